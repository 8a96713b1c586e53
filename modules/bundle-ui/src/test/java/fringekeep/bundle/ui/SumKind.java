package fringekeep.bundle.ui;

import fringekeep.archive.json.JsonObject;
import fringekeep.archive.kind.Computation;
import fringekeep.archive.kind.Input;
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

/** Readings are entered numbers; totals are computed sums of them, each reading with a standard uncertainty of 0.5. */
record SumKind(String name) implements RecordKind {
    private boolean computed() {
        return name.equals("total");
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
    public List<Role> inputRoles() {
        return computed() ? List.of(Role.anyKind("term", 1, 10), Role.ofRaw("raw", 0, 1)) : List.of();
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
        return computed() ? Optional.of(new Sum()) : Optional.empty();
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
        return new Title(name, "");
    }

    /** Sums readings and totals in the order of the inputs. */
    private static final class Sum implements Computation {
        @Override
        public List<MethodId> methods() {
            return List.of(new MethodId("total.sum/1"));
        }

        @Override
        public JsonObject complete(JsonObject choices, Inputs inputs) {
            return choices.get("method").isPresent() ? choices : choices.with("method", "total.sum/1");
        }

        @Override
        public Outcome compute(JsonObject choices, Inputs inputs, Work work) {
            double sum = 0;
            int terms = 0;
            for (Input input : inputs.all()) {
                if (!input.raw()) {
                    sum += number(input.record().orElseThrow());
                    terms++;
                }
            }
            return new Outcome.Computed(
                    JsonObject.EMPTY.with(
                            "sum", JsonObject.EMPTY.with("value", sum).with("u", 0.5 * Math.sqrt(terms))),
                    List.of());
        }

        private static double number(RecordView record) {
            return record.content()
                    .number("number")
                    .orElseGet(() -> record.result()
                            .object("sum")
                            .orElseThrow()
                            .number("value")
                            .orElseThrow());
        }
    }
}
