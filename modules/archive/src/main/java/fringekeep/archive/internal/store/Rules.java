package fringekeep.archive.internal.store;

import fringekeep.archive.internal.records.HeadCodec;
import fringekeep.archive.internal.store.db.StoreFailure;
import fringekeep.archive.internal.store.tables.Edges;
import fringekeep.archive.internal.store.tables.Edges.Edge;
import fringekeep.archive.internal.store.tables.Located;
import fringekeep.archive.internal.store.tables.PartsTable;
import fringekeep.archive.internal.store.tables.Records;
import fringekeep.archive.problem.Problem;
import fringekeep.archive.problem.ProblemException;
import fringekeep.archive.record.AboutReference;
import fringekeep.archive.record.After;
import fringekeep.archive.record.Hash;
import fringekeep.archive.record.Head;
import fringekeep.archive.record.InputReference;
import fringekeep.archive.record.PayloadReference;
import fringekeep.archive.record.ThingId;
import java.sql.Connection;
import java.sql.SQLException;
import java.time.Instant;
import java.util.ArrayList;
import java.util.Collection;
import java.util.List;
import java.util.Optional;
import java.util.Set;

/**
 * What must hold when a record is made here, and only the archive can tell (record format 1, section 7): what is corrected
 * or continued is current, segments of a thing begin at different instants, a scan is placed once. Works within the
 * writer's transaction, so it sees the records written before in the same one.
 */
final class Rules {
    private static final long ALL = Long.MAX_VALUE;
    private static final String NOTHING_STORED = " Nothing has been stored.";
    private final Connection c;
    private final Progress progress;
    private final List<Problem> problems = new ArrayList<>();

    Rules(Connection c, Progress progress) {
        this.c = c;
        this.progress = progress;
    }

    /** Throws all that keeps the record from being recorded. */
    void require(Hash fingerprint, Head head) throws SQLException, ProblemException {
        problems.clear();
        unknown(fingerprint);
        targets(head);
        purged(head);
        thing(head);
        if (head.kind().text().equals("placement") && head.corrects().isEmpty()) {
            onePlacement(head);
        }
        if (!problems.isEmpty()) {
            throw new ProblemException(problems);
        }
    }

    private void unknown(Hash fingerprint) throws SQLException {
        Optional<Located> known = Records.find(c, fingerprint, ALL);
        if (known.isPresent()) {
            add("record.known", "The very same record is in the archive already: " + label(known.get()) + ".", "", "");
        }
    }

    private void targets(Head head) throws SQLException {
        for (int i = 0; i < head.inputs().size(); i++) {
            if (head.inputs().get(i) instanceof InputReference.OfRecord input) {
                here(input.record(), "/inputs/" + i);
            } else if (head.inputs().get(i) instanceof InputReference.OfRaw raw) {
                rawSize(raw, "/inputs/" + i);
            }
        }
        for (int i = 0; i < head.about().size(); i++) {
            AboutReference about = head.about().get(i);
            here(about.record(), "/about/" + i);
        }
    }

    private void here(Hash record, String where) throws SQLException {
        if (Records.find(c, record, ALL).isEmpty()) {
            add(
                    "record.absent",
                    "The record " + record.shortForm() + " is not in this archive.",
                    where,
                    "Receive or record it first.");
        }
    }

    private void rawSize(InputReference.OfRaw raw, String where) throws SQLException {
        Optional<Long> size = PartsTable.rawSize(c, raw.raw());
        if (size.isPresent() && size.get() != raw.bytes()) {
            add(
                    "raw.size",
                    "The raw file has " + size.get() + " bytes, the record says " + raw.bytes() + ".",
                    where,
                    "State its true length.");
        }
    }

    private void purged(Head head) {
        head.parts().forEach((name, hash) -> refusePurged(hash, "/parts/" + name));
        head.sealed().forEach((name, hash) -> refusePurged(hash, "/sealed/" + name));
        for (PayloadReference payload : head.payloads()) {
            refusePurged(payload.sha256(), "/payloads/" + payload.name());
        }
        for (int i = 0; i < head.inputs().size(); i++) {
            if (head.inputs().get(i) instanceof InputReference.OfRaw raw) {
                refusePurged(raw.raw(), "/inputs/" + i);
            }
        }
    }

    private void refusePurged(Hash hash, String where) {
        if (progress.purged().contains(hash)) {
            problems.add(Purging.refused(hash, where));
        }
    }

    private void thing(Head head) throws SQLException {
        if (head.corrects().isPresent()) {
            corrected(head, head.corrects().get());
        } else if (head.after().isPresent()) {
            continued(head, head.after().get(), "/after/record");
        } else if (!Records.ofThing(c, head.thing(), ALL).isEmpty()) {
            add("record.thing-known", "The thing has records already.", "/thing", "Correct or continue one of them.");
        }
    }

