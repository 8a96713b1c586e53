package fringekeep.desk.form;

import fringekeep.desk.session.Stops;
import java.io.IOException;
import java.io.InputStream;
import java.io.UncheckedIOException;
import java.util.Arrays;
import java.util.List;
import java.util.Locale;
import java.util.Optional;
import java.util.Properties;

/**
 * How the form of one kind is laid out, in words: a table shipped as {@code <kind>.properties}. Places are paths of member
 * names without positions, such as {@code content.gratings.period}. Whatever the table does not say follows the schema.
 */
final class FormWords {
    private final String kind;
    private final Properties table;
    private final boolean present;

    private FormWords(String kind, Properties table, boolean present) {
        this.kind = kind;
        this.table = table;
        this.present = present;
    }

    /** The table of a kind; an empty one where none is shipped. */
    static FormWords of(String kind) {
        Properties table = new Properties();
        try (InputStream stream = FormWords.class.getResourceAsStream(kind + ".properties")) {
            if (stream != null) {
                table.load(stream);
            }
            return new FormWords(kind, table, stream != null);
        } catch (IOException e) {
            throw new UncheckedIOException("reading " + kind + ".properties", e);
        }
    }

    /** Whether people enter such records by a form. */
    boolean entered() {
        return present;
    }

    /** Whether people begin such records anew, or only correct what stands. */
    boolean begun() {
        return present && !text("begun").equals(Optional.of("no"));
    }

    /** Whether a record of the kind may come after another: its table says so, as the kind does. */
    boolean continues() {
        return text("continues").isPresent();
    }

    Optional<String> text(String key) {
        return Optional.ofNullable(table.getProperty(key)).map(String::strip);
    }

    /** All keys of the table, for its test. */
    List<String> keys() {
        return table.stringPropertyNames().stream().sorted().toList();
    }

    List<String> list(String key) {
        return text(key).stream()
                .flatMap(words -> Arrays.stream(words.split(",")))
                .map(String::strip)
                .filter(word -> !word.isEmpty())
                .toList();
    }

    /** Words for a place: from the table, else from its name. */
    String label(String path) {
        return text(path + ".label").orElseGet(() -> spoken(path.substring(path.lastIndexOf('.') + 1)));
    }

    /** Words for an item of a list, from 0. */
    String item(String path, int index) {
        return text(path + ".item")
                .orElseGet(() -> singular(label(path)) + " {1}")
                .replace("{1}", Integer.toString(index + 1))
                .replace("{2}", Integer.toString(index + 2));
    }

    private static String singular(String words) {
        return words.endsWith("s") ? words.substring(0, words.length() - 1) : words;
    }

    /** {@code openFraction} as {@code open fraction}. */
    static String spoken(String name) {
        return name.replaceAll("([a-z0-9])([A-Z])", "$1 $2")
                .toLowerCase(Locale.ROOT)
                .replace('-', ' ');
    }

    /** Words for a code: {@code standing-wave} as {@code standing wave}, unless the table says more. */
    String code(String path, String code) {
        return text(path + ".code." + code).orElseGet(() -> plain(code));
    }

    private static String plain(String code) {
        return switch (code) {
            case "\t" -> "tab";
            case "," -> "comma";
            case ";" -> "semicolon";
            case "." -> "point";
            case "|" -> "bar";
            default -> code.matches("[a-z][a-z0-9]*(-[a-z0-9]+)+") ? code.replace('-', ' ') : code;
        };
    }

    /** The kind in words. */
    String kindWords() {
        return Stops.label(kind);
    }

    /** Several of the kind in words. */
    String several() {
        String one = kindWords();
        return text("several").orElse(one.endsWith("y") ? one.substring(0, one.length() - 1) + "ies" : one + "s");
    }

    /** What the kind is, in one sentence of the table; may be empty. */
    String purpose() {
        return text("purpose").orElse("");
    }

    /** Members hidden from people: set by the table, never typed. */
    boolean hidden(String path) {
        return text(path + ".hidden").isPresent();
    }

    /** Whether a group or list stands without a head of its own. */
    boolean headless(String path) {
        return text(path + ".head").equals(Optional.of("none"));
    }

    /** Which member's choice says which of the others are asked for. */
    Optional<String> by(String path) {
        return text(path + ".by");
    }

    /** The members asked for in a case; empty where the table names no such case. */
    Optional<List<String>> inCase(String path, String code) {
        String key = path + ".case." + code;
        return text(key).map(words -> list(key));
    }

    /** Whether any case of a place names a member. */
    boolean cased(String path, String member) {
        return table.stringPropertyNames().stream()
                .filter(key -> key.startsWith(path + ".case."))
                .anyMatch(key -> list(key).contains(member));
    }
}
