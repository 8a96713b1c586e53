package fringekeep.desk.pane;

import java.io.IOException;
import java.io.InputStream;
import java.io.InputStreamReader;
import java.io.UncheckedIOException;
import java.nio.charset.StandardCharsets;
import java.util.Arrays;
import java.util.List;
import java.util.Locale;
import java.util.Optional;
import java.util.Properties;

/**
 * What members of parts are called on screen, which are not shown, and in which order: a table of words, with the kind before
 * the path where kinds differ ({@code fit.result.p}), without it where they do not ({@code result.rows}).
 */
final class FactWords {
    private final String kind;
    private final Properties table;

    private FactWords(String kind, Properties table) {
        this.kind = kind;
        this.table = table;
    }

    /** The words of a kind from the table shipped with the program. */
    static FactWords of(String kind) {
        return new FactWords(kind, Shipped.TABLE);
    }

    private Optional<String> entry(String what, String path) {
        return Optional.ofNullable(table.getProperty(what + "." + kind + "." + path))
                .or(() -> Optional.ofNullable(table.getProperty(what + "." + path)));
    }

    /** Whether a member is not shown: names of payloads, places of columns, what a table shows already. */
    boolean hidden(String path) {
        return entry("hide", path).isPresent();
    }

    /** What a member is called: told words, else those of its name. */
    String label(String path, String member) {
        return entry("label", path).orElseGet(() -> words(member));
    }

    /** What a text value is called, such as {@code per-point}. */
    String value(String path, String value) {
        return entry("value", path + "." + value).orElse(value);
    }

    /** Unit of a number where a sort beside it decides, such as shots instead of seconds. */
    Optional<String> unit(String path, String sort) {
        return entry("unit", path + "." + sort);
    }

    /** Digits of a number without an uncertainty, where it is told. */
    Optional<Integer> digits(String path) {
        return entry("digits", path).map(String::strip).map(Integer::valueOf);
    }

    /** Whether a table comes after the facts, or beside everything on wide windows. */
    boolean late(String path) {
        return entry("late", path).isPresent();
    }

    /** Names of facts in the order in which they are shown first. */
    List<String> order(String what) {
        return entry("order", what).stream()
                .flatMap(text -> Arrays.stream(text.split(",")))
                .map(String::strip)
                .toList();
    }

    /** Words of a member name: {@code molarMass} becomes "molar mass". */
    static String words(String name) {
        StringBuilder words = new StringBuilder();
        for (int i = 0; i < name.length(); i++) {
            char c = name.charAt(i);
            if (Character.isUpperCase(c)) {
                words.append(' ');
            }
            words.append(c);
        }
        return words.toString()
                .toLowerCase(Locale.ROOT)
                .replace('-', ' ')
                .replace('_', ' ')
                .strip();
    }

    private static final class Shipped {
        static final Properties TABLE = read();

        private static Properties read() {
            Properties table = new Properties();
            try (InputStream stream = FactWords.class.getResourceAsStream("/fringekeep/desk/pane/facts.properties")) {
                if (stream == null) {
                    throw new IllegalStateException("facts.properties is missing");
                }
                table.load(new InputStreamReader(stream, StandardCharsets.UTF_8));
            } catch (IOException e) {
                throw new UncheckedIOException("reading facts.properties", e);
            }
            return table;
        }
    }
}
