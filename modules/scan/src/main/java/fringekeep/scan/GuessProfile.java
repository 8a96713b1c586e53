package fringekeep.scan;

import fringekeep.archive.Archive;
import fringekeep.archive.graph.Graph;
import fringekeep.archive.graph.StateName;
import fringekeep.archive.kind.RecordView;
import fringekeep.archive.problem.ProblemException;
import fringekeep.archive.record.Hash;
import fringekeep.scan.internal.problem.ScanProblems;
import fringekeep.scan.internal.reading.FileReader;
import fringekeep.scan.internal.reading.Finding;
import fringekeep.scan.internal.reading.Profile;
import fringekeep.scan.internal.reading.Reading;
import java.util.ArrayList;
import java.util.Comparator;
import java.util.List;
import java.util.Optional;
import java.util.Set;

/** Finds the reading profiles that read a file without a problem, the likeliest first. */
public final class GuessProfile {
    private static final int PAGE = 1_000;
    private static final Set<StateName> PASSED_OVER =
            Set.of(StateName.CORRECTED, StateName.WITHDRAWN, StateName.DISPUTED);

    private final Archive archive;

    /** Guesses among the current profiles of an archive. */
    public GuessProfile(Archive archive) {
        this.archive = archive;
    }

    /**
     * A profile that reads the file.
     *
     * @param profile its fingerprint
     * @param sections sections of the file
     * @param rows rows of all sections
     * @param headerValues header values that were found
     * @param findings codes of what was noticed
     */
    public record Guess(Hash profile, int sections, int rows, int headerValues, List<String> findings) {
        /** Copies. */
        public Guess {
            findings = List.copyOf(findings);
        }
    }

    /**
     * All profiles that read a file without a problem: first those with the fewest suspicions of a wrong unit, then those
     * that find the most header values, then the fewest other findings, then the most columns read, then the newest.
     */
    public List<Guess> guess(byte[] bytes, String file) throws ProblemException {
        List<Guess> guesses = new ArrayList<>();
        for (Hash profile : profiles()) {
            attempt(profile, bytes, file).ifPresent(guesses::add);
        }
        guesses.sort(Comparator.comparingLong(GuessProfile::suspicions)
                .thenComparing(Comparator.comparingInt(Guess::headerValues).reversed())
                .thenComparingInt(guess -> guess.findings().size()));
        return guesses;
    }

    /**
     * The likeliest profile.
     *
     * @throws ProblemException if no profile reads the file
     */
    Hash best(byte[] bytes, String file) throws ProblemException {
        List<Guess> guesses = guess(bytes, file);
        if (guesses.isEmpty()) {
            throw new ProblemException(
                    ScanProblems.of("scan.no-profile", file, profiles().size()));
        }
        return guesses.get(0).profile();
    }

    private static long suspicions(Guess guess) {
        return guess.findings().stream().filter("wrong-unit-suspected"::equals).count();
    }

    /** Current profiles that are not withdrawn, the newest first. */
    List<Hash> profiles() {
        Graph graph = archive.graph();
        List<Hash> profiles = new ArrayList<>();
        long from = 1;
        List<Hash> page = archive.records(ReadingProfileKind.NAME.text(), from, PAGE);
        while (!page.isEmpty()) {
            page.stream()
                    .filter(profile -> graph.states(profile).stream().noneMatch(PASSED_OVER::contains))
                    .forEach(profile -> profiles.add(0, profile));
            from = archive.recorded(page.get(page.size() - 1))
                    .map(entry -> entry.n() + 1)
                    .orElse(Long.MAX_VALUE);
            page = page.size() < PAGE ? List.of() : archive.records(ReadingProfileKind.NAME.text(), from, PAGE);
        }
        return profiles;
    }

    private Optional<Guess> attempt(Hash hash, byte[] bytes, String file) {
        Optional<RecordView> profile = archive.record(hash);
        if (profile.isEmpty()) {
            return Optional.empty();
        }
        try {
            FileReader reader = new FileReader(Profile.of(profile.get().content()), bytes, file);
            int rows = 0;
            int headerValues = 0;
            List<String> findings = new ArrayList<>();
            for (int section = 0; section < reader.sections(); section++) {
                Reading reading = reader.read(section);
                rows += reading.table().rows();
                headerValues += reading.header().found();
                reading.findings().stream().map(Finding::code).forEach(findings::add);
            }
            return Optional.of(new Guess(hash, reader.sections(), rows, headerValues, findings));
        } catch (ProblemException e) {
            return Optional.empty();
        }
    }
}
