package dev.estimation.filters.sensor;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertTrue;

import dev.estimation.filters.model.DifferentiableSensor;
import java.util.List;
import org.junit.jupiter.api.Test;

class BearingTest extends SensorContract {
  private static final Sight PLAIN = Sight.fromGiven(States.FIRST_TWO);

  @Override
  List<SensorCase> cases() {
    double[] place = {1, 2};
    double[] pose = {1, 2, 0.4};
    return List.of(
        new SensorCase(
            "plane",
            new Bearing(PLAIN, 2),
            PLANE,
            1,
            place,
            States.plane(4, 6),
            States.plane(-3, 2 + 1e-7)),
        new SensorCase(
            "compass",
            new Bearing(Sight.fromGiven(States.COMPASS), 2),
            PLANE,
            1,
            place,
            States.plane(4, 6)),
        new SensorCase(
            "heading of the state",
            new Bearing(Sight.toGiven(States.FIRST_TWO).relativeTo(States.ANGLE), 2),
            PLANE,
            1,
            place,
            States.plane(4, 6),
            States.plane(5, 2 - 1e-7)),
        new SensorCase(
            "heading given",
            new Bearing(PLAIN.relativeToGivenHeading(), 2),
            PLANE,
            1,
            pose,
            States.plane(4, 6)),
        new SensorCase(
            "block",
            new Bearing(Sight.toGiven(States.PLACE_IN_PLANE).relativeTo(States.LAST), 2),
            BEHIND_ATTITUDE,
            1,
            place,
            States.behindAttitude(5, -6, 4)));
  }

  @Override
  DifferentiableSensor withDeviation(double deviation) {
    return new Bearing(PLAIN, deviation);
  }

  private static double bearing(Sight sight, double[] state, double... given) {
    double[] z = new double[1];
    new Bearing(sight, 1).measure(state, given, z);
    return z[0];
  }

  /** North-east is 45 degrees in both; one step from north towards east is small in the compass and nearly 90 in mathematics. */
  @Test
  void theOrderOfComponentsServesMathematicsAndCompass() {
    double[] eastNorth = {0.5, Math.sqrt(0.75)};
    assertEquals(Math.PI / 3, bearing(PLAIN, eastNorth, 0, 0), 4e-16); // two roundings
    assertEquals(Math.PI / 6, bearing(Sight.fromGiven(States.COMPASS), eastNorth, 0, 0), 4e-16);
  }

  /** What is given follows the order of the components: north 10, east 0. */
  @Test
  void thePlaceIsGivenInTheOrderOfTheComponents() {
    double[] eastNorth = {5, 10};
    assertEquals(Math.PI / 2, bearing(Sight.fromGiven(States.COMPASS), eastNorth, 10, 0), 0);
  }

  /** A ship that heads east has north on its port side, at -90 degrees; so has one that heads east and stands south of the mark. */
  @Test
  void headingIsSubtracted() {
    double[] northEast = {10, 0, Math.PI / 2};
    Components compass = Components.of(0, 1);
    assertEquals(
        -Math.PI / 2,
        bearing(Sight.fromGiven(compass).relativeToGivenHeading(), northEast, 0, 0, Math.PI / 2),
        0);
    assertEquals(
        -Math.PI / 2,
        bearing(Sight.toGiven(compass).relativeTo(Components.of(2)), northEast, 20, 0),
        0);
  }

  @Test
  void crossesItsSeam() {
    assertCrossesSeam(cases().get(0), 0, small -> States.plane(-3, 2 + small));
  }

  @Test
  void atTheStationThereIsNone() {
    assertTrue(Double.isNaN(bearing(PLAIN, new double[] {1, 2}, 1, 2)));
    assertRefused(new Bearing(PLAIN, 1), new double[] {1, 2}, new double[] {1, 2}, 3);
  }

  @Test
  void refusesSightsInSpace() {
    assertRefusal(
        () -> new Bearing(PLAIN.atHeight(3), 1), "2 dimensions", "got one in 3", "Bearing");
  }

  @Test
  void refusesToReadAComponentTwice() {
    assertRefusal(
        () -> new Bearing(PLAIN.relativeTo(Components.of(1)), 1),
        "distinct",
        "[0, 1, 1]",
        "Bearing");
  }
}
