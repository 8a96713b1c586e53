package fringekeep.scan.ui;

import fringekeep.archive.problem.Problem;
import fringekeep.archive.record.Hash;
import fringekeep.desk.look.Ink;
import fringekeep.desk.look.Mark;
import fringekeep.desk.look.Texts;
import fringekeep.desk.look.Type;
import fringekeep.desk.part.OfferedWords;
import fringekeep.desk.part.RuledTable;
import fringekeep.desk.part.WordButton;
import fringekeep.desk.part.WordLines;
import fringekeep.desk.part.WordLines.Sentence;
import fringekeep.drawing.NumberText;
import fringekeep.drawing.Picture;
import fringekeep.scan.TryFiles.Look;
import fringekeep.scan.TryFiles.Tried;
import fringekeep.scan.ui.FileLine.Stand;
import java.awt.BorderLayout;
import java.awt.Dimension;
import java.awt.FlowLayout;
import java.awt.event.ActionEvent;
import java.util.ArrayList;
import java.util.Arrays;
import java.util.List;
import java.util.Locale;
import java.util.Optional;
import java.util.function.Consumer;
import javax.swing.AbstractAction;
import javax.swing.BorderFactory;
import javax.swing.JCheckBox;
import javax.swing.JComponent;
import javax.swing.JLabel;
import javax.swing.JPanel;
import javax.swing.KeyStroke;

/** What the sheet for taking in looks like: files above, the selected one's text and counts below. */
@SuppressWarnings("serial")
final class TakeInPane extends JPanel {
    private static final Texts TEXTS = new Texts("fringekeep.scan.ui.Texts", TakeInPane.class);

    private final JLabel title = new JLabel(TEXTS.of("take-in.title"));
    private final WordLines counts = new WordLines("take-in summary");
    private final RuledTable table = new RuledTable("files", TEXTS.of("files"), FileCells.columns());
    private final OfferedWords profile;
    private final JLabel profileFor = LookPane.label("");
    private final WordLines words = new WordLines("file words");
    private final LookPane look;
    private final JCheckBox times = new JCheckBox(TEXTS.of("take-in.times"));
    private final WordButton add = WordButton.low(TEXTS.of("take-in.add"), 'A', false);
    private final WordButton folder = WordButton.low(TEXTS.of("take-in.folder"), 'D', false);
    private final WordButton again = WordButton.low(TEXTS.of("take-in.again"), 'G', false);
    private final WordButton stop = WordButton.low(TEXTS.of("take-in.stop"), 'S', false);
    private final WordButton place = WordButton.low(TEXTS.of("take-in.place", 0), 'P', false);
    private final WordButton take = WordButton.low(TEXTS.of("take-in.nothing"), 'T', true);
    private boolean showing;
    private boolean running;

    TakeInPane(TakeInSheet.Ear ear, Consumer<Picture> save) {
        super(new BorderLayout());
        this.look = new LookPane(save);
        this.profile = new OfferedWords(
                "profile", TEXTS.of("take-in.read-by"), List.of(TEXTS.of("take-in.guess")), 0, ear::profile);
        setName("take in");
        name(add, "add files", ear::addFiles);
        name(folder, "add folder", ear::addFolder);
        name(again, "try again", ear::again);
        name(stop, "stop", ear::stopIt);
        name(place, "place", ear::placeThem);
        name(take, "take in now", ear::take);
        times.setName("file times");
        times.setFont(Type.BODY);
        times.setOpaque(false);
        times.setMnemonic('R');
        add(head(), BorderLayout.NORTH);
        add(new Halves(table.inScroll(), middle(), look), BorderLayout.CENTER);
        add(foot(), BorderLayout.SOUTH);
        table.getSelectionModel().addListSelectionListener(event -> {
            if (!showing && !event.getValueIsAdjusting()) {
                ear.selected();
            }
        });
        table.whenEmpty(TEXTS.of("take-in.empty"));
        key(table, "ENTER", ear::take);
        key(table, "DELETE", ear::remove);
        key(table, "LEFT", () -> step(-1));
        key(table, "RIGHT", () -> step(1));
        key(table, "A", ear::addFiles);
        key(table, "D", ear::addFolder);
        key(this, "F5", ear::again);
        updateColours();
    }

    private void step(int by) {
        profile.choose(profile.chosen() + by);
    }

    private static void name(WordButton button, String name, Runnable work) {
        button.setName(name);
        button.addActionListener(event -> work.run());
    }

    private static void key(JComponent on, String stroke, Runnable work) {
        on.getInputMap(WHEN_ANCESTOR_OF_FOCUSED_COMPONENT).put(KeyStroke.getKeyStroke(stroke), stroke);
        on.getActionMap().put(stroke, new AbstractAction() {
            @Override
            public void actionPerformed(ActionEvent event) {
                work.run();
            }
        });
    }

