package dev.estimation.testing;

import dev.estimation.core.gaussian.Covariance;
import dev.estimation.core.gaussian.Gaussian;
import dev.estimation.core.gaussian.Moments;
import dev.estimation.core.space.Space;
import java.util.SplittableRandom;
import org.ejml.data.DMatrixRMaj;

/**
 * Random means, covariances and matrices for property tests; the same seed gives the same bits.
 *
 * <p>A covariance is A A' / (2 n) + I / 2 with A of n x 2n standard normal numbers, scaled on each
 * axis by a standard deviation from 0.5 to 2: its condition number stays below a few hundred.
 */
public final class RandomGaussians {
  private final SplittableRandom random;

  /** Numbers that follow from the seed. */
  public RandomGaussians(long seed) {
    this.random = new SplittableRandom(seed);
  }

  /** Standard normal numbers. */
  public double[] vector(int length) {
    double[] result = new double[length];
    for (int i = 0; i < length; i++) {
      result[i] = random.nextGaussian();
    }
    return result;
  }

  /** A matrix of standard normal numbers. */
  public DMatrixRMaj matrix(int rows, int columns) {
    return DMatrixRMaj.wrap(rows, columns, vector(rows * columns));
  }

  /** A well-conditioned covariance. */
  public DMatrixRMaj covariance(int size) {
    DMatrixRMaj root = matrix(size, 2 * size);
    double[] deviation = random.doubles(size, 0.5, 2).toArray();
    DMatrixRMaj result = new DMatrixRMaj(size, size);
    for (int i = 0; i < size; i++) {
      for (int j = 0; j <= i; j++) {
        double sum = i == j ? size : 0;
        for (int k = 0; k < 2 * size; k++) {
          sum += root.get(i, k) * root.get(j, k);
        }
        double value = sum / (2 * size) * deviation[i] * deviation[j];
        result.set(i, j, value);
        result.set(j, i, value);
      }
    }
    return result;
  }

  /** A matrix as the step path takes it; null stays null. */
  public static Covariance noise(DMatrixRMaj matrix) {
    if (matrix == null) {
      return null;
    }
    Covariance result = new Covariance(matrix.numRows);
    result.changeMatrix().setTo(matrix);
    return result;
  }

  /** A mean of standard normal numbers and a well-conditioned covariance. */
  public Gaussian gaussian(int size) {
    return Gaussian.of(vector(size), covariance(size));
  }

  /** The same as moments of real numbers. */
  public Moments moments(int size) {
    return momentsOf(gaussian(size));
  }

  /** A random order of 0..size-1. */
  public int[] permutation(int size) {
    int[] order = new int[size];
    for (int i = 0; i < size; i++) {
      int j = random.nextInt(i + 1);
      order[i] = order[j];
      order[j] = i;
    }
    return order;
  }

  /** A number between two bounds. */
  public double uniform(double low, double high) {
    return random.nextDouble(low, high);
  }

  /** Moments of real numbers with the values of a Gaussian. */
  public static Moments momentsOf(Gaussian value) {
    Moments result = new Moments(Space.reals(value.dimension()));
    result.set(value);
    return result;
  }
}
