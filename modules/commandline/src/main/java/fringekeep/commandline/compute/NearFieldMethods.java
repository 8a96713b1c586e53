package fringekeep.commandline.compute;

import fringekeep.archive.json.Json;
import fringekeep.interferometry.beam.MatterWave;
import fringekeep.interferometry.constants.Codata2018;
import fringekeep.interferometry.nearfield.BeamInterferometer;
import fringekeep.interferometry.nearfield.Description;
import fringekeep.interferometry.nearfield.FringeSeries;
import fringekeep.interferometry.nearfield.LaserBeam;
import fringekeep.interferometry.nearfield.LightStrength;
import fringekeep.interferometry.nearfield.OpticalResponse;
import fringekeep.interferometry.nearfield.Passage;
import fringekeep.interferometry.nearfield.PowerSeriesSetup;
import fringekeep.interferometry.nearfield.RecoilKernel;
import fringekeep.interferometry.nearfield.TalbotKernel;
import fringekeep.interferometry.nearfield.ThreeGratingFringe;
import fringekeep.interferometry.nearfield.TrainGeometry;
import fringekeep.interferometry.nearfield.VisibilityAgainstPower;
import java.util.List;

/** Talbot coefficients, three-grating fringes, visibility against laser power. */
final class NearFieldMethods {
    private static final double MASS_OF_RATIOS = 1000 * Codata2018.ATOMIC_MASS_CONSTANT;
    private static final double PERIOD_OF_RATIOS = 266e-9;

    private NearFieldMethods() {}

    static List<Method> all() {
        return List.of(
                Method.of(
                        "talbot-coefficient",
                        "Talbot coefficient B_n(ξ) of a slit, light or depletion grating and its classical counterpart",
                        NearFieldMethods::coefficient,
                        Field.whole("order", 2, "n"),
                        Field.number("separation", 0.31, "ξ, coherence separation in periods"),
                        GratingInputs.KERNEL.get(0).shownAs(Json.of("light")),
                        GratingInputs.KERNEL.get(1),
                        GratingInputs.KERNEL.get(2),
                        GratingInputs.KERNEL.get(3),
                        GratingInputs.KERNEL.get(4),
                        GratingInputs.KERNEL.get(5),
                        GratingInputs.KERNEL.get(6),
                        GratingInputs.KERNEL.get(7).shownAs(Json.of("2.7 rad")),
                        GratingInputs.KERNEL.get(8),
                        GratingInputs.KERNEL.get(9),
                        Field.quantity("period", "m", "266 nm", "period, with a wall potential")
                                .seldom(),
                        Field.quantity("velocity", "m/s", "180 m/s", "velocity, with a wall potential")
                                .seldom()),
                Method.of(
                        "three-grating-fringe",
                        "Fringe behind three gratings of any sort, by flight times in Talbot times, one velocity",
                        NearFieldMethods::threeGratings,
                        Field.group("first", "grating 1", GratingInputs.KERNEL, GratingInputs.slits(0.42)),
                        Field.group("second", "grating 2", GratingInputs.KERNEL, GratingInputs.light()),
                        Field.group("third", "grating 3", GratingInputs.KERNEL, GratingInputs.slits(0.42)),
                        Field.number("firstTalbotTimes", 0.5, "flight time from grating 1 to 2 in Talbot times"),
                        Field.number("secondTalbotTimes", 0.5, "from grating 2 to 3; equal if not given")
                                .seldom(),
                        Field.number("momentumSpread", 15, "transverse momentum spread of the source in h/d")
                                .seldom(),
                        Field.quantity("period", "m", "266 nm", "period, with a wall potential")
                                .seldom(),
                        Field.quantity("velocity", "m/s", "180 m/s", "velocity, with a wall potential")
                                .seldom(),
                        Field.whole("highestHarmonic", 8, "highest harmonic of the full fringe")
                                .seldom()),
                Method.of(
                        "beam-interferometer-fringe",
                        "Fringe of a molecular beam behind three gratings, averaged over velocity, mass and height",
                        NearFieldMethods::beamFringe,
                        BeamInputs.and(
                                Field.group("first", "grating 1", GratingInputs.IN_BEAM, GratingInputs.slitsInBeam()),
                                Field.group("second", "grating 2", GratingInputs.IN_BEAM, GratingInputs.lightInBeam()),
                                Field.group("third", "grating 3", GratingInputs.IN_BEAM, GratingInputs.slitsInBeam()),
                                Field.quantity("separation", "m", "105 mm", "from grating 1 to 2"),
                                Field.quantity("secondSeparation", "m", "105 mm", "from grating 2 to 3")
                                        .seldom(),
                                Field.quantity("divergence", "rad", "1 mrad", "transverse angle spread of the source")
                                        .seldom(),
                                Field.whole("highestHarmonic", 4, "highest harmonic of the full fringe")
                                        .seldom())),
                Method.of(
                        "visibility-against-power",
                        "Averaged visibility of slit, standing light, slit at laser powers, quantum and classical",
                        NearFieldMethods::againstPower,
                        BeamInputs.and(setupAnd(
                                Field.list("powers", "W", "W", "incident laser powers", 0, 0.5, 1, 2, 4, 6, 8, 12),
                                Field.quantity(
                                        "polarizabilityVolume", "m3", "120 Ao3", "optical polarizability volume"),
                                Field.quantity("crossSection", "m2", "1e-22 m2", "absorption cross section")
                                        .seldom()))),
                Method.of(
                        "standing-light-strength",
                        "Peak phase and mean absorbed photons in a standing wave, continuous or pulsed",
                        NearFieldMethods::strength,
                        Field.quantity("polarizabilityVolume", "m3", "89 Ao3", "polarizability volume"),
                        Field.quantity("crossSection", "m2", "1.8e-21 m2", "absorption cross section"),
                        Field.quantity("wavelength", "m", "532 nm", "laser wavelength"),
                        Field.quantity("power", "W", "8 W", "incident, single-pass power")
                                .orNothing(),
                        Field.quantity("waist", "m", "0.9 mm", "1/e² intensity radius across the beam")
                                .orNothing(),
                        Field.quantity("velocity", "m/s", "150 m/s", "velocity").orNothing(),
                        Field.quantity("height", "m", "0.1 mm", "height above the laser axis")
                                .seldom(),
                        Field.quantity("fluence", "J/m2", "50 J/m2", "incident pulse energy for an area")
                                .orNothing()));
    }

