package fringekeep.desk.session;

import fringekeep.archive.Archive;
import fringekeep.archive.graph.Graph;
import fringekeep.archive.graph.StateName;
import fringekeep.archive.kind.RecordKind;
import fringekeep.archive.record.Hash;
import java.util.AbstractList;
import java.util.ArrayList;
import java.util.EnumSet;
import java.util.HashSet;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import java.util.RandomAccess;
import java.util.Set;
import java.util.concurrent.ConcurrentHashMap;

/**
 * Which record is of which kind, and the graph, at one watermark. Made away from the window thread, then shared; reading it
 * needs no database. After a commit only what is new is read.
 */
public final class Register {
    private static final int PAGE = 10_000;
    private static final StateName[] STATES = StateName.values();

    private final Graph graph;
    private final Catalogue catalogue;
    private final Map<String, Integer> counts;
    private final int size;
    private final long watermark;
    private final Map<String, byte[]> states = new ConcurrentHashMap<>();

    private Register(Graph graph, Catalogue catalogue, long watermark) {
        this.graph = graph;
        this.catalogue = catalogue;
        this.counts = catalogue.counts();
        this.size = catalogue.size();
        this.watermark = watermark;
    }

    /** Reads all records of all kinds. */
    public static Register read(Archive archive, Stops stops) {
        return read(archive, stops, new Catalogue(), 0);
    }

    /** Reads what came since this register was read. */
    public Register newer(Archive archive, Stops stops) {
        return read(archive, stops, catalogue, watermark);
    }

    private static Register read(Archive archive, Stops stops, Catalogue catalogue, long known) {
        long watermark = archive.facts().watermark();
        Set<String> kinds = new HashSet<>(archive.counts().keySet());
        stops.all().forEach(stop -> kinds.addAll(stop.kinds()));
        for (RecordKind kind : archive.kinds().all()) {
            kinds.add(kind.kind().text());
        }
        for (String kind : kinds.stream().sorted().toList()) {
            append(archive, kind, known + 1, catalogue);
        }
        return new Register(archive.graph(), catalogue, watermark);
    }

    private static void append(Archive archive, String kind, long first, Catalogue catalogue) {
        long from = first;
        while (true) {
            List<Hash> page = archive.records(kind, from, PAGE);
            catalogue.add(kind, page);
            if (page.size() < PAGE) {
                return;
            }
            from = archive.recorded(page.get(page.size() - 1)).orElseThrow().n() + 1;
        }
    }

    /** The graph at the same watermark. */
    public Graph graph() {
        return graph;
    }

    /** Last journal entry that is surely in it. */
    public long watermark() {
        return watermark;
    }

    /** Kind of a record that is at hand. */
    public Optional<String> kind(Hash record) {
        int id = catalogue.id(record);
        return id < 0 || id >= size ? Optional.empty() : Optional.of(catalogue.kind(id));
    }

    /** Place of a record among those of its kind, in journal order; -1 if it is not at hand. */
    public int place(Hash record) {
        int id = catalogue.id(record);
        return id < 0 || id >= size ? -1 : catalogue.place(id);
    }

    /** Kinds of which there are records. */
    public Set<String> kinds() {
        return counts.keySet();
    }

    /** How many records of a kind there are, corrected ones too. */
    public int size(String kind) {
        return counts.getOrDefault(kind, 0);
    }

    /** The record of a kind at a place. */
    public Hash record(String kind, int place) {
        return catalogue.hash(kind, place);
    }

    /** Records of a kind in journal order, corrected ones too; each is made as it is asked for. */
    public List<Hash> records(String kind) {
        return new OfKind(kind, size(kind));
    }

    /** Current records of a kind. */
    public List<Hash> current(String kind) {
        List<Hash> current = new ArrayList<>();
        for (int place = 0; place < size(kind); place++) {
            if (!is(kind, place, StateName.CORRECTED)) {
                current.add(record(kind, place));
            }
        }
        return current;
    }

    /** How many current records of a kind are in a state. */
    public int count(String kind, StateName state) {
        int count = 0;
        for (int place = 0; place < size(kind); place++) {
            if (is(kind, place, state) && !is(kind, place, StateName.CORRECTED)) {
                count++;
            }
        }
        return count;
    }

    /** Whether the record of a kind at a place is in a state. The first asking for a kind looks at all of them. */
    public boolean is(String kind, int place, StateName state) {
        return (states(kind)[place] & (1 << state.ordinal())) != 0;
    }

    /** States of a record; empty when it is not at hand. */
    public Set<StateName> states(Hash record) {
        EnumSet<StateName> found = EnumSet.noneOf(StateName.class);
        Optional<String> kind = kind(record);
        if (kind.isPresent()) {
            byte bits = states(kind.get())[place(record)];
            for (StateName state : STATES) {
                if ((bits & (1 << state.ordinal())) != 0) {
                    found.add(state);
                }
            }
        }
        return found;
    }

    private byte[] states(String kind) {
        return states.computeIfAbsent(kind, this::lookedAt);
    }

    private byte[] lookedAt(String kind) {
        byte[] all = new byte[size(kind)];
        Set<Hash> outdated = graph.outdated();
        for (int place = 0; place < all.length; place++) {
            all[place] = bits(record(kind, place), outdated);
        }
        return all;
    }

    /** Causes are searched forward for all records at once; only judged records are asked for all their states. */
    private byte bits(Hash record, Set<Hash> outdated) {
        int bits = 0;
        if (!graph.judgements(record).isEmpty()) {
            for (StateName state : graph.states(record)) {
                bits |= 1 << state.ordinal();
            }
            return (byte) bits;
        }
        Optional<Hash> now = graph.current(record);
        if (now.isEmpty() && !graph.rivals(record).isEmpty()) {
            bits |= 1 << StateName.DISPUTED.ordinal();
        } else if (!now.equals(Optional.of(record))) {
            bits |= 1 << StateName.CORRECTED.ordinal();
        }
        return (byte) (outdated.contains(record) ? bits | 1 << StateName.OUTDATED.ordinal() : bits);
    }

    private final class OfKind extends AbstractList<Hash> implements RandomAccess {
        private final String kind;
        private final int count;

        OfKind(String kind, int count) {
            this.kind = kind;
            this.count = count;
        }

        @Override
        public Hash get(int place) {
            if (place < 0 || place >= count) {
                throw new IndexOutOfBoundsException(place);
            }
            return record(kind, place);
        }

        @Override
        public int size() {
            return count;
        }
    }
}
