package dev.estimation.benchmarks.cases.uwb;

import dev.estimation.benchmarks.log.LogFolder;
import dev.estimation.benchmarks.replay.LoadedVariant;
import dev.estimation.benchmarks.replay.ReplayCase;
import dev.estimation.benchmarks.replay.Scenario;
import dev.estimation.benchmarks.replay.VariableNames;
import dev.estimation.core.gaussian.Gaussian;
import dev.estimation.filters.motion.ConstantVelocity;
import dev.estimation.filters.sensor.Components;
import dev.estimation.filters.sensor.Range;
import dev.estimation.filters.sensor.Sight;
import java.util.List;
import java.util.OptionalDouble;

/**
 * A tag placed by ranges, from three starts: {@code near} the true place, {@code offset} from it,
 * and {@code cold} with next to no knowledge, in the middle of the anchors.
 */
public final class UwbCase implements ReplayCase {
  private static final double ACCELERATION_DENSITY = 1.0;
  private static final double RANGE_DEVIATION = 0.20;
  private static final double GATE = 0.999;
  private static final double OFFSET = 3;
  private static final List<String> VARIANTS = List.of("near", "offset", "cold");

  private final String logName;
  private final UwbSettings settings;
  private final UwbLog log;

  /** The case on a log, which is read here. */
  public UwbCase(LogFolder folder, UwbSettings settings) {
    this.logName = folder.name();
    this.settings = settings;
    Sight anchor = Sight.fromGiven(Components.of(0, 1)).atHeight(settings.height());
    this.log = new UwbLog(folder, new Range(anchor, RANGE_DEVIATION), settings);
  }

  @Override
  public List<String> variants() {
    return VARIANTS;
  }

  @Override
  public LoadedVariant load(String variant) {
    double nearX = settings.nearX();
    double nearY = settings.nearY();
    return switch (variant) {
      case "near" -> start(variant, "", nearX, nearY, 1);
      case "offset" -> start(variant, "-offset-start", nearX + OFFSET, nearY - OFFSET, 4);
      case "cold" -> start(variant, "-cold-start", 0, 0, 10);
      default ->
        throw new IllegalArgumentException(
            "variant must be one of " + VARIANTS + ", got " + variant);
    };
  }

  @Override
  public VariableNames names(String variant) {
    return VariableNames.ofState("x [m]", "y [m]", "x velocity [m/s]", "y velocity [m/s]")
        .withMeasurement("range [m]")
        .withPlane(0, 1);
  }

  private LoadedVariant start(
      String name, String suffix, double x, double y, double positionDeviation) {
    double[] mean = {x, y, 0, 0};
    double[] deviations = {positionDeviation, positionDeviation, 1, 1};
    Scenario scenario = new Scenario(
        new ConstantVelocity(ACCELERATION_DENSITY, ACCELERATION_DENSITY),
        OptionalDouble.of(GATE),
        Gaussian.independent(mean, deviations),
        log.steps(),
        log.truth());
    return LoadedVariant.of(name, logName + suffix, scenario);
  }
}
