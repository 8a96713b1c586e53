package fringekeep.sourcerun;

import fringekeep.archive.json.JsonArray;
import fringekeep.archive.json.JsonNumber;
import fringekeep.archive.json.JsonObject;
import fringekeep.archive.kind.Inputs;
import fringekeep.archive.kind.Parts;
import fringekeep.archive.problem.Problem;
import fringekeep.archive.problem.ProblemException;
import fringekeep.archive.quantity.Unit;
import fringekeep.archive.quantity.Units;
import fringekeep.archive.record.PartName;
import fringekeep.sample.Entered;
import java.util.ArrayList;
import java.util.List;
import java.util.Optional;
import java.util.OptionalLong;
import java.util.Set;
import java.util.TreeSet;

/** What is wrong with a velocity beyond its schema. */
final class VelocityRules {
    private static final int LONGEST_SEQUENCE = (1 << 14) - 1;
    private static final Set<String> METHODS =
            Set.of(VelocityComputation.SINGLE_SLOT, VelocityComputation.PSEUDO_RANDOM, VelocityComputation.THREE_SLIT);

    private final List<Problem> problems = new ArrayList<>();

    private VelocityRules() {}

    static List<Problem> examine(Parts parts, Inputs inputs) {
        VelocityRules rules = new VelocityRules();
        Optional<JsonObject> content = parts.get(PartName.CONTENT);
        Optional<JsonObject> choices = parts.get(PartName.CHOICES);
        if (content.isPresent() == choices.isPresent()) {
            rules.add("quoted-or-computed", content.isPresent() ? "/content" : "/choices");
        }
        content.ifPresent(rules::content);
        if (content.isPresent() && !inputs.all().isEmpty()) {
            rules.add("quoted-inputs", "/inputs");
        }
        choices.ifPresent(given -> rules.problems.addAll(choices(given)));
        parts.get(PartName.RESULT).ifPresent(result -> rules.distribution(result, "/result"));
        return rules.problems;
    }

    // ---- quoted

    private void content(JsonObject content) {
        if (content.text("origin").filter(origin -> !origin.isBlank()).isEmpty()) {
            add("missing", "/content/origin", "origin");
        }
        Optional<Entered> mean = positive(content, "mean", "/content", true);
        String shape = content.text("shape").orElse("");
        switch (shape) {
            case "single" -> {}
            case "normal" -> normal(content, mean);
            case "nodes" -> distribution(content, "/content");
            default -> one(content, "shape", "/content", Set.of("single", "normal", "nodes"));
        }
        boolean nodes =
                content.get("nodes").isPresent() || content.get("weights").isPresent();
        if (nodes && !shape.equals("nodes")) {
            add("not-of-shape", "/content/nodes", shape);
        }
    }

    private void normal(JsonObject content, Optional<Entered> mean) {
        Optional<Entered> spread = positive(content, "spread", "/content", true);
        if (mean.isPresent()
                && spread.isPresent()
                && spread.get().si() > mean.get().si() / 2) {
            add("spread-wide", "/content/spread");
        }
    }

    private void distribution(JsonObject holder, String at) {
        double[] nodes = numbers(holder.array("nodes"));
        double[] weights = numbers(holder.array("weights"));
        if (nodes.length == 0 || nodes.length != weights.length) {
            add("lengths", at + "/weights");
            return;
        }
        double sum = 0;
        for (int i = 0; i < nodes.length; i++) {
            if (!(nodes[i] > (i == 0 ? 0 : nodes[i - 1]))) {
                add("not-ascending", at + "/nodes/" + i);
                return;
            }
            if (!(weights[i] >= 0)) {
                add("negative", at + "/weights/" + i, "weights");
            }
            sum += weights[i];
        }
        if (!(Math.abs(sum - 1) < 1e-6)) {
            add("sum", at + "/weights");
        }
    }

    static double[] numbers(JsonArray array) {
        return array.items().stream().allMatch(JsonNumber.class::isInstance) ? array.numbers() : new double[0];
    }

    // ---- computed

    static List<Problem> choices(JsonObject choices) {
        VelocityRules rules = new VelocityRules();
        rules.one(choices, "method", "/choices", METHODS);
        switch (choices.text("method").orElse("")) {
            case VelocityComputation.SINGLE_SLOT -> {
                rules.flight(choices);
                rules.positive(choices, "slotOpening", "/choices", true);
            }
            case VelocityComputation.PSEUDO_RANDOM -> {
                rules.flight(choices);
                rules.positive(choices, "binWidth", "/choices", true);
                rules.one(choices, "direction", "/choices", Set.of("forward", "backward"));
                rules.sequence(choices);
            }
            case VelocityComputation.THREE_SLIT -> rules.slits(choices);
            default -> {} // reported above
        }
        return rules.problems;
    }

