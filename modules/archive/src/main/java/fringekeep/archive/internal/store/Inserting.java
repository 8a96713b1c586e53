package fringekeep.archive.internal.store;

import fringekeep.archive.internal.store.Arrival.ArrivingPayload;
import fringekeep.archive.internal.store.db.Sql;
import fringekeep.archive.internal.store.tables.Edges;
import fringekeep.archive.internal.store.tables.PartsTable;
import fringekeep.archive.internal.store.tables.Records;
import fringekeep.archive.internal.store.tables.Tally;
import fringekeep.archive.record.AboutReference;
import fringekeep.archive.record.After;
import fringekeep.archive.record.Hash;
import fringekeep.archive.record.Head;
import fringekeep.archive.record.InputReference;
import fringekeep.archive.record.PayloadReference;
import java.sql.Connection;
import java.sql.SQLException;
import java.sql.Types;
import java.util.HexFormat;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import java.util.SortedMap;

/** Writes the rows of one record: node, record, parts, payloads, edges, words. The entry itself is written by others. */
final class Inserting {
    private final Connection c;
    private final Progress progress;

    Inserting(Connection c, Progress progress) {
        this.c = c;
        this.progress = progress;
    }

    /** Writes all rows; {@code n} is the record's entry. */
    void record(Arrival arrival, long n) throws SQLException {
        Head head = arrival.head();
        long node = node(arrival.fingerprint(), "r");
        boolean replacedBefore = isReplaced(node);
        insertRecord(head, arrival.headBytes(), node, n);
        parts(head.parts(), arrival, n);
        parts(head.sealed(), arrival, n);
        payloads(arrival, n);
        boolean replaces = edges(head, node, n);
        words(arrival, n);
        progress.tally(
                head.kind().text(),
                tally -> new Tally(
                        tally.records() + 1,
                        tally.replaced() + (replacedBefore ? 1 : 0) + (replaces ? 1 : 0),
                        tally.numbered()));
    }

    private void insertRecord(Head head, byte[] bytes, long node, long n) throws SQLException {
        Sql.run(
                c,
                "insert into record (n, node, kind, schema_number, thing, head) values (?, ?, ?, ?, ?, ?)",
                n,
                node,
                head.kind().text(),
                head.schema(),
                HexFormat.of().parseHex(head.thing().hex()),
                bytes);
    }

    private long node(Hash hash, String sort) throws SQLException {
        Optional<Long> known = Records.node(c, hash);
        if (known.isPresent()) {
            return known.get();
        }
        long id = progress.newNode();
        Sql.run(c, "insert into node (id, sha, sort) values (?, ?, ?)", id, hash.bytes(), sort);
        return id;
    }

    private boolean isReplaced(long node) throws SQLException {
        return !Edges.to(c, List.of(node), Edges.CORRECTS, Long.MAX_VALUE).isEmpty();
    }

    private void parts(SortedMap<String, Hash> names, Arrival arrival, long n) throws SQLException {
        for (Map.Entry<String, Hash> part : names.entrySet()) {
            Sql.run(
                    c,
                    "insert into record_part (n, name, sha) values (?, ?, ?)",
                    n,
                    part.getKey(),
                    part.getValue().bytes());
            byte[] bytes = arrival.parts().get(part.getValue());
            if (bytes != null) {
                part(part.getValue(), bytes, n);
            }
        }
    }

    /** Stores a part unless it is stored; a part is stored once per hash. */
    void part(Hash hash, byte[] bytes, long n) throws SQLException {
        boolean known = Sql.first(c, "select n from part where sha = ?", row -> row.getLong(1), hash.bytes())
                .isPresent();
        if (!known) {
            Sql.run(c, "insert into part (sha, n, bytes) values (?, ?, ?)", hash.bytes(), n, bytes);
        }
    }

