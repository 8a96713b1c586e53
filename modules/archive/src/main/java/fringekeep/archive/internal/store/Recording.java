package fringekeep.archive.internal.store;

import fringekeep.archive.Archive.Recorded;
import fringekeep.archive.Prepared;
import fringekeep.archive.internal.store.Arrival.ArrivingPayload;
import fringekeep.archive.internal.store.db.StoreFailure;
import fringekeep.archive.internal.store.files.HashedFiles;
import fringekeep.archive.internal.store.journal.Act;
import fringekeep.archive.internal.store.journal.Entry;
import fringekeep.archive.internal.store.projection.Projections;
import fringekeep.archive.internal.store.tables.Located;
import fringekeep.archive.internal.store.tables.PartsTable;
import fringekeep.archive.internal.store.tables.Records;
import fringekeep.archive.internal.store.tables.Tally;
import fringekeep.archive.kind.Kinds;
import fringekeep.archive.problem.Problem;
import fringekeep.archive.problem.ProblemException;
import fringekeep.archive.record.Hash;
import fringekeep.archive.record.Head;
import fringekeep.archive.record.InputReference;
import fringekeep.archive.record.PayloadReference;
import fringekeep.archive.record.RecordSource;
import java.io.ByteArrayInputStream;
import java.io.IOException;
import java.sql.Connection;
import java.sql.SQLException;
import java.util.ArrayList;
import java.util.Collection;
import java.util.List;
import java.util.Map;
import java.util.Objects;
import java.util.Optional;
import java.util.OptionalLong;
import java.util.Set;

/** Records what was prepared: files first, then one transaction with entries, rows, edges, words and projections. */
final class Recording {
    /** Most records of one transaction. */
    static final int MOST = 100;
    /** Larger payloads lie in their folder (bytes). */
    static final int LARGEST_IN_TABLE = 64 << 10;

    private final Store store;
    private final Kinds kinds;
    private final Projections projections;
    private final RecordSource stored;

    Recording(Store store, Kinds kinds, Projections projections, RecordSource stored) {
        this.store = store;
        this.kinds = kinds;
        this.projections = projections;
        this.stored = stored;
    }

    List<Recorded> record(List<Prepared> records, Set<String> drafts) throws ProblemException {
        if (records.isEmpty() || records.size() > MOST) {
            throw new ProblemException(new Problem(
                    "record.count",
                    "1 to " + MOST + " records are recorded at once, not " + records.size() + ".",
                    "",
                    "Record them in several steps. Nothing has been stored."));
        }
        List<byte[]> draftKeys = new ArrayList<>();
        for (String draft : drafts) {
            draftKeys.add(StoredDrafts.key(draft));
        }
        List<Arrival> arrivals = arrivals(records);
        for (Prepared record : records) {
            writeLargePayloads(record);
        }
        return store.<List<Recorded>, ProblemException>write((c, progress) -> {
            List<Recorded> recorded = new ArrayList<>();
            for (Arrival arrival : arrivals) {
                recorded.add(one(c, progress, arrival));
            }
            for (byte[] draft : draftKeys) {
                StoredDrafts.remove(c, draft);
            }
            return labelled(c, progress, recorded);
        });
    }

    private List<Arrival> arrivals(List<Prepared> records) {
        Arriving arriving = new Arriving(kinds, Views.of(records, stored, kinds));
        List<Arrival> arrivals = new ArrayList<>();
        for (Prepared record : records) {
            requireWhole(record);
            arrivals.add(arriving.arrival(
                    record.fingerprint(), record.head(), record.headBytes(), record.parts(), payloads(record)));
        }
        return arrivals;
    }

    /** A prepared record whose bytes do not fit their hashes is a mistake in code; it must never reach the tables. */
    private static void requireWhole(Prepared record) {
        if (!Hash.of(record.headBytes()).equals(record.fingerprint())) {
            throw new IllegalArgumentException("fingerprint and head differ: " + record.fingerprint());
        }
        List<Hash> named = new ArrayList<>(record.head().parts().values());
        named.addAll(record.head().sealed().values());
        for (Hash part : named) {
            byte[] bytes = record.parts().get(part);
            if (bytes == null || !Hash.of(bytes).equals(part)) {
                throw new IllegalArgumentException("part " + part + " of " + record.fingerprint() + " is not there");
            }
        }
        for (Prepared.PayloadBytes payload : record.payloads()) {
            if (!Hash.of(payload.bytes()).equals(payload.hash())) {
                throw new IllegalArgumentException("payload and hash differ: " + payload.hash());
            }
        }
    }

    private static List<ArrivingPayload> payloads(Prepared record) {
        List<ArrivingPayload> payloads = new ArrayList<>();
        for (Prepared.PayloadBytes payload : record.payloads()) {
            boolean small = payload.bytes().length <= LARGEST_IN_TABLE;
            payloads.add(new ArrivingPayload(
                    payload.hash(), payload.bytes().length, small ? Optional.of(payload.bytes()) : Optional.empty()));
        }
        return payloads;
    }

