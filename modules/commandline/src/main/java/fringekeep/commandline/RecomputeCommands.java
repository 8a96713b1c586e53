package fringekeep.commandline;

import fringekeep.archive.Archive;
import fringekeep.archive.json.Json;
import fringekeep.archive.json.JsonArray;
import fringekeep.archive.json.JsonObject;
import fringekeep.archive.kind.ValueComparison;
import fringekeep.archive.lineage.Recomputed;
import fringekeep.archive.problem.Problem;
import fringekeep.archive.problem.ProblemException;
import fringekeep.archive.problem.StoppedException;
import fringekeep.archive.record.Hash;
import fringekeep.audit.Recompute;
import fringekeep.audit.Through;
import java.nio.file.Path;
import java.util.List;
import java.util.Locale;
import org.jspecify.annotations.Nullable;
import picocli.CommandLine.Command;
import picocli.CommandLine.Option;
import picocli.CommandLine.Parameters;

/** Computing again from what was recorded, and comparing. */
@Command(name = Main.NAME)
final class RecomputeCommands {
    private final Console console;

    RecomputeCommands(Console console) {
        this.console = console;
    }

    @Command(
            name = "recompute",
            description = {
                "Computes records and everything upstream again and compares value by value.",
                "By default each link by itself, from its recorded inputs. With --through what comes out of a link is fed"
                        + " into the next, which answers whether a record follows from raw files and entered facts alone."
            },
            footer = {
                "",
                "Verdicts: same bits; same within rounding (at most 1,024 units in the last place); different; not"
                        + " computable. Nothing is recorded.",
                "Exit code 1 also where something differs or cannot be computed."
            },
            mixinStandardHelpOptions = true)
    int recompute(
            @Option(names = "--archive", paramLabel = "FOLDER", description = "The archive.") @Nullable Path folder,
            @Option(names = "--json", description = "Write JSON.") boolean json,
            @Option(names = "--all", description = "Also name the records that come out the same.") boolean all,
            @Option(names = "--through", description = "Feed recomputed results downstream.") boolean through,
            @Option(
                            names = "--values",
                            description = "With --through: write every value of the named records with its verdict.")
                    boolean values,
            @Parameters(arity = "1..*", paramLabel = "RECORD", description = "Records to recompute.")
                    List<String> references)
            throws ProblemException, StoppedException {
        if (values && !through) {
            throw new ProblemException(new Problem(
                    "recompute.values",
                    "--values is asked for without --through.",
                    "--values",
                    "Add --through: the values of a record are listed with what follows from raw files."));
        }
        try (Session session = Session.open(folder);
                StoppableWork work = new StoppableWork(console, !json)) {
            List<Hash> targets = session.find(references);
            return through
                    ? new ThroughReport(console, session.archive(), values, all)
                            .write(Through.upstreamOf(session.archive(), targets, work), json)
                    : each(session.archive(), Recompute.upstreamOf(session.archive(), targets, work), json, all);
        }
    }

    private int each(Archive archive, Recompute.Verdicts verdicts, boolean json, boolean all) {
        if (json) {
            console.json(json(archive, verdicts));
        } else {
            text(archive, verdicts, all);
        }
        return verdicts.worst().compareTo(Recomputed.Verdict.NOT_COMPUTABLE) >= 0 ? Exit.COULD_NOT : Exit.DONE;
    }

    private void text(Archive archive, Recompute.Verdicts verdicts, boolean all) {
        records(console, archive, verdicts, all);
        console.line("worst: " + verdicts.worst().words());
    }

    /** The records that did not come out the same, or all, and how many have each verdict. */
    static void records(Console console, Archive archive, Recompute.Verdicts verdicts, boolean all) {
        for (Recomputed each : verdicts.records()) {
            boolean shown = all
                    || each.verdict() == Recomputed.Verdict.DIFFERS
                    || each.verdict() == Recomputed.Verdict.LAST_PLACES
                    || (each.verdict() == Recomputed.Verdict.NOT_COMPUTABLE
                            && !each.reason().equals("entered"));
            if (shown) {
                console.line(archive.label(each.record()) + "  "
                        + each.verdict().words() + (each.reason().isEmpty() ? "" : " (" + each.reason() + ")"));
                each.differences().forEach(difference -> difference(console, difference));
            }
        }
        verdicts.counts()
                .forEach((verdict, count) -> console.line(String.format(Locale.ROOT, "%6d  %s", count, verdict)));
    }

    private static void difference(Console console, ValueComparison.Difference difference) {
        String units = difference.units() >= 0 ? "  " + difference.units() + " units in the last place" : "";
        String sigmas = difference.inDeviations().isPresent()
                ? String.format(
                        Locale.ROOT, "  %+.3g \u03c3", difference.inDeviations().getAsDouble())
                : "";
        console.line("    " + difference.pointer() + "  kept " + difference.kept() + "  now " + difference.now() + units
                + sigmas);
    }

    /** The verdicts as JSON. */
    static JsonObject json(Archive archive, Recompute.Verdicts verdicts) {
        List<Json> records = verdicts.records().stream()
                .<Json>map(each -> JsonObject.EMPTY
                        .with("record", each.record().hex())
                        .with("label", archive.label(each.record()))
                        .with("verdict", each.verdict().words())
                        .with("reason", each.reason())
                        .with("units", each.units())
                        .with(
                                "differences",
                                new JsonArray(each.differences().stream()
                                        .<Json>map(RecomputeCommands::json)
                                        .toList())))
                .toList();
        return JsonObject.EMPTY.with("worst", verdicts.worst().words()).with("records", new JsonArray(records));
    }

    private static JsonObject json(ValueComparison.Difference difference) {
        JsonObject object = JsonObject.EMPTY
                .with("pointer", difference.pointer())
                .with("kept", difference.kept())
                .with("now", difference.now())
                .with("units", difference.units());
        if (difference.change().isPresent()) {
            object = object.with("change", difference.change().getAsDouble());
        }
        return difference.inDeviations().isPresent()
                ? object.with("sigmas", difference.inDeviations().getAsDouble())
                : object;
    }
}
