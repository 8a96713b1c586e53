package fringekeep.drawing;

/** Checks the lengths of paired arrays. */
final class Lengths {
    private Lengths() {}

    static void require(int first, int second) {
        if (first != second) {
            throw new IllegalArgumentException(
                    "arrays of " + first + " and " + second + " values must be of equal length");
        }
    }
}
