package fringekeep.commandline;

import static org.assertj.core.api.Assertions.assertThat;

import com.fasterxml.jackson.databind.JsonNode;
import com.fasterxml.jackson.databind.ObjectMapper;
import fringekeep.archive.Archive;
import fringekeep.archive.Archives;
import fringekeep.archive.NewRecord;
import fringekeep.archive.json.Json;
import fringekeep.archive.json.JsonArray;
import fringekeep.archive.json.JsonObject;
import fringekeep.archive.kind.RecordView;
import fringekeep.archive.record.Hash;
import fringekeep.archive.record.PartName;
import java.io.ByteArrayOutputStream;
import java.io.IOException;
import java.io.PrintStream;
import java.nio.charset.StandardCharsets;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.ArrayList;
import java.util.List;
import java.util.Locale;
import java.util.Map;
import java.util.Optional;
import org.junit.jupiter.api.BeforeAll;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.io.TempDir;

/**
 * A chain of the real kinds from raw counts to a figure, recomputed through: once honest, once with a fit whose recorded numbers
 * are not what its scan gives. The counts follow V(P) = 0.44 J2-like rise of no particular compound; only whether numbers follow
 * from them is asked, and the answer is known beforehand.
 */
class ThroughChainTest {
    private static final ObjectMapper MAPPER = new ObjectMapper();
    private static final double[] POWERS = {1, 2, 3, 4, 5, 6};
    private static final double[] VISIBILITIES = {0.02, 0.075, 0.15, 0.235, 0.31, 0.37};

    @TempDir
    private static Path folder;

    private static String falseFit = "";

    private record Ended(int code, String data, String words) {}

    private static Ended run(String... arguments) {
        ByteArrayOutputStream data = new ByteArrayOutputStream();
        ByteArrayOutputStream words = new ByteArrayOutputStream();
        int code = Main.run(
                new Console(
                        new PrintStream(data, true, StandardCharsets.UTF_8),
                        new PrintStream(words, true, StandardCharsets.UTF_8)),
                arguments);
        return new Ended(code, data.toString(StandardCharsets.UTF_8), words.toString(StandardCharsets.UTF_8));
    }

    private static String lab() {
        return folder.resolve("lab").toString();
    }

    private static Ended done(String command, String... rest) {
        List<String> all = new ArrayList<>(List.of(command, "--archive", lab()));
        all.addAll(List.of(rest));
        Ended ended = run(all.toArray(String[]::new));
        assertThat(ended.code()).as(command + ": " + ended.words()).isZero();
        return ended;
    }

    private static void record(String document) throws IOException {
        Path file = folder.resolve("document.json");
        Files.writeString(file, document.replace('\'', '"'));
        done("record", "--person", "A. Name", file.toString());
    }

    @BeforeAll
    static void measure() throws Exception {
        Ended founded =
                run("found", "--title", "bench", "--zone", "Etc/UTC", "--invented", "--person", "A. Name", lab());
        assertThat(founded.code()).as(founded.words()).isZero();
        record("{'kind':'compound','choices':{'composition':{'sort':'masses','masses':[{'mass':'1200 u exact',"
                + "'share':1}]}}}");
        record("{'kind':'batch','about':[{'role':'compound','record':'compound 1'}],'content':{'label':'B',"
                + "'cautions':[],'acknowledged':true}}");
        record("{'kind':'source-run','about':[{'role':'batch','record':'batch 1'}],'content':{'label':'R',"
                + "'source':'effusive','cautions':[],'acknowledged':true,'settings':[]}}");
        String slits = "{'sort':'material','period':'266 nm exact','openFraction':'0.42 exact'}";
        record("{'kind':'setup','content':{'label':'bench','gratings':[" + slits
                + ",{'sort':'standing-wave','laser':{'wavelength':'532 nm exact','waistAcross':'0.9(1) mm',"
                + "'reflectivity':'1 exact'}}," + slits
                + "],'separations':['105 mm exact','105 mm exact'],'cautions':[],'acknowledged':true}}");
        record("{'kind':'velocity','about':[{'role':'run','record':'source-run 1'}],'content':{'origin':'invented',"
                + "'mean':'120(1) m/s','shape':'single'}}");
        record("{'kind':'reading-profile','content':{'form':'delimited/1','encoding':'UTF-8','delimiter':',',"
                + "'decimal':'.','skip':1,'comment':'#','keySeparator':':','direction':'up','exposure':'1 s exact',"
                + "'columns':[{'axis':'position','unit':'nm'},{'channel':'counts'}],'header':[{'key':'start',"
                + "'moment':'start'},{'key':'laser power','setting':'laser power','unit':'W','deviation':'0.01'}]}}");
        List<String> takeIn = new ArrayList<>(List.of("--profile", "reading-profile 1"));
        List<String> place = new ArrayList<>(List.of("--setup", "setup 1", "--run", "source-run 1"));
        place.addAll(List.of("--velocity", "velocity 1", "--purpose", "signal", "--person", "A. Name"));
        List<String> fit = new ArrayList<>();
        for (int i = 0; i < POWERS.length; i++) {
            takeIn.add(raw(i).toString());
            place.add("scan " + (i + 1));
            fit.add("scan " + (i + 1));
        }
        done("take-in", takeIn.toArray(String[]::new));
        done("place", place.toArray(String[]::new));
        done("fit", fit.toArray(String[]::new));
        done("select", "--person", "A. Name", "--rule", "all", "--from", "laser_power_w=0");
        done("property", "selection 1");
        figure(1);
        tamper();
    }

