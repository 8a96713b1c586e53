package fringekeep.commandline.compute;

import fringekeep.archive.json.JsonDocument;
import fringekeep.archive.json.JsonObject;
import fringekeep.archive.problem.Problem;
import fringekeep.archive.problem.ProblemException;
import java.util.List;

/**
 * A method of the library with the inputs it takes.
 *
 * @param name its name on the command line
 * @param words what it computes, one sentence
 * @param fields its inputs
 * @param body the call of the library
 */
public record Method(String name, String words, List<Field> fields, Body body) {
    /** Copies. */
    public Method {
        fields = List.copyOf(fields);
    }

    /** Calls the library. */
    @FunctionalInterface
    public interface Body {
        /**
         * Computes.
         *
         * @param in checked inputs, SI
         * @param out takes the results
         * @throws ProblemException if the data give no result
         */
        void compute(Inputs in, Results out) throws ProblemException;
    }

    static Method of(String name, String words, Body body, Field... fields) {
        return new Method(name, words, List.of(fields), body);
    }

    /**
     * Reads the inputs, computes, and carries the uncertainties of the inputs to the results.
     *
     * @param document inputs by name
     * @return the results in the order the method gives them
     * @throws ProblemException naming every field that is wrong, or why there is no result
     */
    public Results compute(JsonDocument document) throws ProblemException {
        Inputs inputs = new Reading(document).read(this);
        Results results = new Results();
        try {
            body.compute(inputs, results);
            new Propagation(this, inputs).carry(results);
        } catch (IllegalArgumentException e) {
            throw new ProblemException(new Problem(
                    "compute.refused",
                    "The inputs of " + name + " do not go together: " + e.getMessage() + ".",
                    name,
                    "Change the input named; \"compute " + name + " --form\" shows all with units and an example."));
        }
        return results;
    }

    /** A document that works: every input that has an example. */
    public JsonObject example() {
        return example(fields);
    }

    static JsonObject example(List<Field> fields) {
        JsonObject document = JsonObject.EMPTY;
        for (Field field : fields) {
            if (field.example().isPresent()) {
                document = document.with(field.name(), field.example().orElseThrow());
            }
        }
        return document;
    }
}
