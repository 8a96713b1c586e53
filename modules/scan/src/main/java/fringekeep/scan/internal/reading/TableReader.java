package fringekeep.scan.internal.reading;

import fringekeep.archive.problem.Problem;
import fringekeep.archive.problem.ProblemException;
import fringekeep.scan.internal.problem.ScanProblems;
import fringekeep.scan.internal.reading.ProfileColumn.Role;
import fringekeep.scan.internal.reading.ScanTable.TableColumn;
import java.util.ArrayList;
import java.util.Comparator;
import java.util.List;
import java.util.Optional;

/** Reads the rows of a section into a table; collects what is wrong with them, then refuses all or nothing. */
final class TableReader {
    /** Problems listed of one file. */
    private static final int LISTED = 100;

    private final Profile profile;
    private final String file;
    private final FieldSplitter splitter;
    private final List<Problem> problems = new ArrayList<>();

    TableReader(Profile profile, String file) {
        this.profile = profile;
        this.file = file;
        this.splitter = new FieldSplitter(profile.delimiter());
    }

    /**
     * What was read.
     *
     * @param table in SI, dead rows left out
     * @param rowsInFile rows before dead rows were left out
     * @param unfinished whether an unfinished last line was left out
     */
    record Rows(ScanTable table, int rowsInFile, boolean unfinished) {}

    Rows read(Section section) throws ProblemException {
        if (section.rows().isEmpty()) {
            throw new ProblemException(ScanProblems.of("scan.no-rows", file));
        }
        List<Line> lines = new ArrayList<>(section.rows());
        int width = width(section);
        boolean unfinished = unfinished(lines.get(lines.size() - 1), width);
        if (unfinished) {
            lines.remove(lines.size() - 1);
        }
        int[] places = places(section, width);
        int from = profile.dropFirst();
        int to = lines.size() - profile.dropLast();
        if (from >= to) {
            throw new ProblemException(ScanProblems.of("scan.only-dead-rows", file, lines.size()));
        }
        double[][] values = new double[places.length][to - from];
        for (int row = 0; row < lines.size() && problems.size() < LISTED; row++) {
            boolean kept = row >= from && row < to;
            readRow(lines.get(row), width, places, kept ? values : new double[places.length][1], kept ? row - from : 0);
        }
        if (!problems.isEmpty()) {
            throw new ProblemException(problems);
        }
        return new Rows(table(values), lines.size(), unfinished);
    }

    private int width(Section section) {
        if (profile.byPlace()) {
            return profile.columns().size();
        }
        List<Line> lines = section.names().isEmpty() ? section.rows() : section.names();
        return splitter.split(lines.get(0).text()).size();
    }

    private boolean unfinished(Line last, int width) throws ProblemException {
        if (last.ended() || splitter.split(last.text()).size() >= width) {
            return false;
        }
        if (profile.dropUnfinished()) {
            return true;
        }
        throw new ProblemException(ScanProblems.of(
                "scan.cut-off",
                last.place(file, last.text().length() + 1),
                splitter.split(last.text()).size(),
                width));
    }

    private int[] places(Section section, int width) throws ProblemException {
        List<Field> names = section.names().isEmpty()
                ? List.of()
                : splitter.split(section.names().get(0).text());
        int[] places = new int[profile.columns().size()];
        for (int i = 0; i < places.length; i++) {
            places[i] = place(profile.columns().get(i), i, names, section);
            if (places[i] >= width) {
                throw new ProblemException(
                        ScanProblems.of("scan.column-missing", firstPlace(section), places[i] + 1, width));
            }
        }
        return places;
    }

    private int place(ProfileColumn column, int index, List<Field> names, Section section) throws ProblemException {
        if (column.header().isEmpty()) {
            return column.number().orElse(index + 1) - 1;
        }
        String wanted = column.header().get();
        for (int i = 0; i < names.size(); i++) {
            if (names.get(i).text().equalsIgnoreCase(wanted)) {
                return i;
            }
        }
        List<String> there = names.stream().map(Field::text).toList();
        throw new ProblemException(
                ScanProblems.of("scan.column-name", firstPlace(section), wanted, String.join(", ", there)));
    }

    private String firstPlace(Section section) {
        List<Line> lines = section.names().isEmpty() ? section.rows() : section.names();
        return lines.get(0).place(file, 1);
    }

    private void readRow(Line line, int width, int[] places, double[][] values, int row) {
        List<Field> fields = splitter.split(line.text());
        if (fields.size() != width) {
            int column = fields.size() > width
                    ? fields.get(width).column()
                    : line.text().length() + 1;
            problems.add(ScanProblems.of("scan.row-length", line.place(file, column), fields.size(), width));
            return;
        }
        for (int i = 0; i < places.length && problems.size() < LISTED; i++) {
            ProfileColumn column = profile.columns().get(i);
            if (column.role() != Role.UNUSED) {
                values[i][row] = value(column, fields.get(places[i]), line);
            }
        }
    }

    private double value(ProfileColumn column, Field field, Line line) {
        String text = field.text();
        String place = line.place(file, field.column());
        if (text.isEmpty() || profile.absent().contains(text)) {
            if (column.role() != Role.CHANNEL) {
                problems.add(ScanProblems.of("scan.value-missing", place, column.tableName()));
            }
            return Double.NaN;
        }
        Optional<String> decimal = DecimalText.normalise(text, profile.decimal());
        if (decimal.isEmpty()) {
            problems.add(ScanProblems.of("scan.not-a-number", place, shortened(text), profile.decimal()));
            return Double.NaN;
        }
        double value = column.unit().si(decimal.get());
        refusal(column, value).ifPresent(code -> problems.add(ScanProblems.of(code, place, shortened(text))));
        return value;
    }

    private static Optional<String> refusal(ProfileColumn column, double value) {
        if (!Double.isFinite(value)) {
            return Optional.of("scan.number-too-large");
        }
        if (column.counted() && (value < 0 || value != Math.rint(value) || value > 0x1p53)) {
            return Optional.of("scan.not-a-count");
        }
        boolean exposure = column.role() == Role.EXPOSURE || column.role() == Role.SHOTS;
        return exposure && value <= 0 ? Optional.of("scan.exposure-not-positive") : Optional.empty();
    }

    private static String shortened(String text) {
        return text.length() <= 40 ? text : text.substring(0, 40) + "\u2026";
    }

    private ScanTable table(double[][] values) {
        List<TableColumn> columns = new ArrayList<>();
        for (int i = 0; i < values.length; i++) {
            ProfileColumn column = profile.columns().get(i);
            if (column.role() != Role.UNUSED) {
                columns.add(new TableColumn(column, column.tableName(), values[i]));
            }
        }
        columns.sort(Comparator.comparing(column -> column.profile().role()));
        return new ScanTable(columns);
    }
}
