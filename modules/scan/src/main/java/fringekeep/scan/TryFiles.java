package fringekeep.scan;

import fringekeep.archive.Archive;
import fringekeep.archive.facet.CountTable;
import fringekeep.archive.json.JsonObject;
import fringekeep.archive.kind.RecordView;
import fringekeep.archive.problem.Problem;
import fringekeep.archive.problem.ProblemException;
import fringekeep.archive.record.Hash;
import fringekeep.drawing.Picture;
import fringekeep.scan.internal.ScanResult;
import fringekeep.scan.internal.problem.ScanProblems;
import fringekeep.scan.internal.reading.FileReader;
import fringekeep.scan.internal.reading.Finding;
import fringekeep.scan.internal.reading.Profile;
import fringekeep.scan.internal.reading.Reading;
import fringekeep.scan.internal.reading.ResultColumns;
import java.nio.charset.Charset;
import java.nio.charset.StandardCharsets;
import java.nio.file.Path;
import java.util.ArrayList;
import java.util.LinkedHashMap;
import java.util.LinkedHashSet;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import java.util.Set;

/** Reads files as taking them in would, and stores nothing: what would become of each, and how it looks. */
public final class TryFiles {
    private final Archive archive;
    private final GuessProfile guess;

    /** Tries files for an archive. */
    public TryFiles(Archive archive) {
        this.archive = archive;
        this.guess = new GuessProfile(archive);
    }

    /**
     * What became of a trial.
     *
     * @param file the file
     * @param bytes its length; 0 when it cannot be read
     * @param profile the profile it is read by: the one asked for, else the likeliest; where none reads it, the one that gets
     *     farthest, if any tells a line
     * @param fitting all profiles that read it, the likeliest first; only filled where none was asked for
     * @param sections its sections, one scan each
     * @param rows rows of all sections
     * @param channels names of the channels
     * @param findings codes of what was noticed, each once
     * @param known scans that this very reading gave before
     * @param otherwise current scans of the same bytes that another profile gave
     * @param problems why it would be refused; empty when it would be taken in. Where no profile reads it: that, then what
     *     stops the one that gets farthest
     */
    public record Tried(
            Path file,
            long bytes,
            Optional<Hash> profile,
            List<Hash> fitting,
            int sections,
            int rows,
            List<String> channels,
            List<String> findings,
            List<Hash> known,
            List<Hash> otherwise,
            List<Problem> problems) {
        /** Copies. */
        public Tried {
            fitting = List.copyOf(fitting);
            channels = List.copyOf(channels);
            findings = List.copyOf(findings);
            known = List.copyOf(known);
            otherwise = List.copyOf(otherwise);
            problems = List.copyOf(problems);
        }

        /** Whether there is something new to take in. */
        public boolean isNew() {
            return problems.isEmpty() && known.size() < sections;
        }
    }

    /**
     * How a file looks.
     *
     * @param lines its text; lines that no encoding explains are shown in Latin-1
     * @param pictures counts of each section that can be read, drawn
     */
    public record Look(List<String> lines, List<Picture> pictures) {
        /** Copies. */
        public Look {
            lines = List.copyOf(lines);
            pictures = List.copyOf(pictures);
        }
    }

    /**
     * Current reading profiles, the newest first.
     *
     * @see GuessProfile#guess
     */
    public List<Hash> profiles() {
        return guess.profiles();
    }

    /** Reads a file by a profile, or by the likeliest where none is asked for. */
    public Tried attempt(Path file, Optional<Hash> asked) {
        try {
            byte[] bytes = FileRequests.bytes(file);
            return attempt(file, bytes, asked);
        } catch (ProblemException e) {
            return refused(file, 0, asked, List.of(), e.problems());
        }
    }

    private Tried attempt(Path file, byte[] bytes, Optional<Hash> asked) throws ProblemException {
        List<Hash> fitting = asked.isPresent() ? List.of() : fitting(bytes, name(file));
        Optional<Hash> profile = asked.or(() -> fitting.stream().findFirst());
        if (profile.isEmpty()) {
            return nearest(file, bytes);
        }
        try {
            return read(file, bytes, profile.get(), fitting);
        } catch (ProblemException e) {
            return refused(file, bytes.length, profile, fitting, e.problems());
        }
    }

    /** The profile that gets farthest into the file, with what stops it. */
    private Tried nearest(Path file, byte[] bytes) {
        List<Hash> profiles = profiles();
        List<Problem> problems = new ArrayList<>();
        problems.add(ScanProblems.of("scan.no-profile", name(file), profiles.size()));
        Optional<Hash> nearest = Optional.empty();
        List<Problem> stops = List.of();
        for (Hash profile : profiles) {
            List<Problem> own = problems(profile, bytes, name(file));
            if (line(own) > line(stops)) {
                nearest = Optional.of(profile);
                stops = own;
            }
        }
        problems.addAll(stops);
        return refused(file, bytes.length, nearest, List.of(), problems);
    }

