package fringekeep.commandline;

import fringekeep.archive.Archive;
import fringekeep.archive.ArchiveFacts;
import fringekeep.archive.problem.ProblemException;
import fringekeep.archive.problem.StoppedException;
import java.nio.file.Path;
import picocli.CommandLine.Command;
import picocli.CommandLine.Option;
import picocli.CommandLine.Parameters;

/** Making the archive of the invented laboratory. */
@Command(name = Main.NAME)
final class DemoCommand {
    private final Console console;

    DemoCommand(Console console) {
        this.console = console;
    }

    @Command(
            name = "demo",
            description =
                    "Makes the archive of the invented laboratory from the sample data; the same bytes on every machine.",
            mixinStandardHelpOptions = true)
    int demo(
            @Option(names = "--from", required = true, paramLabel = "FOLDER", description = "The sample data.")
                    Path from,
            @Option(names = "--quiet", description = "No progress.") boolean quiet,
            @Parameters(paramLabel = "FOLDER", description = "Where the archive goes.") Path folder)
            throws ProblemException, StoppedException {
        try (StoppableWork work = new StoppableWork(console, !quiet)) {
            LabReplay.Replayed replayed = LabReplay.replay(from, folder, Session.kinds(), Main.VERSION, work);
            try (Archive archive = replayed.archive()) {
                ArchiveFacts facts = archive.facts();
                replayed.refused().forEach(words -> console.line("refused, as the night's log tells: " + words));
                console.line(facts.title() + " (invented): " + facts.watermark() + " entries, journal head "
                        + archive.journalHead());
            }
        }
        return Exit.DONE;
    }
}
