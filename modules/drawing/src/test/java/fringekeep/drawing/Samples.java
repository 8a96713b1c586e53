package fringekeep.drawing;

import java.util.List;
import java.util.OptionalDouble;

/** Invented pictures for the tests: a fringe with residuals, and visibility against power with two models. */
final class Samples {
    private Samples() {}

    static Picture fringe() {
        int n = 31;
        double[] x = new double[n];
        double[] counts = new double[n];
        double[] deviations = new double[n];
        double[] residuals = new double[n];
        for (int i = 0; i < n; i++) {
            x[i] = 26.6 * i;
            double model = model(x[i]);
            residuals[i] = 2 * StrictMath.sin(3.7 * i * i);
            counts[i] = Math.rint(model + residuals[i] * Math.sqrt(model));
            deviations[i] = Math.sqrt(counts[i]);
        }
        double[] fine = new double[201];
        double[] curve = new double[201];
        double[] low = new double[201];
        double[] high = new double[201];
        for (int i = 0; i < 201; i++) {
            fine[i] = 798.0 * i / 200;
            curve[i] = model(fine[i]);
            low[i] = curve[i] - 8;
            high[i] = curve[i] + 8;
        }
        Axis position = Axis.linear("position of grating 3", "nm");
        Panel top = new Panel(
                "",
                "",
                position,
                Axis.linear("counts in 10 s", ""),
                List.of(
                        new Layer.Band("", Tone.QUANTUM, fine, low, high),
                        new Layer.Ruler("", Tone.INK_SECOND, Stroke.DOTTED, true, 769.4),
                        new Layer.Curve("fit, period 266 nm", Tone.QUANTUM, Stroke.SOLID, fine, curve),
                        new Layer.Points("counts", Tone.INK, Shape.DOT, x, counts, deviations),
                        new Layer.Points(
                                "masked",
                                Tone.MASKED,
                                Shape.BAR,
                                new double[] {452.2},
                                new double[] {831},
                                new double[0])),
                1,
                true);
        Panel bottom = new Panel(
                "",
                "",
                position,
                Axis.linear("residuals", "\u03C3"),
                List.of(new Layer.Sticks("", Tone.INK, x, residuals)),
                0.28,
                false);
        return new Picture("", 130, 80, 1, List.of(top, bottom));
    }

    static Picture power() {
        int n = 121;
        double[] power = new double[n];
        double[] quantum = new double[n];
        double[] classical = new double[n];
        double[] high = new double[n];
        double[] low = new double[n];
        for (int i = 0; i < n; i++) {
            power[i] = 0.1 * i;
            quantum[i] = 0.3 * Math.abs(StrictMath.sin(power[i] / 3.4));
            classical[i] = 0.3 * Math.abs(StrictMath.sin(power[i] / 1.7));
            high[i] = quantum[i] + 0.02;
            low[i] = quantum[i] - 0.02;
        }
        double[] at = {1, 2.1, 3.2, 4.8, 5.4, 6.5, 7.3, 8.2, 9.8, 11};
        double[] v = new double[at.length];
        double[] u = new double[at.length];
        for (int i = 0; i < at.length; i++) {
            v[i] = 0.3 * Math.abs(StrictMath.sin(at[i] / 3.4)) + 0.01 * StrictMath.cos(9.0 * i);
            u[i] = 0.009;
        }
        Axis watts = Axis.linear("laser power", "W");
        Panel a = new Panel(
                "a",
                "invented compound, run 1",
                watts,
                Axis.linear("visibility", ""),
                List.of(
                        new Layer.Band("", Tone.QUANTUM, power, low, high),
                        new Layer.Curve("classical", Tone.CLASSICAL, Stroke.DASHED, power, classical),
                        new Layer.Curve("quantum", Tone.QUANTUM, Stroke.SOLID, power, quantum),
                        new Layer.Points("signal", Tone.INK, Shape.DOT, at, v, u)),
                1,
                true);
        Panel b = new Panel(
                "b",
                "pressure in the chamber",
                Axis.linear("time", "s"),
                new Axis("pressure", "Pa", true, OptionalDouble.empty(), OptionalDouble.empty()),
                List.of(new Layer.Points(
                        "",
                        Tone.SERIES_THREE,
                        Shape.TRIANGLE,
                        new double[] {0, 1000, 2000, 30000},
                        new double[] {1e-7, 3e-6, 2e-5, 4e-4},
                        new double[0])),
                1,
                false);
        return new Picture("two invented panels", 180, 70, 2, List.of(a, b));
    }

    private static double model(double x) {
        return 769.4 + 162 * StrictMath.cos(2 * Math.PI * (x - 175) / 266);
    }
}
