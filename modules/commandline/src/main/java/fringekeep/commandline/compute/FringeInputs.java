package fringekeep.commandline.compute;

import fringekeep.archive.json.JsonArray;
import fringekeep.archive.json.JsonObject;
import fringekeep.interferometry.fringe.Background;
import fringekeep.interferometry.fringe.CovarianceSort;
import fringekeep.interferometry.fringe.DeadTime;
import fringekeep.interferometry.fringe.Estimator;
import fringekeep.interferometry.fringe.FringeData;
import fringekeep.interferometry.fringe.FringeOptions;
import java.util.ArrayList;
import java.util.Arrays;
import java.util.List;

/** Scans and fit choices as documents give them. */
final class FringeInputs {
    private static final double[] POSITIONS = {0.0, 33.25, 66.5, 99.75, 133.0, 166.25, 199.5, 232.75};
    private static final double[] COUNTS = {140, 115, 71, 71, 87, 125, 145, 174};

    /** Inputs of one scan. */
    static final List<Field> SCAN = List.of(
            Field.list("positions", "m", "nm", "grating positions in the order of taking", POSITIONS),
            Field.list("counts", "1", "1", "counts at each position", COUNTS),
            Field.list("exposures", "1", "1", "exposure of each point in seconds or shots; one for all will do")
                    .seldom(),
            Field.list("monitor", "1", "1", "monitor of the beam at each point").seldom(),
            Field.list("times", "s", "s", "time of each point").seldom(),
            Field.list("leftOut", "1", "1", "1 where a point is not to be used").seldom(),
            Field.list("darkCounts", "1", "1", "counts with the beam shut").seldom(),
            Field.list("darkExposures", "1", "1", "exposure of each dark count, as exposures")
                    .seldom(),
            Field.quantity("deadTime", "s", "50 ns", "dead time of the detector")
                    .seldom(),
            Field.choice(
                    "deadTimeSort", DeadTime.Sort.class, "behaviour of the detector, non-paralysable if not given"),
            Field.quantity("exposureUnit", "s", "1 s", "length of one unit of exposure, for the dead time")
                    .seldom());

    /** Choices of a fit. */
    static final List<Field> CHOICES = List.of(
            Field.quantity("period", "m", "266.0 nm", "fringe period, or where to start"),
            Field.flag("periodFree", "fit the period too"),
            Field.choice("estimator", Estimator.class, "how the parameters are found; poisson-likelihood if not given"),
            Field.choice("covariance", CovarianceSort.class, "where the variances come from; expected if not given"),
            Field.choice(
                    "background", Background.Sort.class, "treatment of counts that are not signal; none if not given"),
            Field.number("backgroundRate", 12, "known background for one unit of exposure")
                    .seldom(),
            Field.whole("driftOrder", 0, "order of the drift of the signal, 0 to 3")
                    .seldom(),
            Field.flag("secondHarmonic", "fit the second harmonic too"),
            Field.flag("phaseDrift", "fit a linear drift of the phase too"),
            Field.flag("scaleByDispersion", "multiply the covariance by the dispersion, as for pulsed sources"),
            Field.number("level", 0.95, "confidence level of intervals and limits")
                    .seldom());

    private FringeInputs() {}

    static JsonObject exampleScan(double... counts) {
        return JsonObject.EMPTY
                .with(
                        "positions",
                        JsonObject.EMPTY
                                .with("value", JsonArray.ofNumbers(POSITIONS))
                                .with("unit", "nm"))
                .with("counts", JsonArray.ofNumbers(counts.length == 0 ? COUNTS : counts));
    }

    static Field[] scanAndChoices(Field... more) {
        List<Field> fields = new ArrayList<>(SCAN);
        fields.addAll(CHOICES);
        fields.addAll(Arrays.asList(more));
        return fields.toArray(Field[]::new);
    }

    static Field[] choicesAnd(Field... more) {
        List<Field> fields = new ArrayList<>(Arrays.asList(more));
        fields.addAll(CHOICES);
        return fields.toArray(Field[]::new);
    }

    static FringeData data(Inputs in) {
        FringeData data = FringeData.of(in.numbers("positions"), in.numbers("counts"));
        if (in.has("exposures")) {
            double[] exposures = in.numbers("exposures");
            data = exposures.length == 1 ? data.exposure(exposures[0]) : data.exposures(exposures);
        }
        data = in.has("monitor") ? data.monitor(in.numbers("monitor")) : data;
        data = in.has("times") ? data.times(in.numbers("times")) : data;
        data = in.has("leftOut") ? data.masked(flags(in.numbers("leftOut"))) : data;
        if (in.has("darkCounts")) {
            double[] dark = in.numbers("darkCounts");
            double[] exposures = new double[dark.length];
            Arrays.fill(exposures, 1);
            data = data.dark(dark, in.has("darkExposures") ? in.numbers("darkExposures") : exposures);
        }
        data = in.has("exposureUnit") ? data.secondsPerExposure(in.number("exposureUnit")) : data;
        return in.has("deadTime")
                ? data.deadTime(
                        new DeadTime(in.choice("deadTimeSort", DeadTime.Sort.NON_PARALYSABLE), in.number("deadTime")))
                : data;
    }

    private static boolean[] flags(double[] values) {
        boolean[] flags = new boolean[values.length];
        for (int k = 0; k < flags.length; k++) {
            flags[k] = values[k] != 0;
        }
        return flags;
    }

    static FringeOptions options(Inputs in) {
        return FringeOptions.atPeriod(in.number("period"))
                .periodFree(in.flag("periodFree"))
                .estimator(in.choice("estimator", Estimator.POISSON_LIKELIHOOD))
                .covariance(in.choice("covariance", CovarianceSort.EXPECTED))
                .background(background(in))
                .driftOrder(in.whole("driftOrder", 0))
                .secondHarmonic(in.flag("secondHarmonic"))
                .phaseDrift(in.flag("phaseDrift"))
                .scaleByDispersion(in.flag("scaleByDispersion"));
    }

    private static Background background(Inputs in) {
        Background.Sort otherwise = in.has("backgroundRate") ? Background.Sort.KNOWN : Background.Sort.NONE;
        return switch (in.choice("background", otherwise)) {
            case NONE -> Background.NONE;
            case KNOWN ->
                Background.known(
                        in.number("backgroundRate"),
                        in.estimate("backgroundRate").standardUncertainty());
            case ESTIMATED -> Background.ESTIMATED;
            case JOINT -> Background.JOINT;
        };
    }
}
