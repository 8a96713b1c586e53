package fringekeep.commandline.compute;

import fringekeep.archive.problem.Problem;
import fringekeep.archive.problem.ProblemException;
import fringekeep.interferometry.molecule.MeasuredCurve;
import fringekeep.interferometry.statistics.Estimate;
import java.util.Arrays;
import java.util.List;
import java.util.Locale;
import java.util.Map;
import java.util.Optional;
import java.util.OptionalDouble;

/** Checked inputs of one computation: required ones are there, numbers are SI. Thread rule: immutable. */
public final class Inputs {
    private final Map<String, Given> given;

    /** What stands in one input. */
    sealed interface Given {
        /** Numbers with their standard uncertainties, NaN where none is stated. */
        record Numbers(double[] values, double[] uncertainties) implements Given {}

        /** Rows of numbers. */
        record Rows(double[][] values) implements Given {}

        /** A word. */
        record Word(String value) implements Given {}

        /** A flag. */
        record Flag(boolean value) implements Given {}

        /** Inputs of inputs. */
        record Groups(List<Inputs> members) implements Given {}
    }

    Inputs(Map<String, Given> given) {
        this.given = Map.copyOf(given);
    }

    boolean has(String name) {
        return given.containsKey(name);
    }

    double number(String name) {
        return numbers(name)[0];
    }

    double number(String name, double otherwise) {
        return has(name) ? number(name) : otherwise;
    }

    OptionalDouble optional(String name) {
        return has(name) ? OptionalDouble.of(number(name)) : OptionalDouble.empty();
    }

    int whole(String name) {
        return (int) number(name);
    }

    int whole(String name, int otherwise) {
        return has(name) ? whole(name) : otherwise;
    }

    double[] numbers(String name) {
        return given(name) instanceof Given.Numbers numbers ? numbers.values().clone() : new double[0];
    }

    double[][] rows(String name) {
        return given(name) instanceof Given.Rows rows ? rows.values() : new double[0][];
    }

    /** Value and standard uncertainty, 0 where none is stated. */
    Estimate estimate(String name) {
        double u = uncertainties(name)[0];
        return new Estimate(number(name), Double.isNaN(u) ? 0 : u);
    }

    /** Standard uncertainties, NaN where none is stated. */
    double[] uncertainties(String name) {
        return given(name) instanceof Given.Numbers numbers
                ? numbers.uncertainties().clone()
                : new double[0];
    }

    /** Measured values against places; every value needs its uncertainty. */
    MeasuredCurve curve(String places, String values) throws ProblemException {
        return new MeasuredCurve(numbers(places), numbers(values), stated(values));
    }

    /** Standard uncertainties that must be stated. */
    double[] stated(String name) throws ProblemException {
        double[] uncertainties = uncertainties(name);
        if (Arrays.stream(uncertainties).anyMatch(Double::isNaN)) {
            throw new ProblemException(new Problem(
                    "compute.no-uncertainty",
                    "The values of " + name + " are weighted by their uncertainties, and some state none.",
                    name,
                    "Give \"u\": one standard uncertainty, or one for each value, in the unit of the values."));
        }
        return uncertainties;
    }

    boolean flag(String name) {
        return given.get(name) instanceof Given.Flag flag && flag.value();
    }

    String word(String name, String otherwise) {
        return given.get(name) instanceof Given.Word word ? word.value() : otherwise;
    }

    <E extends Enum<E>> E choice(String name, E otherwise) {
        String word = word(name, Field.word(otherwise)).toUpperCase(Locale.ROOT).replace('-', '_');
        return Enum.valueOf(otherwise.getDeclaringClass(), word);
    }

    List<Inputs> groups(String name) {
        return given.get(name) instanceof Given.Groups groups ? groups.members() : List.of();
    }

    Inputs group(String name) {
        return groups(name).get(0);
    }

    private Given given(String name) {
        return Optional.ofNullable(given.get(name))
                .orElseThrow(() -> new IllegalArgumentException("the input " + name + " is missing"));
    }
}
