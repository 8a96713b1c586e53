package fringekeep.desk.pane;

/** Something that stands in the columns below a record's drawing and needs a height for the width it is given. */
interface FactColumn {
    /** Height it needs in a width. */
    int heightIn(int width);

    /** Whether it wants the room of two columns. */
    boolean wide();
}
