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
import fringekeep.desk.form.Asked.Member;
import fringekeep.desk.form.Asked.Rows;
import fringekeep.desk.form.Asked.Sort;
import fringekeep.desk.look.Texts;
import java.util.ArrayList;
import java.util.List;
import java.util.Map;
import java.util.Optional;

/** Lays a form out as rows, from what is asked, what was typed and what stood before. */
final class FormRows {
    private static final Texts TEXTS = new Texts("fringekeep.desk.form.Texts", FormRows.class);
    private static final int FEW = 12;

    private final FormModel model;
    private final FormKind kind;
    private final FormWords words;
    private final LeafText leaves;
    private final Earlier earlier;
    private final Map<String, String> titles;
    private final Cases cases;
    private final JsonObject typed;
    private final JsonObject before;
    private final List<FormRow> rows = new ArrayList<>();

    FormRows(FormModel model, LeafText leaves, Earlier earlier, Map<String, String> titles) {
        this.model = model;
        this.kind = model.kind();
        this.words = kind.words();
        this.leaves = leaves;
        this.earlier = earlier;
        this.titles = titles;
        this.cases = new Cases(kind);
        this.typed = model.state().typed();
        this.before = model.compared().map(FormModel.Before::typed).orElse(JsonObject.EMPTY);
    }

    List<FormRow> rows() {
        if (kind.twoWays()) {
            part();
        }
        PartName main = model.state().main();
        roles("first");
        kind.part(main).ifPresent(asked -> group((Group) asked, "/" + main.text(), 0));
        roles("last");
        if (kind.part(PartName.IDENTITY).isPresent()) {
            rows.add(FormRow.line(FormRow.Sort.HEAD, "/identity", 0, words.label("identity"), TEXTS.of("salted")));
            kind.part(PartName.IDENTITY).ifPresent(asked -> group((Group) asked, "/identity", 0));
        }
        remark();
        return List.copyOf(rows);
    }

    private void part() {
        Leaf leaf = Leaf.of(Sort.CHOICE, "").among(List.of(PartName.CONTENT.text(), PartName.CHOICES.text()));
        field(
                "/part",
                "part",
                words.label("part"),
                0,
                leaf,
                Json.of(model.state().main().text()),
                Optional.empty());
    }

    private void remark() {
        kind.part(PartName.REMARK).ifPresent(asked -> {
            rows.add(FormRow.line(FormRow.Sort.HEAD, "/remark", 0, words.label("remark"), TEXTS.of("salted")));
            String pointer = "/remark/text";
            Leaf leaf = Leaf.of(Sort.WORDS, asked.description());
            String label = words.text("remark.text.label").orElse(TEXTS.of("words"));
            field(pointer, "remark.text", label, 0, leaf, at(typed, pointer), Optional.empty());
        });
    }

    private static Json at(JsonObject root, String pointer) {
        return JsonPointer.resolve(root, pointer).orElse(Json.of(""));
    }

    // ---- groups

    private void group(Group group, String pointer, int depth) {
        String path = FormKind.path(pointer);
        JsonObject here = object(typed, pointer);
        List<String> hidden = new ArrayList<>();
        List<Member> later = new ArrayList<>();
        for (Member member : kind.ordered(group, path)) {
            String below = path + "." + member.name();
            if (words.hidden(below) || !cases.asked(path, member.name(), here)) {
                continue;
            }
            if (!shown(group, pointer, path, member)) {
                hidden.add(words.label(below));
            } else if (member.asked() instanceof Leaf
                    || !words.list(path + ".order").isEmpty()) {
                member(group, member, pointer, depth);
            } else {
                later.add(member);
            }
        }
        boolean open = model.isOpen(pointer + "/*");
        if (!hidden.isEmpty() || open) {
            String text = open ? TEXTS.of("more.less") : String.join(", ", hidden);
            rows.add(FormRow.line(FormRow.Sort.MORE, pointer + "/*", depth, TEXTS.of(open ? "less" : "more"), text));
        }
        later.forEach(member -> member(group, member, pointer, depth));
    }

    private static JsonObject object(JsonObject root, String pointer) {
        return JsonPointer.resolve(root, pointer)
                .filter(JsonObject.class::isInstance)
                .map(JsonObject.class::cast)
                .orElse(JsonObject.EMPTY);
    }

    private boolean shown(Group group, String pointer, String path, Member member) {
        String below = JsonPointer.child(pointer, member.name());
        if (member.required()
                || model.isOpen(pointer + "/*")
                || filled(typed, below)
                || filled(before, below)
                || problem(below)) {
            return true;
        }
        Optional<String> listed = words.text(path + ".shown");
        return listed.isPresent()
                ? words.list(path + ".shown").contains(member.name())
                : group.members().size() <= FEW && member.asked() instanceof Leaf;
    }

