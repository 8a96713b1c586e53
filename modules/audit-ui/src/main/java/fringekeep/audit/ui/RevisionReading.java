package fringekeep.audit.ui;

import fringekeep.archive.Archive;
import fringekeep.archive.Regathering;
import fringekeep.archive.graph.Cause;
import fringekeep.archive.graph.Graph;
import fringekeep.archive.graph.StateName;
import fringekeep.archive.json.JsonObject;
import fringekeep.archive.kind.RecordView;
import fringekeep.archive.problem.ProblemException;
import fringekeep.archive.problem.StoppedException;
import fringekeep.archive.problem.Work;
import fringekeep.archive.record.Hash;
import fringekeep.archive.record.KindName;
import fringekeep.archive.record.PersonId;
import fringekeep.audit.NextRevision;
import fringekeep.audit.Revision;
import fringekeep.audit.Shift;
import fringekeep.audit.Supposed;
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
import java.util.LinkedHashSet;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import java.util.Set;
import org.openide.util.Lookup;

/** Works next revisions out, supposed or asked for, and lays out how far values move. Not to be used on the window thread. */
final class RevisionReading {
    private static final Texts TEXTS = AuditStage.TEXTS;

    private final Archive archive;
    private final Graph graph;
    private final Stops stops = Stops.shipped();
    private long moved;
    private long little;
    private long still;
    private long away;

    RevisionReading(Archive archive) {
        this.archive = archive;
        this.graph = archive.graph();
    }

    /**
     * What is asked.
     *
     * @param targets whose next revision; empty with {@code without}: everything made from those
     * @param without records supposed to be withdrawn
     */
    record Ask(List<Hash> targets, List<Hash> without) {
        Ask {
            targets = List.copyOf(targets);
            without = List.copyOf(without);
        }

        static Ask next(List<Hash> targets) {
            return new Ask(targets, List.of());
        }

        static Ask supposing(List<Hash> without) {
            return new Ask(List.of(), without);
        }

        boolean recordable() {
            return without.isEmpty();
        }
    }

    /** What came out: rows to show, and what may be recorded. */
    record Answer(String title, VerdictView view, List<Revision> revisions) {
        Answer {
            revisions = List.copyOf(revisions);
        }
    }

    Answer read(Ask ask, Optional<PersonId> person, Work work) throws ProblemException, StoppedException {
        List<Hash> targets = ask.recordable() ? ask.targets() : lastMadeFrom(ask.without());
        List<Revision> revisions = NextRevision.prepare(
                archive, targets, new Supposed(Set.copyOf(ask.without()), Map.of()), rules(), person, work);
        Map<Hash, VerdictView.Beside> beside = new HashMap<>();
        Map<String, List<Line>> byKind = new LinkedHashMap<>();
        List<Revision> latestFirst = revisions.stream()
                .sorted(Comparator.comparingInt(revision -> -stop(revision)))
                .toList();
        for (Revision revision : latestFirst) {
            byKind.computeIfAbsent(kind(revision), kind -> new ArrayList<>()).addAll(lines(revision));
            beside.put(revision.before(), beside(revision));
        }
        List<Group> groups = byKind.entrySet().stream()
                .map(entry -> new Group(Stops.label(entry.getKey()), entry.getValue()))
                .toList();
        return new Answer(
                ask.recordable()
                        ? TEXTS.of("revision.of", labels(ask.targets()))
                        : TEXTS.of("suppose.of", labels(ask.without())),
                new VerdictView(
                        revisions.size() == 1
                                ? TEXTS.of("revision.sub.one")
                                : TEXTS.of("revision.sub", NumberText.count(revisions.size())),
                        answers(ask, targets, revisions),
                        counts(),
                        groups,
                        beside),
                revisions);
    }

    private String labels(List<Hash> records) {
        List<String> labels = records.stream().limit(3).map(archive::label).toList();
        String all = String.join(", ", labels);
        return records.size() <= 3 ? all : TEXTS.of("and.more", all, NumberText.count(records.size() - 3));
    }

    /** Rules of their own that kinds announce. */
    static Map<KindName, Regathering> rules() {
        ClassLoader all = Optional.ofNullable(Lookup.getDefault().lookup(ClassLoader.class))
                .orElseGet(RevisionReading.class::getClassLoader);
        return NextRevision.announced(all);
    }

    /** What nothing current was made from in turn: figures, and properties that stand in none. */
    private List<Hash> lastMadeFrom(List<Hash> records) {
        Set<Hash> downstream = new LinkedHashSet<>();
        for (Hash record : records) {
            for (Hash each : graph.downstream(record)) {
                if (!graph.states(each).contains(StateName.CORRECTED)) {
                    downstream.add(each);
                }
            }
        }
        return downstream.stream()
                .filter(each -> graph.downstream(each).stream().noneMatch(downstream::contains))
                .toList();
    }