    private static Path raw(int i) throws IOException {
        StringBuilder text = new StringBuilder(String.format(
                        Locale.ROOT, "# start: 2031-05-14T20:%02d:00Z%n# laser power: %.1f W%nx,c%n", i, POWERS[i])
                .replace("\r\n", "\n"));
        for (int k = 0; k < 28; k++) {
            double counts = 900 * (1 + VISIBILITIES[i] * Math.cos(2 * Math.PI * k * 38 / 266 + 0.3));
            text.append(k * 38).append(',').append(Math.round(counts)).append('\n');
        }
        return Files.writeString(folder.resolve("raw-" + i + ".txt"), text);
    }

    private static void figure(int property) throws IOException {
        record("{'kind':'figure','inputs':[{'role':'series','record':'property " + property
                + "'}],'choices':{'caption':'V','widthMillimetres':80,'heightMillimetres':60,'panelsInRow':1,"
                + "'panels':[{'name':'a','legend':true,'x':{'label':'P','unit':'W'},'y':{'label':'V','unit':'1'},"
                + "'series':[{'input':0,'series':'points','tone':'ink'},{'input':0,'series':'quantum',"
                + "'tone':'quantum'}]}]}}");
    }

    /** Records a fit of scan 3 whose amplitude is a tenth too large, and a property and a figure honestly made from it. */
    private static void tamper() throws Exception {
        List<String> inputs = new ArrayList<>();
        try (Archive archive = Archives.open(folder.resolve("lab"), Session.kinds(), Session.circumstances())) {
            RecordView third = archive.record(archive.find("fit 3")).orElseThrow();
            double[] values = third.result().array("values").numbers();
            values[1] *= 1.1;
            values[2] *= 1.1;
            Hash made = archive.record(new NewRecord(
                            third.head().kind(),
                            third.head().inputs(),
                            List.of(),
                            Map.of(
                                    PartName.CHOICES,
                                    third.choices(),
                                    PartName.RESULT,
                                    third.result().with("values", JsonArray.ofNumbers(values))),
                            List.of(),
                            Optional.empty(),
                            Optional.empty(),
                            Optional.empty()))
                    .fingerprint();
            falseFit = made.hex();
            for (int i = 1; i <= POWERS.length; i++) {
                inputs.add(i == 3 ? falseFit : archive.find("fit " + i).hex());
            }
        }
        List<Json> taken = new ArrayList<>();
        inputs.forEach(fit -> taken.add(JsonObject.EMPTY.with("role", "taken").with("record", fit)));
        Path file = folder.resolve("selection.json");
        Files.write(
                file,
                fringekeep.archive.json.PrettyJson.write(JsonObject.EMPTY
                        .with("kind", "selection")
                        .with("inputs", new JsonArray(taken))
                        .with(
                                "content",
                                JsonObject.EMPTY
                                        .with("rule", "picked")
                                        .with("conditions", JsonArray.of())
                                        .with("left", JsonArray.of()))));
        done("record", "--person", "A. Name", file.toString());
        done("property", "selection 2");
        figure(2);
    }