    private void flight(JsonObject choices) {
        positive(choices, "distance", "/choices", false);
        if (choices.get("timeZero").isPresent()
                && Entered.of(choices, "timeZero").isEmpty()) {
            add("missing", "/choices/timeZero", "timeZero");
        }
        one(choices, "shape", "/choices", Set.of("shifted-flux", "as-measured"));
        one(choices, "detector", "/choices", Set.of("flux", "density"));
        boolean measured = choices.text("shape").equals(Optional.of("as-measured"));
        one(choices, "background", "/choices", measured ? Set.of("outside-window", "none") : Set.of("fitted"));
        Optional<Entered> from = positive(choices, "from", "/choices", measured);
        Optional<Entered> to = positive(choices, "to", "/choices", measured);
        if (from.isPresent() && to.isPresent() && !(from.get().si() < to.get().si())) {
            add("window-order", "/choices/to");
        }
        if (choices.get("reading").isPresent()) {
            reading(choices.object("reading").orElse(JsonObject.EMPTY));
        }
    }

    private void reading(JsonObject reading) {
        String at = "/choices/reading";
        one(reading, "encoding", at, Set.of("UTF-8", "ISO-8859-1", "windows-1252", "UTF-16"));
        one(reading, "delimiter", at, Set.of("tab", ",", ";", "space"));
        one(reading, "decimal", at, Set.of(".", ","));
        for (String column : List.of("timeColumn", "countsColumn")) {
            OptionalLong place = reading.integer(column);
            if (place.isEmpty() || place.getAsLong() < 0 || place.getAsLong() > 999) {
                add("column", at + "/" + column);
            }
        }
        try {
            Unit unit = Units.parse(reading.text("timeUnit").orElse(""));
            if (!unit.siCode().equals("s")) {
                add("time-unit", at + "/timeUnit");
            }
        } catch (ProblemException e) {
            e.problems().forEach(problem -> problems.add(problem.at(at + "/timeUnit")));
        }
    }

    private void sequence(JsonObject choices) {
        String text = choices.text("sequence").orElse("");
        String at = "/choices/sequence";
        if (text.length() > LONGEST_SEQUENCE || !text.matches("[01]+")) {
            add("sequence-form", at, Integer.toString(LONGEST_SEQUENCE));
            return;
        }
        try {
            FlightMethod.sequence(choices);
        } catch (IllegalArgumentException e) {
            add("sequence", at, String.valueOf(e.getMessage()));
        }
    }

    private void slits(JsonObject choices) {
        JsonArray slits = choices.array("slits");
        if (slits.items().size() != 3) {
            add("slits", "/choices/slits");
        }
        for (int i = 0; i < slits.items().size(); i++) {
            String at = "/choices/slits/" + i;
            JsonObject slit = slits.items().get(i) instanceof JsonObject one ? one : JsonObject.EMPTY;
            for (String member : List.of("position", "height")) {
                if (Entered.of(slit, member).isEmpty()) {
                    add("missing", at + "/" + member, member);
                }
            }
            Optional<Entered> opening = Entered.of(slit, "opening");
            if (slit.get("opening").isPresent()
                    && opening.filter(value -> value.si() >= 0).isEmpty()) {
                add("negative", at + "/opening", "opening");
            }
        }
        positive(choices, "gravity", "/choices", true);
        choices.object("source").ifPresent(source -> positive(source, "width", "/choices/source", true));
    }

    // ---- both

    private Optional<Entered> positive(JsonObject holder, String member, String at, boolean required) {
        Optional<Entered> value = Entered.of(holder, member);
        if (value.isEmpty() && (required || holder.get(member).isPresent())) {
            add("missing", at + "/" + member, member);
        }
        if (value.isPresent() && !(value.get().si() > 0)) {
            add("not-positive", at + "/" + member, member);
            return Optional.empty();
        }
        return value;
    }

    private void one(JsonObject holder, String member, String at, Set<String> allowed) {
        if (holder.text(member).filter(allowed::contains).isEmpty()) {
            add("one-of", at + "/" + member, member, String.join(", ", new TreeSet<>(allowed)));
        }
    }

    private void add(String code, String where, String... arguments) {
        problems.add(Trouble.at(code, where, arguments));
    }
}
