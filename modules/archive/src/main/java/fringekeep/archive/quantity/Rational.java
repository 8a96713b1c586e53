package fringekeep.archive.quantity;

import java.math.BigDecimal;
import java.math.BigInteger;

/** An exact fraction in lowest terms with a positive denominator. */
record Rational(BigInteger numerator, BigInteger denominator) {
    static final Rational ZERO = of(0);
    static final Rational ONE = of(1);
    private static final int SUBNORMAL_SCALE = 1076;

    Rational {
        if (denominator.signum() == 0) {
            throw new ArithmeticException("a fraction over zero");
        }
        BigInteger common = numerator.gcd(denominator);
        if (denominator.signum() < 0) {
            common = common.negate();
        }
        numerator = numerator.divide(common);
        denominator = denominator.divide(common);
    }

    static Rational of(long value) {
        return new Rational(BigInteger.valueOf(value), BigInteger.ONE);
    }

    static Rational of(String decimal) {
        return of(new BigDecimal(decimal));
    }

    static Rational of(BigDecimal decimal) {
        return decimal.scale() <= 0
                ? new Rational(decimal.toBigIntegerExact(), BigInteger.ONE)
                : new Rational(decimal.unscaledValue(), BigInteger.TEN.pow(decimal.scale()));
    }

    Rational times(Rational other) {
        return new Rational(numerator.multiply(other.numerator), denominator.multiply(other.denominator));
    }

    Rational over(Rational other) {
        return new Rational(numerator.multiply(other.denominator), denominator.multiply(other.numerator));
    }

    Rational plus(Rational other) {
        return new Rational(
                numerator.multiply(other.denominator).add(other.numerator.multiply(denominator)),
                denominator.multiply(other.denominator));
    }

    Rational minus(Rational other) {
        return plus(new Rational(other.numerator.negate(), other.denominator));
    }

    Rational power(int exponent) {
        return exponent < 0
                ? ONE.over(power(-exponent))
                : new Rational(numerator.pow(exponent), denominator.pow(exponent));
    }

    /** The nearest double, ties to even, in one rounding; infinite when too large. */
    double toDouble() {
        BigInteger magnitude = numerator.abs();
        if (magnitude.signum() == 0) {
            return 0;
        }
        int exponent = magnitude.bitLength() - denominator.bitLength();
        double value = exponent < -1018 ? nearZero(magnitude, exponent) : ordinary(magnitude, exponent);
        return numerator.signum() < 0 ? -value : value;
    }

    /** {@code BigInteger.doubleValue} rounds to even; 65 bits or more with a sticky last one leave it one rounding. */
    private double ordinary(BigInteger magnitude, int exponent) {
        int shift = 66 - exponent;
        return StrictMath.scalb(scaled(magnitude, shift).doubleValue(), -shift);
    }

    /** Below the normal range the last place is always 2^-1074, so it is rounded there by hand. */
    private double nearZero(BigInteger magnitude, int exponent) {
        BigInteger quarters = scaled(magnitude, SUBNORMAL_SCALE);
        BigInteger whole = quarters.shiftRight(2);
        if (whole.bitLength() > 53) {
            return ordinary(magnitude, exponent);
        }
        int rest = quarters.intValue() & 3;
        boolean up = rest == 3 || (rest == 2 && whole.testBit(0));
        return StrictMath.scalb((up ? whole.add(BigInteger.ONE) : whole).doubleValue(), -1074);
    }

    private BigInteger scaled(BigInteger magnitude, int shift) {
        BigInteger dividend = shift >= 0 ? magnitude.shiftLeft(shift) : magnitude;
        BigInteger divisor = shift >= 0 ? denominator : denominator.shiftLeft(-shift);
        BigInteger[] parts = dividend.divideAndRemainder(divisor);
        return parts[1].signum() == 0 ? parts[0] : parts[0].setBit(0);
    }
}
