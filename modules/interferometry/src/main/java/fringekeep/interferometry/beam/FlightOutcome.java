package fringekeep.interferometry.beam;

/** What a time-of-flight trace gives: a {@link FlightFit}, or the reason why there is none. */
public sealed interface FlightOutcome permits FlightFit, FlightOutcome.Failure {
    /**
     * No fit.
     *
     * @param reason stable reason
     * @param words what happened and what could mend it
     */
    record Failure(Reason reason, String words) implements FlightOutcome {}

    /** The reasons. */
    enum Reason {
        /** Too few bins or counts. */
        TOO_LITTLE_DATA,
        /** No arrival peak above the background. */
        NO_PEAK,
        /** Decoding gives a negative peak: the polarity of the chopper is reversed. */
        REVERSED_POLARITY,
        /** The fit did not settle. */
        NO_CONVERGENCE
    }

    /**
     * The fit.
     *
     * @return it
     * @throws IllegalStateException with the reason if there is none
     */
    default FlightFit orThrow() {
        if (this instanceof FlightFit fit) {
            return fit;
        }
        throw new IllegalStateException(((Failure) this).words());
    }
}
