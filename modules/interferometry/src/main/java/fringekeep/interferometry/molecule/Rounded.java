package fringekeep.interferometry.molecule;

import java.math.BigDecimal;
import java.math.MathContext;
import java.math.RoundingMode;

/**
 * Numbers in words that are recorded: rounded by exact decimal arithmetic, so that they read the same on every Java
 * release (the platform's own formatting of doubles has changed between releases).
 */
final class Rounded {
    private Rounded() {}

    static String to(int digits, double value) {
        if (!Double.isFinite(value)) {
            return Double.isNaN(value) ? "not a number" : value > 0.0 ? "infinite" : "minus infinite";
        }
        return new BigDecimal(value)
                .round(new MathContext(digits, RoundingMode.HALF_EVEN))
                .toString();
    }

    /**
     * Fills a template: {4} takes the next value as a number rounded to four digits, {} as it is.
     *
     * @param template text with places
     * @param values   one per place
     * @return the sentence
     */
    static String words(String template, Object... values) {
        StringBuilder words = new StringBuilder();
        int from = 0;
        for (Object value : values) {
            int open = template.indexOf('{', from);
            int close = template.indexOf('}', open);
            String digits = template.substring(open + 1, close);
            words.append(template, from, open);
            words.append(digits.isEmpty() ? value.toString() : to(Integer.parseInt(digits), (double) value));
            from = close + 1;
        }
        return words.append(template.substring(from)).toString();
    }
}
