package fringekeep.archive.internal.store;

import fringekeep.archive.Person;
import fringekeep.archive.internal.store.copy.CopyFolder;
import fringekeep.archive.internal.store.copy.CopyHint;
import fringekeep.archive.internal.store.copy.PersonsFile;
import fringekeep.archive.internal.store.files.Durable;
import fringekeep.archive.internal.store.files.HashedFiles;
import fringekeep.archive.internal.store.files.HashedFiles.Written;
import fringekeep.archive.internal.store.journal.Act;
import fringekeep.archive.internal.store.tables.JournalTable;
import fringekeep.archive.internal.store.tables.JournalTable.EntryRow;
import fringekeep.archive.internal.store.tables.PartsTable;
import fringekeep.archive.internal.store.tables.PartsTable.Listed;
import fringekeep.archive.problem.Problem;
import fringekeep.archive.problem.ProblemException;
import fringekeep.archive.problem.StoppedException;
import fringekeep.archive.problem.Work;
import fringekeep.archive.record.Hash;
import java.io.ByteArrayInputStream;
import java.io.IOException;
import java.io.InputStream;
import java.nio.charset.StandardCharsets;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.ArrayList;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import java.util.SortedMap;
import java.util.SortedSet;
import java.util.TreeSet;
import java.util.stream.Stream;

/**
 * Copies an archive out as plain files, while it is in use. Files first, then records, then the journal, and last the line
 * that says how far the copy reaches: whatever stops a copy, what {@code archive.json} promises is there.
 */
final class Copying {
    private final Store store;
    private final State state;
    private final List<Problem> missing = new ArrayList<>();

    Copying(Store store) {
        this.store = store;
        this.state = store.state();
    }

    void copyTo(Path target, Work work) throws StoppedException, ProblemException {
        CopyFolder folder = new CopyFolder(target);
        try {
            long before = earlier(folder);
            Durable.makeFolders(folder.root());
            files(folder, before, work);
            lines(folder, before, work);
            persons(folder);
            drafts(folder);
            Durable.write(folder.hint(), new CopyHint(state.archive(), state.watermark(), state.head()).bytes());
            Files.deleteIfExists(folder.aside());
        } catch (IOException e) {
            throw new ProblemException(new Problem(
                    "copy.unwritable",
                    "The copy could not be written: " + e + ".",
                    target.toString(),
                    "Check the disk and the permissions, then copy again; what is there is added to."));
        }
        if (!missing.isEmpty()) {
            throw new ProblemException(missing);
        }
    }

    /** How far an earlier copy in the folder reaches; 0 for none. Refuses what is not ours. */
    private long earlier(CopyFolder folder) throws IOException, ProblemException {
        if (folder.root().startsWith(store.folder().root())
                || store.folder().root().startsWith(folder.root())) {
            throw refusal(
                    "copy.inside",
                    "The copy and the archive would lie in one another.",
                    folder,
                    "Name another folder.");
        }
        Optional<CopyHint> hint = CopyHint.read(folder);
        if (hint.isPresent()) {
            requireOurs(folder, hint.get());
            return hint.get().n();
        }
        if (Files.exists(folder.root()) && !unfinished(folder)) {
            throw refusal(
                    "copy.not-empty",
                    "The folder is not empty and holds no plain copy.",
                    folder,
                    "Name an empty folder or that of an earlier copy.");
        }
        return 0;
    }

    /** Whether the folder holds nothing but what a first copy that was stopped leaves. */
    private static boolean unfinished(CopyFolder folder) throws IOException {
        List<Path> known = List.of(
                folder.root().resolve("journal"),
                folder.root().resolve("records"),
                folder.raw(),
                folder.payloads(),
                folder.aside(),
                folder.persons(),
                folder.drafts());
        try (Stream<Path> entries = Files.list(folder.root())) {
            return entries.allMatch(entry ->
                    known.contains(entry) || entry.getFileName().toString().endsWith(".part"));
        }
    }

    private void requireOurs(CopyFolder folder, CopyHint hint) throws ProblemException {
        if (!hint.archive().equals(state.archive())) {
            throw refusal(
                    "copy.other", "The folder holds the copy of another archive.", folder, "Name another folder.");
        }
        List<EntryRow> entry =
                store.<List<EntryRow>, RuntimeException>read(c -> JournalTable.entries(c, hint.n(), hint.n()));
        if (hint.n() > state.watermark()
                || entry.isEmpty()
                || !entry.get(0).sha256().equals(hint.sha256())) {
            throw refusal(
                    "copy.fork",
                    "The copy's journal goes on differently from entry " + hint.n() + " at the latest.",
                    folder,
                    "One of the two was continued apart: keep both, and copy into another folder.");
        }
    }

    private static ProblemException refusal(String code, String what, CopyFolder folder, String mend) {
        return new ProblemException(new Problem(code, what, folder.root().toString(), mend + " Nothing was changed."));
    }

    private void files(CopyFolder folder, long before, Work work) throws IOException, StoppedException {
        HashedFiles raw = new HashedFiles(folder.raw(), folder.aside());
        HashedFiles payloads = new HashedFiles(folder.payloads(), folder.aside());
        if (Files.isDirectory(folder.aside())) {
            try (Stream<Path> left = Files.list(folder.aside())) {
                for (Path file : left.toList()) {
                    Files.delete(file);
                }
            }
        }
        for (Hash purged : state.purged()) {
            raw.delete(purged);
            payloads.delete(purged);
        }
        all(true, raw, before, work);
        all(false, payloads, before, work);
    }

