package fringekeep.desk.window;

import java.awt.KeyboardFocusManager;
import java.awt.event.ActionEvent;
import javax.swing.AbstractAction;
import javax.swing.JComponent;
import javax.swing.KeyStroke;
import javax.swing.text.JTextComponent;

/** The keys that work everywhere on the desk. Single letters act only outside text fields. */
final class DeskKeys {
    private final Desk desk;

    DeskKeys(Desk desk) {
        this.desk = desk;
    }

    void bind() {
        for (int i = 0; i < 10; i++) {
            int stop = i;
            key("alt " + (i + 1) % 10, () -> {
                desk.openStop(stop);
                desk.listPane().focusRows();
            });
        }
        key("ctrl F", desk::focusFind);
        key("F6", () -> desk.nextPane(1));
        key("shift F6", () -> desk.nextPane(-1));
        key("F1", desk::keys);
        key("ctrl PERIOD", desk::stopWork);
        key("ESCAPE", desk::focusRows);
        for (String stroke : desk.stages().strokes()) {
            Runnable work =
                    () -> desk.stages().forStroke(stroke, desk.selection()).ifPresent(desk::doIt);
            key(stroke, stroke.length() == 1 ? outsideText(work) : work);
        }
        key("T", outsideText(desk::trace));
        key("BACK_SPACE", outsideText(desk::back));
    }

    private static Runnable outsideText(Runnable work) {
        return () -> {
            boolean text =
                    KeyboardFocusManager.getCurrentKeyboardFocusManager().getFocusOwner() instanceof JTextComponent;
            if (!text) {
                work.run();
            }
        };
    }

    private void key(String stroke, Runnable work) {
        desk.getInputMap(JComponent.WHEN_ANCESTOR_OF_FOCUSED_COMPONENT).put(KeyStroke.getKeyStroke(stroke), stroke);
        desk.getInputMap(JComponent.WHEN_IN_FOCUSED_WINDOW).put(KeyStroke.getKeyStroke(stroke), stroke);
        desk.getActionMap().put(stroke, new AbstractAction() {
            @Override
            public void actionPerformed(ActionEvent event) {
                work.run();
            }
        });
    }
}
