package fringekeep.figure;

import fringekeep.archive.facet.Estimates;
import fringekeep.archive.facet.Plottable;
import fringekeep.archive.json.JsonObject;
import fringekeep.archive.kind.Inputs;
import fringekeep.archive.kind.Parts;
import fringekeep.archive.kind.RecordKind;
import fringekeep.archive.kind.RecordView;
import fringekeep.archive.kind.Role;
import fringekeep.archive.kind.Sensitivity;
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

/** A kind for tests: any content; unless its content says {@code bare}, it offers three series and two estimates. */
final class OfferingKind implements RecordKind {
    @Override
    public KindName kind() {
        return new KindName("offering");
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
        return Set.of(PartName.WHO);
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
        if (record.content().get("bare").isPresent()) {
            return Optional.empty();
        }
        if (facet == Plottable.class) {
            return Optional.of(facet.cast(plottable()));
        }
        return facet == Estimates.class ? Optional.of(facet.cast(estimates(record))) : Optional.empty();
    }

    private static Plottable plottable() {
        double[] x = {0.001, 0.002};
        return new Plottable(List.of(
                series("points", Plottable.Sort.POINTS, x, new double[] {0.25, 0.5}, new double[] {0.01, 0.02}),
                series("model", Plottable.Sort.CURVE, x, new double[] {0.125, 0.375}, new double[0]),
                series("range", Plottable.Sort.BAND, x, new double[] {0.125, 0.25}, new double[] {0.5, 0.75})));
    }

    private static Plottable.Series series(String name, Plottable.Sort sort, double[] x, double[] y, double[] other) {
        return new Plottable.Series(name, name, sort, "power", "W", "visibility", "1", x, y, other, List.of());
    }

    /** A length with u = 30 pm of its own and 2 x 20 pm from what it shares: 50 pm together (JCGM 100:2008, 5.1.2). */
    private static Estimates estimates(RecordView record) {
        return new Estimates(
                List.of("length", "visibility"),
                List.of("m", "1"),
                new double[] {2e-9, 0.5},
                new double[] {9e-22, 0, 1e-4},
                List.of(new Sensitivity(record.fingerprint(), "offset", 2e-11, new double[] {2, 0})));
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
        return new Title("offering", "");
    }
}
