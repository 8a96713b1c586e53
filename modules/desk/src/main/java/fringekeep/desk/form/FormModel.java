package fringekeep.desk.form;

import fringekeep.archive.json.Json;
import fringekeep.archive.json.JsonArray;
import fringekeep.archive.json.JsonObject;
import fringekeep.archive.json.JsonPointer;
import fringekeep.archive.problem.Problem;
import fringekeep.archive.problem.ProblemException;
import fringekeep.archive.record.Hash;
import fringekeep.archive.record.PartName;
import fringekeep.desk.form.FormState.Way;
import java.nio.file.Path;
import java.time.ZoneId;
import java.util.ArrayDeque;
import java.util.ArrayList;
import java.util.Deque;
import java.util.HashMap;
import java.util.HashSet;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import java.util.Set;

/**
 * A form in hand: what was typed, what stood before, undo and redo, and the entry document it makes. Knows no archive and no
 * window; to be used by one thread.
 */
final class FormModel {
    /**
     * The record a form begins from.
     *
     * @param record its fingerprint
     * @param label what people call it
     * @param typed what it says, as typed
     */
    record Before(Hash record, String label, JsonObject typed) {}

    private static final int DEEPEST_UNDO = 500;

    private final FormKind kind;
    private final LocalMoment moments;
    private final LeafText leaves;
    private final Deque<FormState> undo = new ArrayDeque<>();
    private final Deque<FormState> redo = new ArrayDeque<>();
    private final Set<String> open = new HashSet<>();
    private final Map<String, String> titles = new HashMap<>();
    private FormState state;
    private Optional<Before> base = Optional.empty();
    private Optional<Before> compared = Optional.empty();
    private Earlier earlier = Earlier.NOTHING;
    private List<Problem> found = List.of();
    private String coalescing = "";

    FormModel(FormKind kind, ZoneId zone) {
        this.kind = kind;
        this.moments = new LocalMoment(zone);
        this.leaves = new LeafText(moments);
        JsonObject begun = new TypedDocument(kind, leaves).begun();
        this.state = new FormState(begun, kind.main(JsonObject.EMPTY), Way.NEW, "", Map.of());
    }

    // ---- where it begins

    /** Begins from an entry document: a new record filled in so far. */
    void begin(JsonObject document) {
        JsonObject typed = merged(state.typed(), typed(document));
        state = state.typed(typed).main(kind.main(document));
        forget();
    }

    private static JsonObject merged(JsonObject under, JsonObject over) {
        JsonObject both = under;
        for (Map.Entry<String, Json> member : over.members().entrySet()) {
            Json value = member.getValue();
            Optional<JsonObject> below = under.object(member.getKey());
            both = both.with(
                    member.getKey(),
                    value instanceof JsonObject object && below.isPresent() ? merged(below.get(), object) : value);
        }
        return both;
    }

    /** Begins from a record that is corrected or continued. */
    void begin(Before from, JsonObject document, Way way, String instant) {
        base = Optional.of(from);
        compared = base;
        state = new FormState(typed(document).without("remark"), kind.main(document), way, instant, Map.of());
        forget();
    }

    /** Goes on from a draft. */
    void resume(FormState draft, Optional<Before> from) {
        base = from;
        compared = from;
        state = draft;
        forget();
    }

    private void forget() {
        undo.clear();
        redo.clear();
        coalescing = "";
    }

    JsonObject typed(JsonObject document) {
        return new TypedDocument(kind, leaves).of(document);
    }

    // ---- what is known

    FormKind kind() {
        return kind;
    }

    FormState state() {
        return state;
    }

    LocalMoment moments() {
        return moments;
    }

    /** The record that is corrected or continued. */
    Optional<Before> base() {
        return base;
    }

    /** The record shown in the column before. */
    Optional<Before> compared() {
        return compared;
    }

    /** Compares with another earlier record. */
    void compare(Before other) {
        compared = Optional.of(other);
    }

    void earlier(Earlier known) {
        earlier = known;
    }

    /** What records named in the form are called. */
    void titles(Map<String, String> known) {
        titles.putAll(known);
    }

    /** What was found wrong when the document was examined; each with the pointer of its field, or none. */
    void found(List<Problem> problems) {
        found = List.copyOf(problems);
        problems.forEach(problem -> reveal(problem.where()));
    }

    List<Problem> found() {
        return found;
    }

