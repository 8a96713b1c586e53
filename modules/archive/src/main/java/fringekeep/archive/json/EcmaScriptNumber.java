package fringekeep.archive.json;

import com.fasterxml.jackson.core.io.schubfach.DoubleToDecimal;

/**
 * Writes finite doubles as ECMAScript does ({@code Number::toString}, radix 10), which is what RFC 8785 asks for: the
 * shortest decimal that reads back as the same double, nearest to it where several are as short.
 *
 * <p>The digits come from Jackson's Schubfach. That one always gives at least two digits; where it gives exactly two, one
 * may do (4.9E-324 must be 5e-324), so one is tried.
 */
public final class EcmaScriptNumber {
    private EcmaScriptNumber() {}

    /**
     * The decimal text of a number.
     *
     * @param value finite; -0 is written 0
     * @throws IllegalArgumentException for NaN and infinities
     */
    public static String write(double value) {
        if (!Double.isFinite(value)) {
            throw new IllegalArgumentException("only finite numbers can be written, not " + value);
        }
        if (value == 0) {
            return "0";
        }
        String text = Decimal.shortest(Math.abs(value)).inEcmaScriptForm();
        return value < 0 ? "-" + text : text;
    }

    /** Digits without leading or trailing zeros, and the place of the point: 0.d1d2d3… &times; 10^point. */
    private record Decimal(String digits, int point) {
        static Decimal shortest(double value) {
            Decimal found = parse(DoubleToDecimal.toString(value));
            return found.digits.length() == 2 ? found.withOneDigit(value) : found;
        }

        private static Decimal parse(String text) {
            int mark = text.indexOf('E');
            String mantissa = mark < 0 ? text : text.substring(0, mark);
            int exponent = mark < 0 ? 0 : Integer.parseInt(text.substring(mark + 1));
            int dot = mantissa.indexOf('.');
            String all = mantissa.substring(0, dot) + mantissa.substring(dot + 1);
            int first = 0;
            while (all.charAt(first) == '0') {
                first++;
            }
            int last = all.length();
            while (all.charAt(last - 1) == '0') {
                last--;
            }
            return new Decimal(all.substring(first, last), dot + exponent - first);
        }

        private Decimal withOneDigit(double value) {
            int first = digits.charAt(0) - '0';
            boolean up = digits.charAt(1) >= '5';
            Decimal near = oneDigit(up ? first + 1 : first);
            Decimal far = oneDigit(up ? first : first + 1);
            if (near.reads(value)) {
                return near;
            }
            return far.reads(value) ? far : this;
        }

        private Decimal oneDigit(int digit) {
            return digit == 10 ? new Decimal("1", point + 1) : new Decimal(Integer.toString(digit), point);
        }

        private boolean reads(double value) {
            return Double.parseDouble("0." + digits + "E" + point) == value;
        }

        String inEcmaScriptForm() {
            int count = digits.length();
            if (count <= point && point <= 21) {
                return digits + "0".repeat(point - count);
            }
            if (0 < point && point <= 21) {
                return digits.substring(0, point) + "." + digits.substring(point);
            }
            if (-6 < point && point <= 0) {
                return "0." + "0".repeat(-point) + digits;
            }
            int exponent = point - 1;
            String fraction = count == 1 ? "" : "." + digits.substring(1);
            return digits.charAt(0) + fraction + "e" + (exponent < 0 ? "-" : "+") + Math.abs(exponent);
        }
    }
}
