package fringekeep.fit.internal;

import fringekeep.archive.json.JsonArray;
import fringekeep.archive.json.JsonObject;
import fringekeep.archive.problem.ProblemException;
import fringekeep.archive.problem.StoppedException;
import fringekeep.archive.problem.Work;
import fringekeep.fit.internal.FitParameters.PositionCorrection;
import fringekeep.interferometry.fringe.DeadTime;
import java.util.ArrayList;
import java.util.List;
import java.util.function.DoubleFunction;

/**
 * How the estimates answer to what inputs state: central differences over one standard deviation to either side.
 *
 * <p>Source: JCGM 100:2008 (GUM), 5.1.3, note 2 (sensitivity coefficients by varying the input by its uncertainty).
 */
public final class Sensitivities {
    private final FringeAnalysis analysis;

    /** Of an analysis. */
    public Sensitivities(FringeAnalysis analysis) {
        this.analysis = analysis;
    }

    /**
     * A parameter that an input states.
     *
     * @param input position of the input
     * @param name name of the parameter there
     * @param deviation its standard uncertainty (SI), above 0
     * @param turned the parameters with so much added
     */
    public record Source(int input, String name, double deviation, DoubleFunction<FitParameters> turned) {}

    /** The period as the setup states it. */
    public static Source period(int input, double deviation, FitParameters parameters) {
        return new Source(input, "period", deviation, by -> parameters.period(parameters.period() + by));
    }

    /** The dead time as setup or calibration state it. */
    public static Source deadTime(int input, double deviation, FitParameters parameters) {
        DeadTime time = parameters.deadTime();
        return new Source(input, "deadTime", deviation, by -> parameters.deadTimeSeconds(time.seconds() + by));
    }

    /** Offset and scale of the position corrections. */
    public static List<Source> corrections(FitParameters parameters) {
        List<Source> sources = new ArrayList<>();
        for (int i = 0; i < parameters.corrections().size(); i++) {
            int place = i;
            PositionCorrection at = parameters.corrections().get(i);
            if (at.offsetDeviation() > 0) {
                sources.add(new Source(
                        at.input(),
                        "offset",
                        at.offsetDeviation(),
                        by -> parameters.correction(
                                place,
                                new PositionCorrection(
                                        at.input(),
                                        at.offset() + by,
                                        at.offsetDeviation(),
                                        at.scale(),
                                        at.scaleDeviation()))));
            }
            if (at.scaleDeviation() > 0) {
                sources.add(new Source(
                        at.input(),
                        "scale",
                        at.scaleDeviation(),
                        by -> parameters.correction(
                                place,
                                new PositionCorrection(
                                        at.input(),
                                        at.offset(),
                                        at.offsetDeviation(),
                                        at.scale() + by,
                                        at.scaleDeviation()))));
            }
        }
        return sources;
    }

    /** The derivatives of all estimates as they are written. */
    public List<JsonObject> json(List<Source> sources, FitAnswer at, Work work)
            throws ProblemException, StoppedException {
        List<JsonObject> all = new ArrayList<>();
        for (Source source : sources) {
            work.check();
            all.add(JsonObject.EMPTY
                    .with("input", source.input())
                    .with("parameter", source.name())
                    .with("deviation", source.deviation())
                    .with("derivatives", JsonArray.ofNumbers(derivatives(source, at))));
        }
        return all;
    }

    private double[] derivatives(Source source, FitAnswer at) throws ProblemException {
        double step = source.deviation();
        double[] above = analysis.answer(source.turned().apply(step)).values();
        double[] below = analysis.answer(source.turned().apply(-step)).values();
        double[] factors = FitResult.factors(at);
        double[] derivatives = new double[above.length];
        for (int i = 0; i < derivatives.length; i++) {
            derivatives[i] = factors[i] * (above[i] - below[i]) / (2 * step);
        }
        return derivatives;
    }
}