    private static boolean filled(JsonObject root, String pointer) {
        return JsonPointer.resolve(root, pointer)
                .filter(value ->
                        !(value instanceof JsonText text) || !text.value().isEmpty())
                .isPresent();
    }

    private boolean problem(String pointer) {
        return model.found().stream().anyMatch(one -> one.where().equals(pointer));
    }

    private void member(Group group, Member member, String pointer, int depth) {
        String below = JsonPointer.child(pointer, member.name());
        String path = FormKind.path(below);
        String label = words.label(path);
        if (member.asked() instanceof Leaf leaf) {
            Leaf narrowed = narrowed(group, member, leaf, object(typed, pointer));
            Optional<Json> old = JsonPointer.resolve(before, below);
            field(below, path, label, depth, narrowed, at(typed, below), old);
        } else if (member.asked() instanceof Group inner) {
            head(below, path, label, depth);
            group(inner, below, depth == 0 && pointer.lastIndexOf('/') == 0 ? 0 : depth + 1);
        } else if (member.asked() instanceof Rows list) {
            head(below, path, label, depth);
            list(list, below, depth);
        }
    }

    private static Leaf narrowed(Group group, Member member, Leaf leaf, JsonObject here) {
        return group.narrowings().stream()
                .filter(one -> one.member().equals(member.name()))
                .filter(one -> here.text(one.by()).equals(Optional.of(one.code())))
                .findFirst()
                .map(one -> leaf.among(one.options()))
                .orElse(leaf);
    }

    private void head(String pointer, String path, String label, int depth) {
        if (!words.headless(path)) {
            rows.add(FormRow.line(
                    FormRow.Sort.HEAD,
                    pointer,
                    depth,
                    label,
                    words.text(path + ".hint").orElse("")));
        }
    }

    // ---- lists

    private void list(Rows list, String pointer, int depth) {
        String path = FormKind.path(pointer);
        int count = TypedTree.size(typed, pointer);
        Optional<String> named = words.text(path + ".named");
        for (int i = 0; i < count; i++) {
            String below = JsonPointer.child(pointer, i);
            String label = words.item(path, i);
            if (list.item() instanceof Leaf leaf) {
                field(below, path, label, depth, leaf, at(typed, below), JsonPointer.resolve(before, below));
            } else if (named.isPresent()) {
                pair((Group) list.item(), below, path, named.get(), depth);
            } else {
                item(list.item(), below, label, depth);
            }
        }
        gone(pointer, path, count, depth);
        if (count < list.most()) {
            String word = words.text(path + ".add").orElseGet(() -> TEXTS.of("add", one(path)));
            Optional<Leaf> leaf = named.map(name -> Leaf.of(Sort.TEXT, ""));
            FormRow add = FormRow.line(
                    FormRow.Sort.ADD, pointer, depth, word, named.isPresent() ? TEXTS.of("add.named") : "");
            rows.add(new FormRow(
                    add.sort(), pointer, depth, word, "", "", "", "", "", "", false, add.words(), List.of(), leaf));
        }
    }

    private String one(String path) {
        return words.item(path, 0).replaceAll("\\s*[0-9]+.*$", "");
    }

    /** Rows that stood before and stand no longer. */
    private void gone(String pointer, String path, int count, int depth) {
        int were = TypedTree.size(before, pointer);
        for (int i = count; i < were; i++) {
            String below = JsonPointer.child(pointer, i);
            String text = summary(path, at(before, below));
            rows.add(new FormRow(
                    FormRow.Sort.ITEM,
                    below,
                    depth,
                    words.item(path, i),
                    "",
                    "",
                    "",
                    "",
                    text,
                    TEXTS.of("gone"),
                    true,
                    TEXTS.of("gone"),
                    List.of(),
                    Optional.empty()));
        }
    }

    /** A row of two members, of which the first is its name and the second what is typed. */
    private void pair(Group group, String pointer, String path, String named, int depth) {
        String name = TypedTree.text(typed, JsonPointer.child(pointer, named));
        Optional<Member> value = group.members().stream()
                .filter(member -> !member.name().equals(named))
                .findFirst();
        value.ifPresent(member -> {
            String below = JsonPointer.child(pointer, member.name());
            Optional<Json> old = namesake(pointer, named, name).flatMap(row -> row.get(member.name()));
            field(below, path + "." + member.name(), name, depth, (Leaf) member.asked(), at(typed, below), old);
        });
    }

