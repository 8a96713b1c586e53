package fringekeep.archive.making;

import fringekeep.archive.kind.Inputs;
import fringekeep.archive.kind.RecordView;
import fringekeep.archive.kind.Subject;
import fringekeep.archive.record.AboutReference;
import fringekeep.archive.record.Hash;
import java.util.Optional;

/** One subject over a resolver. */
record ResolvedSubject(Resolver resolver, AboutReference reference) implements Subject {
    @Override
    public String role() {
        return reference.role();
    }

    @Override
    public Hash target() {
        return reference.record();
    }

    @Override
    public AboutReference.Reach reach() {
        return reference.reach();
    }

    @Override
    public Optional<RecordView> record() {
        return resolver.record(target());
    }

    @Override
    public Inputs inputs() {
        return resolver.inputs(target());
    }

    @Override
    public <T> Optional<T> facet(Class<T> facet) {
        return resolver.facet(target(), facet);
    }
}
