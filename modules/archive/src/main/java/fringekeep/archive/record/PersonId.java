package fringekeep.archive.record;

/** Names a person; who it is stands in an erasable table: 16 random bytes as 32 lower-case hexadecimal digits. */
public record PersonId(String hex) implements Comparable<PersonId> {
    /** Checks the form. */
    public PersonId {
        IdForm.require(hex);
    }

    @Override
    public int compareTo(PersonId other) {
        return hex.compareTo(other.hex);
    }

    @Override
    public String toString() {
        return hex;
    }
}
