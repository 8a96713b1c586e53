package fringekeep.desk.pane;

import fringekeep.archive.json.Json;
import fringekeep.archive.json.JsonArray;
import fringekeep.archive.json.JsonBoolean;
import fringekeep.archive.json.JsonNumber;
import fringekeep.archive.json.JsonObject;
import fringekeep.archive.json.JsonText;
import fringekeep.desk.look.Texts;
import fringekeep.desk.session.Clock;
import fringekeep.drawing.NumberText;
import java.time.Instant;
import java.time.format.DateTimeParseException;
import java.util.ArrayList;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import java.util.Set;
import java.util.regex.Pattern;

/**
 * Turns the JSON of a part into ruled facts without knowing its kind: quantities with what was entered and the uncertainty in
 * its four sorts, estimates, lists of estimates with their covariance, moments, numbers and texts.
 */
public final class FactReader {
    private static final Texts TEXTS = new Texts("fringekeep.desk.pane.Texts", FactReader.class);
    private static final int LIST = 8;
    private static final int DIGITS = 5;
    private static final String PURE = "1";
    private static final Set<String> SORTED = Set.of("sort", "si", "u", "model", "from");
    private static final Pattern INSTANT =
            Pattern.compile("[0-9]{4}-[0-9]{2}-[0-9]{2}T[0-9]{2}:[0-9]{2}:[0-9]{2}(\\.[0-9]+)?Z");

    private final Clock clock;
    private final JsonObject schema;
    private final FactWords words;
    private final String part;
    private final Map<String, List<Fact>> groups = new LinkedHashMap<>();

    /**
     * A reader for one part.
     *
     * @param clock how moments are shown
     * @param schema schema of the part's value, for units; the empty object where there is none
     * @param kind whose words are used
     * @param part name of the part
     */
    public FactReader(Clock clock, JsonObject schema, String kind, String part) {
        this.clock = clock;
        this.schema = schema;
        this.words = FactWords.of(kind);
        this.part = part;
    }

    /** Groups of facts; what stands alone comes under the given heading. */
    public List<FactGroup> read(String heading, JsonObject value) {
        object(heading, "", part, value, schema, true);
        return groups.entrySet().stream()
                .filter(entry -> !entry.getValue().isEmpty())
                .map(entry -> new FactGroup(entry.getKey(), entry.getValue()))
                .toList();
    }

    private void object(String group, String prefix, String path, JsonObject value, JsonObject at, boolean top) {
        if (estimates(group, path, value)) {
            value = value.without("estimates")
                    .without("names")
                    .without("values")
                    .without("covariance")
                    .without("units");
        }
        for (Map.Entry<String, Json> member : value.members().entrySet()) {
            String below = path + "." + member.getKey();
            if (!words.hidden(below)) {
                String own = words.label(below, member.getKey());
                String name = prefix.isEmpty() || own.isEmpty() ? prefix + own : prefix + " " + own;
                any(group, name, below, member.getValue(), property(at, member.getKey()), top);
            }
        }
    }

    private void any(String group, String name, String path, Json value, JsonObject at, boolean top) {
        if (value instanceof JsonObject object) {
            Optional<Fact> whole = whole(name, path, object, at);
            if (whole.isPresent()) {
                add(group, whole.get());
                further(group, name, path, object, at);
            } else {
                object(top ? name : group, top ? "" : name, path, object, at, false);
            }
        } else if (value instanceof JsonArray array) {
            array(top ? name : group, group, name, path, array, at);
        } else {
            add(group, single(name, path, value, at));
        }
    }

    /** A number with its unit, or a text; one of a list of codes in plain words. */
    private Fact single(String name, String path, Json value, JsonObject at) {
        if (value instanceof JsonNumber number) {
            FactUnits.Sized unit = FactUnits.sized(FactUnits.of(at), number.value());
            String text = number.asInteger().isPresent() && unit.size() == 1
                    ? NumberText.count(number.asInteger().getAsLong())
                    : NumberText.significant(
                            unit.of(number.value()), words.digits(path).orElse(DIGITS));
            return new Fact(name, "", text, unit.shown());
        }
        String text = plain(value);
        boolean code = !at.array("enum").items().isEmpty() && text.indexOf('/') < 0;
        return Fact.text(name, code ? words.value(path, text).replace('-', ' ') : instantOr(text));
    }

