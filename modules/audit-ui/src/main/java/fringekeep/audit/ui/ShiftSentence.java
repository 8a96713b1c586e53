package fringekeep.audit.ui;

import fringekeep.archive.Archive;
import fringekeep.archive.json.JsonObject;
import fringekeep.archive.kind.RecordView;
import fringekeep.archive.problem.ProblemException;
import fringekeep.archive.problem.StoppedException;
import fringekeep.archive.problem.Work;
import fringekeep.archive.record.Hash;
import fringekeep.audit.NextRevision;
import fringekeep.audit.Revision;
import fringekeep.audit.Shift;
import fringekeep.audit.Supposed;
import fringekeep.desk.look.Texts;
import fringekeep.desk.stage.SizeOfChange;
import fringekeep.drawing.NumberText;
import java.util.Comparator;
import java.util.List;
import java.util.Optional;
import org.openide.util.lookup.ServiceProvider;

/** How far an outdated record would move, as one sentence: the values that move most, in their standard uncertainties. */
@ServiceProvider(service = SizeOfChange.class)
public final class ShiftSentence implements SizeOfChange {
    private static final Texts TEXTS = AuditStage.TEXTS;
    private static final int MOST = 3;

    /** For the service loader. */
    public ShiftSentence() {}

    @Override
    public String sentence(Archive archive, Hash record, Work work) throws ProblemException, StoppedException {
        List<Revision> revisions = NextRevision.prepare(
                archive, List.of(record), Supposed.NOTHING, RevisionReading.rules(), Optional.empty(), work);
        Optional<Revision> own = revisions.stream()
                .filter(revision -> revision.before().equals(record))
                .findFirst();
        if (own.isEmpty()) {
            return TEXTS.of("size.nothing");
        }
        if (!own.get().reasons().isEmpty()) {
            return own.get().reasons().get(0).what();
        }
        JsonObject result = archive.record(record).map(RecordView::result).orElse(JsonObject.EMPTY);
        List<String> moved = own.get().shifts().stream()
                .filter(shift -> shift.before() != shift.after())
                .sorted(Comparator.comparingDouble(
                        (Shift shift) -> -Math.abs(shift.inDeviations().orElse(0))))
                .limit(MOST)
                .map(shift -> words(result, shift))
                .toList();
        return moved.isEmpty() ? TEXTS.of("size.stays") : String.join("; ", moved);
    }

    private static String words(JsonObject result, Shift shift) {
        String what = ValueNames.words(result, shift.pointer());
        String before = shift.deviation() > 0
                ? NumberText.measured(shift.before(), shift.deviation())
                : NumberText.significant(shift.before(), 5);
        String after = shift.deviation() > 0
                ? NumberText.measured(shift.after(), shift.deviation())
                : NumberText.significant(shift.after(), 5);
        return shift.inDeviations().isPresent()
                ? TEXTS.of(
                        "size.sigma",
                        what,
                        before,
                        after,
                        NumberText.significant(Math.abs(shift.inDeviations().getAsDouble()), 2))
                : TEXTS.of("size.plain", what, before, after);
    }
}
