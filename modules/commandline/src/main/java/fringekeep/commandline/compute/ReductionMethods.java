package fringekeep.commandline.compute;

import fringekeep.archive.json.Json;
import fringekeep.archive.json.JsonObject;
import fringekeep.interferometry.nearfield.Standing;
import fringekeep.interferometry.nearfield.ThermalEmission;
import fringekeep.interferometry.nearfield.VisibilityBudget;
import fringekeep.interferometry.nearfield.VisibilityReduction;
import fringekeep.interferometry.nearfield.WeightedNodes;
import java.util.ArrayList;
import java.util.Arrays;
import java.util.List;

/** What reduces a visibility. */
final class ReductionMethods {
    private static final Field PERIOD = Field.quantity("period", "m", "266 nm", "grating period");
    private static final Field SEPARATION =
            Field.quantity("separation", "m", "105 mm", "distance between neighbouring gratings");
    private static final Field VELOCITY = Field.quantity("velocity", "m/s", "120 m/s", "velocity");

    private ReductionMethods() {}

    static List<Method> all() {
        return List.of(
                Method.of(
                        "vibration-reduction",
                        "Visibility left by sinusoidal vibration, in common or of each grating by itself",
                        ReductionMethods::vibration,
                        Field.list("amplitudes", "m", "nm", "of gratings 1, 2, 3; one for all will do", 20),
                        Field.quantity("frequency", "s-1", "180 Hz", "frequency, not angular"),
                        SEPARATION,
                        VELOCITY,
                        PERIOD),
                Method.of(
                        "alignment-reduction",
                        "Visibility left by roll of a grating and by unequal periods",
                        ReductionMethods::alignment,
                        Field.quantity("roll", "rad", "0.4 mrad", "roll about the beam axis")
                                .orNothing(),
                        Field.quantity("beamHeight", "m", "0.3 mm", "uniform").orNothing(),
                        Field.list("periods", "m", "nm", "of the three gratings", 266.05, 266, 266)
                                .orNothing(),
                        Field.quantity("beamWidth", "m", "1 mm", "uniform").orNothing(),
                        PERIOD),
                Method.of(
                        "time-mismatch-reduction",
                        "Visibility left by unequal flight times between the gratings and transverse velocities",
                        (in, out) -> out.value(
                                "factor",
                                "1",
                                VisibilityReduction.timeMismatch(
                                        in.number("transverseSpread"), in.number("mismatch"), in.number("period"))),
                        Field.quantity(
                                "transverseSpread", "m/s", "0.5 m/s", "standard deviation of transverse velocities"),
                        Field.quantity("mismatch", "s", "30 ns", "second less first flight time"),
                        PERIOD.shownAs(Json.of("78.8 nm"))),
                Method.of(
                        "inertial-phases",
                        "Fringe phases by acceleration and rotation",
                        ReductionMethods::inertial,
                        SEPARATION,
                        VELOCITY,
                        PERIOD,
                        Field.quantity("acceleration", "m/s2", "9.81 m/s2", "component along the grating vector")
                                .orNothing(),
                        Field.quantity(
                                        "rotation",
                                        "rad/s",
                                        "5.5e-5 rad/s",
                                        "component normal to beam and grating vector")
                                .orNothing()),
                Method.of(
                        "dephasing",
                        "Visibility and mean phase left of a phase φ = φ_ref (v/v_ref)^p over the velocities",
                        ReductionMethods::dephasing,
                        Field.quantity("phase", "rad", "3.0 rad", "phase at the reference velocity"),
                        Field.number("power", -2, "p: -2 for gravity and static fields, -1 for rotation"),
                        Field.quantity("referenceVelocity", "m/s", "150 m/s", "v_ref; the mean if not given")
                                .seldom(),
                        Field.quantity("velocity", "m/s", "150 m/s", "mean velocity")
                                .orNothing(),
                        Field.quantity("velocitySpread", "m/s", "15 m/s", "standard deviation")
                                .orNothing(),
                        BeamInputs.FIELDS.get(4),
                        BeamInputs.FIELDS.get(5),
                        BeamInputs.FIELDS.get(6),
                        BeamInputs.FIELDS.get(7)),
                Method.of(
                        "collision-reduction",
                        "Visibility left by collisions with residual gas",
                        (in, out) -> out.value(
                                "factor",
                                "1",
                                VisibilityReduction.collisions(
                                        in.number("pressure"),
                                        in.number("temperature"),
                                        in.number("pathLength"),
                                        in.number("crossSection"))),
                        Field.quantity("pressure", "Pa", "1e-8 mbar", "gas pressure"),
                        Field.quantity("temperature", "K", "300 K", "gas temperature"),
                        Field.quantity("pathLength", "m", "0.21 m", "from first to last grating"),
                        Field.quantity("crossSection", "m2", "2e-17 m2", "effective cross section")),
                Method.of(
                        "thermal-emission-reduction",
                        "Visibility left by thermal emission of a hot molecule; formula from memory",
                        ReductionMethods::emission,
                        Field.list(
                                "frequencies", "rad/s", "rad/s", "angular frequencies, rising", 1e14, 5e14, 1e15, 3e15),
                        Field.list(
                                "crossSections",
                                "m2",
                                "m2",
                                "absorption cross sections there",
                                1e-23,
                                2e-22,
                                1e-21,
                                1e-20),
                        Field.quantity("heatCapacity", "J/K", "2.8e-21 J/K", "of one molecule"),
                        Field.quantity("temperature", "K", "1500 K", "internal temperature at grating 1"),
                        Field.quantity("mass", "kg", "840 u", "mass"),
                        SEPARATION,
                        VELOCITY,
                        PERIOD),
                Method.of(
                        "visibility-budget",
                        "Every reduction of a visibility, and what dominates",
                        ReductionMethods::budget,
                        Field.number("ideal", 0.45, "visibility without reductions"),
                        Field.group(
                                "reductions",
                                "causes with what they leave",
                                List.of(
                                        Field.text("cause", "vibration", "what reduces"),
                                        Field.number("factor", 0.95, "visibility left, 0 to 1"),
                                        Field.choice(
                                                "standing", Standing.class, "how well the formula is established")),
                                cause("vibration", 0.95),
                                cause("roll", 0.70),
                                cause("collisions", 0.98))));
    }

