package fringekeep.commandline.compute;

import fringekeep.archive.problem.ProblemException;
import fringekeep.interferometry.beam.FlightFit;
import fringekeep.interferometry.beam.FlightOutcome;
import fringekeep.interferometry.beam.FlightSetup;
import fringekeep.interferometry.beam.FlightTime;
import fringekeep.interferometry.beam.PseudoRandomSequence;
import fringekeep.interferometry.beam.VelocityDistribution;
import java.util.List;

/** Time of flight. */
final class FlightMethods {
    private static final double[] TRACE = {
        21, 19, 20, 22, 31, 60, 118, 177, 208, 201, 168, 131, 99, 74, 58, 47, 39, 34, 30, 27, 25, 24, 22, 21
    };
    private static final double[] ENCODED = {79, 93, 105, 107, 93, 67, 47, 41, 47, 49, 53, 69, 79, 77, 75};
    private static final double[] OPENINGS = {0, 0, 0, 1, 0, 0, 1, 1, 0, 1, 0, 1, 1, 1, 1};

    private static final Field LENGTH = Field.quantity("flightLength", "m", "1.4 m", "from chopper to detector");
    private static final Field FIRST = Field.quantity("firstBin", "s", "5 ms", "time at the middle of the first bin");
    private static final Field WIDTH = Field.quantity("binWidth", "s", "0.25 ms", "width of the bins");
    private static final Field ZERO = Field.quantity("timeZero", "s", "0 s", "time at which the opening is centred");
    private static final Field DETECTOR =
            Field.choice("detector", "what the detector is sensitive to", "flux", "density");
    private static final Field CYCLES =
            Field.number("cycles", 1, "cycles summed").seldom();
    private static final Field SEQUENCE = Field.list(
                    "sequence", "1", "1", "openings of the chopper, 1 = open", OPENINGS)
            .orNothing();
    private static final Field STAGES =
            Field.whole("stages", 4, "of the shift register").seldom();
    private static final Field TAPS =
            Field.list("taps", "1", "1", "stages fed back", 4, 3).seldom();
    private static final Field SEED =
            Field.whole("seed", 1, "state the register starts with").seldom();
    private static final Field COUNTS = Field.list("counts", "1", "1", "counts in each bin of a cycle", ENCODED);

    private FlightMethods() {}

    static List<Method> all() {
        return List.of(
                Method.of(
                        "flight-single-slot",
                        "Velocity law, signal and background from the trace of a single-slot chopper",
                        (in, out) -> fit(
                                FlightTime.singleSlot(setup(in), in.numbers("counts"), in.number("cycles", 1)), out),
                        LENGTH,
                        FIRST,
                        WIDTH,
                        ZERO,
                        Field.quantity("openTime", "s", "0.2 ms", "how long the slot is open"),
                        DETECTOR,
                        Field.list("counts", "1", "1", "counts in each bin", TRACE),
                        CYCLES),
                Method.of(
                        "flight-pseudo-random",
                        "Velocity law, signal and background from the counts behind a pseudo-random chopper",
                        (in, out) -> fit(
                                FlightTime.pseudoRandom(
                                        setup(in),
                                        sequence(in),
                                        in.numbers("counts"),
                                        in.number("cycles", 1),
                                        !in.flag("cutAtCycle")),
                                out),
                        LENGTH,
                        Field.quantity("firstBin", "s", "0.5 ms", "time at the middle of the first bin"),
                        Field.quantity("binWidth", "s", "1 ms", "width of the bins"),
                        ZERO,
                        DETECTOR,
                        Field.flag("cutAtCycle", "leave out molecules slower than one cycle"),
                        SEQUENCE,
                        STAGES,
                        TAPS,
                        SEED,
                        COUNTS,
                        CYCLES),
                Method.of(
                        "pseudo-random-decoding",
                        "Exact decoding of counts taken through a maximum-length sequence",
                        FlightMethods::decode,
                        SEQUENCE,
                        STAGES,
                        TAPS,
                        SEED,
                        Field.flag("reversedPolarity", "the sequence names the shut bins"),
                        COUNTS,
                        CYCLES,
                        Field.whole("zeroBin", 0, "bin of the time zero, for the wrap-around")
                                .seldom(),
                        Field.number("background", 7, "flat background for each bin and cycle")
                                .seldom()),
                Method.of(
                        "arrival-velocities",
                        "Arrival times read as velocities, without a law",
                        FlightMethods::velocities,
                        LENGTH,
                        FIRST,
                        WIDTH,
                        ZERO,
                        Field.quantity("openTime", "s", "0.2 ms", "how long the slot is open"),
                        DETECTOR,
                        Field.list("counts", "1", "1", "counts in each bin", TRACE),
                        Field.number("background", 20, "flat background in each bin"),
                        Field.whole("fromBin", 3, "first bin of the peak, from 0"),
                        Field.whole("toBin", 20, "last bin of the peak")));
    }

