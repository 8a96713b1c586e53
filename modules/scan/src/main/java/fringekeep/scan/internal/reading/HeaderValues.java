package fringekeep.scan.internal.reading;

import fringekeep.archive.json.JsonObject;
import fringekeep.archive.record.Moment;
import java.util.List;
import java.util.Optional;
import java.util.OptionalDouble;
import java.util.OptionalLong;

/**
 * What the header of a section says.
 *
 * @param settings each with name and quantity, as the result has them
 * @param start begin
 * @param end end
 * @param ambiguous whether a local time was one that the clock shows twice
 * @param exposure exposure (s)
 * @param shots shots of each row
 * @param rows rows of a complete section
 * @param personal lines {@code key: value} that tell of persons
 */
public record HeaderValues(
        List<JsonObject> settings,
        Optional<Moment> start,
        Optional<Moment> end,
        boolean ambiguous,
        OptionalDouble exposure,
        OptionalLong shots,
        OptionalLong rows,
        List<String> personal) {
    /** Copies. */
    public HeaderValues {
        settings = List.copyOf(settings);
        personal = List.copyOf(personal);
    }

    /** How many of the profile's header values were found. */
    public int found() {
        int single = 0;
        single += start.isPresent() ? 1 : 0;
        single += end.isPresent() ? 1 : 0;
        single += exposure.isPresent() ? 1 : 0;
        single += shots.isPresent() ? 1 : 0;
        single += rows.isPresent() ? 1 : 0;
        return single + settings.size() + personal.size();
    }
}
