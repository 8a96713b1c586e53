package fringekeep.scan.internal.reading;

import fringekeep.archive.json.JsonObject;
import fringekeep.archive.problem.Problem;
import fringekeep.scan.internal.problem.ScanProblems;
import java.util.ArrayList;
import java.util.List;
import java.util.Locale;
import java.util.Set;
import java.util.TreeSet;

/** What the header keys of a reading profile must keep to beyond the schema. */
public final class HeaderRules {
    private HeaderRules() {}

    /** All that is wrong; pointers begin with {@code /content/header}. */
    public static List<Problem> examine(JsonObject content) {
        List<Problem> problems = new ArrayList<>();
        Set<String> seen = new TreeSet<>();
        List<JsonObject> items = content.array("header").objects();
        for (int i = 0; i < items.size(); i++) {
            JsonObject item = items.get(i);
            String pointer = "/content/header/" + i;
            long uses = 0;
            for (HeaderKey.Use use : HeaderKey.Use.values()) {
                uses += item.get(use.member()).isPresent() ? 1 : 0;
            }
            if (uses != 1) {
                problems.add(ScanProblems.of("profile.header-use", pointer, uses));
                continue;
            }
            problems.addAll(item(HeaderKey.of(item), pointer, seen));
        }
        return problems;
    }

    private static List<Problem> item(HeaderKey key, String pointer, Set<String> seen) {
        List<Problem> problems = new ArrayList<>();
        if (!seen.add(key.use() + " " + key.name() + " " + key.key().toLowerCase(Locale.ROOT))) {
            problems.add(ScanProblems.of("profile.header-twice", pointer, key.key()));
        }
        if (key.unit().isPresent() && ColumnUnit.written(key.unit().get()).isEmpty()) {
            problems.add(ScanProblems.of(
                    "profile.unit", pointer + "/unit", key.unit().get()));
        }
        if (key.deviation().isPresent() && !(Double.parseDouble(key.deviation().get()) > 0)) {
            problems.add(ScanProblems.of("profile.deviation", pointer + "/deviation"));
        }
        boolean time = key.use() == HeaderKey.Use.EXPOSURE;
        if (time
                && key.unit()
                        .flatMap(ColumnUnit::written)
                        .filter(unit -> !unit.siCode().equals("s"))
                        .isPresent()) {
            problems.add(ScanProblems.of(
                    "profile.unit-sort", pointer + "/unit", key.unit().orElse("")));
        }
        if (key.use() == HeaderKey.Use.MOMENT) {
            problems.addAll(MomentText.examine(key, pointer));
        }
        return problems;
    }
}
