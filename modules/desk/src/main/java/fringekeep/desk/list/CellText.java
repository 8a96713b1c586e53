package fringekeep.desk.list;

import fringekeep.archive.listing.Column;
import fringekeep.archive.listing.Row;
import fringekeep.archive.problem.ProblemException;
import fringekeep.archive.quantity.Unit;
import fringekeep.archive.quantity.Units;
import fringekeep.desk.session.Clock;
import fringekeep.desk.session.Stops;
import fringekeep.drawing.NumberText;
import java.time.Instant;
import java.util.List;
import java.util.Locale;
import java.util.Map;
import java.util.Optional;
import java.util.regex.Matcher;
import java.util.regex.Pattern;

/** Values of declared columns as text. */
final class CellText {
    private static final Pattern BRACKETS = Pattern.compile("(.*\\.[0-9]+)[0-9]\\([0-9.]+\\)");
    private static final Pattern LISTED = Pattern.compile("[a-z]+(-[a-z]+)+");

    /** Digits of numbers without an uncertainty, where fewer say it. */
    private static final Map<String, Integer> DIGITS = Stops.shipped().digits();

    private final Clock clock;
    private final boolean timeOnly;

    /** With times alone where the rows are grouped by day. */
    CellText(Clock clock, boolean timeOnly) {
        this.clock = clock;
        this.timeOnly = timeOnly;
    }

    /** Head of a column: {@code laser power / W}. */
    static ListContent.Head head(Column column, String spec) {
        String label = column.label().isEmpty() ? column.name() : lowered(column.label());
        String unit =
                unit(column).map(Unit::shown).filter(text -> !text.equals("1")).orElse("");
        boolean right = column.sort() == Column.Sort.REAL || column.sort() == Column.Sort.INTEGER;
        return new ListContent.Head(unit.isEmpty() ? label : label + " / " + unit, right, spec);
    }

    /** Words begin small; symbols such as P keep their case. */
    private static String lowered(String label) {
        boolean word = label.length() > 1 && Character.isLowerCase(label.charAt(1));
        return word ? label.substring(0, 1).toLowerCase(Locale.ROOT) + label.substring(1) : label;
    }

    /** Text of a cell; a dash where there is no value; settings without their uncertainty. */
    String of(Column column, List<Column> all, Row row, boolean plain) {
        String text = of(column, all, row);
        return plain && column.sort() == Column.Sort.REAL ? plain(text) : text;
    }

    /** A value without its uncertainty, to the digit before the last one of it. */
    private static String plain(String text) {
        Matcher stated = BRACKETS.matcher(text);
        return stated.matches() ? stated.group(1) : text;
    }

    /** Value with its unit: {@code 842.0(10) K}. */
    String withUnit(Column column, List<Column> all, Row row) {
        String unit =
                unit(column).map(Unit::shown).filter(text -> !text.equals("1")).orElse("");
        return (of(column, all, row) + " " + unit).strip();
    }

    /** Words of a value that is one of a list: {@code laser-off} becomes "laser off". */
    static String plainWords(String value) {
        return LISTED.matcher(value).matches() ? value.replace('-', ' ') : value;
    }

    private String of(Column column, List<Column> all, Row row) {
        Object value = row.values().get(column.name());
        if (value == null) {
            return "\u2013";
        }
        return switch (column.sort()) {
            case TEXT -> plainWords(value.toString());
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
        return u > 0
                ? NumberText.measured(shown(column, si), u)
                : NumberText.significant(shown(column, si), DIGITS.getOrDefault(column.name(), 4));
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
