package fringekeep.scan.internal;

import fringekeep.archive.json.JsonObject;
import fringekeep.archive.problem.Problem;
import fringekeep.archive.problem.ProblemException;
import fringekeep.archive.quantity.Unit;
import fringekeep.archive.quantity.Units;
import fringekeep.scan.internal.problem.ScanProblems;
import java.util.ArrayList;
import java.util.List;
import java.util.Optional;

/** What the steps of a series must keep to beyond the schema. */
public final class SeriesSteps {
    private SeriesSteps() {}

    /** All that is wrong; pointers begin with {@code /content/steps}. */
    public static List<Problem> examine(JsonObject content) {
        List<Problem> problems = new ArrayList<>();
        List<JsonObject> steps = content.array("steps").objects();
        Optional<Unit> first = Optional.empty();
        for (int i = 0; i < steps.size(); i++) {
            String pointer = "/content/steps/" + i;
            if (steps.get(i).get("name").isEmpty()
                    && steps.get(i).get("quantity").isEmpty()) {
                problems.add(ScanProblems.of("series.step-empty", pointer));
            }
            Optional<Unit> unit = unit(steps.get(i));
            if (first.isPresent() && unit.isPresent() && !first.get().sameDimension(unit.get())) {
                problems.add(ScanProblems.of(
                        "series.step-unit",
                        pointer + "/quantity/unit",
                        first.get().code(),
                        unit.get().code()));
            }
            first = first.isPresent() ? first : unit;
        }
        return problems;
    }

    /** The archive examines quantities themselves, so an unknown unit is named there. */
    private static Optional<Unit> unit(JsonObject step) {
        try {
            Optional<String> code = step.object("quantity").flatMap(quantity -> quantity.text("unit"));
            return code.isPresent() ? Optional.of(Units.parse(code.get())) : Optional.empty();
        } catch (ProblemException e) {
            return Optional.empty();
        }
    }
}
