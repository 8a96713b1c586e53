package fringekeep.scan.ui;

import fringekeep.archive.json.JsonObject;
import fringekeep.archive.kind.Computation;
import fringekeep.archive.kind.Inputs;
import fringekeep.archive.kind.Parts;
import fringekeep.archive.kind.RecordKind;
import fringekeep.archive.kind.RecordView;
import fringekeep.archive.kind.Role;
import fringekeep.archive.kind.Title;
import fringekeep.archive.listing.Projection;
import fringekeep.archive.listing.Row;
import fringekeep.archive.problem.Problem;
import fringekeep.archive.record.KindName;
import fringekeep.archive.record.PartName;
import java.util.List;
import java.util.Optional;
import java.util.Set;
import java.util.stream.Stream;

/** A kind that rests on placements, as later stages do. */
final class LeaningKind implements RecordKind {
    static final KindName NAME = new KindName("leaning");

    @Override
    public KindName kind() {
        return NAME;
    }

    @Override
    public int schema() {
        return 1;
    }

    @Override
    public JsonObject jsonSchema(int number) {
        return JsonObject.EMPTY.with("type", "object");
    }

    @Override
    public Set<PartName> sealedParts() {
        return Set.of(PartName.WHO, PartName.REMARK);
    }

    @Override
    public List<Role> inputRoles() {
        return List.of(Role.of("placement", "placement", 1, 10));
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
    public Optional<Computation> computation() {
        return Optional.empty();
    }

    @Override
    public <T> Optional<T> facet(Class<T> facet, RecordView record, Inputs inputs) {
        return Optional.empty();
    }

    @Override
    public List<Projection> projections() {
        return List.of();
    }

    @Override
    public Stream<Row> rows(Projection projection, RecordView record, Inputs inputs) {
        return Stream.empty();
    }

    @Override
    public Title title(RecordView record, Inputs inputs) {
        return new Title("leaning", "");
    }
}
