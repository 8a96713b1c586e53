package fringekeep.bundle.ui;

import fringekeep.archive.problem.Problem;
import fringekeep.bundle.BundleReport;
import fringekeep.bundle.Level;
import fringekeep.desk.look.Ink;
import fringekeep.desk.look.Mark;
import fringekeep.desk.look.Texts;
import fringekeep.desk.look.Type;
import fringekeep.desk.part.RuledTable;
import fringekeep.desk.part.RuledTable.Cell;
import fringekeep.desk.part.RuledTable.Col;
import fringekeep.desk.part.WordButton;
import fringekeep.desk.part.WordLines;
import fringekeep.desk.part.WordLines.Sentence;
import fringekeep.drawing.NumberText;
import java.awt.BorderLayout;
import java.awt.Dimension;
import java.awt.FlowLayout;
import java.awt.event.ActionEvent;
import java.util.ArrayList;
import java.util.List;
import java.util.Locale;
import javax.swing.AbstractAction;
import javax.swing.BorderFactory;
import javax.swing.JComponent;
import javax.swing.JLabel;
import javax.swing.JPanel;
import javax.swing.JScrollPane;
import javax.swing.KeyStroke;

/** What the sheet for checking looks like: levels above, faults below, each with what, where and what to do. */
@SuppressWarnings("serial")
final class CheckPane extends JPanel {
    private static final Texts TEXTS = new Texts("fringekeep.bundle.ui.Texts", CheckPane.class);

    private final JLabel title = new JLabel(TEXTS.of("checking.title"));
    private final WordLines place = new WordLines("bundle place");
    private final RuledTable levels = new RuledTable("levels", TEXTS.of("checks"), CheckLine.columns());
    private final WordLines verdict = new WordLines("verdict");
    private final RuledTable faults = new RuledTable(
            "faults",
            TEXTS.of("checking.faults"),
            List.of(
                    new Col(TEXTS.of("checking.where"), 560, false, false),
                    new Col(TEXTS.of("checking.what"), 460, false, true)));
    private final WordLines mend = new WordLines("mend");
    private final WordButton file = WordButton.low(TEXTS.of("checking.file"), 'Z', false);
    private final WordButton folder = WordButton.low(TEXTS.of("checking.folder"), 'F', false);
    private final WordButton again = WordButton.low(TEXTS.of("checking.again"), 'G', true);
    private final WordButton stop = WordButton.low(TEXTS.of("checking.stop"), 'S', false);
    private transient List<Problem> problems = List.of();

    CheckPane(Runnable chooseFile, Runnable chooseFolder, Runnable checkAgain, Runnable stopIt) {
        super(new BorderLayout());
        setName("check bundle");
        name(file, "choose zip", chooseFile);
        name(folder, "choose folder", chooseFolder);
        name(again, "check again", checkAgain);
        name(stop, "stop", stopIt);
        stop.setVisible(false);
        again.setEnabled(false);
        faults.whenEmpty(TEXTS.of("checking.none"));
        faults.getSelectionModel().addListSelectionListener(event -> mend());
        add(head(), BorderLayout.NORTH);
        add(middle(), BorderLayout.CENTER);
        key("F5", checkAgain);
        key("Z", chooseFile);
        key("F", chooseFolder);
        updateColours();
    }

    private static void name(WordButton button, String name, Runnable work) {
        button.setName(name);
        button.addActionListener(event -> work.run());
    }

    private void key(String stroke, Runnable work) {
        getInputMap(WHEN_ANCESTOR_OF_FOCUSED_COMPONENT).put(KeyStroke.getKeyStroke(stroke), stroke);
        getActionMap().put(stroke, new AbstractAction() {
            @Override
            public void actionPerformed(ActionEvent event) {
                work.run();
            }
        });
    }

    private JPanel head() {
        JPanel head = clear(new BorderLayout(14, 0));
        head.setBorder(BorderFactory.createEmptyBorder(14, 16, 10, 16));
        title.setFont(Type.TITLE);
        head.add(title, BorderLayout.WEST);
        JPanel lowered = clear(new BorderLayout());
        lowered.setBorder(BorderFactory.createEmptyBorder(7, 0, 0, 0));
        lowered.add(place, BorderLayout.CENTER);
        head.add(lowered, BorderLayout.CENTER);
        JPanel buttons = clear(new FlowLayout(FlowLayout.RIGHT, 8, 0));
        for (JComponent one : List.of(file, folder, stop, again)) {
            buttons.add(one);
        }
        head.add(buttons, BorderLayout.EAST);
        return head;
    }

