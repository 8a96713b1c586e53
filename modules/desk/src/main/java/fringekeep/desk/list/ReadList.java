package fringekeep.desk.list;

import fringekeep.archive.Archive;
import fringekeep.archive.graph.StateName;
import fringekeep.archive.listing.Listing;
import fringekeep.archive.listing.Page;
import fringekeep.archive.listing.Projection;
import fringekeep.archive.listing.Row;
import fringekeep.archive.problem.ProblemException;
import fringekeep.archive.problem.StoppedException;
import fringekeep.archive.problem.Work;
import fringekeep.archive.record.Hash;
import fringekeep.desk.list.ListContent.Entry;
import fringekeep.desk.list.ListContent.Head;
import fringekeep.desk.list.ListContent.Line;
import fringekeep.desk.list.ListContent.Plot;
import fringekeep.desk.list.ListContent.RowMark;
import fringekeep.desk.look.Mark;
import fringekeep.desk.look.Texts;
import fringekeep.desk.session.Clock;
import fringekeep.desk.session.InView;
import fringekeep.desk.session.LinkedRecords;
import fringekeep.desk.session.Names;
import fringekeep.desk.session.Register;
import fringekeep.desk.session.States;
import fringekeep.desk.session.Stops;
import fringekeep.desk.session.Views;
import fringekeep.drawing.NumberText;
import java.util.ArrayList;
import java.util.Arrays;
import java.util.BitSet;
import java.util.Comparator;
import java.util.HashMap;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import java.util.Set;
import java.util.stream.IntStream;

/** Reads a list over the declared table of a kind: what stands in each row at once, the rows page by page. */
public final class ReadList {
    private static final Texts TEXTS = new Texts("fringekeep.desk.list.Texts", ReadList.class);
    private static final int AT_ONCE = 20_000;

    private final Archive archive;
    private final Register register;
    private final InView inView;
    private final Stops stops;
    private final Clock clock;
    private final Joined joined;

    /**
     * Reads what is in view.
     *
     * @param joined what was read at the view's register before, or a new one
     */
    public ReadList(Archive archive, InView inView, Stops stops, Joined joined) {
        this.archive = archive;
        this.inView = inView;
        this.register = inView.register();
        this.stops = stops;
        this.clock = new Clock(archive.facts());
        this.joined = joined;
    }

    /** The list that answers a question, with the kind's usual columns. */
    public ListContent read(Question question, Work work) throws ProblemException, StoppedException {
        return read(question, List.of(), work);
    }

    /**
     * The list that answers a question.
     *
     * @param columns columns a person chose; empty for the usual ones
     */
    public ListContent read(Question question, List<String> columns, Work work)
            throws ProblemException, StoppedException {
        String kind = question.kind();
        List<Shown> shown = Shown.of(archive, stops, kind, columns);
        int[] places = places(question, work);
        Gathering gathering = gathering(question, work);
        int[] rows = question.sort().isPresent()
                ? sorted(places, kind, question.sort().get(), work)
                : gathering.rows(places);
        RowOrder order = new RowOrder(register, kind, rows);
        CellText text = new CellText(clock, question.sort().isEmpty() && gathering.dated());
        PagedRows.Reader reader =
                (from, to, pageWork) -> lines(kind, shown, text, order, gathering, from, to, pageWork);
        List<Line> first = reader.lines(0, Math.min(PagedRows.PAGE, order.size()), work);
        ListWords words = new ListWords(archive, inView, stops, joined);
        return new ListContent(
                heading(kind, inView.current(kind)),
                words.of(question, register.size(kind) <= AT_ONCE, work),
                shown.stream().map(Shown::head).toList(),
                plot(kind, shown, places, first, work),
                new PagedRows(order, reader, first),
                marked(kind, places, first),
                Optional.of(question));
    }

    /** Filter words that take long where there are very many records; empty when {@link #read} gave them all. */
    public Optional<ListContent> furtherWords(ListContent content, Work work)
            throws ProblemException, StoppedException {
        Optional<Question> question = content.question();
        if (question.isEmpty() || register.size(question.get().kind()) <= AT_ONCE) {
            return Optional.empty();
        }
        ListWords words = new ListWords(archive, inView, stops, joined);
        return Optional.of(content.with(words.of(question.get(), true, work)));
    }

    /** A first page while the graph is still being read: own columns, no states, no groups. */
    public static ListContent preview(Archive archive, Stops stops, Question question) throws ProblemException {
        Optional<Projection> table = Joined.table(archive, question.kind());
        if (table.isEmpty()) {
            return ListContent.NOTHING;
        }
        List<Shown> shown = Shown.of(archive, stops, question.kind(), List.of());
        CellText text = new CellText(new Clock(archive.facts()), false);
        Page page = archive.list(Listing.newest(table.get().name(), PagedRows.PAGE));
        List<Entry> entries = new ArrayList<>();
        for (Page.Line line : page.rows()) {
            List<String> cells = shown.stream()
                    .map(one -> text.of(
                            one.column(),
                            one.all(),
                            one.spec().way().isEmpty() ? line.row() : new Row(Map.of()),
                            one.plain()))
                    .toList();
            String number = Names.shortNumber(line.label(), question.kind(), new Clock(archive.facts()));
            entries.add(new Entry(
                    line.record(), number, cells, Double.NaN, Double.NaN, Optional.empty(), Optional.empty()));
        }
        long count = archive.counts().getOrDefault(question.kind(), 0L);
        return new ListContent(
                heading(question.kind(), Math.toIntExact(count)),
                List.of(),
                shown.stream().map(Shown::head).toList(),
                Optional.empty(),
                ListRows.of(entries),
                false,
                Optional.empty());
    }

