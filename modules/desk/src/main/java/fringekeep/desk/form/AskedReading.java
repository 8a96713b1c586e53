package fringekeep.desk.form;

import fringekeep.archive.json.Json;
import fringekeep.archive.json.JsonArray;
import fringekeep.archive.json.JsonBoolean;
import fringekeep.archive.json.JsonObject;
import fringekeep.archive.json.JsonPointer;
import fringekeep.archive.json.JsonText;
import fringekeep.desk.form.Asked.Group;
import fringekeep.desk.form.Asked.Leaf;
import fringekeep.desk.form.Asked.Member;
import fringekeep.desk.form.Asked.Narrowing;
import fringekeep.desk.form.Asked.Rows;
import fringekeep.desk.form.Asked.Sort;
import java.util.ArrayList;
import java.util.HashSet;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import java.util.Set;

/** Reads what is asked for out of a JSON Schema. */
final class AskedReading {
    private static final String SHARED = "common-1.schema.json#/$defs/";
    private static final int LINE = 400;
    private static final int MANY = 1_000_000;

    private final JsonObject root;

    AskedReading(JsonObject root) {
        this.root = root;
    }

    /** What the schema asks for in one part; empty where the kind has no such part. */
    Optional<Asked> part(String name) {
        return root.object("properties")
                .flatMap(parts -> parts.object(name))
                .map(schema -> read(schema, schema.text("description").orElse("")));
    }

    private Asked read(JsonObject schema, String description) {
        Optional<String> reference = schema.text("$ref");
        if (reference.isPresent() && reference.get().startsWith(SHARED)) {
            return shared(reference.get().substring(SHARED.length()), schema, description);
        }
        if (reference.isPresent()) {
            JsonObject target = local(reference.get());
            return read(
                    target, description.isEmpty() ? target.text("description").orElse("") : description);
        }
        return switch (schema.text("type").orElse("")) {
            case "object" -> group(schema, description);
            case "array" -> array(schema, description);
            case "integer" -> Leaf.of(Sort.INTEGER, description);
            case "number" -> Leaf.of(Sort.NUMBER, description);
            case "boolean" -> Leaf.of(Sort.FLAG, description);
            default -> text(schema, description);
        };
    }

    private JsonObject local(String reference) {
        return JsonPointer.resolve(root, reference.substring(1))
                .filter(JsonObject.class::isInstance)
                .map(JsonObject.class::cast)
                .orElseThrow(() -> new IllegalStateException("the schema has no " + reference));
    }

    private static Asked shared(String definition, JsonObject schema, String description) {
        return switch (definition) {
            case "quantity" -> {
                JsonObject usual = schema.object("usual").orElse(JsonObject.EMPTY);
                yield new Leaf(
                        Sort.QUANTITY,
                        description,
                        schema.text("siUnit"),
                        usual.number("from"),
                        usual.number("to"),
                        List.of(),
                        0);
            }
            case "moment" -> Leaf.of(Sort.MOMENT, description);
            case "instant" -> Leaf.of(Sort.INSTANT, description);
            case "covariance" -> Leaf.of(Sort.NUMBERS, description);
            case "text" -> text(schema, description);
            default -> Leaf.of(Sort.TEXT, description);
        };
    }

    private static Leaf text(JsonObject schema, String description) {
        if (schema.get("const").filter(JsonBoolean.class::isInstance).isPresent()) {
            return Leaf.of(Sort.MARKED, description);
        }
        List<String> codes = codes(schema);
        if (!codes.isEmpty()) {
            return Leaf.of(Sort.CHOICE, description).among(codes);
        }
        int longest = (int) schema.integer("maxLength").orElse(MANY);
        Leaf leaf = Leaf.of(longest > LINE ? Sort.WORDS : Sort.TEXT, description);
        return new Leaf(leaf.sort(), description, leaf.siUnit(), leaf.usualFrom(), leaf.usualTo(), List.of(), longest);
    }

    private static List<String> codes(JsonObject schema) {
        Optional<Json> constant = schema.get("const");
        List<Json> items = constant.map(List::of).orElse(schema.array("enum").items());
        return items.stream()
                .filter(JsonText.class::isInstance)
                .map(item -> ((JsonText) item).value())
                .toList();
    }

    private Asked array(JsonObject schema, String description) {
        JsonObject items = schema.object("items").orElse(JsonObject.EMPTY);
        int most = (int) schema.integer("maxItems").orElse(MANY);
        Asked item = read(items, items.text("description").orElse(""));
        if (item instanceof Leaf leaf) {
            if (leaf.sort() == Sort.CHOICE && schema.flag("uniqueItems").orElse(false)) {
                return Leaf.of(Sort.CHOICES, description).among(leaf.options());
            }
            if (leaf.sort() == Sort.NUMBER) {
                return Leaf.of(Sort.NUMBERS, description);
            }
            if (leaf.sort() == Sort.NUMBERS || leaf.sort() == Sort.INTEGER) {
                return new Rows(description, item, most);
            }
        }
        if (item instanceof Rows rows && rows.most() == 2 && rows.item() instanceof Leaf) {
            return Leaf.of(Sort.RANGES, description);
        }
        return new Rows(description, item, most);
    }

    private Group group(JsonObject schema, String description) {
        Set<String> required = new HashSet<>();
        schema.array("required").items().forEach(name -> required.add(((JsonText) name).value()));
        List<Member> members = new ArrayList<>();
        JsonObject properties = schema.object("properties").orElse(JsonObject.EMPTY);
        for (Map.Entry<String, Json> property : properties.members().entrySet()) {
            JsonObject below = (JsonObject) property.getValue();
            members.add(new Member(
                    property.getKey(),
                    read(below, below.text("description").orElse("")),
                    required.contains(property.getKey())));
        }
        return new Group(description, members, narrowings(schema.array("allOf")));
    }

    private static List<Narrowing> narrowings(JsonArray rules) {
        List<Narrowing> narrowings = new ArrayList<>();
        for (Json rule : rules.items()) {
            JsonObject one = (JsonObject) rule;
            members(one, "if")
                    .forEach((by, asked) -> members(one, "then").forEach((member, options) -> {
                        List<String> codes = codes((JsonObject) options);
                        codes((JsonObject) asked)
                                .forEach(code -> narrowings.add(new Narrowing(by, code, member, codes)));
                    }));
        }
        return narrowings;
    }

    private static Map<String, Json> members(JsonObject rule, String word) {
        return rule.object(word)
                .flatMap(side -> side.object("properties"))
                .map(properties -> (Map<String, Json>) properties.members())
                .orElse(Map.of());
    }
}
