package dev.estimation.benchmarks.page;

/**
 * Whether innovations in succession are independent, as those of an honest filter are: r(k) = sum e(t) e(t + k) / sum e(t)^2
 * over normalised innovations e, which have mean 0. For white ones and N of them, r(k) is about normal with variance 1/N, so
 * that 95 % of lags lie within 1.96 / sqrt(N). Source: Bar-Shalom, Li and Kirubarajan 2001, section 5.4.2.
 */
final class Whiteness {
  private static final double NORMAL_95 = 1.96;
  private static final int MOST_LAGS = 40;

  private final double[] values;

  /**
   * Of innovations in succession.
   *
   * @param values normalised innovations, kept
   */
  Whiteness(double[] values) {
    this.values = values;
  }

  /** {@return how many lags are worth a look: a quarter of the values, at most 40} */
  int lags() {
    return Math.min(MOST_LAGS, values.length / 4);
  }

  /** {@return the autocorrelation at a lag; NaN if all values are 0} */
  double correlation(int lag) {
    double product = 0;
    double square = 0;
    for (int i = 0; i < values.length; i++) {
      square += values[i] * values[i];
      if (i + lag < values.length) {
        product += values[i] * values[i + lag];
      }
    }
    return product / square;
  }

  /** {@return what 95 % of the lags of white innovations keep} */
  double bound() {
    return NORMAL_95 / Math.sqrt(values.length);
  }
}
