package fringekeep.drawing;

import static org.assertj.core.api.Assertions.assertThat;

import java.awt.event.ActionEvent;
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
