package fringekeep.archive;

import fringekeep.archive.record.Hash;
import fringekeep.archive.record.Head;
import java.util.List;
import java.util.Map;

/**
 * A record ready to be stored: examined, hashed, with its ids and salts drawn.
 *
 * @param fingerprint SHA-256 of {@code headBytes}
 * @param head the head
 * @param headBytes canonical bytes of the head
 * @param parts canonical bytes of the parts by hash
 * @param payloads bytes of the payloads by hash
 */
public record Prepared(
        Hash fingerprint, Head head, byte[] headBytes, Map<Hash, byte[]> parts, List<PayloadBytes> payloads) {
    /** Copies. */
    public Prepared {
        headBytes = headBytes.clone();
        parts = Map.copyOf(parts);
        payloads = List.copyOf(payloads);
    }

    /** Bytes of a payload. */
    public record PayloadBytes(Hash hash, byte[] bytes) {}
}
