package fringekeep.property.internal;

import fringekeep.archive.json.JsonObject;
import fringekeep.interferometry.molecule.FitOutcome;
import fringekeep.interferometry.molecule.Parameter;
import fringekeep.interferometry.molecule.PropertyFit;
import fringekeep.interferometry.nearfield.Description;
import fringekeep.interferometry.nearfield.OpticalResponse;
import fringekeep.interferometry.nearfield.VisibilityAgainstPower;
import java.util.ArrayList;
import java.util.List;
import java.util.Locale;

/**
 * How the stated uncertainties of the power readings enter. What readings share (the scale of the meter) belongs into a
 * calibration; what each reading states of itself is taken as independent unless the choices say that all readings err
 * together, or that it is not to be used.
 *
 * <p>Independent readings widen each point: the variance of a visibility becomes s<sup>2</sup> + (dV/dP u(P))<sup>2</sup>, with
 * the slope at the fit, and the fit is repeated until the estimates stand still (effective variance: J. Orear, Am. J. Phys. 50,
 * 912 (1982), doi:10.1119/1.12972; it is JCGM 100:2008, 5.1.2, for the residual). Phase and absorption of the grating are
 * proportional to the power, so the slope is (&alpha; &part;V/&part;&alpha; + &sigma; &part;V/&part;&sigma;)/P exactly.
 */
final class Readings {
    /** Parameter of the setup under which readings that err together are listed. */
    static final String TOGETHER = "powerReadings";

    private static final int MOST_ROUNDS = 12;
    private static final double STILL = 1e-9;

    /** How they enter. */
    enum Use {
        /** Not at all: the way of records that do not say. */
        AS_READ,
        /** Each by itself. */
        INDEPENDENT,
        /** All together. */
        TOGETHER;

        static Use of(JsonObject choices) {
            return choices.text("powers")
                    .map(text -> valueOf(text.toUpperCase(Locale.ROOT).replace('-', '_')))
                    .orElse(AS_READ);
        }
    }

    private Readings() {}

    /** The question with each point's uncertainty widened by that of its power; the same where there is nothing to widen. */
    static PowerQuestion widened(PowerQuestion question, Description stated) {
        boolean any = Use.of(question.choices()) == Use.INDEPENDENT
                && question.points().stream().anyMatch(point -> point.powerDeviation() > 0);
        PowerQuestion now = question;
        double[] before = {};
        for (int round = 0; any && round < MOST_ROUNDS; round++) {
            FitOutcome outcome = now.fitter(Shift.NONE).fit(now.data(Shift.NONE), stated);
            if (!(outcome instanceof PropertyFit fit)) {
                return now;
            }
            now = question.withDeviations(effective(question, fit, stated));
            if (still(before, fit.values())) {
                return now;
            }
            before = fit.values();
        }
        return now;
    }

    private static boolean still(double[] before, double[] now) {
        boolean still = before.length == now.length;
        for (int i = 0; still && i < now.length; i++) {
            still = Math.abs(now[i] - before[i]) <= STILL * Math.abs(now[i]);
        }
        return still;
    }

    private static double[] effective(PowerQuestion question, PropertyFit fit, Description stated) {
        var fitter = question.fitter(Shift.NONE);
        VisibilityAgainstPower model = new VisibilityAgainstPower(fitter.setup(), fitter.ensemble(), stated);
        double volume = fit.estimate(Parameter.POLARIZABILITY_VOLUME).value();
        double section = fit.has(Parameter.ABSORPTION_CROSS_SECTION)
                ? fit.estimate(Parameter.ABSORPTION_CROSS_SECTION).value()
                : fitter.choices().crossSection();
        double factor = fit.has(Parameter.VISIBILITY_FACTOR)
                ? fit.estimate(Parameter.VISIBILITY_FACTOR).value()
                : fitter.choices().factor();
        double[] deviations = new double[question.points().size()];
        for (int i = 0; i < deviations.length; i++) {
            PowerPoint point = question.points().get(i);
            double power = point.power(Shift.NONE);
            double slope = 0;
            if (power > 0) {
                VisibilityAgainstPower.Point at = model.point(power, new OpticalResponse(volume, section));
                slope = factor * (volume * at.byPolarizability() + section * at.byCrossSection()) / power;
            }
            double part = slope * point.powerDeviation();
            deviations[i] = Math.sqrt(point.deviation() * point.deviation() + part * part);
        }
        return deviations;
    }

    /** What is to be said of readings whose uncertainty is not known; nothing where they are not asked for. */
    static List<String> notStated(PowerQuestion question) {
        List<String> words = new ArrayList<>();
        long silent = question.points().stream()
                .filter(point -> Double.isNaN(point.readingDeviation()))
                .count();
        if (Use.of(question.choices()) != Use.AS_READ && silent > 0) {
            words.add("power as read (" + silent + " of " + question.points().size() + " fits)");
        }
        return List.copyOf(words);
    }
}
