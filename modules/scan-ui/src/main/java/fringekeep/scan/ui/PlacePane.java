package fringekeep.scan.ui;

import fringekeep.archive.record.Hash;
import fringekeep.desk.look.Ink;
import fringekeep.desk.look.Mark;
import fringekeep.desk.look.Texts;
import fringekeep.desk.look.Type;
import fringekeep.desk.part.OfferedWords;
import fringekeep.desk.part.RuledTable;
import fringekeep.desk.part.RuledTable.Cell;
import fringekeep.desk.part.RuledTable.Col;
import fringekeep.desk.part.WordButton;
import fringekeep.desk.part.WordLines;
import fringekeep.desk.part.WordLines.Sentence;
import fringekeep.drawing.NumberText;
import fringekeep.scan.PlaceOffers.Offer;
import fringekeep.scan.PlaceScans.Effect;
import fringekeep.scan.PlacementFacet.Purpose;
import fringekeep.scan.ui.PlaceSheet.Consequence;
import fringekeep.scan.ui.PlaceSheet.ScanLine;
import java.awt.BorderLayout;
import java.awt.Dimension;
import java.awt.FlowLayout;
import java.awt.GridBagConstraints;
import java.awt.GridBagLayout;
import java.awt.Insets;
import java.awt.event.ActionEvent;
import java.util.ArrayList;
import java.util.Arrays;
import java.util.List;
import java.util.Locale;
import java.util.Optional;
import java.util.OptionalInt;
import javax.swing.AbstractAction;
import javax.swing.BorderFactory;
import javax.swing.JComboBox;
import javax.swing.JComponent;
import javax.swing.JLabel;
import javax.swing.JPanel;
import javax.swing.KeyStroke;

/** What the sheet for placing looks like: scans at the left, what is said of all at the right. */
@SuppressWarnings("serial")
final class PlacePane extends JPanel {
    private static final Texts TEXTS = new Texts("fringekeep.scan.ui.Texts", PlacePane.class);
    private static final String KEYS = "SRBLET";

    private final transient PlaceModel model;
    private final transient Runnable asked;
    private final JLabel title = new JLabel();
    private final WordLines whence = new WordLines("place whence");
    private final RuledTable table;
    private final OfferedWords purpose;
    private final Combo setup = new Combo("setup");
    private final Combo run = new Combo("run");
    private final Combo batch = new Combo("batch");
    private final Combo velocity = new Combo("velocity");
    private final Combo series = new Combo("series");
    private final Combo step = new Combo("step");
    private final OfferedWords order;
    private final WordLines consequence = new WordLines("place consequence");
    private final WordButton stop = WordButton.low(TEXTS.of("place.stop"), 'S', false);
    private final WordButton place = WordButton.low(TEXTS.of("place.do.one"), 'P', true);
    private transient List<ScanLine> lines = List.of();
    private transient PlaceModel.Choices choices = new PlaceModel.Choices(
            List.of(),
            List.of(),
            List.of(),
            List.of(),
            new fringekeep.scan.PlaceOffers.Offered(
                    fringekeep.scan.PlaceOffers.Whence.NEWEST,
                    Optional.empty(),
                    Purpose.SIGNAL,
                    Optional.empty(),
                    Optional.empty(),
                    false,
                    List.of(),
                    Optional.empty(),
                    OptionalInt.empty(),
                    Optional.empty()),
            "",
            List.of());
    private transient Optional<Consequence> foreseen = Optional.empty();
    private boolean filling;
    private boolean running;

