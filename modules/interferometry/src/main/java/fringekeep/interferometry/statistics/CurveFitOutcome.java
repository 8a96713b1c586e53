package fringekeep.interferometry.statistics;

/** What a fit of a curve gives: a {@link CurveFit}, or the reason why there is none. */
public sealed interface CurveFitOutcome permits CurveFit, CurveFitOutcome.Failure {
    /**
     * No fit.
     *
     * @param reason stable reason
     * @param words what happened
     */
    record Failure(Reason reason, String words) implements CurveFitOutcome {}

    /** The reasons. */
    enum Reason {
        /** Fewer points than parameters. */
        TOO_FEW_POINTS,
        /** The model has no meaning at the start. */
        BAD_START,
        /** The data do not tell the parameters apart at the place found. */
        NOT_DETERMINED,
        /** No minimum found. */
        NO_CONVERGENCE
    }

    /**
     * The fit.
     *
     * @return it
     * @throws IllegalStateException with the reason if there is none
     */
    default CurveFit orThrow() {
        if (this instanceof CurveFit fit) {
            return fit;
        }
        throw new IllegalStateException(((Failure) this).words());
    }
}
