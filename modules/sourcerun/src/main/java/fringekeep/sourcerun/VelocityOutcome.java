package fringekeep.sourcerun;

import fringekeep.archive.json.Json;
import fringekeep.archive.json.JsonArray;
import fringekeep.archive.json.JsonObject;
import fringekeep.archive.kind.Input;
import fringekeep.archive.kind.Inputs;
import fringekeep.instrument.CalibrationFacet;
import fringekeep.instrument.CalibrationTarget;
import fringekeep.interferometry.beam.VelocityDistribution;
import java.util.ArrayList;
import java.util.List;
import java.util.Optional;

/** Gathers what a method found, applies calibrations of velocity, and writes the result part. */
final class VelocityOutcome {
    private double[] nodes;
    private final double[] weights;
    private double mean;
    private double statistical;
    private double spread;
    private double spreadDeviation;
    private final List<Influence> influences = new ArrayList<>();

    /**
     * A source of uncertainty that is not counting.
     *
     * @param source where it comes from
     * @param slope derivative of the mean velocity with respect to it
     */
    private record Influence(Known.Source source, double slope) {}

    VelocityOutcome(VelocityDistribution distribution, double spreadDeviation) {
        this.nodes = distribution.nodes();
        this.weights = distribution.weights();
        this.mean = distribution.mean();
        this.statistical = distribution.meanUncertainty();
        this.spread = distribution.spread();
        this.spreadDeviation = spreadDeviation;
    }

    /** All sources of a known quantity act on the mean with this slope. */
    void influence(Known known, double slope) {
        known.sources().forEach(source -> influences.add(new Influence(source, slope)));
    }

    void influence(String choice, double deviation, double slope) {
        influences.add(new Influence(new Known.Source(-1, choice, deviation), slope));
    }

    /** Applies pinned calibrations of velocity, in the order of the inputs. */
    void calibrate(Inputs inputs) {
        for (Input input : inputs.role("calibration")) {
            Optional<CalibrationFacet> calibration = input.facet(CalibrationFacet.class)
                    .filter(one -> one.target() == CalibrationTarget.VELOCITY_SCALE
                            || one.target() == CalibrationTarget.VELOCITY_OFFSET);
            calibration.ifPresent(one -> calibrate(one, input.position()));
        }
    }

    private void calibrate(CalibrationFacet calibration, int input) {
        CalibrationFacet.Calibrated at = calibration.apply(mean);
        for (int i = 0; i < nodes.length; i++) {
            nodes[i] = calibration.apply(nodes[i]).value();
        }
        influences.replaceAll(one -> new Influence(one.source, one.slope * at.slope()));
        for (int i = 0; i < at.gradient().length; i++) {
            String parameter = calibration.model().parameters().get(i);
            Known.Source source = new Known.Source(input, parameter, calibration.deviation(i));
            influences.add(new Influence(source, at.gradient()[i]));
        }
        mean = at.value();
        statistical *= at.slope();
        spread *= at.slope();
        spreadDeviation *= at.slope();
    }

    /** Standard uncertainty of the mean (m/s) that shifts all nodes together. */
    private double shift() {
        double variance = 0;
        for (Influence influence : influences) {
            double part = influence.slope * influence.source.deviation();
            variance += part * part;
        }
        return Math.sqrt(variance);
    }

    JsonObject json(VelocityFindings findings) {
        double shift = shift();
        return JsonObject.EMPTY
                .with("mean", estimate(mean, Math.sqrt(statistical * statistical + shift * shift)))
                .with("spread", estimate(spread, spreadDeviation))
                .with("nodes", JsonArray.ofNumbers(nodes))
                .with("weights", JsonArray.ofNumbers(weights))
                .with("shift", shift)
                .with("sensitivities", sensitivities())
                .with("findings", findings.json());
    }

    private JsonArray sensitivities() {
        List<Json> list = new ArrayList<>();
        for (Influence influence : influences) {
            list.add(JsonObject.EMPTY
                    .with("input", influence.source.input())
                    .with("parameter", influence.source.parameter())
                    .with("deviation", influence.source.deviation())
                    .with("derivatives", JsonArray.ofNumbers(influence.slope)));
        }
        return new JsonArray(list);
    }

    static Json estimate(double value, double u) {
        return JsonObject.EMPTY.with("value", value).with("u", u);
    }

    /** Whether every number can be recorded and every velocity is one. */
    boolean usable() {
        boolean usable = Double.isFinite(mean)
                && Double.isFinite(spread)
                && Double.isFinite(statistical)
                && Double.isFinite(spreadDeviation)
                && Double.isFinite(shift())
                && mean > 0;
        for (int i = 0; i < nodes.length; i++) {
            usable &= Double.isFinite(nodes[i]) && nodes[i] > 0 && Double.isFinite(weights[i]);
        }
        return usable;
    }
}
