package fringekeep.fit.ui;

import fringekeep.archive.Archive;
import fringekeep.archive.graph.Graph;
import fringekeep.archive.graph.StateName;
import fringekeep.archive.json.JsonObject;
import fringekeep.archive.kind.RecordView;
import fringekeep.archive.record.Hash;
import fringekeep.desk.look.Mark;
import fringekeep.fit.TrialFits;
import java.util.ArrayList;
import java.util.List;
import java.util.Optional;
import java.util.Set;

/**
 * A recorded fit as a row of the list of fits beside the one that is tried.
 *
 * @param fit its record
 * @param label what people call it
 * @param mark its state, where it has one
 * @param word the state in a word; empty for none
 * @param how estimator and scans in words
 * @param numbers visibility, phase / rad, deviance or &chi;&sup2; over &nu;, p
 * @param rival whether it answers the same question as the one that is tried
 */
record FitLine(
        Hash fit, String label, Optional<Mark> mark, String word, String how, List<String> numbers, boolean rival) {
    FitLine {
        numbers = List.copyOf(numbers);
    }

    /** Lines of all current fits of scans; asks the archive. */
    static List<FitLine> read(Archive archive, List<Hash> scans) {
        TrialFits trials = new TrialFits(archive);
        Graph graph = archive.graph();
        List<FitLine> lines = new ArrayList<>();
        for (Hash fit : trials.fitsOf(scans)) {
            Optional<RecordView> view = archive.record(fit);
            if (view.isPresent()) {
                lines.add(line(archive, graph, trials, view.get(), scans));
            }
        }
        return lines;
    }

    private static FitLine line(Archive archive, Graph graph, TrialFits trials, RecordView view, List<Hash> scans) {
        Hash fit = view.fingerprint();
        List<Hash> together = new ArrayList<>(trials.rivals(fit));
        together.add(fit);
        boolean preferred =
                together.size() > 1 && graph.preferred(together).chosen().equals(Optional.of(fit));
        Set<StateName> states = graph.states(fit);
        Optional<Mark> mark = states.contains(StateName.WITHDRAWN)
                ? Optional.of(Mark.SLASH)
                : states.contains(StateName.OUTDATED)
                        ? Optional.of(Mark.RING)
                        : preferred ? Optional.of(Mark.PREFERRED) : Optional.empty();
        String word = mark.map(each -> FitWords.TEXTS.of("mark." + each.name())).orElse("");
        JsonObject choices = view.choices();
        int count = (int) view.head().inputs().stream()
                .filter(input -> input.role().equals("scan"))
                .count();
        String how = FitWords.method(choices.text("method").orElse(""))
                + (count == 1 ? "" : ", " + FitWords.TEXTS.of("scans.count", count));
        return new FitLine(
                fit,
                archive.label(fit),
                mark,
                word,
                how,
                ResultFacts.brief(choices, view.result()),
                count == scans.size());
    }
}
