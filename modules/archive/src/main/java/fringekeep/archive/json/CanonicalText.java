package fringekeep.archive.json;

import java.util.StringJoiner;

/** Any value on one line, without the rules of stored bytes (member names may be free). */
final class CanonicalText {
    private CanonicalText() {}

    static String write(Json value) {
        if (value instanceof JsonObject object) {
            StringJoiner members = new StringJoiner(",", "{", "}");
            object.members().forEach((name, member) -> members.add(quoted(name) + ":" + write(member)));
            return members.toString();
        }
        if (value instanceof JsonArray array) {
            StringJoiner items = new StringJoiner(", ", "[", "]");
            array.items().forEach(item -> items.add(write(item)));
            return items.toString();
        }
        if (value instanceof JsonText text) {
            return quoted(text.value());
        }
        if (value instanceof JsonNumber number) {
            return EcmaScriptNumber.write(number.value());
        }
        if (value instanceof JsonBoolean flag) {
            return Boolean.toString(flag.value());
        }
        throw new AssertionError(value);
    }

    private static String quoted(String text) {
        StringBuilder quoted = new StringBuilder("\"");
        for (int i = 0; i < text.length(); i++) {
            char c = text.charAt(i);
            switch (c) {
                case '"' -> quoted.append("\\\"");
                case '\\' -> quoted.append("\\\\");
                case '\n' -> quoted.append("\\n");
                case '\t' -> quoted.append("\\t");
                case '\r' -> quoted.append("\\r");
                default -> {
                    if (c < 0x20 || Character.isSurrogate(c) && !paired(text, i)) {
                        quoted.append(String.format(java.util.Locale.ROOT, "\\u%04x", (int) c));
                    } else {
                        quoted.append(c);
                    }
                }
            }
        }
        return quoted.append('"').toString();
    }

    private static boolean paired(String text, int i) {
        return Character.isHighSurrogate(text.charAt(i))
                ? i + 1 < text.length() && Character.isLowSurrogate(text.charAt(i + 1))
                : i > 0 && Character.isHighSurrogate(text.charAt(i - 1));
    }
}
