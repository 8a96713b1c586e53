package fringekeep.commandline.compute;

import fringekeep.archive.json.Json;
import fringekeep.archive.json.JsonObject;
import fringekeep.archive.problem.ProblemException;
import fringekeep.interferometry.molecule.DeflectionFit;
import fringekeep.interferometry.molecule.FieldDeflection;
import fringekeep.interferometry.molecule.MeasuredCurve;
import fringekeep.interferometry.molecule.MomentFit;
import fringekeep.interferometry.molecule.Parameter;
import fringekeep.interferometry.molecule.Polarizability;
import fringekeep.interferometry.molecule.PowerLawBudget;
import fringekeep.interferometry.molecule.ReferenceRatio;
import fringekeep.interferometry.statistics.Estimate;
import java.util.ArrayList;
import java.util.List;

/** Deflection by static electric and magnetic fields. */
final class DeflectionMethods {
    private static final Field MASS = Field.quantity("mass", "kg", "720.642 u", "mass of the molecule");
    private static final Field VELOCITY = Field.quantity("velocity", "m/s", "170 m/s", "velocity");
    private static final Field SEPARATION =
            Field.quantity("separation", "m", "0.38 m", "distance between neighbouring gratings");
    private static final Field START =
            Field.quantity("fieldStart", "m", "80 mm", "start of the field behind grating 1");
    private static final Field LENGTH = Field.quantity("fieldLength", "m", "47 mm", "length of the field");
    private static final Field PERIOD = Field.quantity("period", "m", "991 nm", "grating period");
    private static final Field TEMPERATURE = Field.quantity("temperature", "K", "900 K", "temperature");

    private DeflectionMethods() {}

    private static JsonObject power(String name, double exponent, double relative) {
        return JsonObject.EMPTY
                .with("name", name)
                .with("exponent", Json.of(exponent))
                .with("relative", Json.of(relative));
    }

