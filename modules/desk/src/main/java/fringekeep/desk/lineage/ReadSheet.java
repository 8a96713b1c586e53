package fringekeep.desk.lineage;

import fringekeep.archive.Archive;
import fringekeep.archive.facet.CountTable;
import fringekeep.archive.facet.TimeSpan;
import fringekeep.archive.graph.Cause;
import fringekeep.archive.graph.Graph;
import fringekeep.archive.graph.Graph.Link;
import fringekeep.archive.graph.Graph.LinkSort;
import fringekeep.archive.graph.StateName;
import fringekeep.archive.kind.Inputs;
import fringekeep.archive.kind.RecordKind;
import fringekeep.archive.kind.RecordView;
import fringekeep.archive.problem.StoppedException;
import fringekeep.archive.problem.Work;
import fringekeep.archive.record.Hash;
import fringekeep.archive.record.PartName;
import fringekeep.desk.lineage.Sheet.Band;
import fringekeep.desk.lineage.Sheet.Item;
import fringekeep.desk.lineage.Sheet.Row;
import fringekeep.desk.lineage.Sheet.Step;
import fringekeep.desk.list.Joined;
import fringekeep.desk.look.Texts;
import fringekeep.desk.session.Clock;
import fringekeep.desk.session.Names;
import fringekeep.desk.session.Register;
import fringekeep.desk.session.States;
import fringekeep.desk.session.Stops;
import fringekeep.drawing.NumberText;
import java.time.Instant;
import java.time.LocalDate;
import java.time.format.DateTimeParseException;
import java.util.ArrayList;
import java.util.Comparator;
import java.util.HashMap;
import java.util.HashSet;
import java.util.LinkedHashSet;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import java.util.Set;
import java.util.TreeSet;

/** Reads the lineage of a record into a sheet. Not to be used on the window thread. */
public final class ReadSheet {
    private static final Texts TEXTS = new Texts("fringekeep.desk.lineage.Texts", ReadSheet.class);

    private final Archive archive;
    private final Register register;
    private final Stops stops;
    private final Clock clock;
    private final Joined joined;
    private final Map<Hash, Instant> times = new HashMap<>();

    /** Reads from an archive at the register's watermark. */
    public ReadSheet(Archive archive, Register register, Stops stops) {
        this.archive = archive;
        this.register = register;
        this.stops = stops;
        this.clock = new Clock(archive.facts());
        this.joined = new Joined(archive, register);
    }

    private record Timed(Instant at, Item item) {}

    /** The sheet of a record. */
    public Sheet read(Hash root, Work work) throws StoppedException {
        Graph graph = register.graph();
        Set<Hash> records = new LinkedHashSet<>(graph.upstream(root));
        records.add(root);
        graph.causes(root).stream().map(Cause::by).forEach(records::add);
        List<Timed> timed = new ArrayList<>();
        int done = 0;
        for (Hash record : records) {
            work.check();
            work.progress(++done, records.size(), TEXTS.of("reading"));
            item(record).ifPresent(item -> timed.add(new Timed(times.getOrDefault(record, Instant.EPOCH), item)));
        }
        timed.sort(
                Comparator.comparing(Timed::at).thenComparing(one -> one.item().column()));
        List<Step> steps = steps(records);
        List<Band> bands = bands(rows(timed, steps));
        int days = stops.entry("sheet", "days").stream()
                .findFirst()
                .flatMap(stops::of)
                .orElse(-1);
        double counts = 0;
        int scans = 0;
        Set<LocalDate> measured = new HashSet<>();
        for (Timed one : timed) {
            if (one.item().column() == days
                            && graph.upstream(root).contains(one.item().record())
                    || one.item().column() == days && one.item().record().equals(root)) {
                counts += one.item().counts();
                scans++;
                measured.add(clock.day(one.at()));
            }
        }
        return new Sheet(
                root,
                archive.label(root),
                TEXTS.of("rests", NumberText.count(Math.round(counts)), scans),
                TEXTS.of(measured.size() == 1 ? "day" : "days", measured.size()),
                States.sentences(archive, graph, clock, root),
                bands,
                steps);
    }

    private Optional<Item> item(Hash record) {
        Optional<RecordView> view = archive.record(record);
        Optional<Integer> column = register.kind(record).flatMap(stops::of);
        if (view.isEmpty() || column.isEmpty()) {
            return Optional.empty();
        }
        RecordView at = view.get();
        String kindName = at.head().kind().text();
        boolean main = stops.all().get(column.get()).kind().equals(kindName);
        if (!main && !stops.entry("sheet", "also").contains(kindName)) {
            return Optional.empty();
        }
        Inputs inputs = archive.inputs(record);
        Optional<RecordKind> kind = Names.kind(archive, at);
        times.put(record, time(at, kind, inputs));
        String whole = archive.label(record);
        // columns are narrow: no leading noughts behind a kind's name, no instant behind a continuation's number
        String label = main
                ? Names.shortNumber(whole, kindName, clock)
                : Names.shortLabel(whole, clock).replaceFirst(" 0+(?=[0-9])", " ");
        return Optional.of(new Item(
                record,
                column.get(),
                label,
                words(at),
                States.first(register.graph().states(record)),
                counts(at, kind, inputs)));
    }

