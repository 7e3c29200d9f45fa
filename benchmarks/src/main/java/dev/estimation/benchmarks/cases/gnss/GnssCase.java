package dev.estimation.benchmarks.cases.gnss;

import dev.estimation.benchmarks.log.LogFolder;
import dev.estimation.benchmarks.replay.ConstantTruth;
import dev.estimation.benchmarks.replay.LoadedVariant;
import dev.estimation.benchmarks.replay.ReplayCase;
import dev.estimation.benchmarks.replay.Scenario;
import dev.estimation.benchmarks.replay.VariableNames;
import dev.estimation.core.gaussian.Gaussian;
import dev.estimation.filters.model.MotionModel;
import dev.estimation.filters.motion.MotionBlocks;
import dev.estimation.filters.motion.RandomWalk;
import dev.estimation.filters.motion.ReceiverClock;
import dev.estimation.filters.sensor.Components;
import dev.estimation.filters.sensor.Pseudorange;
import dev.estimation.filters.sensor.Sight;
import java.util.List;
import java.util.Optional;
import java.util.OptionalDouble;

/**
 * A receiver placed by pseudoranges from a start {@code far} away: 100 km, over which ranges bend by
 * hundreds of times their noise. The start is the true place plus an offset, so a log without truth
 * has none. There is no gate.
 */
public final class GnssCase implements ReplayCase {
  private static final String FAR = "far";
  private static final double POSITION_DENSITY = 1e-3;
  private static final double CLOCK_DENSITY = 1e-3;
  private static final double DRIFT_DENSITY = 1e-8;
  private static final double DISTANCE = 1e5;
  private static final double[] DIRECTION = {0.6, -0.48, 0.64};
  private static final double[] START_DEVIATIONS = {DISTANCE, DISTANCE, DISTANCE, 3e5, 10};

  /**
   * A place (m, Earth-fixed) that walks at random, a little, to keep its covariance honest when errors stay the same
   * for minutes; and the clock (m, m/s).
   */
  private final MotionModel motion = MotionBlocks.of(
      new RandomWalk(POSITION_DENSITY, POSITION_DENSITY, POSITION_DENSITY),
      new ReceiverClock(CLOCK_DENSITY, DRIFT_DENSITY));

  private final String logName;
  private final GnssLog log;

  /** The case on a log, which is read here. */
  public GnssCase(LogFolder folder) {
    this.logName = folder.name();
    Sight satellite = Sight.fromGiven(Components.of(0, 1, 2));
    this.log = new GnssLog(folder, Pseudorange.ofGivenDeviation(satellite, Components.of(3)));
  }

  @Override
  public List<String> variants() {
    return List.of(FAR);
  }

  @Override
  public LoadedVariant load(String variant) {
    if (!variant.equals(FAR)) {
      throw new IllegalArgumentException("variant must be " + FAR + ", got " + variant);
    }
    return log.place()
        .map(place -> LoadedVariant.of(FAR, logName, scenario(place)))
        .orElseGet(() -> LoadedVariant.absent(
            FAR, logName, "no start: truth.csv does not tell where the receiver is"));
  }

  @Override
  public VariableNames names(String variant) {
    return VariableNames.ofState("x [m]", "y [m]", "z [m]", "clock [m]", "clock drift [m/s]")
        .withMeasurement("pseudorange [m]")
        .withPlane(0, 1)
        .withPlane(0, 2)
        .withPlane(1, 2);
  }

  private Scenario scenario(double[] place) {
    double[] mean = new double[START_DEVIATIONS.length];
    for (int i = 0; i < place.length; i++) {
      mean[i] = place[i] + DISTANCE * DIRECTION[i];
    }
    return new Scenario(
        motion,
        OptionalDouble.empty(),
        Gaussian.independent(mean, START_DEVIATIONS),
        log.steps(),
        Optional.of(new ConstantTruth(place)));
  }
}
