package dev.estimation.core.points;

import dev.estimation.core.internal.Checks;
import java.util.function.IntToDoubleFunction;

/**
 * Unscented rules: the centre and 2 n points on the axes at +-c.
 *
 * <p>Points weigh 1 / (2 c^2) and the centre 1 - n / c^2 in means, so that mean and covariance are those of
 * N(0, I) for every c. The rules differ in c and in the weight of the centre in covariances:
 *
 * <table>
 *   <caption>The rules in n dimensions</caption>
 *   <tr><th>rule</th><th>c^2</th><th>covariance weight of the centre less its mean weight</th></tr>
 *   <tr><td>{@code symmetric}</td><td>n + kappa</td><td>0</td></tr>
 *   <tr><td>{@code scaled}</td><td>alpha^2 (n + kappa)</td><td>1 - alpha^2 + beta</td></tr>
 *   <tr><td>{@code atDeviations}</td><td>s^2</td><td>1 + max(2 - s^2, -s^2 / n)</td></tr>
 * </table>
 *
 * <p>Means are exact for all polynomials to degree 3 (5 on one axis if c^2 = 3), whatever the covariance
 * weight. Weights are not probabilities: that of the centre is negative where c^2 is below n. Covariances
 * never turn indefinite in {@code atDeviations}, in {@code symmetric} if kappa is not negative, in {@code
 * scaled} if beta + alpha^2 kappa / n is not (see {@link UnitPoints#covarianceWeightsPositive()}). At alpha =
 * 1e-3 and kappa = 0 the rounding of the function is multiplied by 2e6 (see {@link
 * UnitPoints#weightAmplification()}).
 *
 * <p>Cost: 2 n + 1 evaluations. <i>Immutable.</i> Source: Julier and Uhlmann 1997, <i>A new extension
 * of the Kalman filter to nonlinear systems</i>; Julier 2002, <i>The scaled unscented
 * transformation</i>; van der Merwe and Wan 2001.
 */
public final class UnscentedRule implements PointRule {
  private final IntToDoubleFunction squaredDistance;
  private final IntToDoubleFunction addedToCovariance;

  private UnscentedRule(IntToDoubleFunction squaredDistance, IntToDoubleFunction added) {
    this.squaredDistance = squaredDistance;
    this.addedToCovariance = added;
  }

  /**
   * The symmetric rule with one kappa for all dimensions; the same as {@code scaled(1, 0, kappa)}.
   *
   * @param kappa n + kappa must be above 0 wherever the rule is used
   * @return the rule
   */
  public static UnscentedRule symmetric(double kappa) {
    return scaled(1, 0, kappa);
  }

  /**
   * {@return the symmetric rule with a kappa that depends on the dimension}
   *
   * @param kappa of the dimension n, e.g. {@code n -> 3 - n}, with which the fourth moment along every
   *     axis is exact; n + kappa must be above 0 wherever the rule is used
   */
  public static UnscentedRule symmetric(IntToDoubleFunction kappa) {
    return scaled(1, 0, kappa);
  }

  /**
   * The scaled rule with one kappa for all dimensions. Common practice: beta = 2 for Gaussian inputs, kappa =
   * 0 or 3 - n, alpha from 1e-4 to 1.
   *
   * @param alpha spread, above 0
   * @param beta added to the covariance weight of the centre, any value
   * @param kappa n + kappa must be above 0 wherever the rule is used
   * @return the rule
   */
  public static UnscentedRule scaled(double alpha, double beta, double kappa) {
    Checks.finite("kappa", kappa);
    return scaled(alpha, beta, dimension -> kappa);
  }

  /**
   * {@return the scaled rule with a kappa that depends on the dimension, e.g. {@code n -> 3 - n}}
   *
   * @param alpha spread, above 0
   * @param beta added to the covariance weight of the centre
   * @param kappa of the dimension n; n + kappa must be above 0 wherever the rule is used
   */
  public static UnscentedRule scaled(double alpha, double beta, IntToDoubleFunction kappa) {
    requirePositive("alpha", alpha);
    Checks.finite("beta", beta);
    return new UnscentedRule(
        n -> alpha * alpha * (n + checkedKappa(kappa.applyAsDouble(n), n)),
        n -> 1 - alpha * alpha + beta);
  }

  /**
   * The rule with its points at s standard deviations along every axis, in all dimensions.
   *
   * <p>Its covariance weight makes the variance of a square along any one axis exact wherever
   * covariances stay positive semi-definite by it, that is for s^2 up to 2 n / (n - 1); beyond, it is the
   * least weight by which they do, and they are taken around the mean of the points without the centre.
   * For s = sqrt 3 and up to 3 dimensions this is {@code symmetric(n -> 3 - n)}.
   *
   * @param deviations s, above 0, e.g. sqrt 3
   * @return the rule
   */
  public static UnscentedRule atDeviations(double deviations) {
    requirePositive("standard deviations", deviations);
    double square = deviations * deviations;
    return new UnscentedRule(n -> square, n -> 1 + Math.max(2 - square, -square / n));
  }

  private static void requirePositive(String what, double value) {
    Checks.finite(what, value);
    if (!(value > 0)) {
      throw new IllegalArgumentException(what + " must be > 0, got " + value + " (unscented rule)");
    }
  }

  private static double checkedKappa(double kappa, int dimension) {
    if (!(dimension + kappa > 0 && Double.isFinite(kappa))) {
      throw new IllegalArgumentException("n + kappa must be > 0, got n = " + dimension
          + " and kappa = " + kappa + " (unscented rule)");
    }
    return kappa;
  }

  @Override
  public UnitPoints points(int dimension) {
    double square = squaredDistance.applyAsDouble(dimension);
    double centre = (square - dimension) / square;
    return AxisPoints.of(
        dimension,
        Math.sqrt(square),
        centre,
        centre + addedToCovariance.applyAsDouble(dimension),
        0.5 / square);
  }
}
