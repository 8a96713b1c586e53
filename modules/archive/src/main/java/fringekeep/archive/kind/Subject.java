package fringekeep.archive.kind;

import fringekeep.archive.record.AboutReference;
import fringekeep.archive.record.Hash;
import java.util.Optional;

/** Something a record speaks of, resolved to the very record named. */
public interface Subject {
    /** Its role. */
    String role();

    /** The record named. */
    Hash target();

    /** That record alone, or all of its thing. */
    AboutReference.Reach reach();

    /** The record; empty where it is not at hand. */
    Optional<RecordView> record();

    /** The record's own inputs and subjects. */
    Inputs inputs();

    /** A facet that the record's kind offers. */
    <T> Optional<T> facet(Class<T> facet);
}
