package dev.estimation.core.accuracy;

import dev.estimation.core.internal.Whitening;
import dev.estimation.core.matching.Use;
import org.ejml.data.DMatrixRMaj;
import org.ejml.dense.row.CommonOps_DDRM;
import org.ejml.dense.row.NormOps_DDRM;

/**
 * How far the moments of a matching (index a) are from reference moments (index r), where they are used.
 *
 * <p>S is the scale, and A what is compared, noise included in both:
 *
 * <ul>
 *   <li>{@code PREDICTION}: the output is the next estimate. A = P_zz + Q, S = P_zz,r + Q: an error of 1 is
 *       one standard deviation of that estimate.
 *   <li>{@code UPDATE}: the output corrects the input. A = U + R, S = U_r + R, U = P_zz - W'W.
 * </ul>
 *
 * <p>Why U + R and not P_zz + R: what an update leaves of the input's uncertainty is decided by what the
 * measurement says beyond its regression on the input, whose covariance is U + R. A prior of 100 km makes P_zz
 * huge; under it, a curvature of 200 m passes as 0.2 % and leaves a posterior wrong by many of its own
 * standard deviations. In unit coordinates xi of the input the measurement is mean + W' xi + v, v ~ N(0, U
 * + R): errors of mean, W and U, taken under U + R, bound what they do to the posterior of xi.
 *
 * <p>S^1/2 is the lower Cholesky factor; all numbers are free of units.
 *
 * <p>Special input: errors are NaN if moments are. Cost: a few times m^3 + n m^2 operations. <i>Immutable.</i>
 *
 * @param mean |S^-1/2 (mean_a - mean_r)|, the difference taken in the output's space
 * @param covariance the largest |eigenvalue| of S^-1/2 (A_a - A_r) S^-T/2: 0.1 is a variance wrong by 10 % in
 *     some direction
 * @param crossCovariance the largest singular value of (W_a - W_r) S^-T/2; what a smoother or an update feels
 * @param divergence the Kullback-Leibler divergence from the reference to the matching (nats), of
 *     Gaussians. Prediction: of the two outputs, 1/2 (tr(A_a^-1 A_r) - m - ln det(A_a^-1 A_r) + d' A_a^-1 d),
 *     d the difference of means. Update: of the joint distributions of input and measurement; the common input cancels
 *     and leaves the same with U + R for A, and the squared Frobenius norm of (W_a - W_r) A_a^-T/2 added in the
 *     bracket. Infinite if A_a is not positive definite
 */
public record MatchingError(
    double mean, double covariance, double crossCovariance, double divergence) {

  /** A matching that gave no result. */
  static final MatchingError FAILED = new MatchingError(
      Double.POSITIVE_INFINITY,
      Double.POSITIVE_INFINITY,
      Double.POSITIVE_INFINITY,
      Double.POSITIVE_INFINITY);

  /**
   * The errors of moments.
   *
   * @param reference the truth, noise included
   * @param matched the moments in question, noise included
   * @param use what they are for
   * @return the errors
   * @throws IllegalArgumentException if S is not positive definite: the noise is then too small to measure by
   */
  public static MatchingError of(CarriedMoments reference, CarriedMoments matched, Use use) {
    Whitening scale = new Whitening(compared(reference, use));
    if (!scale.isDefinite()) {
      String what = use == Use.PREDICTION ? "the covariance of the output" : "what is unexplained";
      throw new IllegalArgumentException("errors need a positive definite scale, but " + what
          + " with its noise has " + scale.failure() + " (reference moments; give a noise)");
    }
    return of(scale, reference, matched, use);
  }

  /** The largest error but the divergence; infinite where there is no scale. */
  static double largest(CarriedMoments reference, CarriedMoments matched, Use use) {
    Whitening scale = new Whitening(compared(reference, use));
    return scale.isDefinite()
        ? of(scale, reference, matched, use).largest()
        : Double.POSITIVE_INFINITY;
  }

  private static MatchingError of(
      Whitening scale, CarriedMoments reference, CarriedMoments matched, Use use) {
    DMatrixRMaj wanted = compared(reference, use);
    DMatrixRMaj got = compared(matched, use);
    double[] shift = reference.meanDifference(matched);
    DMatrixRMaj cross = difference(matched.unitCrossCovariance(), reference.unitCrossCovariance());
    return new MatchingError(
        scale.length(shift),
        Whitening.largest(scale.eigenvalues(difference(got, wanted))),
        scale.norm(cross),
        divergence(wanted, got, shift, use == Use.UPDATE ? cross : null));
  }

  private static double divergence(
      DMatrixRMaj wanted, DMatrixRMaj got, double[] shift, DMatrixRMaj cross) {
    Whitening scale = new Whitening(got);
    if (!scale.isDefinite()) {
      return Double.POSITIVE_INFINITY;
    }
    double length = scale.length(shift);
    double sum = length * length;
    // tr(E) - ln det(I + E), E = A_a^-1/2 (A_r - A_a) A_a^-T/2: small errors keep their digits.
    for (double value : scale.eigenvalues(difference(wanted, got))) {
      sum += value - Math.log1p(value);
    }
    if (cross != null) {
      double norm = NormOps_DDRM.normF(scale.rows(cross));
      sum += norm * norm;
    }
    return sum / 2;
  }

  /** {@return the largest of the errors of mean, covariance and cross-covariance} */
  public double largest() {
    return Math.max(mean, Math.max(covariance, crossCovariance));
  }

  private static DMatrixRMaj compared(CarriedMoments moments, Use use) {
    return use == Use.PREDICTION ? moments.covariance() : moments.unexplained();
  }

  private static DMatrixRMaj difference(DMatrixRMaj a, DMatrixRMaj b) {
    DMatrixRMaj result = new DMatrixRMaj(a.numRows, a.numCols);
    CommonOps_DDRM.subtract(a, b, result);
    return result;
  }
}
