package fringekeep.fit;

import fringekeep.archive.facet.Estimates;
import fringekeep.archive.kind.FlatTable;
import fringekeep.archive.kind.FlatTable.FlatColumn;
import fringekeep.archive.kind.Inputs;
import fringekeep.archive.kind.RecordView;
import fringekeep.fit.internal.ResidualTable;
import java.util.ArrayList;
import java.util.List;
import java.util.Optional;

/** A fit's estimates and rows as tables for people and bundles. */
final class FitTables {
    private FitTables() {}

    static List<FlatTable> of(RecordView record, Inputs inputs) {
        List<FlatTable> tables = new ArrayList<>();
        FitReading.estimates(record.result(), inputs).ifPresent(estimates -> tables.add(estimates(estimates)));
        List<ResidualTable.Row> rows = FitPicture.rows(record);
        if (!rows.isEmpty()) {
            tables.add(residuals(rows));
        }
        return tables;
    }

    private static FlatTable estimates(Estimates estimates) {
        List<List<Optional<Object>>> rows = new ArrayList<>();
        for (int i = 0; i < estimates.names().size(); i++) {
            double variance = estimates.covariance(i, i);
            rows.add(List.of(
                    Optional.of(estimates.names().get(i)),
                    Optional.of(estimates.values()[i]),
                    Optional.of(Math.sqrt(Math.max(0, variance))),
                    Optional.of(estimates.units().get(i))));
        }
        return new FlatTable(
                "fit-estimates",
                List.of(
                        new FlatColumn("estimate", "estimate", "", "Name of the estimate."),
                        new FlatColumn("value_si", "value", "", "Value in the SI unit beside it."),
                        new FlatColumn("u_si", "u", "", "Standard uncertainty in the same unit."),
                        new FlatColumn("unit", "unit", "", "UCUM code of the SI unit.")),
                rows);
    }

    private static FlatTable residuals(List<ResidualTable.Row> rows) {
        List<List<Optional<Object>>> cells = new ArrayList<>();
        for (ResidualTable.Row row : rows) {
            cells.add(List.of(
                    Optional.of((double) row.source().input()),
                    Optional.of((double) row.source().row()),
                    Optional.of(row.position()),
                    Optional.of(row.exposure()),
                    Optional.of(row.counts()),
                    number(row.fitted()),
                    number(row.residual()),
                    Optional.of(row.used() ? 1.0 : 0.0)));
        }
        return new FlatTable(
                "fit-residuals",
                List.of(
                        new FlatColumn("input", "input", "1", "Position of the scan among the inputs of the fit."),
                        new FlatColumn("row", "row", "1", "Row of the scan, from 0."),
                        new FlatColumn("position_m", "position", "m", "Position as fitted."),
                        new FlatColumn("exposure", "exposure", "", "Exposure of the row, seconds or shots."),
                        new FlatColumn("counts", "counts", "1", "Counts as read, or the sum of them."),
                        new FlatColumn("fitted_counts", "fitted", "1", "Counts the fit expects."),
                        new FlatColumn("residual", "residual", "1", "Residual over the standard deviation expected."),
                        new FlatColumn("used", "used", "1", "1 where the fit used the row, 0 where it was left out.")),
                cells);
    }

    private static Optional<Object> number(double value) {
        return Double.isNaN(value) ? Optional.empty() : Optional.of(value);
    }
}
