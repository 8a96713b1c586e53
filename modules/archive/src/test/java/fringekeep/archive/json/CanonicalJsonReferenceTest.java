package fringekeep.archive.json;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.assertThatThrownBy;

import fringekeep.archive.problem.ProblemException;
import java.nio.charset.StandardCharsets;
import java.util.Map;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.CsvSource;
import org.junit.jupiter.params.provider.ValueSource;

/** Against record format 1, section 17, and the examples of RFC 8785 (DOI 10.17487/RFC8785), appendices B and 3.2. */
class CanonicalJsonReferenceTest {
    @ParameterizedTest
    @ValueSource(
            strings = {
                "5e-324",
                "1e-323",
                "9.5e-7",
                "0.000001",
                "0.002",
                "333333333.3333333",
                "123456789012345680000",
                "1e+21",
                "1e+23",
                "1.7976931348623157e+308"
            })
    void numbersOfTheSpecificationWriteAsThemselves(String text) throws Exception {
        assertThat(EcmaScriptNumber.write(Double.parseDouble(text))).isEqualTo(text);
        byte[] bytes = text.getBytes(StandardCharsets.UTF_8);
        assertThat(CanonicalJson.write(CanonicalJson.read(bytes))).isEqualTo(bytes);
    }

    @Test
    void minusZeroIsWrittenAsZero() {
        assertThat(CanonicalJson.write(Json.of(-0.0))).isEqualTo(new byte[] {'0'});
        assertThat(EcmaScriptNumber.write(-0.0)).isEqualTo("0");
    }

    @ParameterizedTest
    @ValueSource(
            strings = {
                "1.0",
                "1E3",
                "9007199254740993",
                "-0",
                "{\"a\":1,\"a\":2}",
                "{\"b\":1,\"a\":2}",
                "null",
                "1\n",
                " 1",
                "{\"a\": 1}",
                "[1,]",
                "01",
                "+1",
                "NaN",
                "Infinity",
                "1e400",
                "\uFEFF1",
                "\"\\u0041\"",
                "\"\\/\"",
                "\"\\ud800\"",
                "\"\\u0000\"",
                "{\"A\":1}",
                "{\"a_b\":1}",
                "{\"\":1}",
                "",
                "1 2",
                "[1 2]",
                "tru",
                "'a'",
                "\"\\u001F\"",
                "[null]",
                "{\"a\":null}",
                "// c\n1",
                "1e21",
                "1e-7 "
            })
    void everythingElseIsRefused(String text) {
        assertThatThrownBy(() -> CanonicalJson.read(text.getBytes(StandardCharsets.UTF_8)))
                .isInstanceOf(ProblemException.class);
    }

    @Test
    void nestingOfThirtyTwoIsReadAndThirtyThreeIsRefused() throws Exception {
        byte[] deepest = ("[".repeat(32) + "]".repeat(32)).getBytes(StandardCharsets.UTF_8);
        byte[] tooDeep = ("[".repeat(33) + "]".repeat(33)).getBytes(StandardCharsets.UTF_8);

        assertThat(CanonicalJson.write(CanonicalJson.read(deepest))).isEqualTo(deepest);
        assertThatThrownBy(() -> CanonicalJson.read(tooDeep)).isInstanceOf(ProblemException.class);
    }

    /** RFC 8785, appendix B, table 1: IEEE 754 bits and the text they must give. */
    @ParameterizedTest
    @CsvSource({
        "0000000000000000, 0",
        "8000000000000000, 0",
        "0000000000000001, 5e-324",
        "8000000000000001, -5e-324",
        "7fefffffffffffff, 1.7976931348623157e+308",
        "ffefffffffffffff, -1.7976931348623157e+308",
        "4340000000000000, 9007199254740992",
        "c340000000000000, -9007199254740992",
        "4430000000000000, 295147905179352830000",
        "44b52d02c7e14af5, 9.999999999999997e+22",
        "44b52d02c7e14af6, 1e+23",
        "44b52d02c7e14af7, 1.0000000000000001e+23",
        "444b1ae4d6e2ef4e, 999999999999999700000",
        "444b1ae4d6e2ef4f, 999999999999999900000",
        "444b1ae4d6e2ef50, 1e+21",
        "3eb0c6f7a0b5ed8c, 9.999999999999997e-7",
        "3eb0c6f7a0b5ed8d, 0.000001",
        "41b3de4355555553, 333333333.3333332",
        "41b3de4355555554, 333333333.33333325",
        "41b3de4355555555, 333333333.3333333",
        "41b3de4355555556, 333333333.3333334",
        "41b3de4355555557, 333333333.33333343",
        "becbf647612f3696, -0.0000033333333333333333",
        "43143ff3c1cb0959, 1424953923781206.2"
    })
    void numbersOfRfc8785AppendixB(String bits, String text) {
        assertThat(EcmaScriptNumber.write(Double.longBitsToDouble(Long.parseUnsignedLong(bits, 16))))
                .isEqualTo(text);
    }

    /** RFC 8785, section 3.2.2, the text member: escapes and characters. */
    @Test
    void textsOfRfc8785() {
        String text = "\u20ac$\u000f\nA'B\"\\\\\"/";

        assertThat(new String(CanonicalJson.write(Json.of(text)), StandardCharsets.UTF_8))
                .isEqualTo("\"\u20ac$\\u000f\\nA'B\\\"\\\\\\\\\\\"/\"");
    }

    @Test
    void membersAreWrittenInOrderOfCodeUnits() {
        JsonObject object =
                JsonObject.of(Map.of("b", Json.of(1), "aB", Json.of(true), "a", Json.of("x"), "a1", Json.of(0.5)));

        assertThat(new String(CanonicalJson.write(object), StandardCharsets.UTF_8))
                .isEqualTo("{\"a\":\"x\",\"a1\":0.5,\"aB\":true,\"b\":1}");
    }
}