    /** The set-up of a power series, and more. */
    static Field[] setupAnd(Field... more) {
        List<Field> fields = new java.util.ArrayList<>(List.of(more));
        fields.add(Field.quantity("period", "m", "266 nm", "period of all gratings"));
        fields.add(Field.number("openFraction", 0.42, "open fraction of the outer gratings"));
        fields.add(Field.quantity("separation", "m", "105 mm", "distance between neighbouring gratings"));
        fields.add(Field.quantity("waist", "m", "0.9 mm", "1/e² intensity radius of the laser across the beam"));
        fields.add(Field.quantity("wavelength", "m", "532 nm", "laser wavelength; twice the period if not given")
                .seldom());
        fields.add(Field.number("reflectivity", 1, "of the mirror").seldom());
        fields.add(Field.choice("recoil", RecoilKernel.class, "standing-mode-coherent if not given"));
        return fields.toArray(Field[]::new);
    }

    static PowerSeriesSetup setup(Inputs in) {
        LaserBeam laser = GratingInputs.laser(in, in.number("period"));
        return PowerSeriesSetup.symmetric(
                in.number("period"), in.number("openFraction"), in.number("separation"), laser);
    }

    private static void coefficient(Inputs in, Results out) {
        TalbotKernel kernel = GratingInputs.kernel(in, in.number("period", 1), in.number("velocity", 1));
        int order = in.whole("order");
        double separation = in.number("separation");
        out.value("quantum", "1", kernel.quantum(order, separation));
        out.value("classical", "1", kernel.classical(order, separation));
        out.value("transmission", "1", kernel.transmission());
        if (GratingInputs.hasWall(in) && in.word("sort", "slits").equals("slits")) {
            out.words("wallPotential", "eikonal approximation with the stated cut-off");
        }
    }

