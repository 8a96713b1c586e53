package fringekeep.drawing;

/** Shape of a measured point, so that series differ by more than colour. */
public enum Shape {
    /** Filled circle. */
    DOT,
    /** Open circle. */
    CIRCLE,
    /** Filled square. */
    SQUARE,
    /** Filled triangle. */
    TRIANGLE,
    /** Cross. */
    CROSS,
    /** Lozenge. */
    LOZENGE,
    /** Upright bar, for masked points. */
    BAR,
    /** Open circle struck through, for withdrawn points. */
    STRUCK
}