    private static String heading(String kind, int count) {
        return NumberText.count(count) + " " + (count == 1 ? Stops.label(kind) : plural(kind));
    }

    /** What several records of the main kind of each stop are called. */
    public static List<String> plurals(Stops stops) {
        return stops.all().stream().map(stop -> plural(stop.kind())).toList();
    }

    static String plural(String kind) {
        return TEXTS.orElse("plural." + kind, Stops.label(kind) + "s");
    }

    // ---- which records

    private int[] places(Question question, Work work) throws ProblemException, StoppedException {
        String kind = question.kind();
        Optional<Set<Hash>> linked = question.linkedWith().map(record -> LinkedRecords.of(register, record));
        BitSet picked = new BitSet();
        boolean picking = linked.isPresent()
                || question.among().isPresent()
                || !question.words().isEmpty();
        if (picking) {
            picked.set(0, register.size(kind));
            linked.ifPresent(records -> picked.and(set(kind, records)));
            question.among().ifPresent(among -> picked.and(set(kind, among.records())));
            if (!question.words().isEmpty()) {
                List<String> words = Arrays.stream(question.words().split("\\s+"))
                        .filter(word -> !word.isEmpty())
                        .toList();
                picked.and(set(kind, Views.found(archive, kind, words)));
            }
        }
        Optional<BitSet> valued = question.value().isPresent()
                ? Optional.of(new ListWords(archive, inView, stops, joined)
                        .with(kind, question.value().get(), work))
                : Optional.empty();
        return IntStream.range(0, register.size(kind))
                .filter(place -> inView.contains(kind, place) && !register.is(kind, place, StateName.CORRECTED))
                .filter(place -> !picking || picked.get(place))
                .filter(place -> question.state().isEmpty()
                        || register.is(kind, place, question.state().get()))
                .filter(place -> valued.isEmpty() || valued.get().get(place))
                .toArray();
    }

    private BitSet set(String kind, Set<Hash> records) {
        BitSet set = new BitSet();
        for (Hash record : records) {
            if (register.kind(record).filter(kind::equals).isPresent()) {
                set.set(register.place(record));
            }
        }
        return set;
    }

    private int[] sorted(int[] places, String kind, Question.Sort by, Work work)
            throws ProblemException, StoppedException {
        Spec spec = Spec.of(by.column());
        Optional<Values> values = joined.values(spec.kind(kind), spec.column(), work);
        if (values.isEmpty()) {
            return places;
        }
        double[] ranks = values.get().ranks();
        int[] over = spec.way().isEmpty() ? new int[0] : joined.places(kind, spec.way(), work);
        double[] keys = new double[places.length];
        for (int i = 0; i < places.length; i++) {
            int place = spec.way().isEmpty() ? places[i] : over[places[i]];
            keys[i] = place < 0 ? Double.NaN : ranks[place];
        }
        double sign = by.descending() ? -1 : 1;
        return IntStream.range(0, places.length)
                .boxed()
                .sorted(Comparator.comparing((Integer i) -> Double.isNaN(keys[i]))
                        .thenComparingDouble(i -> sign * keys[i])
                        .thenComparingInt(i -> i))
                .mapToInt(i -> places[i])
                .toArray();
    }

    private Gathering gathering(Question question, Work work) throws ProblemException, StoppedException {
        String by = stops.entry(question.kind(), "group").stream().findFirst().orElse("");
        return Gathering.by(archive, stops, clock, joined, question.kind(), by, work);
    }

    // ---- rows

    private List<Line> lines(
            String kind,
            List<Shown> shown,
            CellText text,
            RowOrder order,
            Gathering gathering,
            int from,
            int to,
            Work work)
            throws StoppedException {
        ready(kind, shown, order.places(from, to));
        List<Line> lines = new ArrayList<>();
        for (int row = from; row < to; row++) {
            work.check();
            lines.add(
                    order.group(row)
                            ? gathering.head(order.groupNumber(row))
                            : entry(kind, shown, text, order.record(row)));
        }
        return lines;
    }

    /** Reads what the rows of a page need in a few questions. */
    private void ready(String kind, List<Shown> shown, int[] places) {
        List<Hash> records = Arrays.stream(places)
                .mapToObj(place -> register.record(kind, place))
                .toList();
        joined.ready(kind, records);
        shown.stream()
                .map(one -> one.spec().way())
                .filter(way -> !way.isEmpty())
                .distinct()
                .forEach(way -> joined.ready(
                        way.get(way.size() - 1),
                        records.stream()
                                .flatMap(record -> joined.linked(record, way).stream())
                                .toList()));
    }

