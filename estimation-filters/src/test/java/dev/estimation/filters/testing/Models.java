package dev.estimation.filters.testing;

import dev.estimation.core.function.Structure;
import dev.estimation.core.space.Space;
import dev.estimation.filters.model.DifferentiableMotion;
import dev.estimation.filters.model.DifferentiableNoiseDrivenMotion;
import dev.estimation.filters.model.DifferentiableSensor;
import org.ejml.data.DMatrixRMaj;

/** Small models that several tests need. */
public final class Models {
  private Models() {}

  /** x' = F x, noise Q added. */
  public record LinearMotion(DMatrixRMaj f, DMatrixRMaj q) implements DifferentiableMotion {
    @Override
    public Space stateSpace() {
      return Space.reals(f.numRows);
    }

    @Override
    public void move(double[] state, double[] control, double time, double dt, double[] next) {
      multiply(f, state, next);
    }

    @Override
    public void moveJacobian(
        double[] state, double[] control, double time, double dt, double[] jacobian) {
      System.arraycopy(f.data, 0, jacobian, 0, f.getNumElements());
    }

    @Override
    public void processNoise(
        double[] state, double[] control, double time, double dt, double[] covariance) {
      System.arraycopy(q.data, 0, covariance, 0, q.getNumElements());
    }
  }

  /** x' = F x + G noise, noise of covariance Q inside. */
  public record LinearNoiseDriven(DMatrixRMaj f, DMatrixRMaj g, DMatrixRMaj q)
      implements DifferentiableNoiseDrivenMotion {
    @Override
    public Space stateSpace() {
      return Space.reals(f.numRows);
    }

    @Override
    public int noiseDimension() {
      return q.numRows;
    }

    @Override
    public void move(
        double[] state, double[] noise, double[] control, double time, double dt, double[] next) {
      multiply(f, state, next);
      double[] driven = new double[next.length];
      multiply(g, noise, driven);
      for (int i = 0; i < next.length; i++) {
        next[i] += driven[i];
      }
    }

    @Override
    public void moveJacobians(
        double[] state,
        double[] noise,
        double[] control,
        double time,
        double dt,
        double[] byState,
        double[] byNoise) {
      System.arraycopy(f.data, 0, byState, 0, f.getNumElements());
      System.arraycopy(g.data, 0, byNoise, 0, g.getNumElements());
    }

    @Override
    public void noiseCovariance(double[] control, double time, double dt, double[] covariance) {
      System.arraycopy(q.data, 0, covariance, 0, q.getNumElements());
    }
  }

  /** z = H x, noise R. */
  public record LinearSensor(DMatrixRMaj h, DMatrixRMaj r) implements DifferentiableSensor {
    @Override
    public Space measurementSpace() {
      return Space.reals(h.numRows);
    }

    @Override
    public void measure(double[] state, double[] given, double[] measurement) {
      multiply(h, state, measurement);
    }

    @Override
    public void measureJacobian(double[] state, double[] given, double[] jacobian) {
      System.arraycopy(h.data, 0, jacobian, 0, h.getNumElements());
    }

    @Override
    public void measurementNoise(double[] state, double[] given, double[] covariance) {
      System.arraycopy(r.data, 0, covariance, 0, r.getNumElements());
    }
  }

  /** Sees the first component, an angle, sigma 0.1 rad. It does not tell that it is linear. */
  public record Compass() implements DifferentiableSensor {
    @Override
    public Space measurementSpace() {
      return Space.angles(1);
    }

    @Override
    public void measure(double[] state, double[] given, double[] measurement) {
      measurement[0] = state[0];
    }

    @Override
    public void measureJacobian(double[] state, double[] given, double[] jacobian) {
      jacobian[0] = 1;
    }

    @Override
    public void measurementNoise(double[] state, double[] given, double[] covariance) {
      covariance[0] = 0.01;
    }
  }

  /** Distance to a given place in the plane; its variance is given too. */
  public record Distance() implements DifferentiableSensor {
    @Override
    public Space measurementSpace() {
      return Space.reals(1);
    }

    @Override
    public int givenDimension() {
      return 3;
    }

    @Override
    public void measure(double[] state, double[] given, double[] measurement) {
      measurement[0] = Math.hypot(state[0] - given[0], state[1] - given[1]);
    }

    @Override
    public void measureJacobian(double[] state, double[] given, double[] jacobian) {
      double distance = Math.hypot(state[0] - given[0], state[1] - given[1]);
      jacobian[0] = (state[0] - given[0]) / distance;
      jacobian[1] = (state[1] - given[1]) / distance;
    }

    @Override
    public void measurementNoise(double[] state, double[] given, double[] covariance) {
      covariance[0] = given[2];
    }

    @Override
    public Structure structure() {
      return Structure.UNKNOWN.withActiveInputs(0, 1);
    }
  }

  /** The cube of a scalar. */
  public record Cube(double variance) implements DifferentiableSensor {
    @Override
    public Space measurementSpace() {
      return Space.reals(1);
    }

    @Override
    public void measure(double[] state, double[] given, double[] measurement) {
      measurement[0] = state[0] * state[0] * state[0];
    }

    @Override
    public void measureJacobian(double[] state, double[] given, double[] jacobian) {
      jacobian[0] = 3 * state[0] * state[0];
    }

    @Override
    public void measurementNoise(double[] state, double[] given, double[] covariance) {
      covariance[0] = variance;
    }
  }

  private static void multiply(DMatrixRMaj matrix, double[] x, double[] result) {
    for (int r = 0; r < matrix.numRows; r++) {
      double sum = 0;
      for (int c = 0; c < matrix.numCols; c++) {
        sum += matrix.get(r, c) * x[c];
      }
      result[r] = sum;
    }
  }
}