    PlacePane(PlaceModel model, Runnable asked, Runnable doIt, Runnable stopIt) {
        super(new BorderLayout());
        this.model = model;
        this.asked = asked;
        setName("place");
        table = new RuledTable(
                "scans",
                TEXTS.of("place.scans"),
                List.of(
                        new Col(TEXTS.of("place.scan"), 92, false, false),
                        new Col(TEXTS.of("place.file"), 120, false, true),
                        new Col(TEXTS.of("place.begin"), 96, false, false),
                        new Col(TEXTS.of("place.now"), 150, false, false),
                        new Col(TEXTS.of("place.then"), 170, false, false)));
        purpose =
                new OfferedWords("purpose", TEXTS.of("place.purpose"), purposes(false, false), 0, this::purposeChosen);
        order = new OfferedWords(
                "step order",
                TEXTS.of("place.step"),
                List.of(TEXTS.of("place.in-order"), TEXTS.of("place.same")),
                0,
                chosen -> {
                    if (chosen == 2) {
                        model.stepAsPlaced(true);
                    } else {
                        model.sameStep(chosen == 1);
                    }
                    changed();
                });
        stop.setName("stop");
        stop.addActionListener(event -> stopIt.run());
        place.setName("place now");
        place.addActionListener(event -> doIt.run());
        listen(setup, chosen -> model.setup(hash(choices.setups(), chosen)));
        listen(run, chosen -> model.run(hash(choices.runs(), chosen - 1)));
        listen(series, chosen -> model.series(hash(choices.series(), chosen - 1)));
        listen(batch, chosen -> model.batch(hash(choices.batches(), chosen - 1)));
        listen(step, chosen -> model.firstStep(chosen <= 0 ? OptionalInt.empty() : OptionalInt.of(chosen - 1)));
        listen(velocity, chosen -> model.velocities(velocities().get(chosen)));
        title.setFont(Type.TITLE);
        title.setText(
                model.scans().size() == 1
                        ? TEXTS.of("place.title.one")
                        : TEXTS.of("place.title", NumberText.count(model.scans().size())));
        add(head(), BorderLayout.NORTH);
        add(new Sides(table.inScroll(), form()), BorderLayout.CENTER);
        keys(doIt);
        updateColours();
    }

    private interface Chosen {
        void take(int number);
    }

    private void listen(Combo combo, Chosen chosen) {
        combo.addActionListener(event -> {
            if (!filling && combo.getSelectedIndex() >= 0) {
                chosen.take(combo.getSelectedIndex());
                changed();
            }
        });
    }

    private static Optional<Hash> hash(List<Offer> offers, int number) {
        return number >= 0 && number < offers.size()
                ? Optional.of(offers.get(number).record())
                : Optional.empty();
    }

    private void changed() {
        refresh();
        asked.run();
    }

    private static List<String> purposes(boolean ofSteps, boolean asPlaced) {
        List<String> words = new ArrayList<>(Arrays.stream(Purpose.values())
                .map(one -> TEXTS.of("purpose." + one.text()))
                .toList());
        if (asPlaced) {
            words.add(TEXTS.of("place.as-placed"));
        }
        if (ofSteps) {
            words.add(TEXTS.of("purpose.of-steps"));
        }
        return words;
    }

    private void purposeChosen(int chosen) {
        if (chosen < Purpose.values().length) {
            model.purpose(Purpose.values()[chosen]);
        } else if (model.allPlaced() && chosen == Purpose.values().length) {
            model.purposeAsPlaced();
        } else {
            model.purposeOfSteps();
        }
        changed();
    }

    private void keys(Runnable doIt) {
        key("ctrl ENTER", doIt);
        for (int i = 0; i < KEYS.length(); i++) {
            int number = i;
            key(KEYS.substring(i, i + 1), () -> purpose.choose(number));
        }
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
        head.setBorder(BorderFactory.createEmptyBorder(14, 16, 8, 16));
        head.add(title, BorderLayout.WEST);
        JPanel lowered = clear(new BorderLayout());
        lowered.setBorder(BorderFactory.createEmptyBorder(7, 0, 0, 0));
        lowered.add(whence, BorderLayout.CENTER);
        head.add(lowered, BorderLayout.CENTER);
        return head;
    }

