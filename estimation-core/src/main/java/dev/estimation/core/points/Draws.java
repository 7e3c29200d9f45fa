package dev.estimation.core.points;

import dev.estimation.core.internal.LowerFactor;
import java.util.Arrays;
import org.ejml.data.DMatrixRMaj;

/** What all rules of drawn points share: their limits, and shifting and scaling. */
final class Draws {
  /** Fewer replicates would tell their own scatter too badly. */
  static final int FEWEST_REPLICATES = 16;

  private Draws() {}

  /**
   * Refuses a number of points or replicates that a rule cannot have.
   *
   * @param rule the name in the message
   * @param size points of one replicate
   * @param replicates how many
   */
  static void check(String rule, int size, int replicates) {
    if (size < 2) {
      throw new IllegalArgumentException(rule + " must have 2 points or more, got " + size);
    }
    if (replicates != 1 && replicates < FEWEST_REPLICATES) {
      throw new IllegalArgumentException(
          rule + " must have 1 replicate, without standard errors, or " + FEWEST_REPLICATES
              + " and more, got " + replicates);
    }
    UnitPoints.refuseAbove(rule, (double) size * replicates);
  }

  /** Points of equal weight, shifted and scaled to mean 0 and covariance I; the draws are changed. */
  static UnitPoints standardised(int dimension, double[][] draws) {
    if (draws.length <= dimension) {
      throw new IllegalArgumentException("standardised draws must be more than the dimensions, got "
          + draws.length + " draws in " + dimension + " dimensions");
    }
    centre(draws, dimension);
    scale(draws, dimension);
    double[] weights = new double[draws.length];
    Arrays.fill(weights, 1.0 / draws.length);
    return UnitPoints.of(dimension, 0, 0, draws, weights).exactTo(2);
  }

  private static void centre(double[][] draws, int dimension) {
    double[] mean = new double[dimension];
    for (double[] point : draws) {
      for (int i = 0; i < dimension; i++) {
        mean[i] += point[i] / draws.length;
      }
    }
    for (double[] point : draws) {
      for (int i = 0; i < dimension; i++) {
        point[i] -= mean[i];
      }
    }
  }

  /** Solves against the lower factor of the covariance. */
  private static void scale(double[][] draws, int dimension) {
    DMatrixRMaj covariance = new DMatrixRMaj(dimension, dimension);
    for (double[] point : draws) {
      for (int i = 0; i < dimension; i++) {
        for (int j = 0; j <= i; j++) {
          covariance.data[i * dimension + j] += point[i] * point[j] / draws.length;
        }
      }
    }
    LowerFactor factor = new LowerFactor(dimension);
    if (!factor.factorDefinite(covariance)) {
      throw new IllegalArgumentException(
          "the draws have no definite covariance: " + factor.failure());
    }
    for (double[] point : draws) {
      factor.solveLower(point);
    }
  }
}
