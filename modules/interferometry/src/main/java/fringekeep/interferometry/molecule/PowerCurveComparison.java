package fringekeep.interferometry.molecule;

import fringekeep.interferometry.nearfield.Description;

/**
 * Quantum against classical description of the same visibilities, with the answer "these data cannot tell".
 *
 * <p>Both are fitted with the same free parameters. Before the likelihoods are compared, each description is asked how
 * well it imitates the fitted curve of the other at the measured powers with the stated uncertainties: half the best
 * chi-square against a noise-free curve is the difference of ln L that such data can be expected to show. At one
 * speed a pure phase grating gives identical curves (the polarizability takes up the factor sin(&pi;r)/(&pi;r)), and
 * nothing can be told however small the uncertainties.
 *
 * @param quantum             fit with matter waves
 * @param classical           fit with point particles
 * @param logLikelihoodRatio  ln L(quantum) - ln L(classical) at the best fits; zero if either fit was refused
 * @param expectedIfQuantum   ln L difference to be expected if the quantum fit is true, &ge; 0
 * @param expectedIfClassical ln L difference to be expected if the classical fit is true, &ge; 0
 * @param verdict             the answer
 * @param reason              the answer in words, with its numbers
 */
public record PowerCurveComparison(
        FitOutcome quantum,
        FitOutcome classical,
        double logLikelihoodRatio,
        double expectedIfQuantum,
        double expectedIfClassical,
        Verdict verdict,
        String reason) {
    private static final double HOPELESS = 1e-4;

    /** Answers. */
    public enum Verdict {
        /** The data prefer matter waves. */
        QUANTUM,
        /** The data prefer point particles. */
        CLASSICAL,
        /** The data cannot tell. */
        CANNOT_TELL,
        /** Neither description fits the data, so their ratio means nothing. */
        NEITHER_FITS
    }

    /**
     * Fits and compares.
     *
     * @param fitter the question
     * @param data   visibilities against power (W)
     * @return both fits and the answer
     */
    public static PowerCurveComparison of(PowerCurveFitter fitter, MeasuredCurve data) {
        FitOutcome quantum = fitter.fit(data, Description.QUANTUM);
        FitOutcome classical = fitter.fit(data, Description.CLASSICAL);
        if (quantum instanceof PropertyFit q && classical instanceof PropertyFit c) {
            return judged(fitter, data, q, c);
        }
        return new PowerCurveComparison(
                quantum,
                classical,
                0.0,
                0.0,
                0.0,
                Verdict.CANNOT_TELL,
                "these data cannot tell: at least one description could not be fitted");
    }

    private static PowerCurveComparison judged(
            PowerCurveFitter fitter, MeasuredCurve data, PropertyFit quantum, PropertyFit classical) {
        double ratio = quantum.logLikelihood() - classical.logLikelihood();
        double ifQuantum = imitation(fitter, data, quantum, Description.CLASSICAL);
        double ifClassical = imitation(fitter, data, classical, Description.QUANTUM);
        double threshold = fitter.choices().decisionThreshold();
        Verdict verdict = verdict(quantum, classical, ratio, Math.max(ifQuantum, ifClassical), threshold);
        String reason = reason(verdict, ratio, ifQuantum, ifClassical, threshold);
        return new PowerCurveComparison(quantum, classical, ratio, ifQuantum, ifClassical, verdict, reason);
    }

    private static Verdict verdict(
            PropertyFit quantum, PropertyFit classical, double ratio, double expected, double threshold) {
        if (Math.max(quantum.pValue(), classical.pValue()) < HOPELESS) {
            return Verdict.NEITHER_FITS;
        }
        if (expected < threshold || Math.abs(ratio) < threshold) {
            return Verdict.CANNOT_TELL;
        }
        return ratio > 0.0 ? Verdict.QUANTUM : Verdict.CLASSICAL;
    }

    /** How well the other description follows the fitted curve: half the smallest chi-square, or infinite. */
    private static double imitation(PowerCurveFitter fitter, MeasuredCurve data, PropertyFit truth, Description other) {
        double[] curve = new double[data.size()];
        System.arraycopy(truth.fitted(), 0, curve, 0, curve.length);
        FitOutcome outcome = fitter.fit(data.withValues(curve), other);
        return outcome instanceof PropertyFit fit ? 0.5 * fit.chiSquare() : Double.POSITIVE_INFINITY;
    }

    private static String reason(
            Verdict verdict, double ratio, double ifQuantum, double ifClassical, double threshold) {
        String numbers = Rounded.words(
                "ln L differs by {3}, {3} was to be expected if quantum, {3} if classical, {3} is asked for",
                ratio, ifQuantum, ifClassical, threshold);
        return switch (verdict) {
            case QUANTUM -> "matter waves describe the data better: " + numbers;
            case CLASSICAL -> "point particles describe the data better: " + numbers;
            case NEITHER_FITS -> "neither description fits the data (p below 1e-4 for both): " + numbers;
            case CANNOT_TELL -> "these data cannot tell: " + numbers;
        };
    }
}
