package fringekeep.archive.internal.store.files;

import java.nio.file.Path;

/**
 * Names within an archive's folder (record format 1, section 12).
 *
 * @param root the archive
 */
public record ArchiveFolder(Path root) {
    /** Makes the path absolute. */
    public ArchiveFolder {
        root = root.toAbsolutePath().normalize();
    }

    /** {@code archive.json}: form, id and title, as a hint for people and programs; the journal rules. */
    public Path hint() {
        return root.resolve("archive.json");
    }

    /** Held while a program has the archive open. */
    public Path lock() {
        return root.resolve("lock");
    }

    /** The embedded database. */
    public Path database() {
        return root.resolve("db");
    }

    /** Raw files by hash. */
    public Path raw() {
        return root.resolve("raw");
    }

    /** Large payloads by hash. */
    public Path payloads() {
        return root.resolve("payloads");
    }

    /** The database as it was before its tables were last brought forward. */
    public Path formerDatabase() {
        return aside().resolve("db-before");
    }

    /** Where files are written before they get their names. */
    public Path aside() {
        return root.resolve("aside");
    }
}
