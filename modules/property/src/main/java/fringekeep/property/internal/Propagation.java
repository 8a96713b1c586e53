package fringekeep.property.internal;

import fringekeep.interferometry.molecule.FitOutcome;
import fringekeep.interferometry.molecule.Parameter;
import fringekeep.interferometry.molecule.PowerCurveFitter;
import fringekeep.interferometry.molecule.PropertyFit;
import fringekeep.interferometry.nearfield.Description;
import java.util.ArrayList;
import java.util.List;
import java.util.Optional;

/**
 * How fitted estimates answer to what the points share: each shared parameter is moved by a tenth of its uncertainty either
 * way and the fit repeated close to the answer (JCGM 100:2008, 5.1.4: sensitivities may be found numerically).
 */
final class Propagation {
    private static final double STEP = 0.1;
    private static final double REACH = 0.2;

    private final PowerQuestion question;
    private final Description description;
    private final PropertyFit fit;

    /** What was found. */
    record Found(List<Sensitive> sensitivities, List<String> notStated) {
        Found {
            sensitivities = List.copyOf(sensitivities);
            notStated = List.copyOf(notStated);
        }

        /** Variance of estimate i from all shared parameters. */
        double variance(int i) {
            double variance = 0;
            for (Sensitive each : sensitivities) {
                double part = each.derivatives()[i] * each.shared().deviation().orElse(0);
                variance += part * part;
            }
            return variance;
        }
    }

    /** A shared parameter and the derivative of each estimate with respect to it. */
    record Sensitive(Shared shared, double[] derivatives) {
        Sensitive {
            derivatives = derivatives.clone();
        }

        @Override
        public double[] derivatives() {
            return derivatives.clone();
        }
    }

    Propagation(PowerQuestion question, Description description, PropertyFit fit) {
        this.question = question;
        this.description = description;
        this.fit = fit;
    }

    Found run() {
        List<Sensitive> sensitivities = new ArrayList<>();
        List<String> notStated = new ArrayList<>();
        for (Shared shared : question.shared()) {
            if (shared.deviation().isEmpty()) {
                notStated.add(shared.words());
            } else if (shared.deviation().getAsDouble() > 0) {
                double step = STEP * shared.deviation().getAsDouble();
                Optional<double[]> above = moved(new Shift(shared, step));
                Optional<double[]> below = moved(new Shift(shared, -step));
                if (above.isPresent() && below.isPresent()) {
                    sensitivities.add(new Sensitive(shared, slopes(above.get(), below.get(), step)));
                } else {
                    notStated.add(shared.words() + " (the fit cannot be followed along it)");
                }
            }
        }
        return new Found(sensitivities, notStated);
    }

    private static double[] slopes(double[] above, double[] below, double step) {
        double[] slopes = new double[above.length];
        for (int i = 0; i < slopes.length; i++) {
            slopes[i] = (above[i] - below[i]) / (2 * step);
        }
        return slopes;
    }

    private Optional<double[]> moved(Shift shift) {
        double volume = fit.estimate(Parameter.POLARIZABILITY_VOLUME).value();
        PowerCurveFitter fitter = question.fitter(shift);
        PowerCurveFitter near = new PowerCurveFitter(
                fitter.setup(),
                fitter.ensemble(),
                fitter.choices().withSearch(volume * (1 - REACH), volume * (1 + REACH)));
        FitOutcome outcome = near.fit(question.data(shift), description);
        return outcome instanceof PropertyFit again ? Optional.of(again.values()) : Optional.empty();
    }
}
