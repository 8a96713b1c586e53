package fringekeep.commandline;

import static org.assertj.core.api.Assertions.assertThat;

import fringekeep.archive.json.JsonDocument;
import fringekeep.archive.json.PrettyJson;
import fringekeep.archive.problem.ProblemException;
import fringekeep.commandline.compute.Field;
import fringekeep.commandline.compute.Method;
import fringekeep.commandline.compute.Methods;
import fringekeep.commandline.compute.Results;
import java.io.ByteArrayOutputStream;
import java.io.IOException;
import java.nio.charset.StandardCharsets;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.List;
import java.util.stream.Stream;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.io.TempDir;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.MethodSource;

class ComputeCommandTest {
    private final ByteArrayOutputStream data = new ByteArrayOutputStream();
    private final ByteArrayOutputStream words = new ByteArrayOutputStream();

    @TempDir
    Path folder;

    private int run(String... arguments) {
        return Main.run(ComputeReferenceTest.console(data, words), arguments);
    }

    private String said() {
        return words.toString(StandardCharsets.UTF_8);
    }

    private int compute(String method, String document) throws IOException {
        Path file = Files.writeString(folder.resolve("inputs.json"), document);
        return run("compute", method, file.toString());
    }

    static Stream<Method> methods() {
        return Methods.all().stream();
    }

    @ParameterizedTest
    @MethodSource("methods")
    void theWorkedExampleOfEveryMethodComputes(Method method) throws ProblemException {
        Results results = method.compute(JsonDocument.read(PrettyJson.write(method.example())));

        assertThat(results.all()).isNotEmpty();
        assertThat(results.all().stream().map(Results.Result::name)).doesNotHaveDuplicates();
        assertThat(method.fields().stream().map(Field::name)).doesNotHaveDuplicates();
    }

    @ParameterizedTest
    @MethodSource("methods")
    void theFormOfEveryMethodNamesItsInputs(Method method) {
        assertThat(run("compute", method.name(), "--form")).isEqualTo(Exit.DONE);
        String form = data.toString(StandardCharsets.UTF_8);
        method.fields().forEach(field -> assertThat(form).contains(field.name()).contains(field.words()));
    }

    @Test
    void theListNamesEveryMethod() {
        assertThat(run("compute", "--list")).isEqualTo(Exit.DONE);
        List<String> names = Methods.all().stream().map(Method::name).toList();
        assertThat(names).doesNotHaveDuplicates();
        assertThat(data.toString(StandardCharsets.UTF_8)).contains(names);
    }

    @Test
    void anUnknownMethodIsRefusedWithTheNearestNames() {
        assertThat(run("compute", "fringe-fits")).isEqualTo(Exit.COULD_NOT);
        assertThat(said()).contains("There is no method \"fringe-fits\"", "Perhaps fringe-fit");
    }

    @Test
    void withoutAMethodTheUseIsWrong() {
        assertThat(run("compute")).isEqualTo(Exit.WRONG_USE);
        assertThat(said()).contains("--list");
    }

    @Test
    void everyWrongFieldIsNamedWithItsPlaceAndAMend() throws IOException {
        int code = compute(
                "de-broglie",
                "{\"mas\": \"720 u\",\n \"velocity\": {\"value\": 200, \"unit\": \"m\"},\n \"period\": 266}");

        assertThat(code).isEqualTo(Exit.COULD_NOT);
        assertThat(said())
                .contains("There is no input \"mas\"", "Perhaps mass?")
                .contains("The input mass is missing")
                .contains("velocity is given in m, which does not reduce to m/s")
                .contains("line 2, column 14, field /velocity")
                .contains("The number in period has no unit");
        assertThat(data.toString(StandardCharsets.UTF_8)).isEmpty();
    }

    @Test
    void inputsThatDoNotGoTogetherAreRefusedInTheLibrarysWords() throws IOException {
        int code = compute(
                "fringe-fit",
                "{\"positions\":{\"value\":[0,1],\"unit\":\"nm\"},\"counts\":[1]," + "\"period\":\"266 nm\"}");

        assertThat(code).isEqualTo(Exit.COULD_NOT);
        assertThat(said()).contains("counts: 1 values for 2 points", "mend:");
    }

    @Test
    void dataWithoutResultGiveAReasonAndNoNumber() throws IOException {
        int code = compute(
                "fringe-fit",
                "{\"positions\":{\"value\":[0,100],\"unit\":\"nm\"},\"counts\":[10,12]," + "\"period\":\"266 nm\"}");

        assertThat(code).isEqualTo(Exit.COULD_NOT);
        assertThat(said()).contains("mend:");
        assertThat(data.toString(StandardCharsets.UTF_8)).isEmpty();
    }

    @Test
    void valuesWeightedByUncertaintyNeedThem() throws IOException {
        int code = compute("ring-down", "{\"times\":{\"value\":[0,1,2,3],\"unit\":\"ms\"},\"energies\":[4,3,2,1]}");

        assertThat(code).isEqualTo(Exit.COULD_NOT);
        assertThat(said()).contains("The values of energies are weighted by their uncertainties");
    }

    @Test
    void quantitiesAsTextAndAsObjectsGiveTheSameBits() throws IOException {
        String typed = "{\"mass\":\"720.642 u\",\"velocity\":\"200.0(5) m/s\",\"period\":\"266.38 nm\"}";
        String split = "{\"mass\":{\"value\":720.642,\"unit\":\"u\"},\"velocity\":{\"value\":200,\"u\":0.5,"
                + "\"unit\":\"m/s\"},\"period\":{\"value\":266.38,\"unit\":\"nm\"}}";

        assertThat(compute("de-broglie", typed)).isEqualTo(Exit.DONE);
        String first = data.toString(StandardCharsets.UTF_8);
        data.reset();
        assertThat(compute("de-broglie", split)).isEqualTo(Exit.DONE);
        assertThat(data.toString(StandardCharsets.UTF_8)).isEqualTo(first).contains("wavelength");
    }
}
