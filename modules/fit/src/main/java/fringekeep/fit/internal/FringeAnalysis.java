package fringekeep.fit.internal;

import fringekeep.archive.problem.ProblemException;
import fringekeep.fit.internal.FitAnswer.RowSource;
import fringekeep.interferometry.fringe.DeadTime;
import fringekeep.interferometry.fringe.FringeData;
import fringekeep.interferometry.fringe.FringeFailure;
import fringekeep.interferometry.fringe.FringeFit;
import fringekeep.interferometry.fringe.FringeFitter;
import fringekeep.interferometry.fringe.FringeOptions;
import fringekeep.interferometry.fringe.FringeOutcome;
import fringekeep.interferometry.fringe.JointFit;
import fringekeep.interferometry.fringe.JointOutcome;
import fringekeep.interferometry.fringe.ScanSum;
import fringekeep.interferometry.fringe.SumOutcome;
import fringekeep.interferometry.statistics.Estimate;
import fringekeep.interferometry.statistics.SymmetricMatrix;
import java.util.ArrayList;
import java.util.Arrays;
import java.util.List;

/** Combines scans and fits them. A function of arrays, choices and parameters; the same call gives the same bits. */
public final class FringeAnalysis {
    private static final double SMALLEST_PIVOT = 1e-13;

    private final FitChoices choices;
    private final List<ScanArrays> scans;
    private final List<Estimate> referencePhases;

    /**
     * An analysis of scans.
     *
     * @param scans at least one
     * @param referencePhases phase of the references at each scan for sum-after-phase; empty: each scan's own phase
     */
    public FringeAnalysis(FitChoices choices, List<ScanArrays> scans, List<Estimate> referencePhases) {
        this.choices = choices;
        this.scans = List.copyOf(scans);
        this.referencePhases = List.copyOf(referencePhases);
    }

    /**
     * Fits.
     *
     * @throws ProblemException why there is no fit
     */
    public FitAnswer answer(FitParameters parameters) throws ProblemException {
        List<FringeData> data = new ArrayList<>();
        for (ScanArrays scan : scans) {
            data.add(data(scan, parameters));
        }
        FringeOptions options = choices.options(parameters.period());
        return finite(combined(data, options));
    }

    /** An estimate or covariance that is no number is no answer. */
    private static FitAnswer finite(FitAnswer answer) throws ProblemException {
        boolean numbers = Arrays.stream(answer.values()).allMatch(Double::isFinite)
                && Arrays.stream(answer.covariance()).allMatch(Double::isFinite);
        if (!numbers) {
            throw new ProblemException(FitProblems.of("fit.not-determined", "", "An uncertainty is infinite."));
        }
        return answer;
    }

    private FitAnswer combined(List<FringeData> data, FringeOptions options) throws ProblemException {
        return switch (choices.combine()) {
            case SINGLE -> single(data.get(0), options, rows(scans.subList(0, 1)));
            case SUM -> single(darkOnce(sum(ScanSum.plain(data))), options, rows(scans.subList(0, 1)));
            case SUM_AFTER_PHASE -> single(darkOnce(afterPhase(data, options)), options, rows(scans));
            case JOINT -> joint(data, options);
        };
    }

    /** One scan as data. */
    static FringeData data(ScanArrays scan, FitParameters parameters) throws ProblemException {
        boolean blind = parameters.deadTime().sort() != DeadTime.Sort.NONE;
        if (blind && scan.shots()) {
            throw new ProblemException(FitProblems.of("fit.dead-time-shots", "/choices/deadTime"));
        }
        double[] positions = scan.positions();
        for (int row = 0; row < positions.length; row++) {
            positions[row] = parameters.corrected(positions[row]);
        }
        FringeData data = FringeData.of(positions, scan.counts())
                .exposures(scan.exposures())
                .times(scan.times())
                .masked(scan.masked())
                .deadTime(parameters.deadTime());
        return scan.dark().length > 0 ? data.dark(scan.dark(), scan.darkExposures()) : data;
    }

    /** Fits one scan by itself. */
    static FringeFit fit(FringeData data, FringeOptions options) throws ProblemException {
        FringeOutcome outcome = FringeFitter.fit(data, options);
        if (outcome instanceof FringeFailure failure) {
            throw failed(failure);
        }
        FringeFit fit = outcome.orThrow();
        if (!SymmetricMatrix.factor(fit.harmonic().covariance(), 3, SMALLEST_PIVOT)) {
            throw new ProblemException(FitProblems.of("fit.covariance-singular", ""));
        }
        return fit;
    }

    private static ProblemException failed(FringeFailure failure) {
        String reason =
                failure.reason().name().toLowerCase(java.util.Locale.ROOT).replace('_', '-');
        return new ProblemException(FitProblems.of("fit." + reason, "", failure.words()));
    }

    private FringeData afterPhase(List<FringeData> data, FringeOptions options) throws ProblemException {
        return sum(
                referencePhases.isEmpty()
                        ? ScanSum.afterOwnPhase(data, options)
                        : ScanSum.afterPhase(data, referencePhases, options.period()));
    }

    /** Background scans belong to all scans together; counted once for each, they would seem more certain than they are. */
    private FringeData darkOnce(FringeData sum) {
        boolean shared = choices.backgroundSort().equals("scan");
        return shared ? sum.dark(scans.get(0).dark(), scans.get(0).darkExposures()) : sum;
    }

    private static FringeData sum(SumOutcome outcome) throws ProblemException {
        if (outcome instanceof FringeFailure failure) {
            throw failed(failure);
        }
        if (outcome instanceof ScanSum sum) {
            return sum.data();
        }
        throw new AssertionError(outcome);
    }

    private FitAnswer single(FringeData data, FringeOptions options, List<RowSource> rows) throws ProblemException {
        return Answers.of(fit(data, options), choices, rows);
    }

    private FitAnswer joint(List<FringeData> data, FringeOptions options) throws ProblemException {
        refuseDriftToNothing(data, options);
        JointOutcome outcome = JointFit.of(data, options);
        if (outcome instanceof FringeFailure failure) {
            throw failed(failure);
        }
        if (outcome instanceof JointFit fit) {
            List<List<RowSource>> rows =
                    scans.stream().map(scan -> rows(List.of(scan))).toList();
            return Answers.of(fit, choices, rows);
        }
        throw new AssertionError(outcome);
    }

    /** A scan whose own drift reaches no signal at some row says nothing of the visibility there. */
    private void refuseDriftToNothing(List<FringeData> data, FringeOptions options) throws ProblemException {
        for (int k = 0; k < data.size() && options.driftOrder() > 0; k++) {
            if (fit(data.get(k), options).findings().contains(FringeFit.Finding.ON_EDGE)) {
                throw new ProblemException(FitProblems.of(
                        "fit.joint-drift", "/inputs/" + scans.get(k).input(), options.driftOrder()));
            }
        }
    }

    /** Rows that are used, in the order of the fitted data. */
    private static List<RowSource> rows(List<ScanArrays> scans) {
        List<RowSource> rows = new ArrayList<>();
        for (ScanArrays scan : scans) {
            for (int row = 0; row < scan.rows(); row++) {
                rows.add(new RowSource(scan.input(), row));
            }
        }
        return rows;
    }
}
