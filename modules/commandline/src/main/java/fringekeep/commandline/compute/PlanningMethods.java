package fringekeep.commandline.compute;

import fringekeep.archive.problem.ProblemException;
import fringekeep.interferometry.fringe.DeadTime;
import fringekeep.interferometry.fringe.DifferenceSignal;
import fringekeep.interferometry.fringe.FringePlanning;
import fringekeep.interferometry.statistics.AmplitudeLimits;
import fringekeep.interferometry.statistics.RiceDistribution;
import java.util.List;

/** What scans will tell, limits at low visibility, difference signals, dead time. */
final class PlanningMethods {
    private static final Field NOISE =
            Field.number("quadratureNoise", 0.05, "noise of cosine and sine each over the mean");
    private static final Field LEVEL = Field.number("level", 0.95, "confidence level");

    private PlanningMethods() {}

    static List<Method> all() {
        return List.of(
                Method.of(
                        "fringe-errors-expected",
                        "Expected standard errors of visibility and phase for a planned scan",
                        PlanningMethods::errors,
                        Field.whole("points", 24, "points over one period"),
                        Field.number("meanSignal", 400, "mean signal counts at a point"),
                        Field.number("visibility", 0.25, "expected visibility"),
                        Field.number("background", 0, "background counts at a point, known"),
                        Field.quantity("phase", "rad", "0.3 rad", "phase")),
                Method.of(
                        "fringe-counts-needed",
                        "Counts and time for a wanted error of visibility or phase",
                        PlanningMethods::counts,
                        Field.number("visibility", 0.25, "expected visibility"),
                        Field.number("backgroundRatio", 0.1, "background over mean signal"),
                        Field.number("wantedVisibilityError", 0.01, "standard error of the visibility")
                                .orNothing(),
                        Field.quantity("wantedPhaseError", "rad", "0.05 rad", "standard error of the phase")
                                .orNothing(),
                        Field.quantity("signalRate", "s-1", "250 s-1", "mean signal rate")
                                .orNothing(),
                        Field.whole("points", 24, "points of the scan").orNothing(),
                        Field.quantity("overheadPerPoint", "s", "0.3 s", "time lost at each point")
                                .orNothing(),
                        Field.whole("highestHarmonic", 2, "highest harmonic in the fringe")
                                .orNothing()),
                Method.of(
                        "fringe-scan-reductions",
                        "Lowering of the visibility by jitter, by moving during an exposure and by drift",
                        PlanningMethods::reductions,
                        Field.quantity("jitter", "rad", "0.5 rad", "standard deviation of the phase")
                                .orNothing(),
                        Field.quantity("travel", "m", "40 nm", "way the grating moves in one exposure")
                                .orNothing(),
                        Field.quantity("period", "m", "266 nm", "fringe period").orNothing(),
                        Field.quantity("drift", "rad", "0.4 rad", "change of the phase over the scan")
                                .orNothing()),
                Method.of(
                        "fringe-contrast",
                        "Contrast from extremes, for comparison only",
                        PlanningMethods::contrast,
                        Field.list("counts", "1", "1", "counts").seldom(),
                        Field.number("background", 0, "background at each point")
                                .seldom(),
                        Field.number("first", 0.4, "c1 of 1 + c1 cos t + c2 cos(2t + p)")
                                .orNothing(),
                        Field.number("second", 0.12, "c2").orNothing(),
                        Field.quantity("secondPhase", "rad", "0 rad", "p").orNothing()),
                Method.of(
                        "visibility-limits",
                        "Upper limits, threshold and interval for a low fitted visibility (Rice law)",
                        PlanningMethods::limits,
                        Field.number("visibility", 0.06, "fitted visibility"),
                        NOISE,
                        LEVEL),
                Method.of(
                        "visibility-noise",
                        "Mean and mean square of the fitted visibility for a true one (Rice law)",
                        PlanningMethods::rice,
                        Field.number("visibility", 0.08, "true visibility"),
                        NOISE),
                Method.of(
                        "difference-signal",
                        "Normalised difference of resonant and off-resonant pulse timing",
                        PlanningMethods::difference,
                        Field.number("resonantCounts", 1250, "counts with resonant timing"),
                        Field.number("resonantShots", 1000, "shots with resonant timing"),
                        Field.number("offCounts", 1020, "counts with off-resonant timing"),
                        Field.number("offShots", 1000, "shots with off-resonant timing"),
                        Field.number("dispersion", 1, "variance over mean of the counts, 1 for Poisson")
                                .seldom()),
                Method.of(
                        "dead-time",
                        "Counts a detector with dead time records, and their variance",
                        PlanningMethods::deadTime,
                        Field.number("arrivals", 20000, "expected arrivals"),
                        Field.quantity("liveTime", "s", "1 s", "time they arrive in"),
                        Field.quantity("deadTime", "s", "2 us", "dead time"),
                        Field.choice("deadTimeSort", DeadTime.Sort.class, "non-paralysable if not given")));
    }

