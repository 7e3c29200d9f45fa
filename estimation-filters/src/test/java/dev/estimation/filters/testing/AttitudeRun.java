package dev.estimation.filters.testing;

import dev.estimation.core.gaussian.Form;
import dev.estimation.core.gaussian.Gaussian;
import dev.estimation.core.matching.MomentMatching;
import dev.estimation.filters.filter.Estimate;
import dev.estimation.filters.filter.FilterPlan;
import dev.estimation.filters.filter.FilterWorkspace;
import dev.estimation.filters.filter.SensorPort;
import dev.estimation.filters.filter.StepStatus;
import dev.estimation.filters.motion.GyroscopeAttitude;
import dev.estimation.filters.sensor.KnownVector;
import java.util.SplittableRandom;

/** A body that turns about changing axes, simulated by the very models that the filter has. */
public final class AttitudeRun {
  /** Steps of a run. */
  public static final int STEPS = 100;

  private static final double DT = 0.1;
  private static final double[][] WORLD = {{0, 0, 1}, {0.6, 0.8, 0}};

  private final GyroscopeAttitude motion = new GyroscopeAttitude(1e-4, 1e-6);
  private final KnownVector sensor = Attitude.knownVector(0.02);
  private final FilterPlan plan;
  private final FilterWorkspace work;
  private final SensorPort port;
  private final SplittableRandom random;
  private final Estimate estimate;
  private double[] truth = {0.5, -0.5, 0.5, 0.5, 0.01, -0.02, 0.03};

  /** A run whose first estimate is off by what it says of itself. */
  public AttitudeRun(MomentMatching matching, Form form, double spread, long seed) {
    plan = BothForms.formed(FilterPlan.of(motion, matching), form);
    work = plan.workspace();
    port = work.port(sensor);
    random = new SplittableRandom(seed);
    double[] deviations = {spread, spread, spread, 0.02, 0.02, 0.02};
    // The truth lies around the mean: mean exp(e) is the truth.
    double[] mean = truth;
    truth = displaced(mean, deviations);
    estimate = plan.start(0, Gaussian.independent(Attitude.SPACE, mean, deviations));
  }

  private double[] displaced(double[] point, double[] deviations) {
    double[] error = new double[6];
    for (int i = 0; i < 6; i++) {
      error[i] = deviations[i] * random.nextGaussian();
    }
    double[] result = new double[7];
    Attitude.SPACE.displace(point, error, result);
    return result;
  }

  /** A step of truth and filter; every second one sees both directions. */
  public void step(int k) {
    double[] rates = {0.5 * Math.sin(0.05 * k), 0.4, 0.3 * Math.cos(0.11 * k)};
    double[] moved = new double[7];
    motion.move(truth, rates, estimate.time(), DT, moved);
    double angle = 0.01 * Math.sqrt(DT);
    double bias = 0.001 * Math.sqrt(DT);
    truth = displaced(moved, new double[] {angle, angle, angle, bias, bias, bias});
    require(work.predict(estimate, estimate.time() + DT, rates), work.failure());
    if (k % 2 == 1) {
      for (double[] direction : WORLD) {
        double[] seen = new double[3];
        sensor.measure(truth, direction, seen);
        for (int i = 0; i < 3; i++) {
          seen[i] += 0.02 * random.nextGaussian();
        }
        require(port.update(estimate, seen, direction), port.failure());
      }
    }
  }

  private static void require(StepStatus status, String failure) {
    if (status != StepStatus.APPLIED) {
      throw new AssertionError(status + ": " + failure);
    }
  }

  /** What the filter says. */
  public Estimate estimate() {
    return estimate;
  }

  /** What predicts. */
  public FilterWorkspace work() {
    return work;
  }

  /** A copy of the true state. */
  public double[] truth() {
    return truth.clone();
  }
}