    static List<Method> all() {
        return List.of(
                Method.of(
                        "electric-deflection",
                        "Susceptibility α + <d²>/3kT and the fringe shift by (E·∇)E",
                        DeflectionMethods::electric,
                        Field.quantity("polarizabilityVolume", "m3", "95 Ao3", "static polarizability volume"),
                        Field.quantity("dipoleMoment", "C.m", "3.3e-30 C.m", "root mean square of the moment")
                                .orNothing(),
                        TEMPERATURE.orNothing(),
                        MASS,
                        VELOCITY,
                        Field.quantity("fieldTerm", "V2/m3", "1.2e14 V2/m3", "(E·∇)E"),
                        SEPARATION,
                        START,
                        LENGTH,
                        PERIOD),
                Method.of(
                        "magnetic-deflection",
                        "Curie susceptibility, fringe shift by (B·∇)B, and the visibility unresolved moments leave",
                        DeflectionMethods::magnetic,
                        Field.number("landeFactor", 2, "g"),
                        Field.number("angularMomentum", 0.5, "J in units of ħ"),
                        TEMPERATURE,
                        MASS,
                        VELOCITY,
                        Field.quantity("fieldTerm", "T2/m", "40 T2/m", "(B·∇)B"),
                        Field.quantity("gradient", "T/m", "1 T/m", "dB/dx, for unresolved moments")
                                .orNothing(),
                        SEPARATION,
                        START,
                        LENGTH,
                        PERIOD),
                Method.of(
                        "susceptibility-from-shift",
                        "Electric (fieldTerm) or magnetic (magneticFieldTerm) susceptibility from one fringe shift",
                        DeflectionMethods::fromShift,
                        Field.quantity("shift", "m", "178.4(2.1) nm", "fringe shift"),
                        Field.quantity("fieldTerm", "V2/m3", "1.2e14 V2/m3", "(E·∇)E; give its uncertainty")
                                .orNothing(),
                        Field.quantity("magneticFieldTerm", "T2/m", "40 T2/m", "(B·∇)B")
                                .seldom(),
                        MASS,
                        VELOCITY,
                        SEPARATION,
                        START,
                        LENGTH,
                        PERIOD),
                Method.of(
                        "deflection-fit",
                        "Susceptibility from wrapped phases against squared voltage, with unwrapping",
                        DeflectionMethods::fit,
                        Field.list("voltages", "V", "kV", "voltages", 0, 1, 2, 3, 4, 5, 6, 7),
                        Field.measured(
                                "phases",
                                "rad",
                                "rad",
                                "wrapped phases with u",
                                new double[] {0.20, 0.32, 0.69, 1.29, 2.14, -3.05, -1.71, -0.13},
                                new double[] {0.05}),
                        Field.quantity(
                                "fieldTermPerSquaredVoltage", "m-3", "2.6e6 m-3", "(E·∇)E over the squared voltage"),
                        MASS,
                        VELOCITY,
                        SEPARATION,
                        START,
                        LENGTH,
                        PERIOD,
                        Field.quantity("searchFrom", "m3", "0 Ao3", "lower end of the search, as a volume"),
                        Field.quantity("searchTo", "m3", "400 Ao3", "upper end of the search, as a volume")),
                Method.of(
                        "magnetic-deflection-fit",
                        "Magnetic susceptibility from wrapped phases against squared current, with unwrapping",
                        DeflectionMethods::magneticFit,
                        Field.list("currents", "A", "A", "currents of the magnet", 0, 2, 4, 6, 8, 10),
                        Field.measured(
                                "phases",
                                "rad",
                                "rad",
                                "wrapped phases with u",
                                new double[] {0.10, 0.22, 0.59, 1.19, 2.05, -3.13},
                                new double[] {0.05}),
                        Field.quantity(
                                "fieldTermPerSquaredCurrent",
                                "T2.m-1.A-2",
                                "0.4 T2.m-1.A-2",
                                "(B·∇)B over the squared current"),
                        MASS,
                        VELOCITY,
                        SEPARATION,
                        START,
                        LENGTH,
                        PERIOD,
                        Field.quantity("searchFrom", "J/T2", "-1e-24 J/T2", "lower end of the search"),
                        Field.quantity("searchTo", "J/T2", "1e-24 J/T2", "upper end of the search")),
                Method.of(
                        "power-law-budget",
                        "Uncertainty of a product of powers: statistical and shared parts apart",
                        DeflectionMethods::budget,
                        Field.quantity("result", "1", "95.0(12)", "the result with its statistical uncertainty"),
                        Field.group(
                                "inputs",
                                "inputs common to all data",
                                List.of(
                                        Field.text("name", "velocity", "what it is"),
                                        Field.number("exponent", 2, "power with which it enters"),
                                        Field.number("relative", 0.01, "relative standard uncertainty")),
                                power("velocity", 2, 0.01),
                                power("field term", -1, 0.02))),
                Method.of(
                        "moment-fit",
                        "Polarizability and permanent moment from the susceptibility against temperature",
                        (in, out) -> Fits.report(MomentFit.fit(in.curve("temperatures", "susceptibilities")), out),
                        Field.list("temperatures", "K", "K", "temperatures", 300, 400, 500, 600, 700),
                        Field.measured(
                                "susceptibilities",
                                "C.m2/V",
                                "C.m2/V",
                                "electric susceptibilities with u",
                                new double[] {1.472e-38, 1.271e-38, 1.149e-38, 1.069e-38, 1.011e-38},
                                new double[] {1.2e-40})),
                Method.of(
                        "reference-ratio",
                        "Ratio of two susceptibilities in the same field, which cancels with the geometry",
                        DeflectionMethods::ratio,
                        Field.quantity("shift", "m", "178(2) nm", "fringe shift of the species"),
                        MASS,
                        Field.quantity("velocity", "m/s", "170.0(8) m/s", "of the species"),
                        Field.quantity("referenceShift", "m", "121(2) nm", "fringe shift of the reference"),
                        Field.quantity("referenceMass", "kg", "840.749 u", "mass of the reference"),
                        Field.quantity("referenceVelocity", "m/s", "188.0(9) m/s", "of the reference")));
    }

    private static FieldDeflection field(Inputs in) {
        return new FieldDeflection(
                in.number("separation"), in.number("fieldStart"), in.number("fieldLength"), in.number("period"));
    }

    private static void electric(Inputs in, Results out) {
        double moment = in.number("dipoleMoment", 0);
        double chi = moment == 0
                ? Polarizability.siFromVolume(in.number("polarizabilityVolume"))
                : FieldDeflection.electricSusceptibility(
                        Polarizability.siFromVolume(in.number("polarizabilityVolume")),
                        moment * moment,
                        in.number("temperature"));
        out.value("susceptibility", "C.m2/V", chi);
        shift(chi, in, out);
    }

