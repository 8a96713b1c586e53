package fringekeep.desk.window;

import fringekeep.archive.Person;
import fringekeep.desk.look.Ink;
import fringekeep.desk.look.Texts;
import fringekeep.desk.look.Type;
import fringekeep.desk.part.WordButton;
import java.awt.Component;
import java.awt.Dialog;
import java.awt.GridBagConstraints;
import java.awt.GridBagLayout;
import java.awt.Insets;
import java.awt.KeyboardFocusManager;
import java.awt.Window;
import java.awt.event.WindowAdapter;
import java.awt.event.WindowEvent;
import java.util.List;
import java.util.Optional;
import java.util.function.Consumer;
import javax.swing.BorderFactory;
import javax.swing.JComboBox;
import javax.swing.JComponent;
import javax.swing.JDialog;
import javax.swing.JLabel;
import javax.swing.JPanel;
import javax.swing.KeyStroke;

/** Asks who is at the desk: one of those known, or a new name typed. */
final class PersonSheet {
    private static final Texts TEXTS = new Texts("fringekeep.desk.window.Texts", PersonSheet.class);

    private PersonSheet() {}

    static void ask(Window owner, List<Person> persons, Consumer<String> then) {
        JDialog dialog = new JDialog(owner, TEXTS.of("person.title"), Dialog.ModalityType.MODELESS);
        JComboBox<String> names = new JComboBox<>(persons.stream()
                .map(Person::name)
                .flatMap(Optional::stream)
                .sorted()
                .toArray(String[]::new));
        names.setEditable(true);
        names.setFont(Type.BODY);
        names.setName("person");
        names.getAccessibleContext().setAccessibleName(TEXTS.of("person.name"));
        WordButton press = new WordButton(TEXTS.of("person.do"), 'S', true);
        press.addActionListener(event -> {
            String name = String.valueOf(names.getEditor().getItem()).strip();
            if (!name.isEmpty()) {
                dialog.dispose();
                then.accept(name);
            }
        });
        dialog.add(form(names, press));
        giveBack(dialog, owner);
        dialog.getRootPane()
                .registerKeyboardAction(
                        event -> dialog.dispose(), KeyStroke.getKeyStroke("ESCAPE"), JComponent.WHEN_IN_FOCUSED_WINDOW);
        dialog.getRootPane().setDefaultButton(press);
        dialog.pack();
        dialog.setLocationRelativeTo(owner);
        dialog.setVisible(true);
        names.getEditor().getEditorComponent().requestFocusInWindow();
    }

    /** What had the focus before gets it back, also where no window manager sees to that. */
    static void giveBack(JDialog dialog, Window owner) {
        Component before = KeyboardFocusManager.getCurrentKeyboardFocusManager().getFocusOwner();
        dialog.addWindowListener(new WindowAdapter() {
            @Override
            public void windowClosed(WindowEvent event) {
                owner.toFront();
                owner.requestFocus();
                if (before != null && before.isShowing()) {
                    before.requestFocusInWindow();
                }
            }
        });
    }

    private static JPanel form(JComboBox<String> names, WordButton press) {
        JPanel form = new JPanel(new GridBagLayout());
        form.setBorder(BorderFactory.createEmptyBorder(16, 16, 16, 16));
        form.setBackground(Ink.SHEET.color());
        JLabel words = new JLabel(TEXTS.of("person.words"));
        words.setFont(Type.BODY);
        form.add(words, place(0, 0));
        form.add(names, place(1, 8));
        form.add(press, place(2, 16));
        return form;
    }

    private static GridBagConstraints place(int y, int above) {
        return new GridBagConstraints(
                0,
                y,
                1,
                1,
                1,
                0,
                GridBagConstraints.WEST,
                y == 1 ? GridBagConstraints.HORIZONTAL : GridBagConstraints.NONE,
                new Insets(above, 0, 0, 0),
                0,
                0);
    }
}
