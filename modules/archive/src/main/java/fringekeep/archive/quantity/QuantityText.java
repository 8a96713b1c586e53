package fringekeep.archive.quantity;

import fringekeep.archive.problem.Problem;
import fringekeep.archive.problem.ProblemException;
import java.math.BigDecimal;
import java.math.BigInteger;
import java.util.Locale;
import java.util.Optional;
import java.util.OptionalDouble;
import java.util.regex.Matcher;
import java.util.regex.Pattern;

/**
 * Reads quantities as people type them: {@code 10,50(5) mm}, {@code 900 K}, {@code 1 s exact}, {@code 5 ± 0.1 V},
 * {@code 1.50(5)e-3 T}, {@code 20 [18..25] Cel}. Figures in brackets count in the last digits; brackets of the other shape
 * give bounds. An uncertainty is one standard deviation. Without unit the number is pure.
 */
public final class QuantityText {
    private static final String NUMBER = "[+-]?[0-9]+(?:[.,][0-9]+)?";
    private static final String POWER = "(?:[eE]|\\s*[×x*·]\\s*10\\^?)([+-]?[0-9]{1,3})";
    private static final Pattern FORM = Pattern.compile("(?<open>\\(\\s*)?(?<number>" + NUMBER + ")"
            + "(?:" + POWER.replace("([", "(?<first>[") + ")?"
            + "(?:\\((?<last>[0-9]+(?:[.,][0-9]+)?)\\))?"
            + "(?:\\s*(?:±|\\+/-|\\+-)\\s*(?<spread>[0-9]+(?:[.,][0-9]+)?(?:[eE][+-]?[0-9]{1,3})?))?"
            + "(?<close>\\s*\\))?"
            + "(?:" + POWER.replace("([", "(?<second>[") + ")?"
            + "(?:\\s*\\[\\s*(?<lower>" + NUMBER + ")?\\s*\\.\\.\\s*(?<upper>" + NUMBER + ")?\\s*])?"
            + "(?:\\s*(?<unit>(?:[^\\s0-9(±\\[]|\\[[a-z]).*?))??(?<exact>\\s+exact)?");
    private static final Pattern THOUSANDS = Pattern.compile("[+-]?[1-9][0-9]{0,2},[0-9]{3}");
    private static final int LONGEST = 200;

    private QuantityText() {}

    /**
     * Reads a quantity.
     *
     * @throws ProblemException that says what cannot be read and how to write it
     */
    public static Quantity parse(String typed) throws ProblemException {
        String text = plain(typed);
        Matcher matcher = FORM.matcher(text);
        if (text.length() > LONGEST
                || !matcher.matches()
                || (matcher.group("open") == null) != (matcher.group("close") == null)) {
            throw problem("quantity.form", "\"" + shortened(typed) + "\" cannot be read as a quantity.");
        }
        if (matcher.group("first") != null && matcher.group("second") != null) {
            throw problem("quantity.form", "\"" + shortened(typed) + "\" gives a power of ten twice.");
        }
        String number = decimal(matcher.group("number"));
        String power = power(matcher);
        Unit unit = Units.parse(
                UnitText.code(Optional.ofNullable(matcher.group("unit")).orElse("")));
        String decimal = (number.startsWith("+") ? number.substring(1) : number) + power;
        return quantity(decimal, unit, uncertainty(matcher, number, power, unit));
    }

    private static String plain(String typed) {
        return UnitText.plainDigits(typed.strip())
                .replaceAll("(?<=[0-9])[\u2009\u202F](?=[0-9])", "")
                .replaceAll("[\u00A0\u2009\u202F]", " ")
                .strip();
    }

    private static String decimal(String number) throws ProblemException {
        if (THOUSANDS.matcher(number).matches()) {
            throw new ProblemException(new Problem(
                    "quantity.ambiguous",
                    "\"" + number + "\" may mean a thousand or a decimal.",
                    "",
                    "Write " + number.replace(",", "") + " for the thousand or " + number.replace(',', '.')
                            + " for the decimal."));
        }
        return number.replace(',', '.');
    }

    private static String power(Matcher matcher) {
        String first = matcher.group("first");
        String power = first == null ? matcher.group("second") : first;
        return power == null ? "" : "e" + (power.startsWith("+") ? power.substring(1) : power);
    }