    /** Opens all rows of lists on the way to a place. */
    void reveal(String pointer) {
        String here = pointer;
        while (here.lastIndexOf('/') > 0) {
            here = here.substring(0, here.lastIndexOf('/'));
            open.add(here);
        }
    }

    boolean isOpen(String pointer) {
        return open.contains(pointer);
    }

    void toggle(String pointer) {
        if (!open.remove(pointer)) {
            open.add(pointer);
        }
    }

    /** The rows to show. */
    List<FormRow> rows() {
        return new FormRows(this, leaves, earlier, titles).rows();
    }

    /** What was typed at a place. */
    String text(String pointer) {
        return TypedTree.text(state.typed(), pointer);
    }

    // ---- changes

    private void change(FormState next, String what) {
        if (next.equals(state)) {
            return;
        }
        if (!what.equals(coalescing) || what.isEmpty()) {
            undo.push(state);
            if (undo.size() > DEEPEST_UNDO) {
                undo.removeLast();
            }
        }
        coalescing = what;
        redo.clear();
        state = next;
    }

    /** The field was left: what is typed next is a step of undo of its own. */
    void settle() {
        coalescing = "";
    }

    /** Types into a field; successive letters into one field are one step of undo. */
    void type(String pointer, String text) {
        if (pointer.equals("/from")) {
            change(state.from(text), pointer);
        } else if (pointer.contains("/+")) {
            refer(pointer, text);
        } else if (pointer.matches("/(about|inputs)/[0-9]+/(record|raw)")) {
            retype(pointer, text);
        } else {
            change(state.typed(TypedTree.put(state.typed(), pointer, text)), pointer);
        }
        found = found.stream()
                .filter(problem -> !problem.where().equals(pointer))
                .toList();
    }

    /** Names a further record or file under a role: pointer {@code /about/+batch/record}. */
    private void refer(String pointer, String text) {
        List<String> steps = JsonPointer.steps(pointer);
        if (text.isBlank()) {
            return;
        }
        String role = steps.get(1).substring(1);
        String key = steps.get(2);
        JsonObject entry = JsonObject.EMPTY.with("role", role).with(key, text);
        JsonObject next = TypedTree.add(state.typed(), "/" + steps.get(0), entry);
        change(state.typed(named(next, role, key, text)), "");
    }

    /** The record knows the file by its name, where the kind keeps one. */
    private JsonObject named(JsonObject typed, String role, String key, String text) {
        Optional<String> path = kind.words().text("inputs." + role + ".named");
        if (!key.equals("raw") || path.isEmpty()) {
            return typed;
        }
        Path last = Path.of(text).getFileName();
        String name = last == null ? text : last.toString();
        String pointer = "/" + path.get().replace('.', '/');
        boolean many = kind.at(pointer).filter(Asked.Rows.class::isInstance).isPresent();
        return many
                ? TypedTree.add(typed, pointer, JsonObject.EMPTY.with("name", name))
                : TypedTree.put(typed, pointer + "/name", name);
    }

    private void retype(String pointer, String text) {
        if (text.isBlank()) {
            remove(pointer.substring(0, pointer.lastIndexOf('/')));
            return;
        }
        change(state.typed(TypedTree.put(state.typed(), pointer, text)), pointer);
    }

    /** Adds an empty row to a list and opens it; answers its pointer. */
    String addRow(String list) {
        return addRow(list, new TypedDocument(kind, leaves).empty(FormKind.path(list)));
    }

    /** Adds a row to a list. */
    String addRow(String list, Json item) {
        int index = TypedTree.size(state.typed(), list);
        change(state.typed(TypedTree.add(state.typed(), list, item)), "");
        String pointer = JsonPointer.child(list, index);
        open.add(pointer);
        return pointer;
    }

    /** Takes a row out of its list. */
    void remove(String pointer) {
        int slash = pointer.lastIndexOf('/');
        String list = pointer.substring(0, slash);
        int index = Integer.parseInt(pointer.substring(slash + 1));
        JsonObject next = TypedTree.remove(state.typed(), list, index, required(list));
        if (list.equals("/inputs")) {
            next = unnamed(next, index);
        }
        change(state.typed(next), "");
    }

