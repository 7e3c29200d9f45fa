package dev.estimation.filters.sensor;

import static org.junit.jupiter.api.Assertions.assertArrayEquals;
import static org.junit.jupiter.api.Assertions.assertEquals;

import dev.estimation.core.gaussian.Gaussian;
import dev.estimation.filters.filter.Estimate;
import dev.estimation.filters.filter.FilterPlan;
import dev.estimation.filters.filter.StepStatus;
import dev.estimation.filters.model.DifferentiableSensor;
import dev.estimation.filters.testing.PlainWalk;
import java.util.List;
import org.junit.jupiter.api.Test;

class PositionTest extends SensorContract {
  @Override
  List<SensorCase> cases() {
    return List.of(
        new SensorCase(
            "plane", new Position(States.COMPASS, 2, 3), PLANE, 1, NONE, States.plane(4, 7)),
        new SensorCase(
            "one", new Position(Components.of(3), 2), PLANE, 1, NONE, States.plane(4, 7)),
        new SensorCase(
            "block",
            new Position(States.PLACE, 2, 3, 4),
            BEHIND_ATTITUDE,
            1,
            NONE,
            States.behindAttitude(5, -6, 4)));
  }

  @Override
  DifferentiableSensor withDeviation(double deviation) {
    return new Position(Components.of(1, 0, 2), deviation, deviation, deviation);
  }

  @Test
  void readsInTheOrderOfItsComponents() {
    assertArrayEquals(new double[] {7, 4}, cases().get(0).measured(States.plane(4, 7)), 0);
    assertArrayEquals(new double[] {4, 0, 0, 9}, cases().get(0).noise(States.plane(4, 7)), 0);
  }

  /** Linear in all: one evaluation, whatever the rule, and the Kalman update: 4 of 4 + 1 of the way. */
  @Test
  void noPointsAreDrawn() {
    FilterPlan plan = FilterPlan.cubature(new PlainWalk(5, 1));
    Estimate estimate =
        plan.start(0, Gaussian.independent(new double[5], new double[] {2, 2, 2, 2, 2}));
    var port = plan.workspace().port(new Position(States.FIRST_TWO, 1, 1));
    assertEquals(StepStatus.APPLIED, port.update(estimate, new double[] {10, -5}));
    assertEquals(1, port.evaluations());
    assertEquals(8, estimate.mean(0), 4e-15); // a few roundings
    assertEquals(0.8, estimate.covariance(0, 0), 4e-16);
  }

  @Test
  void refusesAnotherNumberOfDeviations() {
    assertRefusal(
        () -> new Position(States.FIRST_TWO, 1), "1 deviations", "got [0, 1]", "Position");
  }
}
