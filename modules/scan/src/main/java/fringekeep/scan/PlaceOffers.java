package fringekeep.scan;

import fringekeep.archive.Archive;
import fringekeep.archive.facet.TimeSpan;
import fringekeep.archive.graph.Graph;
import fringekeep.archive.graph.StateName;
import fringekeep.archive.json.JsonObject;
import fringekeep.archive.kind.RecordView;
import fringekeep.archive.kind.Title;
import fringekeep.archive.record.AboutReference;
import fringekeep.archive.record.Hash;
import fringekeep.scan.PlacementFacet.Purpose;
import java.time.Instant;
import java.util.ArrayList;
import java.util.Comparator;
import java.util.List;
import java.util.Optional;
import java.util.OptionalInt;
import java.util.Set;

/**
 * What can be said of where scans belong, and what is offered: the source run that was open when the first scan began, and the
 * rest as the placed scan before it has it. Asks the archive; stores nothing.
 */
public final class PlaceOffers {
    private static final int PAGE = 10_000;
    private static final Set<StateName> PASSED_OVER =
            Set.of(StateName.CORRECTED, StateName.WITHDRAWN, StateName.DISPUTED);

    private final Archive archive;
    private final Graph graph;

    /** Offers from an archive as it stands now. */
    public PlaceOffers(Archive archive) {
        this.archive = archive;
        this.graph = archive.graph();
    }

    /**
     * A record that can be named.
     *
     * @param record fingerprint
     * @param words label and title: {@code source run 4, oven 569 °C}
     */
    public record Offer(Hash record, String words) {}

    /**
     * A step of a series.
     *
     * @param words value or name as planned
     * @param purpose what scans of the step are taken for, where the series says it
     */
    public record Step(String words, Optional<Purpose> purpose) {}

    /**
     * What the placement of one scan says beside the records it shares with others.
     *
     * @param purpose purpose
     * @param step step of the series
     * @param series series, as it stands now
     */
    public record Placed(Purpose purpose, OptionalInt step, Optional<Hash> series) {}

    /** How a scan is placed now; empty when it is not, or in dispute. */
    public Optional<Placed> placed(Hash scan) {
        return placement(scan)
                .map(placement -> new Placed(
                        placement.content().text("purpose").flatMap(Purpose::of).orElse(Purpose.SIGNAL),
                        placement.content().integer("step").isPresent()
                                ? OptionalInt.of((int)
                                        placement.content().integer("step").getAsLong())
                                : OptionalInt.empty(),
                        now(placement, "series")));
    }

    /** Where the offered values come from. */
    public enum Whence {
        /** The scan has them itself: it is placed. */
        ITSELF,
        /** A placed scan before it. */
        NEIGHBOUR,
        /** The newest records, for lack of a placed scan. */
        NEWEST
    }

    /**
     * What is offered for scans.
     *
     * @param whence where it comes from
     * @param neighbour the placed scan it comes from
     * @param purpose purpose
     * @param setup setup; empty when there is none in the archive
     * @param run source run
     * @param runByTime whether the run was found by the time of the scan
     * @param velocities velocities
     * @param series series
     * @param step step of the first scan
     * @param batch batch, only where the run names none or several
     */
    public record Offered(
            Whence whence,
            Optional<Hash> neighbour,
            Purpose purpose,
            Optional<Hash> setup,
            Optional<Hash> run,
            boolean runByTime,
            List<Hash> velocities,
            Optional<Hash> series,
            OptionalInt step,
            Optional<Hash> batch) {
        /** Copies. */
        public Offered {
            velocities = List.copyOf(velocities);
        }
    }

    /** Current records of a kind that can be named, the newest first. */
    public List<Offer> offers(String kind) {
        List<Offer> offers = new ArrayList<>();
        for (RecordView record : records(kind)) {
            offers.add(new Offer(record.fingerprint(), words(record)));
        }
        return offers;
    }

    private List<RecordView> records(String kind) {
        return all(kind).stream()
                .filter(record -> graph.states(record).stream().noneMatch(PASSED_OVER::contains))
                .map(archive::record)
                .flatMap(Optional::stream)
                .sorted(Comparator.comparingLong((RecordView record) -> recorded(record.fingerprint()))
                        .reversed())
                .toList();
    }

    private List<Hash> all(String kind) {
        List<Hash> records = new ArrayList<>();
        List<Hash> page = archive.records(kind, 1, PAGE);
        while (!page.isEmpty()) {
            records.addAll(page);
            long last = recorded(page.get(page.size() - 1));
            page = page.size() < PAGE ? List.of() : archive.records(kind, last + 1, PAGE);
        }
        return records;
    }

    private long recorded(Hash record) {
        return archive.recorded(record).map(Archive.Recorded::n).orElse(0L);
    }

    private String words(RecordView record) {
        String label = archive.label(record.fingerprint());
        String title = archive.kinds()
                .get(record.head().kind())
                .map(kind -> kind.title(record, archive.inputs(record.fingerprint())))
                .map(Title::text)
                .orElse("");
        return title.isEmpty() ? label : label + ", " + title;
    }

