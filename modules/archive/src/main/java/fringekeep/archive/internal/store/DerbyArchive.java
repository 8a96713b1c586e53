package fringekeep.archive.internal.store;

import fringekeep.archive.Archive;
import fringekeep.archive.ArchiveFacts;
import fringekeep.archive.Drafts;
import fringekeep.archive.JournalLine;
import fringekeep.archive.KindCount;
import fringekeep.archive.NewRecord;
import fringekeep.archive.Person;
import fringekeep.archive.Prepared;
import fringekeep.archive.Scope;
import fringekeep.archive.graph.Graph;
import fringekeep.archive.graph.StateName;
import fringekeep.archive.internal.store.db.StoreFailure;
import fringekeep.archive.internal.store.journal.Act;
import fringekeep.archive.internal.store.journal.Entry;
import fringekeep.archive.internal.store.projection.ProjectionQuery;
import fringekeep.archive.internal.store.projection.Projections;
import fringekeep.archive.internal.store.tables.JournalTable;
import fringekeep.archive.internal.store.tables.JournalTable.EntryRow;
import fringekeep.archive.internal.store.tables.Located;
import fringekeep.archive.internal.store.tables.Records;
import fringekeep.archive.internal.store.tables.Tally;
import fringekeep.archive.kind.Inputs;
import fringekeep.archive.kind.Kinds;
import fringekeep.archive.kind.RecordView;
import fringekeep.archive.listing.Listing;
import fringekeep.archive.listing.Page;
import fringekeep.archive.problem.Problem;
import fringekeep.archive.problem.ProblemException;
import fringekeep.archive.problem.StoppedException;
import fringekeep.archive.problem.Work;
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
import java.util.TreeMap;
import java.util.concurrent.atomic.AtomicBoolean;
import java.util.function.LongConsumer;

/** The archive as the rest of the program sees it; each group of verbs has a class of its own behind this one. */
final class DerbyArchive implements Archive {
    private final Store store;
    private final Kinds kinds;
    private final StoredBytes bytes;
    private final Views views;
    private final Projections projections;
    private final Recording recording;
    private final TakingIn takingIn;
    private final Filling filling;
    private final Knowing knowing;
    private final AtomicBoolean closed = new AtomicBoolean();

    DerbyArchive(Store store, Kinds kinds) {
        this.store = store;
        this.kinds = kinds;
        this.bytes = new StoredBytes(store);
        this.views = new Views(bytes, kinds);
        this.projections = new Projections(kinds);
        this.recording = new Recording(store, kinds, projections, bytes);
        this.takingIn = new TakingIn(store);
        this.filling = new Filling(store, projections, new Arriving(kinds, views));
        this.knowing = new Knowing(store, bytes);
        Purging.sweep(store);
        filling.begin();
        knowing.begin();
    }

    Store store() {
        return store;
    }

    Recording recording() {
        return recording;
    }

    /** Works out what comes with records whose bytes are elsewhere. */
    Arriving arriving(RecordSource elsewhere) {
        return new Arriving(kinds, new Views(elsewhere, kinds));
    }

    @Override
    public ArchiveFacts facts() {
        State state = store.state();
        return new ArchiveFacts(
                state.archive(),
                state.naming().title(),
                state.naming().dayBoundary(),
                state.naming().zone(),
                state.invented(),
                state.watermark(),
                store.folder().root());
    }

    @Override
    public Kinds kinds() {
        return kinds;
    }

    @Override
    public Optional<RecordView> record(Hash fingerprint) {
        return views.view(fingerprint);
    }

    @Override
    public Inputs inputs(Hash fingerprint) {
        return views.inputs(fingerprint);
    }

    @Override
    public Hash find(String reference) throws ProblemException {
        State state = store.state();
        return store.<Located, ProblemException>read(c -> new Finding(c, state).find(reference))
                .fingerprint();
    }