    private void corrected(Head head, Hash target) throws SQLException {
        Optional<Located> old = currentOf(head, target, "/corrects");
        if (old.isEmpty()) {
            return;
        }
        Head before = head(old.get());
        if (before.after().isPresent() != head.after().isPresent()) {
            add(
                    "record.after-kept",
                    before.after().isPresent()
                            ? "The record to be corrected holds from an instant on; its correction must say from when."
                            : "The record to be corrected does not hold from an instant on; nor can its correction.",
                    "/after",
                    before.after().isPresent() ? "Repeat \"after\"; its \"from\" may differ." : "Leave \"after\" out.");
        } else if (head.after().isPresent()) {
            begins(head, head.after().get(), Set.of(old.get().node()));
        }
        if (head.kind().text().equals("judgement")
                && !new Standing(c).stands(old.get().node())) {
            add(
                    "judgement.not-live",
                    "The judgement " + label(old.get()) + " does not stand any more, so it is not corrected.",
                    "/corrects",
                    "Judge anew.");
        }
    }

    private void continued(Head head, After after, String where) throws SQLException {
        Optional<Located> old = currentOf(head, after.record(), where);
        if (old.isEmpty()) {
            return;
        }
        Optional<Instant> begin = head(old.get()).after().map(After::from);
        if (begin.isPresent() && !after.from().isAfter(begin.get())) {
            add(
                    "record.begin",
                    "What is continued holds from " + begin.get() + " on; " + after.from() + " is not later.",
                    "/after/from",
                    "Give a later instant, or correct " + label(old.get()) + ".");
        }
        begins(head, after, Set.of());
    }

    /** The record to be corrected or continued, if it is current and of the same kind and thing. */
    private Optional<Located> currentOf(Head head, Hash target, String where) throws SQLException {
        Optional<Located> old = Records.find(c, target, ALL);
        if (old.isEmpty()) {
            add("record.absent", "The record " + target.shortForm() + " is not in this archive.", where, "Receive it.");
            return old;
        }
        if (!old.get().kind().equals(head.kind()) || !old.get().thing().equals(head.thing())) {
            add(
                    "record.other-thing",
                    "The record " + label(old.get()) + " is of another kind or thing.",
                    where,
                    "Name a record of the same thing.");
            return Optional.empty();
        }
        List<Long> ends = ends(old.get().node());
        if (!ends.equals(List.of(old.get().node()))) {
            Collection<String> newer = labels(Records.byNode(c, ends, ALL).values());
            add(
                    "record.not-current",
                    "The record " + label(old.get()) + " was corrected; now stands " + String.join(" and ", newer)
                            + ".",
                    where,
                    "Look at " + String.join(" and ", newer) + " and name that.");
            return Optional.empty();
        }
        return old;
    }

    /** Nodes reached forward over corrections that nothing corrects. */
    private List<Long> ends(long node) throws SQLException {
        List<Edge> correctors = Edges.to(c, List.of(node), Edges.CORRECTS, ALL);
        List<Long> ends = new ArrayList<>();
        for (Edge corrector : correctors) {
            ends.addAll(ends(corrector.src()));
        }
        return correctors.isEmpty() ? List.of(node) : ends;
    }

    /** Refuses a begin that another current segment of the thing has. */
    private void begins(Head head, After after, Set<Long> leaving) throws SQLException {
        for (Located other : Records.ofThing(c, head.thing(), ALL)) {
            boolean current =
                    Edges.to(c, List.of(other.node()), Edges.CORRECTS, ALL).isEmpty();
            if (current
                    && !leaving.contains(other.node())
                    && head(other).after().map(After::from).equals(Optional.of(after.from()))) {
                add(
                        "record.equal-begin",
                        label(other) + " holds from the very same instant on.",
                        "/after/from",
                        "Correct that one, or give another instant.");
            }
        }
    }

    private void onePlacement(Head head) throws SQLException {
        for (int i = 0; i < head.about().size(); i++) {
            AboutReference about = head.about().get(i);
            Optional<Located> scan =
                    about.role().equals("scan") ? Records.find(c, about.record(), ALL) : Optional.empty();
            if (scan.isPresent()) {
                refuseSecond(scan.get().thing(), "/about/" + i);
            }
        }
    }

    private void refuseSecond(ThingId scan, String where) throws SQLException {
        List<Long> nodes =
                Records.ofThing(c, scan, ALL).stream().map(Located::node).toList();
        List<Long> speakers = Edges.to(c, nodes, Edges.ABOUT, ALL).stream()
                .filter(edge -> edge.role().equals("scan"))
                .map(Edge::src)
                .toList();
        for (Located speaker : Records.byNode(c, speakers, ALL).values()) {
            if (speaker.kind().text().equals("placement")
                    && Edges.to(c, List.of(speaker.node()), Edges.CORRECTS, ALL).isEmpty()) {
                add(
                        "placement.second",
                        "The scan is placed already, by " + label(speaker) + ".",
                        where,
                        "Correct " + label(speaker) + " instead.");
            }
        }
    }

    private Head head(Located record) throws SQLException {
        byte[] bytes = Records.head(c, record.fingerprint(), ALL)
                .orElseThrow(() -> new StoreFailure("no head of " + record.fingerprint()));
        try {
            return HeadCodec.read(bytes);
        } catch (ProblemException e) {
            throw new StoreFailure("the stored head of " + record.fingerprint() + " is damaged; run check", e);
        }
    }

    private String label(Located record) throws SQLException {
        return new Labels(c, progress.archive(), ALL).of(record);
    }

    private Collection<String> labels(Collection<Located> records) throws SQLException {
        return new Labels(c, progress.archive(), ALL).of(records).values();
    }

    private void add(String code, String what, String where, String mend) {
        problems.add(new Problem(code, what, where, (mend + NOTHING_STORED).strip()));
    }
}
