package stillwarden.derive.physics;

import java.util.function.DoubleUnaryOperator;

/** A value that is only known to lie somewhere: finite {@code low <= nominal <= high}, SI. */
public record Band(double low, double nominal, double high) {
  public Band {
    if (!(Double.isFinite(low) && Double.isFinite(high) && low <= nominal && nominal <= high)) {
      throw new IllegalArgumentException("band: want finite low <= nominal <= high, was " + low + ", " + nominal + ", " + high);
    }
  }

  public static Band of(double value) {
    return new Band(value, value, value);
  }

  /** {@code value} within a relative error. */
  public static Band within(double value, double share) {
    return new Band(value * (1 - share), value, value * (1 + share));
  }

  public Band plus(Band b) {
    return new Band(low + b.low, nominal + b.nominal, high + b.high);
  }

  public Band minus(Band b) {
    return new Band(low - b.high, nominal - b.nominal, high - b.low);
  }

  /** Product of two bands that are nowhere negative. */
  public Band times(Band b) {
    return new Band(low * b.low, nominal * b.nominal, high * b.high);
  }

  public Band times(double positive) {
    return new Band(low * positive, nominal * positive, high * positive);
  }

  /** Quotient; this is nowhere negative and {@code b} nowhere zero or below. */
  public Band over(Band b) {
    return new Band(low / b.high, nominal / b.nominal, high / b.low);
  }

  public Band atLeast(double floor) {
    return new Band(Math.max(floor, low), Math.max(floor, nominal), Math.max(floor, high));
  }

  public Band atMost(double ceiling) {
    return new Band(Math.min(ceiling, low), Math.min(ceiling, nominal), Math.min(ceiling, high));
  }

  /** A monotone function of the band, whichever way it runs. */
  public Band map(DoubleUnaryOperator f) {
    double a = f.applyAsDouble(low);
    double b = f.applyAsDouble(high);
    double n = f.applyAsDouble(nominal);
    return new Band(Math.min(n, Math.min(a, b)), n, Math.max(n, Math.max(a, b)));
  }
}
