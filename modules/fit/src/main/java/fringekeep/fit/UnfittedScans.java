package fringekeep.fit;

import fringekeep.archive.Archive;
import fringekeep.archive.graph.Graph;
import fringekeep.archive.graph.StateName;
import fringekeep.archive.kind.RecordView;
import fringekeep.archive.listing.Listing;
import fringekeep.archive.listing.Page;
import fringekeep.archive.problem.ProblemException;
import fringekeep.archive.record.AboutReference;
import fringekeep.archive.record.Hash;
import fringekeep.archive.record.ThingId;
import fringekeep.scan.PlaceScans;
import fringekeep.scan.PlacementFacet.Purpose;
import java.time.Instant;
import java.util.ArrayList;
import java.util.List;
import java.util.Optional;
import java.util.Set;

/** Finds scans by a rule that have no current fit yet: all signals of a day, a series, a run. */
public final class UnfittedScans {
    private static final int PAGE = 1_000;

    private final Archive archive;

    /** Of an archive. */
    public UnfittedScans(Archive archive) {
        this.archive = archive;
    }

    /**
     * Which scans are meant; all conditions must hold.
     *
     * @param purposes purposes of their placements
     * @param from begin not before this instant
     * @param to begin before this instant
     * @param series any record of the series they are placed in
     * @param run any record of the source run
     * @param fittedToo whether scans that have a current fit are meant too
     */
    public record Rule(
            Set<Purpose> purposes,
            Optional<Instant> from,
            Optional<Instant> to,
            Optional<Hash> series,
            Optional<Hash> run,
            boolean fittedToo) {
        /** Copies. */
        public Rule {
            purposes = Set.copyOf(purposes);
        }
    }

    /** Current scans that answer the rule, not withdrawn, placed once, in the order of the journal. */
    public List<Hash> find(Rule rule) throws ProblemException {
        Graph graph = archive.graph();
        List<Hash> found = new ArrayList<>();
        Optional<Page.Key> after = Optional.empty();
        do {
            Page page = archive.list(listing(rule, after));
            for (Page.Line line : page.rows()) {
                if (answers(line.record(), rule, graph)) {
                    found.add(line.record());
                }
            }
            after = page.last();
        } while (after.isPresent());
        return found;
    }

    private static Listing listing(Rule rule, Optional<Page.Key> after) {
        List<Listing.Filter> filters = new ArrayList<>();
        rule.from().ifPresent(from -> filters.add(new Listing.Filter("started", Listing.Comparison.AT_LEAST, from)));
        rule.to().ifPresent(to -> filters.add(new Listing.Filter("started", Listing.Comparison.BELOW, to)));
        return new Listing("scan", filters, true, List.of(), Optional.empty(), "n", false, after, PAGE);
    }

    private boolean answers(Hash scan, Rule rule, Graph graph) {
        Optional<RecordView> record = archive.record(scan);
        if (record.isEmpty() || graph.states(scan).contains(StateName.WITHDRAWN)) {
            return false;
        }
        List<RecordView> placements = PlaceScans.placements(archive, graph, record.get());
        return placements.size() == 1
                && placed(placements.get(0), rule)
                && (rule.fittedToo() || SameQuestion.fits(archive, graph, scan).isEmpty());
    }

    private boolean placed(RecordView placement, Rule rule) {
        Optional<Purpose> purpose = placement.content().text("purpose").flatMap(Purpose::of);
        return purpose.filter(rule.purposes()::contains).isPresent()
                && names(placement, "series", rule.series())
                && names(placement, "run", rule.run());
    }

    private boolean names(RecordView placement, String role, Optional<Hash> wanted) {
        return wanted.isEmpty()
                || placement.head().about().stream()
                        .filter(reference -> reference.role().equals(role))
                        .map(AboutReference::record)
                        .map(this::thing)
                        .anyMatch(thing -> thing.isPresent() && thing.equals(thing(wanted.get())));
    }

    private Optional<ThingId> thing(Hash record) {
        return archive.record(record).map(each -> each.head().thing());
    }
}
