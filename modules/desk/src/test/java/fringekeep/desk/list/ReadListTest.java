package fringekeep.desk.list;

import static org.assertj.core.api.Assertions.assertThat;

import fringekeep.archive.Archive;
import fringekeep.archive.graph.StateName;
import fringekeep.archive.listing.Column;
import fringekeep.archive.problem.ProblemException;
import fringekeep.archive.problem.StoppedException;
import fringekeep.archive.problem.Work;
import fringekeep.desk.chain.ChainState;
import fringekeep.desk.lab.InventedLab;
import fringekeep.desk.list.ListContent.Entry;
import fringekeep.desk.list.ListContent.Group;
import fringekeep.desk.session.InView;
import fringekeep.desk.session.Register;
import fringekeep.desk.session.Stops;
import fringekeep.desk.session.View;
import fringekeep.desk.session.Views;
import java.lang.reflect.Proxy;
import java.time.LocalDate;
import java.util.List;
import java.util.Optional;
import org.junit.jupiter.api.Test;

class ReadListTest {
    private final InventedLab lab = new InventedLab();
    private final Stops stops = Stops.shipped();
    private final Register register = Register.read(lab.archive(), stops);
    private final Joined joined = new Joined(lab.archive(), register);

    private InView inView(View view) throws ProblemException {
        return new Views(lab.archive(), stops).of(register, view);
    }

    private ListContent read(Question question) throws ProblemException, StoppedException {
        return new ReadList(lab.archive(), inView(View.ALL), stops, joined).read(question, Work.QUIET);
    }

    private static List<Entry> entries(ListContent content) {
        return content.rows().stream()
                .filter(Entry.class::isInstance)
                .map(Entry.class::cast)
                .toList();
    }

    @Test
    void scansAreGatheredByRunWithColumnsOfPlacementAndFit() throws Exception {
        ListContent scans = read(Question.all("scan"));

        assertThat(scans.heading()).isEqualTo("36 scans");
        assertThat(scans.rows().stream().filter(Group.class::isInstance))
                .containsExactly(new Group("run 1   oven at 842 K", ""));
        assertThat(scans.heads())
                .extracting(ListContent.Head::text)
                .containsExactly("ended", "purpose", "laser power / W", "visibility");
        assertThat(entries(scans).get(1).cells()).containsExactly("17:12", "reference", "5", "0.2950(92)");
    }

    @Test
    void headsBeginSmallButSymbolsKeepTheirCase() {
        assertThat(CellText.head(Column.real("w", "P", "W", "W"), "w").text()).isEqualTo("P / W");
        assertThat(CellText.head(Column.real("m", "Molar mass", "kg/mol", "g/mol"), "m")
                        .text())
                .isEqualTo("molar mass / g/mol");
    }

    @Test
    void thePlotColumnTakesValueAndDeviationOfTheLinkedFit() throws Exception {
        ListContent scans = read(Question.all("scan"));

        assertThat(scans.plot()).isPresent();
        assertThat(entries(scans).get(1).value()).isEqualTo(0.295);
        assertThat(entries(scans).get(1).deviation()).isEqualTo(0.0092);
    }

    @Test
    void filterWordsNarrowToAState() throws Exception {
        ListContent scans = read(Question.all("scan"));
        ListContent.Word word = scans.words().stream()
                .filter(one -> one.text().equals("withdrawn"))
                .findFirst()
                .orElseThrow();

        ListContent withdrawn = read(word.question());

        assertThat(word.count()).isEqualTo(1);
        assertThat(entries(withdrawn)).extracting(Entry::record).containsExactly(lab.withdrawn);
        assertThat(entries(withdrawn).get(0).state()).contains(StateName.WITHDRAWN);
    }

    @Test
    void whatIsLinkedWithARecordIsListedAlone() throws Exception {
        ListContent fits = read(Question.linkedWith("fit", Optional.of(lab.scan)));

        assertThat(entries(fits)).extracting(Entry::record).containsExactly(lab.fit);
    }

    @Test
    void filterWordsCountTheValuesOfAColumnOfTheLinkedRecord() throws Exception {
        ListContent scans = read(Question.all("scan"));

        assertThat(scans.words())
                .extracting(word -> word.text() + " " + word.count())
                .contains("signal 24", "reference 12");
        ListContent references = read(scans.words().stream()
                .filter(word -> word.text().equals("reference"))
                .findFirst()
                .orElseThrow()
                .question());
        assertThat(entries(references))
                .hasSize(12)
                .allMatch(entry -> entry.cells().get(1).equals("reference"));
    }

