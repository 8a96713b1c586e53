package fringekeep.desk.pane;

import fringekeep.archive.json.Json;
import fringekeep.archive.json.JsonArray;
import fringekeep.archive.json.JsonBoolean;
import fringekeep.archive.json.JsonNumber;
import fringekeep.archive.json.JsonObject;
import fringekeep.archive.json.JsonText;
import fringekeep.archive.problem.ProblemException;
import fringekeep.archive.quantity.Unit;
import fringekeep.archive.quantity.Units;
import fringekeep.desk.session.Clock;
import fringekeep.drawing.NumberText;
import java.math.BigDecimal;
import java.time.Instant;
import java.time.format.DateTimeParseException;
import java.util.ArrayList;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Locale;
import java.util.Map;
import java.util.Optional;
import java.util.regex.Matcher;
import java.util.regex.Pattern;

/**
 * Turns the JSON of a part into ruled facts without knowing its kind: quantities with what was entered and the uncertainty in
 * its four sorts, estimates, lists of estimates with their covariance, moments, numbers and texts.
 */
public final class FactReader {
    private static final int LIST = 8;
    private static final Pattern INSTANT =
            Pattern.compile("[0-9]{4}-[0-9]{2}-[0-9]{2}T[0-9]{2}:[0-9]{2}:[0-9]{2}(\\.[0-9]+)?Z");
    private static final Pattern BRACKETED = Pattern.compile("\\(([^() ]+)\\)[^()]*$");
    private static final List<String> NAMED = List.of("W", "J", "Pa", "V", "A", "N", "C", "T", "K", "Ohm", "F");

    private final Clock clock;
    private final JsonObject schema;
    private final Map<String, List<Fact>> groups = new LinkedHashMap<>();

    /**
     * A reader for one part.
     *
     * @param clock how moments are shown
     * @param schema schema of the part's value, for units; the empty object where there is none
     */
    public FactReader(Clock clock, JsonObject schema) {
        this.clock = clock;
        this.schema = schema;
    }

    /** Groups of facts; what stands alone comes under the given heading. */
    public List<FactGroup> read(String heading, JsonObject value) {
        object(heading, "", value, schema, true);
        return groups.entrySet().stream()
                .filter(entry -> !entry.getValue().isEmpty())
                .map(entry -> new FactGroup(entry.getKey(), entry.getValue()))
                .toList();
    }

    private void object(String group, String prefix, JsonObject value, JsonObject at, boolean top) {
        if (estimates(group, value)) {
            value = value.without("estimates")
                    .without("names")
                    .without("values")
                    .without("covariance")
                    .without("units");
        }
        for (Map.Entry<String, Json> member : value.members().entrySet()) {
            String name = prefix.isEmpty() ? words(member.getKey()) : prefix + " " + words(member.getKey());
            JsonObject below = property(at, member.getKey());
            any(group, name, member.getValue(), below, top);
        }
    }

    private void any(String group, String name, Json value, JsonObject at, boolean top) {
        if (value instanceof JsonObject object) {
            Optional<Fact> whole = whole(name, object, at);
            if (whole.isPresent()) {
                add(group, whole.get());
                further(group, name, object, whole.get().unit());
            } else {
                object(top ? name : group, top ? "" : name, object, at, false);
            }
        } else if (value instanceof JsonArray array) {
            array(top ? name : group, group, name, array, at);
        } else {
            add(group, Fact.text(name, instantOr(plain(value))).withUnit(unit(at)));
        }
    }

    private void array(String inner, String group, String name, JsonArray array, JsonObject at) {
        List<Json> items = array.items();
        JsonObject itemSchema = at.object("items").orElse(JsonObject.EMPTY);
        if (items.isEmpty()) {
            return;
        }
        if (!(items.get(0) instanceof JsonObject)) {
            add(group, Fact.text(name, list(items)));
            return;
        }
        for (int i = 0; i < items.size() && i < 40; i++) {
            if (items.get(i) instanceof JsonObject item) {
                String own = item.text("name").orElse("");
                String title = own.isEmpty() ? singular(name) + " " + (i + 1) : own;
                named(inner, title, own.isEmpty() ? item : item.without("name"), itemSchema);
            }
        }
    }

