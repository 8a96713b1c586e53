package fringekeep.archive.graph;

/** States of a record, worked out from the graph (record format 1, section 8). */
public enum StateName {
    /** A newer record of the same thing says this one was never true. */
    CORRECTED,
    /** A live judgement withdraws it. */
    WITHDRAWN,
    /** A live judgement masks points or a channel of it. */
    MASKED,
    /** A live judgement doubts it; never outdates. */
    DOUBTED,
    /** A live judgement prefers it. */
    PREFERRED,
    /** Something pinned upstream was corrected or judged since, unless the record knew. */
    OUTDATED,
    /** Two records claim the same place. */
    DISPUTED
}
