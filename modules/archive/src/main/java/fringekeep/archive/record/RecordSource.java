package fringekeep.archive.record;

import fringekeep.archive.problem.ProblemException;
import java.util.Optional;
import java.util.OptionalLong;

/**
 * Where stored bytes come from: an archive, a bundle's folder, memory. Gives the exact bytes that were hashed, or nothing
 * where they are not at hand. Implementations say whether they may be shared by threads.
 */
public interface RecordSource {
    /** Bytes of a head by its fingerprint. */
    Optional<byte[]> head(Hash fingerprint);

    /** Bytes of a part by its hash. */
    Optional<byte[]> part(Hash part);

    /**
     * Bytes of a payload by their hash.
     *
     * @throws ProblemException if they should be there and cannot be read
     */
    Optional<byte[]> payload(Hash payload) throws ProblemException;

    /**
     * Bytes of a raw file by their hash.
     *
     * @throws ProblemException if they should be there and cannot be read
     */
    Optional<byte[]> raw(Hash raw) throws ProblemException;

    /** Length of a raw file (bytes); empty where it is not at hand. */
    default OptionalLong rawLength(Hash raw) throws ProblemException {
        Optional<byte[]> bytes = raw(raw);
        return bytes.isPresent() ? OptionalLong.of(bytes.get().length) : OptionalLong.empty();
    }

    /** This source, and another one for what this one does not have. */
    default RecordSource or(RecordSource other) {
        return new LayeredSource(this, other);
    }
}
