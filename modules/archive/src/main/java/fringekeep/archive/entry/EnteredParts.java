package fringekeep.archive.entry;

import fringekeep.archive.internal.records.SchemaWalk;
import fringekeep.archive.internal.records.SchemaWalk.Place;
import fringekeep.archive.json.EcmaScriptNumber;
import fringekeep.archive.json.Json;
import fringekeep.archive.json.JsonArray;
import fringekeep.archive.json.JsonNumber;
import fringekeep.archive.json.JsonObject;
import fringekeep.archive.json.JsonPointer;
import fringekeep.archive.json.JsonText;
import fringekeep.archive.kind.RecordKind;
import fringekeep.archive.problem.Problem;
import fringekeep.archive.problem.ProblemException;
import fringekeep.archive.quantity.Quantity;
import fringekeep.archive.quantity.QuantityJson;
import fringekeep.archive.quantity.QuantityText;
import fringekeep.archive.quantity.Uncertainty;
import fringekeep.archive.quantity.ValueText;
import fringekeep.archive.record.PartName;
import java.text.Normalizer;
import java.util.ArrayList;
import java.util.EnumMap;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import java.util.OptionalDouble;
import java.util.TreeMap;

/** Reads the parts of a document: texts in normal form, quantities and moments from text. */
final class EnteredParts {
    private static final List<PartName> ENTERED =
            List.of(PartName.CONTENT, PartName.CHOICES, PartName.IDENTITY, PartName.REMARK);

    private final Trouble trouble;
    private final Optional<RecordKind> kind;
    private final List<Problem> questions = new ArrayList<>();

    EnteredParts(Trouble trouble, Optional<RecordKind> kind) {
        this.trouble = trouble;
        this.kind = kind;
    }

    List<Problem> questions() {
        return questions;
    }

    Map<PartName, JsonObject> values(JsonObject document) {
        Json body = normal(body(document));
        if (kind.isPresent()) {
            JsonObject schema = kind.get().jsonSchema(kind.get().schema());
            for (Place place : SchemaWalk.quantities(schema, body)) {
                body = quantity(body, place);
            }
            for (Place place : SchemaWalk.moments(schema, body)) {
                body = moment(body, place);
            }
        }
        Map<PartName, JsonObject> values = new EnumMap<>(PartName.class);
        for (PartName name : ENTERED) {
            ((JsonObject) body).object(name.text()).ifPresent(value -> values.put(name, value));
        }
        return values;
    }

    private JsonObject body(JsonObject document) {
        Map<String, Json> members = new TreeMap<>();
        for (PartName name : ENTERED) {
            document.get(name.text()).ifPresent(value -> {
                if (value instanceof JsonObject) {
                    members.put(name.text(), value);
                } else if (name == PartName.REMARK && value instanceof JsonText) {
                    members.put(name.text(), JsonObject.EMPTY.with("text", value));
                } else {
                    trouble.add(
                            "entry.part",
                            "\"" + name.text() + "\" is an object.",
                            JsonPointer.child("", name.text()),
                            "Write {…}.");
                }
            });
        }
        return JsonObject.of(members);
    }

    private static Json normal(Json value) {
        if (value instanceof JsonText text) {
            String lines = text.value().replace("\r\n", "\n").replace('\r', '\n');
            return new JsonText(Normalizer.normalize(lines, Normalizer.Form.NFC));
        }
        if (value instanceof JsonArray array) {
            return new JsonArray(
                    array.items().stream().map(EnteredParts::normal).toList());
        }
        if (value instanceof JsonObject object) {
            Map<String, Json> members = new TreeMap<>();
            object.members().forEach((name, member) -> members.put(name, normal(member)));
            return JsonObject.of(members);
        }
        return value;
    }

