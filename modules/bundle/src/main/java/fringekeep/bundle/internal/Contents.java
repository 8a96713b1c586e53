package fringekeep.bundle.internal;

import fringekeep.archive.Archive;
import fringekeep.archive.lineage.Lineage;
import fringekeep.archive.lineage.LineageRecord;
import fringekeep.archive.record.Hash;
import java.util.ArrayList;
import java.util.LinkedHashSet;
import java.util.List;
import java.util.Set;

/**
 * What goes into a bundle: everything the roots rest on and speak of, and the live judgements on any of it. What such a
 * judgement speaks of besides is named but not taken in, or one masked scan would bring three hundred others.
 *
 * @param lineage the records taken, the judgements last
 */
public record Contents(Lineage lineage) {
    /** Collects from an archive. */
    public static Contents of(Archive archive, List<Hash> roots) {
        Lineage.Source source = Lineage.source(archive::record, archive::inputs, archive::label);
        Lineage made = Lineage.of(source, archive.kinds(), roots, Lineage.Reach.SPOKEN_OF);
        Set<Hash> taken = new LinkedHashSet<>();
        made.records().forEach(record -> taken.add(record.fingerprint()));
        Set<Hash> judgements = new LinkedHashSet<>();
        for (LineageRecord record : made.records()) {
            judgements.addAll(archive.graph().judgements(record.fingerprint()));
        }
        judgements.removeAll(taken);
        List<LineageRecord> all = new ArrayList<>(made.records());
        List<Hash> leaves = new ArrayList<>(judgements);
        for (Hash judgement : leaves) {
            Lineage single = Lineage.of(source, archive.kinds(), List.of(judgement), Lineage.Reach.MADE_FROM);
            single.records().stream()
                    .filter(record -> taken.add(record.fingerprint()))
                    .forEach(all::add);
        }
        return new Contents(new Lineage(roots, all, made.rawFiles(), made.absent()));
    }
}