    private JPanel head() {
        JPanel head = clear(new BorderLayout(24, 0));
        head.setBorder(BorderFactory.createEmptyBorder(14, 16, 6, 16));
        title.setFont(Type.TITLE);
        JPanel left = clear(new BorderLayout(14, 0));
        left.add(title, BorderLayout.WEST);
        JPanel lowered = clear(new BorderLayout());
        lowered.setBorder(BorderFactory.createEmptyBorder(7, 0, 0, 0));
        lowered.add(counts, BorderLayout.CENTER);
        left.add(lowered, BorderLayout.CENTER);
        head.add(left, BorderLayout.CENTER);
        head.add(row(FlowLayout.RIGHT, add, folder, again), BorderLayout.EAST);
        return head;
    }

    private JPanel middle() {
        JPanel middle = clear(new BorderLayout(0, 4));
        middle.setBorder(BorderFactory.createEmptyBorder(8, 16, 8, 16));
        JPanel choice = clear(new BorderLayout(16, 0));
        JLabel by = LookPane.label(TEXTS.of("take-in.read-by"));
        by.setLabelFor(profile);
        by.setVerticalAlignment(JLabel.TOP);
        by.setBorder(BorderFactory.createEmptyBorder(2, 0, 0, 0));
        profileFor.setVerticalAlignment(JLabel.TOP);
        profileFor.setBorder(BorderFactory.createEmptyBorder(2, 0, 0, 0));
        choice.add(by, BorderLayout.WEST);
        choice.add(profile, BorderLayout.CENTER);
        choice.add(profileFor, BorderLayout.EAST);
        middle.add(choice, BorderLayout.NORTH);
        middle.add(words, BorderLayout.CENTER);
        return middle;
    }

    private JPanel foot() {
        JPanel foot = clear(new BorderLayout());
        foot.setBorder(BorderFactory.createEmptyBorder(6, 16, 10, 16));
        foot.add(times, BorderLayout.WEST);
        foot.add(row(FlowLayout.RIGHT, stop, place, take), BorderLayout.EAST);
        return foot;
    }

    private static JPanel row(int align, JComponent... parts) {
        JPanel row = clear(new FlowLayout(align, 8, 0));
        for (JComponent part : parts) {
            row.add(part);
        }
        return row;
    }

    private static JPanel clear(java.awt.LayoutManager layout) {
        JPanel panel = new JPanel(layout);
        panel.setOpaque(false);
        return panel;
    }

    // ---- showing

    /** Shows all files. */
    void show(List<FileLine> lines) {
        showing = true;
        if (lines.isEmpty()) {
            table.clearSelection();
            table.show(List.of());
        } else {
            table.show(lines.stream().map(FileCells::of).toList());
        }
        showing = false;
    }

    /** Shows one file anew. */
    void show(int row, FileLine line) {
        table.show(row, FileCells.of(line));
    }

    /** Selects the first file when none is. */
    void selectFirst() {
        if (table.getSelectedRow() < 0 && table.getRowCount() > 0) {
            table.setRowSelectionInterval(0, 0);
        }
    }

    /** Selected rows from above. */
    List<Integer> selected() {
        return Arrays.stream(table.getSelectedRows()).boxed().toList();
    }

    /** Names the profiles that can be chosen. */
    void profiles(List<String> names) {
        List<String> offered = new ArrayList<>(List.of(TEXTS.of("take-in.guess")));
        offered.addAll(names);
        profile.offer(offered, Math.max(0, Math.min(profile.chosen(), names.size())));
    }

    /** Shows which profile is chosen for the selected files. */
    void choice(Optional<FileLine> first, int selected, List<Hash> profiles) {
        int now = first.flatMap(FileLine::asked).map(profiles::indexOf).orElse(-1) + 1;
        List<String> offered = new ArrayList<>(List.of(TEXTS.of("take-in.guess")));
        offered.addAll(names());
        profile.offer(offered, now);
        profile.setEnabled(first.isPresent() && !running);
        profileFor.setText(selected > 1 ? TEXTS.of("take-in.for", NumberText.count(selected)) : "");
    }

    private List<String> names() {
        return profile.words().subList(1, profile.words().size());
    }

    /** Shows the selected file. */
    void look(Optional<FileLine> line, Optional<Look> file, int profiles) {
        List<Problem> problems = line.map(FileLine::problems).orElse(List.of());
        String otherwise = line.isEmpty()
                ? TEXTS.of("take-in.look")
                : problems.isEmpty() ? TEXTS.of("files.waits") : TEXTS.of("counts.none");
        look.show(file, problems, otherwise);
        words.show(line.map(this::sentences).orElse(List.of()));
        revalidate();
    }

    private List<Sentence> sentences(FileLine line) {
        List<Sentence> said = new ArrayList<>();
        List<Problem> problems = line.problems();
        boolean nearest = line.asked().isEmpty() && problems.size() > 1;
        if (nearest) {
            String name = line.trial().map(FileLine.Trial::profile).orElse("");
            said.add(Sentence.second(problems.get(0).what() + " " + TEXTS.of("take-in.nearest", name)));
        }
        List<Problem> told = nearest ? problems.subList(1, problems.size()) : problems;
        told.stream().findFirst().ifPresent(problem -> {
            said.add(Sentence.marked(Mark.DASHES, problem.what() + "  " + problem.where()));
            said.add(Sentence.second(problem.mend()));
        });
        if (told.size() > 1) {
            int more = told.size() - 1;
            said.add(Sentence.second(more == 1 ? TEXTS.of("take-in.more.one") : TEXTS.of("take-in.more", more)));
        }
        if (problems.isEmpty()) {
            line.trial().ifPresent(trial -> said.addAll(read(line, trial)));
        }
        return said;
    }

