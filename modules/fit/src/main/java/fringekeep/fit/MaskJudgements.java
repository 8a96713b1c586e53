package fringekeep.fit;

import fringekeep.archive.Archive;
import fringekeep.archive.NewRecord;
import fringekeep.archive.Prepared;
import fringekeep.archive.json.Json;
import fringekeep.archive.json.JsonArray;
import fringekeep.archive.json.JsonObject;
import fringekeep.archive.kind.RecordView;
import fringekeep.archive.problem.ProblemException;
import fringekeep.archive.record.AboutReference;
import fringekeep.archive.record.AboutReference.Reach;
import fringekeep.archive.record.Hash;
import fringekeep.archive.record.KindName;
import fringekeep.archive.record.PartName;
import fringekeep.archive.record.PersonId;
import fringekeep.fit.internal.FitProblems;
import fringekeep.fit.internal.Masks;
import java.util.ArrayList;
import java.util.LinkedHashSet;
import java.util.List;
import java.util.Map;
import java.util.NavigableSet;
import java.util.Optional;
import java.util.Set;
import java.util.TreeMap;
import java.util.TreeSet;

/**
 * Turns changes of masks into judgements, prepared and not recorded: one mask a scan and reason, one that undoes earlier
 * masks whose points are used again, and those masks once more for what is left of them.
 */
final class MaskJudgements {
    /** Stands in for a reason that is still to be given, in fits that are only tried. */
    private static final String UNSAID = "other";

    /** Stands in for the person in fits that are only tried. */
    private static final PersonId NOBODY = new PersonId("0".repeat(32));

    private final Archive archive;
    private final PersonId person;
    private final boolean tried;
    private final List<Prepared> prepared = new ArrayList<>();
    private final List<Hash> masks = new ArrayList<>();
    private final Set<Hash> undone = new LinkedHashSet<>();

    private MaskJudgements(Archive archive, PersonId person, boolean tried) {
        this.archive = archive;
        this.person = person;
        this.tried = tried;
    }

    /**
     * Judgements to be recorded.
     *
     * @throws ProblemException if a reason is missing
     */
    static MaskJudgements toRecord(Archive archive, List<MaskChange> changes, PersonId person) throws ProblemException {
        for (MaskChange change : changes) {
            boolean unsaid = change.masked().containsValue("")
                    || !change.shown().isEmpty() && change.undoing().isEmpty();
            if (unsaid) {
                throw new ProblemException(FitProblems.of("fit.mask-reason", archive.label(change.scan())));
            }
        }
        return prepared(archive, changes, person, false);
    }

    /** The same to try a fit with. */
    static MaskJudgements toTry(Archive archive, List<MaskChange> changes) throws ProblemException {
        return prepared(archive, changes, NOBODY, true);
    }

    private static MaskJudgements prepared(Archive archive, List<MaskChange> changes, PersonId person, boolean tried)
            throws ProblemException {
        MaskJudgements judgements = new MaskJudgements(archive, person, tried);
        for (MaskChange change : changes) {
            judgements.undo(change);
            judgements.mask(change);
        }
        return judgements;
    }

    /** All of them, in the order in which they are to be recorded. */
    List<Prepared> prepared() {
        return List.copyOf(prepared);
    }

    /** The masks among them. */
    List<Hash> masks() {
        return List.copyOf(masks);
    }

    /** Earlier masks that hold no longer. */
    Set<Hash> undone() {
        return Set.copyOf(undone);
    }

    private void mask(MaskChange change) throws ProblemException {
        Map<String, NavigableSet<Integer>> byReason = new TreeMap<>();
        change.masked()
                .forEach((row, reason) ->
                        byReason.computeIfAbsent(reason, any -> new TreeSet<>()).add(row));
        for (Map.Entry<String, NavigableSet<Integer>> each : byReason.entrySet()) {
            masked(change, each.getKey(), each.getValue(), change.words());
        }
    }

