package fringekeep.fit;

import fringekeep.archive.Archive;
import fringekeep.archive.NewRecord;
import fringekeep.archive.Prepared;
import fringekeep.archive.Regathering;
import fringekeep.archive.json.JsonObject;
import fringekeep.archive.kind.RecordView;
import fringekeep.archive.problem.ProblemException;
import fringekeep.archive.record.Hash;
import fringekeep.archive.record.InputReference;
import fringekeep.archive.record.KindName;
import fringekeep.archive.record.PartName;
import java.util.ArrayList;
import java.util.List;
import java.util.Map;
import java.util.Optional;

/**
 * Asks a fit anew after something upstream was corrected or judged: scans that fell away are left out, and everything else is
 * gathered as it stands now.
 */
public final class FitRegathering implements Regathering {
    @Override
    public KindName kind() {
        return FitKind.NAME;
    }

    @Override
    public Optional<NewRecord> regather(Archive archive, Hash record, StandIn standIn, List<Prepared> prepared)
            throws ProblemException {
        RecordView fit = archive.record(record)
                .orElseThrow(() -> new IllegalArgumentException("no record " + record.shortForm()));
        List<Hash> scans = standing(fit, "scan", standIn);
        if (scans.isEmpty()) {
            return Optional.empty();
        }
        GatherInputs.Asked asked = new GatherInputs.Asked(
                scans,
                standing(fit, "reference", standIn),
                standing(fit, "background", standIn),
                channel(fit),
                Calibrations.targets(fit.choices()),
                pinned(fit, "notwithstanding"));
        return Optional.of(new NewRecord(
                FitKind.NAME,
                revised(new GatherInputs(archive).of(asked), standIn),
                List.of(),
                Map.of(PartName.CHOICES, asked(fit.choices(), scans.size())),
                List.of(),
                Optional.of(record),
                Optional.empty(),
                Optional.empty()));
    }

    private static List<Hash> pinned(RecordView fit, String role) {
        List<Hash> pinned = new ArrayList<>();
        for (InputReference input : fit.head().inputs()) {
            if (input instanceof InputReference.OfRecord of && input.role().equals(role)) {
                pinned.add(of.record());
            }
        }
        return pinned;
    }

    /** Those that did not fall away. Gathering starts from the records of the archive; revisions are put in after it. */
    private static List<Hash> standing(RecordView fit, String role, StandIn standIn) {
        return pinned(fit, role).stream()
                .filter(record -> standIn.of(record).isPresent())
                .toList();
    }

    private static List<InputReference> revised(List<InputReference> gathered, StandIn standIn) {
        List<InputReference> revised = new ArrayList<>();
        for (InputReference input : gathered) {
            if (input instanceof InputReference.OfRecord of) {
                standIn.of(of.record())
                        .ifPresent(hash -> revised.add(new InputReference.OfRecord(of.role(), hash, of.channel())));
            }
        }
        return revised;
    }

    private static String channel(RecordView fit) {
        return fit.head().inputs().stream()
                .filter(input -> input.role().equals("scan"))
                .map(input -> ((InputReference.OfRecord) input).channel())
                .flatMap(Optional::stream)
                .findFirst()
                .orElse("counts");
    }

    /** What setup or calibration told is asked of them again; a sum of which one scan is left is a single fit. */
    private static JsonObject asked(JsonObject choices, int scans) {
        JsonObject again = scans == 1 ? choices.with("combine", "single") : choices;
        Optional<JsonObject> period =
                choices.object("period").filter(each -> each.text("from").equals(Optional.of("setup")));
        return period.isPresent()
                ? again.with("period", period.get().without("si").without("u"))
                : again;
    }
}
