package fringekeep.desk.window;

import fringekeep.archive.Archive;
import fringekeep.archive.graph.StateName;
import fringekeep.archive.problem.Problem;
import fringekeep.archive.record.Hash;
import fringekeep.desk.chain.ChainListener;
import fringekeep.desk.chain.ChainState;
import fringekeep.desk.chain.ChainStrip;
import fringekeep.desk.lineage.RawCounts;
import fringekeep.desk.lineage.ReadSheet;
import fringekeep.desk.lineage.RuledSheet;
import fringekeep.desk.list.ListContent;
import fringekeep.desk.list.Question;
import fringekeep.desk.list.ReadList;
import fringekeep.desk.list.RecordList;
import fringekeep.desk.look.Ink;
import fringekeep.desk.look.Mark;
import fringekeep.desk.look.Texts;
import fringekeep.desk.pane.PageAction;
import fringekeep.desk.pane.ReadRecord;
import fringekeep.desk.pane.RecordPane;
import fringekeep.desk.part.ProgressLine;
import fringekeep.desk.part.TroubleLine;
import fringekeep.desk.run.Progress;
import fringekeep.desk.run.Runner;
import fringekeep.desk.session.Register;
import fringekeep.desk.session.Stops;
import fringekeep.desk.stage.DeskAction;
import fringekeep.desk.stage.DeskHand;
import fringekeep.desk.stage.DeskSelection;
import fringekeep.desk.stage.DeskSheet;
import fringekeep.drawing.NumberText;
import java.awt.BorderLayout;
import java.awt.CardLayout;
import java.nio.file.Path;
import java.util.ArrayDeque;
import java.util.ArrayList;
import java.util.Deque;
import java.util.List;
import java.util.Optional;
import javax.swing.JPanel;

/**
 * All that stands between menu line and the window's foot: strip, sheets, status line, and the way from one to the other.
 * Lives on the window thread; everything that asks the archive goes through the runner.
 */
@SuppressWarnings("serial")
public final class Desk extends JPanel {
    private static final Texts TEXTS = new Texts("fringekeep.desk.window.Texts", Desk.class);

    private final transient Runner runner;
    private final transient Stops stops;
    private final transient Memory memory;
    private final ChainStrip strip;
    private final RecordList list;
    private final RecordPane record;
    private final TwoPanes panes;
    private final RuledSheet lineage;
    private final FirstSheet first;
    private final KeysSheet keysSheet = new KeysSheet();
    private final TroubleLine caution = new TroubleLine();
    private final ProgressLine progress;
    private final StatusBar status = new StatusBar();
    private final CardLayout cards = new CardLayout();
    private final JPanel sheets = new JPanel(cards);
    private final JPanel top = new JPanel(new BorderLayout());
    private final JPanel stageRoom = new JPanel(new BorderLayout());
    private final transient DeskStages stages;
    private final transient DeskPersons persons;
    private final transient Hand hand;
    private final transient Deque<Place> history = new ArrayDeque<>();
    private transient Optional<Archive> archive = Optional.empty();
    private transient Optional<Register> register = Optional.empty();
    private transient Optional<DeskSheet> sheet = Optional.empty();
    private transient Place place;
    private String doneWords = "";
    private int paneInSheet = 1;
    private String card = "first";
    private String cardBeforeKeys = "first";

    /** A desk without an archive. */
    Desk(Runner runner, Stops stops, DeskHost host, Memory memory, DeskStages stages) {
        super(new BorderLayout());
        this.runner = runner;
        this.stops = stops;
        this.memory = memory;
        this.stages = stages;
        this.progress = new ProgressLine(one -> runner.stop(one.place()));
        this.hand = new Hand(this, runner, host, memory);
        this.persons = new DeskPersons(runner, memory, host, this::showStatus);
        this.place = start(stops);
        this.strip = new ChainStrip(ChainState.empty(stops), new StripEar());
        this.list = new RecordList(this::select, this::enterRecord, this::ask);
        this.record = new RecordPane(this::pageActions, this::follow, host::save);
        this.panes = new TwoPanes(list, record, width -> memory.put("list width", Integer.toString(width)));
        this.lineage =
                new RuledSheet(strip::columns, ReadList.plurals(stops), this::selectInSheet, this::open, this::back);
        this.first = new FirstSheet(host::chooseArchive, host::foundArchive);
        assemble();
        new DeskKeys(this).bind();
        runner.onTrouble(problems -> {
            if (archive.isPresent()) {
                caution.show(problems);
            } else {
                host.trouble(problems);
            }
        });
        runner.onProgress(this::showProgress);
        showStatus();
    }

