package fringekeep.commandline;

import java.util.ArrayList;
import java.util.List;
import java.util.Map;
import picocli.CommandLine.Model.CommandSpec;

/** What every command's help ends with: examples, how records are named, exit codes. */
final class HelpTexts {
    private static final String EXIT =
            "Exit codes: 0 done, 1 could not (nothing is half written), 2 wrong use, 3 stopped, 70 unexpected failure.";

    private static final Map<String, List<String>> EXAMPLES = Map.ofEntries(
            example("found", "found --title \"our bench\" --zone Europe/Lisbon --person \"A. Name\" lab"),
            example("facts", "facts --archive lab --json"),
            example("person", "person --archive lab --add \"B. Name\""),
            example("check", "check --archive lab"),
            example("copy", "copy --archive lab /media/safe/lab-copy"),
            example("restore", "restore /media/safe/lab-copy lab-again"),
            example("receive", "receive --archive lab dataset.zip-unpacked"),
            example("rebuild", "rebuild --archive lab"),
            example("purge", "purge --what raw --reason \"wrong file\" --text \"holds names of people\" SHA-256"),
            example("record", "record --person \"A. Name\" setup.json", "record --json - < compound.json"),
            example("show", "show \"scan 412\"", "show --json \"UPBC NOU3\""),
            example("list", "list fit --where purpose=signal --limit 20", "list --json --word drift scan"),
            example("schema", "schema setup"),
            example(
                    "judge",
                    "judge --verdict masked --reason mode-hop --channel counts --points 14-27 --person \"A. Name\""
                            + " \"scan 412\""),
            example("take-in", "take-in --profile \"reading-profile 1\" night/*.txt"),
            example(
                    "place",
                    "place --setup \"setup 1\" --run \"source-run 3\" --purpose signal --person \"A. Name\" \"scan 12\""
                            + " \"scan 13\""),
            example("fit", "fit --reference \"scan 11\" \"scan 12\"", "fit --unfitted --json"),
            example(
                    "select",
                    "select --rule \"strong signals of series 2\" --is purpose=signal --from laser_power_w=0.5 --person"
                            + " \"A. Name\""),
            example("reselect", "reselect \"figure 1\""),
            example("property", "property --choices choices.json \"selection 1\""),
            example("draw", "draw --into pictures --form svg,csv \"figure 1\""),
            example("trace", "trace \"figure 1\"", "trace --form prov \"property 2\" > lineage.json"),
            example("outdated", "outdated --sizes \"figure 1\""),
            example("suppose", "suppose --without \"scan 412\" \"figure 1\""),
            example("revise", "revise --person \"A. Name\" \"figure 1\""),
            example(
                    "recompute",
                    "recompute \"figure 1\"",
                    "recompute --through --values \"property 2\"",
                    "recompute --through --json \"figure 1\" > verdicts.json"),
            example("bundle", "bundle --settings about.json --into dataset \"figure 1\""),
            example("check-bundle", "check-bundle dataset"),
            example("demo", "demo --from sample-data demo-lab"));

    private HelpTexts() {}

    private static Map.Entry<String, List<String>> example(String command, String... lines) {
        return Map.entry(command, List.of(lines));
    }

    /** Adds the end to a command's help. */
    static void complete(CommandSpec command) {
        List<String> footer = new ArrayList<>(List.of(command.usageMessage().footer()));
        List<String> examples = EXAMPLES.getOrDefault(command.name(), List.of());
        if (!examples.isEmpty()) {
            footer.add("");
            footer.add(examples.size() == 1 ? "Example:" : "Examples:");
            examples.forEach(line -> footer.add("  " + Main.NAME + " " + line.replace("%", "%%")));
        }
        footer.add("");
        footer.add(EXIT);
        command.usageMessage().footer(footer.toArray(String[]::new));
    }
}
