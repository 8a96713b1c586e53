package fringekeep.property.ui;

import fringekeep.archive.quantity.Unit;
import fringekeep.property.ui.PropertyPlan.Bounds;
import java.math.BigDecimal;
import java.util.Optional;
import java.util.OptionalDouble;
import java.util.regex.Matcher;
import java.util.regex.Pattern;

/** Reads conditions as people write them: {@code 2 to 9}, {@code from 2}, {@code below 9}; a text as it is. */
final class BoundsText {
    private static final String NUMBER = "([-\u2212+]?[0-9.]+(?:[eE][-+]?[0-9]+)?)";
    private static final Pattern BETWEEN = Pattern.compile(NUMBER + "\\s*(?:to|\u2026|\\.\\.)\\s*" + NUMBER);
    private static final Pattern FROM = Pattern.compile("(?:from|>=|\u2265)\\s*" + NUMBER);
    private static final Pattern BELOW = Pattern.compile("(?:below|<)\\s*" + NUMBER);

    private BoundsText() {}

    /** A text column's condition. */
    static Bounds text(String written) {
        return new Bounds(Optional.of(written), OptionalDouble.empty(), OptionalDouble.empty(), written);
    }

    /** A number column's condition in its shown unit; empty if it cannot be read. */
    static Optional<Bounds> number(String written, Unit shown) {
        Matcher between = BETWEEN.matcher(written);
        Matcher from = FROM.matcher(written);
        Matcher below = BELOW.matcher(written);
        if (between.matches()) {
            return bounds(si(between.group(1), shown), si(between.group(2), shown), written, shown);
        }
        if (from.matches()) {
            return bounds(si(from.group(1), shown), OptionalDouble.empty(), written, shown);
        }
        return below.matches()
                ? bounds(OptionalDouble.empty(), si(below.group(1), shown), written, shown)
                : Optional.empty();
    }

    private static Optional<Bounds> bounds(OptionalDouble from, OptionalDouble below, String written, Unit unit) {
        boolean empty = from.isPresent() && below.isPresent() && from.getAsDouble() >= below.getAsDouble();
        String words = unit.shown().equals("1") || unit.shown().isEmpty() ? written : written + " " + unit.shown();
        return empty ? Optional.empty() : Optional.of(new Bounds(Optional.empty(), from, below, words));
    }

    private static OptionalDouble si(String number, Unit shown) {
        try {
            return OptionalDouble.of(shown.toSi(new BigDecimal(number.replace('\u2212', '-'))));
        } catch (NumberFormatException e) {
            return OptionalDouble.of(Double.NaN); // such as 1.2.3: no bound that anything answers
        }
    }
}
