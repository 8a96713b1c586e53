package fringekeep.instrument;

import fringekeep.archive.json.Json;
import fringekeep.archive.json.JsonObject;
import fringekeep.archive.json.JsonText;
import fringekeep.archive.kind.FlatTable;
import fringekeep.archive.problem.Problem;
import fringekeep.sample.Caution;
import java.util.ArrayList;
import java.util.Collection;
import java.util.Collections;
import java.util.EnumSet;
import java.util.HashSet;
import java.util.List;
import java.util.Optional;
import java.util.Set;

/** Hazards of work at setups and sources. */
public final class CautionRules {
    /** Hazards that setups and source runs can state. */
    public static final Set<Caution> WORK = Collections.unmodifiableSet(EnumSet.of(
            Caution.CLASS_4_LASER,
            Caution.CLASS_3B_LASER,
            Caution.ULTRAVIOLET_LASER,
            Caution.INFRARED_LASER,
            Caution.HIGH_VOLTAGE,
            Caution.OVEN,
            Caution.VACUUM,
            Caution.CRYOGEN,
            Caution.GAS_UNDER_PRESSURE,
            Caution.DUST,
            Caution.TOXIC,
            Caution.NOISE,
            Caution.MAGNETIC_FIELD,
            Caution.RADIOACTIVE));

    private CautionRules() {}

    /** What is wrong with member {@code cautions} of a content. */
    public static List<Problem> examine(JsonObject content) {
        List<Problem> problems = new ArrayList<>();
        Set<String> seen = new HashSet<>();
        List<Json> cautions = content.array("cautions").items();
        for (int i = 0; i < cautions.size(); i++) {
            String at = "/content/cautions/" + i;
            String code = cautions.get(i) instanceof JsonText text ? text.value() : "";
            if (Caution.of(code).filter(WORK::contains).isEmpty()) {
                problems.add(Trouble.at("caution-unknown", at, code, Caution.codes(WORK)));
            } else if (!seen.add(code)) {
                problems.add(Trouble.at("caution-twice", at, code));
            }
        }
        return problems;
    }

    /** Cautions that a content states, in its order. */
    public static List<Caution> stated(JsonObject content) {
        return content.array("cautions").items().stream()
                .filter(JsonText.class::isInstance)
                .flatMap(item -> Caution.of(((JsonText) item).value()).stream())
                .toList();
    }

    /** A table of the usual cautions, each followed by the sentence that defers to the local rules; none for none. */
    public static List<FlatTable> table(Collection<Caution> cautions) {
        if (cautions.isEmpty()) {
            return List.of();
        }
        List<FlatTable.FlatColumn> columns = List.of(
                new FlatTable.FlatColumn("caution", "Caution", "", "Hazard stated or following from what is stated."),
                new FlatTable.FlatColumn("advice", "Usual caution", "", "Usual caution; local rules come first."));
        List<List<Optional<Object>>> rows = new ArrayList<>();
        for (Caution caution : cautions) {
            rows.add(List.of(Optional.of(caution.title()), Optional.of(caution.advice() + " " + Caution.localRules())));
        }
        return List.of(new FlatTable("cautions", columns, rows));
    }
}