    @Override
    public String label(Hash fingerprint) {
        State state = store.state();
        return store.<String, RuntimeException>read(c -> {
            Optional<Located> record = Records.find(c, fingerprint, state.watermark());
            return record.isPresent()
                    ? new Labels(c, state.archive(), state.watermark()).of(record.get())
                    : fingerprint.shortForm();
        });
    }

    @Override
    public Optional<Recorded> recorded(Hash fingerprint) {
        State state = store.state();
        return store.<Optional<Recorded>, RuntimeException>read(c -> {
            Optional<Located> record = Records.find(c, fingerprint, state.watermark());
            if (record.isEmpty()) {
                return Optional.empty();
            }
            EntryRow row =
                    JournalTable.entries(c, record.get().n(), record.get().n()).get(0);
            String label = new Labels(c, state.archive(), state.watermark()).of(record.get());
            return Optional.of(new Recorded(
                    fingerprint, row.n(), label, JournalLines.entry(row).at()));
        });
    }

    @Override
    public List<Hash> records(String kind, long fromEntry, int limit) {
        long watermark = store.state().watermark();
        return store
                .<List<Located>, RuntimeException>read(c -> Records.ofKind(c, kind, fromEntry, watermark, limit))
                .stream()
                .map(Located::fingerprint)
                .toList();
    }

    @Override
    public Map<String, Long> counts() {
        Map<String, Long> counts = new TreeMap<>();
        for (Map.Entry<String, Tally> tally : store.state().tallies().entrySet()) {
            counts.put(
                    tally.getKey(),
                    tally.getValue().records() - tally.getValue().replaced());
        }
        return counts;
    }

    @Override
    public boolean graphReady() {
        return knowing.ready();
    }

    @Override
    public Optional<Map<Hash, Set<StateName>>> states(Collection<Hash> records) {
        return knowing.states(records);
    }

    @Override
    public Map<String, KindCount> counts(Scope scope) {
        return new Counting(store, knowing).counts(scope);
    }

    @Override
    public Page list(Listing listing) throws ProblemException {
        try {
            return page(listing);
        } catch (StoreFailure e) {
            if (!e.tableGone()) {
                throw e;
            }
            filling.awaitSwap();
            return page(listing);
        }
    }

    private Page page(Listing listing) throws ProblemException {
        State state = store.state();
        ProjectionQuery query = new ProjectionQuery(projections, listing, state.watermark());
        return store.<Page, ProblemException>read(c -> new ListingAnswer(c, state, query, listing).page());
    }

    @Override
    public Graph graph() {
        return knowing.graph();
    }

    @Override
    public List<byte[]> journal(long from, int limit) {
        return rows(from, limit).stream().map(EntryRow::bytes).toList();
    }

    private List<EntryRow> rows(long from, int limit) {
        long to = Math.min(store.state().watermark(), from + limit - 1);
        return store.<List<EntryRow>, RuntimeException>read(c -> JournalTable.entries(c, from, to));
    }

    @Override
    public List<JournalLine> journalLines(long from, int limit) {
        return rows(from, limit).stream().map(JournalLines::line).toList();
    }

    @Override
    public List<JournalLine> journalLines(Instant from, Instant to) {
        return knowing.times().between(from, to).stream()
                .flatMap(n -> rows(n, 1).stream())
                .map(JournalLines::line)
                .toList();
    }

    @Override
    public Hash journalHead() {
        return store.state().head();
    }

    @Override
    public Optional<InputStream> raw(Hash raw) throws ProblemException {
        return takingIn.open(raw);
    }

    @Override
    public Optional<byte[]> stored(Hash hash) {
        return bytes.head(hash).or(() -> bytes.part(hash));
    }

    @Override
    public RecordSource source() {
        return bytes;
    }

    @Override
    public Prepared prepare(NewRecord record, List<Prepared> earlier) throws ProblemException {
        return views.preparing(store.circumstances()).prepare(record, earlier);
    }

    @Override
    public List<Recorded> record(List<Prepared> records) throws ProblemException {
        return recording.record(records, Set.of());
    }

