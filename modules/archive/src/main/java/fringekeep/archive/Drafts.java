package fringekeep.archive;

import fringekeep.archive.json.JsonObject;
import fringekeep.archive.problem.ProblemException;
import java.util.Optional;
import java.util.SortedMap;

/** Unfinished entry forms: unhashed, not in the journal, kept through a crash. */
public interface Drafts {
    /** All drafts by id. */
    SortedMap<String, JsonObject> all() throws ProblemException;

    /** One draft. */
    Optional<JsonObject> get(String id) throws ProblemException;

    /** Saves a draft under an id of 32 lower-case hexadecimal digits; the body has a member {@code kind}. */
    void save(String id, JsonObject body) throws ProblemException;

    /** Removes a draft. */
    void remove(String id) throws ProblemException;
}
