package fringekeep.archive.entry;

import fringekeep.archive.internal.records.SchemaWalk;
import fringekeep.archive.internal.records.SchemaWalk.Place;
import fringekeep.archive.json.Json;
import fringekeep.archive.json.JsonArray;
import fringekeep.archive.json.JsonObject;
import fringekeep.archive.json.JsonPointer;
import fringekeep.archive.kind.RecordKind;
import fringekeep.archive.kind.RecordView;
import fringekeep.archive.problem.ProblemException;
import fringekeep.archive.quantity.Quantity;
import fringekeep.archive.quantity.QuantityJson;
import fringekeep.archive.quantity.QuantityText;
import fringekeep.archive.record.AboutReference;
import fringekeep.archive.record.Hash;
import fringekeep.archive.record.InputReference;
import fringekeep.archive.record.PartName;
import java.util.List;
import java.util.Locale;
import java.util.function.Function;

/** Writes entry documents from records, so that a correction starts from what stands. */
public final class EntryWriting {
    private final Function<Hash, String> reference;

    /**
     * A writer.
     *
     * @param reference what a record is called, such as {@code scan 412}; its digits always do
     */
    public EntryWriting(Function<Hash, String> reference) {
        this.reference = reference;
    }

    /** The document that would record the same once more, as a new thing. */
    public JsonObject again(RecordView record, RecordKind kind) {
        JsonObject document = JsonObject.EMPTY.with("kind", record.head().kind().text());
        for (PartName name : List.of(PartName.CONTENT, PartName.CHOICES, PartName.IDENTITY)) {
            document = document.with(name.text(), record.part(name));
        }
        document = document.with("remark", record.part(PartName.REMARK).flatMap(remark -> remark.get("text")));
        document = (JsonObject) quantitiesAsText(document, kind);
        return withReferences(document, record);
    }

    /** The document that corrects a record, beginning with what it says now. */
    public JsonObject correction(RecordView record, RecordKind kind) {
        JsonObject document = again(record, kind).with("corrects", reference.apply(record.fingerprint()));
        return document.with(
                "after",
                record.head()
                        .after()
                        .map(after -> JsonObject.EMPTY
                                .with("record", reference.apply(after.record()))
                                .with("from", after.from().toString())));
    }

    private static Json quantitiesAsText(JsonObject document, RecordKind kind) {
        Json body = document;
        for (Place place : SchemaWalk.quantities(kind.jsonSchema(kind.schema()), document)) {
            if (JsonPointer.resolve(body, place.pointer()).orElseThrow() instanceof JsonObject json) {
                Quantity quantity = QuantityJson.read(json);
                String text = QuantityText.write(quantity);
                if (readsBack(text, quantity)) {
                    body = JsonPointer.replace(body, place.pointer(), Json.of(text));
                }
            }
        }
        return body;
    }

    private static boolean readsBack(String text, Quantity quantity) {
        try {
            return QuantityText.parse(text).equals(quantity);
        } catch (ProblemException e) {
            return false;
        }
    }

    private JsonObject withReferences(JsonObject document, RecordView record) {
        JsonObject whole = document;
        if (!record.head().about().isEmpty()) {
            whole = whole.with(
                    "about",
                    new JsonArray(
                            record.head().about().stream().map(this::about).toList()));
        }
        if (!record.head().inputs().isEmpty()) {
            whole = whole.with(
                    "inputs",
                    new JsonArray(
                            record.head().inputs().stream().map(this::input).toList()));
        }
        return whole;
    }

    private Json about(AboutReference about) {
        return JsonObject.EMPTY
                .with("role", about.role())
                .with("record", reference.apply(about.record()))
                .with("reach", about.reach().name().toLowerCase(Locale.ROOT));
    }

    private Json input(InputReference input) {
        if (input instanceof InputReference.OfRecord record) {
            return JsonObject.EMPTY
                    .with("role", record.role())
                    .with("record", reference.apply(record.record()))
                    .with("channel", record.channel().map(Json::of));
        }
        if (input instanceof InputReference.OfRaw raw) {
            return JsonObject.EMPTY
                    .with("role", raw.role())
                    .with("raw", raw.raw().hex())
                    .with("bytes", raw.bytes());
        }
        throw new AssertionError(input);
    }
}
