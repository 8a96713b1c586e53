package fringekeep.archive.lineage;

import fringekeep.archive.kind.Inputs;
import fringekeep.archive.kind.RecordView;
import fringekeep.archive.kind.Title;
import fringekeep.archive.record.Hash;

/**
 * A record within a lineage.
 *
 * @param view the record
 * @param inputs what it was made from and speaks of
 * @param label {@code scan 0412}, or the short form where no archive gives numbers
 * @param title what its kind calls it; kind and short form where the kind is not known here
 */
public record LineageRecord(RecordView view, Inputs inputs, String label, Title title) {
    /** Fingerprint. */
    public Hash fingerprint() {
        return view.fingerprint();
    }
}
