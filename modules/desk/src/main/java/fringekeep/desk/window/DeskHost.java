package fringekeep.desk.window;

import fringekeep.archive.problem.Problem;
import fringekeep.drawing.Picture;
import java.util.List;

/** What a desk asks of the window around it. */
interface DeskHost {
    /** A person wants to open an archive. */
    void chooseArchive();

    /** A person wants to found an archive. */
    void foundArchive();

    /** A drawing is to be saved. */
    void save(Picture picture);

    /** Something could not be done. */
    void trouble(List<Problem> problems);
}
