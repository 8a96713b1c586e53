package fringekeep.archive.making;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.assertThatThrownBy;

import fringekeep.archive.RecordVectors;
import fringekeep.archive.json.JsonObject;
import fringekeep.archive.kind.Inputs;
import fringekeep.archive.kind.Kinds;
import fringekeep.archive.kind.Parts;
import fringekeep.archive.kind.RecordKind;
import fringekeep.archive.kind.RecordView;
import fringekeep.archive.kind.Role;
import fringekeep.archive.kind.Title;
import fringekeep.archive.listing.Projection;
import fringekeep.archive.listing.Row;
import fringekeep.archive.problem.Problem;
import fringekeep.archive.problem.ProblemException;
import fringekeep.archive.record.Hash;
import fringekeep.archive.record.KindName;
import fringekeep.archive.record.PartName;
import java.util.List;
import java.util.Optional;
import java.util.Set;
import java.util.stream.Stream;
import org.junit.jupiter.api.Test;

/** The golden records as they are seen from a source of bytes. */
class ResolverTest {
    private static MemorySource goldenSource() {
        MemorySource source = new MemorySource();
        RecordVectors.ofForm("head/1").values().forEach(source::addHead);
        RecordVectors.ofForm("part/1").values().forEach(source::addPart);
        source.addRaw(RecordVectors.bytes(RecordVectors.RAW));
        source.addPayload(RecordVectors.bytes(RecordVectors.TABLE));
        return source;
    }

    @Test
    void recordsOfUnknownKindsAreServedAsStored() throws Exception {
        Resolver resolver = new Resolver(new Kinds(List.of()), goldenSource());
        RecordView scan = resolver.record(RecordVectors.SCAN).orElseThrow();

        assertThat(scan.head().kind()).isEqualTo(new KindName("scan"));
        assertThat(scan.result().integer("rows")).hasValue(4);
        assertThat(scan.payload("table")).isEqualTo(RecordVectors.bytes(RecordVectors.TABLE));
        assertThat(resolver.kind(scan)).isEmpty();
        assertThat(resolver.facet(RecordVectors.SCAN, String.class)).isEmpty();
    }

    @Test
    void inputsAreFollowedToTheRawFile() throws Exception {
        Inputs inputs = new Resolver(new Kinds(List.of()), goldenSource()).inputs(RecordVectors.FIT);

        assertThat(inputs.all()).hasSize(6);
        assertThat(inputs.role("scan").get(0).channel()).contains("counts");
        assertThat(inputs.role("scan").get(0).inputs().role("raw").get(0).rawBytes())
                .hasValueSatisfying(bytes -> assertThat(bytes).hasSize(51));
        assertThat(inputs.role("placement")
                        .get(0)
                        .inputs()
                        .about("setup")
                        .get(0)
                        .target())
                .isEqualTo(RecordVectors.SETUP);
    }

    @Test
    void aPartThatIsNotAtHandIsWithheld() {
        MemorySource source = new MemorySource();
        source.addHead(RecordVectors.bytes(RecordVectors.COMPOUND));
        RecordView compound = new Resolver(new Kinds(List.of()), source)
                .record(RecordVectors.COMPOUND)
                .orElseThrow();

        assertThat(compound.part(PartName.IDENTITY)).isEmpty();
        assertThat(compound.withheld(PartName.IDENTITY)).isTrue();
        assertThat(compound.withheld(PartName.REMARK)).isFalse();
    }

    @Test
    void aPayloadThatIsMissingIsNamed() {
        MemorySource source = new MemorySource();
        source.addHead(RecordVectors.bytes(RecordVectors.SCAN));
        RecordView scan = new Resolver(new Kinds(List.of()), source)
                .record(RecordVectors.SCAN)
                .orElseThrow();

        assertThatThrownBy(() -> scan.payload("table"))
                .isInstanceOfSatisfying(
                        ProblemException.class,
                        e -> assertThat(e.problems().get(0).code()).isEqualTo("record.payload-missing"));
        assertThatThrownBy(() -> scan.payload("other"))
                .isInstanceOfSatisfying(
                        ProblemException.class,
                        e -> assertThat(e.problems().get(0).code()).isEqualTo("record.payload-unknown"));
    }

