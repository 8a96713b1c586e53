package fringekeep.sample;

import fringekeep.archive.json.JsonObject;
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
import java.time.DateTimeException;
import java.time.Instant;
import java.util.ArrayList;
import java.util.HashMap;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import java.util.Set;
import java.util.stream.Collectors;
import java.util.stream.Stream;

/** A batch: the very portion of one or more compounds that goes into the source. */
public final class BatchKind implements RecordKind {
    private static final KindName KIND = new KindName("batch");
    private static final Column LABEL = Column.text("label", "Label");
    private static final Column COMPOUND = Column.text("compound", "Compound");
    private static final Column CAUTIONS = Column.text("cautions", "Cautions");
    private static final Column PURITY = Column.real("purity", "Purity", "1", "%");
    private static final Column RECEIVED = Column.instant("received_at", "Received");
    private static final Projection TABLE = new Projection(
            "batch",
            KIND,
            List.of(LABEL, COMPOUND, CAUTIONS, PURITY, Column.deviation("purity_u", PURITY), RECEIVED),
            List.of(List.of("label")));

    private final JsonObject schemaOne = SchemaResource.read(BatchKind.class, "batch-1.schema.json");

    /** For the service loader. */
    public BatchKind() {}

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
        return Set.of(PartName.WHO, PartName.REMARK, PartName.IDENTITY);
    }

    @Override
    public List<Role> inputRoles() {
        return List.of();
    }

    @Override
    public List<Role> aboutRoles() {
        return List.of(Role.of("compound", "compound", 1, 1000));
    }

    @Override
    public boolean mayContinue() {
        return true;
    }

    @Override
    public List<Problem> examine(Parts parts, Inputs inputs) {
        return BatchRules.examine(parts);
    }

    @Override
    public List<Projection> projections() {
        return List.of(TABLE);
    }

    @Override
    public Stream<Row> rows(Projection projection, RecordView record, Inputs inputs) {
        JsonObject content = record.content();
        Map<String, Object> row = new HashMap<>();
        row.put(LABEL.name(), title(record, inputs).text());
        row.put(COMPOUND.name(), compounds(inputs));
        row.put(CAUTIONS.name(), CompoundFacts.shortened(cautions(record)));
        Entered.of(content, "purity").ifPresent(purity -> {
            row.put(PURITY.name(), purity.si());
            purity.deviation().ifPresent(u -> row.put("purity_u", u));
        });
        content.object("received")
                .flatMap(moment -> moment.text("at"))
                .flatMap(BatchKind::instant)
                .ifPresent(at -> row.put(RECEIVED.name(), at));
        return Stream.of(new Row(row));
    }

    private static Optional<Instant> instant(String text) {
        try {
            return Optional.of(Instant.parse(text));
        } catch (DateTimeException e) {
            return Optional.empty(); // the archive refuses such a moment; a list shows nothing
        }
    }

    /** Names of the compounds the batch is of, as far as they are at hand. */
    private static String compounds(Inputs inputs) {
        String names = inputs.about("compound").stream()
                .flatMap(subject -> subject.record().stream())
                .map(compound -> CompoundFacts.names(compound).findFirst().orElse(CompoundFacts.composition(compound)))
                .collect(Collectors.joining(", "));
        return CompoundFacts.shortened(names);
    }

    private static String cautions(RecordView record) {
        return CompoundKind.texts(record.content(), "cautions")
                .map(code -> Caution.of(code).map(Caution::title).orElse(code))
                .collect(Collectors.joining("; "));
    }

    @Override
    public Title title(RecordView record, Inputs inputs) {
        return new Title(CompoundFacts.shortened(record.content().text("label").orElse("")), compounds(inputs));
    }

    @Override
    public List<FlatTable> tables(RecordView record, Inputs inputs) {
        List<FlatTable.FlatColumn> columns = List.of(
                new FlatTable.FlatColumn("caution", "Caution", "", "Hazard stated for the batch."),
                new FlatTable.FlatColumn("advice", "Usual caution", "", "Usual caution; local rules come first."));
        List<List<Optional<Object>>> rows = new ArrayList<>();
        CompoundKind.texts(record.content(), "cautions")
                .flatMap(code -> Caution.of(code).stream())
                .forEach(caution -> rows.add(List.of(
                        Optional.of(caution.title()), Optional.of(caution.advice() + " " + Caution.localRules()))));
        return rows.isEmpty() ? List.of() : List.of(new FlatTable("cautions", columns, rows));
    }

    @Override
    public Stream<String> words(RecordView record) {
        JsonObject identity = record.part(PartName.IDENTITY).orElse(JsonObject.EMPTY);
        Stream<String> texts =
                Stream.of("supplier", "lot", "orderNumber").flatMap(name -> identity.text(name).stream());
        Stream<String> own =
                Stream.concat(record.content().text("label").stream(), record.content().text("storage").stream());
        Stream<String> remark = record.part(PartName.REMARK).stream().flatMap(part -> part.text("text").stream());
        return Stream.of(CompoundKind.texts(identity, "names"), texts, own, remark)
                .flatMap(stream -> stream);
    }
}
