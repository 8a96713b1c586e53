package fringekeep.desk.session;

import fringekeep.archive.Archive;
import fringekeep.archive.JournalLine;
import fringekeep.archive.graph.Graph;
import fringekeep.archive.graph.Graph.Link;
import fringekeep.archive.graph.Graph.LinkSort;
import fringekeep.archive.kind.RecordKind;
import fringekeep.archive.listing.Listing;
import fringekeep.archive.listing.Page;
import fringekeep.archive.listing.Projection;
import fringekeep.archive.problem.ProblemException;
import fringekeep.archive.record.Hash;
import fringekeep.archive.record.KindName;
import fringekeep.desk.look.Texts;
import java.time.Instant;
import java.time.LocalDate;
import java.util.ArrayDeque;
import java.util.Arrays;
import java.util.BitSet;
import java.util.Deque;
import java.util.HashMap;
import java.util.LinkedHashSet;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import java.util.Set;

/** Works out what is in view and keeps the last answer. Not to be used on the window thread. */
public final class Views {
    private static final Texts TEXTS = new Texts("fringekeep.desk.session.Texts", Views.class);
    private static final int PAGE = 1_000;

    private final Archive archive;
    private final Stops stops;
    private final Clock clock;
    private Optional<InView> last = Optional.empty();

    /** Views of an archive. */
    public Views(Archive archive, Stops stops) {
        this.archive = archive;
        this.stops = stops;
        this.clock = new Clock(archive.facts());
    }

    /** What is in view at a register. */
    public synchronized InView of(Register register, View view) throws ProblemException {
        Optional<InView> known =
                last.filter(one -> one.register() == register && one.view().equals(view));
        if (known.isPresent()) {
            return known.get();
        }
        InView now = read(register, view);
        last = Optional.of(now);
        return now;
    }

    private InView read(Register register, View view) throws ProblemException {
        String title = archive.facts().title();
        if (view instanceof View.Day day) {
            return within(register, view, day.day(), day.day(), Clock.words(day.day()), clock.boundaries());
        } else if (view instanceof View.Span span) {
            return within(
                    register,
                    view,
                    span.from(),
                    span.to(),
                    Clock.words(span.from(), span.to()),
                    TEXTS.of("view.days", span.days()));
        } else if (view instanceof View.Upstream upstream) {
            Set<Hash> records = new LinkedHashSet<>(register.graph().upstream(upstream.record()));
            records.add(upstream.record());
            leanOn(register, records, Set.of());
            return some(
                    register,
                    view,
                    records,
                    Names.shortLabel(archive.label(upstream.record()), clock),
                    TEXTS.of("view.upstream"));
        } else if (view instanceof View.Found found) {
            return some(register, view, found(found.words()), found.words(), TEXTS.of("view.found"));
        }
        String detail = archive.facts().invented() ? TEXTS.of("view.invented") : TEXTS.of("view.all");
        return new InView(view, register, Optional.empty(), title, detail);
    }

    private InView within(Register register, View view, LocalDate from, LocalDate to, String name, String detail) {
        Instant begin = clock.begin(from);
        Instant end = clock.begin(to.plusDays(1));
        Set<Hash> records = new LinkedHashSet<>();
        for (JournalLine line : archive.journalLines(begin, end)) {
            line.record().ifPresent(records::add);
        }
        leanOn(register, records, Set.copyOf(stops.entry("view", "also")));
        return some(register, view, records, name, detail);
    }

    /** Adds what records were made from or speak of, over any number of steps; only some kinds where kinds are told. */
    private static void leanOn(Register register, Set<Hash> records, Set<String> kinds) {
        Graph graph = register.graph();
        Deque<Hash> open = new ArrayDeque<>(records);
        Set<Hash> seen = new LinkedHashSet<>(records);
        while (!open.isEmpty()) {
            Hash record = open.removeFirst();
            for (Link link : graph.links(record)) {
                boolean leans =
                        link.from().equals(record) && (link.sort() == LinkSort.INPUT || link.sort() == LinkSort.ABOUT);
                Hash other =
                        link.sort() == LinkSort.ABOUT ? graph.current(link.to()).orElse(link.to()) : link.to();
                if (leans && register.kind(other).isPresent() && seen.add(other)) {
                    boolean counts = kinds.isEmpty()
                            || kinds.contains(register.kind(other).orElse(""));
                    if (counts) {
                        records.add(other);
                        open.add(other);
                    }
                }
            }
        }
    }

