package dev.estimation.core.matching;

/**
 * A workspace whose moments have standard errors. {@link PointMatching} makes one for rules whose {@code
 * UnitPoints.replicates()} is 2 or more, and no other, so that a caller knows before use: ask the points,
 * or the workspace by its type.
 *
 * <p>N points come in R independent replicates of equal size: single draws (R = N), antithetic pairs,
 * hypercubes or shifts. With e_i = d_i - delta the deviation of point i from the pooled mean, a_r the mean of
 * e_i over replicate r, and S_r the mean of e_i e_i' over it: P_zz = 1/R sum S_r + 1/(R (R - 1)) sum a_r
 * a_r'. The second term is what the scatter of the pooled mean takes from the first, so that P_zz is
 * free of bias; for single draws this is division by N - 1. W likewise. The standard errors are
 * those of averages of R numbers, a_r and S_r.
 *
 * <p>They are estimates themselves, with R - 1 degrees of freedom. Were replicates normal, the truth would lie
 * within +-2 of them in 93.6 % of cases at R = 16 and 95.0 % at R = 64 (Student). Where a few points in the
 * tails decide it is less: for a range and bearing, an exponential and a product, by hypercubes and shifts
 * of 32 to 255 points, it was 87 to 96 % for means and 83 to 95 % for covariances at R = 16, and 93 to 96 %
 * and 91 to 96 % at R = 64 (1000 seeds each). Take 64 or more where that matters.
 */
public interface SampledWorkspace extends MatchingWorkspace {
  /** {@return R, the number of independent replicates} */
  int replicates();

  /**
   * The standard error of a component of the mean: sqrt(sum a_r^2 / (R (R - 1))). Additive noise has no
   * part in it.
   *
   * @param row from 0
   * @return in the unit of the component
   */
  double meanStandardError(int row);

  /**
   * The standard error of an entry of the covariance: sqrt(sum (S_r - their mean)^2 / (R (R - 1))) of
   * that entry of the S_r. Their dependence by the common pooled mean is of second order and left out.
   *
   * @param row from 0
   * @param column from 0
   * @return in the product of the two units
   */
  double covarianceStandardError(int row, int column);
}
