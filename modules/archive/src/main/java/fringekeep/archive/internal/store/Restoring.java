package fringekeep.archive.internal.store;

import fringekeep.archive.Archive;
import fringekeep.archive.Circumstances;
import fringekeep.archive.Person;
import fringekeep.archive.internal.store.Arrival.ArrivingPayload;
import fringekeep.archive.internal.store.copy.CopiedEntry;
import fringekeep.archive.internal.store.copy.CopyContents;
import fringekeep.archive.internal.store.copy.CopyFolder;
import fringekeep.archive.internal.store.copy.PersonsFile;
import fringekeep.archive.internal.store.files.Durable;
import fringekeep.archive.internal.store.files.HashedFiles;
import fringekeep.archive.internal.store.files.HashedFiles.Written;
import fringekeep.archive.internal.store.journal.Act;
import fringekeep.archive.internal.store.journal.Entry;
import fringekeep.archive.internal.store.tables.Numbers;
import fringekeep.archive.internal.store.tables.Tally;
import fringekeep.archive.json.JsonDocument;
import fringekeep.archive.json.JsonObject;
import fringekeep.archive.kind.Kinds;
import fringekeep.archive.problem.Problem;
import fringekeep.archive.problem.ProblemException;
import fringekeep.archive.problem.StoppedException;
import fringekeep.archive.problem.Work;
import fringekeep.archive.record.ArchiveId;
import fringekeep.archive.record.Hash;
import fringekeep.archive.record.Head;
import fringekeep.archive.record.InputReference;
import fringekeep.archive.record.PayloadReference;
import java.io.ByteArrayInputStream;
import java.io.IOException;
import java.nio.file.Files;
import java.nio.file.Path;
import java.nio.file.StandardCopyOption;
import java.sql.Connection;
import java.sql.SQLException;
import java.util.ArrayList;
import java.util.Comparator;
import java.util.HashMap;
import java.util.HashSet;
import java.util.List;
import java.util.Map;
import java.util.Objects;
import java.util.Optional;
import java.util.OptionalLong;
import java.util.Set;
import java.util.stream.Stream;

/**
 * Restores an archive from its plain copy: the same entries byte for byte, so the same id, journal and numbers. Everything is
 * verified first; then the archive is built beside its place and renamed into it when it is whole. A raw file or payload that
 * the copy lacks is lacking afterwards too, and the archive's check names it.
 */
final class Restoring {
    private static final int STEP = 100;
    private final Kinds kinds;
    private final Circumstances circumstances;
    private final CopyContents contents;
    private final CopyFolder copy;
    private final Map<Hash, Head> heads;

    private Restoring(
            Kinds kinds, Circumstances circumstances, CopyContents contents, CopyFolder copy, Map<Hash, Head> heads) {
        this.kinds = kinds;
        this.circumstances = circumstances;
        this.contents = contents;
        this.copy = copy;
        this.heads = heads;
    }

    /** Restores and opens. */
    static Archive restore(Path from, Path folder, Kinds kinds, Circumstances circumstances, Work work)
            throws ProblemException, StoppedException {
        CopyContents contents = CopyContents.read(from, work);
        List<Hash> records = new ArrayList<>();
        for (CopiedEntry one : contents.entries()) {
            if (brings(one.entry().act())) {
                records.add(JournalLines.record(one.entry().act()).orElseThrow());
            }
        }
        Map<Hash, Head> heads = new Verifying(contents.source()).heads(records, work);
        Restoring restoring = new Restoring(kinds, circumstances, contents, new CopyFolder(from), heads);
        Path target = folder.toAbsolutePath().normalize();
        Path building = target.resolveSibling("." + target.getFileName() + ".restoring");
        try {
            requireFree(target);
            deleteAll(building);
            boolean done = false;
            try {
                restoring.build(building, work);
                Files.deleteIfExists(target);
                Files.move(building, target, StandardCopyOption.ATOMIC_MOVE);
                Durable.forceFolder(Durable.folderOf(target));
                done = true;
            } finally {
                if (!done) {
                    deleteAll(building);
                }
            }
        } catch (IOException e) {
            throw problem("restore.unwritable", "The archive cannot be written: " + e + ".", target, "Check the disk.");
        }
        return new Opening(target, kinds, circumstances).open();
    }

    private static boolean brings(Act act) {
        return act instanceof Act.Recorded || act instanceof Act.Received;
    }

    private static void requireFree(Path target) throws IOException, ProblemException {
        if (Files.exists(target)) {
            try (Stream<Path> entries = Files.list(target)) {
                if (entries.findAny().isPresent()) {
                    throw problem("archive.folder-not-empty", "The folder is not empty.", target, "Name a new folder.");
                }
            }
        }
    }

    private static ProblemException problem(String code, String what, Path where, String mend) {
        return new ProblemException(new Problem(code, what, where.toString(), mend + " Nothing was changed."));
    }

    private static void deleteAll(Path folder) throws IOException {
        if (Files.exists(folder)) {
            try (Stream<Path> files = Files.walk(folder)) {
                for (Path file : files.sorted(Comparator.reverseOrder()).toList()) {
                    Files.delete(file);
                }
            }
        }
    }

