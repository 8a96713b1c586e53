package fringekeep.archive.internal.store;

import fringekeep.archive.Archive.Origin;
import fringekeep.archive.Archive.Received;
import fringekeep.archive.Person;
import fringekeep.archive.internal.store.Arrival.ArrivingPayload;
import fringekeep.archive.internal.store.copy.CopiedEntry;
import fringekeep.archive.internal.store.copy.CopyContents;
import fringekeep.archive.internal.store.copy.CopyFolder;
import fringekeep.archive.internal.store.copy.CopyHint;
import fringekeep.archive.internal.store.copy.HashedFolder;
import fringekeep.archive.internal.store.copy.PersonsFile;
import fringekeep.archive.internal.store.db.StoreFailure;
import fringekeep.archive.internal.store.files.HashedFiles;
import fringekeep.archive.internal.store.journal.Act;
import fringekeep.archive.internal.store.projection.Projections;
import fringekeep.archive.internal.store.tables.JournalTable;
import fringekeep.archive.internal.store.tables.Located;
import fringekeep.archive.internal.store.tables.Numbers;
import fringekeep.archive.internal.store.tables.PartsTable;
import fringekeep.archive.internal.store.tables.Records;
import fringekeep.archive.kind.Kinds;
import fringekeep.archive.problem.Problem;
import fringekeep.archive.problem.ProblemException;
import fringekeep.archive.problem.StoppedException;
import fringekeep.archive.problem.Work;
import fringekeep.archive.record.Hash;
import fringekeep.archive.record.Head;
import fringekeep.archive.record.InputReference;
import fringekeep.archive.record.PayloadReference;
import fringekeep.archive.record.RecordSource;
import java.io.ByteArrayInputStream;
import java.io.IOException;
import java.nio.file.Files;
import java.nio.file.Path;
import java.sql.Connection;
import java.sql.SQLException;
import java.util.ArrayList;
import java.util.HashMap;
import java.util.HashSet;
import java.util.List;
import java.util.Map;
import java.util.Objects;
import java.util.Optional;
import java.util.OptionalLong;
import java.util.Set;
import java.util.TreeMap;

/**
 * Receives records made elsewhere: everything offered is verified first; then each new record gets an entry {@code received},
 * in order of dependence, and each part formerly withheld an entry {@code supplied}. Journals are never merged.
 */
final class Receiving {
    private static final int STEP = 100;
    private final Store store;
    private final Recording recording;
    private final Projections projections;
    private final RecordSource stored;
    private final Kinds kinds;

    /** What comes from where. */
    private record Offer(RecordSource source, Map<Hash, Head> heads, Map<Hash, Act.Origin> origins, Origin from) {}

    Receiving(Store store, Recording recording, Projections projections, RecordSource stored, Kinds kinds) {
        this.store = store;
        this.recording = recording;
        this.projections = projections;
        this.stored = stored;
        this.kinds = kinds;
    }

    /** From a plain copy or a folder of files by hash. */
    Received receive(Path folder, boolean withPersons, Work work) throws StoppedException, ProblemException {
        CopyFolder copy = new CopyFolder(folder);
        if (!Files.isDirectory(folder)) {
            throw new ProblemException(
                    new Problem("receive.no-folder", "There is no such folder.", folder.toString(), "Check the path."));
        }
        if (!Files.exists(copy.journal(0))) {
            HashedFolder hashed = HashedFolder.read(folder);
            return receive(hashed.records(), hashed.source(), hashed.origin(), work);
        }
        CopyContents contents = CopyContents.read(folder, work);
        refuseFork(contents);
        Received received = receive(copied(contents, folder, work), work);
        if (withPersons) {
            persons(copy);
        }
        return received;
    }

    /** From any source. */
    Received receive(List<Hash> records, RecordSource source, Origin origin, Work work)
            throws StoppedException, ProblemException {
        Map<Hash, Head> heads = new Verifying(source).heads(records, work);
        Map<Hash, Act.Origin> origins = new HashMap<>();
        for (Hash record : records) {
            origins.put(record, new Act.Origin(origin.archive(), OptionalLong.empty(), OptionalLong.empty()));
        }
        return receive(new Offer(source, heads, origins, origin), work);
    }

