package fringekeep.archive.kind;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.assertThatThrownBy;

import fringekeep.archive.RecordVectors;
import fringekeep.archive.problem.ProblemException;
import java.nio.charset.StandardCharsets;
import java.util.HexFormat;
import java.util.List;
import java.util.Optional;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.ValueSource;

/** Against the golden table of record format 1, section 17, and arrays written by NumPy. */
class PayloadFormsReferenceTest {
    @Test
    void theGoldenTableIsReadAndWritten() throws Exception {
        byte[] golden = RecordVectors.bytes(RecordVectors.TABLE);
        CsvPayload.Table table = CsvPayload.read(golden);

        assertThat(table.numbers("position_m").orElseThrow()).containsExactly(0, 6.65e-8, 1.33e-7, 1.995e-7);
        assertThat(table.numbers("counts").orElseThrow()).containsExactly(120, 100, 80, 100);
        assertThat(CsvPayload.write(
                        List.of("position_m", "counts"),
                        List.of(new double[] {0, 6.65e-8, 1.33e-7, 1.995e-7}, new double[] {120, 100, 80, 100})))
                .isEqualTo(golden);
    }

    @Test
    void textsAndAbsentCellsComeBack() throws Exception {
        CsvPayload.Table table = new CsvPayload.Table(List.of(
                new CsvPayload.Texts("name", List.of(Optional.of("a \"b\", c\nd"), Optional.empty(), Optional.of(""))),
                new CsvPayload.Numbers("x_m", new double[] {1, Double.NaN, -0.0})));
        byte[] bytes = CsvPayload.write(table);

        assertThat(new String(bytes, StandardCharsets.UTF_8))
                .isEqualTo("name,x_m\n\"a \"\"b\"\", c\nd\",1\n,\n\"\",0\n");
        assertThat(CsvPayload.write(CsvPayload.read(bytes))).isEqualTo(bytes);
    }

    @ParameterizedTest
    @ValueSource(
            strings = {
                "",
                "a",
                "a\r\n1\r\n",
                "a\n1",
                "a\n1.0\n",
                "a\n1,2\n",
                "a,a\n1,2\n",
                "A\n1\n",
                "a\n-0\n",
                "a\nNaN\n",
                "a\n1e400\n",
                "a\n\"x\n",
                "a\n\"x\"y\n",
                "a\n1\n\"x\"\n",
                "\uFEFFa\n1\n",
                "a\nx\n",
                "a\n1e21\n"
            })
    void everyOtherTableIsRefused(String text) {
        assertThatThrownBy(() -> CsvPayload.read(text.getBytes(StandardCharsets.UTF_8)))
                .isInstanceOf(ProblemException.class);
    }

    /** Bytes made by NumPy 2.4.6: numpy.lib.format.write_array(stream, array, version=(1, 0)). */
    @Test
    void arraysWrittenByNumpyAreReadAndWritten() throws Exception {
        byte[] reals = numpy(
                "'<f8'",
                "(2, 3)",
                "000000000000f03f000000000000f87f0000000000000040"
                        + "333333333333d33f000000000000000000000000000000c0");
        NpyPayload.NpyArray array = NpyPayload.read(reals);

        assertThat(array.shape()).containsExactly(2, 3);
        assertThat(array.reals()).containsExactly(1, Double.NaN, 2, 0.3, 0, -2);
        assertThat(NpyPayload.write(array)).isEqualTo(reals);
        byte[] shorts = numpy("'<u2'", "(3,)", "0000ffff0100");
        assertThat(NpyPayload.read(shorts).integers()).containsExactly(0, 65535, 1);
        assertThat(NpyPayload.write(NpyPayload.read(shorts))).isEqualTo(shorts);
    }

    private static byte[] numpy(String type, String shape, String values) {
        String dictionary = "{'descr': " + type + ", 'fortran_order': False, 'shape': " + shape + ", }";
        String header = dictionary + " ".repeat(128 - 10 - 1 - dictionary.length()) + "\n";
        String prefix = "934e554d505901007600";
        byte[] text = header.getBytes(StandardCharsets.US_ASCII);
        return HexFormat.of().parseHex(prefix + HexFormat.of().formatHex(text) + values);
    }

    @Test
    void infinitiesMinusZeroAndOtherHeadersAreRefused() {
        assertThatThrownBy(() -> NpyPayload.read(numpy("'<f8'", "(1,)", "000000000000f07f")))
                .isInstanceOf(ProblemException.class);
        assertThatThrownBy(() -> NpyPayload.read(numpy("'<f8'", "(1,)", "0000000000000080")))
                .isInstanceOf(ProblemException.class);
        assertThatThrownBy(() -> NpyPayload.read(numpy("'<f8'", "(1,)", "010000000000f87f")))
                .isInstanceOf(ProblemException.class);
        assertThatThrownBy(() -> NpyPayload.read(numpy("'>f8'", "(1,)", "000000000000f03f")))
                .isInstanceOf(ProblemException.class);
        assertThatThrownBy(() -> NpyPayload.read(numpy("'<f8'", "(2,)", "000000000000f03f")))
                .isInstanceOf(ProblemException.class);
        assertThatThrownBy(() -> NpyPayload.write(new double[] {Double.POSITIVE_INFINITY}, 1))
                .isInstanceOf(IllegalArgumentException.class);
    }
}
