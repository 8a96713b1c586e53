package fringekeep.desk.stage;

/** The menus, from left to right. A menu without entries is not shown. */
public enum DeskMenu {
    /** Open, found, take in, persons. */
    ARCHIVE,
    /** Which day is in view. */
    DAY,
    /** The record in hand. */
    RECORD,
    /** Fits, properties, figures. */
    FIT,
    /** Lineage, recomputing, supposing. */
    LINEAGE,
    /** Export and check. */
    BUNDLE,
    /** Keys and the rest. */
    HELP
}
