package fringekeep.interferometry.fringe;

import static org.assertj.core.api.Assertions.assertThat;

import java.nio.ByteBuffer;
import java.nio.charset.StandardCharsets;
import java.security.MessageDigest;
import java.security.NoSuchAlgorithmException;
import java.util.HexFormat;
import java.util.List;
import java.util.Random;
import org.junit.jupiter.api.Test;

/**
 * Our own earlier bits: a hash over 1,500 scans fitted in every way must be the same on every machine, JDK and thread
 * count. A change of it is a change of recorded results and needs a new method number.
 */
class FringeDeterminismRegressionTest {
    private static final String RECORDED = "a2c13e2d979cf75cbc4061347bbc5bc11f368e745db57b38ce63108715db9e1e";

    private static List<FringeOptions> ways() {
        FringeOptions options = FringeOptions.atPeriod(1);
        return List.of(
                options,
                options.covariance(CovarianceSort.OBSERVED),
                options.estimator(Estimator.UNWEIGHTED),
                options.estimator(Estimator.WEIGHTED),
                options.background(Background.JOINT),
                options.background(Background.ESTIMATED).driftOrder(2),
                options.secondHarmonic(true).phaseDrift(true),
                options.periodFree(true).driftOrder(1));
    }

    @Test
    void hashOfALargeResultSetIsTheRecordedOne() throws NoSuchAlgorithmException {
        MessageDigest digest = MessageDigest.getInstance("SHA-256");
        Random random = new Random(20310514);
        for (int k = 0; k < 1500; k++) {
            double mean = 2 + 3 * (k % 200);
            FringeData data = SimulatedScans.scan(random, 12 + k % 30, mean, 0.009 * (k % 100), k, 1, 0)
                    .dark(new double[] {k % 7, k % 5}, new double[] {2, 3});
            FringeOptions way = ways().get(k % ways().size());
            FringeOutcome outcome = FringeFitter.fit(data, way);
            if (outcome instanceof FringeFailure failure) {
                digest.update(failure.reason().name().getBytes(StandardCharsets.UTF_8));
                continue;
            }
            FringeFit fit = outcome.orThrow();
            add(digest, fit.values());
            add(digest, fit.covariance());
            FringeGoodness goodness = fit.goodness();
            add(digest, fit.deviance(), goodness.pValue(), goodness.runs().pValue());
            if (k % 10 == 0) {
                fit.visibilityInterval(0.6827).ifPresent(i -> add(digest, i.low(), i.high()));
                fit.phaseInterval(0.9545).ifPresent(i -> add(digest, i.low(), i.high()));
                fit.upperLimit(0.95).ifPresent(limit -> add(digest, limit.value()));
            }
        }

        assertThat(HexFormat.of().formatHex(digest.digest())).isEqualTo(RECORDED);
    }

    private static void add(MessageDigest digest, double... values) {
        ByteBuffer buffer = ByteBuffer.allocate(8 * values.length);
        for (double value : values) {
            buffer.putDouble(value);
        }
        digest.update(buffer.array());
    }
}
