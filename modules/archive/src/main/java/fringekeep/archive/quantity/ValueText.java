package fringekeep.archive.quantity;

import java.math.BigDecimal;
import java.math.MathContext;
import java.math.RoundingMode;
import java.util.OptionalDouble;

/**
 * Numbers as people read them: two digits of the standard uncertainty in brackets behind the value, a true minus (U+2212),
 * thin spaces between thousands. JCGM 100:2008, 7.2.2 allows the notation, 7.2.6 the two digits.
 */
public final class ValueText {
    /** What stands in place of an uncertainty nobody stated. */
    public static final String NOT_STATED = "not stated";

    /** What stands in place of the uncertainty of an exact number. */
    public static final String EXACT = "exact";

    private static final int UNCERTAINTY_DIGITS = 2;
    private static final int LOWEST_PLAIN = -4;
    private static final int HIGHEST_PLAIN = 6;
    private static final int PLAIN_DIGITS = 6;

    private ValueText() {}

    /**
     * A value with its standard uncertainty, such as {@code 0.2113(92)} or {@code 1.234(56)×10⁻⁸}.
     *
     * @param deviation in the unit of the value; 0 = exact, NaN = not stated
     */
    public static String estimate(double value, double deviation) {
        if (!Double.isFinite(value)) {
            return "no value";
        }
        if (Double.isNaN(deviation) || deviation == 0) {
            return number(value) + " " + (deviation == 0 ? EXACT : NOT_STATED);
        }
        if (Double.isInfinite(deviation)) {
            return number(value) + " " + NOT_STATED;
        }
        BigDecimal rounded =
                new BigDecimal(deviation).round(new MathContext(UNCERTAINTY_DIGITS, RoundingMode.HALF_EVEN));
        int exponent = exponent(Math.max(Math.abs(value), deviation));
        boolean plain = exponent >= LOWEST_PLAIN && exponent <= HIGHEST_PLAIN;
        int power = plain ? 0 : exponent;
        String body = withBrackets(new BigDecimal(value).movePointLeft(power), rounded.movePointLeft(power));
        return plain ? body : body + "×10" + UnitText.superscript(exponent);
    }

    private static String withBrackets(BigDecimal value, BigDecimal deviation) {
        int decimals = UNCERTAINTY_DIGITS - 1 - exponent(deviation);
        BigDecimal shown = value.setScale(decimals, RoundingMode.HALF_EVEN);
        BigDecimal spread = deviation.setScale(decimals, RoundingMode.HALF_EVEN);
        boolean asWritten = decimals <= 0 || spread.compareTo(BigDecimal.ONE) >= 0;
        String brackets =
                asWritten ? spread.toPlainString() : spread.unscaledValue().toString();
        return dressed(shown.toPlainString()) + "(" + brackets + ")";
    }

    private static int exponent(double value) {
        return value == 0 ? 0 : exponent(new BigDecimal(value));
    }

    private static int exponent(BigDecimal value) {
        return value.signum() == 0 ? 0 : value.precision() - value.scale() - 1;
    }

    /** An SI value and uncertainty, shown in another unit, without the unit's name. */
    public static String estimate(double si, double siDeviation, Unit shown) {
        double deviation = Double.isFinite(siDeviation) ? shown.differenceFromSi(siDeviation) : siDeviation;
        return Double.isFinite(si) ? estimate(shown.fromSi(si), deviation) : estimate(si, siDeviation);
    }

    /** An entered quantity as typed, with its uncertainty and unit. */
    public static String entered(Quantity quantity) {
        String unit = quantity.unit().equals("1")
                ? ""
                : " " + Units.of(quantity.unit()).shown();
        String text = dressed(quantity.text());
        Uncertainty uncertainty = quantity.uncertainty();
        if (uncertainty instanceof Uncertainty.Stated stated) {
            return brackets(quantity.text(), stated.text()) + unit;
        }
        if (uncertainty instanceof Uncertainty.Bounds bounds) {
            return text + " [" + bound(bounds.lower(), quantity) + " … " + bound(bounds.upper(), quantity) + "]" + unit;
        }
        return text + unit + " " + (uncertainty instanceof Uncertainty.Exact ? EXACT : NOT_STATED);
    }

    /** A quantity as entered, for titles: says nothing where the uncertainty is exact or not stated. */
    public static String brief(Quantity quantity) {
        String whole = entered(quantity);
        Uncertainty uncertainty = quantity.uncertainty();
        if (uncertainty instanceof Uncertainty.Exact) {
            return whole.substring(0, whole.length() - EXACT.length() - 1);
        }
        return uncertainty instanceof Uncertainty.Unstated
                ? whole.substring(0, whole.length() - NOT_STATED.length() - 1)
                : whole;
    }

    private static String brackets(String text, String deviation) {
        boolean plain = text.indexOf('e') < 0 && deviation.indexOf('e') < 0;
        BigDecimal spread = new BigDecimal(deviation);
        BigDecimal value = new BigDecimal(text);
        if (plain && spread.scale() == value.scale() && (spread.compareTo(BigDecimal.ONE) < 0 || spread.scale() == 0)) {
            return dressed(text) + "(" + spread.unscaledValue() + ")";
        }
        return dressed(text) + " ± " + dressed(deviation);
    }

    private static String bound(OptionalDouble si, Quantity quantity) {
        return si.isEmpty() ? "" : number(Units.of(quantity.unit()).fromSi(si.getAsDouble()));
    }

    /** An upper limit, such as {@code < 2.1}. */
    public static String below(double limit) {
        return "< " + significant(limit, UNCERTAINTY_DIGITS);
    }

    /** A number without uncertainty in at most six significant digits. */
    public static String number(double value) {
        return significant(value, PLAIN_DIGITS)
                .replaceAll("(\\.[0-9]*?)0+(?=$|×)", "$1")
                .replaceAll("\\.(?=$|×)", "");
    }

    private static String significant(double value, int digits) {
        if (!Double.isFinite(value)) {
            return "no value";
        }
        BigDecimal rounded = new BigDecimal(value).round(new MathContext(digits, RoundingMode.HALF_EVEN));
        int exponent = exponent(rounded);
        if (exponent >= LOWEST_PLAIN && exponent <= HIGHEST_PLAIN) {
            return dressed(rounded.setScale(Math.max(0, digits - 1 - exponent), RoundingMode.HALF_EVEN)
                    .toPlainString());
        }
        BigDecimal mantissa = rounded.movePointLeft(exponent).setScale(digits - 1, RoundingMode.HALF_EVEN);
        return dressed(mantissa.toPlainString()) + "×10" + UnitText.superscript(exponent);
    }

    /** A count with thin spaces between thousands. */
    public static String count(long count) {
        return dressed(Long.toString(count));
    }

    /** Where the decimal sign of a shown number stands, or would stand: renderers align on it. */
    public static int pointPlace(String shown) {
        int at = 0;
        while (at < shown.length() && "0123456789−\u2009<~ ".indexOf(shown.charAt(at)) >= 0) {
            at++;
        }
        return at;
    }

    private static String dressed(String plain) {
        String signed = plain.replace('-', '−');
        int start = signed.startsWith("−") ? 1 : 0;
        int end = start;
        while (end < signed.length() && Character.isDigit(signed.charAt(end))) {
            end++;
        }
        StringBuilder text = new StringBuilder(signed);
        if (end - start > 4) {
            for (int at = end - 3; at > start; at -= 3) {
                text.insert(at, '\u2009');
            }
        }
        return text.toString();
    }
}
