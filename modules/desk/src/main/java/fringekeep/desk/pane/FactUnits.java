package fringekeep.desk.pane;

import fringekeep.archive.json.JsonObject;
import fringekeep.archive.problem.ProblemException;
import fringekeep.archive.quantity.Unit;
import fringekeep.archive.quantity.Units;
import java.math.BigDecimal;
import java.util.List;
import java.util.Optional;
import java.util.regex.Matcher;
import java.util.regex.Pattern;

/** Units of facts: in the words of the trade, and with a prefix where plain SI would need a power of ten. */
final class FactUnits {
    private static final Pattern BRACKETED = Pattern.compile("\\(([^() ]+)\\)[^()]*$");
    private static final List<String> NAMED = List.of("W", "J", "Pa", "V", "A", "N", "C", "T", "K", "Ohm", "F");
    private static final List<String> PREFIXED = List.of("m", "s", "W", "J", "V", "A");
    private static final List<String> PREFIXES = List.of("f", "p", "n", "\u00B5", "m", "", "k", "M", "G");

    private FactUnits() {}

    /**
     * A unit as it is shown and what an SI number is divided by for it.
     *
     * @param shown {@code nm}
     * @param size {@code 1e-9}
     */
    record Sized(String shown, double size) {
        double of(double si) {
            return size == 1 ? si : si / size;
        }
    }

    /** The SI unit with the prefix that brings a number between 1 and 1,000; plain where units take none. */
    static Sized sized(String shown, double si) {
        if (!PREFIXED.contains(shown) || si == 0 || !Double.isFinite(si)) {
            return new Sized(shown, 1);
        }
        int power = (int) StrictMath.floor(StrictMath.log10(Math.abs(si)) / 3 + 1e-9);
        int at = power + 5;
        if (at < 0 || at >= PREFIXES.size()) {
            return new Sized(shown, 1);
        }
        return new Sized(PREFIXES.get(at) + shown, Double.parseDouble("1e" + 3 * power));
    }

    /** Unit of a number: named by the schema, or told in brackets at the end of its description. */
    static String of(JsonObject schema) {
        return schema.text("siUnit")
                .or(() -> schema.text("unit"))
                .or(() -> schema.text("description").flatMap(FactUnits::bracketed))
                .map(FactUnits::shown)
                .orElse("");
    }

    private static Optional<String> bracketed(String description) {
        Matcher matcher = BRACKETED.matcher(description);
        return matcher.find() ? Optional.of(matcher.group(1)).filter(FactUnits::isUnit) : Optional.empty();
    }

    private static boolean isUnit(String code) {
        try {
            Units.parse(code);
            return true;
        } catch (ProblemException e) {
            return false; // other words in brackets
        }
    }

    /** A code as people write it; empty for pure numbers. */
    static String shown(String code) {
        try {
            String text = Units.parse(code).shown();
            return text.equals("1") ? "" : text;
        } catch (ProblemException e) {
            return code; // a unit of a newer kind: shown as it stands
        }
    }

    /** The SI unit of a quantity in the words of the trade: W, not m2.kg.s-3. */
    static String si(String code) {
        try {
            Unit unit = Units.parse(code);
            for (String name : NAMED) {
                Unit named = Units.of(name);
                if (named.sameDimension(unit) && named.toSi(BigDecimal.ONE) == 1) {
                    return named.shown();
                }
            }
            String si = unit.siCode();
            return si.equals("1") || si.isEmpty() ? "" : shown(si);
        } catch (ProblemException e) {
            return "SI"; // a unit of a newer kind
        }
    }
}
