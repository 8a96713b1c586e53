package fringekeep.scan.internal.reading;

import java.util.Optional;

/**
 * Reads decimals as instruments write them: sign, digits, decimal sign, exponent. Nothing else is a number: no grouping, no
 * hexadecimal, no words.
 */
final class DecimalText {
    /** Longest number read (characters). */
    private static final int LONGEST = 60;

    private static final int GREATEST_EXPONENT = 330;

    private DecimalText() {}

    /** The number with {@code .} as decimal sign and without plus signs; empty if the text is no number. */
    static Optional<String> normalise(String text, char decimalSign) {
        int end = end(text, decimalSign);
        return end == text.length() && end > 0 ? Optional.of(clean(text, decimalSign)) : Optional.empty();
    }

    /** Length of the longest beginning that is a number; 0 if there is none. */
    static int end(String text, char decimalSign) {
        int at = text.startsWith("+") || text.startsWith("-") ? 1 : 0;
        int whole = digits(text, at);
        at += whole;
        int fraction = 0;
        if (at < text.length() && text.charAt(at) == decimalSign) {
            fraction = digits(text, at + 1);
            at += whole + fraction > 0 ? 1 + fraction : 0;
        }
        if (whole + fraction == 0 || at > LONGEST) {
            return 0;
        }
        return at + exponent(text, at);
    }

    private static int exponent(String text, int at) {
        if (at >= text.length() || (text.charAt(at) != 'e' && text.charAt(at) != 'E')) {
            return 0;
        }
        int sign = at + 1 < text.length() && (text.charAt(at + 1) == '+' || text.charAt(at + 1) == '-') ? 1 : 0;
        int digits = digits(text, at + 1 + sign);
        boolean bounded = digits > 0
                && digits <= 3
                && Integer.parseInt(text.substring(at + 1 + sign, at + 1 + sign + digits)) <= GREATEST_EXPONENT;
        return bounded ? 1 + sign + digits : 0;
    }

    private static int digits(String text, int from) {
        int at = from;
        while (at < text.length() && text.charAt(at) >= '0' && text.charAt(at) <= '9') {
            at++;
        }
        return at - from;
    }

    private static String clean(String text, char decimalSign) {
        String plain = text.replace(decimalSign, '.').replace("+", "");
        plain = plain.startsWith(".") ? "0" + plain : plain;
        plain = plain.startsWith("-.") ? "-0" + plain.substring(1) : plain;
        int point = plain.indexOf('.');
        boolean bare = point >= 0 && (point + 1 == plain.length() || !Character.isDigit(plain.charAt(point + 1)));
        return bare ? plain.substring(0, point) + plain.substring(point + 1) : plain;
    }
}
