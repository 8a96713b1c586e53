package fringekeep.archive.facet;

import fringekeep.archive.kind.Sensitivity;
import java.util.List;
import java.util.OptionalInt;

/**
 * Estimates with their covariance.
 *
 * @param names one per estimate
 * @param units UCUM codes of SI units, one per estimate
 * @param values SI
 * @param covariance statistical covariance, lower triangle by rows, n(n+1)/2 values
 * @param sensitivities how each estimate answers to shared sources
 */
public record Estimates(
        List<String> names, List<String> units, double[] values, double[] covariance, List<Sensitivity> sensitivities) {
    /** Copies and checks lengths. */
    public Estimates {
        names = List.copyOf(names);
        units = List.copyOf(units);
        values = values.clone();
        covariance = covariance.clone();
        sensitivities = List.copyOf(sensitivities);
        int n = names.size();
        if (units.size() != n || values.length != n || covariance.length != n * (n + 1) / 2) {
            throw new IllegalArgumentException(n + " names, " + units.size() + " units, " + values.length + " values, "
                    + covariance.length + " covariances");
        }
    }

    /** Position of an estimate. */
    public OptionalInt position(String name) {
        int at = names.indexOf(name);
        return at < 0 ? OptionalInt.empty() : OptionalInt.of(at);
    }

    /** Covariance of two estimates by position. */
    public double covariance(int first, int second) {
        int row = Math.max(first, second);
        return covariance[row * (row + 1) / 2 + Math.min(first, second)];
    }
}
