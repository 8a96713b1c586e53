package fringekeep.archive.making;

import fringekeep.archive.kind.Input;
import fringekeep.archive.kind.Inputs;
import fringekeep.archive.kind.Subject;
import fringekeep.archive.record.AboutReference;
import fringekeep.archive.record.InputReference;
import java.util.ArrayList;
import java.util.List;

/** Resolved inputs and subjects; what they point to is read when asked for. */
record ResolvedInputs(List<Input> all, List<Subject> about) implements Inputs {
    static ResolvedInputs of(Resolver resolver, List<InputReference> inputs, List<AboutReference> about) {
        List<Input> resolved = new ArrayList<>(inputs.size());
        for (int i = 0; i < inputs.size(); i++) {
            resolved.add(new ResolvedInput(resolver, i, inputs.get(i)));
        }
        List<Subject> subjects = new ArrayList<>(about.size());
        about.forEach(reference -> subjects.add(new ResolvedSubject(resolver, reference)));
        return new ResolvedInputs(List.copyOf(resolved), List.copyOf(subjects));
    }
}
