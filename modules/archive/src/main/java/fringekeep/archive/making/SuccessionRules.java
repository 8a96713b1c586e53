package fringekeep.archive.making;

import fringekeep.archive.NewRecord;
import fringekeep.archive.kind.Parts;
import fringekeep.archive.kind.RecordKind;
import fringekeep.archive.kind.RecordView;
import fringekeep.archive.problem.Problem;
import fringekeep.archive.record.After;
import fringekeep.archive.record.Hash;
import java.time.Instant;
import java.util.ArrayList;
import java.util.List;
import java.util.Optional;

/**
 * Rules of corrects and after that the two records alone decide (record format 1, section 7). Whether the earlier one is
 * current is for the archive to say.
 */
final class SuccessionRules {
    private final NewRecord record;
    private final RecordKind kind;
    private final List<Problem> problems = new ArrayList<>();

    private SuccessionRules(NewRecord record, RecordKind kind) {
        this.record = record;
        this.kind = kind;
    }

    static List<Problem> examine(NewRecord record, RecordKind kind, Resolver resolver) {
        SuccessionRules rules = new SuccessionRules(record, kind);
        record.corrects()
                .ifPresent(hash -> rules.earlier(hash, "/corrects", resolver).ifPresent(rules::corrected));
        record.after().ifPresent(after -> rules.after(after, resolver));
        return List.copyOf(rules.problems);
    }

    private Optional<RecordView> earlier(Hash hash, String pointer, Resolver resolver) {
        Optional<RecordView> earlier = resolver.record(hash);
        if (earlier.isEmpty()) {
            add(
                    "record.not-at-hand",
                    "The record " + hash.shortForm() + " is not in this archive.",
                    pointer,
                    "Record or receive it first.");
            return earlier;
        }
        if (!earlier.get().head().kind().equals(record.kind())) {
            add(
                    "record.other-kind",
                    "A " + record.kind() + " cannot follow a "
                            + earlier.get().head().kind() + ".",
                    pointer,
                    "Name a record of the same kind.");
            return Optional.empty();
        }
        if (earlier.get().head().schema() > kind.schema()) {
            add(
                    "record.newer-schema",
                    "The record " + hash.shortForm() + " was made by a newer program.",
                    pointer,
                    "Use a newer program.");
        }
        return earlier;
    }

    private void corrected(RecordView earlier) {
        Optional<After> before = earlier.head().after();
        if (before.isPresent() && record.after().isEmpty()) {
            add(
                    "record.after-dropped",
                    "The record to be corrected holds after another one from an instant on; a correction must repeat that.",
                    "/after",
                    "Give \"after\" with the same record; \"from\" may change.");
        } else if (record.after().isPresent()
                && !before.map(After::record).equals(record.after().map(After::record))) {
            add(
                    "record.after-changed",
                    "A correction cannot change which record it follows.",
                    "/after/record",
                    "Repeat the record that the corrected one follows, or leave \"after\" out if it has none.");
        }
    }

    private void after(After after, Resolver resolver) {
        if (!kind.mayContinue()) {
            add(
                    "record.cannot-continue",
                    "A " + kind.kind() + " cannot follow another one from an instant on.",
                    "/after",
                    "Correct it, or record a new one.");
            return;
        }
        Optional<RecordView> earlier = earlier(after.record(), "/after/record", resolver);
        Optional<Instant> begin = earlier.flatMap(view -> view.head().after()).map(After::from);
        if (begin.isPresent() && !after.from().isAfter(begin.get())) {
            add(
                    "record.from-too-early",
                    "The change at " + after.from() + " is not later than " + begin.get()
                            + ", from when the earlier record holds.",
                    "/after/from",
                    "Give a later instant.");
        }
        problems.addAll(kind.examineContinuation(new Parts(record.parts()), after.from()));
    }

    private void add(String code, String what, String pointer, String mend) {
        problems.add(new Problem(code, what, pointer, mend + " Nothing has been stored."));
    }
}
