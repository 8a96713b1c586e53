package fringekeep.audit;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.assertThatThrownBy;

import fringekeep.archive.NewRecord;
import fringekeep.archive.json.JsonObject;
import fringekeep.archive.lineage.Recomputed.Verdict;
import fringekeep.archive.problem.StoppedException;
import fringekeep.archive.problem.Work;
import fringekeep.archive.record.Hash;
import fringekeep.archive.record.KindName;
import fringekeep.archive.record.PartName;
import java.nio.file.Path;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import org.junit.jupiter.api.AfterAll;
import org.junit.jupiter.api.BeforeAll;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.io.TempDir;

/** Chains recomputed through, some with a link whose recorded result is not what its inputs give. */
class ThroughTest {
    @TempDir
    private static Path folder;

    private static SmallArchive small;

    @BeforeAll
    static void found() throws Exception {
        small = SmallArchive.found(folder.resolve("archive"));
    }

    @AfterAll
    static void close() {
        small.archive().close();
    }

    private static Hash reading(double number) throws Exception {
        return small.reading(number, Optional.empty());
    }

    private static Hash total(Hash... terms) throws Exception {
        return small.total(List.of(terms).stream().map(SmallArchive::term).toList());
    }

    /** A total whose recorded sum is given, not computed: what a tampered or mistaken link looks like. */
    private static Hash claimed(double sum, String method, Hash... terms) throws Exception {
        JsonObject result =
                JsonObject.EMPTY.with("sum", JsonObject.EMPTY.with("value", sum).with("u", 0.5));
        return small.archive()
                .record(new NewRecord(
                        new KindName("total"),
                        List.of(terms).stream().map(SmallArchive::term).toList(),
                        List.of(),
                        Map.of(PartName.CHOICES, JsonObject.EMPTY.with("method", method), PartName.RESULT, result),
                        List.of(),
                        Optional.empty(),
                        Optional.empty(),
                        Optional.empty()))
                .fingerprint();
    }

    private static Through.Answer through(Hash target) throws Exception {
        return Through.upstreamOf(small.archive(), List.of(target), Work.QUIET)
                .answers()
                .get(0);
    }

    private static Verdict byItself(Hash target) throws Exception {
        return Recompute.upstreamOf(small.archive(), List.of(target), Work.QUIET).records().stream()
                .filter(each -> each.record().equals(target))
                .findFirst()
                .orElseThrow()
                .verdict();
    }

    @Test
    void anHonestChainFollowsBitByBit() throws Exception {
        Hash top = total(total(reading(0.1), reading(0.2)), reading(0.3));

        Through.Answer answer = through(top);

        assertThat(answer.follows()).isEqualTo(Through.Follows.SAME_BITS);
        assertThat(answer.beginnings()).isEmpty();
        assertThat(answer.taken()).isEmpty();
        assertThat(answer.values()).map(ValueVerdict::pointer).containsExactly("/sum/u", "/sum/value");
        assertThat(answer.values()).allMatch(value -> value.verdict() == Verdict.SAME_BITS && value.units() == 0);
    }

    @Test
    void aFalseLinkBelowIsSeenAtTheTopAlthoughTheTopFollowsFromIt() throws Exception {
        Hash false15 = claimed(16, "total.sum/1", reading(10), reading(5));
        Hash middle = total(false15, reading(1));
        Hash top = total(middle);

        Through.Answer answer = through(top);

        assertThat(byItself(top)).isEqualTo(Verdict.SAME_BITS);
        assertThat(answer.follows()).isEqualTo(Through.Follows.NO);
        assertThat(answer.beginnings()).containsExactly(false15);
        ValueVerdict value = answer.values().stream()
                .filter(each -> each.pointer().equals("/sum/value"))
                .findFirst()
                .orElseThrow();
        assertThat(value.kept()).isEqualTo("17");
        assertThat(value.now()).isEqualTo("16");
        assertThat(value.verdict()).isEqualTo(Verdict.DIFFERS);
        assertThat(value.change()).hasValue(-1);
        assertThat(value.inDeviations()).hasValue(-2);
    }

    @Test
    void oneUnitInTheLastPlaceBelowIsCarriedUp() throws Exception {
        Hash perturbed = claimed(Math.nextUp(0.1 + 0.2), "total.sum/1", reading(0.1), reading(0.2));

        Through.Answer answer = through(total(perturbed));

        assertThat(answer.follows()).isEqualTo(Through.Follows.WITHIN_ROUNDING);
        assertThat(answer.beginnings()).containsExactly(perturbed);
        assertThat(through(perturbed).values())
                .filteredOn(each -> each.pointer().equals("/sum/value"))
                .singleElement()
                .satisfies(each -> {
                    assertThat(each.units()).isEqualTo(1);
                    assertThat(each.verdict()).isEqualTo(Verdict.LAST_PLACES);
                });
    }

    @Test
    void whatRestsOnARetiredMethodCannotBeDecided() throws Exception {
        Hash retired = claimed(3, "total.abacus/1", reading(1), reading(2));

        Through.Answer answer = through(total(retired));

        assertThat(answer.follows()).isEqualTo(Through.Follows.UNDECIDED);
        assertThat(answer.taken()).containsExactly(retired);
        assertThat(through(reading(4)).follows()).isEqualTo(Through.Follows.ENTERED);
    }

    @Test
    void feedingRecordsNothingAndStopsWhenAsked() throws Exception {
        Hash top = total(claimed(9, "total.sum/1", reading(1)));
        Hash before = small.archive().journalHead();
        Work stopping = new Work() {
            @Override
            public void progress(long done, long total, String what) {
                // not shown
            }

            @Override
            public boolean stopped() {
                return true;
            }
        };

        through(top);

        assertThat(small.archive().journalHead()).isEqualTo(before);
        assertThatThrownBy(() -> Through.upstreamOf(small.archive(), List.of(top), stopping))
                .isInstanceOf(StoppedException.class);
    }
}
