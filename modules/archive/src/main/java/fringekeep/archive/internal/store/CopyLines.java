package fringekeep.archive.internal.store;

import fringekeep.archive.internal.store.db.Sql;
import fringekeep.archive.internal.store.journal.Act;
import fringekeep.archive.internal.store.tables.JournalTable;
import fringekeep.archive.internal.store.tables.JournalTable.EntryRow;
import fringekeep.archive.internal.store.tables.PartsTable;
import fringekeep.archive.internal.store.tables.Records;
import fringekeep.archive.record.Hash;
import java.io.ByteArrayOutputStream;
import java.nio.charset.StandardCharsets;
import java.sql.Connection;
import java.sql.SQLException;
import java.util.ArrayList;
import java.util.HashMap;
import java.util.List;
import java.util.Map;
import java.util.Optional;

/**
 * Lines of one journal file and its records file. A part stands with the entry that brought it; one that is not at hand, or
 * was supplied later, is its hash alone with the entry of its record.
 *
 * @param journal entries, one a line
 * @param records heads and parts
 */
record CopyLines(byte[] journal, byte[] records) {
    static CopyLines of(Connection c, long from, long to) throws SQLException {
        ByteArrayOutputStream journal = new ByteArrayOutputStream();
        ByteArrayOutputStream records = new ByteArrayOutputStream();
        Map<Long, byte[]> heads = new HashMap<>();
        for (Records.HeadRow row : Records.heads(c, from, to)) {
            heads.put(row.record().n(), row.head());
        }
        for (EntryRow row : JournalTable.entries(c, from, to)) {
            journal.writeBytes(row.bytes());
            journal.write('\n');
            byte[] head = heads.get(row.n());
            if (head != null) {
                line(records, Hash.of(head), Optional.of(head));
                parts(c, row.n(), records);
            } else if (row.act().equals("supplied") && JournalLines.entry(row).act() instanceof Act.Supplied supplied) {
                line(records, supplied.sha256(), PartsTable.part(c, supplied.sha256(), Long.MAX_VALUE));
            }
        }
        return new CopyLines(journal.toByteArray(), records.toByteArray());
    }

    private static void parts(Connection c, long n, ByteArrayOutputStream records) throws SQLException {
        for (PartRow part : partRows(c, n)) {
            if (part.broughtBy().isEmpty() || part.broughtBy().get() > n) {
                line(records, part.sha256(), Optional.empty());
            } else if (part.broughtBy().get() == n) {
                line(records, part.sha256(), PartsTable.part(c, part.sha256(), Long.MAX_VALUE));
            }
        }
    }

    private record PartRow(Hash sha256, Optional<Long> broughtBy) {}

    private static List<PartRow> partRows(Connection c, long n) throws SQLException {
        return Sql.list(
                c,
                "select q.sha, p.n from record_part q left join part p on p.sha = q.sha where q.n = ? order by q.name",
                row -> {
                    Hash sha256 = Hash.fromBytes(row.getBytes(1));
                    long brought = row.getLong(2);
                    return new PartRow(sha256, row.wasNull() ? Optional.empty() : Optional.of(brought));
                },
                n);
    }

    private static void line(ByteArrayOutputStream out, Hash hash, Optional<byte[]> bytes) {
        out.writeBytes(hash.hex().getBytes(StandardCharsets.US_ASCII));
        if (bytes.isPresent()) {
            out.write(' ');
            out.writeBytes(bytes.get());
        }
        out.write('\n');
    }

    /** Entries with which a part's line may stand: those of records that have it, and those that supplied it. */
    static List<Long> entriesWith(Connection c, Hash part, long watermark) throws SQLException {
        List<Long> entries = new ArrayList<>(PartsTable.usersOfPart(c, part));
        for (EntryRow row : JournalTable.ofAct(c, "supplied", watermark)) {
            if (JournalLines.entry(row).act() instanceof Act.Supplied supplied
                    && supplied.sha256().equals(part)) {
                entries.add(row.n());
            }
        }
        return entries;
    }
}