    private static JsonObject cause(String words, double factor) {
        return JsonObject.EMPTY
                .with("cause", words)
                .with("factor", Json.of(factor))
                .with("standing", "derived");
    }

    private static void vibration(Inputs in, Results out) {
        double[] given = in.numbers("amplitudes");
        double[] amplitudes = {given[0], given[given.length > 2 ? 1 : 0], given[given.length > 2 ? 2 : 0]};
        double period = in.number("period");
        double time = in.number("separation") / in.number("velocity");
        double common = VisibilityReduction.commonVibration(amplitudes[0], in.number("frequency"), time, period);
        out.value("commonMode", "1", common);
        double each = VisibilityReduction.independentVibration(amplitudes[0], amplitudes[1], amplitudes[2], period);
        out.value("independent", "1", each);
        out.value("secondGratingOnly", "1", VisibilityReduction.independentVibration(0, amplitudes[1], 0, period));
    }

    private static void alignment(Inputs in, Results out) {
        double period = in.number("period");
        if (in.has("roll")) {
            double height = in.number("beamHeight");
            out.value("rollOfOuterGrating", "1", VisibilityReduction.outerRoll(in.number("roll"), height, period));
            out.value("rollOfCentreGrating", "1", VisibilityReduction.centreRoll(in.number("roll"), height, period));
        }
        if (in.has("periods")) {
            double[] periods = in.numbers("periods");
            if (periods.length != 3) {
                throw new IllegalArgumentException("three gratings have three periods, not " + periods.length);
            }
            out.value(
                    "periodMismatch",
                    "1",
                    VisibilityReduction.periodMismatch(periods[0], periods[1], periods[2], in.number("beamWidth")));
        }
    }

    private static void inertial(Inputs in, Results out) {
        double length = in.number("separation");
        double velocity = in.number("velocity");
        double period = in.number("period");
        if (in.has("acceleration")) {
            double time = length / velocity;
            out.value(
                    "accelerationPhase",
                    "rad",
                    VisibilityReduction.accelerationPhase(in.number("acceleration"), time, period));
        }
        if (in.has("rotation")) {
            out.value(
                    "rotationPhase",
                    "rad",
                    VisibilityReduction.rotationPhase(in.number("rotation"), length, velocity, period));
        }
    }

    private static void dephasing(Inputs in, Results out) {
        WeightedNodes velocities = BeamInputs.velocities(in);
        double reference = in.has("referenceVelocity")
                ? in.number("referenceVelocity")
                : in.number("velocity", velocities.mean(v -> v));
        VisibilityReduction.Dephasing left =
                VisibilityReduction.dephasing(in.number("phase"), reference, in.number("power"), velocities);
        out.value("factor", "1", left.factor());
        out.value("meanPhase", "rad", left.phase());
    }

    private static void emission(Inputs in, Results out) {
        double[] frequencies = in.numbers("frequencies");
        double[] crossSections = in.numbers("crossSections");
        if (frequencies.length != crossSections.length || frequencies.length < 2) {
            throw new IllegalArgumentException(
                    frequencies.length + " frequencies and " + crossSections.length + " cross sections");
        }
        ThermalEmission emission =
                new ThermalEmission(omega -> between(frequencies, crossSections, omega), in.number("heatCapacity"));
        double temperature = in.number("temperature");
        double time = in.number("separation") / in.number("velocity");
        out.value("factor", "1", emission.factor(temperature, time, in.number("mass"), in.number("period")));
        out.value("photonRate", "s-1", emission.rate(temperature));
        out.value("power", "W", emission.power(temperature));
        out.words("standing", Field.word(ThermalEmission.STANDING));
    }

    /** Linear between the given frequencies, the end value outside above, in proportion to frequency below. */
    private static double between(double[] places, double[] values, double place) {
        if (place <= places[0]) {
            return values[0] * place / places[0];
        }
        int upper = Arrays.binarySearch(places, place);
        upper = upper >= 0 ? upper : -upper - 1;
        if (upper >= places.length) {
            return values[values.length - 1];
        }
        double part = (place - places[upper - 1]) / (places[upper] - places[upper - 1]);
        return values[upper - 1] + part * (values[upper] - values[upper - 1]);
    }

    private static void budget(Inputs in, Results out) {
        List<VisibilityBudget.Entry> entries = new ArrayList<>();
        for (Inputs one : in.groups("reductions")) {
            entries.add(new VisibilityBudget.Entry(
                    one.word("cause", ""), one.number("factor"), one.choice("standing", Standing.DERIVED)));
        }
        VisibilityBudget budget = new VisibilityBudget(in.number("ideal"), entries);
        out.value("expected", "1", budget.expected());
        out.value("reduction", "1", budget.reduction());
        out.list(
                "causesByShare",
                budget.byShare().stream().map(share -> share.entry().cause()).toList());
        out.values(
                "shares",
                "1",
                budget.byShare().stream()
                        .mapToDouble(VisibilityBudget.Share::share)
                        .toArray());
    }
}
