package dev.estimation.filters.sensor;

import static org.junit.jupiter.api.Assertions.assertArrayEquals;
import static org.junit.jupiter.api.Assertions.assertEquals;

import dev.estimation.core.space.Space;
import dev.estimation.filters.model.DifferentiableSensor;
import java.util.List;
import org.junit.jupiter.api.Test;

class RangeAzimuthElevationTest extends SensorContract {
  private static final Space SIX = Space.reals(6);
  private static final Sight COMPASS = Sight.fromGiven(Components.of(1, 0, 2));

  @Override
  List<SensorCase> cases() {
    double[] place = {1, 2, 3};
    double[] pose = {1, 2, 3, 0.4};
    return List.of(
        new SensorCase(
            "compass",
            new RangeAzimuthElevation(COMPASS, 2, 3, 4),
            SIX,
            1,
            place,
            state(18, 24, 8),
            state(2 + 1e-7, -9, 5),
            state(5, 6, -4)),
        new SensorCase(
            "own pose given",
            new RangeAzimuthElevation(COMPASS.relativeToGivenHeading(), 2, 3, 4),
            SIX,
            1,
            pose,
            state(18, 24, 8)),
        new SensorCase(
            "known height",
            new RangeAzimuthElevation(Sight.fromGiven(States.FIRST_TWO).atHeight(0), 2, 3, 4),
            PLANE,
            1,
            place,
            States.plane(9, 8)),
        new SensorCase(
            "block",
            new RangeAzimuthElevation(Sight.toGiven(States.PLACE).relativeTo(States.LAST), 2, 3, 4),
            BEHIND_ATTITUDE,
            1,
            place,
            States.behindAttitude(5, -6, 4)));
  }

  private static double[] state(double east, double north, double up) {
    return new double[] {east, north, up, 1, 2, 3};
  }

  @Override
  DifferentiableSensor withDeviation(double deviation) {
    return new RangeAzimuthElevation(COMPASS, deviation, deviation, deviation);
  }

  /** East 2 sqrt(3), north 2, up 4 sqrt(3): distance 8, azimuth and elevation 60 degrees. */
  @Test
  void measuresTheThree() {
    SensorCase c = cases().get(0);
    double root = Math.sqrt(3);
    double[] seen =
        c.measured(state(2 + 2 * root, 3, 3 + 4 * root)); // north 1, east 2, up 3 is the place
    assertArrayEquals(new double[] {8, Math.PI / 3, Math.PI / 3}, seen, 4e-15); // roundings of 10
    assertArrayEquals(new double[] {4, 0, 0, 0, 9, 0, 0, 0, 16}, c.noise(state(0, 0, 0)), 0);
  }

  @Test
  void crossesItsSeam() {
    assertCrossesSeam(cases().get(0), 1, small -> state(2 + small, -9, 5));
  }

  @Test
  void straightOverheadThereIsNoAzimuth() {
    SensorCase c = cases().get(0);
    assertArrayEquals(new double[] {7, Double.NaN, Math.PI / 2}, c.measured(state(2, 1, 10)), 0);
    assertEquals(Double.NaN, c.jacobian(state(2, 1, 10))[6], 0);
    assertRefused(c.sensor(), state(2, 1, 10), c.given(), 7, 0, 1.5);
    assertRefused(c.sensor(), state(2, 1, 3), c.given(), 7, 0, 1.5);
  }

  @Test
  void refusesSightsInThePlane() {
    assertRefusal(
        () -> new RangeAzimuthElevation(Sight.fromGiven(States.FIRST_TWO), 1, 1, 1),
        "3 dimensions",
        "got one in 2",
        "RangeAzimuthElevation");
  }
}
