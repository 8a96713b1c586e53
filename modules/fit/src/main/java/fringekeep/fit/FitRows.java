package fringekeep.fit;

import fringekeep.archive.json.JsonObject;
import fringekeep.archive.kind.Input;
import fringekeep.archive.kind.Inputs;
import fringekeep.archive.kind.RecordView;
import fringekeep.archive.listing.Column;
import fringekeep.archive.listing.Projection;
import fringekeep.archive.listing.Row;
import fringekeep.fit.FringeFacet.Value;
import fringekeep.fit.internal.Rows;
import java.util.List;
import java.util.Optional;
import java.util.stream.Stream;

/** Declared table of fits: one row a fit. */
final class FitRows {
    private static final Column VISIBILITY = Column.real("visibility", "visibility", "1", "1");
    private static final Column PHASE = Column.real("phase_rad", "phase", "rad", "rad");
    private static final Column POWER = Column.real("laser_power_w", "P", "W", "W");
    private static final Column MEAN = Column.real("mean_rate", "mean rate", "s-1", "s-1");

    static final Projection TABLE = new Projection(
            "fit",
            FitKind.NAME,
            List.of(
                    VISIBILITY,
                    Column.deviation("visibility_u", VISIBILITY),
                    PHASE,
                    Column.deviation("phase_u_rad", PHASE),
                    MEAN,
                    Column.deviation("mean_rate_u", MEAN),
                    POWER,
                    Column.deviation("laser_power_u_w", POWER),
                    Column.text("purpose", "role"),
                    Column.text("channel", "channel"),
                    Column.text("combined", "combined"),
                    Column.integer("scans", "scans"),
                    Column.text("method", "method"),
                    Column.real("period_m", "period", "m", "nm"),
                    Column.real("deviance", "deviance", "1", "1"),
                    Column.integer("degrees", "degrees of freedom"),
                    Column.real("p_value", "p", "1", "1"),
                    Column.real("fringe_p", "p of no fringe", "1", "1"),
                    Column.integer("masked_rows", "masked"),
                    Column.instant("started", "started"),
                    Column.hash("scan", "scan")),
            List.of(List.of("scan"), List.of("started"), List.of("purpose")));

    private FitRows() {}

    static Stream<Row> of(RecordView record, Inputs inputs) {
        JsonObject result = record.result();
        JsonObject choices = record.choices();
        Optional<FringeFacet> fringe = FringeFacts.of(record, inputs);
        return Stream.of(estimates(new Rows(), fringe)
                .text("purpose", fringe.flatMap(FringeFacet::purpose).map(each -> each.text()))
                .text("channel", FringeFacts.channel(inputs))
                .text("combined", choices.text("combine"))
                .integer("scans", inputs.role("scan").size())
                .text("method", choices.text("method"))
                .real("period_m", period(record))
                .real("deviance", result.number("deviance"))
                .integer("degrees", result.integer("degreesOfFreedom"))
                .real("p_value", result.number("p"))
                .real(
                        "fringe_p",
                        result.object("fringe")
                                .map(each -> each.number("p").orElse(Double.NaN))
                                .orElse(Double.NaN))
                .integer("masked_rows", result.integer("masked"))
                .instant("started", fringe.flatMap(FringeFacet::start))
                .hash("scan", inputs.role("scan").stream().findFirst().map(Input::target))
                .row());
    }

    private static Rows estimates(Rows rows, Optional<FringeFacet> fringe) {
        if (fringe.isEmpty()) {
            return rows;
        }
        pair(rows, "visibility", "visibility_u", Optional.of(fringe.get().visibility()));
        pair(rows, "phase_rad", "phase_u_rad", fringe.get().phase());
        pair(rows, "mean_rate", "mean_rate_u", Optional.of(fringe.get().mean()));
        pair(rows, "laser_power_w", "laser_power_u_w", fringe.get().power());
        return rows;
    }

    private static void pair(Rows rows, String value, String deviation, Optional<Value> estimate) {
        estimate.ifPresent(each -> rows.real(value, each.value()).real(deviation, each.deviation()));
    }

    /** The fitted period, or the fixed one (m). */
    static double period(RecordView record) {
        int at = record.result().array("estimates").texts().indexOf("period");
        double[] values = record.result().array("values").numbers();
        return at >= 0 && at < values.length
                ? values[at]
                : record.choices()
                        .object("period")
                        .map(each -> each.number("si").orElse(Double.NaN))
                        .orElse(Double.NaN);
    }
}
