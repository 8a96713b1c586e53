package fringekeep.archive.internal.store.copy;

import fringekeep.archive.internal.records.HeadCodec;
import fringekeep.archive.internal.store.journal.Act;
import fringekeep.archive.internal.store.journal.Entry;
import fringekeep.archive.internal.store.journal.EntryCodec;
import fringekeep.archive.problem.Problem;
import fringekeep.archive.problem.ProblemException;
import fringekeep.archive.problem.StoppedException;
import fringekeep.archive.problem.Work;
import fringekeep.archive.record.Hash;
import fringekeep.archive.record.Head;
import java.io.IOException;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.ArrayList;
import java.util.List;
import java.util.Optional;
import java.util.SortedMap;
import java.util.TreeMap;

/**
 * Reads a plain copy and verifies it as it goes: the journal's chain up to the entry that {@code archive.json} names, every
 * line's hash, and that each entry's head and new parts stand where they belong.
 */
public final class CopyContents {
    private final CopyFolder folder;
    private final CopyHint hint;
    private final CopySource source;
    private final List<CopiedEntry> entries = new ArrayList<>();
    private Optional<Hash> previous = Optional.empty();

    private CopyContents(CopyFolder folder, CopyHint hint) {
        this.folder = folder;
        this.hint = hint;
        this.source = new CopySource(folder);
    }

    /**
     * Reads a copy.
     *
     * @throws ProblemException naming the first line that does not hold
     */
    public static CopyContents read(Path root, Work work) throws ProblemException, StoppedException {
        CopyFolder folder = new CopyFolder(root);
        try {
            CopyHint hint = CopyHint.read(folder)
                    .orElseThrow(() -> wrong(
                            "copy.none", "The folder holds no plain copy.", folder.hint(), "Name another folder."));
            CopyContents contents = new CopyContents(folder, hint);
            for (int file = 0; file <= CopyFolder.fileOf(hint.n()); file++) {
                work.check();
                work.progress(file, CopyFolder.fileOf(hint.n()) + 1L, "reading the copy");
                contents.file(file);
            }
            contents.requireEnd();
            return contents;
        } catch (IOException e) {
            throw wrong("copy.unreadable", "The copy cannot be read: " + e + ".", root, "Check the disk.");
        }
    }

    /** What it says of itself. */
    public CopyHint hint() {
        return hint;
    }

    /** All entries in order. */
    public List<CopiedEntry> entries() {
        return java.util.Collections.unmodifiableList(entries);
    }

    /** Its bytes by hash. */
    public CopySource source() {
        return source;
    }

    private void file(int file) throws IOException, ProblemException {
        Path journal = folder.journal(file);
        if (!Files.exists(journal) || !Files.exists(folder.records(file))) {
            Path missing = Files.exists(journal) ? folder.records(file) : journal;
            throw wrong("copy.missing-file", "The file is missing.", missing, "Take it from another copy.");
        }
        Lines records = new Lines(folder.records(file), file, source);
        Lines lines = new Lines(journal, file, source);
        while (lines.more() && entries.size() < hint.n()) {
            byte[] bytes = lines.next();
            entry(bytes, journal + ", line " + lines.number(), records);
        }
        // In the last file a copy that was stopped may have left lines of entries it does not promise yet.
        if (records.more() && file < CopyFolder.fileOf(hint.n())) {
            throw wrong(
                    "copy.surplus",
                    "Here lines stand that belong to no entry.",
                    records.place(),
                    "Take the file from another copy.");
        }
    }

    private void entry(byte[] bytes, String where, Lines records) throws ProblemException {
        Entry entry;
        try {
            entry = EntryCodec.read(bytes);
        } catch (ProblemException e) {
            throw broken(e, where);
        }
        boolean follows = entry.n() == entries.size() + 1L
                && entry.previous().equals(previous)
                && entry.archive().equals(hint.archive())
                && (entry.n() == 1) == (entry.act() instanceof Act.Founded);
        if (!follows) {
            throw wrong(
                    "copy.chain",
                    "The journal's chain breaks: entry " + entry.n() + " does not follow entry " + entries.size() + ".",
                    where,
                    "Take the journal from another copy.");
        }
        previous = Optional.of(Hash.of(bytes));
        entries.add(new CopiedEntry(entry, bytes, brought(entry.act(), records)));
    }

    private List<Hash> brought(Act act, Lines records) throws ProblemException {
        if (act instanceof Act.Recorded recorded) {
            return record(recorded.record(), records);
        } else if (act instanceof Act.Received received) {
            return record(received.record(), records);
        } else if (act instanceof Act.Supplied supplied) {
            return records.take(supplied.sha256()) ? List.of(supplied.sha256()) : List.of();
        }
        return List.of();
    }

    private Head head(Hash fingerprint, String where) throws ProblemException {
        try {
            return HeadCodec.read(source.head(fingerprint).orElseThrow());
        } catch (ProblemException e) {
            throw broken(e, where);
        }
    }

    private List<Hash> record(Hash fingerprint, Lines records) throws ProblemException {
        String where = records.place();
        if (!records.take(fingerprint)) {
            throw wrong(
                    "copy.head-missing",
                    "The head " + fingerprint + " stands as a hash alone; heads are never withheld.",
                    records.place(),
                    "Take the file from another copy.");
        }
        Head head = head(fingerprint, where);
        SortedMap<String, Hash> parts = new TreeMap<>(head.parts());
        parts.putAll(head.sealed());
        List<Hash> brought = new ArrayList<>();
        for (Hash part : parts.values()) {
            if (records.isNext(part)) {
                if (records.take(part)) {
                    brought.add(part);
                }
            } else if (!source.has(part)) {
                throw wrong(
                        "copy.part-missing",
                        "The line of part " + part + " is missing.",
                        records.place(),
                        "Take the file from another copy.");
            }
        }
        return brought;
    }

    private void requireEnd() throws ProblemException {
        if (entries.size() != hint.n() || !previous.equals(Optional.of(hint.sha256()))) {
            throw wrong(
                    "copy.end",
                    "The journal does not end with the entry " + hint.n() + " that archive.json names.",
                    folder.journal(CopyFolder.fileOf(hint.n())) + " or " + folder.hint(),
                    "Take both from another copy.");
        }
    }

    /** What is wrong with stored bytes, with the place in the copy and a mend that fits a copy. */
    static ProblemException broken(ProblemException found, String where) {
        return new ProblemException(found.problems().stream()
                .map(problem -> new Problem(
                        problem.code(),
                        problem.what(),
                        problem.where().isEmpty() ? where : where + ", " + problem.where(),
                        "Take the file from another copy. Nothing was changed."))
                .toList());
    }

    static ProblemException wrong(String code, String what, Object where, String mend) {
        return new ProblemException(new Problem(code, what, where.toString(), mend + " Nothing was changed."));
    }
}
