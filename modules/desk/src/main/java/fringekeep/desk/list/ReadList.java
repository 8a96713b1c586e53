package fringekeep.desk.list;

import fringekeep.archive.Archive;
import fringekeep.archive.graph.StateName;
import fringekeep.archive.listing.Column;
import fringekeep.archive.listing.Listing;
import fringekeep.archive.listing.Page;
import fringekeep.archive.listing.Projection;
import fringekeep.archive.listing.Row;
import fringekeep.archive.problem.ProblemException;
import fringekeep.archive.problem.StoppedException;
import fringekeep.archive.problem.Work;
import fringekeep.archive.record.Hash;
import fringekeep.desk.list.ListContent.Entry;
import fringekeep.desk.list.ListContent.Group;
import fringekeep.desk.list.ListContent.Head;
import fringekeep.desk.list.ListContent.Line;
import fringekeep.desk.list.ListContent.Plot;
import fringekeep.desk.list.ListContent.Word;
import fringekeep.desk.look.Texts;
import fringekeep.desk.session.Clock;
import fringekeep.desk.session.LinkedRecords;
import fringekeep.desk.session.Names;
import fringekeep.desk.session.Register;
import fringekeep.desk.session.States;
import fringekeep.desk.session.Stops;
import fringekeep.drawing.NumberText;
import java.time.Instant;
import java.util.ArrayList;
import java.util.Arrays;
import java.util.List;
import java.util.Optional;
import java.util.Set;

/** Reads a list over the declared table of a kind, page by page. Not to be used on the window thread. */
public final class ReadList {
    private static final Texts TEXTS = new Texts("fringekeep.desk.list.Texts", ReadList.class);
    private static final int PAGE = 500;

    private final Archive archive;
    private final Register register;
    private final Stops stops;
    private final Clock clock;
    private final Joined joined;

    /** Reads from an archive at the register's watermark. */
    public ReadList(Archive archive, Register register, Stops stops) {
        this.archive = archive;
        this.register = register;
        this.stops = stops;
        this.clock = new Clock(archive.facts());
        this.joined = new Joined(archive, register);
    }

    /** A shown column: of the kind's own table, or taken over from a linked record. */
    private record Shown(Column column, List<Column> all, String from) {}

    /** The list that answers a question. */
    public ListContent read(Question question, Work work) throws ProblemException, StoppedException {
        Optional<Projection> table = Joined.table(archive, question.kind());
        List<Word> words = words(question);
        String heading = heading(question.kind());
        if (table.isEmpty()) {
            return new ListContent(heading, words, List.of(), Optional.empty(), plain(question), false);
        }
        List<Shown> shown = shown(question.kind(), table.get());
        List<Page.Line> lines = lines(table.get(), question, work);
        boolean more = lines.size() > question.most();
        List<Page.Line> kept = more ? lines.subList(0, question.most()) : lines;
        List<Line> rows = rows(question.kind(), table.get(), shown, kept, work);
        List<Head> heads =
                shown.stream().map(one -> CellText.head(one.column())).toList();
        return new ListContent(heading, words, heads, plot(question.kind(), shown, rows), rows, more);
    }

    private String heading(String kind) {
        int count = register.current(kind).size();
        return NumberText.count(count) + " " + (count == 1 ? Stops.label(kind) : plural(kind));
    }

    /** What several records of the main kind of each stop are called. */
    public static List<String> plurals(Stops stops) {
        return stops.all().stream().map(stop -> plural(stop.kind())).toList();
    }

    private static String plural(String kind) {
        return TEXTS.orElse("plural." + kind, Stops.label(kind) + "s");
    }

    private List<Word> words(Question question) {
        List<Word> words = new ArrayList<>();
        String kind = question.kind();
        boolean all = question.state().isEmpty()
                && question.linkedWith().isEmpty()
                && question.words().isEmpty()
                && question.among().isEmpty();
        words.add(new Word(TEXTS.of("all"), -1, Question.all(kind), all));
        for (StateName state : List.of(
                StateName.OUTDATED, StateName.WITHDRAWN, StateName.MASKED, StateName.DOUBTED, StateName.PREFERRED)) {
            int count = register.count(kind, state);
            if (count > 0) {
                Question narrowed = new Question(kind, Optional.of(state), Optional.empty(), "", PAGE);
                words.add(new Word(
                        States.word(state), count, narrowed, question.state().equals(Optional.of(state))));
            }
        }
        question.linkedWith()
                .ifPresent(
                        record -> words.add(new Word(TEXTS.of("linked", archive.label(record)), -1, question, true)));
        question.among()
                .ifPresent(among ->
                        words.add(new Word(among.words(), among.records().size(), question, true)));
        if (!question.words().isEmpty()) {
            words.add(new Word(TEXTS.of("found", question.words()), -1, question, true));
        }
        stops.of(kind).ifPresent(stop -> {
            for (String other : stops.all().get(stop).kinds()) {
                int count = register.current(other).size();
                if (!other.equals(kind) && count > 0) {
                    words.add(new Word(plural(other), count, Question.all(other), false));
                }
            }
        });
        return words;
    }

    private List<Shown> shown(String kind, Projection table) {
        List<String> wanted = stops.entry(kind, "columns");
        List<Shown> shown = new ArrayList<>();
        if (wanted.isEmpty()) {
            table.columns().forEach(column -> shown.add(new Shown(column, table.columns(), "")));
        }
        for (String entry : wanted) {
            int colon = entry.indexOf(':');
            String other = colon < 0 ? kind : entry.substring(0, colon);
            Joined.column(archive, other, entry.substring(colon + 1))
                    .ifPresent(column -> shown.add(new Shown(
                            column,
                            Joined.table(archive, other)
                                    .map(Projection::columns)
                                    .orElse(List.of()),
                            colon < 0 ? "" : other)));
        }
        shown.removeIf(
                one -> !one.column().deviationOf().isEmpty() || one.column().sort() == Column.Sort.HASH);
        return shown;
    }

