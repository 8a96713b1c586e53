package fringekeep.fit.internal;

import fringekeep.archive.json.JsonObject;
import fringekeep.archive.kind.Inputs;
import fringekeep.archive.kind.Knob;
import java.util.ArrayList;
import java.util.List;

/** What "suppose" may turn in a fit: period, dead time, known background. */
public final class FitKnobs {
    private FitKnobs() {}

    /** The knobs of complete choices; all are choices, at the values that are recorded. */
    public static List<Knob> of(FitChoices choices, Inputs inputs) {
        List<Knob> knobs = new ArrayList<>();
        knobs.add(knob("period", "/choices/period/si", choices.period(), "m"));
        if (!choices.deadTimeSort().equals("none")) {
            knobs.add(knob(
                    "dead time",
                    "/choices/deadTime/si",
                    choices.json().object("deadTime").orElseThrow(),
                    "s"));
        }
        if (choices.backgroundSort().equals("known")) {
            boolean shots = inputs.role("scan").stream()
                    .map(input -> input.facet(fringekeep.archive.facet.CountTable.class))
                    .flatMap(java.util.Optional::stream)
                    .anyMatch(table -> table.shots().length > 0);
            knobs.add(knob("background", "/choices/background/si", choices.background(), shots ? "1" : "s-1"));
        }
        return knobs;
    }

    private static Knob knob(String name, String pointer, JsonObject member, String unit) {
        return new Knob(
                name,
                -1,
                pointer,
                member.number("si").orElseThrow(),
                member.number("u").orElse(Double.NaN),
                unit);
    }
}
