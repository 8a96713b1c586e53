package fringekeep.scan;

import fringekeep.archive.Archive;
import fringekeep.archive.kind.RecordView;
import fringekeep.archive.listing.Listing;
import fringekeep.archive.listing.Page;
import fringekeep.archive.problem.ProblemException;
import fringekeep.archive.record.Hash;
import java.util.List;
import java.util.Optional;

/** Finds the scans that were read from a raw file. */
final class ScansOfFile {
    private static final int MOST = 10_000;

    private final Archive archive;

    ScansOfFile(Archive archive) {
        this.archive = archive;
    }

    /** Current scans of a raw file in the order of the journal. */
    List<RecordView> current(Hash raw) throws ProblemException {
        Listing listing = new Listing(
                ScanRows.TABLE.name(),
                List.of(new Listing.Filter("raw_file", Listing.Comparison.IS, raw)),
                true,
                List.of(),
                Optional.empty(),
                "n",
                false,
                Optional.empty(),
                MOST);
        Page page = archive.list(listing);
        return page.rows().stream()
                .map(line -> archive.record(line.record()))
                .flatMap(Optional::stream)
                .toList();
    }
}
