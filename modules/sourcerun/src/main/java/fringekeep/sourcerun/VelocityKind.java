package fringekeep.sourcerun;

import fringekeep.archive.facet.CountTable;
import fringekeep.archive.facet.Distribution;
import fringekeep.archive.facet.Plottable;
import fringekeep.archive.json.JsonObject;
import fringekeep.archive.kind.Computation;
import fringekeep.archive.kind.FlatTable;
import fringekeep.archive.kind.Inputs;
import fringekeep.archive.kind.Parts;
import fringekeep.archive.kind.RecordKind;
import fringekeep.archive.kind.RecordView;
import fringekeep.archive.kind.Role;
import fringekeep.archive.kind.SchemaResource;
import fringekeep.archive.kind.Title;
import fringekeep.archive.listing.Column;
import fringekeep.archive.listing.Projection;
import fringekeep.archive.listing.Row;
import fringekeep.archive.problem.Problem;
import fringekeep.archive.record.KindName;
import fringekeep.archive.record.PartName;
import fringekeep.drawing.Picture;
import java.util.HashMap;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import java.util.Set;
import java.util.stream.Stream;

/** A velocity distribution: computed from a flight trace or a selector of three slits, or quoted. */
public final class VelocityKind implements RecordKind {
    private static final KindName KIND = new KindName("velocity");
    private static final Column LABEL = Column.text("label", "Label");
    private static final Column METHOD = Column.text("method", "Method");
    private static final Column MEAN = Column.real("mean_m_per_s", "Mean", "m/s", "m/s");
    private static final Column SPREAD = Column.real("spread_m_per_s", "Spread", "m/s", "m/s");
    private static final Column FINDINGS = Column.integer("finding_count", "Findings");
    private static final Projection TABLE = new Projection(
            "velocity",
            KIND,
            List.of(LABEL, METHOD, MEAN, Column.deviation("mean_u_m_per_s", MEAN), SPREAD, FINDINGS),
            List.of(List.of("mean_m_per_s")));

    private final Computation computation = new VelocityComputation();

    private final JsonObject schemaOne = SchemaResource.read(VelocityKind.class, "velocity-1.schema.json");

    /** For the service loader. */
    public VelocityKind() {}

    @Override
    public KindName kind() {
        return KIND;
    }

    @Override
    public int schema() {
        return 1;
    }

    @Override
    public JsonObject jsonSchema(int number) {
        if (number != 1) {
            throw new IllegalArgumentException(KIND + " has no schema number " + number);
        }
        return schemaOne;
    }

    @Override
    public Set<PartName> sealedParts() {
        return Set.of(PartName.WHO, PartName.REMARK);
    }

    @Override
    public List<Role> inputRoles() {
        return List.of(
                Role.ofRaw("trace", 0, 1),
                Role.offering("trace", CountTable.class, 0, 1),
                Role.of("calibration", "calibration", 0, 100));
    }

    @Override
    public List<Role> aboutRoles() {
        return List.of(Role.of("run", "source-run", 0, 1));
    }

    @Override
    public List<Problem> examine(Parts parts, Inputs inputs) {
        return VelocityRules.examine(parts, inputs);
    }

    @Override
    public Optional<Computation> computation() {
        return Optional.of(computation);
    }

    @Override
    public <T> Optional<T> facet(Class<T> facet, RecordView record, Inputs inputs) {
        if (facet == Distribution.class) {
            return VelocityFacts.distribution(record).map(facet::cast);
        }
        if (facet == Plottable.class) {
            return VelocityFacts.distribution(record)
                    .map(VelocityPicture::plottable)
                    .map(facet::cast);
        }
        return Optional.empty();
    }

    @Override
    public List<Projection> projections() {
        return List.of(TABLE);
    }

    @Override
    public Stream<Row> rows(Projection projection, RecordView record, Inputs inputs) {
        Map<String, Object> row = new HashMap<>();
        row.put(LABEL.name(), title(record, inputs).text());
        row.put(METHOD.name(), VelocityFacts.method(record));
        VelocityFacts.distribution(record).ifPresent(velocities -> {
            row.put(MEAN.name(), velocities.mean());
            row.put("mean_u_m_per_s", velocities.meanDeviation());
            row.put(SPREAD.name(), velocities.spread());
        });
        row.put(FINDINGS.name(), (long)
                record.result().array("findings").items().size());
        return Stream.of(new Row(row));
    }

    @Override
    public Title title(RecordView record, Inputs inputs) {
        Optional<String> label =
                record.content().text("label").or(() -> record.choices().text("label"));
        Optional<String> file = record.choices().object("file").flatMap(one -> one.text("name"));
        String method = VelocityFacts.method(record);
        String text = label.or(() -> file).orElse(method);
        return new Title(SourceRunKind.shortened(text), text.equals(method) ? "" : method);
    }

    @Override
    public List<Picture> drawings(RecordView record, Inputs inputs) {
        return VelocityFacts.distribution(record)
                .map(velocities -> VelocityPicture.of(velocities, deviations(record)))
                .map(List::of)
                .orElse(List.of());
    }

    private static double[] deviations(RecordView record) {
        return VelocityRules.numbers(record.result().array("deviations"));
    }

    @Override
    public List<FlatTable> tables(RecordView record, Inputs inputs) {
        return VelocityFacts.distribution(record)
                .map(velocities -> List.of(VelocityPicture.table(velocities)))
                .orElse(List.of());
    }

    @Override
    public Stream<String> words(RecordView record) {
        Stream<String> own = Stream.of("label", "origin")
                .flatMap(name ->
                        Stream.concat(record.content().text(name).stream(), record.choices().text(name).stream()));
        Stream<String> file = record.choices().object("file").flatMap(one -> one.text("name")).stream();
        Stream<String> remark = record.part(PartName.REMARK).stream().flatMap(part -> part.text("text").stream());
        return Stream.of(own, file, Stream.of(VelocityFacts.method(record)), remark)
                .flatMap(stream -> stream);
    }
}
