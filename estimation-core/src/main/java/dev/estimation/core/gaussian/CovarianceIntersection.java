package dev.estimation.core.gaussian;

import dev.estimation.core.space.Space;
import org.ejml.data.DMatrixRMaj;

/**
 * Estimates of one state whose errors are correlated in an unknown way, fused to one that is never too sure:
 *
 * <pre>
 * P^-1 = w A^-1 + (1 - w) B^-1,   m = P (w A^-1 a + (1 - w) B^-1 b),   0 &lt;= w &lt;= 1.
 * </pre>
 *
 * Whatever the correlation, the covariance of the error of m is at most P, if A and B are honest. The
 * weight minimises the determinant or the trace of P, so that neither is worse than that of the better input.
 * A trace adds up variances of all components: for those of different units, choose the determinant.
 *
 * <p>Computed on axes on which A = T diag(a) T' and B = T diag(b) T', found from lower factors: there P is T
 * diag(a b / (w b + (1 - w) a)) T', no inverse needed. The trace, and the logarithm of the determinant, are convex in
 * w; their derivative is bisected until w has all its digits. Of estimates with equal covariances the weight is 1 / 2.
 *
 * <p>A zero variance is exact knowledge, kept at any weight; the weight then minimises over the other axes. Where both
 * are exact they must agree to 1e-10 of the largest numbers.
 * Means are differenced about that of the first estimate; unit quaternions are fused to first order in
 * the difference.
 *
 * <p>More than two are fused one after the other, each time with the best weight: the result is as honest, but
 * depends on the order, and joint weights could be somewhat better.
 *
 * <p>Cost: two singular value decompositions a pair, off the step path; allocates. <i>Immutable.</i> Source: Julier
 * and Uhlmann 1997, <i>A non-divergent estimation algorithm in the presence of unknown correlations</i> (formulas from
 * memory; convexity derived here).
 */
public final class CovarianceIntersection {
  private static final double SAME = 1e-10;

  /** Shares a and b of an axis closer than this are equal up to rounding. */
  private static final double EQUAL = 1e-12;

  private final Space space;
  private final boolean byTrace;

  private CovarianceIntersection(Space space, boolean byTrace) {
    this.space = space;
    this.byTrace = byTrace;
  }

  /**
   * Weights that minimise the determinant, whatever the units of components.
   *
   * @param space where the state lives
   * @return the method
   */
  public static CovarianceIntersection minimisingDeterminant(Space space) {
    return new CovarianceIntersection(space, false);
  }

  /**
   * Weights that minimise the trace, the sum of the variances.
   *
   * @param space where the state lives; all components in one unit
   * @return the method
   */
  public static CovarianceIntersection minimisingTrace(Space space) {
    return new CovarianceIntersection(space, true);
  }

  /**
   * Fuses estimates, each with what the earlier ones gave.
   *
   * @param first in the space
   * @param others in the space
   * @return mean and covariance
   * @throws IllegalArgumentException if a dimension or mean does not fit the space, or exact estimates contradict
   *     each other
   */
  public Gaussian fuse(Gaussian first, Gaussian... others) {
    Gaussian fused = momentsOf(first).toGaussian();
    for (Gaussian other : others) {
      fused = fuse(momentsOf(fused), momentsOf(other));
    }
    return fused;
  }

  /**
   * The weight of the first of two estimates.
   *
   * @param first in the space
   * @param second in the space
   * @return w, from 0 to 1
   * @throws IllegalArgumentException if a dimension or mean does not fit the space
   */
  public double weight(Gaussian first, Gaussian second) {
    return weight(axes(momentsOf(first), momentsOf(second)));
  }

  private Moments momentsOf(Gaussian value) {
    Moments moments = new Moments(space);
    moments.set(value);
    moments.factor(); // a Gaussian's covariance has a factor
    return moments;
  }