    private static void shift(double susceptibility, Inputs in, Results out) {
        FieldDeflection field = field(in);
        double shift = field.shift(susceptibility, in.number("fieldTerm"), in.number("mass"), in.number("velocity"));
        out.value("fringeShift", "m", shift);
        out.value("fringePhase", "rad", field.phase(shift));
        out.value("geometryFactor", "m2", field.geometryFactor());
    }

    private static void magnetic(Inputs in, Results out) {
        double spin = in.number("angularMomentum");
        double chi = FieldDeflection.curieSusceptibility(in.number("landeFactor"), spin, in.number("temperature"));
        out.value("susceptibility", "J/T2", chi);
        shift(chi, in, out);
        if (in.has("gradient")) {
            double phase = field(in)
                    .phasePerMagneticNumber(
                            in.number("landeFactor"), in.number("gradient"), in.number("mass"), in.number("velocity"));
            out.value("phasePerMagneticNumber", "rad", phase);
            out.value("visibilityOfUnresolvedMoments", "1", FieldDeflection.unresolvedMoments(phase, spin));
        }
    }

    private static void fromShift(Inputs in, Results out) {
        String term = in.has("fieldTerm") ? "fieldTerm" : "magneticFieldTerm";
        double chi =
                field(in).susceptibility(in.number("shift"), in.number(term), in.number("mass"), in.number("velocity"));
        out.value("susceptibility", term.equals("fieldTerm") ? "C.m2/V" : "J/T2", chi);
    }

    private static void budget(Inputs in, Results out) {
        List<PowerLawBudget.Input> inputs = new ArrayList<>();
        for (Inputs one : in.groups("inputs")) {
            inputs.add(new PowerLawBudget.Input(one.word("name", ""), one.number("exponent"), one.number("relative")));
        }
        Estimate given = in.estimate("result");
        PowerLawBudget budget = PowerLawBudget.of(given, inputs);
        out.bare("statisticalUncertainty", "1", budget.statistical());
        out.bare("sharedUncertainty", "1", budget.shared());
        out.bare("combinedUncertainty", "1", budget.combined());
        out.bare(
                "contributions",
                "1",
                budget.parts().stream()
                        .mapToDouble(PowerLawBudget.Part::contribution)
                        .toArray());
    }

    private static void fit(Inputs in, Results out) throws ProblemException {
        double[] squares = in.numbers("voltages");
        for (int k = 0; k < squares.length; k++) {
            squares[k] *= squares[k];
        }
        FieldDeflection field = field(in);
        double factor = field.phase(
                field.shift(1.0, in.number("fieldTermPerSquaredVoltage"), in.number("mass"), in.number("velocity")));
        double unit = Polarizability.siFromVolume(1);
        report(
                new DeflectionFit(factor, unit * in.number("searchFrom"), unit * in.number("searchTo")),
                squares,
                in,
                out);
    }

    private static void magneticFit(Inputs in, Results out) throws ProblemException {
        double[] squares = in.numbers("currents");
        for (int k = 0; k < squares.length; k++) {
            squares[k] *= squares[k];
        }
        FieldDeflection field = field(in);
        double factor = field.phase(
                field.shift(1.0, in.number("fieldTermPerSquaredCurrent"), in.number("mass"), in.number("velocity")));
        report(
                new DeflectionFit(
                        factor, in.number("searchFrom"), in.number("searchTo"), Parameter.MAGNETIC_SUSCEPTIBILITY),
                squares,
                in,
                out);
    }

    private static void report(DeflectionFit question, double[] squares, Inputs in, Results out)
            throws ProblemException {
        DeflectionFit.Result result =
                question.fit(new MeasuredCurve(squares, in.numbers("phases"), in.stated("phases")));
        Fits.report(result.outcome(), out);
        out.bare("unwrappedPhases", "rad", result.unwrapped());
    }

    private static void ratio(Inputs in, Results out) {
        ReferenceRatio.Deflected species =
                new ReferenceRatio.Deflected(in.estimate("shift"), in.number("mass"), in.estimate("velocity"));
        ReferenceRatio.Deflected reference = new ReferenceRatio.Deflected(
                in.estimate("referenceShift"), in.number("referenceMass"), in.estimate("referenceVelocity"));
        out.estimate("ratio", "1", ReferenceRatio.of(species, reference));
    }
}
