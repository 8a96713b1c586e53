package fringekeep.scan.internal;

import fringekeep.archive.json.JsonObject;
import fringekeep.archive.problem.Problem;
import fringekeep.archive.problem.ProblemException;
import fringekeep.archive.quantity.Unit;
import fringekeep.archive.quantity.Units;
import fringekeep.scan.internal.problem.ScanProblems;
import fringekeep.scan.internal.reading.HeaderRules;
import fringekeep.scan.internal.reading.ProfileNames;
import java.util.ArrayList;
import java.util.List;
import java.util.Optional;
import java.util.Set;
import java.util.TreeSet;

/** What a reading profile must keep to beyond its schema. */
public final class ProfileRules {
    private static final List<String> ROLES = List.of("axis", "channel", "exposure", "shots", "unused");

    private final JsonObject content;
    private final List<JsonObject> columns;
    private final List<Problem> problems = new ArrayList<>();

    private ProfileRules(JsonObject content) {
        this.content = content;
        this.columns = content.array("columns").objects();
    }

    /** All that is wrong with the content; pointers begin with {@code /content}. */
    public static List<Problem> examine(JsonObject content) {
        ProfileRules rules = new ProfileRules(content);
        for (int i = 0; i < rules.columns.size(); i++) {
            rules.column(rules.columns.get(i), "/content/columns/" + i);
        }
        if (rules.problems.isEmpty()) {
            rules.columnsTogether();
        }
        rules.exposure();
        rules.problems.addAll(HeaderRules.examine(content));
        if (content.text("decimal").equals(content.text("delimiter"))) {
            rules.add(
                    "profile.decimal-delimiter",
                    "/content/delimiter",
                    content.text("decimal").orElse(""));
        }
        return List.copyOf(rules.problems);
    }

    private void add(String code, String where, Object... values) {
        problems.add(ScanProblems.of(code, where, values));
    }

    private void column(JsonObject column, String pointer) {
        long roles = ROLES.stream().filter(role -> column.get(role).isPresent()).count();
        if (roles != 1) {
            add("profile.column-role", pointer, roles);
            return;
        }
        if (column.get("header").isPresent() && column.get("number").isPresent()) {
            add("profile.column-place", pointer);
        }
        members(column, pointer, "axis", List.of("positions", "from", "to"));
        members(column, pointer, "channel", List.of("means", "saturation", "highest"));
        members(column, pointer, "exposure", List.of("of"));
        unit(column, pointer);
        boolean crossed = column.number("from").orElse(Double.NEGATIVE_INFINITY)
                > column.number("to").orElse(Double.POSITIVE_INFINITY);
        if (crossed) {
            add("profile.range", pointer + "/from");
        }
    }

    private void members(JsonObject column, String pointer, String role, List<String> names) {
        for (String name : names) {
            if (column.get(name).isPresent() && column.get(role).isEmpty()) {
                add("profile.column-member", pointer + "/" + name, name, role);
            }
        }
    }

    private void unit(JsonObject column, String pointer) {
        Optional<String> code = column.text("unit");
        if (code.isEmpty()) {
            return;
        }
        Optional<Unit> unit = known(code.get());
        if (unit.isEmpty()) {
            add("profile.unit", pointer + "/unit", code.get());
        } else if (column.get("exposure").isPresent() && !unit.get().siCode().equals("s")) {
            add("profile.unit-sort", pointer + "/unit", code.get());
        }
    }

    private static Optional<Unit> known(String code) {
        try {
            return Optional.of(Units.parse(code));
        } catch (ProblemException e) {
            return Optional.empty();
        }
    }

    private void columnsTogether() {
        if (columns.stream().noneMatch(column -> column.get("axis").isPresent())) {
            add("profile.no-axis", "/content/columns");
        }
        Set<String> channels = new TreeSet<>();
        columns.forEach(column -> column.text("channel").ifPresent(channels::add));
        if (channels.isEmpty()) {
            add("profile.no-channel", "/content/columns");
        }
        Set<String> names = new TreeSet<>();
        for (int i = 0; i < columns.size(); i++) {
            Optional<String> of = columns.get(i).text("of");
            if (of.isPresent() && !channels.contains(of.get())) {
                add("profile.of-channel", "/content/columns/" + i + "/of", of.get());
            }
            Optional<String> name = ProfileNames.tableName(columns.get(i));
            if (name.isPresent() && !names.add(name.get())) {
                add("profile.column-twice", "/content/columns/" + i, name.get());
            }
        }
        boolean named = columns.stream().anyMatch(column -> column.get("header").isPresent());
        if (named && content.integer("skip").orElse(0) == 0) {
            add("profile.header-name", "/content/skip");
        }
    }

    private void exposure() {
        boolean column = columns.stream()
                .anyMatch(each ->
                        each.get("exposure").isPresent() && each.get("of").isEmpty()
                                || each.get("shots").isPresent());
        boolean header = content.array("header").objects().stream()
                .anyMatch(item ->
                        item.get("exposure").isPresent() || item.get("shots").isPresent());
        boolean time = content.object("exposure").isPresent();
        boolean shots = content.get("shots").isPresent();
        if (time && shots) {
            add("profile.exposure-twice", "/content/shots");
        }
        if (!column && !header && !time && !shots) {
            add("profile.exposure-none", "/content");
        }
        double si = content.object("exposure")
                .map(quantity -> quantity.number("si").orElse(0))
                .orElse(1.0);
        if (!(si > 0)) {
            add("profile.exposure-value", "/content/exposure");
        }
    }
}
