package fringekeep.desk.look;

import java.util.Locale;
import java.util.MissingResourceException;
import java.util.ResourceBundle;

/** Words on the screen, from a resource bundle; places {0}, {1} … are filled with texts that are already formatted. */
public final class Texts {
    private final ResourceBundle bundle;

    /** Words of a bundle such as {@code fringekeep.desk.pane.Texts}, read by the class loader of a class beside it. */
    public Texts(String name, Class<?> beside) {
        this.bundle = ResourceBundle.getBundle(name, Locale.ROOT, beside.getClassLoader());
    }

    /** Words with their places filled. */
    public String of(String key, Object... values) {
        String text = bundle.getString(key);
        for (int i = 0; i < values.length; i++) {
            text = text.replace("{" + i + "}", String.valueOf(values[i]));
        }
        return text;
    }

    /** Words, or others where the bundle has none. */
    public String orElse(String key, String otherwise) {
        try {
            return bundle.getString(key);
        } catch (MissingResourceException e) {
            return otherwise; // absence is an answer here: the caller says what then
        }
    }
}
