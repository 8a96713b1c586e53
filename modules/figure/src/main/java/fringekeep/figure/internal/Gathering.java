package fringekeep.figure.internal;

import fringekeep.archive.facet.Estimates;
import fringekeep.archive.facet.Plottable;
import fringekeep.archive.kind.Input;
import fringekeep.archive.kind.Inputs;
import fringekeep.archive.kind.Sensitivity;
import fringekeep.archive.problem.Problem;
import fringekeep.archive.problem.ProblemException;
import fringekeep.archive.quantity.Unit;
import fringekeep.archive.quantity.Units;
import fringekeep.archive.record.Hash;
import java.util.ArrayList;
import java.util.List;
import java.util.Locale;
import java.util.Optional;
import java.util.OptionalInt;

/** Takes what an input offers and converts it to the units of the axes. */
final class Gathering {
    private final PlotRequest request;
    private final String pointer;

    private Gathering(PlotRequest request, String pointer) {
        this.request = request;
        this.pointer = pointer;
    }

    static Numbers gather(PlotRequest request, String pointer, Inputs inputs) throws ProblemException {
        Gathering gathering = new Gathering(request, pointer);
        if (request.input() >= inputs.all().size()) {
            throw gathering.problem(
                    "figure.no-input",
                    "Series " + request.position() + " of panel " + request.panel() + " asks input " + request.input()
                            + "; there are " + inputs.all().size() + ".",
                    "/input",
                    "Name a position from 0 to " + (inputs.all().size() - 1) + ".");
        }
        Input input = inputs.all().get(request.input());
        return request.series().equals(PlotRequest.VALUE) ? gathering.value(input) : gathering.series(input);
    }

    private Numbers series(Input input) throws ProblemException {
        Plottable offered = input.facet(Plottable.class)
                .orElseThrow(() -> problem(
                        "figure.no-series",
                        "Input " + request.input() + " offers no series.",
                        "/input",
                        "Pin a fit, a velocity or a property, or ask for series \"value\"."));
        Plottable.Series series = offered.series(request.series())
                .orElseThrow(() -> problem(
                        "figure.unknown-series",
                        "Input " + request.input() + " offers no series \"" + request.series() + "\".",
                        "/series",
                        "It offers: "
                                + String.join(
                                        ", ",
                                        offered.series().stream()
                                                .map(Plottable.Series::name)
                                                .toList())
                                + "."));
        Unit x = unit(request.xUnit(), series.xUnit(), "x");
        Unit y = unit(request.yUnit(), series.yUnit(), "y");
        boolean band = series.sort() == Plottable.Sort.BAND;
        return new Numbers(
                series.sort().name().toLowerCase(Locale.ROOT),
                request.label().orElse(series.label()),
                values(series.x(), x),
                values(series.y(), y),
                band ? values(series.other(), y) : differences(series.other(), y),
                sources(series, input.target()));
    }

    private static List<Optional<Hash>> sources(Plottable.Series series, Hash input) {
        List<Optional<Hash>> sources = new ArrayList<>();
        for (int i = 0; i < series.x().length; i++) {
            sources.add(Optional.of(
                    series.sources().isEmpty() ? input : series.sources().get(i)));
        }
        return sources;
    }

    private Numbers value(Input input) throws ProblemException {
        Estimates estimates = input.facet(Estimates.class)
                .orElseThrow(() -> problem(
                        "figure.no-value",
                        "Input " + request.input() + " offers no value.",
                        "/input",
                        "Pin a property, a fit or a quoted value."));
        OptionalInt at = request.estimate().isPresent()
                ? estimates.position(request.estimate().get())
                : OptionalInt.of(0);
        int position = at.orElseThrow(() -> problem(
                "figure.unknown-estimate",
                "Input " + request.input() + " has no estimate \""
                        + request.estimate().orElse("") + "\".",
                "/estimate",
                "It has: " + String.join(", ", estimates.names()) + "."));
        Unit y = unit(request.yUnit(), estimates.units().get(position), "y");
        double variance = combined(estimates, position);
        boolean known = Double.isFinite(variance) && variance > 0;
        return new Numbers(
                request.at().isPresent() ? "points" : "level",
                request.label().orElse(estimates.names().get(position)),
                request.at().isPresent() ? new double[] {request.at().getAsDouble()} : new double[0],
                new double[] {y.fromSi(estimates.values()[position])},
                known ? new double[] {y.differenceFromSi(Math.sqrt(variance))} : new double[0],
                List.of(Optional.of(input.target())));
    }

    /** Statistical variance and the parts of all shared sources, in the order in which the record lists them. */
    private static double combined(Estimates estimates, int position) {
        double variance = estimates.covariance(position, position);
        for (Sensitivity shared : estimates.sensitivities()) {
            double part = shared.derivatives()[position] * shared.deviation();
            variance += part * part;
        }
        return variance;
    }

    private Unit unit(String wanted, String offered, String axis) throws ProblemException {
        Unit unit = Units.parse(wanted);
        if (!unit.sameDimension(Units.parse(offered))) {
            throw problem(
                    "figure.unit",
                    "The " + axis + " axis is in " + wanted + ", but the series is in " + offered + ".",
                    "",
                    "Give the axis a unit of the same dimension.");
        }
        return unit;
    }

    private static double[] values(double[] si, Unit unit) {
        double[] shown = new double[si.length];
        for (int i = 0; i < si.length; i++) {
            shown[i] = unit.fromSi(si[i]);
        }
        return shown;
    }

    private static double[] differences(double[] si, Unit unit) {
        double[] shown = new double[si.length];
        for (int i = 0; i < si.length; i++) {
            shown[i] = unit.differenceFromSi(si[i]);
        }
        return shown;
    }

    private ProblemException problem(String code, String what, String below, String mend) {
        return new ProblemException(new Problem(code, what, pointer + below, mend));
    }
}
