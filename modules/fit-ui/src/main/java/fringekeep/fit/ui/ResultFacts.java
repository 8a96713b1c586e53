package fringekeep.fit.ui;

import fringekeep.archive.json.JsonObject;
import fringekeep.archive.quantity.Units;
import fringekeep.archive.quantity.ValueText;
import fringekeep.drawing.NumberText;
import java.util.ArrayList;
import java.util.List;
import java.util.Optional;

/** Results of a fit as rows of name and value, two digits of uncertainty. */
final class ResultFacts {
    private static final List<String> PERIODICAL = List.of("period");

    private static final double SMALLEST_P = 1e-4;

    private ResultFacts() {}

    /**
     * One row.
     *
     * @param name with its unit, as heads have it
     * @param value with its uncertainty
     * @param strong whether it is what the fit is about
     */
    record Row(String name, String value, boolean strong) {}

    /** All rows. */
    static List<Row> of(JsonObject choices, JsonObject result) {
        List<Row> rows = new ArrayList<>();
        List<String> names = result.array("estimates").texts();
        double[] values = result.array("values").numbers();
        double[] covariance = result.array("covariance").numbers();
        for (int i = 0; i < names.size(); i++) {
            if (!PERIODICAL.contains(names.get(i))) {
                double u = Math.sqrt(Math.max(0, covariance[i * (i + 1) / 2 + i]));
                rows.add(new Row(word(names.get(i)), ValueText.estimate(values[i], u), false));
            }
        }
        rows.add(new Row(word("visibility"), estimate(result, "visibility"), true));
        rows.add(new Row(word("phase"), estimate(result, "phase"), false));
        rows.add(period(choices, names, values, covariance));
        rows.add(new Row(quality(choices), ratio(choices, result), false));
        rows.add(new Row(word("p"), p(result), false));
        result.object("reference").ifPresent(reference -> {
            rows.add(new Row(word("relativeVisibility"), estimate(reference, "relativeVisibility"), true));
            rows.add(new Row(word("relativePhase"), estimate(reference, "relativePhase"), false));
        });
        result.number("upperLimit").ifPresent(limit -> {
            boolean established = result.object("visibility")
                    .map(each -> each.number("lower").orElse(0) > 0)
                    .orElse(false);
            if (!established) {
                rows.add(new Row(word("limit"), ValueText.below(limit), false));
            }
        });
        long masked = result.integer("masked").orElse(0);
        rows.add(new Row(
                word("rows"),
                ValueText.count(result.integer("rows").orElse(0))
                        + (masked > 0 ? FitWords.TEXTS.of("rows.left", masked) : ""),
                false));
        return rows;
    }

    /** Visibility, phase, quality, p. */
    static List<String> brief(JsonObject choices, JsonObject result) {
        return List.of(estimate(result, "visibility"), estimate(result, "phase"), ratio(choices, result), p(result));
    }

    private static String word(String name) {
        return FitWords.TEXTS.of("result." + name);
    }

    private static String estimate(JsonObject result, String name) {
        Optional<JsonObject> estimate = result.object(name);
        return estimate.isEmpty()
                ? "\u2013"
                : ValueText.estimate(
                        estimate.get().number("value").orElse(Double.NaN),
                        estimate.get().number("u").orElse(Double.NaN));
    }

    private static Row period(JsonObject choices, List<String> names, double[] values, double[] covariance) {
        int at = names.indexOf("period");
        if (at >= 0) {
            double u = Math.sqrt(Math.max(0, covariance[at * (at + 1) / 2 + at]));
            return new Row(word("period"), ValueText.estimate(values[at], u, Units.of("nm")), false);
        }
        JsonObject period = choices.object("period").orElse(JsonObject.EMPTY);
        double si = period.number("si").orElse(Double.NaN);
        double u = period.number("u").orElse(0);
        String value = u > 0 ? ValueText.estimate(si, u, Units.of("nm")) : ValueText.number(Math.rint(si * 1e15) / 1e6);
        return new Row(word("period.fixed"), value, false);
    }

    private static boolean likelihood(JsonObject choices) {
        return choices.text("method").orElse("").contains("poisson");
    }

    private static String quality(JsonObject choices) {
        return word(likelihood(choices) ? "deviance" : "chiSquare");
    }

    private static String ratio(JsonObject choices, JsonObject result) {
        double value =
                result.number(likelihood(choices) ? "deviance" : "chiSquare").orElse(Double.NaN);
        String shown = Double.isNaN(value) ? "\u2013" : ValueText.number(Math.rint(value * 10) / 10);
        return shown + " / "
                + ValueText.count(result.integer("degreesOfFreedom").orElse(0));
    }

    private static String p(JsonObject result) {
        double p = result.number("p").orElse(Double.NaN);
        return Double.isNaN(p) ? "\u2013" : p < SMALLEST_P ? ValueText.below(SMALLEST_P) : NumberText.significant(p, 2);
    }
}
