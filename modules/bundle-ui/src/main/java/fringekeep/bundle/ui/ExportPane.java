package fringekeep.bundle.ui;

import fringekeep.archive.problem.Problem;
import fringekeep.bundle.BundleReport;
import fringekeep.bundle.ExportBundle.Exported;
import fringekeep.bundle.ExportBundle.KindShare;
import fringekeep.desk.look.Ink;
import fringekeep.desk.look.Mark;
import fringekeep.desk.look.Texts;
import fringekeep.desk.look.Type;
import fringekeep.desk.part.RuledTable;
import fringekeep.desk.part.WordButton;
import fringekeep.desk.part.WordLines;
import fringekeep.desk.part.WordLines.Sentence;
import fringekeep.desk.session.Stops;
import fringekeep.drawing.NumberText;
import java.awt.BorderLayout;
import java.awt.FlowLayout;
import java.awt.Toolkit;
import java.awt.datatransfer.StringSelection;
import java.awt.event.ActionEvent;
import java.util.ArrayList;
import java.util.List;
import java.util.Optional;
import java.util.SortedMap;
import java.util.function.Supplier;
import javax.swing.AbstractAction;
import javax.swing.BorderFactory;
import javax.swing.JComponent;
import javax.swing.JLabel;
import javax.swing.JPanel;
import javax.swing.JScrollPane;
import javax.swing.JTextField;
import javax.swing.KeyStroke;
import javax.swing.ScrollPaneConstants;

/** What the sheet for exporting looks like. */
@SuppressWarnings("serial")
final class ExportPane extends JPanel {
    private static final Texts TEXTS = new Texts("fringekeep.bundle.ui.Texts", ExportPane.class);

    private final GoesIn goesIn = new GoesIn(Stops.shipped());
    private final JLabel title = new JLabel(TEXTS.of("export.title"));
    private final WordLines of = new WordLines("export of");
    private final Fields fields;
    private final JLabel checksHead = head("checks");
    private final JLabel statedHead = head("export.stated");
    private final RuledTable table = new RuledTable("checks", TEXTS.of("checks"), CheckLine.columns());
    private final WordLines words = new WordLines("export words");
    private final JTextField line = new JTextField();
    private final WordButton copy = WordButton.low(TEXTS.of("export.copy"), 'Y', false);
    private final JPanel stranger = clear(new BorderLayout(8, 0));
    private final WordButton stop = WordButton.low(TEXTS.of("export.stop"), 'S', false);
    private final WordButton export = WordButton.low(TEXTS.of("export.do"), 'E', true);
    private transient SortedMap<String, KindShare> shares = new java.util.TreeMap<>();

