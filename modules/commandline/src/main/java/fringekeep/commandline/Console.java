package fringekeep.commandline;

import fringekeep.archive.json.Json;
import fringekeep.archive.json.JsonArray;
import fringekeep.archive.json.JsonObject;
import fringekeep.archive.json.PrettyJson;
import fringekeep.archive.problem.Problem;
import java.io.PrintStream;
import java.nio.charset.StandardCharsets;
import java.util.List;

/** Where words and data go: data to one stream, everything else to the other, both in UTF-8. */
final class Console {
    private final PrintStream data;
    private final PrintStream words;

    Console(PrintStream data, PrintStream words) {
        this.data = data;
        this.words = words;
    }

    /** The process's own streams. */
    static Console ofProcess() {
        return new Console(
                new PrintStream(System.out, true, StandardCharsets.UTF_8),
                new PrintStream(System.err, true, StandardCharsets.UTF_8));
    }

    PrintStream data() {
        return data;
    }

    PrintStream words() {
        return words;
    }

    /** A line of data. */
    void line(String text) {
        data.print(text);
        data.print('\n');
    }

    /** Text that ends its own lines. */
    void text(String text) {
        data.print(text);
    }

    /** A document. */
    void json(Json value) {
        byte[] bytes = PrettyJson.write(value);
        data.write(bytes, 0, bytes.length);
        data.flush();
    }

    /** A table with columns padded to their widest cell. */
    void table(List<String> heads, List<List<String>> rows) {
        int[] widths = heads.stream().mapToInt(String::length).toArray();
        for (List<String> row : rows) {
            for (int i = 0; i < widths.length; i++) {
                widths[i] = Math.max(widths[i], row.get(i).length());
            }
        }
        line(padded(heads, widths));
        rows.forEach(row -> line(padded(row, widths)));
    }

    private static String padded(List<String> cells, int[] widths) {
        StringBuilder text = new StringBuilder();
        for (int i = 0; i < cells.size(); i++) {
            String cell = cells.get(i);
            text.append(i == 0 ? "" : "  ").append(cell);
            if (i < cells.size() - 1) {
                text.append(" ".repeat(widths[i] - cell.length()));
            }
        }
        return text.toString().stripTrailing();
    }

    /** Problems in three parts each. */
    void problems(List<Problem> problems) {
        for (Problem problem : problems) {
            words.print(problem.what() + "\n");
            if (!problem.where().isEmpty()) {
                words.print("  where: " + problem.where() + "\n");
            }
            words.print("  mend: " + problem.mend() + "\n");
        }
    }

    /** Problems as JSON. */
    static JsonArray problemsJson(List<Problem> problems) {
        return new JsonArray(problems.stream()
                .<Json>map(problem -> JsonObject.EMPTY
                        .with("code", problem.code())
                        .with("what", problem.what())
                        .with("where", problem.where())
                        .with("mend", problem.mend()))
                .toList());
    }
}
