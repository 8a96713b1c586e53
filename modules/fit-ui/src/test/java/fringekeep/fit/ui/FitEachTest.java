package fringekeep.fit.ui;

import static org.assertj.core.api.Assertions.assertThat;

import fringekeep.archive.problem.Problem;
import fringekeep.archive.problem.ProblemException;
import fringekeep.archive.problem.StoppedException;
import fringekeep.archive.problem.Work;
import fringekeep.archive.record.Hash;
import fringekeep.desk.run.Job;
import java.nio.file.Path;
import java.util.ArrayList;
import java.util.List;
import java.util.concurrent.atomic.AtomicLong;
import java.util.function.Consumer;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.io.TempDir;

class FitEachTest {
    @TempDir
    private Path folder;

    private final AtomicLong clock = new AtomicLong();
    private final List<String> left = new ArrayList<>();

    /** Jobs that are stopped once so many fits are done; each takes two seconds of the clock. */
    private final class StoppingJobs implements Jobs {
        private final long after;
        private java.util.Optional<FitEach> told = java.util.Optional.empty();

        StoppingJobs(long after) {
            this.after = after;
        }

        @Override
        public <T> void run(String place, Job<T> job, Consumer<T> done, Consumer<List<Problem>> failed) {
            AtomicLong tried = new AtomicLong();
            try {
                done.accept(job.work(new Work() {
                    @Override
                    public void progress(long now, long total, String what) {
                        tried.set(now);
                        clock.addAndGet(2_000_000_000L);
                        left.add(told.flatMap(FitEach::left)
                                .map(Object::toString)
                                .orElse(""));
                    }

                    @Override
                    public boolean stopped() {
                        return tried.get() >= after;
                    }
                }));
            } catch (ProblemException e) {
                failed.accept(e.problems());
            } catch (StoppedException e) {
                throw new AssertionError(e);
            }
        }
    }

    private FitEach each(SmallLab lab, long after) {
        StoppingJobs jobs = new StoppingJobs(after);
        FitEach each = new FitEach(lab.archive, jobs, clock::get, () -> {});
        jobs.told = java.util.Optional.of(each);
        return each;
    }

    @Test
    void stopKeepsWhatIsDoneAndTheRestIsFoundAgain() throws ProblemException {
        try (SmallLab lab = new SmallLab(folder)) {
            for (int i = 0; i < 6; i++) {
                lab.scan(600 + 10 * i);
            }
            FitEach each = each(lab, 4);
            each.takeUnfitted(problems -> {
                throw new AssertionError(problems);
            });
            assertThat(each.scans()).hasSize(6);
            each.start(SmallLab.PERSON, problems -> {
                throw new AssertionError(problems);
            });

            assertThat(each.recorded()).isEqualTo(4);
            assertThat(each.untried()).isEqualTo(2);
            assertThat(lab.archive.records("fit", 1, 100)).hasSize(4);
            assertThat(left).containsExactly("10.0", "8.0", "6.0", "4.0");

            FitEach rest = each(lab, Long.MAX_VALUE);
            rest.takeUnfitted(problems -> {
                throw new AssertionError(problems);
            });
            assertThat(rest.scans()).hasSize(2);
            rest.start(SmallLab.PERSON, problems -> {
                throw new AssertionError(problems);
            });
            assertThat(lab.archive.records("fit", 1, 100)).hasSize(6);
        }
    }

    @Test
    void choicesAreMadeOnceForAll() throws ProblemException {
        try (SmallLab lab = new SmallLab(folder)) {
            List<Hash> scans = List.of(lab.scan(300), lab.scan(310));
            FitEach each = each(lab, Long.MAX_VALUE);
            each.take(scans);
            each.plan(each.plan().with("driftOrder", java.util.Optional.of(fringekeep.archive.json.Json.of(1))));
            each.start(SmallLab.PERSON, problems -> {
                throw new AssertionError(problems);
            });

            assertThat(lab.archive.records("fit", 1, 100))
                    .allSatisfy(fit -> assertThat(lab.archive
                                    .record(fit)
                                    .orElseThrow()
                                    .choices()
                                    .integer("driftOrder"))
                            .hasValue(1));
        }
    }
}
