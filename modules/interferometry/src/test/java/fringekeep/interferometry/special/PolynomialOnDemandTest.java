package fringekeep.interferometry.special;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.assertThatIllegalArgumentException;

import java.util.Random;
import org.junit.jupiter.api.Test;

/** A table made on demand has the bits of one made at once; sums over Bessel functions those of their terms. */
class PolynomialOnDemandTest {
    private final PiecewisePolynomial whole = PiecewisePolynomial.of(x -> Bessel.j(2, x), 1.5, 0.5, 60);
    private final PolynomialOnDemand onDemand = new PolynomialOnDemand(x -> Bessel.j(2, x), 1.5, 0.5, 60);

    @Test
    void valuesAndDerivativesHaveTheBitsOfTheWholeTable() {
        Random random = new Random(2);
        double[] places = random.doubles(5000, 1.5, 31.5).toArray();
        places[0] = 1.5;
        places[1] = 31.5;
        double[] values = new double[places.length];
        double[] derivatives = new double[places.length];
        onDemand.curve(places, values, derivatives);
        double[] pair = new double[2];
        double[] wanted = new double[2];
        for (int k = 0; k < places.length; k++) {
            whole.valueAndDerivative(places[k], wanted);
            onDemand.valueAndDerivative(places[k], pair);
            assertThat(pair).containsExactly(wanted);
            assertThat(new double[] {values[k], derivatives[k]}).containsExactly(wanted);
            assertThat(onDemand.value(places[k])).isEqualTo(whole.value(places[k]));
        }
    }

    @Test
    void placesOutsideAreRefused() {
        assertThat(onDemand.end()).isEqualTo(31.5);
        assertThatIllegalArgumentException().isThrownBy(() -> onDemand.value(31.6));
        assertThatIllegalArgumentException().isThrownBy(() -> onDemand.value(1.4));
        assertThatIllegalArgumentException().isThrownBy(() -> onDemand.value(Double.NaN));
        assertThatIllegalArgumentException().isThrownBy(() -> new PolynomialOnDemand(x -> x, 0, 0, 1));
    }

    @Test
    void weightedSumsHaveTheBitsOfTheirTerms() {
        Random random = new Random(3);
        double[] weights = random.doubles(40, -1, 1).toArray();
        double[] factors = random.doubles(40, -2, 2).toArray();
        for (int order = -7; order <= 7; order++) {
            for (double x = -60; x < 60; x += 1.7) {
                double sum = 0;
                for (int q = 0; q < weights.length; q++) {
                    sum = Math.fma(weights[q], Bessel.j(order, factors[q] * x), sum);
                }
                assertThat(Bessel.weightedJ(order, weights, factors, x)).isEqualTo(sum);
            }
        }
    }
}
