package fringekeep.property;

import fringekeep.archive.Archive;
import fringekeep.archive.NewRecord;
import fringekeep.archive.json.JsonObject;
import fringekeep.archive.kind.RecordView;
import fringekeep.archive.problem.Problem;
import fringekeep.archive.problem.ProblemException;
import fringekeep.archive.record.AboutReference;
import fringekeep.archive.record.Hash;
import fringekeep.archive.record.InputReference;
import fringekeep.archive.record.PersonId;
import fringekeep.property.SelectFits.Condition;
import fringekeep.property.SelectFits.Left;
import fringekeep.property.SelectFits.Resolved;
import java.util.ArrayList;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;
import java.util.Optional;

/**
 * Fits for a property, chosen by a rule or picked, with those a person leaves out for a reason of their own. What it makes of a
 * rule alone is what {@link SelectFits} makes of it.
 */
public final class ChooseFits {
    /** Reasons a person may leave a fit out for, codes of the closed list. */
    public static final List<String> REASONS = List.of("no-fringe", "poor-fit", "drifting", "other-choice", "by-hand");

    private final Archive archive;
    private final SelectFits fits;

    /** Chooses among the fits of an archive as it is now. */
    public ChooseFits(Archive archive) {
        this.archive = archive;
        this.fits = new SelectFits(archive);
    }

    /**
     * How fits are chosen.
     *
     * @param label a short name, may be empty
     * @param rule the rule in words
     * @param conditions the rule; empty for a list that is picked
     * @param picked the picked list; not looked at where there are conditions
     * @param byHand fits a person leaves out, each with a reason of {@link #REASONS}
     */
    public record Choice(
            String label, String rule, List<Condition> conditions, List<Hash> picked, Map<Hash, String> byHand) {
        /** Copies. */
        public Choice {
            conditions = List.copyOf(conditions);
            picked = List.copyOf(picked);
            byHand = Map.copyOf(byHand);
        }
    }

    /**
     * What became of the fits.
     *
     * @param taken in order
     * @param left reasons of those left out
     */
    public record Chosen(List<Hash> taken, Map<Hash, String> left) {
        /** Copies. */
        public Chosen {
            taken = List.copyOf(taken);
            left = java.util.Collections.unmodifiableMap(new LinkedHashMap<>(left));
        }
    }

    /** Takes or leaves out each fit; records nothing. */
    public Chosen resolve(Choice choice) throws ProblemException {
        Resolved resolved = resolved(choice);
        Map<Hash, String> left = new LinkedHashMap<>();
        resolved.left().forEach((fit, why) -> left.put(fit, why.reason()));
        return new Chosen(resolved.taken(), left);
    }

    /**
     * The selection, ready to be recorded.
     *
     * @throws ProblemException if nothing is taken
     */
    public NewRecord request(Choice choice, PersonId person) throws ProblemException {
        Resolved resolved = resolved(choice);
        if (resolved.taken().isEmpty()) {
            throw new ProblemException(new Problem(
                    "selection.nothing",
                    "No fit is taken.",
                    "/content/conditions",
                    "Fit the scans first, or widen the rule; nothing has been stored."));
        }
        return fits.request(choice.label(), choice.rule(), choice.conditions(), resolved, person);
    }

    private Resolved resolved(Choice choice) throws ProblemException {
        List<Hash> candidates = choice.conditions().isEmpty() ? choice.picked() : fits.answering(choice.conditions());
        List<Hash> judged = candidates.stream()
                .filter(fit -> !choice.byHand().containsKey(fit))
                .toList();
        Resolved resolved = fits.resolve(judged);
        Map<Hash, Left> left = new LinkedHashMap<>(resolved.left());
        for (Hash fit : candidates) {
            if (choice.byHand().containsKey(fit)) {
                left.put(fit, new Left(choice.byHand().get(fit), Optional.empty()));
            }
        }
        return new Resolved(resolved.taken(), left);
    }

    /** The choice a recorded selection states, with its fits as they stand now. */
    public Choice recorded(Hash selection) {
        RecordView view = archive.record(selection).orElseThrow();
        JsonObject content = view.content();
        List<Hash> picked = new ArrayList<>(taken(selection));
        Map<Hash, String> byHand = new LinkedHashMap<>();
        List<AboutReference> about = view.head().about();
        for (JsonObject each : content.array("left").objects()) {
            Hash fit = now(about.get((int) each.integer("about").orElseThrow()).record());
            String reason = each.text("reason").orElse("by-hand");
            picked.add(fit);
            if (REASONS.contains(reason)) {
                byHand.put(fit, reason);
            }
        }
        List<Condition> conditions = content.array("conditions").objects().stream()
                .map(Condition::of)
                .toList();
        return new Choice(
                content.text("label").orElse(""), content.text("rule").orElse(""), conditions, picked, byHand);
    }

    /** The fits a selection takes, as they stand now. */
    public List<Hash> taken(Hash selection) {
        List<Hash> taken = new ArrayList<>();
        for (InputReference input :
                archive.record(selection).orElseThrow().head().inputs()) {
            if (input instanceof InputReference.OfRecord of && of.role().equals(SelectionKind.TAKEN)) {
                taken.add(now(of.record()));
            }
        }
        return taken;
    }

    private Hash now(Hash record) {
        return archive.graph().current(record).orElse(record);
    }
}
