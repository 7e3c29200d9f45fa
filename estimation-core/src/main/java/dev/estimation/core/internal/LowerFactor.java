package dev.estimation.core.internal;

import org.ejml.data.DMatrixRMaj;
import org.ejml.dense.row.decomposition.TriangularSolver_DDRM;

/**
 * Lower Cholesky factors of covariance matrices. An object owns its factor and remembers where the
 * last attempt failed; it is confined to one thread and allocates only when built.
 *
 * <p>Why not EJML's: it accepts NaN and infinity on the diagonal, refuses zero variances, and its
 * threshold is not relative to the matrix.
 */
public final class LowerFactor {
  private static final double EPSILON = 0x1p-52;

  /** Pivots above this fraction of their diagonal entry need no closer look. */
  private static final double NEARLY_ZERO = 1e-3;

  /** No pivot beyond this fraction of its diagonal entry passes for rounding, whatever came before. */
  private static final double LARGEST_ROUNDING = 1e-6;

  private final int size;
  private final DMatrixRMaj columns;
  private final double[] inverse;
  private final double[] growth;
  private final double[] least;
  private final int[] lowerIndices;
  private int growthKnown;
  private int failedPivot = -1;
  private double failedValue;

  /**
   * Factors of matrices of the given size: L with P = L L', lower triangular.
   *
   * @param size rows and columns
   */
  public LowerFactor(int size) {
    this.size = size;
    this.columns = new DMatrixRMaj(size, size);
    this.inverse = new double[size];
    this.growth = new double[size];
    this.least = new double[size];
    this.lowerIndices = SymmetricMatrix.lowerIndices(size);
  }

  /** {@return the factor; a failed attempt leaves it in part} */
  public DMatrixRMaj columns() {
    return columns;
  }

  /**
   * Factors a positive definite matrix, reading its lower triangle. A pivot not
   * above {@code n eps} times its diagonal entry fails; NaN and infinity fail.
   *
   * @param matrix n x n, read
   * @return whether it is positive definite
   */
  public boolean factorDefinite(DMatrixRMaj matrix) {
    return factor(matrix, true);
  }

  /**
   * Factors a symmetric positive semi-definite matrix. A pivot within its rounding of zero, with an
   * equally small column, is a zero variance and gives a zero column; NaN and infinity fail.
   *
   * @param matrix n x n, read
   * @return whether it is positive semi-definite
   */
  public boolean factorSemidefinite(DMatrixRMaj matrix) {
    return factor(matrix, false);
  }

  /** Plainly if every pivot is large, else with a close look at each. */
  private boolean factor(DMatrixRMaj matrix, boolean definite) {
    double[] p = matrix.data;
    double[] l = columns.data;
    for (int at : lowerIndices) {
      l[at] = p[at];
    }
    for (int q = 0; q < size; q++) {
      least[q] = NEARLY_ZERO * p[q * (size + 1)];
    }
    if (PlainCholesky.factor(l, size, least)) {
      failedPivot = -1;
      return true;
    }
    return factorCarefully(p, definite);
  }

  /** Row by row: the entries left of the diagonal, then the pivot. */
  private boolean factorCarefully(double[] p, boolean definite) {
    double[] b = columns.data;
    int n = size;
    growthKnown = 0;
    for (int q = 0; q < n; q++) {
      for (int c = 0; c < q; c++) {
        double rest = p[q * n + c] - dot(b, q * n, c * n, c);
        if (inverse[c] == 0 && !vanishes(rest, p, q, c)) {
          return fail(c, 0);
        }
        b[q * n + c] = rest * inverse[c];
      }
      double pivot = p[q * (n + 1)] - dot(b, q * n, q * n, q);
      if (!setPivot(pivot, p, q, definite)) {
        return fail(q, pivot);
      }
    }
    failedPivot = -1;
    return true;
  }

  /** Sets the diagonal entry; false if the pivot is not allowed. */
  private boolean setPivot(double pivot, double[] p, int q, boolean definite) {
    double variance = p[q * (size + 1)];
    double root = pivot > NEARLY_ZERO * variance && pivot <= Double.MAX_VALUE
        ? Math.sqrt(pivot)
        : smallRoot(pivot, p, q, definite);
    if (!(root >= 0)) {
      return false;
    }
    columns.data[q * (size + 1)] = root;
    inverse[q] = root == 0 ? 0 : 1 / root;
    return true;
  }

  /** The root of a pivot that is small or worse: zero for a zero variance, NaN if it is not allowed. */
  private double smallRoot(double pivot, double[] p, int q, boolean definite) {
    double variance = p[q * (size + 1)];
    double bound = definite ? variance : bound(p, q, q);
    double threshold = Math.min(size * EPSILON * bound, LARGEST_ROUNDING * variance);
    if (!(pivot >= -threshold && pivot <= Double.MAX_VALUE && bound <= Double.MAX_VALUE)) {
      return Double.NaN;
    }
    if (pivot > threshold) {
      return Math.sqrt(pivot);
    }
    return definite ? Double.NaN : 0;
  }

