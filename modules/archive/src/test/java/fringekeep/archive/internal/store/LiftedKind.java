package fringekeep.archive.internal.store;

import fringekeep.archive.json.JsonObject;
import fringekeep.archive.kind.Computation;
import fringekeep.archive.kind.Inputs;
import fringekeep.archive.kind.Kinds;
import fringekeep.archive.kind.MethodId;
import fringekeep.archive.kind.Outcome;
import fringekeep.archive.kind.Parts;
import fringekeep.archive.kind.RecordKind;
import fringekeep.archive.kind.RecordView;
import fringekeep.archive.kind.Role;
import fringekeep.archive.kind.Title;
import fringekeep.archive.listing.Column;
import fringekeep.archive.listing.Projection;
import fringekeep.archive.listing.Row;
import fringekeep.archive.problem.Problem;
import fringekeep.archive.problem.Work;
import fringekeep.archive.record.KindName;
import fringekeep.archive.record.PartName;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import java.util.OptionalDouble;
import java.util.Set;
import java.util.stream.Stream;

/**
 * Kinds that have seen two schema numbers: {@code reading} is entered, as {@code millimetres} and then as {@code metres};
 * {@code share} is computed from a reading, with {@code percent} and then {@code fraction} of it, and a result called
 * {@code part} and then {@code share}.
 */
record LiftedKind(String name, int schema) implements RecordKind {
    /** Both kinds as a program of that schema number knows them. */
    static Kinds of(int schema) {
        return new Kinds(List.of(new LiftedKind("reading", schema), new LiftedKind("share", schema)));
    }

    private boolean computed() {
        return name.equals("share");
    }

    @Override
    public KindName kind() {
        return new KindName(name);
    }

    @Override
    public JsonObject jsonSchema(int number) {
        return JsonObject.EMPTY.with("type", "object");
    }

    @Override
    public JsonObject lift(PartName part, int number, JsonObject value) {
        return switch (part) {
            case CONTENT -> renamed(value, "millimetres", "metres", 0.001);
            case CHOICES -> renamed(value, "percent", "fraction", 0.01);
            case RESULT -> renamed(value, "part", "share", 1);
            default -> value;
        };
    }

    private static JsonObject renamed(JsonObject value, String old, String now, double factor) {
        OptionalDouble number = value.number(old);
        return number.isPresent() ? value.without(old).with(now, number.getAsDouble() * factor) : value;
    }

    @Override
    public Set<PartName> sealedParts() {
        return Set.of(PartName.WHO, PartName.REMARK);
    }

    @Override
    public List<Role> inputRoles() {
        return computed() ? List.of(Role.anyKind("reading", 1, 1)) : List.of();
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
        return computed() ? Optional.of(new Share()) : Optional.empty();
    }

    @Override
    public List<Projection> projections() {
        String column = computed() ? "share" : "length_m";
        return List.of(
                new Projection(name + "_list", kind(), List.of(Column.real(column, "value", "", "")), List.of()));
    }

    @Override
    public Stream<Row> rows(Projection projection, RecordView record, Inputs inputs) {
        OptionalDouble value =
                computed() ? record.result().number("share") : record.content().number("metres");
        String column = projection.columns().get(0).name();
        return Stream.of(new Row(value.isPresent() ? Map.of(column, value.getAsDouble()) : Map.of()));
    }

    @Override
    public Title title(RecordView record, Inputs inputs) {
        return new Title(name, "");
    }

    /** The unit of lengths became a word in the second schema number. */
    @Override
    public Stream<String> words(RecordView record) {
        return record.content().get("metres").isPresent() ? Stream.of("metres") : Stream.of("millimetres");
    }

    /** Takes a share of a reading; knows the choices of its own schema number only. */
    private final class Share implements Computation {
        @Override
        public List<MethodId> methods() {
            return List.of(new MethodId("share.of-reading/1"));
        }

        @Override
        public JsonObject complete(JsonObject choices, Inputs inputs) {
            return choices.with("method", "share.of-reading/1");
        }

        @Override
        public Outcome compute(JsonObject choices, Inputs inputs, Work work) {
            RecordView reading = inputs.all().get(0).record().orElseThrow();
            JsonObject result = schema == 1
                    ? JsonObject.EMPTY.with("part", choices.number("percent").orElseThrow() * 0.01 * metres(reading))
                    : JsonObject.EMPTY.with("share", choices.number("fraction").orElseThrow() * metres(reading));
            return new Outcome.Computed(result, List.of());
        }

        private double metres(RecordView reading) {
            return schema == 1
                    ? reading.content().number("millimetres").orElseThrow() * 0.001
                    : reading.content().number("metres").orElseThrow();
        }
    }
}
