package fringekeep.commandline.compute;

import fringekeep.archive.json.Json;
import fringekeep.archive.json.JsonArray;
import fringekeep.archive.json.JsonNumber;
import fringekeep.archive.json.JsonObject;
import fringekeep.interferometry.statistics.Estimate;
import fringekeep.interferometry.statistics.Interval;
import java.util.ArrayList;
import java.util.Arrays;
import java.util.List;
import java.util.Map;
import java.util.Optional;

/** Results in the order they were given, each with its unit. Thread rule: one thread. */
public final class Results {
    private final List<Result> all = new ArrayList<>();

    /**
     * One result.
     *
     * @param name its name
     * @param value a number, numbers in a row, words or a flag
     * @param uncertainty standard uncertainty in the same shape, empty where the library gives none
     * @param unit UCUM code; empty for words
     * @param carried whether uncertainties of inputs are carried to it
     * @param shares what inputs contribute to the uncertainty
     */
    public record Result(
            String name, Json value, Optional<Json> uncertainty, String unit, boolean carried, List<Share> shares) {
        /** Copies. */
        public Result {
            shares = List.copyOf(shares);
        }
    }

    /**
     * What one input contributes to the uncertainty of a result.
     *
     * @param input path of the input
     * @param change change of the result's numbers by one standard uncertainty of the input; NaN where it has none
     */
    public record Share(String input, double[] change) {
        /** Copies. */
        public Share {
            change = change.clone();
        }

        @Override
        public double[] change() {
            return change.clone();
        }
    }

    /** All results. */
    public List<Result> all() {
        return List.copyOf(all);
    }

    /** A result by name. */
    Optional<Result> named(String name) {
        return all.stream().filter(result -> result.name().equals(name)).findFirst();
    }

    /** Adds shares of inputs to the own uncertainties, in quadrature. */
    void combine(Map<String, List<Share>> shares) {
        all.replaceAll(result -> shares.containsKey(result.name())
                ? combined(result, shares.getOrDefault(result.name(), List.of()))
                : result);
    }

    private static Result combined(Result result, List<Share> shares) {
        boolean row = result.value() instanceof JsonArray;
        double[] sums = new double[shares.get(0).change().length];
        result.uncertainty().ifPresent(own -> {
            List<Json> items = own instanceof JsonArray array ? array.items() : List.of(own);
            for (int k = 0; k < sums.length; k++) {
                sums[k] = items.get(k) instanceof JsonNumber number ? number.value() * number.value() : Double.NaN;
            }
        });
        for (Share share : shares) {
            double[] change = share.change();
            for (int k = 0; k < sums.length; k++) {
                sums[k] += change[k] * change[k];
            }
        }
        double[] deviations = Arrays.stream(sums).map(Math::sqrt).toArray();
        Json u = row ? json(deviations) : json(deviations[0]);
        return new Result(result.name(), result.value(), Optional.of(u), result.unit(), true, shares);
    }

    /** What inputs contribute to uncertainties, one object for each result and input. */
    public JsonArray budget() {
        List<Json> lines = new ArrayList<>();
        for (Result result : all) {
            for (Share share : result.shares()) {
                double[] change = share.change();
                Json size = change.length == 1 ? json(Math.abs(change[0])) : json(absolute(change));
                lines.add(JsonObject.EMPTY
                        .with("result", result.name())
                        .with("input", share.input())
                        .with("u", size)
                        .with("unit", result.unit()));
            }
        }
        return new JsonArray(lines);
    }

    private static double[] absolute(double[] values) {
        return Arrays.stream(values).map(Math::abs).toArray();
    }

    /** The results as members of an object. */
    public JsonObject json() {
        JsonObject object = JsonObject.EMPTY;
        for (Result result : all) {
            JsonObject one = JsonObject.EMPTY.with("value", result.value()).with("u", result.uncertainty());
            object = object.with(result.name(), result.unit().isEmpty() ? one : one.with("unit", result.unit()));
        }
        return object;
    }

    void value(String name, String unit, double value) {
        all.add(new Result(name, json(value), Optional.empty(), unit, true, List.of()));
    }

    /** A number that tells about data or computation, such as a p-value; no uncertainty is carried to it. */
    void bare(String name, String unit, double value) {
        all.add(new Result(name, json(value), Optional.empty(), unit, false, List.of()));
    }

    /** Such numbers in a row, such as a covariance or the ends of an interval. */
    void bare(String name, String unit, double[] values) {
        all.add(new Result(name, json(values), Optional.empty(), unit, false, List.of()));
    }

    void values(String name, String unit, double... values) {
        all.add(new Result(name, json(values), Optional.empty(), unit, true, List.of()));
    }

    void estimate(String name, String unit, Estimate estimate) {
        estimate(name, unit, estimate.value(), estimate.standardUncertainty());
    }

    void estimate(String name, String unit, double value, double deviation) {
        all.add(new Result(name, json(value), Optional.of(json(deviation)), unit, true, List.of()));
    }

    void estimate(String name, String unit, Optional<Estimate> estimate) {
        if (estimate.isPresent()) {
            estimate(name, unit, estimate.orElseThrow());
        } else {
            words(name, "not determined by the data");
        }
    }

    void estimates(String name, String unit, double[] values, double[] deviations) {
        all.add(new Result(name, json(values), Optional.of(json(deviations)), unit, true, List.of()));
    }

    /** Numbers with a scatter that tell about the computation; no uncertainty is carried to them. */
    void bareEstimates(String name, String unit, double[] values, double[] deviations) {
        all.add(new Result(name, json(values), Optional.of(json(deviations)), unit, false, List.of()));
    }

    void estimates(String name, String unit, List<Estimate> estimates) {
        estimates(
                name,
                unit,
                estimates.stream().mapToDouble(Estimate::value).toArray(),
                estimates.stream().mapToDouble(Estimate::standardUncertainty).toArray());
    }

    void interval(String name, String unit, Interval interval) {
        bare(name, unit, new double[] {interval.low(), interval.high()});
    }

    void words(String name, String words) {
        all.add(new Result(name, Json.of(words), Optional.empty(), "", false, List.of()));
    }

    void list(String name, List<String> words) {
        all.add(new Result(name, JsonArray.ofTexts(words), Optional.empty(), "", false, List.of()));
    }

    void flag(String name, boolean value) {
        all.add(new Result(name, Json.of(value), Optional.empty(), "", false, List.of()));
    }

    private static Json json(double[] values) {
        return new JsonArray(Arrays.stream(values).<Json>mapToObj(Results::json).toList());
    }

    /** JSON has no infinities, so they are written as words. */
    private static Json json(double value) {
        if (Double.isFinite(value)) {
            return Json.of(value);
        }
        return Json.of(Double.isNaN(value) ? "undetermined" : value > 0 ? "infinite" : "minus infinite");
    }
}
