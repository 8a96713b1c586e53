package fringekeep.property;

import fringekeep.archive.Archive;
import fringekeep.archive.NewRecord;
import fringekeep.archive.graph.Graph;
import fringekeep.archive.graph.StateName;
import fringekeep.archive.json.Json;
import fringekeep.archive.json.JsonArray;
import fringekeep.archive.json.JsonObject;
import fringekeep.archive.listing.Listing;
import fringekeep.archive.listing.Page;
import fringekeep.archive.problem.Problem;
import fringekeep.archive.problem.ProblemException;
import fringekeep.archive.record.AboutReference;
import fringekeep.archive.record.Hash;
import fringekeep.archive.record.InputReference;
import fringekeep.archive.record.KindName;
import fringekeep.archive.record.PartName;
import fringekeep.archive.record.PersonId;
import java.util.ArrayList;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import java.util.OptionalDouble;
import java.util.Set;

/**
 * Resolves a rule over the list of fits to a selection: current fits that answer it are taken, those whose scans are
 * withdrawn, that are outdated, or that another fit of the same question is preferred to are left out with the reason.
 */
public final class SelectFits {
    private static final KindName SELECTION = new KindName("selection");
    private static final int PAGE = 1_000;

    private final Archive archive;
    private final Graph graph;

    /** Resolves rules over an archive as it is now. */
    public SelectFits(Archive archive) {
        this.archive = archive;
        this.graph = archive.graph();
    }

    /**
     * A condition on a column of the list of fits.
     *
     * @param column its name
     * @param is text it must be
     * @param from number it must not be less than (SI)
     * @param below number it must be less than (SI)
     */
    public record Condition(String column, Optional<String> is, OptionalDouble from, OptionalDouble below) {
        /** A condition as a selection's content states it. */
        static Condition of(JsonObject json) {
            return new Condition(
                    json.text("column").orElse(""), json.text("is"), json.number("from"), json.number("below"));
        }

        private JsonObject json() {
            JsonObject json = JsonObject.EMPTY.with("column", column).with("is", is.map(Json::of));
            json = from.isPresent() ? json.with("from", from.getAsDouble()) : json;
            return below.isPresent() ? json.with("below", below.getAsDouble()) : json;
        }
    }

    /**
     * The selection, ready to be recorded.
     *
     * @param label a short name
     * @param rule the rule in words
     * @param conditions the rule as conditions, at least one
     * @throws ProblemException if a column is not known or nothing answers the rule
     */
    public NewRecord select(String label, String rule, List<Condition> conditions, PersonId person)
            throws ProblemException {
        Resolved resolved = resolve(answering(conditions));
        if (resolved.taken().isEmpty()) {
            throw new ProblemException(new Problem(
                    "selection.nothing",
                    resolved.left().isEmpty()
                            ? "No current fit answers the rule."
                            : "All " + resolved.left().size() + " fits that answer the rule are left out.",
                    "/content/conditions",
                    "Fit the scans first, or widen the rule; nothing has been stored."));
        }
        return request(label, rule, conditions, resolved, person);
    }

    /**
     * What became of the fits that answer a rule.
     *
     * @param taken those taken, in order
     * @param left those left out
     */
    record Resolved(List<Hash> taken, Map<Hash, Left> left) {}

    /**
     * Why a fit is left out.
     *
     * @param reason code of the closed list
     * @param because the judgement that decided
     */
    record Left(String reason, Optional<Hash> because) {}

    /**
     * Takes or leaves out each fit.
     *
     * @throws ProblemException if several fits answer one question and no judgement prefers one
     */
    Resolved resolve(List<Hash> fits) throws ProblemException {
        List<Hash> taken = new ArrayList<>();
        Map<Hash, Left> left = new LinkedHashMap<>();
        Map<String, List<Hash>> questions = new LinkedHashMap<>();
        for (Hash fit : fits) {
            Optional<Left> reason = reason(fit);
            if (reason.isPresent()) {
                left.put(fit, reason.get());
            } else {
                questions
                        .computeIfAbsent(question(fit), any -> new ArrayList<>())
                        .add(fit);
                taken.add(fit);
            }
        }
        for (List<Hash> rivals : questions.values()) {
            if (rivals.size() > 1) {
                Graph.Preference preference = preference(rivals);
                for (Hash passedOver : rivals) {
                    if (!preference.chosen().equals(Optional.of(passedOver))) {
                        left.put(passedOver, new Left("other-choice", preference.because()));
                    }
                }
            }
        }
        taken.removeIf(left::containsKey);
        return new Resolved(List.copyOf(taken), left);
    }

