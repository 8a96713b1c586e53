package fringekeep.interferometry.molecule;

import fringekeep.interferometry.nearfield.BeamEnsemble;
import fringekeep.interferometry.nearfield.Description;
import fringekeep.interferometry.nearfield.PowerSeriesSetup;
import fringekeep.interferometry.nearfield.VisibilityAgainstPower;
import fringekeep.interferometry.statistics.Estimate;
import java.util.ArrayList;
import java.util.Comparator;
import java.util.List;
import java.util.Optional;
import java.util.function.DoubleUnaryOperator;

/**
 * Fits optical polarizability, and where asked absorption cross section and remaining visibility factor, to visibility
 * against laser power.
 *
 * <p>The curve oscillates with polarizability, so the search is global first: the weighted sum of squares is scanned in
 * steps of 0.05 of the mean grating argument at the largest power (with the best factor at each step), every local
 * minimum is then polished with analytic derivatives. The lowest is the answer; others within a chi-square difference
 * of 9 are warned about. Uncertainties are those of the data alone; shared inputs are propagated by
 * {@link SharedInputs}.
 *
 * <p>Thread rule: immutable. Cost: a few milliseconds, 0.1 s with absorption over a fine velocity distribution.
 *
 * @param setup    the interferometer
 * @param ensemble speeds, masses, heights
 * @param choices  what is free and where to look
 */
public record PowerCurveFitter(PowerSeriesSetup setup, BeamEnsemble ensemble, PowerCurveChoices choices) {
    private static final double LOWEST_ARGUMENT = 0.05;
    private static final double HIGHEST_ARGUMENT = 40.0;
    private static final double ARGUMENT_STEP = 0.05;
    private static final int MOST_STEPS = 20_000;
    private static final int MOST_MINIMA = 12;
    /** A table pays if it costs no more values than this many looks at each point. */
    private static final double TABLE_WORTH = 2000.0;

    private static final double LARGEST_START_FACTOR = 1.5;
    private static final double NEARBY = 9.0;
    private static final double POOR = 1e-3;
    private static final double FIRST_MAXIMUM = 3.0542;

    /** Relative strengths z/c at which a free cross section is started. */
    private static final double[] START_ABSORPTIONS = {0.0, 0.1, 0.4};

    /**
     * Fits in one description.
     *
     * @param data        visibilities against power (W)
     * @param description quantum or classical
     * @return the fit, or why there is none
     */
    public FitOutcome fit(MeasuredCurve data, Description description) {
        int free = PowerCurveModel.parameters(choices).size();
        int points = data.size() + (choices.known().isPresent() ? 1 : 0);
        if (points < free) {
            return new FitRefused(
                    FitRefused.Reason.TOO_FEW_POINTS,
                    points + " points cannot determine " + free
                            + " parameters: measure more powers or hold a parameter");
        }
        VisibilityAgainstPower visibility = new VisibilityAgainstPower(setup, ensemble, description);
        double perVolume = visibility.meanArgumentFactor() * data.largestPlace();
        if (!(perVolume > 0.0)) {
            return new FitRefused(
                    FitRefused.Reason.NOT_DETERMINED,
                    "the light grating leaves no trace: no power above 0 W, or a whole number of Talbot lengths");
        }
        return search(prepared(visibility, data, perVolume), perVolume);
    }

    /** The model for the solver, tabulated over the search range where it depends on one number only. */
    private PowerCurveModel prepared(VisibilityAgainstPower visibility, MeasuredCurve data, double perVolume) {
        PowerCurveModel plain = new PowerCurveModel(visibility, choices, data);
        double reach = 1.25 * highest(perVolume) * data.largestPlace();
        return plain.phaseOnly()
                ? new PowerCurveModel(visibility.tabulated(reach, TABLE_WORTH * data.size()), choices, data)
                : plain;
    }

    private double lowest(double perVolume) {
        return choices.lowest() > 0.0 ? choices.lowest() : LOWEST_ARGUMENT / perVolume;
    }

    private double highest(double perVolume) {
        return choices.highest() > 0.0 ? choices.highest() : HIGHEST_ARGUMENT / perVolume;
    }

    private FitOutcome search(PowerCurveModel model, double perVolume) {
        KinkedCurveFitter fitter = new KinkedCurveFitter(model, model.data());
        List<KinkedCurveFitter.Minimum> minima = new ArrayList<>();
        for (double[] start : starts(model, perVolume)) {
            fitter.minimum(start).filter(found -> found.parameters()[0] > 0.0).ifPresent(found -> keep(minima, found));
        }
        minima.sort(Comparator.comparingDouble(KinkedCurveFitter.Minimum::chiSquare));
        if (minima.isEmpty()) {
            return new FitRefused(
                    FitRefused.Reason.NOT_CONVERGED,
                    Rounded.words(
                            "no minimum was found for a polarizability volume from {4} to {4} m^3: check powers, speeds and waist",
                            lowest(perVolume), highest(perVolume)));
        }
        return finished(model, fitter, minima, perVolume);
    }

