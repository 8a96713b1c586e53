package fringekeep.figure.ui;

import fringekeep.archive.Archive;
import fringekeep.archive.NewRecord;
import fringekeep.archive.json.Json;
import fringekeep.archive.json.JsonObject;
import fringekeep.archive.problem.Problem;
import fringekeep.archive.problem.ProblemException;
import fringekeep.archive.problem.StoppedException;
import fringekeep.archive.problem.Work;
import fringekeep.desk.look.Ink;
import fringekeep.desk.look.Painted;
import fringekeep.desk.look.Pen;
import fringekeep.desk.look.Texts;
import fringekeep.desk.look.Type;
import fringekeep.desk.part.WordButton;
import fringekeep.desk.stage.DeskHand;
import fringekeep.desk.stage.DeskSheet;
import fringekeep.drawing.Picture;
import fringekeep.drawing.PictureView;
import fringekeep.figure.FigurePreview;
import java.awt.Graphics;
import java.awt.event.ActionEvent;
import java.util.ArrayList;
import java.util.HashSet;
import java.util.List;
import java.util.Optional;
import java.util.Set;
import javax.swing.AbstractAction;
import javax.swing.JComponent;
import javax.swing.JMenuItem;
import javax.swing.JPopupMenu;
import javax.swing.KeyStroke;

/** A figure being made: its choices as lines at the left, what they draw at the right, recorded when it is as wanted. */
public final class FigureSheet implements DeskSheet {
    private static final Texts TEXTS = new Texts("fringekeep.figure.ui.Texts", FigureSheet.class);
    private static final String JOB = "figure preview";
    private static final int LEFT = 452;

    private final DeskHand hand;
    private final FigureDraft draft;
    private final Room room = new Room();
    private final FigureOutline outline;
    private final WordButton record = WordButton.low(TEXTS.of("record"), 'R', true);
    private final WordButton undo = WordButton.low(TEXTS.of("undo"), 'U', false);
    private final WordButton addSeries = WordButton.low(TEXTS.of("add.series"), 's', false);
    private final WordButton addPanel = WordButton.low(TEXTS.of("add.panel"), 'p', false);
    private final WordButton remove = WordButton.low(TEXTS.of("remove"), 'm', false);
    private Optional<PictureView> view = Optional.empty();
    private String sentence = "";
    private boolean recording;

    FigureSheet(DeskHand hand, FigureDraft draft) {
        this.hand = hand;
        this.draft = draft;
        this.outline = new FigureOutline(draft, this::preview, this::say);
        record.setName("record figure");
        record.addActionListener(event -> recordIt());
        undo.addActionListener(event -> undone(draft.undo()));
        addSeries.addActionListener(event -> offerSeries());
        addPanel.addActionListener(event -> newPanel());
        remove.addActionListener(event -> removeSelected());
        for (JComponent part : List.of(outline, record, undo, addSeries, addPanel, remove)) {
            room.add(part);
        }
        key("ctrl ENTER", this::recordIt);
        key("ctrl Z", () -> undone(draft.undo()));
        key("ctrl shift Z", () -> undone(draft.redo()));
        key("F2", outline::nextHead);
        preview();
    }

    private void key(String stroke, Runnable work) {
        room.getInputMap(JComponent.WHEN_ANCESTOR_OF_FOCUSED_COMPONENT).put(KeyStroke.getKeyStroke(stroke), stroke);
        room.getActionMap().put(stroke, new AbstractAction() {
            @Override
            public void actionPerformed(ActionEvent event) {
                work.run();
            }
        });
    }

    private void say(String words) {
        sentence = words;
        room.repaint();
    }

    private void undone(boolean something) {
        if (something) {
            outline.again();
            preview();
        }
    }

    // ---- what it draws

    private void preview() {
        Archive archive = hand.archive();
        NewRecord request = draft.request(Optional.empty());
        hand.run(JOB, work -> draw(archive, request, work), this::drawn, this::faulty);
    }

    private static Picture draw(Archive archive, NewRecord request, Work work)
            throws ProblemException, StoppedException {
        return FigurePreview.of(archive.compute(request, List.of(), work));
    }

    private void drawn(Picture picture) {
        say("");
        outline.faults(Set.of());
        if (view.isPresent()) {
            view.get().show(picture);
        } else {
            PictureView first = new PictureView(picture, Ink::theme, hand::save);
            first.setName("figure preview");
            view = Optional.of(first);
            room.add(first);
            room.revalidate();
        }
        room.repaint();
    }

    private void faulty(List<Problem> problems) {
        Set<String> pointers = new HashSet<>();
        for (Problem problem : problems) {
            pointers.add(problem.where().replaceFirst("^/choices", ""));
        }
        outline.faults(pointers);
        Problem first = problems.get(0);
        say(first.what() + " " + first.mend());
    }

    // ---- panels and series

    private String panelPointer() {
        String at = outline.selected().map(FigureField::pointer).orElse("/panels/0");
        String[] steps = at.split("/");
        return steps.length > 2 && steps[1].equals("panels") ? "/panels/" + steps[2] : "/panels/0";
    }

    private List<Json> items(String pointer) {
        return draft.get(pointer)
                .filter(fringekeep.archive.json.JsonArray.class::isInstance)
                .map(array -> new ArrayList<>(((fringekeep.archive.json.JsonArray) array).items()))
                .orElseGet(ArrayList::new);
    }

