package fringekeep.sourcerun;

import fringekeep.archive.facet.Distribution;
import fringekeep.archive.json.JsonObject;
import fringekeep.archive.kind.RecordView;
import fringekeep.archive.record.PartName;
import fringekeep.interferometry.beam.VelocityDistribution;
import fringekeep.sample.Entered;
import java.util.Optional;
import java.util.OptionalDouble;

/** What a recorded velocity says, computed or quoted. */
final class VelocityFacts {
    private VelocityFacts() {}

    /** The distribution; empty where the record is not of the form asked for. */
    static Optional<Distribution> distribution(RecordView record) {
        try {
            return record.part(PartName.CONTENT).isPresent() ? quoted(record.content()) : computed(record.result());
        } catch (IllegalArgumentException e) {
            return Optional.empty(); // the rules report lengths and signs
        }
    }

    private static Optional<Distribution> computed(JsonObject result) {
        JsonObject mean = result.object("mean").orElse(JsonObject.EMPTY);
        JsonObject spread = result.object("spread").orElse(JsonObject.EMPTY);
        OptionalDouble value = mean.number("value");
        if (value.isEmpty()) {
            return Optional.empty();
        }
        return Optional.of(new Distribution(
                "velocity",
                "m/s",
                VelocityRules.numbers(result.array("nodes")),
                VelocityRules.numbers(result.array("weights")),
                value.getAsDouble(),
                mean.number("u").orElse(0),
                spread.number("value").orElse(0)));
    }

    private static Optional<Distribution> quoted(JsonObject content) {
        Optional<Entered> mean = Entered.of(content, "mean");
        if (mean.isEmpty()) {
            return Optional.empty();
        }
        double u = mean.get().deviationOrZero();
        double spread = Entered.of(content, "spread").map(Entered::si).orElse(0.0);
        VelocityDistribution shape =
                switch (content.text("shape").orElse("")) {
                    case "nodes" -> nodes(content, u);
                    case "normal" -> VelocityDistribution.quoted(mean.get().si(), u, spread);
                    default -> VelocityDistribution.quoted(mean.get().si(), u, 0);
                };
        return Optional.of(new Distribution(
                "velocity", "m/s", shape.nodes(), shape.weights(), mean.get().si(), u, shape.spread()));
    }

    private static VelocityDistribution nodes(JsonObject content, double u) {
        double[] nodes = VelocityRules.numbers(content.array("nodes"));
        double[] weights = VelocityRules.numbers(content.array("weights"));
        if (nodes.length != weights.length) {
            throw new IllegalArgumentException(nodes.length + " nodes, " + weights.length + " weights");
        }
        return VelocityDistribution.of(nodes, weights, u);
    }

    /** How the velocity came about, in words. */
    static String method(RecordView record) {
        if (record.part(PartName.CONTENT).isPresent()) {
            return "quoted";
        }
        return switch (record.choices().text("method").orElse("")) {
            case VelocityComputation.SINGLE_SLOT -> "flight, single slot";
            case VelocityComputation.PSEUDO_RANDOM -> "flight, pseudo-random";
            case VelocityComputation.THREE_SLIT -> "three slits";
            default -> "";
        };
    }
}
