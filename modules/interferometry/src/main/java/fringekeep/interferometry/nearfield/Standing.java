package fringekeep.interferometry.nearfield;

/** How well a formula is established here. */
public enum Standing {
    /** Derived, and confirmed by an independent numerical method in the tests. */
    DERIVED,
    /** Taken from a publication whose text was at hand. */
    PUBLISHED,
    /** Written from memory of the literature; not to be relied on without a look at the source. */
    FROM_MEMORY
}
