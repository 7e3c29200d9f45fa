package dev.estimation.core.matching;

/**
 * A workspace whose moments come from independent draws, and so have standard errors. What {@link
 * PointMatching} makes for such rules; ask for it by type.
 */
public interface SampledWorkspace extends MatchingWorkspace {
  /**
   * The standard error of a component of the mean: sqrt(p_rr / N), without the additive noise.
   *
   * @param row from 0
   * @return in the unit of the component
   */
  double meanStandardError(int row);

  /**
   * The standard error of an entry of the covariance, from the fourth moments of the draws:
   * sqrt((mean of e_r^2 e_c^2 - p_rc^2) / N).
   *
   * @param row from 0
   * @param column from 0
   * @return in the product of the two units
   */
  double covarianceStandardError(int row, int column);
}
