package fringekeep.desk.run;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.assertThatThrownBy;

import fringekeep.archive.problem.Problem;
import fringekeep.archive.problem.ProblemException;
import fringekeep.archive.problem.Work;
import java.util.ArrayDeque;
import java.util.ArrayList;
import java.util.Deque;
import java.util.List;
import org.junit.jupiter.api.Test;

class RunnerTest {
    private final Deque<Runnable> waiting = new ArrayDeque<>();
    private final List<String> answers = new ArrayList<>();
    private final List<Problem> troubles = new ArrayList<>();
    private final Runner runner = new Runner(waiting::add, Runnable::run);

    @Test
    void aNewerQuestionForTheSamePlaceDropsTheOlderAnswer() {
        List<Work> works = new ArrayList<>();
        runner.run("list", work -> keep(works, work, "old"), answers::add);
        runner.run("list", work -> keep(works, work, "new"), answers::add);
        runAll();

        assertThat(answers).containsExactly("new");
        assertThat(works).hasSize(1);
    }

    @Test
    void aJobThatRunsIsToldToStopWhenANewerOneComes() {
        List<Work> works = new ArrayList<>();
        runner.run(
                "list",
                work -> {
                    works.add(work);
                    runner.run("list", other -> "new", answers::add);
                    return work.stopped() ? "stopped" : "went on";
                },
                answers::add);
        runAll();

        assertThat(works.get(0).stopped()).isTrue();
        assertThat(answers).containsExactly("new");
    }

    @Test
    void aJobStoppedBeforeItBeganDoesNotCountAsRunning() {
        runner.run("list", work -> "list", answers::add);
        runner.stop("list");
        runAll();

        assertThat(answers).isEmpty();
        assertThat(runner.quiet()).isTrue();
    }

    @Test
    void differentPlacesDoNotDisturbEachOther() {
        runner.run("list", work -> "list", answers::add);
        runner.run("record", work -> "record", answers::add);
        runAll();

        assertThat(answers).containsExactly("list", "record");
        assertThat(runner.quiet()).isTrue();
    }

    @Test
    void problemsComeToTheListener() {
        Problem problem = new Problem("test.problem", "What.", "where", "Mend.");
        runner.onTrouble(troubles::addAll);
        runner.run(
                "list",
                work -> {
                    throw new ProblemException(problem);
                },
                answer -> answers.add("none"));
        runAll();

        assertThat(troubles).containsExactly(problem);
        assertThat(answers).isEmpty();
    }

    @Test
    void theUnforeseenRisesAndThePlaceIsFreeAgain() {
        runner.run(
                "list",
                work -> {
                    throw new IllegalStateException("unforeseen");
                },
                answer -> answers.add("none"));

        assertThatThrownBy(this::runAll).isInstanceOf(IllegalStateException.class);
        assertThat(runner.quiet()).isTrue();
    }

    private static String keep(List<Work> works, Work work, String answer) {
        works.add(work);
        return answer;
    }

    private void runAll() {
        while (!waiting.isEmpty()) {
            waiting.removeFirst().run();
        }
    }
}