    private JPanel form() {
        JPanel form = clear(new GridBagLayout());
        form.setBorder(BorderFactory.createEmptyBorder(4, 0, 0, 16));
        row(form, 0, "place.purpose", purpose);
        row(form, 1, "place.setup", setup);
        row(form, 2, "place.run", run);
        row(form, 3, "place.batch", batch);
        row(form, 4, "place.velocity", velocity);
        row(form, 5, "place.series", series);
        row(form, 6, "place.step", step);
        row(form, 7, "", order);
        form.add(consequence, at(0, 8, 2, 14, GridBagConstraints.HORIZONTAL));
        JPanel buttons = clear(new FlowLayout(FlowLayout.RIGHT, 8, 0));
        buttons.add(stop);
        buttons.add(place);
        stop.setVisible(false);
        form.add(buttons, at(0, 9, 2, 14, GridBagConstraints.HORIZONTAL));
        GridBagConstraints rest = at(0, 10, 2, 0, GridBagConstraints.BOTH);
        rest.weighty = 1;
        form.add(clear(new BorderLayout()), rest);
        return form;
    }

    private static void row(JPanel form, int y, String key, JComponent field) {
        JLabel label = LookPane.label(key.isEmpty() ? "" : TEXTS.of(key));
        label.setLabelFor(field);
        GridBagConstraints left = at(0, y, 1, 6, GridBagConstraints.NONE);
        left.anchor = GridBagConstraints.NORTHWEST;
        left.weightx = 0;
        left.insets = new Insets(6 + 4, 0, 0, 16);
        form.add(label, left);
        form.add(field, at(1, y, 1, 6, GridBagConstraints.HORIZONTAL));
    }

    private static GridBagConstraints at(int x, int y, int width, int above, int fill) {
        return new GridBagConstraints(
                x, y, width, 1, 1, 0, GridBagConstraints.NORTHWEST, fill, new Insets(above, 0, 0, 0), 0, 0);
    }

    private static JPanel clear(java.awt.LayoutManager layout) {
        JPanel panel = new JPanel(layout);
        panel.setOpaque(false);
        return panel;
    }

    // ---- showing

    /** Shows what is offered. */
    void offer(PlaceModel.Choices next, List<ScanLine> scans) {
        choices = next;
        lines = List.copyOf(scans);
        String key = "place.whence."
                + next.offered().whence().name().toLowerCase(Locale.ROOT)
                + (next.offered().runByTime() ? ".run" : "");
        whence.show(List.of(Sentence.second(TEXTS.of(key, next.from()))));
        refresh();
    }

    /** Shows the model in the fields. */
    void refresh() {
        filling = true;
        boolean ofSteps = model.stepsTellPurposes();
        int own = Purpose.values().length;
        int chosen = model.isPurposeAsPlaced()
                ? own
                : model.isPurposeOfSteps()
                        ? own + (model.allPlaced() ? 1 : 0)
                        : model.purpose().ordinal();
        purpose.offer(purposes(ofSteps, model.allPlaced()), chosen);
        setup.fill(words(choices.setups(), false), place(choices.setups(), model.setup()));
        run.fill(words(choices.runs(), true), place(choices.runs(), model.run()) + 1);
        series.fill(words(choices.series(), true), place(choices.series(), model.series()) + 1);
        fillBatch();
        List<List<Hash>> options = velocities();
        velocity.fill(options.stream().map(this::velocityWords).toList(), options.indexOf(model.velocities()));
        fillStep();
        filling = false;
        rows();
    }

    private void fillBatch() {
        boolean told = model.batchIsTold();
        batch.setEnabled(!told && !running);
        if (told) {
            Hash named = model.ofRun().batches().get(0);
            String words = choices.batches().stream()
                    .filter(offer -> offer.record().equals(named))
                    .map(Offer::words)
                    .findFirst()
                    .orElse("");
            batch.fill(List.of(TEXTS.of("place.batch.told", words)), 0);
        } else {
            batch.fill(words(choices.batches(), true), place(choices.batches(), model.batch()) + 1);
        }
    }

    private void fillStep() {
        List<String> words = new ArrayList<>(List.of(TEXTS.of("place.none")));
        for (int i = 0; i < model.steps().size(); i++) {
            words.add(TEXTS.of("place.step.word", i, model.steps().get(i).words()));
        }
        step.fill(words, model.firstStep().isPresent() ? model.firstStep().getAsInt() + 1 : 0);
        step.setEnabled(model.series().isPresent() && !running);
        List<String> orders = new ArrayList<>(List.of(TEXTS.of("place.in-order"), TEXTS.of("place.same")));
        if (model.canKeepSteps()) {
            orders.add(TEXTS.of("place.as-placed"));
        }
        order.offer(orders, model.isStepAsPlaced() ? 2 : model.isSameStep() ? 1 : 0);
        order.setEnabled(!running);
        boolean many = model.firstStep().isPresent() && model.scans().size() > 1;
        order.setVisible(many || model.canKeepSteps());
    }

