package fringekeep.desk.form;

import fringekeep.archive.Archive;
import fringekeep.archive.entry.EntryWriting;
import fringekeep.archive.graph.Graph;
import fringekeep.archive.graph.StateName;
import fringekeep.archive.json.Json;
import fringekeep.archive.json.JsonArray;
import fringekeep.archive.json.JsonObject;
import fringekeep.archive.json.JsonPointer;
import fringekeep.archive.json.JsonText;
import fringekeep.archive.kind.RecordView;
import fringekeep.archive.problem.Problem;
import fringekeep.archive.problem.ProblemException;
import fringekeep.archive.record.After;
import fringekeep.archive.record.Hash;
import fringekeep.archive.record.KindName;
import fringekeep.desk.form.FormState.Way;
import fringekeep.desk.look.Texts;
import fringekeep.desk.session.Clock;
import fringekeep.desk.session.Names;
import fringekeep.desk.session.Register;
import java.time.Instant;
import java.util.ArrayList;
import java.util.Collections;
import java.util.HashMap;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import java.util.Set;

/** Reads what a form begins from. Asks the archive, so never to be used on the window thread. */
final class FormReading {
    private static final Texts TEXTS = new Texts("fringekeep.desk.form.Texts", FormReading.class);
    private static final int MOST_EARLIER = 60;

    private final Archive archive;
    private final Register register;
    private final Graph graph;
    private final Clock clock;

    FormReading(Archive archive, Register register) {
        this.archive = archive;
        this.register = register;
        this.graph = register.graph();
        this.clock = new Clock(archive.facts());
    }

    /**
     * A line of the list at the left.
     *
     * @param record the earlier record
     * @param number its number
     * @param when from when it holds, or when it was recorded
     * @param words how it stands to the one before, or its title
     * @param struck whether it was corrected or withdrawn
     */
    record Line(Hash record, String number, String when, String words, boolean struck) {}

    /** A draft that is kept. */
    record Kept(String id, String words, JsonObject body) {}

    /**
     * A form ready to be shown.
     *
     * @param model the form
     * @param title heading, such as {@code setup 13}
     * @param heading heading of the list at the left
     * @param earlier earlier records of the same thing, or others of the kind where the thing is new
     * @param drafts other drafts of the kind
     * @param draft id under which this one is kept, if it is a kept one
     */
    record Opened(
            FormModel model,
            String title,
            String heading,
            List<Line> earlier,
            List<Kept> drafts,
            Optional<String> draft) {
        Opened {
            earlier = List.copyOf(earlier);
            drafts = List.copyOf(drafts);
        }
    }

    /** A new record, filled in as far as a document says. */
    Opened fresh(String name, JsonObject document) throws ProblemException {
        FormModel model = new FormModel(kind(name), clock.zone());
        model.begin(named(document));
        return opened(model, TEXTS.of("title.new", model.kind().words().kindWords()), Optional.empty());
    }

    /** A record that corrects another or comes after it. */
    Opened from(Hash record, Way way) throws ProblemException {
        RecordView view = view(record);
        FormModel model = new FormModel(kind(view.head().kind().text()), clock.zone());
        boolean may = model.kind().kind().mayContinue();
        JsonObject document = document(view, model.kind());
        String now = model.moments().of(now());
        model.begin(before(view, model), document, may ? way : Way.CORRECTS, now);
        model.earlier(ranges(view, model));
        return opened(model, archive.label(record), Optional.empty());
    }

    private static Instant now() {
        return Instant.now().truncatedTo(java.time.temporal.ChronoUnit.MINUTES);
    }

    /** A draft that was kept. */
    Opened draft(String id, JsonObject body) throws ProblemException {
        FormModel model = new FormModel(kind(body.text("kind").orElse("")), clock.zone());
        Optional<RecordView> base = body.text("of").map(Hash::new).flatMap(archive::record);
        try {
            FormState state = FormState.of(body.object("state").orElse(JsonObject.EMPTY));
            Optional<FormModel.Before> before =
                    base.isPresent() ? Optional.of(before(base.get(), model)) : Optional.empty();
            model.resume(state, before);
        } catch (IllegalArgumentException e) {
            throw new ProblemException(new Problem(
                    "form.draft",
                    "The draft cannot be read: " + e.getMessage() + ".",
                    id,
                    "Discard it, or open it with the program that kept it. Nothing has been changed."));
        }
        if (base.isPresent()) {
            model.earlier(ranges(base.get(), model));
        }
        return opened(model, body.text("title").orElse(""), Optional.of(id));
    }

