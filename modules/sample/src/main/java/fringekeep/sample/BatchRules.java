package fringekeep.sample;

import fringekeep.archive.json.Json;
import fringekeep.archive.json.JsonObject;
import fringekeep.archive.json.JsonText;
import fringekeep.archive.kind.Parts;
import fringekeep.archive.problem.Problem;
import fringekeep.archive.problem.ProblemException;
import fringekeep.archive.quantity.Units;
import fringekeep.archive.record.PartName;
import java.util.ArrayList;
import java.util.EnumSet;
import java.util.HashSet;
import java.util.List;
import java.util.Optional;
import java.util.Set;

/** What is wrong with a batch beyond its schema. */
final class BatchRules {
    /** Hazards a substance can have. */
    static final Set<Caution> CAUTIONS = EnumSet.range(Caution.DUST, Caution.STATIC_SENSITIVE);

    private static final Set<String> AMOUNTS = Set.of("kg", "m3", "mol");

    private BatchRules() {}

    static List<Problem> examine(Parts parts) {
        Optional<JsonObject> content = parts.get(PartName.CONTENT);
        if (content.isEmpty()) {
            return List.of(Trouble.at("missing", "/content", "content"));
        }
        List<Problem> problems = new ArrayList<>();
        if (content.get().text("label").filter(label -> !label.isBlank()).isEmpty()) {
            problems.add(Trouble.at("label", "/content/label"));
        }
        cautions(content.get(), problems);
        content.get().object("amount").ifPresent(amount -> amount(amount, problems));
        Entered.of(content.get(), "purity")
                .filter(purity -> !(purity.si() >= 0 && purity.si() <= 1))
                .ifPresent(purity -> problems.add(Trouble.at("purity-range", "/content/purity")));
        return problems;
    }

    private static void cautions(JsonObject content, List<Problem> problems) {
        List<Json> cautions = content.array("cautions").items();
        Set<String> seen = new HashSet<>();
        for (int i = 0; i < cautions.size(); i++) {
            String code = cautions.get(i) instanceof JsonText text ? text.value() : "";
            if (Caution.of(code).filter(CAUTIONS::contains).isEmpty()) {
                problems.add(Trouble.at("caution-unknown", "/content/cautions/" + i, code, Caution.codes(CAUTIONS)));
            } else if (!seen.add(code)) {
                problems.add(Trouble.at("caution-twice", "/content/cautions/" + i, code));
            }
        }
    }

    private static void amount(JsonObject amount, List<Problem> problems) {
        String unit = amount.text("unit").orElse("");
        boolean positive = Entered.of(amount).filter(value -> value.si() > 0).isPresent();
        if (!positive || !AMOUNTS.contains(siUnit(unit))) {
            problems.add(Trouble.at("amount-unit", "/content/amount", unit));
        }
    }

    private static String siUnit(String unit) {
        try {
            return Units.parse(unit).siCode();
        } catch (ProblemException e) {
            return ""; // no unit of an amount
        }
    }
}
