package fringekeep.interferometry.nearfield;

import fringekeep.interferometry.special.Bessel;
import fringekeep.interferometry.special.CosineSineKernel;
import fringekeep.interferometry.special.HalfTurn;
import fringekeep.interferometry.special.PiecewisePolynomial;
import fringekeep.interferometry.special.PolynomialOnDemand;
import java.util.function.DoubleUnaryOperator;
import org.jspecify.annotations.Nullable;

/**
 * Visibility of a slit - light - slit interferometer as a function of laser power, averaged over speed, mass and
 * height: V(P) = 2 |&Sigma; W_q B_n2(c_q &alpha;'P, z_q &sigma;P)|, the signed amplitude being averaged and the
 * modulus taken last.
 *
 * <p>Everything but &alpha;'P and &sigma;P is fixed at construction: W_q holds the outer gratings and the weights of
 * the ensemble, normalised by the mean transmission. Derivatives are analytic. Without absorption V depends on the one
 * number &alpha;'P alone and can be tabulated ({@link #tabulated}); the table agrees with the sum to 1e-14.
 *
 * <p>A small negative cross section is accepted, so that a fit may fall on either side of zero.
 *
 * <p>Thread rule: immutable. Cost: about 10 ns per node without, 60 ns with absorption; about 10 ns in all with the
 * table.
 */
public final class VisibilityAgainstPower {
    private static final double CELL = 0.5;
    private static final double LARGEST_TABLE_WORK = 3e7;
    private static final double VALUES_PER_CELL = 11.0;

    private final int order;
    private final double recoilSign;
    private final double[] weights;
    private final double[] odd;
    private final double[] even;
    private final double largestOdd;
    private final boolean reflectionIsPerfect;
    private final @Nullable PolynomialOnDemand table;

    /**
     * Fixes the set-up, the beam and the description.
     *
     * @param setup       gratings, distances, laser
     * @param ensemble    speeds (weighted as the detector does), masses, heights
     * @param description quantum or classical
     */
    public VisibilityAgainstPower(PowerSeriesSetup setup, BeamEnsemble ensemble, Description description) {
        Nodes nodes = new Nodes(setup, ensemble, description);
        this.order = setup.geometry().harmonic2();
        this.recoilSign = setup.laser().recoil().sign();
        this.weights = nodes.weights;
        this.odd = nodes.odd;
        this.even = nodes.even;
        this.largestOdd = nodes.largestOdd();
        this.table = null;
        this.reflectionIsPerfect = setup.laser().reflectivity() == 1.0;
    }

    private VisibilityAgainstPower(VisibilityAgainstPower model, PolynomialOnDemand table) {
        this.order = model.order;
        this.recoilSign = model.recoilSign;
        this.weights = model.weights;
        this.odd = model.odd;
        this.even = model.even;
        this.largestOdd = model.largestOdd;
        this.reflectionIsPerfect = model.reflectionIsPerfect;
        this.table = table;
    }

    /**
     * The same model with its absorption-free curve tabulated.
     *
     * @param largestProduct largest polarizability volume times power to be asked for (m^3 W); beyond it the sum is
     *     used
     * @return a model that answers absorption-free questions from the table; this model itself if the table would cost
     *     more than it saves (over 3e7 kernel values)
     */
    public VisibilityAgainstPower tabulated(double largestProduct) {
        return tabulated(largestProduct, LARGEST_TABLE_WORK / weights.length);
    }

    /**
     * The same if the table costs no more than a number of visibilities computed directly.
     *
     * @param largestProduct largest polarizability volume times power to be asked for (m^3 W)
     * @param mostValues     largest number of visibilities that may be computed for the table
     * @return a model with a table, or this model itself
     */
    public VisibilityAgainstPower tabulated(double largestProduct, double mostValues) {
        double cells = Math.ceil(largestProduct * largestOdd / CELL);
        if (!(cells >= 1.0) || cells * VALUES_PER_CELL > mostValues) {
            return this;
        }
        return new VisibilityAgainstPower(
                this, new PolynomialOnDemand(x -> phaseOnly(x / largestOdd), 0.0, CELL, (int) cells));
    }