    private Optional<JsonObject> namesake(String pointer, String named, String name) {
        return TypedTree.items(before, pointer.substring(0, pointer.lastIndexOf('/'))).stream()
                .filter(JsonObject.class::isInstance)
                .map(JsonObject.class::cast)
                .filter(row -> row.text(named).equals(Optional.of(name)))
                .findFirst();
    }

    private void item(Asked asked, String pointer, String label, int depth) {
        String path = FormKind.path(pointer);
        Json now = at(typed, pointer);
        Optional<Json> old = JsonPointer.resolve(before, pointer);
        boolean trouble = model.found().stream().anyMatch(one -> one.where().startsWith(pointer + "/"))
                || unreadable(asked, pointer, now);
        boolean open = model.isOpen(pointer) || trouble;
        boolean compares = model.compared().isPresent();
        rows.add(new FormRow(
                FormRow.Sort.ITEM,
                pointer,
                depth,
                label,
                "",
                open ? "" : summary(path, now),
                "",
                "",
                open ? "" : old.map(value -> summary(path, value)).orElse(""),
                "",
                compares && !old.equals(Optional.of(now)),
                open ? TEXTS.of("fold") : TEXTS.of("unfold"),
                List.of(),
                Optional.empty()));
        problems(pointer, depth);
        if (open && asked instanceof Group group) {
            group(group, pointer, depth + 1);
        }
    }

    private boolean unreadable(Asked asked, String pointer, Json value) {
        if (asked instanceof Leaf leaf) {
            return value instanceof JsonText text
                    && !text.value().isBlank()
                    && unreadable(leaf, text.value()).isPresent();
        }
        return asked instanceof Group group
                && value instanceof JsonObject object
                && object.members().entrySet().stream()
                        .anyMatch(member -> group.member(member.getKey())
                                .filter(one -> unreadable(
                                        one.asked(), JsonPointer.child(pointer, member.getKey()), member.getValue()))
                                .isPresent());
    }

    /** A row of a list in one line: the values the table names, else all. */
    private String summary(String path, Json value) {
        if (!(value instanceof JsonObject object)) {
            return value instanceof JsonText text ? text.value() : "";
        }
        List<String> names = words.list(path + ".summary");
        List<String> texts = new ArrayList<>();
        for (String name : names.isEmpty() ? List.copyOf(object.members().keySet()) : names) {
            object.get(name).ifPresent(member -> {
                String text = summary(path + "." + name, member);
                if (!text.isBlank()) {
                    texts.add(words.text(path + "." + name + ".brief")
                                    .map(word -> word + " ")
                                    .orElse("")
                            + words.code(path + "." + name, text));
                }
            });
        }
        return String.join(", ", texts);
    }

    // ---- single values

    private void field(String pointer, String path, String label, int depth, Leaf leaf, Json now, Optional<Json> old) {
        String text = now instanceof JsonText typedText ? typedText.value() : "";
        String previous = old.map(value -> value instanceof JsonText was ? was.value() : carried(value))
                .orElse("");
        boolean compares = model.compared().isPresent() && !pointer.equals("/part") && !pointer.equals("/remark/text");
        QuantityReading reading = QuantityReading.of(leaf.sort() == Sort.QUANTITY ? text : "", leaf.siUnit());
        QuantityReading was = QuantityReading.of(leaf.sort() == Sort.QUANTITY ? previous : "", Optional.empty());
        String shown = now instanceof JsonText ? shown(path, leaf, text) : carried(now);
        rows.add(new FormRow(
                FormRow.Sort.FIELD,
                pointer,
                depth,
                label,
                text,
                shown,
                leaf.sort() == Sort.RECORD ? titles.getOrDefault(text, "") : reading.si(),
                reading.siUnit(leaf.siUnit()),
                compares ? shown(path, leaf, previous) : "",
                compares ? reading.change(was) : "",
                compares && !text.equals(previous) && (now instanceof JsonText || !old.equals(Optional.of(now))),
                leaf.description(),
                List.of(),
                Optional.of(leaf)));
        if (!text.isBlank()) {
            unreadable(leaf, text).ifPresent(problem -> rows.add(problem(pointer, depth, problem)));
        }
        problems(pointer, depth);
        if (!text.equals(previous)
                && leaf.sort() == Sort.QUANTITY
                && !text.equals(model.state().meant().get(pointer))) {
            question(pointer, leaf, reading, previous);
        }
    }