    private void all(boolean raw, HashedFiles target, long before, Work work) throws IOException, StoppedException {
        byte[] after = new byte[32];
        long done = 0;
        while (true) {
            byte[] key = after;
            List<Listed> page =
                    store.<List<Listed>, RuntimeException>read(c -> PartsTable.page(c, raw, key, state.watermark()));
            if (page.isEmpty()) {
                return;
            }
            for (Listed file : page) {
                work.check();
                work.progress(++done, 0, raw ? "raw files" : "payloads");
                boolean there = file.n() <= before && target.size(file.sha256()).equals(Optional.of(file.size()));
                if (!there) {
                    copy(raw, file, target);
                }
            }
            after = page.get(page.size() - 1).sha256().bytes();
        }
    }

    private void copy(boolean raw, Listed file, HashedFiles target) throws IOException {
        Optional<InputStream> bytes = open(raw, file);
        if (bytes.isEmpty()) {
            if (!store.state().purged().contains(file.sha256())) {
                missing.add(lost(raw, file, "is missing"));
            }
            return;
        }
        try (InputStream in = bytes.get()) {
            Written written = target.write(in, Long.MAX_VALUE);
            if (written.hash().equals(file.sha256())) {
                target.adopt(written);
            } else {
                written.discard();
                missing.add(lost(raw, file, "is damaged"));
            }
        }
    }

    private Optional<InputStream> open(boolean raw, Listed file) throws IOException {
        if (raw) {
            return store.raw().open(file.sha256());
        }
        Optional<PartsTable.Payload> row = store.<Optional<PartsTable.Payload>, RuntimeException>read(
                c -> PartsTable.payload(c, file.sha256(), state.watermark()));
        if (row.isEmpty()) {
            return Optional.empty();
        }
        return row.get().bytes().isPresent()
                ? Optional.of(new ByteArrayInputStream(row.get().bytes().get()))
                : store.payloads().open(file.sha256());
    }

    private static Problem lost(boolean raw, Listed file, String how) {
        return new Problem(
                "copy.lost-file",
                "The " + (raw ? "raw file" : "payload") + " " + file.sha256() + " " + how
                        + " in the archive and is not in the copy.",
                "entry " + file.n(),
                "Put it back and copy again; everything else was copied.");
    }

    private void lines(CopyFolder folder, long before, Work work) throws IOException, StoppedException {
        Durable.makeFolders(Durable.folderOf(folder.journal(0)));
        Durable.makeFolders(Durable.folderOf(folder.records(0)));
        SortedSet<Integer> files = touched(before);
        int last = CopyFolder.fileOf(state.watermark());
        int done = 0;
        for (int file : files) {
            work.check();
            work.progress(++done, files.size(), "records");
            long from = (long) file * CopyFolder.ENTRIES_PER_FILE + 1;
            long to = Math.min(state.watermark(), from + CopyFolder.ENTRIES_PER_FILE - 1);
            CopyLines lines = store.<CopyLines, RuntimeException>read(c -> CopyLines.of(c, from, to));
            Durable.write(folder.records(file), lines.records());
            if (file == last || from + CopyFolder.ENTRIES_PER_FILE - 1 > before) {
                Durable.write(folder.journal(file), lines.journal());
            }
        }
    }

    /** Files that hold entries not copied yet, and those in which a purge since then rewrites a line. */
    private SortedSet<Integer> touched(long before) {
        SortedSet<Integer> files = new TreeSet<>();
        for (int file = CopyFolder.fileOf(before + 1); file <= CopyFolder.fileOf(state.watermark()); file++) {
            files.add(file);
        }
        List<EntryRow> purges =
                store.<List<EntryRow>, RuntimeException>read(c -> JournalTable.ofAct(c, "purged", state.watermark()));
        for (EntryRow row : purges) {
            if (row.n() > before && JournalLines.entry(row).act() instanceof Act.Purged purge) {
                store.<List<Long>, RuntimeException>read(
                                c -> CopyLines.entriesWith(c, purge.sha256(), state.watermark()))
                        .forEach(n -> files.add(CopyFolder.fileOf(n)));
            }
        }
        return files;
    }

    private void persons(CopyFolder folder) throws IOException {
        List<Person> persons = store.database().<List<Person>, RuntimeException>readCommitted(Persons::all);
        Durable.write(folder.persons(), PersonsFile.write(persons));
    }

    private void drafts(CopyFolder folder) throws IOException {
        SortedMap<String, String> drafts =
                store.database().<SortedMap<String, String>, RuntimeException>readCommitted(StoredDrafts::texts);
        Durable.makeFolders(folder.drafts());
        try (Stream<Path> old = Files.list(folder.drafts())) {
            for (Path file : old.toList()) {
                if (!drafts.containsKey(file.getFileName().toString().replace(".json", ""))) {
                    Files.delete(file);
                }
            }
        }
        for (Map.Entry<String, String> draft : drafts.entrySet()) {
            Durable.write(
                    folder.drafts().resolve(draft.getKey() + ".json"),
                    draft.getValue().getBytes(StandardCharsets.UTF_8));
        }
    }
}
