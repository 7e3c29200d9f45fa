package dev.estimation.filters.sensor;

import static org.junit.jupiter.api.Assertions.assertArrayEquals;
import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertTrue;

import dev.estimation.filters.model.DifferentiableSensor;
import java.util.List;
import org.junit.jupiter.api.Test;

class RangeRateTest extends SensorContract {
  private static final Components VELOCITY = Components.of(2, 3);
  private static final Sight PLAIN = Sight.fromGiven(States.FIRST_TWO);

  @Override
  List<SensorCase> cases() {
    return List.of(
        new SensorCase(
            "plane",
            new RangeRate(PLAIN, VELOCITY, 2),
            PLANE,
            1,
            new double[] {1, 2, 0, 0},
            States.plane(4, 7),
            States.plane(-3, 2)),
        new SensorCase(
            "moving station",
            new RangeRate(Sight.fromGiven(States.COMPASS), Components.of(3, 2), 2),
            PLANE,
            1,
            new double[] {1, 2, 5, 6},
            States.plane(4, 6)),
        new SensorCase(
            "known height",
            new RangeRate(PLAIN.atHeight(9), VELOCITY, 2),
            PLANE,
            1,
            new double[] {1, 2, 3, 4, 5, 6},
            States.plane(4, 6)),
        new SensorCase(
            "to space",
            new RangeRate(Sight.toGiven(States.PLACE), States.VELOCITY, 2),
            BEHIND_ATTITUDE,
            1,
            new double[] {1, 2, 3, 4, 5, 6},
            States.behindAttitude(5, -6, 4)));
  }

  @Override
  DifferentiableSensor withDeviation(double deviation) {
    return new RangeRate(PLAIN, VELOCITY, deviation);
  }

  /** Away is positive, whichever end is the state; across is zero; a station that goes along sees nothing. */
  @Test
  void isPositiveWhenTheyPart() {
    double[] state = {3, 4, 6, 8};
    assertEquals(10, rate(PLAIN, state, 0, 0, 0, 0), 2e-15); // roundings
    assertEquals(10, rate(Sight.toGiven(States.FIRST_TWO), state, 0, 0, 0, 0), 2e-15);
    assertEquals(-10, rate(PLAIN, state, 6, 8, 0, 0), 2e-15);
    assertEquals(0, rate(PLAIN, state, 3 + 8, 4 - 6, 0, 0), 0);
    assertEquals(0, rate(PLAIN, state, 0, 0, 6, 8), 0);
  }

  private static double rate(Sight sight, double[] state, double... given) {
    double[] z = new double[1];
    new RangeRate(sight, VELOCITY, 1).measure(state, given, z);
    return z[0];
  }

  /**
   * Against the ranges a hundredth of a second before and after, on straight lines. The third derivative of the range is about
   * 3 v^3 / d^2 = 1e-3 m/s^3, a sixth of which times the square of the step is 2e-8 m/s; rounding of the ranges is a tenth of it.
   */
  @Test
  void isTheRateOfTheRange() {
    SensorCase c = cases().get(3);
    double[] state = States.behindAttitude(5000, -6000, 4000);
    double step = 1e-2;
    double change = rangeAt(state, c.given(), step) - rangeAt(state, c.given(), -step);
    assertEquals(change / (2 * step), c.measured(state)[0], 3e-8);
  }

  private static double rangeAt(double[] state, double[] given, double time) {
    double[] moved = state.clone();
    double[] place = new double[3];
    for (int i = 0; i < 3; i++) {
      moved[4 + i] += time * state[7 + i];
      place[i] = given[i] + time * given[3 + i];
    }
    double[] z = new double[1];
    new Range(Sight.toGiven(States.PLACE), 1).measure(moved, place, z);
    return z[0];
  }

  @Test
  void atTheStationThereIsNone() {
    assertTrue(Double.isNaN(rate(PLAIN, new double[] {1, 2, 3, 4}, 1, 2, 0, 0)));
    assertRefused(
        new RangeRate(PLAIN, VELOCITY, 1), new double[] {1, 2, 3, 4}, new double[] {1, 2, 0, 0}, 3);
  }

  @Test
  void linearInTheVelocity() {
    assertArrayEquals(new int[] {2, 3}, cases().get(0).sensor().structure().linearInputs());
    assertArrayEquals(new int[] {6, 7, 8}, cases().get(3).sensor().structure().linearInputs());
  }

  @Test
  void refusesWhatDoesNotFit() {
    assertRefusal(
        () -> new RangeRate(PLAIN, Components.of(2, 3, 4), 1),
        "a velocity must have 2 components",
        "[2, 3, 4]",
        "RangeRate");
    assertRefusal(
        () -> new RangeRate(PLAIN, Components.of(1, 2), 1),
        "distinct",
        "[0, 1, 1, 2]",
        "RangeRate");
    assertRefusal(
        () -> new RangeRate(PLAIN.relativeTo(States.ANGLE), VELOCITY, 1),
        "without a heading",
        "RangeRate");
  }
}
