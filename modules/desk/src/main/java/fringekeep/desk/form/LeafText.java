package fringekeep.desk.form;

import fringekeep.archive.json.EcmaScriptNumber;
import fringekeep.archive.json.Json;
import fringekeep.archive.json.JsonArray;
import fringekeep.archive.json.JsonBoolean;
import fringekeep.archive.json.JsonNumber;
import fringekeep.archive.json.JsonObject;
import fringekeep.archive.json.JsonText;
import fringekeep.archive.problem.Problem;
import fringekeep.archive.problem.ProblemException;
import fringekeep.archive.quantity.Quantity;
import fringekeep.archive.quantity.QuantityJson;
import fringekeep.archive.quantity.QuantityText;
import fringekeep.desk.form.Asked.Leaf;
import fringekeep.desk.form.Asked.Sort;
import java.time.Instant;
import java.time.ZoneOffset;
import java.time.ZonedDateTime;
import java.util.ArrayList;
import java.util.Arrays;
import java.util.List;
import java.util.Optional;
import java.util.regex.Pattern;

/** One value of an entry document as the text of a field, and back. */
final class LeafText {
    static final String YES = "yes";
    static final String NO = "no";
    static final String NONE = "none";
    /** Says that a text is empty on purpose. */
    private static final String EMPTY = "\"\"";

    private static final Pattern NUMBER = Pattern.compile("[+-]?[0-9]+([.,][0-9]+)?([eE][+-]?[0-9]{1,3})?");
    private static final Pattern THOUSANDS = Pattern.compile("[+-]?[1-9][0-9]{0,2},[0-9]{3}");
    private static final Pattern RANGE = Pattern.compile("([0-9]{1,10})(?:\\s*[-–]\\s*([0-9]{1,10}))?");

    private final LocalMoment moments;

    LeafText(LocalMoment moments) {
        this.moments = moments;
    }

    /** The value as typed; empty where it is of another form than asked, so that it is carried along untouched. */
    Optional<String> typed(Leaf leaf, Json value) {
        return switch (leaf.sort()) {
            case TEXT, WORDS -> text(value).map(words -> words.isEmpty() ? EMPTY : words);
            case CHOICE, RECORD, FILE -> text(value);
            case CHOICES ->
                value instanceof JsonArray array
                        ? joined(array, ", ").map(words -> words.isEmpty() ? NONE : words)
                        : Optional.empty();
            case NUMBERS -> value instanceof JsonArray array ? joined(array, " ") : Optional.empty();
            case RANGES -> value instanceof JsonArray array ? ranges(array) : Optional.empty();
            case NUMBER, INTEGER ->
                value instanceof JsonNumber number
                        ? Optional.of(EcmaScriptNumber.write(number.value()))
                        : Optional.empty();
            case FLAG, MARKED ->
                value instanceof JsonBoolean flag ? Optional.of(flag.value() ? YES : NO) : Optional.empty();
            case QUANTITY -> quantity(value);
            case MOMENT -> moment(value);
            case INSTANT -> text(value).map(iso -> moments.of(Instant.parse(iso)));
        };
    }

    private static Optional<String> text(Json value) {
        return value instanceof JsonText text ? Optional.of(text.value()) : Optional.empty();
    }

    private static Optional<String> joined(JsonArray array, String between) {
        List<String> texts = new ArrayList<>();
        for (Json item : array.items()) {
            if (item instanceof JsonText text && !text.value().contains(",")) {
                texts.add(text.value());
            } else if (item instanceof JsonNumber number) {
                texts.add(EcmaScriptNumber.write(number.value()));
            } else {
                return Optional.empty();
            }
        }
        return Optional.of(String.join(between, texts));
    }

    private static Optional<String> ranges(JsonArray array) {
        List<String> texts = new ArrayList<>();
        for (Json item : array.items()) {
            if (!(item instanceof JsonArray pair) || pair.items().size() != 2) {
                return Optional.empty();
            }
            double[] ends = pair.numbers();
            String first = EcmaScriptNumber.write(ends[0]);
            texts.add(ends[0] == ends[1] ? first : first + "-" + EcmaScriptNumber.write(ends[1]));
        }
        return Optional.of(String.join(" ", texts));
    }

    private static Optional<String> quantity(Json value) {
        if (value instanceof JsonNumber number) {
            return Optional.of(EcmaScriptNumber.write(number.value()));
        }
        if (value instanceof JsonObject object) {
            try {
                Quantity quantity = QuantityJson.read(object);
                String text = QuantityReading.text(quantity);
                return QuantityText.parse(text).equals(quantity) ? Optional.of(text) : Optional.empty();
            } catch (ProblemException | IllegalArgumentException e) {
                return Optional.empty(); // carried along as it is
            }
        }
        return text(value).map(LeafText::brackets);
    }

    /** The deviation in brackets where it was written behind the value. */
    private static String brackets(String text) {
        try {
            return text.contains("±") ? QuantityReading.text(QuantityText.parse(text)) : text;
        } catch (ProblemException e) {
            return text; // as it was typed; what is wrong is said at its field
        }
    }

    private Optional<String> moment(Json value) {
        if (value instanceof JsonObject object
                && object.text("at").isPresent()
                && object.text("offset").isPresent()) {
            return Optional.of(moments.of(
                    Instant.parse(object.text("at").get()),
                    object.text("offset").get(),
                    object.text("zone").orElse("")));
        }
        return text(value);
    }

