package fringekeep.archive;

import fringekeep.archive.kind.Kinds;
import fringekeep.archive.problem.ProblemException;
import fringekeep.archive.problem.StoppedException;
import fringekeep.archive.problem.Work;
import fringekeep.archive.record.ArchiveId;
import fringekeep.archive.record.Hash;
import java.nio.file.Path;
import java.util.List;
import java.util.Optional;
import java.util.ServiceLoader;

/** Founding, opening and restoring archives. Thread-safe. */
public final class Archives {
    private Archives() {}

    /**
     * Founds an archive in a new or empty folder and opens it.
     *
     * @throws ProblemException if the folder is not empty, or is no safe place, or the founding is incomplete
     */
    public static Archive found(Path folder, Founding founding, Kinds kinds, Circumstances circumstances)
            throws ProblemException {
        return engine().found(folder, founding, kinds, circumstances);
    }

    /**
     * Opens an archive; only one program at a time can.
     *
     * @throws ProblemException if there is none, it is in use, damaged, newer than this program, or no safe place
     */
    public static Archive open(Path folder, Kinds kinds, Circumstances circumstances) throws ProblemException {
        return engine().open(folder, kinds, circumstances);
    }

    /**
     * Restores an archive from its plain copy: same id, journal and numbers. Everything is verified first.
     *
     * @param copy a folder that {@link Archive#copyTo} wrote
     * @param folder a new or empty folder
     */
    public static Archive restore(Path copy, Path folder, Kinds kinds, Circumstances circumstances, Work work)
            throws ProblemException, StoppedException {
        return engine().restore(copy, folder, kinds, circumstances, work);
    }

    /** What the folder says it is, without opening it, so also while another program has it open. */
    public static Optional<FolderHint> look(Path folder) throws ProblemException {
        return engine().look(folder);
    }

    private static ArchiveEngine engine() {
        return ServiceLoader.load(ArchiveEngine.class, Archives.class.getClassLoader())
                .findFirst()
                .orElseThrow(() -> new IllegalStateException("no archive engine is announced"));
    }

    /**
     * What a lab says when it founds its archive.
     *
     * @param title its name for it, 1 to 200 characters
     * @param dayBoundary {@code HH:MM} at which a measurement day begins
     * @param zone time-zone id of the lab
     * @param invented whether the data are invented (a demonstration)
     * @param persons who enters records; may be empty
     * @param continues the archive this one continues, if it does
     */
    public record Founding(
            String title,
            String dayBoundary,
            String zone,
            boolean invented,
            List<Person> persons,
            Optional<Continues> continues) {
        /** Copies. */
        public Founding {
            persons = List.copyOf(persons);
        }
    }

    /** State of the journal that is continued in a new archive. */
    public record Continues(ArchiveId archive, long n, Hash sha256) {}

    /**
     * What a folder says of itself.
     *
     * @param archive id, if stated
     * @param title title, if stated
     * @param copy whether it is a plain copy and not an archive
     * @param heldBy who has it open, in words; empty when nobody has
     */
    public record FolderHint(Optional<ArchiveId> archive, Optional<String> title, boolean copy, String heldBy) {}
}
