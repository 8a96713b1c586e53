package fringekeep.archive.kind;

import fringekeep.archive.problem.ProblemException;
import fringekeep.archive.record.Hash;
import java.util.Optional;

/** One resolved input. */
public interface Input {
    /** Position in the head, from 0. */
    int position();

    /** Its role. */
    String role();

    /** Which channel is meant, if one is. */
    Optional<String> channel();

    /** Fingerprint of the record or hash of the raw file. */
    Hash target();

    /** Whether the target is a raw file. */
    boolean raw();

    /** The record; empty for raw files and where it is not at hand. */
    Optional<RecordView> record();

    /** Bytes of the raw file; empty for records and where it is not at hand. */
    Optional<byte[]> rawBytes() throws ProblemException;

    /** The record's own inputs; without any for raw files. */
    Inputs inputs();

    /** A facet that the record's kind offers. */
    <T> Optional<T> facet(Class<T> facet);
}
