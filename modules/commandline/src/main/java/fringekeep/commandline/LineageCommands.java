package fringekeep.commandline;

import fringekeep.archive.Archive;
import fringekeep.archive.graph.Cause;
import fringekeep.archive.graph.Graph;
import fringekeep.archive.graph.StateName;
import fringekeep.archive.json.Json;
import fringekeep.archive.json.JsonArray;
import fringekeep.archive.json.JsonObject;
import fringekeep.archive.lineage.Lineage;
import fringekeep.archive.lineage.ProvJson;
import fringekeep.archive.problem.ProblemException;
import fringekeep.archive.problem.StoppedException;
import fringekeep.archive.record.Hash;
import fringekeep.audit.NextRevision;
import fringekeep.audit.Revision;
import fringekeep.audit.Shift;
import fringekeep.audit.Supposed;
import fringekeep.audit.TraceJson;
import fringekeep.audit.TraceText;
import java.nio.file.Path;
import java.util.ArrayList;
import java.util.HashSet;
import java.util.List;
import java.util.Locale;
import java.util.Map;
import java.util.Set;
import org.jspecify.annotations.Nullable;
import picocli.CommandLine.Command;
import picocli.CommandLine.Option;
import picocli.CommandLine.Parameters;

/** Commands about where a record comes from and what became of it. */
@Command(name = Main.NAME)
final class LineageCommands {
    private final Console console;

    LineageCommands(Console console) {
        this.console = console;
    }

    /** Forms in which a lineage is written. */
    enum Form {
        /** Indented text. */
        TEXT,
        /** One JSON document. */
        JSON,
        /** PROV-JSON. */
        PROV
    }

    @Command(
            name = "trace",
            description = "Shows what a record was made from, down to raw files.",
            mixinStandardHelpOptions = true)
    int trace(
            @Option(names = "--archive", paramLabel = "FOLDER", description = "The archive.") @Nullable Path folder,
            @Option(names = "--form", defaultValue = "TEXT", description = "text, json or prov.") Form form,
            @Option(names = "--json", description = "The same as --form json.") boolean json,
            @Option(names = "--all", description = "Write like records out one by one.") boolean all,
            @Option(names = "--spoken-of", description = "Also what records speak of without being made from it.")
                    boolean spokenOf,
            @Parameters(arity = "1..*", paramLabel = "RECORD", description = "Records to trace.")
                    List<String> references)
            throws ProblemException {
        try (Session session = Session.open(folder)) {
            Archive archive = session.archive();
            Lineage lineage = Lineage.of(
                    Lineage.source(archive::record, archive::inputs, archive::label),
                    archive.kinds(),
                    session.find(references),
                    spokenOf ? Lineage.Reach.SPOKEN_OF : Lineage.Reach.MADE_FROM);
            switch (json ? Form.JSON : form) {
                case TEXT -> console.text(TraceText.of(lineage, archive.graph(), all));
                case JSON -> console.json(TraceJson.of(lineage, archive.graph()));
                case PROV -> console.json(ProvJson.of(lineage));
            }
            return Exit.DONE;
        }
    }

    @Command(
            name = "outdated",
            description = "Lists what is outdated, why, and by how many standard uncertainties it would move.",
            mixinStandardHelpOptions = true)
    int outdated(
            @Option(names = "--archive", paramLabel = "FOLDER", description = "The archive.") @Nullable Path folder,
            @Option(names = "--json", description = "Write JSON.") boolean json,
            @Option(names = "--sizes", description = "Also compute how far each result would move.") boolean sizes,
            @Parameters(arity = "0..*", paramLabel = "RECORD", description = "Only these and what they rest on.")
                    @Nullable
                    List<String> references)
            throws ProblemException, StoppedException {
        try (Session session = Session.open(folder);
                StoppableWork work = new StoppableWork(console, !json)) {
            List<Hash> found = outdated(session, references == null ? List.of() : references);
            List<Revision> revisions = sizes
                    ? NextRevision.prepare(
                            session.archive(), found, Supposed.NOTHING, rules(), session.anyPerson(), work)
                    : List.of();
            if (json) {
                console.json(new JsonArray(found.stream()
                        .<Json>map(record -> outdatedJson(session.archive(), record, revisions))
                        .toList()));
            } else {
                found.forEach(record -> outdatedText(session.archive(), record, revisions));
                console.line(found.size() + " outdated");
            }
            return Exit.DONE;
        }
    }

