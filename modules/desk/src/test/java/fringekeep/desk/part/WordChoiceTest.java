package fringekeep.desk.part;

import static org.assertj.core.api.Assertions.assertThat;

import fringekeep.desk.part.WordChoice.Word;
import java.awt.event.ActionEvent;
import java.awt.event.MouseEvent;
import java.awt.image.BufferedImage;
import java.util.ArrayList;
import java.util.List;
import javax.swing.KeyStroke;
import org.junit.jupiter.api.Test;

class WordChoiceTest {
    private final List<String> told = new ArrayList<>();
    private final WordChoice choice = new WordChoice(
            "drift",
            "drift",
            List.of(new Word("0", "none"), new Word("1", "linear"), new Word("2", "quadratic")),
            "0",
            100,
            told::add);

    @Test
    void arrowsChooseAndStayAtTheEnds() {
        press("RIGHT");
        press("RIGHT");
        press("RIGHT");
        press("LEFT");

        assertThat(told).containsExactly("1", "2", "1");
        assertThat(choice.getAccessibleContext().getAccessibleDescription()).startsWith("linear");
    }

    @Test
    void aClickOnAWordChoosesIt() {
        choice.setSize(320, 22);
        choice.paint(new BufferedImage(320, 22, BufferedImage.TYPE_INT_RGB).createGraphics());
        choice.dispatchEvent(
                new MouseEvent(choice, MouseEvent.MOUSE_PRESSED, 0, 0, 150, 10, 1, false, MouseEvent.BUTTON1));

        assertThat(told).containsExactly("1");
    }

    @Test
    void showingTellsNobodyAndHomeGoesBackToTheUsual() {
        choice.show("2");
        assertThat(told).isEmpty();

        press("HOME");
        assertThat(told).containsExactly("0");
    }

    @Test
    void wordsThatHaveNoRoomTakeAnotherLine() {
        assertThat(choice.heightIn(320)).isEqualTo(WordChoice.ROW);
        assertThat(choice.heightIn(180)).isGreaterThan(WordChoice.ROW);
    }

    @Test
    void aFieldTellsItsTextOnceAndSaysWhatIsWrong() {
        FieldRow row = new FieldRow("from", "from", "nm", 100, text -> {
            told.add(text);
            return text.equals("x") ? "a number is wanted" : "";
        });

        row.enter("x");
        assertThat(row.fault()).isEqualTo("a number is wanted");
        assertThat(row.height()).isGreaterThan(FieldRow.ROW);

        row.enter("12");
        row.enter("12");
        assertThat(row.fault()).isEmpty();
        assertThat(told).containsExactly("x", "12");
    }

    private void press(String stroke) {
        Object name = choice.getInputMap().get(KeyStroke.getKeyStroke(stroke));
        choice.getActionMap().get(name).actionPerformed(new ActionEvent(choice, ActionEvent.ACTION_PERFORMED, stroke));
    }
}
