package fringekeep.property.ui;

import fringekeep.archive.problem.Problem;
import fringekeep.desk.run.Job;
import java.util.List;
import java.util.function.Consumer;

/** Where work goes that may take longer than the window thread has. */
interface Jobs {
    /** Runs a job for a place; a newer one for it supersedes. Answers come back on the window thread. */
    <T> void run(String place, Job<T> job, Consumer<T> done, Consumer<List<Problem>> failed);
}