    private String words(RecordView view) {
        for (String entry : stops.entry(view.head().kind().text(), "words")) {
            if (entry.equals("none")) {
                return "";
            }
            int colon = entry.indexOf(':');
            Object word = joined.linked(view.fingerprint(), entry.substring(0, colon))
                    .map(other -> joined.row(other).values().get(entry.substring(colon + 1)))
                    .orElse(null);
            if (word != null) {
                return word.toString().replace('-', ' ');
            }
        }
        return Names.title(archive, view).text();
    }

    private Instant time(RecordView view, Optional<RecordKind> kind, Inputs inputs) {
        return kind.flatMap(one -> one.facet(TimeSpan.class, view, inputs))
                .map(span -> span.start().at())
                .or(() -> view.head().after().map(after -> after.from()))
                .or(() -> view.part(PartName.MADE)
                        .flatMap(made -> made.text("at"))
                        .flatMap(ReadSheet::instant))
                .or(() -> archive.recorded(view.fingerprint()).map(Archive.Recorded::at))
                .orElse(Instant.EPOCH);
    }

    private static Optional<Instant> instant(String text) {
        try {
            return Optional.of(Instant.parse(text));
        } catch (DateTimeParseException e) {
            return Optional.empty(); // the journal's time is taken instead
        }
    }

    private static double counts(RecordView view, Optional<RecordKind> kind, Inputs inputs) {
        return kind.flatMap(one -> one.facet(CountTable.class, view, inputs))
                .flatMap(RawCounts::counts)
                .map(channel -> {
                    double sum = 0;
                    for (double value : channel.values()) {
                        sum += Double.isFinite(value) ? value : 0;
                    }
                    return sum;
                })
                .orElse(0.0);
    }

    private List<Step> steps(Set<Hash> records) {
        List<Step> steps = new ArrayList<>();
        for (Hash record : records) {
            for (Link link : register.graph().links(record)) {
                if (link.sort() == LinkSort.INPUT && link.from().equals(record) && records.contains(link.to())) {
                    steps.add(new Step(link.from(), link.to(), link.role()));
                }
            }
        }
        return steps;
    }

    private record RowAt(Instant at, Row row) {}

    /** One row per record; a record made from exactly one record of the column before it shares that record's row. */
    private List<RowAt> rows(List<Timed> timed, List<Step> steps) {
        Map<Hash, Timed> byRecord = new HashMap<>();
        timed.forEach(one -> byRecord.put(one.item().record(), one));
        Map<Hash, List<Item>> guests = new HashMap<>();
        Set<Hash> sharing = new HashSet<>();
        for (Timed one : timed) {
            List<Hash> before = steps.stream()
                    .filter(step -> step.user().equals(one.item().record())
                            && step.role().equals(register.kind(step.input()).orElse("")))
                    .map(Step::input)
                    .filter(input -> Optional.ofNullable(byRecord.get(input))
                            .filter(host -> host.item().column() == one.item().column() - 1)
                            .isPresent())
                    .distinct()
                    .toList();
            boolean counted = before.size() == 1
                    && Optional.ofNullable(byRecord.get(before.get(0)))
                            .filter(host -> host.item().counts() > 0)
                            .isPresent();
            if (counted && !guests.containsKey(before.get(0))) {
                guests.computeIfAbsent(before.get(0), key -> new ArrayList<>()).add(one.item());
                sharing.add(one.item().record());
            }
        }
        List<RowAt> rows = new ArrayList<>();
        for (Timed one : timed) {
            if (!sharing.contains(one.item().record())) {
                List<Item> items = new ArrayList<>(List.of(one.item()));
                items.addAll(guests.getOrDefault(one.item().record(), List.of()));
                rows.add(new RowAt(one.at(), new Row("", one.item().title(), items)));
            }
        }
        return rows;
    }

    /** Bands by measurement day; what was before the first measured day comes under one heading. */
    private List<Band> bands(List<RowAt> rows) {
        int column = stops.entry("sheet", "days").stream()
                .findFirst()
                .flatMap(stops::of)
                .orElse(-1);
        TreeSet<LocalDate> measured = new TreeSet<>();
        for (RowAt row : rows) {
            if (row.row().items().get(0).column() == column) {
                measured.add(clock.day(row.at()));
            }
        }
        List<Band> bands = new ArrayList<>();
        List<Row> now = new ArrayList<>();
        String heading = "";
        for (RowAt row : rows) {
            LocalDate day = clock.day(row.at());
            boolean before = measured.isEmpty() || day.isBefore(measured.first());
            String next = before ? TEXTS.of("before") : Clock.words(day);
            if (!next.equals(heading)) {
                if (!now.isEmpty()) {
                    bands.add(new Band(heading, now));
                }
                now = new ArrayList<>();
                heading = next;
            }
            String time = before ? clock.date(row.at()) : clock.time(row.at());
            now.add(new Row(time, row.row().words(), row.row().items()));
        }
        if (!now.isEmpty()) {
            bands.add(new Band(heading, now));
        }
        return bands;
    }

    /** Whether a state keeps a record out of a gathered row. */
    static boolean apart(Item item) {
        return item.state()
                .filter(state -> state == StateName.WITHDRAWN || state == StateName.CORRECTED)
                .isPresent();
    }
}
