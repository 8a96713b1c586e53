package fringekeep.instrument;

import fringekeep.archive.facet.Curve;
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
import java.util.stream.Collectors;
import java.util.stream.Stream;

/** A monitor log: slow readings against time, read from one raw file. */
public final class MonitorLogKind implements RecordKind {
    private static final KindName KIND = new KindName("monitor-log");
    private static final Column FILE = Column.text("file", "File");
    private static final Column READINGS = Column.text("readings", "Readings");
    private static final Column START = Column.instant("start_at", "Start");
    private static final Column END = Column.instant("end_at", "End");
    private static final Column ROWS = Column.integer("row_count", "Rows");
    private static final Column OFFSET = Column.real("clock_offset_s", "Clock offset", "s", "s");
    private static final Column FINDINGS = Column.integer("finding_count", "Findings");
    private static final Projection TABLE = new Projection(
            "monitor_log",
            KIND,
            List.of(FILE, READINGS, START, END, ROWS, OFFSET, Column.deviation("clock_offset_u_s", OFFSET), FINDINGS),
            List.of(List.of("start_at")));

    private final Computation computation = new MonitorReading();

    private final JsonObject schemaOne = SchemaResource.read(MonitorLogKind.class, "monitor-log-1.schema.json");

    /** For the service loader. */
    public MonitorLogKind() {}

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
        return List.of(Role.ofRaw("raw", 1, 1));
    }

    @Override
    public List<Role> aboutRoles() {
        return List.of();
    }

    @Override
    public List<Problem> examine(Parts parts, Inputs inputs) {
        return MonitorRules.examine(parts);
    }

    @Override
    public Optional<Computation> computation() {
        return Optional.of(computation);
    }

    @Override
    public <T> Optional<T> facet(Class<T> facet, RecordView record, Inputs inputs) {
        if (facet == MonitorLog.class) {
            return MonitorFacts.log(record).map(facet::cast);
        }
        if (facet == Curve.class) {
            return MonitorFacts.log(record)
                    .flatMap(log -> log.series().stream().findFirst().flatMap(first -> log.curve(first.name())))
                    .map(facet::cast);
        }
        if (facet == Plottable.class) {
            return MonitorFacts.log(record).map(MonitorFacts::plottable).map(facet::cast);
        }
        return Optional.empty();
    }

    @Override
    public List<Projection> projections() {
        return List.of(TABLE);
    }

    @Override
    public Stream<Row> rows(Projection projection, RecordView record, Inputs inputs) {
        JsonObject result = record.result();
        Map<String, Object> row = new HashMap<>();
        row.put(FILE.name(), title(record, inputs).text());
        row.put(READINGS.name(), readings(record));
        CalibrationReader.instant(result, "start").ifPresent(start -> row.put(START.name(), start));
        CalibrationReader.instant(result, "end").ifPresent(end -> row.put(END.name(), end));
        result.integer("rows").ifPresent(rows -> row.put(ROWS.name(), rows));
        JsonObject offset = result.object("clockOffset").orElse(JsonObject.EMPTY);
        offset.number("value").ifPresent(value -> row.put(OFFSET.name(), value));
        offset.number("u").ifPresent(u -> row.put("clock_offset_u_s", u));
        row.put(FINDINGS.name(), (long) result.array("findings").items().size());
        return Stream.of(new Row(row));
    }

    private static String readings(RecordView record) {
        return SetupKind.shortened(SetupReader.objects(record.choices().array("columns"))
                .flatMap(column -> column.text("name").stream())
                .collect(Collectors.joining(", ")));
    }

    @Override
    public Title title(RecordView record, Inputs inputs) {
        JsonObject file = record.choices().object("file").orElse(JsonObject.EMPTY);
        return new Title(SetupKind.shortened(file.text("name").orElse("log")), readings(record));
    }

    @Override
    public List<Picture> drawings(RecordView record, Inputs inputs) {
        return MonitorFacts.log(record).map(MonitorFacts::picture).map(List::of).orElse(List.of());
    }

    @Override
    public List<FlatTable> tables(RecordView record, Inputs inputs) {
        return MonitorFacts.log(record).map(MonitorFacts::table).map(List::of).orElse(List.of());
    }

    @Override
    public Stream<String> words(RecordView record) {
        Stream<String> names =
                SetupReader.objects(record.choices().array("columns")).flatMap(column -> column.text("name").stream());
        Stream<String> file = record.choices().object("file").flatMap(one -> one.text("name")).stream();
        Stream<String> remark = record.part(PartName.REMARK).stream().flatMap(part -> part.text("text").stream());
        return Stream.of(names, file, remark).flatMap(stream -> stream);
    }
}
