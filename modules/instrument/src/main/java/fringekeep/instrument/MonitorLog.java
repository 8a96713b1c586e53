package fringekeep.instrument;

import fringekeep.archive.facet.Curve;
import java.time.Duration;
import java.time.Instant;
import java.util.List;
import java.util.Optional;
import java.util.OptionalDouble;

/**
 * Slow readings against true time, as later stages ask a monitor log for them.
 *
 * @param start true time of the first row
 * @param clockDeviation standard uncertainty of the true times (s), the same for all rows
 * @param times seconds since start, one a row
 * @param series readings, each as long as the times
 */
public record MonitorLog(Instant start, double clockDeviation, double[] times, List<Series> series) {
    /** Copies and checks lengths. */
    public MonitorLog {
        times = times.clone();
        series = List.copyOf(series);
        for (Series one : series) {
            if (one.values.length != times.length) {
                throw new IllegalArgumentException(one.values.length + " readings at " + times.length + " times");
            }
        }
    }

    @Override
    public double[] times() {
        return times.clone();
    }

    /** The readings of that name. */
    public Optional<Series> series(String name) {
        return series.stream().filter(one -> one.name.equals(name)).findFirst();
    }

    /** The readings of that name against seconds since start. */
    public Optional<Curve> curve(String name) {
        return series(name).map(one -> new Curve("time", "s", times, one.name, one.unit, one.values));
    }

    /**
     * The reading at an instant, on the straight line between its neighbours.
     *
     * @return empty outside the log, and where a neighbour is absent
     */
    public OptionalDouble at(String name, Instant instant) {
        Optional<Series> readings = series(name);
        double t = Duration.between(start, instant).toNanos() / 1e9;
        if (readings.isEmpty()) {
            return OptionalDouble.empty();
        }
        double[] values = readings.get().values;
        for (int i = 0; i < times.length; i++) {
            if (times[i] == t && !Double.isNaN(values[i])) {
                return OptionalDouble.of(values[i]);
            }
            if (i > 0 && times[i - 1] < t && t < times[i]) {
                double share = (t - times[i - 1]) / (times[i] - times[i - 1]);
                double value = values[i - 1] + share * (values[i] - values[i - 1]);
                return Double.isNaN(value) ? OptionalDouble.empty() : OptionalDouble.of(value);
            }
        }
        return OptionalDouble.empty();
    }

    /** Mean of the rows from one instant to another, both included; empty where there are none. */
    public OptionalDouble mean(String name, Instant from, Instant to) {
        Optional<Series> readings = series(name);
        double first = Duration.between(start, from).toNanos() / 1e9;
        double last = Duration.between(start, to).toNanos() / 1e9;
        double sum = 0;
        int count = 0;
        for (int i = 0; i < times.length && readings.isPresent(); i++) {
            double value = readings.get().values[i];
            if (times[i] >= first && times[i] <= last && !Double.isNaN(value)) {
                sum += value;
                count++;
            }
        }
        return count == 0 ? OptionalDouble.empty() : OptionalDouble.of(sum / count);
    }

    /**
     * One column of readings.
     *
     * @param name words, such as {@code chamber pressure}
     * @param unit UCUM code (SI)
     * @param values one a row, NaN where absent
     */
    public record Series(String name, String unit, double[] values) {
        /** Copies. */
        public Series {
            values = values.clone();
        }

        @Override
        public double[] values() {
            return values.clone();
        }
    }
}
