package dev.estimation.benchmarks.jmh;

import dev.estimation.benchmarks.cases.vessel.CoordinatedTurn;
import dev.estimation.benchmarks.cases.vessel.ShipRadar;
import dev.estimation.core.gaussian.Gaussian;
import dev.estimation.core.space.Space;
import dev.estimation.filters.model.DifferentiableMotion;
import java.util.SplittableRandom;

/**
 * The five-state step that benchmarks measure: a coordinated turn over 1 s with fixed noise, seen in
 * range and bearing from the origin.
 */
public final class TurnProblem {
  /** Variances of range (m^2) and bearing (rad^2). */
  static final double RANGE_VARIANCE = 100;

  static final double BEARING_VARIANCE = 9e-6;

  private TurnProblem() {}

  /** {@return the motion, noise diag(0.1, 0.1, 0.1, 0.1, 1e-6)} */
  public static DifferentiableMotion motion() {
    return new FixedNoiseTurn();
  }

  /** {@return the sensor; given is the place of the origin, (0, 0)} */
  public static ShipRadar sensor() {
    return new ShipRadar(Math.sqrt(RANGE_VARIANCE), Math.sqrt(BEARING_VARIANCE));
  }

  /** {@return the first estimate} */
  public static Gaussian start() {
    double[] deviations = {20, 20, 5, 5, Math.sqrt(1e-3)};
    return Gaussian.independent(new double[] {1000, 1000, 14, 4, 0}, deviations);
  }

  /** {@return measurements of a target that moves as the model says, simulated from a seed} */
  public static double[][] measurements(int count, long seed) {
    SplittableRandom random = new SplittableRandom(seed);
    DifferentiableMotion motion = motion();
    ShipRadar sensor = sensor();
    double[] state = {1000, 1000, 14, 4, 0.02};
    double[] next = new double[5];
    double[][] measurements = new double[count][2];
    for (double[] measurement : measurements) {
      motion.move(state, new double[0], 0, 1, next);
      System.arraycopy(next, 0, state, 0, 5);
      sensor.measure(state, new double[2], measurement);
      measurement[0] += Math.sqrt(RANGE_VARIANCE) * random.nextGaussian();
      measurement[1] += Math.sqrt(BEARING_VARIANCE) * random.nextGaussian();
    }
    return measurements;
  }

  /** The turn of the vessel case, with noise that does not depend on time. */
  private static final class FixedNoiseTurn implements DifferentiableMotion {
    private final CoordinatedTurn turn = new CoordinatedTurn(0, 0);

    @Override
    public Space stateSpace() {
      return turn.stateSpace();
    }

    @Override
    public void move(double[] state, double[] control, double time, double dt, double[] next) {
      turn.move(state, control, time, dt, next);
    }

    @Override
    public void moveJacobian(
        double[] state, double[] control, double time, double dt, double[] jacobian) {
      turn.moveJacobian(state, control, time, dt, jacobian);
    }

    @Override
    public void processNoise(
        double[] state, double[] control, double time, double dt, double[] covariance) {
      for (int i = 0; i < 4; i++) {
        covariance[i * 6] = 0.1;
      }
      covariance[24] = 1e-6;
    }
  }
}
