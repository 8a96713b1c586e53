package fringekeep.commandline;

import fringekeep.archive.Archive;
import fringekeep.archive.json.Json;
import fringekeep.archive.json.JsonArray;
import fringekeep.archive.json.JsonObject;
import fringekeep.archive.record.Hash;
import java.util.List;
import java.util.Optional;

/** What a command says of the records it has just made: a line each, or a JSON array of label, record and journal entry. */
final class RecordedText {
    private RecordedText() {}

    /** Says it. */
    static void write(Console console, Archive archive, List<Hash> records, boolean json) {
        if (json) {
            console.json(new JsonArray(
                    records.stream().<Json>map(record -> json(archive, record)).toList()));
        } else {
            records.forEach(record -> console.line(archive.label(record) + "  " + title(archive, record) + record));
        }
    }

    private static JsonObject json(Archive archive, Hash record) {
        return JsonObject.EMPTY
                .with("label", archive.label(record))
                .with("record", record.hex())
                .with("n", archive.recorded(record).map(recorded -> Json.of((double) recorded.n())));
    }

    private static String title(Archive archive, Hash record) {
        Optional<String> words = archive.record(record)
                .flatMap(view -> archive.kinds()
                        .get(view.head().kind())
                        .map(kind -> kind.title(view, archive.inputs(record)).text()));
        return words.filter(text -> !text.isBlank()).map(text -> text + "  ").orElse("");
    }
}
