package fringekeep.desk.stage;

import fringekeep.archive.Archive;
import fringekeep.archive.problem.Problem;
import fringekeep.archive.record.Hash;
import fringekeep.archive.record.PersonId;
import fringekeep.desk.run.Job;
import fringekeep.desk.session.Register;
import fringekeep.drawing.Picture;
import java.nio.file.Path;
import java.util.List;
import java.util.Optional;
import java.util.function.Consumer;

/** The desk as the windows of a stage see it. To be used on the window thread. */
public interface DeskHand {
    /** The open archive. Actions and sheets are only asked while one is open. */
    Archive archive();

    /** Which records there are, and the graph, at the watermark last read. */
    Register register();

    /** What is selected. */
    DeskSelection selection();

    /** The kind whose list is open, also while the list is empty. */
    default Optional<String> openKind() {
        return selection().kind();
    }

    /**
     * Runs a job away from the window thread, with progress at the foot of the window. A newer job for the same place stops
     * the older one. Problems are shown under the strip.
     */
    <T> void run(String place, Job<T> job, Consumer<T> done);

    /** The same with an ear for problems of one's own. */
    <T> void run(String place, Job<T> job, Consumer<T> done, Consumer<List<Problem>> failed);

    /** Asks the job of a place to stop; what it has recorded by then stays. */
    void stop(String place);

    /** Shows a sheet below the strip, in place of list and record; going back or Esc leaves it. */
    void show(DeskSheet sheet);

    /** Leaves the sheet that is shown. */
    void back();

    /** Opens a record: its stop, its list, its pane. */
    void open(Hash record);

    /** Lists just these records of a kind. */
    void list(String kind, List<Hash> records, String words);

    /** Says what could not be done and how to mend it, as a line under the strip; an empty list clears it. */
    void say(List<Problem> problems);

    /** Says in the status line what was done, such as {@code recorded: setup 14}. */
    void done(String words);

    /**
     * The person at the desk, whose name stands with what is recorded; asks once per archive who it is.
     *
     * @param then called on the window thread unless the question is left unanswered
     */
    void person(Consumer<PersonId> then);

    /** What people call the person at the desk; empty when nobody was named yet. */
    Optional<String> personName();

    /** Asks for files to read. */
    List<Path> chooseFiles(String title);

    /** Asks for a folder. */
    Optional<Path> chooseFolder(String title);

    /** Asks for a file to write. */
    Optional<Path> chooseToSave(String title, String suggested);

    /** Asks where a drawing goes (SVG, PDF, PNG, CSV) and writes it. */
    void save(Picture picture);

    /** A choice kept beyond this run, such as a width; harmless when lost. */
    Optional<String> remembered(String name);

    /** Keeps a choice. */
    void remember(String name, String value);
}
