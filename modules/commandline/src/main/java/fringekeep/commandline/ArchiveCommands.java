package fringekeep.commandline;

import fringekeep.archive.Archive;
import fringekeep.archive.ArchiveFacts;
import fringekeep.archive.Archives;
import fringekeep.archive.Person;
import fringekeep.archive.json.Json;
import fringekeep.archive.json.JsonArray;
import fringekeep.archive.json.JsonBoolean;
import fringekeep.archive.json.JsonObject;
import fringekeep.archive.problem.Problem;
import fringekeep.archive.problem.ProblemException;
import fringekeep.archive.problem.StoppedException;
import fringekeep.archive.record.Hash;
import fringekeep.archive.record.PersonId;
import java.nio.file.Path;
import java.util.ArrayList;
import java.util.HexFormat;
import java.util.List;
import java.util.Locale;
import java.util.Map;
import java.util.Optional;
import java.util.TreeMap;
import org.jspecify.annotations.Nullable;
import picocli.CommandLine.Command;
import picocli.CommandLine.Option;
import picocli.CommandLine.Parameters;

/** Commands about an archive as a whole. */
@Command(name = Main.NAME)
final class ArchiveCommands {
    private final Console console;

    ArchiveCommands(Console console) {
        this.console = console;
    }

    @Command(name = "found", description = "Founds a new archive in an empty folder.", mixinStandardHelpOptions = true)
    int found(
            @Option(
                            names = "--title",
                            required = true,
                            paramLabel = "TEXT",
                            description = "The laboratory's name for it.")
                    String title,
            @Option(
                            names = "--day-boundary",
                            defaultValue = "06:00",
                            paramLabel = "HH:MM",
                            description = "When a measurement day begins (${DEFAULT-VALUE} when not given).")
                    String dayBoundary,
            @Option(
                            names = "--zone",
                            required = true,
                            paramLabel = "ZONE",
                            description = "IANA time zone, such as Europe/Lisbon.")
                    String zone,
            @Option(names = "--person", paramLabel = "NAME", description = "A person who records; may be repeated.")
                    @Nullable
                    List<String> people,
            @Option(names = "--invented", description = "The data are invented, and every view says so.")
                    boolean invented,
            @Option(names = "--json", description = "Write JSON.") boolean json,
            @Parameters(paramLabel = "FOLDER", description = "Where it goes.") Path folder)
            throws ProblemException {
        List<Person> persons = new ArrayList<>();
        for (String name : people == null ? List.<String>of() : people) {
            persons.add(newPerson(name, Optional.empty(), Optional.empty()));
        }
        Archives.Founding founding =
                new Archives.Founding(title, dayBoundary, zone, invented, persons, Optional.empty());
        try (Archive archive = Archives.found(folder, founding, Session.kinds(), Session.circumstances())) {
            facts(archive, json);
        }
        return Exit.DONE;
    }

    private static Person newPerson(String name, Optional<String> orcid, Optional<String> mail) {
        String id = HexFormat.of().formatHex(Session.circumstances().random().get());
        return new Person(new PersonId(id), Optional.of(name), orcid, mail);
    }

    @Command(
            name = "facts",
            description = "Says what an archive is and how much it holds.",
            mixinStandardHelpOptions = true)
    int facts(
            @Option(names = "--archive", paramLabel = "FOLDER", description = "The archive.") @Nullable Path folder,
            @Option(names = "--json", description = "Write JSON.") boolean json)
            throws ProblemException {
        try (Session session = Session.open(folder)) {
            facts(session.archive(), json);
        }
        return Exit.DONE;
    }

