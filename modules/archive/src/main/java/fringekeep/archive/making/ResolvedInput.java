package fringekeep.archive.making;

import fringekeep.archive.kind.Input;
import fringekeep.archive.kind.Inputs;
import fringekeep.archive.kind.RecordView;
import fringekeep.archive.problem.ProblemException;
import fringekeep.archive.record.Hash;
import fringekeep.archive.record.InputReference;
import java.util.List;
import java.util.Optional;

/** One input over a resolver. */
record ResolvedInput(Resolver resolver, int position, InputReference reference) implements Input {
    @Override
    public String role() {
        return reference.role();
    }

    @Override
    public Optional<String> channel() {
        return reference instanceof InputReference.OfRecord record ? record.channel() : Optional.empty();
    }

    @Override
    public Hash target() {
        if (reference instanceof InputReference.OfRecord record) {
            return record.record();
        }
        if (reference instanceof InputReference.OfRaw raw) {
            return raw.raw();
        }
        throw new AssertionError(reference);
    }

    @Override
    public boolean raw() {
        return reference instanceof InputReference.OfRaw;
    }

    @Override
    public Optional<RecordView> record() {
        return raw() ? Optional.empty() : resolver.record(target());
    }

    @Override
    public Optional<byte[]> rawBytes() throws ProblemException {
        return raw() ? resolver.source().raw(target()) : Optional.empty();
    }

    @Override
    public Inputs inputs() {
        return raw() ? resolver.inputs(List.of(), List.of()) : resolver.inputs(target());
    }

    @Override
    public <T> Optional<T> facet(Class<T> facet) {
        return raw() ? Optional.empty() : resolver.facet(target(), facet);
    }
}
