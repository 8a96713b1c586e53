package fringekeep.testsupport;

import java.io.File;
import java.io.IOException;
import java.net.URI;
import java.net.URLClassLoader;
import java.nio.charset.StandardCharsets;
import java.nio.file.Path;
import java.util.ArrayList;
import java.util.Arrays;
import java.util.List;
import java.util.Random;
import java.util.Timer;
import java.util.TimerTask;
import java.util.stream.Collectors;

/** Programs of their own with the class path of the tests, and how they end themselves at a random moment. */
public final class OtherProgram {
    private OtherProgram() {}

    /** How many kills a test makes: 4 in the ordinary build, 50 in the profile "thorough". */
    public static int kills() {
        return Integer.getInteger("fringekeep.kills", 4);
    }

    /** Whether the profile "thorough" asks for the full numbers. */
    public static boolean thorough() {
        return Boolean.getBoolean("fringekeep.thorough");
    }

    /** Starts the main method of a class of the tests; what it writes, errors too, is its output. */
    public static Process start(Class<?> program, String... arguments) throws IOException {
        List<String> command = new ArrayList<>(List.of(
                Path.of(System.getProperty("java.home"), "bin", "java").toString(),
                "-XX:TieredStopAtLevel=1",
                "-XX:+UseSerialGC",
                "-Xshare:auto",
                "-Xmx256m",
                "-Djava.awt.headless=true",
                "-cp",
                classPath(program),
                program.getName()));
        command.addAll(List.of(arguments));
        return new ProcessBuilder(command).redirectErrorStream(true).start();
    }

    /** The class path of the tests, however they were started. */
    private static String classPath(Class<?> program) {
        if (program.getClassLoader() instanceof URLClassLoader loader) {
            return Arrays.stream(loader.getURLs())
                    .map(url -> Path.of(URI.create(url.toString())).toString())
                    .collect(Collectors.joining(File.pathSeparator));
        }
        return System.getProperty("java.class.path");
    }

    /** All lines a program writes until it ends. The last may have been cut off by its end. */
    public static List<String> lines(Process process) throws IOException {
        return new String(process.getInputStream().readAllBytes(), StandardCharsets.UTF_8)
                .lines()
                .toList();
    }

    /**
     * Runs a program that halts itself with exit value 0.
     *
     * @return lines it wrote before
     * @throws IllegalStateException if it ended in another way, with what it wrote
     */
    public static List<String> runUntilHalted(Class<?> program, String... arguments)
            throws IOException, InterruptedException {
        Process process = start(program, arguments);
        List<String> lines = lines(process);
        if (process.waitFor() != 0) {
            throw new IllegalStateException("the program failed before it halted: " + String.join("\n", lines));
        }
        return lines;
    }

    /**
     * Halts this program at a random moment within a time, without any clean-up, as when it is killed.
     *
     * @param milliseconds longest time from now, above 0
     */
    public static void haltWithin(Random random, int milliseconds) {
        TimerTask halt = new TimerTask() {
            @Override
            public void run() {
                Runtime.getRuntime().halt(0);
            }
        };
        new Timer(true).schedule(halt, random.nextInt(milliseconds));
    }
}
