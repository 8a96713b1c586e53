package fringekeep.desk.pane;

import fringekeep.archive.Archive;
import fringekeep.archive.Person;
import fringekeep.archive.json.JsonObject;
import fringekeep.archive.kind.FlatTable;
import fringekeep.archive.kind.RecordView;
import fringekeep.archive.record.Hash;
import fringekeep.archive.record.PartName;
import fringekeep.desk.list.Joined;
import fringekeep.desk.look.Texts;
import fringekeep.desk.session.Clock;
import fringekeep.desk.session.Names;
import fringekeep.desk.session.Register;
import fringekeep.desk.session.Stops;
import fringekeep.drawing.NumberText;
import java.time.Instant;
import java.time.format.DateTimeParseException;
import java.util.ArrayList;
import java.util.Comparator;
import java.util.List;
import java.util.Optional;
import java.util.regex.Pattern;

/** Facts and tables of a record of any kind. */
final class PageFacts {
    private static final Texts TEXTS = new Texts("fringekeep.desk.pane.Texts", PageFacts.class);
    private static final int ROWS = 60;
    private static final Pattern FINGERPRINT = Pattern.compile("[0-9a-f]{64}");
    private static final Pattern MEMBER = Pattern.compile("[a-z]+([A-Z][a-z0-9]*)+");

    private final Archive archive;
    private final Register register;
    private final Stops stops;
    private final Clock clock;
    private final Joined joined;

    PageFacts(Archive archive, Register register, Stops stops, Clock clock, Joined joined) {
        this.archive = archive;
        this.register = register;
        this.stops = stops;
        this.clock = clock;
        this.joined = joined;
    }

    /** Those named come first and alone, in their order; all when none is named. */
    static List<Fact> ordered(List<Fact> facts, List<String> names) {
        List<Fact> first = new ArrayList<>();
        for (String name : names) {
            facts.stream().filter(fact -> fact.name().equals(name)).forEach(first::add);
        }
        return first.isEmpty() ? facts.subList(0, Math.min(14, facts.size())) : first;
    }

    /** Groups with what was entered first, then the rest. */
    List<FactGroup> groups(RecordView view) {
        List<FactGroup> groups = new ArrayList<>();
        groups.addAll(part(view, PartName.RESULT));
        groups.addAll(part(view, PartName.CONTENT));
        linked(view).ifPresent(groups::add);
        groups.addAll(part(view, PartName.IDENTITY));
        groups.addAll(texts(view));
        groups.addAll(part(view, PartName.REMARK));
        groups.addAll(part(view, PartName.CHOICES));
        groups.add(recorded(view));
        groups.sort(Comparator.comparing(group -> !group.entered()));
        return groups;
    }

    /** Facts of one part. */
    List<FactGroup> part(RecordView view, PartName name) {
        String kind = view.head().kind().text();
        if (view.withheld(name)) {
            return List.of(
                    new FactGroup(TEXTS.of("part." + name.text()), List.of(Fact.text(TEXTS.of("withheld"), ""))));
        }
        JsonObject schema = Names.kind(archive, view)
                .map(one -> one.jsonSchema(one.schema()))
                .flatMap(whole -> whole.object("properties"))
                .flatMap(parts -> parts.object(name.text()))
                .orElse(JsonObject.EMPTY);
        return view.part(name)
                .map(value -> new FactReader(clock, schema, kind, name.text())
                        .read(TEXTS.orElse("part." + kind + "." + name.text(), TEXTS.of("part." + name.text())), value))
                .orElse(List.of());
    }

    /** When it was recorded and made, by whom, with which build. */
    private FactGroup recorded(RecordView view) {
        List<Fact> facts = new ArrayList<>();
        archive.recorded(view.fingerprint()).ifPresent(at -> {
            facts.add(Fact.text(TEXTS.of("recorded.at"), clock.date(at.at()) + " " + clock.time(at.at())));
            facts.add(Fact.text(TEXTS.of("recorded.entry"), NumberText.count(at.n())));
        });
        JsonObject made = view.part(PartName.MADE).orElse(JsonObject.EMPTY);
        made.text("at").ifPresent(at -> facts.add(Fact.text(TEXTS.of("made.at"), moment(at))));
        made.text("build").ifPresent(build -> facts.add(Fact.text(TEXTS.of("made.build"), build)));
        if (view.withheld(PartName.WHO)) {
            facts.add(Fact.text(TEXTS.of("who"), TEXTS.of("withheld")));
        } else {
            view.part(PartName.WHO)
                    .flatMap(who -> who.text("person"))
                    .ifPresent(id -> facts.add(Fact.text(TEXTS.of("who"), person(archive, id))));
        }
        facts.add(Fact.text(
                TEXTS.of("schema"),
                view.head().kind().text() + " " + view.head().schema()));
        return new FactGroup(TEXTS.of("recorded"), facts);
    }

