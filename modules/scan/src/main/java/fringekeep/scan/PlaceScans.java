package fringekeep.scan;

import fringekeep.archive.Archive;
import fringekeep.archive.NewRecord;
import fringekeep.archive.Prepared;
import fringekeep.archive.graph.Graph;
import fringekeep.archive.graph.StateName;
import fringekeep.archive.json.JsonObject;
import fringekeep.archive.kind.RecordView;
import fringekeep.archive.problem.Problem;
import fringekeep.archive.problem.ProblemException;
import fringekeep.archive.problem.Work;
import fringekeep.archive.record.AboutReference;
import fringekeep.archive.record.Hash;
import fringekeep.archive.record.PartName;
import fringekeep.archive.record.PersonId;
import fringekeep.archive.record.ThingId;
import fringekeep.scan.internal.problem.ScanProblems;
import java.util.ArrayList;
import java.util.EnumMap;
import java.util.HashSet;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import java.util.OptionalInt;
import java.util.Set;

/**
 * Places many scans in one act. A scan that is placed already gets a correction of its placement; a placement that would say
 * the same again is left as it is. All are examined before the first is recorded; up to 100 are one transaction.
 */
public final class PlaceScans {
    private static final int TRANSACTION = 100;

    private final Archive archive;

    /** Places scans of an archive. */
    public PlaceScans(Archive archive) {
        this.archive = archive;
    }

    /**
     * Where one scan belongs.
     *
     * @param scan the scan
     * @param purpose what it was taken for
     * @param setup the setup, any record of its thing
     * @param run the source run
     * @param velocities velocity records
     * @param series the series
     * @param step its step, from 0; only beside a series
     * @param batch the batch, only where the run names none or several
     * @param remark words
     */
    public record Place(
            Hash scan,
            PlacementFacet.Purpose purpose,
            Hash setup,
            Optional<Hash> run,
            List<Hash> velocities,
            Optional<Hash> series,
            OptionalInt step,
            Optional<Hash> batch,
            Optional<String> remark) {
        /** Copies. */
        public Place {
            velocities = List.copyOf(velocities);
        }
    }

    /**
     * Places scans.
     *
     * @return the placement of each, in order; new, or the one that said the same
     * @throws ProblemException all that is wrong with any of them; nothing is stored then
     */
    public List<Hash> place(List<Place> places, PersonId person) throws ProblemException {
        return place(places, person, Work.QUIET);
    }

    /**
     * Places scans with progress. Stopping while they are examined stores nothing; stopping while they are recorded keeps what
     * is recorded.
     *
     * @return the placement of each, in order; when stopped, of those at the begin that are done
     * @throws ProblemException all that is wrong with any of them; nothing is stored then
     */
    public List<Hash> place(List<Place> places, PersonId person, Work work) throws ProblemException {
        Graph graph = archive.graph();
        Set<ThingId> things = new HashSet<>();
        List<Problem> problems = new ArrayList<>();
        List<Hash> placements = new ArrayList<>();
        List<Prepared> fresh = new ArrayList<>();
        for (Place place : places) {
            if (work.stopped()) {
                return List.of();
            }
            try {
                RecordView scan = scan(place.scan());
                if (!things.add(scan.head().thing())) {
                    throw new ProblemException(
                            ScanProblems.of("placement.scan-twice", "", archive.label(place.scan())));
                }
                Optional<RecordView> before = current(scan, graph);
                if (before.isPresent() && says(before.get(), place)) {
                    placements.add(before.get().fingerprint());
                } else {
                    Prepared prepared = archive.prepare(request(place, before, person), List.of());
                    fresh.add(prepared);
                    placements.add(prepared.fingerprint());
                }
            } catch (ProblemException e) {
                e.problems().forEach(problem -> problems.add(located(problem, place)));
            }
            work.progress(things.size(), places.size(), "examined");
        }
        if (!problems.isEmpty()) {
            throw new ProblemException(problems);
        }
        return record(placements, fresh, work);
    }

    /** What placing a scan would do. */
    public enum Effect {
        /** The scan gets its first placement. */
        PLACES,
        /** Its placement is corrected. */
        CORRECTS,
        /** Its placement says the same already; nothing is recorded. */
        KEEPS,
        /** Several placements of the scan are in dispute; it is refused. */
        DISPUTED
    }

    /**
     * What would become of one place.
     *
     * @param effect what placing would do
     * @param before the placement that stands now
     * @param outdated records that a correction would make outdated, in order of dependence
     */
    public record Foreseen(Effect effect, Optional<RecordView> before, List<Hash> outdated) {
        /** Copies. */
        public Foreseen {
            outdated = List.copyOf(outdated);
        }
    }

