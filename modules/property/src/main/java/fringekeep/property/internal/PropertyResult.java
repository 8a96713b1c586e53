package fringekeep.property.internal;

import fringekeep.archive.json.Json;
import fringekeep.archive.json.JsonArray;
import fringekeep.archive.json.JsonObject;
import fringekeep.archive.problem.StoppedException;
import fringekeep.archive.problem.Work;
import fringekeep.interferometry.molecule.FitOutcome;
import fringekeep.interferometry.molecule.FitRefused;
import fringekeep.interferometry.molecule.Parameter;
import fringekeep.interferometry.molecule.Polarizability;
import fringekeep.interferometry.molecule.PowerCurveComparison;
import fringekeep.interferometry.molecule.PowerCurveFitter;
import fringekeep.interferometry.molecule.PowerCurveIntervals;
import fringekeep.interferometry.molecule.PropertyFit;
import fringekeep.interferometry.nearfield.Description;
import fringekeep.interferometry.statistics.Interval;
import java.util.ArrayList;
import java.util.List;
import java.util.Locale;
import java.util.Optional;
import java.util.function.DoubleUnaryOperator;

/** Writes the answer as a result part. */
final class PropertyResult {
    private final PowerQuestion question;
    private final PowerCurveComparison comparison;
    private final Description stated;
    private final PropertyFit fit;

    PropertyResult(PowerQuestion question, PowerCurveComparison comparison, Description stated) {
        this.question = question;
        this.comparison = comparison;
        this.stated = stated;
        this.fit = (PropertyFit) (stated == Description.QUANTUM ? comparison.quantum() : comparison.classical());
    }

    JsonObject write(Work work) throws StoppedException {
        Propagation.Found found = new Propagation(question, stated, fit).run();
        work.check();
        JsonObject result = JsonObject.EMPTY
                .with(
                        "verdict",
                        comparison.verdict().name().toLowerCase(Locale.ROOT).replace('_', '-'))
                .with("reason", comparison.reason())
                .with("logLikelihoodRatio", comparison.logLikelihoodRatio())
                .with("expectedIfQuantum", finite(comparison.expectedIfQuantum()))
                .with("expectedIfClassical", finite(comparison.expectedIfClassical()))
                .with("threshold", question.choices().number("threshold").orElseThrow())
                .with("quantum", description(comparison.quantum(), Description.QUANTUM))
                .with("classical", description(comparison.classical(), Description.CLASSICAL))
                .with("sensitivities", sensitivities(found))
                .with("notStated", JsonArray.ofTexts(notStated(found)))
                .with("points", question.points().size())
                .with("table", PowerCurves.POINTS);
        result = values(result, found);
        return bootstrap(result);
    }

    private List<String> notStated(Propagation.Found found) {
        List<String> all = new ArrayList<>(found.notStated());
        all.addAll(Readings.notStated(question));
        return List.copyOf(all);
    }

    private static Optional<Json> finite(double value) {
        return Double.isFinite(value) ? Optional.of(Json.of(value)) : Optional.empty();
    }

    private static String name(Parameter parameter) {
        return switch (parameter) {
            case POLARIZABILITY_VOLUME -> "polarizabilityVolume";
            case ABSORPTION_CROSS_SECTION -> "absorptionCrossSection";
            case VISIBILITY_FACTOR -> "visibilityFactor";
            default -> throw new IllegalStateException("a power series has no parameter " + parameter);
        };
    }