    private void offerSeries() {
        JPopupMenu menu = new JPopupMenu();
        for (int i = 0; i < draft.sources().size(); i++) {
            FigureDraft.Source source = draft.sources().get(i);
            int input = i;
            List<String> offers = new ArrayList<>(source.offers());
            offers.add("value");
            for (String name : offers) {
                JMenuItem item = new JMenuItem(source.label() + ": " + name);
                item.addActionListener(event -> newSeries(input, name));
                menu.add(item);
            }
        }
        menu.show(addSeries, 0, -menu.getPreferredSize().height);
    }

    private void newSeries(int input, String name) {
        String at = panelPointer() + "/series";
        List<Json> series = items(at);
        series.add(JsonObject.EMPTY.with("input", input).with("series", name).with("tone", "ink"));
        draft.setList(at, series);
        outline.again();
        preview();
    }

    private void newPanel() {
        List<Json> panels = items("/panels");
        JsonObject like = (JsonObject) draft.get(panelPointer()).orElseThrow();
        Set<String> names = new HashSet<>();
        draft.choices()
                .array("panels")
                .objects()
                .forEach(one -> one.text("name").ifPresent(names::add));
        char name = 'a';
        while (names.contains(String.valueOf(name)) && name < 'z') {
            name++;
        }
        panels.add(like.with("name", String.valueOf(name)));
        draft.setList("/panels", panels);
        outline.again();
        preview();
    }

    /** Takes away the series or panel the person is in; the last of each stays. */
    private void removeSelected() {
        String at = outline.selected().map(FigureField::pointer).orElse("");
        String[] steps = at.split("/");
        boolean series = steps.length > 4 && steps[3].equals("series");
        if (steps.length < 3 || !steps[1].equals("panels")) {
            say(TEXTS.of("remove.what"));
            return;
        }
        String list = series ? "/panels/" + steps[2] + "/series" : "/panels";
        List<Json> items = items(list);
        if (items.size() < 2) {
            say(TEXTS.of("remove.last"));
            return;
        }
        items.remove(Integer.parseInt(series ? steps[4] : steps[2]));
        draft.setList(list, items);
        outline.again();
        preview();
    }

    // ---- recording

    private void recordIt() {
        if (outline.table().isEditing()) {
            outline.table().getCellEditor().stopCellEditing();
        }
        if (recording) {
            return;
        }
        hand.person(person -> {
            recording = true;
            Archive archive = hand.archive();
            NewRecord request = draft.request(Optional.of(person));
            hand.run(
                    "figure record",
                    work -> archive.record(archive.compute(request, List.of(), work)),
                    recorded -> {
                        recording = false;
                        hand.done(TEXTS.of("recorded", recorded.label()));
                        hand.open(recorded.fingerprint());
                    },
                    problems -> {
                        recording = false;
                        faulty(problems);
                    });
        });
    }

    /** What the draft is; for tests. */
    JsonObject choices() {
        return draft.choices();
    }

    @Override
    public String name() {
        return "figure";
    }

    @Override
    public JComponent component() {
        return room;
    }

    @Override
    public void focusFirst() {
        outline.focusLines();
    }

    @Override
    public List<Runnable> panes() {
        return List.of(outline::focusLines, () -> view.ifPresent(JComponent::requestFocusInWindow));
    }

    @Override
    public List<String> hints() {
        return List.of(TEXTS.of("hint"));
    }

    @Override
    public void left() {
        hand.stop(JOB);
    }

    /** Title above, lines left, drawing right, what can be done below. */
    @SuppressWarnings("serial")
    private final class Room extends Painted {
        Room() {
            setOpaque(true);
        }

        @Override
        public void doLayout() {
            int left = getWidth() > 1700 ? 620 : LEFT;
            int foot = getHeight() - 46;
            outline.setBounds(16, 50, left, Math.max(60, foot - 62));
            int x = 16;
            for (WordButton button : List.of(addSeries, addPanel, remove, undo)) {
                button.setBounds(x, foot, button.getPreferredSize().width, 28);
                x += button.getWidth() + 8;
            }
            record.setBounds(
                    getWidth() - 16 - record.getPreferredSize().width, foot, record.getPreferredSize().width, 28);
            view.ifPresent(one -> {
                Picture picture = one.picture();
                int width = getWidth() - left - 64;
                int high = foot - 70;
                double tall = width * picture.heightMillimetres() / picture.widthMillimetres();
                if (tall > high) {
                    one.setBounds(left + 48, 50, (int) (width * high / tall), high);
                } else {
                    one.setBounds(left + 48, 50, width, (int) tall);
                }
            });
        }

        @Override
        protected void paintComponent(Graphics graphics) {
            try (Pen pen = new Pen(graphics)) {
                pen.fill(Ink.SHEET.color(), 0, 0, getWidth(), getHeight());
                String title = TEXTS.of(draft.corrects().isPresent() ? "draft.next" : "draft");
                double end = pen.text(title, Type.TITLE, Ink.INK, 16, 29);
                pen.fitted(
                        sentence.isEmpty() ? TEXTS.of("nothing.recorded") : sentence,
                        Type.BODY,
                        sentence.isEmpty() ? Ink.INK2 : Ink.INK,
                        end + 14,
                        29,
                        getWidth() - end - 40);
                pen.level(Ink.RULE, 16, 16.0 + outline.getWidth(), 48);
                pen.level(Ink.HAIR, 16, getWidth() - 16.0, getHeight() - 58.0);
            }
        }
    }
}
