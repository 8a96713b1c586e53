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
import java.time.Instant;
import java.util.ArrayList;
import java.util.HashMap;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import java.util.Set;
import java.util.stream.Stream;

/** A calibration: how readings of one sort become true values, from when to when. */
public final class CalibrationKind implements RecordKind {
    /** Name of the declared table. */
    static final String TABLE_NAME = "calibration";

    private static final KindName KIND = new KindName("calibration");
    private static final Column WHAT = Column.text("what", "What");
    private static final Column LABEL = Column.text("label", "Label");
    private static final Column SUBJECT = Column.text("subject", "Device");
    private static final Column MODEL = Column.text("model", "Model");
    private static final Column FIRST = Column.real("first_parameter", "First parameter", "1", "1");
    private static final Column FROM = Column.instant("valid_from", "From");
    private static final Column TO = Column.instant("valid_to", "To");
    private static final Projection TABLE = new Projection(
            TABLE_NAME,
            KIND,
            List.of(WHAT, SUBJECT, LABEL, MODEL, FIRST, Column.deviation("first_parameter_u", FIRST), FROM, TO),
            List.of(List.of("what", "valid_from")));

    private final JsonObject schemaOne = SchemaResource.read(CalibrationKind.class, "calibration-1.schema.json");

    /** For the service loader. */
    public CalibrationKind() {}

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
        return List.of(Role.anyKind("evidence", 0, 10_000), Role.ofRaw("evidence", 0, 10_000));
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
        return CalibrationRules.examine(parts);
    }

    /** A calibration that follows another holds from the very instant from which it is valid (record format 1, section 6). */
    @Override
    public List<Problem> examineContinuation(Parts parts, Instant from) {
        Optional<Instant> valid = parts.get(PartName.CONTENT)
                .flatMap(content -> content.object("valid"))
                .flatMap(object -> CalibrationReader.instant(object, "from"));
        return valid.isEmpty() || valid.get().equals(from)
                ? List.of()
                : List.of(Trouble.at(
                        "valid-from", "/content/valid/from", valid.get().toString(), from.toString()));
    }

    @Override
    public <T> Optional<T> facet(Class<T> facet, RecordView record, Inputs inputs) {
        return facet == CalibrationFacet.class
                ? CalibrationReader.read(record.content()).map(facet::cast)
                : Optional.empty();
    }

    @Override
    public List<Projection> projections() {
        return List.of(TABLE);
    }

    @Override
    public Stream<Row> rows(Projection projection, RecordView record, Inputs inputs) {
        JsonObject content = record.content();
        Map<String, Object> row = new HashMap<>();
        row.put(WHAT.name(), content.text("what").orElse(""));
        content.text("subject").ifPresent(subject -> row.put(SUBJECT.name(), SetupKind.shortened(subject)));
        content.text("label").ifPresent(label -> row.put(LABEL.name(), SetupKind.shortened(label)));
        row.put(MODEL.name(), content.text("model").orElse(""));
        CalibrationReader.read(content).ifPresent(calibration -> {
            row.put(FIRST.name(), calibration.parameters()[0]);
            row.put("first_parameter_u", calibration.deviation(0));
            row.put(FROM.name(), calibration.from());
            calibration.to().ifPresent(to -> row.put(TO.name(), to));
        });
        return Stream.of(new Row(row));
    }

    @Override
    public Title title(RecordView record, Inputs inputs) {
        JsonObject content = record.content();
        String what = content.text("what").orElse("").replace('-', ' ');
        String label = content.text("label").orElse(what);
        return new Title(SetupKind.shortened(label), label.equals(what) ? "" : what);
    }

    @Override
    public List<FlatTable> tables(RecordView record, Inputs inputs) {
        Optional<CalibrationFacet> calibration = CalibrationReader.read(record.content());
        if (calibration.isEmpty()) {
            return List.of();
        }
        List<FlatTable.FlatColumn> columns = List.of(
                new FlatTable.FlatColumn("parameter", "Parameter", "", "Name of the parameter."),
                new FlatTable.FlatColumn("value", "Value", "1", "Value in the SI unit beside it."),
                new FlatTable.FlatColumn("deviation", "u", "1", "Standard uncertainty in that unit."),
                new FlatTable.FlatColumn("unit", "Unit", "", "SI unit of value and uncertainty."));
        List<JsonObject> given =
                SetupReader.objects(record.content().array("parameters")).toList();
        List<List<Optional<Object>>> rows = new ArrayList<>();
        for (int i = 0; i < given.size(); i++) {
            rows.add(List.of(
                    Optional.of(given.get(i).text("name").orElse("")),
                    Optional.of(calibration.get().parameters()[i]),
                    Optional.of(calibration.get().deviation(i)),
                    Optional.of(given.get(i).text("unit").orElse(""))));
        }
        return List.of(new FlatTable("parameters", columns, rows));
    }

    @Override
    public Stream<String> words(RecordView record) {
        Stream<String> own =
                Stream.of("what", "label", "subject").flatMap(name -> record.content().text(name).stream());
        Stream<String> remark = record.part(PartName.REMARK).stream().flatMap(part -> part.text("text").stream());
        return Stream.concat(own, remark);
    }
}