    private void question(String pointer, Leaf leaf, QuantityReading reading, String previous) {
        FormRow field = rows.get(rows.size() - 1);
        String kinds = words.several();
        earlier.question(pointer, leaf, reading, previous, kinds).ifPresent(question -> {
            String said = reading.quantity()
                    .map(fringekeep.archive.quantity.ValueText::brief)
                    .orElse("");
            List<String> answers = new ArrayList<>(List.of(TEXTS.of("answer.meant", said)));
            answers.add(question.instead()
                    .map(text -> TEXTS.of("answer.make", text))
                    .orElse(TEXTS.of("answer.change")));
            rows.add(field.asking(question.words(), answers));
        });
    }

    private Optional<Problem> unreadable(Leaf leaf, String text) {
        try {
            if (leaf.sort() == Sort.QUANTITY) {
                return QuantityReading.of(text, leaf.siUnit()).problems().stream()
                        .findFirst();
            }
            leaves.entered(leaf, text);
            return Optional.empty();
        } catch (ProblemException e) {
            return Optional.of(e.problems().get(0));
        }
    }

    private void problems(String pointer, int depth) {
        boolean said = !rows.isEmpty() && rows.get(rows.size() - 1).sort() == FormRow.Sort.PROBLEM;
        if (!said) {
            model.found().stream()
                    .filter(problem -> problem.where().equals(pointer))
                    .forEach(problem -> rows.add(problem(pointer, depth, problem)));
        }
    }

    private static FormRow problem(String pointer, int depth, Problem problem) {
        String mend = problem.mend().replace(" Nothing has been stored.", "").replace("; nothing has been stored", "");
        return FormRow.line(FormRow.Sort.PROBLEM, pointer, depth, "", (problem.what() + " " + mend).strip());
    }

    private String shown(String path, Leaf leaf, String text) {
        return switch (leaf.sort()) {
            case CHOICE -> text.isEmpty() ? "" : words.code(path, text);
            case CHOICES -> {
                List<String> codes = new ArrayList<>();
                for (String code : text.split(",")) {
                    codes.add(words.code(path, code.strip()));
                }
                yield String.join(", ", codes);
            }
            case TEXT, WORDS, QUANTITY, NUMBER, INTEGER, FLAG, MARKED, MOMENT, INSTANT, NUMBERS, RANGES, RECORD, FILE ->
                text;
        };
    }

    /** A value the form cannot type, kept as it is. */
    private static String carried(Json value) {
        return value instanceof JsonArray array && array.items().isEmpty() ? "" : TEXTS.of("carried");
    }

    // ---- others named

    private void roles(String place) {
        boolean headed = false;
        for (FormKind.Part part : kind.roles()) {
            String stands = words.text(part.path() + ".stands").orElse("first");
            boolean asked = cases.role(part.member(), part.role().name(), typed) && !words.hidden(part.path());
            if (asked && stands.equals(place)) {
                if (!headed && place.equals("last")) {
                    rows.add(FormRow.line(
                            FormRow.Sort.HEAD,
                            "/" + part.member(),
                            0,
                            words.text("last.label").orElse(TEXTS.of("made.from")),
                            ""));
                    headed = true;
                }
                role(part);
            }
        }
    }

    private void role(FormKind.Part part) {
        List<JsonObject> entries = typed.array(part.member()).objects();
        List<JsonObject> old = before.array(part.member()).objects().stream()
                .filter(entry -> is(entry, part))
                .toList();
        int count = 0;
        for (int i = 0; i < entries.size(); i++) {
            if (is(entries.get(i), part)) {
                String pointer = "/" + part.member() + "/" + i + "/" + part.key();
                Optional<Json> was = count < old.size() ? old.get(count).get(part.key()) : Optional.empty();
                field(pointer, part.path(), label(part, count), 0, part.leaf(), at(typed, pointer), was);
                problems("/" + part.member() + "/" + i, 0);
                count++;
            }
        }
        if (count < part.role().most()) {
            String pointer = "/" + part.member() + "/+" + part.role().name() + "/" + part.key();
            String label = count == 0 ? label(part, 0) : TEXTS.of("another", words.label(part.path()));
            field(pointer, part.path(), label, 0, part.leaf(), Json.of(""), Optional.empty());
            if (count == 0) {
                problems("/" + part.member() + "/+" + part.role().name(), 0);
            }
        }
    }

    private static boolean is(JsonObject entry, FormKind.Part part) {
        return entry.text("role").equals(Optional.of(part.role().name()))
                && entry.get(part.key()).isPresent();
    }

    private String label(FormKind.Part part, int index) {
        String label = words.text(part.path() + ".label")
                .orElseGet(() -> FormWords.spoken(part.role().name()));
        return index == 0 ? label : label + " " + (index + 1);
    }
}
