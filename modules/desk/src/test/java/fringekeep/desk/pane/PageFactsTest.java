package fringekeep.desk.pane;

import static org.assertj.core.api.Assertions.assertThat;

import fringekeep.archive.Archive;
import fringekeep.archive.graph.StateName;
import fringekeep.archive.json.JsonArray;
import fringekeep.archive.json.JsonObject;
import fringekeep.archive.kind.FlatTable;
import fringekeep.archive.kind.FlatTable.FlatColumn;
import fringekeep.desk.lab.InventedLab;
import fringekeep.desk.list.Joined;
import fringekeep.desk.look.Type;
import fringekeep.desk.session.Clock;
import fringekeep.desk.session.Register;
import fringekeep.desk.session.Stops;
import fringekeep.drawing.Lettering;
import java.util.List;
import java.util.Optional;
import org.junit.jupiter.api.Test;

class PageFactsTest {
    private final InventedLab lab = new InventedLab();
    private final Archive archive = lab.archive();
    private final Stops stops = Stops.shipped();
    private final Register register = Register.read(archive, stops);
    private final Joined joined = new Joined(archive, register);

    private RecordPage page(fringekeep.archive.record.Hash record) {
        return new ReadRecord(archive, register, stops, joined).read(record).orElseThrow();
    }

    @Test
    void aScanShowsItsFitBesideItAndWhereItIsPlaced() {
        RecordPage page = page(lab.scan);

        assertThat(page.besides()).hasSize(1);
        assertThat(page.besides().get(0).record()).isEqualTo(lab.fit);
        assertThat(page.besides().get(0).facts())
                .extracting(Fact::name)
                .startsWith("mean", "cosine", "sine", "visibility");
        FactGroup placed = page.groups().stream()
                .filter(group -> group.heading().equals("placed"))
                .findFirst()
                .orElseThrow();
        assertThat(placed.facts()).extracting(Fact::name).contains("setup", "source run");
        assertThat(page.identity()).startsWith("signal, ").contains("run 1");
    }

    @Test
    void everyRecordSaysWhenItWasRecorded() {
        FactGroup recorded = page(lab.setup()).groups().stream()
                .filter(group -> group.heading().equals("recorded"))
                .findFirst()
                .orElseThrow();

        assertThat(recorded.facts()).contains(Fact.text("recorded", "2025-03-01 10:00"));
    }

    @Test
    void judgementsSayWhatWhenAndWhy() {
        RecordPage.Note note = page(lab.withdrawn).notes().get(0);

        assertThat(note.text()).isEqualTo("withdrawn: mode hop");
        assertThat(note.small()).isEqualTo("13 Mar 01:04, laser jumped half-way");
        assertThat(note.mark()).contains(fringekeep.desk.session.States.mark(StateName.WITHDRAWN));
    }

    @Test
    void numbersOfAToldSortAreOneFactWithTheUnitOfTheSort() {
        JsonObject result = JsonObject.EMPTY
                .with(
                        "exposure",
                        JsonObject.EMPTY.with("sort", "shots-per-point").with("si", 400.0))
                .with("table", "table");
        List<FactGroup> groups =
                new FactReader(new Clock(archive.facts()), JsonObject.EMPTY, "scan", "result").read("result", result);

        assertThat(groups).hasSize(1);
        assertThat(groups.get(0).facts()).containsExactly(new Fact("exposure", "", "400", "shots each point"));
    }

    @Test
    void plainSiTakesThePrefixThatNeedsNoPowerOfTen() {
        assertThat(FactUnits.sized("m", 2.66e-7)).isEqualTo(new FactUnits.Sized("nm", 1e-9));
        assertThat(FactUnits.sized("m", 0.105)).isEqualTo(new FactUnits.Sized("mm", 1e-3));
        assertThat(FactUnits.sized("W", 7.3)).isEqualTo(new FactUnits.Sized("W", 1));
        assertThat(FactUnits.sized("V", 4500)).isEqualTo(new FactUnits.Sized("kV", 1000));
        assertThat(FactUnits.sized("K", 1e-3)).isEqualTo(new FactUnits.Sized("K", 1));
        assertThat(FactUnits.sized("m", 0)).isEqualTo(new FactUnits.Sized("m", 1));
    }

    @Test
    void valuesOfATableHaveTheDigitsTheirUncertaintySays() {
        FlatTable table = new FlatTable(
                "values",
                List.of(
                        new FlatColumn("quantity", "quantity", "", ""),
                        new FlatColumn("value", "value", "", ""),
                        new FlatColumn("combined_u", "u", "", ""),
                        new FlatColumn("at_m", "Position", "m", "")),
                List.of(List.of(
                        Optional.of("openFraction"),
                        Optional.of(420.4876),
                        Optional.of(7.3451),
                        Optional.of(2.66e-7))));
        PageTable page = new TableReading(table, FactWords::words).page("values", false);

        assertThat(page.heads()).containsExactly("quantity", "value", "u", "position / nm");
        assertThat(page.rows().get(0)).containsExactly("open fraction", "420.5", "7.3", "266");
        assertThat(page.right()).containsExactly(false, true, true, true);
    }

    @Test
    void longTextsAreBrokenBetweenWordsAndShortenedAtTheEndOnly() {
        String text = "the lamp in the corner was on for the first half of the night and nobody noticed";
        List<String> lines = Lines.of(text, Type.BODY, 150, 9);

        assertThat(String.join(" ", lines)).isEqualTo(text);
        assertThat(lines).allMatch(line -> Lettering.width(line, Type.BODY) <= 150);
        assertThat(Lines.of(text, Type.BODY, 150, 2))
                .hasSize(2)
                .last()
                .asString()
                .endsWith("\u2026");
    }

    @Test
    void codesAreShownWithoutHyphensButMethodsKeepTheirs() {
        JsonObject schema = JsonObject.EMPTY.with(
                "properties",
                JsonObject.EMPTY
                        .with("how", JsonObject.EMPTY.with("enum", JsonArray.ofTexts(List.of("along-lines"))))
                        .with("method", JsonObject.EMPTY.with("enum", JsonArray.ofTexts(List.of("a.b-c/1")))));
        List<FactGroup> groups = new FactReader(new Clock(archive.facts()), schema, "setup", "content")
                .read("as entered", JsonObject.EMPTY.with("how", "along-lines").with("method", "a.b-c/1"));

        assertThat(groups.get(0).facts())
                .containsExactly(Fact.text("how", "along lines"), Fact.text("method", "a.b-c/1"));
    }
}
