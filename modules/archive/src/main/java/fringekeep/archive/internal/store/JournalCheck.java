package fringekeep.archive.internal.store;

import fringekeep.archive.internal.store.db.Sql;
import fringekeep.archive.internal.store.journal.Act;
import fringekeep.archive.internal.store.journal.Entry;
import fringekeep.archive.internal.store.journal.EntryCodec;
import fringekeep.archive.internal.store.tables.JournalTable;
import fringekeep.archive.internal.store.tables.JournalTable.EntryRow;
import fringekeep.archive.internal.store.tables.Located;
import fringekeep.archive.internal.store.tables.Records;
import fringekeep.archive.problem.ProblemException;
import fringekeep.archive.problem.StoppedException;
import fringekeep.archive.problem.Work;
import fringekeep.archive.record.ArchiveId;
import fringekeep.archive.record.Hash;
import java.util.HashMap;
import java.util.HexFormat;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import java.util.OptionalLong;
import java.util.Set;
import java.util.TreeSet;

/** Follows the journal: hashes, chain, gaps, and whether what its entries say was done is in the tables. */
final class JournalCheck {
    private final Snapshot at;
    private final Faults faults;
    private Optional<Hash> previous = Optional.empty();

    /** A row of table thing_number. */
    private record Numbered(ArchiveId archive, String kind, long number, byte[] thing) {}

    JournalCheck(Snapshot at, Faults faults) {
        this.at = at;
        this.faults = faults;
    }

    void check(Work work) throws StoppedException {
        at.eachRange(work, "journal", this::range);
        if (!previous.equals(Optional.of(at.state().head()))) {
            faults.damaged(
                    "journal.head", "The last entry's hash is not the one in use.", "journal entry " + at.watermark());
        }
    }

    private void range(long from, long to) {
        Map<Long, EntryRow> rows = new HashMap<>();
        at.read(c -> JournalTable.entries(c, from, to)).forEach(row -> rows.put(row.n(), row));
        Map<Long, Located> records = new HashMap<>();
        at.read(c -> Records.between(c, from, to)).forEach(record -> records.put(record.n(), record));
        Map<Long, Numbered> numbers = numbers(from, to);
        for (long n = from; n <= to; n++) {
            EntryRow row = rows.get(n);
            if (row == null) {
                faults.damaged("journal.gap", "A journal entry is missing.", "journal entry " + n);
                continue;
            }
            Optional<Entry> entry = entry(row);
            previous = Optional.of(Hash.of(row.bytes()));
            entry.ifPresent(read -> acts(read, row, Optional.ofNullable(records.remove(row.n())), numbers));
        }
        Set<Long> left = new TreeSet<>(records.keySet());
        left.retainAll(rows.keySet());
        left.forEach(n -> faults.damaged(
                "journal.no-act", "A record's row belongs to an entry that records nothing.", "journal entry " + n));
        new TreeSet<>(numbers.keySet())
                .forEach(n -> faults.damaged(
                        "number.surplus", "A number was given with an entry that gives none.", "journal entry " + n));
    }

    private Optional<Entry> entry(EntryRow row) {
        String where = "journal entry " + row.n();
        if (!Hash.of(row.bytes()).equals(row.sha256())) {
            faults.damaged("journal.hash", "The entry's bytes are not those of its hash " + row.sha256() + ".", where);
        }
        try {
            Entry entry = EntryCodec.read(row.bytes());
            chain(entry, row, where);
            return Optional.of(entry);
        } catch (ProblemException e) {
            faults.damaged(
                    "journal.form",
                    "The entry cannot be read: " + e.problems().get(0).what(),
                    where);
            return Optional.empty();
        }
    }

    private void chain(Entry entry, EntryRow row, String where) {
        boolean first = row.n() == 1;
        if (entry.n() != row.n() || !entry.archive().equals(at.state().archive())) {
            faults.damaged("journal.place", "The entry belongs to another place or another archive.", where);
        }
        if (!entry.previous().equals(previous) || first != (entry.act() instanceof Act.Founded)) {
            faults.damaged("journal.chain", "The entry does not name the hash of the entry before it.", where);
        }
        if (!entry.act().name().equals(row.act())) {
            faults.damaged(
                    "journal.act",
                    "The table calls the act \"" + row.act() + "\", the entry \""
                            + entry.act().name() + "\".",
                    where);
        }
    }

    private void acts(Entry entry, EntryRow row, Optional<Located> record, Map<Long, Numbered> numbers) {
        String where = "journal entry " + row.n();
        Optional<Numbered> numbered = Optional.ofNullable(numbers.remove(row.n()));
        if (entry.act() instanceof Act.Recorded recorded) {
            same(recorded.record(), record, where);
            number(recorded.number(), entry.archive(), record, numbered, true, where);
        } else if (entry.act() instanceof Act.Received received) {
            same(received.record(), record, where);
            number(received.origin().number(), received.origin().archive(), record, numbered, false, where);
        } else if (record.isPresent()) {
            faults.damaged("journal.no-act", "A record's row belongs to an entry that records nothing.", where);
        }
    }

    private void same(Hash said, Optional<Located> record, String where) {
        if (record.isEmpty() || !record.get().fingerprint().equals(said)) {
            faults.damaged(
                    "journal.record",
                    "The entry records " + said + ", the tables have "
                            + record.map(found -> found.fingerprint().hex()).orElse("nothing") + ".",
                    where);
        }
    }

    /** A received number may be known already from an earlier record of the same thing. */
    private void number(
            OptionalLong said,
            ArchiveId whose,
            Optional<Located> record,
            Optional<Numbered> found,
            boolean required,
            String where) {
        if (found.isEmpty()) {
            if (said.isPresent() && required) {
                faults.damaged("number.missing", "The number " + said.getAsLong() + " is not in the tables.", where);
            }
            return;
        }
        boolean same = said.isPresent()
                && said.getAsLong() == found.get().number()
                && whose.equals(found.get().archive())
                && record.isPresent()
                && record.get().kind().text().equals(found.get().kind())
                && record.get()
                        .thing()
                        .hex()
                        .equals(HexFormat.of().formatHex(found.get().thing()));
        if (!same) {
            faults.damaged("number.differs", "The number in the tables is not the one the entry gives.", where);
        }
    }

    private Map<Long, Numbered> numbers(long from, long to) {
        Map<Long, Numbered> numbers = new HashMap<>();
        List<Integer> read = at.read(c -> Sql.list(
                c,
                "select n, archive, kind, number, thing from thing_number where n >= ? and n <= ?",
                row -> {
                    numbers.put(
                            row.getLong(1),
                            new Numbered(
                                    new ArchiveId(HexFormat.of().formatHex(row.getBytes(2))),
                                    row.getString(3),
                                    row.getLong(4),
                                    row.getBytes(5)));
                    return 1;
                },
                from,
                to));
        if (read.size() != numbers.size()) {
            faults.damaged("number.surplus", "Two numbers were given with one entry.", "journal entry " + from);
        }
        return numbers;
    }
}