    private Entry entry(String kind, List<Shown> shown, CellText text, Hash record) {
        Page.Line line = joined.line(record);
        List<String> cells = new ArrayList<>();
        double value = Double.NaN;
        double deviation = Double.NaN;
        Map<List<String>, Row> rows = new HashMap<>();
        for (int i = 0; i < shown.size(); i++) {
            Shown one = shown.get(i);
            Row row = rows.computeIfAbsent(one.spec().way(), way -> row(line, way));
            cells.add(text.of(one.column(), one.all(), row, one.plain()));
            if (one.plotted() && row.values().get(one.column().name()) instanceof Double si) {
                value = CellText.shown(one.column(), si);
                deviation = CellText.shownDeviation(one.column(), CellText.deviation(one.column(), one.all(), row));
            }
        }
        Set<StateName> states = register.states(record);
        return new Entry(
                record,
                Names.shortNumber(line.label(), kind, clock),
                cells,
                value,
                deviation,
                States.first(states),
                mark(kind, record, states));
    }

    private Row row(Page.Line line, List<String> way) {
        return way.isEmpty()
                ? line.row()
                : joined.linked(line.record(), way).map(joined::row).orElseGet(() -> new Row(Map.of()));
    }

    /** Its own state first, then what it lacks, then the state of what is drawn beside it. */
    private Optional<RowMark> mark(String kind, Hash record, Set<StateName> states) {
        Optional<StateName> own = States.first(states);
        if (own.isPresent()) {
            return own.map(state -> new RowMark(States.mark(state), States.word(state)));
        }
        for (String wanted : stops.entry(kind, "wants")) {
            if (joined.linked(record, wanted).isEmpty()) {
                return Optional.of(new RowMark(Mark.CORNER, ListWords.lacking(wanted)));
            }
        }
        for (String beside : stops.entry(kind, "beside")) {
            boolean outdated = joined.linked(record, beside)
                    .filter(other -> register.states(other).contains(StateName.OUTDATED))
                    .isPresent();
            if (outdated) {
                return Optional.of(new RowMark(Mark.RING, TEXTS.of("beside.outdated", Stops.label(beside))));
            }
        }
        return Optional.empty();
    }

    private boolean marked(String kind, int[] places, List<Line> first) {
        boolean inSight = first.stream()
                .anyMatch(line -> line instanceof Entry entry && entry.mark().isPresent());
        return inSight
                || Arrays.stream(places)
                        .anyMatch(place ->
                                Arrays.stream(StateName.values()).anyMatch(state -> register.is(kind, place, state)));
    }

    // ---- the plot column

    private Optional<Plot> plot(String kind, List<Shown> shown, int[] places, List<Line> first, Work work)
            throws ProblemException, StoppedException {
        int column = IntStream.range(0, shown.size())
                .filter(i -> shown.get(i).plotted())
                .findFirst()
                .orElse(-1);
        if (column < 0) {
            return Optional.empty();
        }
        double most = first.stream()
                .filter(Entry.class::isInstance)
                .mapToDouble(line -> ((Entry) line).value())
                .filter(Double::isFinite)
                .max()
                .orElse(0);
        if (places.length > PagedRows.PAGE && register.size(kind) <= AT_ONCE) {
            most = Math.max(most, most(kind, shown.get(column), places, work));
        }
        if (!(most > 0)) {
            return Optional.empty();
        }
        double step = StrictMath.pow(10, StrictMath.floor(StrictMath.log10(most)));
        double fine = most / step < 2 ? step / 2 : most / step > 5 ? 2 * step : step;
        return Optional.of(new Plot(column, Math.ceil(most / fine + 0.2) * fine, fine));
    }

    private double most(String kind, Shown plotted, int[] places, Work work) throws ProblemException, StoppedException {
        Spec spec = plotted.spec();
        Optional<Values> values = joined.values(spec.kind(kind), spec.column(), work);
        int[] over = spec.way().isEmpty() ? new int[0] : joined.places(kind, spec.way(), work);
        double most = 0;
        for (int place : places) {
            int at = spec.way().isEmpty() ? place : over[place];
            double value =
                    at < 0 ? Double.NaN : values.map(all -> all.numbers()[at]).orElse(Double.NaN);
            most = value > most ? value : most;
        }
        return CellText.shown(plotted.column(), most);
    }

    // ---- choosing columns, copying

    /** Columns that a list of a kind can show, with their heads; those shown come first where they are chosen. */
    public static List<Head> offered(Archive archive, Stops stops, String kind) {
        return Shown.of(archive, stops, kind, Joined.offered(archive, kind, stops.entry(kind, "joins"))).stream()
                .map(Shown::head)
                .toList();
    }

    /** Rows as a table for spreadsheets: tabs between cells, units in heads, all digits. */
    public String table(ListContent content, List<Hash> records, Work work) throws StoppedException {
        String kind = content.question().map(Question::kind).orElse("");
        List<Shown> shown = Shown.of(
                archive, stops, kind, content.heads().stream().map(Head::column).toList());
        return new CopiedTable(archive, joined, clock).of(kind, shown, records, work);
    }
}
