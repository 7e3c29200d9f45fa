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
 * of the output space: angles and rotations are averaged around the centre's image, so deviations must stay
 * within half a turn of it. The mean of rotations is the first step towards the intrinsic one, where
 * deviations sum to zero ({@link #withMeanPasses} goes on), not the nearest to the mean of matrices or
 * quaternions: of 350, 0 and 20 degrees about one axis it is 3.333 degrees, and not 3.295. The covariance
 * is that of differences as seen from the centre's image.
 *
 * <p>Zero variances give points that do not move along them. P_zz is positive semi-definite for every
 * function if {@code UnitPoints.covarianceWeightsPositive()}. The rounding of g itself is multiplied by
 * {@code UnitPoints.weightAmplification()}.
 *
 * <p>Where g is linear in some inputs given the others, points are drawn for the others alone and the rest is
 * summed beforehand; {@link Structure} has the formulas. With A S the columns by which u_b acts, E[A S S' A'] is summed with
 * mean weights. Where that of the centre is below 0 it is E[A] S S' E[A]' and the covariance of A S, written as
 * that of z above, so that weights of 1e6 do not cancel and P_zz stays positive semi-definite where it was.
 *
 * <p>Samples ({@code UnitPoints.isSample()}) have a mean and covariance of their own: for them P_zz and W
 * are taken about both sample means. Where they come in independent replicates, the workspace is a {@link
 * SampledWorkspace}: its moments are free of bias and have standard errors.
 *
 * <p>Cost: the evaluations of the rule and one at the centre; about points * m^2 / 2 operations for
 * the covariance, and points * (m + n) for each coordinate that is not zero. <i>Immutable.</i> Source:
 * Sarkka and Svensson 2023, <i>Bayesian Filtering and Smoothing</i>, 2nd ed., chapters 8 and 9; means in
 * curved spaces: Pennec 2006, <i>Intrinsic statistics on Riemannian manifolds</i> (from memory).
 */
public final class PointMatching implements MomentMatching {
  /** For functions that are linear in all their inputs: no points, and 1 + wm_0 - wc_0 = 0. */
  private static final UnitPoints CENTRE_ALONE =
      UnitPoints.of(0, 1, 2, new double[0][], new double[0]);

  private final PointRule rule;
  private final int meanPasses;

  private PointMatching(PointRule rule, int meanPasses) {
    this.rule = rule;
    this.meanPasses = meanPasses;
  }

  /**
   * {@return matching by the points of a rule}
   *
   * @param rule the points
   */
  public static PointMatching of(PointRule rule) {
    return new PointMatching(rule, 1);
  }

  /**
   * The same with more passes for the mean. In a space that is curved, such as rotations, deviations from
   * g(m) are not quite deviations from the mean: each further pass takes the mean of the last one as the centre
   * c and the deviations d_i = g(u_i) - c anew, d_0 = g(m) - c included, and moves to c + sum w_i d_i. Passes
   * converge to the intrinsic mean, from which deviations sum to zero. Covariances are taken about
   * the last centre. Of reals and angles nothing changes but rounding, unless angles spread so far that some lie
   * half a turn from g(m). Cost: no evaluation; a difference an image and pass, and memory for the images.
   *
   * @param passes 1 or more; 1 unless set
   * @return the matching
   */
  public PointMatching withMeanPasses(int passes) {
    if (passes < 1) {
      throw new IllegalArgumentException("mean passes must be 1 or more, got " + passes);
    }
    return new PointMatching(rule, passes);
  }

  @Override
  public MatchingWorkspace workspace(
      Space input, Space output, VectorFunction function, Form form) {
    Structure structure = function.structure();
    int nonlinear = structure.nonlinearInputs(input.dimension()).length;
    UnitPoints points = nonlinear == 0 ? CENTRE_ALONE : rule.points(nonlinear);
    if (!points.isSample()) {
      return new PointWorkspace(input, output, function, points, meanPasses, form);
    }
    VectorFunction sampled = new Restructured(function, structure.withLinearInputs());
    UnitPoints draws = rule.points(structure.activeInputs(input.dimension()).length);
    return draws.replicates() > 1
        ? new ReplicatedWorkspace(input, output, sampled, draws, meanPasses, form)
        : new SampleWorkspace(input, output, sampled, draws, meanPasses, form);
  }
}
