package fringekeep.archive.making;

import fringekeep.archive.json.Json;
import fringekeep.archive.json.JsonArray;
import fringekeep.archive.json.JsonObject;
import fringekeep.archive.kind.Computation;
import fringekeep.archive.kind.Inputs;
import fringekeep.archive.kind.MethodId;
import fringekeep.archive.kind.Outcome;
import fringekeep.archive.kind.Parts;
import fringekeep.archive.kind.RecordKind;
import fringekeep.archive.kind.RecordView;
import fringekeep.archive.kind.Role;
import fringekeep.archive.kind.Title;
import fringekeep.archive.listing.Projection;
import fringekeep.archive.listing.Row;
import fringekeep.archive.problem.Problem;
import fringekeep.archive.problem.Work;
import fringekeep.archive.record.KindName;
import fringekeep.archive.record.PartName;
import java.util.List;
import java.util.Optional;
import java.util.Set;
import java.util.stream.Stream;

/** A kind for tests: any content, or choices with a number whose square is the result. */
public record DemoKind(
        String name, JsonObject schemaJson, List<Role> inputRoles, List<Role> aboutRoles, boolean mayContinue)
        implements RecordKind {
    public static DemoKind open(String name, List<Role> inputs, List<Role> about) {
        return new DemoKind(name, JsonObject.EMPTY.with("type", "object"), inputs, about, true);
    }

    /** With content {"length": quantity in metres, "label"?: text}. */
    public static DemoKind measured(String name) {
        JsonObject length = JsonObject.EMPTY
                .with("$ref", "common-1.schema.json#/$defs/quantity")
                .with("siUnit", "m")
                .with("usual", JsonObject.EMPTY.with("from", 1e-9).with("to", 10));
        JsonObject content = strict(JsonObject.EMPTY
                        .with("length", length)
                        .with("label", JsonObject.EMPTY.with("type", "string").with("maxLength", 5)))
                .with("required", JsonArray.of(Json.of("length")));
        JsonObject remark = strict(JsonObject.EMPTY.with("text", JsonObject.EMPTY.with("type", "string")));
        JsonObject schema = strict(JsonObject.EMPTY.with("content", content).with("remark", remark))
                .with("required", JsonArray.of(Json.of("content")));
        return new DemoKind(name, schema, List.of(), List.of(), false);
    }

    private static JsonObject strict(JsonObject properties) {
        return JsonObject.EMPTY
                .with("type", "object")
                .with("properties", properties)
                .with("additionalProperties", Json.of(false));
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
        return schemaJson;
    }

    @Override
    public Set<PartName> sealedParts() {
        return Set.of(PartName.WHO, PartName.REMARK, PartName.IDENTITY);
    }

    @Override
    public List<Problem> examine(Parts parts, Inputs inputs) {
        return parts.get(PartName.CONTENT).flatMap(content -> content.text("bad")).stream()
                .map(word -> new Problem("demo.bad", "Bad: " + word, "/content/bad", "Leave it."))
                .toList();
    }

    @Override
    public Optional<Computation> computation() {
        return Optional.of(new Square());
    }

    @Override
    public <T> Optional<T> facet(Class<T> facet, RecordView record, Inputs inputs) {
        return facet == String.class ? record.content().text("label").map(facet::cast) : Optional.empty();
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
        return new Title(name, "");
    }

    /** Squares a number. */
    private static final class Square implements Computation {
        @Override
        public List<MethodId> methods() {
            return List.of(new MethodId("demo.square/1"));
        }

        @Override
        public JsonObject complete(JsonObject choices, Inputs inputs) {
            return choices.get("method").isPresent() ? choices : choices.with("method", "demo.square/1");
        }

        @Override
        public Outcome compute(JsonObject choices, Inputs inputs, Work work) {
            double number = choices.number("number").orElse(Double.NaN);
            return Double.isNaN(number)
                    ? new Outcome.NoResult(List.of(new Problem("demo.no-number", "There is no number.", "", "")))
                    : new Outcome.Computed(JsonObject.EMPTY.with("square", number * number), List.of());
        }
    }
}
