package fringekeep.archive.kind;

import java.util.List;

/**
 * What a record was made from and what it speaks of, resolved: from an archive, a bundle's folder or a supposed change; a
 * kind cannot tell which.
 */
public interface Inputs {
    /** All inputs in order; position i is {@code all().get(i)}. */
    List<Input> all();

    /** What the record speaks of, in order. */
    List<Subject> about();

    /** Inputs of one role in order. */
    default List<Input> role(String role) {
        return all().stream().filter(input -> input.role().equals(role)).toList();
    }

    /** Subjects of one role in order. */
    default List<Subject> about(String role) {
        return about().stream().filter(subject -> subject.role().equals(role)).toList();
    }
}
