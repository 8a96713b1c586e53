package fringekeep.desk.form;

import fringekeep.archive.Archive;
import fringekeep.archive.NewRecord;
import fringekeep.archive.Person;
import fringekeep.archive.Prepared;
import fringekeep.archive.entry.Entered;
import fringekeep.archive.entry.EntryDocument;
import fringekeep.archive.entry.EntrySurroundings;
import fringekeep.archive.json.JsonDocument;
import fringekeep.archive.json.JsonObject;
import fringekeep.archive.json.PrettyJson;
import fringekeep.archive.kind.FlatTable;
import fringekeep.archive.kind.Input;
import fringekeep.archive.kind.Inputs;
import fringekeep.archive.kind.RecordKind;
import fringekeep.archive.kind.Subject;
import fringekeep.archive.problem.Problem;
import fringekeep.archive.problem.ProblemException;
import fringekeep.archive.problem.StoppedException;
import fringekeep.archive.problem.Work;
import fringekeep.archive.record.Hash;
import fringekeep.archive.record.PartName;
import fringekeep.archive.record.PersonId;
import fringekeep.desk.session.Names;
import java.io.IOException;
import java.io.InputStream;
import java.io.OutputStream;
import java.nio.charset.StandardCharsets;
import java.nio.file.Files;
import java.nio.file.InvalidPathException;
import java.nio.file.Path;
import java.util.ArrayList;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import java.util.Set;
import java.util.TreeMap;

/** Examines what a form says, and records it. Asks the archive, so never to be used on the window thread. */
final class FormCheck {
    private static final PersonId NOBODY = new PersonId("0".repeat(32));
    private static final Inputs NONE = new Inputs() {
        @Override
        public List<Input> all() {
            return List.of();
        }

        @Override
        public List<Subject> about() {
            return List.of();
        }
    };

    private final Archive archive;
    private final FormKind form;
    private final RecordKind kind;

    FormCheck(Archive archive, FormKind form) {
        this.archive = archive;
        this.form = form;
        this.kind = form.kind();
    }

    /**
     * What was found.
     *
     * @param problems all that is wrong, each with the pointer of its field or none
     * @param cautions hazards that the record states or that follow from it
     * @param titles what records named in it are called, by the text that names them
     */
    record Checked(List<Problem> problems, List<Caution> cautions, Map<String, String> titles) {
        Checked {
            problems = List.copyOf(problems);
            cautions = List.copyOf(cautions);
            titles = Map.copyOf(titles);
        }
    }

    /** Examines a document; stores nothing and takes no file in. */
    Checked check(JsonObject document, List<String> references) {
        Map<String, String> titles = titles(references);
        try {
            Entered entered = read(document, this::sized);
            NewRecord record = signed(entered.record(), Optional.of(somebody()));
            boolean whole = record.parts().containsKey(PartName.CONTENT) && !hasPaths(document);
            if (!whole) {
                return new Checked(List.of(), List.of(), titles);
            }
            Prepared prepared = archive.prepare(record, List.of());
            return new Checked(List.of(), cautions(DraftView.of(record, prepared)), titles);
        } catch (ProblemException e) {
            return new Checked(fields(e.problems()), List.of(), titles);
        }
    }

    /** Records a document, computing where the kind is computed; removes its draft in the same transaction. */
    Archive.Recorded record(JsonObject document, PersonId person, Set<String> drafts, Work work)
            throws ProblemException, StoppedException {
        try {
            NewRecord record = signed(read(document, this::taken).record(), Optional.of(person));
            NewRecord whole =
                    record.parts().containsKey(PartName.CHOICES) ? archive.compute(record, List.of(), work) : record;
            return archive.record(List.of(archive.prepare(whole, List.of())), drafts)
                    .get(0);
        } catch (ProblemException e) {
            throw new ProblemException(fields(e.problems()));
        }
    }

    private Entered read(JsonObject document, EntrySurroundings.RawFiles files) throws ProblemException {
        EntrySurroundings surroundings = new EntrySurroundings(archive.kinds(), archive::find, this::person, files);
        return EntryDocument.read(JsonDocument.read(PrettyJson.write(document)), surroundings);
    }