    private void masked(MaskChange change, String reason, NavigableSet<Integer> rows, String words)
            throws ProblemException {
        JsonObject content = JsonObject.EMPTY
                .with("verdict", "masked")
                .with("reason", reason.isEmpty() ? UNSAID : reason)
                .with("channel", change.channel())
                .with("points", ranges(rows));
        Prepared mask = judgement(content, words, new AboutReference("target", change.scan(), Reach.RECORD));
        masks.add(mask.fingerprint());
    }

    private void undo(MaskChange change) throws ProblemException {
        if (change.shown().isEmpty()) {
            return;
        }
        List<RecordView> against = live(archive, change.scan(), change.channel()).stream()
                .filter(mask -> !disjoint(mask.content(), change.shown()))
                .toList();
        if (against.isEmpty()) {
            return;
        }
        JsonObject content = JsonObject.EMPTY
                .with("verdict", "restored")
                .with("reason", change.undoing().isEmpty() ? UNSAID : change.undoing());
        AboutReference[] about = against.stream()
                .map(mask -> new AboutReference("undoes", mask.fingerprint(), Reach.RECORD))
                .toArray(AboutReference[]::new);
        judgement(content, change.words(), about);
        for (RecordView mask : against) {
            undone.add(mask.fingerprint());
            again(mask, change);
        }
    }

    /** What an undone mask leaves masked, with its own reason. */
    private void again(RecordView mask, MaskChange change) throws ProblemException {
        for (AboutReference target : mask.head().about()) {
            NavigableSet<Integer> rows = Masks.rows(mask.content(), TrialFits.rows(archive, target.record()));
            if (target.record().equals(change.scan())) {
                rows.removeAll(change.shown());
            }
            if (!rows.isEmpty()) {
                String words = mask.part(PartName.REMARK)
                        .flatMap(remark -> remark.text("text"))
                        .orElse("");
                String channel = mask.content().text("channel").orElse(change.channel());
                MaskChange rest = new MaskChange(target.record(), channel, new TreeMap<>(), new TreeSet<>(), "", words);
                masked(rest, mask.content().text("reason").orElse(UNSAID), rows, words);
            }
        }
    }

    private Prepared judgement(JsonObject content, String words, AboutReference... about) throws ProblemException {
        boolean other = content.text("reason").equals(Optional.of(UNSAID));
        String said = words.isBlank() && other && tried ? UNSAID : words;
        Map<PartName, JsonObject> parts = said.isBlank()
                ? Map.of(PartName.CONTENT, content)
                : Map.of(PartName.CONTENT, content, PartName.REMARK, JsonObject.EMPTY.with("text", said.strip()));
        Prepared judgement = archive.prepare(
                new NewRecord(
                        new KindName("judgement"),
                        List.of(),
                        List.of(about),
                        parts,
                        List.of(),
                        Optional.empty(),
                        Optional.empty(),
                        Optional.of(person)),
                prepared);
        prepared.add(judgement);
        return judgement;
    }

    /** Judgements that mask points of a channel of a scan now. */
    static List<RecordView> live(Archive archive, Hash scan, String channel) {
        List<RecordView> live = new ArrayList<>();
        for (Hash judgement : archive.graph().judgements(scan)) {
            archive.record(judgement).filter(record -> masks(record, channel)).ifPresent(live::add);
        }
        return live;
    }

    private static boolean masks(RecordView judgement, String channel) {
        JsonObject content = judgement.content();
        Optional<String> named = content.text("channel");
        return content.text("verdict").equals(Optional.of("masked"))
                && (named.isEmpty() || named.get().equals(channel));
    }

    private static boolean disjoint(JsonObject content, NavigableSet<Integer> rows) {
        NavigableSet<Integer> masked = Masks.rows(content, rows.last() + 1);
        return rows.stream().noneMatch(masked::contains);
    }

    /** Runs [first, last], ascending and apart. */
    private static Json ranges(NavigableSet<Integer> rows) {
        List<Json> ranges = new ArrayList<>();
        int first = rows.first();
        int last = first;
        for (int row : rows) {
            if (row > last + 1) {
                ranges.add(JsonArray.ofNumbers(first, last));
                first = row;
            }
            last = row;
        }
        ranges.add(JsonArray.ofNumbers(first, last));
        return new JsonArray(ranges);
    }
}
