package fringekeep.sourcerun;

import fringekeep.archive.json.JsonArray;
import fringekeep.archive.json.JsonObject;
import fringekeep.archive.kind.Inputs;
import fringekeep.archive.problem.ProblemException;
import fringekeep.instrument.CalibrationTarget;
import fringekeep.interferometry.beam.FlightFit;
import fringekeep.interferometry.beam.FlightOutcome;
import fringekeep.interferometry.beam.FlightSetup;
import fringekeep.interferometry.beam.FlightTime;
import fringekeep.interferometry.beam.PseudoRandomSequence;
import fringekeep.interferometry.beam.VelocityDistribution;
import fringekeep.interferometry.beam.VelocityLaw;
import fringekeep.interferometry.statistics.Estimate;
import fringekeep.sample.Entered;
import java.util.Optional;

/**
 * Methods {@code velocity.flight-single-slot/1} and {@code velocity.flight-pseudo-random/1}.
 *
 * <p>Shape shifted-flux: the law v&sup3; exp(-(v-v0)&sup2;/w&sup2;) is fitted to the raw counts
 * ({@link FlightTime#singleSlot}, {@link FlightTime#pseudoRandom}). Shape as-measured: the trace, decoded where the chopper
 * was pseudo-random, is read as velocities ({@link FlightTime#velocities}). Distance L and time zero act on all velocities: v =
 * L/(t - t0), so dv/dL = v/L and dv/dt0 = v&sup2;/L.
 */
final class FlightMethod {
    private static final double POOR = 1e-3;
    private static final double WRAPS = 5;
    private static final double CUT = 0.01;

    private final JsonObject choices;
    private final Inputs inputs;
    private final boolean random;
    private final FlightTrace trace;
    private final Known distance;
    private final Known timeZero;
    private final double opening;
    private final VelocityFindings findings = new VelocityFindings();

    FlightMethod(JsonObject choices, Inputs inputs) throws ProblemException {
        this.choices = choices;
        this.inputs = inputs;
        this.random = choices.text("method").equals(Optional.of(VelocityComputation.PSEUDO_RANDOM));
        this.trace = FlightTrace.of(choices, inputs);
        this.distance = Known.of(choices, "distance", CalibrationTarget.FLIGHT_DISTANCE, inputs)
                .orElseThrow(() -> missing("distance"));
        this.timeZero = Known.of(choices, "timeZero", CalibrationTarget.TIME_ZERO, inputs)
                .orElseThrow(() -> missing("timeZero"));
        this.opening =
                random ? 0 : Entered.of(choices, "slotOpening").map(Entered::si).orElse(0.0);
        if (!(distance.value() > 0)) {
            throw new ProblemException(Trouble.at("not-positive", "/choices/distance", "distance"));
        }
    }

    private static ProblemException missing(String name) {
        return new ProblemException(Trouble.at("missing", "/choices/" + name, name));
    }

    JsonObject result() throws ProblemException {
        if (random) {
            matches();
        }
        if (distance.unstated() || timeZero.unstated()) {
            findings.add("uncertainty-unstated");
        }
        return choices.text("shape").equals(Optional.of("as-measured")) ? asMeasured() : fitted();
    }

    private void matches() throws ProblemException {
        int elements = choices.text("sequence").orElse("").length();
        if (trace.counts().length != elements) {
            throw new ProblemException(Trouble.at(
                    "sequence-length",
                    "/choices/sequence",
                    Integer.toString(elements),
                    Integer.toString(trace.counts().length)));
        }
        Optional<Entered> width = Entered.of(choices, "binWidth");
        if (width.isPresent() && Math.abs(width.get().si() / trace.width() - 1) > 1e-3) {
            throw new ProblemException(Trouble.at("bin-width", "/choices/binWidth"));
        }
    }

    private FlightSetup setup(double first) {
        boolean density = choices.text("detector").equals(Optional.of("density"));
        return new FlightSetup(distance.value(), first, trace.width(), timeZero.value(), opening, density);
    }

    // ---- shape shifted-flux

    private JsonObject fitted() throws ProblemException {
        FlightSetup setup = setup(trace.first());
        FlightOutcome outcome = random
                ? FlightTime.pseudoRandom(setup, sequence(choices), trace.counts(), 1)
                : FlightTime.singleSlot(setup, trace.counts(), 1);
        if (outcome instanceof FlightOutcome.Failure failure) {
            throw new ProblemException(Trouble.at("no-law", "/choices", failure.words()));
        }
        FlightFit fit = outcome.orThrow();
        if (fit.pValue() < POOR) {
            findings.add("law-does-not-fit");
        }
        if (random && fit.wrapAround() > WRAPS) {
            findings.add("wraps-around");
        }
        VelocityDistribution cut = window(fit.distribution());
        VelocityOutcome found = new VelocityOutcome(cut, spreadDeviation(fit));
        found.influence(distance, cut.mean() / distance.value());
        found.influence(timeZero, secondMoment(cut) / distance.value());
        JsonObject result = finished(found);
        return result.with(
                        "background",
                        VelocityOutcome.estimate(
                                fit.background().value(), fit.background().standardUncertainty()))
                .with("fit", fit(fit));
    }

    private static JsonObject fit(FlightFit fit) {
        return JsonObject.EMPTY
                .with("centre", estimate(fit.centre()))
                .with("width", estimate(fit.width()))
                .with("signal", estimate(fit.signal()))
                .with("deviance", fit.deviance())
                .with("degreesOfFreedom", fit.degreesOfFreedom())
                .with("pValue", fit.pValue());
    }

