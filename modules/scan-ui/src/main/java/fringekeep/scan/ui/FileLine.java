package fringekeep.scan.ui;

import fringekeep.archive.problem.Problem;
import fringekeep.archive.record.Hash;
import fringekeep.scan.TakeInFiles.FileOutcome;
import fringekeep.scan.TakeInFiles.State;
import fringekeep.scan.TryFiles.Tried;
import java.nio.file.Path;
import java.util.List;
import java.util.Optional;

/**
 * A file on the sheet.
 *
 * @param file the file
 * @param asked the profile a person chose for it; empty: the best guess
 * @param trial what reading it gave, once tried as asked
 * @param outcome what taking it in gave, with the words for its scans
 */
record FileLine(Path file, Optional<Hash> asked, Optional<Trial> trial, Optional<Taken> outcome) {
    /**
     * A trial with the words that only the archive knows.
     *
     * @param tried the trial
     * @param profile what the profile is called
     * @param scans what its known scans, or those of other profiles, are called
     */
    record Trial(Tried tried, String profile, String scans) {}

    /**
     * An outcome with the words for its scans.
     *
     * @param outcome the outcome
     * @param scans what its scans are called
     */
    record Taken(FileOutcome outcome, String scans) {}

    /** Where a file stands. */
    enum Stand {
        /** Not tried yet. */
        WAITS,
        /** Would give new scans. */
        READS,
        /** Gives nothing new. */
        KNOWN,
        /** Would be, or was, refused. */
        REFUSED,
        /** Its scans are recorded. */
        TAKEN_IN
    }

    Stand stand() {
        if (outcome.isPresent()) {
            State state = outcome.get().outcome().state();
            return state == State.TAKEN_IN ? Stand.TAKEN_IN : state == State.KNOWN ? Stand.KNOWN : Stand.REFUSED;
        }
        if (trial.isEmpty()) {
            return Stand.WAITS;
        }
        Tried tried = trial.get().tried();
        return !tried.problems().isEmpty() ? Stand.REFUSED : tried.isNew() ? Stand.READS : Stand.KNOWN;
    }

    /** What is wrong with it. */
    List<Problem> problems() {
        return outcome.map(taken -> taken.outcome().problems())
                .or(() -> trial.map(tried -> tried.tried().problems()))
                .orElse(List.of());
    }

    /** The profile it is or was read by. */
    Optional<Hash> profile() {
        return outcome.flatMap(taken -> taken.outcome().profile())
                .or(() -> trial.flatMap(tried -> tried.tried().profile()));
    }

    FileLine fresh(Optional<Hash> profile) {
        return new FileLine(file, profile, Optional.empty(), Optional.empty());
    }

    FileLine with(Trial next) {
        return new FileLine(file, asked, Optional.of(next), outcome);
    }

    FileLine with(Taken next) {
        return new FileLine(file, asked, trial, Optional.of(next));
    }
}
