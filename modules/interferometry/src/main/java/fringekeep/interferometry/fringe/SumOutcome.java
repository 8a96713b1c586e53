package fringekeep.interferometry.fringe;

/** What combining scans gives: a {@link ScanSum}, or the reason why they cannot be combined. */
public sealed interface SumOutcome permits ScanSum, FringeFailure {
    /**
     * The sum.
     *
     * @return it
     * @throws IllegalStateException with the reason if there is none
     */
    default ScanSum sumOrThrow() {
        if (this instanceof ScanSum sum) {
            return sum;
        }
        throw new IllegalStateException(((FringeFailure) this).words());
    }
}
