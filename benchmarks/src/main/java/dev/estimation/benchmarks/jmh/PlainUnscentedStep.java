package dev.estimation.benchmarks.jmh;

import dev.estimation.filters.model.MotionModel;
import dev.estimation.filters.model.SensorModel;
import org.ejml.data.DMatrixRMaj;
import org.ejml.dense.row.CommonOps_DDRM;
import org.ejml.dense.row.factory.DecompositionFactory_DDRM;
import org.ejml.dense.row.factory.LinearSolverFactory_DDRM;
import org.ejml.interfaces.decomposition.CholeskyDecomposition_F64;
import org.ejml.interfaces.linsol.LinearSolverDense;

/**
 * The same step as anyone would write it from the textbook with a matrix library: scaled sigma points
 * with alpha = 1, beta = 2, kappa = 0 over the whole state, matrix operations throughout, matrices and
 * solvers used again. What the library is compared with.
 */
final class PlainUnscentedStep {
  private static final int N = 5;
  private static final int M = 2;
  private static final int POINTS = 2 * N + 1;

  private final MotionModel motion;
  private final SensorModel sensor;
  private final double[] nothing = new double[0];
  private final double weight = 0.5 / N;
  private final double spread = Math.sqrt(N);
  final DMatrixRMaj mean = new DMatrixRMaj(N, 1);
  final DMatrixRMaj covariance = new DMatrixRMaj(N, N);
  private final DMatrixRMaj processNoise = new DMatrixRMaj(N, N);
  private final DMatrixRMaj measurementNoise = new DMatrixRMaj(M, M);
  private final DMatrixRMaj points = new DMatrixRMaj(N, POINTS);
  private final DMatrixRMaj images = new DMatrixRMaj(M, POINTS);
  private final DMatrixRMaj weighted = new DMatrixRMaj(N, POINTS);
  private final DMatrixRMaj weightedImages = new DMatrixRMaj(M, POINTS);
  private final DMatrixRMaj factor = new DMatrixRMaj(N, N);
  private final DMatrixRMaj predicted = new DMatrixRMaj(M, 1);
  private final DMatrixRMaj innovation = new DMatrixRMaj(M, 1);
  private final DMatrixRMaj innovationCovariance = new DMatrixRMaj(M, M);
  private final DMatrixRMaj cross = new DMatrixRMaj(M, N);
  private final DMatrixRMaj gain = new DMatrixRMaj(M, N);
  private final DMatrixRMaj correction = new DMatrixRMaj(N, 1);
  private final DMatrixRMaj transposed = new DMatrixRMaj(N, N);
  private final double[] state = new double[N];
  private final double[] next = new double[N];
  private final double[] image = new double[M];
  private final CholeskyDecomposition_F64<DMatrixRMaj> cholesky =
      DecompositionFactory_DDRM.chol(N, true);
  private final LinearSolverDense<DMatrixRMaj> solver = LinearSolverFactory_DDRM.chol(M);

  PlainUnscentedStep(MotionModel motion, SensorModel sensor) {
    this.motion = motion;
    this.sensor = sensor;
  }

  void predict() {
    drawPoints();
    for (int i = 0; i < POINTS; i++) {
      readColumn(points, i, state);
      motion.move(state, nothing, 0, 1, next);
      writeColumn(points, i, next);
    }
    fillMean(points, mean);
    subtract(points, mean);
    scaleColumns(points, weighted);
    CommonOps_DDRM.multTransB(weighted, points, covariance);
    motion.processNoise(state, nothing, 0, 1, processNoise.data);
    CommonOps_DDRM.addEquals(covariance, processNoise);
  }

  void update(double[] measurement) {
    drawPoints();
    for (int i = 0; i < POINTS; i++) {
      readColumn(points, i, state);
      sensor.measure(state, nothing, image);
      writeColumn(images, i, image);
    }
    fillMean(images, predicted);
    subtract(images, predicted);
    subtract(points, mean);
    scaleColumns(images, weightedImages);
    CommonOps_DDRM.multTransB(weightedImages, images, innovationCovariance);
    sensor.measurementNoise(mean.data, nothing, measurementNoise.data);
    CommonOps_DDRM.addEquals(innovationCovariance, measurementNoise);
    CommonOps_DDRM.multTransB(weightedImages, points, cross);
    if (!solver.setA(innovationCovariance)) {
      throw new ArithmeticException("innovation covariance is not definite");
    }
    solver.solve(cross, gain);
    innovation.data[0] = measurement[0] - predicted.data[0];
    innovation.data[1] = measurement[1] - predicted.data[1];
    CommonOps_DDRM.multTransA(gain, innovation, correction);
    CommonOps_DDRM.addEquals(mean, correction);
    CommonOps_DDRM.multTransA(gain, cross, factor);
    CommonOps_DDRM.subtractEquals(covariance, factor);
    CommonOps_DDRM.transpose(covariance, transposed);
    CommonOps_DDRM.add(0.5, covariance, 0.5, transposed, covariance);
  }

  private void drawPoints() {
    factor.setTo(covariance);
    if (!cholesky.decompose(factor)) {
      throw new ArithmeticException("covariance is not definite");
    }
    cholesky.getT(factor);
    for (int r = 0; r < N; r++) {
      points.set(r, 0, mean.get(r, 0));
      for (int c = 0; c < N; c++) {
        points.set(r, 1 + c, mean.get(r, 0) + spread * factor.get(r, c));
        points.set(r, 1 + N + c, mean.get(r, 0) - spread * factor.get(r, c));
      }
    }
  }

  /** Centre weight 0 in means. */
  private void fillMean(DMatrixRMaj values, DMatrixRMaj result) {
    for (int r = 0; r < values.numRows; r++) {
      double sum = 0;
      for (int i = 1; i < POINTS; i++) {
        sum += values.get(r, i);
      }
      result.set(r, 0, weight * sum);
    }
  }

  private static void subtract(DMatrixRMaj values, DMatrixRMaj centre) {
    for (int r = 0; r < values.numRows; r++) {
      for (int i = 0; i < POINTS; i++) {
        values.set(r, i, values.get(r, i) - centre.get(r, 0));
      }
    }
  }

  /** Centre weight 2 in covariances. */
  private void scaleColumns(DMatrixRMaj values, DMatrixRMaj result) {
    for (int r = 0; r < values.numRows; r++) {
      result.set(r, 0, 2 * values.get(r, 0));
      for (int i = 1; i < POINTS; i++) {
        result.set(r, i, weight * values.get(r, i));
      }
    }
  }

  private static void readColumn(DMatrixRMaj values, int column, double[] target) {
    for (int r = 0; r < target.length; r++) {
      target[r] = values.get(r, column);
    }
  }

  private static void writeColumn(DMatrixRMaj values, int column, double[] source) {
    for (int r = 0; r < source.length; r++) {
      values.set(r, column, source[r]);
    }
  }
}
