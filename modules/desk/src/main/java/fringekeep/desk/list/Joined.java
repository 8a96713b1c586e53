package fringekeep.desk.list;

import fringekeep.archive.Archive;
import fringekeep.archive.graph.Graph;
import fringekeep.archive.graph.Graph.Link;
import fringekeep.archive.graph.Graph.LinkSort;
import fringekeep.archive.graph.StateName;
import fringekeep.archive.kind.RecordKind;
import fringekeep.archive.kind.RecordView;
import fringekeep.archive.listing.Column;
import fringekeep.archive.listing.Listing;
import fringekeep.archive.listing.Page;
import fringekeep.archive.listing.Projection;
import fringekeep.archive.listing.Row;
import fringekeep.archive.problem.ProblemException;
import fringekeep.archive.problem.StoppedException;
import fringekeep.archive.problem.Work;
import fringekeep.archive.record.Hash;
import fringekeep.archive.record.KindName;
import fringekeep.desk.look.Texts;
import fringekeep.desk.session.Register;
import java.util.ArrayList;
import java.util.Arrays;
import java.util.HashMap;
import java.util.HashSet;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import java.util.Set;

/**
 * Rows of records, and of those linked with them: a scan's placement, its preferred or newest fit. Keeps what it has read at
 * one register, whole tables of small kinds, the last few thousand rows of others. Thread-safe; not for the window thread.
 */
public final class Joined {
    private static final Texts TEXTS = new Texts("fringekeep.desk.list.Texts", Joined.class);
    private static final int WHOLE = 2_000;
    private static final int KEPT = 6_000;
    private static final int NEAR = 40;

    private final Archive archive;
    private final Register register;
    private final Map<Hash, Page.Line> whole = new HashMap<>();
    private final Map<Hash, Page.Line> some = new LinkedHashMap<>(256, 0.75f, true) {
        private static final long serialVersionUID = 1L;

        @Override
        protected boolean removeEldestEntry(Map.Entry<Hash, Page.Line> eldest) {
            return size() > KEPT;
        }
    };
    private final Set<String> loaded = new HashSet<>();
    private final Map<String, Values> values = new HashMap<>();
    private final Map<String, int[]> ways = new HashMap<>();

    /** Reads from an archive at the register's watermark. */
    public Joined(Archive archive, Register register) {
        this.archive = archive;
        this.register = register;
    }

    /** The register it reads at. */
    public Register register() {
        return register;
    }

    /** The declared table of a kind that lists show. */
    public static Optional<Projection> table(Archive archive, String kind) {
        return archive.kinds().get(new KindName(kind)).map(RecordKind::projections).stream()
                .flatMap(List::stream)
                .findFirst();
    }

    /** A column of a kind's first table, if it declares it. */
    public static Optional<Column> column(Archive archive, String kind, String name) {
        return table(archive, kind).stream()
                .flatMap(table -> table.columns().stream())
                .filter(column -> column.name().equals(name))
                .findFirst();
    }

    /** The record of a kind that speaks of or was made from a record: preferred, else the newest that stands. */
    public Optional<Hash> linked(Hash record, String kind) {
        Graph graph = register.graph();
        Optional<Hash> best = Optional.empty();
        boolean preferred = false;
        for (Link link : graph.links(record)) {
            Hash other = link.from().equals(record) ? link.to() : link.from();
            boolean counts = link.sort() == LinkSort.ABOUT || (link.sort() == LinkSort.INPUT && asItself(link));
            if (!counts || !register.kind(other).orElse("").equals(kind)) {
                continue;
            }
            Hash now = link.sort() == LinkSort.ABOUT && link.to().equals(other)
                    ? graph.current(other).orElse(other)
                    : other;
            Set<StateName> states = register.states(now);
            if (states.contains(StateName.CORRECTED) || states.contains(StateName.WITHDRAWN)) {
                continue;
            }
            boolean better = states.contains(StateName.PREFERRED);
            if (best.isEmpty() || (better && !preferred) || (better == preferred && newer(now, best.get()))) {
                best = Optional.of(now);
                preferred = preferred || better;
            }
        }
        return best;
    }

    /** All current records of a kind that speak of or were made from a record, in journal order. */
    public List<Hash> allLinked(Hash record, String kind) {
        return register.graph().links(record).stream()
                .filter(link -> link.to().equals(record)
                        && (link.sort() == LinkSort.ABOUT || (link.sort() == LinkSort.INPUT && asItself(link))))
                .map(Link::from)
                .filter(other -> register.kind(other).orElse("").equals(kind))
                .filter(other -> !register.states(other).contains(StateName.CORRECTED))
                .distinct()
                .sorted(java.util.Comparator.comparingInt(register::place))
                .toList();
    }

    /** Over several steps. */
    Optional<Hash> linked(Hash record, List<String> way) {
        Optional<Hash> here = Optional.of(record);
        for (String kind : way) {
            here = here.flatMap(one -> linked(one, kind));
        }
        return here;
    }

    /** For each place of a kind the place of the record over a way, -1 where there is none. */
    synchronized int[] places(String kind, List<String> way, Work work) throws StoppedException {
        String key = kind + ">" + String.join(">", way);
        int[] known = ways.get(key);
        if (known != null) {
            return known;
        }
        int[] places = new int[register.size(kind)];
        for (int place = 0; place < places.length; place++) {
            if (place % 1_000 == 0) {
                work.check();
                work.progress(place, places.length, TEXTS.of("reading"));
            }
            places[place] = linked(register.record(kind, place), way)
                    .map(register::place)
                    .orElse(-1);
        }
        ways.put(key, places);
        return places;
    }

