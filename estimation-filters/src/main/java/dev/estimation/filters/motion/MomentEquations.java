package dev.estimation.filters.motion;

import dev.estimation.core.internal.Checks;
import java.util.Arrays;
import org.apache.commons.math3.ode.FirstOrderDifferentialEquations;

/**
 * The equations of the state, x' = a(x), alone or with a matrix X behind it, row by row: the transition, X' = A X, or
 * the covariance of the noise, X' = A X + X A' + D. The variable is the time since the start. One integration's own.
 */
final class MomentEquations implements FirstOrderDifferentialEquations {
  /** What is integrated. */
  enum Kind {
    STATE,
    TRANSITION,
    NOISE
  }

  /** Ends an integration where the model gives no number. */
  static final class NotFiniteException extends RuntimeException {
    private static final long serialVersionUID = 1L;

    NotFiniteException() {
      super(null, null, false, false);
    }
  }

  private final DifferentiableContinuousMotion motion;
  private final Kind kind;
  private final double[] control;
  private final double start;
  private final int d;
  private final double[] state;
  private final double[] rate;
  private final double[] jacobian;
  private final double[] density;

  MomentEquations(
      DifferentiableContinuousMotion motion, Kind kind, double[] control, double start) {
    this.motion = motion;
    this.kind = kind;
    this.control = control;
    this.start = start;
    this.d = motion.stateSpace().dimension();
    this.state = new double[d];
    this.rate = new double[d];
    this.jacobian = new double[kind == Kind.STATE ? 0 : d * d];
    this.density = new double[kind == Kind.NOISE ? d * d : 0];
  }

  @Override
  public int getDimension() {
    return kind == Kind.STATE ? d : d + d * d;
  }

  @Override
  public void computeDerivatives(double elapsed, double[] y, double[] derivative) {
    double time = start + elapsed;
    Arrays.fill(rate, Double.NaN);
    motion.drift(copied(y), control, time, rate);
    System.arraycopy(rate, 0, derivative, 0, d);
    if (kind != Kind.STATE) {
      Arrays.fill(jacobian, 0);
      motion.driftJacobian(copied(y), control, time, jacobian);
      fillProduct(y, derivative);
    }
    if (kind == Kind.NOISE) {
      Arrays.fill(density, 0);
      motion.noiseDensity(copied(y), control, time, density);
      addTransposeAndDensity(derivative);
    }
    if (!Checks.allFinite(derivative, getDimension())) {
      throw new NotFiniteException();
    }
  }

  /** A copy for each call, since a model may write on it, against its contract. */
  private double[] copied(double[] y) {
    System.arraycopy(y, 0, state, 0, d);
    return state;
  }

  /** A X. */
  private void fillProduct(double[] y, double[] derivative) {
    for (int i = 0; i < d; i++) {
      for (int j = 0; j < d; j++) {
        double sum = 0;
        for (int k = 0; k < d; k++) {
          sum += jacobian[i * d + k] * y[d + k * d + j];
        }
        derivative[d + i * d + j] = sum;
      }
    }
  }

  /** X is symmetric, so X A' is the transpose of A X. */
  private void addTransposeAndDensity(double[] derivative) {
    for (int i = 0; i < d; i++) {
      for (int j = 0; j <= i; j++) {
        int lower = d + i * d + j;
        int upper = d + j * d + i;
        double sum = derivative[lower] + derivative[upper] + density[i * d + j];
        derivative[lower] = sum;
        derivative[upper] = sum;
      }
    }
  }
}
