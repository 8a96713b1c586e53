package fringekeep.sourcerun;

import fringekeep.archive.facet.TimeSpan;
import fringekeep.archive.json.JsonArray;
import fringekeep.archive.json.JsonObject;
import fringekeep.archive.problem.ProblemException;
import fringekeep.archive.quantity.QuantityJson;
import fringekeep.archive.quantity.Units;
import fringekeep.archive.record.Moment;
import fringekeep.sample.Entered;
import java.util.List;
import java.util.Optional;
import java.util.stream.Stream;

/** Reads the content of a source run; what is not of the form asked for is left out. */
final class SourceRunReader {
    private SourceRunReader() {}

    static SourceRunFacet read(JsonObject content) {
        return new SourceRunFacet(
                content.text("label").orElse(""), content.text("source"), settings(content), time(content));
    }

    private static List<SourceRunFacet.Setting> settings(JsonObject content) {
        return objects(content.array("settings"))
                .flatMap(one -> setting(one).stream())
                .toList();
    }

    private static Optional<SourceRunFacet.Setting> setting(JsonObject one) {
        Optional<Entered> value = Entered.of(one, "quantity");
        String unit = one.object("quantity")
                .flatMap(quantity -> quantity.text("unit"))
                .orElse("");
        return value.flatMap(known -> siUnit(unit)
                .map(si -> new SourceRunFacet.Setting(one.text("name").orElse(""), known, si)));
    }

    private static Optional<String> siUnit(String unit) {
        try {
            return Optional.of(Units.parse(unit).siCode());
        } catch (ProblemException e) {
            return Optional.empty(); // the archive refuses such a unit; a setting without one has no value
        }
    }

    /** When it ran; empty where the start is not stated. */
    static Optional<TimeSpan> time(JsonObject content) {
        return moment(content, "started").map(start -> new TimeSpan(start, moment(content, "ended")));
    }

    static Optional<Moment> moment(JsonObject content, String member) {
        try {
            return content.object(member).map(QuantityJson::moment);
        } catch (IllegalArgumentException e) {
            return Optional.empty(); // the rules report it
        }
    }

    static Stream<JsonObject> objects(JsonArray array) {
        return array.items().stream().filter(JsonObject.class::isInstance).map(JsonObject.class::cast);
    }
}
