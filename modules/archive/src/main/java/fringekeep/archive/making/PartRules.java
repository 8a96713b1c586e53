package fringekeep.archive.making;

import fringekeep.archive.NewRecord;
import fringekeep.archive.internal.records.SchemaWalk;
import fringekeep.archive.internal.records.SchemaWalk.Place;
import fringekeep.archive.json.CanonicalJson;
import fringekeep.archive.json.Json;
import fringekeep.archive.json.JsonObject;
import fringekeep.archive.json.JsonPointer;
import fringekeep.archive.kind.RecordKind;
import fringekeep.archive.problem.Problem;
import fringekeep.archive.quantity.Quantity;
import fringekeep.archive.quantity.QuantityJson;
import fringekeep.archive.record.PartName;
import java.util.ArrayList;
import java.util.List;
import java.util.Map;
import java.util.TreeMap;

/** Checks parts against format, schema and exact quantities. */
final class PartRules {
    private final SchemaCheck schemas = new SchemaCheck();

    List<Problem> examine(NewRecord record, RecordKind kind) {
        List<Problem> problems = new ArrayList<>(names(record, kind));
        record.parts().entrySet().stream()
                .sorted(Map.Entry.comparingByKey())
                .forEach(part -> problems.addAll(CanonicalJson.examine(
                        part.getValue(), JsonPointer.child("", part.getKey().text()))));
        if (problems.isEmpty()) {
            JsonObject body = body(record.parts());
            problems.addAll(schemas.examine(kind, body));
            if (problems.isEmpty()) {
                problems.addAll(quantities(kind.jsonSchema(kind.schema()), body));
            }
        }
        return problems;
    }

    /** Problems of the choices alone, before there is a result. */
    List<Problem> examineChoices(JsonObject choices, RecordKind kind) {
        JsonObject body = body(Map.of(PartName.CHOICES, choices));
        String pointer = JsonPointer.child("", PartName.CHOICES.text());
        List<Problem> problems = new ArrayList<>(CanonicalJson.examine(choices, pointer));
        if (problems.isEmpty()) {
            schemas.examine(kind, body).stream()
                    .filter(problem -> problem.where().startsWith(pointer))
                    .forEach(problems::add);
        }
        return problems;
    }

    private static JsonObject body(Map<PartName, JsonObject> parts) {
        Map<String, Json> members = new TreeMap<>();
        parts.forEach((name, value) -> members.put(name.text(), value));
        return JsonObject.of(members);
    }

    private static List<Problem> names(NewRecord record, RecordKind kind) {
        List<Problem> problems = new ArrayList<>();
        for (PartName name : record.parts().keySet()) {
            if (name == PartName.MADE || name == PartName.WHO) {
                problems.add(
                        problem("record.part-given", "The part \"" + name.text() + "\" is made by the program.", name));
            } else if (name.salted() && !kind.sealedParts().contains(name)) {
                problems.add(problem(
                        "record.part-unknown", "A " + kind.kind() + " has no part \"" + name.text() + "\".", name));
            }
        }
        boolean entered = record.parts().containsKey(PartName.CONTENT);
        boolean asked = record.parts().containsKey(PartName.CHOICES);
        boolean answered = record.parts().containsKey(PartName.RESULT);
        if (entered && (asked || answered)) {
            problems.add(problem(
                    "record.content-and-result",
                    "Entered content and computed parts never stand together.",
                    PartName.CONTENT));
        } else if (asked != answered) {
            problems.add(problem(
                    "record.half-computed",
                    "Choices and result only stand together.",
                    asked ? PartName.RESULT : PartName.CHOICES));
        }
        if (entered && record.person().isEmpty()) {
            problems.add(new Problem(
                    "record.person-missing",
                    "What is entered or judged needs a person.",
                    "/person",
                    "Name the person who enters it. Nothing has been stored."));
        }
        return problems;
    }

    private static List<Problem> quantities(JsonObject schema, JsonObject body) {
        List<Problem> problems = new ArrayList<>();
        for (Place place : SchemaWalk.quantities(schema, body)) {
            if (JsonPointer.resolve(body, place.pointer()).orElseThrow() instanceof JsonObject json) {
                Quantity quantity = QuantityJson.read(json);
                problems.addAll(QuantityJson.examine(quantity, place.siUnit(), place.pointer()));
            }
        }
        return problems;
    }

    private static Problem problem(String code, String what, PartName name) {
        return new Problem(
                code,
                what,
                JsonPointer.child("", name.text()),
                "Give the parts this kind has. Nothing has been stored.");
    }
}
