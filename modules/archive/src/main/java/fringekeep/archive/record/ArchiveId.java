package fringekeep.archive.record;

/** Names an archive, from its first journal entry: 16 random bytes as 32 lower-case hexadecimal digits. */
public record ArchiveId(String hex) implements Comparable<ArchiveId> {
    /** Checks the form. */
    public ArchiveId {
        IdForm.require(hex);
    }

    @Override
    public int compareTo(ArchiveId other) {
        return hex.compareTo(other.hex);
    }

    @Override
    public String toString() {
        return hex;
    }
}
