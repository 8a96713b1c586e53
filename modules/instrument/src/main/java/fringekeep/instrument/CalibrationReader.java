package fringekeep.instrument;

import fringekeep.archive.json.JsonArray;
import fringekeep.archive.json.JsonNumber;
import fringekeep.archive.json.JsonObject;
import java.time.DateTimeException;
import java.time.Instant;
import java.util.List;
import java.util.Optional;
import java.util.OptionalDouble;

/** Reads the content of a calibration. */
final class CalibrationReader {
    private CalibrationReader() {}

    /** The calibration; empty where the content is not of the form asked for. */
    static Optional<CalibrationFacet> read(JsonObject content) {
        Optional<CalibrationTarget> target = content.text("what").flatMap(CalibrationTarget::of);
        Optional<CalibrationModel> model = content.text("model").flatMap(CalibrationModel::of);
        JsonObject valid = content.object("valid").orElse(JsonObject.EMPTY);
        Optional<Instant> from = instant(valid, "from");
        double[] parameters = parameters(content.array("parameters"));
        double[] covariance = numbers(content.array("covariance"));
        if (target.isEmpty() || model.isEmpty() || from.isEmpty()) {
            return Optional.empty();
        }
        int n = model.get().parameters().size();
        if (parameters.length != n || covariance.length != n * (n + 1) / 2) {
            return Optional.empty();
        }
        return Optional.of(new CalibrationFacet(
                target.get(),
                model.get(),
                parameters,
                covariance,
                from.get(),
                instant(valid, "to"),
                content.text("subject")));
    }

    static Optional<Instant> instant(JsonObject holder, String name) {
        try {
            return holder.text(name).map(Instant::parse);
        } catch (DateTimeException e) {
            return Optional.empty(); // the rules report it
        }
    }

    private static double[] parameters(JsonArray array) {
        List<OptionalDouble> values =
                SetupReader.objects(array).map(one -> one.number("value")).toList();
        return values.stream().allMatch(OptionalDouble::isPresent)
                ? values.stream().mapToDouble(OptionalDouble::getAsDouble).toArray()
                : new double[0];
    }

    static double[] numbers(JsonArray array) {
        return array.items().stream().allMatch(JsonNumber.class::isInstance) ? array.numbers() : new double[0];
    }
}
