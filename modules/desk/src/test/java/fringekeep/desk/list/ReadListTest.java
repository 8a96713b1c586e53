package fringekeep.desk.list;

import static org.assertj.core.api.Assertions.assertThat;

import fringekeep.archive.graph.StateName;
import fringekeep.archive.listing.Column;
import fringekeep.archive.problem.ProblemException;
import fringekeep.archive.problem.StoppedException;
import fringekeep.archive.problem.Work;
import fringekeep.desk.lab.InventedLab;
import fringekeep.desk.list.ListContent.Entry;
import fringekeep.desk.list.ListContent.Group;
import fringekeep.desk.session.Register;
import fringekeep.desk.session.Stops;
import java.util.List;
import java.util.Optional;
import org.junit.jupiter.api.Test;

class ReadListTest {
    private final InventedLab lab = new InventedLab();
    private final Stops stops = Stops.shipped();
    private final ReadList lists = new ReadList(lab.archive(), Register.read(lab.archive(), stops), stops);

    private ListContent read(Question question) throws ProblemException, StoppedException {
        return lists.read(question, Work.QUIET);
    }

    private static List<Entry> entries(ListContent content) {
        return content.rows().stream()
                .filter(Entry.class::isInstance)
                .map(Entry.class::cast)
                .toList();
    }

    @Test
    void scansAreGroupedByMeasurementDayWithColumnsOfPlacementAndFit() throws Exception {
        ListContent scans = read(Question.all("scan"));

        assertThat(scans.heading()).isEqualTo("36 scans");
        assertThat(scans.rows().stream().filter(Group.class::isInstance))
                .containsExactly(new Group("Wed 12 Mar 2025", ""), new Group("Thu 13 Mar 2025", ""));
        assertThat(scans.heads())
                .extracting(ListContent.Head::text)
                .containsExactly("ended", "purpose", "laser power / W", "visibility");
        assertThat(entries(scans).get(1).cells()).containsExactly("17:12", "reference", "5", "0.2950(92)");
    }

    @Test
    void headsBeginSmallButSymbolsKeepTheirCase() {
        assertThat(CellText.head(Column.real("w", "P", "W", "W")).text()).isEqualTo("P / W");
        assertThat(CellText.head(Column.real("m", "Molar mass", "kg/mol", "g/mol"))
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
        ListContent fits = read(new Question("fit", Optional.empty(), Optional.of(lab.scan), "", 500));

        assertThat(entries(fits)).extracting(Entry::record).containsExactly(lab.fit);
    }

    @Test
    void noMoreRowsThanAskedFor() throws Exception {
        ListContent few = read(new Question("scan", Optional.empty(), Optional.empty(), "", 10));

        assertThat(entries(few)).hasSize(10);
        assertThat(few.more()).isTrue();
    }
}
