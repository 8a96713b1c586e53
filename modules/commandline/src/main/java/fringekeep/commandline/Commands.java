package fringekeep.commandline;

import java.util.ArrayList;
import java.util.List;
import picocli.CommandLine;

/**
 * All commands of the program: annotated methods of group objects. The library calls such methods on the object directly
 * above them, so each group has a line of its own, and the first word says which line is meant. The top line holds the same
 * commands for its help only.
 */
final class Commands {
    private final List<CommandLine> groups = new ArrayList<>();

    /** Groups in the order of the chain. */
    Commands(Console console) {
        for (Object group : List.of(
                new ArchiveCommands(console),
                new RecordCommands(console),
                new StageCommands(console),
                new LineageCommands(console),
                new RecomputeCommands(console),
                new ReselectCommand(console),
                new BundleCommands(console),
                new ComputeCommand(console),
                new DemoCommand(console))) {
            CommandLine line = new CommandLine(group);
            line.getSubcommands().values().forEach(command -> HelpTexts.complete(command.getCommandSpec()));
            groups.add(line);
        }
    }

    /** The line that has a command of that name; the given one when none has. */
    CommandLine lineOf(String word, CommandLine otherwise) {
        return groups.stream()
                .filter(line -> line.getSubcommands().containsKey(word))
                .findFirst()
                .orElse(otherwise);
    }

    /** All lines. */
    List<CommandLine> lines() {
        return List.copyOf(groups);
    }

    /** Adds every command to the top line, for its help. */
    void listIn(CommandLine top) {
        for (CommandLine line : groups) {
            for (CommandLine command : new CommandLine(line.getCommandSpec().userObject())
                    .getSubcommands()
                    .values()) {
                HelpTexts.complete(command.getCommandSpec());
                top.addSubcommand(command.getCommandName(), command);
            }
        }
    }
}
