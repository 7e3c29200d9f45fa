package dev.estimation.filters.sensor;

import static org.junit.jupiter.api.Assertions.assertArrayEquals;
import static org.junit.jupiter.api.Assertions.assertEquals;

import dev.estimation.core.space.Space;
import dev.estimation.filters.model.DifferentiableSensor;
import java.util.List;
import org.junit.jupiter.api.Test;

class PseudorangeRateTest extends SensorContract {
  private static final Sight SPATIAL = Sight.fromGiven(Components.of(0, 1, 2));
  private static final Components VELOCITY = Components.of(4, 5, 6);
  private static final Components DRIFT = Components.of(7);

  @Override
  List<SensorCase> cases() {
    double[] state = {1.2e6, 2.5e5, 6.2e6, 40, 12, -7, 3, 0.1};
    double[] satellite = {-1.45e7, -2.6e6, 2.19e7, 2500, -1300, 1800};
    return List.of(
        new SensorCase(
            "satellite",
            new PseudorangeRate(SPATIAL, VELOCITY, DRIFT, 2),
            Space.reals(8),
            1e6,
            satellite,
            state),
        new SensorCase(
            "block",
            new PseudorangeRate(Sight.toGiven(States.PLACE), States.VELOCITY, States.LAST, 2),
            BEHIND_ATTITUDE,
            1,
            new double[] {1, 2, 3, 4, 5, 6},
            States.behindAttitude(5, -6, 4)));
  }

  @Override
  DifferentiableSensor withDeviation(double deviation) {
    return new PseudorangeRate(SPATIAL, VELOCITY, DRIFT, deviation);
  }

  @Test
  void addsTheDriftToTheRangeRate() {
    double[] state = {2, 3, 6, 99, 2, 3, 6, 0.25};
    double[] z = new double[1];
    new PseudorangeRate(SPATIAL, VELOCITY, DRIFT, 1).measure(state, new double[6], z);
    assertEquals(7.25, z[0], 2e-15); // a few roundings of 7
    assertArrayEquals(
        new int[] {4, 5, 6, 7},
        new PseudorangeRate(SPATIAL, VELOCITY, DRIFT, 1).structure().linearInputs());
  }

  @Test
  void atTheSatelliteThereIsNone() {
    assertRefused(
        new PseudorangeRate(SPATIAL, VELOCITY, DRIFT, 1), new double[8], new double[6], 3);
  }

  @Test
  void refusesADriftOfTwoComponents() {
    assertRefusal(
        () -> new PseudorangeRate(SPATIAL, VELOCITY, Components.of(7, 8), 1),
        "a drift must have 1 component",
        "[7, 8]");
  }
}
