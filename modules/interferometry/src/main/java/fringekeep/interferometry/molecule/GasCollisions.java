package fringekeep.interferometry.molecule;

import fringekeep.interferometry.constants.Codata2018;
import fringekeep.interferometry.special.GaussRule;
import fringekeep.interferometry.statistics.Estimate;
import java.util.List;

/**
 * Collisions with residual gas: effective cross section from visibility against pressure, and its prediction.
 *
 * <p>V = V0 exp(-p/p0), p0 = kT/(l &sigma;_eff), l the path from first to last grating (2L for equal separations),
 * every collision taking the molecule out of the fringe: K. Hornberger et al., Phys. Rev. Lett. 90, 160401 (2003).
 */
public final class GasCollisions {
    /** 2&pi; &Gamma;(3/5) cos(&pi;/5) (3&pi;/8)^(2/5), of the total cross section for an r^-6 potential. */
    private static final double R6_PREFACTOR = 2.0
            * Math.PI
            * 1.4891922488128171
            * StrictMath.cos(Math.PI / 5.0)
            * StrictMath.pow(3.0 * Math.PI / 8.0, 0.4);

    private GasCollisions() {}

    /**
     * Fits decay pressure and undisturbed visibility.
     *
     * @param data visibilities against pressure (Pa)
     * @return {@link Parameter#DECAY_PRESSURE} and {@link Parameter#UNDISTURBED_VISIBILITY}; refused if the visibility
     *     does not fall
     */
    public static FitOutcome fit(MeasuredCurve data) {
        if (data.size() < 2) {
            return new FitRefused(FitRefused.Reason.TOO_FEW_POINTS, "decay pressure and visibility need two pressures");
        }
        double unit = Math.max(data.largestPlace(), Double.MIN_NORMAL);
        double[] start = {2.0 / unit, Math.max(1e-3, data.value(0))};
        FitOutcome rate = SmoothFit.fit(
                new Decay(data), data, start, List.of(Parameter.DECAY_PRESSURE, Parameter.UNDISTURBED_VISIBILITY));
        return rate instanceof PropertyFit fit ? inverted(fit, data) : rate;
    }

    /** The solver works with 1/p0, which has no pole; the answer is p0 with the covariance carried over. */
    private static FitOutcome inverted(PropertyFit rate, MeasuredCurve data) {
        double[] values = rate.values();
        if (!(values[0] > 0.0)) {
            return new FitRefused(
                    FitRefused.Reason.NOT_DETERMINED,
                    "the visibility does not fall with pressure; p0 has no finite value");
        }
        double pressure = 1.0 / values[0];
        double slope = -pressure * pressure;
        double[] c = rate.covariance();
        double[] covariance = {slope * slope * c[0], slope * c[1], c[2]};
        PropertyFit.Solution solution = new PropertyFit.Solution(
                new double[] {pressure, values[1]}, covariance, rate.fitted(), rate.chiSquare());
        return new PropertyFit(rate.parameters(), solution, data, rate.warnings());
    }

    private record Decay(MeasuredCurve data) implements CurveModel {
        @Override
        public int parameters() {
            return 2;
        }

        @Override
        public void evaluate(double[] parameters, double[] values, double[][] jacobian) {
            for (int k = 0; k < values.length; k++) {
                double p = data.place(k);
                double left = StrictMath.exp(-p * parameters[0]);
                values[k] = parameters[1] * left;
                jacobian[k][0] = -p * values[k];
                jacobian[k][1] = left;
            }
        }
    }

    /**
     * Effective cross section of a decay pressure.
     *
     * @param decayPressure p0 (Pa)
     * @param temperature   gas temperature (K)
     * @param pathLength    path from first to last grating (m)
     * @return &sigma;_eff = kT/(l p0) (m^2)
     */
    public static Estimate crossSection(Estimate decayPressure, double temperature, double pathLength) {
        double value = Codata2018.BOLTZMANN_CONSTANT * temperature / (pathLength * decayPressure.value());
        return new Estimate(value, value * decayPressure.standardUncertainty() / decayPressure.value());
    }

    /**
     * Decay pressure of an effective cross section.
     *
     * @param crossSection &sigma;_eff (m^2)
     * @param temperature  gas temperature (K)
     * @param pathLength   path from first to last grating (m)
     * @return p0 (Pa)
     */
    public static double decayPressure(double crossSection, double temperature, double pathLength) {
        return Codata2018.BOLTZMANN_CONSTANT * temperature / (pathLength * crossSection);
    }

    /**
     * Total cross section of an attractive -C6/r^6 potential at one relative speed.
     *
     * @param coefficient C6 (J m^6), &gt; 0
     * @param speed       relative speed (m/s), &gt; 0
     * @return 8.0828 (C6/&#x127;v)^(2/5) (m^2); L. D. Landau, E. M. Lifshitz, Quantum Mechanics, section 127
     */
    public static double totalCrossSection(double coefficient, double speed) {
        return R6_PREFACTOR * StrictMath.pow(coefficient / (Codata2018.REDUCED_PLANCK_CONSTANT * speed), 0.4);
    }

    /**
     * Effective cross section of a molecule in a thermal gas, &lt;&sigma;(v_r) v_r&gt;/v, averaged over the Maxwell
     * distribution of the gas by Gauss-Legendre quadrature (relative error below 1e-10).
     *
     * @param coefficient C6 (J m^6), &gt; 0
     * @param velocity    speed of the molecule (m/s), &gt; 0
     * @param temperature gas temperature (K), &gt; 0
     * @param gasMass     mass of a gas particle (kg), &gt; 0
     * @return &sigma;_eff (m^2)
     */
    public static double effectiveCrossSection(
            double coefficient, double velocity, double temperature, double gasMass) {
        double thermal = Math.sqrt(2.0 * Codata2018.BOLTZMANN_CONSTANT * temperature / gasMass);
        double low = Math.max(0.0, velocity / thermal - 8.0);
        double high = velocity / thermal + 8.0;
        GaussRule rule = GaussRule.legendre(32);
        double[] nodes = rule.nodes();
        double[] weights = rule.weights();
        double sum = 0.0;
        for (int panel = 0; panel < 8; panel++) {
            double half = (high - low) / 16.0;
            double centre = low + (2 * panel + 1) * half;
            for (int k = 0; k < nodes.length; k++) {
                double ratio = centre + half * nodes[k];
                sum += half * weights[k] * density(ratio, velocity / thermal) * StrictMath.pow(ratio, 0.6);
            }
        }
        return totalCrossSection(coefficient, thermal) * thermal * sum / velocity;
    }

    /** Density of the relative speed x in units of the gas's most probable speed, for a molecule at speed s. */
    private static double density(double x, double s) {
        double difference = StrictMath.exp(-(x - s) * (x - s)) - StrictMath.exp(-(x + s) * (x + s));
        return x / (s * Math.sqrt(Math.PI)) * difference;
    }

    /**
     * C6 from atomic units.
     *
     * @param atomicUnits C6 (hartree bohr^6)
     * @return C6 (J m^6)
     */
    public static double coefficientFromAtomicUnits(double atomicUnits) {
        double cube = Codata2018.BOHR_RADIUS * Codata2018.BOHR_RADIUS * Codata2018.BOHR_RADIUS;
        return atomicUnits * Codata2018.HARTREE_ENERGY * cube * cube;
    }
}
