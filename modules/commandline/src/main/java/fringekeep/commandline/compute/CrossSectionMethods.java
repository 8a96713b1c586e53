package fringekeep.commandline.compute;

import fringekeep.archive.problem.ProblemException;
import fringekeep.interferometry.molecule.GasCollisions;
import fringekeep.interferometry.molecule.Macroscopicity;
import fringekeep.interferometry.molecule.ModificationBounds;
import fringekeep.interferometry.molecule.Parameter;
import fringekeep.interferometry.molecule.PhotoDepletion;
import fringekeep.interferometry.molecule.PropertyFit;
import fringekeep.interferometry.molecule.RecoilBeam;
import fringekeep.interferometry.nearfield.BeamEnsemble;
import fringekeep.interferometry.nearfield.LightStrength;
import fringekeep.interferometry.statistics.Estimate;
import java.util.List;

/** Cross sections from recoil, collisions and depletion; bounds on modified quantum mechanics. */
final class CrossSectionMethods {
    private static final Field WAVELENGTH = Field.quantity("wavelength", "m", "532 nm", "laser wavelength");
    private static final Field WAIST =
            Field.quantity("waist", "m", "0.8 mm", "1/e² intensity radius across the molecular beam");
    private static final Field DISTANCE =
            Field.quantity("distance", "m", "32 mm", "from the laser to the nearer outer grating");
    private static final Field PERIOD = Field.quantity("period", "m", "266 nm", "grating period");
    private static final Field POWERS = Field.list("powers", "W", "W", "laser powers", 0, 1, 2, 4, 6);

    private CrossSectionMethods() {}

    static List<Method> all() {
        return List.of(
                Method.of(
                        "recoil-effect",
                        "Visibility ratio and fringe shift by absorption from a separate running beam",
                        CrossSectionMethods::recoil,
                        BeamInputs.and(
                                Field.quantity("crossSection", "m2", "2.1e-21 m2", "absorption cross section"),
                                WAVELENGTH,
                                Field.quantity("power", "W", "1.2 W", "laser power"),
                                WAIST,
                                DISTANCE,
                                PERIOD)),
                Method.of(
                        "recoil-cross-section",
                        "Absorption cross section from visibility with and without the recoil beam, one velocity",
                        CrossSectionMethods::pair,
                        Field.quantity("visibilityWith", "1", "0.234(4)", "visibility with the laser"),
                        Field.quantity("visibilityWithout", "1", "0.250(4)", "visibility without it"),
                        WAVELENGTH,
                        Field.quantity("power", "W", "1.2 W", "laser power"),
                        WAIST,
                        DISTANCE,
                        PERIOD,
                        Field.quantity("mass", "kg", "840.749 u", "mass of the molecule"),
                        Field.quantity("velocity", "m/s", "190 m/s", "velocity")),
                Method.of(
                        "recoil-fit",
                        "Absorption cross section from visibility against the power of the recoil beam",
                        (in, out) -> Fits.report(
                                beam(in).fit(in.curve("powers", "visibilities"), BeamInputs.ensemble(in)), out),
                        BeamInputs.and(
                                POWERS,
                                Field.measured(
                                        "visibilities",
                                        "1",
                                        "1",
                                        "visibilities with u",
                                        new double[] {0.250, 0.236, 0.225, 0.201, 0.181},
                                        new double[] {0.003}),
                                WAVELENGTH,
                                WAIST,
                                DISTANCE,
                                PERIOD)),
                Method.of(
                        "collision-cross-section",
                        "Effective cross section predicted for -C6/r⁶ and from a decay pressure",
                        CrossSectionMethods::collision,
                        Field.quantity("c6", "J.m6", "4.8e-77 J.m6", "C6").orNothing(),
                        Field.number("c6AtomicUnits", 500, "C6 in hartree bohr⁶, instead of c6")
                                .seldom(),
                        Field.quantity("velocity", "m/s", "190 m/s", "velocity").orNothing(),
                        Field.quantity("gasMass", "kg", "28.0134 u", "mass of a gas particle")
                                .orNothing(),
                        Field.quantity("decayPressure", "Pa", "9.0(3)e-5 Pa", "measured decay pressure")
                                .orNothing(),
                        Field.quantity("temperature", "K", "300(2) K", "gas temperature"),
                        Field.quantity("pathLength", "m", "440 mm", "from first to last grating")),
                Method.of(
                        "pressure-fit",
                        "Decay pressure and effective cross section from visibility against gas pressure",
                        CrossSectionMethods::pressure,
                        Field.list("pressures", "Pa", "Pa", "gas pressures", 1e-6, 2e-5, 5e-5, 1e-4, 2e-4),
                        Field.measured(
                                "visibilities",
                                "1",
                                "1",
                                "visibilities with u",
                                new double[] {0.301, 0.243, 0.174, 0.098, 0.033},
                                new double[] {0.006}),
                        Field.quantity("temperature", "K", "300(2) K", "gas temperature"),
                        Field.quantity("pathLength", "m", "440 mm", "from first to last grating")),
                Method.of(
                        "photo-depletion",
                        "Depletion cross section from transmission against laser power or pulse fluence",
                        CrossSectionMethods::depletion,
                        BeamInputs.and(
                                POWERS.orNothing(),
                                Field.list("fluences", "J/m2", "J/m2", "pulse fluences, instead of powers")
                                        .seldom(),
                                Field.measured(
                                        "transmissions",
                                        "1",
                                        "1",
                                        "transmissions with u",
                                        new double[] {1.00, 0.86, 0.74, 0.55, 0.40},
                                        new double[] {0.01}),
                                WAVELENGTH,
                                WAIST.orNothing())),
                Method.of(
                        "modification-bounds",
                        "What an observed visibility excludes of a modification of quantum mechanics; from memory",
                        CrossSectionMethods::bounds,
                        Field.number("confirmed", 0.5, "confirmed share of the expected visibility"),
                        Field.quantity("mass", "kg", "10123 u", "mass"),
                        Field.quantity("time", "s", "1 ms", "flight time between neighbouring gratings"),
                        PERIOD,
                        Field.list(
                                        "momentumWidths",
                                        "kg.m/s",
                                        "kg.m/s",
                                        "widths of momentum kicks",
                                        1e-30,
                                        1e-27,
                                        1e-24)
                                .orNothing(),
                        Field.list("lengths", "m", "m", "localisation lengths", 1e-9, 1e-7, 1e-5)
                                .orNothing()),
                Method.of(
                        "macroscopicity",
                        "μ = log10[|1/ln f| (M/m_e)² (t/1 s)], by the estimate for interferometers",
                        CrossSectionMethods::macroscopicity,
                        Field.number("confirmed", 0.5, "f, confirmed share of the expected visibility"),
                        Field.quantity("mass", "kg", "10123 u", "total mass"),
                        Field.quantity("time", "s", "2 ms", "coherence time")));
    }

