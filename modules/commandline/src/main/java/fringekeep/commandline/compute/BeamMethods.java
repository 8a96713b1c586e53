package fringekeep.commandline.compute;

import fringekeep.interferometry.beam.GravitySelector;
import fringekeep.interferometry.beam.MatterWave;
import fringekeep.interferometry.beam.Oven;
import fringekeep.interferometry.beam.ThermalSource;
import fringekeep.interferometry.beam.VelocityDistribution;
import fringekeep.interferometry.beam.VelocityLaw;
import java.util.List;

/** Waves, velocities, ovens and vacuum. */
final class BeamMethods {
    static final Field MASS = Field.quantity("mass", "kg", "720.642 u", "mass of the molecule");
    static final Field VELOCITY = Field.quantity("velocity", "m/s", "200.0(5) m/s", "velocity along the beam");
    static final Field PERIOD = Field.quantity("period", "m", "266.38 nm", "period of the grating or fringe");
    static final Field TEMPERATURE = Field.quantity("temperature", "K", "900 K", "temperature");

    private BeamMethods() {}

    static List<Method> all() {
        return List.of(
                Method.of(
                        "de-broglie",
                        "De Broglie wavelength h/(mv), Talbot length d²/λ and Talbot time md²/h",
                        BeamMethods::wave,
                        MASS,
                        VELOCITY,
                        PERIOD.orNothing()),
                Method.of(
                        "thermal-velocities",
                        "Velocities in a gas and in the flux of an effusive beam",
                        BeamMethods::thermal,
                        MASS,
                        TEMPERATURE),
                Method.of(
                        "supersonic-velocity",
                        "Velocity an ideal adiabatic expansion ends with",
                        BeamMethods::supersonic,
                        MASS,
                        TEMPERATURE,
                        Field.number("heatCapacityRatio", 1.4, "ratio γ of the heat capacities of the gas"),
                        Field.quantity("meanMass", "kg", "4.2 u", "mean mass of a seeded mixture")
                                .seldom()),
                Method.of(
                        "shifted-flux-velocities",
                        "The law vⁿ exp(-(v-v0)²/w²): mode, moments and arrival times",
                        BeamMethods::shifted,
                        Field.quantity("centre", "m/s", "180 m/s", "v0"),
                        Field.quantity("width", "m/s", "45 m/s", "w"),
                        Field.whole("power", 3, "n: 3 for flux, 2 for density").seldom(),
                        Field.choice("detector", "what the detector is sensitive to", "flux", "density"),
                        Field.quantity("flightLength", "m", "1.4 m", "flight length")
                                .orNothing()),
                Method.of(
                        "three-slit-velocity",
                        "Velocity that the free-flight parabola through three horizontal slits selects",
                        BeamMethods::slits,
                        Field.list("distances", "m", "m", "slits along the beam, rising", 0.0, 1.05, 2.38),
                        Field.list("heights", "m", "mm", "heights of the slits, upwards", 0.0, -0.0023, -0.9),
                        Field.quantity("gravity", "m/s2", "9.80665 m/s2", "acceleration of gravity")
                                .seldom(),
                        Field.quantity(
                                        "sagUncertainty",
                                        "m",
                                        "2 um",
                                        "standard uncertainty of the middle slit's height")
                                .orNothing(),
                        Field.list("openings", "m", "um", "openings of the slits", 100, 100, 100)
                                .orNothing(),
                        Field.quantity("sourceTemperature", "K", "900 K", "of the effusive source, with openings")
                                .orNothing(),
                        MASS.orNothing()),
                Method.of(
                        "oven",
                        "Vapour pressure log10(p/Pa) = A - B/T, heat of evaporation, effusion, mean free path in the vapour",
                        BeamMethods::oven,
                        Field.number("a", 11.2, "A, for pascal and the decadic logarithm"),
                        Field.quantity("b", "K", "8200 K", "B"),
                        Field.quantity("temperature", "K", "850 K", "of the oven"),
                        Field.quantity("area", "m2", "1 mm2", "area of the aperture")
                                .orNothing(),
                        MASS.orNothing(),
                        Field.quantity("diameter", "m", "1.4 nm", "collision diameter of the molecules")
                                .orNothing(),
                        Field.quantity("aperture", "m", "1 mm", "width of the aperture, for the Knudsen number")
                                .orNothing()),
                Method.of(
                        "mean-free-path",
                        "Mean free path of a beam in a residual gas",
                        BeamMethods::path,
                        Field.quantity("crossSection", "m2", "6.2e-18 m2", "collision cross section"),
                        Field.quantity("pressure", "Pa", "1e-8 mbar", "gas pressure"),
                        TEMPERATURE.shownAs(fringekeep.archive.json.Json.of("300 K")),
                        VELOCITY.orNothing(),
                        Field.quantity("gasMass", "kg", "28.0134 u", "mass of a gas particle")
                                .orNothing()),
                Method.of(
                        "vacuum-needed",
                        "Pressure at which a share of the beam passes without a collision",
                        (in, out) -> out.value(
                                "pressure",
                                "Pa",
                                Oven.pressureFor(
                                        in.number("share"),
                                        in.number("length"),
                                        in.number("crossSection"),
                                        in.number("temperature"))),
                        Field.number("share", 0.9, "share left, between 0 and 1"),
                        Field.quantity("length", "m", "2.1 m", "length of the flight"),
                        Field.quantity("crossSection", "m2", "6.2e-18 m2", "collision cross section"),
                        TEMPERATURE),
                Method.of(
                        "doppler-shift",
                        "Relative frequency shift v cos(angle)/c of an absorption line",
                        (in, out) -> out.value(
                                "relativeShift", "1", Oven.dopplerShift(in.number("velocity"), in.number("angle"))),
                        VELOCITY,
                        Field.quantity("angle", "rad", "89.5 deg", "between beam and light")));
    }

