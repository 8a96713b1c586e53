package fringekeep.fit;

import fringekeep.archive.Archive;
import fringekeep.archive.NewRecord;
import fringekeep.archive.facet.CountTable;
import fringekeep.archive.json.JsonObject;
import fringekeep.archive.kind.NewPayload;
import fringekeep.archive.kind.RecordView;
import fringekeep.archive.problem.Problem;
import fringekeep.archive.problem.ProblemException;
import fringekeep.archive.record.Hash;
import fringekeep.archive.record.InputReference;
import fringekeep.archive.record.PartName;
import fringekeep.drawing.Layer;
import fringekeep.drawing.Stroke;
import fringekeep.fit.Trial.Point;
import fringekeep.fit.Trial.Use;
import fringekeep.fit.internal.FitAnswer.RowSource;
import fringekeep.fit.internal.FitChoices;
import fringekeep.fit.internal.ResidualTable;
import fringekeep.fit.internal.ResidualTable.Row;
import java.util.ArrayList;
import java.util.HashMap;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import java.util.Set;
import java.util.TreeSet;

/** Points and pictures of a fit that is tried. */
final class TrialDrawing {
    private final Archive archive;
    private final TrialFits.Draft draft;
    private final FitChoices choices;
    private final Map<Hash, Optional<CountTable>> tables = new HashMap<>();
    private final Map<Hash, double[]> read = new HashMap<>();

    TrialDrawing(Archive archive, TrialFits.Draft draft) {
        this.archive = archive;
        this.draft = draft;
        this.choices = new FitChoices(draft.request().choices());
    }

    /** A fit that came out. */
    Trial fitted(NewRecord computed, Optional<Hash> compared) throws ProblemException {
        JsonObject asked = computed.parts().getOrDefault(PartName.CHOICES, JsonObject.EMPTY);
        JsonObject result = computed.parts().getOrDefault(PartName.RESULT, JsonObject.EMPTY);
        NewPayload payload = computed.payloads().get(0);
        List<Row> rows = ResidualTable.read(payload.bytes(), payload.form()).stream()
                .map(row -> row.used() ? row : whole(row, asked))
                .toList();
        List<Point> points = new ArrayList<>();
        for (Row row : rows) {
            points.add(point(row, computed.inputs()));
        }
        List<Layer> behind = compared.flatMap(archive::record)
                .map(other -> curve(other, FitPicture.exposure(result)))
                .map(List::of)
                .orElse(List.of());
        return new Trial(
                asked,
                Optional.of(result),
                points,
                FitPicture.of(asked, result, rows, look(points, rows), behind),
                List.of());
    }

    private Layer curve(RecordView other, double exposure) {
        return FitPicture.curve(other, exposure, archive.label(other.fingerprint()));
    }

    /** A fit that failed: the scans' own counts. */
    Trial failed(List<Problem> problems) {
        List<Row> rows = new ArrayList<>();
        List<Point> points = new ArrayList<>();
        double exposure = 1;
        String sort = "time";
        for (Hash scan : draft.request().scans()) {
            Optional<CountTable> table = tables.computeIfAbsent(scan, each -> TrialFits.table(archive, each));
            if (table.isPresent()) {
                double[] exposures = exposures(table.get());
                sort = table.get().shots().length > 0 ? "shots" : "time";
                exposure = exposures.length > 0 ? exposures[0] : 1;
                rows(scan, table.get(), exposures, rows, points);
            }
        }
        JsonObject stated = JsonObject.EMPTY.with("si", exposure).with("sort", sort);
        return new Trial(
                draft.request().choices(),
                Optional.empty(),
                points,
                FitPicture.counts(rows, stated, look(points, rows)),
                problems);
    }

    private void rows(Hash scan, CountTable table, double[] exposures, List<Row> rows, List<Point> points) {
        Optional<CountTable.Column> axis = choices.axis().isPresent()
                ? table.axis(choices.axis().get())
                : table.axes().stream().findFirst();
        Optional<CountTable.Column> channel = table.channel(draft.request().channel());
        if (axis.isEmpty() || channel.isEmpty()) {
            return;
        }
        Set<Integer> masked = masked(scan);
        double[] positions = axis.get().values();
        double[] counts = channel.get().values();
        for (int row = 0; row < positions.length; row++) {
            boolean outside = !choices.within(positions[row]);
            boolean left = masked.contains(row) || Double.isNaN(counts[row]);
            Use use = outside ? Use.OUTSIDE : left ? Use.MASKED : Use.USED;
            double count = Double.isNaN(counts[row]) ? 0 : counts[row];
            points.add(new Point(scan, row, positions[row], positions[row], count, use));
            rows.add(new Row(
                    new RowSource(0, row),
                    positions[row],
                    exposures.length > row ? exposures[row] : 1,
                    count,
                    Double.NaN,
                    Double.NaN,
                    use == Use.USED));
        }
    }

    private Set<Integer> masked(Hash scan) {
        Set<Integer> masked = new TreeSet<>(
                new TrialFits(archive).masked(scan, draft.request().channel()));
        for (MaskChange change : draft.masks()) {
            if (change.scan().equals(scan)) {
                masked.addAll(change.masked().keySet());
                masked.removeAll(change.shown());
            }
        }
        return masked;
    }

    /** A sum leaves out what is masked; it is shown as what it would have been. */
    private Row whole(Row row, JsonObject asked) {
        if (!asked.text("combine").equals(Optional.of("sum"))) {
            return row;
        }
        double counts = 0;
        double exposure = 0;
        for (Hash scan : draft.request().scans()) {
            Optional<CountTable> table = tables.computeIfAbsent(scan, each -> TrialFits.table(archive, each));
            Optional<CountTable.Column> channel =
                    table.flatMap(each -> each.channel(draft.request().channel()));
            int at = row.source().row();
            if (channel.isPresent() && at < table.get().rows()) {
                double count = channel.get().values()[at];
                counts += Double.isNaN(count) ? 0 : count;
                exposure += exposures(table.get())[at];
            }
        }
        return new Row(row.source(), row.position(), exposure, counts, row.fitted(), row.residual(), false);
    }

    private static double[] exposures(CountTable table) {
        return table.shots().length > 0 ? table.shots() : table.exposure();
    }

    private Point point(Row row, List<InputReference> inputs) {
        Hash scan = ((InputReference.OfRecord) inputs.get(row.source().input())).record();
        double[] positions = read.computeIfAbsent(scan, this::positions);
        int at = row.source().row();
        double asRead = at < positions.length ? positions[at] : row.position();
        Use use = row.used() ? Use.USED : choices.within(asRead) ? Use.MASKED : Use.OUTSIDE;
        return new Point(scan, at, row.position(), asRead, row.counts(), use);
    }

    private double[] positions(Hash scan) {
        return tables.computeIfAbsent(scan, each -> TrialFits.table(archive, each))
                .flatMap(table -> choices.axis().isPresent()
                        ? table.axis(choices.axis().get())
                        : table.axes().stream().findFirst())
                .map(CountTable.Column::values)
                .orElse(new double[0]);
    }

    /** Rows and points stand in the same order. */
    private static FitPicture.Look look(List<Point> points, List<Row> rows) {
        Map<Row, Use> uses = new HashMap<>();
        for (int i = 0; i < rows.size(); i++) {
            uses.put(rows.get(i), points.get(i).use());
        }
        return new FitPicture.Look(Stroke.DOTTED, row -> uses.get(row) == Use.OUTSIDE);
    }
}