    private List<Sentence> read(FileLine line, FileLine.Trial trial) {
        Tried tried = trial.tried();
        List<Sentence> said = new ArrayList<>();
        line.outcome()
                .filter(taken -> line.stand() == Stand.TAKEN_IN)
                .ifPresent(taken -> said.add(Sentence.of(TEXTS.of("take-in.taken", taken.scans()))));
        String by = line.asked().isPresent()
                ? TEXTS.of("take-in.chosen", trial.profile())
                : tried.fitting().size() > 1
                        ? TEXTS.of("take-in.several", tried.fitting().size(), trial.profile())
                        : TEXTS.of("take-in.one-fits", trial.profile());
        said.add(Sentence.second(by));
        if (line.stand() == Stand.KNOWN) {
            said.add(Sentence.marked(Mark.SAME, TEXTS.of("take-in.known", trial.scans())));
        } else if (line.stand() == Stand.READS && !tried.otherwise().isEmpty()) {
            said.add(Sentence.marked(Mark.QUESTION, TEXTS.of("take-in.otherwise", trial.scans())));
        }
        return said;
    }

    /** Says how many stand where, and which buttons make sense. */
    void summary(TakeInModel model, boolean runs, int asked, String said) {
        running = runs;
        List<String> parts = new ArrayList<>();
        parts.add(model.size() == 1 ? TEXTS.of("take-in.files.one") : TEXTS.of("take-in.files", count(model.size())));
        for (Stand stand : List.of(Stand.READS, Stand.WAITS, Stand.TAKEN_IN, Stand.KNOWN, Stand.REFUSED)) {
            long number = model.count(stand);
            if (number > 0) {
                String key = "take-in.count." + stand.name().toLowerCase(Locale.ROOT);
                parts.add(TEXTS.of(key, NumberText.count(number)));
            }
        }
        String first = running
                ? TEXTS.of("take-in.running", count(asked - model.ready().size()), count(asked))
                : said;
        String all = String.join(", ", parts);
        counts.show(List.of(Sentence.second(model.size() == 0 ? "" : first.isEmpty() ? all : first + "; " + all)));
        buttons(model);
    }

    private static String count(long number) {
        return NumberText.count(number);
    }

    private void buttons(TakeInModel model) {
        int ready = model.ready().size();
        int scans = model.scansTaken().size();
        stop.setVisible(running);
        take.setVisible(!running);
        take.setEnabled(ready > 0);
        take.setText(
                ready == 0
                        ? TEXTS.of("take-in.nothing")
                        : ready == 1 ? TEXTS.of("take-in.do.one") : TEXTS.of("take-in.do", count(ready)));
        take.setMnemonic('T');
        place.setVisible(!running && scans > 0);
        place.setText(scans == 1 ? TEXTS.of("take-in.place.one") : TEXTS.of("take-in.place", count(scans)));
        again.setEnabled(!running && model.count(Stand.REFUSED) > 0);
        times.setEnabled(!running);
    }

    void fileTimes(boolean on) {
        times.setSelected(on);
    }

    boolean fileTimes() {
        return times.isSelected();
    }

    void focusTable() {
        table.requestFocusInWindow();
    }

    List<Runnable> panes() {
        return List.of(
                this::focusTable,
                profile::requestFocusInWindow,
                () -> look.raw().requestFocusInWindow());
    }

    // ---- for tests

    RuledTable table() {
        return table;
    }

    LookPane lookPane() {
        return look;
    }

    OfferedWords profileChoice() {
        return profile;
    }

    String wordsShown() {
        return words.words();
    }

    String summaryShown() {
        return counts.words();
    }

    boolean canTake() {
        return take.isVisible() && take.isEnabled();
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
        times.setForeground(Ink.INK.color());
    }

    /** Table above, words between, look below: the table takes no more than it has rows, and no more than half. */
    private static final class Halves extends JPanel {
        private final JComponent table;
        private final JComponent words;
        private final JComponent look;

        Halves(JComponent table, JComponent words, JComponent look) {
            super(null);
            this.table = table;
            this.words = words;
            this.look = look;
            setOpaque(false);
            add(table);
            add(words);
            add(look);
        }

        @Override
        public void doLayout() {
            int width = getWidth();
            words.setSize(width, Math.max(1, words.getHeight()));
            words.doLayout();
            int between = Math.max(70, words.getPreferredSize().height);
            int above = Math.max(24 + 5 * 22, (getHeight() - between) * 45 / 100);
            table.setBounds(0, 0, width, above);
            words.setBounds(0, above, width, between);
            look.setBounds(0, above + between, width, Math.max(0, getHeight() - above - between));
        }

        @Override
        public Dimension getPreferredSize() {
            return new Dimension(900, 500);
        }
    }
}