    /** A whole column of a kind; empty when it declares none so. */
    synchronized Optional<Values> values(String kind, String name, Work work)
            throws ProblemException, StoppedException {
        Optional<Projection> table = table(archive, kind);
        Optional<Column> column = column(archive, kind, name);
        if (table.isEmpty() || column.isEmpty()) {
            return Optional.empty();
        }
        Values known = values.get(kind + ":" + name);
        if (known == null) {
            known = Values.read(archive, register, kind, table.get(), column.get(), TEXTS.of("reading"), work);
            values.put(kind + ":" + name, known);
        }
        return Optional.of(known);
    }

    /** Whether the input plays the role of its own kind: a scan that is fitted, not one taken as reference. */
    private boolean asItself(Link link) {
        return link.role().equals(register.kind(link.to()).orElse(""));
    }

    private boolean newer(Hash one, Hash other) {
        return register.place(one) > register.place(other);
    }

    /** First row of a record in its kind's first table. */
    public Row row(Hash record) {
        return line(record).row();
    }

    /** First row of a record and its label. */
    synchronized Page.Line line(Hash record) {
        String kind = register.kind(record).orElse("");
        if (register.size(kind) <= WHOLE && loaded.add(kind)) {
            load(kind);
        }
        Page.Line known = whole.getOrDefault(record, some.get(record));
        if (known == null) {
            known = read(record);
            some.put(record, known);
        }
        return known;
    }

    /** Reads rows of records of one kind in as few questions as their places allow. */
    synchronized void ready(String kind, List<Hash> records) {
        List<Hash> missing = records.stream()
                .filter(record -> !whole.containsKey(record) && !some.containsKey(record))
                .toList();
        if (missing.size() < 4 || register.size(kind) <= WHOLE) {
            return;
        }
        long first = entry(missing, false);
        long last = entry(missing, true);
        if (last - first <= (long) NEAR * missing.size()) {
            between(kind, first, last, missing.size());
        }
    }

    private long entry(List<Hash> records, boolean last) {
        int place = records.stream()
                .mapToInt(register::place)
                .reduce((a, b) -> last ? Math.max(a, b) : Math.min(a, b))
                .orElse(0);
        String kind = register.kind(records.get(0)).orElse("");
        return archive.recorded(register.record(kind, place))
                .map(Archive.Recorded::n)
                .orElse(0L);
    }

    private void between(String kind, long first, long last, int count) {
        Optional<Projection> table = table(archive, kind);
        Optional<Page.Key> after = Optional.of(new Page.Key(Optional.empty(), first - 1, Integer.MAX_VALUE));
        try {
            while (table.isPresent() && after.isPresent() && after.get().n() < last) {
                Page page = archive.list(new Listing(
                        table.get().name(),
                        List.of(),
                        false,
                        List.of(),
                        Optional.empty(),
                        "n",
                        false,
                        after,
                        Math.min(1_000, count + 1)));
                page.rows().forEach(line -> some.putIfAbsent(line.record(), line));
                after = page.last();
            }
        } catch (ProblemException e) {
            throw new IllegalStateException("a declared table cannot be read: " + table.map(Projection::name), e);
        }
    }

    private void load(String kind) {
        Optional<Projection> table = table(archive, kind);
        Optional<Page.Key> after = Optional.empty();
        try {
            do {
                if (table.isEmpty()) {
                    return;
                }
                Page page = archive.list(new Listing(
                        table.get().name(), List.of(), false, List.of(), Optional.empty(), "n", false, after, WHOLE));
                page.rows().forEach(line -> whole.putIfAbsent(line.record(), line));
                after = page.last();
            } while (after.isPresent());
        } catch (ProblemException e) {
            throw new IllegalStateException("a declared table cannot be read: " + table.map(Projection::name), e);
        }
    }

    private Page.Line read(Hash record) {
        Optional<RecordView> view = archive.record(record);
        Row row = view.flatMap(at -> archive.kinds()
                        .get(at.head().kind())
                        .flatMap(kind -> kind.projections().stream()
                                .findFirst()
                                .flatMap(table -> kind.rows(table, at, archive.inputs(record))
                                        .findFirst())))
                .orElseGet(() -> new Row(Map.of()));
        return new Page.Line(record, 0, archive.label(record), row);
    }

    /** Columns that can be shown for a kind: its own, then those of the linked kinds. */
    static List<String> offered(Archive archive, String kind, List<String> joins) {
        List<String> offered = new ArrayList<>();
        for (String join : concat("", joins)) {
            String other = join.isEmpty() ? kind : Spec.of(join + ":x").kind(kind);
            table(archive, other).stream()
                    .flatMap(table -> table.columns().stream())
                    .filter(column -> column.deviationOf().isEmpty() && column.sort() != Column.Sort.HASH)
                    .forEach(column -> offered.add(join.isEmpty() ? column.name() : join + ":" + column.name()));
        }
        return offered;
    }

    private static List<String> concat(String first, List<String> others) {
        List<String> all = new ArrayList<>(Arrays.asList(first));
        all.addAll(others);
        return all;
    }
}