    private void payloads(Arrival arrival, long n) throws SQLException {
        for (PayloadReference payload : arrival.head().payloads()) {
            Sql.run(
                    c,
                    "insert into record_payload (n, name, sha, size, form) values (?, ?, ?, ?, ?)",
                    n,
                    payload.name(),
                    payload.sha256().bytes(),
                    payload.bytes(),
                    payload.form());
        }
        for (ArrivingPayload payload : arrival.payloads()) {
            payload(payload, n);
        }
    }

    /** Stores a payload unless it is stored. */
    void payload(ArrivingPayload payload, long n) throws SQLException {
        boolean known = Sql.first(
                        c,
                        "select n from payload where sha = ?",
                        row -> row.getLong(1),
                        payload.hash().bytes())
                .isPresent();
        if (!known) {
            Sql.run(
                    c,
                    "insert into payload (sha, n, size, bytes) values (?, ?, ?, ?)",
                    payload.hash().bytes(),
                    n,
                    payload.size(),
                    payload.bytes().<Object>map(bytes -> bytes).orElse(new Sql.Null(Types.BLOB)));
        }
    }

    /** Writes all edges; answers whether the record is the first to correct one that is here. */
    private boolean edges(Head head, long src, long n) throws SQLException {
        int seq = 0;
        for (InputReference input : head.inputs()) {
            input(input, src, seq++, n);
        }
        seq = 0;
        for (AboutReference about : head.about()) {
            String reach = about.reach() == AboutReference.Reach.THING ? Edges.THING : Edges.RECORD;
            edge(
                    src,
                    Edges.ABOUT,
                    seq++,
                    about.role(),
                    node(about.record(), "r"),
                    Optional.empty(),
                    Optional.of(reach),
                    n);
        }
        Optional<After> after = head.after();
        if (after.isPresent()) {
            long dst = node(after.get().record(), "r");
            edge(src, Edges.AFTER, 0, "", dst, Optional.empty(), Optional.empty(), n);
        }
        return head.corrects().isPresent() && corrects(head.corrects().get(), src, n);
    }

    private boolean corrects(Hash target, long src, long n) throws SQLException {
        long dst = node(target, "r");
        boolean first = !isReplaced(dst)
                && Sql.first(c, "select n from record where node = ?", row -> row.getLong(1), dst)
                        .isPresent();
        edge(src, Edges.CORRECTS, 0, "", dst, Optional.empty(), Optional.empty(), n);
        return first;
    }

    private void input(InputReference input, long src, int seq, long n) throws SQLException {
        if (input instanceof InputReference.OfRecord record) {
            long dst = node(record.record(), "r");
            edge(src, Edges.INPUT, seq, record.role(), dst, record.channel(), Optional.empty(), n);
        } else if (input instanceof InputReference.OfRaw raw) {
            edge(src, Edges.INPUT, seq, raw.role(), node(raw.raw(), "w"), Optional.empty(), Optional.empty(), n);
        } else {
            throw new AssertionError(input);
        }
    }

    private void edge(
            long src,
            String link,
            int seq,
            String role,
            long dst,
            Optional<String> channel,
            Optional<String> reach,
            long n)
            throws SQLException {
        Sql.run(
                c,
                "insert into edge (src, link, seq, role, dst, channel, reach, n) values (?, ?, ?, ?, ?, ?, ?, ?)",
                src,
                link,
                seq,
                role,
                dst,
                channel.<Object>map(text -> text).orElse(new Sql.Null(Types.VARCHAR)),
                reach.<Object>map(text -> text).orElse(new Sql.Null(Types.CHAR)),
                n);
    }

    /** Names a raw file whose bytes lie in its folder. */
    static void rawFile(Connection c, Hash raw, long size, long n) throws SQLException {
        if (PartsTable.rawSize(c, raw).isEmpty()) {
            Sql.run(c, "insert into raw_file (sha, n, size) values (?, ?, ?)", raw.bytes(), n, size);
        }
    }

    private void words(Arrival arrival, long n) throws SQLException {
        for (String word : arrival.words()) {
            Sql.run(c, "insert into word (word, n) values (?, ?)", word, n);
        }
    }
}
