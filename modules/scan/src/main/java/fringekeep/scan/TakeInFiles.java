package fringekeep.scan;

import fringekeep.archive.Archive;
import fringekeep.archive.NewRecord;
import fringekeep.archive.Prepared;
import fringekeep.archive.json.JsonArray;
import fringekeep.archive.json.JsonObject;
import fringekeep.archive.problem.Problem;
import fringekeep.archive.problem.ProblemException;
import fringekeep.archive.problem.StoppedException;
import fringekeep.archive.problem.Work;
import fringekeep.archive.record.Hash;
import fringekeep.archive.record.PersonId;
import fringekeep.scan.internal.problem.ScanProblems;
import java.nio.file.Path;
import java.util.ArrayList;
import java.util.List;
import java.util.Optional;
import java.util.function.Consumer;

/**
 * Takes many raw files in by one reading profile, or each by the profile that fits it best. A file that cannot be read is
 * refused whole and the others go on; a file that was read by the same profile before gives no second scan. Stopping keeps
 * what was recorded before.
 *
 * <p>Thread rule: one call at a time for one instance.
 */
public final class TakeInFiles {
    /** Records gathered before they are committed together. */
    private static final int GATHERED = 50;

    private final Archive archive;

    /** Takes files into an archive. */
    public TakeInFiles(Archive archive) {
        this.archive = archive;
    }

    /**
     * What is asked.
     *
     * @param files in the order in which scans are to be numbered
     * @param profile the reading profile; empty: the best guess for each file
     * @param fileTimes whether the time of each file is recorded with its name
     * @param person who takes them in, if that is to be recorded; needed where headers tell of persons
     */
    public record Request(List<Path> files, Optional<Hash> profile, boolean fileTimes, Optional<PersonId> person) {
        /** Copies. */
        public Request {
            files = List.copyOf(files);
        }
    }

    /** What became of a file. */
    public enum State {
        /** Its scans are recorded. */
        TAKEN_IN,
        /** It was read by this profile before; its scans are named. */
        KNOWN,
        /** Nothing of it was stored. */
        REFUSED,
        /** Not reached before the stop. */
        STOPPED
    }

    /**
     * What became of one file.
     *
     * @param file the file
     * @param state what became of it
     * @param raw hash of its bytes; empty when refused or not reached
     * @param profile the profile it was read by
     * @param scans fingerprints of its scans, one a section
     * @param findings codes of what was noticed while reading
     * @param problems why it was refused
     */
    public record FileOutcome(
            Path file,
            State state,
            Optional<Hash> raw,
            Optional<Hash> profile,
            List<Hash> scans,
            List<String> findings,
            List<Problem> problems) {
        /** Copies. */
        public FileOutcome {
            scans = List.copyOf(scans);
            findings = List.copyOf(findings);
            problems = List.copyOf(problems);
        }
    }

    /**
     * Takes files in.
     *
     * @return one outcome a file, in the order of the request
     * @throws ProblemException if the profile is no reading profile of this archive; troubles of single files are outcomes
     */
    public List<FileOutcome> takeIn(Request request, Work work) throws ProblemException {
        if (request.profile().isPresent()) {
            FileRequests.requireProfile(archive, request.profile().get());
        }
        List<Chosen> chosen = request.files().stream()
                .map(file -> new Chosen(file, request.profile()))
                .toList();
        return takeEach(chosen, request.fileTimes(), request.person(), work, outcome -> {});
    }

    /**
     * A file and how it is to be read.
     *
     * @param file the file
     * @param profile the reading profile; empty: the best guess
     */
    public record Chosen(Path file, Optional<Hash> profile) {}