    private void array(String inner, String group, String name, String path, JsonArray array, JsonObject at) {
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
                String title = own.isEmpty() ? (singular(name) + " " + (i + 1)).strip() : own;
                named(inner, title, path, own.isEmpty() ? item : item.without("name"), itemSchema);
            }
        }
    }

    /** A named thing with one quantity or value is one row; others become rows with the name before them. */
    private void named(String group, String title, String path, JsonObject item, JsonObject at) {
        Optional<Fact> whole = whole(title, path, item, at);
        if (whole.isPresent()) {
            add(group, whole.get());
        } else if (item.members().size() == 1) {
            Map.Entry<String, Json> only = item.members().entrySet().iterator().next();
            any(group, title, path + "." + only.getKey(), only.getValue(), property(at, only.getKey()), false);
        } else {
            objectOrLine(group, title, path, item, at);
        }
    }

    /** A thing of texts and numbers only is one line. */
    private void objectOrLine(String group, String title, String path, JsonObject item, JsonObject at) {
        boolean flat = item.members().values().stream()
                .noneMatch(value -> value instanceof JsonObject || value instanceof JsonArray);
        if (!flat) {
            object(group, title, path, item, at, false);
            return;
        }
        List<String> line = new ArrayList<>();
        item.members().forEach((name, value) -> {
            String below = path + "." + name;
            Fact fact = single(words.label(below, name), below, value, property(at, name));
            boolean pure = value instanceof JsonText && fact.value().equals(PURE);
            if (!words.hidden(below) && !fact.value().isEmpty() && !pure) {
                String text = fact.unit().isEmpty() ? fact.value() : fact.value() + " " + fact.unit();
                line.add(value instanceof JsonText ? text : (fact.name() + " " + text).strip());
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

    /** An object that is one value: a quantity, an estimate, a number of a told sort, a moment. */
    private Optional<Fact> whole(String name, String path, JsonObject object, JsonObject at) {
        if (object.text("text").isPresent()
                && object.number("si").isPresent()
                && object.object("uncertainty").isPresent()) {
            return Optional.of(quantity(name, object));
        }
        if (object.number("value").isPresent()
                && object.members().values().stream().allMatch(JsonNumber.class::isInstance)) {
            double value = object.number("value").getAsDouble();
            double u = object.number("u").orElse(Double.NaN);
            String code = object.text("unit").map(FactUnits::shown).orElseGet(() -> FactUnits.of(at));
            FactUnits.Sized unit = FactUnits.sized(code, value);
            return Optional.of(new Fact(name, "", NumberText.measured(unit.of(value), unit.of(u)), unit.shown()));
        }
        if (object.text("sort").isPresent()
                && SORTED.containsAll(object.members().keySet())) {
            return Optional.of(sorted(name, path, object, at));
        }
        if (object.text("at").isPresent() && object.text("offset").isPresent()) {
            String known = object.text("known").orElse("");
            String moment = moment(object.text("at").get());
            return Optional.of(Fact.text(
                    name,
                    known.isEmpty()
                            ? moment
                            : moment + ", "
                                    + words.value(path + ".known", known).replace('-', ' ')));
        }
        return Optional.empty();
    }

    /** A number and how it is meant: an exposure of each point, a period that was kept. */
    private Fact sorted(String name, String path, JsonObject object, JsonObject at) {
        String sort = object.text("sort").orElse("");
        String meant = words.value(path + ".sort", sort).replace('-', ' ');
        if (object.number("si").isEmpty()) {
            return Fact.text(name, meant);
        }
        double si = object.number("si").getAsDouble();
        double u = object.number("u").orElse(Double.NaN);
        String code = words.unit(path, sort).orElseGet(() -> FactUnits.of(property(at, "si")));
        FactUnits.Sized unit = FactUnits.sized(code, si);
        String value =
                u > 0 ? NumberText.measured(unit.of(si), unit.of(u)) : NumberText.significant(unit.of(si), DIGITS);
        return new Fact(name, "", value, (unit.shown() + " " + meant).strip());
    }

    /** Numbers beside a value and its uncertainty, such as statistical and shared parts or the ends of an interval. */
    private void further(String group, String name, String path, JsonObject object, JsonObject at) {
        if (object.number("value").isEmpty()) {
            return;
        }
        String code = object.text("unit").map(FactUnits::shown).orElseGet(() -> FactUnits.of(at));
        FactUnits.Sized unit = FactUnits.sized(code, object.number("value").getAsDouble());
        object.members().forEach((member, other) -> {
            String below = path + "." + member;
            boolean more = !member.equals("value") && !member.equals("u") && !words.hidden(below);
            if (more && other instanceof JsonNumber number) {
                add(
                        group,
                        new Fact(
                                name + ", " + words.label(below, member),
                                "",
                                NumberText.significant(unit.of(number.value()), 3),
                                unit.shown()));
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

    private Fact quantity(String name, JsonObject quantity) {
        JsonObject uncertainty = quantity.object("uncertainty").orElse(JsonObject.EMPTY);
        String unit = quantity.text("unit").orElse("1");
        double si = quantity.number("si").orElse(Double.NaN);
        String sort = uncertainty.text("sort").orElse("");
        String text = quantity.text("text").orElse("");
        String stated = sort.equals("stated")
                ? text + " \u00B1 " + uncertainty.text("text").orElse("")
                : text;
        String shown = FactUnits.shown(unit);
        String entered = (shown.isEmpty() ? stated : stated + " " + shown) + (sort.equals("exact") ? " exact" : "");
        FactUnits.Sized sized = FactUnits.sized(FactUnits.si(unit), si);
        String value =
                switch (sort) {
                    case "stated" ->
                        NumberText.measured(
                                sized.of(si), sized.of(uncertainty.number("si").orElse(Double.NaN)));
                    case "exact" -> NumberText.significant(sized.of(si), 6) + " exact";
                    case "bounds" -> bounds(uncertainty, sized);
                    default -> NumberText.significant(sized.of(si), 6) + " " + TEXTS.of("unstated");
                };
        return new Fact(name, entered, value, sized.shown());
    }

    private static String bounds(JsonObject uncertainty, FactUnits.Sized unit) {
        Optional<String> lower = end(uncertainty, "lower", unit);
        Optional<String> upper = end(uncertainty, "upper", unit);
        if (lower.isPresent() && upper.isPresent()) {
            return lower.get() + " to " + upper.get();
        }
        return lower.map(low -> "> " + low).orElseGet(() -> "< " + upper.orElse(""));
    }

    private static Optional<String> end(JsonObject uncertainty, String which, FactUnits.Sized unit) {
        return uncertainty.number(which).isPresent()
                ? Optional.of(
                        NumberText.significant(unit.of(uncertainty.number(which).getAsDouble()), 6))
                : Optional.empty();
    }

    /** Estimates beside their covariance (lower triangle by rows): one row each. */
    private boolean estimates(String group, String path, JsonObject value) {
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
            String unit = i < units.size() ? FactUnits.shown(units.get(i)) : "";
            add(
                    group,
                    new Fact(
                            words.label(
                                    path + ".estimates." + names.texts().get(i),
                                    names.texts().get(i)),
                            "",
                            NumberText.measured(values.numbers()[i], u),
                            unit));
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

    private static String singular(String name) {
        if (name.endsWith("ies") && !name.endsWith("series")) {
            return name.substring(0, name.length() - 3) + "y";
        }
        return name.endsWith("s") && !name.endsWith("ss") && !name.endsWith("series")
                ? name.substring(0, name.length() - 1)
                : name;
    }
}
