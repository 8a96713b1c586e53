package fringekeep.interferometry.special;

/**
 * A small random generator whose sequence is fixed by its seed for ever; results record its name and seed.
 *
 * <p>Source: G. L. Steele, D. Lea, C. H. Flood, Fast splittable pseudorandom number generators, OOPSLA 2014,
 * doi:10.1145/2660193.2660195, figures 14 and 16 (fixed golden-ratio increment, 64-bit finaliser). Normal deviates
 * follow G. E. P. Box and M. E. Muller, Ann. Math. Stat. 29, 610 (1958), with {@link StrictMath}.
 *
 * <p>Thread rule: one thread per object.
 */
public final class SplitMix64 {
    /** The name that a result records beside the seed. */
    public static final String NAME = "SplitMix64, Box-Muller normals";

    private static final long GOLDEN = 0x9e3779b97f4a7c15L;

    private long state;
    private double spare;
    private boolean hasSpare;

    /**
     * Starts a sequence.
     *
     * @param seed any 64-bit number
     */
    public SplitMix64(long seed) {
        state = seed;
    }

    /**
     * Next 64 random bits.
     *
     * @return any long, all equally likely
     */
    public long nextLong() {
        state += GOLDEN;
        long mixed = (state ^ (state >>> 30)) * 0xbf58476d1ce4e5b9L;
        mixed = (mixed ^ (mixed >>> 27)) * 0x94d049bb133111ebL;
        return mixed ^ (mixed >>> 31);
    }

    /**
     * Next uniform deviate.
     *
     * @return a multiple of 2^-53 in [0, 1)
     */
    public double nextDouble() {
        return (nextLong() >>> 11) * 0x1.0p-53;
    }

    /**
     * Next standard normal deviate.
     *
     * @return mean 0, variance 1
     */
    public double nextGaussian() {
        if (hasSpare) {
            hasSpare = false;
            return spare;
        }
        double radius = Math.sqrt(-2.0 * StrictMath.log(1.0 - nextDouble()));
        double angle = 2.0 * Math.PI * nextDouble();
        spare = radius * StrictMath.sin(angle);
        hasSpare = true;
        return radius * StrictMath.cos(angle);
    }
}
