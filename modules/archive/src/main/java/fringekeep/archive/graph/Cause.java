package fringekeep.archive.graph;

import fringekeep.archive.record.Hash;

/**
 * Why a record is outdated.
 *
 * @param sort which rule
 * @param upstream what it was made from that the cause hits
 * @param by the correcting record, the judgement, or the segment that holds now; for UNDONE the judgement that fell
 */
public record Cause(Sort sort, Hash upstream, Hash by) {
    /** The four rules. */
    public enum Sort {
        /** Upstream was corrected. */
        CORRECTED,
        /** Upstream was withdrawn, masked or passed over for another. */
        JUDGED,
        /** A judgement that was pinned does not stand any more. */
        UNDONE,
        /** At the time of the scan another segment of the thing holds. */
        CHANGED
    }
}
