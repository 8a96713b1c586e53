package fringekeep.commandline;

import fringekeep.archive.Archive;
import fringekeep.archive.Archives;
import fringekeep.archive.Circumstances;
import fringekeep.archive.Person;
import fringekeep.archive.kind.Kinds;
import fringekeep.archive.problem.Problem;
import fringekeep.archive.problem.ProblemException;
import fringekeep.archive.record.Hash;
import fringekeep.archive.record.PersonId;
import java.nio.file.Path;
import java.util.ArrayList;
import java.util.List;
import java.util.Optional;
import org.jspecify.annotations.Nullable;

/** What one command works with: its archive, its console and the kinds of this program. */
final class Session implements AutoCloseable {
    private static final String VARIABLE = "FRINGEKEEP_ARCHIVE";

    private final Archive archive;

    private Session(Archive archive) {
        this.archive = archive;
    }

    /** The kinds of this program. */
    static Kinds kinds() {
        return Kinds.announced(Session.class.getClassLoader());
    }

    /** The real clock, generator and zone. */
    static Circumstances circumstances() {
        return Circumstances.real(Main.VERSION);
    }

    /**
     * Opens the archive named, or that of the environment.
     *
     * @throws ProblemException if none is named or it cannot be opened
     */
    static Session open(@Nullable Path named) throws ProblemException {
        return new Session(Archives.open(folder(named), kinds(), circumstances()));
    }

    /** The folder named, or that of the environment. */
    static Path folder(@Nullable Path named) throws ProblemException {
        Optional<Path> folder = Optional.ofNullable(named)
                .or(() -> Optional.ofNullable(System.getenv(VARIABLE)).map(Path::of));
        return folder.orElseThrow(() -> new ProblemException(new Problem(
                "command.no-archive",
                "No archive is named.",
                "",
                "Give --archive FOLDER, or set " + VARIABLE + "; found one with: fringekeep-headless found FOLDER.")));
    }

    Archive archive() {
        return archive;
    }

    /** The records that people named. */
    List<Hash> find(List<String> references) throws ProblemException {
        List<Hash> found = new ArrayList<>();
        for (String reference : references) {
            found.add(archive.find(reference));
        }
        return List.copyOf(found);
    }

    /**
     * A person by name or id; nobody when none is named.
     *
     * @throws ProblemException if nobody is called so
     */
    Optional<PersonId> person(@Nullable String named) throws ProblemException {
        if (named == null) {
            return Optional.empty();
        }
        for (Person person : archive.persons()) {
            if (person.id().hex().equals(named) || person.name().equals(Optional.of(named))) {
                return Optional.of(person.id());
            }
        }
        throw new ProblemException(new Problem(
                "command.person",
                "Nobody is called \"" + named + "\".",
                "",
                "Name one of: "
                        + String.join(
                                ", ",
                                archive.persons().stream()
                                        .flatMap(person -> person.name().stream())
                                        .toList())
                        + "; or add a person with: fringekeep-headless person --add NAME. Nothing has been stored."));
    }

    /** Somebody of this archive, for what is worked out and never recorded. */
    Optional<PersonId> anyPerson() {
        return archive.persons().stream().map(Person::id).findFirst();
    }

    @Override
    public void close() {
        archive.close();
    }
}
