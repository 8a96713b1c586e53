package fringekeep.desk.list;

import static org.assertj.core.api.Assertions.assertThat;

import fringekeep.archive.problem.ProblemException;
import fringekeep.archive.problem.StoppedException;
import fringekeep.archive.problem.Work;
import fringekeep.archive.record.Hash;
import fringekeep.desk.lab.ManyScans;
import fringekeep.desk.list.ListContent.Entry;
import fringekeep.desk.list.ListContent.Head;
import fringekeep.desk.list.ListContent.Waiting;
import fringekeep.desk.session.Register;
import fringekeep.desk.session.Stops;
import fringekeep.desk.session.View;
import fringekeep.desk.session.Views;
import java.awt.Component;
import java.awt.Container;
import java.awt.image.BufferedImage;
import java.util.ArrayList;
import java.util.List;
import java.util.Optional;
import org.junit.jupiter.api.Test;

/** A list of 400,000 scans: pages come as they are in sight, and painting asks the archive nothing. */
class ManyRowsTest {
    private static final int ROWS = 400_000;

    private final ManyScans lab = new ManyScans(ROWS);
    private final Stops stops = Stops.shipped();
    private final Register register = Register.read(lab.archive(), stops);
    private final List<Integer> wanted = new ArrayList<>();
    private final RecordList list = new RecordList(new Ear());

    private final class Ear implements ListEar {
        @Override
        public void select(Hash record) {}

        @Override
        public void marked() {}

        @Override
        public void enter() {}

        @Override
        public void ask(Question question) {}

        @Override
        public void page(PagedRows rows, int page) {
            wanted.add(page);
        }

        @Override
        public void copy(ListContent content, List<Hash> records) {}

        @Override
        public void columns(String kind, List<String> columns) {}

        @Override
        public List<Head> offered(String kind) {
            return List.of();
        }
    }

    private ListContent read(Question question) throws ProblemException, StoppedException {
        return new ReadList(
                        lab.archive(),
                        new Views(lab.archive(), stops).of(register, View.ALL),
                        stops,
                        new Joined(lab.archive(), register))
                .read(question, Work.QUIET);
    }

    private void paint() {
        list.setSize(500, 700);
        for (int i = 0; i < 3; i++) {
            lay(list);
        }
        lab.painting.set(true);
        list.paint(new BufferedImage(500, 700, BufferedImage.TYPE_INT_RGB).getGraphics());
        lab.painting.set(false);
    }

    private static void lay(Component component) {
        component.doLayout();
        if (component instanceof Container container) {
            for (Component child : container.getComponents()) {
                lay(child);
            }
        }
    }

    @Test
    void openingReadsOnePageOfRowsOnly() throws Exception {
        ListContent content = read(Question.all("scan"));

        assertThat(content.heading()).isEqualTo("400\u2009000 scans");
        assertThat(content.rows().size()).isEqualTo(ROWS);
        assertThat(lab.given.get()).isLessThan(2L * PagedRows.PAGE + 10);
    }

    @Test
    void scrollingAnywhereAsksForThePagesInSightAndKeepsFew() throws Exception {
        ListContent content = read(Question.all("scan"));
        list.show(content, Optional.empty());
        PagedRows rows = (PagedRows) content.rows();
        for (int i = 1; i <= 200; i++) {
            int row = (int) ((long) i * 7_919_000 % ROWS);
            list.table().scrollRectToVisible(list.table().getCellRect(row, 0, true));
            wanted.clear();
            paint();
            assertThat(wanted.size()).isLessThanOrEqualTo(1);
            for (int page : List.copyOf(wanted)) {
                list.arrived(rows, page, rows.read(page, Work.QUIET));
            }
        }

        assertThat(rows.pagesKept()).isLessThanOrEqualTo(40);
        assertThat(lab.given.get()).isLessThan(201L * (PagedRows.PAGE + 2) + 10);
    }

    @Test
    void aRowInTheMiddleIsWaitingUntilItsPageArrives() throws Exception {
        PagedRows rows = (PagedRows) read(Question.all("scan")).rows();
        int row = rows.rowOf(ManyScans.scan(250_000));

        assertThat(rows.get(row)).isEqualTo(new Waiting(ManyScans.scan(250_000)));
        int page = row / PagedRows.PAGE;
        rows.arrived(page, rows.read(page, Work.QUIET));
        Entry entry = (Entry) rows.get(row);
        assertThat(entry.number()).isEqualTo("250000");
        assertThat(entry.cells().get(1)).isEqualTo(Integer.toString(250_000 % 97));
    }

    @Test
    void sortingByAColumnOrdersAllRows() throws Exception {
        PagedRows rows =
                (PagedRows) read(Question.all("scan").turned("laser_power_w").turned("laser_power_w"))
                        .rows();

        assertThat(rows.record(0)).contains(ManyScans.scan(96));
        assertThat(rows.record(ROWS - 1)).contains(ManyScans.scan(97L * (ROWS / 97)));
        assertThat(((Entry) rows.read(0, Work.QUIET).get(0)).cells().get(1)).isEqualTo("96");
    }

    @Test
    void theRegisterHoldsFiftyBytesARecordAndReadsOnlyWhatIsNew() throws Exception {
        Register next = register.newer(lab.archive(), stops);

        assertThat(next.size("scan")).isEqualTo(ROWS);
        assertThat(next.place(ManyScans.scan(399_999))).isEqualTo(399_998);
        assertThat(next.records("scan").get(123_455)).isEqualTo(ManyScans.scan(123_456));
        assertThat(next.kind(ManyScans.scan(ROWS + 1L))).isEmpty();
    }
}
