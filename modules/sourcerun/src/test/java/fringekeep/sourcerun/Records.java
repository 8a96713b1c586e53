package fringekeep.sourcerun;

import fringekeep.archive.json.JsonDocument;
import fringekeep.archive.json.JsonObject;
import fringekeep.archive.kind.Input;
import fringekeep.archive.kind.Inputs;
import fringekeep.archive.kind.NewPayload;
import fringekeep.archive.kind.Parts;
import fringekeep.archive.kind.RecordView;
import fringekeep.archive.kind.Subject;
import fringekeep.archive.problem.Problem;
import fringekeep.archive.problem.ProblemException;
import fringekeep.archive.record.Hash;
import fringekeep.archive.record.Head;
import fringekeep.archive.record.KindName;
import fringekeep.archive.record.PartName;
import fringekeep.archive.record.ThingId;
import java.io.IOException;
import java.nio.charset.StandardCharsets;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.EnumMap;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import java.util.TreeMap;

/** Records, inputs and documents for tests, without an archive. */
final class Records {
    static final Inputs NO_INPUTS = inputs(List.of(), List.of());

    private Records() {}

    static JsonObject json(String text) {
        try {
            return (JsonObject) JsonDocument.read(text.getBytes(StandardCharsets.UTF_8), 1 << 24, 64)
                    .value();
        } catch (ProblemException e) {
            throw new AssertionError(e.problems().toString(), e);
        }
    }

    /** The value of a golden part. */
    static JsonObject golden(String name) throws IOException {
        return json(Files.readString(Path.of("src/test/reference/record-format-1", name + ".json")))
                .object("value")
                .orElseThrow();
    }

    static Parts parts(Object... namesAndValues) {
        Map<PartName, JsonObject> parts = new EnumMap<>(PartName.class);
        for (int i = 0; i < namesAndValues.length; i += 2) {
            parts.put((PartName) namesAndValues[i], (JsonObject) namesAndValues[i + 1]);
        }
        return new Parts(parts);
    }

    static Inputs inputs(List<Input> inputs, List<Subject> about) {
        return new Inputs() {
            @Override
            public List<Input> all() {
                return inputs;
            }

            @Override
            public List<Subject> about() {
                return about;
            }
        };
    }

    static RecordView record(String kind, Parts parts) {
        return record(kind, parts, List.of());
    }

    static RecordView record(String kind, Parts parts, List<NewPayload> payloads) {
        Head head = new Head(
                new KindName(kind),
                1,
                new ThingId("0123456789abcdef0123456789abcdef"),
                List.of(),
                List.of(),
                List.of(),
                new TreeMap<>(),
                new TreeMap<>(),
                Optional.empty(),
                Optional.empty());
        return new RecordView() {
            @Override
            public Hash fingerprint() {
                return Hash.of(kind.getBytes(StandardCharsets.UTF_8));
            }

            @Override
            public Head head() {
                return head;
            }

            @Override
            public Optional<JsonObject> part(PartName name) {
                return parts.get(name);
            }

            @Override
            public boolean withheld(PartName name) {
                return false;
            }

            @Override
            public byte[] payload(String name) throws ProblemException {
                for (NewPayload payload : payloads) {
                    if (payload.name().equals(name)) {
                        return payload.bytes();
                    }
                }
                throw new ProblemException(new Problem("payload", "no payload " + name, "", ""));
            }
        };
    }

    /** A raw file as input. */
    static Input raw(String role, byte[] bytes) {
        return input(role, 0, Optional.of(bytes), Optional.empty());
    }

    /** A record that offers one facet as input. */
    static Input offering(String role, int position, Object offered) {
        return input(role, position, Optional.empty(), Optional.of(offered));
    }

    private static Input input(String role, int position, Optional<byte[]> bytes, Optional<Object> offered) {
        return new Input() {
            @Override
            public int position() {
                return position;
            }

            @Override
            public String role() {
                return role;
            }

            @Override
            public Optional<String> channel() {
                return Optional.empty();
            }

            @Override
            public Hash target() {
                return Hash.of(bytes.orElse(role.getBytes(StandardCharsets.UTF_8)));
            }

            @Override
            public boolean raw() {
                return bytes.isPresent();
            }

            @Override
            public Optional<RecordView> record() {
                return Optional.empty();
            }

            @Override
            public Optional<byte[]> rawBytes() {
                return bytes.map(byte[]::clone);
            }

            @Override
            public Inputs inputs() {
                return NO_INPUTS;
            }

            @Override
            public <T> Optional<T> facet(Class<T> facet) {
                return offered.filter(facet::isInstance).map(facet::cast);
            }
        };
    }
}
