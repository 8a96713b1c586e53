package fringekeep.desk.window;

import static org.assertj.core.api.Assertions.assertThat;

import fringekeep.archive.Person;
import fringekeep.archive.problem.Problem;
import fringekeep.desk.lab.InventedLab;
import fringekeep.desk.list.Question;
import fringekeep.desk.run.Runner;
import fringekeep.desk.session.Stops;
import fringekeep.desk.session.View;
import fringekeep.drawing.Picture;
import java.awt.event.ActionEvent;
import java.awt.image.BufferedImage;
import java.nio.file.Path;
import java.time.LocalDate;
import java.util.ArrayList;
import java.util.HashSet;
import java.util.List;
import java.util.Optional;
import java.util.Set;
import java.util.function.Consumer;
import org.junit.jupiter.api.Test;

/** The whole desk, without display, with jobs run at once. */
class DeskTest {
    private final InventedLab lab = new InventedLab();
    private final List<Problem> troubles = new ArrayList<>();
    private final Memory memory = Memory.fleeting();
    private final Desk desk = new Desk(
            new Runner(Runnable::run, Runnable::run), Stops.shipped(), new Host(), memory, new DeskStages(List.of()));

    private final class Host implements DeskHost {
        @Override
        public void chooseArchive() {}

        @Override
        public void foundArchive(FoundingPane.Answers answers) {}

        @Override
        public void tryInvented() {}

        @Override
        public void save(Picture picture) {}

        @Override
        public List<Path> chooseFiles(String title) {
            return List.of();
        }

        @Override
        public Optional<Path> chooseFolder(String title) {
            return Optional.empty();
        }

        @Override
        public Optional<Path> chooseToSave(String title, String suggested) {
            return Optional.empty();
        }

        @Override
        public void askPerson(List<Person> persons, Consumer<String> then) {
            then.accept("A. Person");
        }

        @Override
        public void trouble(List<Problem> problems) {
            troubles.addAll(problems);
        }
    }

    @Test
    void beginsWithTheFirstSheetAndShowsTheFigureOnceAnArchiveIsOpen() {
        assertThat(desk.sheetShown()).isEqualTo("first");

        desk.open(lab.archive());

        assertThat(desk.sheetShown()).isEqualTo("records");
        assertThat(desk.stopShown()).isEqualTo(9);
        assertThat(desk.recordPane().page().orElseThrow().record()).isEqualTo(lab.figure);
    }

    @Test
    void aTracedFigureIsWalkedToRawCounts() {
        desk.open(lab.archive());
        desk.trace();
        DeskPictures.paint(desk, 1280, 770);

        assertThat(desk.sheetShown()).isEqualTo("lineage");
        for (int i = 0; i < 3; i++) {
            assertThat(desk.lineageSheet().raw()).isEmpty();
            desk.lineageSheet().left();
        }

        assertThat(desk.lineageSheet().raw().orElseThrow().counts()).hasSize(31);
        desk.back();
        assertThat(desk.sheetShown()).isEqualTo("records");
    }

    @Test
    void aNumberIsFoundAndOpened() {
        desk.open(lab.archive());
        desk.find("scan 0031");

        assertThat(desk.recordPane().page().orElseThrow().record()).isEqualTo(lab.scan);
        assertThat(desk.stopShown()).isEqualTo(6);
        assertThat(troubles).isEmpty();
    }

    @Test
    void wordsThatAreNoNumberNarrowTheList() {
        desk.open(lab.archive());
        desk.openStop(3);
        desk.find("velocity");

        assertThat(desk.listPane().table().getRowCount()).isEqualTo(1);
    }

    @Test
    void aDayInViewNarrowsStripListAndComesBackToAll() {
        desk.open(lab.archive());
        desk.openStop(6);
        desk.view(new View.Day(LocalDate.of(2025, 3, 13)));

        assertThat(desk.listPane().content().heading()).isEqualTo("18 scans");
        desk.open(lab.scan(0));
        assertThat(desk.view()).isEqualTo(View.ALL);
        assertThat(desk.listPane().content().heading()).isEqualTo("36 scans");
    }

