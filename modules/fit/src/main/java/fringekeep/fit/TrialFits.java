package fringekeep.fit;

import fringekeep.archive.Archive;
import fringekeep.archive.NewRecord;
import fringekeep.archive.Prepared;
import fringekeep.archive.facet.CountTable;
import fringekeep.archive.json.JsonObject;
import fringekeep.archive.kind.RecordView;
import fringekeep.archive.problem.ProblemException;
import fringekeep.archive.problem.StoppedException;
import fringekeep.archive.problem.Work;
import fringekeep.archive.record.AboutReference;
import fringekeep.archive.record.AboutReference.Reach;
import fringekeep.archive.record.Hash;
import fringekeep.archive.record.InputReference;
import fringekeep.archive.record.KindName;
import fringekeep.archive.record.PartName;
import fringekeep.archive.record.PersonId;
import fringekeep.fit.FitScans.Request;
import fringekeep.fit.internal.FitProblems;
import fringekeep.fit.internal.Masks;
import java.util.ArrayList;
import java.util.List;
import java.util.Map;
import java.util.NavigableSet;
import java.util.Optional;
import java.util.TreeSet;

/**
 * Fits that a person tries before one is recorded: inputs are gathered once and computed as often as choices turn. What is
 * recorded in the end is what {@link FitScans} records of the same request once the masks have been judged.
 *
 * <p>Thread rule: one call at a time for one instance.
 */
public final class TrialFits {
    private static final KindName JUDGEMENT = new KindName("judgement");

    private final Archive archive;
    private Optional<Gathered> gathered = Optional.empty();

    /** Tries fits of an archive. */
    public TrialFits(Archive archive) {
        this.archive = archive;
    }

    /**
     * What is tried.
     *
     * @param request what is asked of the fit
     * @param masks what is changed about masks
     */
    public record Draft(Request request, List<MaskChange> masks) {
        /** Copies; changes that change nothing are left out. */
        public Draft {
            masks = masks.stream().filter(mask -> !mask.empty()).toList();
        }
    }

    /**
     * What was recorded.
     *
     * @param fit the fit
     * @param judgements masks before it, and the preference behind it
     */
    public record Kept(Hash fit, List<Hash> judgements) {
        /** Copies. */
        public Kept {
            judgements = List.copyOf(judgements);
        }
    }

    private record Gathered(long watermark, Request asked, List<String> targets, NewRecord record) {
        boolean answers(long now, Request request, List<String> wanted) {
            return watermark == now && targets.equals(wanted) && asked.equals(withoutChoices(request));
        }
    }

    private static Request withoutChoices(Request request) {
        return new Request(
                request.scans(),
                request.channel(),
                JsonObject.EMPTY,
                request.references(),
                request.backgrounds(),
                request.notwithstanding(),
                request.again());
    }

    /** Tries a fit. One that fails answers with the reason and the counts. */
    public Trial attempt(Draft draft, Optional<Hash> compared, Work work) throws StoppedException {
        TrialDrawing drawing = new TrialDrawing(archive, draft);
        try {
            MaskJudgements judgements = MaskJudgements.toTry(archive, draft.masks());
            NewRecord computed = archive.compute(
                    request(draft.request(), judgements, Optional.empty()), judgements.prepared(), work);
            return drawing.fitted(computed, compared);
        } catch (ProblemException e) {
            return drawing.failed(e.problems());
        }
    }

    /**
     * Records masks, fit and preference in one transaction.
     *
     * @param preferred code of the reason why the new fit is preferred to others of the same question; empty for no word of it
     * @throws ProblemException if a reason is missing or there is no fit; nothing is recorded then
     */
    public Kept record(Draft draft, Optional<String> preferred, PersonId person, Work work)
            throws ProblemException, StoppedException {
        MaskJudgements judgements = MaskJudgements.toRecord(archive, draft.masks(), person);
        List<Prepared> all = new ArrayList<>(judgements.prepared());
        NewRecord request = request(draft.request(), judgements, Optional.of(person));
        Prepared fit = archive.prepare(archive.compute(request, all, work), all);
        all.add(fit);
        List<Hash> others = new ArrayList<>(new FitScans(archive).rivals(request.inputs()));
        request.corrects().ifPresent(others::remove);
        if (preferred.isPresent() && !others.isEmpty()) {
            all.add(archive.prepare(preference(fit.fingerprint(), others, preferred.get(), "", person), all));
        }
        archive.record(all);
        List<Hash> judged =
                new ArrayList<>(all.stream().map(Prepared::fingerprint).toList());
        judged.remove(fit.fingerprint());
        return new Kept(fit.fingerprint(), judged);
    }

