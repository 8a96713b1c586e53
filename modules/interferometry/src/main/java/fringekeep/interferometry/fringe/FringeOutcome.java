package fringekeep.interferometry.fringe;

/** What a fit gives: a {@link FringeFit}, or the reason why there is none. */
public sealed interface FringeOutcome permits FringeFit, FringeFailure {
    /**
     * The fit.
     *
     * @return it
     * @throws IllegalStateException with the reason if there is none
     */
    default FringeFit orThrow() {
        if (this instanceof FringeFit fit) {
            return fit;
        }
        throw new IllegalStateException(((FringeFailure) this).words());
    }
}
