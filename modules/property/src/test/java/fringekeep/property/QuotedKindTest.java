package fringekeep.property;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.catchThrowableOfType;
import static org.assertj.core.api.Assertions.within;

import fringekeep.archive.facet.Estimates;
import fringekeep.archive.problem.Problem;
import fringekeep.archive.problem.ProblemException;
import fringekeep.archive.record.Hash;
import fringekeep.archive.record.KindName;
import java.nio.file.Path;
import org.junit.jupiter.api.AfterAll;
import org.junit.jupiter.api.BeforeAll;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.io.TempDir;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.CsvSource;

/** Values from elsewhere, entered as they are printed there. */
class QuotedKindTest {
    private static PropertyLab lab;

    @BeforeAll
    static void found(@TempDir Path folder) throws Exception {
        lab = PropertyLab.found(folder.resolve("archive"));
    }

    @AfterAll
    static void close() {
        lab.close();
    }

    private Hash quoted(String what, String quantity) throws Exception {
        return lab.enter(
                "quoted",
                "{'kind':'quoted','content':{'what':'" + what + "','of':'caesium','quantity':'" + quantity
                        + "','how':'measured','source':'arXiv:1509.07091'}}");
    }

    private Estimates offered(Hash record) {
        return lab.archive
                .kinds()
                .get(new KindName("quoted"))
                .orElseThrow()
                .facet(Estimates.class, lab.archive.record(record).orElseThrow(), lab.archive.inputs(record))
                .orElseThrow();
    }

    /** Polarizability volumes as printed in the abstract of arXiv:1509.07091; the uncertainties here are made up. */
    @ParameterizedTest
    @CsvSource({"59.45(9) Ao3, 59.45e-30, 0.09e-30", "47.44(8) Ao3, 47.44e-30, 0.08e-30"})
    void offersValueAndUncertaintyInSi(String printed, double value, double u) throws Exception {
        Estimates offered = offered(quoted("polarizability-volume", printed));

        assertThat(offered.names()).containsExactly("polarizability-volume");
        assertThat(offered.units()).containsExactly("m3");
        assertThat(offered.values()[0]).isCloseTo(value, within(1e-15 * value));
        assertThat(Math.sqrt(offered.covariance(0, 0))).isCloseTo(u, within(1e-12 * u));
    }

    @Test
    void anUncertaintyThatIsNotStatedIsNeverZero() throws Exception {
        assertThat(offered(quoted("dipole-moment", "1e-30 C.m")).covariance(0, 0))
                .isNaN();
        assertThat(offered(quoted("visibility", "0.5 exact")).covariance(0, 0)).isZero();
    }

    @Test
    void aUnitOfAnotherDimensionIsRefused() {
        ProblemException thrown =
                catchThrowableOfType(ProblemException.class, () -> quoted("polarizability-volume", "59.4(1) nm"));

        assertThat(thrown.problems()).extracting(Problem::code).containsExactly("quoted.unit");
        assertThat(thrown.problems().get(0).mend()).contains("m3");
    }
}
