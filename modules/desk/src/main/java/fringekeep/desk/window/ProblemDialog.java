package fringekeep.desk.window;

import fringekeep.archive.problem.Problem;
import fringekeep.desk.look.Ink;
import fringekeep.desk.look.Texts;
import fringekeep.desk.look.Type;
import fringekeep.desk.part.WordButton;
import java.awt.BorderLayout;
import java.awt.Color;
import java.awt.Dialog;
import java.awt.Dimension;
import java.awt.FlowLayout;
import java.awt.Window;
import java.util.List;
import javax.swing.BorderFactory;
import javax.swing.JComponent;
import javax.swing.JDialog;
import javax.swing.JPanel;
import javax.swing.JScrollPane;
import javax.swing.JTextArea;
import javax.swing.KeyStroke;

/** Says what could not be done: what happened, where, how to mend it. */
final class ProblemDialog {
    private static final Texts TEXTS = new Texts("fringekeep.desk.window.Texts", ProblemDialog.class);

    private ProblemDialog() {}

    /** Shows problems over a window; does not block it. */
    static void show(Window owner, String title, List<Problem> problems) {
        JDialog dialog = new JDialog(owner, title, Dialog.ModalityType.MODELESS);
        JTextArea text = new JTextArea(words(problems));
        text.setEditable(false);
        text.setLineWrap(true);
        text.setWrapStyleWord(true);
        text.setFont(Type.BODY);
        text.setBackground(Ink.SHEET.color());
        text.setForeground(Ink.INK.color());
        text.setBorder(BorderFactory.createEmptyBorder(12, 16, 12, 16));
        JScrollPane scroll = new JScrollPane(text);
        scroll.setPreferredSize(new Dimension(620, Math.min(420, 90 + 80 * problems.size())));
        WordButton close = new WordButton(TEXTS.of("trouble.close"), 'C', true);
        close.addActionListener(event -> dialog.dispose());
        JPanel foot = new JPanel(new FlowLayout(FlowLayout.RIGHT, 16, 10));
        Color sheet = Ink.SHEET.color();
        foot.setBackground(sheet);
        foot.add(close);
        dialog.add(scroll, BorderLayout.CENTER);
        dialog.add(foot, BorderLayout.SOUTH);
        PersonSheet.giveBack(dialog, owner);
        dialog.getRootPane().setDefaultButton(close);
        dialog.getRootPane()
                .registerKeyboardAction(
                        event -> dialog.dispose(), KeyStroke.getKeyStroke("ESCAPE"), JComponent.WHEN_IN_FOCUSED_WINDOW);
        dialog.pack();
        dialog.setLocationRelativeTo(owner);
        dialog.setVisible(true);
    }

    static String words(List<Problem> problems) {
        StringBuilder words = new StringBuilder();
        for (Problem problem : problems) {
            words.append(problem.what()).append('\n');
            if (!problem.where().isEmpty()) {
                words.append(problem.where()).append('\n');
            }
            words.append(problem.mend()).append("\n\n");
        }
        return words.toString().strip();
    }
}
