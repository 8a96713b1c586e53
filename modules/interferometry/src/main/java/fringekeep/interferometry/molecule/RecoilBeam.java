package fringekeep.interferometry.molecule;

import fringekeep.interferometry.constants.Codata2018;
import fringekeep.interferometry.nearfield.BeamEnsemble;
import fringekeep.interferometry.nearfield.LightStrength;
import fringekeep.interferometry.special.HalfTurn;
import fringekeep.interferometry.statistics.Estimate;
import java.util.List;
import java.util.Optional;

/**
 * Absorption cross section from the recoil of a separate running laser beam inside the interferometer.
 *
 * <p>At distance D from the nearer outer grating one photon moves the fringe by the phase
 * &theta; = 2&pi; D &lambda;_dB/(d &lambda;_L); the photon number is Poissonian with mean n, so the first harmonic is
 * multiplied by exp[n(e^(i&theta;) - 1)]: V/V0 = exp[-n(1 - cos &theta;)] at one speed, shift n sin &theta;. Over
 * speed, mass and height the complex factor is averaged and its modulus taken last. Source: S. Eibenberger et al.,
 * arXiv:1402.5307; formula derived and checked by explicit sums over photon numbers.
 *
 * @param wavelength laser wavelength (m)
 * @param waist      1/e&sup2; intensity radius of the laser across the molecular beam (m)
 * @param distance   distance D of the laser from the nearer outer grating (m)
 * @param period     grating period d (m)
 */
public record RecoilBeam(double wavelength, double waist, double distance, double period) {
    /** Checks the lengths. */
    public RecoilBeam {
        if (!(wavelength > 0.0 && waist > 0.0 && distance > 0.0 && period > 0.0)) {
            throw new IllegalArgumentException("wavelength " + wavelength + ", waist " + waist + ", distance "
                    + distance + " and period " + period + " m must be positive");
        }
    }

    /**
     * Fringe phase of one absorbed photon.
     *
     * @param mass     mass (kg)
     * @param velocity speed (m/s)
     * @return &theta; (rad)
     */
    public double phasePerPhoton(double mass, double velocity) {
        return 2.0 * Math.PI * halfTurnsPerPhoton(mass, velocity) / 2.0;
    }

    private double halfTurnsPerPhoton(double mass, double velocity) {
        double deBroglie = Codata2018.PLANCK_CONSTANT / (mass * velocity);
        return 2.0 * distance * deBroglie / (period * wavelength);
    }

    /**
     * Effect on the fringe.
     *
     * @param visibilityRatio V/V0
     * @param phaseShift      shift of the fringe (rad), in (-&pi;, &pi;], for light from one side; zero from both sides
     */
    public record Effect(double visibilityRatio, double phaseShift) {}

    /**
     * Effect at one speed on the laser axis.
     *
     * @param photons  mean number of absorbed photons, &ge; 0
     * @param mass     mass (kg)
     * @param velocity speed (m/s)
     * @return ratio and shift
     */
    public Effect effect(double photons, double mass, double velocity) {
        double halfTurns = halfTurnsPerPhoton(mass, velocity);
        double half = HalfTurn.sin(0.5 * halfTurns);
        double ratio = StrictMath.exp(-2.0 * photons * half * half);
        return new Effect(ratio, Math.IEEEremainder(photons * HalfTurn.sin(halfTurns), 2.0 * Math.PI));
    }

    /**
     * Effect averaged over a beam.
     *
     * @param crossSection absorption cross section (m^2)
     * @param power        laser power (W)
     * @param beam         speeds, masses, heights in the laser
     * @return ratio and shift of the averaged first harmonic
     */
    public Effect effect(double crossSection, double power, BeamEnsemble beam) {
        double[] sums = average(crossSection, power, beam);
        return new Effect(StrictMath.hypot(sums[0], sums[1]), StrictMath.atan2(sums[1], sums[0]));
    }

