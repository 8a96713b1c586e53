package fringekeep.archive.internal.store;

import fringekeep.archive.problem.ProblemException;
import fringekeep.archive.record.Hash;
import fringekeep.archive.record.RecordSource;
import java.util.Optional;

/** A source as it will be once some bytes are gone. */
record Without(RecordSource source, Hash gone) implements RecordSource {
    @Override
    public Optional<byte[]> head(Hash fingerprint) {
        return source.head(fingerprint);
    }

    @Override
    public Optional<byte[]> part(Hash part) {
        return part.equals(gone) ? Optional.empty() : source.part(part);
    }

    @Override
    public Optional<byte[]> payload(Hash payload) throws ProblemException {
        return payload.equals(gone) ? Optional.empty() : source.payload(payload);
    }

    @Override
    public Optional<byte[]> raw(Hash raw) throws ProblemException {
        return raw.equals(gone) ? Optional.empty() : source.raw(raw);
    }
}
