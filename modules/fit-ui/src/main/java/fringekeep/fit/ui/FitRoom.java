package fringekeep.fit.ui;

import fringekeep.desk.look.Ink;
import fringekeep.desk.part.SheetHead;
import fringekeep.desk.part.WordButton;
import fringekeep.desk.part.WordChoice;
import fringekeep.drawing.PictureView;
import java.awt.Graphics;
import java.util.Optional;
import javax.swing.JComponent;
import javax.swing.JScrollPane;

/** Where everything of the sheet lies: fringe and numbers at the left, fits and masks below them, choices at the right. */
@SuppressWarnings("serial")
final class FitRoom extends JComponent {
    private static final int MARGIN = 16;
    private static final int GAP = 24;
    private static final int BUTTON = 26;

    private final SheetHead head;
    private final ResultPanel result;
    private final MaskPanel masks;
    private final FitsPanel others;
    private final WordChoice prefer;
    private final JScrollPane choices;
    private final WordButton record;
    private transient Optional<PictureView> fringe = Optional.empty();

    FitRoom(
            SheetHead head,
            ResultPanel result,
            MaskPanel masks,
            FitsPanel others,
            WordChoice prefer,
            JScrollPane choices,
            WordButton record) {
        this.head = head;
        this.result = result;
        this.masks = masks;
        this.others = others;
        this.prefer = prefer;
        this.choices = choices;
        this.record = record;
        setName("fit-by-hand");
        setFocusCycleRoot(true);
        setFocusTraversalPolicy(new javax.swing.LayoutFocusTraversalPolicy());
        add(head);
        add(result);
        add(masks);
        add(others);
        add(prefer);
        add(choices);
        add(record);
    }

    void fringe(PictureView view) {
        fringe.ifPresent(this::remove);
        fringe = Optional.of(view);
        add(view, 0);
    }

    @Override
    public void doLayout() {
        int width = getWidth() - 2 * MARGIN;
        int right = Math.max(340, Math.min(460, (int) (width * 0.3)));
        int left = width - right - GAP;
        int foot = getHeight() - MARGIN - BUTTON;
        head.setBounds(MARGIN, 0, left, SheetHead.HEIGHT);
        choices.setBounds(MARGIN + left + GAP, 10, right, foot - 22);
        record.setBounds(
                getWidth() - MARGIN - record.getPreferredSize().width, foot, record.getPreferredSize().width, BUTTON);
        int maskWidth = Math.min(340, (int) (left * 0.38));
        int below = below(maskWidth);
        int top = SheetHead.HEIGHT + 4;
        int plot = getHeight() - MARGIN - below - top;
        int numbers = Math.min(ResultPanel.WIDTH, left / 3);
        fringe.ifPresent(view -> view.setBounds(MARGIN, top, left - numbers - GAP, plot));
        result.setBounds(MARGIN + left - numbers, top, numbers, Math.min(plot, result.getPreferredSize().height));
        int y = top + plot + 10;
        masks.setBounds(MARGIN, y, maskWidth, getHeight() - MARGIN - y);
        int othersWidth = left - maskWidth - GAP;
        int tall = Math.min(others.getPreferredSize().height, getHeight() - MARGIN - y - (prefer.isVisible() ? 46 : 0));
        others.setBounds(MARGIN + maskWidth + GAP, y, othersWidth, tall);
        prefer.setBounds(MARGIN + maskWidth + GAP, y + tall + 2, othersWidth, prefer.heightIn(othersWidth));
    }

    /** Room below the plot: what masks and fits need, within a third of all. */
    private int below(int maskWidth) {
        int fits = others.getPreferredSize().height + (prefer.isVisible() ? 48 : 0);
        int wanted = Math.max(Math.max(masks.heightIn(maskWidth), fits), 112) + 12;
        return Math.min(wanted, (int) (getHeight() * 0.36));
    }

    @Override
    protected void paintComponent(Graphics graphics) {
        graphics.setColor(Ink.SHEET.color());
        graphics.fillRect(0, 0, getWidth(), getHeight());
        graphics.setColor(Ink.HAIR.color());
        int x = choices.getX() - GAP / 2;
        graphics.fillRect(x, 0, 1, getHeight());
    }
}
