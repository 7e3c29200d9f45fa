package dev.estimation.core.gaussian;

import dev.estimation.core.space.Space;
import org.ejml.data.DMatrixRMaj;
import org.ejml.dense.row.CommonOps_DDRM;
import org.ejml.dense.row.factory.DecompositionFactory_DDRM;
import org.ejml.interfaces.decomposition.EigenDecomposition_F64;

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
    Covariance scale = requireDefinite("covariance of q", by.factoredCovariance());
    if (!of.factoredCovariance().isDefinite()) {
      return Double.POSITIVE_INFINITY;
    }
    int d = space.dimension();
    double sum = squaredMeanError(of, by, scale);
    DMatrixRMaj ratio = solved(scale, of.lowerFactor());
    for (int r = 0; r < d; r++) {
      for (int c = 0; c < r; c++) {
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
    return Math.sqrt(squaredMeanError(moments(p), moments(q), scale(scale)));
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
    Covariance by = scale(scale);
    DMatrixRMaj half = solved(by, difference);
    CommonOps_DDRM.transpose(half);
    DMatrixRMaj ratio = solved(by, half);
    return largestEigenvalue(ratio);
  }

  private double largestEigenvalue(DMatrixRMaj symmetric) {
    EigenDecomposition_F64<DMatrixRMaj> eigen =
        DecompositionFactory_DDRM.eig(space.dimension(), false, true);
    if (!eigen.decompose(symmetric)) {
      return Double.NaN;
    }
    double largest = 0;
    for (int i = 0; i < space.dimension(); i++) {
      largest = Math.max(largest, Math.abs(eigen.getEigenvalue(i).getReal()));
    }
    return largest;
  }

  private double squaredMeanError(Moments p, Moments q, Covariance scale) {
    double[] difference = new double[space.dimension()];
    space.difference(p.mean(), q.mean(), difference);
    scale.solveLower(difference);
    double sum = 0;
    for (double value : difference) {
      sum += value * value;
    }
    return sum;
  }

  /** L^-1 X, column by column. */
  private DMatrixRMaj solved(Covariance scale, DMatrixRMaj right) {
    int d = space.dimension();
    DMatrixRMaj result = new DMatrixRMaj(d, d);
    double[] column = new double[d];
    for (int c = 0; c < d; c++) {
      for (int r = 0; r < d; r++) {
        column[r] = right.get(r, c);
      }
      scale.solveLower(column);
      for (int r = 0; r < d; r++) {
        result.set(r, c, column[r]);
      }
    }
    return result;
  }

  private Moments moments(Gaussian value) {
    Moments moments = new Moments(space);
    moments.set(value);
    return moments;
  }

  private Covariance scale(DMatrixRMaj matrix) {
    Covariance result = new Covariance(space.dimension());
    result.changeMatrix().setTo(CovarianceInput.of(space.dimension(), matrix, "the space"));
    return requireDefinite("scale", result);
  }

  private static Covariance requireDefinite(String what, Covariance covariance) {
    if (!covariance.isDefinite()) {
      throw new IllegalArgumentException(
          what + " must be positive definite: " + covariance.failure());
    }
    return covariance;
  }
}