    private static Map<fringekeep.archive.record.KindName, fringekeep.archive.Regathering> rules() {
        return NextRevision.announced(LineageCommands.class.getClassLoader());
    }

    private static List<Hash> outdated(Session session, List<String> references) throws ProblemException {
        Archive archive = session.archive();
        Graph graph = archive.graph();
        Set<Hash> within = new HashSet<>();
        for (Hash record : session.find(references)) {
            within.add(record);
            within.addAll(graph.upstream(record));
        }
        List<Hash> found = new ArrayList<>();
        for (fringekeep.archive.kind.RecordKind kind : archive.kinds().all()) {
            for (Hash record : allOf(archive, kind.kind().text())) {
                boolean asked = references.isEmpty() || within.contains(record);
                Set<StateName> states = graph.states(record);
                if (asked && states.contains(StateName.OUTDATED) && !states.contains(StateName.CORRECTED)) {
                    found.add(record);
                }
            }
        }
        return found;
    }

    private static List<Hash> allOf(Archive archive, String kind) {
        List<Hash> all = new ArrayList<>();
        long from = 0;
        List<Hash> page = archive.records(kind, from, 1000);
        while (!page.isEmpty()) {
            all.addAll(page);
            from = archive.recorded(page.get(page.size() - 1)).orElseThrow().n() + 1;
            page = archive.records(kind, from, 1000);
        }
        return all;
    }

    private void outdatedText(Archive archive, Hash record, List<Revision> revisions) {
        console.line(archive.label(record) + "  " + record.shortForm());
        for (Cause cause : archive.graph().causes(record)) {
            console.line("  " + words(archive, cause));
        }
        revisions.stream().filter(revision -> revision.before().equals(record)).forEach(this::revisionText);
    }

    /** One cause as a sentence. */
    static String words(Archive archive, Cause cause) {
        String upstream = archive.label(cause.upstream());
        String by = archive.label(cause.by());
        return switch (cause.sort()) {
            case CORRECTED -> upstream + " was corrected by " + by;
            case JUDGED -> upstream + " was judged since: " + by;
            case UNDONE -> "judgement " + upstream + " does not stand any more";
            case CHANGED -> "at the time of the scan " + by + " holds instead of " + upstream;
        };
    }

    private static Json outdatedJson(Archive archive, Hash record, List<Revision> revisions) {
        List<Json> causes = archive.graph().causes(record).stream()
                .<Json>map(cause -> JsonObject.EMPTY
                        .with("sort", cause.sort().name().toLowerCase(Locale.ROOT))
                        .with("upstream", cause.upstream().hex())
                        .with("by", cause.by().hex())
                        .with("words", words(archive, cause)))
                .toList();
        JsonObject object = JsonObject.EMPTY
                .with("record", record.hex())
                .with("label", archive.label(record))
                .with("causes", new JsonArray(causes));
        for (Revision revision : revisions) {
            if (revision.before().equals(record)) {
                object = object.with("shifts", shifts(revision));
            }
        }
        return object;
    }

    private static JsonArray shifts(Revision revision) {
        return new JsonArray(revision.shifts().stream()
                .<Json>map(shift -> {
                    JsonObject object = JsonObject.EMPTY
                            .with("pointer", shift.pointer())
                            .with("before", shift.before())
                            .with("after", shift.after())
                            .with("u", shift.deviation());
                    return shift.inDeviations().isPresent()
                            ? object.with("sigmas", shift.inDeviations().getAsDouble())
                            : object;
                })
                .toList());
    }

