package fringekeep.archive.json;

import java.util.Iterator;
import java.util.Map;

/** JSON laid out for people: one member a line, two spaces deeper each time, short lists of numbers on one line. */
public final class JsonLayout {
    private static final int LONGEST_LINE = 100;

    private JsonLayout() {}

    /** The text of a value, with a line feed at the end. */
    public static String write(Json value) {
        StringBuilder text = new StringBuilder();
        write(value, 0, text);
        return text.append('\n').toString();
    }

    private static void write(Json value, int depth, StringBuilder text) {
        if (value instanceof JsonObject object && !object.members().isEmpty()) {
            text.append("{\n");
            Iterator<Map.Entry<String, Json>> members =
                    object.members().entrySet().iterator();
            while (members.hasNext()) {
                Map.Entry<String, Json> member = members.next();
                text.append("  ".repeat(depth + 1))
                        .append(flat(Json.of(member.getKey())))
                        .append(": ");
                write(member.getValue(), depth + 1, text);
                text.append(members.hasNext() ? ",\n" : "\n");
            }
            text.append("  ".repeat(depth)).append('}');
        } else if (value instanceof JsonArray array && !onOneLine(array)) {
            text.append("[\n");
            for (int i = 0; i < array.items().size(); i++) {
                text.append("  ".repeat(depth + 1));
                write(array.items().get(i), depth + 1, text);
                text.append(i + 1 < array.items().size() ? ",\n" : "\n");
            }
            text.append("  ".repeat(depth)).append(']');
        } else {
            text.append(flat(value));
        }
    }

    private static boolean onOneLine(JsonArray array) {
        return array.items().stream().noneMatch(item -> item instanceof JsonObject || item instanceof JsonArray)
                && flat(array).length() <= LONGEST_LINE;
    }

    private static String flat(Json value) {
        return CanonicalText.write(value);
    }
}
