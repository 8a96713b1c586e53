package fringekeep.interferometry.molecule;

/** A fit that succeeded, or the reason why there is no number. */
public sealed interface FitOutcome permits PropertyFit, FitRefused {
    /**
     * The fit, for callers that treat a refusal as an error.
     *
     * @return the fit
     * @throws IllegalStateException with the reason if there is none
     */
    default PropertyFit orThrow() {
        if (this instanceof PropertyFit fit) {
            return fit;
        }
        FitRefused refused = (FitRefused) this;
        throw new IllegalStateException(refused.reason() + ": " + refused.words());
    }
}
