package fringekeep.audit;

import fringekeep.archive.json.CanonicalJson;
import fringekeep.archive.json.Json;
import fringekeep.archive.json.JsonArray;
import fringekeep.archive.json.JsonNumber;
import fringekeep.archive.json.JsonObject;
import fringekeep.archive.json.JsonPointer;
import fringekeep.archive.kind.CsvPayload;
import fringekeep.archive.kind.NewPayload;
import fringekeep.archive.kind.Outcome;
import fringekeep.archive.kind.RecordView;
import fringekeep.archive.kind.ValueComparison;
import fringekeep.archive.lineage.Recomputed.Verdict;
import fringekeep.archive.problem.ProblemException;
import fringekeep.archive.record.PayloadReference;
import java.nio.charset.StandardCharsets;
import java.util.ArrayList;
import java.util.Arrays;
import java.util.List;
import java.util.Optional;
import java.util.OptionalDouble;
import java.util.TreeSet;

/**
 * One recorded value beside what came out anew (record format 1, section 10).
 *
 * @param pointer JSON pointer in the result, or {@code payload NAME, row R, column C} (rows from 0)
 * @param kept what was recorded, as written; {@code absent} where it was not there
 * @param now what came out, as written; {@code absent} where it is not there
 * @param verdict same bits, within rounding, or different
 * @param units distance in units in the last place; -1 where the values are no two numbers
 * @param change new minus old, for numbers that differ
 * @param inDeviations change over the standard uncertainty that stands beside, where one does
 */
public record ValueVerdict(
        String pointer,
        String kept,
        String now,
        Verdict verdict,
        long units,
        OptionalDouble change,
        OptionalDouble inDeviations) {
    private static final String ABSENT = "absent";

    /** Every value of a record's result and of its CSV payloads; payloads of other forms as a whole. */
    static List<ValueVerdict> of(RecordView record, Outcome.Computed now) throws ProblemException {
        List<ValueVerdict> all = new ArrayList<>();
        walk("", record.result(), now.result(), OptionalDouble.empty(), all);
        for (PayloadReference reference : record.head().payloads()) {
            byte[] kept = record.payload(reference.name());
            Optional<byte[]> other = now.payloads().stream()
                    .filter(payload -> payload.name().equals(reference.name()))
                    .findFirst()
                    .map(NewPayload::bytes);
            payload(reference, kept, other, all);
        }
        return List.copyOf(all);
    }

    private static void walk(String pointer, Json kept, Json now, OptionalDouble u, List<ValueVerdict> all) {
        if (kept instanceof JsonObject before && now instanceof JsonObject after) {
            members(pointer, before, after, all);
        } else if (kept instanceof JsonArray before
                && now instanceof JsonArray after
                && before.items().size() == after.items().size()) {
            for (int i = 0; i < before.items().size(); i++) {
                walk(pointer + "/" + i, before.items().get(i), after.items().get(i), OptionalDouble.empty(), all);
            }
        } else if (kept instanceof JsonNumber before && now instanceof JsonNumber after) {
            all.add(numbers(pointer, before.value(), after.value(), u));
        } else {
            all.add(other(pointer, written(kept), written(now)));
        }
    }

    private static String written(Json value) {
        return new String(CanonicalJson.write(value), StandardCharsets.UTF_8);
    }

    private static void members(String pointer, JsonObject kept, JsonObject now, List<ValueVerdict> all) {
        TreeSet<String> names = new TreeSet<>(kept.members().keySet());
        names.addAll(now.members().keySet());
        for (String name : names) {
            String where = JsonPointer.child(pointer, name);
            Optional<Json> before = kept.get(name);
            Optional<Json> after = now.get(name);
            if (before.isPresent() && after.isPresent()) {
                OptionalDouble u = name.equals("value") ? kept.number("u") : OptionalDouble.empty();
                walk(where, before.get(), after.get(), u, all);
            } else {
                all.add(other(
                        where,
                        before.map(ValueVerdict::written).orElse(ABSENT),
                        after.map(ValueVerdict::written).orElse(ABSENT)));
            }
        }
    }

    private static void payload(PayloadReference reference, byte[] kept, Optional<byte[]> now, List<ValueVerdict> all)
            throws ProblemException {
        String where = "payload " + reference.name();
        if (now.isEmpty()) {
            all.add(other(where, kept.length + " bytes", ABSENT));
            return;
        }
        if (!reference.form().equals(CsvPayload.FORM)) {
            boolean same = Arrays.equals(kept, now.get());
            all.add(other(where, kept.length + " bytes", same ? kept.length + " bytes" : "other bytes"));
            return;
        }
        CsvPayload.Table before = CsvPayload.read(kept);
        CsvPayload.Table after = CsvPayload.read(now.get());
        boolean alike = before.rows() == after.rows() && names(before).equals(names(after));
        if (!alike) {
            all.add(other(
                    where,
                    names(before) + " in " + before.rows() + " rows",
                    names(after) + " in " + after.rows() + " rows"));
            return;
        }
        for (int i = 0; i < before.columns().size(); i++) {
            for (int row = 0; row < before.rows(); row++) {
                all.add(cell(where, before.columns().get(i), after.columns().get(i), row));
            }
        }
    }

    private static List<String> names(CsvPayload.Table table) {
        return table.columns().stream().map(CsvPayload.Column::name).toList();
    }

    private static ValueVerdict cell(String where, CsvPayload.Column kept, CsvPayload.Column now, int row) {
        String pointer = where + ", row " + row + ", column " + kept.name();
        boolean numbers = kept instanceof CsvPayload.Numbers
                && now instanceof CsvPayload.Numbers
                && !kept.cell(row).isEmpty()
                && !now.cell(row).isEmpty();
        return numbers
                ? numbers(
                        pointer,
                        ((CsvPayload.Numbers) kept).values()[row],
                        ((CsvPayload.Numbers) now).values()[row],
                        OptionalDouble.empty())
                : other(pointer, words(kept.cell(row)), words(now.cell(row)));
    }

    private static String words(String cell) {
        return cell.isEmpty() ? ABSENT : cell;
    }

    private static ValueVerdict numbers(String pointer, double kept, double now, OptionalDouble u) {
        long units = ValueComparison.distance(kept, now);
        Verdict verdict = units == 0
                ? Verdict.SAME_BITS
                : units <= ValueComparison.MOST_UNITS ? Verdict.LAST_PLACES : Verdict.DIFFERS;
        double change = now - kept;
        boolean changed = units != 0 && Double.isFinite(change);
        boolean scaled = changed && u.isPresent() && u.getAsDouble() > 0;
        return new ValueVerdict(
                pointer,
                written(Json.of(kept)),
                written(Json.of(now)),
                verdict,
                units,
                changed ? OptionalDouble.of(change) : OptionalDouble.empty(),
                scaled ? OptionalDouble.of(change / u.getAsDouble()) : OptionalDouble.empty());
    }

    private static ValueVerdict other(String pointer, String kept, String now) {
        boolean same = kept.equals(now);
        return new ValueVerdict(
                pointer,
                kept,
                now,
                same ? Verdict.SAME_BITS : Verdict.DIFFERS,
                same ? 0 : -1,
                OptionalDouble.empty(),
                OptionalDouble.empty());
    }
}
