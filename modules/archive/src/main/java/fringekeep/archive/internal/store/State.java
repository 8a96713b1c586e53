package fringekeep.archive.internal.store;

import fringekeep.archive.internal.store.db.Sql;
import fringekeep.archive.internal.store.journal.Act;
import fringekeep.archive.internal.store.journal.Entry;
import fringekeep.archive.internal.store.journal.EntryCodec;
import fringekeep.archive.internal.store.tables.JournalTable;
import fringekeep.archive.internal.store.tables.JournalTable.EntryRow;
import fringekeep.archive.internal.store.tables.Tally;
import fringekeep.archive.problem.Problem;
import fringekeep.archive.problem.ProblemException;
import fringekeep.archive.record.ArchiveId;
import fringekeep.archive.record.Hash;
import java.sql.Connection;
import java.sql.SQLException;
import java.util.HashSet;
import java.util.List;
import java.util.Map;
import java.util.Set;

/**
 * What is committed, as every reader may know it.
 *
 * @param archive id
 * @param naming title, day boundary, zone
 * @param invented whether its data are invented
 * @param watermark last committed entry
 * @param head hash of that entry
 * @param tallies counts by kind
 * @param lastNode last number given in the graph
 * @param purged hashes of what was taken away for cause
 */
record State(
        ArchiveId archive,
        Act.Naming naming,
        boolean invented,
        long watermark,
        Hash head,
        Map<String, Tally> tallies,
        long lastNode,
        Set<Hash> purged) {
    State {
        tallies = Map.copyOf(tallies);
        purged = Set.copyOf(purged);
    }

    /** As an archive tells it when it is opened. */
    static State load(Connection c) throws SQLException, ProblemException {
        EntryRow last = JournalTable.last(c).orElseThrow(State::withoutJournal);
        EntryRow first = JournalTable.entries(c, 1, 1).stream().findFirst().orElseThrow(State::withoutJournal);
        Entry founding = EntryCodec.read(first.bytes());
        if (!(founding.act() instanceof Act.Founded founded)) {
            throw withoutJournal();
        }
        EntryCodec.read(last.bytes()); // a newer form is refused here, before anything is written after it
        return new State(
                founding.archive(),
                naming(c, founded, last.n()),
                founded.invented(),
                last.n(),
                last.sha256(),
                Tally.all(c),
                Sql.first(c, "select max(id) from node", row -> row.getLong(1)).orElse(0L),
                purged(c, last.n()));
    }

    private static Act.Naming naming(Connection c, Act.Founded founded, long watermark)
            throws SQLException, ProblemException {
        List<EntryRow> settings = JournalTable.ofAct(c, "settings", watermark);
        if (settings.isEmpty()) {
            return founded.naming();
        }
        Entry latest = EntryCodec.read(settings.get(settings.size() - 1).bytes());
        return ((Act.Settings) latest.act()).naming();
    }

    private static Set<Hash> purged(Connection c, long watermark) throws SQLException, ProblemException {
        Set<Hash> purged = new HashSet<>();
        for (EntryRow row : JournalTable.ofAct(c, "purged", watermark)) {
            purged.add(((Act.Purged) EntryCodec.read(row.bytes()).act()).sha256());
        }
        return purged;
    }

    private static ProblemException withoutJournal() {
        return new ProblemException(new Problem(
                "archive.no-founding",
                "The archive's journal does not begin with its founding: founding it was interrupted or the database"
                        + " is damaged.",
                "db",
                "If it was just being founded, delete the folder and found it anew; otherwise restore it from a plain"
                        + " copy. Nothing was changed."));
    }
}
