package dev.estimation.filters.sensor;

import static org.junit.jupiter.api.Assertions.assertEquals;

import dev.estimation.filters.model.DifferentiableSensor;
import java.util.List;
import org.junit.jupiter.api.Test;

class RangeDifferenceTest extends SensorContract {
  private static final Sight PLAIN = Sight.fromGiven(States.FIRST_TWO);

  @Override
  List<SensorCase> cases() {
    double[] inPlane = {1, 2, -5, 9};
    double[] inSpace = {1, 2, 3, -5, 9, 1};
    return List.of(
        new SensorCase(
            "plane",
            new RangeDifference(PLAIN, 2),
            PLANE,
            1,
            inPlane,
            States.plane(4, 7),
            States.plane(-3, 2)),
        new SensorCase(
            "to places",
            new RangeDifference(Sight.toGiven(States.COMPASS), 2),
            PLANE,
            1,
            inPlane,
            States.plane(4, 6)),
        new SensorCase(
            "known height",
            new RangeDifference(PLAIN.atHeight(8), 2),
            PLANE,
            1,
            inSpace,
            States.plane(4, 6)),
        new SensorCase(
            "space",
            new RangeDifference(Sight.fromGiven(States.PLACE), 2),
            BEHIND_ATTITUDE,
            1,
            inSpace,
            States.behindAttitude(5, -6, 4)));
  }

  @Override
  DifferentiableSensor withDeviation(double deviation) {
    return new RangeDifference(PLAIN, deviation);
  }

  /** On a hyperbola with foci at +-5 and half axis 3, vertex (3, 0) and (6, 4 sqrt(3)): the distances differ by 6. */
  @Test
  void isConstantOnAHyperbola() {
    double[] z = new double[1];
    double[] foci = {-5, 0, 5, 0};
    for (double[] point :
        new double[][] {{3, 0}, {6, 4 * Math.sqrt(3)}, {3 * Math.cosh(2), -4 * Math.sinh(2)}}) {
      new RangeDifference(PLAIN, 1).measure(point, foci, z);
      assertEquals(6, z[0], 1e-14); // some roundings of 20
    }
  }

  @Test
  void atAPlaceLinearisationIsRefused() {
    assertRefused(new RangeDifference(PLAIN, 1), new double[] {1, 2}, new double[] {1, 2, 7, 7}, 3);
    assertRefused(new RangeDifference(PLAIN, 1), new double[] {1, 2}, new double[] {7, 7, 1, 2}, 3);
  }

  @Test
  void refusesAHeading() {
    assertRefusal(
        () -> new RangeDifference(PLAIN.relativeToGivenHeading(), 1),
        "without a heading",
        "RangeDifference");
  }
}
