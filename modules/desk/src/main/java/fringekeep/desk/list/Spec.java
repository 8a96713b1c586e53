package fringekeep.desk.list;

import java.util.ArrayList;
import java.util.Arrays;
import java.util.List;

/**
 * Where a column stands: {@code visibility} in the kind's own table, {@code placement:purpose} in that of the linked placement,
 * {@code scan>placement:purpose} over two steps; {@code placement>source-run} names a linked record itself.
 *
 * @param way kinds of the records to go over
 * @param column name of the column; empty for the record itself
 */
record Spec(List<String> way, String column) {
    Spec {
        way = List.copyOf(way);
    }

    static Spec of(String text) {
        int colon = text.indexOf(':');
        boolean steps = colon >= 0 || text.contains(">");
        String before = colon >= 0 ? text.substring(0, colon) : steps ? text : "";
        List<String> way = new ArrayList<>();
        Arrays.stream(before.split(">"))
                .map(String::strip)
                .filter(kind -> !kind.isEmpty())
                .forEach(way::add);
        return new Spec(way, steps ? colon >= 0 ? text.substring(colon + 1).strip() : "" : text.strip());
    }

    /** The kind in whose table the column stands. */
    String kind(String own) {
        return way.isEmpty() ? own : way.get(way.size() - 1);
    }
}
