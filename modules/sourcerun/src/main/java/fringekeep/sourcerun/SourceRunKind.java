package fringekeep.sourcerun;

import fringekeep.archive.facet.TimeSpan;
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
import fringekeep.instrument.CautionRules;
import fringekeep.sample.Entered;
import java.util.ArrayList;
import java.util.HashMap;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import java.util.OptionalDouble;
import java.util.Set;
import java.util.stream.Collectors;
import java.util.stream.Stream;

/** A source run: one running of the source, with its settings. */
public final class SourceRunKind implements RecordKind {
    private static final KindName KIND = new KindName("source-run");
    private static final Column LABEL = Column.text("label", "Label");
    private static final Column BATCH = Column.text("batch", "Batch");
    private static final Column SETTINGS = Column.text("settings", "Settings");
    private static final Column TEMPERATURE = Column.real("temperature_k", "Temperature", "K", "K");
    private static final Column STARTED = Column.instant("started_at", "Started");
    private static final Column ENDED = Column.instant("ended_at", "Ended");
    private static final Projection TABLE = new Projection(
            "source_run",
            KIND,
            List.of(
                    LABEL,
                    BATCH,
                    SETTINGS,
                    TEMPERATURE,
                    Column.deviation("temperature_u_k", TEMPERATURE),
                    STARTED,
                    ENDED),
            List.of(List.of("started_at"), List.of("label")));

    private final JsonObject schemaOne = SchemaResource.read(SourceRunKind.class, "source-run-1.schema.json");

    /** For the service loader. */
    public SourceRunKind() {}

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
        return List.of(Role.of("batch", "batch", 0, 100));
    }

    @Override
    public List<Problem> examine(Parts parts, Inputs inputs) {
        return SourceRunRules.examine(parts);
    }

    @Override
    public <T> Optional<T> facet(Class<T> facet, RecordView record, Inputs inputs) {
        if (record.part(PartName.CONTENT).isEmpty()) {
            return Optional.empty();
        }
        if (facet == SourceRunFacet.class) {
            return Optional.of(facet.cast(SourceRunReader.read(record.content())));
        }
        return facet == TimeSpan.class ? SourceRunReader.time(record.content()).map(facet::cast) : Optional.empty();
    }

    @Override
    public List<Projection> projections() {
        return List.of(TABLE);
    }

    @Override
    public Stream<Row> rows(Projection projection, RecordView record, Inputs inputs) {
        SourceRunFacet run = SourceRunReader.read(record.content());
        Map<String, Object> row = new HashMap<>();
        row.put(LABEL.name(), title(record, inputs).text());
        row.put(BATCH.name(), batches(inputs));
        row.put(SETTINGS.name(), shortened(settings(record)));
        temperature(run).ifPresent(value -> {
            row.put(TEMPERATURE.name(), value.si());
            value.deviation().ifPresent(u -> row.put("temperature_u_k", u));
        });
        run.time().ifPresent(time -> {
            row.put(STARTED.name(), time.start().at());
            time.end().ifPresent(end -> row.put(ENDED.name(), end.at()));
        });
        return Stream.of(new Row(row));
    }

    /** The first setting that is a temperature. */
    private static Optional<Entered> temperature(SourceRunFacet run) {
        return run.settings().stream()
                .filter(setting -> setting.unit().equals("K"))
                .map(SourceRunFacet.Setting::value)
                .findFirst();
    }

    /** Settings as typed. */
    private static String settings(RecordView record) {
        return SourceRunReader.objects(record.content().array("settings"))
                .map(SourceRunKind::typed)
                .collect(Collectors.joining(", "));
    }

    private static String typed(JsonObject setting) {
        JsonObject quantity = setting.object("quantity").orElse(JsonObject.EMPTY);
        return setting.text("name").orElse("") + " " + quantity.text("text").orElse("") + " "
                + quantity.text("unit").filter(unit -> !unit.equals("1")).orElse("");
    }

    private static String batches(Inputs inputs) {
        return shortened(inputs.about("batch").stream()
                .flatMap(subject -> subject.record().stream())
                .flatMap(batch -> batch.content().text("label").stream())
                .collect(Collectors.joining(", ")));
    }

    static String shortened(String text) {
        return text.length() <= 200 ? text : text.substring(0, 199) + "…";
    }

    @Override
    public Title title(RecordView record, Inputs inputs) {
        Optional<String> label = record.content().text("label").filter(text -> !text.isBlank());
        String settings = settings(record);
        return new Title(shortened(label.orElse(settings)), label.isPresent() ? shortened(settings) : "");
    }

    @Override
    public List<FlatTable> tables(RecordView record, Inputs inputs) {
        List<FlatTable> tables = new ArrayList<>();
        SourceRunFacet run = SourceRunReader.read(record.content());
        if (!run.settings().isEmpty()) {
            tables.add(table(run));
        }
        tables.addAll(CautionRules.table(CautionRules.stated(record.content())));
        return tables;
    }

    private static FlatTable table(SourceRunFacet run) {
        List<FlatTable.FlatColumn> columns = List.of(
                new FlatTable.FlatColumn("setting", "Setting", "", "Name of the setting."),
                new FlatTable.FlatColumn("value", "Value", "1", "Value in the SI unit beside it."),
                new FlatTable.FlatColumn("deviation", "u", "1", "Standard uncertainty, where stated."),
                new FlatTable.FlatColumn("unit", "Unit", "", "SI unit of value and uncertainty."));
        List<List<Optional<Object>>> rows = new ArrayList<>();
        for (SourceRunFacet.Setting setting : run.settings()) {
            OptionalDouble u = setting.value().deviation();
            rows.add(List.of(
                    Optional.of(setting.name()),
                    Optional.of(setting.value().si()),
                    u.isPresent() ? Optional.of(u.getAsDouble()) : Optional.empty(),
                    Optional.of(setting.unit())));
        }
        return new FlatTable("settings", columns, rows);
    }

    @Override
    public Stream<String> words(RecordView record) {
        JsonObject content = record.content();
        Stream<String> names = Stream.of("settings", "words")
                .flatMap(list -> SourceRunReader.objects(content.array(list)))
                .flatMap(one -> Stream.concat(one.text("name").stream(), one.text("text").stream()));
        Stream<String> own = Stream.of("label", "source").flatMap(name -> content.text(name).stream());
        Stream<String> remark = record.part(PartName.REMARK).stream().flatMap(part -> part.text("text").stream());
        return Stream.of(own, names, remark).flatMap(stream -> stream);
    }
}