    private static void keep(List<KinkedCurveFitter.Minimum> minima, KinkedCurveFitter.Minimum found) {
        for (KinkedCurveFitter.Minimum known : minima) {
            if (Math.abs(known.parameters()[0] - found.parameters()[0]) < 1e-5 * known.parameters()[0]) {
                return;
            }
        }
        minima.add(found);
    }

    /** Starting points: local minima of the scan, the deepest first, without those far too shallow to win. */
    private List<double[]> starts(PowerCurveModel model, double perVolume) {
        List<Scanned> scanned = new ArrayList<>();
        double[] absorptions = choices.fitCrossSection() ? START_ABSORPTIONS : new double[] {0.0};
        for (double absorption : absorptions) {
            scan(model, perVolume, absorption, scanned);
        }
        scanned.sort(Comparator.comparingDouble(Scanned::chiSquare));
        double hopeless = scanned.isEmpty() ? 0.0 : 4.0 * scanned.get(0).chiSquare() + 50.0;
        return scanned.stream()
                .filter(minimum -> minimum.chiSquare() <= hopeless)
                .limit(MOST_MINIMA)
                .map(Scanned::start)
                .toList();
    }

    private record Scanned(double[] start, double chiSquare) {}

    private void scan(PowerCurveModel model, double perVolume, double absorption, List<Scanned> minima) {
        double low = lowest(perVolume);
        double high = highest(perVolume);
        int steps = (int) Math.min(MOST_STEPS, Math.ceil((high - low) * perVolume / ARGUMENT_STEP) + 2.0);
        double ratio = absorption
                * model.visibility().meanArgumentFactor()
                / Math.max(model.visibility().meanAbsorptionFactor(), Double.MIN_NORMAL);
        Optional<DoubleUnaryOperator> ray = choices.fitCrossSection()
                ? Optional.of(model.visibility()
                        .alongRay(ratio, high * model.largestPower(), steps * (double) model.points()))
                : Optional.empty();
        Scanned before = new Scanned(new double[0], Double.POSITIVE_INFINITY);
        Scanned here = before;
        for (int step = 0; step <= steps; step++) {
            double volume = low + (high - low) * step / steps;
            double crossSection = choices.fitCrossSection() ? ratio * volume : choices.crossSection();
            double[] shape =
                    ray.map(curve -> model.shape(curve, volume)).orElseGet(() -> model.shape(volume, crossSection));
            Scanned next = scanned(model, shape, volume, crossSection);
            if (step > 0 && here.chiSquare <= before.chiSquare && here.chiSquare <= next.chiSquare) {
                minima.add(here);
            }
            before = here;
            here = next;
        }
        if (here.chiSquare < before.chiSquare) {
            minima.add(here);
        }
    }

    private Scanned scanned(PowerCurveModel model, double[] shape, double volume, double crossSection) {
        double product = 0.0;
        double square = 0.0;
        for (int k = 0; k < shape.length; k++) {
            double weight = 1.0 / (model.data().uncertainty(k) * model.data().uncertainty(k));
            product += weight * shape[k] * model.data().value(k);
            square += weight * shape[k] * shape[k];
        }
        double best = square > 0.0 ? Math.min(LARGEST_START_FACTOR, Math.max(1e-3, product / square)) : 1.0;
        double factor = choices.fitFactor() ? best : choices.factor();
        return new Scanned(start(volume, crossSection, factor), chiSquare(model, shape, factor, volume));
    }

    private static double chiSquare(PowerCurveModel model, double[] shape, double factor, double volume) {
        double sum = 0.0;
        for (int k = 0; k < model.data().size(); k++) {
            double modelled = k < shape.length ? factor * shape[k] : volume;
            double pull = (model.data().value(k) - modelled) / model.data().uncertainty(k);
            sum += pull * pull;
        }
        return sum;
    }

    private double[] start(double volume, double crossSection, double factor) {
        List<Double> start = new ArrayList<>(List.of(volume));
        if (choices.fitCrossSection()) {
            start.add(crossSection);
        }
        if (choices.fitFactor()) {
            start.add(factor);
        }
        return start.stream().mapToDouble(Double::doubleValue).toArray();
    }

    private FitOutcome finished(
            PowerCurveModel model, KinkedCurveFitter fitter, List<KinkedCurveFitter.Minimum> minima, double perVolume) {
        KinkedCurveFitter.Minimum best = minima.get(0);
        Optional<double[]> covariance = fitter.covariance(best.parameters());
        if (covariance.isEmpty()) {
            return new FitRefused(
                    FitRefused.Reason.NOT_DETERMINED,
                    "these data leave a combination of " + PowerCurveModel.parameters(choices)
                            + " open: hold one of them");
        }
        PropertyFit.Solution solution = new PropertyFit.Solution(
                best.parameters(), covariance.get(), fitter.curve(best.parameters()), best.chiSquare());
        PropertyFit fit = new PropertyFit(PowerCurveModel.parameters(choices), solution, model.data(), List.of());
        return fit.withWarnings(warnings(fit, minima, perVolume));
    }

