package fringekeep.archive.json;

import fringekeep.archive.problem.Problem;
import java.util.ArrayList;
import java.util.List;
import java.util.Map;
import java.util.regex.Pattern;

/** What a value must keep to so that canonical bytes exist: names, depth, texts (record format 1, sections 1 and 15). */
final class CanonicalRules {
    static final int DEEPEST = 32;
    static final int LONGEST_TEXT = 1 << 20;
    private static final Pattern NAME = Pattern.compile("[a-z][A-Za-z0-9]{0,39}");
    private static final int MOST_PROBLEMS = 100;

    private final List<Problem> problems = new ArrayList<>();

    private CanonicalRules() {}

    static List<Problem> examine(Json value, String pointer) {
        CanonicalRules rules = new CanonicalRules();
        rules.look(value, pointer, 1);
        return List.copyOf(rules.problems);
    }

    private void look(Json value, String pointer, int depth) {
        if (problems.size() >= MOST_PROBLEMS) {
            return;
        }
        if (value instanceof JsonObject object) {
            if (allows(depth, pointer)) {
                object.members().entrySet().forEach(member -> look(member, pointer, depth));
            }
        } else if (value instanceof JsonArray array) {
            if (allows(depth, pointer)) {
                for (int i = 0; i < array.items().size(); i++) {
                    look(array.items().get(i), JsonPointer.child(pointer, i), depth + 1);
                }
            }
        } else if (value instanceof JsonText text) {
            look(text.value(), pointer);
        }
    }

    private void look(Map.Entry<String, Json> member, String pointer, int depth) {
        String here = JsonPointer.child(pointer, member.getKey());
        if (!NAME.matcher(member.getKey()).matches()) {
            add(
                    "json.name",
                    "A member may not be called \"" + member.getKey() + "\".",
                    here,
                    "Use a letter a to z, then" + " letters and digits, at most 40.");
        }
        look(member.getValue(), here, depth + 1);
    }

    private boolean allows(int depth, String pointer) {
        if (depth <= DEEPEST) {
            return true;
        }
        add("json.too-deep", "Containers are nested deeper than " + DEEPEST + ".", pointer, "Nest less.");
        return false;
    }

    private void look(String text, String pointer) {
        long bytes = 0;
        for (int i = 0; i < text.length(); i++) {
            char c = text.charAt(i);
            if (c == 0) {
                add("json.zero-character", "A text holds the character U+0000.", pointer, "Remove it.");
                return;
            }
            if (Character.isSurrogate(c)) {
                boolean pair = Character.isHighSurrogate(c)
                        && i + 1 < text.length()
                        && Character.isLowSurrogate(text.charAt(i + 1));
                if (!pair) {
                    add("json.lone-surrogate", "A text holds half a character.", pointer, "Write the text anew.");
                    return;
                }
                i++;
                bytes += 4;
            } else {
                bytes += c < 0x80 ? 1 : c < 0x800 ? 2 : 3;
            }
        }
        if (bytes > LONGEST_TEXT) {
            add(
                    "json.text-too-long",
                    "A text has " + bytes + " bytes; at most " + LONGEST_TEXT + " are kept.",
                    pointer,
                    "Shorten it, or attach it as a file.");
        }
    }

    private void add(String code, String what, String pointer, String mend) {
        problems.add(new Problem(code, what, pointer, mend + " Nothing has been stored."));
    }
}
