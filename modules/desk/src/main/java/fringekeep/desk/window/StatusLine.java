package fringekeep.desk.window;

import java.awt.Dimension;
import javax.swing.JComponent;
import javax.swing.JPanel;

/** Stands where the platform would show its status line; the desk has its own. */
public final class StatusLine {
    private StatusLine() {}

    /** Made by the platform for its frame: takes no room. */
    public static JComponent create() {
        JPanel nothing = new JPanel(null);
        nothing.setPreferredSize(new Dimension(0, 0));
        return nothing;
    }
}
