package fringekeep.interferometry.molecule;

import java.util.ArrayList;
import java.util.List;
import java.util.Optional;

/**
 * Electric or magnetic susceptibility from fringe phases that are known only up to whole turns.
 *
 * <p>Phase = &phi;_0 + s q, with q the squared voltage (or any measure of (E.grad)E) and s the susceptibility times a
 * known factor. The slope is first searched on a grid with all phases wrapped (the best &phi;_0 at each slope), so that
 * no order of points and no small steps are asked for; the phases are then unwrapped to the nearest turn of the best
 * line and fitted by weighted least squares. Another slope whose wrapped residuals fit almost as well is warned about.
 *
 * @param phasePerSusceptibility factor c: phase = &phi;_0 + &chi; c q (rad per unit of &chi; and q), not zero
 * @param lowest                 lowest susceptibility searched
 * @param highest                highest susceptibility searched, &gt; lowest
 * @param susceptibility         what the slope is: {@link Parameter#ELECTRIC_SUSCEPTIBILITY} or
 *     {@link Parameter#MAGNETIC_SUSCEPTIBILITY}
 */
public record DeflectionFit(double phasePerSusceptibility, double lowest, double highest, Parameter susceptibility) {
    private static final int MOST_STEPS = 100_000;
    private static final double NEARBY = 9.0;
    private static final double TURN = 2.0 * Math.PI;

    /** Checks the range. */
    public DeflectionFit {
        if (phasePerSusceptibility == 0.0 || !Double.isFinite(phasePerSusceptibility) || !(highest > lowest)) {
            throw new IllegalArgumentException("a deflection needs a phase per susceptibility ("
                    + phasePerSusceptibility + ") and a range to search (" + lowest + " to " + highest + ")");
        }
        if (susceptibility != Parameter.ELECTRIC_SUSCEPTIBILITY
                && susceptibility != Parameter.MAGNETIC_SUSCEPTIBILITY) {
            throw new IllegalArgumentException(susceptibility + " is no susceptibility to a static field");
        }
    }

    /**
     * A fit of the electric susceptibility.
     *
     * @param phasePerSusceptibility factor c (rad per unit of &chi; and q), not zero
     * @param lowest                 lowest susceptibility searched
     * @param highest                highest susceptibility searched, &gt; lowest
     */
    public DeflectionFit(double phasePerSusceptibility, double lowest, double highest) {
        this(phasePerSusceptibility, lowest, highest, Parameter.ELECTRIC_SUSCEPTIBILITY);
    }

    /**
     * A fit with the unwrapped phases it rests on.
     *
     * @param outcome   susceptibility of the sort asked for and phase without field, or a refusal
     * @param unwrapped phases on the branch that was used (rad), one per point
     */
    public record Result(FitOutcome outcome, double[] unwrapped) {}

    /**
     * Fits.
     *
     * @param data wrapped phases (rad) against q (for example V^2), standard uncertainties (rad)
     * @return the fit and the unwrapped phases
     */
    public Result fit(MeasuredCurve data) {
        if (data.size() < 2) {
            return new Result(
                    new FitRefused(FitRefused.Reason.TOO_FEW_POINTS, "a slope needs at least two field strengths"),
                    new double[0]);
        }
        List<Candidate> candidates = candidates(data);
        Candidate best = candidates.get(0);
        for (Candidate candidate : candidates) {
            best = candidate.chiSquare < best.chiSquare ? candidate : best;
        }
        double[] unwrapped = unwrapped(data, best);
        Optional<PropertyFit> fit = line(data.withValues(unwrapped));
        if (fit.isEmpty()) {
            return new Result(
                    new FitRefused(FitRefused.Reason.NOT_DETERMINED, "all points have the same field strength"),
                    unwrapped);
        }
        return new Result(fit.get().withWarnings(warnings(fit.get(), data, candidates)), unwrapped);
    }

    private record Candidate(double susceptibility, double offset, double chiSquare) {}