    /**
     * Foresees what placing would do, and stores nothing.
     *
     * @return one answer a place, in order
     * @throws ProblemException if one of them names no scan
     */
    public List<Foreseen> foresee(List<Place> places) throws ProblemException {
        Graph graph = archive.graph();
        List<Foreseen> foreseen = new ArrayList<>();
        for (Place place : places) {
            List<RecordView> before = placements(archive, graph, scan(place.scan()));
            if (before.size() > 1) {
                foreseen.add(new Foreseen(Effect.DISPUTED, Optional.empty(), List.of()));
            } else if (before.isEmpty()) {
                foreseen.add(new Foreseen(Effect.PLACES, Optional.empty(), List.of()));
            } else if (says(before.get(0), place)) {
                foreseen.add(new Foreseen(Effect.KEEPS, Optional.of(before.get(0)), List.of()));
            } else {
                foreseen.add(new Foreseen(
                        Effect.CORRECTS,
                        Optional.of(before.get(0)),
                        wouldOutdate(graph, before.get(0).fingerprint())));
            }
        }
        return foreseen;
    }

    private static List<Hash> wouldOutdate(Graph graph, Hash placement) {
        return graph.downstream(placement).stream()
                .filter(record -> !graph.states(record).contains(StateName.CORRECTED))
                .filter(record -> !graph.states(record).contains(StateName.OUTDATED))
                .toList();
    }

    private List<Hash> record(List<Hash> placements, List<Prepared> fresh, Work work) throws ProblemException {
        for (int from = 0; from < fresh.size(); from += TRANSACTION) {
            if (work.stopped()) {
                return placements.subList(0, placements.indexOf(fresh.get(from).fingerprint()));
            }
            archive.record(fresh.subList(from, Math.min(from + TRANSACTION, fresh.size())));
            work.progress(Math.min(from + TRANSACTION, fresh.size()), fresh.size(), "placed");
        }
        return placements;
    }

    private Problem located(Problem problem, Place place) {
        return problem.at((archive.label(place.scan()) + " " + problem.where()).strip());
    }

    private RecordView scan(Hash hash) throws ProblemException {
        Optional<RecordView> view = archive.record(hash);
        if (view.isEmpty() || !view.get().head().kind().equals(ScanKind.NAME)) {
            throw new ProblemException(ScanProblems.of("placement.scan-kind", "", archive.label(hash)));
        }
        return view.get();
    }

    /** The current placement of a scan. */
    private Optional<RecordView> current(RecordView scan, Graph graph) throws ProblemException {
        List<RecordView> placements = placements(archive, graph, scan);
        if (placements.size() > 1) {
            List<String> labels = placements.stream()
                    .map(placement -> archive.label(placement.fingerprint()))
                    .toList();
            throw new ProblemException(ScanProblems.of(
                    "placement.disputed", "", archive.label(scan.fingerprint()), String.join(", ", labels)));
        }
        return placements.stream().findFirst();
    }

    /** Current placements of a scan's thing: none, one, or several in dispute. */
    public static List<RecordView> placements(Archive archive, Graph graph, RecordView scan) {
        return graph.speakingOf(scan.fingerprint()).stream()
                .distinct()
                .map(archive::record)
                .flatMap(Optional::stream)
                .filter(record -> record.head().kind().equals(PlacementKind.NAME))
                .filter(record -> graph.current(record.fingerprint())
                        .map(record.fingerprint()::equals)
                        .orElse(true))
                .toList();
    }

    private static NewRecord request(Place place, Optional<RecordView> before, PersonId person) {
        Map<PartName, JsonObject> parts = new EnumMap<>(PartName.class);
        parts.put(PartName.CONTENT, content(place));
        place.remark().ifPresent(words -> parts.put(PartName.REMARK, JsonObject.EMPTY.with("text", words)));
        return new NewRecord(
                PlacementKind.NAME,
                List.of(),
                about(place),
                parts,
                List.of(),
                before.map(RecordView::fingerprint),
                Optional.empty(),
                Optional.of(person));
    }

    private static JsonObject content(Place place) {
        JsonObject content = JsonObject.EMPTY.with("purpose", place.purpose().text());
        return place.step().isPresent() ? content.with("step", place.step().getAsInt()) : content;
    }

    private static List<AboutReference> about(Place place) {
        List<AboutReference> about = new ArrayList<>();
        about.add(thing("scan", place.scan()));
        about.add(thing("setup", place.setup()));
        place.run().ifPresent(run -> about.add(thing("run", run)));
        place.velocities().forEach(velocity -> about.add(thing("velocity", velocity)));
        place.series().ifPresent(series -> about.add(thing("series", series)));
        place.batch().ifPresent(batch -> about.add(thing("batch", batch)));
        return about;
    }

    private static AboutReference thing(String role, Hash record) {
        return new AboutReference(role, record, AboutReference.Reach.THING);
    }

    private boolean says(RecordView before, Place place) {
        return place.remark().isEmpty()
                && before.content().equals(content(place))
                && things(before.head().about()).equals(things(about(place)));
    }

    private List<String> things(List<AboutReference> about) {
        return about.stream()
                .map(reference -> reference.role() + " "
                        + archive.record(reference.record())
                                .map(record -> record.head().thing().hex())
                                .orElse(reference.record().hex()))
                .sorted()
                .toList();
    }
}
