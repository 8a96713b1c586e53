package fringekeep.archive.kind;

import fringekeep.archive.json.EcmaScriptNumber;
import fringekeep.archive.problem.Problem;
import fringekeep.archive.problem.ProblemException;
import java.nio.ByteBuffer;
import java.nio.charset.CharacterCodingException;
import java.nio.charset.StandardCharsets;
import java.util.ArrayList;
import java.util.Arrays;
import java.util.List;
import java.util.Optional;
import java.util.regex.Pattern;

/**
 * Payload form {@code csv/1} (record format 1, section 5): UTF-8, LF after every line, one header line of column names, cells
 * separated by commas; numbers as ECMAScript writes them, texts always quoted (RFC 4180), absent cells empty. Bytes are valid
 * only if writing what was read gives the same bytes.
 */
public final class CsvPayload {
    /** Name of the form. */
    public static final String FORM = "csv/1";

    private static final Pattern NAME = Pattern.compile("[a-z][a-z0-9_]*");

    private CsvPayload() {}

    /** Bytes of a table of numbers, NaN = absent. */
    public static byte[] write(List<String> names, List<double[]> columns) {
        List<Column> numbers = new ArrayList<>();
        for (int i = 0; i < names.size(); i++) {
            numbers.add(new Numbers(names.get(i), columns.get(i)));
        }
        return write(new Table(numbers));
    }

    /** Bytes of a table. */
    public static byte[] write(Table table) {
        StringBuilder text = new StringBuilder();
        text.append(String.join(",", table.columns().stream().map(Column::name).toList()))
                .append('\n');
        for (int row = 0; row < table.rows(); row++) {
            for (int i = 0; i < table.columns().size(); i++) {
                text.append(i == 0 ? "" : ",").append(table.columns().get(i).cell(row));
            }
            text.append('\n');
        }
        return text.toString().getBytes(StandardCharsets.UTF_8);
    }

    /**
     * Reads a table.
     *
     * @throws ProblemException with line and column if the bytes are not exactly of this form
     */
    public static Table read(byte[] bytes) throws ProblemException {
        Table table = new CsvReading(decoded(bytes)).table();
        if (!Arrays.equals(bytes, write(table))) {
            throw problem("payload.not-canonical", "The table is not in the one form its numbers and texts have.", "");
        }
        return table;
    }

    private static String decoded(byte[] bytes) throws ProblemException {
        try {
            return StandardCharsets.UTF_8
                    .newDecoder()
                    .decode(ByteBuffer.wrap(bytes))
                    .toString();
        } catch (CharacterCodingException e) {
            throw problem("payload.not-utf8", "The table is not UTF-8.", "");
        }
    }

    static ProblemException problem(String code, String what, String where) {
        return new ProblemException(new Problem(code, what, where, "Write the table anew from its source."));
    }

    /**
     * A table: columns of equal length.
     *
     * @param columns at least one, names different
     */
    public record Table(List<Column> columns) {
        /** Checks lengths and names. */
        public Table {
            columns = List.copyOf(columns);
            if (columns.isEmpty()) {
                throw new IllegalArgumentException("a table has at least one column");
            }
            int rows = columns.get(0).rows();
            if (columns.stream().anyMatch(column -> column.rows() != rows)) {
                throw new IllegalArgumentException("columns differ in length");
            }
            if (columns.stream().map(Column::name).distinct().count() != columns.size()) {
                throw new IllegalArgumentException("two columns have one name");
            }
        }

        /** Number of rows. */
        public int rows() {
            return columns.get(0).rows();
        }

        /** The column of that name. */
        public Optional<Column> column(String name) {
            return columns.stream().filter(column -> column.name().equals(name)).findFirst();
        }

        /** Values of a column of numbers, NaN where absent; empty if there is none of that name. */
        public Optional<double[]> numbers(String name) {
            return column(name).filter(Numbers.class::isInstance).map(column -> ((Numbers) column).values());
        }
    }

    /** A column. */
    public sealed interface Column {
        /** {@code [a-z][a-z0-9_]*} with a unit suffix. */
        String name();

        /** Number of rows. */
        int rows();

        /** A cell as written. */
        String cell(int row);
    }

    /** A column of finite numbers, NaN = absent. */
    public record Numbers(String name, double[] values) implements Column {
        /** Copies; -0 becomes 0; refuses infinities. */
        public Numbers {
            requireName(name);
            double[] copy = values.clone();
            for (int i = 0; i < copy.length; i++) {
                if (Double.isInfinite(copy[i])) {
                    throw new IllegalArgumentException("row " + i + " of column " + name + " is infinite");
                }
                copy[i] = copy[i] + 0.0;
            }
            values = copy;
        }

        @Override
        public double[] values() {
            return values.clone();
        }

        @Override
        public int rows() {
            return values.length;
        }

        @Override
        public String cell(int row) {
            return Double.isNaN(values[row]) ? "" : EcmaScriptNumber.write(values[row]);
        }
    }

    /** A column of texts, empty = absent. */
    public record Texts(String name, List<Optional<String>> values) implements Column {
        /** Copies. */
        public Texts {
            requireName(name);
            values = List.copyOf(values);
        }

        @Override
        public int rows() {
            return values.size();
        }

        @Override
        public String cell(int row) {
            return values.get(row)
                    .map(text -> "\"" + text.replace("\"", "\"\"") + "\"")
                    .orElse("");
        }
    }

    private static void requireName(String name) {
        if (!NAME.matcher(name).matches() || name.length() > 64) {
            throw new IllegalArgumentException("not a column name: " + name);
        }
    }
}
