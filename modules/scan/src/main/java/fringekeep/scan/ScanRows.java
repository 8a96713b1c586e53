package fringekeep.scan;

import fringekeep.archive.json.JsonObject;
import fringekeep.archive.kind.RecordView;
import fringekeep.archive.listing.Column;
import fringekeep.archive.listing.Projection;
import fringekeep.archive.listing.Row;
import fringekeep.archive.record.Moment;
import fringekeep.scan.internal.Rows;
import java.util.List;
import java.util.stream.Stream;

/** Declared tables of scans: one row a scan, and one row a setting. */
final class ScanRows {
    private static final Column POWER = Column.real("laser_power_w", "P", "W", "W");

    static final Projection TABLE = new Projection(
            "scan",
            ScanKind.NAME,
            List.of(
                    Column.text("file", "file"),
                    Column.integer("file_section", "section"),
                    Column.instant("started", "started"),
                    Column.instant("ended", "ended"),
                    POWER,
                    Column.deviation("laser_power_u_w", POWER),
                    Column.text("settings", "settings"),
                    Column.integer("table_rows", "rows"),
                    Column.text("channels", "channels"),
                    Column.integer("findings", "findings"),
                    Column.text("finding_words", "findings"),
                    Column.hash("raw_file", "raw file"),
                    Column.hash("profile", "profile")),
            List.of(List.of("started"), List.of("raw_file"), List.of("file")));

    static final Projection SETTINGS = new Projection(
            "scan_setting",
            ScanKind.NAME,
            List.of(
                    Column.text("setting", "setting"),
                    Column.text("as_entered", "as entered"),
                    Column.real("value_si", "SI", "", ""),
                    Column.real("deviation_si", "u", "", "")),
            List.of(List.of("setting")));

    private ScanRows() {}

    static Stream<Row> of(RecordView record) {
        JsonObject result = record.result();
        SettingsFacet settings = ScanKind.settings(record);
        double power =
                settings.named("laser power").map(SettingsFacet.Setting::value).orElse(Double.NaN);
        double deviation = settings.named("laser power")
                .map(SettingsFacet.Setting::deviation)
                .orElse(Double.NaN);
        return Stream.of(new Rows()
                .text("file", record.choices().object("file").flatMap(file -> file.text("name")))
                .integer("file_section", record.choices().integer("section"))
                .instant("started", ScanTables.moment(result, "start").map(Moment::at))
                .instant("ended", ScanTables.moment(result, "end").map(Moment::at))
                .real("laser_power_w", power)
                .real("laser_power_u_w", deviation)
                .text(
                        "settings",
                        String.join(
                                "; ",
                                settings.settings().stream()
                                        .map(setting -> setting.name() + " " + setting.shown())
                                        .toList()))
                .integer("table_rows", result.integer("rows"))
                .text("channels", names(result, "channels", "name"))
                .integer("findings", result.array("findings").items().size())
                .text("finding_words", names(result, "findings", "code").replace('-', ' '))
                .hash("raw_file", ScanTables.raw(record))
                .hash("profile", ScanTables.profile(record))
                .row());
    }

    static Stream<Row> settings(RecordView record) {
        return ScanKind.settings(record).settings().stream()
                .map(setting -> new Rows()
                        .text("setting", setting.name())
                        .text("as_entered", setting.shown())
                        .real("value_si", setting.value())
                        .real("deviation_si", setting.deviation())
                        .row());
    }

    private static String names(JsonObject result, String member, String name) {
        return String.join(
                ", ",
                result.array(member).objects().stream()
                        .flatMap(item -> item.text(name).stream())
                        .distinct()
                        .toList());
    }
}