    /** Local minima of the wrapped sum of squares over the range. */
    private List<Candidate> candidates(MeasuredCurve data) {
        double reach = 0.0;
        for (int k = 0; k < data.size(); k++) {
            reach = Math.max(reach, Math.abs(data.place(k) * phasePerSusceptibility));
        }
        double wanted = Math.ceil((highest - lowest) * reach / 0.05) + 2.0;
        if (wanted > MOST_STEPS) {
            throw new IllegalArgumentException(
                    "the range of susceptibilities spans " + wanted * 0.05 + " rad at the strongest field; narrow it");
        }
        int steps = (int) wanted;
        List<Candidate> minima = new ArrayList<>();
        Candidate before = candidate(data, lowest);
        Candidate here = before;
        minima.add(before);
        for (int step = 1; step <= steps; step++) {
            Candidate next = candidate(data, lowest + (highest - lowest) * step / steps);
            if (here.chiSquare <= before.chiSquare && here.chiSquare <= next.chiSquare) {
                minima.add(here);
            }
            before = here;
            here = next;
        }
        minima.add(here);
        return minima;
    }

    /** The offset is the direction of the weighted mean of unit vectors, refined by one mean of wrapped residuals. */
    private Candidate candidate(MeasuredCurve data, double susceptibility) {
        double cosine = 0.0;
        double sine = 0.0;
        for (int k = 0; k < data.size(); k++) {
            double rest = data.value(k) - susceptibility * phasePerSusceptibility * data.place(k);
            double weight = 1.0 / (data.uncertainty(k) * data.uncertainty(k));
            cosine += weight * StrictMath.cos(rest);
            sine += weight * StrictMath.sin(rest);
        }
        double offset = StrictMath.atan2(sine, cosine);
        double sum = 0.0;
        for (int k = 0; k < data.size(); k++) {
            double pull = wrapped(data, k, susceptibility, offset) / data.uncertainty(k);
            sum += pull * pull;
        }
        return new Candidate(susceptibility, offset, sum);
    }

    private double wrapped(MeasuredCurve data, int k, double susceptibility, double offset) {
        double model = offset + susceptibility * phasePerSusceptibility * data.place(k);
        return Math.IEEEremainder(data.value(k) - model, TURN);
    }

    private double[] unwrapped(MeasuredCurve data, Candidate best) {
        double[] phases = new double[data.size()];
        for (int k = 0; k < phases.length; k++) {
            double model = best.offset + best.susceptibility * phasePerSusceptibility * data.place(k);
            phases[k] = data.value(k) + TURN * Math.rint((model - data.value(k)) / TURN);
        }
        return phases;
    }

    private Optional<PropertyFit> line(MeasuredCurve unwrapped) {
        return LineFit.fit(
                unwrapped, q -> phasePerSusceptibility * q, List.of(susceptibility, Parameter.UNDISTURBED_PHASE));
    }

    private List<FitWarning> warnings(PropertyFit fit, MeasuredCurve data, List<Candidate> candidates) {
        List<FitWarning> warnings = new ArrayList<>();
        double value = fit.values()[0];
        double apart = 5.0 * fit.estimate(susceptibility).standardUncertainty();
        for (Candidate other : candidates) {
            double excess = other.chiSquare - fit.chiSquare();
            if (excess < NEARBY && Math.abs(other.susceptibility - value) > apart) {
                warnings.add(new FitWarning(
                        FitWarning.Sort.AMBIGUOUS_PHASE,
                        Rounded.words(
                                "a susceptibility of {5}, phases unwrapped otherwise, fits almost as well (chi-square"
                                        + " larger by {3}); add field strengths in between",
                                other.susceptibility, excess)));
            }
        }
        if (fit.pValue() < 1e-3) {
            warnings.add(new FitWarning(
                    FitWarning.Sort.POOR_FIT,
                    Rounded.words("chi-square {4} at {} degrees of freedom", fit.chiSquare(), data.size() - 2)));
        }
        return warnings;
    }
}
