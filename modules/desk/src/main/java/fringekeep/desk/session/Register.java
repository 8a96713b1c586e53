package fringekeep.desk.session;

import fringekeep.archive.Archive;
import fringekeep.archive.graph.Graph;
import fringekeep.archive.graph.StateName;
import fringekeep.archive.kind.RecordKind;
import fringekeep.archive.record.Hash;
import java.util.ArrayList;
import java.util.HashMap;
import java.util.HashSet;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import java.util.Set;

/**
 * Which record is of which kind, and the graph, at one watermark. Made away from the window thread, then shared; reading it
 * needs no database.
 */
public final class Register {
    private static final int PAGE = 10_000;

    private final Graph graph;
    private final Map<String, List<Hash>> byKind;
    private final Map<Hash, String> kindOf;
    private final Map<Hash, Integer> placeOf = new HashMap<>();

    private Register(Graph graph, Map<String, List<Hash>> byKind, Map<Hash, String> kindOf) {
        this.graph = graph;
        this.byKind = byKind;
        this.kindOf = kindOf;
        byKind.values().forEach(records -> {
            for (int i = 0; i < records.size(); i++) {
                placeOf.put(records.get(i), i);
            }
        });
    }

    /** Reads all records of all kinds. */
    public static Register read(Archive archive, Stops stops) {
        Map<String, List<Hash>> byKind = new LinkedHashMap<>();
        Map<Hash, String> kindOf = new HashMap<>();
        Set<String> kinds = new HashSet<>(archive.counts().keySet());
        stops.all().forEach(stop -> kinds.addAll(stop.kinds()));
        for (RecordKind kind : archive.kinds().all()) {
            kinds.add(kind.kind().text());
        }
        for (String kind : kinds.stream().sorted().toList()) {
            List<Hash> records = all(archive, kind);
            byKind.put(kind, records);
            records.forEach(record -> kindOf.put(record, kind));
        }
        return new Register(archive.graph(), byKind, kindOf);
    }

    private static List<Hash> all(Archive archive, String kind) {
        List<Hash> records = new ArrayList<>();
        long from = 1;
        while (true) {
            List<Hash> page = archive.records(kind, from, PAGE);
            records.addAll(page);
            if (page.size() < PAGE) {
                return records;
            }
            from = archive.recorded(page.get(page.size() - 1)).orElseThrow().n() + 1;
        }
    }

    /** The graph at the same watermark. */
    public Graph graph() {
        return graph;
    }

    /** Kind of a record that is at hand. */
    public Optional<String> kind(Hash record) {
        return Optional.ofNullable(kindOf.get(record));
    }

    /** Place of a record among those of its kind, in journal order; -1 if it is not at hand. */
    public int place(Hash record) {
        return placeOf.getOrDefault(record, -1);
    }

    /** Records of a kind in journal order, corrected ones too. */
    public List<Hash> records(String kind) {
        return byKind.getOrDefault(kind, List.of());
    }

    /** Current records of a kind. */
    public List<Hash> current(String kind) {
        return records(kind).stream()
                .filter(record -> !graph.states(record).contains(StateName.CORRECTED))
                .toList();
    }

    /** How many current records of a kind are in a state. */
    public int count(String kind, StateName state) {
        int count = 0;
        for (Hash record : records(kind)) {
            Set<StateName> states = graph.states(record);
            if (states.contains(state) && !states.contains(StateName.CORRECTED)) {
                count++;
            }
        }
        return count;
    }
}
