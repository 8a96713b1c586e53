package fringekeep.desk.form;

import fringekeep.archive.json.Json;
import fringekeep.archive.json.JsonArray;
import fringekeep.archive.json.JsonObject;
import fringekeep.archive.record.PartName;
import java.util.Map;
import java.util.TreeMap;

/**
 * All that a person has typed and chosen so far; one step of undo.
 *
 * @param typed the entry document with every value as typed
 * @param main the part that holds the facts
 * @param way new, correcting or coming after
 * @param from instant of change as typed, where it comes after
 * @param meant unusual values that were confirmed, as typed, by pointer
 */
record FormState(JsonObject typed, PartName main, Way way, String from, Map<String, String> meant) {
    /** How the record stands to an earlier one. */
    enum Way {
        /** A thing of its own. */
        NEW,
        /** The earlier one was never true. */
        CORRECTS,
        /** Things changed. */
        AFTER
    }

    /** Copies. */
    FormState {
        meant = Map.copyOf(new TreeMap<>(meant));
    }

    FormState typed(JsonObject next) {
        return new FormState(next, main, way, from, meant);
    }

    FormState main(PartName next) {
        return new FormState(typed, next, way, from, meant);
    }

    FormState way(Way next) {
        return new FormState(typed, main, next, from, meant);
    }

    FormState from(String next) {
        return new FormState(typed, main, way, next, meant);
    }

    FormState meaning(String pointer, String text) {
        Map<String, String> more = new TreeMap<>(meant);
        more.put(pointer, text);
        return new FormState(typed, main, way, from, more);
    }

    /** As kept in a draft. */
    JsonObject json() {
        JsonArray answers = new JsonArray(new TreeMap<>(meant)
                .entrySet().stream()
                        .<Json>map(answer -> JsonObject.EMPTY
                                .with("pointer", answer.getKey())
                                .with("text", answer.getValue()))
                        .toList());
        return JsonObject.EMPTY
                .with("typed", typed)
                .with("main", main.text())
                .with("way", way.name())
                .with("from", from)
                .with("meant", answers);
    }

    /**
     * A state from a draft.
     *
     * @throws IllegalArgumentException if it is none
     */
    static FormState of(JsonObject json) {
        Map<String, String> meant = new TreeMap<>();
        json.array("meant").objects().forEach(answer -> meant.put(text(answer, "pointer"), text(answer, "text")));
        return new FormState(
                json.object("typed").orElseThrow(() -> new IllegalArgumentException("no typed values in the draft")),
                PartName.of(text(json, "main")).orElseThrow(() -> new IllegalArgumentException("no part")),
                Way.valueOf(text(json, "way")),
                text(json, "from"),
                meant);
    }

    private static String text(JsonObject json, String member) {
        return json.text(member).orElseThrow(() -> new IllegalArgumentException("no " + member + " in the draft"));
    }
}
