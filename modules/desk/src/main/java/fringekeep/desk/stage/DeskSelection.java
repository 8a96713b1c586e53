package fringekeep.desk.stage;

import fringekeep.archive.record.Hash;
import java.util.List;
import java.util.Optional;

/**
 * What is selected.
 *
 * @param archiveOpen whether an archive is open
 * @param kind kind of the selected records
 * @param records all selected records, all of that kind, in the list's order: those marked with Space, else the selected rows,
 *     the one in hand among them
 * @param inHand the record shown in the pane
 */
public record DeskSelection(boolean archiveOpen, Optional<String> kind, List<Hash> records, Optional<Hash> inHand) {
    /** Copies. */
    public DeskSelection {
        records = records instanceof LazyRecords ? records : List.copyOf(records);
    }

    /** Whether the selected records are of one of these kinds. */
    public boolean isOf(String... kinds) {
        return !records.isEmpty()
                && kind.filter(java.util.Set.of(kinds)::contains).isPresent();
    }
}