    /**
     * Signed visibility and its derivatives at one power.
     *
     * @param signed           2 S_1/S_0; negative where the fringe is moved by half a period
     * @param byPolarizability its derivative with respect to the polarizability volume (1/m^3)
     * @param byCrossSection   its derivative with respect to the absorption cross section (1/m^2)
     */
    public record Point(double signed, double byPolarizability, double byCrossSection) {}

    /**
     * Visibility at one power.
     *
     * @param power    incident laser power (W), &ge; 0
     * @param response polarizability and cross section
     * @return |2 S_1/S_0|
     */
    public double visibility(double power, OpticalResponse response) {
        return Math.abs(signedVisibility(power, response));
    }

    /**
     * Signed visibility at one power.
     *
     * @param power    incident laser power (W), &ge; 0
     * @param response polarizability and cross section
     * @return 2 S_1/S_0
     * @throws IllegalArgumentException if the power is negative, or absorption is asked for behind an imperfect mirror
     */
    public double signedVisibility(double power, OpticalResponse response) {
        double product = requirePower(power) * response.polarizabilityVolume();
        if (response.crossSection() == 0.0) {
            return fastPhaseOnly(product);
        }
        double absorbed = absorbed(power, response);
        double sum = 0.0;
        for (int q = 0; q < weights.length; q++) {
            double z = even[q] * absorbed;
            double value = CosineSineKernel.coefficient(order, recoilSign * z, odd[q] * product, -z);
            sum = Math.fma(weights[q], value, sum);
        }
        return sum;
    }

    /**
     * Signed visibility with analytic derivatives.
     *
     * @param power    incident laser power (W), &ge; 0
     * @param response polarizability and cross section
     * @return value and derivatives; the derivative by the cross section is given at zero absorption too
     */
    public Point point(double power, OpticalResponse response) {
        double product = requirePower(power) * response.polarizabilityVolume();
        double absorbed = absorbed(power, response);
        double signed = 0.0;
        double byOdd = 0.0;
        double byEven = 0.0;
        double[] near = new double[3];
        for (int q = 0; q < weights.length; q++) {
            double z = even[q] * absorbed;
            CosineSineKernel.neighbours(order, recoilSign * z, odd[q] * product, -z, near);
            signed = Math.fma(weights[q], near[1], signed);
            byOdd = Math.fma(weights[q] * odd[q], 0.5 * (near[0] - near[2]), byOdd);
            byEven = Math.fma(weights[q] * even[q], recoilSign * 0.5 * (near[0] + near[2]) - near[1], byEven);
        }
        return new Point(signed, power * byOdd, power * byEven);
    }

    /**
     * Signed visibility without absorption and its derivative by the polarizability, from the table where there is one.
     *
     * @param power                incident laser power (W), &ge; 0
     * @param polarizabilityVolume polarizability volume (m^3)
     * @return value and derivative; the derivative by the cross section is not computed and given as zero
     */
    public Point phaseOnlyPoint(double power, double polarizabilityVolume) {
        double[] both = new double[2];
        phaseOnly(power, polarizabilityVolume, both);
        return new Point(both[0], both[1], 0.0);
    }

    /**
     * The same for many powers into arrays, as a fit asks.
     *
     * @param powers               incident laser powers (W), &ge; 0
     * @param polarizabilityVolume polarizability volume (m^3)
     * @param signed               filled with the signed visibility at each power
     * @param slopes               filled with its derivative by the polarizability volume (1/m^3)
     */
    public void phaseOnlyCurve(double[] powers, double polarizabilityVolume, double[] signed, double[] slopes) {
        if (table == null || !(polarizabilityVolume > 0.0) || !arguments(powers, polarizabilityVolume, signed)) {
            eachPhaseOnly(powers, polarizabilityVolume, signed, slopes);
            return;
        }
        table.curve(signed, signed, slopes);
        for (int k = 0; k < powers.length; k++) {
            slopes[k] = powers[k] * (slopes[k] * largestOdd);
        }
    }