    private static List<String> words(List<Offer> offers, boolean none) {
        List<String> words = new ArrayList<>(none ? List.of(TEXTS.of("place.none")) : List.of());
        offers.forEach(offer -> words.add(offer.words().replace("source-run", "source run")));
        return words;
    }

    private static int place(List<Offer> offers, Optional<Hash> record) {
        return record.map(one -> offers.stream().map(Offer::record).toList().indexOf(one))
                .orElse(-1);
    }

    /** None, each of the run's, all of the run's, and what is chosen now if it is none of these. */
    private List<List<Hash>> velocities() {
        List<Hash> own = model.ofRun().velocities().stream().map(Offer::record).toList();
        List<List<Hash>> options = new ArrayList<>();
        options.add(List.of());
        own.forEach(one -> options.add(List.of(one)));
        if (own.size() > 1) {
            options.add(own);
        }
        if (!options.contains(model.velocities())) {
            options.add(model.velocities());
        }
        return options;
    }

    private String velocityWords(List<Hash> option) {
        if (option.isEmpty()) {
            return TEXTS.of("place.none");
        }
        List<String> words = model.ofRun().velocities().stream()
                .filter(offer -> option.contains(offer.record()))
                .map(Offer::words)
                .toList();
        return option.size() == 1 && words.size() == 1
                ? words.get(0)
                : TEXTS.of(words.size() == option.size() ? "place.velocity.all" : "place.velocity.kept", option.size());
    }

    /** Shows what placing would do. */
    void foreseen(Optional<Consequence> next, boolean runs, String said) {
        foreseen = next;
        running = runs;
        rows();
        List<Sentence> words = new ArrayList<>();
        if (!said.isEmpty()) {
            words.add(Sentence.of(said));
        }
        if (model.setup().isEmpty()) {
            words.add(Sentence.marked(Mark.QUESTION, TEXTS.of("place.no-setup")));
        }
        if (model.withoutStep() > 0) {
            words.add(Sentence.marked(
                    Mark.QUESTION,
                    TEXTS.of("place.no-step", model.withoutStep(), model.steps().size())));
        }
        next.ifPresent(what -> words.addAll(sentences(what)));
        consequence.show(words);
        long acts = next.map(what -> what.effects().stream()
                        .filter(effect -> effect == Effect.PLACES || effect == Effect.CORRECTS)
                        .count())
                .orElse(0L);
        boolean disputed =
                next.filter(what -> what.effects().contains(Effect.DISPUTED)).isPresent();
        place.setEnabled(acts > 0 && !disputed && model.complete() && !running);
        place.setText(
                acts == 0
                        ? TEXTS.of("place.do.none")
                        : acts == 1 ? TEXTS.of("place.do.one") : TEXTS.of("place.do", NumberText.count(acts)));
        place.setMnemonic('P');
        revalidate();
    }

    private static List<Sentence> sentences(Consequence what) {
        List<Sentence> words = new ArrayList<>();
        List<String> parts = new ArrayList<>();
        for (Effect effect : Effect.values()) {
            long number = what.effects().stream().filter(effect::equals).count();
            if (number > 0) {
                parts.add(TEXTS.of("place.effect." + effect.name().toLowerCase(Locale.ROOT), NumberText.count(number)));
            }
        }
        words.add(Sentence.of(String.join(", ", parts)));
        if (!what.kinds().isEmpty()) {
            String kinds = String.join(
                    ", ",
                    what.kinds().entrySet().stream()
                            .map(each -> counted(each.getValue(), each.getKey()))
                            .toList());
            words.add(Sentence.marked(Mark.RING, TEXTS.of("place.outdates", kinds)));
        }
        if (what.effects().contains(Effect.DISPUTED)) {
            words.add(Sentence.marked(Mark.DISPUTED, TEXTS.of("place.disputed")));
        }
        return words;
    }

