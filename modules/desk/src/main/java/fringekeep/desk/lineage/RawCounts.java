package fringekeep.desk.lineage;

import fringekeep.archive.Archive;
import fringekeep.archive.facet.CountTable;
import fringekeep.archive.kind.RecordView;
import fringekeep.archive.record.Hash;
import fringekeep.desk.session.Names;
import java.util.Optional;

/**
 * Raw counts of a record for the side of the sheet.
 *
 * @param label such as "scan 0412"
 * @param title its words
 * @param axis name and SI unit of the axis
 * @param unit SI unit of the axis
 * @param positions along the axis (SI)
 * @param channel name of the channel
 * @param counts one per position
 */
public record RawCounts(
        String label, String title, String axis, String unit, double[] positions, String channel, double[] counts) {
    /** Copies. */
    public RawCounts {
        positions = positions.clone();
        counts = counts.clone();
    }

    /** Reads them; empty where the record offers none. */
    public static Optional<RawCounts> read(Archive archive, Hash record) {
        Optional<RecordView> view = archive.record(record);
        return view.flatMap(at -> Names.kind(archive, at)
                        .flatMap(kind -> kind.facet(CountTable.class, at, archive.inputs(record))))
                .flatMap(table -> counts(table).map(channel -> {
                    CountTable.Column axis = table.axes().get(0);
                    return new RawCounts(
                            archive.label(record),
                            Names.title(archive, view.get()).text(),
                            axis.name(),
                            axis.unit(),
                            axis.values(),
                            channel.name(),
                            channel.values());
                }));
    }

    /** The channel of counts: the one of that name, else the first. */
    static Optional<CountTable.Column> counts(CountTable table) {
        return table.channel("counts").or(() -> table.channels().stream().findFirst());
    }
}