    private Opened opened(FormModel model, String title, Optional<String> draft) throws ProblemException {
        List<Line> lines = model.base().isPresent()
                ? ofThing(model.base().get().record())
                : ofKind(model.kind().name());
        model.titles(new FormCheck(archive, model.kind())
                .check(model.document().document(), model.references())
                .titles());
        List<Kept> drafts = drafts(Optional.of(model.kind().name())).stream()
                .filter(kept -> !Optional.of(kept.id()).equals(draft))
                .toList();
        return new Opened(model, title, heading(model), lines, drafts, draft);
    }

    private String heading(FormModel model) {
        String kinds = Effects.plural(model.kind().name(), 2);
        return model.base()
                .flatMap(base -> archive.record(base.record()))
                .map(view -> Names.title(archive, view).text())
                .orElseGet(() -> TEXTS.of("list.kind", kinds));
    }

    private FormKind kind(String name) throws ProblemException {
        return Optional.of(name)
                .filter(text -> text.matches("[a-z][a-z0-9-]*"))
                .map(KindName::new)
                .flatMap(archive.kinds()::get)
                .map(FormKind::new)
                .orElseThrow(() -> new ProblemException(new Problem(
                        "form.kind", "This program knows no kind " + name + ".", name, "Use a newer program.")));
    }

    private RecordView view(Hash record) throws ProblemException {
        return archive.record(record)
                .orElseThrow(() -> new ProblemException(new Problem(
                        "form.no-record", "The record is not at hand.", record.shortForm(), "Open the list again.")));
    }

    /** What a record says, as typed, to be shown beside a form. */
    FormModel.Before before(RecordView view, FormModel model) {
        JsonObject document = document(view, model.kind());
        return new FormModel.Before(view.fingerprint(), archive.label(view.fingerprint()), model.typed(document));
    }

    /** The same for a record by fingerprint. */
    FormModel.Before before(Hash record, FormModel model) throws ProblemException {
        return before(view(record), model);
    }

    private JsonObject document(RecordView view, FormKind kind) {
        return new EntryWriting(this::reference)
                .again(view, kind.kind())
                .with("after", view.head().after().map(this::after));
    }

    private JsonObject after(After after) {
        return JsonObject.EMPTY
                .with("record", reference(after.record()))
                .with("from", after.from().toString());
    }

    /** What people call a record, where that finds this very one; else its digits. */
    private String reference(Hash record) {
        String label = archive.label(record);
        try {
            return archive.find(label).equals(record) ? label : record.hex();
        } catch (ProblemException e) {
            return record.hex(); // the label means several: the digits always say which
        }
    }

    /** The same document with records called what people call them, where it names them by their digits. */
    private JsonObject named(JsonObject document) {
        JsonObject named = document;
        for (String list : List.of("about", "inputs")) {
            if (document.get(list).isPresent()) {
                List<Json> entries = document.array(list).objects().stream()
                        .<Json>map(this::namedEntry)
                        .toList();
                named = named.with(list, new JsonArray(entries));
            }
        }
        return named;
    }

    private JsonObject namedEntry(JsonObject entry) {
        return entry.text("record")
                .filter(text -> text.matches("[0-9a-f]{64}"))
                .map(Hash::new)
                .filter(record -> archive.record(record).isPresent())
                .map(record -> entry.with("record", reference(record)))
                .orElse(entry);
    }

    /** An entry document that would record another of the kind like this one. */
    JsonObject like(Hash record) throws ProblemException {
        RecordView view = view(record);
        FormKind kind = kind(view.head().kind().text());
        return document(view, kind).without("remark").without("after");
    }

    // ---- the list at the left