    private static fringekeep.archive.json.Json estimate(Estimate estimate) {
        return VelocityOutcome.estimate(estimate.value(), estimate.standardUncertainty());
    }

    /** Cuts a law to the window of velocities asked for. */
    private VelocityDistribution window(VelocityDistribution whole) throws ProblemException {
        double from = Entered.of(choices, "from").map(Entered::si).orElse(0.0);
        double to = Entered.of(choices, "to").map(Entered::si).orElse(Double.MAX_VALUE);
        double[] nodes = whole.nodes();
        double[] weights = whole.weights();
        double kept = 0;
        int count = 0;
        for (int i = 0; i < nodes.length; i++) {
            if (nodes[i] >= from && nodes[i] <= to) {
                nodes[count] = nodes[i];
                weights[count++] = weights[i];
                kept += weights[i];
            }
        }
        if (!(kept > 0)) {
            throw new ProblemException(Trouble.at("window-empty", "/choices/from"));
        }
        if (kept > 1 - CUT / 100) {
            return whole;
        }
        if (kept < 1 - CUT) {
            findings.add("window-cuts");
        }
        return VelocityDistribution.of(
                java.util.Arrays.copyOf(nodes, count),
                java.util.Arrays.copyOf(weights, count),
                whole.meanUncertainty());
    }

    /** Carries the covariance of centre and width on to the standard deviation of the law, by central differences. */
    private static double spreadDeviation(FlightFit fit) {
        double[] values = fit.values();
        double[] covariance = fit.covariance();
        double step = 1e-4 * values[2];
        double byCentre = slope(values[1], values[2], step, 0);
        double byWidth = slope(values[1], values[2], 0, step);
        double variance = byCentre * byCentre * covariance[2]
                + 2 * byCentre * byWidth * covariance[4]
                + byWidth * byWidth * covariance[5];
        return Math.sqrt(Math.max(0, variance));
    }

    private static double slope(double centre, double width, double byCentre, double byWidth) {
        double up = new VelocityLaw(3, centre + byCentre, width + byWidth).standardDeviation();
        double down = new VelocityLaw(3, centre - byCentre, width - byWidth).standardDeviation();
        return (up - down) / (2 * (byCentre + byWidth));
    }

    // ---- shape as-measured

    private JsonObject asMeasured() throws ProblemException {
        double[] signal = trace.counts().clone();
        double[] variances = trace.counts().clone();
        double first = trace.first();
        if (random) {
            PseudoRandomSequence sequence = sequence(choices);
            double[] decoded = sequence.decode(trace.counts(), 1);
            if (PseudoRandomSequence.looksReversed(decoded)) {
                throw new ProblemException(Trouble.at("polarity", "/choices/sequence"));
            }
            // flight times are known up to whole turns: begin with the first positive one
            int turn = (int) Math.floor((timeZero.value() - first) / trace.width()) + 1;
            first += turn * trace.width();
            for (int i = 0; i < signal.length; i++) {
                signal[i] = decoded[Math.floorMod(i + turn, signal.length)];
            }
            java.util.Arrays.fill(variances, sequence.decodedVariance(trace.counts(), 1));
        }
        return read(new MeasuredTrace(setup(first), signal, variances, random));
    }

    private JsonObject read(MeasuredTrace measured) throws ProblemException {
        double from = Entered.of(choices, "from").map(Entered::si).orElse(0.0);
        double to = Entered.of(choices, "to").map(Entered::si).orElse(Double.MAX_VALUE);
        boolean background = choices.text("background").equals(Optional.of("outside-window"));
        MeasuredTrace.Peak peak = measured.peak(from, to, background);
        if (peak.negative()) {
            findings.add("negative-weights");
        }
        if (peak.resolution() > 0.5) {
            findings.add("resolution-dominates");
        }
        VelocityOutcome found = new VelocityOutcome(peak.distribution(), peak.spreadDeviation());
        found.influence(distance, peak.distribution().mean() / distance.value());
        found.influence(timeZero, secondMoment(peak.distribution()) / distance.value());
        return finished(found)
                .with("background", VelocityOutcome.estimate(peak.background(), peak.backgroundDeviation()))
                .with("deviations", JsonArray.ofNumbers(peak.deviations()));
    }

    // ---- both

    private JsonObject finished(VelocityOutcome found) throws ProblemException {
        found.calibrate(inputs);
        if (!found.usable()) {
            throw new ProblemException(Trouble.at("not-finite", "/choices"));
        }
        return found.json(findings);
    }

    private static double secondMoment(VelocityDistribution distribution) {
        double sum = 0;
        double[] nodes = distribution.nodes();
        double[] weights = distribution.weights();
        for (int i = 0; i < nodes.length; i++) {
            sum += weights[i] * nodes[i] * nodes[i];
        }
        return sum;
    }

    /** The sequence as the beam meets it. */
    static PseudoRandomSequence sequence(JsonObject choices) {
        String text = choices.text("sequence").orElse("");
        boolean backward = choices.text("direction").equals(Optional.of("backward"));
        boolean[] open = new boolean[text.length()];
        for (int i = 0; i < open.length; i++) {
            open[i] = text.charAt(backward ? open.length - 1 - i : i) == '1';
        }
        return PseudoRandomSequence.of(open);
    }
}
