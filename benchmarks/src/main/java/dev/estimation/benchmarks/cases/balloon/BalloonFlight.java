package dev.estimation.benchmarks.cases.balloon;

import dev.estimation.benchmarks.replay.InterpolatedTruth;
import dev.estimation.benchmarks.replay.Measurement;
import dev.estimation.benchmarks.replay.Scenario;
import dev.estimation.benchmarks.replay.Step;
import dev.estimation.core.gaussian.Gaussian;
import dev.estimation.filters.motion.ConstantVelocity;
import dev.estimation.filters.sensor.Components;
import dev.estimation.filters.sensor.RangeAzimuthElevation;
import dev.estimation.filters.sensor.Sight;
import java.util.ArrayList;
import java.util.List;
import java.util.OptionalDouble;
import java.util.Random;

/**
 * Simulates one flight exactly as the filter believes it to be: the true start is drawn from the
 * filter's own start, the wind walks with the filter's own process noise, and measurements err by
 * the sensor's own noise. So an honest covariance is possible, and whatever is not honest comes
 * from the way of carrying moments.
 *
 * <p>{@link Random} and not a newer generator, because its normal draws are specified: the same
 * seed gives the same flight on every Java version.
 */
final class BalloonFlight {
  static final double RANGE_DEVIATION = 3;
  static final double ANGLE_DEVIATION = Math.toRadians(1.0);
  static final double WIND_DENSITY = 0.02;
  static final double ASCENT_DENSITY = 0.002;
  static final double INTERVAL = 10;
  static final int STEPS = 90;
  static final double GATE = 0.999;

  private static final int AXES = 3;
  private static final double[] START_MEAN = {18_000, 24_000, 8_000, 8, 6, 5};
  private static final double[] START_DEVIATIONS = {4_000, 4_000, 2_000, 6, 6, 1};

  private final ConstantVelocity motion =
      new ConstantVelocity(WIND_DENSITY, WIND_DENSITY, ASCENT_DENSITY);
  /** At the origin. The state begins with east, north and up; azimuths are from north to east. */
  private final RangeAzimuthElevation station = new RangeAzimuthElevation(
      Sight.fromGiven(Components.of(1, 0, 2)), RANGE_DEVIATION, ANGLE_DEVIATION, ANGLE_DEVIATION);

  private final Random random;
  private final double[] state = new double[2 * AXES];
  private final double[] origin = new double[AXES];

  BalloonFlight(long seed) {
    this.random = new Random(seed);
  }

  /** Flies once. */
  Scenario fly() {
    for (int i = 0; i < state.length; i++) {
      state[i] = START_MEAN[i] + START_DEVIATIONS[i] * random.nextGaussian();
    }
    InterpolatedTruth.Builder truth = new InterpolatedTruth.Builder(INTERVAL, 0, 1, 2);
    List<Step> steps = new ArrayList<>();
    for (int step = 0; step < STEPS; step++) {
      double time = step * INTERVAL;
      if (step > 0) {
        drift();
      }
      truth.add(time, true, state[0], state[1], state[2]);
      steps.add(new Step(time, List.of(measure())));
    }
    Gaussian start = Gaussian.independent(START_MEAN, START_DEVIATIONS);
    return new Scenario(motion, OptionalDouble.of(GATE), start, steps, truth.build());
  }

  /** Moves by the model and adds noise of its process covariance, axis by axis. */
  private void drift() {
    double[] next = new double[state.length];
    motion.move(state, new double[0], 0, INTERVAL, next);
    for (int axis = 0; axis < AXES; axis++) {
      double density = axis == AXES - 1 ? ASCENT_DENSITY : WIND_DENSITY;
      double first = random.nextGaussian();
      double second = random.nextGaussian();
      // The lower Cholesky factor of [[dt^3/3, dt^2/2], [dt^2/2, dt]] in closed form.
      double scale = Math.sqrt(density * INTERVAL);
      next[axis] += scale * INTERVAL / Math.sqrt(3) * first;
      next[AXES + axis] += scale * (Math.sqrt(3) / 2 * first + second / 2);
    }
    System.arraycopy(next, 0, state, 0, state.length);
  }

  private Measurement measure() {
    double[] value = new double[AXES];
    station.measure(state, origin, value);
    value[0] += RANGE_DEVIATION * random.nextGaussian();
    value[1] += ANGLE_DEVIATION * random.nextGaussian();
    value[2] += ANGLE_DEVIATION * random.nextGaussian();
    return new Measurement(station, value, origin);
  }
}
