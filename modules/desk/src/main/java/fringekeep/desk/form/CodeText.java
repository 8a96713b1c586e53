package fringekeep.desk.form;

import fringekeep.archive.record.PartName;
import java.util.ArrayList;
import java.util.List;
import java.util.Locale;
import java.util.Optional;

/** Codes behind the words that a person sees and types in one row. */
final class CodeText {
    private final FormWords words;
    private final FormRow row;

    CodeText(FormWords words, FormRow row) {
        this.words = words;
        this.row = row;
    }

    /** What stands in a row once its text is taken over. */
    String code(String text) {
        Asked.Leaf leaf = row.leaf().orElseThrow();
        return switch (leaf.sort()) {
            case CHOICE -> one(leaf, text);
            case CHOICES -> {
                List<String> codes = new ArrayList<>();
                for (String word : text.split(",")) {
                    if (!word.isBlank() && !(word.strip().equals(LeafText.NONE) && text.contains(","))) {
                        codes.add(one(leaf, word.strip()));
                    }
                }
                yield String.join(", ", codes);
            }
            case TEXT, WORDS, QUANTITY, NUMBER, INTEGER, FLAG, MARKED, MOMENT, INSTANT, NUMBERS, RANGES, RECORD, FILE ->
                text.strip();
        };
    }

    /** The code of a word; an unknown word stays as typed and is said to be unknown. The begin of one word will do. */
    private String one(Asked.Leaf leaf, String text) {
        String path = FormKind.path(row.pointer());
        String plain = text.strip().toLowerCase(Locale.ROOT);
        List<String> begun = new ArrayList<>();
        for (String option : leaf.options()) {
            String said = words.code(path, option).toLowerCase(Locale.ROOT);
            if (option.equals(text) || said.equals(plain)) {
                return option;
            }
            if (!plain.isEmpty() && said.startsWith(plain)) {
                begun.add(option);
            }
        }
        return begun.size() == 1 ? begun.get(0) : text.strip();
    }

    /** The part chosen in the row that says which one is meant. */
    Optional<PartName> part(String text) {
        return PartName.of(one(row.leaf().orElseThrow(), text));
    }

    /** A list of words with one more, or without it where it is there. */
    static String toggled(String text, String word) {
        List<String> all = new ArrayList<>();
        for (String one : text.split(",")) {
            if (!one.isBlank()) {
                all.add(one.strip());
            }
        }
        if (!all.isEmpty() && !all.contains(word) && word.startsWith(all.get(all.size() - 1))) {
            all.remove(all.size() - 1); // the begin of the word that was just chosen
        }
        if (!all.remove(word)) {
            all.add(word);
        }
        return String.join(", ", all);
    }
}
