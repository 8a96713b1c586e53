package fringekeep.archive.kind;

import fringekeep.archive.problem.ProblemException;
import java.util.ArrayList;
import java.util.Arrays;
import java.util.List;
import java.util.Optional;

/** Reads the text of a {@code csv/1} payload cell by cell. */
final class CsvReading {
    private final String text;
    private int at;
    private int line = 1;

    CsvReading(String text) {
        this.text = text;
    }

    CsvPayload.Table table() throws ProblemException {
        List<String> names = line().stream().map(Cell::content).toList();
        List<Gathered> columns = names.stream().map(Gathered::new).toList();
        while (at < text.length()) {
            line++;
            List<Cell> cells = line();
            if (cells.size() != names.size()) {
                throw wrong("has " + cells.size() + " cells; the header announces " + names.size());
            }
            for (int i = 0; i < cells.size(); i++) {
                columns.get(i).add(cells.get(i));
            }
        }
        List<CsvPayload.Column> made = new ArrayList<>();
        for (Gathered column : columns) {
            made.add(column.column());
        }
        try {
            return new CsvPayload.Table(made);
        } catch (IllegalArgumentException e) {
            throw CsvPayload.problem("payload.form", "The header cannot be used: " + e.getMessage() + ".", "line 1");
        }
    }

    private List<Cell> line() throws ProblemException {
        List<Cell> cells = new ArrayList<>();
        while (true) {
            cells.add(cell());
            if (at >= text.length()) {
                throw wrong("does not end with a line feed");
            }
            char end = text.charAt(at++);
            if (end == '\n') {
                return cells;
            }
            if (end != ',') {
                throw wrong("has something after the closing quote of cell " + cells.size());
            }
        }
    }

    private Cell cell() throws ProblemException {
        if (at < text.length() && text.charAt(at) == '"') {
            return new Cell(quoted(), true);
        }
        int start = at;
        while (at < text.length() && text.charAt(at) != ',' && text.charAt(at) != '\n') {
            at++;
        }
        return new Cell(text.substring(start, at), false);
    }

    private String quoted() throws ProblemException {
        StringBuilder content = new StringBuilder();
        at++;
        while (at < text.length()) {
            char c = text.charAt(at++);
            if (c != '"') {
                content.append(c);
            } else if (at < text.length() && text.charAt(at) == '"') {
                content.append(c);
                at++;
            } else {
                return content.toString();
            }
        }
        throw wrong("has a quote that is not closed");
    }

    private ProblemException wrong(String what) {
        return CsvPayload.problem("payload.form", "Row " + line + " " + what + ".", "line " + line);
    }

    private record Cell(String content, boolean quoted) {}

    /** What a column's cells were so far. */
    private final class Gathered {
        private final String name;
        private double[] numbers = new double[16];
        private int rows;
        private final List<Optional<String>> texts = new ArrayList<>();
        private boolean anyNumber;
        private boolean anyText;

        Gathered(String name) {
            this.name = name;
        }

        void add(Cell cell) throws ProblemException {
            double number = Double.NaN;
            if (cell.quoted) {
                anyText = true;
            } else if (!cell.content.isEmpty()) {
                anyNumber = true;
                number = number(cell.content);
            }
            if (anyText && anyNumber) {
                throw wrong("mixes texts and numbers in column \"" + name + "\"");
            }
            if (rows == numbers.length) {
                numbers = Arrays.copyOf(numbers, 2 * rows);
            }
            numbers[rows++] = number;
            if (!anyNumber) {
                texts.add(cell.quoted ? Optional.of(cell.content) : Optional.empty());
            }
        }

        private double number(String content) throws ProblemException {
            if (content.length() <= 32 && content.matches("-?[0-9]+(\\.[0-9]+)?(e[+-][0-9]+)?")) {
                double value = Double.parseDouble(content);
                if (Double.isFinite(value)) {
                    return value;
                }
            }
            throw wrong("has a cell in column \"" + name + "\" that is no number");
        }

        CsvPayload.Column column() throws ProblemException {
            try {
                return anyText
                        ? new CsvPayload.Texts(name, texts)
                        : new CsvPayload.Numbers(name, Arrays.copyOf(numbers, rows));
            } catch (IllegalArgumentException e) {
                throw CsvPayload.problem(
                        "payload.form", "The header cannot be used: " + e.getMessage() + ".", "line 1");
            }
        }
    }
}