    private JsonObject unnamed(JsonObject typed, int index) {
        List<JsonObject> inputs = state.typed().array("inputs").objects();
        String role = inputs.get(index).text("role").orElse("");
        Optional<String> path = kind.words().text("inputs." + role + ".named");
        long among = inputs.subList(0, index).stream()
                .filter(input -> input.text("role").equals(Optional.of(role)))
                .count();
        String pointer = path.map(words -> "/" + words.replace('.', '/')).orElse("");
        boolean many = path.isPresent() && TypedTree.size(typed, pointer) > among;
        return many ? TypedTree.remove(typed, pointer, (int) among, false) : typed;
    }

    private boolean required(String list) {
        int slash = list.lastIndexOf('/');
        String name = list.substring(slash + 1);
        return slash > 0
                && kind.at(list.substring(0, slash))
                        .filter(Asked.Group.class::isInstance)
                        .flatMap(group -> ((Asked.Group) group).member(name))
                        .filter(Asked.Member::required)
                        .isPresent();
    }

    /** Chooses between correcting and coming after. */
    void way(Way way) {
        change(state.way(way), "");
    }

    /** Chooses which part holds the facts. */
    void main(PartName part) {
        change(state.main(part), "");
    }

    /** An unusual value is meant as it is typed. */
    void mean(String pointer) {
        change(state.meaning(pointer, text(pointer)), "");
    }

    /** Notes whether the cautions were read, where the kind keeps that. */
    void acknowledge(String pointer, boolean read) {
        if (kind.at(pointer).isPresent()) {
            change(state.typed(TypedTree.put(state.typed(), pointer, read ? LeafText.YES : "")), pointer);
        }
    }

    /** Cautions are read anew with every record: nothing is noted at the begin of a form. */
    void notAcknowledged(String pointer) {
        if (!text(pointer).isEmpty()) {
            state = state.typed(TypedTree.put(state.typed(), pointer, ""));
        }
    }

    /** Fills what is still empty with what a document says. */
    void fill(JsonObject document) {
        JsonObject like = typed(document);
        change(state.typed(merged(like, blankless(state.typed()))), "");
    }

    private static JsonObject blankless(JsonObject typed) {
        JsonObject kept = JsonObject.EMPTY;
        for (Map.Entry<String, Json> member : typed.members().entrySet()) {
            Json value = member.getValue();
            if (value instanceof JsonObject object) {
                kept = kept.with(member.getKey(), blankless(object));
            } else if (!(value instanceof JsonArray array)
                    || array.items().stream().anyMatch(FormModel::says)) {
                kept = kept.with(member.getKey(), value);
            }
        }
        return kept;
    }

    private static boolean says(Json item) {
        return !item.equals(JsonObject.EMPTY) && !item.equals(Json.of(""));
    }

    boolean undo() {
        return step(undo, redo);
    }

    boolean redo() {
        return step(redo, undo);
    }

    private boolean step(Deque<FormState> from, Deque<FormState> to) {
        if (from.isEmpty()) {
            return false;
        }
        to.push(state);
        state = from.pop();
        coalescing = "";
        found = List.of();
        return true;
    }

    /** Whether anything was typed or chosen since the form began. */
    boolean touched() {
        return !undo.isEmpty();
    }

    // ---- the document

    /** The entry document as far as it can be read, and what cannot. */
    EntryFilling.Filled document() {
        EntryFilling.Filled filled = new EntryFilling(kind, leaves).fill(state);
        List<Problem> problems = new ArrayList<>(filled.problems());
        JsonObject document = filled.document();
        if (base.isPresent() && state.way() == Way.CORRECTS) {
            document = document.with("corrects", base.get().record().hex());
            Optional<Json> after =
                    Optional.ofNullable(base.get().typed().members().get("after"));
            document = document.with("after", after);
        } else if (base.isPresent() && state.way() == Way.AFTER) {
            document = after(document, base.get(), problems);
        }
        return new EntryFilling.Filled(document, problems);
    }

    private JsonObject after(JsonObject document, Before from, List<Problem> problems) {
        try {
            String instant = moments.read(state.from()).toInstant().toString();
            return document.with(
                    "after",
                    JsonObject.EMPTY.with("record", from.record().hex()).with("from", instant));
        } catch (ProblemException e) {
            e.problems().forEach(problem -> problems.add(problem.at("/from")));
            return document;
        }
    }

    /** Texts under which other records are named in the form. */
    List<String> references() {
        List<String> texts = new ArrayList<>();
        for (String member : List.of("about", "inputs")) {
            JsonArray entries = state.typed().array(member);
            entries.objects().forEach(entry -> entry.text("record").ifPresent(texts::add));
        }
        return texts;
    }
}
