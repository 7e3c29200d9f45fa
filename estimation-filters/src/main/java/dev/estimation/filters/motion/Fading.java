package dev.estimation.filters.motion;

/**
 * Functions of u = dt / tau for an acceleration that fades as exp(-u), each divided by the power of u with which it
 * begins, so that all are finite at 0. Up to u = 1 they are sums of their power series, of which the terms
 * left out are below 1e-18; above, closed forms, which lose no more than two digits there.
 */
final class Fading {
  private static final double SERIES = 1;
  private static final int TERMS = 26;

  private Fading() {}

  /** (1 - e^-u) / u. */
  static double velocity(double u) {
    return u < 1e-9 ? 1 - u / 2 : -Math.expm1(-u) / u;
  }

  /** (u - 1 + e^-u) / u^2. */
  static double position(double u) {
    return u > SERIES ? (u + Math.expm1(-u)) / (u * u) : sum(u, 2, 0, 0, 1, false);
  }

  /** The integral of (1 - e^-s)^2 to u, over u^3: terms 2^n - 2. */
  static double velocityVariance(double u) {
    if (u > SERIES) {
      double x = -Math.expm1(-u);
      return (u - x - x * x / 2) / (u * u * u);
    }
    return sum(u, 2, 1, 0, -2, true);
  }

  /** The integral of (s - 1 + e^-s)^2 to u, over u^5: terms 2^n - 2 n - 2. */
  static double positionVariance(double u) {
    if (u > SERIES) {
      double e = Math.exp(-u);
      double rest = u - 2 * u * e - Math.expm1(-2 * u) / 2;
      return (u * u * u / 3 - u * u + rest) / WhiteNoise.power(u, 5);
    }
    return sum(u, 4, 1, -2, -2, true);
  }

  /** The integral of (s - 1 + e^-s) e^-s to u, over u^3: terms 2^n - n - 1. */
  static double positionAcceleration(double u) {
    if (u > SERIES) {
      return (-Math.expm1(-2 * u) / 2 - u * Math.exp(-u)) / (u * u * u);
    }
    return sum(u, 2, 1, -1, -1, true);
  }

  /**
   * The sum over n from first of (-1)^n ([2^n] + linear n + constant) / n! u^(n - first), each over n + 1 if
   * integrated once.
   */
  private static double sum(
      double u, int first, int integrals, double linear, double constant, boolean doubling) {
    double sum = 0;
    double power = 1 / WhiteNoise.factorial(first); // first is even
    double two = doubling ? WhiteNoise.power(2, first) : 0;
    for (int n = first; n < first + TERMS; n++) {
      double term = power * (two + linear * n + constant);
      sum += integrals == 0 ? term : term / (n + 1);
      power *= -u / (n + 1);
      two *= 2;
    }
    return sum;
  }
}
