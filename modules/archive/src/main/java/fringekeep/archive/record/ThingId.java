package fringekeep.archive.record;

/** Names what all records of one compound, setup, scan … have in common: 16 random bytes as 32 lower-case hexadecimal digits. */
public record ThingId(String hex) implements Comparable<ThingId> {
    /** Checks the form. */
    public ThingId {
        IdForm.require(hex);
    }

    @Override
    public int compareTo(ThingId other) {
        return hex.compareTo(other.hex);
    }

    @Override
    public String toString() {
        return hex;
    }
}
