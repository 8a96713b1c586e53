package fringekeep.fit.ui;

import fringekeep.archive.json.Json;
import fringekeep.archive.problem.ProblemException;
import fringekeep.archive.quantity.Unit;
import fringekeep.archive.quantity.Units;
import fringekeep.desk.look.Ink;
import fringekeep.desk.look.Painted;
import fringekeep.desk.look.Pen;
import fringekeep.desk.look.Type;
import fringekeep.desk.part.FieldRow;
import fringekeep.desk.part.WordChoice;
import fringekeep.desk.part.WordChoice.Word;
import fringekeep.drawing.NumberText;
import java.awt.Dimension;
import java.awt.Graphics;
import java.awt.Rectangle;
import java.math.BigDecimal;
import java.util.ArrayList;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import java.util.OptionalDouble;
import java.util.function.BooleanSupplier;
import java.util.function.UnaryOperator;
import javax.swing.JComponent;
import javax.swing.Scrollable;

/** All choices of a fit as rows of words and fields under heads; each says what is usual. */
@SuppressWarnings("serial")
final class ChoicesPanel extends Painted implements Scrollable {
    static final int INDENT = 118;
    private static final int HEAD = 30;

    private final transient Hand hand;
    private final transient List<Entry> entries = new ArrayList<>();
    private final transient Map<String, Integer> heads = new LinkedHashMap<>();

    /** What the rows speak to. */
    interface Hand {
        /** The plan now. */
        FitPlan plan();

        /** Changes the plan. */
        void change(UnaryOperator<FitPlan> how);

        /** Looks records up by what people write, away from the window thread, and puts them into the plan. */
        void scans(String role, String written, FieldRow row);
    }

    private record Entry(String head, JComponent row, BooleanSupplier seen, Runnable refresh) {}

    /**
     * All rows.
     *
     * @param channels channels that can be fitted
     * @param axes axes along which a fringe may run
     * @param rivals whether another fit answers the same question
     */
    ChoicesPanel(Hand hand, List<String> channels, List<String> axes, boolean rivals) {
        this.hand = hand;
        setName("fit.choices");
        scans(channels, axes);
        model();
        range();
        counts();
        uncertainty();
        if (rivals) {
            end();
        }
        refresh();
    }

    private void scans(List<String> channels, List<String> axes) {
        String head = "scans";
        if (hand.plan().scans().size() > 1) {
            words(head, "combine", "sum", () -> true, "sum", "sum-after-phase", "joint");
        }
        if (channels.size() > 1) {
            WordChoice choice = new WordChoice(
                    "fit.channel",
                    text("channel"),
                    plain(channels),
                    channels.get(0),
                    INDENT,
                    code -> hand.change(plan -> plan.channel(code)));
            add(head, choice, () -> true, () -> choice.show(hand.plan().channel()));
        }
        if (axes.size() > 1) {
            WordChoice choice = choice("axis", plain(axes), axes.get(0));
            add(
                    head,
                    choice,
                    () -> true,
                    () -> choice.show(hand.plan().text("axis").orElse(axes.get(0))));
        }
        records(head, "references");
        records(head, "backgrounds");
        words(head, "references", "none", () -> !hand.plan().references().isEmpty(), "none", "normalised");
    }

    private static List<Word> plain(List<String> names) {
        return names.stream().map(name -> new Word(name, name)).toList();
    }

    private void records(String head, String role) {
        FieldRow[] self = new FieldRow[1];
        self[0] = FieldRow.any(
                "fit." + role + ".scans",
                text(role + ".scans"),
                text("scans.hint"),
                INDENT,
                written -> hand.scans(role, written, self[0]));
        add(head, self[0], () -> true, () -> {});
    }

    private void model() {
        String head = "curve";
        words(
                head,
                "method",
                "fringe.poisson-likelihood/1",
                () -> true,
                "fringe.poisson-likelihood/1",
                "fringe.weighted/1",
                "fringe.unweighted/1");
        WordChoice drift = new WordChoice(
                "fit.driftOrder",
                text("driftOrder"),
                FitWords.words("driftOrder", "0", "1", "2"),
                "0",
                INDENT,
                code -> hand.change(plan -> plan.with(
                        "driftOrder",
                        code.equals("0") ? Optional.empty() : Optional.of(Json.of(Integer.parseInt(code))))));
        add(
                head,
                drift,
                () -> true,
                () -> drift.show(
                        NumberText.count((long) hand.plan().number("driftOrder").orElse(0))));
        words(head, "period.sort", "fixed", () -> true, "fixed", "free");
        words(head, "period.from", "setup", () -> true, "setup", "given");
        number(head, "period.si", "nm", () -> is("period.from", "given"));
        number(head, "period.u", "nm", () -> is("period.from", "given") && !is("period.sort", "free"));
        flag(head, "phaseDrift");
        flag(head, "secondHarmonic");
    }

