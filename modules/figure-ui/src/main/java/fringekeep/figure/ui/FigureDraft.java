package fringekeep.figure.ui;

import fringekeep.archive.Archive;
import fringekeep.archive.NewRecord;
import fringekeep.archive.facet.Plottable;
import fringekeep.archive.json.Json;
import fringekeep.archive.json.JsonArray;
import fringekeep.archive.json.JsonObject;
import fringekeep.archive.json.JsonPointer;
import fringekeep.archive.kind.RecordView;
import fringekeep.archive.record.Hash;
import fringekeep.archive.record.InputReference;
import fringekeep.archive.record.KindName;
import fringekeep.archive.record.PartName;
import fringekeep.archive.record.PersonId;
import java.util.ArrayDeque;
import java.util.ArrayList;
import java.util.Deque;
import java.util.List;
import java.util.Map;
import java.util.Optional;

/** A figure that is being drawn: choices that can be changed and undone, and the records it takes numbers from. */
final class FigureDraft {
    private final List<Source> sources;
    private final Optional<Hash> corrects;
    private final Deque<JsonObject> past = new ArrayDeque<>();
    private final Deque<JsonObject> future = new ArrayDeque<>();
    private JsonObject choices;

    /**
     * A record the figure takes numbers from.
     *
     * @param record its fingerprint
     * @param role what for
     * @param label what people call it
     * @param offers names of the series it offers
     */
    record Source(Hash record, String role, String label, List<String> offers) {
        Source {
            offers = List.copyOf(offers);
        }
    }

    FigureDraft(JsonObject choices, List<Source> sources, Optional<Hash> corrects) {
        this.choices = choices;
        this.sources = List.copyOf(sources);
        this.corrects = corrects;
    }

    /** A new figure from a proposal. Asks the archive. */
    static FigureDraft of(Archive archive, JsonObject proposal) {
        List<Source> sources = new ArrayList<>();
        for (JsonObject input : proposal.array("inputs").objects()) {
            Hash record = new Hash(input.text("record").orElseThrow());
            sources.add(source(archive, record, input.text("role").orElse("series")));
        }
        return new FigureDraft(proposal.object("choices").orElseThrow(), sources, Optional.empty());
    }

    /** The next revision of a figure with other choices. Asks the archive. */
    static FigureDraft from(Archive archive, Hash figure) {
        RecordView view = archive.record(figure).orElseThrow();
        List<Source> sources = new ArrayList<>();
        for (InputReference input : view.head().inputs()) {
            if (input instanceof InputReference.OfRecord of) {
                sources.add(source(archive, of.record(), of.role()));
            }
        }
        return new FigureDraft(view.choices(), sources, Optional.of(figure));
    }

    private static Source source(Archive archive, Hash record, String role) {
        List<String> offers = archive.record(record)
                .flatMap(view -> archive.kinds()
                        .get(view.head().kind())
                        .flatMap(kind -> kind.facet(Plottable.class, view, archive.inputs(record))))
                .map(plottable ->
                        plottable.series().stream().map(Plottable.Series::name).toList())
                .orElse(List.of());
        return new Source(record, role, archive.label(record), offers);
    }

    JsonObject choices() {
        return choices;
    }

    List<Source> sources() {
        return sources;
    }

    Optional<Hash> corrects() {
        return corrects;
    }

    /** What is at a place of the choices. */
    Optional<Json> get(String pointer) {
        return JsonPointer.resolve(choices, pointer);
    }

    /** Changes a place; an absent value takes the member away. */
    void set(String pointer, Optional<Json> value) {
        int end = pointer.lastIndexOf('/');
        String name = pointer.substring(end + 1);
        String parent = pointer.substring(0, end);
        JsonObject object = (JsonObject) JsonPointer.resolve(choices, parent).orElseThrow();
        JsonObject changed = value.map(json -> object.with(name, json)).orElseGet(() -> object.without(name));
        become((JsonObject) (parent.isEmpty() ? changed : JsonPointer.replace(choices, parent, changed)));
    }

    /** Changes a list of the choices. */
    void setList(String pointer, List<? extends Json> items) {
        become((JsonObject) JsonPointer.replace(choices, pointer, new JsonArray(List.copyOf(items))));
    }

    private void become(JsonObject next) {
        if (!next.equals(choices)) {
            past.push(choices);
            future.clear();
            choices = next;
        }
    }

    boolean undo() {
        return swap(past, future);
    }

    boolean redo() {
        return swap(future, past);
    }

    private boolean swap(Deque<JsonObject> from, Deque<JsonObject> to) {
        if (from.isEmpty()) {
            return false;
        }
        to.push(choices);
        choices = from.pop();
        return true;
    }

    /** What is to be computed. */
    NewRecord request(Optional<PersonId> person) {
        List<InputReference> inputs = sources.stream()
                .<InputReference>map(
                        source -> new InputReference.OfRecord(source.role(), source.record(), Optional.empty()))
                .toList();
        return new NewRecord(
                new KindName("figure"),
                inputs,
                List.of(),
                Map.of(PartName.CHOICES, choices),
                List.of(),
                corrects,
                Optional.empty(),
                person);
    }
}
