package fringekeep.audit;

import fringekeep.archive.graph.Cause;
import fringekeep.archive.graph.Graph;
import fringekeep.archive.json.Json;
import fringekeep.archive.json.JsonArray;
import fringekeep.archive.json.JsonObject;
import fringekeep.archive.lineage.Lineage;
import fringekeep.archive.lineage.LineageRecord;
import fringekeep.archive.record.Hash;
import fringekeep.archive.record.InputReference;
import java.util.ArrayList;
import java.util.List;
import java.util.Locale;

/** A lineage as one JSON document: records in the order of dependence with their inputs, states and causes; raw files. */
public final class TraceJson {
    private TraceJson() {}

    /** The document. */
    public static JsonObject of(Lineage lineage, Graph graph) {
        List<Json> records = new ArrayList<>();
        lineage.records().forEach(record -> records.add(record(record, graph)));
        List<Json> raw = new ArrayList<>();
        lineage.rawFiles()
                .forEach((hash, bytes) ->
                        raw.add(JsonObject.EMPTY.with("raw", hash.hex()).with("bytes", bytes)));
        return JsonObject.EMPTY
                .with("roots", hashes(lineage.roots()))
                .with("records", new JsonArray(records))
                .with("rawFiles", new JsonArray(raw))
                .with("absent", hashes(List.copyOf(lineage.absent())));
    }

    private static JsonArray hashes(List<Hash> hashes) {
        return JsonArray.ofTexts(hashes.stream().map(Hash::hex).toList());
    }

    private static JsonObject record(LineageRecord record, Graph graph) {
        List<Json> inputs = new ArrayList<>();
        for (InputReference input : record.view().head().inputs()) {
            JsonObject reference = JsonObject.EMPTY.with("role", input.role());
            if (input instanceof InputReference.OfRecord of) {
                reference = reference
                        .with("record", of.record().hex())
                        .with("channel", of.channel().map(Json::of));
            } else if (input instanceof InputReference.OfRaw file) {
                reference = reference.with("raw", file.raw().hex());
            }
            inputs.add(reference);
        }
        return JsonObject.EMPTY
                .with("record", record.fingerprint().hex())
                .with("label", record.label())
                .with("kind", record.view().head().kind().text())
                .with("title", record.title().text())
                .with("method", record.view().choices().text("method").map(Json::of))
                .with("inputs", new JsonArray(inputs))
                .with(
                        "states",
                        JsonArray.ofTexts(graph.states(record.fingerprint()).stream()
                                .sorted()
                                .map(state -> state.name().toLowerCase(Locale.ROOT))
                                .toList()))
                .with(
                        "causes",
                        new JsonArray(graph.causes(record.fingerprint()).stream()
                                .<Json>map(TraceJson::cause)
                                .toList()));
    }

    private static JsonObject cause(Cause cause) {
        return JsonObject.EMPTY
                .with("sort", cause.sort().name().toLowerCase(Locale.ROOT))
                .with("upstream", cause.upstream().hex())
                .with("by", cause.by().hex());
    }
}
