package fringekeep.drawing;

import java.math.BigDecimal;
import java.util.ArrayList;
import java.util.List;
import java.util.function.ToDoubleFunction;

/**
 * Places and words of the ticks of an axis.
 *
 * @param values where
 * @param labels what is written there
 * @param exponent power of ten taken out of all labels and written with the unit, 0 = none
 */
record Ticks(double[] values, List<String> labels, int exponent) {
    private static final int[] STEPS = {1, 2, 5};

    /** The finest ticks whose labels keep apart: {@code room} says how much length a label needs. */
    static Ticks of(Scale scale, ToDoubleFunction<String> room) {
        return scale.logarithmic() ? ratios(scale, room) : steps(scale, room);
    }

    private static Ticks steps(Scale scale, ToDoubleFunction<String> room) {
        double length = Math.abs(scale.end() - scale.start());
        double span = scale.to() - scale.from();
        int exponent = common(Math.max(Math.abs(scale.from()), Math.abs(scale.to())));
        int power = (int) StrictMath.floor(StrictMath.log10(span)) - 2;
        Ticks coarsest = new Ticks(new double[0], List.of(), exponent);
        for (int i = 0; i < 12; i++) {
            BigDecimal step = BigDecimal.valueOf(STEPS[i % 3]).scaleByPowerOfTen(power + i / 3);
            if (span / step.doubleValue() > 400) {
                continue;
            }
            Ticks ticks = every(step, scale, exponent);
            double widest = ticks.labels.stream().mapToDouble(room).max().orElse(0);
            coarsest = ticks.values.length >= 2 ? ticks : coarsest;
            if (step.doubleValue() / span * length >= widest) {
                return ticks;
            }
        }
        return coarsest.thinned();
    }

    private static Ticks every(BigDecimal step, Scale scale, int exponent) {
        long first = (long) Math.ceil(scale.from() / step.doubleValue() - 1e-9);
        long last = (long) Math.floor(scale.to() / step.doubleValue() + 1e-9);
        int decimals = Math.max(0, step.stripTrailingZeros().scale() + exponent);
        List<Double> values = new ArrayList<>();
        List<String> labels = new ArrayList<>();
        for (long k = first; k <= last; k++) {
            BigDecimal exact = step.multiply(BigDecimal.valueOf(k));
            values.add(exact.doubleValue());
            labels.add(NumberText.fixed(exact.scaleByPowerOfTen(-exponent).doubleValue(), decimals));
        }
        return new Ticks(values.stream().mapToDouble(Double::doubleValue).toArray(), labels, exponent);
    }

    /** Powers of ten are taken out below a thousandth and from a hundred thousand on, in threes. */
    private static int common(double largest) {
        if (largest == 0) {
            return 0;
        }
        int exponent = (int) StrictMath.floor(StrictMath.log10(largest));
        return exponent >= 5 || exponent <= -3 ? Math.floorDiv(exponent, 3) * 3 : 0;
    }

    private static Ticks ratios(Scale scale, ToDoubleFunction<String> room) {
        int low = (int) StrictMath.floor(StrictMath.log10(scale.from()));
        int high = (int) StrictMath.ceil(StrictMath.log10(scale.to()));
        List<Double> values = new ArrayList<>();
        List<String> labels = new ArrayList<>();
        double before = Double.NaN;
        for (int decade = low; decade <= high; decade++) {
            for (int step : high - low <= 2 ? STEPS : new int[] {1}) {
                double value =
                        BigDecimal.valueOf(step).scaleByPowerOfTen(decade).doubleValue();
                String label = Math.abs(decade) <= 3
                        ? NumberText.significant(value, 1)
                        : (step == 1 ? "10" : step + " \u00D7 10") + NumberText.superscript(decade);
                double place = scale.holds(value) ? scale.place(value) : Double.NaN;
                if (!Double.isNaN(place) && !(Math.abs(place - before) < room.applyAsDouble(label))) {
                    values.add(value);
                    labels.add(label);
                    before = place;
                }
            }
        }
        return new Ticks(values.stream().mapToDouble(Double::doubleValue).toArray(), labels, 0);
    }

    /** Where the axis is too short for two labels, only the first is kept. */
    private Ticks thinned() {
        return values.length == 0 ? this : new Ticks(new double[] {values[0]}, List.of(labels.get(0)), exponent);
    }
}
