package dev.estimation.benchmarks.cases.vessel;

import dev.estimation.benchmarks.log.LogFolder;
import dev.estimation.benchmarks.replay.LoadedVariant;
import dev.estimation.benchmarks.replay.Measurement;
import dev.estimation.benchmarks.replay.ReplayCase;
import dev.estimation.benchmarks.replay.Scenario;
import dev.estimation.benchmarks.replay.Step;
import dev.estimation.benchmarks.replay.VariableNames;
import dev.estimation.core.gaussian.Gaussian;
import dev.estimation.filters.model.MotionModel;
import dev.estimation.filters.motion.ConstantVelocity;
import dev.estimation.filters.motion.CoordinatedTurn;
import dev.estimation.filters.sensor.Components;
import dev.estimation.filters.sensor.RangeAndBearing;
import dev.estimation.filters.sensor.Sight;
import java.util.ArrayList;
import java.util.Arrays;
import java.util.List;
import java.util.OptionalDouble;

/**
 * Two target vessels, each tracked by radar with constant velocity ({@code cv}) and with a
 * coordinated turn ({@code ct}). The first detection of a target starts its track and is not used
 * again; each later one is a step.
 */
public final class VesselCase implements ReplayCase {
  private static final double RADAR_LAG = 1.6;
  private static final double ACCELERATION_DENSITY = 0.1;
  private static final double TURN_DENSITY = 2.0e-4;
  private static final double GATE = 0.999;
  private static final double[] START_DEVIATIONS = {10, 10, 3, 3, 0.05};
  private static final List<String> VARIANTS =
      List.of("target1-cv", "target1-ct", "target2-cv", "target2-ct");

  /** From the own ship, whose north and east are given with each plot; the state begins with those of the target. */
  private final RangeAndBearing radar =
      new RangeAndBearing(Sight.fromGiven(Components.of(0, 1)), 4.0, 0.03);

  private final String logName;
  private final VesselLog log;

  /** The case on a log, which is read here. */
  public VesselCase(LogFolder folder) {
    this.logName = folder.name();
    this.log = new VesselLog(folder);
  }

  @Override
  public List<String> variants() {
    return VARIANTS;
  }

  @Override
  public LoadedVariant load(String variant) {
    if (!VARIANTS.contains(variant)) {
      throw new IllegalArgumentException("variant must be one of " + VARIANTS + ", got " + variant);
    }
    long target = variant.startsWith("target1") ? 1 : 2;
    String label = logName + "-" + variant;
    List<RadarPlot> plots = log.plots(target);
    if (plots.isEmpty()) {
      return LoadedVariant.absent(
          variant, label, "target " + target + " has no radar detection in this log");
    }
    return LoadedVariant.of(variant, label, scenario(plots, variant.endsWith("ct"), target));
  }

  @Override
  public VariableNames names(String variant) {
    VariableNames state = variant.endsWith("ct")
        ? VariableNames.ofState(
            "north [m]",
            "east [m]",
            "north velocity [m/s]",
            "east velocity [m/s]",
            "turn rate [rad/s]")
        : VariableNames.ofState(
            "north [m]", "east [m]", "north velocity [m/s]", "east velocity [m/s]");
    return state.withMeasurement("range [m]", "bearing [rad]").withPlane(1, 0);
  }

  private Scenario scenario(List<RadarPlot> plots, boolean turning, long target) {
    MotionModel motion = turning
        ? new CoordinatedTurn(ACCELERATION_DENSITY, TURN_DENSITY)
        : new ConstantVelocity(ACCELERATION_DENSITY, ACCELERATION_DENSITY);
    return new Scenario(
        motion,
        OptionalDouble.of(GATE),
        start(plots.get(0), motion.stateSpace().dimension()),
        steps(plots),
        log.truth(target));
  }

  private static Gaussian start(RadarPlot first, int dimension) {
    double[] mean = new double[dimension];
    mean[0] = first.north();
    mean[1] = first.east();
    return Gaussian.independent(mean, Arrays.copyOf(START_DEVIATIONS, dimension));
  }

  private List<Step> steps(List<RadarPlot> plots) {
    List<Step> steps = new ArrayList<>();
    for (RadarPlot plot : plots) {
      List<Measurement> used = steps.isEmpty() ? List.of() : List.of(measurement(plot));
      steps.add(new Step(plot.time() - RADAR_LAG, used));
    }
    return steps;
  }

  private Measurement measurement(RadarPlot plot) {
    double[] value = {plot.range(), plot.bearing()};
    return new Measurement(radar, value, plot.ownNorth(), plot.ownEast());
  }
}