    private void build(Path building, Work work) throws IOException, ProblemException, StoppedException {
        CopiedEntry first = contents.entries().get(0);
        Act.Founded founded = (Act.Founded) first.entry().act();
        DerbyArchive archive = new Opening(building, kinds, circumstances)
                .create(
                        (c, progress) -> {
                            progress.append(c, first.entry(), first.bytes());
                            return progress;
                        },
                        first.entry().archive(),
                        founded);
        try {
            files(archive.store(), work);
            List<CopiedEntry> rest =
                    contents.entries().subList(1, contents.entries().size());
            for (int from = 0; from < rest.size(); from += STEP) {
                work.check();
                work.progress(from, rest.size(), "restoring");
                replay(archive, rest.subList(from, Math.min(rest.size(), from + STEP)));
            }
            besides(archive);
        } finally {
            archive.close();
        }
    }

    private void files(Store store, Work work) throws IOException, StoppedException {
        Set<Hash> done = new HashSet<>();
        for (Head head : heads.values()) {
            work.check();
            for (InputReference input : head.inputs()) {
                if (input instanceof InputReference.OfRaw raw && done.add(raw.raw())) {
                    adopt(store.raw(), contents.source().raw(raw.raw()));
                }
            }
            for (PayloadReference payload : head.payloads()) {
                if (payload.bytes() > Recording.LARGEST_IN_TABLE && done.add(payload.sha256())) {
                    adopt(store.payloads(), contents.source().payload(payload.sha256()));
                }
            }
        }
    }

    private static void adopt(HashedFiles files, Optional<byte[]> bytes) throws IOException {
        if (bytes.isPresent()) {
            Written written = files.write(new ByteArrayInputStream(bytes.get()), Long.MAX_VALUE);
            files.adopt(written);
        }
    }

    private void replay(DerbyArchive archive, List<CopiedEntry> step) throws ProblemException {
        Arriving arriving = archive.arriving(contents.source());
        Map<Long, Arrival> arrivals = new HashMap<>();
        for (CopiedEntry one : step) {
            if (brings(one.entry().act())) {
                arrivals.put(one.entry().n(), arrival(one, arriving));
            }
        }
        archive.store().<Boolean, ProblemException>write((c, progress) -> {
            for (CopiedEntry one : step) {
                progress.append(c, one.entry(), one.bytes());
                act(
                        c,
                        progress,
                        archive,
                        one,
                        Optional.ofNullable(arrivals.get(one.entry().n())));
            }
            return true;
        });
    }

    private Arrival arrival(CopiedEntry one, Arriving arriving) {
        Hash record = JournalLines.record(one.entry().act()).orElseThrow();
        Head head = Objects.requireNonNull(heads.get(record));
        Map<Hash, byte[]> parts = new HashMap<>();
        for (Hash part : one.brought()) {
            parts.put(part, contents.source().part(part).orElseThrow());
        }
        List<ArrivingPayload> payloads = new ArrayList<>();
        for (PayloadReference payload : head.payloads()) {
            Optional<byte[]> bytes = contents.source().payload(payload.sha256());
            boolean small = payload.bytes() <= Recording.LARGEST_IN_TABLE;
            if (bytes.isPresent()) {
                payloads.add(new ArrivingPayload(payload.sha256(), payload.bytes(), small ? bytes : Optional.empty()));
            }
        }
        return arriving.arrival(record, head, contents.source().head(record).orElseThrow(), parts, payloads);
    }

    private void act(Connection c, Progress progress, DerbyArchive archive, CopiedEntry one, Optional<Arrival> arrival)
            throws SQLException {
        Entry entry = one.entry();
        if (entry.act() instanceof Act.Recorded recorded) {
            number(
                    c,
                    progress.archive(),
                    recorded.number(),
                    arrival.orElseThrow().head(),
                    entry.n());
            recorded.number()
                    .ifPresent(number -> counted(progress, arrival.orElseThrow().head(), number));
        } else if (entry.act() instanceof Act.Received received) {
            number(
                    c,
                    received.origin().archive(),
                    received.origin().number(),
                    arrival.orElseThrow().head(),
                    entry.n());
        } else if (entry.act() instanceof Act.Supplied supplied
                && !one.brought().isEmpty()) {
            byte[] bytes = contents.source().part(supplied.sha256()).orElseThrow();
            new Inserting(c, progress).part(supplied.sha256(), bytes, entry.n());
        }
        if (arrival.isPresent()) {
            archive.recording().insert(c, progress, arrival.get(), entry.n());
        }
    }

    private static void number(Connection c, ArchiveId whose, OptionalLong number, Head head, long n)
            throws SQLException {
        if (number.isPresent()
                && Numbers.of(c, List.of(head.thing()), Long.MAX_VALUE).isEmpty()) {
            Numbering.insert(c, whose, head, number.getAsLong(), n);
        }
    }

    private static void counted(Progress progress, Head head, long number) {
        progress.tally(
                head.kind().text(),
                tally -> new Tally(tally.records(), tally.replaced(), Math.max(tally.numbered(), number)));
    }

    /** Persons and drafts, which no hash protects. */
    private void besides(DerbyArchive archive) throws IOException, ProblemException {
        if (Files.exists(copy.persons())) {
            for (Person person : PersonsFile.read(Files.readAllBytes(copy.persons()))) {
                archive.savePerson(person);
            }
        }
        if (!Files.isDirectory(copy.drafts())) {
            return;
        }
        try (Stream<Path> files = Files.list(copy.drafts())) {
            for (Path file : files.sorted().toList()) {
                if (JsonDocument.read(Files.readAllBytes(file)).value() instanceof JsonObject body) {
                    archive.drafts().save(file.getFileName().toString().replace(".json", ""), body);
                }
            }
        }
    }
}
