package fringekeep.fit.ui;

import fringekeep.archive.judgement.Verdict;
import fringekeep.desk.look.Texts;
import fringekeep.desk.part.WordChoice.Word;
import java.util.ArrayList;
import java.util.List;

/** Words of the windows of fits. */
final class FitWords {
    static final Texts TEXTS = new Texts("fringekeep.fit.ui.Texts", FitWords.class);

    private FitWords() {}

    /** Words of a choice: {@code method.fringe.weighted/1} and so on, by path and code. */
    static List<Word> words(String path, String... codes) {
        List<Word> words = new ArrayList<>();
        for (String code : codes) {
            words.add(new Word(code, TEXTS.of(path + "." + key(code))));
        }
        return words;
    }

    private static String key(String code) {
        return code.replace("fringe.", "").replace("/1", "");
    }

    static String method(String method) {
        return TEXTS.orElse("method." + key(method), method);
    }

    /** Reasons of a verdict as words. */
    static List<Word> reasons(Verdict verdict) {
        return verdict.reasons().stream()
                .map(code -> new Word(code, Verdict.words(code)))
                .toList();
    }
}