    private JsonObject description(FitOutcome outcome, Description description) {
        if (outcome instanceof FitRefused refused) {
            return JsonObject.EMPTY.with("refused", refused.words());
        }
        PropertyFit own = (PropertyFit) outcome;
        List<Json> warnings = own.warnings().stream()
                .<Json>map(warning -> JsonObject.EMPTY
                        .with(
                                "sort",
                                warning.sort().name().toLowerCase(Locale.ROOT).replace('_', '-'))
                        .with("words", warning.words()))
                .toList();
        return JsonObject.EMPTY
                .with(
                        "estimates",
                        JsonArray.ofTexts(own.parameters().stream()
                                .map(PropertyResult::name)
                                .toList()))
                .with("values", JsonArray.ofNumbers(own.values()))
                .with("covariance", JsonArray.ofNumbers(own.covariance()))
                .with("chiSquare", own.chiSquare())
                .with("degreesOfFreedom", own.degreesOfFreedom())
                .with("p", finite(own.pValue()))
                .with("logLikelihood", own.logLikelihood())
                .with("interval", interval(own, description))
                .with("warnings", new JsonArray(warnings));
    }

    private JsonObject interval(PropertyFit own, Description description) {
        PowerCurveFitter fitter = question.fitter(Shift.NONE);
        Interval interval = new PowerCurveIntervals(fitter, question.data(Shift.NONE), description, own)
                .profile(
                        Parameter.POLARIZABILITY_VOLUME,
                        question.choices().number("level").orElseThrow());
        return JsonObject.EMPTY
                .with("level", interval.level())
                .with("lower", finite(interval.low()))
                .with("upper", finite(interval.high()));
    }

    private static JsonArray sensitivities(Propagation.Found found) {
        return new JsonArray(found.sensitivities().stream()
                .<Json>map(each -> JsonObject.EMPTY
                        .with("source", each.shared().source().hex())
                        .with("parameter", each.shared().parameter())
                        .with("deviation", each.shared().deviation().orElse(0))
                        .with("derivatives", JsonArray.ofNumbers(each.derivatives())))
                .toList());
    }

    private JsonObject values(JsonObject result, Propagation.Found found) {
        JsonObject whole = result;
        for (int i = 0; i < fit.parameters().size(); i++) {
            Parameter parameter = fit.parameters().get(i);
            double value = fit.values()[i];
            double statistical = Math.sqrt(fit.covariance(parameter, parameter));
            double shared = Math.sqrt(found.variance(i));
            whole = whole.with(name(parameter), stated(value, statistical, shared, x -> x));
            if (parameter == Parameter.POLARIZABILITY_VOLUME) {
                whole = whole.with("polarizability", stated(value, statistical, shared, Polarizability::siFromVolume))
                        .with(
                                "polarizabilityAtomic",
                                stated(value, statistical, shared, Polarizability::atomicUnitsFromVolume));
            }
        }
        return whole;
    }

    /** All three in another unit; the conversions are proportional. */
    private static JsonObject stated(double value, double statistical, double shared, DoubleUnaryOperator unit) {
        return JsonObject.EMPTY
                .with("value", unit.applyAsDouble(value))
                .with("u", unit.applyAsDouble(Math.sqrt(statistical * statistical + shared * shared)))
                .with("statistical", unit.applyAsDouble(statistical))
                .with("shared", unit.applyAsDouble(shared));
    }

    private JsonObject bootstrap(JsonObject result) {
        Optional<JsonObject> asked = question.choices().object("bootstrap");
        if (asked.isEmpty()) {
            return result;
        }
        PowerCurveIntervals.Bootstrap spread = new PowerCurveIntervals(
                        question.fitter(Shift.NONE), question.data(Shift.NONE), stated, fit)
                .bootstrap(question.choices().integer("seed").orElseThrow(), (int)
                        asked.get().integer("resamples").orElseThrow());
        int at = fit.parameters().indexOf(Parameter.POLARIZABILITY_VOLUME);
        return result.with(
                "bootstrap",
                JsonObject.EMPTY
                        .with("generator", spread.generator())
                        .with("resamples", spread.resamples())
                        .with("failed", spread.failed())
                        .with("u", spread.deviation()[at])
                        .with("lower", spread.central68()[at][0])
                        .with("upper", spread.central68()[at][1]));
    }
}
