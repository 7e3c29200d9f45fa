package dev.estimation.filters.filter;

import dev.estimation.core.gaussian.Covariance;
import dev.estimation.core.gaussian.Moments;
import dev.estimation.core.matching.MatchingStatus;
import dev.estimation.core.matching.MatchingWorkspace;
import java.util.Optional;
import org.ejml.data.DMatrixRMaj;
import org.ejml.dense.row.CommonOps_DDRM;

/** One thread's way of carrying an estimate over a time, whichever way the noise enters. */
abstract class Transition {
  private final String name;
  private final int controlDimension;
  private final NoiseMatrix noise;
  private final MatchingWorkspace matching;
  private final double[] mean;
  private boolean matched;

  Transition(String name, int controlDimension, NoiseMatrix noise, MatchingWorkspace matching) {
    this.name = name;
    this.controlDimension = controlDimension;
    this.noise = noise;
    this.matching = matching;
    this.mean = new double[matching.output().mean().length];
  }

  /** Carries the moments of the state; {@link #output()} is valid if the status is an applied one. */
  final StepStatus carry(Moments prior, double[] control, double time, double dt) {
    matched = false;
    // A copy, since a model may write on what it is given, against its contract.
    System.arraycopy(prior.mean(), 0, mean, 0, mean.length);
    fillNoise(mean, control, time, dt, noise.blank());
    if (!noise.isValid()) {
      return StepStatus.NOISE_NOT_VALID;
    }
    matched = true;
    MatchingStatus ended = match(prior, control, time, dt, noise.covariance(), matching);
    if (!ended.hasResult()) {
      return StepStatus.of(ended);
    }
    return output().factor() ? StepStatus.of(ended) : StepStatus.NOT_DEFINITE;
  }

  abstract void fillNoise(
      double[] mean, double[] control, double time, double dt, double[] covariance);

  abstract MatchingStatus match(
      Moments prior,
      double[] control,
      double time,
      double dt,
      Covariance noiseCovariance,
      MatchingWorkspace workspace);

  final Moments output() {
    return matching.output();
  }

  /**
   * The cross-covariance of the state before and after: C = B W, over the rows of the state.
   *
   * @param cross filled, d x d
   */
  final void crossCovariance(DMatrixRMaj cross) {
    double[] b = matching.inputFactor().data;
    double[] w = matching.unitCrossCovariance().data;
    int k = matching.activeInputs();
    int d = cross.numRows;
    int n = matching.inputFactor().numCols;
    for (int r = 0; r < d; r++) {
      for (int c = 0; c < d; c++) {
        double sum = 0;
        for (int a = 0; a < k; a++) {
          sum += b[r * n + a] * w[a * d + c];
        }
        cross.data[r * d + c] = sum;
      }
    }
  }

  /** [W' L 0; B 0 E] over the rows of the state, L the factor of what the input does not explain; none if T has none. */
  final Optional<DMatrixRMaj> jointRoot() {
    Covariance rest = matching.unexplained();
    if (!rest.factor()) {
      return Optional.empty();
    }
    int d = rest.dimension();
    int k = matching.activeInputs();
    DMatrixRMaj w = matching.unitCrossCovariance();
    DMatrixRMaj input = matching.inputFactor();
    int n = input.numCols;
    DMatrixRMaj root = new DMatrixRMaj(2 * d, n + d);
    CommonOps_DDRM.extract(input, 0, d, 0, k, root, d, 0);
    CommonOps_DDRM.extract(input, 0, d, k, n, root, d, k + d);
    CommonOps_DDRM.insert(rest.lowerFactor(), root, 0, k);
    for (int c = 0; c < d; c++) {
      for (int a = 0; a < k; a++) {
        root.set(c, a, w.get(a, c));
      }
    }
    return Optional.of(root);
  }

  final String name() {
    return name;
  }

  final int controlDimension() {
    return controlDimension;
  }

  final int evaluations() {
    return matched ? matching.evaluations() : 0;
  }

  final int jacobians() {
    return matched ? matching.jacobians() : 0;
  }

  final double estimatedError() {
    return matched ? matching.estimatedError() : Double.NaN;
  }

  /** Why the last carry ended with the given status. */
  final String failure(StepStatus status) {
    if (status == StepStatus.NOISE_NOT_VALID) {
      return noise.failure();
    }
    if (status == StepStatus.NOT_DEFINITE && matching.failure().isEmpty()) {
      return "predicted covariance is not positive semi-definite: " + output().factorFailure();
    }
    return matching.failure();
  }
}
