package fringekeep.archive.json;

import com.fasterxml.jackson.core.JsonFactory;
import com.fasterxml.jackson.core.JsonLocation;
import com.fasterxml.jackson.core.JsonParser;
import com.fasterxml.jackson.core.JsonProcessingException;
import com.fasterxml.jackson.core.JsonToken;
import com.fasterxml.jackson.core.StreamReadConstraints;
import fringekeep.archive.problem.Problem;
import fringekeep.archive.problem.ProblemException;
import java.io.IOException;
import java.io.UncheckedIOException;
import java.util.ArrayList;
import java.util.HashMap;
import java.util.List;
import java.util.Map;
import java.util.TreeMap;

/** Builds our JSON values from Jackson's stream of tokens and remembers where each value stands. */
final class JsonParsing {
    private static final int LONGEST_NUMBER = 1_000;
    private static final JsonFactory FACTORY = JsonFactory.builder()
            .disable(JsonFactory.Feature.INTERN_FIELD_NAMES)
            .streamReadConstraints(StreamReadConstraints.builder()
                    .maxStringLength(JsonDocument.LARGEST)
                    .maxNumberLength(LONGEST_NUMBER)
                    .maxNameLength(1_000)
                    .maxNestingDepth(10_000)
                    .build())
            .build();

    private final JsonParser parser;
    private final int deepest;
    private final boolean keepPositions;
    private final Map<String, JsonDocument.Position> positions = new HashMap<>();

    private JsonParsing(JsonParser parser, int deepest, boolean keepPositions) {
        this.parser = parser;
        this.deepest = deepest;
        this.keepPositions = keepPositions;
    }

    static JsonDocument document(String text, int deepest) throws ProblemException {
        String body = text.startsWith("\uFEFF") ? text.substring(1) : text;
        return parse(body, deepest, true);
    }

    static Json bare(String text, int deepest) throws ProblemException {
        return parse(text, deepest, false).value();
    }

    private static JsonDocument parse(String text, int deepest, boolean keepPositions) throws ProblemException {
        try (JsonParser parser = FACTORY.createParser(text)) {
            JsonParsing parsing = new JsonParsing(parser, deepest, keepPositions);
            Json value = parsing.whole();
            return new JsonDocument(value, parsing.positions);
        } catch (JsonProcessingException e) {
            throw new ProblemException(new Problem(
                    "json.malformed",
                    "This is not JSON: " + firstSentence(e.getOriginalMessage()),
                    place(e.getLocation()),
                    "Mend the text at that place; nothing has been stored."));
        } catch (IOException e) {
            throw new UncheckedIOException("reading from memory", e);
        }
    }

    private static String firstSentence(String message) {
        int end = message.indexOf('\n');
        String line = end < 0 ? message : message.substring(0, end);
        return line.length() > 300 ? line.substring(0, 300) + "…" : line;
    }

    private Json whole() throws IOException, ProblemException {
        if (parser.nextToken() == null) {
            throw problem("json.empty", "There is no JSON value.", "Write one object.");
        }
        Json value = value("", 0);
        if (parser.nextToken() != null) {
            throw problem("json.trailing", "Something follows after the end of the JSON value.", "Remove it.");
        }
        return value;
    }

    private Json value(String pointer, int depth) throws IOException, ProblemException {
        remember(pointer);
        JsonToken token = parser.currentToken();
        return switch (token) {
            case START_OBJECT -> object(pointer, deeper(depth));
            case START_ARRAY -> array(pointer, deeper(depth));
            case VALUE_STRING -> new JsonText(parser.getText());
            case VALUE_NUMBER_INT, VALUE_NUMBER_FLOAT -> number(parser.getText());
            case VALUE_TRUE -> new JsonBoolean(true);
            case VALUE_FALSE -> new JsonBoolean(false);
            case VALUE_NULL -> throw problem("json.null", "null has no meaning here.", "Leave the member out.");
            case NOT_AVAILABLE, END_OBJECT, END_ARRAY, FIELD_NAME, VALUE_EMBEDDED_OBJECT ->
                throw new IllegalStateException("token " + token + " where a value begins");
        };
    }

    private void remember(String pointer) {
        if (keepPositions) {
            JsonLocation location = parser.currentTokenLocation();
            positions.put(pointer, new JsonDocument.Position(location.getLineNr(), location.getColumnNr()));
        }
    }

    private int deeper(int depth) throws ProblemException {
        if (depth >= deepest) {
            throw problem("json.too-deep", "Containers are nested deeper than " + deepest + ".", "Nest less.");
        }
        return depth + 1;
    }

    private JsonObject object(String pointer, int depth) throws IOException, ProblemException {
        TreeMap<String, Json> members = new TreeMap<>();
        while (parser.nextToken() == JsonToken.FIELD_NAME) {
            String name = parser.currentName();
            if (members.containsKey(name)) {
                throw problem("json.duplicate-name", "The member \"" + name + "\" stands twice.", "Keep one of them.");
            }
            parser.nextToken();
            members.put(name, value(keepPositions ? JsonPointer.child(pointer, name) : "", depth));
        }
        return new JsonObject(members);
    }

    private JsonArray array(String pointer, int depth) throws IOException, ProblemException {
        List<Json> items = new ArrayList<>();
        while (parser.nextToken() != JsonToken.END_ARRAY) {
            items.add(value(keepPositions ? JsonPointer.child(pointer, items.size()) : "", depth));
        }
        return new JsonArray(items);
    }

    private JsonNumber number(String text) throws ProblemException {
        double value = Double.parseDouble(text);
        if (Double.isInfinite(value)) {
            throw problem("json.number-too-large", "The number " + shortened(text) + " is too large.", "Write less.");
        }
        if (value == 0 && !text.split("[eE]", 2)[0].replaceAll("[-.0]", "").isEmpty()) {
            throw problem("json.number-too-small", "The number " + shortened(text) + " is too near zero.", "Write 0.");
        }
        return new JsonNumber(value);
    }

    private static String shortened(String text) {
        return text.length() <= 40 ? text : text.substring(0, 40) + "…";
    }

    private ProblemException problem(String code, String what, String mend) {
        return new ProblemException(
                new Problem(code, what, place(parser.currentTokenLocation()), mend + " Nothing has been stored."));
    }

    private static String place(JsonLocation location) {
        return location == null
                ? ""
                : "line " + Math.max(1, location.getLineNr()) + ", column " + Math.max(1, location.getColumnNr());
    }
}
