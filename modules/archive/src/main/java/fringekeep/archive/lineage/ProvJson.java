package fringekeep.archive.lineage;

import fringekeep.archive.json.Json;
import fringekeep.archive.json.JsonArray;
import fringekeep.archive.json.JsonObject;
import fringekeep.archive.record.AboutReference;
import fringekeep.archive.record.Hash;
import fringekeep.archive.record.Head;
import fringekeep.archive.record.InputReference;
import fringekeep.archive.record.PartName;
import java.util.Map;
import java.util.SortedMap;
import java.util.TreeMap;

/**
 * A lineage as PROV-JSON.
 *
 * <p>Source: W3C Member Submission, The PROV-JSON Serialization, 24 April 2013; PROV-DM, W3C Recommendation, 30 April 2013.
 * Records and raw files are entities, the making of a record is an activity, the program is an agent. Names follow RFC 6920 in
 * spirit but stay XML names: {@code record:} and {@code raw:} with the hash.
 */
public final class ProvJson {
    private static final String RECORD = "record:r";
    private static final String RAW = "raw:f";
    private static final String MAKING = "making:m";

    private final SortedMap<String, Json> entities = new TreeMap<>();
    private final SortedMap<String, Json> activities = new TreeMap<>();
    private final SortedMap<String, Json> agents = new TreeMap<>();
    private final SortedMap<String, Json> used = new TreeMap<>();
    private final SortedMap<String, Json> generated = new TreeMap<>();
    private final SortedMap<String, Json> derived = new TreeMap<>();
    private final SortedMap<String, Json> associated = new TreeMap<>();
    private final SortedMap<String, Json> influenced = new TreeMap<>();

    private ProvJson() {}

    /** The document. */
    public static JsonObject of(Lineage lineage) {
        ProvJson document = new ProvJson();
        lineage.rawFiles().forEach(document::rawFile);
        lineage.records().forEach(document::record);
        return document.assemble();
    }

    /** Name of a record's entity. */
    public static String entity(Hash record) {
        return RECORD + record.hex();
    }

    /** Name of a raw file's entity. */
    public static String rawEntity(Hash raw) {
        return RAW + raw.hex();
    }

    private JsonObject assemble() {
        JsonObject prefixes = JsonObject.EMPTY
                .with("prov", "http://www.w3.org/ns/prov#")
                .with("xsd", "http://www.w3.org/2001/XMLSchema#")
                .with("record", "urn:fringekeep:record:")
                .with("raw", "urn:fringekeep:raw:")
                .with("making", "urn:fringekeep:making:")
                .with("program", "urn:fringekeep:program:")
                .with("fact", "urn:fringekeep:fact:");
        SortedMap<String, Json> document = new TreeMap<>();
        document.put("prefix", prefixes);
        put(document, "entity", entities);
        put(document, "activity", activities);
        put(document, "agent", agents);
        put(document, "used", used);
        put(document, "wasGeneratedBy", generated);
        put(document, "wasDerivedFrom", derived);
        put(document, "wasAssociatedWith", associated);
        put(document, "wasInfluencedBy", influenced);
        return new JsonObject(document);
    }

    private static void put(SortedMap<String, Json> document, String name, SortedMap<String, Json> members) {
        if (!members.isEmpty()) {
            document.put(name, new JsonObject(members));
        }
    }

    private void rawFile(Hash raw, long bytes) {
        entities.put(
                rawEntity(raw),
                JsonObject.EMPTY
                        .with("prov:type", typed("fact:raw-file", "prov:QUALIFIED_NAME"))
                        .with("fact:sha256", raw.hex())
                        .with("fact:bytes", typed(Long.toString(bytes), "xsd:long")));
    }

    private static JsonObject typed(String value, String type) {
        return JsonObject.EMPTY.with("$", value).with("type", type);
    }

    private void record(LineageRecord record) {
        Head head = record.view().head();
        String entity = entity(record.fingerprint());
        entities.put(
                entity,
                JsonObject.EMPTY
                        .with("prov:type", typed("fact:" + head.kind(), "prov:QUALIFIED_NAME"))
                        .with("prov:label", label(record))
                        .with("fact:sha256", record.fingerprint().hex())
                        .with("fact:thing", head.thing().hex()));
        String making = MAKING + record.fingerprint().hex();
        made(record, making);
        relation(generated, "g" + record.fingerprint().hex(), Map.of("prov:entity", entity, "prov:activity", making));
        inputs(record, entity, making);
        for (int i = 0; i < head.about().size(); i++) {
            AboutReference about = head.about().get(i);
            relation(
                    influenced,
                    "i" + record.fingerprint().hex() + "-" + i,
                    Map.of(
                            "prov:influencee",
                            entity,
                            "prov:influencer",
                            entity(about.record()),
                            "prov:role",
                            about.role()));
        }
        head.corrects().ifPresent(old -> revision(record, entity, old));
        head.after().ifPresent(after -> revision(record, entity, after.record()));
    }

    private static String label(LineageRecord record) {
        return record.label() + ": " + record.title().text();
    }

    private void made(LineageRecord record, String making) {
        JsonObject made = record.view().part(PartName.MADE).orElse(JsonObject.EMPTY);
        JsonObject activity = JsonObject.EMPTY.with("prov:label", "making of " + record.label());
        if (made.text("at").isPresent()) {
            activity = activity.with("prov:endTime", made.text("at").get());
        }
        if (record.view().choices().text("method").isPresent()) {
            activity = activity.with(
                    "fact:method", record.view().choices().text("method").get());
        }
        activities.put(making, activity);
        String build = made.text("build").orElse("unknown");
        String program = "program:fringekeep-" + build.replaceAll("[^A-Za-z0-9._-]", "-");
        agents.put(
                program,
                JsonObject.EMPTY
                        .with("prov:type", typed("prov:SoftwareAgent", "prov:QUALIFIED_NAME"))
                        .with("prov:label", "Fringekeep " + build));
        relation(associated, "a" + record.fingerprint().hex(), Map.of("prov:activity", making, "prov:agent", program));
    }

    private void inputs(LineageRecord record, String entity, String making) {
        for (int i = 0; i < record.view().head().inputs().size(); i++) {
            InputReference input = record.view().head().inputs().get(i);
            String source = input instanceof InputReference.OfRecord of
                    ? entity(of.record())
                    : rawEntity(((InputReference.OfRaw) input).raw());
            String key = record.fingerprint().hex() + "-" + i;
            relation(
                    used, "u" + key, Map.of("prov:activity", making, "prov:entity", source, "prov:role", input.role()));
            relation(
                    derived,
                    "d" + key,
                    Map.of("prov:generatedEntity", entity, "prov:usedEntity", source, "prov:activity", making));
        }
    }

    private void revision(LineageRecord record, String entity, Hash old) {
        SortedMap<String, Json> members = new TreeMap<>();
        members.put("prov:generatedEntity", Json.of(entity));
        members.put("prov:usedEntity", Json.of(entity(old)));
        members.put("prov:type", JsonArray.of(typed("prov:Revision", "prov:QUALIFIED_NAME")));
        derived.put("_:r" + record.fingerprint().hex() + old.hex(), new JsonObject(members));
    }

    private static void relation(SortedMap<String, Json> relations, String key, Map<String, String> members) {
        SortedMap<String, Json> object = new TreeMap<>();
        members.forEach((name, value) -> object.put(name, Json.of(value)));
        relations.put("_:" + key, new JsonObject(object));
    }
}
