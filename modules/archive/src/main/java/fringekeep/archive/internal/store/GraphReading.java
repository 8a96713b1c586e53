package fringekeep.archive.internal.store;

import fringekeep.archive.graph.GraphBuilder;
import fringekeep.archive.internal.records.PartCodec;
import fringekeep.archive.internal.store.db.Sql;
import fringekeep.archive.internal.store.db.StoreFailure;
import fringekeep.archive.internal.store.journal.Act;
import fringekeep.archive.internal.store.tables.JournalTable;
import fringekeep.archive.internal.store.tables.JournalTable.EntryRow;
import fringekeep.archive.internal.store.tables.PartsTable;
import fringekeep.archive.internal.store.tables.Records;
import fringekeep.archive.json.JsonObject;
import fringekeep.archive.problem.ProblemException;
import fringekeep.archive.record.PartName;
import java.nio.charset.StandardCharsets;
import java.sql.Connection;
import java.sql.SQLException;
import java.time.Instant;
import java.util.HashMap;
import java.util.List;
import java.util.Map;
import java.util.Optional;

/** Reads from the tables what the graph needs: heads, contents of judgements, and when scans began. */
final class GraphReading {
    private static final byte[] START = "\"start\":{".getBytes(StandardCharsets.UTF_8);
    private final Store store;
    private final GraphBuilder builder;

    /** What one step reads. */
    private record Step(
            List<Records.HeadRow> heads,
            Map<Long, byte[]> contents,
            Map<Long, byte[]> results,
            Map<Act.Supplied, byte[]> supplied) {}

    GraphReading(Store store, GraphBuilder builder) {
        this.store = store;
        this.builder = builder;
    }

    /** Adds the records of entries {@code from} to {@code to}. */
    void read(long from, long to) {
        Step step = store.<Step, RuntimeException>read(c -> new Step(
                Records.heads(c, from, to),
                parts(c, PartName.CONTENT, "judgement", from, to),
                parts(c, PartName.RESULT, "%", from, to),
                supplied(c, from, to)));
        for (Records.HeadRow row : step.heads()) {
            long n = row.record().n();
            Optional<JsonObject> content =
                    Optional.ofNullable(step.contents().get(n)).map(GraphReading::value);
            Optional<Instant> start = Optional.ofNullable(step.results().get(n))
                    .filter(GraphReading::mayHaveStart)
                    .flatMap(bytes -> GraphBuilder.scanStart(value(bytes)));
            builder.add(n, HeadReading.head(row), row.record().fingerprint(), content, start);
        }
        step.supplied().forEach((act, bytes) -> builder.supply(act.record(), value(bytes)));
    }

    private static Map<Long, byte[]> parts(Connection c, PartName name, String kind, long from, long to)
            throws SQLException {
        Map<Long, byte[]> parts = new HashMap<>();
        Sql.list(
                c,
                "select r.n, p.bytes from --DERBY-PROPERTIES joinOrder=FIXED\n record r, record_part q, part p"
                        + " where r.n >= ? and r.n <= ? and r.kind like ? and q.n = r.n and q.name = ?"
                        + " and p.sha = q.sha",
                row -> parts.put(row.getLong(1), row.getBytes(2)),
                from,
                to,
                kind,
                name.text());
        return parts;
    }

    private static Map<Act.Supplied, byte[]> supplied(Connection c, long from, long to) throws SQLException {
        Map<Act.Supplied, byte[]> supplied = new HashMap<>();
        for (EntryRow row : JournalTable.entries(c, from, to)) {
            if (row.act().equals("supplied")
                    && JournalLines.entry(row).act() instanceof Act.Supplied act
                    && act.part().equals(PartName.CONTENT.text())) {
                PartsTable.part(c, act.sha256(), to).ifPresent(bytes -> supplied.put(act, bytes));
            }
        }
        return supplied;
    }

    /** Most results are not of scans; a look at the bytes spares reading them. */
    private static boolean mayHaveStart(byte[] bytes) {
        for (int i = 0; i + START.length <= bytes.length; i++) {
            if (java.util.Arrays.equals(bytes, i, i + START.length, START, 0, START.length)) {
                return true;
            }
        }
        return false;
    }

    private static JsonObject value(byte[] bytes) {
        try {
            return PartCodec.read(bytes).value();
        } catch (ProblemException e) {
            throw new StoreFailure("a stored part is damaged; run check", e);
        }
    }
}
