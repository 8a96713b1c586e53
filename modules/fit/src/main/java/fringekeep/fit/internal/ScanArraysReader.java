package fringekeep.fit.internal;

import fringekeep.archive.facet.CountTable;
import fringekeep.archive.kind.Input;
import fringekeep.archive.kind.Inputs;
import fringekeep.archive.problem.ProblemException;
import java.util.ArrayList;
import java.util.Arrays;
import java.util.List;
import java.util.Optional;

/** Reads the scans of a fit from their facets, with masks, range and dark counts. */
public final class ScanArraysReader {
    private static final double LARGEST_COUNT = 0x1p53;

    private final Inputs inputs;
    private final FitChoices choices;
    private final Masks masks;

    /** Reads by choices. */
    public ScanArraysReader(Inputs inputs, FitChoices choices) {
        this.inputs = inputs;
        this.choices = choices;
        this.masks = new Masks(inputs);
    }

    /**
     * All scans of one role, with their dark counts as the choices say.
     *
     * @throws ProblemException if a table is not at hand, a channel is missing, or values are no counts
     */
    public List<ScanArrays> role(String role) throws ProblemException {
        List<ScanArrays> scans = new ArrayList<>();
        for (Input input : inputs.role(role)) {
            scans.add(withDark(input, read(input)));
        }
        return scans;
    }

    private ScanArrays read(Input input) throws ProblemException {
        CountTable table = table(input);
        CountTable.Column axis = axis(table, input);
        CountTable.Column channel = channel(table, input);
        boolean[] masked = new boolean[table.rows()];
        masks.apply(input.target(), channel.name(), masked);
        double[] counts = channel.values();
        double[] positions = axis.values();
        for (int row = 0; row < masked.length; row++) {
            masked[row] |= Double.isNaN(counts[row]) || !choices.within(positions[row]);
        }
        return new ScanArrays(
                input.position(),
                positions,
                whole(counts, masked, channel.name(), input),
                exposures(table),
                times(table),
                masked,
                new double[0],
                new double[0],
                table.shots().length > 0,
                table.start());
    }

    private static CountTable table(Input input) throws ProblemException {
        return input.facet(CountTable.class)
                .orElseThrow(() -> new ProblemException(FitProblems.of("fit.no-table", pointer(input))));
    }

    private static String pointer(Input input) {
        return "/inputs/" + input.position();
    }

    private CountTable.Column axis(CountTable table, Input input) throws ProblemException {
        Optional<String> name = choices.axis();
        Optional<CountTable.Column> axis = name.isPresent()
                ? table.axis(name.get())
                : table.axes().stream().findFirst();
        CountTable.Column found = axis.orElseThrow(
                () -> new ProblemException(FitProblems.of("fit.no-axis", pointer(input), name.orElse(""))));
        if (!found.unit().equals("m")) {
            throw new ProblemException(FitProblems.of("fit.axis-unit", pointer(input), found.name(), found.unit()));
        }
        return found;
    }

    private static CountTable.Column channel(CountTable table, Input input) throws ProblemException {
        String name = input.channel().orElse("counts");
        return table.channel(name)
                .orElseThrow(() -> new ProblemException(FitProblems.of(
                        "fit.no-channel",
                        pointer(input),
                        name,
                        String.join(
                                ", ",
                                table.channels().stream()
                                        .map(CountTable.Column::name)
                                        .toList()))));
    }

    private static double[] exposures(CountTable table) {
        return table.shots().length > 0 ? table.shots() : table.exposure();
    }

    /** An axis "time" tells the times; else rows count as equally spaced. */
    private static double[] times(CountTable table) {
        Optional<CountTable.Column> time =
                table.axis("time").filter(axis -> axis.unit().equals("s"));
        if (time.isPresent()) {
            return time.get().values();
        }
        double[] times = new double[table.rows()];
        Arrays.setAll(times, row -> row);
        return times;
    }

    private static double[] whole(double[] values, boolean[] masked, String channel, Input input)
            throws ProblemException {
        double[] counts = values.clone();
        for (int row = 0; row < counts.length; row++) {
            boolean count = counts[row] >= 0 && counts[row] == Math.rint(counts[row]) && counts[row] <= LARGEST_COUNT;
            if (!masked[row] && !count) {
                throw new ProblemException(FitProblems.of("fit.not-counts", pointer(input), channel, row, counts[row]));
            }
            counts[row] = count ? counts[row] : 0;
        }
        return counts;
    }

    private ScanArrays withDark(Input input, ScanArrays scan) throws ProblemException {
        return switch (choices.backgroundSort()) {
            case "channel" -> darkChannel(input, scan);
            case "scan" -> darkScans(scan);
            default -> scan;
        };
    }

    private ScanArrays darkChannel(Input input, ScanArrays scan) throws ProblemException {
        CountTable table = table(input);
        String name = choices.background().text("channel").orElse("dark");
        CountTable.Column dark = table.channel(name)
                .orElseThrow(() -> new ProblemException(FitProblems.of("fit.no-dark-channel", pointer(input), name)));
        double[] exposures =
                table.channel(name + " exposure").map(CountTable.Column::values).orElse(scan.exposures());
        boolean[] masked = new boolean[table.rows()];
        masks.apply(input.target(), name, masked);
        double[] counts = dark.values();
        for (int row = 0; row < masked.length; row++) {
            masked[row] |= Double.isNaN(counts[row]);
        }
        double[] whole = whole(counts, masked, name, input);
        return scan.withDark(kept(whole, masked), kept(exposures, masked));
    }

    private ScanArrays darkScans(ScanArrays scan) throws ProblemException {
        List<double[]> counts = new ArrayList<>();
        List<double[]> exposures = new ArrayList<>();
        for (Input input : inputs.role("background")) {
            ScanArrays dark = read(input);
            if (dark.shots() != scan.shots()) {
                throw new ProblemException(FitProblems.of("fit.background-exposure", pointer(input)));
            }
            counts.add(kept(dark.counts(), dark.masked()));
            exposures.add(kept(dark.exposures(), dark.masked()));
        }
        return scan.withDark(joined(counts), joined(exposures));
    }

    private static double[] kept(double[] values, boolean[] masked) {
        double[] kept = new double[values.length];
        int n = 0;
        for (int row = 0; row < values.length; row++) {
            if (!masked[row]) {
                kept[n++] = values[row];
            }
        }
        return Arrays.copyOf(kept, n);
    }

    private static double[] joined(List<double[]> arrays) {
        return arrays.stream().flatMapToDouble(Arrays::stream).toArray();
    }
}