    @Override
    public List<Recorded> record(List<Prepared> records, Set<String> drafts) throws ProblemException {
        return recording.record(records, drafts);
    }

    @Override
    public NewRecord compute(NewRecord request, List<Prepared> earlier, Work work)
            throws ProblemException, StoppedException {
        return views.computing().compute(request, earlier, work);
    }

    @Override
    public RawTaken takeIn(Path file) throws ProblemException {
        return takingIn.file(file);
    }

    @Override
    public RawTaken takeIn(byte[] raw) throws ProblemException {
        return takingIn.bytes(raw);
    }

    @Override
    public List<Person> persons() {
        return store.database().<List<Person>, RuntimeException>readCommitted(Persons::all);
    }

    @Override
    public void savePerson(Person person) throws ProblemException {
        Person examined = Persons.examined(person);
        store.<Boolean, ProblemException>write((c, progress) -> {
            Persons.save(c, examined);
            return true;
        });
    }

    @Override
    public void erasePerson(PersonId person) throws ProblemException {
        store.<Entry, ProblemException>write((c, progress) -> {
            if (!Persons.erase(c, person)) {
                throw new ProblemException(new Problem(
                        "person.unknown",
                        "Nothing is known of that person.",
                        person.hex(),
                        "Check the id. Nothing was changed."));
            }
            FreedPages.note(c, List.of("PERSON"));
            return progress.append(c, new Act.PersonErased(person));
        });
        new FreedPages(store).clean();
    }

    @Override
    public void settings(String title, String dayBoundary, String zone) throws ProblemException {
        Act.Naming naming = Naming.examined(title, dayBoundary, zone);
        store.<Entry, ProblemException>write((c, progress) -> progress.append(c, new Act.Settings(naming)));
        Hint.rewrite(store);
    }

    /** Waits, however long, until no list is being filled. */
    private void holdLists(Work quiet) {
        try {
            filling.hold(quiet);
        } catch (StoppedException e) {
            throw new IllegalStateException("quiet work is never stopped", e);
        }
    }

    /** Waits until the lists that opening found unfilled are filled. */
    void awaitLists() {
        filling.awaitBackground();
    }

    @Override
    public void purge(PurgeTarget target, Hash hash, String reason, String text) throws ProblemException {
        Arriving withoutIt = new Arriving(kinds, new Views(new Without(bytes, hash), kinds));
        holdLists(Work.QUIET);
        try {
            new Purging(store, projections).purge(target, hash, reason, text, withoutIt);
            views.forget();
        } finally {
            filling.release();
        }
    }

    @Override
    public Drafts drafts() {
        return new StoredDrafts(store);
    }

    @Override
    public List<Problem> check(Work work) throws StoppedException, ProblemException {
        return new Checking(store, projections, new Arriving(kinds, views)).check(work);
    }

    @Override
    public void rebuildProjections(Work work) throws StoppedException, ProblemException {
        filling.rebuild(work);
    }

    @Override
    public void copyTo(Path folder, Work work) throws StoppedException, ProblemException {
        new Copying(store).copyTo(folder, work);
    }

    @Override
    public Received receive(Path folder, boolean withPersons, Work work) throws StoppedException, ProblemException {
        filling.hold(work);
        try {
            return receiving().receive(folder, withPersons, work);
        } finally {
            views.forget();
            filling.release();
        }
    }

    @Override
    public Received receive(List<Hash> records, RecordSource source, Origin origin, Work work)
            throws StoppedException, ProblemException {
        filling.hold(work);
        try {
            return receiving().receive(records, source, origin, work);
        } finally {
            views.forget();
            filling.release();
        }
    }

    private Receiving receiving() {
        return new Receiving(store, recording, projections, bytes, kinds);
    }

    @Override
    public AutoCloseable onCommit(LongConsumer listener) {
        return store.listen(listener);
    }

    @Override
    public void close() {
        if (closed.compareAndSet(false, true)) {
            knowing.close();
            filling.close();
            store.close();
        }
    }
}