    private String question(Hash fit) {
        return archive.record(fit)
                .flatMap(view -> archive.kinds()
                        .get(view.head().kind())
                        .flatMap(kind -> kind.question(view, archive.inputs(fit))))
                .orElse(fit.hex());
    }

    /** Counts of one scan must not enter twice: where several fits of it answer the rule, a judgement has to say which. */
    private Graph.Preference preference(List<Hash> rivals) throws ProblemException {
        Graph.Preference preference = graph.preferred(rivals);
        if (preference.chosen().isEmpty()) {
            throw new ProblemException(new Problem(
                    "selection.rivals",
                    "Several fits of the same scans answer the rule and none is preferred: "
                            + String.join(
                                    ", ", rivals.stream().map(archive::label).toList())
                            + ".",
                    "/content/conditions",
                    "Prefer one of them by a judgement, or narrow the rule; nothing has been stored."));
        }
        return preference;
    }

    /** Current fits that answer, in journal order. */
    List<Hash> answering(List<Condition> conditions) throws ProblemException {
        List<Listing.Filter> filters = new ArrayList<>();
        for (Condition condition : conditions) {
            condition
                    .is()
                    .ifPresent(
                            text -> filters.add(new Listing.Filter(condition.column(), Listing.Comparison.IS, text)));
            condition
                    .from()
                    .ifPresent(value ->
                            filters.add(new Listing.Filter(condition.column(), Listing.Comparison.AT_LEAST, value)));
            condition
                    .below()
                    .ifPresent(value ->
                            filters.add(new Listing.Filter(condition.column(), Listing.Comparison.BELOW, value)));
        }
        List<Hash> found = new ArrayList<>();
        Optional<Page.Key> after = Optional.empty();
        do {
            Page page = archive.list(
                    new Listing("fit", filters, true, List.of(), Optional.empty(), "n", false, after, PAGE));
            page.rows().forEach(line -> found.add(line.record()));
            after = page.last();
        } while (after.isPresent());
        return List.copyOf(found);
    }

    /** Why a fit is left out by itself: it or what it rests on is withdrawn, or it is outdated. */
    Optional<Left> reason(Hash fit) {
        Set<StateName> states = graph.states(fit);
        boolean scanWithdrawn = graph.upstream(fit).stream()
                .anyMatch(record -> graph.states(record).contains(StateName.WITHDRAWN));
        if (states.contains(StateName.WITHDRAWN) || scanWithdrawn) {
            return Optional.of(new Left("withdrawn", judgement(fit)));
        }
        return states.contains(StateName.OUTDATED)
                ? Optional.of(new Left("outdated", Optional.empty()))
                : Optional.empty();
    }

    /** Judgements on a fit or on anything it was made from, the first of which is said to have decided. */
    private Optional<Hash> judgement(Hash fit) {
        List<Hash> all = new ArrayList<>(graph.judgements(fit));
        graph.upstream(fit).stream()
                .filter(record -> graph.states(record).contains(StateName.WITHDRAWN))
                .forEach(record -> all.addAll(graph.judgements(record)));
        return all.stream().findFirst();
    }

    NewRecord request(String label, String rule, List<Condition> conditions, Resolved resolved, PersonId person) {
        List<InputReference> inputs = new ArrayList<>();
        resolved.taken().forEach(fit -> inputs.add(new InputReference.OfRecord(SelectionKind.TAKEN, fit)));
        List<AboutReference> about = new ArrayList<>();
        List<Json> reasons = new ArrayList<>();
        for (Map.Entry<Hash, Left> each : resolved.left().entrySet()) {
            Left decided = each.getValue();
            JsonObject reason = JsonObject.EMPTY.with("about", about.size()).with("reason", decided.reason());
            if (decided.because().isPresent()) {
                InputReference because = new InputReference.OfRecord(
                        SelectionKind.BECAUSE, decided.because().get());
                if (!inputs.contains(because)) {
                    inputs.add(because);
                }
                reason = reason.with("because", inputs.indexOf(because));
            }
            reasons.add(reason);
            about.add(new AboutReference(SelectionKind.LEFT_OUT, each.getKey(), AboutReference.Reach.RECORD));
        }
        JsonObject content = JsonObject.EMPTY
                .with("rule", rule)
                .with(
                        "conditions",
                        new JsonArray(
                                conditions.stream().<Json>map(Condition::json).toList()))
                .with("left", new JsonArray(reasons));
        return new NewRecord(
                SELECTION,
                inputs,
                about,
                Map.of(PartName.CONTENT, label.isBlank() ? content : content.with("label", label)),
                List.of(),
                Optional.empty(),
                Optional.empty(),
                Optional.of(person));
    }
}
