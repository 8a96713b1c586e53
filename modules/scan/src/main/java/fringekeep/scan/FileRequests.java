package fringekeep.scan;

import fringekeep.archive.Archive;
import fringekeep.archive.NewRecord;
import fringekeep.archive.graph.Graph;
import fringekeep.archive.json.JsonObject;
import fringekeep.archive.kind.RecordView;
import fringekeep.archive.problem.ProblemException;
import fringekeep.archive.quantity.QuantityJson;
import fringekeep.archive.record.Hash;
import fringekeep.archive.record.InputReference;
import fringekeep.archive.record.Moment;
import fringekeep.archive.record.PartName;
import fringekeep.archive.record.PersonId;
import fringekeep.scan.internal.problem.ScanProblems;
import fringekeep.scan.internal.reading.FileReader;
import fringekeep.scan.internal.reading.Lines;
import fringekeep.scan.internal.reading.Profile;
import fringekeep.scan.internal.reading.Reading;
import java.io.IOException;
import java.nio.file.Files;
import java.nio.file.Path;
import java.time.Instant;
import java.time.ZoneId;
import java.util.ArrayList;
import java.util.EnumMap;
import java.util.HashSet;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import java.util.Set;

/** Turns files into requests for scans: reads them whole first, so that a refused file leaves nothing behind. */
final class FileRequests {
    private final Archive archive;
    private final boolean fileTimes;
    private final Optional<PersonId> person;
    private final GuessProfile guess;
    private final Set<String> requested = new HashSet<>();

    FileRequests(Archive archive, boolean fileTimes, Optional<PersonId> person) {
        this.archive = archive;
        this.fileTimes = fileTimes;
        this.person = person;
        this.guess = new GuessProfile(archive);
    }

    /**
     * What is to be recorded of a file.
     *
     * @param raw hash of its bytes, taken in
     * @param profile the profile it is read by
     * @param scans requests without result, one a section that was not read so before
     * @param known current scans of sections that were read by this profile before
     */
    record Gathered(Hash raw, Hash profile, List<NewRecord> scans, List<Hash> known) {}

    Gathered of(Path file, Optional<Hash> asked) throws ProblemException {
        String name = String.valueOf(file.getFileName());
        byte[] bytes = bytes(file);
        Hash chosen = asked.isPresent() ? asked.get() : guess.best(bytes, name);
        FileReader reader =
                new FileReader(Profile.of(requireProfile(archive, chosen).content()), bytes, name);
        List<Reading> sections = new ArrayList<>();
        for (int section = 0; section < reader.sections(); section++) {
            sections.add(reader.read(section));
        }
        Archive.RawTaken raw = archive.takeIn(bytes);
        Earlier earlier = new Earlier(archive, raw.hash());
        List<NewRecord> scans = new ArrayList<>();
        List<Hash> known = new ArrayList<>();
        for (int section = 0; section < sections.size(); section++) {
            Optional<Hash> same = earlier.readBy(chosen, section);
            if (same.isPresent()) {
                known.add(same.get());
            } else if (requested.add(raw.hash() + " " + chosen + " " + section)) {
                scans.add(scan(file, raw, chosen, section, sections.get(section), earlier));
            }
        }
        return new Gathered(raw.hash(), chosen, scans, known);
    }

    /** All bytes of a file. */
    static byte[] bytes(Path file) throws ProblemException {
        try {
            long length = Files.size(file);
            if (length > Lines.LARGEST) {
                // asked before reading: what is no text file may be larger than the memory
                throw new ProblemException(
                        ScanProblems.of("scan.file-too-large", file.toString(), length, Lines.LARGEST));
            }
            return Files.readAllBytes(file);
        } catch (IOException e) {
            throw new ProblemException(
                    ScanProblems.of("scan.file-unreadable", file.toString(), String.valueOf(e.getMessage())));
        }
    }

    /** The reading profile of a fingerprint. */
    static RecordView requireProfile(Archive archive, Hash hash) throws ProblemException {
        Optional<RecordView> view = archive.record(hash);
        if (view.isEmpty() || !view.get().head().kind().equals(ReadingProfileKind.NAME)) {
            throw new ProblemException(ScanProblems.of("scan.not-a-profile", archive.label(hash)));
        }
        return view.get();
    }

    private NewRecord scan(Path file, Archive.RawTaken raw, Hash profile, int section, Reading reading, Earlier earlier)
            throws ProblemException {
        JsonObject named = JsonObject.EMPTY.with("name", String.valueOf(file.getFileName()));
        JsonObject described = fileTimes ? named.with("modified", modified(file)) : named;
        Map<PartName, JsonObject> parts = new EnumMap<>(PartName.class);
        parts.put(PartName.CHOICES, JsonObject.EMPTY.with("file", described).with("section", section));
        if (!reading.header().personal().isEmpty()) {
            String words = String.join("\n", reading.header().personal());
            parts.put(PartName.REMARK, JsonObject.EMPTY.with("text", words));
        }
        return new NewRecord(
                ScanKind.NAME,
                List.of(
                        new InputReference.OfRaw("raw", raw.hash(), raw.bytes()),
                        new InputReference.OfRecord("profile", profile)),
                List.of(),
                parts,
                List.of(),
                earlier.replacedBy(profile, section),
                Optional.empty(),
                person);
    }

    private JsonObject modified(Path file) throws ProblemException {
        try {
            Instant at = Files.getLastModifiedTime(file).toInstant();
            ZoneId zone = ZoneId.of(archive.facts().zone());
            String offset = zone.getRules().getOffset(at).getId();
            return QuantityJson.write(new Moment(at, offset, Optional.of(zone.getId())));
        } catch (IOException e) {
            throw new ProblemException(
                    ScanProblems.of("scan.file-unreadable", file.toString(), String.valueOf(e.getMessage())));
        }
    }

    /** Current scans of one raw file that are recorded already. */
    private static final class Earlier {
        private final Graph graph;
        private final List<RecordView> scans;

        Earlier(Archive archive, Hash raw) throws ProblemException {
            this.graph = archive.graph();
            this.scans = new ScansOfFile(archive).current(raw);
        }

        Optional<Hash> readBy(Hash profile, int section) {
            return scans.stream()
                    .filter(scan ->
                            section(scan) == section && ScanTables.profile(scan).equals(Optional.of(profile)))
                    .map(RecordView::fingerprint)
                    .findFirst();
        }

        /** The scan read by a profile that the new one replaces: the new reading then corrects it. */
        Optional<Hash> replacedBy(Hash profile, int section) {
            return scans.stream()
                    .filter(scan -> section(scan) == section)
                    .filter(scan ->
                            ScanTables.profile(scan).flatMap(graph::current).equals(Optional.of(profile)))
                    .map(RecordView::fingerprint)
                    .findFirst();
        }

        private static long section(RecordView scan) {
            return scan.choices().integer("section").orElse(0);
        }
    }
}
