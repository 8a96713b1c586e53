package fringekeep.archive.internal.store;

import fringekeep.archive.internal.records.HeadCodec;
import fringekeep.archive.internal.store.db.StoreFailure;
import fringekeep.archive.internal.store.tables.Edges;
import fringekeep.archive.internal.store.tables.Edges.Edge;
import fringekeep.archive.internal.store.tables.Located;
import fringekeep.archive.internal.store.tables.Numbers;
import fringekeep.archive.internal.store.tables.Numbers.ThingNumber;
import fringekeep.archive.internal.store.tables.Records;
import fringekeep.archive.problem.ProblemException;
import fringekeep.archive.record.After;
import fringekeep.archive.record.ArchiveId;
import fringekeep.archive.record.Hash;
import fringekeep.archive.record.ThingId;
import java.sql.Connection;
import java.sql.SQLException;
import java.util.Collection;
import java.util.HashMap;
import java.util.HashSet;
import java.util.List;
import java.util.Locale;
import java.util.Map;
import java.util.Set;
import java.util.TreeMap;

/**
 * What people call records: {@code scan 0412}, its first correction {@code scan 0412 b}, a continuation {@code setup 0013 from
 * 2031-05-14T09:00:00Z}; things of another archive bear its title in brackets.
 */
final class Labels {
    private final Connection c;
    private final ArchiveId own;
    private final long watermark;

    Labels(Connection c, ArchiveId own, long watermark) {
        this.c = c;
        this.own = own;
        this.watermark = watermark;
    }

    /** Label of one record. */
    String of(Located record) throws SQLException {
        return of(List.of(record)).getOrDefault(record.node(), "");
    }

    /** Labels by node. */
    Map<Long, String> of(Collection<Located> records) throws SQLException {
        Set<ThingId> things = new HashSet<>();
        Set<Long> nodes = new HashSet<>();
        for (Located record : records) {
            things.add(record.thing());
            nodes.add(record.node());
        }
        Map<ThingId, ThingNumber> numbers = Numbers.of(c, things, watermark);
        Map<Long, Integer> depths = depths(nodes);
        Map<Long, String> begins = begins(nodes);
        Map<ArchiveId, String> titles = titles(numbers.values());
        Map<Long, String> labels = new TreeMap<>();
        for (Located record : records) {
            String base = base(record, numbers, titles);
            labels.put(
                    record.node(),
                    base + begins.getOrDefault(record.node(), "") + letter(depths.getOrDefault(record.node(), 0)));
        }
        return labels;
    }

    private Map<ArchiveId, String> titles(Collection<ThingNumber> numbers) throws SQLException {
        boolean foreign = numbers.stream().anyMatch(number -> !number.archive().equals(own));
        return foreign ? Numbers.origins(c) : Map.of();
    }

    private String base(Located record, Map<ThingId, ThingNumber> numbers, Map<ArchiveId, String> titles) {
        ThingNumber number = numbers.get(record.thing());
        if (number == null) {
            return record.kind().text() + " " + record.fingerprint().shortForm();
        }
        String text = String.format(Locale.ROOT, "%s %04d", record.kind().text(), number.number());
        if (number.archive().equals(own)) {
            return text;
        }
        String title =
                titles.getOrDefault(number.archive(), number.archive().hex().substring(0, 8));
        return text + " (" + title + ")";
    }

    /** How many corrections lie before each record, as far as they are here. */
    private Map<Long, Integer> depths(Set<Long> nodes) throws SQLException {
        Map<Long, Integer> depths = new HashMap<>();
        Map<Long, Set<Long>> walkers = new HashMap<>();
        nodes.forEach(node -> walkers.put(node, Set.of(node)));
        Map<Long, Set<Long>> front = walkers;
        while (!front.isEmpty()) {
            Map<Long, Set<Long>> next = new HashMap<>();
            for (Edge edge : Edges.from(c, front.keySet(), Edges.CORRECTS, watermark)) {
                Set<Long> started = front.getOrDefault(edge.src(), Set.of());
                started.forEach(node -> depths.merge(node, 1, Integer::sum));
                next.merge(edge.dst(), started, Labels::union);
            }
            front = next;
        }
        return depths;
    }

    private static Set<Long> union(Set<Long> one, Set<Long> other) {
        Set<Long> both = new HashSet<>(one);
        both.addAll(other);
        return both;
    }

    private Map<Long, String> begins(Set<Long> nodes) throws SQLException {
        List<Long> continuing = Edges.from(c, nodes, Edges.AFTER, watermark).stream()
                .map(Edge::src)
                .toList();
        Map<Long, String> begins = new HashMap<>();
        for (Located record : Records.byNode(c, continuing, watermark).values()) {
            begins.put(record.node(), " from " + after(record.fingerprint()).from());
        }
        return begins;
    }

    private After after(Hash fingerprint) throws SQLException {
        byte[] head = Records.head(c, fingerprint, watermark)
                .orElseThrow(() -> new StoreFailure("the head of " + fingerprint + " is not in the database"));
        try {
            return HeadCodec.read(head)
                    .after()
                    .orElseThrow(() -> new StoreFailure("table edge has an after that head " + fingerprint + " lacks"));
        } catch (ProblemException e) {
            throw new StoreFailure("the stored head of " + fingerprint + " is damaged; run check", e);
        }
    }

    /** Nothing, " b", " c" … " z", " aa" … for 0, 1, 2 … corrections. */
    static String letter(int corrections) {
        if (corrections == 0) {
            return "";
        }
        StringBuilder letters = new StringBuilder();
        for (int rest = corrections + 1; rest > 0; rest = (rest - 1) / 26) {
            letters.insert(0, (char) ('a' + (rest - 1) % 26));
        }
        return " " + letters;
    }
}
