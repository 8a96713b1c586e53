package fringekeep.instrument;

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
import fringekeep.drawing.Picture;
import fringekeep.sample.Entered;
import java.util.ArrayList;
import java.util.HashMap;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import java.util.Set;
import java.util.stream.Collectors;
import java.util.stream.Stream;

/** A setup: gratings, distances, detector and what else stands on the bench. */
public final class SetupKind implements RecordKind {
    private static final KindName KIND = new KindName("setup");
    private static final Column LABEL = Column.text("label", "Label");
    private static final Column GRATINGS = Column.text("gratings", "Gratings");
    private static final Column PERIOD = Column.real("period_m", "Period", "m", "nm");
    private static final Column PERIOD_U = Column.deviation("period_u_m", PERIOD);
    private static final Column SEPARATION = Column.real("separation_m", "Separation", "m", "mm");
    private static final Column SEPARATION_U = Column.deviation("separation_u_m", SEPARATION);
    private static final Column WAVELENGTH = Column.real("wavelength_m", "Wavelength", "m", "nm");
    private static final Column POWER = Column.real("power_w", "Laser power", "W", "W");
    private static final Column DEAD_TIME = Column.real("dead_time_s", "Dead time", "s", "us");
    private static final Projection TABLE = new Projection(
            "setup",
            KIND,
            List.of(LABEL, GRATINGS, PERIOD, PERIOD_U, SEPARATION, SEPARATION_U, WAVELENGTH, POWER, DEAD_TIME),
            List.of(List.of("label")));

    private final JsonObject schemaOne = SchemaResource.read(SetupKind.class, "setup-1.schema.json");

    /** For the service loader. */
    public SetupKind() {}

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
        return List.of();
    }

    @Override
    public List<Role> aboutRoles() {
        return List.of();
    }

    @Override
    public boolean mayContinue() {
        return true;
    }

    @Override
    public List<Problem> examine(Parts parts, Inputs inputs) {
        return SetupRules.examine(parts);
    }

    @Override
    public <T> Optional<T> facet(Class<T> facet, RecordView record, Inputs inputs) {
        return facet == SetupFacet.class && record.part(PartName.CONTENT).isPresent()
                ? Optional.of(facet.cast(SetupReader.read(record.content())))
                : Optional.empty();
    }

    @Override
    public List<Projection> projections() {
        return List.of(TABLE);
    }

    @Override
    public Stream<Row> rows(Projection projection, RecordView record, Inputs inputs) {
        SetupFacet setup = SetupReader.read(record.content());
        Map<String, Object> row = new HashMap<>();
        row.put(LABEL.name(), shortened(setup.label()));
        row.put(GRATINGS.name(), gratings(setup));
        Optional<Laser> laser = setup.gratings().stream()
                .flatMap(grating -> grating.laser().stream())
                .findFirst();
        put(row, setup.grating(0).flatMap(Grating::period), PERIOD, Optional.of(PERIOD_U));
        put(row, setup.separation(0), SEPARATION, Optional.of(SEPARATION_U));
        put(row, laser.map(Laser::wavelength), WAVELENGTH, Optional.empty());
        put(row, laser.flatMap(Laser::power), POWER, Optional.empty());
        put(row, setup.detector().flatMap(SetupFacet.Detector::deadTime), DEAD_TIME, Optional.empty());
        return Stream.of(new Row(row));
    }

    private static void put(
            Map<String, Object> row, Optional<Entered> value, Column column, Optional<Column> deviation) {
        value.ifPresent(known -> {
            row.put(column.name(), known.si());
            if (deviation.isPresent() && known.deviation().isPresent()) {
                row.put(deviation.get().name(), known.deviation().getAsDouble());
            }
        });
    }

    private static String gratings(SetupFacet setup) {
        return shortened(
                setup.gratings().stream().map(grating -> grating.sort().words()).collect(Collectors.joining(" · ")));
    }

    static String shortened(String text) {
        return text.length() <= 200 ? text : text.substring(0, 199) + "…";
    }

    @Override
    public Title title(RecordView record, Inputs inputs) {
        SetupFacet setup = SetupReader.read(record.content());
        return new Title(shortened(setup.label()), gratings(setup));
    }

    @Override
    public List<Picture> drawings(RecordView record, Inputs inputs) {
        return SetupPicture.of(SetupReader.read(record.content()));
    }

    @Override
    public List<FlatTable> tables(RecordView record, Inputs inputs) {
        List<FlatTable> tables = new ArrayList<>(SetupTables.of(SetupReader.read(record.content())));
        tables.addAll(CautionRules.table(SetupCautions.of(record.content())));
        return tables;
    }

    @Override
    public Stream<String> words(RecordView record) {
        JsonObject content = record.content();
        Stream<String> names = Stream.of("gratings", "slits", "words")
                .flatMap(list -> SetupReader.objects(content.array(list)))
                .flatMap(one -> Stream.concat(one.text("name").stream(), one.text("text").stream()));
        Stream<String> remark = record.part(PartName.REMARK).stream().flatMap(part -> part.text("text").stream());
        return Stream.of(content.text("label").stream(), names, remark).flatMap(stream -> stream);
    }
}
