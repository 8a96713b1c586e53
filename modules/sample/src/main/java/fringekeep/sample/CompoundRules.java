package fringekeep.sample;

import fringekeep.archive.json.JsonObject;
import fringekeep.archive.kind.Parts;
import fringekeep.archive.problem.Problem;
import fringekeep.archive.problem.ProblemException;
import fringekeep.archive.record.PartName;
import java.util.ArrayList;
import java.util.List;
import java.util.Optional;
import java.util.OptionalDouble;
import java.util.OptionalLong;

/** What is wrong with a compound beyond its schema. */
final class CompoundRules {
    private CompoundRules() {}

    static List<Problem> examine(Parts parts) {
        List<Problem> problems = new ArrayList<>();
        Optional<JsonObject> choices = parts.get(PartName.CHOICES);
        if (choices.isEmpty()) {
            problems.add(Trouble.at("missing", "/choices", "choices"));
        } else {
            problems.addAll(choices(choices.get()));
        }
        parts.get(PartName.RESULT).ifPresent(result -> result(result, problems));
        parts.get(PartName.IDENTITY).ifPresent(identity -> identity(identity, problems));
        return problems;
    }

    /** What is wrong with complete choices. */
    static List<Problem> choices(JsonObject choices) {
        List<Problem> problems = new ArrayList<>();
        if (!choices.text("method").equals(Optional.of(CompoundMass.METHOD))) {
            problems.add(Trouble.at("method", "/choices/method", CompoundMass.METHOD));
        }
        OptionalLong charge = choices.integer("charge");
        if (charge.isEmpty() || Math.abs(charge.getAsLong()) > 1000) {
            problems.add(Trouble.at("charge", "/choices/charge"));
        }
        Optional<JsonObject> composition = choices.object("composition");
        if (composition.isEmpty()) {
            problems.add(Trouble.at("missing", "/choices/composition", "composition"));
            return problems;
        }
        try {
            Composition read = Composition.read(composition.get());
            if (read instanceof Composition.Molecule molecule && charge.isPresent()) {
                agree(molecule.formula().charge(), charge.getAsLong(), problems);
            }
        } catch (ProblemException e) {
            problems.addAll(e.problems());
        }
        return problems;
    }

    private static void agree(int written, long stated, List<Problem> problems) {
        if (written != 0 && written != stated) {
            problems.add(
                    Trouble.at("charge-differs", "/choices/charge", Long.toString(stated), Integer.toString(written)));
        }
    }

    private static void result(JsonObject result, List<Problem> problems) {
        OptionalDouble molar =
                result.object("molarMass").orElse(JsonObject.EMPTY).number("value");
        if (molar.isEmpty() || !(molar.getAsDouble() > 0)) {
            problems.add(Trouble.at("not-positive", "/result/molarMass/value", "molarMass"));
        }
        result.object("distribution").ifPresent(distribution -> {
            int nodes = distribution.array("nodes").items().size();
            if (nodes == 0 || nodes != distribution.array("weights").items().size()) {
                problems.add(Trouble.at("lengths", "/result/distribution/weights"));
            }
        });
    }

    private static void identity(JsonObject identity, List<Problem> problems) {
        identity.text("formula").ifPresent(formula -> {
            try {
                Formula.parse(formula);
            } catch (ProblemException e) {
                e.problems().forEach(problem -> problems.add(problem.at("/identity/formula")));
            }
        });
    }
}
