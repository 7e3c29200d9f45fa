package dev.estimation.filters.sensor;

import static dev.estimation.testing.Agreement.assertWithin;
import static org.junit.jupiter.api.Assertions.assertArrayEquals;
import static org.junit.jupiter.api.Assertions.assertEquals;

import dev.estimation.core.gaussian.Gaussian;
import dev.estimation.core.space.Space;
import dev.estimation.filters.filter.Estimate;
import dev.estimation.filters.filter.FilterPlan;
import dev.estimation.filters.filter.FilterWorkspace;
import dev.estimation.filters.filter.IteratedUpdate;
import dev.estimation.filters.filter.StepStatus;
import dev.estimation.filters.model.DifferentiableSensor;
import dev.estimation.filters.testing.PlainWalk;
import java.util.Arrays;
import java.util.List;
import org.junit.jupiter.api.Test;

class RangeAndBearingTest extends SensorContract {
  private static final Sight PLAIN = Sight.fromGiven(States.FIRST_TWO);
  private static final Sight ROBOT = Sight.toGiven(States.FIRST_TWO).relativeTo(States.ANGLE);

  @Override
  List<SensorCase> cases() {
    double[] place = {1, 2};
    double[] pose = {1, 2, 0.4};
    return List.of(
        new SensorCase(
            "plane",
            new RangeAndBearing(PLAIN, 2, 3),
            PLANE,
            1,
            place,
            States.plane(4, 6),
            States.plane(-3, 2 - 1e-7)),
        new SensorCase(
            "robot",
            new RangeAndBearing(ROBOT, 2, 3),
            PLANE,
            1,
            place,
            States.plane(4, 6),
            States.plane(5, 2)),
        new SensorCase(
            "own ship",
            new RangeAndBearing(Sight.fromGiven(States.COMPASS).relativeToGivenHeading(), 2, 3),
            PLANE,
            1,
            pose,
            States.plane(4, 6)),
        new SensorCase(
            "block",
            new RangeAndBearing(Sight.toGiven(States.PLACE_IN_PLANE).relativeTo(States.LAST), 2, 3),
            BEHIND_ATTITUDE,
            1,
            place,
            States.behindAttitude(5, -6, 4)));
  }

  @Override
  DifferentiableSensor withDeviation(double deviation) {
    return new RangeAndBearing(PLAIN, deviation, deviation);
  }

  @Test
  void isARangeAndABearing() {
    for (SensorCase c : cases().subList(0, 1)) {
      double[] range = new double[1];
      double[] bearing = new double[1];
      new Range(PLAIN, 1).measure(c.points()[0], c.given(), range);
      new Bearing(PLAIN, 1).measure(c.points()[0], c.given(), bearing);
      assertArrayEquals(new double[] {range[0], bearing[0]}, c.measured(c.points()[0]), 0);
    }
    assertArrayEquals(new double[] {4, 0, 0, 9}, cases().get(0).noise(States.plane(4, 6)), 0);
  }

  /**
   * The maximum of the posterior density and its Gauss-Newton covariance for a prior N((10, 5), [[4, 1], [1, 9]]), found at extended
   * precision by an independent program. 1e-12 standard deviations: the tolerance asked of the iteration is 1e-14.
   */
  @Test
  void iteratedUpdateFindsTheMaximumOfThePosterior() {
    Gaussian prior = Gaussian.of(new double[] {10, 5}, new double[][] {{4, 1}, {1, 9}});
    FilterPlan plan = FilterPlan.iteratedExtended(
        new PlainWalk(2, 1), IteratedUpdate.undamped().withTolerance(1e-14));
    Estimate estimate = plan.start(0, prior);
    StepStatus status = plan.workspace()
        .port(new RangeAndBearing(PLAIN, 0.1, 0.02))
        .update(estimate, new double[] {12.3, 0.6}, new double[2]);
    assertEquals(StepStatus.APPLIED, status);
    assertWithin("x", 10.157116827533569, estimate.mean(0), 1e-12, 2);
    assertWithin("y", 6.9351242595186475, estimate.mean(1), 1e-12, 3);
    assertWithin("P11", 0.025788992911124326, estimate.covariance(0, 0), 1e-12, 1);
    assertWithin("P12", -0.0231973595341698, estimate.covariance(1, 0), 1e-12, 1);
    assertWithin("P22", 0.044023476259514491, estimate.covariance(1, 1), 1e-12, 1);
  }

