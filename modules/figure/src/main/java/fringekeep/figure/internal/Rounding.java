package fringekeep.figure.internal;

import fringekeep.archive.json.JsonObject;
import java.math.BigDecimal;
import java.math.MathContext;
import java.math.RoundingMode;
import java.util.Optional;
import java.util.OptionalDouble;
import java.util.regex.Matcher;
import java.util.regex.Pattern;

/**
 * Rounds a value as a statement's rule says and compares it with what is printed.
 *
 * <p>Source: JCGM 100:2008 (GUM), 7.2.2 and 7.2.6: an uncertainty is given with at most two digits and the value to the same
 * place; {@code 1.234(56)} means the uncertainty in the last digits.
 */
public final class Rounding {
    private static final Pattern PRINTED = Pattern.compile("(?<value>[-\u2212]?[0-9 \u2009]+(?:\\.[0-9]+)?)"
            + "(?:\\((?<last>[0-9]+)\\)|\\s*(?:\u00b1|\\+/-)\\s*(?<spread>[0-9]+(?:\\.[0-9]+)?))?"
            + "(?:\\s*\u00d7\\s*10(?:\\^(?<power>[-\u2212]?[0-9]+)))?");

    private Rounding() {}

    /**
     * The printed value and uncertainty as decimals.
     *
     * @return empty when the text is not a number as printed
     */
    static Optional<Printed> read(String text) {
        Matcher matcher = PRINTED.matcher(text.strip());
        if (!matcher.matches()) {
            return Optional.empty();
        }
        int power = matcher.group("power") == null ? 0 : Integer.parseInt(plain(matcher.group("power")));
        BigDecimal value = new BigDecimal(plain(matcher.group("value")));
        Optional<BigDecimal> spread = Optional.empty();
        if (matcher.group("last") != null) {
            spread = Optional.of(new BigDecimal(matcher.group("last")).movePointLeft(Math.max(0, value.scale())));
        } else if (matcher.group("spread") != null) {
            spread = Optional.of(new BigDecimal(matcher.group("spread")));
        }
        return Optional.of(new Printed(value.scaleByPowerOfTen(power), spread.map(u -> u.scaleByPowerOfTen(power))));
    }

    private static String plain(String digits) {
        return digits.replace('\u2212', '-').replace(" ", "").replace("\u2009", "");
    }

    /** A number as printed. */
    record Printed(BigDecimal value, Optional<BigDecimal> deviation) {}

    /**
     * Rounds by a rule.
     *
     * @param rule member {@code rounding} of a statement
     * @param value value in the printed unit
     * @param deviation its standard uncertainty in the printed unit, when it has one
     * @return what ought to be printed; empty when the rule needs an uncertainty and there is none
     */
    static Optional<Printed> round(JsonObject rule, double value, OptionalDouble deviation) {
        int digits = (int) rule.integer("digits").orElseThrow();
        BigDecimal exact = new BigDecimal(value);
        return switch (rule.text("sort").orElseThrow()) {
            case "decimals" -> Optional.of(to(exact, deviation, digits));
            case "significant" -> Optional.of(to(exact, deviation, place(exact, digits)));
            case "uncertainty-digits" ->
                deviation.isPresent() && deviation.getAsDouble() > 0
                        ? Optional.of(to(exact, deviation, place(new BigDecimal(deviation.getAsDouble()), digits)))
                        : Optional.empty();
            default -> throw new IllegalStateException("rule of rounding: " + rule);
        };
    }

    private static Printed to(BigDecimal value, OptionalDouble deviation, int decimals) {
        Optional<BigDecimal> u = deviation.isPresent()
                ? Optional.of(new BigDecimal(deviation.getAsDouble()).setScale(decimals, RoundingMode.HALF_EVEN))
                : Optional.empty();
        return new Printed(value.setScale(decimals, RoundingMode.HALF_EVEN), u);
    }

    /** Decimals that keep so many significant digits; 9.96 to two digits is 10, one decimal fewer than it seems. */
    private static int place(BigDecimal number, int digits) {
        if (number.signum() == 0) {
            return digits;
        }
        BigDecimal rounded = number.round(new MathContext(Math.max(1, digits), RoundingMode.HALF_EVEN));
        return digits - (rounded.precision() - rounded.scale());
    }
}
