package fringekeep.desk.window;

import fringekeep.archive.Person;
import fringekeep.archive.problem.Problem;
import fringekeep.drawing.Picture;
import java.nio.file.Path;
import java.util.List;
import java.util.Optional;
import java.util.function.Consumer;

/** What a desk asks of the window around it. */
interface DeskHost {
    /** A person wants to open an archive. */
    void chooseArchive();

    /** A person founds an archive. */
    void foundArchive(FoundingPane.Answers answers);

    /** A person wants to try the invented laboratory. */
    void tryInvented();

    /** A drawing is to be saved. */
    void save(Picture picture);

    /** Asks for files to read; empty when none were chosen. */
    List<Path> chooseFiles(String title);

    /** Asks for a folder. */
    Optional<Path> chooseFolder(String title);

    /** Asks for a file to write. */
    Optional<Path> chooseToSave(String title, String suggested);

    /** Asks who is at the desk and passes on a name. */
    void askPerson(List<Person> persons, Consumer<String> then);

    /** Something could not be done. */
    void trouble(List<Problem> problems);
}
