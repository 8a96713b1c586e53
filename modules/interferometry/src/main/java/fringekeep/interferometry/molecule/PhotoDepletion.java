package fringekeep.interferometry.molecule;

import fringekeep.interferometry.constants.Codata2018;
import fringekeep.interferometry.nearfield.BeamEnsemble;
import fringekeep.interferometry.nearfield.LightStrength;
import java.util.List;

/**
 * Cross section for removal from the beam by one photon, from the transmission against laser power or fluence.
 *
 * <p>Transmission = T0 &lt;exp(-&sigma; g)&gt;, g the photons per area a molecule meets: for a running Gaussian beam
 * &radic;(2/&pi;) &lambda; P e^(-2y&sup2;/w&sup2;)/(h c w v), for a pulse &lambda; F/(hc). Averages over speed and
 * height are taken of the transmission, not of its exponent.
 */
public final class PhotoDepletion {
    private PhotoDepletion() {}

    /**
     * Fits transmission against the power of a running beam that crosses the molecular beam.
     *
     * @param data       transmissions against power (W)
     * @param wavelength laser wavelength (m)
     * @param waist      1/e&sup2; intensity radius across the molecular beam (m)
     * @param beam       speeds and heights (masses do not matter)
     * @return {@link Parameter#DEPLETION_CROSS_SECTION} and {@link Parameter#UNDISTURBED_TRANSMISSION}
     */
    public static FitOutcome fitPower(MeasuredCurve data, double wavelength, double waist, BeamEnsemble beam) {
        int heights = beam.heights().size();
        double[] factors = new double[beam.velocities().size() * heights];
        double[] weights = new double[factors.length];
        for (int i = 0; i < beam.velocities().size(); i++) {
            double onAxis = LightStrength.runningPhotons(
                    1.0, wavelength, 1.0, waist, beam.velocities().value(i));
            for (int k = 0; k < heights; k++) {
                factors[i * heights + k] =
                        onAxis * LightStrength.profile(beam.heights().value(k), waist);
                weights[i * heights + k] =
                        beam.velocities().weight(i) * beam.heights().weight(k);
            }
        }
        return fit(data, factors, weights);
    }

    /**
     * Fits transmission against the fluence of a homogeneous pulse.
     *
     * @param data       transmissions against fluence (J/m^2)
     * @param wavelength laser wavelength (m)
     * @return {@link Parameter#DEPLETION_CROSS_SECTION} and {@link Parameter#UNDISTURBED_TRANSMISSION}
     */
    public static FitOutcome fitFluence(MeasuredCurve data, double wavelength) {
        double photons = wavelength / (Codata2018.PLANCK_CONSTANT * Codata2018.SPEED_OF_LIGHT);
        return fit(data, new double[] {photons}, new double[] {1.0});
    }

    private static FitOutcome fit(MeasuredCurve data, double[] factors, double[] weights) {
        if (data.size() < 2) {
            return new FitRefused(FitRefused.Reason.TOO_FEW_POINTS, "cross section and transmission need two settings");
        }
        double largest = 0.0;
        for (double factor : factors) {
            largest = Math.max(largest, factor * data.largestPlace());
        }
        double[] start = {0.5 / Math.max(largest, Double.MIN_NORMAL), Math.max(1e-3, data.value(0))};
        return SmoothFit.fit(
                new Curve(data, factors, weights),
                data,
                start,
                List.of(Parameter.DEPLETION_CROSS_SECTION, Parameter.UNDISTURBED_TRANSMISSION));
    }

    private record Curve(MeasuredCurve data, double[] factors, double[] weights) implements CurveModel {
        @Override
        public int parameters() {
            return 2;
        }

        @Override
        public void evaluate(double[] parameters, double[] values, double[][] jacobian) {
            for (int k = 0; k < values.length; k++) {
                double left = 0.0;
                double slope = 0.0;
                for (int q = 0; q < factors.length; q++) {
                    double dose = factors[q] * data.place(k);
                    double part = weights[q] * StrictMath.exp(-parameters[0] * dose);
                    left += part;
                    slope -= dose * part;
                }
                values[k] = parameters[1] * left;
                jacobian[k][0] = parameters[1] * slope;
                jacobian[k][1] = left;
            }
        }
    }
}