    private List<Line> ofThing(Hash record) {
        List<Line> lines = new ArrayList<>();
        List<Hash> records = archive.record(record)
                .map(view -> new ArrayList<>(graph.records(view.head().thing())))
                .orElseGet(ArrayList::new);
        Collections.reverse(records);
        for (Hash each : records) {
            archive.record(each).ifPresent(view -> lines.add(line(each, view)));
        }
        return lines;
    }

    private Line line(Hash record, RecordView view) {
        String kind = view.head().kind().text();
        String number = Names.number(archive.label(record), kind);
        Optional<After> after = view.head().after();
        String when = after.map(one -> clock.moment(one.from())).orElseGet(() -> recorded(record));
        String words = view.head()
                .corrects()
                .map(one -> TEXTS.of("line.corrects", Names.number(archive.label(one), kind)))
                .or(() -> after.map(one -> TEXTS.of("line.after", Names.number(archive.label(one.record()), kind))))
                .orElse(TEXTS.of("line.first"));
        return new Line(record, number, when, words, struck(record));
    }

    private String recorded(Hash record) {
        return archive.recorded(record).map(one -> clock.moment(one.at())).orElse("");
    }

    private boolean struck(Hash record) {
        Set<StateName> states = graph.states(record);
        return states.contains(StateName.CORRECTED) || states.contains(StateName.WITHDRAWN);
    }

    private List<Line> ofKind(String kind) {
        List<Hash> records = new ArrayList<>(register.records(kind));
        Collections.reverse(records);
        List<Line> lines = new ArrayList<>();
        for (Hash record : records) {
            if (!struck(record) && lines.size() < MOST_EARLIER) {
                archive.record(record)
                        .ifPresent(view -> lines.add(new Line(
                                record,
                                Names.number(archive.label(record), kind),
                                recorded(record),
                                Names.title(archive, view).text(),
                                false)));
            }
        }
        return lines;
    }

    /** Drafts that are kept, of one kind or of all, newest first. */
    List<Kept> drafts(Optional<String> kind) throws ProblemException {
        List<Kept> kept = new ArrayList<>();
        for (Map.Entry<String, JsonObject> draft : archive.drafts().all().entrySet()) {
            JsonObject body = draft.getValue();
            boolean ours = body.object("state").isPresent()
                    && kind.map(name -> body.text("kind").equals(Optional.of(name)))
                            .orElse(true);
            if (ours) {
                String at = body.text("saved")
                        .map(text -> clock.moment(Instant.parse(text)))
                        .orElse("");
                kept.add(new Kept(
                        draft.getKey(), TEXTS.of("draft.of", body.text("title").orElse(""), at), body));
            }
        }
        kept.sort((a, b) -> b.body()
                .text("saved")
                .orElse("")
                .compareTo(a.body().text("saved").orElse("")));
        return kept;
    }

    // ---- earlier values

    private Earlier ranges(RecordView view, FormModel model) {
        Map<String, Earlier.Range> ranges = new HashMap<>();
        for (Hash record : graph.records(view.head().thing())) {
            boolean stood = !graph.states(record).contains(StateName.CORRECTED);
            Optional<RecordView> earlier = stood ? archive.record(record) : Optional.empty();
            earlier.ifPresent(one -> collect("", model.typed(document(one, model.kind())), model.kind(), ranges));
        }
        return new Earlier(ranges);
    }

    private static void collect(String pointer, Json value, FormKind kind, Map<String, Earlier.Range> ranges) {
        if (value instanceof JsonObject object) {
            object.members().forEach((name, member) -> collect(JsonPointer.child(pointer, name), member, kind, ranges));
        } else if (value instanceof JsonArray array) {
            for (int i = 0; i < array.items().size(); i++) {
                collect(JsonPointer.child(pointer, i), array.items().get(i), kind, ranges);
            }
        } else if (value instanceof JsonText text && isQuantity(kind, pointer)) {
            QuantityReading.of(text.value(), Optional.empty())
                    .quantity()
                    .ifPresent(quantity ->
                            ranges.merge(pointer, Earlier.Range.of(quantity), (range, next) -> range.with(quantity)));
        }
    }

    private static boolean isQuantity(FormKind kind, String pointer) {
        return kind.at(pointer)
                .filter(asked -> asked instanceof Asked.Leaf leaf && leaf.sort() == Asked.Sort.QUANTITY)
                .isPresent();
    }
}
