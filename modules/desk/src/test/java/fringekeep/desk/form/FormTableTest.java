package fringekeep.desk.form;

import static org.assertj.core.api.Assertions.assertThat;

import fringekeep.archive.kind.RecordKind;
import fringekeep.archive.record.KindName;
import java.awt.image.BufferedImage;
import java.time.ZoneId;
import java.util.ArrayList;
import java.util.List;
import org.junit.jupiter.api.Test;

/** The rows of a form under the hands of a person, without a window. */
class FormTableTest {
    private final List<String> heard = new ArrayList<>();

    private final class Ear implements FormTable.Ear {
        @Override
        public void changed() {
            heard.add("changed");
        }

        @Override
        public void moved(FormRow row) {}

        @Override
        public void asked(FormRow row) {
            heard.add("asked " + row.pointer());
        }

        @Override
        public void file(FormRow row) {
            heard.add("file " + row.pointer());
        }

        @Override
        public void left(boolean downwards) {
            heard.add(downwards ? "left below" : "left above");
        }
    }

    private FormTable table(String kind) {
        RecordKind found = LabDocuments.KINDS.get(new KindName(kind)).orElseThrow();
        FormTable table = new FormTable(new FormModel(new FormKind(found), ZoneId.of("CET")), new Ear());
        table.setSize(960, 600);
        table.focusFirst();
        return table;
    }

    private static String at(FormTable table) {
        return table.row().orElseThrow().pointer();
    }

    @Test
    void enterWalksFromFieldToFieldAndOutBelow() {
        FormTable table = table("series");
        assertThat(at(table)).isEqualTo("/about/+setup/record");
        table.forward();
        assertThat(at(table)).isEqualTo("/content/label");
        table.backward();
        assertThat(at(table)).isEqualTo("/about/+setup/record");
        table.backward();
        for (int i = 0; i < 20 && !heard.contains("left below"); i++) {
            table.forward();
        }

        assertThat(heard).contains("left above", "left below");
    }

    @Test
    void whatIsTypedGoesIntoTheFormWithEveryLetter() {
        FormTable table = table("quoted");
        table.go("/content/quantity");
        table.field().setText("431(22) Ao3");

        FormRow row = table.row().orElseThrow();
        assertThat(row.si()).isEqualTo("431(22) × 10⁻³⁰");
        assertThat(row.siUnit()).isEqualTo("m³");
        assertThat(heard).contains("changed");
    }

    @Test
    void aChoiceIsNarrowedByLettersAndTakenOverWhenItsFieldIsLeft() {
        FormTable table = table("quoted");
        table.go("/content/how");
        table.field().setText("calc");
        assertThat(heard).contains("asked /content/how");
        table.offer(List.of(
                new ChoiceList.Option("measured", ""),
                new ChoiceList.Option("calculated", ""),
                new ChoiceList.Option("estimated", "")));
        assertThat(table.choices().shown()).containsExactly(new ChoiceList.Option("calculated", ""));
        table.forward();

        assertThat(table.rows().stream().filter(row -> row.pointer().equals("/content/how")))
                .allMatch(row -> row.text().equals("calculated"));
    }

    @Test
    void aNamedRowIsAddedByItsNameAndTakesItsValue() {
        FormTable table = table("source-run");
        table.go("/content/settings");
        assertThat(table.row().orElseThrow().sort()).isEqualTo(FormRow.Sort.ADD);
        table.field().setText("oven temperature");
        table.forward();
        assertThat(at(table)).isEqualTo("/content/settings/0/quantity");
        assertThat(table.row().orElseThrow().label()).isEqualTo("oven temperature");
        table.field().setText("742(5) K");
        assertThat(table.row().orElseThrow().si()).isEqualTo("742.0(5.0)");
        table.remove();

        assertThat(table.rows()).noneMatch(row -> row.pointer().startsWith("/content/settings/"));
    }

    @Test
    void rowsOfAListAreAddedOpenedAndFolded() {
        FormTable table = table("series");
        table.go("/content/steps");
        table.act();
        assertThat(at(table)).isEqualTo("/content/steps/0/quantity");
        table.field().setText("0.2 W");
        table.go("/content/steps/0");
        table.act();

        assertThat(table.rows()).noneMatch(row -> row.pointer().startsWith("/content/steps/0/"));
        assertThat(table.row().orElseThrow().shown()).isEqualTo("0.2 W");
    }

    @Test
    void aFieldOfAFileAsksForOne() {
        FormTable table = table("note");
        table.go("/inputs/+attachment/raw");
        table.ask();

        assertThat(heard).contains("file /inputs/+attachment/raw");
    }

    @Test
    void whatIsWrongIsSaidBelowItsFieldWhileTyping() {
        FormTable table = table("series");
        table.go("/content/steps");
        table.act();
        table.field().setText("1,000 W");

        assertThat(table.rows())
                .anyMatch(row -> row.sort() == FormRow.Sort.PROBLEM
                        && row.pointer().equals("/content/steps/0/quantity")
                        && row.words().startsWith("\"1,000\" may mean a thousand or a decimal."));
    }

    @Test
    void allFormsPaint() {
        for (RecordKind kind : LabDocuments.KINDS.all()) {
            if (FormWords.of(kind.kind().text()).entered()) {
                FormTable table = table(kind.kind().text());
                BufferedImage image = new BufferedImage(960, 600, BufferedImage.TYPE_INT_RGB);
                table.paint(image.createGraphics());
                assertThat(dark(image)).as(kind.kind().text()).isGreaterThan(200);
            }
        }
    }

    private static int dark(BufferedImage image) {
        int dark = 0;
        for (int y = 0; y < image.getHeight(); y++) {
            for (int x = 0; x < image.getWidth(); x++) {
                dark += (image.getRGB(x, y) & 0xFF) < 0x60 ? 1 : 0;
            }
        }
        return dark;
    }

    @Test
    void theFieldForQuantitiesReadsWhileTyping() {
        List<String> told = new ArrayList<>();
        QuantityField field = new QuantityField("separation", java.util.Optional.of("m"), () -> told.add("typed"));
        field.before("105,00(5) mm");
        field.text("10,50(5) mm");

        assertThat(told).isNotEmpty();
        assertThat(field.quantity().orElseThrow().si()).isEqualTo(0.0105);
        assertThat(field.reading().change(QuantityReading.of("105,00(5) mm", java.util.Optional.of("m"))))
                .isEqualTo("−94.5 mm");
        field.text("10 kg");
        assertThat(field.quantity()).isEmpty();
        assertThat(field.reading().problems().get(0).code()).isEqualTo("quantity.dimension");
    }

    @Test
    void timesAreReadByTheClockOfTheArchive() throws Exception {
        LocalMoment moments = new LocalMoment(ZoneId.of("CET"));

        assertThat(moments.read("2031-07-01 10:00").toInstant()).hasToString("2031-07-01T08:00:00Z");
        assertThat(moments.read("2031-10-26 02:30 +01:00").toInstant()).hasToString("2031-10-26T01:30:00Z");
        org.assertj.core.api.Assertions.assertThatThrownBy(() -> moments.read("2031-10-26 02:30"))
                .hasMessageContaining("twice");
        org.assertj.core.api.Assertions.assertThatThrownBy(() -> moments.read("2031-03-30 02:30"))
                .hasMessageContaining("never showed");
    }
}
