package fringekeep.desk.window;

import fringekeep.desk.look.Ink;
import fringekeep.desk.look.Texts;
import fringekeep.desk.look.Type;
import fringekeep.desk.part.WordButton;
import java.awt.Dialog;
import java.awt.GridBagConstraints;
import java.awt.GridBagLayout;
import java.awt.Insets;
import java.awt.Window;
import java.nio.file.Path;
import java.time.ZoneId;
import java.util.function.Consumer;
import javax.swing.BorderFactory;
import javax.swing.JButton;
import javax.swing.JDialog;
import javax.swing.JFileChooser;
import javax.swing.JLabel;
import javax.swing.JPanel;
import javax.swing.JTextField;

/** Asks what a lab says when it founds its archive. */
final class FoundingSheet {
    private static final Texts TEXTS = new Texts("fringekeep.desk.window.Texts", FoundingSheet.class);

    private final JTextField title = new JTextField(28);
    private final JTextField boundary = new JTextField("06:00", 8);
    private final JTextField zone = new JTextField(ZoneId.systemDefault().getId(), 20);
    private final JTextField folder = new JTextField(28);

    /** What was asked. */
    record Answers(String title, String dayBoundary, String zone, Path folder) {}

    void ask(Window owner, Consumer<Answers> found) {
        JDialog dialog = new JDialog(owner, TEXTS.of("found.title"), Dialog.ModalityType.MODELESS);
        JPanel form = new JPanel(new GridBagLayout());
        form.setBorder(BorderFactory.createEmptyBorder(16, 16, 16, 16));
        form.setBackground(Ink.SHEET.color());
        JButton choose = new JButton(TEXTS.of("found.choose"));
        choose.addActionListener(event -> chooseFolder(dialog));
        row(form, 0, TEXTS.of("found.name"), title);
        row(form, 1, TEXTS.of("found.boundary"), boundary);
        row(form, 2, TEXTS.of("found.zone"), zone);
        row(form, 3, TEXTS.of("found.folder"), folder);
        form.add(
                choose,
                new GridBagConstraints(2, 3, 1, 1, 0, 0, GridBagConstraints.WEST, 0, new Insets(4, 8, 4, 0), 0, 0));
        WordButton press = new WordButton(TEXTS.of("found.do"), 'F', true);
        press.addActionListener(event -> {
            found.accept(new Answers(title.getText(), boundary.getText(), zone.getText(), Path.of(folder.getText())));
            dialog.dispose();
        });
        form.add(
                press,
                new GridBagConstraints(1, 4, 1, 1, 0, 0, GridBagConstraints.WEST, 0, new Insets(16, 8, 0, 0), 0, 0));
        dialog.add(form);
        dialog.getRootPane().setDefaultButton(press);
        dialog.pack();
        dialog.setLocationRelativeTo(owner);
        dialog.setVisible(true);
    }

    private static void row(JPanel form, int y, String words, JTextField field) {
        JLabel label = new JLabel(words);
        label.setFont(Type.BODY);
        label.setLabelFor(field);
        field.setFont(Type.BODY);
        form.add(
                label,
                new GridBagConstraints(0, y, 1, 1, 0, 0, GridBagConstraints.EAST, 0, new Insets(4, 0, 4, 0), 0, 0));
        form.add(
                field,
                new GridBagConstraints(1, y, 1, 1, 1, 0, GridBagConstraints.WEST, 0, new Insets(4, 8, 4, 0), 0, 0));
    }

    private void chooseFolder(JDialog owner) {
        JFileChooser chooser = new JFileChooser();
        chooser.setFileSelectionMode(JFileChooser.DIRECTORIES_ONLY);
        if (chooser.showSaveDialog(owner) == JFileChooser.APPROVE_OPTION) {
            folder.setText(chooser.getSelectedFile().getPath());
        }
    }
}
