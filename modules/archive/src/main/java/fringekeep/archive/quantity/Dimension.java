package fringekeep.archive.quantity;

import java.util.Arrays;

/** Exponents of the base units m, kg, s, A, K, mol and rad. A plane angle counts as a dimension of its own. */
record Dimension(int[] exponents) {
    static final String[] BASE = {"m", "kg", "s", "A", "K", "mol", "rad"};
    static final Dimension NONE = new Dimension(new int[BASE.length]);

    Dimension {
        exponents = exponents.clone();
    }

    static Dimension of(int... exponents) {
        return new Dimension(Arrays.copyOf(exponents, BASE.length));
    }

    Dimension plus(Dimension other, int times) {
        int[] sum = exponents.clone();
        for (int i = 0; i < sum.length; i++) {
            sum[i] += times * other.exponents[i];
        }
        return new Dimension(sum);
    }

    /** UCUM code of the coherent SI unit in base units, such as {@code m.kg.s-2}; {@code 1} when there is none. */
    String code() {
        StringBuilder code = new StringBuilder();
        for (int i = 0; i < BASE.length; i++) {
            if (exponents[i] != 0) {
                code.append(code.isEmpty() ? "" : ".").append(BASE[i]).append(exponents[i] == 1 ? "" : exponents[i]);
            }
        }
        return code.isEmpty() ? "1" : code.toString();
    }

    @Override
    public boolean equals(Object other) {
        return other instanceof Dimension dimension && Arrays.equals(exponents, dimension.exponents);
    }

    @Override
    public int hashCode() {
        return Arrays.hashCode(exponents);
    }

    @Override
    public String toString() {
        return code();
    }
}
