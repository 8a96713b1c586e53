package fringekeep.archive.kind;

import fringekeep.archive.internal.records.SchemaWalk;
import fringekeep.archive.json.CanonicalJson;
import fringekeep.archive.json.Json;
import fringekeep.archive.json.JsonArray;
import fringekeep.archive.json.JsonNumber;
import fringekeep.archive.json.JsonObject;
import fringekeep.archive.json.JsonPointer;
import fringekeep.archive.problem.ProblemException;
import fringekeep.archive.record.PartName;
import java.nio.charset.StandardCharsets;
import java.util.ArrayList;
import java.util.Arrays;
import java.util.HashSet;
import java.util.List;
import java.util.Optional;
import java.util.OptionalDouble;
import java.util.Set;
import java.util.TreeSet;

/**
 * Compares what was kept with what came out, value by value (record format 1, section 10): numbers by their distance in units
 * in the last place, everything else for equality.
 */
public final class ValueComparison {
    /** Up to so many units in the last place two numbers count as the same within rounding. */
    public static final long MOST_UNITS = 1_024;

    private static final int MOST_KEPT = 100;

    private final Set<String> integers;
    private final List<Difference> differences = new ArrayList<>();
    private long units;
    private long count;

    /** Compares all numbers of results by their distance. */
    public ValueComparison() {
        this(Set.of());
    }

    private ValueComparison(Set<String> integers) {
        this.integers = integers;
    }

    /**
     * Compares the results of a kind: what its schema calls an integer must be equal.
     *
     * @param schema the kind's schema, one object with a member per part
     * @param kept the result that was kept
     */
    public static ValueComparison of(JsonObject schema, JsonObject kept) {
        String part = JsonPointer.child("", PartName.RESULT.text());
        Set<String> integers = new HashSet<>();
        for (String pointer : SchemaWalk.integers(schema, JsonObject.EMPTY.with(PartName.RESULT.text(), kept))) {
            integers.add(pointer.substring(Math.min(part.length(), pointer.length())));
        }
        return new ValueComparison(Set.copyOf(integers));
    }

    /**
     * A value that is not the same.
     *
     * @param pointer JSON pointer in the result, {@code payload NAME, row R, column C} or {@code payload NAME, value I} (from 0)
     * @param units distance in units in the last place; -1 where the values are no two numbers
     * @param kept what was kept, as written
     * @param now what came out, as written
     * @param change new minus old, for numbers
     * @param inDeviations change over the standard uncertainty that stands beside, where one does
     */
    public record Difference(
            String pointer, long units, String kept, String now, OptionalDouble change, OptionalDouble inDeviations) {
        /** Whether the values count as the same within rounding. */
        public boolean withinRounding() {
            return units >= 0 && units <= MOST_UNITS;
        }
    }

    /** The first hundred differences. */
    public List<Difference> differences() {
        return List.copyOf(differences);
    }

    /** How many values differ. */
    public long count() {
        return count;
    }

    /** Largest distance of two numbers; -1 when something is different in another way. */
    public long units() {
        return units;
    }

    /** Compares two results. */
    public void results(Json kept, Json now) {
        values("", kept, now, OptionalDouble.empty());
    }

    /** Compares the bytes of two payloads of one form. */
    public void payloads(String name, String form, byte[] kept, byte[] now) {
        if (Arrays.equals(kept, now)) {
            return;
        }
        try {
            switch (form) {
                case CsvPayload.FORM -> tables(name, CsvPayload.read(kept), CsvPayload.read(now));
                case NpyPayload.FORM -> grids(name, NpyPayload.read(kept), NpyPayload.read(now));
                default -> other("payload " + name, kept.length + " bytes", now.length + " other bytes");
            }
        } catch (ProblemException e) {
            other("payload " + name, "unreadable", e.problems().get(0).what());
        }
    }

    private void tables(String name, CsvPayload.Table kept, CsvPayload.Table now) {
        List<String> names =
                kept.columns().stream().map(CsvPayload.Column::name).toList();
        List<String> others =
                now.columns().stream().map(CsvPayload.Column::name).toList();
        if (!names.equals(others) || kept.rows() != now.rows()) {
            other("payload " + name, names + " in " + kept.rows() + " rows", others + " in " + now.rows() + " rows");
            return;
        }
        for (int i = 0; i < names.size(); i++) {
            for (int row = 0; row < kept.rows(); row++) {
                String where = "payload " + name + ", row " + row + ", column " + names.get(i);
                cells(where, kept.columns().get(i), now.columns().get(i), row);
            }
        }
    }

