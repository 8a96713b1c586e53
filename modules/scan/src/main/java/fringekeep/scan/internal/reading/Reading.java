package fringekeep.scan.internal.reading;

import fringekeep.archive.record.Moment;
import java.util.List;
import java.util.Optional;

/**
 * One section as it was read.
 *
 * @param table the table in SI
 * @param exposure exposure of the rows
 * @param header header values
 * @param findings what was noticed
 * @param fileTimeIsEnd whether the time of the file may stand for the end
 */
public record Reading(
        ScanTable table, Exposure exposure, HeaderValues header, List<Finding> findings, boolean fileTimeIsEnd) {
    /** Copies. */
    public Reading {
        findings = List.copyOf(findings);
    }

    /** Begin as the header tells it. */
    public Optional<Moment> start() {
        return header.start();
    }
}
