package dev.estimation.core.accuracy;

/**
 * Skewness and kurtosis of one component, with standard errors as {@link SampledOutput} says. A Gaussian has 0
 * and 3. <i>Immutable.</i>
 *
 * @param skewness mean y^3
 * @param skewnessStandardError of it
 * @param kurtosis mean y^4
 * @param kurtosisStandardError of it
 */
public record ComponentShape(
    double skewness, double skewnessStandardError, double kurtosis, double kurtosisStandardError) {
  static ComponentShape of(double[] deviations) {
    int n = deviations.length;
    double root = Math.sqrt(power(deviations, 1, 2));
    double g = power(deviations, root, 3);
    double k = power(deviations, root, 4);
    double skewShares = 0;
    double kurtosisShares = 0;
    for (double deviation : deviations) {
      double y = deviation / root;
      double skew = y * y * y - g - 3 * y - 1.5 * g * (y * y - 1);
      double peak = y * y * y * y - k - 4 * g * y - 2 * k * (y * y - 1);
      skewShares += skew * skew;
      kurtosisShares += peak * peak;
    }
    return new ComponentShape(g, Math.sqrt(skewShares) / n, k, Math.sqrt(kurtosisShares) / n);
  }

  private static double power(double[] deviations, double scale, int exponent) {
    double sum = 0;
    for (double deviation : deviations) {
      double y = deviation / scale;
      sum += exponent == 2 ? y * y : exponent == 3 ? y * y * y : y * y * y * y;
    }
    return sum / deviations.length;
  }
}
