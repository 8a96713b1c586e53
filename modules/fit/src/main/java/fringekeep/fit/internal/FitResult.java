package fringekeep.fit.internal;

import fringekeep.archive.json.Json;
import fringekeep.archive.json.JsonArray;
import fringekeep.archive.json.JsonObject;
import fringekeep.archive.quantity.QuantityJson;
import fringekeep.interferometry.fringe.FringeFit;
import fringekeep.interferometry.fringe.FringeGoodness;
import fringekeep.interferometry.statistics.AmplitudeLimits;
import fringekeep.interferometry.statistics.Estimate;
import java.util.ArrayList;
import java.util.List;
import java.util.Locale;
import java.util.Optional;
import java.util.Set;

/** Writes an answer as the result part of a fit. */
public final class FitResult {
    /** Name of the payload. */
    public static final String RESIDUALS = "residuals";

    /** Estimates that are rates and are written as counts in the exposure stated beside. */
    private static final Set<String> RATES = Set.of("mean", "cosine", "sine", "cosine2", "sine2", "background");

    private static final double DISAGREE = 0.01;

    private final FitChoices choices;
    private final List<ScanArrays> scans;
    private final FitAnswer answer;

    /** Writes one answer. */
    public FitResult(FitChoices choices, List<ScanArrays> scans, FitAnswer answer) {
        this.choices = choices;
        this.scans = List.copyOf(scans);
        this.answer = answer;
    }

    /**
     * The result.
     *
     * @param sensitivities written already
     * @param reference written already, if asked
     */
    public JsonObject json(List<JsonObject> sensitivities, Optional<JsonObject> reference) {
        double[] factors = factors(answer);
        JsonObject result = JsonObject.EMPTY
                .with("estimates", JsonArray.ofTexts(answer.names()))
                .with("values", JsonArray.ofNumbers(scaled(answer.values(), factors)))
                .with("covariance", JsonArray.ofNumbers(scaledCovariance(answer.covariance(), factors)))
                .with("degreesOfFreedom", degreesOfFreedom())
                .with("sensitivities", new JsonArray(List.copyOf(sensitivities)))
                .with("exposure", exposure())
                .with("residuals", RESIDUALS)
                .with("outliers", new JsonArray(List.copyOf(outliers())))
                .with("findings", JsonArray.ofTexts(findings()));
        return fringe(goodness(counted(result)))
                .with("reference", reference)
                .with("backgroundRate", backgroundRate())
                .with("scans", perScan());
    }

    /** Factor from rate to counts in the stated exposure for each estimate; 1 for what is no rate. */
    static double[] factors(FitAnswer answer) {
        return answer.names().stream()
                .mapToDouble(name -> RATES.contains(name) ? answer.exposure() : 1)
                .toArray();
    }

    private static double[] scaled(double[] values, double[] factors) {
        double[] scaled = values.clone();
        for (int i = 0; i < scaled.length; i++) {
            scaled[i] *= factors[i];
        }
        return scaled;
    }

    private static double[] scaledCovariance(double[] covariance, double[] factors) {
        double[] scaled = covariance.clone();
        for (int i = 0, at = 0; i < factors.length; i++) {
            for (int j = 0; j <= i; j++, at++) {
                scaled[at] *= factors[i] * factors[j];
            }
        }
        return scaled;
    }

    private JsonObject exposure() {
        boolean shots = scans.get(0).shots();
        return JsonObject.EMPTY.with("si", answer.exposure()).with("sort", shots ? "shots" : "time");
    }

    private int degreesOfFreedom() {
        return answer.fits().stream().mapToInt(FringeFit::degreesOfFreedom).sum();
    }

    private JsonObject counted(JsonObject result) {
        int used = 0;
        int left = 0;
        double counts = 0;
        for (ScanArrays scan : scans) {
            left += scan.left();
            used += scan.rows() - scan.left();
            for (int row = 0; row < scan.rows(); row++) {
                counts += scan.masked()[row] ? 0 : scan.counts()[row];
            }
        }
        return result.with("rows", used).with("masked", left).with("counts", counts);
    }

    private JsonObject goodness(JsonObject result) {
        double deviance = 0;
        double chiSquare = 0;
        for (FringeFit fit : answer.fits()) {
            deviance += fit.deviance();
            chiSquare += fit.chiSquare();
        }
        JsonObject with = result.with("deviance", number(deviance)).with("chiSquare", number(chiSquare));
        if (answer.fits().size() == 1) {
            FringeGoodness goodness = answer.fits().get(0).goodness();
            return goodness.degreesOfFreedom() > 0 ? with.with("p", number(goodness.pValue())) : with;
        }
        return with.with("p", number(Chances.upper(deviance, Math.max(1, degreesOfFreedom()))));
    }