    private Offer copied(CopyContents contents, Path folder, Work work) throws StoppedException, ProblemException {
        Map<Hash, Act.Origin> origins = new HashMap<>();
        List<Hash> records = new ArrayList<>();
        String title = folder.getFileName().toString();
        for (CopiedEntry one : contents.entries()) {
            Act act = one.entry().act();
            if (act instanceof Act.Recorded recorded) {
                records.add(recorded.record());
                origins.put(
                        recorded.record(),
                        new Act.Origin(
                                one.entry().archive(),
                                OptionalLong.of(one.entry().n()),
                                recorded.number()));
            } else if (act instanceof Act.Received received) {
                records.add(received.record());
                origins.put(received.record(), received.origin());
            } else if (act instanceof Act.Founded founded) {
                title = founded.naming().title();
            } else if (act instanceof Act.Settings settings) {
                title = settings.naming().title();
            }
        }
        Map<Hash, Head> heads = new Verifying(contents.source()).heads(records, work);
        return new Offer(
                contents.source(), heads, origins, new Origin(contents.hint().archive(), title));
    }

    /** The same archive continued in two places cannot be put together again. */
    private void refuseFork(CopyContents contents) throws ProblemException {
        State state = store.state();
        CopyHint hint = contents.hint();
        if (!hint.archive().equals(state.archive())) {
            return;
        }
        for (CopiedEntry one : contents.entries()) {
            long n = one.entry().n();
            if (n > state.watermark()) {
                break;
            }
            JournalTable.EntryRow here = store.<List<JournalTable.EntryRow>, RuntimeException>read(
                            c -> JournalTable.entries(c, n, n))
                    .get(0);
            if (!here.sha256().equals(Hash.of(one.bytes()))) {
                throw new ProblemException(new Problem(
                        "receive.fork",
                        "The same archive was continued apart: entry " + n + " is " + here.sha256() + " here and "
                                + Hash.of(one.bytes()) + " there.",
                        "entry " + n,
                        "Found one of the two anew with \"continues\", then receive from it. Nothing was changed."));
            }
        }
    }

    private Received receive(Offer offer, Work work) throws StoppedException, ProblemException {
        List<Hash> order = Dependence.order(offer.heads());
        files(offer, work);
        long records = 0;
        long known = 0;
        long parts = 0;
        for (int from = 0; from < order.size(); from += STEP) {
            work.check();
            work.progress(from, order.size(), "receiving");
            List<Hash> step = order.subList(from, Math.min(order.size(), from + STEP));
            Received received = step(offer, step);
            records += received.records();
            known += received.known();
            parts += received.parts();
        }
        work.progress(order.size(), order.size(), "");
        return new Received(records, known, parts);
    }

    /** Raw files and large payloads first, as ever. Bytes purged here stay out. */
    private void files(Offer offer, Work work) throws StoppedException, ProblemException {
        Set<Hash> done = new HashSet<>(store.state().purged());
        for (Head head : offer.heads().values()) {
            work.check();
            for (InputReference input : head.inputs()) {
                if (input instanceof InputReference.OfRaw raw && done.add(raw.raw())) {
                    adopt(store.raw(), raw.raw(), raw.bytes(), offer.source().raw(raw.raw()));
                }
            }
            for (PayloadReference payload : head.payloads()) {
                if (payload.bytes() > Recording.LARGEST_IN_TABLE && done.add(payload.sha256())) {
                    Optional<byte[]> bytes = offer.source().payload(payload.sha256());
                    adopt(store.payloads(), payload.sha256(), payload.bytes(), bytes);
                }
            }
        }
    }

    private static void adopt(HashedFiles files, Hash hash, long size, Optional<byte[]> bytes) {
        try {
            if (bytes.isPresent() && !files.whole(hash, size)) {
                files.adopt(files.write(new ByteArrayInputStream(bytes.get()), size));
            }
        } catch (IOException e) {
            throw new StoreFailure("Storing " + files.path(hash), e);
        }
    }

    private Received step(Offer offer, List<Hash> step) throws ProblemException {
        Arriving arriving = new Arriving(kinds, new Views(offer.source().or(stored), kinds));
        List<Hash> absent = new ArrayList<>();
        List<Renewing> supplied = new ArrayList<>();
        for (Hash record : step) {
            Optional<Located> here =
                    store.<Optional<Located>, RuntimeException>read(c -> Records.find(c, record, Long.MAX_VALUE));
            if (here.isEmpty()) {
                absent.add(record);
            } else {
                renewing(offer, here.get(), arriving).ifPresent(supplied::add);
            }
        }
        List<Arrival> arrivals = new ArrayList<>();
        for (Hash record : absent) {
            arrivals.add(arrival(offer, record, arriving));
        }
        return store.<Received, ProblemException>write((c, progress) -> {
            for (Arrival arrival : arrivals) {
                received(c, progress, offer, arrival);
            }
            long parts = 0;
            for (Renewing one : supplied) {
                parts += supply(c, progress, one);
            }
            return new Received(arrivals.size(), (long) step.size() - arrivals.size(), parts);
        });
    }