    /**
     * Takes files in, each by a profile of its own.
     *
     * @param files in the order in which scans are to be numbered
     * @param fileTimes whether the time of each file is recorded with its name
     * @param person who takes them in, if that is to be recorded
     * @param told hears the outcome of each file as soon as it is durable, on the calling thread
     * @return one outcome a file, in the order asked; a profile that is none refuses its file
     */
    public List<FileOutcome> takeEach(
            List<Chosen> files, boolean fileTimes, Optional<PersonId> person, Work work, Consumer<FileOutcome> told) {
        FileRequests requests = new FileRequests(archive, fileTimes, person);
        List<FileOutcome> outcomes = new ArrayList<>();
        List<Pending> pending = new ArrayList<>();
        for (Chosen chosen : files) {
            if (work.stopped()) {
                break;
            }
            pending.add(read(chosen, requests, pending));
            if (pending.stream().mapToInt(each -> each.prepared().size()).sum() >= GATHERED) {
                tell(commit(pending), outcomes, told);
                pending.clear();
            }
            String name = String.valueOf(chosen.file().getFileName());
            work.progress(outcomes.size() + pending.size(), files.size(), name);
        }
        tell(commit(pending), outcomes, told);
        for (Chosen chosen : files.subList(outcomes.size(), files.size())) {
            Path file = chosen.file();
            Problem stopped = ScanProblems.of("scan.stopped", file.toString());
            tell(List.of(refused(file, State.STOPPED, List.of(stopped))), outcomes, told);
        }
        return outcomes;
    }

    private static void tell(List<FileOutcome> next, List<FileOutcome> outcomes, Consumer<FileOutcome> told) {
        outcomes.addAll(next);
        next.forEach(told);
    }

    /** A file that was read, and what is to be recorded of it. */
    private record Pending(FileOutcome outcome, List<Prepared> prepared) {}

    private Pending read(Chosen chosen, FileRequests requests, List<Pending> pending) {
        Path file = chosen.file();
        try {
            FileRequests.Gathered gathered = requests.of(file, chosen.profile());
            List<Prepared> prepared = new ArrayList<>();
            List<Hash> scans = new ArrayList<>(gathered.known());
            List<String> findings = new ArrayList<>();
            for (NewRecord scan : gathered.scans()) {
                NewRecord computed = archive.compute(scan, List.of(), Work.QUIET);
                prepared.add(archive.prepare(computed, List.of()));
                findings.addAll(findings(computed));
            }
            prepared.forEach(each -> scans.add(each.fingerprint()));
            State state = prepared.isEmpty() ? State.KNOWN : State.TAKEN_IN;
            FileOutcome outcome = new FileOutcome(
                    file,
                    state,
                    Optional.of(gathered.raw()),
                    Optional.of(gathered.profile()),
                    scans,
                    findings,
                    List.of());
            return new Pending(sameAsPending(outcome, pending), prepared);
        } catch (ProblemException e) {
            return new Pending(refused(file, State.REFUSED, e.problems()), List.of());
        } catch (StoppedException e) {
            throw new IllegalStateException("quiet work is never stopped", e);
        }
    }

    private static FileOutcome sameAsPending(FileOutcome outcome, List<Pending> pending) {
        boolean waits = outcome.state() == State.KNOWN && outcome.scans().isEmpty();
        return waits
                ? pending.stream()
                        .map(Pending::outcome)
                        .filter(earlier -> earlier.raw().equals(outcome.raw())
                                && earlier.profile().equals(outcome.profile()))
                        .findFirst()
                        .map(earlier -> new FileOutcome(
                                outcome.file(),
                                State.KNOWN,
                                outcome.raw(),
                                outcome.profile(),
                                earlier.scans(),
                                List.of(),
                                List.of()))
                        .orElse(outcome)
                : outcome;
    }

    private static List<String> findings(NewRecord scan) {
        JsonObject result = scan.parts().getOrDefault(fringekeep.archive.record.PartName.RESULT, JsonObject.EMPTY);
        JsonArray findings = result.array("findings");
        return findings.objects().stream()
                .flatMap(finding -> finding.text("code").stream())
                .toList();
    }

    /** Commits what is pending in one transaction; if that fails, nothing of it is stored and every file says why. */
    private List<FileOutcome> commit(List<Pending> pending) {
        List<Prepared> all =
                pending.stream().flatMap(each -> each.prepared().stream()).toList();
        try {
            for (int from = 0; from < all.size(); from += 100) {
                archive.record(all.subList(from, Math.min(from + 100, all.size())));
            }
            return pending.stream().map(Pending::outcome).toList();
        } catch (ProblemException e) {
            return pending.stream()
                    .map(each -> each.prepared().isEmpty()
                            ? each.outcome()
                            : refused(each.outcome().file(), State.REFUSED, e.problems()))
                    .toList();
        }
    }

    private static FileOutcome refused(Path file, State state, List<Problem> problems) {
        return new FileOutcome(file, state, Optional.empty(), Optional.empty(), List.of(), List.of(), problems);
    }
}
