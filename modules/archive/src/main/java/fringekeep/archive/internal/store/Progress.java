package fringekeep.archive.internal.store;

import fringekeep.archive.internal.store.db.Sql;
import fringekeep.archive.internal.store.journal.Act;
import fringekeep.archive.internal.store.journal.Entry;
import fringekeep.archive.internal.store.journal.EntryCodec;
import fringekeep.archive.internal.store.tables.Tally;
import fringekeep.archive.record.ArchiveId;
import fringekeep.archive.record.Hash;
import java.sql.Connection;
import java.sql.SQLException;
import java.time.Instant;
import java.util.HashMap;
import java.util.HashSet;
import java.util.Map;
import java.util.Optional;
import java.util.Set;
import java.util.function.Supplier;
import java.util.function.UnaryOperator;

/** The state as it grows within one transaction; thrown away when that is rolled back. Writer thread only. */
final class Progress {
    private final ArchiveId archive;
    private final boolean invented;
    private final Supplier<Instant> clock;
    private final Map<String, Tally> tallies;
    private final Set<String> touched = new HashSet<>();
    private final Set<Hash> purged;
    private Act.Naming naming;
    private long watermark;
    private Optional<Hash> head;
    private long lastNode;

    /** Goes on from a committed state. */
    Progress(State state, Supplier<Instant> clock) {
        this.archive = state.archive();
        this.invented = state.invented();
        this.clock = clock;
        this.tallies = new HashMap<>(state.tallies());
        this.purged = new HashSet<>(state.purged());
        this.naming = state.naming();
        this.watermark = state.watermark();
        this.head = Optional.of(state.head());
        this.lastNode = state.lastNode();
    }

    /** Before entry 1. */
    Progress(ArchiveId archive, Act.Naming naming, boolean invented, Supplier<Instant> clock) {
        this.archive = archive;
        this.invented = invented;
        this.clock = clock;
        this.tallies = new HashMap<>();
        this.purged = new HashSet<>();
        this.naming = naming;
        this.head = Optional.empty();
    }

    ArchiveId archive() {
        return archive;
    }

    long watermark() {
        return watermark;
    }

    Set<Hash> purged() {
        return purged;
    }

    /** Writes the next entry with the clock's time. */
    Entry append(Connection c, Act act) throws SQLException {
        Entry entry = new Entry(archive, watermark + 1, clock.get(), act, head);
        append(c, entry, EntryCodec.write(entry));
        return entry;
    }

    /** Writes an entry as it stands in a copy. */
    void append(Connection c, Entry entry, byte[] bytes) throws SQLException {
        Hash hash = Hash.of(bytes);
        Sql.run(
                c,
                "insert into journal (n, sha, act, bytes) values (?, ?, ?, ?)",
                entry.n(),
                hash.bytes(),
                entry.act().name(),
                bytes);
        watermark = entry.n();
        head = Optional.of(hash);
        if (entry.act() instanceof Act.Settings settings) {
            naming = settings.naming();
        } else if (entry.act() instanceof Act.Purged purge) {
            purged.add(purge.sha256());
        }
    }

    long newNode() {
        return ++lastNode;
    }

    Tally tally(String kind) {
        return tallies.getOrDefault(kind, Tally.NONE);
    }

    void tally(String kind, UnaryOperator<Tally> change) {
        tallies.put(kind, change.apply(tally(kind)));
        touched.add(kind);
    }

    void saveTallies(Connection c) throws SQLException {
        for (String kind : touched) {
            Tally.save(c, kind, tally(kind));
        }
    }

    /** The state if this is committed. */
    State state() {
        return new State(
                archive,
                naming,
                invented,
                watermark,
                head.orElseThrow(() -> new IllegalStateException("no entry written")),
                tallies,
                lastNode,
                purged);
    }
}
