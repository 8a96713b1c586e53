package fringekeep.interferometry.molecule;

import fringekeep.interferometry.statistics.Estimate;
import java.util.Optional;

/**
 * What a fit of visibility against power leaves free, and where it looks.
 *
 * @param fitCrossSection     whether the absorption cross section is fitted
 * @param crossSection        its value if it is not (m^2), &ge; 0; zero means no absorption
 * @param fitFactor           whether the remaining visibility factor is fitted
 * @param factor              its value if it is not
 * @param lowest              lower end of the search for the polarizability volume (m^3); zero chooses it from the
 *     data's largest power (mean grating argument 0.05)
 * @param highest             upper end (m^3); zero chooses it likewise (mean grating argument 40)
 * @param known               independently known polarizability volume (m^3), which then counts as one more data point
 * @param decisionThreshold   smallest |difference of ln L| at which one description is preferred; ln 100 by default
 */
public record PowerCurveChoices(
        boolean fitCrossSection,
        double crossSection,
        boolean fitFactor,
        double factor,
        double lowest,
        double highest,
        Optional<Estimate> known,
        double decisionThreshold) {
    /** ln 100: odds of a hundred to one. */
    public static final double ODDS_OF_A_HUNDRED = 4.605170185988092;

    /** Checks every number. */
    public PowerCurveChoices {
        if (!(crossSection >= 0.0) || !(factor > 0.0) || !(lowest >= 0.0) || !(highest >= 0.0)) {
            throw new IllegalArgumentException("cross section " + crossSection + " m^2, factor " + factor
                    + " and search range " + lowest + " to " + highest + " m^3 must not be negative");
        }
        if (highest > 0.0 && !(highest > lowest)) {
            throw new IllegalArgumentException("the search range " + lowest + " to " + highest + " m^3 is empty");
        }
        if (!(decisionThreshold > 0.0)) {
            throw new IllegalArgumentException("the decision threshold is positive, not " + decisionThreshold);
        }
    }

    /**
     * Polarizability alone, no absorption, factor one.
     *
     * @return the choices
     */
    public static PowerCurveChoices polarizabilityOnly() {
        return new PowerCurveChoices(false, 0.0, false, 1.0, 0.0, 0.0, Optional.empty(), ODDS_OF_A_HUNDRED);
    }

    /**
     * The same with the visibility factor free.
     *
     * @return the choices
     */
    public PowerCurveChoices withFreeFactor() {
        return new PowerCurveChoices(
                fitCrossSection, crossSection, true, factor, lowest, highest, known, decisionThreshold);
    }

    /**
     * The same with the factor held.
     *
     * @param value the factor, &gt; 0
     * @return the choices
     */
    public PowerCurveChoices withFactor(double value) {
        return new PowerCurveChoices(
                fitCrossSection, crossSection, false, value, lowest, highest, known, decisionThreshold);
    }

    /**
     * The same with the absorption cross section free.
     *
     * @return the choices
     */
    public PowerCurveChoices withFreeCrossSection() {
        return new PowerCurveChoices(true, crossSection, fitFactor, factor, lowest, highest, known, decisionThreshold);
    }

    /**
     * The same with the absorption cross section held.
     *
     * @param value cross section (m^2), &ge; 0
     * @return the choices
     */
    public PowerCurveChoices withCrossSection(double value) {
        return new PowerCurveChoices(false, value, fitFactor, factor, lowest, highest, known, decisionThreshold);
    }

    /**
     * The same with a search range.
     *
     * @param from lowest polarizability volume (m^3)
     * @param to   highest polarizability volume (m^3)
     * @return the choices
     */
    public PowerCurveChoices withSearch(double from, double to) {
        return new PowerCurveChoices(
                fitCrossSection, crossSection, fitFactor, factor, from, to, known, decisionThreshold);
    }

    /**
     * The same with independent knowledge of the polarizability.
     *
     * @param volume polarizability volume with its standard uncertainty (m^3)
     * @return the choices
     */
    public PowerCurveChoices withKnown(Estimate volume) {
        return new PowerCurveChoices(
                fitCrossSection,
                crossSection,
                fitFactor,
                factor,
                lowest,
                highest,
                Optional.of(volume),
                decisionThreshold);
    }

    /**
     * The same with another threshold.
     *
     * @param threshold smallest decisive |difference of ln L|, &gt; 0
     * @return the choices
     */
    public PowerCurveChoices withDecisionThreshold(double threshold) {
        return new PowerCurveChoices(
                fitCrossSection, crossSection, fitFactor, factor, lowest, highest, known, threshold);
    }
}
