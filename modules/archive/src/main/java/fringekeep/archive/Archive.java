package fringekeep.archive;

import fringekeep.archive.graph.Graph;
import fringekeep.archive.graph.StateName;
import fringekeep.archive.kind.Inputs;
import fringekeep.archive.kind.Kinds;
import fringekeep.archive.kind.RecordView;
import fringekeep.archive.listing.Listing;
import fringekeep.archive.listing.Page;
import fringekeep.archive.problem.Problem;
import fringekeep.archive.problem.ProblemException;
import fringekeep.archive.problem.StoppedException;
import fringekeep.archive.problem.Work;
import fringekeep.archive.record.ArchiveId;
import fringekeep.archive.record.Hash;
import fringekeep.archive.record.PersonId;
import fringekeep.archive.record.RecordSource;
import java.io.InputStream;
import java.nio.file.Path;
import java.time.Instant;
import java.util.Collection;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import java.util.Set;

/**
 * One lab's store, open in this process. Thread-safe: one writer thread inside, readers see a committed watermark and never
 * wait for the writer.
 */
public interface Archive extends AutoCloseable {
    /** Id, title, day boundary, zone, whether invented, and the watermark now. */
    ArchiveFacts facts();

    /** The kinds this program knows. */
    Kinds kinds();

    // ---- reading

    /** A record at hand. */
    Optional<RecordView> record(Hash fingerprint);

    /** What a record was made from and speaks of. */
    Inputs inputs(Hash fingerprint);

    /**
     * Finds a record by what people write: {@code scan 412}, {@code scan 0412 b}, a short form or 64 hexadecimal digits. A
     * number means the current record of the thing.
     *
     * @throws ProblemException if nothing or more than one thing answers; the candidates are named
     */
    Hash find(String reference) throws ProblemException;

    /** What people call a record: {@code scan 0412}, {@code scan 0412 b} for its first correction. */
    String label(Hash fingerprint);

    /** Journal entry that recorded or received it, and when. */
    Optional<Recorded> recorded(Hash fingerprint);

    /** Records of a kind in journal order, from an entry on. */
    List<Hash> records(String kind, long fromEntry, int limit);

    /** How many current records each kind has. */
    Map<String, Long> counts();

    /** Whether counts and lists know states by now: right after opening the graph is still being loaded. */
    boolean graphReady();

    /** States of records for a list, if the graph is loaded by now; never waits for it. */
    Optional<Map<Hash, Set<StateName>>> states(Collection<Hash> records);

    /**
     * How many records each kind has within a scope. Waits for the graph when it is still being loaded, so never to be asked
     * on the window's thread.
     */
    Map<String, KindCount> counts(Scope scope);

    /** A page of a projection. */
    Page list(Listing listing) throws ProblemException;

    /** States and links at the present watermark. */
    Graph graph();

    /** Entries n = from … in order, as their exact bytes. */
    List<byte[]> journal(long from, int limit);

    /** Entries n = from … in order, in short. */
    List<JournalLine> journalLines(long from, int limit);

    /** Entries written at or after {@code from} and before {@code to}, in order. */
    List<JournalLine> journalLines(Instant from, Instant to);

    /** Hash of the last committed entry. */
    Hash journalHead();

    /** Bytes of a raw file. */
    Optional<InputStream> raw(Hash raw) throws ProblemException;

    /** Exact stored bytes of a head or part by hash. */
    Optional<byte[]> stored(Hash hash);

    /** Exact stored bytes of everything at hand. */
    RecordSource source();

    // ---- writing

    /**
     * Examines new records and works out heads, parts and fingerprints, drawing ids and salts; stores nothing. Later ones may
     * refer to earlier ones of the same list by fingerprint, so callers that need one prepare one by one and pass all to
     * {@link #record}.
     *
     * @param earlier prepared records that this one may refer to
     * @throws ProblemException all that is wrong, each with its JSON pointer
     */
    Prepared prepare(NewRecord record, List<Prepared> earlier) throws ProblemException;

    /** Records all in one transaction (at most 100); returns after the commit. */
    List<Recorded> record(List<Prepared> records) throws ProblemException;

    /** Records all in one transaction and removes the drafts they were entered in. */
    List<Recorded> record(List<Prepared> records, Set<String> drafts) throws ProblemException;

    /** Prepares and records one. */
    default Recorded record(NewRecord record) throws ProblemException {
        return record(List.of(prepare(record, List.of()))).get(0);
    }

    /**
     * Completes choices, computes, and returns what is to be recorded.
     *
     * @param request a new record with choices (possibly incomplete) and inputs, without result
     */
    NewRecord compute(NewRecord request, List<Prepared> earlier, Work work) throws ProblemException, StoppedException;

    /** Takes a raw file in (copy, fsync, rename); known bytes are recognised. */
    RawTaken takeIn(Path file) throws ProblemException;

    /** Takes raw bytes in. */
    RawTaken takeIn(byte[] bytes) throws ProblemException;

    /** Persons by id. */
    List<Person> persons();

    /** Adds or changes a person. */
    void savePerson(Person person) throws ProblemException;

    /** Forgets a person; the id stays in salted parts, what it stood for is gone. */
    void erasePerson(PersonId person) throws ProblemException;

    /** Changes title, day boundary or zone from now on. */
    void settings(String title, String dayBoundary, String zone) throws ProblemException;

    /** Purges a raw file, a payload or a salted part for cause. */
    void purge(PurgeTarget target, Hash hash, String reason, String text) throws ProblemException;

    /** Drafts of entry forms. */
    Drafts drafts();

    // ---- care

    /** Re-hashes everything, follows the journal, compares projections, finds orphans; names each fault. */
    List<Problem> check(Work work) throws StoppedException, ProblemException;

    /** Rebuilds all projections, and the words that records are found by. */
    void rebuildProjections(Work work) throws StoppedException, ProblemException;

    /** Copies the archive out as plain files while it is in use; a second copy into the same folder adds. */
    void copyTo(Path folder, Work work) throws StoppedException, ProblemException;

    /** Receives records from a plain copy or a bundle's folder; known ones are skipped. */
    Received receive(Path folder, boolean withPersons, Work work) throws StoppedException, ProblemException;

    /**
     * Receives records from a source of bytes by hash, such as a bundle.
     *
     * @param records fingerprints of all records offered, in any order
     * @param source their bytes
     * @param origin the archive they come from and what it calls itself
     */
    Received receive(List<Hash> records, RecordSource source, Origin origin, Work work)
            throws StoppedException, ProblemException;

    /** Calls a listener after each commit, on the writer thread, with the new watermark. */
    AutoCloseable onCommit(java.util.function.LongConsumer listener);

    @Override
    void close();

    /** What was recorded. */
    record Recorded(Hash fingerprint, long n, String label, Instant at) {}

    /** A raw file taken in. */
    record RawTaken(Hash hash, long bytes, boolean known) {}

    /** Where received records come from. */
    record Origin(ArchiveId archive, String title) {}

    /** What can be purged. */
    enum PurgeTarget {
        /** A raw file. */
        RAW,
        /** A payload. */
        PAYLOAD,
        /** A salted part. */
        PART
    }

    /** How many records came, were known already, and parts supplied. */
    record Received(long records, long known, long parts) {}
}
