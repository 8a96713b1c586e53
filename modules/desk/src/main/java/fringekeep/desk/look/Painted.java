package fringekeep.desk.look;

import javax.accessibility.AccessibleContext;
import javax.accessibility.AccessibleRole;
import javax.swing.JComponent;

/** A component that paints itself and can be read out: its accessible name and description say what is painted. */
@SuppressWarnings("serial")
public abstract class Painted extends JComponent {
    /** Role told to those who read the screen out. */
    protected AccessibleRole role() {
        return AccessibleRole.CANVAS;
    }

    @Override
    public AccessibleContext getAccessibleContext() {
        if (accessibleContext == null) {
            accessibleContext = new AccessibleJComponent() {
                @Override
                public AccessibleRole getAccessibleRole() {
                    return role();
                }
            };
        }
        return accessibleContext;
    }
}
