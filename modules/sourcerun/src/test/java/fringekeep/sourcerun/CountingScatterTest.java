package fringekeep.sourcerun;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.within;

import fringekeep.archive.facet.CountTable;
import fringekeep.archive.json.JsonObject;
import fringekeep.archive.kind.Inputs;
import fringekeep.archive.kind.Outcome;
import fringekeep.archive.problem.ProblemException;
import fringekeep.archive.problem.Work;
import fringekeep.interferometry.beam.VelocityLaw;
import java.util.List;
import java.util.Optional;
import java.util.Random;
import org.junit.jupiter.api.Test;

/** Uncertainties from counting are the scatter over traces drawn anew. */
class CountingScatterTest {
    private static final int DRAWS = 300;
    private static final int BINS = 255;
    private static final double BIN = 0.00025;
    private final VelocityComputation computation = new VelocityComputation();

    /** Expected counts of a short opening: arrival density f(L/t) L/t² (Physics of the beam: v = L/t) and a background. */
    private static double[] expected() {
        VelocityLaw law = new VelocityLaw(3, 90, 25);
        double[] counts = new double[BINS];
        for (int i = 1; i < BINS; i++) {
            counts[i] = 20_000 * BIN * law.arrivalDensity(i * BIN, 1.5);
        }
        return counts;
    }

    private static double[] through(double[] flight, double background) {
        double[] counts = new double[BINS];
        for (int j = 0; j < BINS; j++) {
            counts[j] = background;
            for (int i = 0; i < BINS; i++) {
                counts[j] += Flights.SEQUENCE.charAt(Math.floorMod(j - i, BINS)) == '1' ? flight[i] : 0;
            }
        }
        return counts;
    }

    private static double[] drawn(double[] means, Random random) {
        double[] counts = new double[means.length];
        for (int i = 0; i < means.length; i++) {
            counts[i] = means[i] > 50
                    ? Math.max(0, Math.rint(means[i] + Math.sqrt(means[i]) * random.nextGaussian()))
                    : poisson(means[i], random);
        }
        return counts;
    }

    /** Products of uniform numbers; D. E. Knuth, The Art of Computer Programming 2, 3.4.1. */
    private static double poisson(double mean, Random random) {
        double limit = Math.exp(-mean);
        double product = random.nextDouble();
        int count = 0;
        while (product > limit) {
            product *= random.nextDouble();
            count++;
        }
        return count;
    }

    private static Inputs trace(double[] counts) {
        double[] times = new double[BINS];
        java.util.Arrays.setAll(times, i -> i * BIN);
        CountTable table = new CountTable(
                List.of(new CountTable.Column("time of flight", "s", times)),
                List.of(new CountTable.Column("counts", "1", counts)),
                new double[0],
                new double[0],
                Optional.empty(),
                Optional.empty());
        return Records.inputs(List.of(Records.offering("trace", 0, table)), List.of());
    }

    private void scatterIsAsStated(JsonObject choices, double[] means) throws ProblemException {
        Random random = new Random(11);
        double[] mean = new double[DRAWS];
        double[] spread = new double[DRAWS];
        double statedMean = 0;
        double statedSpread = 0;
        for (int i = 0; i < DRAWS; i++) {
            Inputs inputs = trace(drawn(means, random));
            Outcome outcome = computation.compute(computation.complete(choices, inputs), inputs, Work.QUIET);
            JsonObject result = ((Outcome.Computed) outcome).result();
            mean[i] = result.object("mean").orElseThrow().number("value").orElseThrow();
            spread[i] = result.object("spread").orElseThrow().number("value").orElseThrow();
            statedMean += result.object("mean").orElseThrow().number("u").orElseThrow() / DRAWS;
            statedSpread += result.object("spread").orElseThrow().number("u").orElseThrow() / DRAWS;
        }
        // a standard deviation from 300 draws is known to 4 %, so 15 % is more than three of its own
        assertThat(statedMean).isCloseTo(scatter(mean), within(0.15 * scatter(mean)));
        assertThat(statedSpread).isCloseTo(scatter(spread), within(0.15 * scatter(spread)));
    }

    private static double scatter(double[] values) {
        double mean = 0;
        for (double value : values) {
            mean += value / values.length;
        }
        double sum = 0;
        for (double value : values) {
            sum += (value - mean) * (value - mean);
        }
        return Math.sqrt(sum / (values.length - 1));
    }

    private static JsonObject exact(JsonObject choices) {
        return choices.without("reading")
                .with("distance", Records.json(Flights.quantity(1.5, "m", 0)))
                .with("timeZero", Records.json(Flights.quantity(0, "s", 0)));
    }

    @Test
    void ofASingleSlotAsMeasured() throws ProblemException {
        double[] means = expected();
        for (int i = 0; i < BINS; i++) {
            means[i] += 4;
        }
        scatterIsAsStated(exact(Flights.single(45, 200)), means);
    }

    @Test
    void ofAPseudoRandomChopperAsMeasured() throws ProblemException {
        scatterIsAsStated(exact(Flights.random(45, 200)), through(expected(), 300));
    }

    @Test
    void ofAFittedLaw() throws ProblemException {
        double[] means = expected();
        for (int i = 0; i < BINS; i++) {
            means[i] += 4;
        }
        JsonObject narrow = exact(Flights.single(45, 200))
                .with("background", "fitted")
                .with("slotOpening", Records.json(Flights.quantity(0.00001, "s", 0)))
                .without("from")
                .without("to");
        scatterIsAsStated(narrow, means);
    }
}
