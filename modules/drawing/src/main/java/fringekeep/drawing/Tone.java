package fringekeep.drawing;

/** Colour by meaning; the theme turns it into a colour for paper, a light or a dark screen. */
public enum Tone {
    /** Measured points, axes, words. */
    INK,
    /** Secondary words and lines. */
    INK_SECOND,
    /** Grid and other quiet lines. */
    QUIET,
    /** The quantum model and fitted fringes. */
    QUANTUM,
    /** The classical model. */
    CLASSICAL,
    /** Masked points. */
    MASKED,
    /** Outdated or different. */
    MARK,
    /** Further series, in this order. */
    SERIES_THREE,
    /** Fourth series. */
    SERIES_FOUR,
    /** Fifth series. */
    SERIES_FIVE,
    /** Sixth series. */
    SERIES_SIX
}