    /** Places in the table; false if one lies outside. */
    private boolean arguments(double[] powers, double polarizabilityVolume, double[] arguments) {
        double end = table == null ? -1.0 : table.end();
        boolean inside = true;
        for (int k = 0; k < powers.length; k++) {
            double argument = powers[k] * polarizabilityVolume * largestOdd;
            arguments[k] = argument;
            inside &= argument >= 0.0 && argument <= end;
        }
        return inside;
    }

    private void eachPhaseOnly(double[] powers, double polarizabilityVolume, double[] signed, double[] slopes) {
        double[] both = new double[2];
        for (int k = 0; k < powers.length; k++) {
            phaseOnly(powers[k], polarizabilityVolume, both);
            signed[k] = both[0];
            slopes[k] = both[1];
        }
    }

    private void phaseOnly(double power, double polarizabilityVolume, double[] both) {
        double product = requirePower(power) * polarizabilityVolume;
        double argument = Math.abs(product) * largestOdd;
        if (table == null || argument > table.end()) {
            both[0] = phaseOnly(product);
            both[1] = power * phaseOnlySlope(product);
            return;
        }
        table.valueAndDerivative(argument, both);
        double parity = order % 2 != 0 && product < 0.0 ? -1.0 : 1.0;
        double slope = both[1] * largestOdd * Math.signum(product == 0.0 ? 1.0 : product);
        both[0] = parity * both[0];
        both[1] = parity * power * slope;
    }

    private double phaseOnlySlope(double product) {
        double slope = 0.0;
        for (int q = 0; q < weights.length; q++) {
            double c = odd[q] * product;
            slope = Math.fma(weights[q] * odd[q], 0.5 * (Bessel.j(order - 1, c) - Bessel.j(order + 1, c)), slope);
        }
        return slope;
    }

    /**
     * Signed visibility along the ray of one ratio of absorption to polarizability, tabulated for a search.
     *
     * @param crossSectionPerVolume cross section over polarizability volume (1/m), &ge; 0
     * @param largestProduct        largest polarizability volume times power (m^3 W), &gt; 0
     * @param mostValues            largest number of visibilities that may be computed for a table
     * @return signed visibility against polarizability volume times power, good to about 1e-9
     */
    public DoubleUnaryOperator alongRay(double crossSectionPerVolume, double largestProduct, double mostValues) {
        double cells = Math.ceil(largestProduct * largestOdd / CELL);
        DoubleUnaryOperator direct =
                product -> signedVisibility(1.0, new OpticalResponse(product, product * crossSectionPerVolume));
        if (!(cells >= 1.0) || cells * VALUES_PER_CELL > mostValues) {
            return direct;
        }
        PiecewisePolynomial ray =
                PiecewisePolynomial.of(x -> direct.applyAsDouble(x / largestOdd), 0.0, CELL, (int) cells);
        return product -> {
            double x = product * largestOdd;
            return x <= ray.end() ? ray.value(x) : direct.applyAsDouble(product);
        };
    }

    /**
     * Mean argument of the grating kernel per polarizability volume and power, the natural unit of a search.
     *
     * @return &Sigma; |W_q c_q| / &Sigma; |W_q| (1/(m^3 W))
     */
    public double meanArgumentFactor() {
        double sum = 0.0;
        double total = 0.0;
        for (int q = 0; q < weights.length; q++) {
            sum += Math.abs(weights[q] * odd[q]);
            total += Math.abs(weights[q]);
        }
        return sum / total;
    }

    /**
     * Mean absorption exponent per cross section and power.
     *
     * @return &Sigma; |W_q z_q| / &Sigma; |W_q| (1/(m^2 W)), zero if absorption leaves no trace at this Talbot
     *     parameter
     */
    public double meanAbsorptionFactor() {
        double sum = 0.0;
        double total = 0.0;
        for (int q = 0; q < weights.length; q++) {
            sum += Math.abs(weights[q]) * even[q];
            total += Math.abs(weights[q]);
        }
        return sum / total;
    }

    private double fastPhaseOnly(double product) {
        double argument = Math.abs(product) * largestOdd;
        if (table == null || argument > table.end()) {
            return phaseOnly(product);
        }
        double value = table.value(argument);
        return order % 2 != 0 && product < 0.0 ? -value : value;
    }

    private double phaseOnly(double product) {
        return Bessel.weightedJ(order, weights, odd, product);
    }