    private void revisionText(Revision revision) {
        console.problems(revision.reasons());
        for (Shift shift : revision.shifts()) {
            if (shift.before() != shift.after()) {
                String sigmas = shift.inDeviations().isPresent()
                        ? String.format(
                                Locale.ROOT,
                                "  %+.2f \u03c3",
                                shift.inDeviations().getAsDouble())
                        : "";
                console.line("  " + shift.pointer() + "  " + shift.before() + " \u2192 " + shift.after() + sigmas);
            }
        }
    }

    @Command(
            name = "suppose",
            description =
                    "Computes what would become of records if others were withdrawn or replaced; records nothing.",
            mixinStandardHelpOptions = true)
    int suppose(
            @Option(names = "--archive", paramLabel = "FOLDER", description = "The archive.") @Nullable Path folder,
            @Option(names = "--json", description = "Write JSON.") boolean json,
            @Option(names = "--without", paramLabel = "RECORD", description = "Taken as withdrawn; may be repeated.")
                    @Nullable
                    List<String> without,
            @Option(names = "--instead", paramLabel = "OLD=NEW", description = "Taken as corrected; may be repeated.")
                    @Nullable
                    Map<String, String> instead,
            @Parameters(arity = "1..*", paramLabel = "RECORD", description = "Records to compute again.")
                    List<String> references)
            throws ProblemException, StoppedException {
        try (Session session = Session.open(folder);
                StoppableWork work = new StoppableWork(console, !json)) {
            Map<Hash, Hash> replaced = new java.util.HashMap<>();
            for (Map.Entry<String, String> each : (instead == null ? Map.<String, String>of() : instead).entrySet()) {
                replaced.put(
                        session.archive().find(each.getKey()), session.archive().find(each.getValue()));
            }
            Set<Hash> withdrawn = Set.copyOf(session.find(without == null ? List.of() : without));
            List<Revision> revisions = NextRevision.prepare(
                    session.archive(),
                    session.find(references),
                    new Supposed(withdrawn, replaced),
                    rules(),
                    session.anyPerson(),
                    work);
            revisions(revisions, json);
            return Exit.DONE;
        }
    }

    private void revisions(List<Revision> revisions, boolean json) {
        if (json) {
            console.json(new JsonArray(revisions.stream()
                    .<Json>map(revision -> JsonObject.EMPTY
                            .with("record", revision.before().hex())
                            .with("label", revision.label())
                            .with(
                                    "revision",
                                    revision.after()
                                            .map(after ->
                                                    Json.of(after.fingerprint().hex())))
                            .with("shifts", shifts(revision))
                            .with("problems", Console.problemsJson(revision.reasons())))
                    .toList()));
            return;
        }
        for (Revision revision : revisions) {
            console.line(revision.label() + (revision.after().isPresent() ? "" : "  falls away"));
            revisionText(revision);
        }
        console.line(revisions.size() + " records change");
    }

    @Command(
            name = "revise",
            description = "Records the next revision of outdated records and of everything they rest on.",
            mixinStandardHelpOptions = true)
    int revise(
            @Option(names = "--archive", paramLabel = "FOLDER", description = "The archive.") @Nullable Path folder,
            @Option(names = "--json", description = "Write JSON.") boolean json,
            @Option(names = "--person", paramLabel = "NAME", description = "Who answers for revised selections.")
                    @Nullable
                    String person,
            @Parameters(arity = "1..*", paramLabel = "RECORD", description = "Records to revise.")
                    List<String> references)
            throws ProblemException, StoppedException {
        try (Session session = Session.open(folder);
                StoppableWork work = new StoppableWork(console, !json)) {
            List<Revision> revisions = NextRevision.prepare(
                    session.archive(),
                    session.find(references),
                    Supposed.NOTHING,
                    rules(),
                    session.person(person),
                    work);
            List<Archive.Recorded> recorded = NextRevision.record(session.archive(), revisions);
            revisions(revisions, json);
            if (!json) {
                console.line(recorded.size() + " recorded");
            }
            return revisions.stream()
                            .flatMap(revision -> revision.reasons().stream())
                            .allMatch(reason -> reason.code().equals(NextRevision.FALLS_AWAY))
                    ? Exit.DONE
                    : Exit.COULD_NOT;
        }
    }
}
