package fringekeep.archive.internal.store;

import fringekeep.archive.internal.store.Arrival.ArrivingPayload;
import fringekeep.archive.internal.store.projection.ProjectedRow;
import fringekeep.archive.kind.Inputs;
import fringekeep.archive.kind.Kinds;
import fringekeep.archive.kind.RecordKind;
import fringekeep.archive.kind.RecordView;
import fringekeep.archive.listing.Projection;
import fringekeep.archive.listing.Row;
import fringekeep.archive.record.Hash;
import fringekeep.archive.record.Head;
import java.util.ArrayList;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import java.util.Set;

/** Works out what is written with a record, with the help of its kind, outside any transaction. */
final class Arriving {
    private final Kinds kinds;
    private final Views views;

    Arriving(Kinds kinds, Views views) {
        this.kinds = kinds;
        this.views = views;
    }

    /** The record with words and rows; both empty for kinds or schemas this program does not know. */
    Arrival arrival(
            Hash fingerprint, Head head, byte[] headBytes, Map<Hash, byte[]> parts, List<ArrivingPayload> payloads) {
        Optional<RecordView> view = views.view(fingerprint);
        Optional<RecordKind> kind = known(head);
        if (view.isEmpty() || kind.isEmpty()) {
            return new Arrival(fingerprint, head, headBytes, parts, payloads, Set.of(), List.of());
        }
        return new Arrival(
                fingerprint,
                head,
                headBytes,
                parts,
                payloads,
                Words.of(kind.get().words(view.get())),
                rows(kind.get(), view.get(), views.inputs(fingerprint)));
    }

    /** The kind, if this program can read records of that schema number. */
    Optional<RecordKind> known(Head head) {
        return kinds.get(head.kind()).filter(kind -> head.schema() <= kind.schema());
    }

    /** Words of a stored record as they are now. */
    Set<String> words(Hash fingerprint, Head head) {
        return known(head)
                .flatMap(kind -> views.view(fingerprint).map(view -> Words.of(kind.words(view))))
                .orElse(Set.of());
    }

    /** Rows of a stored record in all its projections. */
    List<ProjectedRow> rows(Hash fingerprint, Head head) {
        return known(head)
                .flatMap(kind -> views.view(fingerprint).map(view -> rows(kind, view, views.inputs(fingerprint))))
                .orElse(List.of());
    }

    /** Rows of a stored record in one projection. */
    List<ProjectedRow> rows(String projection, Hash fingerprint, Head head) {
        return rows(fingerprint, head).stream()
                .filter(row -> row.projection().equals(projection))
                .toList();
    }

    private static List<ProjectedRow> rows(RecordKind kind, RecordView view, Inputs inputs) {
        List<ProjectedRow> rows = new ArrayList<>();
        for (Projection projection : kind.projections()) {
            int seq = 0;
            for (Row row : kind.rows(projection, view, inputs).toList()) {
                rows.add(new ProjectedRow(projection.name(), seq++, row));
            }
        }
        return rows;
    }
}
