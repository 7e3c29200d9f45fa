package dev.estimation.filters.sensor;

import static org.junit.jupiter.api.Assertions.assertArrayEquals;
import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertTrue;

import dev.estimation.core.gaussian.Gaussian;
import dev.estimation.core.gaussian.Moments;
import dev.estimation.core.matching.MatchingWorkspace;
import dev.estimation.core.matching.PointMatching;
import dev.estimation.core.points.GaussHermiteRule;
import dev.estimation.core.space.Space;
import dev.estimation.filters.model.DifferentiableSensor;
import java.util.List;
import org.junit.jupiter.api.Test;

class RangeTest extends SensorContract {
  private static final Sight PLAIN = Sight.fromGiven(States.FIRST_TWO);

  @Override
  List<SensorCase> cases() {
    return List.of(
        new SensorCase(
            "plane",
            new Range(PLAIN, 2),
            PLANE,
            1,
            new double[] {1, 2},
            States.plane(4, 6),
            States.plane(-3, 2)),
        new SensorCase(
            "to a landmark",
            new Range(Sight.toGiven(States.COMPASS), 2),
            PLANE,
            1,
            new double[] {1, 2},
            States.plane(4, 6)),
        new SensorCase(
            "known height",
            new Range(PLAIN.atHeight(1.5), 2),
            PLANE,
            1,
            new double[] {1, 2, 7},
            States.plane(4, 6),
            States.plane(1, 2)),
        new SensorCase(
            "space",
            new Range(Sight.fromGiven(States.PLACE), 2),
            BEHIND_ATTITUDE,
            1,
            new double[] {1, 2, 3},
            States.behindAttitude(5, -6, 4)),
        new SensorCase(
            "to space",
            new Range(Sight.toGiven(States.PLACE), 2),
            BEHIND_ATTITUDE,
            1,
            new double[] {1, 2, 3},
            States.behindAttitude(1, 2, 9),
            States.behindAttitude(4, 6, 9)));
  }

  @Override
  DifferentiableSensor withDeviation(double deviation) {
    return new Range(PLAIN, deviation);
  }

  @Test
  void measuresDistances() {
    double[] z = new double[1];
    new Range(PLAIN, 1).measure(new double[] {4, 6}, new double[] {1, 2}, z);
    assertEquals(5, z[0], 0);
    new Range(PLAIN.atHeight(1.5), 1).measure(new double[] {3, 7}, new double[] {1, 4, 7.5}, z);
    assertEquals(7, z[0], 0);
    new Range(Sight.toGiven(Components.of(0, 1, 2)), 1)
        .measure(new double[] {3, 7, 1.5}, new double[] {1, 4, 7.5}, z);
    assertEquals(7, z[0], 0);
  }

  /**
   * Mean and variance of the length of N((5, 0), I): closed forms with Bessel functions, evaluated at 30 digits by an
   * independent program. The kink of the length, 5 deviations away, leaves 40 nodes an axis
   * 3e-9 m off the mean.
   */
  @Test
  void momentsAreThoseOfTheRiceDistribution() {
    SensorCase c = new SensorCase("plane", new Range(PLAIN, 1), Space.reals(2), 1, new double[2]);
    MatchingWorkspace work = PointMatching.of(GaussHermiteRule.product(40))
        .workspace(c.space(), c.sensor().measurementSpace(), c.function());
    Moments prior = new Moments(c.space());
    prior.set(Gaussian.independent(new double[] {3, 4}, new double[] {1, 1}));
    work.carry(prior, c.given(), null);
    assertEquals(5.1010696394921249, work.output().mean()[0], 1e-8);
    assertEquals(0.97908853305168308, work.output().toGaussian().covariance(0, 0), 1e-7);
  }

  @Test
  void atTheStationLinearisationIsRefused() {
    assertRefused(new Range(PLAIN, 1), new double[] {1, 2}, new double[] {1, 2}, 3);
    double[] jacobian = new double[2];
    new Range(PLAIN, 1).measureJacobian(new double[2], new double[2], jacobian);
    assertTrue(Double.isNaN(jacobian[0]) && Double.isNaN(jacobian[1]));
  }

  /** A tag at the height of the anchor and under it is no singular place for the state in the plane of another height. */
  @Test
  void overTheStationTheRangeIsFlat() {
    double[] jacobian = new double[2];
    new Range(PLAIN.atHeight(3), 1).measureJacobian(new double[2], new double[3], jacobian);
    assertArrayEquals(new double[2], jacobian, 0);
  }

  @Test
  void refusesAHeading() {
    assertRefusal(
        () -> new Range(PLAIN.relativeTo(States.ANGLE), 1),
        "without a heading",
        "heading [4]",
        "Range");
    assertRefusal(() -> new Range(PLAIN.relativeToGivenHeading(), 1), "a given heading", "Range");
  }
}
