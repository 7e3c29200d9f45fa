package dev.estimation.benchmarks.jmh;

import dev.estimation.core.gaussian.Moments;
import dev.estimation.filters.filter.Estimate;
import dev.estimation.filters.filter.FilterWorkspace;
import org.ejml.data.DMatrixRMaj;
import org.ejml.dense.row.CommonOps_DDRM;
import org.ejml.dense.row.factory.LinearSolverFactory_DDRM;
import org.ejml.interfaces.linsol.LinearSolverDense;

/**
 * The backward pass as anyone would write it from the textbook with a matrix library, for states that are plain vectors: G' =
 * P'^-1 C', m + G (m_s - m'), P + G (P_s - P') G'. What the library is compared with.
 */
public final class PlainSmoother {
  private final int n;
  private final DMatrixRMaj[] means;
  private final DMatrixRMaj[] covariances;
  private final DMatrixRMaj[] predictedMeans;
  private final DMatrixRMaj[] predicted;
  private final DMatrixRMaj[] crosses;
  private final DMatrixRMaj[] smoothedMeans;
  private final DMatrixRMaj[] smoothedCovariances;
  private final DMatrixRMaj gain;
  private final DMatrixRMaj turned;
  private final DMatrixRMaj change;
  private final DMatrixRMaj product;
  private final DMatrixRMaj shift;
  private final LinearSolverDense<DMatrixRMaj> solver;
  private int size;

  PlainSmoother(int n, int steps) {
    this.n = n;
    this.means = matrices(steps + 1, 1);
    this.covariances = matrices(steps + 1, n);
    this.predictedMeans = matrices(steps + 1, 1);
    this.predicted = matrices(steps + 1, n);
    this.crosses = matrices(steps + 1, n);
    this.smoothedMeans = matrices(steps + 1, 1);
    this.smoothedCovariances = matrices(steps + 1, n);
    this.gain = new DMatrixRMaj(n, n);
    this.turned = new DMatrixRMaj(n, n);
    this.change = new DMatrixRMaj(n, n);
    this.product = new DMatrixRMaj(n, n);
    this.shift = new DMatrixRMaj(n, 1);
    this.solver = LinearSolverFactory_DDRM.chol(n);
  }

  private DMatrixRMaj[] matrices(int count, int columns) {
    DMatrixRMaj[] result = new DMatrixRMaj[count];
    for (int i = 0; i < count; i++) {
      result[i] = new DMatrixRMaj(n, columns);
    }
    return result;
  }

  void start(Estimate estimate) {
    size = 0;
    keep(estimate);
  }

  /** A step that has ended. */
  void record(FilterWorkspace work, Estimate estimate) {
    Moments prediction = work.prediction(estimate, crosses[size]);
    System.arraycopy(prediction.mean(), 0, predictedMeans[size].data, 0, n);
    predicted[size].setTo(prediction.covariance());
    keep(estimate);
  }

  private void keep(Estimate estimate) {
    for (int i = 0; i < n; i++) {
      means[size].data[i] = estimate.mean(i);
      for (int j = 0; j < n; j++) {
        covariances[size].set(i, j, estimate.covariance(i, j));
      }
    }
    size++;
  }

  /** Goes back to the first estimate. */
  PlainSmoother smooth() {
    smoothedMeans[size - 1].setTo(means[size - 1]);
    smoothedCovariances[size - 1].setTo(covariances[size - 1]);
    for (int k = size - 2; k >= 0; k--) {
      smooth(k);
    }
    return this;
  }

  private void smooth(int k) {
    product.setTo(predicted[k + 1]);
    if (!solver.setA(product)) {
      throw new ArithmeticException("predicted covariance is not definite");
    }
    CommonOps_DDRM.transpose(crosses[k + 1], turned);
    solver.solve(turned, gain);
    CommonOps_DDRM.subtract(smoothedMeans[k + 1], predictedMeans[k + 1], shift);
    CommonOps_DDRM.multTransA(gain, shift, smoothedMeans[k]);
    CommonOps_DDRM.addEquals(smoothedMeans[k], means[k]);
    CommonOps_DDRM.subtract(smoothedCovariances[k + 1], predicted[k + 1], change);
    CommonOps_DDRM.multTransA(gain, change, product);
    CommonOps_DDRM.mult(product, gain, smoothedCovariances[k]);
    CommonOps_DDRM.addEquals(smoothedCovariances[k], covariances[k]);
  }

  double mean(int step, int index) {
    return smoothedMeans[step].data[index];
  }

  double covariance(int step, int row, int column) {
    return smoothedCovariances[step].get(row, column);
  }
}