    /**
     * Records that a fit is preferred to all other current fits of the same question.
     *
     * @param reason code of the reason
     * @param words words beside it; may be empty unless the reason is {@code other}
     * @throws ProblemException if there is no other fit of the question
     */
    public Hash prefer(Hash fit, String reason, String words, PersonId person) throws ProblemException {
        List<Hash> others = new ArrayList<>(rivals(fit));
        if (others.isEmpty()) {
            throw new ProblemException(FitProblems.of("fit.no-rival", archive.label(fit), archive.label(fit)));
        }
        return archive.record(preference(fit, others, reason, words, person)).fingerprint();
    }

    private static NewRecord preference(Hash chosen, List<Hash> over, String reason, String words, PersonId person) {
        List<AboutReference> about = new ArrayList<>();
        about.add(new AboutReference("chosen", chosen, Reach.THING));
        over.forEach(each -> about.add(new AboutReference("over", each, Reach.THING)));
        JsonObject content = JsonObject.EMPTY.with("verdict", "preferred").with("reason", reason);
        Map<PartName, JsonObject> parts = words.isBlank()
                ? Map.of(PartName.CONTENT, content)
                : Map.of(PartName.CONTENT, content, PartName.REMARK, JsonObject.EMPTY.with("text", words.strip()));
        return new NewRecord(
                JUDGEMENT, List.of(), about, parts, List.of(), Optional.empty(), Optional.empty(), Optional.of(person));
    }

    /** Other current fits that answer the question a fit answers. */
    public List<Hash> rivals(Hash fit) {
        RecordView view = archive.record(fit).orElseThrow();
        List<Hash> others =
                new ArrayList<>(new FitScans(archive).rivals(view.head().inputs()));
        others.remove(fit);
        return others;
    }

    /** All current fits that pin one of these scans, in the order of the journal. */
    public List<Hash> fitsOf(List<Hash> scans) {
        List<Hash> fits = new ArrayList<>();
        for (Hash scan : scans) {
            SameQuestion.fits(archive, archive.graph(), scan).stream()
                    .filter(fit -> !fits.contains(fit))
                    .forEach(fits::add);
        }
        return fits;
    }

    /** Rows of a channel that live judgements mask. */
    public NavigableSet<Integer> masked(Hash scan, String channel) {
        NavigableSet<Integer> masked = new TreeSet<>();
        int rows = rows(archive, scan);
        MaskJudgements.live(archive, scan, channel).forEach(mask -> masked.addAll(Masks.rows(mask.content(), rows)));
        return masked;
    }

    /** The scans a fit pins, as they stand now, in its order. */
    public static List<Hash> scansOf(Archive archive, Hash fit) {
        List<Hash> scans = new ArrayList<>();
        for (InputReference input : archive.record(fit).orElseThrow().head().inputs()) {
            if (input instanceof InputReference.OfRecord of && of.role().equals("scan")) {
                scans.add(archive.graph().current(of.record()).orElse(of.record()));
            }
        }
        return scans;
    }

    /** The counts of a scan; empty where they are not at hand. */
    public Optional<CountTable> counts(Hash scan) {
        return table(archive, scan);
    }

    static Optional<CountTable> table(Archive archive, Hash scan) {
        return archive.record(scan)
                .flatMap(view -> archive.kinds()
                        .get(view.head().kind())
                        .flatMap(kind -> kind.facet(CountTable.class, view, archive.inputs(scan))));
    }

    static int rows(Archive archive, Hash scan) {
        return table(archive, scan).map(CountTable::rows).orElse(0);
    }

    private NewRecord request(Request request, MaskJudgements masks, Optional<PersonId> person)
            throws ProblemException {
        NewRecord base = gathered(request);
        return new NewRecord(
                base.kind(),
                masked(base.inputs(), masks),
                base.about(),
                Map.of(PartName.CHOICES, request.choices()),
                base.payloads(),
                base.corrects(),
                base.after(),
                person);
    }

    private NewRecord gathered(Request request) throws ProblemException {
        long now = archive.graph().watermark();
        List<String> targets = Calibrations.targets(request.choices());
        if (gathered.filter(each -> each.answers(now, request, targets)).isEmpty()) {
            NewRecord record = new FitScans(archive).request(request, Optional.empty());
            gathered = Optional.of(new Gathered(now, withoutChoices(request), targets, record));
        }
        return gathered.orElseThrow().record();
    }

    /** New masks stand behind those that hold on, before what the fit knows of in spite. */
    private static List<InputReference> masked(List<InputReference> gathered, MaskJudgements masks) {
        List<InputReference> inputs = new ArrayList<>();
        List<InputReference> last = new ArrayList<>();
        for (InputReference input : gathered) {
            boolean gone = input instanceof InputReference.OfRecord of
                    && of.role().equals("mask")
                    && masks.undone().contains(of.record());
            if (!gone) {
                (input.role().equals("notwithstanding") ? last : inputs).add(input);
            }
        }
        masks.masks().forEach(mask -> inputs.add(new InputReference.OfRecord("mask", mask)));
        inputs.addAll(last);
        return inputs;
    }
}
