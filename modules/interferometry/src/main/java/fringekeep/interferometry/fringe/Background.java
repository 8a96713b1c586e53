package fringekeep.interferometry.fringe;

/**
 * What is done about counts that are not signal.
 *
 * @param sort the treatment
 * @param rate the known rate per unit exposure; 0 unless known
 * @param standardUncertainty its standard uncertainty; 0 unless known
 */
public record Background(Sort sort, double rate, double standardUncertainty) {
    /** No background: the mean is that of all counts. */
    public static final Background NONE = new Background(Sort.NONE, 0, 0);
    /** From the dark counts first, its uncertainty then propagated. */
    public static final Background ESTIMATED = new Background(Sort.ESTIMATED, 0, 0);
    /** A parameter of the joint likelihood of scan and dark counts. */
    public static final Background JOINT = new Background(Sort.JOINT, 0, 0);

    /** The treatments. */
    public enum Sort {
        /** No background. */
        NONE,
        /** A known rate. */
        KNOWN,
        /** Dark counts over dark exposure. */
        ESTIMATED,
        /** Fitted together with the dark counts. */
        JOINT
    }

    /** Refuses negative rates. */
    public Background {
        if (!(rate >= 0) || !(standardUncertainty >= 0)) {
            throw new IllegalArgumentException(
                    "background rate and its uncertainty must not be negative: " + rate + ", " + standardUncertainty);
        }
    }

    /**
     * A known background.
     *
     * @param rate counts per unit exposure
     * @param standardUncertainty its standard uncertainty, 0 if exact
     * @return the treatment
     */
    public static Background known(double rate, double standardUncertainty) {
        return new Background(Sort.KNOWN, rate, standardUncertainty);
    }
}
