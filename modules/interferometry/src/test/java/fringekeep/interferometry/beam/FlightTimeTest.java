package fringekeep.interferometry.beam;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.assertThatThrownBy;
import static org.assertj.core.api.Assertions.within;

import fringekeep.interferometry.statistics.Estimate;
import fringekeep.interferometry.statistics.GaussLegendre;
import java.util.Random;
import org.junit.jupiter.api.Test;

class FlightTimeTest {
    private static final FlightSetup SLOT = new FlightSetup(1.2, 5e-5, 1e-4, 0.0005, 8e-4, false);

    /** Molecules one by one: a velocity by rejection, a start inside the opening, a bin at arrival. */
    private static double[] flown(
            Random random, FlightSetup setup, VelocityLaw law, int molecules, int bins, double b) {
        double[] counts = new double[bins];
        double top = law.density(law.mode());
        for (int k = 0; k < molecules; k++) {
            double v;
            do {
                v = (law.mode() + 6 * law.width()) * random.nextDouble();
            } while (random.nextDouble() * top > law.density(v));
            double opened = setup.timeZero() + setup.openTime() * (random.nextDouble() - 0.5);
            double arrival = opened + setup.length() / v;
            int bin = (int) Math.floor((arrival - setup.firstBin()) / setup.binWidth() + 0.5);
            if (bin >= 0 && bin < bins) {
                counts[bin]++;
            }
        }
        int dark = (int) (b * bins);
        for (int k = 0; k < dark; k++) {
            counts[random.nextInt(bins)]++;
        }
        return counts;
    }

    @Test
    void singleSlotFitRecoversTheLawWithTheUncertaintyItStates() {
        Random random = new Random(1);
        VelocityLaw truth = new VelocityLaw(3, 160, 40);
        double[] squares = new double[2];
        int runs = 40;
        for (int k = 0; k < runs; k++) {
            FlightFit fit = FlightTime.singleSlot(SLOT, flown(random, SLOT, truth, 3000, 200, 2), 1)
                    .orThrow();
            Estimate mean = fit.meanVelocity();
            squares[0] += square((mean.value() - truth.mean()) / mean.standardUncertainty()) / runs;
            squares[1] += square((fit.width().value() - 40) / fit.width().standardUncertainty()) / runs;
        }
        // Mean square of 40 unit normal deviates: 1 with standard deviation sqrt(2 / 40) = 0.22.
        assertThat(squares[0]).isBetween(0.45, 1.7);
        assertThat(squares[1]).isBetween(0.45, 1.7);
    }

    private static double square(double x) {
        return x * x;
    }

    @Test
    void openingIsTakenOutOfTheWidth() {
        FlightSetup wide = new FlightSetup(1.2, 5e-5, 1e-4, 0.0005, 2e-3, false);
        VelocityLaw truth = new VelocityLaw(3, 200, 25);
        double[] counts = flown(new Random(2), wide, truth, 40_000, 200, 1);

        FlightFit fit = FlightTime.singleSlot(wide, counts, 1).orThrow();
        FlightFit ignoring = FlightTime.singleSlot(new FlightSetup(1.2, 5e-5, 1e-4, 0.0005, 0, false), counts, 1)
                .orThrow();

        assertThat(fit.width().value()).isCloseTo(25, within(3.5 * fit.width().standardUncertainty()));
        assertThat(ignoring.width().value()).isGreaterThan(30);
        assertThat(fit.distribution().meanUncertainty())
                .isEqualTo(fit.meanVelocity().standardUncertainty());
    }

    @Test
    void densityDetectorSeesTheSlowOnesMore() {
        FlightSetup density = new FlightSetup(1.2, 5e-5, 1e-4, 0.0005, 8e-4, true);
        VelocityLaw flux = new VelocityLaw(3, 150, 50);
        double[] counts = flown(new Random(3), SLOT, flux.seenByDensityDetector(), 40_000, 300, 1);

        FlightFit fit = FlightTime.singleSlot(density, counts, 1).orThrow();

        assertThat(fit.meanVelocity().value())
                .isCloseTo(flux.mean(), within(4 * fit.meanVelocity().standardUncertainty()));
    }

    @Test
    void withoutAPeakThereIsAReason() {
        double[] level = new double[100];
        java.util.Arrays.fill(level, 50);
        FlightOutcome flat = FlightTime.singleSlot(SLOT, level, 1);
        FlightOutcome empty = FlightTime.singleSlot(SLOT, new double[100], 1);

        assertThat(flat).isInstanceOf(FlightOutcome.Failure.class);
        assertThat(((FlightOutcome.Failure) empty).reason()).isEqualTo(FlightOutcome.Reason.TOO_LITTLE_DATA);
        assertThatThrownBy(() -> FlightTime.singleSlot(SLOT, new double[] {1.5}, 1))
                .hasMessageContaining("bin 0");
    }

