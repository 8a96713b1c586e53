package fringekeep.commandline.compute;

import fringekeep.interferometry.nearfield.BeamEnsemble;
import fringekeep.interferometry.nearfield.WeightedNodes;
import java.util.ArrayList;
import java.util.Arrays;
import java.util.List;

/** Speeds, masses and heights a model averages over, as documents give them. */
final class BeamInputs {
    private static final int SHIFTED_PANELS = 800;
    private static final int NORMAL_PANELS = 60;
    private static final int HEIGHT_POINTS = 24;
    private static final double REACH = 7;
    private static final double LOWEST = 1.0;

    /** Inputs of the beam. */
    static final List<Field> FIELDS = List.of(
            Field.quantity("mass", "kg", "1000 u", "mass of the molecule"),
            Field.quantity("massSpread", "kg", "8 u", "standard deviation of the masses, as behind a mass filter")
                    .seldom(),
            Field.quantity("velocity", "m/s", "140 m/s", "mean velocity; v0 of the shifted flux law")
                    .orNothing(),
            Field.quantity(
                            "velocitySpread",
                            "m/s",
                            "14 m/s",
                            "standard deviation; w of the shifted flux law; 0 if left out")
                    .orNothing(),
            Field.choice("velocityLaw", "normal if not given", "normal", "shifted-flux"),
            Field.quantity("lowestVelocity", "m/s", "8 m/s", "slowest velocity averaged over")
                    .seldom(),
            Field.list("velocities", "m/s", "m/s", "velocities of a measured distribution")
                    .seldom(),
            Field.list("velocityWeights", "1", "1", "their weights").seldom(),
            Field.choice("detector", "what the detector is sensitive to; flux if not given", "flux", "density"),
            Field.quantity("beamHeight", "m", "0.2 mm", "height of the beam in the light, uniform; 0 if left out")
                    .orNothing());

    private BeamInputs() {}

    static Field[] and(Field... more) {
        List<Field> fields = new ArrayList<>(Arrays.asList(more));
        fields.addAll(FIELDS);
        return fields.toArray(Field[]::new);
    }

    static BeamEnsemble ensemble(Inputs in) {
        WeightedNodes velocities = velocities(in);
        double mass = in.number("mass");
        WeightedNodes masses = in.has("massSpread")
                ? WeightedNodes.normal(mass, in.number("massSpread"), 0.01 * mass)
                : WeightedNodes.single(mass);
        double half = 0.5 * in.number("beamHeight", 0);
        WeightedNodes heights = half > 0 ? WeightedNodes.uniform(-half, half, HEIGHT_POINTS) : WeightedNodes.single(0);
        return new BeamEnsemble(
                in.word("detector", "flux").equals("density") ? velocities.dividedByValue() : velocities,
                masses,
                heights);
    }

    static WeightedNodes velocities(Inputs in) {
        if (in.has("velocities")) {
            return WeightedNodes.of(in.numbers("velocities"), in.numbers("velocityWeights"));
        }
        double velocity = in.number("velocity");
        double spread = in.number("velocitySpread", 0);
        double lowest = in.number("lowestVelocity", LOWEST);
        if (in.word("velocityLaw", "normal").equals("shifted-flux")) {
            return WeightedNodes.shiftedFlux(velocity, spread, lowest, SHIFTED_PANELS);
        }
        return spread > 0 ? normal(velocity, spread, lowest) : WeightedNodes.single(velocity);
    }

    /** Cut exactly at the lowest velocity, below which phases in 1/v have no limit. */
    private static WeightedNodes normal(double velocity, double spread, double lowest) {
        double from = Math.max(lowest, velocity - REACH * spread);
        double to = velocity + REACH * spread;
        if (!(from < to)) {
            throw new IllegalArgumentException("no velocity of " + velocity + " m/s +- " + spread
                    + " m/s lies above the lowest, " + lowest + " m/s");
        }
        return WeightedNodes.ofDensity(
                v -> StrictMath.exp(-0.5 * (v - velocity) * (v - velocity) / (spread * spread)),
                from,
                to,
                NORMAL_PANELS);
    }
}
