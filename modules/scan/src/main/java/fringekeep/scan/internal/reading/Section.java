package fringekeep.scan.internal.reading;

import java.util.List;

/**
 * One section of a file.
 *
 * @param shared header lines of all sections, comment prefix taken off
 * @param header header lines of this section, comment prefix taken off
 * @param names the last of the skipped lines, which names columns; empty when none is skipped
 * @param rows lines that hold rows
 */
record Section(List<Line> shared, List<Line> header, List<Line> names, List<Line> rows) {
    Section {
        shared = List.copyOf(shared);
        header = List.copyOf(header);
        names = List.copyOf(names);
        rows = List.copyOf(rows);
    }
}
