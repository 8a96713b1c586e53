package fringekeep.fit.internal;

import fringekeep.archive.json.JsonObject;
import fringekeep.interferometry.fringe.Background;
import fringekeep.interferometry.fringe.CovarianceSort;
import fringekeep.interferometry.fringe.DeadTime;
import fringekeep.interferometry.fringe.Estimator;
import fringekeep.interferometry.fringe.FringeOptions;
import java.util.Optional;

/**
 * Choices of a fit, read from their JSON with what is absent taken as its documented default.
 *
 * @param json the choices part
 */
public record FitChoices(JsonObject json) {
    private static final double USUAL_INTERVAL = 0.6827;
    private static final double USUAL_LIMIT = 0.95;
    private static final double USUAL_OUTLIER = 4;

    /** How several scans become one answer. */
    public enum Combine {
        /** One scan. */
        SINGLE("single"),
        /** Counts of equal rows added. */
        SUM("sum"),
        /** Each scan shifted by its phase, then fitted as one. */
        SUM_AFTER_PHASE("sum-after-phase"),
        /** One visibility for all. */
        JOINT("joint");

        private final String text;

        Combine(String text) {
            this.text = text;
        }
    }

    /** How scans are combined. */
    public Combine combine() {
        String text = json.text("combine").orElse("single");
        for (Combine combine : Combine.values()) {
            if (combine.text.equals(text)) {
                return combine;
            }
        }
        throw new IllegalArgumentException("combine " + text);
    }

    /** How the parameters are found. */
    public Estimator estimator() {
        return switch (json.text("method").orElse("")) {
            case "fringe.unweighted/1" -> Estimator.UNWEIGHTED;
            case "fringe.weighted/1" -> Estimator.WEIGHTED;
            case "fringe.poisson-likelihood/1" -> Estimator.POISSON_LIKELIHOOD;
            default -> throw new IllegalArgumentException("method " + json.text("method"));
        };
    }

    /** Sort of the dead time: none, given, setup, calibration. */
    public String deadTimeSort() {
        return json.object("deadTime").flatMap(each -> each.text("sort")).orElse("none");
    }

    /** The dead time as recorded. */
    public DeadTime deadTime() {
        JsonObject member = json.object("deadTime").orElse(JsonObject.EMPTY);
        if (deadTimeSort().equals("none")) {
            return DeadTime.NONE;
        }
        boolean extending = member.text("model").orElse("").equals("extending");
        DeadTime.Sort sort = extending ? DeadTime.Sort.PARALYSABLE : DeadTime.Sort.NON_PARALYSABLE;
        return new DeadTime(sort, member.number("si").orElse(0));
    }

    /** The background member. */
    public JsonObject background() {
        return json.object("background").orElse(JsonObject.EMPTY.with("sort", "none"));
    }

    /** Sort of the background: none, known, channel, scan. */
    public String backgroundSort() {
        return background().text("sort").orElse("none");
    }

    private Background treatment() {
        boolean joint = background().flag("joint").orElse(false);
        return switch (backgroundSort()) {
            case "none" -> Background.NONE;
            case "known" ->
                Background.known(
                        background().number("si").orElse(0),
                        background().number("u").orElse(0));
            default -> joint ? Background.JOINT : Background.ESTIMATED;
        };
    }

    /** Whether the period is fitted. */
    public boolean periodFree() {
        return period().text("sort").orElse("").equals("free");
    }

    /** The period member. */
    public JsonObject period() {
        return json.object("period").orElse(JsonObject.EMPTY);
    }

    /** The period as recorded (m). */
    public double periodSi() {
        return period().number("si").orElseThrow();
    }

    /** Options of the fringe fit at a period (m). */
    public FringeOptions options(double period) {
        CovarianceSort covariance =
                switch (json.text("covariance").orElse("expected")) {
                    case "expected" -> CovarianceSort.EXPECTED;
                    case "observed" -> CovarianceSort.OBSERVED;
                    case "scatter" -> CovarianceSort.RESIDUAL_SCATTER;
                    default -> throw new IllegalArgumentException("covariance " + json.text("covariance"));
                };
        return new FringeOptions(
                period,
                periodFree(),
                estimator(),
                covariance,
                treatment(),
                (int) json.integer("driftOrder").orElse(0),
                json.flag("secondHarmonic").orElse(false),
                json.flag("phaseDrift").orElse(false),
                json.text("dispersion").orElse("poisson").equals("scaled"));
    }

    /** Name of the axis; empty = the first. */
    public Optional<String> axis() {
        return json.text("axis");
    }

    /** Whether a position is in the range that is fitted (m). */
    public boolean within(double position) {
        JsonObject range = json.object("range").orElse(JsonObject.EMPTY);
        return position >= range.number("from").orElse(Double.NEGATIVE_INFINITY)
                && position <= range.number("to").orElse(Double.POSITIVE_INFINITY);
    }

    /** Whether positions are corrected by calibrations. */
    public boolean calibratedPositions() {
        return json.text("positions").orElse("as-read").equals("calibrated");
    }

    /** Whether the answer is also given relative to references. */
    public boolean normalised() {
        return json.text("references").orElse("none").equals("normalised");
    }

    /** Confidence level of the visibility's interval. */
    public double interval() {
        return json.number("interval").orElse(USUAL_INTERVAL);
    }

    /** Level of the upper limit. */
    public double limit() {
        return json.number("limit").orElse(USUAL_LIMIT);
    }

    /** Standardised residual from which a row is named. */
    public double outlier() {
        return json.number("outlier").orElse(USUAL_OUTLIER);
    }
}
