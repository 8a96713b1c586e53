package fringekeep.desk.list;

import fringekeep.archive.problem.ProblemException;
import fringekeep.archive.problem.StoppedException;
import fringekeep.archive.problem.Work;
import fringekeep.archive.record.Hash;
import fringekeep.desk.list.ListContent.Group;
import fringekeep.desk.list.ListContent.Line;
import fringekeep.desk.list.ListContent.Waiting;
import java.util.Arrays;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import java.util.function.IntConsumer;

/**
 * Rows of which only some pages are in memory; what stands in each row is four bytes. A row whose page is not at hand is
 * answered as waiting, and its page is asked for. To be used on the window thread, but for {@link #read}.
 */
public final class PagedRows extends ListRows {
    /** Rows of a page. */
    public static final int PAGE = 100;

    private static final int KEPT = 40;

    private final RowOrder order;
    private final Reader reader;
    private final Map<Integer, List<Line>> pages = new LinkedHashMap<>(64, 0.75f, true) {
        private static final long serialVersionUID = 1L;

        @Override
        protected boolean removeEldestEntry(Map.Entry<Integer, List<Line>> eldest) {
            return size() > KEPT;
        }
    };
    private final List<Line> first;
    private IntConsumer wanted = page -> {};

    /** Reads the lines of some rows, away from the window thread. */
    interface Reader {
        List<Line> lines(int from, int to, Work work) throws ProblemException, StoppedException;
    }

    PagedRows(RowOrder order, Reader reader, List<Line> firstPage) {
        this.order = order;
        this.reader = reader;
        this.first = List.copyOf(firstPage);
        if (!first.isEmpty()) {
            pages.put(0, first);
        }
    }

    /** Told which page is wanted. */
    public void onWanted(IntConsumer listener) {
        wanted = listener;
    }

    /** Reads a page, away from the window thread. */
    public List<Line> read(int page, Work work) throws ProblemException, StoppedException {
        return reader.lines(page * PAGE, Math.min(size(), (page + 1) * PAGE), work);
    }

    /** A page that was read. */
    public void arrived(int page, List<Line> lines) {
        pages.put(page, List.copyOf(lines));
    }

    /** How many pages are in memory. */
    public int pagesKept() {
        return pages.size();
    }

    @Override
    public Line get(int row) {
        List<Line> page = pages.get(row / PAGE);
        if (page != null && row % PAGE < page.size()) {
            return page.get(row % PAGE);
        }
        wanted.accept(row / PAGE);
        return order.group(row) ? new Group("", "") : new Waiting(order.record(row));
    }

    @Override
    public int size() {
        return order.size();
    }

    @Override
    public Optional<Hash> record(int row) {
        return order.group(row) ? Optional.empty() : Optional.of(order.record(row));
    }

    @Override
    public boolean group(int row) {
        return order.group(row);
    }

    @Override
    public int rowOf(Hash record) {
        return order.rowOf(record);
    }

    @Override
    public int[] groups() {
        return order.groups();
    }

    @Override
    public List<Line> sample() {
        return first;
    }

    @Override
    public boolean equals(Object other) {
        return this == other;
    }

    @Override
    public int hashCode() {
        return System.identityHashCode(this);
    }

    @Override
    public String toString() {
        return size() + " rows, pages " + Arrays.toString(pages.keySet().toArray());
    }
}
