package fringekeep.commandline;

import fringekeep.archive.problem.ProblemException;
import fringekeep.archive.problem.StoppedException;
import java.io.IOException;
import java.io.OutputStreamWriter;
import java.io.PrintStream;
import java.io.PrintWriter;
import java.nio.charset.StandardCharsets;
import java.nio.file.Files;
import java.nio.file.Path;
import picocli.CommandLine;
import picocli.CommandLine.Command;
import picocli.CommandLine.HelpCommand;

/** Start of the headless program. */
@Command(
        name = Main.NAME,
        description = "Keeps a matter-wave laboratory's measurement record and does the analysis inside it.",
        mixinStandardHelpOptions = true,
        version = "Fringekeep " + Main.VERSION,
        footer = {
            "",
            "Every command names its archive with --archive, or takes it from FRINGEKEEP_ARCHIVE.",
            "Records are named by number (scan 412), short form (XXXX XXXX) or 64 hexadecimal digits.",
            "Exit codes: 0 done, 1 could not, 2 wrong use, 3 stopped, 70 unexpected failure."
        },
        subcommands = {HelpCommand.class})
public final class Main {
    /** Name of the program. */
    public static final String NAME = "fringekeep-headless";

    /** Program version, written into every record. */
    public static final String VERSION = "1.0.0";

    private Main() {}

    /** Runs one command and ends the process with its exit code. */
    public static void main(String[] arguments) {
        int code = run(Console.ofProcess(), arguments);
        Runtime.getRuntime().exit(code);
    }

    /** Runs one command. */
    static int run(Console console, String... arguments) {
        CommandLine top = new CommandLine(new Main());
        Commands commands = new Commands(console);
        commands.listIn(top);
        if (arguments.length == 0) {
            top.usage(console.words());
            return Exit.WRONG_USE;
        }
        CommandLine line = commands.lineOf(arguments[0], top);
        line.setOut(new PrintWriter(new OutputStreamWriter(console.data(), StandardCharsets.UTF_8), true));
        line.setErr(new PrintWriter(new OutputStreamWriter(console.words(), StandardCharsets.UTF_8), true));
        line.setCaseInsensitiveEnumValuesAllowed(true);
        line.setUsageHelpWidth(100);
        line.setExecutionExceptionHandler((exception, command, result) -> failed(console, exception));
        return line.execute(arguments);
    }

    private static int failed(Console console, Exception exception) {
        if (exception instanceof ProblemException trouble) {
            console.problems(trouble.problems());
            return Exit.COULD_NOT;
        }
        if (exception instanceof StoppedException) {
            console.words().print("stopped; what was finished stays\n");
            return Exit.STOPPED;
        }
        console.words().print("Unexpected failure: " + exception + "\n");
        console.words().print("  where: " + log(exception) + "\n");
        console.words()
                .print("  mend: keep that file and tell whoever looks after the program; the archive is consistent.\n");
        return Exit.UNEXPECTED;
    }

    private static String log(Exception exception) {
        try {
            Path file = Files.createTempFile("fringekeep-", ".log");
            try (PrintStream out = new PrintStream(file.toFile(), StandardCharsets.UTF_8)) {
                Throwable cause = exception;
                while (cause != null) {
                    out.print(cause + "\n");
                    for (StackTraceElement element : cause.getStackTrace()) {
                        out.print("    at " + element + "\n");
                    }
                    cause = cause.getCause();
                }
            }
            return file.toString();
        } catch (IOException e) {
            return "no log could be written: " + e.getMessage();
        }
    }
}
