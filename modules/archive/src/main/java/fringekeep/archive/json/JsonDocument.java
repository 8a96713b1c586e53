package fringekeep.archive.json;

import fringekeep.archive.problem.Problem;
import fringekeep.archive.problem.ProblemException;
import java.util.Map;

/**
 * JSON as people and other programs write it: white space, any order of members, any spelling of numbers. Duplicate names,
 * null, numbers beyond a double and texts that are not Unicode are refused, with line and column.
 *
 * @param value what was read
 * @param positions line and column at which each value stands, by JSON pointer
 */
public record JsonDocument(Json value, Map<String, Position> positions) {
    /** Largest document taken from outside (bytes): 16 MiB. */
    public static final int LARGEST = 16 << 20;

    /** Containers may be nested so deep; the outermost is 1. */
    public static final int DEEPEST = 32;

    /** Copies. */
    public JsonDocument {
        positions = Map.copyOf(positions);
    }

    /**
     * Reads a document in UTF-8, with or without byte-order mark.
     *
     * @throws ProblemException with line and column
     */
    public static JsonDocument read(byte[] bytes) throws ProblemException {
        return read(bytes, LARGEST, DEEPEST);
    }

    /**
     * Reads a document with other limits.
     *
     * @param largest bytes at most
     * @param deepest containers nested at most
     */
    public static JsonDocument read(byte[] bytes, int largest, int deepest) throws ProblemException {
        if (bytes.length > largest) {
            throw new ProblemException(new Problem(
                    "json.too-large",
                    "The document has " + bytes.length + " bytes; at most " + largest + " are taken.",
                    "",
                    "Split it; nothing has been stored."));
        }
        return JsonParsing.document(Utf8Text.decode(bytes), deepest);
    }

    /** Where the value stands that a pointer names, or its nearest container: {@code line 3, column 5}. */
    public String place(String pointer) {
        String here = pointer;
        while (!positions.containsKey(here) && !here.isEmpty()) {
            here = here.substring(0, here.lastIndexOf('/'));
        }
        Position position = positions.getOrDefault(here, new Position(1, 1));
        return "line " + position.line() + ", column " + position.column();
    }

    /** A place in a text, from 1. */
    public record Position(int line, int column) {}
}