  private boolean vanishes(double rest, double[] p, int row, int c) {
    double unit = size * EPSILON * Math.sqrt(bound(p, c, c));
    return Math.abs(rest) <= unit * Math.sqrt(bound(p, row, c));
  }

  /**
   * The rounding of a pivot is about eps times this: its diagonal entry, and the rounding of earlier
   * pivots in the measure in which their columns carry it on. With the diagonal entry alone, exact
   * constraints such as x1 = x0 + x2 would be refused now and then. Asked for small pivots only.
   */
  private double bound(double[] p, int row, int c) {
    for (; growthKnown < c; growthKnown++) {
      double scale = inverse[growthKnown];
      growth[growthKnown] = sum(p, growthKnown, growthKnown) * scale * scale;
    }
    return sum(p, row, c);
  }

  private double sum(double[] p, int row, int c) {
    double[] b = columns.data;
    double sum = p[row * (size + 1)];
    for (int q = 0; q < c; q++) {
      sum += b[row * size + q] * b[row * size + q] * growth[q];
    }
    return sum;
  }

  private boolean fail(int pivot, double value) {
    failedPivot = pivot;
    failedValue = value;
    return false;
  }

  /** {@return which pivot failed, in words: "pivot 2 of 4 is -3.1E-9"} */
  public String failure() {
    return describe(failedPivot, size, failedValue);
  }

  /**
   * {@return a failed pivot in words}
   *
   * @param pivot from 0
   * @param size of the matrix
   * @param value of the pivot
   */
  public static String describe(int pivot, int size, double value) {
    return "pivot " + (pivot + 1) + " of " + size + " is " + value;
  }

  /** {@return the pivot that made the last attempt fail, from 0; -1 if none did} */
  public int failedPivot() {
    return failedPivot;
  }

  /** {@return the value of that pivot} */
  public double failedValue() {
    return failedValue;
  }

  /**
   * Takes what was filled into {@link #columns()} for the factor.
   *
   * @return whether every diagonal entry is finite and 0 or more
   */
  public boolean accept() {
    failedPivot = -1;
    for (int q = 0; q < size; q++) {
      double root = columns.data[q * (size + 1)];
      if (!(root >= 0 && root <= Double.MAX_VALUE)) {
        return fail(q, root);
      }
    }
    return true;
  }

  /** {@return whether no pivot of the factor is zero, or as small as the rounding of its row} */
  public boolean isDefinite() {
    for (int q = 0; q < size; q++) {
      int row = q * size;
      double scale = 0;
      for (int c = 0; c <= q; c++) {
        scale += Math.abs(columns.data[row + c]);
      }
      if (!(columns.data[row + q] > size * EPSILON * scale)) {
        return fail(q, columns.data[row + q] * columns.data[row + q]);
      }
    }
    return true;
  }

  /**
   * Copies the factor of another of the same size.
   *
   * @param other copied from
   */
  public void set(LowerFactor other) {
    System.arraycopy(other.columns.data, 0, columns.data, 0, columns.getNumElements());
    failedPivot = other.failedPivot;
    failedValue = other.failedValue;
  }

  /**
   * Overwrites {@code b} with the solution y of L y = b. Wants a definite factor.
   *
   * @param b n numbers, updated
   */
  public void solveLower(double[] b) {
    TriangularSolver_DDRM.solveL(columns.data, b, size);
  }

  /**
   * Overwrites a vector with the solution x of L L' x = b. Components of zero variance get 0.
   *
   * @param b the vector stands at {@code start} and after, updated
   * @param start where it begins
   */
  public void solve(double[] b, int start) {
    double[] l = columns.data;
    for (int r = 0; r < size; r++) {
      double sum = b[start + r];
      for (int c = 0; c < r; c++) {
        sum -= l[r * size + c] * b[start + c];
      }
      b[start + r] = divided(sum, l[r * (size + 1)]);
    }
    for (int r = size - 1; r >= 0; r--) {
      double sum = b[start + r];
      for (int c = r + 1; c < size; c++) {
        sum -= l[c * size + r] * b[start + c];
      }
      b[start + r] = divided(sum, l[r * (size + 1)]);
    }
  }

  private static double divided(double sum, double pivot) {
    return pivot == 0 ? 0 : sum / pivot;
  }

  /** {@return twice the sum of the logarithms of the diagonal: ln det of the factored matrix} */
  public double logDeterminant() {
    double sum = 0;
    for (int i = 0; i < size; i++) {
      sum += Math.log(columns.data[i * (size + 1)]);
    }
    return 2 * sum;
  }

  private static double dot(double[] data, int a, int b, int length) {
    double sum = 0;
    for (int i = 0; i < length; i++) {
      sum += data[a + i] * data[b + i];
    }
    return sum;
  }
}