    /** Real and imaginary part of the mean factor, then of its derivative by the cross section. */
    private double[] average(double crossSection, double power, BeamEnsemble beam) {
        double[] sums = new double[4];
        for (int i = 0; i < beam.velocities().size(); i++) {
            double velocity = beam.velocities().value(i);
            double perArea = LightStrength.runningPhotons(1.0, wavelength, power, waist, velocity);
            for (int j = 0; j < beam.masses().size(); j++) {
                double halfTurns = halfTurnsPerPhoton(beam.masses().value(j), velocity);
                double weight = beam.velocities().weight(i) * beam.masses().weight(j);
                for (int k = 0; k < beam.heights().size(); k++) {
                    double rate = perArea * LightStrength.profile(beam.heights().value(k), waist);
                    add(sums, weight * beam.heights().weight(k), rate, rate * crossSection, halfTurns);
                }
            }
        }
        return sums;
    }

    private static void add(double[] sums, double weight, double rate, double photons, double halfTurns) {
        double half = HalfTurn.sin(0.5 * halfTurns);
        double loss = 2.0 * half * half;
        double sine = HalfTurn.sin(halfTurns);
        double size = weight * StrictMath.exp(-photons * loss);
        double real = size * StrictMath.cos(photons * sine);
        double imaginary = size * StrictMath.sin(photons * sine);
        sums[0] += real;
        sums[1] += imaginary;
        sums[2] += rate * (-loss * real - sine * imaginary);
        sums[3] += rate * (-loss * imaginary + sine * real);
    }

    /**
     * Cross section from one pair of visibilities, laser on and off, at one speed on the laser axis.
     *
     * @param with     visibility with the laser
     * @param without  visibility without it
     * @param power    laser power (W)
     * @param mass     mass (kg)
     * @param velocity speed (m/s)
     * @return cross section (m^2) with the uncertainty of both visibilities: u(n) = u(R)/(R (1 - cos &theta;)); empty
     *     if the phase per photon is a multiple of 2&pi;, where nothing is to be seen
     */
    public Optional<Estimate> crossSection(
            Estimate with, Estimate without, double power, double mass, double velocity) {
        double half = HalfTurn.sin(0.5 * halfTurnsPerPhoton(mass, velocity));
        double loss = 2.0 * half * half;
        double perArea = LightStrength.runningPhotons(1.0, wavelength, power, waist, velocity);
        if (!(loss > 0.0) || !(perArea > 0.0) || !(with.value() > 0.0) || !(without.value() > 0.0)) {
            return Optional.empty();
        }
        double photons = -StrictMath.log(with.value() / without.value()) / loss;
        double relative = StrictMath.hypot(
                with.standardUncertainty() / with.value(), without.standardUncertainty() / without.value());
        return Optional.of(new Estimate(photons / perArea, relative / (loss * perArea)));
    }

    /**
     * Fits cross section and undisturbed visibility to visibility against power.
     *
     * @param data visibilities against laser power (W)
     * @param beam speeds, masses, heights in the laser
     * @return {@link Parameter#ABSORPTION_CROSS_SECTION} and {@link Parameter#UNDISTURBED_VISIBILITY}
     */
    public FitOutcome fit(MeasuredCurve data, BeamEnsemble beam) {
        if (data.size() < 2) {
            return new FitRefused(FitRefused.Reason.TOO_FEW_POINTS, "cross section and visibility need two powers");
        }
        double unit = LightStrength.runningPhotons(
                1.0,
                wavelength,
                Math.max(data.largestPlace(), Double.MIN_NORMAL),
                waist,
                beam.velocities().value(0));
        double[] start = {0.1 / unit, Math.max(1e-3, data.value(0))};
        return SmoothFit.fit(
                new Curve(data, beam),
                data,
                start,
                List.of(Parameter.ABSORPTION_CROSS_SECTION, Parameter.UNDISTURBED_VISIBILITY));
    }

    private final class Curve implements CurveModel {
        private final MeasuredCurve data;
        private final BeamEnsemble beam;

        Curve(MeasuredCurve data, BeamEnsemble beam) {
            this.data = data;
            this.beam = beam;
        }

        @Override
        public int parameters() {
            return 2;
        }

        @Override
        public void evaluate(double[] parameters, double[] values, double[][] jacobian) {
            for (int k = 0; k < values.length; k++) {
                double[] s = average(parameters[0], data.place(k), beam);
                double size = StrictMath.hypot(s[0], s[1]);
                values[k] = parameters[1] * size;
                jacobian[k][0] = size > 0.0 ? parameters[1] * (s[0] * s[2] + s[1] * s[3]) / size : 0.0;
                jacobian[k][1] = size;
            }
        }
    }
}
