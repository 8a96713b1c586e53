package fringekeep.interferometry.fringe;

/**
 * Why a scan could not be fitted.
 *
 * @param reason stable reason
 * @param words what happened and what could mend it
 */
public record FringeFailure(Reason reason, String words) implements FringeOutcome, SumOutcome, JointOutcome {
    /** The reasons. */
    public enum Reason {
        /** Fewer points left than parameters. */
        TOO_FEW_POINTS,
        /** The positions do not tell the parameters apart. */
        NOT_DETERMINED,
        /** No counts at all. */
        NO_COUNTS,
        /** Background asked from dark counts, but there are none. */
        NO_DARK_COUNTS,
        /** Dead time leaves no model rate for the counts seen. */
        SATURATED,
        /** No minimum found. */
        NO_CONVERGENCE,
        /** The scans to combine do not belong to the same positions, dead time or unit of exposure. */
        SCANS_DIFFER,
        /** The period left the range the scan can resolve. */
        PERIOD_LOST
    }
}
