package fringekeep.drawing;

import static org.assertj.core.api.Assertions.assertThat;

import java.awt.Graphics2D;
import java.awt.event.ActionEvent;
import java.awt.event.MouseEvent;
import java.awt.image.BufferedImage;
import java.util.ArrayList;
import java.util.List;
import javax.swing.Action;
import javax.swing.KeyStroke;
import org.junit.jupiter.api.Test;

class PictureViewTest {
    private final List<Picture> saved = new ArrayList<>();
    private final PictureView view = new PictureView(Samples.fringe(), () -> Theme.LIGHT, saved::add);

    @Test
    void arrowsReadOutPointAfterPoint() {
        paint();
        press("RIGHT");
        press("RIGHT");

        assertThat(view.readoutWords()).startsWith("point 2: position of grating 3 26.6 nm, counts in 10 s ");
        assertThat(view.getAccessibleContext().getAccessibleDescription()).isEqualTo(view.readoutWords());
    }

    @Test
    void plusNarrowsTheAxisThatPanelsShareAndNoughtShowsAll() {
        paint();
        press("EQUALS");

        Axis zoomed = view.shown().panels().get(0).x();
        assertThat(zoomed.to().orElseThrow() - zoomed.from().orElseThrow()).isBetween(500.0, 650.0);
        assertThat(view.shown().panels().get(1).x()).isEqualTo(zoomed);

        press("0");
        assertThat(view.shown()).isSameAs(view.picture());
    }

    @Test
    void savesWhatIsShown() {
        paint();
        press("ctrl S");

        assertThat(saved).containsExactly(view.shown());
    }

    @Test
    void anotherPictureKeepsTheZoomAndThePointThatIsRead() {
        paint();
        press("RIGHT");
        press("RIGHT");
        press("EQUALS");
        Axis zoomed = view.shown().panels().get(0).x();

        view.show(Samples.fringe());

        assertThat(view.shown().panels().get(0).x()).isEqualTo(zoomed);
        assertThat(view.picked())
                .contains(new PictureView.Picked(0, view.picked().orElseThrow().layer(), 1));
        press("0");
        assertThat(view.shown()).isSameAs(view.picture());
    }

    @Test
    void handsTakeADragThatWouldZoom() {
        List<String> seen = new ArrayList<>();
        view.hands(new PictureView.Hands() {
            @Override
            public boolean down(MouseEvent event) {
                seen.add("down");
                return event.getX() > 300;
            }

            @Override
            public void drag(MouseEvent event) {
                seen.add("drag " + Math.rint(view.abscissa(0, event.getX())));
            }

            @Override
            public void up(MouseEvent event) {
                seen.add("up");
            }

            @Override
            public void over(Graphics2D g, Theme colours) {}
        });
        paint();
        double at = view.abscissa(0, 400);

        mouse(MouseEvent.MOUSE_PRESSED, 350, 200);
        mouse(MouseEvent.MOUSE_DRAGGED, 400, 250);
        mouse(MouseEvent.MOUSE_RELEASED, 400, 250);

        assertThat(seen).containsExactly("down", "drag " + Math.rint(at), "up");
        assertThat(view.shown()).isSameAs(view.picture());
        assertThat(view.placeOf(0, at)).isCloseTo(400, org.assertj.core.data.Offset.offset(1e-6));

        mouse(MouseEvent.MOUSE_PRESSED, 150, 100);
        mouse(MouseEvent.MOUSE_DRAGGED, 250, 200);
        mouse(MouseEvent.MOUSE_RELEASED, 250, 200);
        assertThat(view.shown()).isNotSameAs(view.picture());
    }

    private void mouse(int id, int x, int y) {
        view.dispatchEvent(new MouseEvent(view, id, 0, 0, x, y, 1, false, MouseEvent.BUTTON1));
    }

    @Test
    void hasAnAccessibleName() {
        assertThat(view.getAccessibleContext().getAccessibleName()).contains("counts in 10 s");
    }

    private void paint() {
        view.setSize(600, 400);
        view.paint(new BufferedImage(600, 400, BufferedImage.TYPE_INT_RGB).createGraphics());
    }

    private void press(String stroke) {
        Object name = view.getInputMap().get(KeyStroke.getKeyStroke(stroke));
        Action action = view.getActionMap().get(name);
        action.actionPerformed(new ActionEvent(view, ActionEvent.ACTION_PERFORMED, stroke));
    }
}
