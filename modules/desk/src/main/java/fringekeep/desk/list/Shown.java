package fringekeep.desk.list;

import fringekeep.archive.Archive;
import fringekeep.archive.listing.Column;
import fringekeep.archive.listing.Projection;
import fringekeep.desk.session.Stops;
import java.util.ArrayList;
import java.util.List;

/**
 * A shown column.
 *
 * @param text where it stands, as written in the table of stops
 * @param spec the same, read
 * @param column its declaration
 * @param all all columns of its table
 * @param plotted whether its values are drawn as lozenges
 * @param plain whether it is shown without its uncertainty: a setting
 */
record Shown(String text, Spec spec, Column column, List<Column> all, boolean plotted, boolean plain) {
    Shown {
        all = List.copyOf(all);
    }

    /** Columns of a kind: chosen ones, else those of the table of stops, else all of its own. */
    static List<Shown> of(Archive archive, Stops stops, String kind, List<String> chosen) {
        List<String> wanted = new ArrayList<>(chosen.isEmpty() ? stops.entry(kind, "columns") : chosen);
        if (wanted.isEmpty()) {
            wanted.addAll(Joined.offered(archive, kind, List.of()));
        }
        String plot = stops.entry(kind, "plot").stream().findFirst().orElse("");
        List<String> plain = stops.entry(kind, "plain");
        List<Shown> shown = new ArrayList<>();
        for (String text : wanted) {
            Spec spec = Spec.of(text);
            List<Column> all = Joined.table(archive, spec.kind(kind))
                    .map(Projection::columns)
                    .orElse(List.of());
            all.stream()
                    .filter(column -> column.name().equals(spec.column())
                            && column.deviationOf().isEmpty()
                            && column.sort() != Column.Sort.HASH)
                    .findFirst()
                    .ifPresent(column -> shown.add(new Shown(
                            text, spec, column, all, column.name().equals(plot), plain.contains(column.name()))));
        }
        return shown;
    }

    ListContent.Head head() {
        return CellText.head(column, text);
    }
}
