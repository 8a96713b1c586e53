package fringekeep.fit;

import fringekeep.archive.json.JsonObject;
import fringekeep.archive.kind.CsvPayload;
import fringekeep.archive.kind.Inputs;
import fringekeep.archive.kind.RecordView;
import fringekeep.archive.problem.ProblemException;
import fringekeep.archive.quantity.ValueText;
import fringekeep.archive.record.PayloadReference;
import fringekeep.drawing.Axis;
import fringekeep.drawing.Layer;
import fringekeep.drawing.Panel;
import fringekeep.drawing.Picture;
import fringekeep.drawing.Shape;
import fringekeep.drawing.Stroke;
import fringekeep.drawing.Tone;
import fringekeep.fit.internal.FittedCurve;
import fringekeep.fit.internal.ResidualTable;
import fringekeep.fit.internal.ResidualTable.Row;
import java.util.ArrayList;
import java.util.List;
import java.util.Optional;
import java.util.OptionalDouble;
import java.util.function.ToDoubleFunction;

/** Draws counts with the fitted curve and its band, and the residuals below; masked rows as bars. */
final class FitPicture {
    private static final double WIDTH = 120;
    private static final double HEIGHT = 90;
    private static final double RESIDUAL_SHARE = 0.3;
    private static final double LEAST_RESIDUAL = 3;
    private static final double NANOMETRES = 1e9;
    private static final int CURVE_POINTS = 400;

    private FitPicture() {}

    /** The picture; empty where the payload is not at hand. */
    static Optional<Picture> of(RecordView record, Inputs inputs) {
        List<Row> rows = rows(record);
        if (rows.isEmpty()) {
            return Optional.empty();
        }
        double exposure = record.result()
                .object("exposure")
                .map(each -> each.number("si").orElse(1))
                .orElse(1.0);
        Panel fringe = fringe(record, rows, exposure);
        return Optional.of(new Picture("", WIDTH, HEIGHT, 1, List.of(fringe, residuals(rows))));
    }

    /** Rows of the residual payload; empty where it is not at hand. */
    static List<Row> rows(RecordView record) {
        String name = record.result().text("residuals").orElse("");
        String form = record.head().payloads().stream()
                .filter(payload -> payload.name().equals(name))
                .map(PayloadReference::form)
                .findFirst()
                .orElse(CsvPayload.FORM);
        try {
            return name.isEmpty() ? List.of() : ResidualTable.read(record.payload(name), form);
        } catch (ProblemException e) {
            return List.of();
        }
    }

    private static Panel fringe(RecordView record, List<Row> rows, double exposure) {
        List<Layer> layers = new ArrayList<>();
        if (!record.choices().text("combine").orElse("").equals("joint")) {
            curve(record, rows, exposure, layers);
        } else {
            layers.add(points(
                    "expected", Tone.QUANTUM, Shape.CIRCLE, rows, true, row -> even(row, row.fitted(), exposure)));
        }
        layers.add(counts(rows, exposure, true));
        if (rows.stream().anyMatch(row -> !row.used())) {
            layers.add(counts(rows, exposure, false));
        }
        return new Panel(
                "",
                heading(record, exposure),
                Axis.linear("position", "nm"),
                Axis.linear("counts", ""),
                layers,
                1,
                false);
    }

    private static String heading(RecordView record, double exposure) {
        String sort = record.result()
                .object("exposure")
                .flatMap(each -> each.text("sort"))
                .orElse("time");
        String per = ValueText.number(exposure) + (sort.equals("shots") ? " shots" : " s");
        return "counts in " + per + " against position / nm; below, residuals / \u03c3";
    }

    private static void curve(RecordView record, List<Row> rows, double exposure, List<Layer> layers) {
        JsonObject result = record.result();
        FittedCurve curve = FittedCurve.of(record.choices(), result, rows, exposure, CURVE_POINTS);
        double[] x = scaled(curve.positions());
        layers.add(new Layer.Band("", Tone.QUANTUM, x, curve.lower(), curve.upper()));
        layers.add(new Layer.Ruler("mean", Tone.QUIET, Stroke.DOTTED, true, curve.mean()));
        layers.add(new Layer.Curve("fit", Tone.QUANTUM, Stroke.SOLID, x, curve.values()));
    }

    private static double[] scaled(double[] positions) {
        double[] scaled = positions.clone();
        for (int i = 0; i < scaled.length; i++) {
            scaled[i] *= NANOMETRES;
        }
        return scaled;
    }

    /** Counts brought to the exposure of the panel, so that rows of unequal exposure lie on one curve. */
    private static double even(Row row, double counts, double exposure) {
        return row.exposure() == exposure ? counts : counts * exposure / row.exposure();
    }

    private static Layer counts(List<Row> rows, double exposure, boolean used) {
        List<Row> shown = rows.stream().filter(row -> row.used() == used).toList();
        double[] x =
                shown.stream().mapToDouble(row -> row.position() * NANOMETRES).toArray();
        double[] y = shown.stream()
                .mapToDouble(row -> even(row, row.counts(), exposure))
                .toArray();
        double[] deviations = shown.stream()
                .mapToDouble(row -> even(row, Math.sqrt(row.counts()), exposure))
                .toArray();
        return new Layer.Points(
                used ? "counts" : "masked",
                used ? Tone.INK : Tone.MASKED,
                used ? Shape.DOT : Shape.BAR,
                x,
                y,
                deviations);
    }

    private static Layer points(
            String name, Tone tone, Shape shape, List<Row> rows, boolean used, ToDoubleFunction<Row> value) {
        List<Row> shown = rows.stream().filter(row -> row.used() == used).toList();
        return new Layer.Points(
                name,
                tone,
                shape,
                shown.stream().mapToDouble(row -> row.position() * NANOMETRES).toArray(),
                shown.stream().mapToDouble(value).toArray(),
                new double[0]);
    }

    private static Panel residuals(List<Row> rows) {
        List<Row> used = rows.stream().filter(Row::used).toList();
        double[] x =
                used.stream().mapToDouble(row -> row.position() * NANOMETRES).toArray();
        double[] y = used.stream().mapToDouble(Row::residual).toArray();
        double most = LEAST_RESIDUAL;
        for (double residual : y) {
            most = Math.max(most, Math.abs(residual) * 1.1);
        }
        List<Layer> layers = new ArrayList<>(List.of(
                new Layer.Ruler("", Tone.QUIET, Stroke.SOLID, true, 0),
                new Layer.Sticks("residuals", Tone.INK, x, y),
                new Layer.Points("", Tone.INK, Shape.DOT, x, y, new double[0])));
        if (used.size() < rows.size()) {
            double floor = -most;
            layers.add(points("", Tone.MASKED, Shape.BAR, rows, false, row -> floor));
        }
        Axis residual = new Axis("residual", "\u03c3", false, OptionalDouble.of(-most), OptionalDouble.of(most));
        return new Panel("", "", Axis.linear("position", "nm"), residual, layers, RESIDUAL_SHARE, false);
    }
}