    @Test
    void velocitiesWithoutALawHaveTheSameMeanAndSpread() {
        VelocityLaw truth = new VelocityLaw(3, 200, 25);
        double[] counts = flown(new Random(4), SLOT, truth, 60_000, 200, 1);
        double[] signal = counts.clone();
        for (int i = 0; i < signal.length; i++) {
            signal[i] -= 1;
        }

        VelocityDistribution found = FlightTime.velocities(SLOT, signal, counts, 40, 150);

        assertThat(found.mean()).isCloseTo(truth.mean(), within(5 * found.meanUncertainty() + 0.3));
        assertThat(found.spread()).isCloseTo(truth.standardDeviation(), within(0.6));
        assertThat(found.nodes()).isSorted();
    }

    private static double[] chopped(
            Random random, PseudoRandomSequence sequence, VelocityLaw law, FlightSetup setup, int cycles, double b) {
        int n = sequence.length();
        double[] counts = new double[n];
        for (int j = 0; j < n; j++) {
            double expected = b;
            for (int i = 0; i < 3 * n; i++) {
                if (sequence.opensAt(j - i)) {
                    double from = (i - 0.5) * setup.binWidth() + setup.firstBin() - setup.timeZero();
                    expected += from + setup.binWidth() > 0
                            ? 400
                                    * GaussLegendre.integrate(
                                            t -> law.arrivalDensity(t, setup.length()),
                                            Math.max(from, 1e-7),
                                            from + setup.binWidth())
                            : 0;
                }
            }
            double mean = cycles * expected;
            counts[j] = Math.max(0, Math.rint(mean + Math.sqrt(mean) * random.nextGaussian()));
        }
        return counts;
    }

    @Test
    void pseudoRandomFitCarriesSlowMoleculesOver() {
        PseudoRandomSequence sequence = PseudoRandomSequence.ofRegister(7, new int[] {7, 6}, 1);
        FlightSetup setup = new FlightSetup(1.4, 1e-4, 2e-4, 0.001, 0, false);
        VelocityLaw slow = new VelocityLaw(3, 55, 15);
        VelocityLaw fast = new VelocityLaw(3, 150, 30);

        FlightFit wrapped = FlightTime.pseudoRandom(
                        setup, sequence, chopped(new Random(5), sequence, slow, setup, 50, 5), 50)
                .orThrow();
        FlightFit inside = FlightTime.pseudoRandom(
                        setup, sequence, chopped(new Random(6), sequence, fast, setup, 50, 5), 50)
                .orThrow();

        assertThat(inside.wrapAround()).isLessThan(5);
        assertThat(wrapped.wrapAround()).isGreaterThan(8);
        assertThat(inside.meanVelocity().value())
                .isCloseTo(fast.mean(), within(4 * inside.meanVelocity().standardUncertainty()));
        assertThat(inside.pValue()).isGreaterThan(1e-3);
    }

    @Test
    void reversedPolarityIsNamed() {
        PseudoRandomSequence sequence = PseudoRandomSequence.ofRegister(7, new int[] {7, 6}, 1);
        FlightSetup setup = new FlightSetup(1.4, 1e-4, 2e-4, 0.001, 0, false);
        boolean[] shut = sequence.open();
        double[] counts = chopped(new Random(7), sequence, new VelocityLaw(3, 150, 30), setup, 50, 5);
        for (int j = 0; j < shut.length; j++) {
            shut[j] = !shut[j];
        }
        double[] mirrored = counts.clone();
        double top = java.util.Arrays.stream(counts).max().orElseThrow();
        for (int j = 0; j < counts.length; j++) {
            mirrored[j] = top + 100 - counts[j];
        }

        assertThatThrownBy(() -> PseudoRandomSequence.of(shut)).hasMessageContaining("polarity");
        assertThat(PseudoRandomSequence.ofReversedPolarity(shut).open()).isEqualTo(sequence.open());
        assertThat(((FlightOutcome.Failure) FlightTime.pseudoRandom(setup, sequence, mirrored, 50)).reason())
                .isEqualTo(FlightOutcome.Reason.REVERSED_POLARITY);
    }

    @Test
    void sequencesThatAreNotOfMaximumLengthAreRefused() {
        assertThatThrownBy(() -> PseudoRandomSequence.ofRegister(4, new int[] {4, 2}, 1))
                .isInstanceOf(IllegalArgumentException.class);
        assertThatThrownBy(() -> PseudoRandomSequence.of(new boolean[14])).hasMessageContaining("2^n - 1");
        assertThatThrownBy(() -> PseudoRandomSequence.ofRegister(4, new int[] {5}, 1))
                .hasMessageContaining("tap 5");
    }