    private PersonId person(String nameOrId) throws ProblemException {
        return archive.persons().stream()
                .filter(person -> person.name().equals(Optional.of(nameOrId))
                        || person.id().hex().equals(nameOrId))
                .map(Person::id)
                .findFirst()
                .orElseThrow(() -> new ProblemException(new Problem(
                        "form.person", "Nobody is called " + nameOrId + ".", "", "Choose who is at the desk.")));
    }

    private static NewRecord signed(NewRecord record, Optional<PersonId> person) {
        return new NewRecord(
                record.kind(),
                record.inputs(),
                record.about(),
                record.parts(),
                record.payloads(),
                record.corrects(),
                record.after(),
                record.person().or(() -> person));
    }

    /** Whoever signs in the end: an examination needs a person, whichever. */
    private PersonId somebody() {
        return archive.persons().stream().map(Person::id).findFirst().orElse(NOBODY);
    }

    // ---- raw files

    private static boolean hasPaths(JsonObject document) {
        return document.array("inputs").objects().stream()
                .anyMatch(input ->
                        input.text("raw").isPresent() && input.get("bytes").isEmpty());
    }

    /** A stand-in for a file that is taken in only when the record is recorded. */
    private EntrySurroundings.TakenRaw sized(String path) throws ProblemException {
        try {
            return new EntrySurroundings.TakenRaw(
                    Hash.of(path.getBytes(StandardCharsets.UTF_8)), Files.size(existing(path)));
        } catch (IOException e) {
            throw noFile(path);
        }
    }

    private EntrySurroundings.TakenRaw taken(String path) throws ProblemException {
        if (path.matches("[0-9a-f]{64}")) {
            return known(new Hash(path));
        }
        Archive.RawTaken taken = archive.takeIn(existing(path));
        return new EntrySurroundings.TakenRaw(taken.hash(), taken.bytes());
    }

    private EntrySurroundings.TakenRaw known(Hash hash) throws ProblemException {
        try (InputStream bytes = archive.raw(hash).orElseThrow(() -> noFile(hash.hex()))) {
            return new EntrySurroundings.TakenRaw(hash, bytes.transferTo(OutputStream.nullOutputStream()));
        } catch (IOException e) {
            throw noFile(hash.hex());
        }
    }

    private static Path existing(String path) throws ProblemException {
        try {
            Path file = Path.of(path);
            if (Files.isRegularFile(file)) {
                return file;
            }
        } catch (InvalidPathException e) {
            throw noFile(path);
        }
        throw noFile(path);
    }

    private static ProblemException noFile(String path) {
        return new ProblemException(new Problem(
                "form.no-file",
                "There is no file " + path + ".",
                "",
                "Choose it again with F4. Nothing has been stored."));
    }

    // ---- where problems belong

    private List<Problem> fields(List<Problem> problems) {
        FieldOfProblem fields = new FieldOfProblem(form);
        return problems.stream().map(fields::placed).toList();
    }

    // ---- what others are called

    private Map<String, String> titles(List<String> references) {
        Map<String, String> titles = new TreeMap<>();
        for (String reference : references) {
            title(reference).ifPresent(title -> titles.put(reference, title));
        }
        return titles;
    }

    private Optional<String> title(String reference) {
        try {
            Hash found = archive.find(reference);
            String words = archive.record(found)
                    .map(record -> Names.title(archive, record).text())
                    .orElse("");
            return Optional.of(reference.matches("[0-9a-f]{64}") ? Names.named(archive, found) : words);
        } catch (ProblemException e) {
            return Optional.empty(); // said at its field when the whole document is examined
        }
    }

    private List<Caution> cautions(DraftView record) {
        List<Caution> cautions = new ArrayList<>();
        for (FlatTable table : kind.tables(record, NONE)) {
            if (table.name().equals("cautions")) {
                table.rows()
                        .forEach(row -> cautions.add(new Caution(
                                row.get(0).map(Object::toString).orElse(""),
                                row.get(1).map(Object::toString).orElse(""))));
            }
        }
        return cautions;
    }
}
