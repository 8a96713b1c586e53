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
import fringekeep.desk.list.Joined;
import fringekeep.desk.list.ListContent;
import fringekeep.desk.list.ListEar;
import fringekeep.desk.list.PagedRows;
import fringekeep.desk.list.Question;
import fringekeep.desk.list.ReadList;
import fringekeep.desk.list.RecordList;
import fringekeep.desk.look.Ink;
import fringekeep.desk.look.Mark;
import fringekeep.desk.look.Texts;
import fringekeep.desk.pane.PageAction;
import fringekeep.desk.pane.PaneEar;
import fringekeep.desk.pane.ReadRecord;
import fringekeep.desk.pane.RecordPage;
import fringekeep.desk.pane.RecordPane;
import fringekeep.desk.part.ProgressLine;
import fringekeep.desk.part.TroubleLine;
import fringekeep.desk.run.Progress;
import fringekeep.desk.run.Runner;
import fringekeep.desk.session.InView;
import fringekeep.desk.session.Register;
import fringekeep.desk.session.Stops;
import fringekeep.desk.session.View;
import fringekeep.desk.session.Views;
import fringekeep.desk.stage.DeskAction;
import fringekeep.desk.stage.DeskHand;
import fringekeep.desk.stage.DeskSelection;
import fringekeep.desk.stage.DeskSheet;
import fringekeep.desk.stage.SizeOfChange;
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
import org.openide.util.Lookup;

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
    private final FoundingPane founding;
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
    private transient Optional<Views> views = Optional.empty();
    private transient Optional<InView> inView = Optional.empty();
    private transient Optional<Joined> joined = Optional.empty();
    private transient View view = View.ALL;
    private transient Optional<InView> ticked = Optional.empty();
    private transient Optional<DeskSheet> sheet = Optional.empty();
    private transient Place place;
    private String doneWords = "";
    private int paneInSheet = 1;
    private transient Optional<Hash> toOpen = Optional.empty();
    private transient List<Problem> trouble = List.of();
    private String card = "first";
    private String cardBeforeKeys = "first";

    /** A desk without an archive. */
    Desk(Runner runner, Stops stops, DeskHost host, Memory memory, DeskStages stages) {
        super(new BorderLayout());
        this.runner = runner;
        this.stops = stops;
        this.memory = memory;
        this.stages = stages.with(new ViewStage(this));
        this.progress = new ProgressLine(one -> runner.stop(one.place()));
        this.hand = new Hand(this, runner, host, memory);
        this.persons = new DeskPersons(runner, memory, host, this::showStatus);
        this.place = start(stops);
        this.strip = new ChainStrip(ChainState.empty(stops), new StripEar());
        this.list = new RecordList(new RowsEar());
        this.record = new RecordPane(new RecordEar(host));
        this.panes = new TwoPanes(list, record, width -> memory.put("list width", Integer.toString(width)));
        this.lineage =
                new RuledSheet(strip::columns, ReadList.plurals(stops), this::selectInSheet, this::open, this::back);
        this.first = new FirstSheet(host::tryInvented, host::chooseArchive, this::askToFound);
        this.founding = new FoundingPane(host::foundArchive, host::chooseFolder, this::leaveFounding);
        assemble();
        new DeskKeys(this).bind();
        runner.onTrouble(problems -> {
            say(problems);
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
        strip.setVisible(false);
        JPanel foot = new JPanel(new BorderLayout());
        foot.add(progress, BorderLayout.NORTH);
        foot.add(status, BorderLayout.SOUTH);
        sheets.add(first, "first");
        sheets.add(founding, "found");
        sheets.add(panes, "records");
        sheets.add(lineage, "lineage");
        sheets.add(keysSheet, "keys");
        sheets.add(stageRoom, "stage");
        stageRoom.setOpaque(false);
        keysSheet.add(this.stages.keys());
        add(top, BorderLayout.NORTH);
        add(sheets, BorderLayout.CENTER);
        add(foot, BorderLayout.SOUTH);
        strip.addComponentListener(new java.awt.event.ComponentAdapter() {
            @Override
            public void componentResized(java.awt.event.ComponentEvent event) {
                showTicks();
            }
        });
        memory.get("list width").ifPresent(width -> panes.listWidth(width(width)));
        setBackground(Ink.SHEET.color());
        getAccessibleContext().setAccessibleName("Fringekeep");
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
        strip.setVisible(true);
        say(List.of());
        strip.show(ChainState.empty(stops), place.stop());
        strip.inView(
                next.facts().title(),
                next.facts().invented()
                        ? TEXTS.of("view.invented")
                        : next.facts().zone());
        showCard("records");
        persons.open(archive);
        views = Optional.of(new Views(next, stops));
        preview(next);
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
        views = Optional.empty();
        inView = Optional.empty();
        joined = Optional.empty();
        view = View.ALL;
        history.clear();
        place = start(stops);
        record.show(Optional.empty());
        list.show(ListContent.NOTHING, Optional.empty());
        strip.setVisible(false);
        say(List.of());
        showCard("first");
        showStatus();
    }

    /** Asks what an archive is founded with. */
    void askToFound() {
        say(List.of());
        showCard("found");
        founding.focusFirst();
    }

    private void leaveFounding() {
        showCard(archive.isPresent() ? "records" : "first");
        focusRows();
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

    /** While the graph is still being read: counts, and the first page of the last stop that has records. */
    private void preview(Archive open) {
        if (open.graphReady()) {
            return;
        }
        runner.run("preview", work -> ChainState.counted(open, stops), counted -> {
            if (register.isEmpty()) {
                int filled = filled(i -> counted.stops().get(i).count());
                place = place.at(filled, Question.all(stops.all().get(filled).kind()));
                strip.show(counted, filled);
                runner.run(
                        "list",
                        work -> ReadList.preview(open, stops, place.question()),
                        content -> list.show(content, Optional.empty()));
            }
        });
    }

    /** Reads what is new, as after a commit. */
    void refresh() {
        View wanted = view;
        archive.ifPresent(open -> views.ifPresent(all -> runner.run(
                "register",
                work -> all.of(
                        register.isPresent() ? register.get().newer(open, stops) : Register.read(open, stops), wanted),
                this::arrived)));
    }

    private void arrived(InView next) {
        if (!next.view().equals(view)) {
            refresh();
            return;
        }
        boolean first = register.isEmpty();
        register = Optional.of(next.register());
        joined = archive.map(open -> new Joined(open, next.register()));
        shown(next);
        say(List.of());
        if (first && place.inHand().isEmpty()) {
            int filled = filled(i -> next.current(stops.all().get(i).kind()));
            place = place.at(filled, Question.all(stops.all().get(filled).kind()));
        }
        ask(place.question());
        place.inHand().ifPresent(this::read);
        if (first && card.equals("records")) {
            list.focusRows();
        }
        sheet.ifPresent(DeskSheet::recorded);
        toOpen.filter(one -> next.register().kind(one).isPresent()).ifPresent(this::open);
        if (first) {
            stages.all().forEach(stage -> stage.opened(hand));
        }
        showStatus();
    }

    private void shown(InView next) {
        inView = Optional.of(next);
        strip.inView(next.name(), next.detail());
        showTicks();
    }

    /** Ticks of what is in view, where there is room for them and they are not there yet. */
    private void showTicks() {
        if (strip.wide() && !ticked.equals(inView)) {
            ticked = inView;
            views.ifPresent(all -> inView.ifPresent(now -> runner.run("ticks", work -> all.ticks(now), strip::ticks)));
        }
    }

    /** The stops of the strip. */
    Stops stops() {
        return stops;
    }

    /** What is in view. */
    View view() {
        return view;
    }

    /** Views of the open archive. */
    Optional<Views> views() {
        return views;
    }

    /** Brings something else in view: strip, list and thread follow. */
    void view(View next) {
        if (archive.isEmpty() || register.isEmpty()) {
            return;
        }
        view = next;
        Register known = register.get();
        views.ifPresent(all -> runner.run("view", work -> all.of(known, next), now -> {
            if (now.view().equals(view)) {
                shown(now);
                showViewed();
            }
        }));
    }

    /** Stays at the open stop if it has something in view, else goes to the last one that has. */
    private void showViewed() {
        InView now = inView.orElseThrow();
        String kind = stops.all().get(place.stop()).kind();
        int stop = now.current(kind) > 0
                ? place.stop()
                : filled(i -> now.current(stops.all().get(i).kind()));
        place = place.at(stop, Question.all(stops.all().get(stop).kind()));
        showCard("records");
        ask(place.question());
        list.focusRows();
    }

    /** The last stop that has records: figures where there are any. */
    private int filled(java.util.function.IntUnaryOperator count) {
        for (int i = stops.all().size() - 1; i >= 0; i--) {
            if (count.applyAsInt(i) > 0) {
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
        List<String> columns = columns(question.kind());
        reading((reader, work) -> reader.read(question, columns, work), "list", this::listArrived);
    }

    private interface Reading<T> {
        T read(ReadList reader, fringekeep.archive.problem.Work work)
                throws fringekeep.archive.problem.ProblemException, fringekeep.archive.problem.StoppedException;
    }

    /** Runs a job over what is in view now. */
    private <T> void reading(Reading<T> job, String where, java.util.function.Consumer<T> done) {
        archive.ifPresent(open -> inView.ifPresent(now -> joined.ifPresent(rows ->
                runner.run(where, work -> job.read(new ReadList(open, now, stops, rows), work), done))));
    }

    private List<String> columns(String kind) {
        return memory.get("columns " + kind)
                .filter(text -> !text.isBlank())
                .map(text -> List.of(text.split(",")))
                .orElse(List.of());
    }

    private void listArrived(ListContent content) {
        reading(
                (reader, work) -> reader.furtherWords(content, work),
                "list words",
                more -> more.ifPresent(list::words));
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
        archive.ifPresent(open -> joined.ifPresent(rows ->
                runner.run("record", work -> new ReadRecord(open, rows.register(), stops, rows).read(next), page -> {
                    record.show(page);
                    panes.retie();
                })));
    }

    private void showChain() {
        archive.ifPresent(open -> inView.ifPresent(now -> runner.run(
                "chain",
                work -> ChainState.of(open, now, stops, place.inHand()),
                state -> strip.show(state, place.stop()))));
    }

    /** Opens a record: its stop, its list, its pane. */
    void open(Hash next) {
        if (register.isPresent() && register.get().kind(next).isEmpty()) {
            toOpen = Optional.of(next); // recorded just now: the register is still being read
            return;
        }
        toOpen = Optional.empty();
        remember();
        if (inView.filter(now -> !now.contains(next)).isPresent()) {
            view(View.ALL);
        }
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
        Question linked = Question.linkedWith(stops.all().get(stop).kind(), place.inHand());
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

    /** Works out by how much the record in hand would move, and says it behind its state. */
    void sizeOfChange() {
        Optional<Hash> wanted = place.inHand();
        Optional<SizeOfChange> size = Optional.ofNullable(Lookup.getDefault().lookup(SizeOfChange.class));
        if (wanted.isEmpty() || size.isEmpty() || archive.isEmpty()) {
            return;
        }
        Archive open = archive.get();
        record.size(wanted.get(), TEXTS.of("size.working"));
        runner.run(
                "size of change",
                work -> size.get().sentence(open, wanted.get(), work),
                words -> record.size(wanted.get(), words),
                problems -> {
                    record.size(wanted.get(), "");
                    say(problems);
                });
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
        trouble = List.copyOf(problems);
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

    /** Looks for a number, and if there is none, for words: what they find is in view then. */
    void find(String words) {
        if (words.isBlank()) {
            view(View.ALL);
            return;
        }
        archive.ifPresent(open -> runner.run(
                "find", work -> open.find(words), this::open, problems -> view(new View.Found(words.strip()))));
    }

    /** Opens the choice of what is in view. */
    void chooseView() {
        archive.ifPresent(open -> show(new ViewSheet(this, hand)));
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
            case "records" -> {
                if (list.table().isFocusOwner()) {
                    list.clearMarks();
                }
                list.focusRows();
            }
            case "found" -> founding.focusFirst();
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
                : List.of(strip::focusOpen, list::focusRows, record::focusPage, record::focusLine);
        int now = isIn(focus, strip) ? 0 : record.lineFocused() ? 3 : isIn(focus, record) ? 2 : 1;
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
                    if (card.equals("records") && list.markedCount() > 1) {
                        left.add(TEXTS.of("status.marked", NumberText.count(list.markedCount())));
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

    /** What is said to be wrong. */
    public List<Problem> trouble() {
        return trouble;
    }

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
            ask(Question.in(stops.all().get(stop).kind(), state));
        }

        @Override
        public void linked(int stop) {
            openLinked(stop);
        }

        @Override
        public void chooseView() {
            Desk.this.chooseView();
        }

        @Override
        public void find(String words) {
            Desk.this.find(words);
        }
    }

    /** What a person does in the list. */
    private final class RowsEar implements ListEar {
        @Override
        public void select(Hash next) {
            Desk.this.select(next);
        }

        @Override
        public void marked() {
            showStatus();
        }

        @Override
        public void enter() {
            enterRecord();
        }

        @Override
        public void ask(Question question) {
            Desk.this.ask(question);
        }

        @Override
        public void page(PagedRows rows, int page) {
            runner.run(
                    "list page", work -> rows.read(page, work), lines -> list.arrived(rows, page, lines), problems -> {
                        list.arrived(rows, page, List.of());
                        say(problems);
                    });
        }

        @Override
        public void copy(ListContent content, List<Hash> records) {
            reading((reader, work) -> reader.table(content, records, work), "copy", text -> {
                java.awt.Toolkit.getDefaultToolkit()
                        .getSystemClipboard()
                        .setContents(new java.awt.datatransfer.StringSelection(text), null);
                done(TEXTS.of("copied", NumberText.count(records.size())));
            });
        }

        @Override
        public void columns(String kind, List<String> columns) {
            memory.put("columns " + kind, String.join(",", columns));
            Desk.this.ask(place.question());
        }

        @Override
        public List<ListContent.Head> offered(String kind) {
            return archive.map(open -> ReadList.offered(open, stops, kind)).orElse(List.of());
        }
    }

    /** What a person does with the record in hand. */
    private final class RecordEar implements PaneEar {
        private final DeskHost host;

        RecordEar(DeskHost host) {
            this.host = host;
        }

        @Override
        public List<PageAction> actions() {
            return pageActions();
        }

        @Override
        public void follow(List<Hash> records) {
            Desk.this.follow(records);
        }

        @Override
        public void save(fringekeep.drawing.Picture picture) {
            host.save(picture);
        }

        @Override
        public void save(RecordPage.Attached file) {
            new AttachedFiles(hand).save(file);
        }

        @Override
        public void open(RecordPage.Attached file) {
            new AttachedFiles(hand).open(file);
        }
    }
}
