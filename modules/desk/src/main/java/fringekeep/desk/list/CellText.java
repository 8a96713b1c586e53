package fringekeep.desk.list;

import fringekeep.archive.listing.Column;
import fringekeep.archive.listing.Row;
import fringekeep.archive.problem.ProblemException;
import fringekeep.archive.quantity.Unit;
import fringekeep.archive.quantity.Units;
import fringekeep.desk.session.Clock;
import fringekeep.drawing.NumberText;
import java.time.Instant;
import java.util.List;
import java.util.Locale;
import java.util.Optional;

/** Values of declared columns as text. */
final class CellText {
    private final Clock clock;
    private final boolean timeOnly;

    /** With times alone where the rows are grouped by day. */
    CellText(Clock clock, boolean timeOnly) {
        this.clock = clock;
        this.timeOnly = timeOnly;
    }

    /** Head of a column: {@code laser power / W}. */
    static ListContent.Head head(Column column) {
        String label = column.label().isEmpty() ? column.name() : lowered(column.label());
        String unit =
                unit(column).map(Unit::shown).filter(text -> !text.equals("1")).orElse("");
        boolean right = column.sort() == Column.Sort.REAL || column.sort() == Column.Sort.INTEGER;
        return new ListContent.Head(unit.isEmpty() ? label : label + " / " + unit, right);
    }

    /** Words begin small; symbols such as P keep their case. */
    private static String lowered(String label) {
        boolean word = label.length() > 1 && Character.isLowerCase(label.charAt(1));
        return word ? label.substring(0, 1).toLowerCase(Locale.ROOT) + label.substring(1) : label;
    }

    /** Text of a cell; a dash where there is no value. */
    String of(Column column, List<Column> all, Row row) {
        Object value = row.values().get(column.name());
        if (value == null) {
            return "\u2013";
        }
        return switch (column.sort()) {
            case TEXT -> value.toString();
            case REAL -> measured(column, (Double) value, deviation(column, all, row));
            case INTEGER -> NumberText.count((Long) value);
            case INSTANT -> timeOnly ? clock.time((Instant) value) : clock.moment((Instant) value);
            case FLAG -> Boolean.TRUE.equals(value) ? "yes" : "";
            case HASH -> "";
        };
    }

    /** Value in the shown unit. */
    static double shown(Column column, double si) {
        return unit(column).map(unit -> unit.fromSi(si)).orElse(si);
    }

    /** A deviation in the shown unit. */
    static double shownDeviation(Column column, double si) {
        return Double.isFinite(si)
                ? unit(column).map(unit -> unit.differenceFromSi(si)).orElse(si)
                : si;
    }

    /** Deviation of a column's value in a row (SI), NaN if none. */
    static double deviation(Column column, List<Column> all, Row row) {
        for (Column other : all) {
            if (other.deviationOf().equals(column.name())
                    && row.values().get(other.name()) instanceof Double deviation) {
                return deviation;
            }
        }
        return Double.NaN;
    }

    private static String measured(Column column, double si, double deviation) {
        double u = shownDeviation(column, deviation);
        return u > 0 ? NumberText.measured(shown(column, si), u) : NumberText.significant(shown(column, si), 5);
    }

    private static Optional<Unit> unit(Column column) {
        String code = column.shownUnit().isEmpty() ? column.unit() : column.shownUnit();
        if (code.isEmpty()) {
            return Optional.empty();
        }
        try {
            return Optional.of(Units.parse(code));
        } catch (ProblemException e) {
            return Optional.empty(); // a unit of a newer kind: the number is shown in SI
        }
    }
}
