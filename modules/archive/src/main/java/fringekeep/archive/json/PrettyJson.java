package fringekeep.archive.json;

import java.nio.charset.StandardCharsets;
import java.util.Iterator;
import java.util.Map;

/**
 * JSON documents of published standards as people read them: two spaces a level, one line end after the last brace. Members
 * keep the order of UTF-16 code units, numbers the shortest form, so equal values give equal bytes. Names are free (standards
 * use {@code @id} and {@code prov:type}), unlike those of records.
 */
public final class PrettyJson {
    private PrettyJson() {}

    /** The document in UTF-8. */
    public static byte[] write(Json value) {
        StringBuilder text = new StringBuilder();
        append(text, value, 0);
        return text.append('\n').toString().getBytes(StandardCharsets.UTF_8);
    }

    private static void append(StringBuilder text, Json value, int depth) {
        if (value instanceof JsonObject object) {
            object(text, object, depth);
        } else if (value instanceof JsonArray array) {
            array(text, array, depth);
        } else {
            scalar(text, value);
        }
    }

    private static void object(StringBuilder text, JsonObject object, int depth) {
        if (object.members().isEmpty()) {
            text.append("{}");
            return;
        }
        text.append('{');
        Iterator<Map.Entry<String, Json>> members = object.members().entrySet().iterator();
        while (members.hasNext()) {
            Map.Entry<String, Json> member = members.next();
            line(text, depth + 1);
            scalar(text, new JsonText(member.getKey()));
            text.append(": ");
            append(text, member.getValue(), depth + 1);
            text.append(members.hasNext() ? "," : "");
        }
        line(text, depth);
        text.append('}');
    }

    private static void array(StringBuilder text, JsonArray array, int depth) {
        if (array.items().isEmpty()) {
            text.append("[]");
            return;
        }
        text.append('[');
        Iterator<Json> items = array.items().iterator();
        while (items.hasNext()) {
            line(text, depth + 1);
            append(text, items.next(), depth + 1);
            text.append(items.hasNext() ? "," : "");
        }
        line(text, depth);
        text.append(']');
    }

    private static void scalar(StringBuilder text, Json value) {
        text.append(new String(CanonicalJson.write(value), StandardCharsets.UTF_8));
    }

    private static void line(StringBuilder text, int depth) {
        text.append('\n').append("  ".repeat(depth));
    }
}
