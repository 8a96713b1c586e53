package fringekeep.archive.internal.store;

import fringekeep.archive.internal.store.tables.JournalTable;
import fringekeep.archive.internal.store.tables.JournalTable.EntryRow;
import java.time.Instant;
import java.util.ArrayList;
import java.util.Arrays;
import java.util.List;

/**
 * Writing time of every entry, in memory: the writer's clock may run backwards, so no order can be relied on. Thread-safe; a
 * question first reads what was committed since the last one.
 */
final class JournalTimes {
    private static final int STEP = 1_000;
    private final Store store;
    private Instant[] times = new Instant[0];
    private int known;

    JournalTimes(Store store) {
        this.store = store;
    }

    /** Entries written at or after {@code from} and before {@code to}, ascending. */
    synchronized List<Long> between(Instant from, Instant to) {
        grow();
        List<Long> found = new ArrayList<>();
        for (int i = 0; i < known; i++) {
            if (!times[i].isBefore(from) && times[i].isBefore(to)) {
                found.add(i + 1L);
            }
        }
        return found;
    }

    /** Reads what is not known yet. */
    synchronized void grow() {
        long watermark = store.state().watermark();
        if (times.length < watermark) {
            times = Arrays.copyOf(times, Math.toIntExact(watermark + watermark / 8 + STEP));
        }
        while (known < watermark) {
            long from = known + 1L;
            long to = Math.min(watermark, known + (long) STEP);
            for (EntryRow row : store.<List<EntryRow>, RuntimeException>read(c -> JournalTable.entries(c, from, to))) {
                times[known++] = JournalLines.entry(row).at();
            }
        }
    }
}