    private String kind(Revision revision) {
        return archive.record(revision.before())
                .map(view -> view.head().kind().text())
                .orElse("unknown");
    }

    private int stop(Revision revision) {
        return stops.of(kind(revision)).orElse(-1);
    }

    private List<VerdictView.Answer> answers(Ask ask, List<Hash> targets, List<Revision> revisions) {
        List<VerdictView.Answer> answers = new ArrayList<>();
        if (revisions.isEmpty()) {
            answers.add(new VerdictView.Answer(Mark.SAME, TEXTS.of(ask.recordable() ? "nothing" : "nothing.supposed")));
            return answers;
        }
        for (Hash target : targets.subList(0, Math.min(3, targets.size()))) {
            for (Cause cause : graph.causes(target).stream().limit(2).toList()) {
                answers.add(new VerdictView.Answer(
                        Mark.RING,
                        TEXTS.of(
                                "cause." + cause.sort().name(),
                                archive.label(target),
                                Names.named(archive, cause.upstream()),
                                archive.label(cause.by()))));
            }
        }
        return answers;
    }

    private List<Count> counts() {
        return List.of(
                new Count(Mark.DIFFERENT, Ink.MARK, moved, TEXTS.of("count.moved")),
                new Count(Mark.NEAR, Ink.QUANTUM, little, TEXTS.of("count.little")),
                new Count(Mark.SAME, Ink.STRONG, still, TEXTS.of("count.still")),
                new Count(Mark.DASHES, Ink.RULE, away, TEXTS.of("count.away")));
    }

    private List<Line> lines(Revision revision) {
        String number = Names.number(revision.label(), kind(revision));
        List<Line> lines = new ArrayList<>();
        if (revision.after().isEmpty()) {
            away++;
            String why = revision.reasons().stream()
                    .findFirst()
                    .map(problem -> problem.what())
                    .orElse("");
            return List.of(
                    new Line(number, why, "", "", "", Mark.DASHES, TEXTS.of("falls.away"), List.of(revision.before())));
        }
        JsonObject result =
                archive.record(revision.before()).map(RecordView::result).orElse(JsonObject.EMPTY);
        for (Shift shift : revision.shifts()) {
            if (shift.before() != shift.after()) {
                lines.add(line(number, result, revision, shift));
            }
        }
        if (lines.isEmpty()) {
            still++;
            lines.add(new Line(
                    number,
                    TEXTS.of("made.anew"),
                    "",
                    "",
                    "",
                    Mark.SAME,
                    TEXTS.of("stays"),
                    List.of(revision.before())));
        }
        return lines;
    }

    private Line line(String number, JsonObject result, Revision revision, Shift shift) {
        double sigmas = shift.inDeviations().orElse(Double.NaN);
        boolean far = !(Math.abs(sigmas) < 1);
        if (far) {
            moved++;
        } else {
            little++;
        }
        String words = Double.isNaN(sigmas)
                ? TEXTS.of("moves")
                : TEXTS.of("moves.sigma", NumberText.significant(Math.abs(sigmas), 2));
        return new Line(
                number,
                ValueNames.words(result, shift.pointer()),
                shown(shift.before(), shift.deviation()),
                shown(shift.after(), shift.deviation()),
                NumberText.significant(shift.after() - shift.before(), 2),
                far ? Mark.DIFFERENT : Mark.NEAR,
                words,
                List.of(revision.before()));
    }

    private static String shown(double value, double deviation) {
        return deviation > 0 ? NumberText.measured(value, deviation) : NumberText.significant(value, 5);
    }

    private VerdictView.Beside beside(Revision revision) {
        JsonObject result =
                archive.record(revision.before()).map(RecordView::result).orElse(JsonObject.EMPTY);
        List<VerdictView.Interval> intervals = revision.shifts().stream()
                .filter(shift -> shift.before() != shift.after() && shift.deviation() > 0)
                .limit(3)
                .map(shift -> new VerdictView.Interval(
                        ValueNames.words(result, shift.pointer()), shift.before(), shift.after(), shift.deviation()))
                .toList();
        String sentence = revision.reasons().stream()
                .findFirst()
                .map(problem -> problem.what() + " " + problem.mend())
                .orElseGet(() -> graph.causes(revision.before()).stream()
                        .findFirst()
                        .map(cause -> TEXTS.of(
                                "cause." + cause.sort().name(),
                                revision.label(),
                                Names.named(archive, cause.upstream()),
                                archive.label(cause.by())))
                        .orElse(TEXTS.of("because.upstream")));
        return new VerdictView.Beside(
                revision.label(),
                revision.before().shortForm(),
                revision.after().isPresent() ? Mark.RING : Mark.DASHES,
                sentence,
                List.of(),
                intervals);
    }
}
