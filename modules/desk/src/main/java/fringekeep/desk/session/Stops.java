package fringekeep.desk.session;

import java.io.IOException;
import java.io.InputStream;
import java.io.UncheckedIOException;
import java.util.ArrayList;
import java.util.Arrays;
import java.util.HashMap;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import java.util.Properties;

/** The stops of the chain strip and which kinds are shown under each. Data, not knowledge: read from a table. */
public final class Stops {
    private final List<Stop> stops;
    private final Map<String, Integer> stopOfKind = new HashMap<>();
    private final Properties table;

    /**
     * One stop.
     *
     * @param label word in the strip
     * @param kind its main kind
     * @param also further kinds listed under it
     * @param opens whether a line stands before it: it begins a group
     */
    public record Stop(String label, String kind, List<String> also, boolean opens) {
        /** Copies. */
        public Stop {
            also = List.copyOf(also);
        }

        /** Main kind and the further ones. */
        public List<String> kinds() {
            List<String> kinds = new ArrayList<>();
            kinds.add(kind);
            kinds.addAll(also);
            return kinds;
        }
    }

    private Stops(Properties table) {
        this.table = table;
        List<Stop> read = new ArrayList<>();
        for (String kind : words(table.getProperty("stops", ""))) {
            read.add(new Stop(
                    label(kind),
                    kind,
                    words(table.getProperty(kind + ".also", "")),
                    Boolean.parseBoolean(table.getProperty(kind + ".opens", "false"))));
        }
        this.stops = List.copyOf(read);
        for (int i = 0; i < stops.size(); i++) {
            for (String kind : stops.get(i).kinds()) {
                stopOfKind.put(kind, i);
            }
        }
    }

    /** The table shipped with the program. */
    public static Stops shipped() {
        Properties table = new Properties();
        try (InputStream stream = Stops.class.getResourceAsStream("/fringekeep/desk/session/stops.properties")) {
            if (stream == null) {
                throw new IllegalStateException("stops.properties is missing");
            }
            table.load(stream);
        } catch (IOException e) {
            throw new UncheckedIOException("reading stops.properties", e);
        }
        return new Stops(table);
    }

    /** The stops from left to right. */
    public List<Stop> all() {
        return stops;
    }

    /** Position of the stop under which a kind is shown. */
    public Optional<Integer> of(String kind) {
        return Optional.ofNullable(stopOfKind.get(kind));
    }

    /** Words for a kind: {@code source run}. */
    public static String label(String kind) {
        return kind.replace('-', ' ');
    }

    /** An entry of the table about a kind, such as which column is plotted; empty list where there is none. */
    public List<String> entry(String kind, String what) {
        return words(table.getProperty(kind + "." + what, ""));
    }

    /** How many digits a column's numbers have where no uncertainty says it. */
    public Map<String, Integer> digits() {
        Map<String, Integer> digits = new HashMap<>();
        for (String name : table.stringPropertyNames()) {
            if (name.startsWith("digits.")) {
                digits.put(
                        name.substring("digits.".length()),
                        Integer.parseInt(table.getProperty(name).strip()));
            }
        }
        return Map.copyOf(digits);
    }

    private static List<String> words(String list) {
        return Arrays.stream(list.split(","))
                .map(String::strip)
                .filter(word -> !word.isEmpty())
                .toList();
    }
}