    @Test
    void rowsAreSortedByAColumnOfTheLinkedFitBothWaysAndThenAsRecordedAgain() throws Exception {
        Question up = Question.all("scan").turned("fit:visibility");
        List<Entry> sorted = entries(read(up));
        List<Entry> down = entries(read(up.turned("fit:visibility")));

        assertThat(sorted).extracting(Entry::value).isSorted();
        assertThat(down.get(0).value()).isEqualTo(sorted.get(35).value());
        assertThat(up.turned("fit:visibility").turned("fit:visibility").sort()).isEmpty();
    }

    @Test
    void chosenColumnsStandInTheirOrder() throws Exception {
        ListContent scans = new ReadList(lab.archive(), inView(View.ALL), stops, joined)
                .read(Question.all("scan"), List.of("fit:visibility", "ended"), Work.QUIET);

        assertThat(scans.heads()).extracting(ListContent.Head::column).containsExactly("fit:visibility", "ended");
        assertThat(ReadList.offered(lab.archive(), stops, "scan"))
                .extracting(ListContent.Head::column)
                .contains("laser_power_w", "placement:purpose", "fit:visibility");
    }

    @Test
    void copiedRowsHaveUnitsInHeadsAndEveryDigit() throws Exception {
        ReadList reader = new ReadList(lab.archive(), inView(View.ALL), stops, joined);
        ListContent scans = reader.read(Question.all("scan"), Work.QUIET);
        String table = reader.table(scans, List.of(lab.scan), Work.QUIET);

        String[] lines = table.split("\n");
        assertThat(lines).hasSize(2);
        assertThat(lines[0]).isEqualTo("scan\tended\tpurpose\tlaser power / W\tvisibility\tu(visibility)");
        String[] cells = lines[1].split("\t");
        double power = 1 + (30 * 0.37) % 9;
        assertThat(cells[0]).isEqualTo("0031");
        assertThat(Double.parseDouble(cells[3])).isEqualTo(power);
        assertThat(Double.parseDouble(cells[4])).isEqualTo(0.3 * Math.abs(StrictMath.sin(power / 3.4)));
        assertThat(Double.parseDouble(cells[5])).isEqualTo(0.0092);
    }

    @Test
    void aDayShowsWhatWasRecordedOnItAndWhatThatLeansOn() throws Exception {
        InView day = inView(new View.Day(LocalDate.of(2025, 3, 12)));

        assertThat(day.name()).isEqualTo("Wed 12 Mar 2025");
        assertThat(day.detail()).isEqualTo("06:00 to 06:00");
        assertThat(day.current("scan")).isEqualTo(18);
        assertThat(day.current("fit")).isEqualTo(18);
        assertThat(day.current("setup")).isEqualTo(1);
        assertThat(day.current("property")).isZero();
        ListContent scans = new ReadList(lab.archive(), day, stops, joined).read(Question.all("scan"), Work.QUIET);
        assertThat(scans.heading()).isEqualTo("18 scans");
        assertThat(entries(scans)).hasSize(18);
    }

    @Test
    void whatAFigureRestsOnIsInViewAlone() throws Exception {
        InView upstream = inView(new View.Upstream(lab.property));

        assertThat(upstream.current("fit")).isEqualTo(36);
        assertThat(upstream.current("scan")).isEqualTo(36);
        assertThat(upstream.current("figure")).isZero();
    }

    @Test
    void aSpanTakesBothEndsAndTurnsThemRound() throws Exception {
        InView span = inView(new View.Span(LocalDate.of(2025, 3, 13), LocalDate.of(2025, 3, 12)));

        assertThat(span.name()).isEqualTo("12 to 13 Mar 2025");
        assertThat(span.detail()).isEqualTo("2 measurement days");
        assertThat(span.current("scan")).isEqualTo(36);
    }

    @Test
    void aFirstPageIsThereBeforeTheGraphIs() throws Exception {
        Archive withoutGraph = (Archive) Proxy.newProxyInstance(
                ReadListTest.class.getClassLoader(), new Class<?>[] {Archive.class}, (proxy, method, arguments) -> {
                    if (method.getName().equals("graph")) {
                        throw new IllegalStateException("the graph is still being read");
                    }
                    return method.invoke(lab.archive(), arguments);
                });

        ListContent first = ReadList.preview(withoutGraph, stops, Question.all("scan"));

        assertThat(first.heading()).isEqualTo("36 scans");
        assertThat(first.rows()).hasSize(36);
        assertThat(((Entry) first.rows().get(1)).cells()).containsExactly("12 Mar 17:12", "\u2013", "5", "\u2013");
        assertThat(ChainState.counted(withoutGraph, stops).stops().get(6).count())
                .isEqualTo(36);
    }
}
