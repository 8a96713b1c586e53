package fringekeep.commandline.compute;

import fringekeep.archive.problem.ProblemException;
import fringekeep.interferometry.fringe.FringeData;
import fringekeep.interferometry.fringe.FringeFailure;
import fringekeep.interferometry.fringe.FringeFit;
import fringekeep.interferometry.fringe.FringeFitter;
import fringekeep.interferometry.fringe.FringeGoodness;
import fringekeep.interferometry.fringe.FringeOptions;
import fringekeep.interferometry.fringe.FringeOutcome;
import fringekeep.interferometry.fringe.HarmonicEstimate;
import fringekeep.interferometry.fringe.JointFit;
import fringekeep.interferometry.fringe.JointOutcome;
import fringekeep.interferometry.fringe.PeriodSearch;
import fringekeep.interferometry.fringe.ReferencedFringe;
import fringekeep.interferometry.fringe.RobustFit;
import fringekeep.interferometry.fringe.RobustOutcome;
import fringekeep.interferometry.fringe.ScanSum;
import fringekeep.interferometry.fringe.SumOutcome;
import fringekeep.interferometry.statistics.Estimate;
import java.util.ArrayList;
import java.util.List;

/** Fits of fringes to one scan and to several. */
final class FringeMethods {
    private static final Field SCANS = Field.group(
            "scans",
            "scans, each with positions and counts",
            FringeInputs.SCAN,
            FringeInputs.exampleScan(),
            FringeInputs.exampleScan(151, 120, 80, 66, 80, 119, 152, 168));

    private FringeMethods() {}

    static List<Method> all() {
        return List.of(
                Method.of(
                        "fringe-fit",
                        "Mean, visibility and phase of one scan with intervals, limits and goodness of fit",
                        (in, out) -> report(fit(FringeInputs.data(in), FringeInputs.options(in)), in, out),
                        FringeInputs.scanAndChoices()),
                Method.of(
                        "fringe-robust-fit",
                        "The same after points that do not belong to the fringe are named and left out",
                        FringeMethods::robust,
                        FringeInputs.scanAndChoices(
                                Field.number("probability", 1e-4, "of a point as far off by chance"))),
                Method.of(
                        "fringe-joint-fit",
                        "Several scans with a common visibility and phases of their own",
                        FringeMethods::joint,
                        FringeInputs.choicesAnd(
                                SCANS,
                                Field.choice(
                                        "nuisances",
                                        JointFit.Nuisances.class,
                                        "drift, background and the like: free if not given, or held at each scan's fit"))),
                Method.of(
                        "fringe-sum",
                        "Several scans made into one, then fitted",
                        FringeMethods::sum,
                        FringeInputs.choicesAnd(
                                SCANS,
                                Field.choice(
                                        "how",
                                        "plain if not given; after-phase needs phases",
                                        "plain",
                                        "after-phase",
                                        "after-own-phase"),
                                Field.list("phases", "rad", "rad", "phase of each scan from its references")
                                        .seldom())),
                Method.of(
                        "fringe-referenced",
                        "Visibility and phase of a signal scan against references before and after it",
                        FringeMethods::referenced,
                        FringeInputs.choicesAnd(
                                Field.group("signal", "the signal scan", FringeInputs.SCAN, FringeInputs.exampleScan()),
                                Field.group(
                                        "before",
                                        "the reference before",
                                        FringeInputs.SCAN,
                                        FringeInputs.exampleScan(151, 120, 80, 66, 80, 119, 152, 168)),
                                Field.group(
                                                "after",
                                                "the reference after",
                                                FringeInputs.SCAN,
                                                FringeInputs.exampleScan(149, 117, 83, 64, 82, 123, 150, 166))
                                        .orNothing(),
                                Field.number("when", 0.5, "where the signal lies between them, 0 to 1")
                                        .seldom())),
                Method.of(
                        "fringe-period",
                        "Period of an unknown fringe by a periodogram, then a fit",
                        FringeMethods::period,
                        FringeInputs.SCAN.get(0).shownAs(shown(40, 0, 16)),
                        FringeInputs.SCAN.get(1).shownAs(fringekeep.archive.json.JsonArray.ofNumbers(wave())),
                        Field.quantity("shortest", "m", "200 nm", "shortest period"),
                        Field.quantity("longest", "m", "400 nm", "longest period")));
    }