    private void facts(Archive archive, boolean json) {
        ArchiveFacts facts = archive.facts();
        Map<String, Long> counts = new TreeMap<>(archive.counts());
        if (json) {
            JsonObject kinds = JsonObject.EMPTY;
            for (Map.Entry<String, Long> each : counts.entrySet()) {
                kinds = kinds.with(each.getKey(), each.getValue());
            }
            console.json(JsonObject.EMPTY
                    .with("archive", facts.id().hex())
                    .with("title", facts.title())
                    .with("dayBoundary", facts.dayBoundary())
                    .with("zone", facts.zone())
                    .with("invented", new JsonBoolean(facts.invented()))
                    .with("entries", facts.watermark())
                    .with("journalHead", archive.journalHead().hex())
                    .with("folder", facts.folder().toString())
                    .with("current", kinds));
            return;
        }
        console.line(facts.title() + (facts.invented() ? "  (invented)" : ""));
        console.line("archive " + facts.id().hex() + ", day from " + facts.dayBoundary() + " " + facts.zone());
        console.line("journal: " + facts.watermark() + " entries, head "
                + archive.journalHead().hex());
        counts.forEach((kind, count) -> console.line(String.format(Locale.ROOT, "%8d  %s", count, kind)));
    }

    @Command(
            name = "person",
            description = "Adds a person, lists persons, or forgets one.",
            mixinStandardHelpOptions = true)
    int person(
            @Option(names = "--archive", paramLabel = "FOLDER", description = "The archive.") @Nullable Path folder,
            @Option(names = "--add", paramLabel = "NAME", description = "Adds a person of that name.") @Nullable
                    String add,
            @Option(names = "--orcid", paramLabel = "ORCID", description = "With --add.") @Nullable String orcid,
            @Option(names = "--mail", paramLabel = "ADDRESS", description = "With --add.") @Nullable String mail,
            @Option(
                            names = "--forget",
                            paramLabel = "ID",
                            description = "Erases name, ORCID and mail; the id stays in records.")
                    @Nullable
                    String forget,
            @Option(names = "--json", description = "Write JSON.") boolean json)
            throws ProblemException {
        try (Session session = Session.open(folder)) {
            if (add != null) {
                session.archive().savePerson(newPerson(add, Optional.ofNullable(orcid), Optional.ofNullable(mail)));
            }
            if (forget != null) {
                session.archive().erasePerson(personId(forget));
            }
            if (json) {
                console.json(new JsonArray(session.archive().persons().stream()
                        .<Json>map(person -> JsonObject.EMPTY
                                .with("id", person.id().hex())
                                .with("name", person.name().map(Json::of))
                                .with("orcid", person.orcid().map(Json::of))
                                .with("mail", person.mail().map(Json::of)))
                        .toList()));
            } else {
                session.archive()
                        .persons()
                        .forEach(person -> console.line(
                                person.id().hex() + "  " + person.name().orElse("(erased)")
                                        + person.orcid().map(id -> "  " + id).orElse("")));
            }
        }
        return Exit.DONE;
    }

    private static PersonId personId(String text) throws ProblemException {
        try {
            return new PersonId(text);
        } catch (IllegalArgumentException e) {
            throw new ProblemException(new Problem(
                    "command.person-id",
                    "\"" + text + "\" is not a person's id.",
                    "--forget",
                    "Give the 32 hexadecimal digits that fringekeep-headless person shows; nothing was erased."));
        }
    }

    @Command(
            name = "check",
            description =
                    "Re-hashes everything, follows the journal, compares tables with records, finds orphans; names each fault.",
            mixinStandardHelpOptions = true)
    int check(
            @Option(names = "--archive", paramLabel = "FOLDER", description = "The archive.") @Nullable Path folder,
            @Option(names = "--json", description = "Write JSON.") boolean json)
            throws ProblemException, StoppedException {
        try (Session session = Session.open(folder);
                StoppableWork work = new StoppableWork(console, !json)) {
            List<Problem> faults = session.archive().check(work);
            if (json) {
                console.json(JsonObject.EMPTY
                        .with("entries", session.archive().facts().watermark())
                        .with("faults", Console.problemsJson(faults)));
            } else {
                console.problems(faults);
                console.line(
                        faults.isEmpty()
                                ? "whole: " + session.archive().facts().watermark() + " entries, no fault"
                                : faults.size() + " faults");
            }
            return faults.isEmpty() ? Exit.DONE : Exit.COULD_NOT;
        }
    }

