package dev.estimation.benchmarks.cases.robot;

import dev.estimation.benchmarks.log.LogFolder;
import dev.estimation.benchmarks.replay.LoadedVariant;
import dev.estimation.benchmarks.replay.ReplayCase;
import dev.estimation.benchmarks.replay.Scenario;
import dev.estimation.benchmarks.replay.VariableNames;
import dev.estimation.core.gaussian.Gaussian;
import dev.estimation.filters.motion.PlanarVehicle;
import dev.estimation.filters.sensor.Components;
import dev.estimation.filters.sensor.RangeAndBearing;
import dev.estimation.filters.sensor.Sight;
import java.util.List;
import java.util.Optional;
import java.util.OptionalDouble;

/**
 * A robot placed by landmarks, from two starts: {@code near} its true pose and {@code wide} of it.
 * Both are the true pose at the first command plus an offset, so a log without truth has no start.
 */
public final class RobotCase implements ReplayCase {
  private static final double SPEED_DENSITY = 5.0e-4;
  private static final double TURN_DENSITY = 2.0e-3;
  private static final double RANGE_DEVIATION = 0.5;
  private static final double BEARING_DEVIATION = 0.05;
  private static final double GATE = 0.999;
  private static final List<String> VARIANTS = List.of("near", "wide");

  private final PlanarVehicle motion = new PlanarVehicle(SPEED_DENSITY, TURN_DENSITY);
  /** Of a given landmark, from the pose that is the state: x, y, heading. */
  private final RangeAndBearing sensor = new RangeAndBearing(
      Sight.toGiven(Components.of(0, 1)).relativeTo(Components.of(2)),
      RANGE_DEVIATION,
      BEARING_DEVIATION);

  private final String logName;
  private final RobotLog log;

  /** The case on a log, which is read here. */
  public RobotCase(LogFolder folder) {
    this.logName = folder.name();
    this.log = new RobotLog(folder);
  }

  @Override
  public List<String> variants() {
    return VARIANTS;
  }

  @Override
  public LoadedVariant load(String variant) {
    return switch (variant) {
      case "near" ->
        start(variant, "", new double[] {0.2, -0.2, 0.1}, new double[] {0.3, 0.3, 0.15});
      case "wide" ->
        start(variant, "-wide-start", new double[] {1.5, -1.5, 0.8}, new double[] {2, 2, 0.8});
      default ->
        throw new IllegalArgumentException(
            "variant must be one of " + VARIANTS + ", got " + variant);
    };
  }

  @Override
  public VariableNames names(String variant) {
    return VariableNames.ofState("x [m]", "y [m]", "heading [rad]")
        .withMeasurement("range [m]", "bearing [rad]")
        .withPlane(0, 1);
  }

  private LoadedVariant start(String name, String suffix, double[] offset, double[] deviations) {
    String label = logName + suffix;
    double first = log.commands().get(0).time();
    Optional<double[]> pose = log.poseAt(first);
    if (pose.isEmpty()) {
      return LoadedVariant.absent(
          name,
          label,
          "no start: groundtruth.csv has no pose before and after the first odometry row (t = "
              + first + " s)");
    }
    double[] mean = pose.get();
    for (int i = 0; i < mean.length; i++) {
      mean[i] += offset[i];
    }
    Scenario scenario = new Scenario(
        motion,
        OptionalDouble.of(GATE),
        Gaussian.independent(mean, deviations),
        new RobotSteps(log, sensor).steps(),
        log.truth());
    return LoadedVariant.of(name, label, scenario);
  }
}
