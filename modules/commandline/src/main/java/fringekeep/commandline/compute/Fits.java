package fringekeep.commandline.compute;

import fringekeep.archive.problem.ProblemException;
import fringekeep.interferometry.molecule.FitOutcome;
import fringekeep.interferometry.molecule.FitRefused;
import fringekeep.interferometry.molecule.FitWarning;
import fringekeep.interferometry.molecule.Parameter;
import fringekeep.interferometry.molecule.PropertyFit;
import java.util.List;

/** Fits of molecular properties as results. */
final class Fits {
    private Fits() {}

    static PropertyFit found(FitOutcome outcome) throws ProblemException {
        if (outcome instanceof FitRefused refused) {
            throw NoResult.because(refused.words());
        }
        return outcome.orThrow();
    }

    static PropertyFit report(FitOutcome outcome, Results out) throws ProblemException {
        PropertyFit fit = found(outcome);
        for (Parameter parameter : fit.parameters()) {
            out.estimate(name(parameter), parameter.unit(), fit.estimate(parameter));
        }
        out.bare("covariance", "", fit.covariance());
        out.list("covarianceOf", names(fit.parameters()));
        out.bare("chiSquare", "1", fit.chiSquare());
        out.bare("degreesOfFreedom", "1", fit.degreesOfFreedom());
        out.bare("pValue", "1", fit.pValue());
        out.bare("fitted", "", fit.fitted());
        out.list("warnings", fit.warnings().stream().map(FitWarning::words).toList());
        return fit;
    }

    static List<String> names(List<Parameter> parameters) {
        return parameters.stream().map(Fits::name).toList();
    }

    /** The parameter as a member name. */
    static String name(Parameter parameter) {
        StringBuilder name = new StringBuilder();
        boolean capital = false;
        for (char letter : Field.word(parameter).toCharArray()) {
            if (letter == '-') {
                capital = true;
            } else {
                name.append(capital ? Character.toUpperCase(letter) : letter);
                capital = false;
            }
        }
        return name.toString();
    }
}