    private static fringekeep.archive.json.Json shown(int points, double first, double step) {
        double[] values = new double[points];
        for (int k = 0; k < points; k++) {
            values[k] = first + step * k;
        }
        return fringekeep.archive.json.JsonObject.EMPTY
                .with("value", fringekeep.archive.json.JsonArray.ofNumbers(values))
                .with("unit", "nm");
    }

    private static double[] wave() {
        double[] counts = new double[40];
        for (int k = 0; k < counts.length; k++) {
            counts[k] = Math.rint(200 * (1 + 0.4 * StrictMath.cos(2 * Math.PI * 16 * k / 266.0)));
        }
        return counts;
    }

    static FringeFit fit(FringeData data, FringeOptions options) throws ProblemException {
        FringeOutcome outcome = FringeFitter.fit(data, options);
        if (outcome instanceof FringeFailure failure) {
            throw NoResult.because(failure.words());
        }
        return outcome.orThrow();
    }

    private static void report(FringeFit fit, Inputs in, Results out) {
        double level = in.number("level", 0.95);
        out.estimate("visibility", "1", fit.visibility());
        out.estimate("phase", "rad", fit.phase());
        fit.visibilityInterval(level).ifPresent(interval -> out.interval("visibilityInterval", "1", interval));
        fit.phaseInterval(level).ifPresent(interval -> out.interval("phaseInterval", "rad", interval));
        fit.biasCorrectedVisibility().ifPresent(value -> out.estimate("biasCorrectedVisibility", "1", value));
        fit.upperLimit(level).ifPresent(limit -> {
            out.value("upperLimit", "1", limit.value());
            out.words("upperLimitSort", Field.word(limit.sort()));
        });
        for (String name : fit.names()) {
            fit.estimate(name).ifPresent(value -> out.estimate(name, name.equals("period") ? "m" : "1", value));
        }
        out.bare("covariance", "", fit.covariance());
        out.list("covarianceOf", fit.names());
        goodness(fit, out);
        fit.significance().ifPresent(found -> {
            out.bare("significance", "1", found.deviations());
            out.bare("noFringePValue", "1", found.pValue());
            out.bare("visibilityOfNoise95", "1", found.threshold95());
        });
        out.list("findings", fit.findings().stream().map(Field::word).toList());
    }

    private static void goodness(FringeFit fit, Results out) {
        FringeGoodness goodness = fit.goodness();
        out.bare("deviance", "1", fit.deviance());
        out.bare("chiSquare", "1", fit.chiSquare());
        out.bare("residualSumOfSquares", "1", fit.residualSumOfSquares());
        out.bare("degreesOfFreedom", "1", goodness.degreesOfFreedom());
        out.bare("pValue", "1", goodness.pValue());
        out.estimate("dispersion", "1", goodness.dispersion(), goodness.dispersionUncertainty());
        out.bare("runs", "1", goodness.runs().runs());
        out.bare("runsPValue", "1", goodness.runs().pValue());
    }

    private static void robust(Inputs in, Results out) throws ProblemException {
        RobustOutcome outcome = RobustFit.of(FringeInputs.data(in), FringeInputs.options(in), in.number("probability"));
        if (outcome instanceof RobustOutcome.None none) {
            throw NoResult.because(none.failure().words());
        }
        if (outcome instanceof RobustOutcome.Found found) {
            RobustFit robust = found.value();
            out.values(
                    "pointsLeftOut",
                    "1",
                    robust.outliers().stream()
                            .mapToDouble(RobustFit.Outlier::point)
                            .toArray());
            report(robust.fit(), in, out);
        }
    }

