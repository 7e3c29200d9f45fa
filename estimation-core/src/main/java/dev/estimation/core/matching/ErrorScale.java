package dev.estimation.core.matching;

import dev.estimation.core.gaussian.Covariance;
import java.util.Arrays;

/**
 * Lengths in standard deviations of a covariance that may be singular: a vector that leaves its range is of infinite
 * length, beyond rounding. Each component is brought to a deviation of 1 first; a direction of which less than a millionth
 * of that is left counts as none, and parts below 1e-5 in it are not seen. Lengths are NaN if the sum overflows. <i>Confined
 * to one thread</i>; allocates only when built.
 */
final class ErrorScale {
  private static final double LEAST_PIVOT = 1e-12;
  private static final double ROUNDING = 1e-5;

  private final int rows;
  private final double[] covariance;
  private final double[] factor;
  private final double[] inverseDeviations;
  private final double[] inversePivots;
  private final double[] unit;

  ErrorScale(int rows) {
    this.rows = rows;
    this.covariance = new double[rows * rows];
    this.factor = new double[rows * rows];
    this.inverseDeviations = new double[rows];
    this.inversePivots = new double[rows];
    this.unit = new double[rows];
  }

  /** Begins a sum with a covariance, or with none. */
  void begin(Covariance noise) {
    if (noise == null) {
      Arrays.fill(covariance, 0);
    } else {
      System.arraycopy(noise.lowerTriangle().data, 0, covariance, 0, covariance.length);
    }
  }

  /** Adds v v', the components of v a stride apart. */
  void addSquare(double[] v, int start, int stride) {
    for (int i = 0; i < rows; i++) {
      double value = v[start + i * stride];
      for (int j = 0; j <= i; j++) {
        covariance[i * rows + j] += value * v[start + j * stride];
      }
    }
  }

  /** Adds to the variance of a component. */
  void addVariance(int component, double variance) {
    covariance[component * rows + component] += variance;
  }

  /** Ends the sum; only then lengths mean anything. */
  void factor() {
    for (int i = 0; i < rows; i++) {
      double deviation = Math.sqrt(covariance[i * rows + i]);
      double inverse = deviation > 0 ? 1 / deviation : 1;
      inverseDeviations[i] = Double.isFinite(deviation) ? inverse : Double.NaN;
    }
    for (int j = 0; j < rows; j++) {
      for (int i = j; i < rows; i++) {
        double sum = covariance[i * rows + j] * inverseDeviations[i] * inverseDeviations[j];
        for (int c = 0; c < j; c++) {
          sum -= factor[i * rows + c] * factor[j * rows + c];
        }
        if (i == j) {
          // Of a direction without variance, nothing is divided by 0: it is left out.
          inversePivots[j] = sum > LEAST_PIVOT * rows ? 1 / Math.sqrt(sum) : 0;
        }
        factor[i * rows + j] = sum * inversePivots[j];
      }
    }
  }

  /** The squared length of v, the components a stride apart. */
  double square(double[] v, int start, int stride) {
    return fillUnit(v, start, stride, unit, 0);
  }

  /**
   * Brings v to unit deviations.
   *
   * @param result filled from a place on
   * @return its squared length
   */
  double fillUnit(double[] v, int start, int stride, double[] result, int to) {
    double square = 0;
    for (int i = 0; i < rows; i++) {
      double rest = v[start + i * stride] * inverseDeviations[i];
      for (int j = 0; j < i; j++) {
        rest -= factor[i * rows + j] * result[to + j];
      }
      double unitPart = rest * inversePivots[i];
      result[to + i] = unitPart;
      square += unitPart * unitPart;
      if (inversePivots[i] == 0 && Math.abs(rest) > ROUNDING) {
        square = Double.POSITIVE_INFINITY;
      }
    }
    return square;
  }
}
