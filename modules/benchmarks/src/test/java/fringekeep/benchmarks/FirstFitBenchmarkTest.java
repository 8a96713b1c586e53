package fringekeep.benchmarks;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.within;

import fringekeep.interferometry.fringe.FringeFitter;
import java.io.File;
import java.io.IOException;
import java.io.UncheckedIOException;
import java.net.URISyntaxException;
import java.nio.charset.StandardCharsets;
import java.nio.file.Path;
import org.junit.jupiter.api.Test;

/** The first fit in a cold process, ours and a script's; time on the clock. */
class FirstFitBenchmarkTest {
    private static final int PROCESSES = 7;
    private static final String SCRIPT = """
            import numpy as np
            from scipy.optimize import curve_fit
            x = 16.0 * np.arange(40)
            y = np.rint(300 * (1 + 0.4 * np.cos(2 * np.pi * x / 266)))
            model = lambda x, n, v, p: n * (1 + v * np.cos(2 * np.pi * x / 266 + p))
            print(curve_fit(model, x, y, p0=[300, 0.3, 0.1])[0][1])
            """;

    private record Run(double seconds, String answer) {}

    private static Run run(String... command) {
        long begin = System.nanoTime();
        try {
            Process process = new ProcessBuilder(command)
                    .redirectError(ProcessBuilder.Redirect.DISCARD)
                    .start();
            String answer = new String(process.getInputStream().readAllBytes(), StandardCharsets.UTF_8).strip();
            process.waitFor();
            return new Run((System.nanoTime() - begin) * 1e-9, answer);
        } catch (InterruptedException e) {
            Thread.currentThread().interrupt();
            throw new IllegalStateException(e);
        } catch (IOException e) {
            throw new UncheckedIOException(e);
        }
    }

    /** The folder or jar of a class: a program that fits needs the library and nothing else. */
    private static Path place(Class<?> type) {
        try {
            return Path.of(
                    type.getProtectionDomain().getCodeSource().getLocation().toURI());
        } catch (URISyntaxException e) {
            throw new IllegalStateException(e);
        }
    }

    @Test
    void firstFitInAColdProcess() {
        String java = Path.of(System.getProperty("java.home"), "bin", "java").toString();
        String path = place(FirstFit.class) + File.pathSeparator + place(FringeFitter.class);
        double[] inside = new double[PROCESSES];
        double[] whole = new double[PROCESSES];
        double[] script = new double[PROCESSES];
        boolean missing = false;
        for (int k = 0; k < PROCESSES; k++) {
            Run ours = run(java, "-cp", path, "fringekeep.benchmarks.FirstFit");
            Run theirs = run("python3", "-c", SCRIPT);
            String[] answer = ours.answer.split(" ");
            inside[k] = Double.parseDouble(answer[0]);
            whole[k] = 1e3 * ours.seconds;
            missing |= theirs.answer.isEmpty();
            script[k] = 1e3 * theirs.seconds;
            if (!theirs.answer.isEmpty()) {
                assertThat(Double.parseDouble(answer[1])).isCloseTo(Double.parseDouble(theirs.answer), within(1e-3));
            }
        }
        Bench.print(
                "first fit in a cold JVM %.1f ms; whole process %.0f ms; %s",
                Bench.median(inside),
                Bench.median(whole),
                missing ? "SciPy is MISSING" : "script with SciPy " + Math.round(Bench.median(script)) + " ms");
    }
}
