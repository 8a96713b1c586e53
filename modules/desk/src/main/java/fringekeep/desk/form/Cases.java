package fringekeep.desk.form;

import fringekeep.archive.json.JsonObject;
import fringekeep.archive.json.JsonPointer;
import fringekeep.archive.json.JsonText;
import java.util.List;
import java.util.Optional;

/** Which members and roles are asked for, given what was chosen: a grating of light has no slits. */
final class Cases {
    private final FormWords words;

    Cases(FormKind kind) {
        this.words = kind.words();
    }

    /** Whether a member of a group is asked for in the case chosen in it. */
    boolean asked(String path, String member, JsonObject group) {
        Optional<String> by = words.by(path);
        if (by.isEmpty() || by.get().equals(member) || !words.cased(path, member)) {
            return true;
        }
        String code = group.text(by.get()).orElse("");
        return words.inCase(path, code).filter(names -> names.contains(member)).isPresent();
    }

    /** Whether a role is asked for; the table names the member that decides, and its values. */
    boolean role(String member, String role, JsonObject typed) {
        Optional<String> when = words.text(member + "." + role + ".when");
        if (when.isEmpty()) {
            return true;
        }
        String pointer = "/" + when.get().replace('.', '/');
        String chosen = JsonPointer.resolve(typed, pointer)
                .map(value -> value instanceof JsonText text ? text.value() : "")
                .orElse("");
        List<String> codes = words.list(member + "." + role + ".in");
        return codes.contains(chosen.isEmpty() ? "unsaid" : chosen);
    }
}
