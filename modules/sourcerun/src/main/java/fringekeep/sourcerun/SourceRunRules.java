package fringekeep.sourcerun;

import fringekeep.archive.json.JsonArray;
import fringekeep.archive.json.JsonObject;
import fringekeep.archive.kind.Parts;
import fringekeep.archive.problem.Problem;
import fringekeep.archive.record.PartName;
import fringekeep.instrument.CautionRules;
import fringekeep.sample.Entered;
import java.util.ArrayList;
import java.util.HashSet;
import java.util.List;
import java.util.Optional;
import java.util.Set;

/** What is wrong with a source run beyond its schema. */
final class SourceRunRules {
    private final List<Problem> problems = new ArrayList<>();

    private SourceRunRules() {}

    static List<Problem> examine(Parts parts) {
        SourceRunRules rules = new SourceRunRules();
        Optional<JsonObject> content = parts.get(PartName.CONTENT);
        if (content.isEmpty()) {
            rules.add("missing", "/content", "content");
        } else {
            rules.content(content.get());
        }
        return rules.problems;
    }

    private void content(JsonObject content) {
        Set<String> names = new HashSet<>();
        JsonArray settings = content.array("settings");
        named(settings, "/content/settings", names);
        named(content.array("words"), "/content/words", names);
        for (int i = 0; i < settings.items().size(); i++) {
            if (settings.items().get(i) instanceof JsonObject one
                    && Entered.of(one, "quantity").isEmpty()) {
                add("missing", "/content/settings/" + i + "/quantity", "quantity");
            }
        }
        moment(content, "started");
        moment(content, "ended");
        SourceRunReader.time(content)
                .filter(time -> time.end().isPresent()
                        && !time.start().at().isBefore(time.end().get().at()))
                .ifPresent(time -> add("ended-early", "/content/ended"));
        if (content.get("ended").isPresent() && content.get("started").isEmpty()) {
            add("started-missing", "/content/started");
        }
        problems.addAll(CautionRules.examine(content));
    }

    private void moment(JsonObject content, String member) {
        if (content.get(member).isPresent()
                && SourceRunReader.moment(content, member).isEmpty()) {
            add("moment", "/content/" + member, member);
        }
    }

    private void named(JsonArray array, String at, Set<String> seen) {
        for (int i = 0; i < array.items().size(); i++) {
            String name = array.items().get(i) instanceof JsonObject one
                    ? one.text("name").orElse("")
                    : "";
            if (name.isBlank() || !seen.add(name)) {
                add("name", at + "/" + i + "/name", name);
            }
        }
    }

    private void add(String code, String where, String... arguments) {
        problems.add(Trouble.at(code, where, arguments));
    }
}