    private void range() {
        String head = "range";
        number(head, "range.from", "nm", () -> true);
        number(head, "range.to", "nm", () -> true);
        WordChoice positions = choice("positions", FitWords.words("positions", "calibrated", "as-read"), "calibrated");
        add(
                head,
                positions,
                () -> true,
                () -> positions.show(hand.plan().text("positions").orElse("calibrated")));
    }

    private void counts() {
        String head = "counts";
        words(head, "background.sort", "none", () -> true, "none", "known", "channel", "scan");
        number(head, "background.si", "1", () -> is("background.sort", "known"));
        number(head, "background.u", "1", () -> is("background.sort", "known"));
        textField(head, "background.channel", () -> is("background.sort", "channel"));
        WordChoice joint = choice("background.joint", FitWords.words("flag", "no", "yes"), "no");
        add(
                head,
                joint,
                () -> is("background.sort", "channel") || is("background.sort", "scan"),
                () -> joint.show(flagged("background.joint")));
        words(head, "deadTime.sort", "none", () -> true, "none", "setup", "calibration", "given");
        number(head, "deadTime.si", "ns", () -> is("deadTime.sort", "given"));
        number(head, "deadTime.u", "ns", () -> is("deadTime.sort", "given"));
        words(
                head,
                "deadTime.model",
                "non-extending",
                () -> is("deadTime.sort", "given"),
                "non-extending",
                "extending");
    }

    private void uncertainty() {
        String head = "uncertainty";
        words(head, "covariance", "expected", () -> true, "expected", "observed", "scatter");
        words(head, "dispersion", "poisson", () -> true, "poisson", "scaled");
        number(head, "interval", "1", () -> true);
        number(head, "limit", "1", () -> true);
        number(head, "outlier", "1", () -> true);
    }

    private void end() {
        WordChoice again = new WordChoice(
                "fit.again",
                text("again"),
                FitWords.words("again", "no", "yes"),
                "no",
                INDENT,
                code -> hand.change(plan ->
                        plan.end(new FitPlan.End(code.equals("yes"), plan.end().preferred()))));
        add("end", again, () -> true, () -> again.show(hand.plan().end().again() ? "yes" : "no"));
        List<Word> reasons = new ArrayList<>(List.of(new Word("", text("preferred.no"))));
        FitWords.reasons(fringekeep.archive.judgement.Verdict.PREFERRED).stream()
                .filter(word -> !word.code().equals("other"))
                .forEach(reasons::add);
        WordChoice preferred = new WordChoice(
                "fit.preferred",
                text("preferred"),
                reasons,
                "",
                INDENT,
                code -> hand.change(plan -> plan.end(new FitPlan.End(plan.end().again(), code))));
        add(
                "end",
                preferred,
                () -> !hand.plan().end().again(),
                () -> preferred.show(hand.plan().end().preferred()));
    }

    private static String text(String key) {
        return FitWords.TEXTS.of("choice." + key);
    }

    private boolean is(String path, String code) {
        return hand.plan().text(path).equals(Optional.of(code));
    }

    private WordChoice choice(String path, List<Word> words, String usual) {
        return new WordChoice(
                "fit." + path,
                text(path),
                words,
                usual,
                INDENT,
                code -> hand.change(plan -> chosen(plan, path, code, usual)));
    }

    private static FitPlan chosen(FitPlan plan, String path, String code, String usual) {
        boolean flag = code.equals("yes") || code.equals("no");
        Json value = flag ? Json.of(code.equals("yes")) : Json.of(code);
        boolean owner = path.endsWith(".sort") || path.equals("period.from");
        FitPlan cleared = owner ? without(plan, path) : plan;
        return cleared.with(path, code.equals(usual) ? Optional.empty() : Optional.of(value));
    }

    /** What only another sort asks for is taken away with it. */
    private static FitPlan without(FitPlan plan, String path) {
        String owner = path.substring(0, path.indexOf('.'));
        FitPlan left = plan.with(owner + ".si", Optional.empty()).with(owner + ".u", Optional.empty());
        return owner.equals("period")
                ? left
                : left.with(owner + ".channel", Optional.empty())
                        .with(owner + ".model", Optional.empty())
                        .with(owner + ".joint", Optional.empty());
    }

    private void words(String head, String path, String usual, BooleanSupplier seen, String... codes) {
        WordChoice choice = choice(path, FitWords.words(path, codes), usual);
        add(head, choice, seen, () -> choice.show(hand.plan().text(path).orElse(usual)));
    }

    private void flag(String head, String path) {
        WordChoice choice = choice(path, FitWords.words("flag", "no", "yes"), "no");
        add(head, choice, () -> true, () -> choice.show(flagged(path)));
    }

    private String flagged(String path) {
        int dot = path.indexOf('.');
        Optional<Boolean> flag = dot < 0
                ? hand.plan().choices().flag(path)
                : hand.plan()
                        .choices()
                        .object(path.substring(0, dot))
                        .flatMap(inner -> inner.flag(path.substring(dot + 1)));
        return flag.orElse(false) ? "yes" : "no";
    }

