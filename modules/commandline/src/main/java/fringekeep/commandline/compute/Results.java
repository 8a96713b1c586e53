package fringekeep.commandline.compute;

import fringekeep.archive.json.Json;
import fringekeep.archive.json.JsonArray;
import fringekeep.archive.json.JsonObject;
import fringekeep.interferometry.statistics.Estimate;
import fringekeep.interferometry.statistics.Interval;
import java.util.ArrayList;
import java.util.Arrays;
import java.util.List;
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
     */
    public record Result(String name, Json value, Optional<Json> uncertainty, String unit) {}

    /** All results. */
    public List<Result> all() {
        return List.copyOf(all);
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
        all.add(new Result(name, json(value), Optional.empty(), unit));
    }

    void values(String name, String unit, double... values) {
        all.add(new Result(name, json(values), Optional.empty(), unit));
    }

    void estimate(String name, String unit, Estimate estimate) {
        estimate(name, unit, estimate.value(), estimate.standardUncertainty());
    }

    void estimate(String name, String unit, double value, double deviation) {
        all.add(new Result(name, json(value), Optional.of(json(deviation)), unit));
    }

    void estimate(String name, String unit, Optional<Estimate> estimate) {
        if (estimate.isPresent()) {
            estimate(name, unit, estimate.orElseThrow());
        } else {
            words(name, "not determined by the data");
        }
    }

    void estimates(String name, String unit, double[] values, double[] deviations) {
        all.add(new Result(name, json(values), Optional.of(json(deviations)), unit));
    }

    void estimates(String name, String unit, List<Estimate> estimates) {
        estimates(
                name,
                unit,
                estimates.stream().mapToDouble(Estimate::value).toArray(),
                estimates.stream().mapToDouble(Estimate::standardUncertainty).toArray());
    }

    void interval(String name, String unit, Interval interval) {
        values(name, unit, interval.low(), interval.high());
    }

    void words(String name, String words) {
        all.add(new Result(name, Json.of(words), Optional.empty(), ""));
    }

    void list(String name, List<String> words) {
        all.add(new Result(name, JsonArray.ofTexts(words), Optional.empty(), ""));
    }

    void flag(String name, boolean value) {
        all.add(new Result(name, Json.of(value), Optional.empty(), ""));
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