    private void grids(String name, NpyPayload.NpyArray kept, NpyPayload.NpyArray now) {
        if (kept.sort() != now.sort() || !Arrays.equals(kept.shape(), now.shape())) {
            other(
                    "payload " + name,
                    kept.sort() + " " + Arrays.toString(kept.shape()),
                    now.sort() + " " + Arrays.toString(now.shape()));
            return;
        }
        double[] before = kept.reals();
        double[] after = now.reals();
        for (int i = 0; i < before.length; i++) {
            String where = "payload " + name + ", value " + i;
            if (Double.isNaN(before[i]) != Double.isNaN(after[i])) {
                other(where, cell(before[i]), cell(after[i]));
            } else if (!Double.isNaN(before[i])) {
                numbers(where, before[i], after[i], OptionalDouble.empty());
            }
        }
        long[] first = kept.integers();
        long[] second = now.integers();
        for (int i = 0; i < first.length; i++) {
            if (first[i] != second[i]) {
                other("payload " + name + ", value " + i, Long.toString(first[i]), Long.toString(second[i]));
            }
        }
    }

    private static String cell(double value) {
        return Double.isNaN(value) ? "absent" : Double.toString(value);
    }

    private void cells(String where, CsvPayload.Column kept, CsvPayload.Column now, int row) {
        String before = kept.cell(row);
        String after = now.cell(row);
        if (before.equals(after)) {
            return;
        }
        boolean numbers = kept instanceof CsvPayload.Numbers
                && now instanceof CsvPayload.Numbers
                && !before.isEmpty()
                && !after.isEmpty();
        if (numbers) {
            numbers(
                    where,
                    ((CsvPayload.Numbers) kept).values()[row],
                    ((CsvPayload.Numbers) now).values()[row],
                    OptionalDouble.empty());
        } else {
            other(where, before, after);
        }
    }

    private void values(String pointer, Json kept, Json now, OptionalDouble deviation) {
        if (kept instanceof JsonObject before && now instanceof JsonObject after) {
            objects(pointer, before, after);
        } else if (kept instanceof JsonArray before && now instanceof JsonArray after) {
            arrays(pointer, before, after);
        } else if (kept instanceof JsonNumber before && now instanceof JsonNumber after) {
            if (integers.contains(pointer) && before.value() != after.value()) {
                other(pointer, Double.toString(before.value()), Double.toString(after.value()));
            } else {
                numbers(pointer, before.value(), after.value(), deviation);
            }
        } else if (!kept.equals(now)) {
            other(pointer, written(kept), written(now));
        }
    }

    /** A value as it would be written. */
    private static String written(Json value) {
        return new String(CanonicalJson.write(value), StandardCharsets.UTF_8);
    }

    private void objects(String pointer, JsonObject kept, JsonObject now) {
        TreeSet<String> names = new TreeSet<>(kept.members().keySet());
        names.addAll(now.members().keySet());
        for (String name : names) {
            Optional<Json> before = kept.get(name);
            Optional<Json> after = now.get(name);
            if (before.isEmpty() || after.isEmpty()) {
                other(
                        JsonPointer.child(pointer, name),
                        before.map(ValueComparison::written).orElse("absent"),
                        after.map(ValueComparison::written).orElse("absent"));
            } else {
                OptionalDouble u = name.equals("value") ? kept.number("u") : OptionalDouble.empty();
                values(JsonPointer.child(pointer, name), before.get(), after.get(), u);
            }
        }
    }

    private void arrays(String pointer, JsonArray kept, JsonArray now) {
        if (kept.items().size() != now.items().size()) {
            other(pointer, kept.items().size() + " items", now.items().size() + " items");
            return;
        }
        for (int i = 0; i < kept.items().size(); i++) {
            values(pointer + "/" + i, kept.items().get(i), now.items().get(i), OptionalDouble.empty());
        }
    }

    private void numbers(String pointer, double kept, double now, OptionalDouble deviation) {
        long distance = distance(kept, now);
        if (distance == 0) {
            return;
        }
        double change = now - kept;
        boolean known = deviation.isPresent() && deviation.getAsDouble() > 0;
        units = units < 0 ? units : Math.max(units, distance);
        keep(new Difference(
                pointer,
                distance,
                Double.toString(kept),
                Double.toString(now),
                Double.isFinite(change) ? OptionalDouble.of(change) : OptionalDouble.empty(),
                known ? OptionalDouble.of(change / deviation.getAsDouble()) : OptionalDouble.empty()));
    }

    private void other(String pointer, String kept, String now) {
        units = -1;
        keep(new Difference(pointer, -1, kept, now, OptionalDouble.empty(), OptionalDouble.empty()));
    }

    private void keep(Difference difference) {
        count++;
        if (differences.size() < MOST_KEPT) {
            differences.add(difference);
        }
    }

    /**
     * Distance of two finite numbers in units in the last place: the bits as integers, negative numbers mapped to
     * {@code Long.MIN_VALUE - bits}, so that neighbours differ by one across zero too.
     */
    public static long distance(double first, double second) {
        long a = ordinal(first);
        long b = ordinal(second);
        // the two lie on different sides of zero: their sum may be beyond a long
        try {
            return Math.absExact(Math.subtractExact(a, b));
        } catch (ArithmeticException e) {
            return Long.MAX_VALUE;
        }
    }

    private static long ordinal(double value) {
        long bits = Double.doubleToLongBits(value);
        return bits < 0 ? Long.MIN_VALUE - bits : bits;
    }
}
