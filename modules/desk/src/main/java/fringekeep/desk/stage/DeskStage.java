package fringekeep.desk.stage;

import java.nio.file.Path;
import java.util.List;

/**
 * What one module adds to the desk. Announced with {@code @ServiceProvider(service = DeskStage.class)}; made once, on the
 * window thread, before the menus are. All methods are called on the window thread.
 */
public interface DeskStage {
    /** Things that can be done, in the order in which menus and record heads show them. */
    List<DeskAction> actions();

    /** Where its actions stand among those of other stages: those with smaller numbers come first. */
    default int order() {
        return 500;
    }

    /** Keys that work inside its sheets, for the sheet of keys: a group head, then key and words. */
    default List<KeyLine> keys() {
        return List.of();
    }

    /** An archive was opened and read: time to offer what was left unfinished. */
    default void opened(DeskHand hand) {}

    /**
     * Files were dropped on the window while an archive is open.
     *
     * @return whether this stage takes care of them
     */
    default boolean dropped(List<Path> files, DeskHand hand) {
        return false;
    }
}