    private void writeLargePayloads(Prepared record) {
        for (Prepared.PayloadBytes payload : record.payloads()) {
            if (payload.bytes().length > LARGEST_IN_TABLE
                    && !store.state().purged().contains(payload.hash())) {
                writeLarge(payload.bytes());
            }
        }
    }

    private void writeLarge(byte[] bytes) {
        try {
            HashedFiles.Written written = store.payloads().write(new ByteArrayInputStream(bytes), bytes.length);
            store.payloads().adopt(written);
        } catch (IOException e) {
            throw new StoreFailure("Writing a payload into " + store.folder().payloads(), e);
        }
    }

    private Recorded one(Connection c, Progress progress, Arrival arrival) throws SQLException, ProblemException {
        Head head = arrival.head();
        new Rules(c, progress).require(arrival.fingerprint(), head);
        requireFiles(c, arrival);
        OptionalLong number = number(progress, head);
        Entry entry = progress.append(c, new Act.Recorded(arrival.fingerprint(), number));
        if (number.isPresent()) {
            Numbering.insert(c, progress.archive(), head, number.getAsLong(), entry.n());
        }
        insert(c, progress, arrival, entry.n());
        return new Recorded(arrival.fingerprint(), entry.n(), "", entry.at());
    }

    private static OptionalLong number(Progress progress, Head head) {
        if (head.corrects().isPresent() || head.after().isPresent()) {
            return OptionalLong.empty();
        }
        String kind = head.kind().text();
        long number = progress.tally(kind).numbered() + 1;
        progress.tally(kind, tally -> new Tally(tally.records(), tally.replaced(), number));
        return OptionalLong.of(number);
    }

    /** All rows of a record but its entry and number. */
    void insert(Connection c, Progress progress, Arrival arrival, long n) throws SQLException {
        new Inserting(c, progress).record(arrival, n);
        rawFiles(c, arrival.head(), n);
        if (kinds.get(arrival.head().kind())
                .filter(kind -> arrival.head().schema() <= kind.schema())
                .isPresent()) {
            projections.insert(c, n, arrival.rows());
        } else {
            projections.forget(c, arrival.head().kind());
        }
    }

    /** A record made here has its raw files and payloads at hand; one received may come without. */
    private void requireFiles(Connection c, Arrival arrival) throws SQLException, ProblemException {
        List<Problem> problems = new ArrayList<>();
        for (InputReference input : arrival.head().inputs()) {
            if (input instanceof InputReference.OfRaw raw && !rawSize(raw.raw()).equals(Optional.of(raw.bytes()))) {
                problems.add(new Problem(
                        "raw.absent",
                        "A raw file of " + raw.bytes() + " bytes with SHA-256 " + raw.raw() + " is not in the archive.",
                        store.raw().path(raw.raw()).toString(),
                        "Take the file in first. Nothing has been stored."));
            }
        }
        for (PayloadReference payload : arrival.head().payloads()) {
            boolean comes = arrival.payloads().stream()
                    .anyMatch(one -> one.hash().equals(payload.sha256()) && one.size() == payload.bytes());
            if (!comes
                    && PartsTable.payload(c, payload.sha256(), Long.MAX_VALUE).isEmpty()) {
                throw new IllegalArgumentException("payload " + payload.name() + " does not come with its record");
            }
        }
        if (!problems.isEmpty()) {
            throw new ProblemException(problems);
        }
    }

    /** Names the raw files of a record whose bytes are at hand. */
    void rawFiles(Connection c, Head head, long n) throws SQLException {
        for (InputReference input : head.inputs()) {
            if (input instanceof InputReference.OfRaw raw) {
                rawFile(c, raw, n);
            }
        }
    }

    /** Names a raw file if its bytes are at hand; a received record may come without. */
    private void rawFile(Connection c, InputReference.OfRaw raw, long n) throws SQLException {
        if (PartsTable.rawSize(c, raw.raw()).isPresent()) {
            return;
        }
        Optional<Long> size = rawSize(raw.raw());
        if (size.isPresent() && size.get() == raw.bytes()) {
            Inserting.rawFile(c, raw.raw(), raw.bytes(), n);
        }
    }

    private Optional<Long> rawSize(Hash raw) {
        try {
            return store.raw().size(raw);
        } catch (IOException e) {
            throw new StoreFailure("Reading the length of raw file " + raw, e);
        }
    }

    private List<Recorded> labelled(Connection c, Progress progress, Collection<Recorded> recorded)
            throws SQLException {
        List<Recorded> labelled = new ArrayList<>();
        Labels labels = new Labels(c, progress.archive(), Long.MAX_VALUE);
        Map<Long, Located> located =
                Records.byEntry(c, recorded.stream().map(Recorded::n).toList());
        Map<Long, String> names = labels.of(located.values());
        for (Recorded one : recorded) {
            Located record = Objects.requireNonNull(located.get(one.n()));
            String name = Objects.requireNonNull(names.get(record.node()));
            labelled.add(new Recorded(one.fingerprint(), one.n(), name, one.at()));
        }
        return labelled;
    }
}
