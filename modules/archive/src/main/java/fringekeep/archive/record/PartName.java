package fringekeep.archive.record;

import java.util.Locale;
import java.util.Optional;

/** The closed list of part names of record format 1. */
public enum PartName {
    /** What people enter. */
    CONTENT(false),
    /** What was asked of a computation. */
    CHOICES(false),
    /** What came out of it. */
    RESULT(false),
    /** When and with which build the record was made. */
    MADE(false),
    /** The person who entered or judged. */
    WHO(true),
    /** Words. */
    REMARK(true),
    /** Names, registry numbers, supplier, lot, structure. */
    IDENTITY(true);

    private final boolean salted;

    PartName(boolean salted) {
        this.salted = salted;
    }

    /** Whether the part carries a salt and can be withheld. */
    public boolean salted() {
        return salted;
    }

    /** The name as written. */
    public String text() {
        return name().toLowerCase(Locale.ROOT);
    }

    /** The part of that name. */
    public static Optional<PartName> of(String text) {
        for (PartName name : values()) {
            if (name.text().equals(text)) {
                return Optional.of(name);
            }
        }
        return Optional.empty();
    }
}