    @Command(
            name = "copy",
            description =
                    "Copies the archive as plain files while it is in use; a second copy into the same folder adds.",
            mixinStandardHelpOptions = true)
    int copy(
            @Option(names = "--archive", paramLabel = "FOLDER", description = "The archive.") @Nullable Path folder,
            @Option(names = "--json", description = "Write JSON.") boolean json,
            @Parameters(paramLabel = "COPY", description = "Folder of the copy.") Path copy)
            throws ProblemException, StoppedException {
        try (Session session = Session.open(folder);
                StoppableWork work = new StoppableWork(console, !json)) {
            session.archive().copyTo(copy, work);
            long entries = session.archive().facts().watermark();
            if (json) {
                console.json(JsonObject.EMPTY.with("copy", copy.toString()).with("entries", entries));
            } else {
                console.line(copy + ": " + entries + " entries");
            }
        }
        return Exit.DONE;
    }

    @Command(
            name = "restore",
            description = "Makes an archive from a plain copy: the same journal, numbers and id.",
            mixinStandardHelpOptions = true)
    int restore(
            @Parameters(index = "0", paramLabel = "COPY", description = "Folder of the copy.") Path copy,
            @Parameters(index = "1", paramLabel = "FOLDER", description = "Where the archive goes.") Path folder)
            throws ProblemException, StoppedException {
        try (StoppableWork work = new StoppableWork(console, true);
                Archive archive = Archives.restore(copy, folder, Session.kinds(), Session.circumstances(), work)) {
            facts(archive, false);
        }
        return Exit.DONE;
    }

    @Command(
            name = "receive",
            description = "Takes records over from a plain copy or a bundle; what is known already is passed over.",
            mixinStandardHelpOptions = true)
    int receive(
            @Option(names = "--archive", paramLabel = "FOLDER", description = "The archive.") @Nullable Path folder,
            @Option(names = "--json", description = "Write JSON.") boolean json,
            @Option(names = "--persons", description = "Also names of persons.") boolean persons,
            @Parameters(paramLabel = "SOURCE", description = "Folder of the copy or bundle.") Path source)
            throws ProblemException, StoppedException {
        try (Session session = Session.open(folder);
                StoppableWork work = new StoppableWork(console, !json)) {
            Archive.Received received = session.archive().receive(source, persons, work);
            if (json) {
                console.json(JsonObject.EMPTY
                        .with("received", received.records())
                        .with("known", received.known())
                        .with("supplied", received.parts()));
                return Exit.DONE;
            }
            console.line(received.records() + " records received, " + received.known() + " known already, "
                    + received.parts() + " parts supplied");
        }
        return Exit.DONE;
    }

    @Command(name = "rebuild", description = "Makes all tables over records anew.", mixinStandardHelpOptions = true)
    int rebuild(@Option(names = "--archive", paramLabel = "FOLDER", description = "The archive.") @Nullable Path folder)
            throws ProblemException, StoppedException {
        try (Session session = Session.open(folder);
                StoppableWork work = new StoppableWork(console, true)) {
            session.archive().rebuildProjections(work);
            console.line("rebuilt");
        }
        return Exit.DONE;
    }

    @Command(
            name = "purge",
            description = "Removes the bytes of a raw file, payload or sealed part for cause; hash and reason stay.",
            mixinStandardHelpOptions = true)
    int purge(
            @Option(names = "--archive", paramLabel = "FOLDER", description = "The archive.") @Nullable Path folder,
            @Option(names = "--what", required = true, paramLabel = "SORT", description = "raw, payload or part.")
                    Archive.PurgeTarget what,
            @Option(names = "--reason", required = true, paramLabel = "TEXT", description = "Reason, a few words.")
                    String reason,
            @Option(names = "--text", required = true, paramLabel = "TEXT", description = "Why, in full.") String text,
            @Parameters(paramLabel = "SHA-256", description = "Hash of the bytes.") String hash)
            throws ProblemException {
        try (Session session = Session.open(folder)) {
            session.archive().purge(what, hash(hash), reason, text);
            console.line("purged " + hash);
        }
        return Exit.DONE;
    }

    private static Hash hash(String text) throws ProblemException {
        try {
            return new Hash(text);
        } catch (IllegalArgumentException e) {
            throw new ProblemException(new Problem(
                    "command.hash", "\"" + text + "\" is no SHA-256.", "", "Give 64 lower-case hexadecimal digits."));
        }
    }
}
