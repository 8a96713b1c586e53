package fringekeep.desk.pane;

import fringekeep.archive.record.Hash;
import fringekeep.desk.pane.RecordPage.Attached;
import fringekeep.drawing.Picture;
import java.util.List;

/** What a person does with the record in hand. All methods are called on the window thread. */
public interface PaneEar {
    /** What can be done with it; asked each time one is shown. */
    List<PageAction> actions();

    /** A knot of the lineage line, or a linked record, is followed. */
    void follow(List<Hash> records);

    /** A drawing is to be saved. */
    void save(Picture picture);

    /** An attached file is to be saved. */
    void save(Attached file);

    /** An attached file is to be opened by the program the system has for it. */
    void open(Attached file);
}
