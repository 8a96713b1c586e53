package fringekeep.archive.internal.store.copy;

import java.nio.file.Path;
import java.util.Locale;

/**
 * Names within a plain copy.
 *
 * @param root the copy
 */
public record CopyFolder(Path root) {
    /** Entries in one file. */
    public static final int ENTRIES_PER_FILE = 1_000;

    /** Makes the path absolute. */
    public CopyFolder {
        root = root.toAbsolutePath().normalize();
    }

    /** {@code archive.json}: whose copy, up to which entry. */
    public Path hint() {
        return root.resolve("archive.json");
    }

    /** The file that holds entry {@code n}. */
    public static int fileOf(long n) {
        return Math.toIntExact((n - 1) / ENTRIES_PER_FILE);
    }

    /** Entries, one a line. */
    public Path journal(int file) {
        return root.resolve("journal").resolve(name(file));
    }

    /** Heads and new parts of the entries of the same journal file. */
    public Path records(int file) {
        return root.resolve("records").resolve(name(file));
    }

    private static String name(int file) {
        return String.format(Locale.ROOT, "%06d.txt", file);
    }

    /** Raw files by hash. */
    public Path raw() {
        return root.resolve("raw");
    }

    /** Payloads by hash. */
    public Path payloads() {
        return root.resolve("payloads");
    }

    /** Where files are written before they get their names; gone when a copy is done. */
    public Path aside() {
        return root.resolve("aside");
    }

    /** Persons; not protected by any hash. */
    public Path persons() {
        return root.resolve("persons.json");
    }

    /** Drafts; not protected by any hash. */
    public Path drafts() {
        return root.resolve("drafts");
    }
}
