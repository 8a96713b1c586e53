package fringekeep.archive.making;

import com.fasterxml.jackson.databind.JsonNode;
import com.fasterxml.jackson.databind.node.ArrayNode;
import com.fasterxml.jackson.databind.node.JsonNodeFactory;
import com.fasterxml.jackson.databind.node.ObjectNode;
import com.networknt.schema.JsonMetaSchema;
import com.networknt.schema.JsonSchema;
import com.networknt.schema.JsonSchemaFactory;
import com.networknt.schema.NonValidationKeyword;
import com.networknt.schema.PathType;
import com.networknt.schema.SchemaLocation;
import com.networknt.schema.SchemaValidatorsConfig;
import com.networknt.schema.SpecVersion;
import com.networknt.schema.ValidationMessage;
import fringekeep.archive.json.Json;
import fringekeep.archive.json.JsonArray;
import fringekeep.archive.json.JsonBoolean;
import fringekeep.archive.json.JsonNumber;
import fringekeep.archive.json.JsonObject;
import fringekeep.archive.json.JsonText;
import fringekeep.archive.kind.RecordKind;
import fringekeep.archive.kind.SchemaResource;
import fringekeep.archive.problem.Problem;
import java.util.LinkedHashSet;
import java.util.List;
import java.util.Locale;
import java.util.Map;
import java.util.OptionalLong;
import java.util.Set;
import java.util.concurrent.ConcurrentHashMap;

/** Checks values against JSON Schemas (draft 2020-12), with the shared definitions at hand. Thread-safe. */
final class SchemaCheck {
    private static final String BASE = "https://schemas.invalid/";
    private static final String COMMON = "common-1.schema.json";
    private static final int MOST_PROBLEMS = 100;
    private static final JsonNodeFactory NODES = JsonNodeFactory.instance;

    private final Map<String, JsonSchema> compiled = new ConcurrentHashMap<>();
    private final JsonSchemaFactory factory;
    private final SchemaValidatorsConfig configuration;

    SchemaCheck() {
        JsonMetaSchema draft = JsonMetaSchema.builder(JsonMetaSchema.getV202012())
                .keyword(new NonValidationKeyword("siUnit"))
                .keyword(new NonValidationKeyword("usual"))
                .build();
        String common = node(SchemaResource.common().without("$id")).toString();
        factory = JsonSchemaFactory.builder(JsonSchemaFactory.getInstance(SpecVersion.VersionFlag.V202012))
                .metaSchema(draft)
                .defaultMetaSchemaIri(draft.getIri())
                .schemaLoaders(loaders -> loaders.schemas(iri -> iri.endsWith(COMMON) ? common : null))
                .build();
        configuration = SchemaValidatorsConfig.builder()
                .pathType(PathType.JSON_POINTER)
                .locale(Locale.ROOT)
                .build();
    }

    /** What is wrong with the parts of a record of a kind, by the schema number the kind writes. */
    List<Problem> examine(RecordKind kind, JsonObject value) {
        JsonSchema schema = compiled.computeIfAbsent(
                kind.kind() + "/" + kind.schema(), key -> compile(kind.jsonSchema(kind.schema())));
        Set<ValidationMessage> messages = schema.validate(node(value));
        Set<Problem> problems = new LinkedHashSet<>();
        messages.stream().limit(MOST_PROBLEMS).map(SchemaCheck::problem).forEach(problems::add);
        return List.copyOf(problems);
    }

    private JsonSchema compile(JsonObject schema) {
        JsonSchema made = factory.getSchema(
                SchemaLocation.of(BASE + "kind.schema.json"), node(schema.without("$id")), configuration);
        made.initializeValidators();
        return made;
    }

    private static Problem problem(ValidationMessage message) {
        String pointer = message.getInstanceLocation().toString();
        String text = message.getError() == null ? message.getMessage() : message.getError();
        return new Problem(
                "schema." + message.getType(), sentence(text), pointer, mend(message) + " Nothing has been stored.");
    }

    private static String sentence(String text) {
        String body = text.length() > 300 ? text.substring(0, 300) + "…" : text;
        String first = body.substring(0, 1).toUpperCase(Locale.ROOT) + body.substring(1);
        return first.endsWith(".") || first.endsWith("…") ? first : first + ".";
    }

    private static String mend(ValidationMessage message) {
        String member = message.getProperty() == null ? "the member" : "\"" + message.getProperty() + "\"";
        return switch (String.valueOf(message.getType())) {
            case "required" -> "Add " + member + ".";
            case "additionalProperties", "unevaluatedProperties" -> "Remove " + member + " or mend its spelling.";
            case "type" -> "Write a value of the sort that is asked for.";
            case "enum", "const" -> "Use one of the values that are allowed.";
            case "oneOf", "anyOf" -> "Keep to one of the forms that are allowed here.";
            default -> "Mend the value.";
        };
    }

    private static JsonNode node(Json value) {
        if (value instanceof JsonObject object) {
            ObjectNode node = NODES.objectNode();
            object.members().forEach((name, member) -> node.set(name, node(member)));
            return node;
        }
        if (value instanceof JsonArray array) {
            ArrayNode node = NODES.arrayNode();
            array.items().forEach(item -> node.add(node(item)));
            return node;
        }
        if (value instanceof JsonText text) {
            return NODES.textNode(text.value());
        }
        if (value instanceof JsonNumber number) {
            OptionalLong integer = number.asInteger();
            return integer.isPresent() ? NODES.numberNode(integer.getAsLong()) : NODES.numberNode(number.value());
        }
        if (value instanceof JsonBoolean flag) {
            return NODES.booleanNode(flag.value());
        }
        throw new AssertionError(value);
    }
}
