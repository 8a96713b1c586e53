package fringekeep.interferometry.nearfield;

import static org.assertj.core.api.Assertions.assertThat;

import fringekeep.interferometry.special.Bessel;
import fringekeep.interferometry.special.EntireBessel;
import java.nio.ByteBuffer;
import java.security.MessageDigest;
import java.security.NoSuchAlgorithmException;
import java.util.HexFormat;
import org.junit.jupiter.api.Test;

/** Our own earlier output: the same bits on every machine, Java release and thread. Accept a change only knowingly. */
class SameBitsRegressionTest {
    private static final String BITS = "c5cb96f8eb3d20b90819ccd70a35133dcb4c3e035c882429d804f8969468adaa";

    @Test
    void aLargeSetOfValuesHasTheRecordedHash() throws NoSuchAlgorithmException {
        assertThat(hash()).isEqualTo(BITS);
    }

    private static String hash() throws NoSuchAlgorithmException {
        MessageDigest digest = MessageDigest.getInstance("SHA-256");
        for (int n = 0; n <= 7; n++) {
            for (double x = 0.01; x < 200.0; x *= 1.013) {
                add(digest, Bessel.j(n, x));
                add(digest, Bessel.scaledI(n, x));
                add(digest, EntireBessel.scaled(n, x - 20.0));
            }
        }
        WallPotential wall = new WallPotential(3e-49, 3, 1.6e-7, 8e-9);
        for (double xi = -1.4; xi < 2.6; xi += 0.037) {
            add(digest, new LightKernel(3.1, 0.8, RecoilKernel.STANDING_MODE_COHERENT).quantum(2, xi));
            add(digest, new DepletionKernel(1.3, 6.0).quantum(1, xi));
            add(digest, new EikonalSlitKernel(266e-9, 112e-9, wall, 150.0).quantum(2, xi));
        }
        PowerSeriesSetup setup = PowerSeriesSetup.symmetric(266e-9, 0.42, 0.105, LaserBeam.ideal(532e-9, 9e-4));
        BeamEnsemble beam = new BeamEnsemble(
                WeightedNodes.normal(110.0, 12.0, 5.0),
                WeightedNodes.single(2e-24),
                WeightedNodes.uniform(-1e-4, 1e-4, 4));
        for (Description description : Description.values()) {
            VisibilityAgainstPower model = new VisibilityAgainstPower(setup, beam, description);
            for (double power = 0.0; power < 10.0; power += 0.25) {
                VisibilityAgainstPower.Point point = model.point(power, new OpticalResponse(1.5e-28, 1e-21));
                add(digest, point.signed());
                add(digest, point.byPolarizability());
                add(digest, point.byCrossSection());
            }
        }
        return HexFormat.of().formatHex(digest.digest());
    }

    private static void add(MessageDigest digest, double value) {
        digest.update(ByteBuffer.allocate(8).putDouble(value).array());
    }
}
