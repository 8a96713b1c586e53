package fringekeep.desk.list;

import fringekeep.archive.Archive;
import fringekeep.archive.listing.Column;
import fringekeep.archive.listing.Row;
import fringekeep.archive.problem.StoppedException;
import fringekeep.archive.problem.Work;
import fringekeep.archive.record.Hash;
import fringekeep.desk.look.Texts;
import fringekeep.desk.session.Clock;
import fringekeep.desk.session.Names;
import java.time.Instant;
import java.util.ArrayList;
import java.util.List;
import java.util.Map;

/** Rows as text for spreadsheets: tab-separated, units in heads, every digit, uncertainties in columns of their own. */
final class CopiedTable {
    private static final Texts TEXTS = new Texts("fringekeep.desk.list.Texts", CopiedTable.class);

    private final Archive archive;
    private final Joined joined;
    private final Clock clock;

    CopiedTable(Archive archive, Joined joined, Clock clock) {
        this.archive = archive;
        this.joined = joined;
        this.clock = clock;
    }

    String of(String kind, List<Shown> shown, List<Hash> records, Work work) throws StoppedException {
        StringBuilder text = new StringBuilder();
        List<String> heads = new ArrayList<>(List.of(kind));
        for (Shown one : shown) {
            heads.add(one.head().text());
            if (deviation(one)) {
                heads.add("u(" + one.head().text() + ")");
            }
        }
        line(text, heads);
        long done = 0;
        for (Hash record : records) {
            work.check();
            work.progress(++done, records.size(), TEXTS.of("copying"));
            line(text, cells(kind, shown, record));
        }
        return text.toString();
    }

    private List<String> cells(String kind, List<Shown> shown, Hash record) {
        String label = joined.line(record).label();
        List<String> cells = new ArrayList<>();
        cells.add(Names.number(label.isEmpty() ? archive.label(record) : label, kind));
        for (Shown one : shown) {
            Row row = joined.linked(record, one.spec().way()).map(joined::row).orElseGet(() -> new Row(Map.of()));
            cells.add(cell(one.column(), row.values().get(one.column().name())));
            if (deviation(one)) {
                double u = CellText.deviation(one.column(), one.all(), row);
                cells.add(Double.isFinite(u) ? Double.toString(CellText.shownDeviation(one.column(), u)) : "");
            }
        }
        return cells;
    }

    private static boolean deviation(Shown one) {
        return one.all().stream()
                .anyMatch(other -> other.deviationOf().equals(one.column().name()));
    }

    /** All digits; instants with the lab's own offset; texts on one line. */
    private String cell(Column column, @org.jspecify.annotations.Nullable Object value) {
        if (value == null) {
            return "";
        }
        if (value instanceof Double si) {
            return Double.toString(CellText.shown(column, si));
        }
        if (value instanceof Instant at) {
            return at.atZone(clock.zone()).toLocalDateTime().toString().replace('T', ' ');
        }
        return value.toString();
    }

    private static void line(StringBuilder text, List<String> cells) {
        for (int i = 0; i < cells.size(); i++) {
            text.append(i == 0 ? "" : "\t").append(cells.get(i).replaceAll("[\\t\\r\\n]+", " "));
        }
        text.append('\n');
    }
}
