package fringekeep.desk.stage;

import java.util.List;
import javax.swing.JComponent;

/** A sheet that stands below the strip in place of list and record. All methods are called on the window thread. */
public interface DeskSheet {
    /** What tests and accessibility call it, such as {@code form}. */
    String name();

    /** What is painted; fills the room between strip and foot, ground {@code sheet}. */
    JComponent component();

    /** Gives the focus to what a person uses first. */
    void focusFirst();

    /** What F6 walks through after the strip. */
    default List<Runnable> panes() {
        return List.of(this::focusFirst);
    }

    /** Words for the left of the status line: the keys that matter here. */
    default List<String> hints() {
        return List.of();
    }

    /** Something was recorded; the register is new. */
    default void recorded() {}

    /**
     * Esc was pressed.
     *
     * @return whether the sheet did something about it (closed a small thing of its own); if not, it is left
     */
    default boolean escape() {
        return false;
    }

    /** The sheet is no longer shown: time to stop its jobs. What was typed must be kept as a draft by now. */
    default void left() {}
}