    private static Place start(Stops stops) {
        int last = stops.all().size() - 1;
        return new Place(
                last,
                Question.all(stops.all().get(last).kind()),
                Optional.empty(),
                Place.Sheet.RECORDS,
                Optional.empty());
    }

    private void assemble() {
        top.add(strip, BorderLayout.CENTER);
        top.add(caution, BorderLayout.SOUTH);
        top.setVisible(false);
        JPanel foot = new JPanel(new BorderLayout());
        foot.add(progress, BorderLayout.NORTH);
        foot.add(status, BorderLayout.SOUTH);
        sheets.add(first, "first");
        sheets.add(panes, "records");
        sheets.add(lineage, "lineage");
        sheets.add(keysSheet, "keys");
        sheets.add(stageRoom, "stage");
        stageRoom.setOpaque(false);
        keysSheet.add(stages.keys());
        add(top, BorderLayout.NORTH);
        add(sheets, BorderLayout.CENTER);
        add(foot, BorderLayout.SOUTH);
        memory.get("list width").ifPresent(width -> panes.listWidth(width(width)));
        setBackground(Ink.SHEET.color());
    }

    private static int width(String text) {
        try {
            return Integer.parseInt(text);
        } catch (NumberFormatException e) {
            return -1; // an old or damaged memory: the usual width
        }
    }

    // ---- the archive

    /** Shows an open archive; an earlier one is closed. */
    void open(Archive next) {
        closeArchive();
        archive = Optional.of(next);
        next.onCommit(watermark -> javax.swing.SwingUtilities.invokeLater(this::refresh));
        top.setVisible(true);
        strip.show(ChainState.empty(stops), place.stop());
        strip.inView(
                next.facts().title(),
                next.facts().invented()
                        ? TEXTS.of("view.invented")
                        : next.facts().zone());
        showCard("records");
        persons.open(archive);
        refresh();
    }

    /** Closes the archive that is shown; the first sheet stands again. */
    void closeArchive() {
        runner.stop();
        archive.ifPresent(open -> runner.run("close", work -> close(open), done -> {}));
        leaveSheet();
        archive = Optional.empty();
        persons.open(archive);
        register = Optional.empty();
        history.clear();
        place = start(stops);
        record.show(Optional.empty());
        list.show(ListContent.NOTHING, Optional.empty());
        top.setVisible(false);
        showCard("first");
        showStatus();
    }

    /** Closes the archive before the program ends; waits until its last words are written. */
    void closeForGood() {
        runner.stop();
        archive.ifPresent(Archive::close);
        archive = Optional.empty();
    }

    private static Boolean close(Archive open) {
        open.close();
        return Boolean.TRUE;
    }

    /** The archive that is shown. */
    Optional<Archive> archive() {
        return archive;
    }

    /** Reads all anew, as after a commit. */
    void refresh() {
        archive.ifPresent(open -> runner.run("register", work -> Register.read(open, stops), this::arrived));
    }

    private void arrived(Register next) {
        register = Optional.of(next);
        caution.show(List.of());
        if (place.inHand().isEmpty()) {
            place = new Place(firstFilled(next), place.question(), Optional.empty(), place.sheet(), place.root());
            place = new Place(
                    place.stop(),
                    Question.all(stops.all().get(place.stop()).kind()),
                    Optional.empty(),
                    place.sheet(),
                    place.root());
        }
        ask(place.question());
        place.inHand().ifPresent(this::read);
        sheet.ifPresent(DeskSheet::recorded);
        showStatus();
    }

    /** The last stop that has records: figures where there are any. */
    private int firstFilled(Register next) {
        for (int i = stops.all().size() - 1; i >= 0; i--) {
            if (!next.records(stops.all().get(i).kind()).isEmpty()) {
                return i;
            }
        }
        return stops.all().size() - 1;
    }

    // ---- going about

