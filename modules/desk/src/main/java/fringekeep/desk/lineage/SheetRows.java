package fringekeep.desk.lineage;

import fringekeep.archive.record.Hash;
import fringekeep.desk.lineage.Sheet.Band;
import fringekeep.desk.lineage.Sheet.Item;
import fringekeep.desk.lineage.Sheet.Row;
import java.util.ArrayList;
import java.util.HashSet;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import java.util.Set;

/**
 * The rows of a sheet as they stand on screen: headings, rows, and gathered rows that can be opened. Walks along links. Plain
 * Java, knows nothing of painting.
 */
public final class SheetRows {
    private static final int LEAST = 3;

    private final Sheet sheet;
    private final Set<String> opened = new HashSet<>();
    private final List<Visible> rows = new ArrayList<>();
    private Optional<Hash> selected;

    /** A row on screen. */
    public sealed interface Visible {}

    /** A band's heading. */
    public record Heading(String text) implements Visible {}

    /** One row. */
    public record Single(Row row) implements Visible {}

    /**
     * Several rows alike.
     *
     * @param key names it
     * @param rows the rows it stands for
     * @param time "16:41 to 20:02"
     * @param words what they have in common
     */
    public record Gathered(String key, List<Row> rows, String time, String words) implements Visible {
        /** Copies. */
        public Gathered {
            rows = List.copyOf(rows);
        }

        /** How many records stand in a column. */
        public long count(int column) {
            return rows.stream()
                    .flatMap(row -> row.items().stream())
                    .filter(item -> item.column() == column)
                    .count();
        }

        /** Counts of all. */
        public double counts() {
            return rows.stream()
                    .flatMap(row -> row.items().stream())
                    .mapToDouble(Item::counts)
                    .sum();
        }
    }

    /** All rows of a sheet, gathered; its root is selected. */
    public SheetRows(Sheet sheet) {
        this.sheet = sheet;
        this.selected = Optional.of(sheet.root());
        arrange();
    }

    /** The sheet. */
    public Sheet sheet() {
        return sheet;
    }

    /** What is on screen. */
    public List<Visible> rows() {
        return List.copyOf(rows);
    }

    /** The record in hand. */
    public Optional<Hash> selected() {
        return selected;
    }

    private void arrange() {
        rows.clear();
        for (Band band : sheet.bands()) {
            rows.add(new Heading(band.heading()));
            Map<String, List<Row>> alike = new LinkedHashMap<>();
            for (Row row : band.rows()) {
                alike.computeIfAbsent(key(band, row), key -> new ArrayList<>()).add(row);
            }
            alike.forEach(this::place);
        }
    }

    private static String key(Band band, Row row) {
        StringBuilder key = new StringBuilder(band.heading()).append('|');
        boolean counts = row.items().stream().anyMatch(item -> item.counts() > 0);
        boolean apart = row.items().stream().anyMatch(ReadSheet::apart);
        key.append(row.words());
        if ((!counts && !row.words().isEmpty()) || apart) {
            return key.append('|').append(row.items().get(0).record().hex()).toString();
        }
        row.items().forEach(item -> key.append('|').append(item.column()));
        return key.toString();
    }

    private void place(String key, List<Row> alike) {
        if (alike.size() < LEAST || opened.contains(key)) {
            alike.forEach(row -> rows.add(new Single(row)));
            return;
        }
        Row first = alike.get(0);
        Row last = alike.get(alike.size() - 1);
        rows.add(new Gathered(key, alike, first.time() + " to " + last.time(), first.words()));
    }

    /** Selects a record, opening the row it is gathered in. */
    public void select(Hash record) {
        if (find(record).isEmpty()) {
            gatheredWith(record).ifPresent(gathered -> {
                opened.add(gathered.key());
                arrange();
            });
        }
        selected = Optional.of(record);
    }

    /** Opens a gathered row. */
    public void open(Gathered gathered) {
        opened.add(gathered.key());
        arrange();
        selected = Optional.of(gathered.rows().get(0).items().get(0).record());
    }

    /** Closes the opened row that holds the record in hand. */
    public void close() {
        for (Band band : sheet.bands()) {
            for (Row row : band.rows()) {
                boolean holds = row.items().stream().anyMatch(item -> selected.equals(Optional.of(item.record())));
                if (holds) {
                    opened.remove(key(band, row));
                }
            }
        }
        arrange();
    }