    /**
     * What a typed text says in an entry document.
     *
     * @throws ProblemException what cannot be read, and how to write it; without a place
     */
    Json entered(Leaf leaf, String typed) throws ProblemException {
        String text = typed.strip();
        return switch (leaf.sort()) {
            case TEXT, WORDS, RECORD, FILE -> Json.of(fits(leaf, leaf.sort() == Sort.WORDS ? typed : text));
            case CHOICE -> Json.of(code(leaf, typed));
            case CHOICES -> codes(leaf, text);
            case QUANTITY -> quantity(text);
            case NUMBER -> Json.of(number(text));
            case INTEGER -> Json.of(whole(text));
            case NUMBERS -> numbers(text);
            case RANGES -> rangesOf(text);
            case FLAG -> Json.of(flag(text));
            case MARKED -> Json.of(marked(text));
            case MOMENT -> Json.of(iso(moments.read(text)));
            case INSTANT -> Json.of(moments.read(text).toInstant().toString());
        };
    }

    private static String fits(Leaf leaf, String text) throws ProblemException {
        if (leaf.longest() > 0 && text.length() > leaf.longest()) {
            throw wrong(
                    "form.too-long",
                    "The text has " + text.length() + " characters; at most " + leaf.longest() + " are taken.",
                    "Shorten it, or put the rest into the remark.");
        }
        return text.equals(EMPTY) ? "" : text;
    }

    private static Json quantity(String text) throws ProblemException {
        QuantityText.parse(text);
        return Json.of(text);
    }

    private static String code(Leaf leaf, String text) throws ProblemException {
        for (String option : leaf.options()) {
            if (option.equals(text) || !text.isBlank() && option.equals(text.strip())) {
                return option;
            }
        }
        throw wrong(
                "form.choice",
                "\"" + text + "\" is none of the choices.",
                "Choose: " + String.join(", ", leaf.options()) + ".");
    }

    private static JsonArray codes(Leaf leaf, String text) throws ProblemException {
        List<String> codes = new ArrayList<>();
        if (text.equals(NONE)) {
            return JsonArray.ofTexts(codes);
        }
        for (String word : text.split(",")) {
            if (!word.isBlank()) {
                codes.add(code(leaf, word.strip()));
            }
        }
        return JsonArray.ofTexts(codes);
    }

    private static double number(String text) throws ProblemException {
        if (THOUSANDS.matcher(text).matches()) {
            throw wrong(
                    "form.ambiguous",
                    "\"" + text + "\" may mean a thousand or a decimal.",
                    "Write " + text.replace(",", "") + " or " + text.replace(',', '.') + ".");
        }
        if (!NUMBER.matcher(text).matches()) {
            throw wrong("form.number", "\"" + text + "\" is not a number.", "Write digits, such as 1.035 or 6.4e-05.");
        }
        double value = Double.parseDouble(text.replace(',', '.'));
        if (!Double.isFinite(value)) {
            throw wrong("form.number", "\"" + text + "\" is too large.", "Write a number below 1.8e308.");
        }
        return value;
    }

    private static double whole(String text) throws ProblemException {
        double value = number(text);
        if (value != Math.rint(value)) {
            throw wrong("form.whole", "\"" + text + "\" is not a whole number.", "Write it without a fraction.");
        }
        return value;
    }

    private static JsonArray numbers(String text) throws ProblemException {
        List<Json> numbers = new ArrayList<>();
        for (String word : text.split("[\\s;]+")) {
            if (!word.isEmpty()) {
                numbers.add(Json.of(number(word)));
            }
        }
        return new JsonArray(numbers);
    }

    private static JsonArray rangesOf(String text) throws ProblemException {
        List<Json> ranges = new ArrayList<>();
        for (String word : text.split("[\\s,;]+(?![-–])(?<![-–])")) {
            var matcher = RANGE.matcher(word.strip());
            if (!matcher.matches()) {
                throw wrong("form.ranges", "\"" + word + "\" is not a range of rows.", "Write 3-7 12, from 0.");
            }
            double first = Double.parseDouble(matcher.group(1));
            double last = matcher.group(2) == null ? first : Double.parseDouble(matcher.group(2));
            ranges.add(JsonArray.ofNumbers(first, last));
        }
        return new JsonArray(ranges);
    }

    private static boolean flag(String text) throws ProblemException {
        if (Arrays.asList(YES, NO).contains(text)) {
            return text.equals(YES);
        }
        throw wrong("form.flag", "\"" + text + "\" is neither yes nor no.", "Write yes or no.");
    }

    private static boolean marked(String text) throws ProblemException {
        if (text.equals(YES)) {
            return true;
        }
        throw wrong("form.flag", "Here stands yes or nothing.", "Write yes, or leave the field empty.");
    }

    private static String iso(ZonedDateTime time) {
        String iso = time.toOffsetDateTime().toString();
        return time.getZone() instanceof ZoneOffset ? iso : iso + "[" + time.getZone() + "]";
    }

    private static ProblemException wrong(String code, String what, String mend) {
        return new ProblemException(new Problem(code, what, "", mend + " Nothing has been stored."));
    }
}
