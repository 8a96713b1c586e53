package fringekeep.property.ui;

import fringekeep.desk.look.Texts;
import fringekeep.desk.part.WordChoice.Word;
import java.util.ArrayList;
import java.util.List;

/** Words of the windows of properties. */
final class PropertyWords {
    static final Texts TEXTS = new Texts("fringekeep.property.ui.Texts", PropertyWords.class);

    private PropertyWords() {}

    /** Words of a choice by path and code. */
    static List<Word> words(String path, List<String> codes) {
        List<Word> words = new ArrayList<>();
        codes.forEach(code -> words.add(new Word(code, TEXTS.of(path + "." + code))));
        return words;
    }

    /** A reason in words. */
    static String reason(String code) {
        return TEXTS.orElse("reason." + code, code.replace('-', ' '));
    }
}
