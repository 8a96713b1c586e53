package fringekeep.interferometry.molecule;

/**
 * Something about a fit that a reader of its number must know.
 *
 * @param sort  what it is, for programs
 * @param words what it is, for people, with the numbers
 */
public record FitWarning(Sort sort, String words) {
    /** Sorts of warnings. */
    public enum Sort {
        /** Visibility factor and polarizability are almost interchangeable in these data. */
        FACTOR_AND_POLARIZABILITY_DEGENERATE,
        /** Two other parameters are almost interchangeable in these data. */
        PARAMETERS_DEGENERATE,
        /** Another value describes the data almost as well. */
        SEVERAL_MINIMA,
        /** The data scatter more than their uncertainties allow. */
        POOR_FIT,
        /** The visibility factor exceeds one by more than two standard uncertainties. */
        FACTOR_ABOVE_ONE,
        /** A value that cannot be negative came out negative. */
        NEGATIVE_VALUE,
        /** The best value sits where the modelled fringe vanishes at a data point; its uncertainty is not reliable. */
        AT_VANISHING_FRINGE,
        /** The best value lies at an end of the search range. */
        AT_SEARCH_LIMIT,
        /** A phase could have been unwrapped in another way. */
        AMBIGUOUS_PHASE,
        /** Some resamples of a bootstrap could not be fitted. */
        RESAMPLES_FAILED
    }
}
