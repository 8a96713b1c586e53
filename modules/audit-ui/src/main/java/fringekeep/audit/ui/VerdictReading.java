package fringekeep.audit.ui;

import fringekeep.archive.Archive;
import fringekeep.archive.json.JsonObject;
import fringekeep.archive.kind.RecordView;
import fringekeep.archive.kind.ValueComparison.Difference;
import fringekeep.archive.lineage.Recomputed;
import fringekeep.archive.lineage.Recomputed.Verdict;
import fringekeep.archive.problem.StoppedException;
import fringekeep.archive.problem.Work;
import fringekeep.archive.record.Hash;
import fringekeep.archive.record.PartName;
import fringekeep.audit.Recompute;
import fringekeep.audit.Through;
import fringekeep.desk.look.Ink;
import fringekeep.desk.look.Mark;
import fringekeep.desk.look.Texts;
import fringekeep.desk.part.VerdictTable.Count;
import fringekeep.desk.part.VerdictTable.Group;
import fringekeep.desk.part.VerdictTable.Line;
import fringekeep.desk.session.Names;
import fringekeep.desk.session.Stops;
import fringekeep.drawing.NumberText;
import java.util.ArrayList;
import java.util.Comparator;
import java.util.HashMap;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import java.util.OptionalDouble;

/** Recomputes and lays the verdicts out. Not to be used on the window thread. */
final class VerdictReading {
    private static final Texts TEXTS = AuditStage.TEXTS;
    private static final int MOST_DIFFERENCES = 6;
    private static final int MOST_SINGLE = 4;

    private final Archive archive;
    private final Stops stops = Stops.shipped();
    private final Map<Hash, VerdictView.Beside> beside = new HashMap<>();
    private long values;
    private long withinUnits;
    private double mostDeviations;

    VerdictReading(Archive archive) {
        this.archive = archive;
    }

    /** How a chain is recomputed. */
    enum Way {
        /** What comes out of a link is fed into the next. */
        THROUGH,
        /** Each link from its recorded inputs. */
        EACH
    }

    VerdictView read(List<Hash> targets, Way way, Work work) throws StoppedException {
        long start = System.nanoTime();
        List<VerdictView.Answer> answers = new ArrayList<>();
        Recompute.Verdicts verdicts;
        if (way == Way.THROUGH) {
            Through.Answers through = Through.upstreamOf(archive, targets, work);
            verdicts = through.verdicts();
            through.answers().forEach(answer -> answers.add(answer(answer)));
        } else {
            verdicts = Recompute.upstreamOf(archive, targets, work);
        }
        Map<String, List<Recomputed>> byKind = byKind(verdicts);
        List<Group> groups = new ArrayList<>();
        for (Map.Entry<String, List<Recomputed>> kind : byKind.entrySet()) {
            work.check();
            groups.add(new Group(
                    Stops.label(kind.getKey()) + ", "
                            + NumberText.count(kind.getValue().size()),
                    lines(kind.getKey(), kind.getValue())));
        }
        double seconds = (System.nanoTime() - start) / 1e9;
        return new VerdictView(
                TEXTS.of(
                        "recomputed.sub",
                        NumberText.count(verdicts.records().size()),
                        NumberText.count(values),
                        NumberText.fixed(seconds, 1)),
                answers,
                counts(verdicts),
                groups,
                beside);
    }

    private VerdictView.Answer answer(Through.Answer answer) {
        Mark mark =
                switch (answer.follows()) {
                    case SAME_BITS -> Mark.SAME;
                    case WITHIN_ROUNDING -> Mark.NEAR;
                    case NO -> Mark.DIFFERENT;
                    case UNDECIDED, ENTERED -> Mark.DASHES;
                };
        String from = answer.beginnings().isEmpty() ? "" : TEXTS.of("begins", labels(answer.beginnings()));
        String taken = answer.taken().isEmpty() ? "" : TEXTS.of("taken", labels(answer.taken()));
        return new VerdictView.Answer(
                mark, archive.label(answer.target()) + " " + answer.follows().words() + from + taken);
    }

    private String labels(List<Hash> records) {
        List<String> labels = records.stream().limit(4).map(archive::label).toList();
        return String.join(", ", labels) + (records.size() > 4 ? " \u2026" : "");
    }

