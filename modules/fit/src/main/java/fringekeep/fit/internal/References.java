package fringekeep.fit.internal;

import fringekeep.archive.json.JsonObject;
import fringekeep.archive.problem.ProblemException;
import fringekeep.interferometry.fringe.FringeFit;
import fringekeep.interferometry.fringe.HarmonicEstimate;
import fringekeep.interferometry.fringe.ReferencedFringe;
import fringekeep.interferometry.statistics.Estimate;
import java.time.Instant;
import java.util.ArrayList;
import java.util.Comparator;
import java.util.List;
import java.util.Optional;

/** Reference scans, each fitted by itself, and what they say at the time of a scan. */
public final class References {
    private static final double MILLISECONDS = 1e3;

    private final List<Reference> references;

    private record Reference(Optional<Instant> start, HarmonicEstimate harmonic) {}

    /** The references around a scan: one, or one before and one after with the place of the scan between them. */
    private record Around(HarmonicEstimate before, HarmonicEstimate after, double when) {}

    /**
     * Fits the references.
     *
     * @throws ProblemException if one has no fit
     */
    public References(List<ScanArrays> scans, FitChoices choices, FitParameters parameters) throws ProblemException {
        this.references = new ArrayList<>();
        for (ScanArrays scan : scans) {
            FringeFit fit =
                    FringeAnalysis.fit(FringeAnalysis.data(scan, parameters), choices.options(parameters.period()));
            references.add(new Reference(scan.start().map(moment -> moment.at()), fit.harmonic()));
        }
        if (references.isEmpty()) {
            throw new ProblemException(FitProblems.of("fit.no-reference", "/inputs"));
        }
    }

    /** Phase of the references at the time of each scan. */
    public List<Estimate> phases(List<ScanArrays> scans) throws ProblemException {
        List<Estimate> phases = new ArrayList<>();
        for (ScanArrays scan : scans) {
            phases.add(phase(around(scan.start().map(moment -> moment.at())))
                    .orElseThrow(() -> new ProblemException(FitProblems.of("fit.reference-fringe", "/inputs"))));
        }
        return phases;
    }

    /** Member {@code reference} of the result: the references at the mean time of the scans, and the answer over them. */
    public JsonObject compare(FitAnswer answer, List<ScanArrays> scans) throws ProblemException {
        Around around = around(mean(scans));
        HarmonicEstimate signal = answer.harmonic();
        ReferencedFringe compared = (around.when() == 0
                        ? ReferencedFringe.against(signal, around.before())
                        : ReferencedFringe.between(signal, around.before(), around.after(), around.when()))
                .orElseThrow(() -> new ProblemException(FitProblems.of("fit.reference-fringe", "/inputs")));
        Estimate visibility = between(
                around.before().visibility().orElseThrow(),
                around.after().visibility().orElseThrow(),
                around.when());
        JsonObject json = JsonObject.EMPTY
                .with("visibility", FitResult.estimate(visibility))
                .with("mean", FitResult.estimate(between(mean(around.before()), mean(around.after()), around.when())))
                .with("relativeVisibility", FitResult.estimate(compared.visibilityRatio()))
                .with("relativeMean", FitResult.estimate(compared.meanRatio()))
                .with("agree", compared.referencesAgree());
        return answer.phase().isEmpty()
                ? json
                : json.with("phase", phase(around).map(FitResult::estimate))
                        .with("relativePhase", FitResult.estimate(compared.phaseDifference()));
    }

    private Around around(Optional<Instant> time) throws ProblemException {
        if (references.size() == 1) {
            return new Around(references.get(0).harmonic(), references.get(0).harmonic(), 0);
        }
        boolean timed = time.isPresent()
                && references.stream().allMatch(each -> each.start().isPresent());
        if (!timed && references.size() == 2) {
            return new Around(references.get(0).harmonic(), references.get(1).harmonic(), 0.5);
        }
        if (!timed) {
            throw new ProblemException(FitProblems.of("fit.reference-time", "/inputs"));
        }
        return nearest(time.get());
    }

    /** The last reference that began before, and the first after; only one of them at either end. */
    private Around nearest(Instant time) {
        List<Reference> sorted = references.stream()
                .sorted(Comparator.comparing(each -> each.start().orElseThrow()))
                .toList();
        int after = 0;
        while (after < sorted.size() && sorted.get(after).start().orElseThrow().isBefore(time)) {
            after++;
        }
        if (after == 0 || after == sorted.size()) {
            HarmonicEstimate only = sorted.get(after == 0 ? 0 : after - 1).harmonic();
            return new Around(only, only, 0);
        }
        Reference first = sorted.get(after - 1);
        Reference second = sorted.get(after);
        double whole = seconds(first.start().orElseThrow(), second.start().orElseThrow());
        double part = seconds(first.start().orElseThrow(), time);
        return new Around(first.harmonic(), second.harmonic(), whole > 0 ? part / whole : 0.5);
    }

    private static double seconds(Instant from, Instant to) {
        return (to.toEpochMilli() - from.toEpochMilli()) / MILLISECONDS;
    }

    private static Optional<Instant> mean(List<ScanArrays> scans) {
        long sum = 0;
        for (ScanArrays scan : scans) {
            if (scan.start().isEmpty()) {
                return Optional.empty();
            }
            sum += scan.start().get().at().toEpochMilli() / scans.size();
        }
        return Optional.of(Instant.ofEpochMilli(sum));
    }

    private static Optional<Estimate> phase(Around around) {
        Optional<Estimate> before = around.before().phase();
        Optional<Estimate> after = around.after().phase();
        if (before.isEmpty() || after.isEmpty()) {
            return Optional.empty();
        }
        double turn = wrapped(after.get().value() - before.get().value());
        Estimate straight = between(
                before.get(),
                new Estimate(before.get().value() + turn, after.get().standardUncertainty()),
                around.when());
        return Optional.of(new Estimate(wrapped(straight.value()), straight.standardUncertainty()));
    }

    private static Estimate mean(HarmonicEstimate harmonic) {
        return new Estimate(harmonic.mean(), Math.sqrt(Math.max(0, harmonic.covariance()[0])));
    }

    private static Estimate between(Estimate a, Estimate b, double when) {
        double first = (1 - when) * a.standardUncertainty();
        double second = when * b.standardUncertainty();
        return new Estimate((1 - when) * a.value() + when * b.value(), Math.sqrt(first * first + second * second));
    }

    private static double wrapped(double angle) {
        return angle - 2 * Math.PI * Math.rint(angle / (2 * Math.PI));
    }
}
