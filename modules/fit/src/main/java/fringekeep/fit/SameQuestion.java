package fringekeep.fit;

import fringekeep.archive.Archive;
import fringekeep.archive.graph.Graph;
import fringekeep.archive.graph.Graph.Link;
import fringekeep.archive.graph.Graph.LinkSort;
import fringekeep.archive.kind.RecordView;
import fringekeep.archive.record.Hash;
import fringekeep.archive.record.ThingId;
import java.util.ArrayList;
import java.util.List;
import java.util.Optional;

/** Finds fits that were made of a scan. */
final class SameQuestion {
    private SameQuestion() {}

    /** Current fits that pin any record of a scan's thing under role scan. */
    static List<Hash> fits(Archive archive, Graph graph, Hash scan) {
        Optional<ThingId> thing =
                archive.record(scan).map(record -> record.head().thing());
        List<Hash> fits = new ArrayList<>();
        for (Hash record : thing.map(graph::records).orElse(List.of(scan))) {
            for (Link link : graph.links(record)) {
                boolean pins = link.sort() == LinkSort.INPUT
                        && link.to().equals(record)
                        && link.role().equals("scan");
                if (pins && current(archive, graph, link.from()) && !fits.contains(link.from())) {
                    fits.add(link.from());
                }
            }
        }
        return fits;
    }

    private static boolean current(Archive archive, Graph graph, Hash fit) {
        boolean kind = archive.record(fit)
                .map(RecordView::head)
                .filter(head -> head.kind().equals(FitKind.NAME))
                .isPresent();
        return kind && graph.current(fit).equals(Optional.of(fit));
    }
}
