package dev.estimation.core.gaussian;

import dev.estimation.core.internal.Whitening;
import dev.estimation.core.space.Space;
import org.ejml.data.DMatrixRMaj;
import org.ejml.dense.row.CommonOps_DDRM;

/**
 * How far two Gaussians p = N(a, A) and q = N(b, B) of one space are apart, by factors and without inverse.
 *
 * <ul>
 *   <li>Kullback-Leibler divergence KL(p || q) = (tr(B^-1 A) - d + (a - b)' B^-1 (a - b) + ln det B - ln det A) / 2:
 *       0 if they are equal, and not symmetric. With B = L L' and the lower triangular M = L^-1 L_A it is the sum
 *       over (m_ii^2 - 1 - ln m_ii^2) / 2, m_ij^2 / 2 for i &gt; j, and the squares of L^-1 (a - b), halved: nothing
 *       in it is negative. In nats;
 *   <li>mean error |L^-1 (a - b)| in deviations of a scale S = L L';
 *   <li>covariance error: the largest |eigenvalue| of L^-1 (A - B) L^-T, so that -c S &lt;= A - B &lt;= c S.
 * </ul>
 *
 * <p>Means are differenced in the space, from b; angles go the short way round. If p has a zero variance, the
 * divergence is infinite. q and scales must be definite. Errors are some n eps, and relative to the
 * condition of B or S.
 *
 * <p>Cost: of the order of d^3; allocates, for analysis off the step path. <i>Immutable.</i> Source: Kullback and
 * Leibler 1951, <i>On information and sufficiency</i>; Kullback 1959, <i>Information Theory and Statistics</i>, for
 * Gaussians (from memory); Mahalanobis 1936, <i>On the generalised distance in statistics</i>.
 */
public final class Divergence {
  private final Space space;

  private Divergence(Space space) {
    this.space = space;
  }

  /**
   * Divergences in a space.
   *
   * @param space where both Gaussians live
   * @return the measures
   */
  public static Divergence in(Space space) {
    return new Divergence(space);
  }

  /**
   * KL(p || q), what is lost by taking q for p.
   *
   * @param p in the space
   * @param q in the space, definite
   * @return nats, 0 or more; infinity if p has a zero variance
   * @throws IllegalArgumentException if one is not of the space, or q is not definite
   */
  public double kullbackLeibler(Gaussian p, Gaussian q) {
    Moments of = moments(p);
    Moments by = moments(q);
    Whitening scale = definite("covariance of q", by.covariance());
    if (!of.factoredCovariance().isDefinite()) {
      return Double.POSITIVE_INFINITY;
    }
    int d = space.dimension();
    double distance = meanError(of, by, scale);
    double sum = distance * distance;
    DMatrixRMaj turned = of.lowerFactor().copy();
    CommonOps_DDRM.transpose(turned);
    DMatrixRMaj ratio = scale.rows(turned); // (L^-1 L_A)'
    for (int r = 0; r < d; r++) {
      for (int c = r + 1; c < d; c++) {
        sum += ratio.get(r, c) * ratio.get(r, c);
      }
      double excess = (ratio.get(r, r) - 1) * (ratio.get(r, r) + 1);
      sum += Math.max(0, excess - 2 * Math.log(ratio.get(r, r)));
    }
    return 0.5 * sum;
  }

  /**
   * The distance of two means in deviations of a scale.
   *
   * @param p in the space
   * @param q in the space
   * @param scale S, d x d, symmetric and positive definite, read
   * @return |L^-1 (a - b)|
   * @throws IllegalArgumentException if one is not of the space, or the scale is not symmetric or not definite
   */
  public double meanError(Gaussian p, Gaussian q, DMatrixRMaj scale) {
    return meanError(moments(p), moments(q), scale(scale));
  }

  /**
   * The distance of two covariances in units of a scale.
   *
   * @param p in the space
   * @param q in the space
   * @param scale S, d x d, symmetric and positive definite, read
   * @return the largest |eigenvalue| of L^-1 (A - B) L^-T
   * @throws IllegalArgumentException if one is not of the space, or the scale is not symmetric or not definite
   */
  public double covarianceError(Gaussian p, Gaussian q, DMatrixRMaj scale) {
    DMatrixRMaj difference = moments(p).covariance().copy();
    CommonOps_DDRM.subtractEquals(difference, moments(q).covariance());
    return Whitening.largest(scale(scale).eigenvalues(difference));
  }

  private double meanError(Moments p, Moments q, Whitening scale) {
    double[] difference = new double[space.dimension()];
    space.difference(p.mean(), q.mean(), difference);
    return scale.length(difference);
  }

  private Moments moments(Gaussian value) {
    Moments moments = new Moments(space);
    moments.set(value);
    return moments;
  }

  private Whitening scale(DMatrixRMaj matrix) {
    return definite("scale", CovarianceInput.of(space.dimension(), matrix, "the space"));
  }

  private static Whitening definite(String what, DMatrixRMaj covariance) {
    Whitening scale = new Whitening(covariance);
    if (!scale.isDefinite()) {
      throw new IllegalArgumentException(what + " must be positive definite: " + scale.failure());
    }
    return scale;
  }
}