    private static JsonNode recompute(int code, String... arguments) throws IOException {
        List<String> all = new ArrayList<>(List.of("recompute", "--archive", lab(), "--json"));
        all.addAll(List.of(arguments));
        Ended ended = run(all.toArray(String[]::new));
        assertThat(ended.code()).as(ended.words()).isEqualTo(code);
        return MAPPER.readTree(ended.data());
    }

    private static String verdict(JsonNode all, String label) {
        for (JsonNode each : all.get("records")) {
            if (each.get("label").asText().equals(label)) {
                return each.get("verdict").asText();
            }
        }
        throw new AssertionError(label);
    }

    @Test
    void anHonestFigureFollowsFromItsRawCountsBitByBit() throws IOException {
        JsonNode all = recompute(0, "--through", "--values", "figure 1");

        JsonNode answer = all.get("through").get(0);
        assertThat(answer.get("follows").asText()).isEqualTo("same-bits");
        assertThat(answer.get("takenAsRecorded")).isEmpty();
        assertThat(answer.get("values")).hasSizeGreaterThan(300);
        answer.get("values")
                .forEach(value -> assertThat(value.get("verdict").asText()).isEqualTo("same bits"));
    }

    @Test
    void eachLinkByItselfBlamesTheFalseFitAlone() throws IOException {
        JsonNode all = recompute(1, "figure 2");

        assertThat(verdict(all, "fit 0007")).isEqualTo("different");
        assertThat(verdict(all, "property 0002")).isEqualTo("same bits");
        assertThat(verdict(all, "figure 0002")).isEqualTo("same bits");
    }

    @Test
    void throughTheChainTheFalseFitReachesTheFigure() throws IOException {
        JsonNode all = recompute(1, "--through", "--values", "figure 2");

        assertThat(verdict(all, "fit 0007")).isEqualTo("different");
        assertThat(verdict(all, "property 0002")).isEqualTo("different");
        assertThat(verdict(all, "figure 0002")).isEqualTo("different");
        JsonNode answer = all.get("through").get(0);
        assertThat(answer.get("follows").asText()).isEqualTo("no");
        assertThat(answer.get("beginnings")).hasSize(1);
        assertThat(answer.get("beginnings").get(0).get("record").asText()).isEqualTo(falseFit);
        assertThat(answer.get("values"))
                .anyMatch(value -> value.get("verdict").asText().equals("different"))
                .anyMatch(value -> value.get("verdict").asText().equals("same bits"));
    }

    /** What comes out through the false chain is what stands in the honest one. */
    @Test
    void whatComesOutIsTheHonestNumber() throws IOException {
        JsonNode honest = recompute(0, "--through", "--values", "property 1")
                .get("through")
                .get(0);
        JsonNode mended = recompute(1, "--through", "--values", "property 2")
                .get("through")
                .get(0);

        String pointer = "/polarizabilityVolume/value";
        assertThat(value(mended, pointer).get("now").asText())
                .isEqualTo(value(honest, pointer).get("kept").asText());
        assertThat(value(mended, pointer).has("sigmas")).isTrue();
    }

    private static JsonNode value(JsonNode answer, String pointer) {
        for (JsonNode value : answer.get("values")) {
            if (value.get("pointer").asText().equals(pointer)) {
                return value;
            }
        }
        throw new AssertionError(pointer);
    }

    @Test
    void theRuleOfTheFiguresSelectionIsRunAgain() throws IOException {
        Ended ended = done("reselect", "--json", "figure 2");

        JsonNode difference = MAPPER.readTree(ended.data()).get(0);
        assertThat(difference.get("byHand").asBoolean()).isTrue();
        assertThat(difference.get("same").asBoolean()).isTrue();
        Ended none = run("reselect", "--archive", lab(), "scan 1");
        assertThat(none.code()).isEqualTo(Exit.COULD_NOT);
        assertThat(none.words()).contains("was made from no selection", "mend:");
    }

    @Test
    void everyCommandsHelpEndsWithItsExitCodes() {
        for (picocli.CommandLine line : new Commands(Console.ofProcess()).lines()) {
            line.getSubcommands().forEach((name, command) -> {
                String help = command.getUsageMessage(picocli.CommandLine.Help.Ansi.OFF);
                assertThat(help).as(name).contains("Exit codes: 0 done", "-h, --help");
                assertThat(help.contains("Example") || name.equals("compute"))
                        .as(name + " has an example")
                        .isTrue();
            });
        }
    }
}
