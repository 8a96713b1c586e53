package fringekeep.archive.quantity;

import fringekeep.archive.problem.Problem;
import fringekeep.archive.problem.ProblemException;
import java.util.Map;
import java.util.concurrent.ConcurrentHashMap;
import java.util.regex.Matcher;
import java.util.regex.Pattern;

/**
 * Units by their UCUM codes: atoms of a closed list with metric prefixes, joined by {@code .} and {@code /}, with integer
 * exponents and annotations in braces ({@code {count}/s}). {@code Cel} stands alone only. Thread-safe.
 */
public final class Units {
    /** The dimensionless unit. */
    public static final Unit ONE = new Unit("1", Rational.ONE, Rational.ZERO, Dimension.NONE);

    private static final Unit CELSIUS =
            new Unit("Cel", Rational.ONE, Rational.of("273.15"), Dimension.of(0, 0, 0, 0, 1));
    private static final Pattern COMPONENT =
            Pattern.compile("(?:(?<one>1)|(?<atom>%|[A-Za-z]+|\\[[a-z]+])(?<power>[+-]?[1-9])?)?(?<note>\\{[^{}]*})?");
    private static final int LONGEST = 64;
    private static final Map<String, Unit> KNOWN = new ConcurrentHashMap<>(Map.of("1", ONE, "Cel", CELSIUS));
    private static final int MOST_KEPT = 1_000;

    private Units() {}

    /**
     * The unit of a code.
     *
     * @throws ProblemException if the code names no unit of the list
     */
    public static Unit parse(String code) throws ProblemException {
        Unit known = KNOWN.get(code);
        if (known != null) {
            return known;
        }
        Unit unit = expression(code);
        if (KNOWN.size() < MOST_KEPT) {
            KNOWN.put(code, unit);
        }
        return unit;
    }

    /**
     * The unit of a code that stands in the program.
     *
     * @throws IllegalArgumentException if the code names no unit of the list
     */
    public static Unit of(String code) {
        try {
            return parse(code);
        } catch (ProblemException e) {
            throw new IllegalArgumentException(e.problems().get(0).what(), e);
        }
    }

    private static Unit expression(String code) throws ProblemException {
        if (code.isEmpty() || code.length() > LONGEST) {
            throw unknown(code, code);
        }
        Rational factor = Rational.ONE;
        Dimension dimension = Dimension.NONE;
        Matcher matcher = COMPONENT.matcher(code);
        int at = 0;
        int sign = 1;
        if (code.charAt(0) == '/') {
            at = 1;
            sign = -1;
        }
        while (true) {
            Component component = component(code, matcher, at);
            factor = factor.times(component.factor.power(sign));
            dimension = dimension.plus(component.dimension, sign);
            at = component.end;
            if (at == code.length()) {
                return new Unit(code, factor, Rational.ZERO, dimension);
            }
            sign = separator(code, at);
            at++;
        }
    }

    private static int separator(String code, int at) throws ProblemException {
        return switch (code.charAt(at)) {
            case '.' -> 1;
            case '/' -> -1;
            default -> throw unknown(code, code.substring(at));
        };
    }

    private static Component component(String code, Matcher matcher, int at) throws ProblemException {
        matcher.region(at, code.length());
        if (!matcher.lookingAt() || matcher.end() == at) {
            throw unknown(code, code.substring(at));
        }
        String atom = matcher.group("atom");
        if (atom == null) {
            return new Component(Rational.ONE, Dimension.NONE, matcher.end());
        }
        UnitAtoms.Atom found = UnitAtoms.find(atom).orElseThrow(() -> unknown(code, atom));
        String power = matcher.group("power");
        int exponent = power == null ? 1 : Integer.parseInt(power);
        return new Component(
                found.factor().power(exponent), Dimension.NONE.plus(found.dimension(), exponent), matcher.end());
    }

    private static ProblemException unknown(String code, String piece) {
        String reason = piece.contains("Cel") && !code.equals("Cel")
                ? "degrees Celsius cannot be part of a product"
                : "\"" + shortened(piece) + "\" is not known";
        return new ProblemException(new Problem(
                "quantity.unit",
                "The unit \"" + shortened(code) + "\" cannot be read: " + reason + ".",
                "",
                "Use a UCUM code such as nm, um, kV/cm, g/mol, mbar, Cel, deg, %, {count}/s or m/s2; for a pure number"
                        + " write 1 or no unit."));
    }

    private static String shortened(String text) {
        return text.length() <= LONGEST ? text : text.substring(0, LONGEST) + "…";
    }

    private record Component(Rational factor, Dimension dimension, int end) {}
}
