package fringekeep.archive.internal.store;

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
import fringekeep.archive.record.Hash;
import fringekeep.archive.record.KindName;
import fringekeep.archive.record.PartName;
import java.time.Instant;
import java.util.ArrayList;
import java.util.List;
import java.util.Map;
import java.util.Set;
import java.util.TreeMap;
import java.util.stream.Stream;

/** A kind for tests that takes any content and any roles, and lists some members of it. */
record OpenKind(String name, boolean extraColumn) implements RecordKind {
    private static final List<String> INPUTS =
            List.of("profile", "scan", "placement", "setup", "run", "batch", "compound", "evidence", "source");
    private static final List<String> ABOUT = List.of(
            "compound", "batch", "scan", "setup", "run", "target", "undoes", "chosen", "over", "subject", "signs");

    /** All kinds that the golden vectors need, and a note. */
    static Kinds all() {
        return kinds(false);
    }

    /** The same, their lists with one column more. */
    static Kinds later() {
        return kinds(true);
    }

    private static Kinds kinds(boolean extraColumn) {
        return new Kinds(Stream.of(
                        "compound",
                        "batch",
                        "setup",
                        "source-run",
                        "reading-profile",
                        "scan",
                        "placement",
                        "fit",
                        "judgement",
                        "note")
                .map(name -> new OpenKind(name, extraColumn))
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
        return Set.of(PartName.WHO, PartName.REMARK, PartName.IDENTITY);
    }

    @Override
    public boolean mayBeComputed() {
        return true;
    }

    @Override
    public List<Role> inputRoles() {
        List<Role> roles = new ArrayList<>();
        INPUTS.forEach(role -> roles.add(Role.anyKind(role, 0, 1_000)));
        roles.add(Role.ofRaw("raw", 0, 10));
        return roles;
    }

    @Override
    public List<Role> aboutRoles() {
        return ABOUT.stream().map(role -> Role.anyKind(role, 0, 1_000)).toList();
    }

    @Override
    public boolean mayContinue() {
        return true;
    }

    @Override
    public List<Problem> examine(Parts parts, Inputs inputs) {
        return List.of();
    }

    @Override
    public List<Projection> projections() {
        List<Column> columns = new ArrayList<>(List.of(
                Column.text("label", "label"),
                Column.real("size_m", "size", "m", "nm"),
                Column.integer("count", "count"),
                Column.instant("start", "start"),
                Column.flag("dusty", "dusty"),
                Column.hash("file", "file")));
        if (extraColumn) {
            columns.add(Column.text("twice", "label twice"));
        }
        return List.of(new Projection(table(), kind(), columns, List.of(List.of("label"), List.of("size_m"))));
    }

    String table() {
        return name.replace('-', '_') + "_list";
    }

    @Override
    public Stream<Row> rows(Projection projection, RecordView record, Inputs inputs) {
        JsonObject content = record.content();
        Map<String, Object> values = new TreeMap<>();
        content.text("label").ifPresent(label -> values.put("label", label));
        content.number("size").ifPresent(size -> values.put("size_m", size));
        content.integer("count").ifPresent(count -> values.put("count", count));
        content.text("start").ifPresent(start -> values.put("start", Instant.parse(start)));
        content.flag("dusty").ifPresent(dusty -> values.put("dusty", dusty));
        inputs.all().stream()
                .filter(input -> input.raw())
                .findFirst()
                .ifPresent(input -> values.put("file", input.target()));
        record.part(PartName.REMARK)
                .flatMap(remark -> remark.text("text"))
                .ifPresent(text -> values.putIfAbsent("label", text));
        if (extraColumn) {
            content.text("label").ifPresent(label -> values.put("twice", label + label));
        }
        return content.number("rows").orElse(1) > 1
                ? Stream.of(new Row(values), new Row(Map.of("label", "second row")))
                : Stream.of(new Row(values));
    }

    @Override
    public Title title(RecordView record, Inputs inputs) {
        return new Title(record.content().text("label").orElse(name), "");
    }

    @Override
    public Stream<String> words(RecordView record) {
        return Stream.concat(
                record.content().text("label").stream(),
                record.part(PartName.REMARK).flatMap(remark -> remark.text("text")).stream());
    }

    /** A hash that stands for nothing. */
    static Hash nowhere() {
        return new Hash("ab".repeat(32));
    }
}
