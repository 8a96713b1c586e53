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

    /** Each shared parameter by itself, so the work is spread over the cores; the order of the answer is that of the list. */
    Found run() {
        List<Answer> answers = question.shared().parallelStream()
                .map(this::answer)
                .flatMap(Optional::stream)
                .toList();
        List<Sensitive> sensitivities = new ArrayList<>();
        List<String> notStated = new ArrayList<>();
        for (Answer answer : answers) {
            answer.sensitive().ifPresent(sensitivities::add);
            answer.notStated().ifPresent(notStated::add);
        }
        return new Found(sensitivities, notStated);
    }

    private record Answer(Optional<Sensitive> sensitive, Optional<String> notStated) {}

    private Optional<Answer> answer(Shared shared) {
        if (shared.deviation().isEmpty()) {
            return Optional.of(new Answer(Optional.empty(), Optional.of(shared.words())));
        }
        if (!(shared.deviation().getAsDouble() > 0)) {
            return Optional.empty();
        }
        double step = STEP * shared.deviation().getAsDouble();
        Optional<double[]> above = moved(new Shift(shared, step));
        Optional<double[]> below = moved(new Shift(shared, -step));
        if (above.isEmpty() || below.isEmpty()) {
            String words = shared.words() + " (the fit cannot be followed along it)";
            return Optional.of(new Answer(Optional.empty(), Optional.of(words)));
        }
        return Optional.of(new Answer(
                Optional.of(new Sensitive(shared, slopes(above.get(), below.get(), step))), Optional.empty()));
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
