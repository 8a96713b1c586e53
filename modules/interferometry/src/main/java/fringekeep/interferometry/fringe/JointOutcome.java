package fringekeep.interferometry.fringe;

/** What a joint fit gives: a {@link JointFit}, or the reason why there is none. */
public sealed interface JointOutcome permits JointFit, FringeFailure {
    /**
     * The fit.
     *
     * @return it
     * @throws IllegalStateException with the reason if there is none
     */
    default JointFit jointOrThrow() {
        if (this instanceof JointFit fit) {
            return fit;
        }
        throw new IllegalStateException(((FringeFailure) this).words());
    }
}
