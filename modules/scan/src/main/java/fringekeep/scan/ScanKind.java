package fringekeep.scan;

import fringekeep.archive.facet.CountTable;
import fringekeep.archive.facet.TimeSpan;
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
import fringekeep.archive.listing.Projection;
import fringekeep.archive.listing.Row;
import fringekeep.archive.problem.Problem;
import fringekeep.archive.record.KindName;
import fringekeep.archive.record.Moment;
import fringekeep.archive.record.PartName;
import fringekeep.drawing.Picture;
import java.util.List;
import java.util.Optional;
import java.util.Set;
import java.util.stream.Stream;

/** Scan: one section of a raw file as read by a reading profile. Computed; knows nothing but file and profile. */
public final class ScanKind implements RecordKind {
    /** Name of the kind. */
    public static final KindName NAME = new KindName("scan");

    @Override
    public KindName kind() {
        return NAME;
    }

    @Override
    public int schema() {
        return 1;
    }

    @Override
    public JsonObject jsonSchema(int number) {
        return SchemaResource.read(ScanKind.class, "scan-" + number + ".schema.json");
    }

    @Override
    public Set<PartName> sealedParts() {
        return Set.of(PartName.WHO, PartName.REMARK);
    }

    @Override
    public List<Role> inputRoles() {
        return List.of(Role.ofRaw("raw", 1, 1), Role.of("profile", "reading-profile", 1, 1));
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
        return Optional.of(ScanComputation.INSTANCE);
    }

    @Override
    public <T> Optional<T> facet(Class<T> facet, RecordView record, Inputs inputs) {
        if (facet == CountTable.class) {
            return ScanTables.countTable(record).map(facet::cast);
        }
        if (facet == TimeSpan.class) {
            Optional<Moment> end = ScanTables.moment(record.result(), "end");
            return ScanTables.moment(record.result(), "start").map(start -> facet.cast(new TimeSpan(start, end)));
        }
        if (facet == SettingsFacet.class) {
            return Optional.of(facet.cast(settings(record)));
        }
        return Optional.empty();
    }

    /** Settings that the header of a scan's file holds. */
    static SettingsFacet settings(RecordView record) {
        return new SettingsFacet(record.result().array("settings").objects().stream()
                .map(item -> Settings.of(
                        item.text("name").orElseThrow(), item.object("quantity").orElseThrow()))
                .toList());
    }

    @Override
    public List<Projection> projections() {
        return List.of(ScanRows.TABLE, ScanRows.SETTINGS);
    }

    @Override
    public Stream<Row> rows(Projection projection, RecordView record, Inputs inputs) {
        return projection.name().equals(ScanRows.SETTINGS.name()) ? ScanRows.settings(record) : ScanRows.of(record);
    }

    @Override
    public Title title(RecordView record, Inputs inputs) {
        String file = record.choices()
                .object("file")
                .flatMap(each -> each.text("name"))
                .orElse("");
        long section = record.choices().integer("section").orElse(0);
        String shown = section == 0 ? file : file + ", section " + section;
        long rows = record.result().integer("rows").orElse(0);
        List<String> settings = settings(record).settings().stream()
                .map(setting -> setting.name() + " " + setting.shown())
                .toList();
        return new Title(shown, rows + " rows" + (settings.isEmpty() ? "" : "; " + String.join("; ", settings)));
    }

    @Override
    public List<Picture> drawings(RecordView record, Inputs inputs) {
        return ScanTables.countTable(record)
                .map(table -> List.of(ScanPicture.of(table)))
                .orElse(List.of());
    }

    @Override
    public List<FlatTable> tables(RecordView record, Inputs inputs) {
        return ScanTables.countTable(record)
                .map(table -> List.of(ScanTables.flat(table)))
                .orElse(List.of());
    }

    @Override
    public Stream<String> words(RecordView record) {
        return record.choices().object("file").flatMap(file -> file.text("name")).stream();
    }
}
