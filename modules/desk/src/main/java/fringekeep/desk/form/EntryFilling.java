package fringekeep.desk.form;

import fringekeep.archive.json.Json;
import fringekeep.archive.json.JsonArray;
import fringekeep.archive.json.JsonObject;
import fringekeep.archive.json.JsonPointer;
import fringekeep.archive.json.JsonText;
import fringekeep.archive.problem.Problem;
import fringekeep.archive.problem.ProblemException;
import fringekeep.archive.record.PartName;
import fringekeep.desk.form.Asked.Group;
import fringekeep.desk.form.Asked.Leaf;
import fringekeep.desk.form.Asked.Rows;
import fringekeep.desk.form.Asked.Sort;
import java.util.ArrayList;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import java.util.TreeMap;

/** Makes the entry document of a form out of what was typed. */
final class EntryFilling {
    private final FormKind kind;
    private final LeafText leaves;
    private final Cases cases;
    private final List<Problem> problems = new ArrayList<>();

    EntryFilling(FormKind kind, LeafText leaves) {
        this.kind = kind;
        this.leaves = leaves;
        this.cases = new Cases(kind);
    }

    /**
     * What was made.
     *
     * @param document the entry document; values that cannot be read are left out
     * @param problems what cannot be read, each with the JSON pointer of its field
     */
    record Filled(JsonObject document, List<Problem> problems) {
        Filled {
            problems = List.copyOf(problems);
        }
    }

    /** The document of a state. */
    Filled fill(FormState state) {
        JsonObject typed = state.typed();
        Map<String, Json> document = new TreeMap<>();
        document.put("kind", Json.of(kind.name()));
        part(typed, state.main()).ifPresent(value -> document.put(state.main().text(), value));
        if (!document.containsKey(state.main().text())) {
            document.put(state.main().text(), JsonObject.EMPTY);
        }
        part(typed, PartName.IDENTITY).ifPresent(value -> document.put("identity", value));
        remark(typed).ifPresent(value -> document.put("remark", value));
        for (String member : List.of("about", "inputs")) {
            references(typed, member).ifPresent(value -> document.put(member, value));
        }
        return new Filled(JsonObject.of(document), problems);
    }

    private Optional<Json> part(JsonObject typed, PartName name) {
        String pointer = JsonPointer.child("", name.text());
        return typed.get(name.text())
                .flatMap(value -> kind.part(name).flatMap(asked -> value(asked, value, pointer, false)));
    }

    private static Optional<Json> remark(JsonObject typed) {
        return typed.object("remark")
                .flatMap(remark -> remark.text("text"))
                .filter(words -> !words.isBlank())
                .map(words -> Json.of(words.strip()));
    }

    private Optional<Json> value(Asked asked, Json value, String pointer, boolean item) {
        if (asked instanceof Leaf leaf) {
            return leaf(leaf, value, pointer, item);
        }
        if (asked instanceof Group group && value instanceof JsonObject object) {
            return group(group, object, pointer, item);
        }
        if (asked instanceof Rows rows && value instanceof JsonArray array) {
            List<Json> items = new ArrayList<>();
            for (int i = 0; i < array.items().size(); i++) {
                String below = JsonPointer.child(pointer, i);
                value(rows.item(), array.items().get(i), below, true).ifPresent(items::add);
            }
            return Optional.of(new JsonArray(items));
        }
        return Optional.of(value);
    }

    private Optional<Json> leaf(Leaf leaf, Json value, String pointer, boolean item) {
        if (!(value instanceof JsonText text)) {
            return Optional.of(value);
        }
        boolean empty = leaf.sort() == Sort.CHOICE
                ? text.value().isEmpty()
                : text.value().isBlank();
        if (empty && !item) {
            return Optional.empty();
        }
        if (empty) {
            problems.add(new Problem(
                    "form.empty-row", "This row is empty.", pointer, "Fill it, or remove it with Ctrl Delete."));
            return Optional.empty();
        }
        try {
            return Optional.of(leaves.entered(leaf, text.value()));
        } catch (ProblemException e) {
            e.problems().forEach(problem -> problems.add(problem.at(pointer)));
            return Optional.empty();
        }
    }

    private Optional<Json> group(Group group, JsonObject object, String pointer, boolean item) {
        Map<String, Json> members = new TreeMap<>();
        String path = FormKind.path(pointer);
        object.members().forEach((name, member) -> {
            String below = JsonPointer.child(pointer, name);
            if (cases.asked(path, name, object)) {
                group.member(name)
                        .map(one -> value(one.asked(), member, below, false))
                        .orElse(Optional.of(member))
                        .ifPresent(value -> members.put(name, value));
            }
        });
        return members.isEmpty() && !item ? Optional.empty() : Optional.of(JsonObject.of(members));
    }

    private Optional<Json> references(JsonObject typed, String member) {
        List<Json> items = new ArrayList<>();
        for (Json item : typed.array(member).items()) {
            JsonObject reference = (JsonObject) item;
            if (cases.role(member, reference.text("role").orElse(""), typed)) {
                items.add(item);
            }
        }
        return items.isEmpty() ? Optional.empty() : Optional.of(new JsonArray(items));
    }
}