    /** Opens a stop of the strip. */
    void openStop(int stop) {
        if (stop < 0 || stop >= stops.all().size() || archive.isEmpty()) {
            return;
        }
        remember();
        place = new Place(
                stop,
                Question.all(stops.all().get(stop).kind()),
                place.inHand(),
                Place.Sheet.RECORDS,
                Optional.empty());
        showCard("records");
        ask(place.question());
    }

    private void ask(Question question) {
        place = new Place(
                stops.of(question.kind()).orElse(place.stop()), question, place.inHand(), place.sheet(), place.root());
        both((open, known) ->
                runner.run("list", work -> new ReadList(open, known, stops).read(question, work), this::listArrived));
    }

    private void listArrived(ListContent content) {
        list.show(content, place.inHand());
        boolean listed = list.selected().isPresent();
        if (!listed && place.sheet() == Place.Sheet.RECORDS) {
            list.first()
                    .ifPresentOrElse(
                            one -> {
                                list.show(content, Optional.of(one));
                                select(one);
                            },
                            () -> {
                                record.show(Optional.empty());
                                showChain();
                            });
        } else {
            showChain();
        }
        panes.retie();
    }

    /** Takes a record in hand. */
    void select(Hash next) {
        place = place.holding(next);
        read(next);
        showChain();
        panes.retie();
    }

    private void read(Hash next) {
        both((open, known) -> runner.run("record", work -> new ReadRecord(open, known, stops).read(next), page -> {
            record.show(page);
            panes.retie();
        }));
    }

    private void showChain() {
        both((open, known) -> runner.run(
                "chain",
                work -> ChainState.of(open, known, stops, place.inHand()),
                state -> strip.show(state, place.stop())));
    }

    /** Opens a record: its stop, its list, its pane. */
    void open(Hash next) {
        remember();
        register.flatMap(known -> known.kind(next)).ifPresent(kind -> {
            place = new Place(
                    stops.of(kind).orElse(place.stop()),
                    Question.all(kind),
                    Optional.of(next),
                    Place.Sheet.RECORDS,
                    Optional.empty());
            showCard("records");
            ask(place.question());
            read(next);
            list.focusRows();
        });
    }

    private void follow(List<Hash> records) {
        if (records.size() == 1) {
            open(records.get(0));
            return;
        }
        register.flatMap(known -> known.kind(records.get(0))).flatMap(stops::of).ifPresent(this::openLinked);
    }

    private void openLinked(int stop) {
        remember();
        Question linked = new Question(stops.all().get(stop).kind(), Optional.empty(), place.inHand(), "", 500);
        place = new Place(stop, linked, place.inHand(), Place.Sheet.RECORDS, Optional.empty());
        showCard("records");
        ask(linked);
    }

    /** Shows the lineage of the record in hand. */
    void trace() {
        Optional<Hash> root = place.inHand();
        if (root.isEmpty() || archive.isEmpty()) {
            return;
        }
        remember();
        place = place.on(Place.Sheet.LINEAGE, root);
        both((open, known) ->
                runner.run("sheet", work -> new ReadSheet(open, known, stops).read(root.get(), work), sheet -> {
                    lineage.show(sheet);
                    showCard("lineage");
                    lineage.focusRows();
                    selectInSheet(root.get());
                }));
    }

    private void selectInSheet(Hash next) {
        place = place.holding(next);
        showChain();
        archive.ifPresent(open -> runner.run("raw", work -> RawCounts.read(open, next), lineage::showRaw));
    }

    private List<PageAction> pageActions() {
        List<PageAction> words = new ArrayList<>();
        for (DeskAction action : stages.onRecord(selection())) {
            words.add(new PageAction(action.word(), action.mnemonic(), () -> doIt(action)));
        }
        words.add(new PageAction(TEXTS.of("trace"), 'T', this::trace));
        return words;
    }

    /** Does something with what is selected, if it applies. */
    void doIt(DeskAction action) {
        if (action.applies().test(selection()) && (register.isPresent() || archive.isEmpty())) {
            action.work().accept(hand);
        }
    }

