package fringekeep.property.internal;

import fringekeep.archive.facet.Estimates;
import fringekeep.archive.facet.TimeSpan;
import fringekeep.archive.json.JsonObject;
import fringekeep.archive.kind.Input;
import fringekeep.archive.kind.Inputs;
import fringekeep.archive.problem.Problem;
import fringekeep.archive.record.Hash;
import fringekeep.fit.FringeFacet;
import fringekeep.instrument.CalibrationFacet;
import fringekeep.instrument.CalibrationTarget;
import fringekeep.scan.SettingsFacet;
import java.time.Instant;
import java.util.ArrayList;
import java.util.Comparator;
import java.util.List;
import java.util.Optional;
import java.util.OptionalDouble;
import java.util.OptionalInt;

/** Reads the points of a power series from the fits a property pins, by itself or through a selection. */
final class PowerPoints {
    private final JsonObject choices;
    private final Inputs inputs;
    private final List<Problem> problems;

    PowerPoints(JsonObject choices, Inputs inputs, List<Problem> problems) {
        this.choices = choices;
        this.inputs = inputs;
        this.problems = problems;
    }

    /** The fits in the order of the inputs, those of a selection in its order. */
    static List<Input> fits(Inputs inputs) {
        List<Input> fits = new ArrayList<>();
        for (Input selection : inputs.role("selection")) {
            fits.addAll(selection.inputs().role("taken"));
        }
        fits.addAll(inputs.role("fit"));
        return List.copyOf(fits);
    }

    /** The points in order of power, then of fingerprint, so that the order of pinning changes no bit. */
    List<PowerPoint> read() {
        List<PowerPoint> points = new ArrayList<>();
        List<Input> fits = fits(inputs);
        for (Input fit : fits) {
            point(fit).ifPresent(points::add);
        }
        if (fits.isEmpty()) {
            problems.add(new Problem(
                    "property.no-fits", "No fit is pinned.", "/inputs", "Pin a selection of fits, or fits."));
        }
        points.sort(Comparator.comparingDouble((PowerPoint point) -> point.power(Shift.NONE))
                .thenComparing(PowerPoint::fit));
        return List.copyOf(points);
    }

    private Optional<PowerPoint> point(Input fit) {
        Optional<Estimates> estimates = fit.facet(Estimates.class);
        Optional<Reading> power = reading(fit);
        if (estimates.isEmpty() || power.isEmpty()) {
            String name = choices.text("powerSetting").orElse("");
            problems.add(new Problem(
                    "property.no-power",
                    "Fit " + fit.target().shortForm()
                            + (estimates.isEmpty() ? " has no result." : " has no setting \"" + name + "\"."),
                    "/choices/powerSetting",
                    "Leave the fit out, or name the setting that holds the power."));
            return Optional.empty();
        }
        boolean relative = choices.text("visibility").orElse("").equals("relative");
        Optional<double[]> visibility = relative ? relative(fit) : visibility(estimates.get(), fit.target());
        return visibility.map(each -> new PowerPoint(
                fit.target(), power.get().value(), power.get().deviation(), calibrations(fit), each[0], each[1]));
    }

    /** Visibility over that of the fit's references, which takes out what changed the contrast of both alike. */
    private Optional<double[]> relative(Input fit) {
        Optional<FringeFacet.Value> relative = fit.facet(FringeFacet.class).flatMap(FringeFacet::relativeVisibility);
        if (relative.isEmpty() || !(relative.get().deviation() > 0)) {
            problems.add(new Problem(
                    "property.no-reference",
                    "Fit " + fit.target().shortForm() + " states no visibility relative to references.",
                    "/choices/visibility",
                    "Fit the scan anew with its reference scans, leave it out, or take visibilities as fitted."));
            return Optional.empty();
        }
        double variance = relative.get().deviation() * relative.get().deviation();
        return Optional.of(new double[] {unbiased(relative.get().value(), variance), Math.sqrt(variance)});
    }

    private double unbiased(double visibility, double variance) {
        boolean subtract = choices.text("bias").orElse("").equals("noise-subtracted");
        return subtract ? Math.sqrt(Math.max(0, visibility * visibility - variance)) : visibility;
    }

    /** A power as read. */
    private record Reading(double value, double deviation) {}

    /** The power of all scans of the fit, which must agree: fits of several scans are of one power. */
    private Optional<Reading> reading(Input fit) {
        String name = choices.text("powerSetting").orElse("");
        boolean used = Readings.Use.of(choices) != Readings.Use.AS_READ;
        double deviation = 0;
        OptionalDouble power = OptionalDouble.empty();
        for (Input scan : fit.inputs().role("scan")) {
            Optional<SettingsFacet.Setting> setting = setting(fit, scan, name);
            if (setting.isEmpty()) {
                return Optional.empty();
            }
            double value = setting.get().value();
            if (power.isPresent() && Math.abs(power.getAsDouble() - value) > 1e-3 * Math.abs(value)) {
                problems.add(new Problem(
                        "property.powers-differ",
                        "The scans of fit " + fit.target().shortForm() + " differ in power.",
                        "/inputs",
                        "Fit scans of one power together only."));
                return Optional.empty();
            }
            power = OptionalDouble.of(value);
            // scans fitted together are read by one meter: the largest uncertainty, NaN where one states none
            deviation = used ? Math.max(deviation, setting.get().deviation()) : 0;
        }
        return power.isPresent() ? Optional.of(new Reading(power.getAsDouble(), deviation)) : Optional.empty();
    }