    private Arrival arrival(Offer offer, Hash record, Arriving arriving) throws ProblemException {
        Head head = Objects.requireNonNull(offer.heads().get(record));
        byte[] bytes = offer.source().head(record).orElseThrow();
        Map<Hash, byte[]> parts = new HashMap<>();
        for (Hash part : partsOf(head)) {
            if (!store.state().purged().contains(part)) {
                offer.source().part(part).ifPresent(found -> parts.put(part, found));
            }
        }
        return arriving.arrival(record, head, bytes, parts, payloads(offer, head));
    }

    private static List<Hash> partsOf(Head head) {
        List<Hash> parts = new ArrayList<>(head.parts().values());
        parts.addAll(head.sealed().values());
        return parts;
    }

    private List<ArrivingPayload> payloads(Offer offer, Head head) throws ProblemException {
        List<ArrivingPayload> payloads = new ArrayList<>();
        for (PayloadReference payload : head.payloads()) {
            Optional<byte[]> bytes = store.state().purged().contains(payload.sha256())
                    ? Optional.empty()
                    : offer.source().payload(payload.sha256());
            if (bytes.isPresent()) {
                boolean small = payload.bytes() <= Recording.LARGEST_IN_TABLE;
                payloads.add(new ArrivingPayload(payload.sha256(), payload.bytes(), small ? bytes : Optional.empty()));
            }
        }
        return payloads;
    }

    private void received(Connection c, Progress progress, Offer offer, Arrival arrival) throws SQLException {
        Act.Origin origin = Objects.requireNonNull(offer.origins().get(arrival.fingerprint()));
        long n = progress.append(c, new Act.Received(arrival.fingerprint(), origin))
                .n();
        if (origin.number().isPresent()
                && Numbers.of(c, List.of(arrival.head().thing()), Long.MAX_VALUE)
                        .isEmpty()) {
            Numbering.insert(
                    c, origin.archive(), arrival.head(), origin.number().getAsLong(), n);
        }
        if (origin.archive().equals(offer.from().archive())) {
            Numbering.origin(c, origin.archive(), offer.from().title());
        }
        recording.insert(c, progress, arrival, n);
    }

    /** A record that is here, with what comes for it. */
    private record Renewing(
            Head head,
            Map<String, Hash> names,
            Map<Hash, byte[]> parts,
            List<ArrivingPayload> payloads,
            Renewal renewal) {}

    private Optional<Renewing> renewing(Offer offer, Located here, Arriving arriving) throws ProblemException {
        Head head = Objects.requireNonNull(offer.heads().get(here.fingerprint()));
        Map<String, Hash> names = new TreeMap<>(head.parts());
        names.putAll(head.sealed());
        names.values()
                .removeIf(part ->
                        stored.part(part).isPresent() || store.state().purged().contains(part));
        Map<Hash, byte[]> parts = new HashMap<>();
        for (Hash part : names.values()) {
            offer.source().part(part).ifPresent(found -> parts.put(part, found));
        }
        names.values().retainAll(parts.keySet());
        Renewal renewal = Renewal.of(here, head, arriving);
        return Optional.of(new Renewing(head, names, parts, payloads(offer, head), renewal));
    }

    private long supply(Connection c, Progress progress, Renewing one) throws SQLException {
        Inserting inserting = new Inserting(c, progress);
        Located record = one.renewal().record();
        for (Map.Entry<String, Hash> name : one.names().entrySet()) {
            Act act = new Act.Supplied(record.fingerprint(), name.getKey(), name.getValue());
            long n = progress.append(c, act).n();
            byte[] bytes = Objects.requireNonNull(one.parts().get(name.getValue()));
            inserting.part(name.getValue(), bytes, n);
        }
        boolean files = false;
        for (ArrivingPayload payload : one.payloads()) {
            files |= PartsTable.payload(c, payload.hash(), Long.MAX_VALUE).isEmpty();
            inserting.payload(payload, record.n());
        }
        recording.rawFiles(c, one.head(), record.n());
        if (files || !one.names().isEmpty()) {
            one.renewal().write(c, projections);
        }
        return one.names().size();
    }

    private void persons(CopyFolder copy) throws ProblemException {
        try {
            if (Files.exists(copy.persons())) {
                List<Person> persons = PersonsFile.read(Files.readAllBytes(copy.persons()));
                store.<Boolean, ProblemException>write((c, progress) -> {
                    for (Person person : persons) {
                        if (Persons.find(c, person.id()).isEmpty()) {
                            Persons.save(c, Persons.examined(person));
                        }
                    }
                    return true;
                });
            }
        } catch (IOException e) {
            throw new ProblemException(new Problem(
                    "copy.persons",
                    "The list of persons cannot be read: " + e + ".",
                    copy.persons().toString(),
                    "Check the disk. The records were received."));
        }
    }
}
