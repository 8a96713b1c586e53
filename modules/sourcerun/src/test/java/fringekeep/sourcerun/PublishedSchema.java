package fringekeep.sourcerun;

import com.fasterxml.jackson.databind.JsonNode;
import com.fasterxml.jackson.databind.ObjectMapper;
import com.fasterxml.jackson.databind.node.ObjectNode;
import com.networknt.schema.JsonSchema;
import com.networknt.schema.JsonSchemaFactory;
import com.networknt.schema.SpecVersion;
import com.networknt.schema.ValidationMessage;
import fringekeep.archive.json.CanonicalJson;
import fringekeep.archive.json.JsonObject;
import fringekeep.archive.kind.SchemaResource;
import java.io.IOException;
import java.io.InputStream;
import java.nio.charset.StandardCharsets;
import java.util.List;

/** A published schema as a library by others (networknt json-schema-validator) understands it. */
final class PublishedSchema {
    private static final ObjectMapper MAPPER = new ObjectMapper();
    private final JsonSchema schema;

    PublishedSchema(Class<?> beside, String resource) throws IOException {
        try (InputStream stream = beside.getResourceAsStream(resource);
                InputStream shared = SchemaResource.class.getResourceAsStream("common-1.schema.json")) {
            String text = new String(stream.readAllBytes(), StandardCharsets.UTF_8);
            ObjectNode node = (ObjectNode) MAPPER.readTree(text.replace("common-1.schema.json#", "#"));
            JsonNode common = MAPPER.readTree(shared).get("$defs");
            node.set("$defs", common);
            schema = JsonSchemaFactory.getInstance(SpecVersion.VersionFlag.V202012)
                    .getSchema(node);
        }
    }

    /** What the validator says about a document of parts; empty when it is accepted. */
    List<String> faults(JsonObject parts) throws IOException {
        JsonNode node = MAPPER.readTree(CanonicalJson.write(parts));
        return schema.validate(node).stream().map(ValidationMessage::getMessage).toList();
    }
}