    /** What is selected. */
    DeskSelection selection() {
        Optional<Hash> inHand = place.inHand();
        List<Hash> records = card.equals("records") ? list.marked() : List.of();
        List<Hash> all = records.isEmpty() ? inHand.stream().toList() : records;
        Optional<String> kind = all.stream().findFirst().flatMap(one -> register.flatMap(known -> known.kind(one)));
        return new DeskSelection(archive.isPresent(), kind, all, inHand);
    }

    /** What stages add. */
    DeskStages stages() {
        return stages;
    }

    /** Who is at the desk. */
    DeskPersons persons() {
        return persons;
    }

    /** Which records there are, once read. */
    Optional<Register> register() {
        return register;
    }

    /** The desk as stages see it. */
    public DeskHand hand() {
        return hand;
    }

    /** Shows a sheet of a stage. */
    void show(DeskSheet next) {
        if (sheet.isEmpty()) {
            remember();
        }
        leaveSheet();
        stageRoom.removeAll();
        stageRoom.add(next.component(), BorderLayout.CENTER);
        sheet = Optional.of(next);
        showCard("stage");
        stageRoom.revalidate();
        next.focusFirst();
    }

    private void leaveSheet() {
        Optional<DeskSheet> before = sheet;
        sheet = Optional.empty();
        before.ifPresent(DeskSheet::left);
    }

    /** Shows a list. */
    void openList(Question question) {
        remember();
        place = new Place(
                stops.of(question.kind()).orElse(place.stop()),
                question,
                Optional.empty(),
                Place.Sheet.RECORDS,
                Optional.empty());
        showCard("records");
        ask(question);
        list.focusRows();
    }

    /** Says what could not be done. */
    void say(List<Problem> problems) {
        caution.show(problems);
    }

    /** Says what was done. */
    void done(String words) {
        doneWords = words;
        showStatus();
    }

    /** Files were dropped on the window. */
    boolean dropped(List<Path> files) {
        return archive.isPresent()
                && register.isPresent()
                && stages.all().stream().anyMatch(stage -> stage.dropped(files, hand));
    }

    private void remember() {
        history.push(place);
        while (history.size() > 100) {
            history.removeLast();
        }
    }

    /** Goes back to where one came from. */
    void back() {
        Optional<Place> before = Optional.ofNullable(history.poll());
        if (before.isEmpty()) {
            return;
        }
        place = before.get();
        if (place.sheet() == Place.Sheet.LINEAGE) {
            showCard("lineage");
            lineage.focusRows();
            showChain();
        } else {
            showCard("records");
            ask(place.question());
            place.inHand().ifPresent(this::read);
            list.focusRows();
        }
    }

    /** Looks for words. */
    void find(String words) {
        if (words.isBlank()) {
            ask(Question.all(place.question().kind()));
            return;
        }
        archive.ifPresent(open -> runner.run("find", work -> open.find(words), this::open, problems -> {
            showCard("records");
            place = place.on(Place.Sheet.RECORDS, Optional.empty());
            ask(new Question(place.question().kind(), Optional.empty(), Optional.empty(), words, 500));
        }));
    }

    // ---- focus

    /** Goes into the record. */
    void enterRecord() {
        record.focusPage();
    }

    /** Back to the rows. */
    void focusRows() {
        if (card.equals("keys")) {
            showCard(cardBeforeKeys);
            if (card.equals("stage")) {
                sheet.ifPresent(DeskSheet::focusFirst);
                return;
            }
        }
        switch (card) {
            case "lineage" -> lineage.focusRows();
            case "records" -> list.focusRows();
            case "stage" ->
                sheet.ifPresent(one -> {
                    if (!one.escape()) {
                        back();
                    }
                });
            default -> first.focusFirst();
        }
    }

    /** Puts the cursor into the field for words to find. */
    void focusFind() {
        strip.findField().requestFocusInWindow();
        strip.findField().selectAll();
    }

    /** The next or previous pane: strip, list, record; strip, lineage. */
    void nextPane(int by) {
        java.awt.Component focus =
                java.awt.KeyboardFocusManager.getCurrentKeyboardFocusManager().getFocusOwner();
        if (sheet.isPresent() && card.equals("stage")) {
            nextInSheet(sheet.get(), by, isIn(focus, strip));
            return;
        }
        List<Runnable> panesInOrder = card.equals("lineage")
                ? List.of(strip::focusOpen, lineage::focusRows)
                : List.of(strip::focusOpen, list::focusRows, record::focusPage);
        int now = isIn(focus, strip) ? 0 : isIn(focus, record) ? 2 : 1;
        panesInOrder.get(Math.floorMod(now + by, panesInOrder.size())).run();
    }

