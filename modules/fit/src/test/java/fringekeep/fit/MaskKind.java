package fringekeep.fit;

import fringekeep.archive.json.JsonDocument;
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
import fringekeep.archive.problem.ProblemException;
import fringekeep.archive.record.KindName;
import fringekeep.archive.record.PartName;
import java.nio.charset.StandardCharsets;
import java.util.List;
import java.util.Set;
import java.util.stream.Stream;

/** Judgements as far as a fit reads them: content and targets, without the rules of the real kind. */
final class MaskKind implements RecordKind {
    @Override
    public KindName kind() {
        return new KindName("judgement");
    }

    @Override
    public int schema() {
        return 1;
    }

    @Override
    public JsonObject jsonSchema(int number) {
        String schema = "{\"type\":\"object\",\"properties\":{\"content\":{\"type\":\"object\"}}}";
        try {
            return (JsonObject)
                    JsonDocument.read(schema.getBytes(StandardCharsets.UTF_8)).value();
        } catch (ProblemException e) {
            throw new IllegalStateException(e);
        }
    }

    @Override
    public Set<PartName> sealedParts() {
        return Set.of(PartName.WHO, PartName.REMARK);
    }

    @Override
    public List<Role> inputRoles() {
        return List.of();
    }

    @Override
    public List<Role> aboutRoles() {
        return List.of(Role.anyKind("target", 1, 100));
    }

    @Override
    public List<Problem> examine(Parts parts, Inputs inputs) {
        return List.of();
    }

    @Override
    public List<Projection> projections() {
        return List.of();
    }

    @Override
    public Stream<Row> rows(Projection projection, RecordView record, Inputs inputs) {
        return Stream.of();
    }

    @Override
    public Title title(RecordView record, Inputs inputs) {
        return new Title("mask", "");
    }
}