    ExportPane(Runnable changed, Supplier<Optional<String>> folder, Runnable doIt, Runnable stopIt) {
        super(new BorderLayout());
        setName("export");
        fields = new Fields(changed, folder);
        stop.setName("stop");
        stop.setVisible(false);
        stop.addActionListener(event -> stopIt.run());
        export.setName("export now");
        export.addActionListener(event -> doIt.run());
        line.setEditable(false);
        line.setName("stranger");
        line.setFont(Type.MONO);
        line.getAccessibleContext().setAccessibleName(TEXTS.of("export.stranger"));
        copy.setName("copy");
        copy.addActionListener(event -> Toolkit.getDefaultToolkit()
                .getSystemClipboard()
                .setContents(new StringSelection(line.getText()), null));
        stranger.add(line, BorderLayout.CENTER);
        stranger.add(copy, BorderLayout.EAST);
        stranger.setVisible(false);
        add(goesIn, BorderLayout.NORTH);
        add(new Sides(left(), right()), BorderLayout.CENTER);
        key("ctrl ENTER", doIt);
        updateColours();
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

    private static JLabel head(String key) {
        JLabel head = new JLabel(TEXTS.of(key));
        head.setFont(Type.GROUP);
        head.setBorder(BorderFactory.createEmptyBorder(0, 0, 4, 0));
        return head;
    }

    private static JPanel clear(java.awt.LayoutManager layout) {
        JPanel panel = new JPanel(layout);
        panel.setOpaque(false);
        return panel;
    }

    private JPanel left() {
        JPanel heads = clear(new BorderLayout(0, 6));
        JPanel first = clear(new BorderLayout(14, 0));
        title.setFont(Type.TITLE);
        first.add(title, BorderLayout.WEST);
        JPanel lowered = clear(new BorderLayout());
        lowered.setBorder(BorderFactory.createEmptyBorder(7, 0, 0, 0));
        lowered.add(of, BorderLayout.CENTER);
        first.add(lowered, BorderLayout.CENTER);
        heads.add(first, BorderLayout.NORTH);
        heads.add(statedHead, BorderLayout.SOUTH);
        JScrollPane scroll = new JScrollPane(fields);
        scroll.setBorder(BorderFactory.createEmptyBorder());
        scroll.setOpaque(false);
        scroll.getViewport().setOpaque(false);
        scroll.setHorizontalScrollBarPolicy(ScrollPaneConstants.HORIZONTAL_SCROLLBAR_NEVER);
        JPanel left = clear(new BorderLayout());
        left.setBorder(BorderFactory.createEmptyBorder(14, 16, 8, 20));
        left.add(heads, BorderLayout.NORTH);
        left.add(scroll, BorderLayout.CENTER);
        return left;
    }

    private JPanel right() {
        JPanel right = clear(new BorderLayout());
        right.setBorder(BorderFactory.createEmptyBorder(22, 0, 8, 0));
        JPanel top = clear(new BorderLayout());
        checksHead.setBorder(BorderFactory.createEmptyBorder(0, 16, 4, 0));
        top.add(checksHead, BorderLayout.NORTH);
        JScrollPane scroll = table.inScroll();
        scroll.setPreferredSize(new java.awt.Dimension(400, 24 + 8 * 22 + 2));
        top.add(scroll, BorderLayout.CENTER);
        right.add(top, BorderLayout.NORTH);
        JPanel below = clear(new BorderLayout(0, 10));
        below.setBorder(BorderFactory.createEmptyBorder(12, 16, 0, 16));
        JPanel said = clear(new BorderLayout(0, 6));
        said.add(words, BorderLayout.NORTH);
        JPanel held = clear(new BorderLayout());
        held.add(stranger, BorderLayout.NORTH);
        said.add(held, BorderLayout.CENTER);
        JPanel buttons = clear(new FlowLayout(FlowLayout.RIGHT, 8, 0));
        buttons.add(stop);
        buttons.add(export);
        JPanel flow = clear(new BorderLayout(0, 14));
        flow.add(said, BorderLayout.NORTH);
        JPanel acts = clear(new BorderLayout());
        acts.add(buttons, BorderLayout.NORTH);
        flow.add(acts, BorderLayout.CENTER);
        below.add(flow, BorderLayout.CENTER);
        right.add(below, BorderLayout.CENTER);
        return right;
    }

    Fields fields() {
        return fields;
    }

    /** Shows what goes in. */
    void goesIn(SortedMap<String, KindShare> next, String root) {
        shares = next;
        goesIn.show(next);
        of.show(List.of(Sentence.second(TEXTS.of("export.of", root))));
    }

    /** Shows the checks. */
    void checks(List<CheckLine> lines) {
        table.show(lines.stream().map(CheckLine::cells).toList());
    }

    /** Before the export: what is to be mended, what is to be known. */
    void ready(int faults) {
        List<Sentence> said = new ArrayList<>();
        if (faults > 0) {
            said.add(Sentence.marked(
                    Mark.QUESTION, faults == 1 ? TEXTS.of("export.fault") : TEXTS.of("export.faults", faults)));
        }
        int outdated = shares.values().stream().mapToInt(KindShare::outdated).sum();
        if (outdated > 0) {
            said.add(Sentence.marked(
                    Mark.RING,
                    outdated == 1
                            ? TEXTS.of("export.outdated.word")
                            : TEXTS.of("export.outdated.words", NumberText.count(outdated))));
        }
        said.add(Sentence.second(TEXTS.of("export.waits")));
        words.show(said);
        stranger.setVisible(false);
        export.setEnabled(faults == 0);
    }

    /** While it is written. */
    void running(boolean runs, String name) {
        fields.running(runs);
        stop.setVisible(runs);
        export.setVisible(!runs);
        if (runs) {
            stranger.setVisible(false);
            words.show(
                    List.of(Sentence.of(TEXTS.of("export.running", name)), Sentence.second(TEXTS.of("export.waits"))));
        }
        revalidate();
    }

    /** After it was written. */
    void done(Exported exported, BundleReport report, String line, boolean zip) {
        List<Sentence> said = new ArrayList<>();
        said.add(Sentence.marked(
                Mark.SAME,
                TEXTS.of(
                        report.allFaults().isEmpty() ? "export.done" : "export.done.most",
                        exported.place(),
                        NumberText.count(exported.records()),
                        NumberText.count(exported.rawFiles()))));
        report.allFaults().stream()
                .limit(2)
                .forEach(fault -> said.add(Sentence.marked(Mark.RING, fault.what() + "  " + fault.where())));
        if (exported.absent() > 0) {
            said.add(Sentence.second(TEXTS.of("export.absent", exported.absent())));
        }
        said.add(Sentence.second(
                TEXTS.of("export.stranger") + (zip ? " (" + TEXTS.of("export.stranger.zip") + ")" : "") + ":"));
        words.show(said);
        this.line.setText(line);
        this.line.setCaretPosition(0);
        stranger.setVisible(true);
        revalidate();
    }

    /** After it was stopped or refused. */
    void ended(String what, List<Problem> problems) {
        List<Sentence> said = new ArrayList<>();
        said.add(Sentence.of(what));
        for (Problem problem : problems.subList(0, Math.min(3, problems.size()))) {
            said.add(Sentence.marked(Mark.DIFFERENT, problem.what() + "  " + problem.where()));
            said.add(Sentence.second(problem.mend()));
        }
        words.show(said);
        stranger.setVisible(false);
        revalidate();
    }

    void focusChecks() {
        table.requestFocusInWindow();
    }

    // ---- for tests

    String wordsShown() {
        return words.words();
    }

    String strangersLine() {
        return line.getText();
    }

    boolean canExport() {
        return export.isEnabled() && export.isVisible();
    }

    GoesIn goesIn() {
        return goesIn;
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
        for (JLabel label : List.of(title, checksHead, statedHead)) {
            label.setForeground(Ink.INK.color());
        }
        line.setBackground(Ink.SHEET.color());
    }

    /** Two halves with a hairline between; on wide windows neither grows beyond what is read at ease. */
    private static final class Sides extends JPanel {
        private final JComponent left;
        private final JComponent right;

        Sides(JComponent left, JComponent right) {
            super(null);
            this.left = left;
            this.right = right;
            setOpaque(false);
            add(left);
            add(right);
        }

        @Override
        public void doLayout() {
            int half = Math.min(960, getWidth() * 52 / 100);
            left.setBounds(0, 0, half, getHeight());
            right.setBounds(half + 1, 0, Math.min(960, getWidth() - half - 1), getHeight());
        }

        @Override
        protected void paintComponent(java.awt.Graphics graphics) {
            try (fringekeep.desk.look.Pen pen = new fringekeep.desk.look.Pen(graphics)) {
                pen.upright(Ink.HAIR, left.getWidth(), 0, getHeight());
            }
        }
    }
}
