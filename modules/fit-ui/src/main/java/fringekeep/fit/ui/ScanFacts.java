package fringekeep.fit.ui;

import fringekeep.archive.Archive;
import fringekeep.archive.facet.CountTable;
import fringekeep.archive.json.JsonObject;
import fringekeep.archive.problem.ProblemException;
import fringekeep.archive.record.Hash;
import fringekeep.fit.TrialFits;
import java.util.ArrayList;
import java.util.List;
import java.util.Optional;

/**
 * What the sheet knows of its scans before anything is tried.
 *
 * @param labels what people call them, in order
 * @param channels channels that can be fitted, the usual one first
 * @param axes axes in m
 * @param fits recorded fits of them
 * @param draft what was chosen before and not recorded
 */
record ScanFacts(
        List<String> labels, List<String> channels, List<String> axes, List<FitLine> fits, Optional<JsonObject> draft) {
    private static final String USUAL = "counts";

    ScanFacts {
        labels = List.copyOf(labels);
        channels = List.copyOf(channels);
        axes = List.copyOf(axes);
        fits = List.copyOf(fits);
    }

    /** Reads; asks the archive. */
    static ScanFacts read(Archive archive, List<Hash> scans) throws ProblemException {
        TrialFits trials = new TrialFits(archive);
        List<String> channels = new ArrayList<>();
        List<String> axes = new ArrayList<>();
        trials.counts(scans.get(0)).ifPresent(table -> {
            table.channels().forEach(column -> channels.add(column.name()));
            table.axes().stream()
                    .filter(axis -> axis.unit().equals("m"))
                    .map(CountTable.Column::name)
                    .forEach(axes::add);
        });
        if (channels.remove(USUAL) || channels.isEmpty()) {
            channels.add(0, USUAL);
        }
        return new ScanFacts(
                scans.stream().map(archive::label).toList(),
                channels,
                axes,
                FitLine.read(archive, scans),
                archive.drafts().get(PlanDraft.id(scans)));
    }
}
