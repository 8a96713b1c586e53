package fringekeep.commandline.compute;

import fringekeep.archive.json.Json;
import fringekeep.archive.json.JsonArray;
import fringekeep.archive.json.JsonNumber;
import fringekeep.archive.problem.Problem;
import fringekeep.archive.problem.ProblemException;
import java.util.ArrayList;
import java.util.Arrays;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;
import java.util.Optional;

/**
 * Carries the standard uncertainties of inputs to results, to first order and for independent inputs.
 *
 * <p>Source: JCGM 100:2008, 5.1.2 with the numerical coefficients of 5.1.3, note 2: Z = [f(x + u) &minus; f(x &minus; u)] / 2
 * for each input, combined as the root of the sum of squares. Inputs whose uncertainty the method itself uses (weights of a
 * fit, a known background) are in the result's own uncertainty already and are not carried a second time; the own part and the
 * carried ones are combined. Where the method refuses x + u or x &minus; u, the other side alone counts.
 */
final class Propagation {
    private static final int MOST_INPUTS = 4000;

    private final Method method;
    private final Inputs nominal;

    Propagation(Method method, Inputs nominal) {
        this.method = method;
        this.nominal = nominal;
    }

    /** One stated uncertainty: where it stands and its size. */
    private record Moved(String path, double u) {}

    /** Combines; the results must be those of the nominal inputs. */
    void carry(Results results) throws ProblemException {
        List<Moved> moved = new ArrayList<>();
        nominal.eachUncertainty("", (path, u) -> moved.add(new Moved(path, u)));
        if (moved.isEmpty()) {
            return;
        }
        if (moved.size() > MOST_INPUTS) {
            throw new ProblemException(new Problem(
                    "compute.too-many-uncertainties",
                    moved.size() + " inputs state an uncertainty the method does not use itself; at most " + MOST_INPUTS
                            + " are carried to results.",
                    method.name(),
                    "Leave \"u\" away where it does not matter, or bin the data first."));
        }
        Map<String, List<Results.Share>> shares = new LinkedHashMap<>();
        for (Moved one : moved) {
            carry(one, results, shares);
        }
        results.combine(shares);
    }

    private void carry(Moved one, Results results, Map<String, List<Results.Share>> shares) throws ProblemException {
        Optional<Results> up = at(one, 1);
        Optional<Results> down = at(one, -1);
        if (up.isEmpty() && down.isEmpty()) {
            throw new ProblemException(new Problem(
                    "compute.not-carried",
                    "The uncertainty of " + one.path + " cannot be carried to the results: " + method.name()
                            + " refuses the input moved by it either way.",
                    one.path,
                    "Leave \"u\" away if the input is exact, or give a smaller one."));
        }
        for (Results.Result result : results.all()) {
            if (!result.carried()) {
                continue;
            }
            double[] middle = numbers(result);
            double[] change = change(result, middle, up, down);
            if (Arrays.stream(change).anyMatch(c -> c != 0)) {
                shares.computeIfAbsent(result.name(), name -> new ArrayList<>())
                        .add(new Results.Share(one.path, change));
            }
        }
    }

    private static double[] change(
            Results.Result result, double[] middle, Optional<Results> up, Optional<Results> down) {
        double[] high = side(result, middle, up);
        double[] low = side(result, middle, down);
        double[] change = new double[middle.length];
        double sides = up.isPresent() && down.isPresent() ? 2 : 1;
        for (int k = 0; k < change.length; k++) {
            change[k] = high.length == middle.length && low.length == middle.length
                    ? turned(result, high[k], low[k]) / sides
                    : Double.NaN;
        }
        return change;
    }

    /** The result's numbers on one side; the middle ones where the method refused, none where it gave no such result. */
    private static double[] side(Results.Result result, double[] middle, Optional<Results> moved) {
        if (moved.isEmpty()) {
            return middle;
        }
        return moved.orElseThrow()
                .named(result.name())
                .map(Propagation::numbers)
                .orElse(new double[0]);
    }

    /** Angles that both lie within one turn around 0 are taken the short way round. */
    private static double turned(Results.Result result, double high, double low) {
        double difference = high - low;
        boolean angles = result.unit().equals("rad") && Math.abs(high) <= Math.PI && Math.abs(low) <= Math.PI;
        if (angles && Math.abs(difference) > Math.PI) {
            return difference - 2 * Math.PI * Math.signum(difference);
        }
        return difference;
    }

    private Optional<Results> at(Moved one, int side) {
        Results results = new Results();
        try {
            method.body().compute(nominal.moved(one.path, side * one.u), results);
            return Optional.of(results);
        } catch (IllegalArgumentException | ProblemException refused) {
            return Optional.empty();
        }
    }

    /** The numbers of a result; NaN for words in the place of a number. */
    private static double[] numbers(Results.Result result) {
        List<Json> items = result.value() instanceof JsonArray array ? array.items() : List.of(result.value());
        return items.stream()
                .mapToDouble(item -> item instanceof JsonNumber number ? number.value() : Double.NaN)
                .toArray();
    }
}
