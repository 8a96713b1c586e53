package fringekeep.desk.session;

import fringekeep.archive.Archive;
import fringekeep.archive.graph.Cause;
import fringekeep.archive.graph.Graph;
import fringekeep.archive.graph.StateName;
import fringekeep.archive.record.Hash;
import fringekeep.desk.look.Mark;
import fringekeep.desk.look.Texts;
import java.util.ArrayList;
import java.util.List;
import java.util.Locale;
import java.util.Optional;
import java.util.Set;

/** States of records as shapes and words. */
public final class States {
    private static final Texts TEXTS = new Texts("fringekeep.desk.session.Texts", States.class);
    private static final List<StateName> ORDER = List.of(
            StateName.DISPUTED,
            StateName.CORRECTED,
            StateName.WITHDRAWN,
            StateName.OUTDATED,
            StateName.MASKED,
            StateName.DOUBTED,
            StateName.PREFERRED);

    private States() {}

    /** One shape and its sentence. */
    public record Sentence(Mark mark, String text) {}

    /** The state that is shown first, if any. */
    public static Optional<StateName> first(Set<StateName> states) {
        return ORDER.stream().filter(states::contains).findFirst();
    }

    /** Shape of a state. */
    public static Mark mark(StateName state) {
        return switch (state) {
            case CORRECTED -> Mark.CORRECTED;
            case WITHDRAWN -> Mark.SLASH;
            case MASKED -> Mark.BAR;
            case DOUBTED -> Mark.WAVE;
            case PREFERRED -> Mark.PREFERRED;
            case OUTDATED -> Mark.RING;
            case DISPUTED -> Mark.DISPUTED;
        };
    }

    /** Word of a state. */
    public static String word(StateName state) {
        return TEXTS.of("state." + state.name().toLowerCase(Locale.ROOT));
    }

    /** One sentence per state: what, since when, why. Asks the archive. */
    public static List<Sentence> sentences(Archive archive, Graph graph, Clock clock, Hash record) {
        List<Sentence> sentences = new ArrayList<>();
        Set<StateName> states = graph.states(record);
        for (StateName state : ORDER) {
            if (states.contains(state)) {
                sentences.add(new Sentence(mark(state), sentence(archive, graph, clock, record, state)));
            }
        }
        return sentences;
    }

    private static String sentence(Archive archive, Graph graph, Clock clock, Hash record, StateName state) {
        return switch (state) {
            case OUTDATED -> causes(archive, clock, graph.causes(record));
            case CORRECTED ->
                graph.current(record)
                        .map(now -> TEXTS.of(
                                "corrected.by",
                                Names.shortLabel(archive.label(now), clock),
                                since(archive, clock, now)))
                        .orElseGet(() -> word(state));
            case WITHDRAWN, MASKED, DOUBTED, PREFERRED -> judged(archive, graph, clock, record, state);
            case DISPUTED -> TEXTS.of("disputed");
        };
    }

    private static String judged(Archive archive, Graph graph, Clock clock, Hash record, StateName state) {
        String verdict = state.name().toLowerCase(Locale.ROOT);
        for (Hash judgement : graph.judgements(record)) {
            var view = archive.record(judgement);
            boolean speaks = view.map(
                            one -> one.content().text("verdict").orElse("").equals(verdict))
                    .orElse(false);
            if (speaks) {
                String reason = view.flatMap(one -> one.content().text("reason"))
                        .orElse("")
                        .replace('-', ' ');
                return TEXTS.of("judged", word(state), since(archive, clock, judgement), reason);
            }
        }
        return word(state);
    }

    private static String causes(Archive archive, Clock clock, List<Cause> causes) {
        if (causes.isEmpty()) {
            return word(StateName.OUTDATED);
        }
        Cause cause = causes.get(0);
        String more = causes.size() > 1 ? TEXTS.of("more", causes.size() - 1) : "";
        String key = "cause." + cause.sort().name().toLowerCase(Locale.ROOT);
        return TEXTS.of(
                        key,
                        since(archive, clock, cause.by()),
                        Names.named(archive, cause.upstream(), clock),
                        by(archive, clock, cause))
                + more;
    }

    /** The number alone where the kind was just said, else the whole label. */
    private static String by(Archive archive, Clock clock, Cause cause) {
        String label = Names.shortLabel(archive.label(cause.by()), clock);
        String upstream = archive.label(cause.upstream());
        int space = upstream.indexOf(' ');
        String kind = space < 0 ? upstream : upstream.substring(0, space + 1);
        return label.startsWith(kind) ? label.substring(kind.length()) : label;
    }

    private static String since(Archive archive, Clock clock, Hash record) {
        return archive.recorded(record)
                .map(recorded -> clock.moment(recorded.at()))
                .orElse("");
    }
}
