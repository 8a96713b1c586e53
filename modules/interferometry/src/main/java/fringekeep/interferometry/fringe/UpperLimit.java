package fringekeep.interferometry.fringe;

/**
 * An upper limit on a visibility.
 *
 * @param sort how it was made
 * @param level confidence level or credibility
 * @param value the limit
 */
public record UpperLimit(Sort sort, double level, double value) {
    /** The ways. */
    public enum Sort {
        /** The true visibility with which a smaller fitted one has probability 1 &minus; level. */
        CLASSICAL,
        /** The posterior with flat prior; used where the classical limit would be 0 because the fit lies unusually low. */
        FLAT_PRIOR
    }
}
