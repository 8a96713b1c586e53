package fringekeep.sample;

import fringekeep.archive.facet.Distribution;
import fringekeep.archive.json.Json;
import fringekeep.archive.json.JsonObject;
import fringekeep.archive.json.JsonText;
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

/** A compound: what flies, and its mass. */
public final class CompoundKind implements RecordKind {
    private static final KindName KIND = new KindName("compound");
    private static final Column NAME = Column.text("name", "Name");
    private static final Column COMPOSITION = Column.text("composition", "Composition");
    private static final Column CHARGE = Column.integer("charge", "Charge");
    private static final Column MOLAR = Column.real("molar_mass_kg_per_mol", "Molar mass", "kg/mol", "g/mol");
    private static final Column MASS = Column.real("mass_kg", "Mass in flight", "kg", "u");
    private static final Column SPREAD = Column.real("mass_spread_kg", "Spread", "kg", "u");
    private static final Projection TABLE = new Projection(
            "compound",
            KIND,
            List.of(
                    NAME,
                    COMPOSITION,
                    CHARGE,
                    MOLAR,
                    Column.deviation("molar_mass_u_kg_per_mol", MOLAR),
                    MASS,
                    Column.deviation("mass_u_kg", MASS),
                    SPREAD),
            List.of(List.of("name"), List.of("mass_kg")));

    private final Computation computation = new CompoundMass();

    private final JsonObject schemaOne = SchemaResource.read(CompoundKind.class, "compound-1.schema.json");

    /** For the service loader. */
    public CompoundKind() {}

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
        return List.of();
    }

    @Override
    public List<Problem> examine(Parts parts, Inputs inputs) {
        return CompoundRules.examine(parts);
    }

    @Override
    public Optional<Computation> computation() {
        return Optional.of(computation);
    }

    @Override
    public <T> Optional<T> facet(Class<T> facet, RecordView record, Inputs inputs) {
        if (facet == MassFacet.class) {
            return CompoundFacts.mass(record).map(facet::cast);
        }
        if (facet == Distribution.class) {
            return CompoundFacts.mass(record).map(CompoundFacts::distribution).map(facet::cast);
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
        row.put(NAME.name(), title(record, inputs).text());
        row.put(COMPOSITION.name(), CompoundFacts.composition(record));
        row.put(CHARGE.name(), record.choices().integer("charge").orElse(0));
        JsonObject molar = record.result().object("molarMass").orElse(JsonObject.EMPTY);
        molar.number("value").ifPresent(value -> row.put(MOLAR.name(), value));
        molar.number("u").ifPresent(value -> row.put("molar_mass_u_kg_per_mol", value));
        CompoundFacts.mass(record).ifPresent(mass -> {
            row.put(MASS.name(), mass.mean());
            row.put("mass_u_kg", mass.meanDeviation());
            row.put(SPREAD.name(), mass.spread());
        });
        return Stream.of(new Row(row));
    }

    @Override
    public Title title(RecordView record, Inputs inputs) {
        String composition = CompoundFacts.composition(record);
        String text = CompoundFacts.names(record).findFirst().orElse(composition);
        return new Title(CompoundFacts.shortened(text), text.equals(composition) ? "" : composition);
    }

    @Override
    public List<Picture> drawings(RecordView record, Inputs inputs) {
        return CompoundFacts.mass(record)
                .filter(mass -> mass.nodes().length > 1)
                .map(MassPicture::of)
                .map(List::of)
                .orElse(List.of());
    }

    @Override
    public List<FlatTable> tables(RecordView record, Inputs inputs) {
        return CompoundTables.of(record);
    }

    @Override
    public Stream<String> words(RecordView record) {
        JsonObject identity = record.part(PartName.IDENTITY).orElse(JsonObject.EMPTY);
        Stream<String> registers = identity.array("registryNumbers").items().stream()
                .filter(JsonObject.class::isInstance)
                .flatMap(one -> ((JsonObject) one).text("number").stream());
        Stream<String> texts = Stream.of("supplier", "lot", "formula").flatMap(name -> identity.text(name).stream());
        Stream<String> remark = record.part(PartName.REMARK).stream().flatMap(part -> part.text("text").stream());
        Stream<String> own = Stream.concat(Stream.of(CompoundFacts.composition(record)), remark);
        return Stream.of(CompoundFacts.names(record), registers, texts, own).flatMap(stream -> stream);
    }

    /** Texts of an array, whatever else stands in it. */
    static Stream<String> texts(JsonObject holder, String name) {
        return holder.array(name).items().stream().flatMap(CompoundKind::text);
    }

    private static Stream<String> text(Json item) {
        return item instanceof JsonText text ? Stream.of(text.value()) : Stream.empty();
    }
}
