package fringekeep.scan.internal.problem;

import fringekeep.archive.problem.Problem;
import java.text.MessageFormat;
import java.util.Arrays;
import java.util.Locale;
import java.util.ResourceBundle;

/** Problems of this module, their texts taken from a bundle by code. */
public final class ScanProblems {
    private static final ResourceBundle TEXTS = ResourceBundle.getBundle(
            "fringekeep.scan.internal.problem.problems", Locale.ROOT, ScanProblems.class.getClassLoader());

    private ScanProblems() {}

    /**
     * A problem.
     *
     * @param code such as {@code scan.row-length}; the bundle has {@code <code>.what} and {@code <code>.mend}
     * @param where file, line and column, or a JSON pointer
     * @param values what stands for {@code {0}}, {@code {1}} … in both texts
     */
    public static Problem of(String code, String where, Object... values) {
        Object[] texts = Arrays.stream(values).map(String::valueOf).toArray();
        return new Problem(
                code,
                new MessageFormat(TEXTS.getString(code + ".what"), Locale.ROOT).format(texts),
                where,
                new MessageFormat(TEXTS.getString(code + ".mend"), Locale.ROOT).format(texts));
    }
}
