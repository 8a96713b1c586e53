package fringekeep.archive.internal.store;

import fringekeep.archive.internal.records.HeadCodec;
import fringekeep.archive.internal.store.db.Sql;
import fringekeep.archive.internal.store.tables.Edges;
import fringekeep.archive.internal.store.tables.Edges.Edge;
import fringekeep.archive.internal.store.tables.Records;
import fringekeep.archive.problem.ProblemException;
import fringekeep.archive.problem.StoppedException;
import fringekeep.archive.problem.Work;
import fringekeep.archive.record.AboutReference;
import fringekeep.archive.record.Hash;
import fringekeep.archive.record.Head;
import fringekeep.archive.record.InputReference;
import fringekeep.archive.record.PayloadReference;
import java.sql.Connection;
import java.sql.SQLException;
import java.util.List;
import java.util.Optional;
import java.util.SortedMap;
import java.util.SortedSet;
import java.util.TreeMap;
import java.util.TreeSet;

/** Hashes every head again, and compares with it what the tables say of the record beside it. */
final class RecordCheck {
    private final Snapshot at;
    private final Faults faults;

    /** What one look into the tables gives. */
    private record Beside(
            SortedSet<String> links, SortedMap<String, Hash> parts, SortedSet<String> payloads, int schema) {}

    RecordCheck(Snapshot at, Faults faults) {
        this.at = at;
        this.faults = faults;
    }

    void check(Work work) throws StoppedException {
        at.eachRange(work, "records", this::range);
        nodes();
    }

    private void range(long from, long to) {
        for (Records.HeadRow row : at.read(c -> Records.heads(c, from, to))) {
            record(row);
        }
    }

    private void record(Records.HeadRow row) {
        String where =
                "journal entry " + row.record().n() + ", record " + row.record().fingerprint();
        if (!Hash.of(row.head()).equals(row.record().fingerprint())) {
            faults.damaged("head.hash", "The head's bytes are not those of its fingerprint.", where);
        }
        try {
            Head head = HeadCodec.read(row.head());
            compare(head, row, where);
        } catch (ProblemException e) {
            faults.damaged(
                    "head.form",
                    "The head cannot be read: " + e.problems().get(0).what(),
                    where);
        }
    }

    private void compare(Head head, Records.HeadRow row, String where) {
        Beside beside = at.read(c -> beside(c, row));
        boolean columns = head.kind().equals(row.record().kind())
                && head.thing().equals(row.record().thing())
                && head.schema() == beside.schema();
        if (!columns) {
            faults.damaged("record.columns", "Kind, schema or thing in the table are not those of the head.", where);
        }
        differ("edge.differs", "The links in the table are not those of the head", links(head), beside.links(), where);
        SortedMap<String, Hash> parts = new TreeMap<>(head.parts());
        parts.putAll(head.sealed());
        if (!parts.equals(beside.parts())) {
            faults.damaged("record.parts", "The parts named in the table are not those of the head.", where);
        }
        differ(
                "record.payloads",
                "The payloads named in the table are not those of the head",
                payloads(head),
                beside.payloads(),
                where);
    }

    private void differ(String code, String what, SortedSet<String> head, SortedSet<String> table, String where) {
        if (!head.equals(table)) {
            SortedSet<String> odd = new TreeSet<>(head);
            odd.removeAll(table);
            SortedSet<String> other = new TreeSet<>(table);
            other.removeAll(head);
            faults.damaged(code, what + ": head " + odd + ", table " + other + ".", where);
        }
    }

    private static SortedSet<String> links(Head head) {
        SortedSet<String> links = new TreeSet<>();
        int seq = 0;
        for (InputReference input : head.inputs()) {
            if (input instanceof InputReference.OfRecord record) {
                links.add(link(
                        Edges.INPUT,
                        seq++,
                        record.role(),
                        record.record(),
                        "r",
                        record.channel().orElse(""),
                        ""));
            } else if (input instanceof InputReference.OfRaw raw) {
                links.add(link(Edges.INPUT, seq++, raw.role(), raw.raw(), "w", "", ""));
            }
        }
        seq = 0;
        for (AboutReference about : head.about()) {
            String reach = about.reach() == AboutReference.Reach.THING ? Edges.THING : Edges.RECORD;
            links.add(link(Edges.ABOUT, seq++, about.role(), about.record(), "r", "", reach));
        }
        head.corrects().ifPresent(old -> links.add(link(Edges.CORRECTS, 0, "", old, "r", "", "")));
        head.after().ifPresent(after -> links.add(link(Edges.AFTER, 0, "", after.record(), "r", "", "")));
        return links;
    }

    private static String link(
            String link, int seq, String role, Hash target, String sort, String channel, String reach) {
        return link + seq + " " + role + " " + sort + " " + target + " " + channel + " " + reach;
    }

    private static SortedSet<String> payloads(Head head) {
        SortedSet<String> payloads = new TreeSet<>();
        for (PayloadReference one : head.payloads()) {
            payloads.add(one.name() + " " + one.sha256() + " " + one.bytes() + " " + one.form());
        }
        return payloads;
    }

    private static Beside beside(Connection c, Records.HeadRow row) throws SQLException {
        long n = row.record().n();
        SortedSet<String> links = new TreeSet<>();
        List<Edge> edges = Edges.ofNode(c, row.record().node());
        SortedMap<Long, String> targets = new TreeMap<>();
        Sql.in(
                c,
                "select id, sort, sha from node where id in (" + Sql.MARKS + ")",
                edges.stream().map(Edge::dst).toList(),
                node -> targets.put(node.getLong(1), node.getString(2) + " " + Hash.fromBytes(node.getBytes(3))));
        for (Edge edge : edges) {
            String when = edge.n() == n ? "" : " of entry " + edge.n();
            links.add(edge.link() + edge.seq() + " " + edge.role() + " " + targets.getOrDefault(edge.dst(), "nowhere")
                    + " " + edge.channel().orElse("") + " " + edge.reach().orElse("") + when);
        }
        SortedMap<String, Hash> parts = new TreeMap<>();
        Sql.list(
                c,
                "select name, sha from record_part where n = ? order by name",
                part -> Optional.ofNullable(parts.put(part.getString(1), Hash.fromBytes(part.getBytes(2)))),
                n);
        SortedSet<String> payloads = new TreeSet<>(Sql.list(
                c,
                "select name, sha, size, form from record_payload where n = ? order by name",
                one -> one.getString(1) + " " + Hash.fromBytes(one.getBytes(2)) + " " + one.getLong(3) + " "
                        + one.getString(4),
                n));
        int schema = Sql.first(c, "select schema_number from record where n = ?", one -> one.getInt(1), n)
                .orElse(0);
        return new Beside(links, parts, payloads, schema);
    }

    /** Nodes that nothing refers to, records that are not records, edges that leave nothing. */
    private void nodes() {
        surplus(
                "node.surplus",
                "Nodes of the graph belong to no record and no link",
                "select count(*) from node x where not exists (select 1 from record r where r.node = x.id)"
                        + " and not exists (select 1 from edge e where e.dst = x.id)");
        surplus(
                "node.sort",
                "Nodes of the graph are said to be raw files but are records",
                "select count(*) from record r, node x where x.id = r.node and x.sort <> 'r'");
        surplus(
                "edge.surplus",
                "Links belong to no record",
                "select count(*) from edge e where not exists (select 1 from record r where r.node = e.src)");
    }

    private void surplus(String code, String what, String question) {
        long count = at.count(question);
        if (count > 0 && at.store().state().watermark() == at.watermark()) {
            faults.damaged(code, what + ": " + count + ".", "tables node, edge");
        }
    }
}