    private String moment(String text) {
        try {
            Instant at = Instant.parse(text);
            return clock.date(at) + " " + clock.time(at);
        } catch (DateTimeParseException e) {
            return text; // shown as it stands
        }
    }

    /** Name of a person, or that it is not known here. */
    static String person(Archive archive, String id) {
        return archive.persons().stream()
                .filter(person -> person.id().hex().equals(id))
                .findFirst()
                .flatMap(Person::name)
                .orElse(TEXTS.of("who.unknown"));
    }

    // ---- records linked with it

    /** Where it belongs: told linked records by label and title. */
    private Optional<FactGroup> linked(RecordView view) {
        String kind = view.head().kind().text();
        List<Fact> facts = new ArrayList<>();
        for (String way : stops.entry(kind, "linked")) {
            List<String> steps = List.of(way.split(">"));
            String last = steps.get(steps.size() - 1).strip();
            linkedRecord(view.fingerprint(), way)
                    .ifPresent(record ->
                            facts.add(Fact.text(Stops.label(last), number(record, last) + titleAfter(record))));
        }
        return facts.isEmpty()
                ? Optional.empty()
                : Optional.of(new FactGroup(TEXTS.orElse("linked." + kind, TEXTS.of("linked")), facts));
    }

    private String number(Hash record, String kind) {
        return Names.shortNumber(archive.label(record), kind, clock).replaceFirst("^0+(?=[0-9])", "");
    }

    private String titleAfter(Hash record) {
        return archive.record(record)
                .map(view -> Names.title(archive, view).text())
                .filter(title -> !title.isEmpty())
                .map(title -> ", " + title)
                .orElse("");
    }

    private Optional<Hash> linkedRecord(Hash record, String way) {
        Optional<Hash> here = Optional.of(record);
        for (String step : way.split(">")) {
            here = here.flatMap(one -> joined.linked(one, step.strip()));
        }
        return here;
    }

    /** Title of a linked record, or its number where its kind has a short word for it. */
    Optional<String> linkedTitle(Hash record, String way) {
        return linkedRecord(record, way).flatMap(other -> {
            String kind = register.kind(other).orElse("");
            Optional<String> word = stops.entry(kind, "short").stream().findFirst();
            return word.isPresent()
                    ? word.map(one -> one + " " + number(other, kind))
                    : archive.record(other)
                            .map(view -> Names.title(archive, view).text())
                            .filter(title -> !title.isEmpty());
        });
    }

    // ---- tables

    private List<FlatTable> flat(RecordView view) {
        FactWords words = FactWords.of(view.head().kind().text());
        return Names.kind(archive, view)
                .map(kind -> kind.tables(view, archive.inputs(view.fingerprint())))
                .orElse(List.of())
                .stream()
                .filter(table -> !table.rows().isEmpty() && table.rows().size() <= ROWS)
                .filter(table -> !words.hidden("tables." + table.name()))
                .toList();
    }

    /** Whether a table is a name and a text only, which need lines rather than columns. */
    private static boolean textual(FlatTable table) {
        return table.columns().size() == 2
                && table.columns().stream().allMatch(column -> column.unit().isEmpty())
                && table.rows().stream()
                        .flatMap(List::stream)
                        .flatMap(Optional::stream)
                        .allMatch(String.class::isInstance);
    }

    /** Tables that its kind gives, but for those that say the facts again. */
    List<PageTable> tables(RecordView view) {
        FactWords words = FactWords.of(view.head().kind().text());
        return flat(view).stream()
                .filter(table -> !textual(table))
                .map(table -> new TableReading(table, this::called)
                        .page(
                                words.label("tables." + table.name(), table.name()),
                                words.late("tables." + table.name())))
                .toList();
    }

    private List<FactGroup> texts(RecordView view) {
        FactWords words = FactWords.of(view.head().kind().text());
        return flat(view).stream()
                .filter(PageFacts::textual)
                .map(table -> new FactGroup(
                        words.label("tables." + table.name(), table.name()),
                        table.rows().stream()
                                .map(row -> Fact.text(text(row.get(0)), text(row.get(1))))
                                .toList()))
                .toList();
    }

    private static String text(Optional<Object> cell) {
        return cell.map(Object::toString).orElse("");
    }

    /** What a fingerprint in a table is called; other texts in words. */
    private String called(String text) {
        if (FINGERPRINT.matcher(text).matches()) {
            Hash record = new Hash(text);
            return register.kind(record).isPresent()
                    ? Names.shortLabel(archive.label(record), clock)
                    : record.shortForm();
        }
        return MEMBER.matcher(text).matches() ? FactWords.words(text) : text;
    }
}