    /** A number if it is one: least squares may expect fewer than no counts, where a deviance does not exist. */
    private static Optional<Json> number(double value) {
        return Double.isFinite(value) ? Optional.of(Json.of(value)) : Optional.empty();
    }

    private JsonObject fringe(JsonObject result) {
        Optional<Json> fringe = answer.significance()
                .map(pair -> JsonObject.EMPTY.with("statistic", pair[0]).with("p", pair[1]));
        return result.with("fringe", fringe)
                .with("visibility", visibility())
                .with("visibilityCorrected", answer.visibility().flatMap(this::corrected))
                .with("upperLimit", answer.limit().filter(Double::isFinite).map(Json::of))
                .with("phase", answer.phase().filter(FitResult::finite).map(FitResult::estimate));
    }

    private Optional<JsonObject> visibility() {
        boolean known = answer.visibility().filter(FitResult::finite).isPresent()
                && answer.interval()
                        .filter(interval -> Double.isFinite(interval.high()))
                        .isPresent();
        if (!known) {
            return Optional.empty();
        }
        return Optional.of(estimate(answer.visibility().get())
                .with("lower", answer.interval().get().low())
                .with("upper", answer.interval().get().high()));
    }

    private Optional<Json> corrected(Estimate visibility) {
        double noise = answer.harmonic().quadratureNoise();
        if (!(noise > 0) || !Double.isFinite(noise) || !finite(visibility)) {
            return Optional.empty();
        }
        double value = AmplitudeLimits.biasCorrected(visibility.value(), noise);
        return Optional.of(QuantityJson.estimate(value, visibility.standardUncertainty()));
    }

    /** An estimate as JSON. */
    static JsonObject estimate(Estimate estimate) {
        return QuantityJson.estimate(estimate.value(), estimate.standardUncertainty());
    }

    private static boolean finite(Estimate estimate) {
        return Double.isFinite(estimate.value()) && Double.isFinite(estimate.standardUncertainty());
    }

    private Optional<Json> backgroundRate() {
        boolean shared = choices.backgroundSort().equals("scan");
        boolean measured = choices.backgroundSort().equals("channel") || shared;
        double counts = 0;
        double exposure = 0;
        for (FringeFit fit : shared ? answer.fits().subList(0, 1) : answer.fits()) {
            counts += fit.data().darkTotal();
            exposure += fit.data().darkExposureTotal();
        }
        return measured && exposure > 0
                ? Optional.of(QuantityJson.estimate(counts / exposure, Math.sqrt(counts) / exposure))
                : Optional.empty();
    }

    /** Each scan by itself, from the fits of a joint fit. */
    private Optional<Json> perScan() {
        if (answer.fits().size() < 2) {
            return Optional.empty();
        }
        List<Json> items = new ArrayList<>();
        for (int k = 0; k < answer.fits().size(); k++) {
            FringeFit fit = answer.fits().get(k);
            double mean = fit.mean().value() * answer.exposure();
            double u = fit.mean().standardUncertainty() * answer.exposure();
            items.add(JsonObject.EMPTY
                    .with("input", scans.get(k).input())
                    .with("mean", QuantityJson.estimate(mean, u))
                    .with("visibility", fit.visibility().map(FitResult::estimate))
                    .with("phase", fit.phase().filter(FitResult::finite).map(FitResult::estimate)));
        }
        return Optional.of(new JsonArray(items));
    }

    private List<JsonObject> outliers() {
        List<JsonObject> outliers = new ArrayList<>();
        for (ResidualTable.Row row : ResidualTable.rows(answer)) {
            if (row.used() && Math.abs(row.residual()) >= choices.outlier()) {
                outliers.add(JsonObject.EMPTY
                        .with("input", row.source().input())
                        .with("row", row.source().row())
                        .with("residual", row.residual()));
            }
        }
        return outliers;
    }

    private List<String> findings() {
        List<String> findings = new ArrayList<>(answer.fits().stream()
                .flatMap(fit -> fit.findings().stream())
                .distinct()
                .sorted()
                .map(finding -> finding.name().toLowerCase(Locale.ROOT).replace('_', '-'))
                .toList());
        if (answer.same().filter(p -> p < DISAGREE).isPresent()) {
            findings.add("scans-differ");
        }
        return findings;
    }
}
