package fringekeep.instrument;

import fringekeep.archive.Archive;
import fringekeep.archive.graph.Graph;
import fringekeep.archive.graph.StateName;
import fringekeep.archive.listing.Listing;
import fringekeep.archive.listing.Page;
import fringekeep.archive.problem.ProblemException;
import fringekeep.archive.record.Hash;
import fringekeep.archive.record.ThingId;
import java.time.Instant;
import java.util.LinkedHashSet;
import java.util.List;
import java.util.Optional;
import java.util.Set;

/**
 * Which calibrations hold at an instant: for every calibration that was ever recorded, the segment of its thing at that instant
 * (record format 1, section 7), if it is valid then and not withdrawn. Two records that claim the same place are a problem
 * that names them; a judgement that prefers one ends it.
 */
public final class CurrentCalibrations {
    private static final int PAGE = 1000;

    private CurrentCalibrations() {}

    /**
     * Calibrations of one target that hold at an instant, oldest record first.
     *
     * @param what code of the target, such as {@code power-scale}
     * @param subject the device meant; empty = any
     */
    public static List<Hash> at(Archive archive, Instant instant, String what, Optional<String> subject)
            throws ProblemException {
        Listing.Filter only = new Listing.Filter("what", Listing.Comparison.IS, what);
        return holding(archive, instant, List.of(only)).stream()
                .filter(found -> facet(archive, found)
                        .filter(calibration -> calibration.target().code().equals(what))
                        .filter(calibration -> subject.isEmpty() || subject.equals(calibration.subject()))
                        .isPresent())
                .toList();
    }

    /** All calibrations that hold at an instant, oldest record first. */
    public static List<Hash> at(Archive archive, Instant instant) throws ProblemException {
        return holding(archive, instant, List.of());
    }

    private static List<Hash> holding(Archive archive, Instant instant, List<Listing.Filter> filters)
            throws ProblemException {
        Graph graph = archive.graph();
        Set<Hash> holding = new LinkedHashSet<>();
        for (ThingId thing : things(archive, filters)) {
            Optional<Hash> at = graph.at(thing, instant);
            if (at.isEmpty()) {
                throw disputed(archive, graph, thing);
            }
            Hash segment = at.get();
            if (!graph.states(segment).contains(StateName.WITHDRAWN)
                    && facet(archive, segment)
                            .filter(found -> found.holds(instant))
                            .isPresent()) {
                holding.add(segment);
            }
        }
        return List.copyOf(holding);
    }

    /** A calibration begins at no instant unless it follows another, so no segment at all means a dispute. */
    private static ProblemException disputed(Archive archive, Graph graph, ThingId thing) {
        String names = String.join(
                ", ", graph.records(thing).stream().map(archive::label).toList());
        return new ProblemException(Trouble.at("calibration-disputed", "", names));
    }

    private static Set<ThingId> things(Archive archive, List<Listing.Filter> filters) throws ProblemException {
        Set<ThingId> things = new LinkedHashSet<>();
        Optional<Page.Key> after = Optional.empty();
        do {
            Page page = archive.list(new Listing(
                    CalibrationKind.TABLE_NAME, filters, true, List.of(), Optional.empty(), "n", false, after, PAGE));
            for (Page.Line line : page.rows()) {
                archive.record(line.record())
                        .ifPresent(record -> things.add(record.head().thing()));
            }
            after = page.last();
        } while (after.isPresent());
        return things;
    }

    private static Optional<CalibrationFacet> facet(Archive archive, Hash fingerprint) {
        return archive.record(fingerprint).flatMap(record -> CalibrationReader.read(record.content()));
    }
}
