package fringekeep.benchmarks;

import java.io.BufferedReader;
import java.io.IOException;
import java.io.InputStream;
import java.io.PrintStream;
import java.io.UncheckedIOException;
import java.nio.charset.StandardCharsets;
import java.nio.file.Files;
import java.nio.file.Path;
import java.nio.file.StandardCopyOption;
import java.util.Arrays;
import java.util.Optional;

/** The Debian package python3-scipy as a process that stays alive, so that both sides alternate within one run. */
final class OtherSide implements AutoCloseable {
    private final Process process;
    private final BufferedReader answers;
    private final PrintStream questions;
    private final String version;

    private OtherSide(Process process, BufferedReader answers, String version) {
        this.process = process;
        this.answers = answers;
        this.questions = new PrintStream(process.getOutputStream(), true, StandardCharsets.UTF_8);
        this.version = version;
    }

    /** CPU seconds and results. */
    record Answer(double seconds, double[] results) {}

    /** Starts it; empty if Python or SciPy is missing. */
    static Optional<OtherSide> start(Path folder) throws IOException {
        Path script = folder.resolve("scipy_side.py");
        try (InputStream in = OtherSide.class.getResourceAsStream("scipy_side.py")) {
            if (in == null) {
                throw new IllegalStateException("scipy_side.py is not among the resources");
            }
            Files.copy(in, script, StandardCopyOption.REPLACE_EXISTING);
        }
        ProcessBuilder builder = new ProcessBuilder("python3", script.toString());
        builder.environment().put("OMP_NUM_THREADS", "1");
        builder.environment().put("OPENBLAS_NUM_THREADS", "1");
        builder.redirectError(folder.resolve("scipy_side.err").toFile());
        try {
            Process process = builder.start();
            BufferedReader answers = process.inputReader(StandardCharsets.UTF_8);
            String version = answers.readLine();
            return version == null ? Optional.empty() : Optional.of(new OtherSide(process, answers, version));
        } catch (IOException e) {
            System.out.println("python3 cannot be started: " + e.getMessage());
            return Optional.empty();
        }
    }

    String version() {
        return version;
    }

    Answer ask(String what, Path data, int number) {
        questions.println(what + " " + data + " " + number);
        try {
            String line = answers.readLine();
            if (line == null) {
                throw new IllegalStateException("the other side ended at " + what + "; see scipy_side.err");
            }
            double[] numbers = Arrays.stream(line.split(" "))
                    .mapToDouble(Double::parseDouble)
                    .toArray();
            return new Answer(numbers[0], Arrays.copyOfRange(numbers, 1, numbers.length));
        } catch (IOException e) {
            throw new UncheckedIOException(e);
        }
    }

    @Override
    public void close() {
        questions.close();
        process.destroy();
    }
}
