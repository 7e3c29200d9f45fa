package dev.estimation.benchmarks.jmh;

import dev.estimation.core.gaussian.Gaussian;
import dev.estimation.filters.model.DifferentiableMotion;
import dev.estimation.filters.model.DifferentiableSensor;
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
    return new Turn();
  }

  /** {@return the sensor; nothing is given} */
  public static DifferentiableSensor sensor() {
    return new Sight();
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
    DifferentiableSensor sensor = sensor();
    double[] nothing = new double[0];
    double[] state = {1000, 1000, 14, 4, 0.02};
    double[] next = new double[5];
    double[][] measurements = new double[count][2];
    for (double[] measurement : measurements) {
      motion.move(state, nothing, 0, 1, next);
      System.arraycopy(next, 0, state, 0, 5);
      sensor.measure(state, nothing, measurement);
      measurement[0] += Math.sqrt(RANGE_VARIANCE) * random.nextGaussian();
      measurement[1] += Math.sqrt(BEARING_VARIANCE) * random.nextGaussian();
    }
    return measurements;
  }
}
