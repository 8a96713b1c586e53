package fringekeep.sourcerun;

import fringekeep.archive.json.Json;
import fringekeep.archive.json.JsonArray;
import fringekeep.archive.json.JsonObject;
import java.util.ArrayList;
import java.util.List;
import java.util.Locale;
import java.util.ResourceBundle;

/** What a method noticed; part of the result, not a judgement. */
final class VelocityFindings {
    private final List<Json> findings = new ArrayList<>();

    /** Adds a finding by its code, with words from the bundle {@code Findings}. */
    void add(String code) {
        ResourceBundle words = ResourceBundle.getBundle("fringekeep.sourcerun.Findings", Locale.ROOT);
        findings.add(JsonObject.EMPTY.with("code", code).with("text", words.getString(code)));
    }

    JsonArray json() {
        return new JsonArray(findings);
    }
}
