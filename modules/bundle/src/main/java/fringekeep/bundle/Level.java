package fringekeep.bundle;

/** How far a bundle holds; each level rests on the one before. */
public enum Level {
    /** Not even the files are as they were bagged. */
    NONE("nothing holds"),
    /** Every file is listed, there, and has its checksums. */
    FILES_INTACT("files intact"),
    /** The descriptions follow their standards and agree with the files. */
    METADATA_VALID("metadata valid"),
    /** Every record, part, payload and raw file that a record names is there under its hash, without a circle. */
    LINEAGE_FOLLOWS("lineage follows"),
    /** Every computed record gives the same bits again. */
    RECOMPUTED("recomputed");

    private final String words;

    Level(String words) {
        this.words = words;
    }

    /** Words for people. */
    public String words() {
        return words;
    }
}
