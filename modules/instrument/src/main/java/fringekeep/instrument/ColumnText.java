package fringekeep.instrument;

import fringekeep.archive.problem.Problem;
import fringekeep.archive.problem.ProblemException;
import java.math.BigDecimal;
import java.nio.ByteBuffer;
import java.nio.charset.CharacterCodingException;
import java.nio.charset.Charset;
import java.nio.charset.CodingErrorAction;
import java.util.ArrayList;
import java.util.List;
import java.util.Optional;
import java.util.regex.Pattern;

/**
 * Plain columns of text as instruments write them: one row a line, cells between delimiters. Used for slow logs and flight
 * traces; scans have reading profiles of their own.
 */
public final class ColumnText {
    private static final Pattern NUMBER = Pattern.compile("[+-]?([0-9]+(\\.[0-9]*)?|\\.[0-9]+)([eE][+-]?[0-9]{1,3})?");

    private ColumnText() {}

    /**
     * How a file is read.
     *
     * @param encoding a charset every Java platform has
     * @param delimiter {@code tab}, {@code ,}, {@code ;} or {@code space}; spaces in a row count as one
     * @param decimal decimal sign
     * @param comment lines that begin with this are passed over; empty = none
     * @param skip lines passed over at the top, comments not counted
     */
    public record Form(String encoding, String delimiter, char decimal, String comment, int skip) {}

    /**
     * One row.
     *
     * @param number line number from 1
     * @param cells without quotes and surrounding blanks
     */
    public record Line(int number, List<String> cells) {
        /** Copies. */
        public Line {
            cells = List.copyOf(cells);
        }
    }

    /**
     * Splits a file into rows; blank lines are passed over.
     *
     * @throws ProblemException if the bytes are not text of that encoding
     */
    public static List<Line> read(byte[] bytes, Form form) throws ProblemException {
        String[] lines = decode(bytes, form.encoding()).split("\r\n|\n|\r", -1);
        List<Line> rows = new ArrayList<>();
        int skipped = 0;
        for (int i = 0; i < lines.length; i++) {
            boolean comment = !form.comment().isEmpty() && lines[i].startsWith(form.comment());
            if (lines[i].isBlank() || comment) {
                continue;
            }
            if (skipped < form.skip()) {
                skipped++;
            } else {
                rows.add(new Line(i + 1, cells(lines[i], form.delimiter())));
            }
        }
        return rows;
    }

    private static String decode(byte[] bytes, String encoding) throws ProblemException {
        try {
            String text = Charset.forName(encoding)
                    .newDecoder()
                    .onMalformedInput(CodingErrorAction.REPORT)
                    .onUnmappableCharacter(CodingErrorAction.REPORT)
                    .decode(ByteBuffer.wrap(bytes))
                    .toString();
            return text.startsWith("\uFEFF") ? text.substring(1) : text;
        } catch (CharacterCodingException e) {
            throw new ProblemException(Trouble.at("text-encoding", "", encoding));
        } catch (IllegalArgumentException e) {
            throw new ProblemException(Trouble.at("text-charset", "/choices", encoding));
        }
    }

    private static List<String> cells(String line, String delimiter) {
        if (delimiter.equals("space")) {
            return List.of(line.strip().split("\\s+"));
        }
        char mark = delimiter.equals("tab") ? '\t' : delimiter.charAt(0);
        List<String> cells = new ArrayList<>();
        StringBuilder cell = new StringBuilder();
        boolean quoted = false;
        for (int i = 0; i < line.length(); i++) {
            char c = line.charAt(i);
            if (c == '"') {
                quoted = !quoted;
            } else if (c == mark && !quoted) {
                cells.add(cell.toString().strip());
                cell.setLength(0);
            } else {
                cell.append(c);
            }
        }
        cells.add(cell.toString().strip());
        return cells;
    }

    /**
     * The number in a cell; empty for an empty cell and for {@code NaN}.
     *
     * @throws ProblemException if the line has no such cell or it holds no number; names line and column
     */
    public static Optional<BigDecimal> number(Line line, int column, char decimal) throws ProblemException {
        String cell = cell(line, column);
        if (cell.isEmpty() || cell.equalsIgnoreCase("nan")) {
            return Optional.empty();
        }
        String plain = decimal == ',' ? cell.replace(".", "#").replace(',', '.') : cell;
        if (!NUMBER.matcher(plain).matches()) {
            throw new ProblemException(trouble("cell-number", line, column, cell));
        }
        return Optional.of(new BigDecimal(plain.endsWith(".") ? plain + "0" : plain));
    }

    /**
     * A cell as it stands.
     *
     * @throws ProblemException if the line has no such cell
     */
    public static String cell(Line line, int column) throws ProblemException {
        if (column >= line.cells().size()) {
            throw new ProblemException(trouble(
                    "cell-missing", line, column, Integer.toString(line.cells().size())));
        }
        return line.cells().get(column);
    }

    /** A problem at a cell. */
    static Problem trouble(String code, Line line, int column, String found) {
        String where = "line " + line.number() + ", column " + (column + 1);
        return Trouble.at(code, where, found);
    }
}