    /** Steps of a series in planned order. */
    public List<Step> steps(Hash series) {
        List<JsonObject> steps = archive.record(series)
                .map(record -> record.content().array("steps").objects())
                .orElse(List.of());
        return steps.stream().map(PlaceOffers::step).toList();
    }

    private static Step step(JsonObject json) {
        String words = json.object("quantity")
                .map(quantity -> Settings.of("", quantity).shown())
                .or(() -> json.text("name"))
                .orElse("");
        return new Step(words, json.text("purpose").flatMap(Purpose::of));
    }

    /** Batches that a source run names; with exactly one, placements name none. */
    public List<Hash> batches(Hash run) {
        return archive.record(run).map(record -> targets(record, "batch")).orElse(List.of());
    }

    /** Current velocities that were measured in a source run. */
    public List<Hash> velocities(Hash run) {
        return records("velocity").stream()
                .filter(velocity -> targets(velocity, "run").stream().anyMatch(named -> sameThing(named, run)))
                .map(RecordView::fingerprint)
                .toList();
    }

    private boolean sameThing(Hash one, Hash other) {
        return thing(one).equals(thing(other));
    }

    private Optional<Object> thing(Hash record) {
        return archive.record(record).map(view -> view.head().thing());
    }

    private static List<Hash> targets(RecordView record, String role) {
        return record.head().about().stream()
                .filter(reference -> reference.role().equals(role))
                .map(AboutReference::record)
                .toList();
    }

    /**
     * What is offered for scans that are to be placed in one act.
     *
     * @param scans at least one, in order
     */
    public Offered offer(List<Hash> scans) {
        Hash first = scans.get(0);
        Optional<RecordView> own = placement(first);
        Optional<Hash> neighbour = own.isPresent() ? Optional.of(first) : placedBefore(first);
        Optional<RecordView> placed = neighbour.flatMap(this::placement);
        Optional<Hash> byTime = own.isPresent() ? Optional.empty() : runAt(first);
        Optional<Hash> before = placed.flatMap(record -> now(record, "run"));
        boolean sameRun = byTime.isEmpty() || byTime.equals(before);
        Optional<Hash> run = byTime.or(() -> before);
        Optional<Hash> series = placed.flatMap(record -> now(record, "series"));
        return new Offered(
                own.isPresent() ? Whence.ITSELF : placed.isPresent() ? Whence.NEIGHBOUR : Whence.NEWEST,
                placed.flatMap(record -> neighbour),
                placed.flatMap(record -> record.content().text("purpose"))
                        .flatMap(Purpose::of)
                        .orElse(Purpose.SIGNAL),
                placed.flatMap(record -> now(record, "setup")).or(() -> newest("setup")),
                run,
                byTime.isPresent(),
                sameRun
                        ? placed.map(record -> targets(record, "velocity")).orElse(List.of()).stream()
                                .flatMap(velocity -> graph.current(velocity).stream())
                                .toList()
                        : velocities(byTime.get()),
                series,
                placed.map(record -> step(record, series, own.isPresent())).orElse(OptionalInt.empty()),
                sameRun ? placed.flatMap(record -> now(record, "batch")) : Optional.empty());
    }

    private OptionalInt step(RecordView placed, Optional<Hash> series, boolean own) {
        if (series.isEmpty() || placed.content().integer("step").isEmpty()) {
            return OptionalInt.empty();
        }
        int step = (int) placed.content().integer("step").getAsLong();
        int next = own ? step : step + 1;
        return OptionalInt.of(next < steps(series.get()).size() ? next : 0);
    }

    private Optional<Hash> newest(String kind) {
        return records(kind).stream().findFirst().map(RecordView::fingerprint);
    }

    private Optional<Hash> now(RecordView placement, String role) {
        return targets(placement, role).stream().findFirst().flatMap(graph::current);
    }

    private Optional<RecordView> placement(Hash scan) {
        List<RecordView> placements = archive.record(scan)
                .map(record -> PlaceScans.placements(archive, graph, record))
                .orElse(List.of());
        return placements.size() == 1 ? Optional.of(placements.get(0)) : Optional.empty();
    }

    /** The placed scan recorded last before this one; else the one recorded next after it. */
    private Optional<Hash> placedBefore(Hash scan) {
        List<Hash> scans = all(ScanKind.NAME.text());
        int at = scans.indexOf(scan);
        for (int i = at - 1; i >= 0; i--) {
            if (placement(scans.get(i)).isPresent()) {
                return Optional.of(scans.get(i));
            }
        }
        return Optional.empty();
    }

    /** The source run that was open when a scan began. */
    private Optional<Hash> runAt(Hash scan) {
        Optional<Instant> begin = span(scan).map(span -> span.start().at());
        return begin.flatMap(at -> records("source-run").stream()
                .filter(run -> span(run.fingerprint())
                        .filter(span -> !span.start().at().isAfter(at))
                        .filter(span ->
                                span.end().map(end -> !end.at().isBefore(at)).orElse(true))
                        .isPresent())
                .map(RecordView::fingerprint)
                .findFirst());
    }

    private Optional<TimeSpan> span(Hash record) {
        return archive.record(record)
                .flatMap(view -> archive.kinds()
                        .get(view.head().kind())
                        .flatMap(kind -> kind.facet(TimeSpan.class, view, archive.inputs(record))));
    }
}
