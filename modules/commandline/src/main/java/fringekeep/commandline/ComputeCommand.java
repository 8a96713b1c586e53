package fringekeep.commandline;

import fringekeep.archive.json.Json;
import fringekeep.archive.json.JsonArray;
import fringekeep.archive.json.JsonDocument;
import fringekeep.archive.json.JsonNumber;
import fringekeep.archive.json.JsonObject;
import fringekeep.archive.json.JsonText;
import fringekeep.archive.json.PrettyJson;
import fringekeep.archive.problem.ProblemException;
import fringekeep.commandline.compute.Field;
import fringekeep.commandline.compute.Method;
import fringekeep.commandline.compute.Methods;
import fringekeep.commandline.compute.Results;
import java.nio.charset.StandardCharsets;
import java.nio.file.Path;
import java.util.ArrayList;
import java.util.List;
import java.util.Locale;
import java.util.stream.Collectors;
import org.jspecify.annotations.Nullable;
import picocli.CommandLine.Command;
import picocli.CommandLine.Option;
import picocli.CommandLine.Parameters;

/** Every method of the interferometry library, without an archive. */
@Command(name = Main.NAME)
final class ComputeCommand {
    private static final int WIDEST_FIGURES = 24;

    private final Console console;

    ComputeCommand(Console console) {
        this.console = console;
    }

    @Command(
            name = "compute",
            description = "Computes with one method of the interferometry library. Needs no archive, stores nothing.",
            mixinStandardHelpOptions = true,
            footer = {
                "",
                "Inputs are a JSON object: {\"mass\": \"720.642 u\", \"velocity\": {\"value\": 200, \"u\": 0.5, \"unit\": \"m/s\"}}.",
                "Units are UCUM codes; u is one standard uncertainty. Constants are CODATA 2018.",
                "Stated uncertainties are carried to every result to first order, inputs taken as independent",
                "(JCGM 100, 5.1.3 note 2); what each input contributes stands below the results."
            })
    int compute(
            @Option(names = "--json", description = "Write JSON.") boolean json,
            @Option(names = "--list", description = "Names all methods.") boolean list,
            @Option(names = "--form", description = "Shows the inputs of the method and a worked example.")
                    boolean form,
            @Parameters(index = "0", arity = "0..1", paramLabel = "METHOD", description = "The method.") @Nullable
                    String name,
            @Parameters(
                            index = "1",
                            arity = "0..1",
                            defaultValue = "-",
                            paramLabel = "FILE",
                            description = "The inputs; - or nothing is the input stream.")
                    Path file)
            throws ProblemException {
        if (list) {
            list(json);
            return Exit.DONE;
        }
        if (name == null) {
            console.words().print("Name a method; \"compute --list\" names all.\n");
            return Exit.WRONG_USE;
        }
        Method method = Methods.named(name);
        if (form) {
            form(method, json);
        } else {
            report(method, method.compute(Documents.read(file)), json);
        }
        return Exit.DONE;
    }

    private void list(boolean json) {
        if (json) {
            console.json(new JsonArray(Methods.groups().stream()
                    .flatMap(group -> group.methods().stream()
                            .<Json>map(method -> JsonObject.EMPTY
                                    .with("method", method.name())
                                    .with("group", group.words())
                                    .with("description", method.words())))
                    .toList()));
            return;
        }
        for (Methods.Group group : Methods.groups()) {
            console.line(group.words().toUpperCase(Locale.ROOT));
            for (Method method : group.methods()) {
                console.line("  " + method.name() + "  " + method.words());
            }
        }
    }

    private void form(Method method, boolean json) throws ProblemException {
        if (json) {
            console.json(method.example());
            return;
        }
        console.line(method.name() + ": " + method.words());
        console.line("");
        List<List<String>> rows = new ArrayList<>();
        rows(method.fields(), "", rows);
        console.table(List.of("input", "SI unit", "needed", "meaning"), rows);
        byte[] example = PrettyJson.write(method.example());
        console.line("");
        console.line("Worked example (invented numbers), inputs:");
        console.text(new String(example, StandardCharsets.UTF_8));
        console.line("");
        console.line("Results:");
        report(method, method.compute(JsonDocument.read(example)), false);
    }

    private static void rows(List<Field> fields, String before, List<List<String>> rows) {
        for (Field field : fields) {
            String words = field.among().isEmpty()
                    ? field.words()
                    : field.words() + " (" + String.join(", ", field.among()) + ")";
            rows.add(List.of(
                    before + field.name() + (field.sort() == Field.Sort.LIST ? "[]" : ""),
                    field.unit(),
                    field.required() ? "yes" : "",
                    words));
            rows(field.parts(), before + field.name() + ".", rows);
        }
    }

    private void report(Method method, Results results, boolean json) {
        if (json) {
            console.json(JsonObject.EMPTY
                    .with("method", method.name())
                    .with("constants", "CODATA 2018")
                    .with("results", results.json())
                    .with("budget", results.budget()));
            return;
        }
        List<List<String>> rows = new ArrayList<>();
        for (Results.Result result : results.all()) {
            String uncertainty = result.uncertainty().map(ComputeCommand::shown).orElse("");
            rows.add(List.of(result.name(), shown(result.value()), uncertainty, result.unit()));
        }
        console.table(List.of("result", "value", "standard uncertainty", "unit"), rows);
        budget(results);
    }

    private void budget(Results results) {
        List<List<String>> rows = new ArrayList<>();
        for (Json line : results.budget().items()) {
            if (line instanceof JsonObject object) {
                rows.add(List.of(
                        object.text("result").orElse(""),
                        object.text("input").orElse(""),
                        object.get("u").map(ComputeCommand::shown).orElse(""),
                        object.text("unit").orElse("")));
            }
        }
        if (!rows.isEmpty()) {
            console.line("");
            console.table(List.of("result", "input", "contributes", "unit"), rows);
        }
    }

    private static String shown(Json value) {
        if (value instanceof JsonNumber || value instanceof JsonText) {
            return plain(value);
        }
        if (value instanceof JsonArray array) {
            String inside = array.items().stream()
                    .limit(WIDEST_FIGURES)
                    .map(ComputeCommand::plain)
                    .collect(Collectors.joining(" "));
            int more = array.items().size() - WIDEST_FIGURES;
            return more > 0 ? inside + " … and " + more + " more (--json shows all)" : inside;
        }
        return plain(value);
    }

    private static String plain(Json value) {
        return value instanceof JsonText text
                ? text.value()
                : new String(PrettyJson.write(value), StandardCharsets.UTF_8).strip();
    }
}
