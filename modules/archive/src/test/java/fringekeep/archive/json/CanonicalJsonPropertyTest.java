package fringekeep.archive.json;

import static org.assertj.core.api.Assertions.assertThat;

import fringekeep.archive.RecordVectors;
import fringekeep.archive.problem.ProblemException;
import fringekeep.archive.record.Hash;
import java.nio.charset.StandardCharsets;
import java.util.List;
import java.util.Map;
import java.util.TreeMap;
import net.jqwik.api.Arbitraries;
import net.jqwik.api.Arbitrary;
import net.jqwik.api.ForAll;
import net.jqwik.api.Property;
import net.jqwik.api.Provide;
import net.jqwik.api.constraints.IntRange;

/** Laws of canonical bytes. */
class CanonicalJsonPropertyTest {
    private static final List<byte[]> VECTORS =
            List.copyOf(RecordVectors.ofForm("head/1").values());

    @Property(tries = 1_000)
    void whatIsWrittenReadsBackEqual(@ForAll("values") Json value) throws ProblemException {
        byte[] bytes = CanonicalJson.write(value);

        assertThat(CanonicalJson.read(bytes)).isEqualTo(value);
        assertThat(CanonicalJson.write(CanonicalJson.read(bytes))).isEqualTo(bytes);
        assertThat(JsonDocumentValues.read(new String(PrettyJson.write(value), StandardCharsets.UTF_8)))
                .isEqualTo(value);
    }

    /** Any one changed byte is refused, or is other canonical JSON with another hash. */
    @Property(tries = 3_000)
    void anyChangedByteIsRefusedOrHashesDifferently(
            @ForAll @IntRange(max = 9) int vector, @ForAll @IntRange(max = 100_000) int place, @ForAll byte value) {
        byte[] whole = VECTORS.get(vector);
        byte[] changed = whole.clone();
        int at = place % changed.length;
        changed[at] = value == whole[at] ? (byte) (value + 1) : value;

        assertThat(Hash.of(changed)).isNotEqualTo(Hash.of(whole));
        try {
            assertThat(CanonicalJson.write(CanonicalJson.read(changed))).isEqualTo(changed);
        } catch (ProblemException e) {
            assertThat(e.problems()).isNotEmpty();
        }
    }

    @Provide
    Arbitrary<Json> values() {
        Arbitrary<Json> leaves = Arbitraries.oneOf(
                Arbitraries.doubles().map(Json::of),
                Arbitraries.integers().map(number -> Json.of((double) number)),
                Arbitraries.of(true, false).map(Json::of),
                Arbitraries.strings()
                        .withCharRange('\u0001', '\ud7ff')
                        .withChars('"', '\\', '\u001f', '\u007f', '\u2028', '\ue000')
                        .ofMaxLength(20)
                        .map(Json::of));
        return nested(leaves, 3);
    }

    private static Arbitrary<Json> nested(Arbitrary<Json> below, int depth) {
        if (depth == 0) {
            return below;
        }
        Arbitrary<Json> inner = nested(below, depth - 1);
        Arbitrary<String> names =
                Arbitraries.strings().withCharRange('a', 'z').ofMinLength(1).ofMaxLength(8);
        return Arbitraries.frequencyOf(
                net.jqwik.api.Tuple.of(3, below),
                net.jqwik.api.Tuple.of(1, inner.list().ofMaxSize(4).map(JsonArray::new)),
                net.jqwik.api.Tuple.of(
                        1, Arbitraries.maps(names, inner).ofMaxSize(4).map(map -> {
                            Map<String, Json> members = new TreeMap<>(map);
                            return JsonObject.of(members);
                        })));
    }

    /** Reads documents in tests. */
    private static final class JsonDocumentValues {
        static Json read(String text) throws ProblemException {
            return JsonDocument.read(text.getBytes(java.nio.charset.StandardCharsets.UTF_8))
                    .value();
        }
    }
}
