package dev.estimation.core.matching;

import dev.estimation.core.function.Structure;
import dev.estimation.core.function.VectorFunction;
import dev.estimation.core.gaussian.Form;
import dev.estimation.core.points.PointRule;
import dev.estimation.core.points.UnitPoints;
import dev.estimation.core.space.Space;

/**
 * Moments carried by points: u_i = m + L xi_i, with L the lower Cholesky factor of the covariance of
 * the active inputs and xi_i the points of a rule.
 *
 * <p>With d_i = g(u_i) - g(m): delta = sum w_i d_i, mean = g(m) + delta, P_zz = sum w_i d_i d_i' +
 * (wc_0 - wm_0 - 1) delta delta', W = sum w_i xi_i d_i'. Sums run over all points but the centre, whose
 * deviation is zero, so a large negative centre weight costs no digits in them. Differences are those
 * of the output space: angles are averaged around the centre's image, so deviations must stay within
 * half a turn of it.
 *
 * <p>Zero variances give points that do not move along them. P_zz is positive semi-definite for every
 * function if {@code UnitPoints.covarianceWeightsPositive()}. The rounding of g itself is multiplied by
 * {@code UnitPoints.weightAmplification()}.
 *
 * <p>Samples ({@code UnitPoints.isSample()}) have a mean and covariance of their own: for them P_zz and W
 * are taken about both sample means. Where they come in independent replicates, the workspace is a {@link
 * SampledWorkspace}: its moments are free of bias and have standard errors.
 *
 * <p>Cost: the evaluations of the rule and one at the centre; about points * m^2 / 2 operations for
 * the covariance, and points * (m + n) for each coordinate that is not zero. <i>Immutable.</i> Source:
 * Sarkka and Svensson 2023, <i>Bayesian Filtering and Smoothing</i>, 2nd ed., chapters 8 and 9.
 */
public final class PointMatching implements MomentMatching {
  /** For functions that are linear in all their inputs: no points, and 1 + wm_0 - wc_0 = 0. */
  private static final UnitPoints CENTRE_ALONE =
      UnitPoints.of(0, 1, 2, new double[0][], new double[0]);

  private final PointRule rule;

  private PointMatching(PointRule rule) {
    this.rule = rule;
  }

  /**
   * {@return matching by the points of a rule}
   *
   * @param rule the points
   */
  public static PointMatching of(PointRule rule) {
    return new PointMatching(rule);
  }

  @Override
  public MatchingWorkspace workspace(
      Space input, Space output, VectorFunction function, Form form) {
    Structure structure = function.structure();
    int nonlinear = structure.nonlinearInputs(input.dimension()).length;
    UnitPoints points = nonlinear == 0 ? CENTRE_ALONE : rule.points(nonlinear);
    if (!points.isSample()) {
      return new PointWorkspace(input, output, function, points, form);
    }
    VectorFunction sampled = new Restructured(function, structure.withLinearInputs());
    UnitPoints draws = rule.points(structure.activeInputs(input.dimension()).length);
    return draws.replicates() > 1
        ? new ReplicatedWorkspace(input, output, sampled, draws, form)
        : new SampleWorkspace(input, output, sampled, draws, form);
  }
}
