package dev.estimation.core.evidence;

import java.util.SplittableRandom;
import org.ejml.data.DMatrixRMaj;
import org.ejml.dense.row.factory.DecompositionFactory_DDRM;

/** Random numbers of one problem. */
final class Draw {
  private static final double MOST_CORRELATION = 0.9;

  private final SplittableRandom random;

  Draw(long seed) {
    this.random = new SplittableRandom(seed);
  }

  double uniform(double low, double high) {
    return low + (high - low) * random.nextDouble();
  }

  /** Log-uniform. */
  double log(double low, double high) {
    return Math.exp(uniform(Math.log(low), Math.log(high)));
  }

  double normal() {
    return random.nextGaussian();
  }

  /** A vector of the given length in any direction. */
  double[] direction(int size, double length) {
    double[] result = new double[size];
    double square = 0;
    for (int i = 0; i < size; i++) {
      result[i] = normal();
      square += result[i] * result[i];
    }
    for (int i = 0; i < size; i++) {
      result[i] *= length / Math.sqrt(square);
    }
    return result;
  }

  DMatrixRMaj independent(double... deviations) {
    DMatrixRMaj result = new DMatrixRMaj(deviations.length, deviations.length);
    for (int i = 0; i < deviations.length; i++) {
      result.set(i, i, deviations[i] * deviations[i]);
    }
    return result;
  }

  /** Correlations uniform between -0.9 and 0.9, drawn anew until they are a correlation matrix. */
  DMatrixRMaj correlated(double... deviations) {
    DMatrixRMaj result = independent(deviations);
    do {
      for (int i = 0; i < deviations.length; i++) {
        for (int j = 0; j < i; j++) {
          double most = MOST_CORRELATION * (deviations.length > 3 ? 0.5 : 1);
          double entry = uniform(-most, most) * deviations[i] * deviations[j];
          result.set(i, j, entry);
          result.set(j, i, entry);
        }
      }
    } while (!DecompositionFactory_DDRM.chol(deviations.length, true).decompose(result.copy()));
    return result;
  }
}