    private void nextInSheet(DeskSheet shown, int by, boolean inStrip) {
        List<Runnable> order = new ArrayList<>();
        order.add(strip::focusOpen);
        order.addAll(shown.panes());
        paneInSheet = inStrip ? Math.floorMod(by, order.size()) : Math.floorMod(paneInSheet + by, order.size());
        order.get(paneInSheet).run();
    }

    private static boolean isIn(java.awt.Component focus, java.awt.Container parent) {
        return focus != null && javax.swing.SwingUtilities.isDescendingFrom(focus, parent);
    }

    /** Asks the long work that is shown at the foot to stop. */
    void stopWork() {
        progress.askToStop();
    }

    /** Shows the keys, or goes back from them. */
    void keys() {
        if (card.equals("keys")) {
            focusRows();
        } else {
            cardBeforeKeys = card;
            showCard("keys");
            keysSheet.requestFocusInWindow();
        }
    }

    private void showCard(String next) {
        if (!next.equals("stage") && !next.equals("keys")) {
            leaveSheet();
        }
        if (!next.equals(card)) {
            doneWords = "";
        }
        card = next;
        cards.show(sheets, next);
        showStatus();
    }

    // ---- what is said

    private void showProgress(Optional<Progress> now) {
        progress.show(now);
        strip.going(now.map(one -> List.of(new ChainStrip.Going(Optional.of(Mark.DASHED_RING), one.what())))
                .orElse(List.of(new ChainStrip.Going(Optional.empty(), TEXTS.of("idle")))));
    }

    private void showStatus() {
        List<String> left = new ArrayList<>();
        List<String> right = new ArrayList<>();
        archive.ifPresentOrElse(
                open -> {
                    left.add(open.facts().title());
                    if (!doneWords.isEmpty()) {
                        left.add(doneWords);
                    }
                    sheet.filter(one -> card.equals("stage"))
                            .ifPresentOrElse(
                                    one -> left.addAll(one.hints()),
                                    () -> left.add(
                                            TEXTS.of(card.equals("lineage") ? "status.lineage" : "status.list")));
                    right.add(TEXTS.of(
                            "status.journal", NumberText.count(open.facts().watermark())));
                    persons.name().ifPresent(right::add);
                },
                () -> left.add(TEXTS.of("status.none")));
        right.add(TEXTS.of("status.keys"));
        status.show(left, right);
    }

    // ---- for tests

    /** What stands below the strip: first, records, lineage, keys, or the name of a stage's sheet. */
    public String sheetShown() {
        return card.equals("stage") ? sheet.map(DeskSheet::name).orElse(card) : card;
    }

    /** The open stop, from 0. */
    public int stopShown() {
        return place.stop();
    }

    /** Whether nothing is being read. */
    public boolean quiet() {
        return runner.quiet();
    }

    /** The list. */
    public RecordList listPane() {
        return list;
    }

    /** The record pane. */
    public RecordPane recordPane() {
        return record;
    }

    /** The lineage sheet. */
    public RuledSheet lineageSheet() {
        return lineage;
    }

    /** The strip. */
    public ChainStrip strip() {
        return strip;
    }

    private interface WithArchive {
        void work(Archive open, Register known);
    }

    private void both(WithArchive work) {
        archive.ifPresent(open -> register.ifPresent(known -> work.work(open, known)));
    }

    private final class StripEar implements ChainListener {
        @Override
        public void open(int stop) {
            openStop(stop);
            list.focusRows();
        }

        @Override
        public void filter(int stop, StateName state) {
            remember();
            showCard("records");
            place = place.on(Place.Sheet.RECORDS, Optional.empty());
            ask(new Question(stops.all().get(stop).kind(), Optional.of(state), Optional.empty(), "", 500));
        }

        @Override
        public void linked(int stop) {
            openLinked(stop);
        }

        @Override
        public void find(String words) {
            Desk.this.find(words);
        }
    }
}