    private static Uncertainty uncertainty(Matcher matcher, String number, String power, Unit unit)
            throws ProblemException {
        boolean exact = matcher.group("exact") != null;
        boolean bounds = matcher.group("lower") != null || matcher.group("upper") != null;
        String last = matcher.group("last");
        String spread = matcher.group("spread");
        if ((exact ? 1 : 0) + (bounds ? 1 : 0) + (last == null ? 0 : 1) + (spread == null ? 0 : 1) > 1) {
            throw problem("quantity.two-uncertainties", "The quantity states its uncertainty in two ways.");
        }
        if (exact) {
            return new Uncertainty.Exact();
        }
        if (bounds) {
            return new Uncertainty.Bounds(bound(matcher.group("lower"), unit), bound(matcher.group("upper"), unit));
        }
        if (last != null) {
            return stated(inLastDigits(last, number) + power, unit);
        }
        return spread == null ? new Uncertainty.Unstated() : spread(spread, power, unit);
    }

    private static Uncertainty spread(String spread, String power, Unit unit) throws ProblemException {
        boolean ownPower = spread.matches(".*[eE].*");
        return stated(decimal(spread).toLowerCase(Locale.ROOT) + (ownPower ? "" : power), unit);
    }

    private static String inLastDigits(String last, String number) {
        if (last.matches(".*[.,].*")) {
            return last.replace(',', '.');
        }
        int point = number.indexOf('.');
        int decimals = point < 0 ? 0 : number.length() - point - 1;
        return new BigDecimal(new BigInteger(last), decimals).toPlainString();
    }

    private static OptionalDouble bound(String text, Unit unit) throws ProblemException {
        return text == null
                ? OptionalDouble.empty()
                : OptionalDouble.of(finite(unit.toSi(new BigDecimal(decimal(text)))));
    }

    private static Uncertainty.Stated stated(String text, Unit unit) throws ProblemException {
        double si = finite(unit.differenceToSi(new BigDecimal(text)));
        if (!(si > 0)) {
            throw new ProblemException(new Problem(
                    "quantity.zero-uncertainty",
                    "An uncertainty of zero states nothing.",
                    "",
                    "Write \"exact\" after the unit, or leave the uncertainty out if it is not known."));
        }
        return new Uncertainty.Stated(text, si);
    }

    private static Quantity quantity(String decimal, Unit unit, Uncertainty uncertainty) throws ProblemException {
        return new Quantity(decimal, unit.code(), finite(unit.toSi(new BigDecimal(decimal))), uncertainty);
    }

    /**
     * A quantity from its texts.
     *
     * @param decimal with a point as decimal sign
     * @param unit UCUM code
     * @param deviation one standard deviation in the same unit, as text; empty = not stated
     */
    public static Quantity of(String decimal, String unit, Optional<String> deviation) throws ProblemException {
        Unit parsed = Units.parse(unit);
        Uncertainty uncertainty = deviation.isPresent() ? stated(deviation.get(), parsed) : new Uncertainty.Unstated();
        return quantity(decimal, parsed, uncertainty);
    }

    /** A quantity as it may be typed: reading it gives an equal one, but for bounds beyond double precision. */
    public static String write(Quantity quantity) {
        String unit = quantity.unit().equals("1") ? "" : " " + quantity.unit();
        Uncertainty uncertainty = quantity.uncertainty();
        if (uncertainty instanceof Uncertainty.Stated stated) {
            return quantity.text() + " ± " + stated.text() + unit;
        }
        if (uncertainty instanceof Uncertainty.Exact) {
            return quantity.text() + unit + " exact";
        }
        if (uncertainty instanceof Uncertainty.Bounds bounds) {
            Unit parsed = Units.of(quantity.unit());
            return quantity.text() + " [" + bound(bounds.lower(), parsed) + ".." + bound(bounds.upper(), parsed) + "]"
                    + unit;
        }
        return quantity.text() + unit;
    }

    private static String bound(OptionalDouble si, Unit unit) {
        return si.isEmpty()
                ? ""
                : BigDecimal.valueOf(unit.fromSi(si.getAsDouble())).toPlainString();
    }

    private static double finite(double si) throws ProblemException {
        if (!Double.isFinite(si)) {
            throw problem("quantity.too-large", "The quantity is beyond what a double holds.");
        }
        return si;
    }

    private static String shortened(String text) {
        return text.length() <= 60 ? text : text.substring(0, 60) + "…";
    }

    private static ProblemException problem(String code, String what) {
        return new ProblemException(new Problem(
                code,
                what,
                "",
                "Write number, uncertainty and unit, such as 10.50(5) mm, 5 ± 0.1 V, 900 K, 1 s exact or 20 [18..25] Cel;"
                        + " the unit once, at the end."));
    }
}
