package fringekeep.scan.internal.reading;

import fringekeep.archive.json.Json;
import fringekeep.archive.json.JsonArray;
import fringekeep.archive.json.JsonObject;
import java.util.ArrayList;
import java.util.List;

/** Something noticed while reading; no judgement. Immutable; members are added as far as they are known. */
public record Finding(JsonObject json) {
    static Finding of(String code) {
        return new Finding(JsonObject.EMPTY.with("code", code));
    }

    /** Its code, such as {@code saturated}. */
    public String code() {
        return json.text("code").orElseThrow();
    }

    Finding column(String name) {
        return new Finding(json.with("column", name));
    }

    Finding value(double value) {
        return new Finding(json.with("value", value));
    }

    Finding limit(double limit) {
        return new Finding(json.with("limit", limit));
    }

    Finding text(String text) {
        return new Finding(json.with("text", text.length() <= 200 ? text : text.substring(0, 200)));
    }

    /** Rows (ascending, from 0) gathered to first and last of each run. */
    Finding rows(List<Integer> rows) {
        List<Json> runs = new ArrayList<>();
        int at = 0;
        while (at < rows.size()) {
            int end = at;
            while (end + 1 < rows.size() && rows.get(end + 1) == rows.get(end) + 1) {
                end++;
            }
            runs.add(JsonArray.ofNumbers(rows.get(at), rows.get(end)));
            at = end + 1;
        }
        return new Finding(json.with("rows", new JsonArray(runs)));
    }
}
