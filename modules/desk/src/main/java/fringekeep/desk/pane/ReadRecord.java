package fringekeep.desk.pane;

import fringekeep.archive.Archive;
import fringekeep.archive.graph.Graph;
import fringekeep.archive.graph.StateName;
import fringekeep.archive.json.JsonObject;
import fringekeep.archive.kind.FlatTable;
import fringekeep.archive.kind.Inputs;
import fringekeep.archive.kind.RecordKind;
import fringekeep.archive.kind.RecordView;
import fringekeep.archive.kind.Title;
import fringekeep.archive.record.Hash;
import fringekeep.archive.record.InputReference;
import fringekeep.archive.record.PartName;
import fringekeep.desk.list.Joined;
import fringekeep.desk.look.Mark;
import fringekeep.desk.look.Texts;
import fringekeep.desk.pane.RecordPage.Beside;
import fringekeep.desk.pane.RecordPage.Knot;
import fringekeep.desk.pane.RecordPage.Note;
import fringekeep.desk.session.Clock;
import fringekeep.desk.session.LinkedRecords;
import fringekeep.desk.session.Names;
import fringekeep.desk.session.Register;
import fringekeep.desk.session.States;
import fringekeep.desk.session.Stops;
import fringekeep.drawing.NumberText;
import fringekeep.drawing.Picture;
import java.util.ArrayList;
import java.util.Comparator;
import java.util.List;
import java.util.Optional;
import java.util.Set;

/** Reads the page of a record of any kind. Not to be used on the window thread. */
public final class ReadRecord {
    private static final Texts TEXTS = new Texts("fringekeep.desk.pane.Texts", ReadRecord.class);
    private static final int ROWS = 24;

    private final Archive archive;
    private final Register register;
    private final Stops stops;
    private final Clock clock;

    /** Reads from an archive at the register's watermark. */
    public ReadRecord(Archive archive, Register register, Stops stops) {
        this.archive = archive;
        this.register = register;
        this.stops = stops;
        this.clock = new Clock(archive.facts());
    }

    /** The page of a record; empty when it is not at hand. */
    public Optional<RecordPage> read(Hash record) {
        return archive.record(record).map(this::page);
    }

    private RecordPage page(RecordView view) {
        Hash record = view.fingerprint();
        Graph graph = register.graph();
        Title title = Names.title(archive, view);
        Optional<RecordView> beside = beside(view);
        List<Picture> pictures = new ArrayList<>();
        beside.ifPresent(other -> pictures.addAll(pictures(other)));
        if (pictures.isEmpty()) {
            pictures.addAll(pictures(view));
        }
        return new RecordPage(
                record,
                archive.label(record),
                title.detail().isEmpty() ? title.text() : title.text() + ", " + title.detail(),
                States.sentences(archive, graph, clock, record),
                pictures,
                beside.map(this::besideFacts),
                groups(view),
                notes(graph, record),
                knots(view));
    }

    private List<Picture> pictures(RecordView view) {
        return Names.kind(archive, view)
                .map(kind -> kind.drawings(view, archive.inputs(view.fingerprint())))
                .orElse(List.of());
    }

    private Optional<RecordView> beside(RecordView view) {
        Joined joined = new Joined(archive, register);
        return stops.entry(view.head().kind().text(), "beside").stream()
                .findFirst()
                .flatMap(kind -> joined.linked(view.fingerprint(), kind))
                .flatMap(archive::record);
    }

    private Beside besideFacts(RecordView view) {
        Optional<StateName> state = States.first(register.graph().states(view.fingerprint()));
        List<Fact> facts = new ArrayList<>();
        for (FactGroup group : part(view, PartName.RESULT)) {
            facts.addAll(group.facts());
        }
        return new Beside(
                view.fingerprint(),
                archive.label(view.fingerprint()),
                state.map(States::mark),
                state.map(States::word).orElse(""),
                facts.subList(0, Math.min(16, facts.size())));
    }

    private List<FactGroup> groups(RecordView view) {
        List<FactGroup> groups = new ArrayList<>();
        groups.addAll(part(view, PartName.RESULT));
        groups.addAll(part(view, PartName.CONTENT));
        groups.addAll(part(view, PartName.CHOICES));
        groups.addAll(part(view, PartName.IDENTITY));
        groups.addAll(tables(view));
        groups.addAll(part(view, PartName.REMARK));
        groups.addAll(part(view, PartName.MADE));
        groups.sort(Comparator.comparing(group -> !group.entered()));
        return groups;
    }

