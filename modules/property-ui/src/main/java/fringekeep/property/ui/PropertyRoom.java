package fringekeep.property.ui;

import fringekeep.desk.look.Ink;
import fringekeep.desk.part.SheetHead;
import fringekeep.desk.part.WordButton;
import fringekeep.desk.part.WordChoice;
import fringekeep.drawing.PictureView;
import java.awt.Graphics;
import java.util.List;
import java.util.Optional;
import javax.swing.JComponent;
import javax.swing.JScrollPane;
import javax.swing.LayoutFocusTraversalPolicy;

/** Where everything of the sheet lies. */
@SuppressWarnings("serial")
final class PropertyRoom extends JComponent {
    private static final int MARGIN = 16;
    private static final int GAP = 24;
    private static final int BUTTON = 26;

    private final SheetHead head;
    private final WordChoice pane;
    private final JScrollPane left;
    private final WordChoice leave;
    private final SidePanel side;
    private final AnswerPanel answer;
    private final transient List<WordButton> buttons;
    private transient Optional<PictureView> plot = Optional.empty();
    private int column;

    PropertyRoom(
            SheetHead head,
            WordChoice pane,
            JScrollPane left,
            WordChoice leave,
            SidePanel side,
            AnswerPanel answer,
            List<WordButton> buttons) {
        this.head = head;
        this.pane = pane;
        this.left = left;
        this.leave = leave;
        this.side = side;
        this.answer = answer;
        this.buttons = List.copyOf(buttons);
        setName("property");
        setFocusCycleRoot(true);
        setFocusTraversalPolicy(new LayoutFocusTraversalPolicy());
        for (JComponent each : List.of(head, pane, left, leave, side, answer)) {
            add(each);
        }
        buttons.forEach(this::add);
    }

    void plot(PictureView view) {
        plot.ifPresent(this::remove);
        plot = Optional.of(view);
        add(view);
    }

    @Override
    public void doLayout() {
        int height = getHeight();
        column = Math.max(340, Math.min(460, (int) (getWidth() * 0.29)));
        int foot = height - MARGIN - BUTTON;
        pane.setBounds(MARGIN, 12, column, WordChoice.ROW);
        int leaving = leave.isVisible() ? leave.heightIn(column) + 8 : 0;
        left.setBounds(MARGIN, 46, column, height - MARGIN - 46 - leaving);
        leave.setBounds(MARGIN, height - MARGIN - leaving + 8, column, Math.max(0, leaving - 8));
        int x = MARGIN + column + GAP;
        int width = getWidth() - x - MARGIN;
        head.setBounds(x, 0, width, SheetHead.HEIGHT);
        int below = Math.min(answer.height(), (int) (height * 0.5));
        int top = SheetHead.HEIGHT + 4;
        int tall = Math.max(80, foot - 12 - below - top);
        int beside = SidePanel.WIDTH;
        plot.ifPresent(view -> view.setBounds(x, top, width - beside - GAP, tall));
        side.setBounds(x + width - beside, top, beside, tall);
        answer.setBounds(x, top + tall + 8, width, below);
        int right = getWidth() - MARGIN;
        for (int i = buttons.size() - 1; i >= 0; i--) {
            WordButton button = buttons.get(i);
            int wide = button.getPreferredSize().width;
            button.setBounds(right - wide, foot, wide, BUTTON);
            right -= button.isVisible() ? wide + 12 : 0;
        }
    }

    @Override
    protected void paintComponent(Graphics graphics) {
        graphics.setColor(Ink.SHEET.color());
        graphics.fillRect(0, 0, getWidth(), getHeight());
        graphics.setColor(Ink.HAIR.color());
        graphics.fillRect(MARGIN + column + GAP / 2, 0, 1, getHeight());
    }
}
