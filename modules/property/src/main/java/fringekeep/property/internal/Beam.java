package fringekeep.property.internal;

import fringekeep.archive.facet.Distribution;
import fringekeep.archive.kind.Input;
import fringekeep.archive.kind.Inputs;
import fringekeep.archive.problem.Problem;
import fringekeep.archive.record.Hash;
import fringekeep.interferometry.nearfield.WeightedNodes;
import fringekeep.sample.MassFacet;
import java.util.ArrayList;
import java.util.List;
import java.util.Optional;
import java.util.OptionalDouble;

/**
 * The beam of a power series: speeds averaged over all pinned velocities with equal weight, and the compound's masses.
 *
 * @param velocities velocity records in the order of their fingerprints
 * @param compound the compound record
 * @param mass its masses
 */
record Beam(List<Velocity> velocities, Hash compound, MassFacet mass) {
    private static final String MEAN = "mean";

    Beam {
        velocities = List.copyOf(velocities);
    }

    /** A velocity record and its distribution. */
    record Velocity(Hash record, Distribution distribution) {}

    static Optional<Beam> read(Inputs inputs, List<Problem> problems) {
        List<Velocity> velocities = new ArrayList<>();
        for (Input input : inputs.role("velocity")) {
            input.facet(Distribution.class)
                    .filter(each -> each.unit().equals("m.s-1") || each.unit().equals("m/s"))
                    .ifPresentOrElse(
                            each -> velocities.add(new Velocity(input.target(), each)),
                            () -> problems.add(new Problem(
                                    "property.no-velocity",
                                    "Input " + input.position() + " offers no distribution of velocity.",
                                    "/inputs/" + input.position(),
                                    "Pin velocity records.")));
        }
        velocities.sort((a, b) -> a.record().compareTo(b.record()));
        Optional<Input> compound = inputs.role("compound").stream().findFirst();
        Optional<MassFacet> mass = compound.flatMap(input -> input.facet(MassFacet.class));
        if (mass.isEmpty()) {
            problems.add(new Problem(
                    "property.no-mass",
                    "No compound with a mass is pinned.",
                    "/inputs",
                    "Pin the compound of the batch."));
        }
        if (velocities.isEmpty() && inputs.role("velocity").isEmpty()) {
            problems.add(new Problem(
                    "property.no-velocity", "No velocity is pinned.", "/inputs", "Pin the velocities of the runs."));
        }
        return velocities.isEmpty() || mass.isEmpty()
                ? Optional.empty()
                : Optional.of(new Beam(velocities, compound.get().target(), mass.get()));
    }

    /** Speeds with one mean moved: a change of a mean shifts all speeds of its record together. */
    WeightedNodes speeds(Shift shift) {
        List<Double> nodes = new ArrayList<>();
        List<Double> weights = new ArrayList<>();
        for (Velocity velocity : velocities) {
            Distribution distribution = velocity.distribution();
            double by = shift.of(velocity.record(), MEAN);
            for (int i = 0; i < distribution.nodes().length; i++) {
                nodes.add(distribution.nodes()[i] + by);
                weights.add(distribution.weights()[i] / velocities.size());
            }
        }
        return WeightedNodes.of(array(nodes), array(weights));
    }

    /** Masses with the mean moved in proportion. */
    WeightedNodes masses(Shift shift) {
        double factor = 1 + shift.of(compound, MEAN) / mass.mean();
        double[] nodes = mass.nodes();
        for (int i = 0; i < nodes.length; i++) {
            nodes[i] *= factor;
        }
        return WeightedNodes.of(nodes, mass.weights());
    }

    List<Shared> shared() {
        List<Shared> shared = new ArrayList<>();
        for (Velocity velocity : velocities) {
            double deviation = velocity.distribution().meanDeviation();
            shared.add(new Shared(
                    velocity.record(),
                    MEAN,
                    velocity.distribution().mean(),
                    Double.isNaN(deviation) ? OptionalDouble.empty() : OptionalDouble.of(deviation)));
        }
        shared.add(new Shared(compound, MEAN, mass.mean(), OptionalDouble.of(mass.meanDeviation())));
        return shared;
    }

    private static double[] array(List<Double> list) {
        return list.stream().mapToDouble(Double::doubleValue).toArray();
    }
}
