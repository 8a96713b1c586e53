package fringekeep.archive;

import fringekeep.archive.problem.ProblemException;
import fringekeep.archive.record.Hash;
import fringekeep.archive.record.KindName;
import java.util.List;
import java.util.Optional;

/**
 * How a record of one kind is asked for anew after something upstream was corrected or judged. Announced in {@code
 * META-INF/services/fringekeep.archive.Regathering} by kinds whose inputs are gathered by a rule of their own; for all others
 * each input is replaced by what stands for it now.
 */
public interface Regathering {
    /** The kind it is for. */
    KindName kind();

    /**
     * The request for the next revision.
     *
     * @param archive where the record lies
     * @param record the record to be revised
     * @param standIn what stands for an input now: a revision that was just prepared, the current record, or nothing where the
     *     input fell away
     * @param prepared revisions that are not recorded yet and may be referred to
     * @return a request that corrects {@code record}, without result when the kind is computed; empty when nothing is left to
     *     make it from
     */
    Optional<NewRecord> regather(Archive archive, Hash record, StandIn standIn, List<Prepared> prepared)
            throws ProblemException;

    /** What stands for an input now. */
    interface StandIn {
        /** The record itself when nothing replaced it; empty when it fell away. */
        Optional<Hash> of(Hash input);

        /** Why an input fell away or is to be seen with care: live judgements on it. */
        List<Hash> because(Hash input);
    }
}