    private static InView some(Register register, View view, Set<Hash> records, String name, String detail) {
        Map<String, BitSet> places = new HashMap<>();
        for (Hash record : records) {
            register.kind(record)
                    .ifPresent(kind ->
                            places.computeIfAbsent(kind, key -> new BitSet()).set(register.place(record)));
        }
        return new InView(view, register, Optional.of(places), name, detail);
    }

    private Set<Hash> found(String words) throws ProblemException {
        List<String> all = Arrays.stream(words.split("\\s+"))
                .filter(word -> !word.isEmpty())
                .toList();
        Set<Hash> records = new LinkedHashSet<>();
        for (RecordKind kind : archive.kinds().all()) {
            records.addAll(found(archive, kind.kind().text(), all));
        }
        return records;
    }

    /** Records of a kind that all words find. */
    public static Set<Hash> found(Archive archive, String kind, List<String> words) throws ProblemException {
        Set<Hash> records = new LinkedHashSet<>();
        Optional<Projection> table = archive.kinds()
                .get(new KindName(kind))
                .flatMap(one -> one.projections().stream().findFirst());
        Optional<Page.Key> after = Optional.empty();
        do {
            if (table.isEmpty()) {
                return records;
            }
            Page page = archive.list(
                    new Listing(table.get().name(), List.of(), true, words, Optional.empty(), "n", false, after, PAGE));
            page.rows().forEach(line -> records.add(line.record()));
            after = page.last();
        } while (after.isPresent());
        return records;
    }

    /** Days with journal entries, newest first, and how many; of the newest entries only where there are very many. */
    public Map<LocalDate, Integer> days() {
        long watermark = archive.facts().watermark();
        Map<LocalDate, Integer> days = new java.util.TreeMap<>(java.util.Comparator.reverseOrder());
        for (long from = Math.max(1, watermark - 20 * PAGE + 1); from <= watermark; from += PAGE) {
            for (JournalLine line : archive.journalLines(from, PAGE)) {
                line.record().ifPresent(record -> days.merge(clock.day(line.at()), 1, Integer::sum));
            }
        }
        return days;
    }

    /**
     * When records of each kind in view were recorded; evenly spread picks where there are very many.
     *
     * @return for each stop places between 0 and 1 over the view's time
     */
    public List<double[]> ticks(InView now) {
        Map<String, List<Instant>> times = new HashMap<>();
        Instant first = Instant.MAX;
        Instant end = Instant.MIN;
        for (Stops.Stop stop : stops.all()) {
            List<Instant> found = times(now, stop.kind());
            times.put(stop.kind(), found);
            for (Instant at : found) {
                first = at.isBefore(first) ? at : first;
                end = at.isAfter(end) ? at : end;
            }
        }
        if (now.view() instanceof View.Day day) {
            first = clock.begin(day.day());
            end = clock.begin(day.day().plusDays(1));
        } else if (now.view() instanceof View.Span span) {
            first = clock.begin(span.from());
            end = clock.begin(span.to().plusDays(1));
        }
        double from = first.getEpochSecond();
        double length = Math.max(1, end.getEpochSecond() - from);
        return stops.all().stream()
                .map(stop -> times.getOrDefault(stop.kind(), List.of()).stream()
                        .mapToDouble(at -> (at.getEpochSecond() - from) / length)
                        .filter(at -> at >= 0 && at <= 1)
                        .toArray())
                .toList();
    }

    private List<Instant> times(InView now, String kind) {
        int size = now.register().size(kind);
        int[] shown = java.util.stream.IntStream.range(0, size)
                .filter(place -> now.contains(kind, place))
                .toArray();
        int step = Math.max(1, shown.length / 200);
        return java.util.stream.IntStream.range(0, shown.length)
                .filter(i -> i % step == 0)
                .mapToObj(i -> archive.recorded(now.register().record(kind, shown[i])))
                .flatMap(Optional::stream)
                .map(Archive.Recorded::at)
                .toList();
    }
}
