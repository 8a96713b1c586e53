package fringekeep.figure.internal;

import fringekeep.archive.kind.CsvPayload;
import fringekeep.archive.problem.ProblemException;
import fringekeep.archive.record.Hash;
import java.util.ArrayList;
import java.util.Arrays;
import java.util.List;
import java.util.Optional;

/** The numbers of a figure: one row per point, in the units of the axes. */
public final class FigureTable {
    /** Name of the payload. */
    public static final String NAME = "numbers";

    private final List<Optional<String>> panels = new ArrayList<>();
    private final List<Double> series = new ArrayList<>();
    private final List<Double> row = new ArrayList<>();
    private final List<Double> x = new ArrayList<>();
    private final List<Double> y = new ArrayList<>();
    private final List<Double> other = new ArrayList<>();
    private final List<Optional<String>> sources = new ArrayList<>();

    /** An empty table. */
    FigureTable() {}

    void add(PlotRequest request, Numbers numbers) {
        for (int i = 0; i < numbers.rows(); i++) {
            panels.add(Optional.of(request.panel()));
            series.add((double) request.position());
            row.add((double) i);
            x.add(numbers.x().length == 0 ? Double.NaN : numbers.x()[i]);
            y.add(numbers.y()[i]);
            other.add(numbers.other().length == 0 ? Double.NaN : numbers.other()[i]);
            sources.add(numbers.sources().get(i).map(Hash::hex));
        }
    }

    byte[] bytes() {
        return CsvPayload.write(new CsvPayload.Table(List.of(
                new CsvPayload.Texts("panel", panels),
                new CsvPayload.Numbers("series", array(series)),
                new CsvPayload.Numbers("row", array(row)),
                new CsvPayload.Numbers("x", array(x)),
                new CsvPayload.Numbers("y", array(y)),
                new CsvPayload.Numbers("other", array(other)),
                new CsvPayload.Texts("source", sources))));
    }

    private static double[] array(List<Double> list) {
        return list.stream().mapToDouble(Double::doubleValue).toArray();
    }

    /** Reads a payload. */
    public static FigureTable read(byte[] bytes) throws ProblemException {
        CsvPayload.Table table = CsvPayload.read(bytes);
        FigureTable figure = new FigureTable();
        figure.panels.addAll(texts(table, "panel"));
        numbers(table, "series", figure.series);
        numbers(table, "row", figure.row);
        numbers(table, "x", figure.x);
        numbers(table, "y", figure.y);
        numbers(table, "other", figure.other);
        figure.sources.addAll(texts(table, "source"));
        return figure;
    }

    private static List<Optional<String>> texts(CsvPayload.Table table, String name) {
        return table.column(name)
                .filter(CsvPayload.Texts.class::isInstance)
                .map(column -> ((CsvPayload.Texts) column).values())
                .orElseGet(() -> java.util.Collections.nCopies(table.rows(), Optional.empty()));
    }

    private static void numbers(CsvPayload.Table table, String name, List<Double> into) {
        double[] absent = new double[table.rows()];
        Arrays.fill(absent, Double.NaN);
        for (double value : table.numbers(name).orElse(absent)) {
            into.add(value);
        }
    }

    /** The rows of one series. */
    Rows rows(String panel, int position) {
        List<Integer> at = new ArrayList<>();
        for (int i = 0; i < y.size(); i++) {
            if (panels.get(i).equals(Optional.of(panel)) && series.get(i) == position) {
                at.add(i);
            }
        }
        boolean hasOther = at.stream().noneMatch(i -> Double.isNaN(other.get(i)));
        return new Rows(pick(x, at), pick(y, at), hasOther ? pick(other, at) : new double[0]);
    }

    private static double[] pick(List<Double> column, List<Integer> at) {
        return at.stream().mapToDouble(column::get).toArray();
    }

    /** Columns of one series. */
    record Rows(double[] x, double[] y, double[] other) {
        Rows {
            x = x.clone();
            y = y.clone();
            other = other.clone();
        }
    }
}
