package dev.estimation.core.points;

import dev.estimation.core.internal.Checks;
import java.util.function.IntToDoubleFunction;

/**
 * The scaled unscented rule: the centre and 2 n points on the axes at +-c.
 *
 * <p>With lambda = alpha^2 (n + kappa) - n: c = sqrt(n + lambda) = alpha sqrt(n + kappa), centre
 * weights lambda / (n + lambda) in means and that + 1 - alpha^2 + beta in covariances, all other
 * weights 1 / (2 (n + lambda)). Exact for all polynomials to degree 3 when the weights of the centre
 * are equal.
 *
 * <p>Common practice: beta = 2 for Gaussian inputs, kappa = 0 or 3 - n, alpha from 1e-4 to 1. Weights
 * are not probabilities; that of the centre is often negative. At alpha = 1e-3 the rounding of the
 * function is multiplied by 2e6 (see {@link UnitPoints#weightAmplification()}).
 *
 * <p>Cost: 2 n + 1 evaluations. <i>Immutable.</i> Source: Julier and Uhlmann 1997, <i>A new extension
 * of the Kalman filter to nonlinear systems</i>; Julier 2002, <i>The scaled unscented
 * transformation</i>; van der Merwe and Wan 2001.
 */
public final class UnscentedRule implements PointRule {
  private final double alpha;
  private final double beta;
  private final IntToDoubleFunction kappa;

  private UnscentedRule(double alpha, double beta, IntToDoubleFunction kappa) {
    Checks.finite("alpha", alpha);
    Checks.finite("beta", beta);
    if (!(alpha > 0)) {
      throw new IllegalArgumentException("alpha must be > 0, got " + alpha);
    }
    this.alpha = alpha;
    this.beta = beta;
    this.kappa = kappa;
  }

  /**
   * A rule with one kappa for all dimensions.
   *
   * @param alpha spread, above 0
   * @param beta added to the covariance weight of the centre, any value
   * @param kappa n + kappa must be above 0 wherever the rule is used
   * @return the rule
   */
  public static UnscentedRule scaled(double alpha, double beta, double kappa) {
    Checks.finite("kappa", kappa);
    return new UnscentedRule(alpha, beta, dimension -> kappa);
  }

  /**
   * {@return a rule whose kappa depends on the dimension, e.g. {@code n -> 3 - n}}
   *
   * @param alpha spread, above 0
   * @param beta added to the covariance weight of the centre
   * @param kappa of the dimension n; n + kappa must be above 0 wherever the rule is used
   */
  public static UnscentedRule scaled(double alpha, double beta, IntToDoubleFunction kappa) {
    return new UnscentedRule(alpha, beta, kappa);
  }

  @Override
  public UnitPoints points(int dimension) {
    double k = kappa.applyAsDouble(dimension);
    if (!(dimension + k > 0 && Double.isFinite(k))) {
      throw new IllegalArgumentException("n + kappa must be > 0, got n = " + dimension
          + " and kappa = " + k + " (unscented rule)");
    }
    double spreadSquared = alpha * alpha * (dimension + k);
    double centre = (spreadSquared - dimension) / spreadSquared;
    return AxisPoints.of(
        dimension,
        Math.sqrt(spreadSquared),
        centre,
        centre + 1 - alpha * alpha + beta,
        0.5 / spreadSquared);
  }
}