    @Test
    void gainOverASingleSlotIsAsPublishedForStrongBackgroundAndBelowOneInWeakBins() {
        PseudoRandomSequence sequence = PseudoRandomSequence.ofRegister(7, new int[] {7, 6}, 1);

        assertThat(sequence.gain(1, 100, 1e9)).isCloseTo(Math.sqrt(128 / 4.0), within(0.2));
        assertThat(sequence.gain(0.1, 400, 0)).isLessThan(1);
    }

    @Test
    void decodedVarianceIsThatOfSimulatedTraces() {
        PseudoRandomSequence sequence = PseudoRandomSequence.ofRegister(5, new int[] {5, 3}, 1);
        Random random = new Random(8);
        double sum = 0;
        double squares = 0;
        double stated = 0;
        for (int k = 0; k < 3000; k++) {
            double[] counts = new double[31];
            for (int j = 0; j < 31; j++) {
                counts[j] = Math.rint(200 + Math.sqrt(200) * random.nextGaussian());
            }
            double first = sequence.decode(counts, 2)[7];
            sum += first / 3000;
            squares += first * first / 3000;
            stated += sequence.decodedVariance(counts, 2) / 3000;
        }
        assertThat(squares - sum * sum).isCloseTo(stated, within(0.1 * stated));
    }

    @Test
    void slitsOfFiniteOpeningPassABandAroundTheSelectedVelocity() {
        GravitySelector selector = new GravitySelector(
                new double[] {0, 1, 2}, new double[] {0, 1.5e-4, 0}, GravitySelector.STANDARD_GRAVITY);
        VelocityLaw source = new VelocityLaw(3, 0, 200);

        VelocityDistribution narrow = selector.passed(new double[] {2e-6, 2e-6, 2e-6}, source, 1e-6);
        VelocityDistribution wide = selector.passed(new double[] {6e-5, 4e-5, 6e-5}, source, 1e-6);

        assertThat(narrow.mean()).isCloseTo(selector.velocity(), within(0.01 * selector.velocity()));
        assertThat(wide.spread()).isGreaterThan(5 * narrow.spread());
        assertThat(selector.velocity(1e-6).standardUncertainty() / selector.velocity())
                .isCloseTo(1e-6 / (2 * 1.5e-4), within(1e-12));
        assertThatThrownBy(() -> new GravitySelector(new double[] {0, 1, 2}, new double[] {0, -1, 0}, 9.81).velocity())
                .hasMessageContaining("above the line");
    }

    @Test
    void velocityLawsAreNormalisedAndTheirNodesAverageAsTheyDo() {
        for (double centre : new double[] {-50, 0, 80, 400}) {
            VelocityLaw law = new VelocityLaw(3, centre, 40);
            VelocityDistribution nodes = law.nodes(4);
            double sum = 0;
            double inverse = 0;
            for (int i = 0; i < nodes.nodes().length; i++) {
                sum += nodes.weights()[i] * nodes.nodes()[i];
                inverse += nodes.weights()[i] / nodes.nodes()[i];
            }
            assertThat(GaussLegendre.integrate(law::density, 0, 1200, 60)).isCloseTo(1, within(1e-11));
            assertThat(sum).isCloseTo(law.mean(), within(1e-6 * law.mean()));
            assertThat(1 / inverse).isCloseTo(law.harmonicMean(), within(1e-5 * law.mean()));
            assertThat(law.seenByDensityDetector().mean()).isLessThan(law.mean());
            assertThat(GaussLegendre.integrate(t -> law.arrivalDensity(t, 1.3), 1e-4, 1, 400))
                    .isCloseTo(1, within(1e-4));
        }
    }

    @Test
    void meanFreePathsJoinTheirLimits() {
        double sigma = 1e-18;
        double fast = Oven.freePath(1e5, 4.65e-26, sigma, 1e-5, 300);
        assertThat(fast).isCloseTo(Oven.freePathOfFastBeam(sigma, 1e-5, 300), within(1e-4 * fast));
        double slow = Oven.freePath(300, 4.65e-26, sigma, 1e-5, 300);
        assertThat(slow).isLessThan(0.7 * fast);
        double pressure = Oven.pressureFor(0.9, 2, sigma, 300);
        assertThat(Math.exp(-2 / Oven.freePathOfFastBeam(sigma, pressure, 300))).isCloseTo(0.9, within(1e-12));
        assertThat(Oven.knudsenNumber(3, 2)).isEqualTo(1.5);
        assertThat(Oven.dopplerShift(299.792458, 0)).isCloseTo(1e-6, within(1e-18));
    }
}
