package fringekeep.interferometry.fringe;

/** What a robust fit gives. */
public sealed interface RobustOutcome {
    /**
     * A fit with its outliers.
     *
     * @param value both
     */
    record Found(RobustFit value) implements RobustOutcome {}

    /**
     * No fit.
     *
     * @param failure why
     */
    record None(FringeFailure failure) implements RobustOutcome {}
}