    /** Row on screen of a record that stands alone. */
    public Optional<Integer> find(Hash record) {
        for (int i = 0; i < rows.size(); i++) {
            if (rows.get(i) instanceof Single single
                    && single.row().items().stream()
                            .anyMatch(item -> item.record().equals(record))) {
                return Optional.of(i);
            }
        }
        return Optional.empty();
    }

    /** Row on screen of a record, gathered or not; -1 if it is not in the sheet. */
    public int rowOf(Hash record) {
        return find(record).or(() -> gatheredWith(record).map(rows::indexOf)).orElse(-1);
    }

    private Optional<Gathered> gatheredWith(Hash record) {
        return rows.stream()
                .filter(Gathered.class::isInstance)
                .map(Gathered.class::cast)
                .filter(gathered -> gathered.rows().stream()
                        .flatMap(row -> row.items().stream())
                        .anyMatch(item -> item.record().equals(record)))
                .findFirst();
    }

    /** The item of a record. */
    public Optional<Item> item(Hash record) {
        return sheet.bands().stream()
                .flatMap(band -> band.rows().stream())
                .flatMap(row -> row.items().stream())
                .filter(item -> item.record().equals(record))
                .findFirst();
    }

    /** Goes along a link: to the input in the nearest column at the left, or the user in the nearest at the right. */
    public boolean along(boolean toInput) {
        Optional<Item> from = selected.flatMap(this::item);
        if (from.isEmpty()) {
            return false;
        }
        Optional<Item> best = Optional.empty();
        for (Sheet.Step step : sheet.steps()) {
            Hash here = toInput ? step.user() : step.input();
            if (selected.equals(Optional.of(here))) {
                Optional<Item> other = item(toInput ? step.input() : step.user());
                if (other.isPresent() && nearer(from.get(), other.get(), best)) {
                    best = other;
                }
            }
        }
        best.ifPresent(item -> select(item.record()));
        return best.isPresent();
    }

    private static boolean nearer(Item from, Item other, Optional<Item> best) {
        int distance = Math.abs(other.column() - from.column());
        return !other.record().equals(from.record())
                && (best.isEmpty() || distance < Math.abs(best.get().column() - from.column()));
    }

    /** Goes up or down to the next record of the same column on screen, else of any column. */
    public void step(int by) {
        int column = selected.flatMap(this::item).map(Item::column).orElse(-1);
        int row = selected.map(this::rowOf).orElse(-1) + by;
        for (; row >= 0 && row < rows.size(); row += by) {
            Optional<Hash> next = inColumn(rows.get(row), column);
            if (next.isPresent()) {
                selected = next;
                return;
            }
        }
    }

    private static Optional<Hash> inColumn(Visible visible, int column) {
        List<Row> rows = visible instanceof Single single
                ? List.of(single.row())
                : visible instanceof Gathered gathered ? gathered.rows() : List.of();
        return rows.stream()
                .flatMap(row -> row.items().stream())
                .filter(item -> item.column() == column)
                .map(Item::record)
                .findFirst();
    }

    /** The gathered row that holds the record in hand, if it does not stand alone. */
    public Optional<Gathered> gatheredSelection() {
        return selected.filter(record -> find(record).isEmpty()).flatMap(this::gatheredWith);
    }

    /** Records on the thread of the one in hand: it, all its inputs and all its users within the sheet. */
    public Set<Hash> thread() {
        Set<Hash> thread = new HashSet<>();
        selected.ifPresent(record -> {
            spread(record, true, thread);
            spread(record, false, thread);
        });
        return thread;
    }

    private void spread(Hash record, boolean toInputs, Set<Hash> thread) {
        List<Hash> open = new ArrayList<>(List.of(record));
        Set<Hash> seen = new HashSet<>(open);
        while (!open.isEmpty()) {
            Hash now = open.remove(open.size() - 1);
            thread.add(now);
            for (Sheet.Step step : sheet.steps()) {
                Hash here = toInputs ? step.user() : step.input();
                Hash other = toInputs ? step.input() : step.user();
                if (here.equals(now) && seen.add(other)) {
                    open.add(other);
                }
            }
        }
    }
}
