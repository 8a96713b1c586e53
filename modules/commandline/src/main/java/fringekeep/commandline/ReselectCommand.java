package fringekeep.commandline;

import fringekeep.archive.Archive;
import fringekeep.archive.json.Json;
import fringekeep.archive.json.JsonArray;
import fringekeep.archive.json.JsonObject;
import fringekeep.archive.problem.Problem;
import fringekeep.archive.problem.ProblemException;
import fringekeep.archive.record.Hash;
import fringekeep.property.RerunSelection;
import java.nio.file.Path;
import java.util.ArrayList;
import java.util.LinkedHashSet;
import java.util.List;
import java.util.Set;
import org.jspecify.annotations.Nullable;
import picocli.CommandLine.Command;
import picocli.CommandLine.Option;
import picocli.CommandLine.Parameters;

/** Running the rules of selections again. */
@Command(name = Main.NAME)
final class ReselectCommand {
    private final Console console;

    ReselectCommand(Console console) {
        this.console = console;
    }

    @Command(
            name = "reselect",
            description = {
                "Runs the rule of a selection again on the archive as it now is and shows the difference.",
                "For a property, figure or statement the selections it was made from are run. Records nothing; to record"
                        + " the outcome use select, or revise for the revision with the same list."
            },
            footer = {
                "",
                "Reasons: recorded-since, corrects, was-left-out; withdrawn, outdated, other-choice, corrected,"
                        + " answers-no-more.",
                "A difference is no fault: the exit code is 0 all the same."
            },
            mixinStandardHelpOptions = true)
    int reselect(
            @Option(names = "--archive", paramLabel = "FOLDER", description = "The archive.") @Nullable Path folder,
            @Option(names = "--json", description = "Write JSON.") boolean json,
            @Option(names = "--all", description = "Also name the fits that are taken as before or still left out.")
                    boolean all,
            @Parameters(arity = "1..*", paramLabel = "RECORD", description = "Selections, or records made from them.")
                    List<String> references)
            throws ProblemException {
        try (Session session = Session.open(folder)) {
            RerunSelection rerun = new RerunSelection(session.archive());
            List<RerunSelection.Difference> differences = new ArrayList<>();
            for (Hash selection : selections(session, rerun, references)) {
                differences.add(rerun.difference(selection));
            }
            if (json) {
                console.json(new JsonArray(differences.stream()
                        .<Json>map(each -> json(session.archive(), each))
                        .toList()));
            } else {
                differences.forEach(each -> text(session.archive(), each, all));
            }
            return Exit.DONE;
        }
    }

    private static Set<Hash> selections(Session session, RerunSelection rerun, List<String> references)
            throws ProblemException {
        Set<Hash> selections = new LinkedHashSet<>();
        for (Hash record : session.find(references)) {
            List<Hash> found = rerun.selectionsOf(record);
            if (found.isEmpty()) {
                throw new ProblemException(new Problem(
                        "command.no-selection",
                        session.archive().label(record) + " was made from no selection.",
                        "",
                        "Name a selection, or a property, figure or statement that rests on one."));
            }
            selections.addAll(found);
        }
        return selections;
    }

    private void text(Archive archive, RerunSelection.Difference difference, boolean all) {
        console.line(archive.label(difference.selection())
                + (difference.byHand() ? "  (picked by hand: only what it names was looked at)" : "")
                + "  " + difference.still().size() + " as before, "
                + difference.nowChosen().size() + " now also chosen, "
                + difference.noLonger().size() + " no longer chosen, "
                + difference.stillLeft().size() + " still left out");
        difference.nowChosen().forEach(each -> change(archive, "now also", each));
        difference.noLonger().forEach(each -> change(archive, "no longer", each));
        if (all) {
            difference.still().forEach(fit -> console.line("    as before  " + archive.label(fit)));
            difference.stillLeft().forEach(each -> change(archive, "still left out", each));
        }
    }

    private void change(Archive archive, String words, RerunSelection.Change change) {
        console.line("    " + words + "  " + archive.label(change.fit()) + "  " + change.reason()
                + change.by().map(by -> "  " + archive.label(by)).orElse(""));
    }

    private static JsonObject json(Archive archive, RerunSelection.Difference difference) {
        return JsonObject.EMPTY
                .with("selection", difference.selection().hex())
                .with("label", archive.label(difference.selection()))
                .with("byHand", Json.of(difference.byHand()))
                .with("same", Json.of(difference.none()))
                .with(
                        "asBefore",
                        JsonArray.ofTexts(
                                difference.still().stream().map(Hash::hex).toList()))
                .with("nowChosen", changes(archive, difference.nowChosen()))
                .with("noLonger", changes(archive, difference.noLonger()))
                .with("stillLeft", changes(archive, difference.stillLeft()));
    }

    private static JsonArray changes(Archive archive, List<RerunSelection.Change> changes) {
        return new JsonArray(changes.stream()
                .<Json>map(each -> JsonObject.EMPTY
                        .with("record", each.fit().hex())
                        .with("label", archive.label(each.fit()))
                        .with("reason", each.reason())
                        .with("by", each.by().map(by -> Json.of(by.hex()))))
                .toList());
    }
}
