package fringekeep.interferometry.molecule;

/**
 * Why a fit gives no number.
 *
 * @param reason for programs
 * @param words  for people: what is missing and how to mend it
 */
public record FitRefused(Reason reason, String words) implements FitOutcome {
    /** Reasons. */
    public enum Reason {
        /** Fewer points than parameters. */
        TOO_FEW_POINTS,
        /** The data do not determine one of the parameters. */
        NOT_DETERMINED,
        /** The iteration came to no end. */
        NOT_CONVERGED
    }
}