    /** Latest kinds first: the figure, then what it was made from. */
    private Map<String, List<Recomputed>> byKind(Recompute.Verdicts verdicts) {
        Map<String, List<Recomputed>> found = new HashMap<>();
        for (Recomputed each : verdicts.records()) {
            String kind = archive.record(each.record())
                    .map(view -> view.head().kind().text())
                    .orElse("unknown");
            found.computeIfAbsent(kind, name -> new ArrayList<>()).add(each);
        }
        Map<String, List<Recomputed>> ordered = new LinkedHashMap<>();
        found.keySet().stream()
                .sorted(Comparator.comparingInt((String kind) -> -stops.of(kind).orElse(-1))
                        .thenComparing(Comparator.naturalOrder()))
                .forEach(kind -> ordered.put(kind, found.getOrDefault(kind, List.of())));
        return ordered;
    }

    private List<Count> counts(Recompute.Verdicts verdicts) {
        Map<Verdict, Long> counts = new HashMap<>();
        long entered = 0;
        for (Recomputed each : verdicts.records()) {
            if (each.reason().equals("entered")) {
                entered++;
            } else {
                counts.merge(each.verdict(), 1L, Long::sum);
            }
        }
        String most = mostDeviations > 0
                ? TEXTS.of("count.different.most", NumberText.significant(mostDeviations, 2))
                : TEXTS.of("count.different");
        return List.of(
                new Count(Mark.SAME, Ink.STRONG, counts.getOrDefault(Verdict.SAME_BITS, 0L), TEXTS.of("count.same")),
                new Count(
                        Mark.NEAR,
                        Ink.QUANTUM,
                        counts.getOrDefault(Verdict.LAST_PLACES, 0L),
                        TEXTS.of("count.near", NumberText.count(withinUnits))),
                new Count(Mark.DIFFERENT, Ink.MARK, counts.getOrDefault(Verdict.DIFFERS, 0L), most),
                new Count(
                        Mark.DASHES,
                        Ink.RULE,
                        counts.getOrDefault(Verdict.NOT_COMPUTABLE, 0L) + entered,
                        TEXTS.of(
                                "count.not",
                                NumberText.count(counts.getOrDefault(Verdict.NOT_COMPUTABLE, 0L)),
                                NumberText.count(entered))));
    }

    private List<Line> lines(String kind, List<Recomputed> records) {
        List<Line> lines = new ArrayList<>();
        Map<String, List<Recomputed>> alike = new LinkedHashMap<>();
        for (Recomputed each : records) {
            if (each.verdict() == Verdict.DIFFERS || each.verdict() == Verdict.LAST_PLACES) {
                lines.addAll(differences(kind, each));
            } else {
                alike.computeIfAbsent(each.verdict() + each.reason(), key -> new ArrayList<>())
                        .add(each);
            }
        }
        for (List<Recomputed> same : alike.values()) {
            if (same.size() <= MOST_SINGLE) {
                same.forEach(each -> lines.add(gathered(kind, List.of(each))));
            } else {
                lines.add(gathered(kind, same));
            }
        }
        return lines;
    }

    private Line gathered(String kind, List<Recomputed> same) {
        long numbers = 0;
        for (Recomputed each : same) {
            numbers += numbers(each);
        }
        values += numbers;
        Recomputed first = same.get(0);
        boolean entered = first.reason().equals("entered");
        String what = entered
                ? TEXTS.of("entered")
                : first.verdict() == Verdict.NOT_COMPUTABLE
                        ? reason(first)
                        : same.size() == 1
                                ? TEXTS.of("values", NumberText.count(numbers))
                                : TEXTS.of("values.in", NumberText.count(numbers), NumberText.count(same.size()));
        same.forEach(each -> beside.put(each.record(), beside(each, List.of())));
        return new Line(
                numbers(kind, same),
                what,
                "",
                "",
                first.verdict() == Verdict.SAME_BITS ? TEXTS.of("ulp", "0") : "",
                mark(first.verdict()),
                entered ? TEXTS.of("not.computed") : words(first.verdict()),
                same.stream().map(Recomputed::record).toList());
    }

    private String numbers(String kind, List<Recomputed> same) {
        String first = Names.number(archive.label(same.get(0).record()), kind);
        String last = Names.number(archive.label(same.get(same.size() - 1).record()), kind);
        return same.size() == 1 ? first : TEXTS.of("gathered", brief(first), brief(last));
    }

    private static String brief(String number) {
        return number.length() <= 8 ? number : number.split(" ")[0];
    }

    private long numbers(Recomputed each) {
        return each.reason().equals("entered")
                ? 0
                : archive.record(each.record())
                        .map(view -> ValueNames.numbers(view.result()))
                        .orElse(0L);
    }