    private List<FactGroup> part(RecordView view, PartName name) {
        if (view.withheld(name)) {
            return List.of(new FactGroup(name.text(), List.of(Fact.text(TEXTS.of("withheld"), ""))));
        }
        JsonObject schema = Names.kind(archive, view)
                .map(kind -> kind.jsonSchema(kind.schema()))
                .flatMap(whole -> whole.object("properties"))
                .flatMap(parts -> parts.object(name.text()))
                .orElse(JsonObject.EMPTY);
        return view.part(name)
                .map(value -> new FactReader(clock, schema).read(TEXTS.of("part." + name.text()), value))
                .orElse(List.of());
    }

    private List<FactGroup> tables(RecordView view) {
        List<FactGroup> groups = new ArrayList<>();
        Inputs inputs = archive.inputs(view.fingerprint());
        Optional<RecordKind> kind = Names.kind(archive, view);
        for (FlatTable table : kind.map(one -> one.tables(view, inputs)).orElse(List.of())) {
            if (table.columns().size() >= 2
                    && !table.rows().isEmpty()
                    && table.rows().size() <= ROWS) {
                groups.add(table(table));
            }
        }
        return groups;
    }

    private static FactGroup table(FlatTable table) {
        List<Fact> facts = new ArrayList<>();
        for (List<Optional<Object>> row : table.rows()) {
            List<String> rest = new ArrayList<>();
            for (int i = 1; i < row.size(); i++) {
                String cell = cell(row.get(i));
                if (!cell.isEmpty()) {
                    rest.add(cell);
                }
            }
            facts.add(Fact.text(cell(row.get(0)), String.join("  ", rest)));
        }
        return new FactGroup(table.name().replace('-', ' '), facts);
    }

    private static String cell(Optional<Object> cell) {
        return cell.map(value -> value instanceof Double number
                        ? NumberText.significant(number, 6)
                        : value instanceof Number whole ? NumberText.count(whole.longValue()) : value.toString())
                .orElse("");
    }

    private List<Note> notes(Graph graph, Hash record) {
        List<Note> notes = new ArrayList<>();
        for (Hash other : graph.speakingOf(record)) {
            Optional<RecordView> view = archive.record(other);
            String kind = register.kind(other).orElse("");
            if (view.isEmpty() || !stops.entry("notes", "kinds").contains(kind)) {
                continue;
            }
            notes.add(note(view.get(), kind));
        }
        return notes;
    }

    private Note note(RecordView view, String kind) {
        String verdict = view.content().text("verdict").orElse("");
        String reason = view.content().text("reason").orElse("").replace('-', ' ');
        String words =
                view.part(PartName.REMARK).flatMap(part -> part.text("text")).orElse("");
        String when = archive.recorded(view.fingerprint())
                .map(at -> clock.moment(at.at()))
                .orElse("");
        Optional<Mark> mark = Set.of(StateName.values()).stream()
                .filter(state -> state.name().equalsIgnoreCase(verdict))
                .findFirst()
                .map(States::mark);
        String text = verdict.isEmpty() ? kind : reason.isEmpty() ? verdict : verdict + ": " + reason;
        return new Note(view.fingerprint(), mark, text, words.isEmpty() ? when : when + " " + words);
    }

    private List<Knot> knots(RecordView view) {
        List<Knot> knots = new ArrayList<>();
        view.head().inputs().stream()
                .filter(InputReference.OfRaw.class::isInstance)
                .map(input -> ((InputReference.OfRaw) input).raw())
                .findFirst()
                .ifPresent(raw -> knots.add(
                        new Knot(TEXTS.of("raw"), raw.hex().substring(0, 8), List.of(), Optional.empty(), false)));
        Set<Hash> linked = LinkedRecords.of(register, view.fingerprint());
        for (Stops.Stop stop : stops.all()) {
            List<Hash> here = linked.stream()
                    .filter(record -> register.kind(record).orElse("").equals(stop.kind())
                            || (record.equals(view.fingerprint())
                                    && stop.kinds().contains(view.head().kind().text())))
                    .toList();
            if (!here.isEmpty()) {
                knots.add(knot(stop, here, view.fingerprint()));
            }
        }
        return knots;
    }

    private Knot knot(Stops.Stop stop, List<Hash> records, Hash inHand) {
        boolean here = records.contains(inHand);
        List<Hash> shown = here ? List.of(inHand) : records;
        String text = shown.size() > 3
                ? NumberText.count(shown.size())
                : String.join(
                        ", ",
                        shown.stream()
                                .map(record -> Names.number(
                                        archive.label(record),
                                        register.kind(record).orElse("")))
                                .toList());
        Optional<Mark> mark = shown.stream()
                .flatMap(record -> States.first(register.graph().states(record)).stream())
                .filter(state -> state == StateName.OUTDATED || state == StateName.WITHDRAWN)
                .findFirst()
                .map(States::mark);
        return new Knot(stop.label(), text, shown, mark, here);
    }
}