    /** A named thing with one quantity or value is one row; others become rows with the name before them. */
    private void named(String group, String title, JsonObject item, JsonObject at) {
        Optional<Fact> whole = whole(title, item, at);
        if (whole.isPresent()) {
            add(group, whole.get());
        } else if (item.members().size() == 1) {
            Map.Entry<String, Json> only = item.members().entrySet().iterator().next();
            any(group, title, only.getValue(), property(at, only.getKey()), false);
        } else {
            objectOrLine(group, title, item, at);
        }
    }

    /** A thing of texts and numbers only is one line. */
    private void objectOrLine(String group, String title, JsonObject item, JsonObject at) {
        boolean flat = item.members().values().stream()
                .noneMatch(value -> value instanceof JsonObject || value instanceof JsonArray);
        if (!flat) {
            object(group, title, item, at, false);
            return;
        }
        List<String> line = new ArrayList<>();
        item.members().forEach((name, value) -> {
            String text = plain(value);
            if (!text.isEmpty()) {
                line.add(value instanceof JsonText ? text : words(name) + " " + text);
            }
        });
        add(group, Fact.text(title, String.join(", ", line)));
    }

    private static String list(List<Json> items) {
        if (items.size() > LIST) {
            return items.size() + " values";
        }
        List<String> words = new ArrayList<>();
        items.forEach(item ->
                words.add(item instanceof JsonArray inner ? list(inner.items()).replace(", ", " to ") : plain(item)));
        return String.join(", ", words);
    }

    /** An object that is one value: a quantity, an estimate, a moment. */
    private Optional<Fact> whole(String name, JsonObject object, JsonObject at) {
        if (object.text("text").isPresent()
                && object.number("si").isPresent()
                && object.object("uncertainty").isPresent()) {
            return Optional.of(quantity(name, object));
        }
        if (object.number("value").isPresent()
                && object.members().values().stream().allMatch(JsonNumber.class::isInstance)) {
            double u = object.number("u").orElse(Double.NaN);
            String unit = object.text("unit").map(FactReader::shown).orElseGet(() -> unit(at));
            return Optional.of(new Fact(
                    name, "", NumberText.measured(object.number("value").getAsDouble(), u), unit));
        }
        if (object.text("at").isPresent() && object.text("offset").isPresent()) {
            return Optional.of(Fact.text(name, moment(object.text("at").get())));
        }
        return Optional.empty();
    }

    /** Numbers beside a value and its uncertainty, such as statistical and shared parts or the ends of an interval. */
    private void further(String group, String name, JsonObject object, String unit) {
        if (object.number("value").isEmpty()) {
            return;
        }
        object.members().forEach((member, value) -> {
            if (value instanceof JsonNumber number && !member.equals("value") && !member.equals("u")) {
                add(group, new Fact(name + ", " + words(member), "", NumberText.significant(number.value(), 3), unit));
            }
        });
    }

    private String instantOr(String text) {
        return INSTANT.matcher(text).matches() ? moment(text) : text;
    }

    private String moment(String at) {
        try {
            Instant instant = Instant.parse(at);
            return clock.date(instant) + " " + clock.time(instant);
        } catch (DateTimeParseException e) {
            return at; // shown as it stands
        }
    }

    private static Fact quantity(String name, JsonObject quantity) {
        JsonObject uncertainty = quantity.object("uncertainty").orElse(JsonObject.EMPTY);
        String unit = quantity.text("unit").orElse("1");
        double si = quantity.number("si").orElse(Double.NaN);
        String sort = uncertainty.text("sort").orElse("");
        String text = quantity.text("text").orElse("");
        String stated = sort.equals("stated")
                ? text + " \u00B1 " + uncertainty.text("text").orElse("")
                : text;
        String shown = shown(unit);
        String entered = (shown.isEmpty() ? stated : stated + " " + shown) + (sort.equals("exact") ? " exact" : "");
        String value =
                switch (sort) {
                    case "stated" ->
                        NumberText.measured(si, uncertainty.number("si").orElse(Double.NaN));
                    case "exact" -> NumberText.significant(si, 6) + " exact";
                    case "bounds" -> bounds(uncertainty);
                    default -> NumberText.significant(si, 6) + " n.s.";
                };
        return new Fact(name, entered, value, siUnit(unit));
    }

