package fringekeep.interferometry.fringe;

import fringekeep.interferometry.statistics.Distributions;
import fringekeep.interferometry.statistics.Estimate;
import java.util.Optional;

/**
 * A signal scan against references taken before and after it.
 *
 * @param visibilityRatio visibility of the signal over that of the reference at its time
 * @param phaseDifference phase of the signal less that of the reference, in (&minus;&pi;, &pi;] (rad)
 * @param meanRatio mean of the signal over that of the reference
 * @param referencesAgree probability of the references' visibilities and phases to differ at least as much as they do if
 *     nothing changed between them; 1 with a single reference
 */
public record ReferencedFringe(
        Estimate visibilityRatio, Estimate phaseDifference, Estimate meanRatio, double referencesAgree) {
    /**
     * Normalises by references, interpolated linearly in time; phases the short way round.
     *
     * @param signal the signal
     * @param before the reference before
     * @param after the reference after
     * @param when where the signal lies between them: 0 at the first, 1 at the second, usually 0.5
     * @return the comparison, empty where one of the three shows no visibility or phase
     */
    public static Optional<ReferencedFringe> between(
            HarmonicEstimate signal, HarmonicEstimate before, HarmonicEstimate after, double when) {
        if (!(when >= 0 && when <= 1)) {
            throw new IllegalArgumentException("the signal must lie between its references, at 0 to 1, is at " + when);
        }
        if (signal.phase().isEmpty()
                || before.phase().isEmpty()
                || after.phase().isEmpty()) {
            return Optional.empty();
        }
        Estimate visibilityBefore = before.visibility().orElseThrow();
        Estimate visibilityAfter = after.visibility().orElseThrow();
        Estimate phaseBefore = before.phase().orElseThrow();
        Estimate phaseAfter = after.phase().orElseThrow();
        double turn = wrapped(phaseAfter.value() - phaseBefore.value());
        Estimate phase = new Estimate(phaseBefore.value() + when * turn, mixed(phaseBefore, phaseAfter, when));
        double chiSquare =
                square((visibilityAfter.value() - visibilityBefore.value()) / sum(visibilityBefore, visibilityAfter))
                        + square(turn / sum(phaseBefore, phaseAfter));
        return Optional.of(compare(
                signal,
                interpolated(visibilityBefore, visibilityAfter, when),
                phase,
                interpolated(mean(before), mean(after), when),
                Distributions.chiSquareUpper(chiSquare, 2)));
    }

    /**
     * Normalises by one reference.
     *
     * @param signal the signal
     * @param reference the reference
     * @return the comparison, empty where one of the two shows no visibility or phase
     */
    public static Optional<ReferencedFringe> against(HarmonicEstimate signal, HarmonicEstimate reference) {
        if (signal.phase().isEmpty() || reference.phase().isEmpty()) {
            return Optional.empty();
        }
        return Optional.of(compare(
                signal, reference.visibility().orElseThrow(), reference.phase().orElseThrow(), mean(reference), 1));
    }

    private static ReferencedFringe compare(
            HarmonicEstimate signal, Estimate visibility, Estimate phase, Estimate mean, double agree) {
        Estimate own = signal.phase().orElseThrow();
        return new ReferencedFringe(
                ratio(signal.visibility().orElseThrow(), visibility),
                new Estimate(wrapped(own.value() - phase.value()), sum(own, phase)),
                ratio(mean(signal), mean),
                agree);
    }

    private static Estimate mean(HarmonicEstimate harmonic) {
        return new Estimate(harmonic.mean(), Math.sqrt(Math.max(0, harmonic.covariance()[0])));
    }

    private static Estimate interpolated(Estimate a, Estimate b, double when) {
        return new Estimate((1 - when) * a.value() + when * b.value(), mixed(a, b, when));
    }

    private static double mixed(Estimate a, Estimate b, double when) {
        return Math.sqrt(square((1 - when) * a.standardUncertainty()) + square(when * b.standardUncertainty()));
    }

    private static double sum(Estimate a, Estimate b) {
        return Math.sqrt(square(a.standardUncertainty()) + square(b.standardUncertainty()));
    }

    private static Estimate ratio(Estimate above, Estimate below) {
        double ratio = above.value() / below.value();
        double u = Math.sqrt(square(above.standardUncertainty()) + square(ratio * below.standardUncertainty()))
                / Math.abs(below.value());
        return new Estimate(ratio, u);
    }

    private static double square(double x) {
        return x * x;
    }

    /** The angle brought into (-pi, pi]. */
    static double wrapped(double angle) {
        double turned = angle - 2 * Math.PI * Math.rint(angle / (2 * Math.PI));
        return turned <= -Math.PI ? turned + 2 * Math.PI : turned;
    }
}