    private static void errors(Inputs in, Results out) {
        FringePlanning.ExpectedErrors errors = FringePlanning.errors(
                in.whole("points"),
                in.number("meanSignal"),
                in.number("visibility"),
                in.number("background"),
                in.number("phase"));
        out.value("visibilityByLikelihood", "1", errors.visibilityLikelihood());
        out.value("phaseByLikelihood", "rad", errors.phaseLikelihood());
        out.value("visibilityByLeastSquares", "1", errors.visibilitySquares());
        out.value("phaseByLeastSquares", "rad", errors.phaseSquares());
    }

    private static void counts(Inputs in, Results out) {
        double visibility = in.number("visibility");
        double ratio = in.number("backgroundRatio");
        if (in.has("wantedVisibilityError")) {
            double wanted = in.number("wantedVisibilityError");
            needed("ForVisibility", FringePlanning.countsForVisibility(wanted, visibility, ratio), in, out);
        }
        if (in.has("wantedPhaseError")) {
            double wanted = in.number("wantedPhaseError");
            needed("ForPhase", FringePlanning.countsForPhase(wanted, visibility, ratio), in, out);
        }
        if (in.has("highestHarmonic")) {
            out.bare("fewestPoints", "1", FringePlanning.fewestPoints(in.whole("highestHarmonic")));
        }
    }

    private static void needed(String what, double counts, Inputs in, Results out) {
        out.value("counts" + what, "1", counts);
        if (in.has("signalRate")) {
            double overhead = in.number("overheadPerPoint", 0);
            out.value(
                    "time" + what,
                    "s",
                    FringePlanning.seconds(counts, in.number("signalRate"), in.whole("points", 0), overhead));
        }
    }

    private static void reductions(Inputs in, Results out) {
        if (in.has("jitter")) {
            out.value("jitterFactor", "1", FringePlanning.jitterFactor(in.number("jitter")));
        }
        if (in.has("travel")) {
            double factor = FringePlanning.travelFactor(in.number("travel"), in.number("period"));
            out.value("travelFactor", "1", factor);
        }
        if (in.has("drift")) {
            out.value("driftFactor", "1", FringePlanning.driftFactor(in.number("drift")));
        }
    }

    private static void contrast(Inputs in, Results out) {
        if (in.has("counts")) {
            double extremes = FringePlanning.contrastOfExtremes(in.numbers("counts"), in.number("background", 0));
            out.value("contrastOfExtremes", "1", extremes);
        }
        if (in.has("first")) {
            double curve = FringePlanning.contrastOfCurve(
                    in.number("first"), in.number("second", 0), in.number("secondPhase", 0));
            out.value("contrastOfCurve", "1", curve);
        }
    }

    private static void limits(Inputs in, Results out) {
        double visibility = in.number("visibility");
        double noise = in.number("quadratureNoise");
        double level = in.number("level");
        out.value("classicalUpperLimit", "1", AmplitudeLimits.classicalUpperLimit(visibility, noise, level));
        out.value("flatPriorUpperLimit", "1", AmplitudeLimits.flatPriorUpperLimit(visibility, noise, level));
        out.value("noFringeThreshold", "1", AmplitudeLimits.threshold(noise, level));
        out.value("biasCorrected", "1", AmplitudeLimits.biasCorrected(visibility, noise));
        out.interval("unifiedInterval", "1", AmplitudeLimits.unifiedInterval(visibility, noise, level));
    }

    private static void rice(Inputs in, Results out) {
        double visibility = in.number("visibility");
        double noise = in.number("quadratureNoise");
        double meanSquare = visibility * visibility + 2 * noise * noise;
        out.value("meanOfFitted", "1", noise * RiceDistribution.mean(visibility / noise));
        out.value("meanSquareOfFitted", "1", meanSquare);
        out.value("secondMomentCorrected", "1", AmplitudeLimits.secondMomentCorrected(meanSquare, noise));
    }

    private static void difference(Inputs in, Results out) throws ProblemException {
        double[] given = {
            in.number("resonantCounts"),
            in.number("resonantShots"),
            in.number("offCounts"),
            in.number("offShots"),
            in.number("dispersion", 1)
        };
        out.estimate("relative", "1", DifferenceSignal.relative(given[0], given[1], given[2], given[3], given[4]));
        out.estimate("symmetric", "1", DifferenceSignal.symmetric(given[0], given[1], given[2], given[3], given[4]));
    }

    private static void deadTime(Inputs in, Results out) {
        DeadTime detector =
                new DeadTime(in.choice("deadTimeSort", DeadTime.Sort.NON_PARALYSABLE), in.number("deadTime"));
        double arrivals = in.number("arrivals");
        double live = in.number("liveTime");
        out.value("recorded", "1", detector.recorded(arrivals, live));
        out.value("slope", "1", detector.slope(arrivals, live));
        out.value("varianceRatio", "1", detector.varianceRatio(arrivals, live));
    }
}