  /**
   * A sensor keeps its structure in a larger state: the same update of a target that stands alone, and that is a block of
   * five behind correlated components. The parts agree to roundings.
   */
  @Test
  void aBlockIsUpdatedAsTheStateOfItsOwn() {
    double[] small = updated(2, States.FIRST_TWO);
    double[] large = updated(5, Components.of(3, 4));
    assertArrayEquals(
        small, large, 1e-12); // some roundings of numbers to 10, with a gain of about 1
  }

  private static double[] updated(int dimension, Components position) {
    double[] mean = new double[dimension];
    double[] deviations = new double[dimension];
    Arrays.fill(deviations, 2);
    mean[dimension - 2] = 8;
    mean[dimension - 1] = 6;
    FilterPlan plan = FilterPlan.unscented(new PlainWalk(dimension, 1), 1, 2, 0);
    FilterWorkspace work = plan.workspace();
    Estimate estimate = plan.start(0, Gaussian.independent(mean, deviations));
    StepStatus status = work.port(new RangeAndBearing(Sight.fromGiven(position), 0.5, 0.1))
        .update(estimate, new double[] {9, 0.7}, new double[2]);
    assertEquals(StepStatus.APPLIED, status);
    return new double[] {
      estimate.mean(dimension - 2),
      estimate.mean(dimension - 1),
      estimate.covariance(dimension - 2, dimension - 1)
    };
  }

  /** Rows stacked by a port keep it too: points are drawn over the two components read, once for all rows. */
  @Test
  void stackedRowsKeepTheStructure() {
    FilterPlan plan = FilterPlan.unscented(new PlainWalk(5, 1), 1, 2, 0);
    Estimate estimate = plan.start(
        0, Gaussian.independent(new double[] {8, 6, 0, 0, 0}, new double[] {1, 1, 1, 1, 1}));
    var port = plan.workspace().port(new RangeAndBearing(PLAIN, 0.5, 0.1), 3);
    double[] measurements = {10, 0.6, 5, 0.7};
    assertEquals(
        StepStatus.APPLIED, port.update(estimate, 2, measurements, new double[] {0, 0, 4, 3}));
    assertEquals(5, port.last().evaluations()); // 2 n + 1 of n = 2
  }

  @Test
  void crossesItsSeam() {
    assertCrossesSeam(cases().get(0), 1, small -> States.plane(-3, 2 + small));
  }

  /** Predicted at -pi and a little, measured at pi less a little: a small correction, whatever the method. */
  @Test
  void innovationsGoTheShortWay() {
    for (FilterPlan plan : List.of(
        FilterPlan.extended(new PlainWalk(2, 1)), FilterPlan.cubature(new PlainWalk(2, 1)))) {
      Estimate estimate =
          plan.start(0, Gaussian.independent(new double[] {-10, -0.1}, new double[] {0.1, 0.1}));
      StepStatus status = plan.workspace()
          .port(new RangeAndBearing(PLAIN, 0.5, 0.01))
          .update(estimate, new double[] {10, Math.PI - 0.01}, new double[2]);
      assertEquals(StepStatus.APPLIED, status);
      assertEquals(
          0, estimate.mean(1), 0.05); // half way from -0.1 to 0.1, since both are known to 0.1
    }
  }

  @Test
  void atTheStationThereIsNoBearing() {
    assertRefused(new RangeAndBearing(PLAIN, 1, 1), new double[] {1, 2}, new double[] {1, 2}, 3, 0);
    double[] state = {1, 2};
    SensorCase c =
        new SensorCase("there", new RangeAndBearing(PLAIN, 1, 1), Space.reals(2), 1, state, state);
    assertArrayEquals(new double[] {0, Double.NaN}, c.measured(state), 0);
  }
}
