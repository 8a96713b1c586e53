package fringekeep.archive.internal.store;

import static fringekeep.archive.internal.store.Filled.content;
import static fringekeep.archive.internal.store.Filled.correcting;
import static fringekeep.archive.internal.store.Filled.labelled;
import static fringekeep.archive.internal.store.Filled.thing;
import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.assertThatThrownBy;

import fringekeep.archive.Archive;
import fringekeep.archive.KindCount;
import fringekeep.archive.Prepared;
import fringekeep.archive.Scope;
import fringekeep.archive.json.JsonObject;
import fringekeep.archive.listing.Listing;
import fringekeep.archive.listing.Listing.Comparison;
import fringekeep.archive.listing.Listing.Filter;
import fringekeep.archive.listing.Page;
import fringekeep.archive.problem.ProblemException;
import fringekeep.archive.problem.Work;
import fringekeep.archive.record.Hash;
import java.nio.file.Path;
import java.time.Instant;
import java.util.ArrayList;
import java.util.List;
import java.util.Optional;
import org.junit.jupiter.api.AfterAll;
import org.junit.jupiter.api.BeforeAll;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.TestInstance;
import org.junit.jupiter.api.io.TempDir;

/** Lists against a plain computation over the same records. */
@TestInstance(TestInstance.Lifecycle.PER_CLASS)
class ListingTest {
    private static final int COMPOUNDS = 60;

    @TempDir
    private static Path folder;

    private Archive archive;
    private final List<Hash> compounds = new ArrayList<>();
    private Hash run;
    private Hash scan;

    @BeforeAll
    void found() throws Exception {
        Script script = new Script();
        archive = Filled.found(folder.resolve("archive"), script);
        List<Prepared> prepared = new ArrayList<>();
        for (int i = 0; i < COMPOUNDS; i++) {
            JsonObject value = JsonObject.EMPTY.with("label", "cage " + i % 7).with("count", i);
            prepared.add(archive.prepare(
                    content("compound", i % 3 == 0 ? value : value.with("size", i % 5)), List.of()));
        }
        archive.record(prepared).forEach(one -> compounds.add(one.fingerprint()));
        Hash batch = archive.record(labelled("batch", "ﬁne powder", thing("compound", compounds.get(0))))
                .fingerprint();
        run = archive.record(labelled("source-run", "hot", thing("batch", batch)))
                .fingerprint();
        scan = archive.record(labelled("scan", "Übersicht")).fingerprint();
        archive.record(labelled("placement", "signal", thing("scan", scan), thing("run", run)));
        script.at("2031-05-15T09:00:00Z");
        archive.record(correcting(labelled("compound", "cage mended"), compounds.get(59)));
    }

    @AfterAll
    void close() {
        archive.close();
    }

    private List<Page.Line> all(Listing first) throws ProblemException {
        List<Page.Line> lines = new ArrayList<>();
        Listing listing = first;
        while (true) {
            Page page = archive.list(listing);
            lines.addAll(page.rows());
            if (page.last().isEmpty()) {
                return lines;
            }
            listing = new Listing(
                    first.projection(),
                    first.filters(),
                    first.currentOnly(),
                    first.words(),
                    first.linkedWith(),
                    first.orderBy(),
                    first.descending(),
                    page.last(),
                    first.limit());
        }
    }

    private static Listing listing(List<Filter> filters, boolean currentOnly, String orderBy, boolean descending) {
        return new Listing(
                "compound_list",
                filters,
                currentOnly,
                List.of(),
                Optional.empty(),
                orderBy,
                descending,
                Optional.empty(),
                7);
    }

    @Test
    void newestFirstPageByPageShowsEveryCurrentRecordOnce() throws Exception {
        List<Page.Line> lines = all(listing(List.of(), true, "n", true));

        assertThat(lines).hasSize(COMPOUNDS);
        assertThat(lines.get(0).label()).isEqualTo("compound 0060 b");
        assertThat(lines.stream().map(Page.Line::n)).isSortedAccordingTo((a, b) -> Long.compare(b, a));
        assertThat(lines.stream().map(Page.Line::record)).doesNotContain(compounds.get(59));
    }

    @Test
    void oldestFirstWithCorrectedOnesShowsThemAll() throws Exception {
        List<Page.Line> lines = all(listing(List.of(), false, "n", false));

        assertThat(lines).hasSize(COMPOUNDS + 1);
        assertThat(lines.stream().map(Page.Line::record).limit(COMPOUNDS)).containsExactlyElementsOf(compounds);
    }

    @Test
    void orderByAColumnHasAbsentValuesLastEitherWay() throws Exception {
        for (boolean descending : new boolean[] {false, true}) {
            List<Page.Line> lines = all(listing(List.of(), false, "size_m", descending));

            List<Optional<Object>> sizes = lines.stream()
                    .map(line -> Optional.ofNullable(line.row().values().get("size_m")))
                    .toList();
            int present = (int) sizes.stream().filter(Optional::isPresent).count();
            assertThat(lines).hasSize(COMPOUNDS + 1).doesNotHaveDuplicates();
            assertThat(sizes.subList(0, present)).allMatch(Optional::isPresent);
            assertThat(sizes.subList(0, present).stream().map(size -> (Double) size.orElseThrow()))
                    .isSortedAccordingTo((a, b) -> descending ? b.compareTo(a) : a.compareTo(b));
        }
    }

