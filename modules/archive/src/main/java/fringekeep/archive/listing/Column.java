package fringekeep.archive.listing;

/**
 * A column of a projection.
 *
 * @param name lower-case words with underscores, with unit suffix; never an SQL word of its own
 * @param label words for the head of the column
 * @param sort what it holds
 * @param unit UCUM code of the stored (SI) value, empty for texts
 * @param shownUnit UCUM code people read ({@code nm} for a stored {@code m}), equal to {@code unit} where none is nicer
 * @param deviationOf name of the column whose standard uncertainty this is, empty otherwise
 */
public record Column(String name, String label, Sort sort, String unit, String shownUnit, String deviationOf) {
    /** What a column holds. */
    public enum Sort {
        /** Text of at most 200 characters. */
        TEXT,
        /** Double. */
        REAL,
        /** Long. */
        INTEGER,
        /** Instant. */
        INSTANT,
        /** Boolean. */
        FLAG,
        /** A record's or file's hash. */
        HASH
    }

    /** A text column. */
    public static Column text(String name, String label) {
        return new Column(name, label, Sort.TEXT, "", "", "");
    }

    /** A number column in SI, shown in another unit. */
    public static Column real(String name, String label, String unit, String shownUnit) {
        return new Column(name, label, Sort.REAL, unit, shownUnit, "");
    }

    /** The standard uncertainty of another number column. */
    public static Column deviation(String name, Column of) {
        return new Column(name, "u", Sort.REAL, of.unit(), of.shownUnit(), of.name());
    }

    /** An integer column. */
    public static Column integer(String name, String label) {
        return new Column(name, label, Sort.INTEGER, "1", "1", "");
    }

    /** An instant column. */
    public static Column instant(String name, String label) {
        return new Column(name, label, Sort.INSTANT, "", "", "");
    }

    /** A true-or-false column. */
    public static Column flag(String name, String label) {
        return new Column(name, label, Sort.FLAG, "", "", "");
    }

    /** A column of hashes. */
    public static Column hash(String name, String label) {
        return new Column(name, label, Sort.HASH, "", "", "");
    }
}
