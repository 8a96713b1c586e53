package fringekeep.archive.record;

import fringekeep.archive.problem.ProblemException;
import java.util.Optional;
import java.util.OptionalLong;

/** One source before another. */
record LayeredSource(RecordSource first, RecordSource second) implements RecordSource {
    @Override
    public Optional<byte[]> head(Hash fingerprint) {
        return first.head(fingerprint).or(() -> second.head(fingerprint));
    }

    @Override
    public Optional<byte[]> part(Hash part) {
        return first.part(part).or(() -> second.part(part));
    }

    @Override
    public Optional<byte[]> payload(Hash payload) throws ProblemException {
        Optional<byte[]> found = first.payload(payload);
        return found.isPresent() ? found : second.payload(payload);
    }

    @Override
    public Optional<byte[]> raw(Hash raw) throws ProblemException {
        Optional<byte[]> found = first.raw(raw);
        return found.isPresent() ? found : second.raw(raw);
    }

    @Override
    public OptionalLong rawLength(Hash raw) throws ProblemException {
        OptionalLong found = first.rawLength(raw);
        return found.isPresent() ? found : second.rawLength(raw);
    }
}