    @Test
    void filtersHoldTogether() throws Exception {
        List<Page.Line> lines = all(listing(
                List.of(
                        new Filter("label", Comparison.IS, "cage 2"),
                        new Filter("count", Comparison.AT_LEAST, 10L),
                        new Filter("count", Comparison.BELOW, 40L)),
                true,
                "n",
                true));

        assertThat(lines.stream().map(line -> line.row().values().get("count"))).containsExactly(37L, 30L, 23L, 16L);
        assertThat(all(listing(List.of(new Filter("size_m", Comparison.ABSENT, "")), false, "n", true)))
                .hasSize(COMPOUNDS / 3 + 1);
        assertThat(all(listing(List.of(new Filter("size_m", Comparison.IS_NOT, 1.0)), false, "n", true)))
                .allMatch(
                        line -> !Double.valueOf(1.0).equals(line.row().values().get("size_m")));
    }

    @Test
    void wordsAreFoundByTheirBeginningInCompatibilityForm() throws Exception {
        assertThat(words("batch_list", "FINE")).hasSize(1);
        assertThat(words("batch_list", "fi pow")).hasSize(1);
        assertThat(words("scan_list", "über")).extracting(Page.Line::record).containsExactly(scan);
        assertThat(words("scan_list", "sicht")).isEmpty();
    }

    private List<Page.Line> words(String projection, String words) throws ProblemException {
        return archive.list(new Listing(
                        projection, List.of(), true, List.of(words), Optional.empty(), "n", true, Optional.empty(), 50))
                .rows();
    }

    @Test
    void linksReachFromACompoundToTheScansPlacedInItsRunsAndBack() throws Exception {
        assertThat(linked("scan_list", compounds.get(0))).containsExactly(scan);
        assertThat(linked("compound_list", scan)).containsExactly(compounds.get(0));
        assertThat(linked("scan_list", compounds.get(1))).isEmpty();
        assertThat(linked("source_run_list", scan)).containsExactly(run);
    }

    private List<Hash> linked(String projection, Hash with) throws ProblemException {
        Listing listing =
                new Listing(projection, List.of(), true, List.of(), Optional.of(with), "n", true, Optional.empty(), 50);
        return archive.list(listing).rows().stream().map(Page.Line::record).toList();
    }

    @Test
    void countsByScopeAgreeWithTheRecords() {
        assertThat(archive.counts()).containsEntry("compound", (long) COMPOUNDS).containsEntry("scan", 1L);
        assertThat(archive.counts(new Scope.Everything()))
                .containsEntry("compound", new KindCount(COMPOUNDS, 1, 0, 0, 0));
        assertThat(archive.counts(new Scope.LinkedWith(scan)))
                .containsEntry("compound", new KindCount(1, 0, 0, 0, 0))
                .containsEntry("placement", new KindCount(1, 0, 0, 0, 0));
        assertThat(archive.counts(
                        new Scope.Times(Instant.parse("2031-05-15T00:00:00Z"), Instant.parse("2031-05-16T00:00:00Z"))))
                .containsOnlyKeys("compound");
        assertThat(archive.counts(new Scope.Records(List.of(scan, run)))).containsOnlyKeys("scan", "source-run");
        assertThat(archive.counts(new Scope.Entries(2, 11))).containsOnlyKeys("compound");
    }

    @Test
    void theJournalInShortSaysWhatHappenedWhen() {
        assertThat(archive.journalLines(1, 1).get(0).act()).isEqualTo("founded");
        assertThat(archive.journalLines(Instant.parse("2031-05-15T00:00:00Z"), Instant.parse("2031-05-16T00:00:00Z")))
                .hasSize(1)
                .allMatch(line -> line.act().equals("recorded") && line.record().isPresent());
    }

    @Test
    void rebuiltListsSayTheSame() throws Exception {
        List<Page.Line> before = all(listing(List.of(), false, "label", false));

        archive.rebuildProjections(Work.QUIET);
        archive.rebuildProjections(Work.QUIET);

        assertThat(all(listing(List.of(), false, "label", false))).isEqualTo(before);
        assertThat(archive.check(Work.QUIET)).isEmpty();
    }

    @Test
    void unknownListsColumnsAndValuesAreNamed() {
        assertThatThrownBy(() -> archive.list(Listing.newest("nothing", 5)))
                .isInstanceOfSatisfying(
                        ProblemException.class,
                        e -> assertThat(e.problems().get(0).code()).isEqualTo("listing.projection"));
        assertThatThrownBy(() -> archive.list(listing(List.of(), true, "weight", true)))
                .isInstanceOfSatisfying(
                        ProblemException.class,
                        e -> assertThat(e.problems().get(0).code()).isEqualTo("listing.column"));
        Filter wrong = new Filter("count", Comparison.IS, "many");
        assertThatThrownBy(() -> archive.list(listing(List.of(wrong), true, "n", true)))
                .isInstanceOfSatisfying(
                        ProblemException.class,
                        e -> assertThat(e.problems().get(0).code()).isEqualTo("listing.value"));
    }
}
