package fringekeep.sourcerun;

import fringekeep.archive.problem.Problem;
import java.util.Locale;
import java.util.ResourceBundle;

/** Problems of this module, with their words from the bundle {@code Problems}. */
final class Trouble {
    private Trouble() {}

    /**
     * A problem by its code.
     *
     * @param code code without the module's name
     * @param where JSON pointer
     * @param arguments what the words speak of, as texts
     */
    static Problem at(String code, String where, String... arguments) {
        ResourceBundle words = ResourceBundle.getBundle("fringekeep.sourcerun.Problems", Locale.ROOT);
        return new Problem(
                "sourcerun." + code,
                format(words.getString(code + ".what"), arguments),
                where,
                format(words.getString(code + ".mend"), arguments));
    }

    private static String format(String pattern, String... arguments) {
        String text = pattern;
        for (int i = 0; i < arguments.length; i++) {
            text = text.replace("{" + i + "}", arguments[i]);
        }
        return text;
    }
}
