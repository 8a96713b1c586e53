package fringekeep.archive.internal.store;

import fringekeep.archive.JournalLine;
import fringekeep.archive.internal.store.db.StoreFailure;
import fringekeep.archive.internal.store.journal.Act;
import fringekeep.archive.internal.store.journal.Entry;
import fringekeep.archive.internal.store.journal.EntryCodec;
import fringekeep.archive.internal.store.tables.JournalTable.EntryRow;
import fringekeep.archive.problem.ProblemException;
import fringekeep.archive.record.Hash;
import java.util.Optional;

/** Stored entries, read. */
final class JournalLines {
    private JournalLines() {}

    static Entry entry(EntryRow row) {
        try {
            return EntryCodec.read(row.bytes());
        } catch (ProblemException e) {
            throw new StoreFailure("journal entry " + row.n() + " is damaged; run check", e);
        }
    }

    static JournalLine line(EntryRow row) {
        Entry entry = entry(row);
        return new JournalLine(entry.n(), entry.at(), entry.act().name(), record(entry.act()));
    }

    static Optional<Hash> record(Act act) {
        if (act instanceof Act.Recorded recorded) {
            return Optional.of(recorded.record());
        } else if (act instanceof Act.Received received) {
            return Optional.of(received.record());
        } else if (act instanceof Act.Supplied supplied) {
            return Optional.of(supplied.record());
        }
        return Optional.empty();
    }
}
