package fringekeep.interferometry.fringe;

/**
 * Cosine and sine of an angle in turns, exact at whole eighths' neighbours of a quarter turn: cos and sin of 1/4, 1/2
 * and 3/4 turn are exactly 0 and &plusmn;1, so that four-step scans give the exact quotients. A turn within its own last
 * two places of a quarter counts as the quarter.
 */
final class Turns {
    private static final double TWO_PI = 2 * Math.PI;

    private Turns() {}

    static double cos(double turns) {
        double quarters = Math.rint(4 * turns);
        double angle = rest(turns, quarters);
        return switch ((int) (quarters - 4 * Math.floor(0.25 * quarters))) {
            case 0 -> StrictMath.cos(angle);
            case 1 -> 0.0 - StrictMath.sin(angle);
            case 2 -> -StrictMath.cos(angle);
            default -> StrictMath.sin(angle);
        };
    }

    static double sin(double turns) {
        double quarters = Math.rint(4 * turns);
        double angle = rest(turns, quarters);
        return switch ((int) (quarters - 4 * Math.floor(0.25 * quarters))) {
            case 0 -> StrictMath.sin(angle);
            case 1 -> StrictMath.cos(angle);
            case 2 -> 0.0 - StrictMath.sin(angle);
            default -> -StrictMath.cos(angle);
        };
    }

    private static double rest(double turns, double quarters) {
        double rest = turns - 0.25 * quarters;
        return Math.abs(rest) <= 2 * Math.ulp(turns) ? 0 : TWO_PI * rest;
    }
}