    private List<FitWarning> warnings(PropertyFit fit, List<KinkedCurveFitter.Minimum> minima, double perVolume) {
        List<FitWarning> warnings = new ArrayList<>();
        warnAboutFactor(fit, perVolume, warnings);
        warnAboutOtherMinima(minima, warnings);
        if (fit.pValue() < POOR) {
            warnings.add(new FitWarning(
                    FitWarning.Sort.POOR_FIT,
                    Rounded.words(
                            "chi-square {4} at {} degrees of freedom (p = {2}): more scatter than stated",
                            fit.chiSquare(), fit.degreesOfFreedom(), fit.pValue())));
        }
        if (!minima.get(0).smooth()) {
            warnings.add(new FitWarning(
                    FitWarning.Sort.AT_VANISHING_FRINGE,
                    "the modelled fringe changes sign at a measured power; use the profile interval"));
        }
        double volume = fit.estimate(Parameter.POLARIZABILITY_VOLUME).value();
        if (volume < lowest(perVolume) || volume > highest(perVolume)) {
            warnings.add(new FitWarning(
                    FitWarning.Sort.AT_SEARCH_LIMIT,
                    Rounded.words("the polarizability volume {4} m^3 lies outside the search range", volume)));
        }
        return warnings;
    }

    private static void warnAboutFactor(PropertyFit fit, double perVolume, List<FitWarning> warnings) {
        if (fit.has(Parameter.ABSORPTION_CROSS_SECTION)
                && fit.estimate(Parameter.ABSORPTION_CROSS_SECTION).value() < 0.0) {
            warnings.add(new FitWarning(
                    FitWarning.Sort.NEGATIVE_VALUE,
                    "the absorption cross section came out negative; quote an upper limit"));
        }
        warnAboutCrossSection(fit, warnings);
        if (!fit.has(Parameter.VISIBILITY_FACTOR)) {
            return;
        }
        double correlation = fit.correlation(Parameter.POLARIZABILITY_VOLUME, Parameter.VISIBILITY_FACTOR);
        double argument = fit.estimate(Parameter.POLARIZABILITY_VOLUME).value() * perVolume;
        if (Math.abs(correlation) > 0.9) {
            String reach = argument < FIRST_MAXIMUM ? "; the curve does not reach its first maximum" : "";
            warnings.add(new FitWarning(
                    FitWarning.Sort.FACTOR_AND_POLARIZABILITY_DEGENERATE,
                    Rounded.words("factor and polarizability are correlated by {3}{}", correlation, reach)));
        }
        Estimate factor = fit.estimate(Parameter.VISIBILITY_FACTOR);
        if (factor.value() > 1.0 + 2.0 * factor.standardUncertainty()) {
            warnings.add(new FitWarning(
                    FitWarning.Sort.FACTOR_ABOVE_ONE,
                    Rounded.words(
                            "the visibility factor is {4}, more than an ideal instrument gives", factor.value())));
        }
    }

    private static void warnAboutCrossSection(PropertyFit fit, List<FitWarning> warnings) {
        if (!fit.has(Parameter.ABSORPTION_CROSS_SECTION)) {
            return;
        }
        for (Parameter other : fit.parameters()) {
            double correlation = fit.correlation(Parameter.ABSORPTION_CROSS_SECTION, other);
            if (other != Parameter.ABSORPTION_CROSS_SECTION && Math.abs(correlation) > 0.9) {
                warnings.add(new FitWarning(
                        FitWarning.Sort.PARAMETERS_DEGENERATE,
                        Rounded.words("absorption cross section and {} are correlated by {3}", other, correlation)));
            }
        }
    }

    private static void warnAboutOtherMinima(List<KinkedCurveFitter.Minimum> minima, List<FitWarning> warnings) {
        for (KinkedCurveFitter.Minimum other : minima.subList(1, minima.size())) {
            double excess = other.chiSquare() - minima.get(0).chiSquare();
            if (excess < NEARBY) {
                warnings.add(new FitWarning(
                        FitWarning.Sort.SEVERAL_MINIMA,
                        Rounded.words(
                                "a polarizability volume of {5} m^3 fits almost as well (chi-square larger by {3})",
                                other.parameters()[0], excess)));
            }
        }
    }

    /** The solver's view of the same question, for profiles and resampling near a known answer. */
    PowerCurveModel near(MeasuredCurve data, Description description, double[] around) {
        VisibilityAgainstPower visibility = new VisibilityAgainstPower(setup, ensemble, description);
        PowerCurveModel plain = new PowerCurveModel(visibility, choices, data);
        double reach = 2.0 * around[0] * data.largestPlace();
        return plain.phaseOnly()
                ? new PowerCurveModel(visibility.tabulated(reach, TABLE_WORTH * data.size()), choices, data)
                : plain;
    }
}
