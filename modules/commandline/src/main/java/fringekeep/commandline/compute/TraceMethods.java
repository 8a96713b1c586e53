package fringekeep.commandline.compute;

import fringekeep.archive.json.JsonArray;
import fringekeep.archive.problem.ProblemException;
import fringekeep.interferometry.special.SplitMix64;
import fringekeep.interferometry.statistics.Estimate;
import fringekeep.interferometry.trace.GasDamping;
import fringekeep.interferometry.trace.OscillatorFit;
import fringekeep.interferometry.trace.PowerSpectrum;
import fringekeep.interferometry.trace.RingDown;
import java.util.List;

/** Traces of a trapped particle. */
final class TraceMethods {
    private static final Field TRACE =
            Field.list("trace", "1", "1", "equally spaced samples", 0).shownAs(JsonArray.ofNumbers(oscillation()));
    private static final Field INTERVAL = Field.quantity("interval", "s", "1 us", "time between samples");
    private static final Field SEGMENT = Field.whole("segment", 1024, "samples of a segment, a power of two");

    private TraceMethods() {}

    static List<Method> all() {
        return List.of(
                Method.of(
                        "power-spectrum",
                        "One-sided power spectral density of a position trace (Welch, Hann windows)",
                        TraceMethods::spectrum,
                        TRACE,
                        INTERVAL,
                        SEGMENT),
                Method.of(
                        "oscillator-fit",
                        "Frequency, damping, temperature and calibration from the power spectrum of a trace",
                        TraceMethods::oscillator,
                        TRACE,
                        INTERVAL,
                        SEGMENT,
                        Field.quantity("lowest", "s-1", "20 kHz", "lower end of the band"),
                        Field.quantity("highest", "s-1", "200 kHz", "upper end of the band"),
                        Field.quantity("mass", "kg", "3e-18 kg", "mass of the particle")
                                .orNothing(),
                        Field.quantity("calibration", "m-1", "1e7 m-1", "trace units for each metre")
                                .orNothing(),
                        Field.quantity("temperature", "K", "295 K", "known temperature, to calibrate")
                                .orNothing()),
                Method.of(
                        "ring-down",
                        "Cooling or heating rate from the energy of an oscillator against time",
                        TraceMethods::ringDown,
                        Field.list("times", "s", "ms", "times after the change", 0, 1, 2, 4, 8, 16),
                        Field.measured(
                                "energies",
                                "1",
                                "1",
                                "energy or mean square with u, any unit",
                                new double[] {10.1, 7.4, 5.6, 3.4, 1.7, 1.1},
                                new double[] {0.2})),
                Method.of(
                        "gas-damping",
                        "Damping of a sphere by dilute gas, radius and mass from a damping",
                        TraceMethods::damping,
                        Field.quantity("pressure", "Pa", "1 mbar", "gas pressure"),
                        Field.quantity("temperature", "K", "295 K", "gas temperature"),
                        Field.quantity("gasMass", "kg", "28.97 u", "mass of a gas particle"),
                        Field.number("accommodation", GasDamping.DIFFUSE, "1 specular, 1 + π/8 diffuse")
                                .seldom(),
                        Field.quantity("density", "kg/m3", "1850 kg/m3", "of the sphere's material"),
                        Field.quantity("radius", "m", "75 nm", "of the sphere, to get the damping")
                                .orNothing(),
                        Field.quantity("damping", "rad/s", "5600(90) rad/s", "measured, to get radius and mass")
                                .orNothing()));
    }

    /** An invented trace: a damped oscillator at 80 kHz driven by noise, stepped exactly enough for an example. */
    private static double[] oscillation() {
        SplitMix64 random = new SplitMix64(5);
        double[] trace = new double[8192];
        double step = 2 * Math.PI * 80e3 * 1e-6;
        double decay = StrictMath.exp(-0.01);
        double place = 0;
        double momentum = 0;
        for (int k = 0; k < trace.length; k++) {
            double turned = decay * (place * StrictMath.cos(step) + momentum * StrictMath.sin(step));
            momentum = decay * (momentum * StrictMath.cos(step) - place * StrictMath.sin(step))
                    + 0.14 * random.nextGaussian();
            place = turned;
            trace[k] = Math.rint(1e4 * place) / 1e4;
        }
        return trace;
    }

    private static PowerSpectrum spectrumOf(Inputs in) {
        return PowerSpectrum.of(in.numbers("trace"), in.number("interval"), in.whole("segment"));
    }

    private static void spectrum(Inputs in, Results out) {
        PowerSpectrum spectrum = spectrumOf(in);
        double[] frequencies = new double[spectrum.size()];
        double[] densities = new double[frequencies.length];
        for (int k = 0; k < frequencies.length; k++) {
            frequencies[k] = spectrum.frequency(k);
            densities[k] = spectrum.density(k);
        }
        out.bare("segments", "1", spectrum.segments());
        out.bare("effectiveAverages", "1", spectrum.effectiveAverages());
        out.values("frequencies", "s-1", frequencies);
        out.values("densities", "s", densities);
    }

    private static void oscillator(Inputs in, Results out) throws ProblemException {
        OscillatorFit fit = OscillatorFit.fit(spectrumOf(in), in.number("lowest"), in.number("highest"))
                .orElseThrow(() -> NoResult.because("The band shows no resonance the fit could settle on."));
        out.estimate("angularFrequency", "rad/s", fit.angularFrequency());
        out.estimate("damping", "rad/s", fit.damping());
        out.estimate("meanSquare", "1", fit.meanSquare());
        out.estimate("floor", "s", fit.floor());
        out.bare("covariance", "", fit.covariance());
        if (in.has("mass") && in.has("calibration")) {
            out.estimate("temperature", "K", fit.temperature(in.number("mass"), in.number("calibration")));
        }
        if (in.has("mass") && in.has("temperature")) {
            out.estimate("calibration", "m-1", fit.calibration(in.number("mass"), in.number("temperature")));
        }
    }

    private static void ringDown(Inputs in, Results out) throws ProblemException {
        RingDown fit = RingDown.fit(in.numbers("times"), in.numbers("energies"), in.stated("energies"))
                .orElseThrow(() -> NoResult.because("The data show no decay within their span."));
        out.estimate("rate", "s-1", fit.rate());
        out.estimate("start", "1", fit.start());
        out.estimate("end", "1", fit.end());
        out.bare("covariance", "", fit.covariance());
        out.bare("chiSquare", "1", fit.chiSquare());
        out.bare("degreesOfFreedom", "1", fit.degreesOfFreedom());
        out.bare("pValue", "1", fit.pValue());
    }

    private static void damping(Inputs in, Results out) {
        GasDamping gas = new GasDamping(
                in.number("pressure"),
                in.number("temperature"),
                in.number("gasMass"),
                in.number("accommodation", GasDamping.DIFFUSE));
        double density = in.number("density");
        if (in.has("radius")) {
            out.value("dampingOfRadius", "rad/s", gas.damping(in.number("radius"), density));
        }
        if (in.has("damping")) {
            Estimate damping = in.estimate("damping");
            out.estimate("radius", "m", gas.radius(damping, density));
            out.estimate("mass", "kg", gas.mass(damping, density));
        }
    }
}