    private static List<FringeData> scans(Inputs in) {
        return in.groups("scans").stream().map(FringeInputs::data).toList();
    }

    private static void joint(Inputs in, Results out) throws ProblemException {
        JointOutcome outcome =
                JointFit.of(scans(in), FringeInputs.options(in), in.choice("nuisances", JointFit.Nuisances.FREE));
        if (outcome instanceof FringeFailure failure) {
            throw NoResult.because(failure.words());
        }
        if (outcome instanceof JointFit fit) {
            out.estimate("visibility", "1", fit.visibility());
            out.interval("visibilityInterval", "1", fit.interval(in.number("level", 0.95)));
            out.bare("sameVisibilityPValue", "1", fit.sameVisibilityPValue());
            List<Estimate> phases = new ArrayList<>();
            fit.scans().forEach(scan -> scan.phase().ifPresent(phases::add));
            out.estimates("phases", "rad", phases);
            out.estimates(
                    "means", "1", fit.scans().stream().map(FringeFit::mean).toList());
        }
    }

    private static void sum(Inputs in, Results out) throws ProblemException {
        FringeOptions options = FringeInputs.options(in);
        SumOutcome outcome =
                switch (in.word("how", "plain")) {
                    case "after-phase" -> ScanSum.afterPhase(scans(in), phases(in), options.period());
                    case "after-own-phase" -> ScanSum.afterOwnPhase(scans(in), options);
                    default -> ScanSum.plain(scans(in));
                };
        if (outcome instanceof FringeFailure failure) {
            throw NoResult.because(failure.words());
        }
        if (outcome instanceof ScanSum sum) {
            out.values(
                    "phasesTakenOff",
                    "rad",
                    sum.phases().stream().mapToDouble(Double::doubleValue).toArray());
            out.value("jitterFactor", "1", sum.jitterFactor());
            report(fit(sum.data(), options), in, out);
        }
    }

    private static List<Estimate> phases(Inputs in) throws ProblemException {
        double[] values = in.numbers("phases");
        double[] uncertainties = in.stated("phases");
        List<Estimate> phases = new ArrayList<>();
        for (int k = 0; k < values.length; k++) {
            phases.add(new Estimate(values[k], uncertainties[k]));
        }
        return phases;
    }

    private static HarmonicEstimate harmonic(Inputs in, String name) throws ProblemException {
        return fit(FringeInputs.data(in.group(name)), FringeInputs.options(in)).harmonic();
    }

    private static void referenced(Inputs in, Results out) throws ProblemException {
        HarmonicEstimate signal = harmonic(in, "signal");
        HarmonicEstimate before = harmonic(in, "before");
        ReferencedFringe fringe = (in.has("after")
                        ? ReferencedFringe.between(signal, before, harmonic(in, "after"), in.number("when", 0.5))
                        : ReferencedFringe.against(signal, before))
                .orElseThrow(() -> NoResult.because("One of the scans shows no visibility or phase."));
        out.estimate("visibilityRatio", "1", fringe.visibilityRatio());
        out.estimate("phaseDifference", "rad", fringe.phaseDifference());
        out.estimate("meanRatio", "1", fringe.meanRatio());
        out.bare("referencesAgreePValue", "1", fringe.referencesAgree());
    }

    private static void period(Inputs in, Results out) throws ProblemException {
        PeriodSearch search = PeriodSearch.over(FringeInputs.data(in), in.number("shortest"), in.number("longest"))
                .orElseThrow(() -> NoResult.because("Fewer than four points or no counts are left."));
        out.value("periodOfHighestPower", "m", search.period());
        out.bare("power", "1", search.power());
        out.bare("falseAlarmProbability", "1", search.falseAlarm());
        out.estimate("period", "m", search.refined());
    }
}