    private static String bounds(JsonObject uncertainty) {
        Optional<String> lower = uncertainty.number("lower").isPresent()
                ? Optional.of(NumberText.significant(uncertainty.number("lower").getAsDouble(), 6))
                : Optional.empty();
        Optional<String> upper = uncertainty.number("upper").isPresent()
                ? Optional.of(NumberText.significant(uncertainty.number("upper").getAsDouble(), 6))
                : Optional.empty();
        if (lower.isPresent() && upper.isPresent()) {
            return lower.get() + " to " + upper.get();
        }
        return lower.map(low -> "> " + low).orElseGet(() -> "< " + upper.orElse(""));
    }

    /** Estimates beside their covariance (lower triangle by rows): one row each. */
    private boolean estimates(String group, JsonObject value) {
        JsonArray names = value.array("estimates").items().isEmpty() ? value.array("names") : value.array("estimates");
        JsonArray values = value.array("values");
        JsonArray covariance = value.array("covariance");
        int n = names.items().size();
        boolean fits = n > 0
                && values.items().size() == n
                && names.items().stream().allMatch(JsonText.class::isInstance)
                && values.items().stream().allMatch(JsonNumber.class::isInstance)
                && covariance.items().size() == n * (n + 1) / 2
                && covariance.items().stream().allMatch(JsonNumber.class::isInstance);
        if (!fits) {
            return false;
        }
        List<String> units =
                value.array("units").items().stream().map(FactReader::plain).toList();
        for (int i = 0; i < n; i++) {
            double u = Math.sqrt(covariance.numbers()[i * (i + 1) / 2 + i]);
            String unit = i < units.size() ? shown(units.get(i)) : "";
            add(group, new Fact(words(names.texts().get(i)), "", NumberText.measured(values.numbers()[i], u), unit));
        }
        return true;
    }

    private void add(String group, Fact fact) {
        groups.computeIfAbsent(group, key -> new ArrayList<>()).add(fact);
    }

    private static String plain(Json value) {
        if (value instanceof JsonText text) {
            return text.value();
        }
        if (value instanceof JsonNumber number) {
            return number.asInteger().isPresent()
                    ? NumberText.count(number.asInteger().getAsLong())
                    : NumberText.significant(number.value(), 6);
        }
        if (value instanceof JsonBoolean flag) {
            return flag.value() ? "yes" : "no";
        }
        if (value instanceof JsonArray array) {
            return list(array.items());
        }
        return value instanceof JsonObject object && object.members().isEmpty() ? "" : "\u2026";
    }

    private static JsonObject property(JsonObject schema, String name) {
        return schema.object("properties").flatMap(all -> all.object(name)).orElse(JsonObject.EMPTY);
    }

    /** Unit of a number: named by the schema, or told in brackets at the end of its description. */
    private static String unit(JsonObject schema) {
        return schema.text("siUnit")
                .or(() -> schema.text("unit"))
                .or(() -> schema.text("description").flatMap(FactReader::bracketed))
                .map(FactReader::shown)
                .orElse("");
    }

    private static Optional<String> bracketed(String description) {
        Matcher matcher = BRACKETED.matcher(description);
        return matcher.find() ? Optional.of(matcher.group(1)).filter(FactReader::isUnit) : Optional.empty();
    }

    private static boolean isUnit(String code) {
        try {
            Units.parse(code);
            return true;
        } catch (ProblemException e) {
            return false; // other words in brackets
        }
    }

    private static String shown(String code) {
        try {
            String text = Units.parse(code).shown();
            return text.equals("1") ? "" : text;
        } catch (ProblemException e) {
            return code; // a unit of a newer kind: shown as it stands
        }
    }

    /** The SI unit of a quantity in the words of the trade: W, not m2.kg.s-3. */
    private static String siUnit(String code) {
        try {
            Unit unit = Units.parse(code);
            for (String name : NAMED) {
                Unit named = Units.of(name);
                if (named.sameDimension(unit) && named.toSi(BigDecimal.ONE) == 1) {
                    return named.shown();
                }
            }
            String si = unit.siCode();
            return si.equals("1") || si.isEmpty() ? "" : shown(si);
        } catch (ProblemException e) {
            return "SI"; // a unit of a newer kind
        }
    }

    private static String singular(String name) {
        if (name.endsWith("ies") && !name.endsWith("series")) {
            return name.substring(0, name.length() - 3) + "y";
        }
        return name.endsWith("s") && !name.endsWith("ss") && !name.endsWith("series")
                ? name.substring(0, name.length() - 1)
                : name;
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
        return words.toString().toLowerCase(Locale.ROOT).replace('-', ' ').strip();
    }
}
