package fringekeep.property;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.catchThrowableOfType;

import fringekeep.archive.NewRecord;
import fringekeep.archive.Regathering;
import fringekeep.archive.json.JsonObject;
import fringekeep.archive.problem.Problem;
import fringekeep.archive.problem.ProblemException;
import fringekeep.archive.record.Hash;
import fringekeep.archive.record.InputReference;
import java.nio.file.Path;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import org.junit.jupiter.api.AfterAll;
import org.junit.jupiter.api.BeforeAll;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.io.TempDir;

/** Rules over fits of a published power series: what they take, leave out, and give when run again. */
class SelectFitsTest {
    private static PropertyLab lab;
    private static PropertyLab.Series series;
    private static int tests;

    /** Each test has ten watts of its own. */
    private final int base = 10 * ++tests;

    @BeforeAll
    static void measure(@TempDir Path folder) throws Exception {
        lab = PropertyLab.found(folder.resolve("archive"));
        series = lab.series("vp_01");
    }

    @AfterAll
    static void close() {
        lab.close();
    }

    private Hash fit(int point) throws Exception {
        PropertyLab.Point at = series.points().get(point);
        return lab.fit(series, at, (base + at.power()) + " W");
    }

    private Hash select(double from, double below) throws Exception {
        return lab.select(base + from, base + below);
    }

    private Hash scanOf(Hash fit) {
        return lab.archive.inputs(fit).role("scan").get(0).target();
    }

    private RerunSelection.Difference again(Hash selection) throws ProblemException {
        return new RerunSelection(lab.archive).difference(selection);
    }

    @Test
    void takesWhatAnswersAndLeavesOutWhatIsWithdrawnWithTheJudgement() throws Exception {
        Hash low = fit(1);
        Hash middle = fit(2);
        fit(9);
        Hash judgement = lab.judge("withdrawn", "mode-hop", Map.of("target", scanOf(middle)));

        Hash selection = select(0.3, 1);

        assertThat(lab.archive.inputs(selection).role("taken"))
                .extracting(each -> each.target())
                .containsExactly(low);
        assertThat(lab.archive.inputs(selection).role("because"))
                .extracting(each -> each.target())
                .containsExactly(judgement);
        JsonObject left = lab.archive
                .record(selection)
                .orElseThrow()
                .content()
                .array("left")
                .objects()
                .get(0);
        assertThat(left.text("reason")).hasValue("withdrawn");
        assertThat(lab.archive.inputs(selection).about().get(0).target()).isEqualTo(middle);
    }

    @Test
    void nothingThatAnswersIsAProblem() throws Exception {
        fit(1);
        ProblemException thrown = catchThrowableOfType(ProblemException.class, () -> select(8, 9));
        assertThat(thrown.problems()).extracting(Problem::code).containsExactly("selection.nothing");
    }

    @Test
    void anUnchangedArchiveGivesTheSameListAgain() throws Exception {
        Hash one = fit(1);
        Hash two = fit(2);
        Hash selection = select(0, 1);

        RerunSelection.Difference difference = again(selection);

        assertThat(difference.none()).isTrue();
        assertThat(difference.byHand()).isFalse();
        assertThat(difference.still()).containsExactly(one, two);
    }

    @Test
    void whatCameAndWhatWentIsNamedWithItsReason() throws Exception {
        fit(1);
        Hash two = fit(2);
        Hash three = fit(3);
        Hash selection = select(0, 2);
        Hash judgement = lab.judge("withdrawn", "drift", Map.of("target", two));
        Hash later = fit(4);

        RerunSelection.Difference difference = again(selection);

        assertThat(difference.nowChosen())
                .containsExactly(new RerunSelection.Change(later, "recorded-since", Optional.empty()));
        assertThat(difference.noLonger())
                .containsExactly(new RerunSelection.Change(two, "withdrawn", Optional.of(judgement)));
        assertThat(difference.still()).contains(three);
    }

    @Test
    void whatWasWithdrawnAndIsRestoredIsChosenAgain() throws Exception {
        fit(1);
        Hash two = fit(2);
        Hash judgement = lab.judge("withdrawn", "drift", Map.of("target", two));
        Hash selection = select(0, 2);
        lab.judge("restored", "judged-in-error", Map.of("undoes", judgement));

        RerunSelection.Difference difference = again(selection);

        assertThat(difference.nowChosen())
                .containsExactly(new RerunSelection.Change(two, "was-left-out", Optional.of(judgement)));
        assertThat(difference.stillLeft()).isEmpty();
    }

    @Test
    void aPropertyLeadsToTheSelectionItRestsOn() throws Exception {
        for (PropertyLab.Point point : series.points()) {
            lab.fit(series, point, point.power() + " W");
        }
        Hash selection = lab.select(0, 9);
        Hash property = lab.property(selection, "{'bias':'none','heightNodes':1}");

        assertThat(new RerunSelection(lab.archive).selectionsOf(property)).containsExactly(selection);
        ProblemException thrown = catchThrowableOfType(ProblemException.class, () -> again(property));
        assertThat(thrown.problems()).extracting(Problem::code).containsExactly("selection.not-one");
    }

    @Test
    void theNextRevisionReplacesAndLeavesOut() throws Exception {
        Hash one = fit(1);
        Hash two = fit(2);
        Hash three = fit(3);
        Hash selection = select(0, 2);
        Hash replacement = fit(4);
        Hash judgement = lab.judge("withdrawn", "drift", Map.of("target", two));
        Regathering.StandIn standIn = new Regathering.StandIn() {
            @Override
            public Optional<Hash> of(Hash input) {
                if (input.equals(two)) {
                    return Optional.empty();
                }
                return Optional.of(input.equals(three) ? replacement : input);
            }

            @Override
            public List<Hash> because(Hash input) {
                return lab.archive.graph().judgements(input);
            }
        };

        NewRecord next = new SelectionRegathering()
                .regather(lab.archive, selection, standIn, List.of())
                .orElseThrow();

        assertThat(next.corrects()).hasValue(selection);
        assertThat(next.inputs())
                .containsExactly(
                        new InputReference.OfRecord("taken", one),
                        new InputReference.OfRecord("taken", replacement),
                        new InputReference.OfRecord("because", judgement));
        assertThat(next.about()).extracting(each -> each.record()).containsExactly(two);
    }
}