    private static void wave(Inputs in, Results out) {
        double mass = in.number("mass");
        double velocity = in.number("velocity");
        double wavelength = MatterWave.wavelength(mass, velocity);
        out.value("wavelength", "m", wavelength);
        if (in.has("period")) {
            double length = MatterWave.talbotLength(mass, velocity, in.number("period"));
            out.value("talbotLength", "m", length);
            out.value("talbotTime", "s", MatterWave.talbotTime(mass, in.number("period")));
        }
    }

    private static void thermal(Inputs in, Results out) {
        ThermalSource source = new ThermalSource(in.number("mass"), in.number("temperature"));
        out.value("gasMode", "m/s", source.gasMode());
        out.value("gasMean", "m/s", source.gasMean());
        out.value("beamMode", "m/s", source.beamMode());
        out.value("beamMean", "m/s", source.beamMean());
        out.value("beamRootMeanSquare", "m/s", source.beamRootMeanSquare());
    }

    private static void supersonic(Inputs in, Results out) {
        ThermalSource source = new ThermalSource(in.number("mass"), in.number("temperature"));
        double ratio = in.number("heatCapacityRatio");
        out.value(
                "terminalVelocity",
                "m/s",
                in.has("meanMass") ? source.seededLimit(ratio, in.number("meanMass")) : source.supersonicLimit(ratio));
    }

    private static void shifted(Inputs in, Results out) {
        VelocityLaw entered = new VelocityLaw(in.whole("power", 3), in.number("centre"), in.number("width"));
        VelocityLaw law = in.word("detector", "flux").equals("density") ? entered.seenByDensityDetector() : entered;
        out.value("mode", "m/s", law.mode());
        out.value("mean", "m/s", law.mean());
        out.value("standardDeviation", "m/s", law.standardDeviation());
        out.value("harmonicMean", "m/s", law.harmonicMean());
        if (in.has("flightLength")) {
            double length = in.number("flightLength");
            out.value("arrivalPeakTime", "s", law.arrivalPeakTime(length));
            out.value("lengthOverArrivalPeakTime", "m/s", length / law.arrivalPeakTime(length));
        }
    }

    private static void slits(Inputs in, Results out) {
        GravitySelector selector = new GravitySelector(
                in.numbers("distances"), in.numbers("heights"), in.number("gravity", GravitySelector.STANDARD_GRAVITY));
        double u = in.number("sagUncertainty", 0);
        out.estimate("velocity", "m/s", selector.velocity(u));
        out.value("heightAboveLine", "m", selector.sag());
        if (in.has("openings") && in.has("sourceTemperature") && in.has("mass")) {
            VelocityLaw source = new ThermalSource(in.number("mass"), in.number("sourceTemperature")).beam();
            VelocityDistribution passed = selector.passed(in.numbers("openings"), source, u);
            out.estimate("meanPassed", "m/s", passed.mean(), passed.meanUncertainty());
            out.value("spreadPassed", "m/s", passed.spread());
        }
    }

    private static void oven(Inputs in, Results out) {
        double temperature = in.number("temperature");
        double pressure = Oven.vapourPressure(in.number("a"), in.number("b"), temperature);
        out.value("vapourPressure", "Pa", pressure);
        out.value("enthalpy", "J/mol", Oven.enthalpy(in.number("b")));
        if (in.has("area") && in.has("mass")) {
            double rate = Oven.effusionRate(pressure, in.number("area"), in.number("mass"), temperature);
            out.value("effusionRate", "s-1", rate);
        }
        if (in.has("diameter")) {
            double path = Oven.freePathInOwnGas(in.number("diameter"), pressure, temperature);
            out.value("freePathInVapour", "m", path);
            if (in.has("aperture")) {
                out.value("knudsenNumber", "1", Oven.knudsenNumber(path, in.number("aperture")));
            }
        }
    }

    private static void path(Inputs in, Results out) {
        double crossSection = in.number("crossSection");
        double pressure = in.number("pressure");
        double temperature = in.number("temperature");
        out.value("freePathOfFastBeam", "m", Oven.freePathOfFastBeam(crossSection, pressure, temperature));
        if (in.has("velocity") && in.has("gasMass")) {
            out.value(
                    "freePath",
                    "m",
                    Oven.freePath(in.number("velocity"), in.number("gasMass"), crossSection, pressure, temperature));
        }
    }
}
