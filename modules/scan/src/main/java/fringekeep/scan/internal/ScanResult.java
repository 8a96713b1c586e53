package fringekeep.scan.internal;

import fringekeep.archive.json.Json;
import fringekeep.archive.json.JsonArray;
import fringekeep.archive.json.JsonObject;
import fringekeep.archive.json.JsonText;
import fringekeep.archive.kind.NewPayload;
import fringekeep.archive.kind.NpyPayload;
import fringekeep.archive.kind.Outcome;
import fringekeep.archive.quantity.QuantityJson;
import fringekeep.archive.record.Moment;
import fringekeep.scan.internal.reading.Finding;
import fringekeep.scan.internal.reading.Reading;
import fringekeep.scan.internal.reading.ResultColumns;
import java.time.Duration;
import java.util.List;
import java.util.Optional;

/** Turns a reading into the result part and the table payload of a scan. */
public final class ScanResult {
    /** Name of the payload. */
    public static final String TABLE = "table";

    private static final double NANOSECONDS = 1e9;

    private ScanResult() {}

    /** The outcome of reading. */
    public static Outcome.Computed of(Reading reading, JsonObject choices) {
        NewPayload payload = TablePayload.write(TABLE, reading.table());
        JsonObject result = ResultColumns.of(reading.table())
                .with("exposure", reading.exposure().json())
                .with(
                        "findings",
                        array(reading.findings().stream().map(Finding::json).toList()))
                .with("rows", reading.table().rows())
                .with("table", TABLE);
        if (payload.form().equals(NpyPayload.FORM)) {
            result = result.with(
                    "columns",
                    JsonArray.ofTexts(reading.table().columns().stream()
                            .map(column -> column.name())
                            .toList()));
        }
        if (!reading.header().settings().isEmpty()) {
            result = result.with("settings", array(reading.header().settings()));
        }
        return new Outcome.Computed(withTimes(result, reading, choices), List.of(payload));
    }

    private static Json array(List<JsonObject> objects) {
        return new JsonArray(List.copyOf(objects));
    }

    /** What a person entered goes before the header, the header before the time of the file. */
    private static JsonObject withTimes(JsonObject result, Reading reading, JsonObject choices) {
        Optional<JsonObject> start = choices.object("start")
                .map(entered -> known(entered, "entered"))
                .or(() -> reading.header().start().map(moment -> known(moment, "header")));
        Optional<JsonObject> end = choices.object("end")
                .map(entered -> known(entered, "entered"))
                .or(() -> reading.header().end().map(moment -> known(moment, "header")));
        Optional<JsonObject> modified = choices.object("file").flatMap(file -> file.object("modified"));
        if (start.isEmpty() && end.isEmpty() && reading.fileTimeIsEnd() && modified.isPresent()) {
            end = modified.map(moment -> known(moment, "file-time"));
            start = begin(QuantityJson.moment(modified.get()), reading).map(moment -> known(moment, "file-time"));
        }
        return result.with("start", start).with("end", end);
    }

    /** The end less the exposure of all rows; unknown for shots, whose rate is not known. */
    private static Optional<Moment> begin(Moment end, Reading reading) {
        if (reading.exposure().shots()) {
            return Optional.empty();
        }
        Duration total = Duration.ofNanos((long) (reading.exposure().total() * NANOSECONDS));
        return Optional.of(new Moment(end.at().minus(total), end.offset(), end.zone()));
    }

    private static JsonObject known(Moment moment, String source) {
        return known(QuantityJson.write(moment), source);
    }

    private static JsonObject known(JsonObject moment, String source) {
        return moment.with("known", new JsonText(source));
    }
}
