package fringekeep.drawing;

import java.math.BigDecimal;
import java.math.MathContext;
import java.math.RoundingMode;

/** Numbers for people: no locale, true minus (U+2212), thin-space thousands, two digits of uncertainty. */
public final class NumberText {
    private static final char MINUS = '\u2212';
    private static final char THIN_SPACE = '\u2009';
    private static final String SUPERSCRIPTS = "\u2070\u00B9\u00B2\u00B3\u2074\u2075\u2076\u2077\u2078\u2079";

    private NumberText() {}

    /** A finite number with so many decimals. */
    public static String fixed(double value, int decimals) {
        return grouped(BigDecimal.valueOf(value).setScale(decimals, RoundingMode.HALF_EVEN));
    }

    /** A number with so many significant digits; powers of ten where it is very large or small. */
    public static String significant(double value, int digits) {
        if (!Double.isFinite(value)) {
            return "\u2013";
        }
        if (value == 0) {
            return "0";
        }
        BigDecimal rounded = new BigDecimal(value).round(new MathContext(digits, RoundingMode.HALF_EVEN));
        int exponent = exponent(rounded);
        if (exponent >= 6 || exponent < -4) {
            return grouped(rounded.stripTrailingZeros().scaleByPowerOfTen(-exponent)) + power(exponent);
        }
        BigDecimal stripped = rounded.stripTrailingZeros();
        return grouped(stripped.scale() < 0 ? stripped.setScale(0) : stripped);
    }

    /**
     * A value with its standard uncertainty in brackets, two digits of it: {@code 0.2113(92)}, {@code 2.10(21) × 10⁻⁶}.
     *
     * @param deviation one standard deviation; 0, NaN or infinite gives the value alone with six digits
     */
    public static String measured(double value, double deviation) {
        if (!(deviation > 0) || !Double.isFinite(deviation) || !Double.isFinite(value)) {
            return significant(value, 6);
        }
        BigDecimal u = new BigDecimal(deviation).round(new MathContext(2, RoundingMode.HALF_EVEN));
        int places = 1 - exponent(u);
        BigDecimal shown = new BigDecimal(value).setScale(places, RoundingMode.HALF_EVEN);
        int leading = Math.max(shown.signum() == 0 ? exponent(u) : exponent(shown), exponent(u));
        if (leading >= 6 || leading < -3) {
            BigDecimal scaled = shown.scaleByPowerOfTen(-leading);
            BigDecimal scaledU = u.scaleByPowerOfTen(-leading);
            return bracket(scaled, scaledU, places + leading) + power(leading);
        }
        return bracket(shown, u, places);
    }

    /** An integer with thin spaces between thousands. */
    public static String count(long value) {
        return grouped(BigDecimal.valueOf(value));
    }

    /** The shortest decimal that reads back as the same double; the same on every Java version. */
    public static String full(double value) {
        if (!Double.isFinite(value)) {
            return "";
        }
        for (int digits = 1; digits < 17; digits++) {
            BigDecimal rounded = new BigDecimal(value).round(new MathContext(digits, RoundingMode.HALF_EVEN));
            if (rounded.doubleValue() == value) {
                return written(rounded);
            }
        }
        return written(new BigDecimal(value).round(new MathContext(17, RoundingMode.HALF_EVEN)));
    }

    private static String written(BigDecimal value) {
        BigDecimal stripped = value.stripTrailingZeros();
        int exponent = exponent(stripped);
        return exponent < -7 || exponent > 20 ? stripped.toString() : stripped.toPlainString();
    }

    /** {@code  × 10⁻⁶}, empty for 0. */
    public static String power(int exponent) {
        return exponent == 0 ? "" : " \u00D7 10" + superscript(exponent);
    }

    /** A power's digits, raised. */
    static String superscript(int exponent) {
        StringBuilder text = new StringBuilder();
        for (char c : Integer.toString(exponent).toCharArray()) {
            text.append(c == '-' ? '\u207B' : SUPERSCRIPTS.charAt(c - '0'));
        }
        return text.toString();
    }

    private static String bracket(BigDecimal value, BigDecimal u, int places) {
        BigDecimal shown = value.setScale(Math.max(0, places), RoundingMode.HALF_EVEN);
        boolean split = u.compareTo(BigDecimal.ONE) >= 0 && places > 0;
        String digits = split
                ? u.setScale(places, RoundingMode.HALF_EVEN).toPlainString()
                : u.movePointRight(Math.max(0, places))
                        .setScale(0, RoundingMode.HALF_EVEN)
                        .toPlainString();
        return grouped(shown) + "(" + digits + ")";
    }

    private static int exponent(BigDecimal value) {
        return value.precision() - value.scale() - 1;
    }

    private static String grouped(BigDecimal value) {
        String plain = value.abs().toPlainString();
        int point = plain.indexOf('.');
        String whole = point < 0 ? plain : plain.substring(0, point);
        StringBuilder text = new StringBuilder();
        if (value.signum() < 0) {
            text.append(MINUS);
        }
        for (int i = 0; i < whole.length(); i++) {
            if (i > 0 && whole.length() > 4 && (whole.length() - i) % 3 == 0) {
                text.append(THIN_SPACE);
            }
            text.append(whole.charAt(i));
        }
        return point < 0
                ? text.toString()
                : text.append(plain, point, plain.length()).toString();
    }
}
