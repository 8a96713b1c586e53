package fringekeep.archive.json;

import com.fasterxml.jackson.core.JsonFactory;
import com.fasterxml.jackson.core.JsonGenerator;
import com.fasterxml.jackson.core.json.JsonWriteFeature;
import fringekeep.archive.problem.Problem;
import fringekeep.archive.problem.ProblemException;
import java.io.ByteArrayOutputStream;
import java.io.IOException;
import java.io.UncheckedIOException;
import java.util.Arrays;
import java.util.List;
import java.util.Map;

/**
 * Canonical JSON: RFC 8785 with the narrower rules of record format 1, section 1. Bytes are valid only if reading and
 * writing them gives the same bytes.
 */
public final class CanonicalJson {
    /** Largest part (bytes): 8 MiB. */
    public static final int LARGEST_PART = 8 << 20;

    /** Largest head (bytes): 4 MiB. */
    public static final int LARGEST_HEAD = 4 << 20;

    /** Largest journal entry (bytes): 64 KiB. */
    public static final int LARGEST_ENTRY = 64 << 10;

    private static final JsonFactory FACTORY =
            JsonFactory.builder().disable(JsonWriteFeature.WRITE_HEX_UPPER_CASE).build();

    private CanonicalJson() {}

    /**
     * The canonical bytes of a value.
     *
     * @throws IllegalArgumentException if the value breaks a rule of {@link #examine}
     */
    public static byte[] write(Json value) {
        List<Problem> problems = examine(value, "");
        if (!problems.isEmpty()) {
            throw new IllegalArgumentException(
                    problems.get(0).what() + " " + problems.get(0).where());
        }
        ByteArrayOutputStream bytes = new ByteArrayOutputStream();
        try (JsonGenerator generator = FACTORY.createGenerator(bytes)) {
            write(value, generator);
        } catch (IOException e) {
            throw new UncheckedIOException("writing to memory", e);
        }
        return bytes.toByteArray();
    }

    private static void write(Json value, JsonGenerator generator) throws IOException {
        if (value instanceof JsonObject object) {
            generator.writeStartObject();
            for (Map.Entry<String, Json> member : object.members().entrySet()) {
                generator.writeFieldName(member.getKey());
                write(member.getValue(), generator);
            }
            generator.writeEndObject();
        } else if (value instanceof JsonArray array) {
            generator.writeStartArray();
            for (Json item : array.items()) {
                write(item, generator);
            }
            generator.writeEndArray();
        } else if (value instanceof JsonText text) {
            generator.writeString(text.value());
        } else if (value instanceof JsonNumber number) {
            generator.writeNumber(EcmaScriptNumber.write(number.value()));
        } else if (value instanceof JsonBoolean flag) {
            generator.writeBoolean(flag.value());
        } else {
            throw new AssertionError(value);
        }
    }

    /** What keeps a value from having canonical bytes: names, depth, texts. Empty when it has. */
    public static List<Problem> examine(Json value, String pointer) {
        return CanonicalRules.examine(value, pointer);
    }

    /**
     * Reads canonical bytes of at most {@link #LARGEST_PART}.
     *
     * @throws ProblemException if writing what was read would not give the very same bytes
     */
    public static Json read(byte[] bytes) throws ProblemException {
        return read(bytes, LARGEST_PART);
    }

    /** Reads canonical bytes of at most so many. */
    public static Json read(byte[] bytes, int largest) throws ProblemException {
        if (bytes.length > largest) {
            throw new ProblemException(new Problem(
                    "json.too-large",
                    "There are " + bytes.length + " bytes; at most " + largest + " are taken.",
                    "",
                    ""));
        }
        Json value = JsonParsing.bare(Utf8Text.decode(bytes), CanonicalRules.DEEPEST);
        List<Problem> problems = examine(value, "");
        if (!problems.isEmpty()) {
            throw new ProblemException(problems);
        }
        int differs = Arrays.mismatch(bytes, write(value));
        if (differs >= 0) {
            throw new ProblemException(new Problem(
                    "json.not-canonical",
                    "The bytes are not in canonical form (RFC 8785): byte " + differs + " (from 0) would be another.",
                    "byte " + differs,
                    "Bytes that were hashed are never mended: fetch them again from where they are whole."));
        }
        return value;
    }

    /** Reads canonical bytes of an object. */
    public static JsonObject readObject(byte[] bytes, int largest) throws ProblemException {
        if (read(bytes, largest) instanceof JsonObject object) {
            return object;
        }
        throw new ProblemException(
                new Problem("json.not-an-object", "The bytes hold JSON, but not an object.", "byte 0", ""));
    }
}