    @Test
    void theChoiceOfViewListsDaysAndFiguresAndShowsWhatIsChosen() {
        desk.open(lab.archive());
        desk.chooseView();
        assertThat(desk.sheetShown()).isEqualTo("view");
        DeskPictures.paint(desk, 1280, 770);

        desk.view(new View.Upstream(lab.property));

        assertThat(desk.sheetShown()).isEqualTo("records");
        desk.openStop(7);
        assertThat(desk.listPane().content().heading()).isEqualTo("36 fits");
        desk.openStop(9);
        assertThat(desk.listPane().content().heading()).isEqualTo("0 figures");
    }

    @Test
    void spaceMarksRowsAndTheSelectionIsWhatIsMarked() {
        desk.open(lab.archive());
        desk.openStop(6);
        press("SPACE");
        press("SPACE");

        assertThat(desk.selection().records())
                .hasSize(2)
                .doesNotContain(desk.selection().inHand().orElseThrow());
        press("ctrl A");
        assertThat(desk.selection().records()).hasSize(36);
        desk.listPane().clearMarks();
        assertThat(desk.selection().records())
                .containsExactly(desk.selection().inHand().orElseThrow());
    }

    @Test
    void theNextFilterWordIsReachedByAKey() {
        desk.open(lab.archive());
        desk.openStop(6);
        press("F4");

        assertThat(desk.listPane().content().question().orElseThrow().value())
                .contains(new Question.Value("placement:purpose", "signal"));
        press("shift F4");
        assertThat(desk.listPane().content().question().orElseThrow().whole()).isTrue();
    }

    @Test
    void chosenColumnsAreKeptAndTheUsualOnesComeBack() {
        desk.open(lab.archive());
        desk.openStop(6);
        memory.put("columns scan", "fit:visibility,ended");
        desk.openStop(6);
        assertThat(desk.listPane().content().heads())
                .extracting(head -> head.column())
                .containsExactly("fit:visibility", "ended");

        memory.put("columns scan", "");
        desk.openStop(6);
        assertThat(desk.listPane().content().heads()).hasSizeGreaterThan(2);
    }

    private void press(String key) {
        desk.listPane()
                .table()
                .getActionMap()
                .get("list " + key)
                .actionPerformed(new ActionEvent(desk, ActionEvent.ACTION_PERFORMED, key));
    }

    @Test
    void howMuchARecordMovesIsSaidBehindItsState() {
        desk.open(lab.archive());
        desk.recordPane().size(lab.figure, "V stays, 0.04 \u03c3");
        DeskPictures.paint(desk, 1280, 770);

        assertThat(desk.recordPane().getComponent(0).getAccessibleContext().getAccessibleDescription())
                .endsWith("V stays, 0.04 \u03c3");
    }

    @Test
    void allSheetsPaintInManyColours() {
        desk.open(lab.archive());
        desk.openStop(6);
        desk.select(lab.scan);
        BufferedImage records = DeskPictures.paint(desk, 1280, 770);
        desk.trace();
        BufferedImage lineage = DeskPictures.paint(desk, 1280, 770);
        desk.keys();
        BufferedImage keys = DeskPictures.paint(desk, 1280, 770);

        assertThat(colours(records)).hasSizeGreaterThan(100);
        assertThat(colours(lineage)).hasSizeGreaterThan(100);
        assertThat(colours(keys)).hasSizeGreaterThan(50);
    }

    private static Set<Integer> colours(BufferedImage image) {
        Set<Integer> colours = new HashSet<>();
        for (int y = 0; y < image.getHeight(); y += 2) {
            for (int x = 0; x < image.getWidth(); x++) {
                colours.add(image.getRGB(x, y));
            }
        }
        return colours;
    }
}
