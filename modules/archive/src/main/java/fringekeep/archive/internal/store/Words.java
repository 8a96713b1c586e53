package fringekeep.archive.internal.store;

import java.text.Normalizer;
import java.util.Locale;
import java.util.Set;
import java.util.TreeSet;
import java.util.regex.Pattern;
import java.util.stream.Stream;

/** Words that records are found by: compatibility form NFKC, lower case by the root locale, letters and digits only. */
final class Words {
    /** Longest word kept (UTF-16 units); longer ones are found by their beginning. */
    static final int LONGEST = 64;

    private static final Pattern BETWEEN = Pattern.compile("[^\\p{L}\\p{M}\\p{N}]+");

    private Words() {}

    /** The distinct words of some texts. */
    static Set<String> of(Stream<String> texts) {
        Set<String> words = new TreeSet<>();
        texts.forEach(text -> BETWEEN.splitAsStream(normal(text))
                .filter(word -> !word.isEmpty())
                .map(Words::cut)
                .forEach(words::add));
        return words;
    }

    private static String normal(String text) {
        String lower = Normalizer.normalize(text, Normalizer.Form.NFKC).toLowerCase(Locale.ROOT);
        return Normalizer.normalize(lower, Normalizer.Form.NFKC);
    }

    private static String cut(String word) {
        if (word.length() <= LONGEST) {
            return word;
        }
        int end = Character.isHighSurrogate(word.charAt(LONGEST - 1)) ? LONGEST - 1 : LONGEST;
        return word.substring(0, end);
    }
}
