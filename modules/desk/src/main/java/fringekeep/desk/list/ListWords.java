package fringekeep.desk.list;

import fringekeep.archive.Archive;
import fringekeep.archive.graph.StateName;
import fringekeep.archive.problem.ProblemException;
import fringekeep.archive.problem.StoppedException;
import fringekeep.archive.problem.Work;
import fringekeep.desk.list.ListContent.Word;
import fringekeep.desk.look.Texts;
import fringekeep.desk.session.InView;
import fringekeep.desk.session.Register;
import fringekeep.desk.session.States;
import fringekeep.desk.session.Stops;
import java.util.ArrayList;
import java.util.BitSet;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import java.util.stream.IntStream;

/** Filter words of a list with their counts: values of told columns, what is lacking, states, the kinds beside. */
final class ListWords {
    private static final Texts TEXTS = new Texts("fringekeep.desk.list.Texts", ListWords.class);
    private static final int MOST = 7;
    private static final List<StateName> SHOWN =
            List.of(StateName.OUTDATED, StateName.WITHDRAWN, StateName.MASKED, StateName.DOUBTED, StateName.PREFERRED);

    private final Archive archive;
    private final Register register;
    private final InView inView;
    private final Stops stops;
    private final Joined joined;

    ListWords(Archive archive, InView inView, Stops stops, Joined joined) {
        this.archive = archive;
        this.inView = inView;
        this.register = inView.register();
        this.stops = stops;
        this.joined = joined;
    }

    /** What rows without a linked record of a kind are called: unplaced. */
    static String lacking(String kind) {
        return TEXTS.orElse("lacks." + kind, TEXTS.of("lacks", Stops.label(kind)));
    }

    /** Words of a list; those that need all rows only where they are asked for. */
    List<Word> of(Question question, boolean counted, Work work) throws ProblemException, StoppedException {
        String kind = question.kind();
        List<Word> words = new ArrayList<>();
        words.add(new Word(TEXTS.of("all"), -1, Question.all(kind), question.whole()));
        if (counted) {
            for (String column : stops.entry(kind, "filters")) {
                values(question, column, words, work);
            }
        }
        for (StateName state : SHOWN) {
            int count = inView.count(kind, state);
            if (count > 0) {
                boolean chosen = question.state().equals(Optional.of(state));
                words.add(new Word(States.word(state), count, Question.in(kind, state), chosen));
            }
        }
        question.linkedWith()
                .ifPresent(
                        record -> words.add(new Word(TEXTS.of("linked", archive.label(record)), -1, question, true)));
        question.among()
                .ifPresent(among ->
                        words.add(new Word(among.words(), among.records().size(), question, true)));
        if (!question.words().isEmpty()) {
            words.add(new Word(TEXTS.of("found", question.words()), -1, question, true));
        }
        beside(kind, words);
        return words;
    }

    private void beside(String kind, List<Word> words) {
        stops.of(kind).ifPresent(stop -> {
            for (String other : stops.all().get(stop).kinds()) {
                int count = other.equals(kind) ? 0 : inView.current(other);
                if (count > 0) {
                    words.add(new Word(ReadList.plural(other), count, Question.all(other), false));
                }
            }
        });
    }

    private void values(Question question, String column, List<Word> words, Work work)
            throws ProblemException, StoppedException {
        String kind = question.kind();
        Map<String, Integer> counts = new LinkedHashMap<>();
        Coded coded = coded(kind, column, work);
        for (int place = 0; place < register.size(kind); place++) {
            if (inView.contains(kind, place) && !register.is(kind, place, StateName.CORRECTED)) {
                counts.merge(coded.text(place), 1, Integer::sum);
            }
        }
        counts.entrySet().stream()
                .filter(entry -> !entry.getKey().isEmpty())
                .sorted((one, other) -> other.getValue() - one.getValue())
                .limit(MOST)
                .forEach(entry -> {
                    Question.Value value = new Question.Value(column, entry.getKey());
                    boolean chosen = question.value().equals(Optional.of(value));
                    words.add(new Word(
                            CellText.plainWords(entry.getKey()), entry.getValue(), Question.with(kind, value), chosen));
                });
        Spec spec = Spec.of(column);
        int without = counts.getOrDefault("", 0);
        if (without > 0 && !spec.way().isEmpty()) {
            Question.Value value = new Question.Value(column, "");
            boolean chosen = question.value().equals(Optional.of(value));
            words.add(new Word(lacking(spec.kind(kind)), without, Question.with(kind, value), chosen));
        }
    }

    /** Places of a kind with a value in a column. */
    BitSet with(String kind, Question.Value value, Work work) throws ProblemException, StoppedException {
        Coded coded = coded(kind, value.column(), work);
        BitSet found = new BitSet();
        IntStream.range(0, register.size(kind))
                .filter(place -> coded.text(place).equals(value.text()))
                .forEach(found::set);
        return found;
    }

    /** Values of a text column, over a way. */
    private record Coded(Optional<Values> values, Optional<int[]> over) {
        String text(int place) {
            int at = over.map(places -> places[place]).orElse(place);
            if (at < 0 || values.isEmpty() || Double.isNaN(values.get().numbers()[at])) {
                return "";
            }
            List<String> words = values.get().words();
            return words.isEmpty() ? "" : words.get((int) values.get().numbers()[at]);
        }
    }

    private Coded coded(String kind, String column, Work work) throws ProblemException, StoppedException {
        Spec spec = Spec.of(column);
        Optional<int[]> over =
                spec.way().isEmpty() ? Optional.empty() : Optional.of(joined.places(kind, spec.way(), work));
        return new Coded(joined.values(spec.kind(kind), spec.column(), work), over);
    }
}
