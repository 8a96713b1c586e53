package fringekeep.archive.graph;

import fringekeep.archive.record.Hash;
import fringekeep.archive.record.ThingId;
import java.time.Instant;
import java.util.Collection;
import java.util.List;
import java.util.Optional;
import java.util.Set;

/**
 * The graph of all records and their states at one watermark. Immutable to its reader; a newer one is asked for after a
 * commit.
 */
public interface Graph {
    /** Last journal entry it knows. */
    long watermark();

    /** States of a record; empty when none applies. */
    Set<StateName> states(Hash record);

    /** Why a record is outdated; empty when it is not. */
    List<Cause> causes(Hash record);

    /** All outdated records. Worked out once for a snapshot, forward from what was corrected, judged or continued. */
    Set<Hash> outdated();

    /** Everything upstream over inputs, records only, in order of dependence (inputs before users). */
    List<Hash> upstream(Hash record);

    /** Everything downstream over inputs, in order of dependence. */
    List<Hash> downstream(Hash record);

    /** Links of a record, both ways. */
    List<Link> links(Hash record);

    /** The record that stands for this one now: the end of its chain of corrections. Empty while disputed. */
    Optional<Hash> current(Hash record);

    /** Everyone in an open dispute with a current record, itself included; empty when it is not disputed. */
    List<Hash> rivals(Hash record);

    /**
     * Who is to be relied on among records that answer one question (record format 1, section 9).
     *
     * @param sameQuestion records of one kind with an equal question; corrected and withdrawn ones are left aside
     */
    Preference preferred(Collection<Hash> sameQuestion);

    /** All records of a thing in journal order. */
    List<Hash> records(ThingId thing);

    /** The segment of a thing that holds at an instant. Empty when there is none or it is disputed. */
    Optional<Hash> at(ThingId thing, Instant instant);

    /** Live judgements that speak of a record. */
    List<Hash> judgements(Hash record);

    /** Records that speak of a record or of its thing. */
    List<Hash> speakingOf(Hash record);

    /**
     * A link.
     *
     * @param from the record whose head holds it
     * @param to its target
     * @param sort which member
     * @param role role, empty for corrects and after
     */
    record Link(Hash from, Hash to, LinkSort sort, String role) {}

    /**
     * Who is preferred.
     *
     * @param chosen the one to rely on; empty when several stand and no judgement decides
     * @param candidates those that are current and not withdrawn, in journal order
     * @param because the judgement that decides, where one does
     */
    record Preference(Optional<Hash> chosen, List<Hash> candidates, Optional<Hash> because) {
        /** Copies. */
        public Preference {
            candidates = List.copyOf(candidates);
        }
    }

    /** Members of a head that link. */
    enum LinkSort {
        /** Made from. */
        INPUT,
        /** Speaks of. */
        ABOUT,
        /** Replaces. */
        CORRECTS,
        /** Follows. */
        AFTER
    }
}
