package fringekeep.desk.form;

import fringekeep.desk.look.Texts;
import java.util.Locale;

/** What a field asks for and how it is typed, in one line. */
final class FormHelp {
    private static final Texts TEXTS = new Texts("fringekeep.desk.form.Texts", FormHelp.class);

    private FormHelp() {}

    static String of(FormRow row) {
        if (row.leaf().isEmpty() || !row.typed()) {
            return "";
        }
        String typed = row.sort() == FormRow.Sort.ADD
                ? TEXTS.of("add.named")
                : TEXTS.orElse("help." + row.leaf().get().sort().name().toLowerCase(Locale.ROOT), "");
        String words = row.sort() == FormRow.Sort.ADD ? "" : row.words();
        return (words + (words.isEmpty() || words.endsWith(".") ? " " : ". ") + typed).strip();
    }
}
