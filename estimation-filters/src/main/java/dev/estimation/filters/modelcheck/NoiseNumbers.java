package dev.estimation.filters.modelcheck;

import dev.estimation.core.gaussian.Covariance;
import dev.estimation.core.internal.SymmetricMatrix;
import org.ejml.data.DMatrixRMaj;

/** Whether a noise covariance is one, and not lost in the rounding of what it belongs to. */
final class NoiseNumbers {
  private final Examination examination;
  private final Operation noise;
  private final boolean definite;

  NoiseNumbers(Examination examination) {
    this.examination = examination;
    this.noise = examination.subject.noise();
    this.definite = examination.subject.isSensor();
  }

  void look() {
    for (Arguments at : examination.places) {
      Attempt attempt = Attempt.of(noise, at);
      if (attempt.isFinite()) {
        look(at, matrix(attempt.out()));
      }
    }
  }

  private static DMatrixRMaj matrix(double[] entries) {
    int n = (int) Math.round(Math.sqrt(entries.length));
    DMatrixRMaj matrix = new DMatrixRMaj(n, n);
    matrix.setData(entries);
    return matrix;
  }

  private void look(Arguments at, DMatrixRMaj matrix) {
    int odd = firstBadVariance(matrix) < 0 ? SymmetricMatrix.firstAsymmetric(matrix) : -1;
    if (odd >= 0) {
      reportAsymmetry(at, matrix, odd);
      return;
    }
    Covariance covariance = new Covariance(matrix.numRows);
    covariance.changeMatrix().setTo(matrix);
    if (!(definite ? covariance.isDefinite() : covariance.factor())) {
      reportIndefinite(at, matrix, covariance);
    } else if (examination.subject.noises() == 0) {
      lookAtRounding(at, matrix);
    }
  }

  private static int firstBadVariance(DMatrixRMaj matrix) {
    for (int i = 0; i < matrix.numRows; i++) {
      if (!(matrix.get(i, i) >= 0)) {
        return i;
      }
    }
    return -1;
  }

  private void reportAsymmetry(Arguments at, DMatrixRMaj matrix, int odd) {
    int n = matrix.numRows;
    int mirror = odd % n * n + odd / n;
    double got = matrix.data[odd];
    double wanted = matrix.data[mirror];
    examination.ledger.add(
        FindingKind.NOISE_NOT_SYMMETRIC,
        noise,
        noise.entry(odd),
        at,
        wanted,
        got,
        Math.abs(got - wanted),
        noise.entry(odd) + " must be " + noise.entry(mirror) + " = " + wanted + ", got " + got);
  }

  private void reportIndefinite(Arguments at, DMatrixRMaj matrix, Covariance covariance) {
    int variance = firstBadVariance(matrix);
    double got = variance >= 0 ? matrix.get(variance, variance) : covariance.failedValue();
    String reason = variance >= 0
        ? noise.entry(variance * (matrix.numRows + 1)) + " = " + got
        : covariance.failure();
    examination.ledger.add(
        FindingKind.NOISE_NOT_DEFINITE,
        noise,
        "covariance",
        at,
        0,
        got,
        -got,
        "covariance must be positive " + (definite ? "definite" : "semi-definite") + ", got "
            + reason);
  }

  private void lookAtRounding(Arguments at, DMatrixRMaj matrix) {
    double[] value = examination.view.value(at);
    for (int i = 0; value != null && value.length == matrix.numRows && i < value.length; i++) {
      double deviation = Math.sqrt(matrix.get(i, i));
      double limit = Math.ulp(value[i]) / 2;
      if (deviation > 0 && deviation < limit) {
        String entry = noise.entry(i * (matrix.numRows + 1));
        examination.ledger.add(
            FindingKind.NOISE_BELOW_ROUNDING,
            noise,
            entry,
            at,
            limit,
            deviation,
            limit / deviation,
            entry + " should be a deviation of " + limit
                + " or more, half the spacing of doubles at " + value[i] + ", got " + deviation);
      }
    }
  }
}
