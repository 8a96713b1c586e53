package fringekeep.desk.chain;

import fringekeep.archive.Archive;
import fringekeep.archive.graph.StateName;
import fringekeep.archive.record.Hash;
import fringekeep.desk.session.Clock;
import fringekeep.desk.session.InView;
import fringekeep.desk.session.LinkedRecords;
import fringekeep.desk.session.Names;
import fringekeep.desk.session.Register;
import fringekeep.desk.session.Stops;
import java.util.ArrayList;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import java.util.Set;

/**
 * What the strip shows.
 *
 * @param selection number of the record in hand, empty if none
 * @param stops one per stop, left to right
 */
public record ChainState(String selection, List<StopState> stops) {
    /** Copies. */
    public ChainState {
        stops = List.copyOf(stops);
    }

    /**
     * What one stop shows.
     *
     * @param label its word
     * @param opens whether a line stands before it
     * @param count current records of its main kind
     * @param outdated how many of them are outdated
     * @param withdrawn how many are withdrawn
     * @param linked records linked with the selection, -1 when nothing is selected
     * @param here number of the selected record when it stands under this stop, else empty
     */
    public record StopState(
            String label, boolean opens, int count, int outdated, int withdrawn, int linked, String here) {}

    /** Works the strip out over what is in view; asks the archive for one label only. */
    public static ChainState of(Archive archive, InView inView, Stops stops, Optional<Hash> selected) {
        Register register = inView.register();
        Clock clock = new Clock(archive.facts());
        Set<Hash> linked =
                selected.map(record -> LinkedRecords.of(register, record)).orElseGet(Set::of);
        String kind = selected.flatMap(register::kind).orElse("");
        String number = selected.map(record -> Names.shortNumber(archive.label(record), kind, clock))
                .orElse("");
        List<StopState> states = new ArrayList<>();
        for (Stops.Stop stop : stops.all()) {
            int count = inView.current(stop.kind());
            long share = linked.stream()
                    .filter(record -> register.kind(record).orElse("").equals(stop.kind()))
                    .filter(inView::contains)
                    .count();
            states.add(new StopState(
                    stop.label(),
                    stop.opens(),
                    count,
                    inView.count(stop.kind(), StateName.OUTDATED),
                    inView.count(stop.kind(), StateName.WITHDRAWN),
                    selected.isPresent() ? (int) share : -1,
                    stop.kinds().contains(kind) ? number : ""));
        }
        return new ChainState(number, states);
    }

    /** Counts alone, while the graph is still being read. */
    public static ChainState counted(Archive archive, Stops stops) {
        Map<String, Long> counts = archive.counts();
        return new ChainState(
                "",
                stops.all().stream()
                        .map(stop -> new StopState(
                                stop.label(),
                                stop.opens(),
                                Math.toIntExact(counts.getOrDefault(stop.kind(), 0L)),
                                0,
                                0,
                                -1,
                                ""))
                        .toList());
    }

    /** An empty strip: the stops without any record. */
    public static ChainState empty(Stops stops) {
        return new ChainState(
                "",
                stops.all().stream()
                        .map(stop -> new StopState(stop.label(), stop.opens(), 0, 0, 0, -1, ""))
                        .toList());
    }
}
