package fringekeep.archive.internal.store;

import fringekeep.archive.internal.store.projection.ProjectedRow;
import fringekeep.archive.record.Hash;
import fringekeep.archive.record.Head;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import java.util.Set;

/**
 * A record with all that is written with it, worked out before the transaction begins.
 *
 * @param fingerprint SHA-256 of the head
 * @param head the head
 * @param headBytes its exact bytes
 * @param parts exact bytes of the parts at hand
 * @param payloads payloads at hand
 * @param words words to be found by
 * @param rows rows of projections
 */
record Arrival(
        Hash fingerprint,
        Head head,
        byte[] headBytes,
        Map<Hash, byte[]> parts,
        List<ArrivingPayload> payloads,
        Set<String> words,
        List<ProjectedRow> rows) {
    /** A payload: its bytes where they go into the table; larger ones lie in their folder already. */
    record ArrivingPayload(Hash hash, long size, Optional<byte[]> bytes) {}
}