    private JPanel middle() {
        JPanel middle = clear(new BorderLayout(0, 10));
        JScrollPane scroll = levels.inScroll();
        scroll.setPreferredSize(new Dimension(600, 24 + 4 * 22 + 2));
        JPanel top = clear(new BorderLayout(0, 10));
        top.add(scroll, BorderLayout.NORTH);
        JPanel said = clear(new BorderLayout());
        said.setBorder(BorderFactory.createEmptyBorder(0, 16, 4, 16));
        said.add(verdict, BorderLayout.CENTER);
        top.add(said, BorderLayout.CENTER);
        middle.add(top, BorderLayout.NORTH);
        middle.add(faults.inScroll(), BorderLayout.CENTER);
        JPanel foot = clear(new BorderLayout());
        foot.setBorder(BorderFactory.createEmptyBorder(4, 16, 10, 16));
        foot.setPreferredSize(new Dimension(600, 72));
        foot.add(mend, BorderLayout.CENTER);
        middle.add(foot, BorderLayout.SOUTH);
        return middle;
    }

    private static JPanel clear(java.awt.LayoutManager layout) {
        JPanel panel = new JPanel(layout);
        panel.setOpaque(false);
        return panel;
    }

    /** Shows which bundle it is, and whether it is being checked. */
    void running(String bundle, boolean runs) {
        place.show(List.of(Sentence.second(bundle.isEmpty() ? TEXTS.of("checking.none") : bundle)));
        stop.setVisible(runs);
        again.setVisible(!runs);
        again.setEnabled(!bundle.isEmpty());
        file.setEnabled(!runs);
        folder.setEnabled(!runs);
        if (runs) {
            faults(List.of(), TEXTS.of("checking.running"));
            verdict.show(List.of());
        }
    }

    /** Shows the levels. */
    void levels(List<CheckLine> lines) {
        levels.show(lines.stream().map(CheckLine::cells).toList());
    }

    /** Shows what came of it. */
    void report(BundleReport report) {
        List<Sentence> said = new ArrayList<>();
        String key = "checking.level." + report.level().name().toLowerCase(Locale.ROOT);
        said.add(
                report.level() == Level.NONE
                        ? Sentence.marked(Mark.DIFFERENT, TEXTS.of("checking.nothing"))
                        : report.level() == Level.RECOMPUTED
                                ? Sentence.marked(Mark.SAME, TEXTS.of("checking.holds.most"))
                                : Sentence.marked(Mark.NEAR, TEXTS.of("checking.holds", TEXTS.of(key))));
        List<String> counts = new ArrayList<>();
        if (report.records() > 0) {
            counts.add(TEXTS.of("checking.records", NumberText.count(report.records())));
        }
        report.recomputed()
                .forEach((words, number) ->
                        counts.add(TEXTS.of("checking.recomputed", NumberText.count(number), words)));
        if (!counts.isEmpty()) {
            said.add(Sentence.second(String.join(", ", counts)));
        }
        report.notes().stream().limit(3).forEach(note -> said.add(Sentence.second(note)));
        verdict.show(said);
        faults(report.allFaults(), TEXTS.of("checking.no-faults"));
    }

    /** Shows that it could not be checked, or was stopped. */
    void ended(String words, List<Problem> wrong) {
        verdict.show(words.isEmpty() ? List.of() : List.of(Sentence.of(words)));
        faults(wrong, TEXTS.of("checking.none"));
    }

    private void faults(List<Problem> next, String whenNone) {
        problems = List.copyOf(next);
        faults.whenEmpty(whenNone);
        faults.show(next.stream()
                .map(problem -> List.of(Cell.of(Mark.DIFFERENT, problem.where()), Cell.of(words(problem))))
                .toList());
        if (!next.isEmpty()) {
            faults.setRowSelectionInterval(0, 0);
        }
        mend();
        revalidate();
    }

    private void mend() {
        int row = faults.getSelectedRow();
        if (row < 0 || row >= problems.size()) {
            mend.show(List.of());
            return;
        }
        Problem problem = problems.get(row);
        String place = problem.where().isEmpty() || problem.what().startsWith(problem.where())
                ? problem.what()
                : problem.where() + ": " + problem.what();
        mend.show(List.of(Sentence.of(place), Sentence.second(problem.mend())));
    }

    /** What happened, without the place where it is named beside. */
    private static String words(Problem problem) {
        boolean twice = !problem.where().isEmpty() && problem.what().startsWith(problem.where() + " ");
        return twice ? problem.what().substring(problem.where().length() + 1) : problem.what();
    }

    void focusFirst() {
        (problems.isEmpty() ? levels : faults).requestFocusInWindow();
    }

    // ---- for tests

    String verdictShown() {
        return verdict.words();
    }

    String mendShown() {
        return mend.words();
    }

    int faultsShown() {
        return problems.size();
    }

    @Override
    public void updateUI() {
        super.updateUI();
        if (title != null) {
            updateColours();
        }
    }

    private void updateColours() {
        setBackground(Ink.SHEET.color());
        title.setForeground(Ink.INK.color());
    }
}
