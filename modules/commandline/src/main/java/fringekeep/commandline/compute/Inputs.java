package fringekeep.commandline.compute;

import fringekeep.archive.problem.Problem;
import fringekeep.archive.problem.ProblemException;
import fringekeep.interferometry.molecule.MeasuredCurve;
import fringekeep.interferometry.statistics.Estimate;
import java.util.ArrayList;
import java.util.Arrays;
import java.util.HashSet;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Locale;
import java.util.Map;
import java.util.Optional;
import java.util.OptionalDouble;
import java.util.Set;

/**
 * Checked inputs of one computation: required ones are there, numbers are SI. Remembers whose uncertainty a method used, so
 * that it is not carried to the results a second time. Thread rule: one thread.
 */
public final class Inputs {
    private final Map<String, Given> given;
    private final Set<String> judged = new HashSet<>();
    private final boolean repeated;

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
        this(given, false);
    }

    private Inputs(Map<String, Given> given, boolean repeated) {
        this.given = new LinkedHashMap<>(given);
        this.repeated = repeated;
    }

    /** Takes the place of an uncertainty and its size. */
    interface UncertaintyTaker {
        void take(String path, double u);
    }

    /** Whether these are inputs moved by an uncertainty: only results it is carried to are wanted. */
    boolean repeated() {
        return repeated;
    }

    /** Every stated uncertainty above 0 that no method used, with a path such as first.openFraction or heights[2]. */
    void eachUncertainty(String before, UncertaintyTaker taker) {
        given.forEach((name, value) -> {
            if (value instanceof Given.Numbers numbers && !judged.contains(name)) {
                double[] u = numbers.uncertainties();
                for (int k = 0; k < u.length; k++) {
                    if (u[k] > 0) {
                        taker.take(before + name + (u.length > 1 ? "[" + k + "]" : ""), u[k]);
                    }
                }
            }
            if (value instanceof Given.Groups groups) {
                for (int k = 0; k < groups.members().size(); k++) {
                    String place = groups.members().size() > 1 ? "[" + k + "]" : "";
                    groups.members().get(k).eachUncertainty(before + name + place + ".", taker);
                }
            }
        });
    }

    /** The same with the number at a path moved. */
    Inputs moved(String path, double by) {
        int dot = path.indexOf('.');
        String head = dot < 0 ? path : path.substring(0, dot);
        int bracket = head.indexOf('[');
        String name = bracket < 0 ? head : head.substring(0, bracket);
        int at = bracket < 0 ? 0 : Integer.parseInt(head.substring(bracket + 1, head.length() - 1));
        Map<String, Given> copy = new LinkedHashMap<>(given);
        if (given.get(name) instanceof Given.Numbers numbers) {
            double[] values = numbers.values().clone();
            values[at] += by;
            copy.put(name, new Given.Numbers(values, numbers.uncertainties()));
        } else if (given.get(name) instanceof Given.Groups groups) {
            List<Inputs> members = new ArrayList<>(groups.members());
            members.set(at, members.get(at).moved(path.substring(dot + 1), by));
            copy.put(name, new Given.Groups(members));
        }
        return new Inputs(copy, true);
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
        judged.add(name);
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
