package fringekeep.scan;

import fringekeep.archive.json.JsonObject;
import fringekeep.archive.kind.Computation;
import fringekeep.archive.kind.Input;
import fringekeep.archive.kind.Inputs;
import fringekeep.archive.kind.MethodId;
import fringekeep.archive.kind.Outcome;
import fringekeep.archive.kind.RecordView;
import fringekeep.archive.problem.ProblemException;
import fringekeep.archive.problem.StoppedException;
import fringekeep.archive.problem.Work;
import fringekeep.scan.internal.ScanResult;
import fringekeep.scan.internal.problem.ScanProblems;
import fringekeep.scan.internal.reading.FileReader;
import fringekeep.scan.internal.reading.Profile;
import java.util.List;
import java.util.Optional;

/** Reads a section of a raw file by a profile: method {@code scan.read/1}. */
final class ScanComputation implements Computation {
    static final ScanComputation INSTANCE = new ScanComputation();
    static final MethodId READ = new MethodId("scan.read/1");

    private ScanComputation() {}

    @Override
    public List<MethodId> methods() {
        return List.of(READ);
    }

    @Override
    public JsonObject complete(JsonObject choices, Inputs inputs) throws ProblemException {
        if (choices.object("file").flatMap(file -> file.text("name")).isEmpty()) {
            throw new ProblemException(ScanProblems.of("scan.file-name", "/choices/file/name"));
        }
        JsonObject complete = choices.with("method", choices.text("method").orElse(READ.text()))
                .with("constants", choices.text("constants").orElse("CODATA 2018"));
        return complete.get("section").isPresent() ? complete : complete.with("section", 0);
    }

    @Override
    public Outcome compute(JsonObject choices, Inputs inputs, Work work) throws StoppedException {
        work.check();
        try {
            String file =
                    choices.object("file").flatMap(each -> each.text("name")).orElseThrow();
            Profile profile = profile(inputs);
            FileReader reader = new FileReader(profile, raw(inputs), file);
            work.check();
            return ScanResult.of(reader.read(section(choices)), choices);
        } catch (ProblemException e) {
            return new Outcome.NoResult(e.problems());
        }
    }

    private static int section(JsonObject choices) {
        return (int) Math.min(choices.integer("section").orElseThrow(), Integer.MAX_VALUE);
    }

    private static byte[] raw(Inputs inputs) throws ProblemException {
        Optional<Input> raw = inputs.role("raw").stream().findFirst();
        Optional<byte[]> bytes = raw.isPresent() ? raw.get().rawBytes() : Optional.empty();
        return bytes.orElseThrow(
                () -> new ProblemException(ScanProblems.of("scan.input-missing", "/inputs", "raw file")));
    }

    private static Profile profile(Inputs inputs) throws ProblemException {
        Optional<RecordView> record =
                inputs.role("profile").stream().findFirst().flatMap(Input::record);
        if (record.isEmpty()) {
            throw new ProblemException(ScanProblems.of("scan.input-missing", "/inputs", "reading profile"));
        }
        if (!record.get().head().kind().equals(ReadingProfileKind.NAME)) {
            throw new ProblemException(ScanProblems.of("scan.not-a-profile", "/inputs"));
        }
        return Profile.of(record.get().content());
    }
}