    /** A setting of the scan's file, else of its placement's series step. */
    private static Optional<SettingsFacet.Setting> setting(Input fit, Input scan, String name) {
        Optional<SettingsFacet.Setting> own = scan.facet(SettingsFacet.class).flatMap(settings -> settings.named(name));
        if (own.isPresent()) {
            return own;
        }
        return fit.inputs().role("placement").stream()
                .map(placement -> placement.facet(SettingsFacet.class))
                .flatMap(Optional::stream)
                .map(settings -> settings.named(name))
                .flatMap(Optional::stream)
                .findFirst();
    }

    /** Of each target the calibration that held when the fit's scans began: the latest begun by then. */
    private List<PowerPoint.Pinned> calibrations(Input fit) {
        List<PowerPoint.Pinned> pinned = new ArrayList<>();
        List<Input> all = new ArrayList<>(fit.inputs().role("calibration"));
        all.addAll(inputs.role("calibration"));
        for (CalibrationTarget target : List.of(CalibrationTarget.POWER_SCALE, CalibrationTarget.POWER_WAIST)) {
            List<PowerPoint.Pinned> candidates = new ArrayList<>();
            for (Input calibration : all) {
                calibration
                        .facet(CalibrationFacet.class)
                        .filter(facet -> facet.target() == target)
                        .ifPresent(facet -> candidates.add(new PowerPoint.Pinned(calibration.target(), facet)));
            }
            if (!candidates.isEmpty()) {
                held(candidates, fit, target).ifPresent(pinned::add);
            }
        }
        return pinned;
    }

    private Optional<PowerPoint.Pinned> held(List<PowerPoint.Pinned> candidates, Input fit, CalibrationTarget target) {
        Optional<Instant> start = fit.inputs().role("scan").stream()
                .map(scan -> scan.facet(TimeSpan.class))
                .flatMap(Optional::stream)
                .map(span -> span.start().at())
                .min(Comparator.naturalOrder());
        if (start.isEmpty()
                && candidates.stream().map(PowerPoint.Pinned::record).distinct().count() == 1) {
            return Optional.of(candidates.get(0));
        }
        Optional<PowerPoint.Pinned> latest = start.flatMap(at -> candidates.stream()
                .filter(each -> each.calibration().holds(at))
                .max(Comparator.comparing(
                                (PowerPoint.Pinned each) -> each.calibration().from())
                        .thenComparing(PowerPoint.Pinned::record)));
        if (latest.isEmpty()) {
            problems.add(new Problem(
                    "property.no-calibration",
                    "No pinned calibration of the " + target.code().replace('-', ' ') + " held when the scans of fit "
                            + fit.target().shortForm() + " began.",
                    "/inputs",
                    "Pin the calibration that held then, or none for all fits."));
        }
        return latest;
    }

    /**
     * Visibility and standard uncertainty from mean, cosine and sine, by the law of propagation (JCGM 100:2008, 5.2.2). At
     * vanishing amplitude its derivative has no direction; the larger of the two variances is taken there.
     */
    private Optional<double[]> visibility(Estimates estimates, Hash fit) {
        OptionalInt mean = estimates.position("mean");
        OptionalInt cosine = estimates.position("cosine");
        OptionalInt sine = estimates.position("sine");
        if (mean.isEmpty() || cosine.isEmpty() || sine.isEmpty() || !(estimates.values()[mean.getAsInt()] > 0)) {
            problems.add(new Problem(
                    "property.no-visibility",
                    "Fit " + fit.shortForm() + " has no visibility: its mean is not positive.",
                    "/inputs",
                    "Leave the fit out."));
            return Optional.empty();
        }
        int[] at = {mean.getAsInt(), cosine.getAsInt(), sine.getAsInt()};
        double level = estimates.values()[at[0]];
        double c = estimates.values()[at[1]];
        double s = estimates.values()[at[2]];
        double amplitude = Math.sqrt(c * c + s * s);
        double visibility = amplitude / level;
        double variance = amplitude > 0
                ? propagated(estimates, at, new double[] {
                    -visibility / level, c / (amplitude * level), s / (amplitude * level)
                })
                : Math.max(estimates.covariance(at[1], at[1]), estimates.covariance(at[2], at[2])) / (level * level);
        if (!(variance > 0)) {
            problems.add(new Problem(
                    "property.no-uncertainty",
                    "Fit " + fit.shortForm() + " has no uncertainty.",
                    "/inputs",
                    "Leave the fit out, or fit it anew with an estimator for counts."));
            return Optional.empty();
        }
        return Optional.of(new double[] {unbiased(visibility, variance), Math.sqrt(variance)});
    }

    private static double propagated(Estimates estimates, int[] at, double[] gradient) {
        double variance = 0;
        for (int i = 0; i < at.length; i++) {
            for (int j = 0; j < at.length; j++) {
                variance += gradient[i] * gradient[j] * estimates.covariance(at[i], at[j]);
            }
        }
        return variance;
    }
}
