package fringekeep.interferometry.statistics;

/** A value with its gradient, so that a formula written once gives exact derivatives. */
record Dual(double value, double[] gradient) {
    static Dual constant(double value, int p) {
        return new Dual(value, new double[p]);
    }

    static Dual variable(double value, int index, int p) {
        double[] gradient = new double[p];
        gradient[index] = 1;
        return new Dual(value, gradient);
    }

    private Dual mapped(double result, double slope) {
        double[] scaled = new double[gradient.length];
        for (int j = 0; j < scaled.length; j++) {
            scaled[j] = slope * gradient[j];
        }
        return new Dual(result, scaled);
    }

    private Dual joined(Dual other, double result, double bySelf, double byOther) {
        double[] sum = new double[gradient.length];
        for (int j = 0; j < sum.length; j++) {
            sum[j] = bySelf * gradient[j] + byOther * other.gradient[j];
        }
        return new Dual(result, sum);
    }

    Dual plus(Dual other) {
        return joined(other, value + other.value, 1, 1);
    }

    Dual plus(double other) {
        return mapped(value + other, 1);
    }

    Dual minus(Dual other) {
        return joined(other, value - other.value, 1, -1);
    }

    Dual times(Dual other) {
        return joined(other, value * other.value, other.value, value);
    }

    Dual times(double other) {
        return mapped(value * other, other);
    }

    Dual over(Dual other) {
        double quotient = value / other.value;
        return joined(other, quotient, 1 / other.value, -quotient / other.value);
    }

    Dual exp() {
        double result = StrictMath.exp(value);
        return mapped(result, result);
    }

    Dual power(Dual exponent) {
        double result = StrictMath.pow(value, exponent.value);
        return joined(exponent, result, exponent.value * result / value, result * StrictMath.log(value));
    }

    Dual power(double exponent) {
        return mapped(StrictMath.pow(value, exponent), exponent * StrictMath.pow(value, exponent - 1));
    }

    Dual sin() {
        return mapped(StrictMath.sin(value), StrictMath.cos(value));
    }

    Dual cos() {
        return mapped(StrictMath.cos(value), -StrictMath.sin(value));
    }

    Dual arctan() {
        return mapped(StrictMath.atan(value), 1 / (1 + value * value));
    }
}
