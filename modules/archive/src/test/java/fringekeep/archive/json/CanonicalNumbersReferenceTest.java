package fringekeep.archive.json;

import static org.assertj.core.api.Assertions.assertThat;

import java.math.BigDecimal;
import java.math.MathContext;
import java.math.RoundingMode;
import java.util.List;
import java.util.Random;
import java.util.function.DoubleSupplier;
import java.util.regex.Pattern;
import org.junit.jupiter.api.Test;
import org.mozilla.javascript.Context;
import org.mozilla.javascript.Function;
import org.mozilla.javascript.Scriptable;

/** Canonical numbers against a JavaScript engine's JSON.stringify (Rhino 1.7.15). */
class CanonicalNumbersReferenceTest {
    private static final int NUMBERS = 100_000;
    private static final Pattern NO_FORM = Pattern.compile("^-?0\\.0{6}");

    @Test
    void randomBitPatternsAreWrittenAsTheEngineWritesThem() {
        Random random = new Random(8785);
        assertAgreement(() -> Double.longBitsToDouble(random.nextLong()));
    }

    @Test
    void shortDecimalsAreWrittenAsTheEngineWritesThem() {
        Random random = new Random(31);
        assertAgreement(() -> Double.parseDouble(random.nextInt(100_000) + "e" + random.nextInt(-330, 300)));
    }

    /** The engine writes some numbers below the normal range in a form ECMAScript does not have; those are not judged here. */
    @Test
    void subnormalNumbersAreWrittenAsTheEngineWritesThem() {
        Random random = new Random(324);
        assertAgreement(() -> Double.longBitsToDouble(random.nextLong() >>> (12 + random.nextInt(52))));
    }

    /** ECMAScript, Number::toString: as few digits as possible. So no decimal with one digit less reads back. */
    @Test
    void noShorterDecimalReadsBack() {
        Random random = new Random(5);
        for (int i = 0; i < NUMBERS; i++) {
            int shift = i % 2 == 0 ? 1 : 12 + random.nextInt(52);
            double number = Double.longBitsToDouble(random.nextLong() >>> shift);
            if (Double.isFinite(number) && number > 0) {
                BigDecimal written = new BigDecimal(EcmaScriptNumber.write(number)).stripTrailingZeros();
                assertThat(written.doubleValue()).isEqualTo(number);
                for (RoundingMode mode : List.of(RoundingMode.DOWN, RoundingMode.UP)) {
                    if (written.precision() > 1) {
                        BigDecimal shorter = written.round(new MathContext(written.precision() - 1, mode));
                        assertThat(shorter.doubleValue()).as("%s", written).isNotEqualTo(number);
                    }
                }
            }
        }
    }

    private static void assertAgreement(DoubleSupplier numbers) {
        try (Context context = Context.enter()) {
            Scriptable scope = context.initStandardObjects();
            Function stringify =
                    context.compileFunction(scope, "function(x){return JSON.stringify(x);}", "judge", 1, null);
            int compared = 0;
            for (int i = 0; i < NUMBERS; i++) {
                double number = numbers.getAsDouble();
                if (Double.isFinite(number)) {
                    String judged = stringify
                            .call(context, scope, scope, new Object[] {number})
                            .toString();
                    if (!NO_FORM.matcher(judged).find()) {
                        assertThat(EcmaScriptNumber.write(number)).isEqualTo(judged);
                        compared++;
                    }
                }
            }
            assertThat(compared).isGreaterThan(NUMBERS / 2);
        }
    }
}
