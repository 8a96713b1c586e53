package fringekeep.desk.form;

import fringekeep.archive.json.Json;
import fringekeep.archive.json.JsonArray;
import fringekeep.archive.json.JsonObject;
import fringekeep.archive.json.JsonPointer;
import fringekeep.archive.json.JsonText;

/** Types all texts of a filled form into another one, row by row as a person would. */
final class Typing {
    private Typing() {}

    static void into(FormModel form, JsonObject typed) {
        typed.members().forEach((name, value) -> {
            if (name.equals("about") || name.equals("inputs")) {
                ((JsonArray) value).objects().forEach(entry -> refer(form, name, entry));
            } else if (!name.equals("after")) {
                value(form, JsonPointer.child("", name), value);
            }
        });
    }

    private static void refer(FormModel form, String member, JsonObject entry) {
        String key = entry.get("raw").isPresent() ? "raw" : "record";
        String role = entry.text("role").orElseThrow();
        form.type("/" + member + "/+" + role + "/" + key, entry.text(key).orElseThrow());
        int last = TypedTree.size(form.state().typed(), "/" + member) - 1;
        entry.text("reach").ifPresent(reach -> form.type("/" + member + "/" + last + "/reach", reach));
    }

    private static void value(FormModel form, String pointer, Json value) {
        if (value instanceof JsonText text) {
            form.type(pointer, text.value());
        } else if (value instanceof JsonObject object) {
            object.members().forEach((name, member) -> value(form, JsonPointer.child(pointer, name), member));
        } else if (value instanceof JsonArray array) {
            while (TypedTree.size(form.state().typed(), pointer) > array.items().size()) {
                form.remove(pointer + "/0");
            }
            for (int i = 0; i < array.items().size(); i++) {
                String row = TypedTree.size(form.state().typed(), pointer) > i
                        ? JsonPointer.child(pointer, i)
                        : form.addRow(pointer);
                value(form, row, array.items().get(i));
            }
        } else {
            throw new AssertionError("not typed: " + pointer + " " + value);
        }
    }
}