    private static void threeGratings(Inputs in, Results out) {
        double period = in.number("period", PERIOD_OF_RATIOS);
        double velocity = in.number("velocity", 1);
        double talbotTime = MatterWave.talbotTime(MASS_OF_RATIOS, period);
        double first = in.number("firstTalbotTimes");
        double spread = in.has("momentumSpread")
                ? in.number("momentumSpread") * Codata2018.PLANCK_CONSTANT / (period * MASS_OF_RATIOS)
                : Double.POSITIVE_INFINITY;
        Passage passage = new Passage(
                first * talbotTime, in.number("secondTalbotTimes", first) * talbotTime, MASS_OF_RATIOS, spread);
        TalbotKernel[] kernels = {
            GratingInputs.kernel(in.group("first"), period, velocity),
            GratingInputs.kernel(in.group("second"), period, velocity),
            GratingInputs.kernel(in.group("third"), period, velocity)
        };
        for (Description description : Description.values()) {
            ThreeGratingFringe train =
                    new ThreeGratingFringe(TrainGeometry.equal(period), description, in.whole("highestHarmonic", 8));
            report(description, train.series(kernels[0], kernels[1], kernels[2], passage), out);
        }
        out.values(
                "transmissions", "1", kernels[0].transmission(), kernels[1].transmission(), kernels[2].transmission());
    }

    private static void report(Description description, FringeSeries series, Results out) {
        String which = Field.word(description);
        out.value(which + "Visibility", "1", series.sinusoidalVisibility());
        out.value(which + "SignedVisibility", "1", series.signedVisibility());
        out.value(which + "FullVisibility", "1", series.fullVisibility());
        double[] coefficients = new double[series.highest() + 1];
        for (int l = 0; l < coefficients.length; l++) {
            coefficients[l] = series.coefficient(l);
        }
        out.values(which + "Coefficients", "1", coefficients);
        out.value(which + "MeanTransmission", "1", coefficients[0]);
    }

    private static void beamFringe(Inputs in, Results out) {
        double separation = in.number("separation");
        BeamInterferometer interferometer = new BeamInterferometer(
                GratingInputs.inBeam(in.group("first")),
                GratingInputs.inBeam(in.group("second")),
                GratingInputs.inBeam(in.group("third")),
                separation,
                in.number("secondSeparation", separation),
                in.number("divergence", Double.POSITIVE_INFINITY));
        for (Description description : Description.values()) {
            report(
                    description,
                    interferometer.fringe(BeamInputs.ensemble(in), description, in.whole("highestHarmonic", 4)),
                    out);
        }
    }

    private static void againstPower(Inputs in, Results out) {
        OpticalResponse response = new OpticalResponse(in.number("polarizabilityVolume"), in.number("crossSection", 0));
        for (Description description : Description.values()) {
            VisibilityAgainstPower model = new VisibilityAgainstPower(setup(in), BeamInputs.ensemble(in), description);
            double[] visibilities = in.numbers("powers");
            for (int k = 0; k < visibilities.length; k++) {
                visibilities[k] = model.visibility(visibilities[k], response);
            }
            out.values(Field.word(description) + "Visibilities", "1", visibilities);
        }
        out.words("recoil", in.word("recoil", Field.word(RecoilKernel.STANDING_MODE_COHERENT)));
    }

    private static void strength(Inputs in, Results out) {
        double volume = in.number("polarizabilityVolume");
        double crossSection = in.number("crossSection");
        double wavelength = in.number("wavelength");
        if (in.has("power")) {
            double power = in.number("power");
            double waist = in.number("waist");
            double velocity = in.number("velocity");
            double factor = LightStrength.profile(in.number("height", 0), waist);
            out.value("phase", "rad", factor * LightStrength.beamPhase(volume, power, waist, velocity));
            out.value(
                    "photons",
                    "1",
                    factor * LightStrength.beamPhotons(crossSection, wavelength, power, waist, velocity));
            out.value(
                    "photonsOfRunningBeam",
                    "1",
                    factor * LightStrength.runningPhotons(crossSection, wavelength, power, waist, velocity));
        }
        if (in.has("fluence")) {
            out.value("pulsePhase", "rad", LightStrength.pulsePhase(volume, in.number("fluence")));
            out.value("pulsePhotons", "1", LightStrength.pulsePhotons(crossSection, wavelength, in.number("fluence")));
        }
    }
}
