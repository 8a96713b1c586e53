package fringekeep.fit.ui;

import static org.assertj.core.api.Assertions.assertThat;

import fringekeep.archive.json.Json;
import fringekeep.archive.problem.ProblemException;
import fringekeep.archive.record.Hash;
import fringekeep.desk.run.Runner;
import fringekeep.desk.stage.DeskSheet;
import java.awt.event.MouseEvent;
import java.awt.geom.Rectangle2D;
import java.awt.image.BufferedImage;
import java.nio.file.Path;
import java.util.HashSet;
import java.util.List;
import java.util.Optional;
import java.util.Set;
import org.junit.jupiter.api.AfterEach;
import org.junit.jupiter.api.BeforeEach;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.io.TempDir;

/** Sheets laid out and painted without a display, and the mouse on the fringe. */
class FitPaintingTest {
    @TempDir
    private Path folder;

    private SmallLab lab;

    @BeforeEach
    void found() throws ProblemException {
        lab = new SmallLab(folder);
    }

    @AfterEach
    void close() {
        lab.close();
    }

    private static int colours(DeskSheet sheet, int width, int height) {
        BufferedImage image = Painting.of(sheet.component(), width, height);
        Set<Integer> colours = new HashSet<>();
        for (int y = 0; y < height; y += 2) {
            for (int x = 0; x < width; x++) {
                colours.add(image.getRGB(x, y));
            }
        }
        return colours.size();
    }

    @Test
    void paintsFullFailingAndSlow() throws ProblemException {
        Hash scan = lab.scan(700);
        FitSheet sheet = new FitSheet(lab.desk(), List.of(scan));
        assertThat(colours(sheet, 1280, 658)).isGreaterThan(100);
        assertThat(colours(sheet, 2560, 1298)).isGreaterThan(100);

        sheet.change(plan -> plan.with("range.to", Optional.of(Json.of(4e-8))));
        assertThat(colours(sheet, 1280, 658)).isGreaterThan(100);

        FitSheet slow = new FitSheet(
                new QuietDesk(lab.archive, SmallLab.PERSON, new Runner(task -> {}, Runnable::run)), List.of(scan));
        assertThat(slow.state()).isEqualTo("the fit is being computed");
        assertThat(colours(slow, 1280, 658)).isGreaterThan(20);
        assertThat(colours(EachSheet.ofUnfitted(lab.desk()), 1280, 658)).isGreaterThan(50);
    }

    @Test
    void theEndsOfTheRangeAreDraggedAlongTheAxisAndAClickMasks() throws ProblemException {
        FitSheet sheet = new FitSheet(lab.desk(), List.of(lab.scan(700)));
        Painting.of(sheet.component(), 1280, 658);
        FringeView fringe = sheet.fringe().orElseThrow();
        Rectangle2D top = fringe.view().plot(0).orElseThrow();
        Rectangle2D foot = fringe.view().plot(1).orElseThrow();
        int axis = (int) foot.getMaxY() + 4;

        mouse(fringe, MouseEvent.MOUSE_PRESSED, (int) top.getMaxX() - 2, axis);
        mouse(fringe, MouseEvent.MOUSE_DRAGGED, (int) fringe.view().placeOf(0, 300), axis);
        mouse(fringe, MouseEvent.MOUSE_RELEASED, (int) fringe.view().placeOf(0, 300), axis);

        assertThat(sheet.plan().number("range.to").orElseThrow()).isBetween(2.98e-7, 3.02e-7);
        assertThat(sheet.fit().trial().orElseThrow().points(fringekeep.fit.Trial.Use.OUTSIDE))
                .hasSize(6);

        Painting.of(sheet.component(), 1280, 658);
        int x = (int) Math.round(fringe.view().placeOf(0, 4 * 33.25));
        int y = row(fringe, x, top);
        mouse(fringe, MouseEvent.MOUSE_PRESSED, x, y);
        mouse(fringe, MouseEvent.MOUSE_RELEASED, x, y);
        assertThat(sheet.plan().masks().masked()).hasSize(1);
        assertThat(sheet.plan().masks().masked().firstKey().row()).isEqualTo(4);
    }

    /** A height at which a point of counts lies near that abscissa. */
    private static int row(FringeView fringe, int x, Rectangle2D plot) {
        for (int y = (int) plot.getMinY(); y < plot.getMaxY(); y++) {
            if (fringe.view().near(x, y).isPresent()) {
                return y + 6;
            }
        }
        throw new AssertionError("no point near " + x);
    }

    private static void mouse(FringeView fringe, int id, int x, int y) {
        fringe.view().dispatchEvent(new MouseEvent(fringe.view(), id, 0, 0, x, y, 1, false, MouseEvent.BUTTON1));
    }
}
