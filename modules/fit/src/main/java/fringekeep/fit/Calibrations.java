package fringekeep.fit;

import fringekeep.archive.json.JsonObject;
import java.util.ArrayList;
import java.util.List;

/** Which calibrations a fit pins: those its choices use, so that others never outdate it. */
final class Calibrations {
    private Calibrations() {}

    /** Codes of the targets. Positions are calibrated wherever a calibration holds, unless they are asked for as read. */
    static List<String> targets(JsonObject choices) {
        List<String> targets = new ArrayList<>();
        if (!choices.text("positions").orElse("calibrated").equals("as-read")) {
            targets.add("position-scale");
            targets.add("position-offset");
        }
        boolean deadTime = choices.object("deadTime")
                .flatMap(each -> each.text("sort"))
                .filter("calibration"::equals)
                .isPresent();
        if (deadTime) {
            targets.add("dead-time");
        }
        return targets;
    }
}
