package fringekeep.scan;

import fringekeep.archive.facet.CountTable;
import fringekeep.archive.json.JsonObject;
import fringekeep.archive.kind.FlatTable;
import fringekeep.archive.kind.FlatTable.FlatColumn;
import fringekeep.archive.kind.RecordView;
import fringekeep.archive.problem.ProblemException;
import fringekeep.archive.quantity.QuantityJson;
import fringekeep.archive.record.Hash;
import fringekeep.archive.record.InputReference;
import fringekeep.archive.record.Moment;
import fringekeep.scan.internal.TablePayload;
import fringekeep.scan.internal.problem.ScanProblems;
import java.util.ArrayList;
import java.util.Arrays;
import java.util.List;
import java.util.Map;
import java.util.Optional;

/** Reads back what a scan record holds. */
final class ScanTables {
    /** End of the name of the channel that holds the exposure of one other channel alone. */
    static final String EXPOSURE_OF = " exposure";

    private ScanTables() {}

    /** The table as a facet; empty when the payload is not at hand. */
    static Optional<CountTable> countTable(RecordView record) {
        JsonObject result = record.result();
        try {
            Map<String, double[]> columns = TablePayload.read(record, result);
            return Optional.of(table(result, columns));
        } catch (ProblemException e) {
            return Optional.empty();
        }
    }

    /** The table of a result and its columns by name. */
    static CountTable table(JsonObject result, Map<String, double[]> columns) throws ProblemException {
        List<CountTable.Column> axes = new ArrayList<>();
        for (JsonObject axis : result.array("axes").objects()) {
            axes.add(column(axis, columns));
        }
        List<CountTable.Column> channels = new ArrayList<>();
        for (JsonObject channel : result.array("channels").objects()) {
            channels.add(column(channel, columns));
            Optional<String> own = channel.text("exposureColumn");
            if (own.isPresent()) {
                String name = channel.text("name").orElseThrow() + EXPOSURE_OF;
                channels.add(new CountTable.Column(name, "s", values(columns, own.get())));
            }
        }
        JsonObject exposure = result.object("exposure").orElseThrow();
        int rows = (int) result.integer("rows").orElseThrow();
        boolean shots = exposure.text("sort").orElseThrow().startsWith("shots");
        double[] perRow = perRow(exposure, rows, columns);
        return new CountTable(
                axes,
                channels,
                shots ? new double[0] : perRow,
                shots ? perRow : new double[0],
                moment(result, "start"),
                moment(result, "end"));
    }

    private static CountTable.Column column(JsonObject json, Map<String, double[]> columns) throws ProblemException {
        return new CountTable.Column(
                json.text("name").orElseThrow(),
                json.text("unit").orElseThrow(),
                values(columns, json.text("column").orElseThrow()));
    }

    private static double[] values(Map<String, double[]> columns, String name) throws ProblemException {
        double[] values = columns.get(name);
        if (values == null) {
            throw new ProblemException(ScanProblems.of("scan.table-column", "", name));
        }
        return values;
    }

    private static double[] perRow(JsonObject exposure, int rows, Map<String, double[]> columns)
            throws ProblemException {
        Optional<String> column = exposure.text("column");
        if (column.isPresent()) {
            return values(columns, column.get());
        }
        double si = exposure.number("si").orElseThrow();
        double[] perRow = new double[rows];
        Arrays.fill(perRow, exposure.text("sort").orElseThrow().equals("total") ? si / rows : si);
        return perRow;
    }

    /** Member {@code start} or {@code end} of a result. */
    static Optional<Moment> moment(JsonObject result, String name) {
        return result.object(name).map(json -> QuantityJson.moment(json.without("known")));
    }

    /** The raw file of a scan. */
    static Optional<Hash> raw(RecordView record) {
        return record.head().inputs().stream()
                .filter(InputReference.OfRaw.class::isInstance)
                .map(input -> ((InputReference.OfRaw) input).raw())
                .findFirst();
    }

    /** The profile of a scan. */
    static Optional<Hash> profile(RecordView record) {
        return record.head().inputs().stream()
                .filter(InputReference.OfRecord.class::isInstance)
                .map(input -> ((InputReference.OfRecord) input).record())
                .findFirst();
    }

    /** The table for people and bundles. */
    static FlatTable flat(CountTable table) {
        List<CountTable.Column> columns = new ArrayList<>(table.axes());
        columns.addAll(table.channels());
        List<FlatColumn> heads = new ArrayList<>();
        for (CountTable.Column column : columns) {
            heads.add(new FlatColumn(
                    flatName(column), column.name(), column.unit(), "Column " + column.name() + " as read."));
        }
        boolean shots = table.shots().length > 0;
        heads.add(
                shots
                        ? new FlatColumn("shots", "shots", "1", "Source shots of the row.")
                        : new FlatColumn("exposure_s", "exposure", "s", "Exposure of the row."));
        double[] perRow = shots ? table.shots() : table.exposure();
        List<List<Optional<Object>>> rows = new ArrayList<>();
        for (int i = 0; i < table.rows(); i++) {
            List<Optional<Object>> row = new ArrayList<>();
            for (CountTable.Column column : columns) {
                double value = column.values()[i];
                row.add(Double.isNaN(value) ? Optional.empty() : Optional.of(value));
            }
            row.add(Optional.of(perRow[i]));
            rows.add(row);
        }
        return new FlatTable("scan-table", heads, rows);
    }

    private static String flatName(CountTable.Column column) {
        String name = column.name().toLowerCase(java.util.Locale.ROOT).replaceAll("[^a-z0-9]+", "_");
        String unit = column.unit().toLowerCase(java.util.Locale.ROOT).replaceAll("[^a-z0-9]+", "_");
        return column.unit().equals("1") ? name : name + "_" + unit;
    }
}
