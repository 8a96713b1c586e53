package fringekeep.desk.form;

import fringekeep.archive.json.Json;
import fringekeep.archive.json.JsonArray;
import fringekeep.archive.json.JsonObject;
import fringekeep.archive.json.JsonText;
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

/**
 * An entry document in the shape of the form: the same members, every single value as the text of its field. What the schema
 * does not explain is carried along untouched.
 */
final class TypedDocument {
    private final FormKind kind;
    private final LeafText leaves;

    TypedDocument(FormKind kind, LeafText leaves) {
        this.kind = kind;
        this.leaves = leaves;
    }

    /** The document as typed. */
    JsonObject of(JsonObject document) {
        Map<String, Json> typed = new TreeMap<>();
        for (PartName name : List.of(PartName.CONTENT, PartName.CHOICES, PartName.IDENTITY)) {
            document.get(name.text())
                    .ifPresent(value -> typed.put(
                            name.text(),
                            kind.part(name).map(asked -> value(asked, value)).orElse(value)));
        }
        document.get(PartName.REMARK.text())
                .ifPresent(value -> typed.put(
                        PartName.REMARK.text(),
                        value instanceof JsonText ? JsonObject.EMPTY.with("text", value) : value));
        for (String member : List.of("about", "inputs")) {
            if (!document.array(member).items().isEmpty()) {
                typed.put(member, document.array(member));
            }
        }
        document.get("after").ifPresent(value -> typed.put("after", value));
        return JsonObject.of(typed);
    }

    private Json value(Asked asked, Json value) {
        if (asked instanceof Leaf leaf) {
            return leaves.typed(leaf, value).<Json>map(Json::of).orElse(value);
        }
        if (asked instanceof Group group && value instanceof JsonObject object) {
            Map<String, Json> members = new TreeMap<>();
            object.members()
                    .forEach((name, member) -> members.put(
                            name,
                            group.member(name)
                                    .map(one -> value(one.asked(), member))
                                    .orElse(member)));
            return JsonObject.of(members);
        }
        if (asked instanceof Rows rows && value instanceof JsonArray array) {
            return new JsonArray(
                    array.items().stream().map(item -> value(rows.item(), item)).toList());
        }
        return value;
    }

    /** A draft of a new record: what the schema leaves no choice about is filled in, and what the table says. */
    JsonObject begun() {
        Map<String, Json> typed = new TreeMap<>();
        for (PartName name : List.of(PartName.CONTENT, PartName.CHOICES, PartName.IDENTITY)) {
            kind.part(name)
                    .filter(Group.class::isInstance)
                    .map(Group.class::cast)
                    .ifPresent(group -> typed.put(name.text(), group(group, name.text())));
        }
        return JsonObject.of(typed);
    }

    private JsonObject group(Group group, String path) {
        Map<String, Json> members = new TreeMap<>();
        for (Asked.Member member : group.members()) {
            String below = path + "." + member.name();
            begun(member, below).ifPresent(value -> members.put(member.name(), value));
        }
        return JsonObject.of(members);
    }

    private Optional<Json> begun(Asked.Member member, String path) {
        if (member.asked() instanceof Rows) {
            return member.required() ? Optional.of(rows(path)) : Optional.empty();
        }
        if (member.asked() instanceof Group group) {
            JsonObject filled = member.required() ? group(group, path) : JsonObject.EMPTY;
            return filled.members().isEmpty() ? Optional.empty() : Optional.of(filled);
        }
        Leaf leaf = (Leaf) member.asked();
        Optional<String> given = kind.words().text(path + ".begin");
        boolean one = member.required()
                && leaf.sort() == Sort.CHOICE
                && leaf.options().size() == 1;
        return given.or(() -> one ? Optional.of(leaf.options().get(0)) : Optional.empty())
                .map(Json::of);
    }

    private JsonArray rows(String path) {
        List<Json> items = new ArrayList<>();
        int count = kind.words().text(path + ".begin").map(Integer::parseInt).orElse(0);
        for (int i = 0; i < count; i++) {
            items.add(empty(path));
        }
        return new JsonArray(items);
    }

    /** An empty row of a list at a path. */
    Json empty(String path) {
        Optional<Asked> asked = kind.at("/" + path.replace('.', '/'));
        boolean group = asked.filter(Rows.class::isInstance)
                .map(rows -> ((Rows) rows).item() instanceof Group)
                .orElse(false);
        return group ? JsonObject.EMPTY : Json.of("");
    }
}