    private List<Page.Line> lines(Projection table, Question question, Work work)
            throws ProblemException, StoppedException {
        List<String> words = Arrays.stream(question.words().split("\\s+"))
                .filter(word -> !word.isEmpty())
                .toList();
        Optional<Set<Hash>> linked = question.linkedWith().map(record -> LinkedRecords.of(register, record));
        List<Page.Line> lines = new ArrayList<>();
        Optional<Page.Key> after = Optional.empty();
        do {
            work.check();
            Page page = archive.list(
                    new Listing(table.name(), List.of(), true, words, Optional.empty(), "n", false, after, PAGE));
            for (Page.Line line : page.rows()) {
                boolean inState = question.state().isEmpty()
                        || register.graph()
                                .states(line.record())
                                .contains(question.state().get());
                boolean picked = question.among()
                        .map(among -> among.records().contains(line.record()))
                        .orElse(true);
                if (inState && picked && (linked.isEmpty() || linked.get().contains(line.record()))) {
                    lines.add(line);
                }
            }
            after = page.last();
            work.progress(lines.size(), 0, TEXTS.of("reading"));
        } while (after.isPresent() && lines.size() <= question.most());
        return lines;
    }

    private List<Line> rows(String kind, Projection table, List<Shown> shown, List<Page.Line> lines, Work work)
            throws StoppedException {
        String group = stops.entry(kind, "group").stream().findFirst().orElse("");
        CellText text = new CellText(clock, group.equals("day"));
        int plot = plotColumn(kind, shown);
        List<Line> rows = new ArrayList<>();
        String before = "";
        for (Page.Line line : lines) {
            work.check();
            String now = group(group, table, line);
            if (!now.isEmpty() && !now.equals(before)) {
                rows.add(new Group(now, ""));
                before = now;
            }
            rows.add(entry(kind, shown, text, plot, line));
        }
        return rows;
    }

    private Entry entry(String kind, List<Shown> shown, CellText text, int plot, Page.Line line) {
        List<String> cells = new ArrayList<>();
        double value = Double.NaN;
        double deviation = Double.NaN;
        for (int i = 0; i < shown.size(); i++) {
            Shown one = shown.get(i);
            Row row = one.from().isEmpty()
                    ? line.row()
                    : joined.linked(line.record(), one.from())
                            .map(joined::row)
                            .orElseGet(() -> new Row(java.util.Map.of()));
            cells.add(text.of(one.column(), one.all(), row));
            if (i == plot && row.values().get(one.column().name()) instanceof Double si) {
                value = CellText.shown(one.column(), si);
                deviation = CellText.shownDeviation(one.column(), CellText.deviation(one.column(), one.all(), row));
            }
        }
        Optional<StateName> state = States.first(register.graph().states(line.record()));
        return new Entry(line.record(), Names.number(line.label(), kind), cells, value, deviation, state);
    }

    private String group(String by, Projection table, Page.Line line) {
        if (by.equals("day")) {
            return table.columns().stream()
                    .filter(column -> column.sort() == Column.Sort.INSTANT)
                    .map(column -> line.row().values().get(column.name()))
                    .filter(Instant.class::isInstance)
                    .map(Instant.class::cast)
                    .findFirst()
                    .or(() -> archive.recorded(line.record()).map(Archive.Recorded::at))
                    .map(at -> Clock.words(clock.day(at)))
                    .orElse("");
        }
        Object value = by.isEmpty() ? null : line.row().values().get(by);
        return value == null ? "" : value.toString();
    }

    private int plotColumn(String kind, List<Shown> shown) {
        String wanted = stops.entry(kind, "plot").stream().findFirst().orElse("");
        for (int i = 0; i < shown.size(); i++) {
            if (shown.get(i).column().name().equals(wanted)) {
                return i;
            }
        }
        return -1;
    }

    private Optional<Plot> plot(String kind, List<Shown> shown, List<Line> rows) {
        int column = plotColumn(kind, shown);
        double most = 0;
        for (Line row : rows) {
            if (row instanceof Entry entry && Double.isFinite(entry.value())) {
                most = Math.max(most, entry.value());
            }
        }
        if (column < 0 || !(most > 0)) {
            return Optional.empty();
        }
        double step = StrictMath.pow(10, StrictMath.floor(StrictMath.log10(most)));
        double fine = most / step < 2 ? step / 2 : most / step > 5 ? 2 * step : step;
        return Optional.of(new Plot(column, Math.ceil(most / fine + 0.2) * fine, fine));
    }

    /** Records of a kind that declares no table, or that this program does not know: numbers and states only. */
    private List<Line> plain(Question question) {
        List<Line> rows = new ArrayList<>();
        for (Hash record : register.current(question.kind())) {
            Set<StateName> states = register.graph().states(record);
            if (rows.size() < question.most()
                    && (question.state().isEmpty()
                            || states.contains(question.state().get()))) {
                rows.add(new Entry(
                        record,
                        Names.number(archive.label(record), question.kind()),
                        List.of(),
                        Double.NaN,
                        Double.NaN,
                        States.first(states)));
            }
        }
        return rows;
    }
}
