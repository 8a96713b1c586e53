package fringekeep.sample;

import fringekeep.archive.json.JsonObject;
import fringekeep.archive.problem.Problem;
import fringekeep.archive.problem.ProblemException;
import java.util.ArrayList;
import java.util.List;
import java.util.Optional;

/**
 * What a compound is made of, as its choices state it.
 */
sealed interface Composition {
    /** Members that belong to each sort of composition. */
    List<String> MEMBERS =
            List.of("formula", "unit", "sizes", "window", "material", "radius", "radiusSpread", "density", "masses");

    /** A molecule. */
    record Molecule(Formula formula, FormulaMass mass) implements Composition {}

    /** A number of equal units; sizes and shares of equal length; the window in kg where there is one. */
    record Cluster(Formula unit, FormulaMass mass, long[] sizes, double[] shares, Optional<double[]> window)
            implements Composition {}

    /** A sphere. */
    record Particle(String material, Entered radius, Optional<Entered> radiusSpread, Entered density)
            implements Composition {}

    /** Masses alone. */
    record Masses(List<Entered> masses, double[] shares) implements Composition {}

    /**
     * Reads a composition.
     *
     * @param composition member {@code composition} of the choices
     * @throws ProblemException all that is wrong, with pointers that begin with {@code /choices/composition}
     */
    static Composition read(JsonObject composition) throws ProblemException {
        List<Problem> problems = new ArrayList<>();
        Optional<Composition> read = new CompositionReader(composition, problems).read();
        if (!problems.isEmpty() || read.isEmpty()) {
            throw new ProblemException(problems);
        }
        return read.get();
    }
}
