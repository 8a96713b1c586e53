package fringekeep.archive.internal.store;

import java.io.File;
import java.io.IOException;
import java.net.URI;
import java.net.URLClassLoader;
import java.nio.charset.StandardCharsets;
import java.nio.file.Path;
import java.util.ArrayList;
import java.util.Arrays;
import java.util.List;
import java.util.stream.Collectors;

/** Runs {@link KilledProgram} until it has halted. */
final class Killing {
    private Killing() {}

    /** How many kills a test makes; the whole number is asked for by the build's profile "thorough". */
    static int times() {
        return Integer.getInteger("fringekeep.kills", 4);
    }

    /** Lines the program wrote before it halted. */
    static List<String> run(String what, Path folder, long round) throws IOException, InterruptedException {
        Process process = start(KilledProgram.class, what, folder.toString(), Long.toString(round));
        List<String> lines = lines(process);
        if (process.waitFor() != 0) {
            throw new IllegalStateException("the program failed before it halted: " + String.join("\n", lines));
        }
        // A line cut off by the halt was not acknowledged whole.
        return lines;
    }

    static Process start(Class<?> program, String... arguments) throws IOException {
        List<String> command = new ArrayList<>(List.of(
                Path.of(System.getProperty("java.home"), "bin", "java").toString(),
                "-XX:TieredStopAtLevel=1",
                "-XX:+UseSerialGC",
                "-Xshare:auto",
                "-Xmx256m",
                "-cp",
                classPath(),
                program.getName()));
        command.addAll(List.of(arguments));
        return new ProcessBuilder(command).redirectErrorStream(true).start();
    }

    /** The class path of the tests, however they were started. */
    private static String classPath() {
        if (Killing.class.getClassLoader() instanceof URLClassLoader loader) {
            return Arrays.stream(loader.getURLs())
                    .map(url -> Path.of(URI.create(url.toString())).toString())
                    .collect(Collectors.joining(File.pathSeparator));
        }
        return System.getProperty("java.class.path");
    }

    static List<String> lines(Process process) throws IOException {
        return new String(process.getInputStream().readAllBytes(), StandardCharsets.UTF_8)
                .lines()
                .toList();
    }
}
