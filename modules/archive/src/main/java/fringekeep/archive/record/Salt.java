package fringekeep.archive.record;

/** Makes a sealed part unguessable; fresh for every part: 16 random bytes as 32 lower-case hexadecimal digits. */
public record Salt(String hex) implements Comparable<Salt> {
    /** Checks the form. */
    public Salt {
        IdForm.require(hex);
    }

    @Override
    public int compareTo(Salt other) {
        return hex.compareTo(other.hex);
    }

    @Override
    public String toString() {
        return hex;
    }
}