    private List<Line> differences(String kind, Recomputed each) {
        JsonObject result =
                archive.record(each.record()).map(RecordView::result).orElse(JsonObject.EMPTY);
        values += ValueNames.numbers(result);
        String number = Names.number(archive.label(each.record()), kind);
        List<Line> lines = new ArrayList<>();
        List<VerdictView.Interval> intervals = new ArrayList<>();
        for (Difference one : each.differences()) {
            if (lines.size() >= MOST_DIFFERENCES) {
                break;
            }
            note(one);
            interval(result, one).ifPresent(intervals::add);
            boolean near = one.withinRounding();
            lines.add(new Line(
                    number,
                    ValueNames.words(result, one.pointer()),
                    ValueNames.brief(one.kept()),
                    ValueNames.brief(one.now()),
                    near
                            ? TEXTS.of("ulp", NumberText.count(one.units()))
                            : one.change().isPresent() ? signed(one.change().getAsDouble()) : "",
                    near ? Mark.NEAR : Mark.DIFFERENT,
                    words(one),
                    List.of(each.record())));
        }
        if (each.differences().size() > MOST_DIFFERENCES) {
            lines.add(new Line(
                    number,
                    TEXTS.of("further", NumberText.count(each.differences().size() - MOST_DIFFERENCES)),
                    "",
                    "",
                    "",
                    mark(each.verdict()),
                    words(each.verdict()),
                    List.of(each.record())));
        }
        beside.put(each.record(), beside(each, intervals));
        return lines;
    }

    private void note(Difference one) {
        if (one.withinRounding()) {
            withinUnits = Math.max(withinUnits, one.units());
        } else {
            mostDeviations =
                    Math.max(mostDeviations, Math.abs(one.inDeviations().orElse(0)));
        }
    }

    private static Optional<VerdictView.Interval> interval(JsonObject result, Difference one) {
        OptionalDouble change = one.change();
        OptionalDouble deviations = one.inDeviations();
        if (change.isEmpty() || deviations.isEmpty() || deviations.getAsDouble() == 0) {
            return Optional.empty();
        }
        double kept = Double.parseDouble(one.kept());
        return Optional.of(new VerdictView.Interval(
                ValueNames.words(result, one.pointer()),
                kept,
                kept + change.getAsDouble(),
                Math.abs(change.getAsDouble() / deviations.getAsDouble())));
    }

    private static String words(Difference one) {
        if (one.withinRounding()) {
            return words(Verdict.LAST_PLACES);
        }
        return one.inDeviations().isPresent()
                ? TEXTS.of(
                        "different.sigma",
                        NumberText.significant(Math.abs(one.inDeviations().getAsDouble()), 2))
                : words(Verdict.DIFFERS);
    }

    private VerdictView.Beside beside(Recomputed each, List<VerdictView.Interval> intervals) {
        Optional<RecordView> view = archive.record(each.record());
        List<List<String>> facts = new ArrayList<>();
        view.ifPresent(record -> {
            record.choices().text("method").ifPresent(id -> facts.add(List.of(TEXTS.of("fact.method"), id)));
            record.part(PartName.MADE)
                    .flatMap(made -> made.text("build"))
                    .ifPresent(build -> facts.add(List.of(TEXTS.of("fact.made"), build)));
            facts.add(List.of(
                    TEXTS.of("fact.inputs"),
                    NumberText.count(record.head().inputs().size())));
        });
        archive.recorded(each.record())
                .ifPresent(recorded -> facts.add(List.of(TEXTS.of("fact.journal"), NumberText.count(recorded.n()))));
        String sentence = each.reason().equals("entered")
                ? TEXTS.of("sentence.entered")
                : switch (each.verdict()) {
                    case SAME_BITS -> TEXTS.of("sentence.same");
                    case LAST_PLACES -> TEXTS.of("sentence.near", NumberText.count(each.units()));
                    case DIFFERS -> TEXTS.of("sentence.different");
                    case NOT_COMPUTABLE -> reason(each);
                };
        return new VerdictView.Beside(
                archive.label(each.record()),
                each.record().shortForm(),
                mark(each.verdict()),
                sentence,
                facts,
                intervals);
    }

    /** Words for why something could not be computed. */
    private static String reason(Recomputed each) {
        return TEXTS.orElse("reason." + each.reason(), each.reason());
    }

    private static String signed(double change) {
        String text = NumberText.significant(change, 3);
        return change > 0 ? "+" + text : text;
    }

    static Mark mark(Verdict verdict) {
        return switch (verdict) {
            case SAME_BITS -> Mark.SAME;
            case LAST_PLACES -> Mark.NEAR;
            case NOT_COMPUTABLE -> Mark.DASHES;
            case DIFFERS -> Mark.DIFFERENT;
        };
    }

    private static String words(Verdict verdict) {
        return TEXTS.of("verdict." + verdict.name());
    }
}
