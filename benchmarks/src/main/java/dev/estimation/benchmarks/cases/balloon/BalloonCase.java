package dev.estimation.benchmarks.cases.balloon;

import dev.estimation.benchmarks.replay.LoadedVariant;
import dev.estimation.benchmarks.replay.ReplayCase;
import dev.estimation.benchmarks.replay.VariableNames;
import java.util.List;

/**
 * A weather balloon at 30 km, carried by the wind and followed from the ground by range (3 m),
 * azimuth and elevation (1 degree, about 500 m across). At the start it is known to a few
 * kilometres: within that spread the sphere of equal range bends by hundreds of metres, a hundred
 * times the range noise.
 *
 * <p>So linearisation trusts a plane where there is a sphere, takes a wrong position for known to
 * metres, and then finds that later measurements contradict it. Measured over the seeds 1 to 100,
 * mean normalised error squared of the position over the flight (3 degrees of freedom, honest:
 * about 3; 95 % of single values lie in [0.216, 9.348]):
 *
 * <table>
 *   <caption>100 flights</caption>
 *   <tr><th>method</th><th>mean</th><th>above 9.348</th><th>position rmse (m), mean</th></tr>
 *   <tr><td>linear</td><td>236</td><td>82</td><td>4368</td></tr>
 *   <tr><td>unscented:1,2,0</td><td>2.95</td><td>0</td><td>311</td></tr>
 *   <tr><td>unscented:0.001,2,0</td><td>3.06</td><td>0</td><td>310</td></tr>
 *   <tr><td>cubature</td><td>3.65</td><td>1</td><td>436</td></tr>
 *   <tr><td>hermite:3</td><td>3.16</td><td>0</td><td>313</td></tr>
 * </table>
 *
 * <p>The flight shown is that of seed 1.
 */
public final class BalloonCase implements ReplayCase {
  private static final String FLIGHT = "flight";
  static final long SEED = 1;

  @Override
  public List<String> variants() {
    return List.of(FLIGHT);
  }

  @Override
  public LoadedVariant load(String variant) {
    if (!variant.equals(FLIGHT)) {
      throw new IllegalArgumentException("variant must be " + FLIGHT + ", got " + variant);
    }
    return LoadedVariant.of(FLIGHT, "demo", new BalloonFlight(SEED).fly());
  }

  @Override
  public VariableNames names(String variant) {
    return VariableNames.ofState(
            "east [m]",
            "north [m]",
            "up [m]",
            "east velocity [m/s]",
            "north velocity [m/s]",
            "up velocity [m/s]")
        .withMeasurement("range [m]", "azimuth [rad]", "elevation [rad]")
        .withPlane(0, 1)
        .withPlane(0, 2)
        .withPlane(1, 2);
  }
}
