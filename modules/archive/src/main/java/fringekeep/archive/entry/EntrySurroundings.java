package fringekeep.archive.entry;

import fringekeep.archive.kind.Kinds;
import fringekeep.archive.problem.ProblemException;
import fringekeep.archive.record.Hash;
import fringekeep.archive.record.PersonId;

/**
 * What an entry document is read against.
 *
 * @param kinds the kinds that may be entered
 * @param records finds records by what people write
 * @param persons finds persons by name or id
 * @param rawFiles takes raw files in
 */
public record EntrySurroundings(Kinds kinds, Records records, Persons persons, RawFiles rawFiles) {
    /** Finds records by what people write: {@code scan 412}, a short form, 64 hexadecimal digits. */
    @FunctionalInterface
    public interface Records {
        /** The record. */
        Hash find(String reference) throws ProblemException;
    }

    /** Finds persons by name or id. */
    @FunctionalInterface
    public interface Persons {
        /** The person. */
        PersonId find(String nameOrId) throws ProblemException;
    }

    /** Takes raw files in by the path an entry document gives. */
    @FunctionalInterface
    public interface RawFiles {
        /** The file taken in. */
        TakenRaw take(String path) throws ProblemException;
    }

    /** A raw file taken in: its hash and its length (bytes). */
    public record TakenRaw(Hash hash, long bytes) {}
}
