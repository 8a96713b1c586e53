package fringekeep.sample;

import fringekeep.archive.facet.Distribution;
import fringekeep.archive.json.JsonArray;
import fringekeep.archive.json.JsonNumber;
import fringekeep.archive.json.JsonObject;
import fringekeep.archive.kind.RecordView;
import fringekeep.archive.problem.ProblemException;
import fringekeep.archive.record.PartName;
import fringekeep.interferometry.constants.Codata2018;
import java.util.Optional;
import java.util.OptionalDouble;
import java.util.stream.Stream;

/** What a recorded compound says, for facets, lists and titles. */
final class CompoundFacts {
    private static final int LONGEST = 200;

    private CompoundFacts() {}

    /** Names, the one people use first; none where the identity is withheld. */
    static Stream<String> names(RecordView record) {
        return CompoundKind.texts(record.part(PartName.IDENTITY).orElse(JsonObject.EMPTY), "names");
    }

    /** The composition in a few words. */
    static String composition(RecordView record) {
        JsonObject composition = record.choices().object("composition").orElse(JsonObject.EMPTY);
        String words =
                switch (composition.text("sort").orElse("")) {
                    case "formula" -> composition.text("formula").orElse("");
                    case "cluster" -> "clusters of " + composition.text("unit").orElse("");
                    case "particle" -> composition.text("material").orElse("") + " particle";
                    case "masses" -> "composition not stated";
                    default -> "";
                };
        return shortened(words);
    }

    /** At most as many characters as a column of a list holds. */
    static String shortened(String text) {
        return text.length() <= LONGEST ? text : text.substring(0, LONGEST - 1) + "…";
    }

    /** The mass in flight. */
    static Optional<MassFacet> mass(RecordView record) {
        JsonObject result = record.result();
        JsonObject molar = result.object("molarMass").orElse(JsonObject.EMPTY);
        OptionalDouble value = molar.number("value");
        if (value.isEmpty()) {
            return Optional.empty();
        }
        int charge = (int) record.choices().integer("charge").orElse(0);
        double scale = 1000 * Codata2018.ATOMIC_MASS_CONSTANT;
        double neutral = value.getAsDouble() * scale;
        double deviation = molar.number("u").orElse(0) * scale;
        OptionalDouble ion = result.object("ionMass").orElse(JsonObject.EMPTY).number("value");
        double mean = ion.orElse(CompoundMass.inFlight(neutral, charge));
        OptionalDouble light = monoisotopic(record, charge);
        Optional<JsonObject> distribution = result.object("distribution");
        if (distribution.isPresent()) {
            return spreadOut(distribution.get(), deviation, light, charge);
        }
        return Optional.of(new MassFacet(new double[] {mean}, new double[] {1}, mean, deviation, 0, light, charge));
    }

    private static Optional<MassFacet> spreadOut(
            JsonObject distribution, double deviation, OptionalDouble light, int charge) {
        double[] nodes = numbers(distribution.array("nodes"));
        double[] weights = numbers(distribution.array("weights"));
        OptionalDouble mean = distribution.number("mean");
        if (nodes.length == 0 || nodes.length != weights.length || mean.isEmpty()) {
            return Optional.empty();
        }
        double spread = distribution.number("spread").orElse(0);
        return Optional.of(new MassFacet(nodes, weights, mean.getAsDouble(), deviation, spread, light, charge));
    }

    static Distribution distribution(MassFacet mass) {
        return new Distribution(
                "mass", "kg", mass.nodes(), mass.weights(), mass.mean(), mass.meanDeviation(), mass.spread());
    }

    private static OptionalDouble monoisotopic(RecordView record, int charge) {
        Optional<JsonObject> composition = record.choices().object("composition");
        if (composition.isEmpty() || !composition.get().text("sort").equals(Optional.of("formula"))) {
            return OptionalDouble.empty();
        }
        try {
            return Composition.read(composition.get()) instanceof Composition.Molecule molecule
                            && molecule.mass().monoisotopic().isPresent()
                    ? OptionalDouble.of(CompoundMass.inFlight(
                            molecule.mass().monoisotopic().getAsDouble() * Codata2018.ATOMIC_MASS_CONSTANT, charge))
                    : OptionalDouble.empty();
        } catch (ProblemException e) {
            return OptionalDouble.empty(); // a record this program cannot read in full has no such mass to offer
        }
    }

    /** All numbers of an array; empty when something else stands in it. */
    static double[] numbers(JsonArray array) {
        return array.items().stream().allMatch(JsonNumber.class::isInstance) ? array.numbers() : new double[0];
    }
}
