package fringekeep.instrument;

import fringekeep.archive.json.JsonArray;
import fringekeep.archive.json.JsonObject;
import fringekeep.archive.kind.Parts;
import fringekeep.archive.problem.Problem;
import fringekeep.archive.problem.ProblemException;
import fringekeep.archive.quantity.Units;
import fringekeep.archive.record.PartName;
import fringekeep.sample.Entered;
import java.time.DateTimeException;
import java.time.ZoneOffset;
import java.util.ArrayList;
import java.util.HashSet;
import java.util.List;
import java.util.Optional;
import java.util.OptionalLong;
import java.util.Set;

/** What is wrong with a monitor log beyond its schema. */
final class MonitorRules {
    private static final Set<String> ENCODINGS = Set.of("UTF-8", "ISO-8859-1", "windows-1252", "UTF-16");
    private static final Set<String> DELIMITERS = Set.of("tab", ",", ";", "space");
    private static final Set<String> DECIMALS = Set.of(".", ",");
    private static final Set<String> FORMS = Set.of("iso", "epoch-seconds", "seconds", "day-first", "month-first");
    private static final int LAST_COLUMN = 999;

    private final List<Problem> problems = new ArrayList<>();

    private MonitorRules() {}

    static List<Problem> examine(Parts parts) {
        Optional<JsonObject> choices = parts.get(PartName.CHOICES);
        return choices.isEmpty() ? List.of(Trouble.at("missing", "/choices", "choices")) : choices(choices.get());
    }

    static List<Problem> choices(JsonObject choices) {
        MonitorRules rules = new MonitorRules();
        rules.one(choices, "method", Set.of(MonitorReading.METHOD));
        rules.one(choices, "encoding", ENCODINGS);
        rules.one(choices, "delimiter", DELIMITERS);
        rules.one(choices, "decimal", DECIMALS);
        if (choices.text("delimiter").equals(Optional.of(","))
                && choices.text("decimal").equals(Optional.of(","))) {
            rules.add("decimal-delimiter", "/choices/decimal");
        }
        rules.time(choices.object("time").orElse(JsonObject.EMPTY));
        rules.columns(choices.array("columns"));
        if (choices.get("clockOffset").isPresent()
                && Entered.of(choices, "clockOffset")
                        .filter(o -> Math.abs(o.si()) < 1e9)
                        .isEmpty()) {
            rules.add("clock-offset", "/choices/clockOffset");
        }
        return rules.problems;
    }

    private void one(JsonObject choices, String member, Set<String> allowed) {
        if (choices.text(member).filter(allowed::contains).isEmpty()) {
            add("one-of", "/choices/" + member, member, String.join(", ", new java.util.TreeSet<>(allowed)));
        }
    }

    private void time(JsonObject time) {
        String at = "/choices/time";
        column(time, at);
        String form = time.text("form").orElse("");
        if (!FORMS.contains(form)) {
            add("one-of", at + "/form", "form", String.join(", ", new java.util.TreeSet<>(FORMS)));
        }
        if (form.equals("seconds") && CalibrationReader.instant(time, "start").isEmpty()) {
            add("missing", at + "/start", "start");
        }
        boolean numeric = form.equals("day-first") || form.equals("month-first");
        if (time.get("offset").isPresent() ? !offset(time) : numeric) {
            add("offset", at + "/offset");
        }
    }

    private static boolean offset(JsonObject time) {
        try {
            return time.text("offset").map(ZoneOffset::of).isPresent();
        } catch (DateTimeException e) {
            return false;
        }
    }

    private void columns(JsonArray columns) {
        if (columns.items().isEmpty()) {
            add("missing", "/choices/columns", "columns");
        }
        Set<String> names = new HashSet<>();
        for (int i = 0; i < columns.items().size(); i++) {
            String at = "/choices/columns/" + i;
            JsonObject column = columns.items().get(i) instanceof JsonObject one ? one : JsonObject.EMPTY;
            column(column, at);
            String name = column.text("name").orElse("");
            if (name.isBlank() || !names.add(MonitorTable.columnName(name, ""))) {
                add("name", at + "/name", name);
            }
            unit(column.text("unit").orElse(""), at);
        }
    }

    private void column(JsonObject holder, String at) {
        OptionalLong column = holder.integer("column");
        if (column.isEmpty() || column.getAsLong() < 0 || column.getAsLong() > LAST_COLUMN) {
            add("column", at + "/column");
        }
    }

    private void unit(String unit, String at) {
        try {
            Units.parse(unit);
        } catch (ProblemException e) {
            e.problems().forEach(problem -> problems.add(problem.at(at + "/unit")));
        }
    }

    private void add(String code, String where, String... arguments) {
        problems.add(Trouble.at(code, where, arguments));
    }
}
