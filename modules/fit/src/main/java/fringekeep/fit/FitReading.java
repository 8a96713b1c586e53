package fringekeep.fit;

import fringekeep.archive.facet.Estimates;
import fringekeep.archive.json.JsonObject;
import fringekeep.archive.kind.Input;
import fringekeep.archive.kind.Inputs;
import fringekeep.archive.kind.Sensitivity;
import java.util.ArrayList;
import java.util.List;
import java.util.Optional;

/** Reads back what a fit's result says. */
final class FitReading {
    private FitReading() {}

    /** Sensitivities with their sources resolved. */
    static List<Sensitivity> sensitivities(JsonObject result, Inputs inputs) {
        List<Sensitivity> sensitivities = new ArrayList<>();
        for (JsonObject item : result.array("sensitivities").objects()) {
            int position = (int) item.integer("input").orElseThrow();
            Optional<Input> input = inputs.all().stream()
                    .filter(each -> each.position() == position)
                    .findFirst();
            input.ifPresent(source -> sensitivities.add(new Sensitivity(
                    source.target(),
                    item.text("parameter").orElseThrow(),
                    item.number("deviation").orElseThrow(),
                    item.array("derivatives").numbers())));
        }
        return sensitivities;
    }

    /**
     * All estimates of a fit, visibility and phase behind the fitted ones with covariance by the delta method; empty where the
     * result has none.
     */
    static Optional<Estimates> estimates(JsonObject result, Inputs inputs) {
        double[] values = result.array("values").numbers();
        if (values.length < 3) {
            return Optional.empty();
        }
        List<String> names = new ArrayList<>(result.array("estimates").texts());
        Derived derived = Derived.of(values, result.object("phase").isPresent());
        double[] covariance = derived.covariance(result.array("covariance").numbers());
        names.addAll(derived.names());
        List<Sensitivity> sensitivities = sensitivities(result, inputs).stream()
                .map(each -> new Sensitivity(
                        each.source(), each.parameter(), each.deviation(), derived.extended(each.derivatives())))
                .toList();
        return Optional.of(new Estimates(
                names,
                names.stream().map(FitReading::unit).toList(),
                derived.values(values),
                covariance,
                sensitivities));
    }

    private static String unit(String name) {
        return switch (name) {
            case "period" -> "m";
            case "phase", "phaseDrift" -> "rad";
            default -> "1";
        };
    }
}
