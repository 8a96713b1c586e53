package fringekeep.archive.lineage;

import fringekeep.archive.json.CanonicalJson;
import fringekeep.archive.json.JsonObject;
import fringekeep.archive.kind.Computation;
import fringekeep.archive.kind.Input;
import fringekeep.archive.kind.Inputs;
import fringekeep.archive.kind.Kinds;
import fringekeep.archive.kind.NewPayload;
import fringekeep.archive.kind.Outcome;
import fringekeep.archive.kind.RecordKind;
import fringekeep.archive.kind.RecordView;
import fringekeep.archive.kind.ValueComparison;
import fringekeep.archive.lineage.Recomputed.Verdict;
import fringekeep.archive.problem.ProblemException;
import fringekeep.archive.problem.StoppedException;
import fringekeep.archive.problem.Work;
import fringekeep.archive.record.Hash;
import fringekeep.archive.record.PartName;
import fringekeep.archive.record.PayloadReference;
import java.util.Arrays;
import java.util.List;
import java.util.Optional;

/** Runs the recorded method on the recorded choices and inputs and compares. */
public final class Recomputing {
    private Recomputing() {}

    /**
     * What came of an attempt.
     *
     * @param verdict how it compares with what was recorded
     * @param outcome what came out; empty where nothing was computed
     */
    public record Attempt(Recomputed verdict, Optional<Outcome.Computed> outcome) {}

    /**
     * Recomputes one record, each link by itself: its inputs are taken as recorded.
     *
     * @throws StoppedException if the work was stopped
     */
    public static Recomputed recompute(RecordView record, Inputs inputs, Kinds kinds, Work work)
            throws StoppedException {
        return attempt(record, inputs, kinds, work).verdict();
    }

    /**
     * Recomputes one record from the inputs given, which may be other than those recorded, and hands on what came out.
     *
     * @throws StoppedException if the work was stopped
     */
    public static Attempt attempt(RecordView record, Inputs inputs, Kinds kinds, Work work) throws StoppedException {
        Optional<String> hindrance = hindrance(record, inputs, kinds);
        if (hindrance.isPresent()) {
            return notComputable(record.fingerprint(), hindrance.get());
        }
        RecordKind kind = kinds.get(record.head().kind()).orElseThrow();
        Computation computation = kind.computation().orElseThrow();
        Outcome outcome = computation.compute(record.choices(), inputs, work);
        if (outcome instanceof Outcome.NoResult none) {
            // a record with a result whose computation now refuses is different, not merely missing something
            String words = none.reasons().isEmpty()
                    ? "no result"
                    : none.reasons().get(0).what();
            return new Attempt(
                    new Recomputed(record.fingerprint(), Verdict.DIFFERS, -1, List.of(), words), Optional.empty());
        }
        Outcome.Computed computed = (Outcome.Computed) outcome;
        try {
            return new Attempt(compare(record, kind, computed), Optional.of(computed));
        } catch (ProblemException e) {
            return notComputable(record.fingerprint(), "payload-missing");
        }
    }

    private static Attempt notComputable(Hash record, String reason) {
        return new Attempt(new Recomputed(record, Verdict.NOT_COMPUTABLE, 0, List.of(), reason), Optional.empty());
    }

    private static Optional<String> hindrance(RecordView record, Inputs inputs, Kinds kinds) {
        Optional<RecordKind> kind = kinds.get(record.head().kind());
        if (kind.isEmpty() || kind.get().schema() < record.head().schema()) {
            return Optional.of("kind-unknown");
        }
        if (record.withheld(PartName.CHOICES) || record.withheld(PartName.RESULT)) {
            return Optional.of("part-withheld");
        }
        if (record.part(PartName.RESULT).isEmpty() || kind.get().computation().isEmpty()) {
            return Optional.of("entered");
        }
        String method = record.choices().text("method").orElse("");
        boolean known = kind.get().computation().get().methods().stream()
                .anyMatch(each -> each.text().equals(method));
        if (!known) {
            return Optional.of("method-retired");
        }
        for (Input input : inputs.all()) {
            Optional<String> missing = missing(input);
            if (missing.isPresent()) {
                return missing;
            }
        }
        return Optional.empty();
    }

    private static Optional<String> missing(Input input) {
        if (!input.raw()) {
            return input.record().isPresent() ? Optional.empty() : Optional.of("input-missing");
        }
        try {
            return input.rawBytes().isPresent() ? Optional.empty() : Optional.of("raw-missing");
        } catch (ProblemException e) {
            return Optional.of("raw-missing");
        }
    }

    private static Recomputed compare(RecordView record, RecordKind kind, Outcome.Computed now)
            throws ProblemException {
        JsonObject kept = record.result();
        ValueComparison comparison = ValueComparison.of(kind.jsonSchema(kind.schema()), kept);
        if (!Arrays.equals(CanonicalJson.write(kept), CanonicalJson.write(now.result()))) {
            comparison.results(kept, now.result());
        }
        List<String> names =
                record.head().payloads().stream().map(PayloadReference::name).toList();
        List<String> others = now.payloads().stream().map(NewPayload::name).toList();
        if (!names.equals(others)) {
            comparison.results(
                    JsonObject.EMPTY.with("payloads", String.join(", ", names)),
                    JsonObject.EMPTY.with("payloads", String.join(", ", others)));
        } else {
            for (int i = 0; i < names.size(); i++) {
                comparison.payloads(
                        names.get(i),
                        record.head().payloads().get(i).form(),
                        record.payload(names.get(i)),
                        now.payloads().get(i).bytes());
            }
        }
        return new Recomputed(
                record.fingerprint(), verdict(comparison), comparison.units(), comparison.differences(), "");
    }

    private static Verdict verdict(ValueComparison comparison) {
        if (comparison.count() == 0) {
            return Verdict.SAME_BITS;
        }
        boolean close = comparison.units() >= 0 && comparison.units() <= ValueComparison.MOST_UNITS;
        return close ? Verdict.LAST_PLACES : Verdict.DIFFERS;
    }
}
