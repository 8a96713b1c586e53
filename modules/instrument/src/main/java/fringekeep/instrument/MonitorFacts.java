package fringekeep.instrument;

import fringekeep.archive.facet.Plottable;
import fringekeep.archive.json.JsonObject;
import fringekeep.archive.kind.FlatTable;
import fringekeep.archive.kind.RecordView;
import fringekeep.archive.problem.ProblemException;
import fringekeep.drawing.Axis;
import fringekeep.drawing.Layer;
import fringekeep.drawing.Panel;
import fringekeep.drawing.Picture;
import fringekeep.drawing.Stroke;
import fringekeep.drawing.Tone;
import java.time.Instant;
import java.util.ArrayList;
import java.util.Arrays;
import java.util.List;
import java.util.Optional;

/** What a recorded monitor log says. */
final class MonitorFacts {
    private static final double HOUR = 3600;

    private MonitorFacts() {}

    /** The log; empty where the result or its table is not at hand. */
    static Optional<MonitorLog> log(RecordView record) {
        JsonObject result = record.result();
        List<JsonObject> columns = SetupReader.objects(result.array("columns")).toList();
        Optional<Instant> start = CalibrationReader.instant(result, "start");
        if (start.isEmpty()) {
            return Optional.empty();
        }
        try {
            List<double[]> table =
                    TablePayload.read(record.payload(result.text("table").orElse("table")), columns.size() + 1);
            List<MonitorLog.Series> series = new ArrayList<>();
            for (int i = 0; i < columns.size(); i++) {
                String name = columns.get(i).text("name").orElse("");
                String unit = columns.get(i).text("unit").orElse("1");
                series.add(new MonitorLog.Series(name, unit, table.get(i + 1)));
            }
            double u = result.object("clockOffset")
                    .orElse(JsonObject.EMPTY)
                    .number("u")
                    .orElse(0);
            return Optional.of(new MonitorLog(start.get(), u, table.get(0), series));
        } catch (ProblemException | IllegalArgumentException e) {
            return Optional.empty(); // the archive's check names a missing or damaged payload
        }
    }

    static Plottable plottable(MonitorLog log) {
        List<Plottable.Series> series = new ArrayList<>();
        for (MonitorLog.Series one : log.series()) {
            series.add(new Plottable.Series(
                    one.name(),
                    one.name(),
                    Plottable.Sort.CURVE,
                    "time",
                    "s",
                    one.name(),
                    one.unit(),
                    log.times(),
                    one.values(),
                    new double[0],
                    List.of()));
        }
        return new Plottable(series);
    }

    static Picture picture(MonitorLog log) {
        List<Panel> panels = new ArrayList<>();
        for (MonitorLog.Series one : log.series()) {
            panels.add(new Panel(
                    "",
                    "",
                    Axis.linear("time since " + log.start(), "h"),
                    Axis.linear(one.name(), one.unit().equals("1") ? "" : one.unit()),
                    List.of(curve(log.times(), one.values())),
                    1,
                    false));
        }
        return new Picture("", 160, 45.0 * Math.max(1, panels.size()), 1, panels);
    }

    /** Readings that are there, against hours. */
    private static Layer curve(double[] seconds, double[] values) {
        double[] hours = new double[seconds.length];
        double[] readings = new double[seconds.length];
        int count = 0;
        for (int i = 0; i < seconds.length; i++) {
            if (!Double.isNaN(values[i])) {
                hours[count] = seconds[i] / HOUR;
                readings[count++] = values[i];
            }
        }
        return new Layer.Curve("", Tone.INK, Stroke.SOLID, Arrays.copyOf(hours, count), Arrays.copyOf(readings, count));
    }

    static FlatTable table(MonitorLog log) {
        List<FlatTable.FlatColumn> columns = new ArrayList<>();
        columns.add(new FlatTable.FlatColumn("time_s", "Time", "s", "Seconds since " + log.start() + "."));
        for (MonitorLog.Series one : log.series()) {
            columns.add(new FlatTable.FlatColumn(
                    MonitorTable.columnName(one.name(), one.unit()), one.name(), one.unit(), "Reading as logged."));
        }
        List<List<Optional<Object>>> rows = new ArrayList<>();
        double[] times = log.times();
        List<double[]> values =
                log.series().stream().map(MonitorLog.Series::values).toList();
        for (int row = 0; row < times.length; row++) {
            List<Optional<Object>> cells = new ArrayList<>();
            cells.add(Optional.of(times[row]));
            for (double[] column : values) {
                cells.add(Double.isNaN(column[row]) ? Optional.empty() : Optional.of(column[row]));
            }
            rows.add(cells);
        }
        return new FlatTable("readings", columns, rows);
    }
}
