package fringekeep.sourcerun;

import fringekeep.archive.json.JsonObject;

/** Choices for traces of the demo lab. */
final class Flights {
    static final String SEQUENCE =
            "111111110000101111000110100000001000111000100101110000001100100100110111001000001010110110"
                    + "101100101100001111101101111010111010001000011011000111100111001100010110100100010100101010011101110110011110111"
                    + "111010011001101010001100000111010101011111001010000100";

    private Flights() {}

    static String quantity(double si, String unit, double u) {
        return "{\"si\":" + si + ",\"text\":\"" + si + "\",\"unit\":\"" + unit + "\",\"uncertainty\":"
                + (u == 0 ? "{\"sort\":\"exact\"}" : "{\"sort\":\"stated\",\"si\":" + u + ",\"text\":\"" + u + "\"}")
                + "}";
    }

    static JsonObject single(double from, double to) {
        return Records.json("{\"method\":\"velocity.flight-single-slot/1\",\"slotOpening\":" + quantity(0.0004, "s", 0)
                + ",\"timeZero\":" + quantity(0.00035, "s", 0.00002) + common(from, to));
    }

    static JsonObject random(double from, double to) {
        return Records.json("{\"method\":\"velocity.flight-pseudo-random/1\",\"binWidth\":" + quantity(0.00025, "s", 0)
                + ",\"sequence\":\"" + SEQUENCE + "\",\"timeZero\":" + quantity(0, "s", 0.00002) + common(from, to));
    }

    private static String common(double from, double to) {
        return ",\"distance\":" + quantity(1.48, "m", 0.003) + ",\"background\":\"outside-window\",\"from\":"
                + quantity(from, "m/s", 0) + ",\"to\":" + quantity(to, "m/s", 0)
                + ",\"reading\":{\"comment\":\"#\",\"skip\":1,\"timeColumn\":0,\"timeUnit\":\"ms\",\"countsColumn\":1}}";
    }

    static JsonObject slits() {
        return Records.json(
                "{\"method\":\"velocity.three-slit/1\",\"gravity\":" + quantity(9.81, "m/s2", 0.01) + ",\"slits\":["
                        + slit(0, 0, 0.00005) + "," + slit(1, 0.0002, 0.00005) + "," + slit(2, 0, 0.00005) + "]}");
    }

    private static String slit(double position, double height, double opening) {
        return "{\"position\":" + quantity(position, "m", 0.001) + ",\"height\":" + quantity(height, "m", 0.000005)
                + ",\"opening\":" + quantity(opening, "m", 0) + "}";
    }
}