    private static RecoilBeam beam(Inputs in) {
        return new RecoilBeam(in.number("wavelength"), in.number("waist"), in.number("distance"), in.number("period"));
    }

    private static void recoil(Inputs in, Results out) {
        RecoilBeam laser = beam(in);
        BeamEnsemble ensemble = BeamInputs.ensemble(in);
        RecoilBeam.Effect effect = laser.effect(in.number("crossSection"), in.number("power"), ensemble);
        double velocity = ensemble.velocities().mean(v -> v);
        out.value("visibilityRatio", "1", effect.visibilityRatio());
        out.value("fringeShift", "rad", effect.phaseShift());
        out.value("phasePerPhoton", "rad", laser.phasePerPhoton(in.number("mass"), velocity));
        out.value(
                "photons",
                "1",
                LightStrength.runningPhotons(
                        in.number("crossSection"),
                        in.number("wavelength"),
                        in.number("power"),
                        in.number("waist"),
                        velocity));
    }

    private static void pair(Inputs in, Results out) throws ProblemException {
        Estimate found = beam(in).crossSection(
                        in.estimate("visibilityWith"),
                        in.estimate("visibilityWithout"),
                        in.number("power"),
                        in.number("mass"),
                        in.number("velocity"))
                .orElseThrow(() -> NoResult.because(
                        "One photon moves the fringe by whole periods, so absorption leaves the visibility as it is."));
        out.estimate("crossSection", "m2", found);
    }

    private static void collision(Inputs in, Results out) {
        double temperature = in.number("temperature");
        double path = in.number("pathLength");
        if (in.has("decayPressure")) {
            Estimate exact = new Estimate(in.number("decayPressure"), 0);
            out.value(
                    "crossSection",
                    "m2",
                    GasCollisions.crossSection(exact, temperature, path).value());
        }
        if (in.has("c6") || in.has("c6AtomicUnits")) {
            double coefficient = in.has("c6AtomicUnits")
                    ? GasCollisions.coefficientFromAtomicUnits(in.number("c6AtomicUnits"))
                    : in.number("c6");
            double predicted = GasCollisions.effectiveCrossSection(
                    coefficient, in.number("velocity"), temperature, in.number("gasMass"));
            out.value("predictedCrossSection", "m2", predicted);
            out.value("predictedDecayPressure", "Pa", GasCollisions.decayPressure(predicted, temperature, path));
            out.value("totalCrossSection", "m2", GasCollisions.totalCrossSection(coefficient, in.number("velocity")));
        }
    }

    private static void pressure(Inputs in, Results out) throws ProblemException {
        PropertyFit fit = Fits.report(GasCollisions.fit(in.curve("pressures", "visibilities")), out);
        out.estimate(
                "crossSection",
                "m2",
                GasCollisions.crossSection(
                        fit.estimate(Parameter.DECAY_PRESSURE), in.number("temperature"), in.number("pathLength")));
    }

    private static void depletion(Inputs in, Results out) throws ProblemException {
        Fits.report(
                in.has("fluences")
                        ? PhotoDepletion.fitFluence(in.curve("fluences", "transmissions"), in.number("wavelength"))
                        : PhotoDepletion.fitPower(
                                in.curve("powers", "transmissions"),
                                in.number("wavelength"),
                                in.number("waist"),
                                BeamInputs.ensemble(in)),
                out);
    }

    private static void bounds(Inputs in, Results out) {
        ModificationBounds bounds = new ModificationBounds(in.number("mass"), in.number("time"), in.number("period"));
        double confirmed = in.number("confirmed");
        out.value("largestSeparation", "m", bounds.largestSeparation());
        if (in.has("momentumWidths")) {
            double[] times = in.numbers("momentumWidths");
            for (int k = 0; k < times.length; k++) {
                times[k] = bounds.coherenceTime(confirmed, times[k]);
            }
            out.values("shortestCoherenceTimes", "s", times);
        }
        if (in.has("lengths")) {
            double[] rates = in.numbers("lengths");
            for (int k = 0; k < rates.length; k++) {
                rates[k] = bounds.localisationRate(confirmed, rates[k]);
            }
            out.values("largestLocalisationRates", "s-1", rates);
        }
        out.words("standing", Field.word(ModificationBounds.STANDING));
    }

    private static void macroscopicity(Inputs in, Results out) {
        Macroscopicity found =
                Macroscopicity.interferometerEstimate(in.number("confirmed"), in.number("mass"), in.number("time"));
        out.value("macroscopicity", "1", found.value());
        out.words("definition", Field.word(found.definition()));
    }
}
