package fringekeep.scan.internal.reading;

import fringekeep.scan.internal.reading.ProfileColumn.Role;
import fringekeep.scan.internal.reading.ScanTable.TableColumn;
import java.util.ArrayList;
import java.util.Arrays;
import java.util.List;
import java.util.Optional;
import java.util.stream.IntStream;

/** What is noticed in a table that was read: the same table and profile always give the same findings. */
final class Findings {
    /** Spans of a position axis outside which a wrong unit is suspected where the profile states no range (m). */
    private static final double LEAST_SPAN = 5e-9;

    private static final double GREATEST_SPAN = 1e-2;
    private static final double GAP = 1.5;

    private final Profile profile;
    private final ScanTable table;
    private final Exposure exposure;
    private final List<Finding> found = new ArrayList<>();

    Findings(Profile profile, ScanTable table, Exposure exposure) {
        this.profile = profile;
        this.table = table;
        this.exposure = exposure;
    }

    List<Finding> all(HeaderValues header, TableReader.Rows rows, Optional<Section> named) {
        truncated(header, rows);
        for (TableColumn channel : table.role(Role.CHANNEL)) {
            noValue(channel);
            saturated(channel);
            darkTooHigh(channel);
            drift(channel);
        }
        TableColumn axis = table.role(Role.AXIS).get(0);
        course(axis);
        gaps(axis);
        table.role(Role.AXIS).forEach(this::unusual);
        named.ifPresent(section -> new UnitNames(profile, section).differing().forEach(found::add));
        if (header.ambiguous()) {
            found.add(Finding.of("time-ambiguous"));
        }
        return List.copyOf(found);
    }

    private void truncated(HeaderValues header, TableReader.Rows rows) {
        long expected = header.rows().orElse(profile.rows().orElse(0));
        if (rows.unfinished() || rows.rowsInFile() < expected) {
            Finding finding = Finding.of("truncated").value(rows.rowsInFile());
            found.add(expected > 0 ? finding.limit(expected) : finding);
        }
    }

    private void noValue(TableColumn channel) {
        List<Integer> rows = rows(channel, Double::isNaN);
        if (!rows.isEmpty()) {
            found.add(Finding.of("no-value").column(channel.name()).rows(rows));
        }
    }

    private void saturated(TableColumn channel) {
        if (channel.profile().saturation().isEmpty()) {
            return;
        }
        double limit =
                channel.profile().unit().si(plain(channel.profile().saturation().getAsDouble()));
        List<Integer> rows = rows(channel, value -> value >= limit);
        if (!rows.isEmpty()) {
            double greatest = Arrays.stream(channel.values())
                    .filter(value -> value >= limit)
                    .max()
                    .orElse(limit);
            found.add(Finding.of("saturated")
                    .column(channel.name())
                    .rows(rows)
                    .value(greatest)
                    .limit(limit));
        }
    }

    private void darkTooHigh(TableColumn channel) {
        if (channel.profile().highest().isEmpty()) {
            return;
        }
        double[] times = table.exposureOf(channel.profile().name())
                .map(TableColumn::values)
                .orElse(exposure.perRow());
        double counts = 0;
        double time = 0;
        for (int i = 0; i < table.rows(); i++) {
            if (!Double.isNaN(channel.values()[i])) {
                counts += channel.values()[i];
                time += times[i];
            }
        }
        double highest = channel.profile().highest().getAsDouble();
        if (time > 0 && counts / time > highest) {
            found.add(Finding.of("dark-too-high")
                    .column(channel.name())
                    .value(counts / time)
                    .limit(highest));
        }
    }

    private void drift(TableColumn channel) {
        boolean counts =
                channel.profile().counted() && !channel.profile().means().equals("dark");
        if (!counts || Arrays.stream(channel.values()).anyMatch(Double::isNaN)) {
            return;
        }
        double mean = exposure.total() / table.rows();
        double[] even = new double[table.rows()];
        for (int i = 0; i < even.length; i++) {
            even[i] = channel.values()[i] * mean / exposure.perRow()[i];
        }
        DriftTest.relativeChange(table.role(Role.AXIS).get(0).values(), even)
                .filter(change -> Math.abs(change) > profile.driftLimit())
                .ifPresent(change -> found.add(
                        Finding.of("drift").column(channel.name()).value(change).limit(profile.driftLimit())));
    }

    private void course(TableColumn axis) {
        List<Integer> turned = new Course(profile.direction()).against(axis.values());
        if (!turned.isEmpty()) {
            found.add(Finding.of("not-monotonic").column(axis.name()).rows(turned));
        }
    }

    private void gaps(TableColumn axis) {
        double[] x = axis.values();
        double[] steps = IntStream.range(1, x.length)
                .mapToDouble(i -> Math.abs(x[i] - x[i - 1]))
                .sorted()
                .toArray();
        double usual = steps.length == 0 ? 0 : steps[steps.length / 2];
        List<Integer> rows = new ArrayList<>();
        double widest = 0;
        for (int i = 1; i < x.length && usual > 0; i++) {
            if (Math.abs(x[i] - x[i - 1]) > GAP * usual) {
                rows.add(i);
                widest = Math.max(widest, Math.abs(x[i] - x[i - 1]));
            }
        }
        if (!rows.isEmpty()) {
            found.add(Finding.of("gap")
                    .column(axis.name())
                    .rows(rows)
                    .value(widest)
                    .limit(GAP * usual));
        }
    }

    private void unusual(TableColumn axis) {
        double least = Arrays.stream(axis.values()).min().orElse(0);
        double greatest = Arrays.stream(axis.values()).max().orElse(0);
        ProfileColumn column = axis.profile();
        double from = column.from().isPresent()
                ? column.unit().si(plain(column.from().getAsDouble()))
                : Double.NEGATIVE_INFINITY;
        double to =
                column.to().isPresent() ? column.unit().si(plain(column.to().getAsDouble())) : Double.POSITIVE_INFINITY;
        boolean stated = column.from().isPresent() || column.to().isPresent();
        double span = greatest - least;
        if (least < from || greatest > to) {
            found.add(suspicion(axis).value(least < from ? least : greatest).limit(least < from ? from : to));
        } else if (!stated && column.unit().siCode().equals("m") && table.rows() > 2 && span < LEAST_SPAN) {
            found.add(suspicion(axis).value(span).limit(LEAST_SPAN));
        } else if (!stated && column.unit().siCode().equals("m") && span > GREATEST_SPAN) {
            found.add(suspicion(axis).value(span).limit(GREATEST_SPAN));
        }
    }

    private static Finding suspicion(TableColumn axis) {
        return Finding.of("wrong-unit-suspected").column(axis.name());
    }

    private static String plain(double value) {
        return new java.math.BigDecimal(value).toPlainString();
    }

    private static List<Integer> rows(TableColumn column, java.util.function.DoublePredicate test) {
        double[] values = column.values();
        return IntStream.range(0, values.length)
                .filter(i -> test.test(values[i]))
                .boxed()
                .toList();
    }
}
