package fringekeep.fit;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.within;

import fringekeep.archive.json.JsonObject;
import fringekeep.archive.kind.RecordView;
import fringekeep.archive.making.DetachedRecords;
import fringekeep.archive.problem.ProblemException;
import fringekeep.archive.record.Hash;
import java.io.IOException;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.List;
import org.junit.jupiter.api.Test;

/** The golden fit of the record format, section 17: choices are accepted, and estimates and covariance come out as there. */
class GoldenFitReferenceTest {
    private static final String CHOICES = "7c24d4f354d22ab449bac9d4eace8b9da881c6e65408ab387b93d606ffd3472a";
    private static final String RESULT = "22effc5b73a535d6ba2f494d1b319828d570bbc49d869090812cc1caee0ff71c";
    private static final String RAW = "2430a13b82f0347a4de0e1742062781b782a93af9df666fa17b27f3fff056504";
    private static final String SETUP = "4cec03359a1db65cede149c3d228b88ec297cd3df2bae5308e62ff3e9b94e9c7";
    private static final String PROFILE = "b7a01175ccf1c934d87e95c4411daa148955da3217af16b3bd6c39ea8e04ca7a";
    private static final String PLACEMENT = "ac2d793daeefafc1b35ec58921dc678d39c9413d8ad1dc99684abd10c44b2dcb";

    private final Bench bench = new Bench();

    private RecordView fit() throws IOException, ProblemException {
        Hash profile = bench.records.enter("reading-profile", Bench.vector(PROFILE));
        Hash scan = bench.scan(profile, Files.readAllBytes(Path.of("src/test/reference/record-vectors", RAW)));
        Hash setup = bench.records.enter("setup", Bench.vector(SETUP));
        Hash placement = bench.records.enter(
                "placement",
                Bench.vector(PLACEMENT),
                DetachedRecords.about("scan", scan),
                DetachedRecords.about("setup", setup));
        return bench.records.view(bench.records.compute(
                "fit",
                Bench.vector(CHOICES),
                List.of(
                        Bench.scanInput("scan", scan, "counts"),
                        DetachedRecords.input("placement", placement),
                        DetachedRecords.input("setup", setup))));
    }

    @Test
    void meanCosineAndSineAreThoseOfFourSteps() throws IOException, ProblemException {
        JsonObject golden = Bench.vector(RESULT);

        JsonObject result = fit().result();

        assertThat(result.array("estimates")).isEqualTo(golden.array("estimates"));
        assertThat(result.integer("degreesOfFreedom")).isEqualTo(golden.integer("degreesOfFreedom"));
        assertThat(result.array("sensitivities")).isEqualTo(golden.array("sensitivities"));
        double[] values = golden.array("values").numbers();
        double[] covariance = golden.array("covariance").numbers();
        for (int i = 0; i < values.length; i++) {
            assertThat(result.array("values").numbers()[i]).isCloseTo(values[i], within(1e-12));
        }
        for (int i = 0; i < covariance.length; i++) {
            assertThat(result.array("covariance").numbers()[i]).isCloseTo(covariance[i], within(1e-11));
        }
    }

    @Test
    void completedChoicesKeepEveryGoldenMember() throws IOException, ProblemException {
        JsonObject golden = Bench.vector(CHOICES);

        JsonObject choices = fit().choices();

        golden.members().forEach((name, value) -> {
            if (!name.equals("period")) {
                assertThat(choices.get(name)).as(name).contains(value);
            }
        });
        assertThat(choices.object("period").orElseThrow().number("si")).hasValue(2.66e-7);
        assertThat(choices.object("background").orElseThrow().text("sort")).contains("none");
    }
}
