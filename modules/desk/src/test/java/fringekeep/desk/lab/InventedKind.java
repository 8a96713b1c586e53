package fringekeep.desk.lab;

import fringekeep.archive.facet.CountTable;
import fringekeep.archive.facet.TimeSpan;
import fringekeep.archive.json.JsonObject;
import fringekeep.archive.kind.Inputs;
import fringekeep.archive.kind.Parts;
import fringekeep.archive.kind.RecordKind;
import fringekeep.archive.kind.RecordView;
import fringekeep.archive.kind.Role;
import fringekeep.archive.kind.Title;
import fringekeep.archive.listing.Projection;
import fringekeep.archive.listing.Row;
import fringekeep.archive.problem.Problem;
import fringekeep.archive.record.Hash;
import fringekeep.archive.record.KindName;
import fringekeep.archive.record.PartName;
import fringekeep.drawing.Picture;
import java.util.HashMap;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import java.util.Set;
import java.util.stream.Stream;

/** A kind that answers what it was told about each record. */
final class InventedKind implements RecordKind {
    private final KindName name;
    private final Projection table;
    final Map<Hash, Title> titles = new HashMap<>();
    final Map<Hash, Row> rows = new HashMap<>();
    final Map<Hash, List<Picture>> pictures = new HashMap<>();
    final Map<Hash, CountTable> counts = new HashMap<>();
    final Map<Hash, TimeSpan> spans = new HashMap<>();

    InventedKind(String name, Projection table) {
        this.name = new KindName(name);
        this.table = table;
    }

    @Override
    public KindName kind() {
        return name;
    }

    @Override
    public int schema() {
        return 1;
    }

    @Override
    public JsonObject jsonSchema(int number) {
        return JsonObject.EMPTY;
    }

    @Override
    public Set<PartName> sealedParts() {
        return Set.of();
    }

    @Override
    public List<Role> inputRoles() {
        return List.of();
    }

    @Override
    public List<Role> aboutRoles() {
        return List.of();
    }

    @Override
    public List<Problem> examine(Parts parts, Inputs inputs) {
        return List.of();
    }

    @Override
    public <T> Optional<T> facet(Class<T> facet, RecordView record, Inputs inputs) {
        if (facet == CountTable.class) {
            return Optional.ofNullable(counts.get(record.fingerprint())).map(facet::cast);
        }
        if (facet == TimeSpan.class) {
            return Optional.ofNullable(spans.get(record.fingerprint())).map(facet::cast);
        }
        return Optional.empty();
    }

    @Override
    public List<Projection> projections() {
        return List.of(table);
    }

    @Override
    public Stream<Row> rows(Projection projection, RecordView record, Inputs inputs) {
        return Stream.ofNullable(rows.get(record.fingerprint()));
    }

    @Override
    public Title title(RecordView record, Inputs inputs) {
        return Optional.ofNullable(titles.get(record.fingerprint())).orElse(new Title("", ""));
    }

    @Override
    public List<Picture> drawings(RecordView record, Inputs inputs) {
        return pictures.getOrDefault(record.fingerprint(), List.of());
    }
}