  private SharedAxes axes(Moments a, Moments b) {
    return new SharedAxes(a.factoredCovariance(), b.factoredCovariance(), space.dimension());
  }

  private Gaussian fuse(Moments a, Moments b) {
    int d = space.dimension();
    double[] difference = new double[d];
    space.difference(b.mean(), a.mean(), difference);
    SharedAxes axes = axes(a, b);
    double[] s = axes.coordinates(difference);
    requireAgreement(axes.rest(difference, s), largest(a.mean()) + largest(b.mean()));
    double weight = weight(axes);
    double[] correction = new double[d];
    DMatrixRMaj covariance = new DMatrixRMaj(d, d);
    for (int i = 0; i < s.length; i++) {
      double share = axes.first(i);
      double mixed = mixed(axes, i, weight);
      // Where one is exact, the limit of a weight that goes to that one's side.
      double gain = axes.second(i) == 0 ? 1 : share == 0 ? 0 : (1 - weight) * share / mixed;
      double variance = isOpen(axes, i) ? share * axes.second(i) / mixed : 0;
      for (int r = 0; r < d; r++) {
        double entry = axes.axes().get(r, i);
        correction[r] += entry * gain * s[i];
        for (int c = 0; c < d; c++) {
          covariance.add(r, c, variance * entry * axes.axes().get(c, i));
        }
      }
    }
    double[] mean = new double[space.storage()];
    space.displace(a.mean(), correction, mean);
    return RoundedGaussian.of(space, mean, covariance);
  }

  private static void requireAgreement(double[] rest, double size) {
    for (int i = 0; i < rest.length; i++) {
      if (!(Math.abs(rest[i]) <= SAME * size)) {
        throw new IllegalArgumentException(
            "estimates without variance must agree, but component " + i + " differs by " + rest[i]);
      }
    }
  }

  private static double largest(double[] values) {
    double largest = 0;
    for (double value : values) {
      largest = Math.max(largest, Math.abs(value));
    }
    return largest;
  }

  private static boolean isOpen(SharedAxes axes, int i) {
    return axes.first(i) > 0 && axes.second(i) > 0;
  }

  private static double mixed(SharedAxes axes, int i, double weight) {
    return weight * axes.second(i) + (1 - weight) * axes.first(i);
  }

  private double weight(SharedAxes axes) {
    double most = 0;
    for (int i = 0; i < axes.count(); i++) {
      if (isOpen(axes, i)) {
        most = Math.max(most, Math.abs(axes.first(i) - axes.second(i)));
      }
    }
    if (most <= EQUAL) {
      return 0.5;
    }
    if (slope(axes, 0) >= 0) {
      return 0;
    }
    return slope(axes, 1) <= 0 ? 1 : bisect(axes);
  }

  /** The slope rises from below 0 to above; 100 halvings leave 1e-30. */
  private double bisect(SharedAxes axes) {
    double low = 0;
    double high = 1;
    for (int i = 0; i < 100; i++) {
      double middle = 0.5 * (low + high);
      if (slope(axes, middle) < 0) {
        low = middle;
      } else {
        high = middle;
      }
    }
    return high;
  }

  /** The derivative by w of ln det P, or of trace P. */
  private double slope(SharedAxes axes, double weight) {
    double sum = 0;
    for (int i = 0; i < axes.count(); i++) {
      if (isOpen(axes, i)) {
        double a = axes.first(i);
        double b = axes.second(i);
        double mixed = mixed(axes, i, weight);
        sum += byTrace
            ? squaredLength(axes, i) * (a - b) * (a / mixed) * (b / mixed)
            : (a - b) / mixed;
      }
    }
    return sum;
  }

  private static double squaredLength(SharedAxes axes, int axis) {
    double sum = 0;
    for (int r = 0; r < axes.axes().numRows; r++) {
      double entry = axes.axes().get(r, axis);
      sum += entry * entry;
    }
    return sum;
  }
}
