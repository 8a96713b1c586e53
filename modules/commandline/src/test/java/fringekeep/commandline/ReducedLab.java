package fringekeep.commandline;

import com.fasterxml.jackson.databind.JsonNode;
import com.fasterxml.jackson.databind.ObjectMapper;
import com.fasterxml.jackson.databind.node.ArrayNode;
import com.fasterxml.jackson.databind.node.ObjectNode;
import java.io.IOException;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.Set;
import java.util.function.Predicate;

/** The invented laboratory's first night, cut to some of its files and to the steps that read, place and fit them. */
final class ReducedLab {
    static final Path SAMPLES = Path.of("../../sample-data").toAbsolutePath().normalize();
    static final ObjectMapper MAPPER = new ObjectMapper();
    private static final int LAST_STEP = 17;
    private static final Set<String> KEPT_RECORDS =
            Set.of("compound", "batch", "setup", "calibration", "reading-profile", "source-run");

    private ReducedLab() {}

    /** Writes {@code lab/lab.json} under the folder; raw files are read where they lie. */
    static Path write(Path folder, Path raw, Predicate<String> files) throws IOException {
        ObjectNode lab = (ObjectNode)
                MAPPER.readTree(SAMPLES.resolve("lab").resolve("lab.json").toFile());
        lab.put("rawFolder", raw.toAbsolutePath().normalize().toString());
        ArrayNode kept = MAPPER.createArrayNode();
        for (JsonNode step : lab.get("steps")) {
            if (step.get("n").asInt() <= LAST_STEP && keeps((ObjectNode) step, files)) {
                kept.add(step);
            }
        }
        lab.set("steps", kept);
        Path script = Files.createDirectories(folder.resolve("lab")).resolve("lab.json");
        MAPPER.writeValue(script.toFile(), lab);
        return folder;
    }

    private static boolean keeps(ObjectNode step, Predicate<String> files) {
        switch (step.get("step").asText()) {
            case "record":
                return KEPT_RECORDS.contains(step.at("/documents/0/kind").asText());
            case "take-in":
                cut(step, "files", files);
                return true;
            case "fit":
                cut(step, "each", files);
                return true;
            default:
                cut(step, "scans", files);
                step.set("velocities", MAPPER.createArrayNode());
                step.get("scans").forEach(scan -> ((ObjectNode) scan).remove(Set.of("series", "step")));
                return true;
        }
    }

    private static void cut(ObjectNode step, String member, Predicate<String> files) {
        ArrayNode kept = MAPPER.createArrayNode();
        for (JsonNode item : step.get(member)) {
            String name = item.isTextual() ? item.asText() : item.get("scan").asText();
            if (files.test(name.replace("scan of ", ""))) {
                kept.add(item);
            }
        }
        step.set(member, kept);
    }
}
