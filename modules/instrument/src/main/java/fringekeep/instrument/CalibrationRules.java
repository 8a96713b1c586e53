package fringekeep.instrument;

import fringekeep.archive.json.JsonArray;
import fringekeep.archive.json.JsonObject;
import fringekeep.archive.kind.Parts;
import fringekeep.archive.problem.Problem;
import fringekeep.archive.problem.ProblemException;
import fringekeep.archive.quantity.Unit;
import fringekeep.archive.quantity.Units;
import fringekeep.archive.record.PartName;
import java.math.BigDecimal;
import java.time.Instant;
import java.util.ArrayList;
import java.util.List;
import java.util.Optional;
import java.util.OptionalDouble;

/** What is wrong with a calibration beyond its schema. */
final class CalibrationRules {
    private final List<Problem> problems = new ArrayList<>();

    private CalibrationRules() {}

    static List<Problem> examine(Parts parts) {
        CalibrationRules rules = new CalibrationRules();
        Optional<JsonObject> content = parts.get(PartName.CONTENT);
        if (content.isEmpty()) {
            rules.add("missing", "/content", "content");
        } else {
            rules.content(content.get());
        }
        return rules.problems;
    }

    private void content(JsonObject content) {
        Optional<CalibrationTarget> target = content.text("what").flatMap(CalibrationTarget::of);
        Optional<CalibrationModel> model = content.text("model").flatMap(CalibrationModel::of);
        if (target.isEmpty()) {
            add("calibration-what", "/content/what");
        }
        if (model.isEmpty()) {
            add("calibration-model", "/content/model");
        }
        valid(content.object("valid").orElse(JsonObject.EMPTY));
        if (target.isEmpty() || model.isEmpty()) {
            return;
        }
        if (!target.get().models().contains(model.get())) {
            add(
                    "model-of-what",
                    "/content/model",
                    model.get().method(),
                    target.get().code(),
                    target.get().modelCodes());
        }
        parameters(content.array("parameters"), target.get(), model.get());
        covariance(content.array("covariance"), model.get());
    }

    private void valid(JsonObject valid) {
        Optional<Instant> from = CalibrationReader.instant(valid, "from");
        Optional<Instant> to = CalibrationReader.instant(valid, "to");
        if (from.isEmpty()) {
            add("instant", "/content/valid/from");
        }
        if (valid.get("to").isPresent() && to.isEmpty()) {
            add("instant", "/content/valid/to");
        }
        if (from.isPresent() && to.isPresent() && !from.get().isBefore(to.get())) {
            add("valid-order", "/content/valid/to");
        }
    }

    private void parameters(JsonArray parameters, CalibrationTarget target, CalibrationModel model) {
        String names = String.join(", ", model.parameters());
        if (parameters.items().size() != model.parameters().size()) {
            add("parameters", "/content/parameters", model.method(), names);
            return;
        }
        for (int i = 0; i < parameters.items().size(); i++) {
            String at = "/content/parameters/" + i;
            JsonObject one = parameters.items().get(i) instanceof JsonObject object ? object : JsonObject.EMPTY;
            String name = model.parameters().get(i);
            if (!one.text("name").equals(Optional.of(name))) {
                add("parameters", at + "/name", model.method(), names);
            }
            unit(one.text("unit").orElse(""), unit(name, target), at + "/unit");
            value(one.number("value"), name, target, at + "/value");
        }
    }

    private void value(OptionalDouble value, String name, CalibrationTarget target, String at) {
        boolean anySign = name.equals("offset")
                || name.equals("curvature")
                || target == CalibrationTarget.TIME_ZERO
                || target == CalibrationTarget.CLOCK_OFFSET
                || target == CalibrationTarget.DARK_RATE
                || target == CalibrationTarget.DEAD_TIME;
        if (value.isEmpty() || (!anySign && !(value.getAsDouble() > 0))) {
            add("not-positive", at, name);
        }
        boolean mayBeNegative = target == CalibrationTarget.TIME_ZERO || target == CalibrationTarget.CLOCK_OFFSET;
        if (name.equals("value") && anySign && !mayBeNegative && value.orElse(0) < 0) {
            add("negative", at, name);
        }
    }

    /** SI unit of a parameter. */
    private static String unit(String name, CalibrationTarget target) {
        return switch (name) {
            case "scale" -> "1";
            case "curvature" -> "/" + target.unit();
            default -> target.unit();
        };
    }

    private void unit(String given, String asked, String at) {
        try {
            Unit unit = Units.parse(given);
            boolean coherent = unit.toSi(BigDecimal.ONE) == 1 && unit.toSi(BigDecimal.ZERO) == 0;
            if (!coherent || !unit.sameDimension(Units.of(asked))) {
                add("unit", at, given, asked);
            }
        } catch (ProblemException e) {
            add("unit", at, given, asked);
        }
    }

    private void covariance(JsonArray covariance, CalibrationModel model) {
        int n = model.parameters().size();
        double[] given = CalibrationReader.numbers(covariance);
        if (given.length != n * (n + 1) / 2) {
            add("covariance-length", "/content/covariance", Integer.toString(n * (n + 1) / 2), Integer.toString(n));
        } else if (!possible(given, n)) {
            add("covariance-negative", "/content/covariance");
        }
    }

    /** Whether a lower triangle is positive semidefinite: Cholesky factors with room for rounding. */
    private static boolean possible(double[] triangle, int n) {
        double[][] factor = new double[n][n];
        for (int i = 0; i < n; i++) {
            double scale = Math.abs(triangle[i * (i + 1) / 2 + i]);
            for (int j = 0; j <= i; j++) {
                double rest = triangle[i * (i + 1) / 2 + j];
                for (int k = 0; k < j; k++) {
                    rest -= factor[i][k] * factor[j][k];
                }
                double room = 1e-9 * Math.sqrt(scale * Math.abs(triangle[j * (j + 1) / 2 + j]));
                if (i == j && !(rest >= -1e-9 * scale)) {
                    return false;
                }
                if (i == j) {
                    factor[i][i] = Math.sqrt(Math.max(0, rest));
                } else if (factor[j][j] > 0) {
                    factor[i][j] = rest / factor[j][j];
                } else if (Math.abs(rest) > room) {
                    return false;
                }
            }
        }
        return true;
    }

    private void add(String code, String where, String... arguments) {
        problems.add(Trouble.at(code, where, arguments));
    }
}