    private static String counted(int number, String kind) {
        return NumberText.count(number) + " " + (number == 1 ? kind : TEXTS.orElse("plural." + kind, kind));
    }

    private void rows() {
        List<List<Cell>> rows = new ArrayList<>();
        for (int i = 0; i < lines.size(); i++) {
            ScanLine line = lines.get(i);
            int number = i;
            Optional<Effect> effect = foreseen.filter(
                            what -> number < what.effects().size())
                    .map(what -> what.effects().get(number));
            rows.add(List.of(
                    Cell.of(line.label()),
                    Cell.of(line.file(), Ink.INK2),
                    Cell.of(line.begin(), Ink.INK2),
                    line.placed().isEmpty()
                            ? Cell.of(Mark.CORNER, TEXTS.of("place.unplaced"))
                            : Cell.of(line.placed(), Ink.INK2),
                    effect.map(one -> then(number, one)).orElse(Cell.of(""))));
        }
        table.show(rows);
    }

    private Cell then(int scan, Effect effect) {
        String purposeWords = TEXTS.of("purpose." + model.purpose(scan).text());
        OptionalInt at = model.step(scan);
        String stepWords = at.isPresent() && at.getAsInt() < model.steps().size()
                ? TEXTS.of("place.at", model.steps().get(at.getAsInt()).words())
                : "";
        return switch (effect) {
            case PLACES -> Cell.of(purposeWords + stepWords);
            case CORRECTS -> Cell.of(Mark.CORRECTED, purposeWords + stepWords);
            case KEEPS -> Cell.of(TEXTS.of("place.keeps"), Ink.INK3);
            case DISPUTED -> Cell.of(Mark.DISPUTED, TEXTS.of("place.is-disputed"));
        };
    }

    /** While scans are being placed, nothing is chosen. */
    void running(boolean runs) {
        running = runs;
        stop.setVisible(runs);
        place.setEnabled(!runs && model.complete());
        for (Combo combo : List.of(setup, run, velocity, series)) {
            combo.setEnabled(!runs);
        }
        purpose.setEnabled(!runs);
        refresh();
    }

    void focusFirst() {
        purpose.requestFocusInWindow();
    }

    void focusTable() {
        table.requestFocusInWindow();
    }

    // ---- for tests

    RuledTable table() {
        return table;
    }

    String consequenceShown() {
        return consequence.words();
    }

    String whenceShown() {
        return whence.words();
    }

    boolean canPlace() {
        return place.isEnabled();
    }

    void choosePurpose(Purpose next) {
        purpose.choose(next.ordinal());
    }

    void press() {
        place.doClick(0);
    }

    /** Chooses in a field as a person does. */
    void choose(String name, int number) {
        for (Combo combo : List.of(setup, run, batch, velocity, series, step)) {
            if (name.equals(combo.getName())) {
                combo.setSelectedIndex(number);
            }
        }
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

    /** A field that offers records. */
    private static final class Combo extends JComboBox<String> {
        Combo(String name) {
            setName(name);
            setFont(Type.BODY);
            getAccessibleContext().setAccessibleName(TEXTS.of("place." + name));
            setMaximumRowCount(16);
        }

        void fill(List<String> words, int chosen) {
            removeAllItems();
            words.forEach(this::addItem);
            setSelectedIndex(chosen < words.size() ? chosen : -1);
        }

        @Override
        public Dimension getPreferredSize() {
            return new Dimension(200, 26);
        }

        @Override
        public Dimension getMinimumSize() {
            return new Dimension(80, 26);
        }
    }

    /** Scans at the left, the form at the right: no wider than a hand's reach. */
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
            int form = Math.min(720, getWidth() * 42 / 100);
            int table = Math.min(1180, getWidth() - form - 40);
            left.setBounds(0, 0, table, getHeight());
            right.setBounds(table + 24, 0, form, getHeight());
        }
    }
}