    private static FlightSetup setup(Inputs in) {
        return new FlightSetup(
                in.number("flightLength"),
                in.number("firstBin"),
                in.number("binWidth"),
                in.number("timeZero"),
                in.number("openTime", 0),
                in.word("detector", "flux").equals("density"));
    }

    private static void fit(FlightOutcome outcome, Results out) throws ProblemException {
        if (outcome instanceof FlightOutcome.Failure failure) {
            throw NoResult.because(failure.words());
        }
        FlightFit fit = outcome.orThrow();
        out.estimate("signal", "1", fit.signal());
        out.estimate("centre", "m/s", fit.centre());
        out.estimate("width", "m/s", fit.width());
        out.estimate("background", "1", fit.background());
        out.estimate("meanVelocity", "m/s", fit.meanVelocity());
        out.value("mostProbableVelocity", "m/s", fit.law().mode());
        out.bare("deviance", "1", fit.deviance());
        out.bare("degreesOfFreedom", "1", fit.degreesOfFreedom());
        out.bare("pValue", "1", fit.pValue());
        out.bare("wrapAround", "1", fit.wrapAround());
        out.value("meanPerFlightLength", "s-1", fit.lengthOverVelocity());
        out.value("meanPerTimeZero", "m/s2", fit.timeZeroSlope());
        out.bare("covariance", "", fit.covariance());
    }

    private static PseudoRandomSequence sequence(Inputs in) {
        if (in.has("stages")) {
            int[] taps = new int[in.numbers("taps").length];
            for (int k = 0; k < taps.length; k++) {
                taps[k] = (int) in.numbers("taps")[k];
            }
            return PseudoRandomSequence.ofRegister(in.whole("stages"), taps, in.whole("seed", 1));
        }
        double[] entered = in.numbers("sequence");
        boolean[] open = new boolean[entered.length];
        for (int k = 0; k < open.length; k++) {
            open[k] = entered[k] != 0;
        }
        return in.flag("reversedPolarity")
                ? PseudoRandomSequence.ofReversedPolarity(open)
                : PseudoRandomSequence.of(open);
    }

    private static void decode(Inputs in, Results out) {
        PseudoRandomSequence sequence = sequence(in);
        double[] counts = in.numbers("counts");
        double cycles = in.number("cycles", 1);
        double[] decoded = sequence.decode(counts, cycles);
        double variance = sequence.decodedVariance(counts, cycles);
        double[] deviations = new double[decoded.length];
        java.util.Arrays.fill(deviations, Math.sqrt(variance));
        out.estimates("signal", "1", decoded, deviations);
        out.bare("autocorrelationAtZero", "1", sequence.autocorrelation(0));
        out.bare("autocorrelationElsewhere", "1", sequence.autocorrelation(1));
        out.bare("wrapAround", "1", sequence.wrapAround(decoded, variance, in.whole("zeroBin", 0)));
        out.flag("looksReversed", PseudoRandomSequence.looksReversed(decoded));
        if (in.has("background")) {
            out.value("offsetOfBackground", "1", 2 * in.number("background") / (sequence.length() + 1.0));
        }
    }

    private static void velocities(Inputs in, Results out) {
        double[] signal = in.numbers("counts");
        double[] variances = signal.clone();
        for (int k = 0; k < signal.length; k++) {
            signal[k] -= in.number("background");
            variances[k] = Math.max(variances[k], 1);
        }
        VelocityDistribution read =
                FlightTime.velocities(setup(in), signal, variances, in.whole("fromBin"), in.whole("toBin"));
        out.estimate("mean", "m/s", read.mean(), read.meanUncertainty());
        out.value("spread", "m/s", read.spread());
        out.values("velocities", "m/s", read.nodes());
        out.values("weights", "1", read.weights());
    }
}
