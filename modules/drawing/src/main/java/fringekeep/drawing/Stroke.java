package fringekeep.drawing;

/** How a line is drawn. */
public enum Stroke {
    /** Unbroken. */
    SOLID,
    /** Seven on, four off. */
    DASHED,
    /** Dots. */
    DOTTED
}