    private List<Problem> problems(Hash profile, byte[] bytes, String name) {
        try {
            FileReader reader = reader(profile, bytes, name);
            for (int section = 0; section < reader.sections(); section++) {
                reader.read(section);
            }
            return List.of();
        } catch (ProblemException e) {
            return e.problems();
        }
    }

    /** The first line that is in the way; 0 where none is named. */
    private static int line(List<Problem> problems) {
        return problems.stream()
                .flatMap(problem -> FilePlace.of(problem).stream())
                .mapToInt(FilePlace::line)
                .findFirst()
                .orElse(0);
    }

    private List<Hash> fitting(byte[] bytes, String name) throws ProblemException {
        return guess.guess(bytes, name).stream()
                .map(GuessProfile.Guess::profile)
                .toList();
    }

    private static String name(Path file) {
        return String.valueOf(file.getFileName());
    }

    private static Tried refused(
            Path file, long bytes, Optional<Hash> profile, List<Hash> fitting, List<Problem> problems) {
        return new Tried(file, bytes, profile, fitting, 0, 0, List.of(), List.of(), List.of(), List.of(), problems);
    }

    private Tried read(Path file, byte[] bytes, Hash profile, List<Hash> fitting) throws ProblemException {
        FileReader reader = reader(profile, bytes, name(file));
        int rows = 0;
        Set<String> channels = new LinkedHashSet<>();
        Set<String> findings = new LinkedHashSet<>();
        for (int section = 0; section < reader.sections(); section++) {
            Reading reading = reader.read(section);
            rows += reading.table().rows();
            ResultColumns.of(reading.table()).array("channels").objects().stream()
                    .flatMap(channel -> channel.text("name").stream())
                    .forEach(channels::add);
            reading.findings().stream().map(Finding::code).forEach(findings::add);
        }
        List<Hash> known = new ArrayList<>();
        List<Hash> otherwise = new ArrayList<>();
        for (RecordView scan : new ScansOfFile(archive).current(Hash.of(bytes))) {
            boolean same = ScanTables.profile(scan).equals(Optional.of(profile));
            (same ? known : otherwise).add(scan.fingerprint());
        }
        return new Tried(
                file,
                bytes.length,
                Optional.of(profile),
                fitting,
                reader.sections(),
                rows,
                List.copyOf(channels),
                List.copyOf(findings),
                known,
                otherwise,
                List.of());
    }

    private FileReader reader(Hash profile, byte[] bytes, String name) throws ProblemException {
        return new FileReader(profile(profile), bytes, name);
    }

    private Profile profile(Hash hash) throws ProblemException {
        return Profile.of(FileRequests.requireProfile(archive, hash).content());
    }

    /**
     * Text and drawing of a file.
     *
     * @param most lines at most
     * @throws ProblemException if the file cannot be read from the disk
     */
    public Look look(Path file, Optional<Hash> profile, int most) throws ProblemException {
        byte[] bytes = FileRequests.bytes(file);
        Charset encoding = StandardCharsets.UTF_8;
        List<Picture> pictures = List.of();
        if (profile.isPresent()) {
            encoding = Charset.forName(profile(profile.get()).encoding());
            pictures = pictures(profile.get(), bytes, name(file));
        }
        return new Look(lines(bytes, encoding, most), pictures);
    }

    private List<Picture> pictures(Hash profile, byte[] bytes, String name) {
        List<Picture> pictures = new ArrayList<>();
        try {
            FileReader reader = reader(profile, bytes, name);
            for (int section = 0; section < reader.sections(); section++) {
                pictures.add(ScanPicture.of(table(reader.read(section))));
            }
        } catch (ProblemException e) {
            return pictures; // what is wrong is told by the trial; sections before it are drawn
        }
        return pictures;
    }

    private static CountTable table(Reading reading) throws ProblemException {
        Map<String, double[]> columns = new LinkedHashMap<>();
        reading.table().columns().forEach(column -> columns.put(column.name(), column.values()));
        return ScanTables.table(ScanResult.of(reading, JsonObject.EMPTY).result(), columns);
    }

    private static List<String> lines(byte[] bytes, Charset encoding, int most) {
        String text = new String(bytes, encoding);
        String shown = text.indexOf('\uFFFD') >= 0 ? new String(bytes, StandardCharsets.ISO_8859_1) : text;
        return shown.lines().limit(most).toList();
    }
}