    private double absorbed(double power, OpticalResponse response) {
        if (response.crossSection() != 0.0 && !reflectionIsPerfect) {
            throw new IllegalArgumentException("recoil from absorption is described for a perfect mirror only; set the"
                    + " reflectivity to 1 or the cross section to 0");
        }
        return power * response.crossSection();
    }

    private static double requirePower(double power) {
        if (!(power >= 0.0 && power < Double.POSITIVE_INFINITY)) {
            throw new IllegalArgumentException("the laser power is at least 0 W, not " + power);
        }
        return power;
    }

    /** Every class of molecules of the ensemble, flattened. */
    private static final class Nodes {
        final double[] weights;
        final double[] odd;
        final double[] even;
        private final PowerSeriesSetup setup;
        private final Description description;
        private final ThreeGratingFringe train;
        private double transmission;

        Nodes(PowerSeriesSetup setup, BeamEnsemble ensemble, Description description) {
            this.setup = setup;
            this.description = description;
            this.train = new ThreeGratingFringe(setup.geometry(), description, 1);
            int heights = ensemble.heights().size();
            int masses = ensemble.masses().size();
            int count = ensemble.velocities().size() * masses * heights;
            weights = new double[count];
            odd = new double[count];
            even = new double[count];
            for (int i = 0; i < ensemble.velocities().size(); i++) {
                double velocity = ensemble.velocities().value(i);
                TalbotKernel first = setup.first().at(velocity);
                TalbotKernel third = setup.third().at(velocity);
                transmission += ensemble.velocities().weight(i) * first.transmission() * third.transmission();
                for (int j = 0; j < masses; j++) {
                    double weight =
                            ensemble.velocities().weight(i) * ensemble.masses().weight(j);
                    fill(
                            (i * masses + j) * heights,
                            ensemble,
                            weight,
                            new Species(velocity, ensemble.masses().value(j), first, third));
                }
            }
            for (int q = 0; q < count; q++) {
                weights[q] *= 2.0 / transmission;
            }
        }

        private record Species(double velocity, double mass, TalbotKernel first, TalbotKernel third) {}

        private void fill(int at, BeamEnsemble ensemble, double weight, Species one) {
            Passage passage = new Passage(
                    setup.separation1() / one.velocity,
                    setup.separation2() / one.velocity,
                    one.mass,
                    setup.divergence() * one.velocity);
            double outer = outerAmplitude(passage, one);
            double xi = train.secondSeparation(1, passage) / setup.geometry().period2();
            boolean quantum = description == Description.QUANTUM;
            double sine = quantum ? HalfTurn.sin(xi) : Math.PI * xi;
            double half = quantum ? HalfTurn.sin(0.5 * xi) : 0.5 * Math.PI * xi;
            LaserBeam laser = setup.laser();
            double phase = LightStrength.beamPhase(1.0, 1.0, laser.waist(), one.velocity)
                    * LightStrength.modulation(laser.reflectivity());
            double photons = LightStrength.beamPhotons(1.0, laser.wavelength(), 1.0, laser.waist(), one.velocity);
            for (int k = 0; k < ensemble.heights().size(); k++) {
                double profile = LightStrength.profile(ensemble.heights().value(k), laser.waist());
                weights[at + k] = weight * ensemble.heights().weight(k) * outer;
                odd[at + k] = phase * profile * sine;
                even[at + k] = photons * profile * half * half;
            }
        }

        /** Product of the outer gratings' amplitudes and the source coherence, the light grating set aside. */
        private double outerAmplitude(Passage passage, Species one) {
            return train.series(one.first, TransparentKernel.INSTANCE, one.third, passage)
                    .coefficient(1);
        }

        double largestOdd() {
            double largest = 0.0;
            for (double value : odd) {
                largest = Math.max(largest, Math.abs(value));
            }
            return largest;
        }
    }

    /** Stands in for the light grating where only the outer gratings' factor is wanted. */
    private enum TransparentKernel implements TalbotKernel {
        INSTANCE;

        @Override
        public double quantum(int n, double xi) {
            return 1.0;
        }

        @Override
        public double classical(int n, double xi) {
            return 1.0;
        }
    }
}
