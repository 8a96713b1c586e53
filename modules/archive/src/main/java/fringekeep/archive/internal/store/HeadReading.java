package fringekeep.archive.internal.store;

import fringekeep.archive.internal.records.HeadCodec;
import fringekeep.archive.internal.store.db.StoreFailure;
import fringekeep.archive.internal.store.tables.Records;
import fringekeep.archive.problem.ProblemException;
import fringekeep.archive.record.Hash;
import fringekeep.archive.record.Head;

/** Heads that were examined before they were stored; one that cannot be read now was damaged since. */
final class HeadReading {
    private HeadReading() {}

    static Head head(Records.HeadRow row) {
        return head(row.record().fingerprint(), row.head());
    }

    static Head head(Hash fingerprint, byte[] bytes) {
        try {
            return HeadCodec.read(bytes);
        } catch (ProblemException e) {
            throw new StoreFailure("the stored head of " + fingerprint + " is damaged; run check", e);
        }
    }
}
