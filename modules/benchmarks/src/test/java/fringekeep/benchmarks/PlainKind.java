package fringekeep.benchmarks;

import fringekeep.archive.json.JsonObject;
import fringekeep.archive.kind.Inputs;
import fringekeep.archive.kind.Kinds;
import fringekeep.archive.kind.Parts;
import fringekeep.archive.kind.RecordKind;
import fringekeep.archive.kind.RecordView;
import fringekeep.archive.kind.Role;
import fringekeep.archive.kind.Title;
import fringekeep.archive.listing.Column;
import fringekeep.archive.listing.Projection;
import fringekeep.archive.listing.Row;
import fringekeep.archive.problem.Problem;
import fringekeep.archive.record.KindName;
import fringekeep.archive.record.PartName;
import java.util.List;
import java.util.Map;
import java.util.Set;
import java.util.stream.Stream;

/** A kind with a label, a number and a list, so that an archive of many records is made in minutes; invented. */
record PlainKind(String name) implements RecordKind {
    /** Kinds of the chain that the benchmarks need. */
    static Kinds all() {
        return new Kinds(Stream.of("setup", "scan", "fit", "property")
                .map(PlainKind::new)
                .toList());
    }

    @Override
    public KindName kind() {
        return new KindName(name);
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
        return List.of(Role.anyKind("scan", 0, 9), Role.anyKind("setup", 0, 9), Role.anyKind("fit", 0, 1_000));
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
    public List<Projection> projections() {
        return List.of(new Projection(
                name + "_list",
                kind(),
                List.of(Column.text("label", "label"), Column.real("value_m", "value", "m", "nm")),
                List.of(List.of("value_m"))));
    }

    @Override
    public Stream<Row> rows(Projection projection, RecordView record, Inputs inputs) {
        return Stream.of(new Row(Map.of(
                "label", record.content().text("label").orElseThrow(),
                "value_m", record.content().number("value").orElseThrow())));
    }

    @Override
    public Title title(RecordView record, Inputs inputs) {
        return new Title(record.content().text("label").orElseThrow(), "");
    }

    @Override
    public Stream<String> words(RecordView record) {
        return record.content().text("label").stream();
    }
}
