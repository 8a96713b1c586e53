package fringekeep.sample;

import java.io.BufferedReader;
import java.io.IOException;
import java.io.InputStream;
import java.io.InputStreamReader;
import java.io.UncheckedIOException;
import java.math.BigDecimal;
import java.nio.charset.StandardCharsets;
import java.util.HashMap;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import java.util.SortedMap;
import java.util.TreeMap;

/**
 * The elements with their standard atomic weights and isotope masses, from the resources {@code atomic-weights.csv} and
 * {@code isotopes.csv}, whose first lines name their sources.
 *
 * <p>Standard uncertainty of a weight: a published value a(d) is read as a rectangular distribution of half-width d, so
 * u = d/&radic;3 (A. M. H. van der Veen et al., Pure Appl. Chem. 93, 629 (2021), doi:10.1515/pac-2017-1002, section 5).
 * Where an interval is published the conventional value is used, and the half-width is its distance from the farther end,
 * so that the whole interval is covered.
 *
 * <p>Uncertainty of an isotope's mass: the evaluation writes uncertainties with two digits in the last places, hence 99 units
 * of the last place given bound it; carbon-12 is exact by definition.
 */
final class Elements {
    private static final Map<String, Element> BY_SYMBOL = read();

    private Elements() {}

    /** The element with that symbol; D and T are not symbols here. */
    static Optional<Element> symbol(String symbol) {
        return Optional.ofNullable(BY_SYMBOL.get(symbol));
    }

    /** All elements by atomic number. */
    static List<Element> all() {
        return List.copyOf(BY_SYMBOL.values());
    }

    private static Map<String, Element> read() {
        Map<Integer, SortedMap<Integer, Element.Isotope>> isotopes = isotopes();
        Map<String, Element> elements = new LinkedHashMap<>();
        for (String line : lines("atomic-weights.csv")) {
            int number = Integer.parseInt(line.substring(0, line.indexOf(',')));
            String rest = line.substring(line.indexOf(',') + 1);
            String symbol = rest.substring(0, rest.indexOf(','));
            Optional<Element.Weight> weight = weight(rest.substring(rest.indexOf(',') + 1));
            elements.put(symbol, new Element(number, symbol, weight, isotopes.getOrDefault(number, new TreeMap<>())));
        }
        return elements;
    }

    /** Reads {@code 4.002602(2),} or {@code "[12.0096,12.0116]",12.011} or {@code ,}. */
    private static Optional<Element.Weight> weight(String cells) {
        if (cells.equals(",")) {
            return Optional.empty();
        }
        return Optional.of(cells.startsWith("\"") ? interval(cells) : single(cells));
    }

    private static Element.Weight single(String cells) {
        int open = cells.indexOf('(');
        BigDecimal value = new BigDecimal(cells.substring(0, open));
        BigDecimal digits = new BigDecimal(cells.substring(open + 1, cells.indexOf(')')));
        return rectangular(value, digits.movePointLeft(value.scale()));
    }

    private static Element.Weight interval(String cells) {
        int comma = cells.indexOf(',');
        int close = cells.indexOf(']');
        BigDecimal lower = new BigDecimal(cells.substring(2, comma));
        BigDecimal upper = new BigDecimal(cells.substring(comma + 1, close));
        BigDecimal conventional = new BigDecimal(cells.substring(close + 3));
        return rectangular(conventional, conventional.subtract(lower).max(upper.subtract(conventional)));
    }

    private static Element.Weight rectangular(BigDecimal value, BigDecimal halfWidth) {
        return new Element.Weight(value, halfWidth.doubleValue() / Math.sqrt(3));
    }

    private static Map<Integer, SortedMap<Integer, Element.Isotope>> isotopes() {
        Map<Integer, SortedMap<Integer, Element.Isotope>> byNumber = new HashMap<>();
        for (String line : lines("isotopes.csv")) {
            String[] cells = line.split(",", -1);
            BigDecimal mass = new BigDecimal(cells[2]);
            double deviation = cells[2].equals("12")
                    ? 0
                    : BigDecimal.valueOf(99).movePointLeft(mass.scale()).doubleValue();
            double share = cells[3].isEmpty() ? 0 : Double.parseDouble(cells[3]);
            byNumber.computeIfAbsent(Integer.valueOf(cells[0]), number -> new TreeMap<>())
                    .put(Integer.valueOf(cells[1]), new Element.Isotope(mass, deviation, share));
        }
        return byNumber;
    }

    /** Lines of a resource without comments and header. */
    private static List<String> lines(String name) {
        InputStream stream = Elements.class.getResourceAsStream(name);
        if (stream == null) {
            throw new IllegalStateException("no resource " + name);
        }
        try (BufferedReader reader = new BufferedReader(new InputStreamReader(stream, StandardCharsets.UTF_8))) {
            return reader.lines()
                    .filter(line -> !line.startsWith("#") && !line.startsWith("number,"))
                    .toList();
        } catch (IOException e) {
            throw new UncheckedIOException("reading resource " + name, e);
        }
    }
}