    private void textField(String head, String path, BooleanSupplier seen) {
        FieldRow row = FieldRow.any(
                "fit." + path,
                text(path),
                "",
                INDENT,
                written -> hand.change(
                        plan -> plan.with(path, written.isEmpty() ? Optional.empty() : Optional.of(Json.of(written)))));
        add(head, row, seen, () -> row.show(hand.plan().text(path).orElse("")));
    }

    private void number(String head, String path, String unit, BooleanSupplier seen) {
        Unit shown = Units.of(unit);
        FieldRow row = new FieldRow("fit." + path, text(path), text(path + ".hint"), INDENT, written -> {
            Optional<Double> value = read(written, shown);
            if (value.isEmpty() && !written.isEmpty()) {
                return FitWords.TEXTS.of("not-a-number", written);
            }
            hand.change(plan -> plan.with(path, value.map(Json::of)));
            return "";
        });
        add(head, row, seen, () -> row.show(shown(hand.plan().number(path), shown)));
    }

    /** A number, or a number with a unit. */
    private static Optional<Double> read(String written, Unit shown) {
        String text = written.replace('\u2212', '-').replace(',', '.').strip();
        int space = text.indexOf(' ');
        try {
            Unit unit =
                    space < 0 ? shown : Units.parse(text.substring(space + 1).strip());
            BigDecimal number = new BigDecimal(space < 0 ? text : text.substring(0, space));
            return unit.sameDimension(shown) ? Optional.of(unit.toSi(number)) : Optional.empty();
        } catch (NumberFormatException | ProblemException e) {
            return Optional.empty(); // the row says so
        }
    }

    private static String shown(OptionalDouble si, Unit unit) {
        return si.isEmpty()
                ? ""
                : NumberText.significant(unit.fromSi(si.getAsDouble()), 9).replace("\u2009", "");
    }

    private void add(String head, JComponent row, BooleanSupplier seen, Runnable refresh) {
        entries.add(new Entry(head, row, seen, refresh));
        add(row);
    }

    /** Shows the plan as it is now. */
    void refresh() {
        for (Entry entry : entries) {
            entry.refresh().run();
            entry.row().setVisible(entry.seen().getAsBoolean());
        }
        revalidate();
        repaint();
    }

    /** The row of that name. */
    Optional<JComponent> row(String name) {
        return entries.stream()
                .map(Entry::row)
                .filter(row -> name.equals(row.getName()) || (name + ".row").equals(row.getName()))
                .findFirst();
    }

    /** The first row that can have the focus. */
    Optional<JComponent> first() {
        return entries.stream()
                .map(Entry::row)
                .filter(row -> row instanceof WordChoice && row.isVisible())
                .findFirst();
    }

    private int lay(int width, boolean move) {
        String head = "";
        int y = -8;
        heads.clear();
        for (Entry entry : entries) {
            if (!entry.row().isVisible()) {
                continue;
            }
            if (!entry.head().equals(head)) {
                head = entry.head();
                heads.put(head, y);
                y += HEAD;
            }
            int tall = entry.row() instanceof WordChoice choice
                    ? choice.heightIn(width)
                    : entry.row().getPreferredSize().height;
            if (move) {
                entry.row().setBounds(2, y, width, tall);
            }
            y += tall;
        }
        return y + 8;
    }

    @Override
    public void doLayout() {
        lay(getWidth() - 6, true);
    }

    @Override
    public Dimension getPreferredSize() {
        int width = getParent() == null ? 360 : Math.max(200, getParent().getWidth());
        return new Dimension(width, lay(width - 6, false));
    }

    @Override
    protected void paintComponent(Graphics graphics) {
        try (Pen pen = new Pen(graphics)) {
            pen.fill(Ink.SHEET.color(), 0, 0, getWidth(), getHeight());
            heads.forEach((head, y) -> {
                pen.text(FitWords.TEXTS.of("head." + head), Type.GROUP, Ink.INK, 2, y + 22.0);
                pen.level(Ink.RULE, 2, getWidth() - 4.0, y + HEAD - 1.0);
            });
        }
    }

    @Override
    public Dimension getPreferredScrollableViewportSize() {
        return getPreferredSize();
    }

    @Override
    public int getScrollableUnitIncrement(Rectangle visible, int orientation, int direction) {
        return 22;
    }

    @Override
    public int getScrollableBlockIncrement(Rectangle visible, int orientation, int direction) {
        return Math.max(22, visible.height - 44);
    }

    @Override
    public boolean getScrollableTracksViewportWidth() {
        return true;
    }

    @Override
    public boolean getScrollableTracksViewportHeight() {
        return getParent() != null && getParent().getHeight() > getPreferredSize().height;
    }
}
