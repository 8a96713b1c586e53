package fringekeep.sourcerun;

import fringekeep.archive.json.JsonObject;
import fringekeep.archive.kind.Input;
import fringekeep.archive.kind.Inputs;
import fringekeep.instrument.CalibrationFacet;
import fringekeep.instrument.CalibrationModel;
import fringekeep.instrument.CalibrationTarget;
import fringekeep.sample.Entered;
import java.util.ArrayList;
import java.util.List;
import java.util.Optional;

/**
 * A quantity that a method needs, from a choice or from a pinned calibration, and where its uncertainty comes from.
 *
 * @param value value (SI)
 * @param sources independent sources of uncertainty, each with derivative 1
 * @param unstated whether an uncertainty is not known
 */
record Known(double value, List<Source> sources, boolean unstated) {
    /** Copies. */
    Known {
        sources = List.copyOf(sources);
    }

    /**
     * A source of uncertainty.
     *
     * @param input place of the calibration among the inputs, -1 for a choice
     * @param parameter its parameter, or the name of the choice
     * @param deviation standard uncertainty (SI)
     */
    record Source(int input, String parameter, double deviation) {}

    /** The quantity of that name, calibrated where a calibration of that target is pinned; empty where neither is there. */
    static Optional<Known> of(JsonObject choices, String name, CalibrationTarget target, Inputs inputs) {
        Optional<Known> known = Entered.of(choices, name).map(entered -> ofChoice(name, entered));
        for (Input input : inputs.role("calibration")) {
            Optional<CalibrationFacet> calibration =
                    input.facet(CalibrationFacet.class).filter(one -> one.target() == target);
            if (calibration.isPresent()) {
                known = calibrated(known, calibration.get(), input.position());
            }
        }
        return known;
    }

    private static Known ofChoice(String name, Entered entered) {
        List<Source> sources =
                entered.deviationOrZero() > 0 ? List.of(new Source(-1, name, entered.deviationOrZero())) : List.of();
        return new Known(entered.si(), sources, entered.deviation().isEmpty());
    }

    private static Optional<Known> calibrated(Optional<Known> known, CalibrationFacet calibration, int input) {
        Source source = new Source(input, calibration.model().parameters().get(0), calibration.deviation(0));
        if (calibration.model() == CalibrationModel.VALUE) {
            return Optional.of(new Known(calibration.parameters()[0], List.of(source), false));
        }
        return known.map(reading -> {
            List<Source> sources = new ArrayList<>(reading.sources);
            sources.add(source);
            return new Known(calibration.apply(reading.value).value(), sources, reading.unstated);
        });
    }
}