    private Json quantity(Json body, Place place) {
        Json value = JsonPointer.resolve(body, place.pointer()).orElseThrow();
        Optional<Quantity> quantity;
        try {
            quantity = understood(value, place);
        } catch (ProblemException e) {
            e.problems().forEach(problem -> trouble.add(problem.at(place.pointer())));
            return body;
        }
        if (quantity.isEmpty()) {
            return body;
        }
        List<Problem> problems = QuantityJson.examine(quantity.get(), place.siUnit(), place.pointer());
        problems.forEach(trouble::add);
        if (problems.isEmpty()) {
            question(quantity.get(), place);
        }
        return JsonPointer.replace(body, place.pointer(), QuantityJson.write(quantity.get()));
    }

    /** Empty for what is left to the schema to refuse or to take as it is. */
    private static Optional<Quantity> understood(Json value, Place place) throws ProblemException {
        if (value instanceof JsonText text) {
            return Optional.of(QuantityText.parse(text.value()));
        }
        if (value instanceof JsonNumber number) {
            if (place.siUnit().equals(Optional.of("1"))) {
                return Optional.of(QuantityText.parse(EcmaScriptNumber.write(number.value())));
            }
            throw new ProblemException(new Problem(
                    "entry.bare-number",
                    "A number alone says neither unit nor uncertainty.",
                    place.pointer(),
                    "Write a text with a unit, such as \"10.50(5) mm\". Nothing has been stored."));
        }
        if (value instanceof JsonObject object
                && object.text("text").isPresent()
                && object.text("unit").isPresent()) {
            return fromMembers(object);
        }
        return Optional.empty();
    }

    private static Optional<Quantity> fromMembers(JsonObject object) throws ProblemException {
        Optional<JsonObject> uncertainty = object.object("uncertainty");
        String sort = uncertainty.flatMap(one -> one.text("sort")).orElse("unstated");
        boolean complete = object.number("si").isPresent()
                && uncertainty.isPresent()
                && (!sort.equals("stated") || uncertainty.get().number("si").isPresent());
        if (complete || !object.text("text").orElseThrow().matches("-?[0-9]+(\\.[0-9]+)?([eE][+-]?[0-9]{1,3})?")) {
            return complete ? readable(object) : Optional.empty();
        }
        Optional<String> deviation = uncertainty.flatMap(one -> one.text("text"));
        Quantity quantity =
                QuantityText.of(object.text("text").get(), object.text("unit").orElseThrow(), deviation);
        return Optional.of(
                sort.equals("exact")
                        ? new Quantity(quantity.text(), quantity.unit(), quantity.si(), new Uncertainty.Exact())
                        : quantity);
    }

    private static Optional<Quantity> readable(JsonObject object) {
        try {
            return Optional.of(QuantityJson.read(object));
        } catch (IllegalArgumentException e) {
            return Optional.empty();
        }
    }

    private void question(Quantity quantity, Place place) {
        double si = quantity.si();
        boolean usual =
                si >= place.usualFrom().orElse(si) && si <= place.usualTo().orElse(si);
        if (!usual) {
            questions.add(trouble.placed(new Problem(
                    "entry.unusual",
                    "Is " + ValueText.entered(quantity) + " right? It is outside of what is usual, "
                            + end(place.usualFrom()) + " to " + end(place.usualTo()) + " "
                            + place.siUnit().orElse("") + ".",
                    place.pointer(),
                    "Mend it, or go on if it is right.")));
        }
    }

    private static String end(OptionalDouble end) {
        return end.isPresent() ? ValueText.number(end.getAsDouble()) : "…";
    }

    private Json moment(Json body, Place place) {
        if (JsonPointer.resolve(body, place.pointer()).orElseThrow() instanceof JsonText text) {
            try {
                return JsonPointer.replace(body, place.pointer(), QuantityJson.write(MomentText.parse(text.value())));
            } catch (ProblemException e) {
                e.problems().forEach(problem -> trouble.add(problem.at(place.pointer())));
            }
        }
        return body;
    }
}
