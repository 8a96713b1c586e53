package fringekeep.sample;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.catchThrowableOfType;

import fringekeep.archive.problem.Problem;
import fringekeep.archive.problem.ProblemException;
import java.util.Random;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.CsvSource;

class FormulaTest {
    @Test
    void countsAtomsOfNestedGroupsInOrderOfFirstMention() throws ProblemException {
        Formula formula = Formula.parse("(C8F17(CH2)2)4C20H10N4");

        assertThat(formula.terms())
                .containsExactly(
                        new Formula.Term("C", 0, 60),
                        new Formula.Term("F", 0, 68),
                        new Formula.Term("H", 0, 26),
                        new Formula.Term("N", 0, 4));
        assertThat(formula.charge()).isZero();
    }

    @Test
    void keepsIsotopesApartFromTheElementAsItComes() throws ProblemException {
        Formula formula = Formula.parse("[13C]2H5OH");

        assertThat(formula.terms())
                .containsExactly(
                        new Formula.Term("C", 13, 2), new Formula.Term("H", 0, 6), new Formula.Term("O", 0, 1));
    }

    @Test
    void readsDeuteriumAndTritiumAsIsotopesOfHydrogen() throws ProblemException {
        assertThat(Formula.parse("D2O").terms()).first().isEqualTo(new Formula.Term("H", 2, 2));
        assertThat(Formula.parse("T2").terms()).first().isEqualTo(new Formula.Term("H", 3, 2));
    }

    @ParameterizedTest
    @CsvSource({"C6H5O-,-1", "C60+,1", "Ca2+,1", "Ca++,2", "Ca^2+,2", "C60^10-,-10"})
    void readsTheChargeAtTheEnd(String text, int charge) throws ProblemException {
        assertThat(Formula.parse(text).charge()).isEqualTo(charge);
    }

    @ParameterizedTest
    @CsvSource({
        "c60, formula-character, 1",
        "C60x, formula-character, 4",
        "Xx2, formula-element-unknown, 1",
        "C(H2, formula-bracket-open, 5",
        "CH)2, formula-bracket-closed, 3",
        "C0, formula-count, 2",
        "C007, formula-count, 2",
        "C999999999, formula-count, 10",
        "[99C]2, formula-isotope-unknown, 1",
        "[13C2, formula-isotope-open, 5",
        "[C], formula-isotope-unknown, 1",
        "(), formula-empty, 2",
        "+, formula-empty, 2",
        "C+-, formula-charge, 3",
        "C^2, formula-charge, 4",
        "C+60, formula-charge, 3"
    })
    void saysWhatIsWrongAndInWhichColumn(String text, String code, String column) {
        ProblemException refused = catchThrowableOfType(ProblemException.class, () -> Formula.parse(text));

        Problem problem = refused.problems().get(0);
        assertThat(problem.code()).isEqualTo("sample." + code);
        assertThat(problem.what()).contains("column " + column).contains(text);
        assertThat(problem.mend()).isNotBlank();
    }

    @Test
    void refusesDeepNestingWithoutOverflow() {
        String deep = "(".repeat(500) + "C" + ")".repeat(500);

        assertThat(catchThrowableOfType(ProblemException.class, () -> Formula.parse(deep)))
                .isNotNull();
    }

    @Test
    void anyTextIsReadOrRefusedWithAProblem() {
        Random random = new Random(7);
        String alphabet = "CHONFe123[]()()+-^ 0Dé";
        int read = 0;
        for (int i = 0; i < 20_000; i++) {
            StringBuilder text = new StringBuilder();
            for (int j = random.nextInt(12); j >= 0; j--) {
                text.append(alphabet.charAt(random.nextInt(alphabet.length())));
            }
            try {
                assertThat(Formula.parse(text.toString()).terms()).isNotEmpty();
                read++;
            } catch (ProblemException e) {
                assertThat(e.problems()).hasSize(1);
            }
        }
        assertThat(read).isGreaterThan(500);
    }
}
