package fringekeep.fit.internal;

import static org.assertj.core.api.Assertions.assertThat;

import fringekeep.archive.json.CanonicalJson;
import fringekeep.archive.json.JsonObject;
import fringekeep.archive.problem.ProblemException;
import fringekeep.interferometry.fringe.DeadTime;
import java.util.ArrayList;
import java.util.Arrays;
import java.util.List;
import java.util.Optional;
import java.util.SplittableRandom;
import org.junit.jupiter.api.Test;

/** Scans with few counts, few rows and masks, fitted in every way: a result of finite numbers or a reason, never a crash. */
class PoorScansTest {
    private static final List<String> METHODS =
            List.of("fringe.poisson-likelihood/1", "fringe.weighted/1", "fringe.unweighted/1");
    private static final List<String> COMBINED = List.of("single", "sum", "sum-after-phase", "joint");
    private static final int CASES = 200;

    private static ScanArrays scan(int input, int rows, SplittableRandom random) {
        double[] positions = new double[rows];
        double[] counts = new double[rows];
        double[] times = new double[rows];
        boolean[] masked = new boolean[rows];
        int most = 1 + random.nextInt(8);
        for (int row = 0; row < rows; row++) {
            positions[row] = 33e-9 * row;
            counts[row] = Math.max(0, random.nextInt(-2, most));
            times[row] = row;
            masked[row] = random.nextInt(10) == 0;
        }
        double[] exposures = new double[rows];
        Arrays.fill(exposures, 2.5);
        double[] dark = {random.nextInt(4), random.nextInt(4)};
        return new ScanArrays(
                input,
                positions,
                counts,
                exposures,
                times,
                masked,
                dark,
                new double[] {2.5, 2.5},
                false,
                Optional.empty());
    }

    private static FitChoices choices(SplittableRandom random) {
        String method = METHODS.get(random.nextInt(METHODS.size()));
        boolean likelihood = method.startsWith("fringe.poisson");
        String combine = COMBINED.get(random.nextInt(likelihood ? 4 : 3));
        boolean free = random.nextInt(5) == 0 && (combine.equals("single") || combine.equals("sum"));
        JsonObject background = JsonObject.EMPTY.with("sort", random.nextBoolean() ? "none" : "channel");
        return new FitChoices(JsonObject.EMPTY
                .with("method", method)
                .with("combine", combine)
                .with(
                        "period",
                        JsonObject.EMPTY.with("sort", free ? "free" : "fixed").with("si", 2.66e-7))
                .with("background", background)
                .with("covariance", random.nextBoolean() ? "expected" : "observed")
                .with("driftOrder", random.nextInt(3)));
    }

    @Test
    void everyPoorScanGivesFiniteNumbersOrAReason() {
        SplittableRandom random = new SplittableRandom(20310514L);
        int fitted = 0;
        int refused = 0;
        for (int i = 0; i < CASES; i++) {
            FitChoices choices = choices(random);
            int rows = 3 + random.nextInt(14);
            int number = choices.combine() == FitChoices.Combine.SINGLE ? 1 : 1 + random.nextInt(4);
            List<ScanArrays> scans = new ArrayList<>();
            for (int k = 0; k < number; k++) {
                scans.add(scan(2 * k, rows, random));
            }
            try {
                FitAnswer answer = new FringeAnalysis(choices, scans, List.of())
                        .answer(new FitParameters(2.66e-7, DeadTime.NONE, List.of()));
                JsonObject result = new FitResult(choices, scans, answer).json(List.of(), Optional.empty());
                assertThat(CanonicalJson.write(result)).isNotEmpty();
                assertThat(ResidualTable.payload("residuals", answer).bytes()).isNotEmpty();
                fitted++;
            } catch (ProblemException e) {
                assertThat(e.problems().get(0).what()).isNotBlank();
                refused++;
            }
        }
        assertThat(fitted).isGreaterThan(CASES / 3);
        assertThat(refused).isGreaterThan(CASES / 100);
    }
}
