package dev.estimation.filters.motion;

/** What white noise of spectral density 1 makes of the chain that integrates it. */
final class WhiteNoise {
  private WhiteNoise() {}

  /**
   * With x_0' = x_1, ..., x_k' = w, the covariance of x_r and x_c after a time from exact knowledge:
   * dt^p / ((k - r)! (k - c)! p), p = 2 k + 1 - r - c.
   *
   * @param order k, 0 for a random walk
   * @param row r, from 0
   * @param column c, from 0
   * @param dt s
   */
  static double covariance(int order, int row, int column, double dt) {
    int power = 2 * order + 1 - row - column;
    return power(dt, power) / (factorial(order - row) * factorial(order - column) * power);
  }

  /** dt^n / n!: how much of x_(i + n) is in x_i after a time. */
  static double integral(int n, double dt) {
    return power(dt, n) / factorial(n);
  }

  static double power(double base, int exponent) {
    double product = 1;
    for (int i = 0; i < exponent; i++) {
      product *= base;
    }
    return product;
  }

  static double factorial(int n) {
    double product = 1;
    for (int i = 2; i <= n; i++) {
      product *= i;
    }
    return product;
  }
}
