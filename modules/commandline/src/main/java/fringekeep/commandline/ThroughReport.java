package fringekeep.commandline;

import fringekeep.archive.Archive;
import fringekeep.archive.json.Json;
import fringekeep.archive.json.JsonArray;
import fringekeep.archive.json.JsonObject;
import fringekeep.archive.record.Hash;
import fringekeep.audit.Through;
import fringekeep.audit.ValueVerdict;
import java.util.List;
import java.util.Locale;

/** What a chain recomputed through says, as text or JSON. */
final class ThroughReport {
    private final Console console;
    private final Archive archive;
    private final boolean values;
    private final boolean all;

    ThroughReport(Console console, Archive archive, boolean values, boolean all) {
        this.console = console;
        this.archive = archive;
        this.values = values;
        this.all = all;
    }

    /** Writes and gives the exit code. */
    int write(Through.Answers answers, boolean json) {
        if (json) {
            console.json(RecomputeCommands.json(archive, answers.verdicts())
                    .with(
                            "through",
                            new JsonArray(answers.answers().stream()
                                    .<Json>map(this::json)
                                    .toList())));
        } else {
            RecomputeCommands.records(console, archive, answers.verdicts(), all);
            answers.answers().forEach(this::text);
        }
        return answers.answers().stream().allMatch(ThroughReport::agrees) ? Exit.DONE : Exit.COULD_NOT;
    }

    private static boolean agrees(Through.Answer answer) {
        return switch (answer.follows()) {
            case SAME_BITS, WITHIN_ROUNDING, ENTERED -> true;
            case UNDECIDED, NO -> false;
        };
    }

    private void text(Through.Answer answer) {
        if (values) {
            answer.values().forEach(this::value);
        }
        console.line(archive.label(answer.target()) + "  " + answer.follows().words());
        labels("differences begin at", answer.beginnings());
        labels("taken as recorded", answer.taken());
    }

    private void labels(String words, List<Hash> records) {
        if (!records.isEmpty()) {
            console.line("    " + words + ": "
                    + String.join(", ", records.stream().map(archive::label).toList()));
        }
    }

    private void value(ValueVerdict value) {
        String units = value.units() > 0 ? "  " + value.units() + " units in the last place" : "";
        String sigmas = value.inDeviations().isPresent()
                ? String.format(
                        Locale.ROOT, "  %+.3g \u03c3", value.inDeviations().getAsDouble())
                : "";
        String now = value.units() == 0 ? "" : "  now " + value.now();
        console.line(
                "    " + value.pointer() + "  " + value.verdict().words() + "  " + value.kept() + now + units + sigmas);
    }

    private JsonObject json(Through.Answer answer) {
        JsonObject object = JsonObject.EMPTY
                .with("record", answer.target().hex())
                .with("label", archive.label(answer.target()))
                .with(
                        "follows",
                        answer.follows().name().toLowerCase(Locale.ROOT).replace('_', '-'))
                .with("words", answer.follows().words())
                .with("beginnings", labelled(answer.beginnings()))
                .with("takenAsRecorded", labelled(answer.taken()));
        return values
                ? object.with(
                        "values",
                        new JsonArray(answer.values().stream()
                                .<Json>map(ThroughReport::json)
                                .toList()))
                : object;
    }

    private JsonArray labelled(List<Hash> records) {
        return new JsonArray(records.stream()
                .<Json>map(each -> JsonObject.EMPTY.with("record", each.hex()).with("label", archive.label(each)))
                .toList());
    }

    private static JsonObject json(ValueVerdict value) {
        JsonObject object = JsonObject.EMPTY
                .with("pointer", value.pointer())
                .with("verdict", value.verdict().words())
                .with("kept", value.kept())
                .with("now", value.now())
                .with("units", value.units());
        if (value.change().isPresent()) {
            object = object.with("change", value.change().getAsDouble());
        }
        return value.inDeviations().isPresent()
                ? object.with("sigmas", value.inDeviations().getAsDouble())
                : object;
    }
}