    @Test
    void brokenBytesAreNeverServed() {
        MemorySource source = new MemorySource();
        Hash broken = source.addHead("{\"fringekeep\":\"head/1\"}".getBytes(java.nio.charset.StandardCharsets.UTF_8));
        Hash part = source.addHead(
                RecordVectors.ofForm("part/1").values().iterator().next());
        Resolver resolver = new Resolver(new Kinds(List.of()), source);

        assertThatThrownBy(() -> resolver.record(broken)).isInstanceOf(IllegalStateException.class);
        assertThatThrownBy(() -> resolver.record(part)).isInstanceOf(IllegalStateException.class);
    }

    @Test
    void olderSchemasAreLiftedStepByStepInMemory() {
        Resolver resolver = new Resolver(new Kinds(List.of(new Batch(3))), goldenSource());
        RecordView batch = resolver.record(RecordVectors.BATCH).orElseThrow();

        assertThat(batch.content().text("label")).contains("DC-1");
        assertThat(batch.content().number("lifted2")).hasValue(1);
        assertThat(batch.content().number("lifted3")).hasValue(2);
        assertThat(resolver.facet(RecordVectors.BATCH, String.class)).contains("DC-1");
    }

    @Test
    void aKindIsNotAskedAboutSchemasNewerThanItself() {
        MemorySource source = goldenSource();
        DetachedRecords newer = new DetachedRecords(new Batch(3));
        Hash hash;
        try {
            hash = newer.enter("batch", JsonObject.EMPTY.with("label", "new"));
        } catch (ProblemException e) {
            throw new AssertionError(e.problems().toString(), e);
        }
        Resolver older =
                new Resolver(new Kinds(List.of(new Batch(2))), newer.source().or(source));

        assertThat(older.record(hash).orElseThrow().content().text("label")).contains("new");
        assertThat(older.kind(older.record(hash).orElseThrow())).isEmpty();
        assertThat(older.facet(hash, String.class)).isEmpty();
    }

    @Test
    void aSecondSourceIsAskedForWhatTheFirstLacks() throws Exception {
        MemorySource first = new MemorySource();
        Hash raw = first.addRaw(new byte[] {1, 2, 3});
        Resolver resolver = new Resolver(new Kinds(List.of()), goldenSource()).before(first);

        assertThat(resolver.source().rawLength(raw)).hasValue(3);
        assertThat(resolver.source().rawLength(RecordVectors.RAW)).hasValue(51);
        assertThat(resolver.record(RecordVectors.FIT)).isPresent();
        assertThat(resolver.record(raw)).isEmpty();
    }

    /** A kind that has seen several schema numbers. */
    private record Batch(int schema) implements RecordKind {
        @Override
        public KindName kind() {
            return new KindName("batch");
        }

        @Override
        public JsonObject jsonSchema(int number) {
            return JsonObject.EMPTY.with("type", "object");
        }

        @Override
        public JsonObject lift(PartName part, int number, JsonObject value) {
            return part == PartName.CONTENT ? value.with("lifted" + (number + 1), number) : value;
        }

        @Override
        public Set<PartName> sealedParts() {
            return Set.of();
        }

        @Override
        public List<Role> inputRoles() {
            return List.of();
        }

        @Override
        public List<Role> aboutRoles() {
            return List.of(Role.anyKind("compound", 0, 9));
        }

        @Override
        public List<Problem> examine(Parts parts, Inputs inputs) {
            return List.of();
        }

        @Override
        public <T> Optional<T> facet(Class<T> facet, RecordView record, Inputs inputs) {
            return facet == String.class ? record.content().text("label").map(facet::cast) : Optional.empty();
        }

        @Override
        public List<Projection> projections() {
            return List.of();
        }

        @Override
        public Stream<Row> rows(Projection projection, RecordView record, Inputs inputs) {
            return Stream.empty();
        }

        @Override
        public Title title(RecordView record, Inputs inputs) {
            return new Title("batch", "");
        }
    }
}
