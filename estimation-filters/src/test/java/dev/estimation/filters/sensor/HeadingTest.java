package dev.estimation.filters.sensor;

import static org.junit.jupiter.api.Assertions.assertEquals;

import dev.estimation.core.gaussian.Gaussian;
import dev.estimation.filters.filter.Estimate;
import dev.estimation.filters.filter.FilterPlan;
import dev.estimation.filters.filter.StepStatus;
import dev.estimation.filters.model.DifferentiableSensor;
import dev.estimation.filters.testing.PlainWalk;
import java.util.List;
import org.junit.jupiter.api.Test;

class HeadingTest extends SensorContract {
  @Override
  List<SensorCase> cases() {
    return List.of(
        new SensorCase("plane", new Heading(States.ANGLE, 2), PLANE, 1, NONE, States.plane(4, 7)),
        new SensorCase(
            "block",
            new Heading(States.LAST, 2),
            BEHIND_ATTITUDE,
            1,
            NONE,
            States.behindAttitude(5, -6, 4)));
  }

  @Override
  DifferentiableSensor withDeviation(double deviation) {
    return new Heading(Components.of(0), deviation);
  }

  /** A state that has turned many times meets a compass at its seam: half way, by equal variances. */
  @Test
  void goesTheShortWay() {
    FilterPlan plan = FilterPlan.cubature(new PlainWalk(1, 1));
    double turned = 6 * Math.PI + Math.PI - 0.1;
    Estimate estimate =
        plan.start(0, Gaussian.independent(new double[] {turned}, new double[] {1}));
    var port = plan.workspace().port(new Heading(Components.of(0), 1));
    assertEquals(StepStatus.APPLIED, port.update(estimate, new double[] {-Math.PI + 0.1}));
    assertEquals(turned + 0.1, estimate.mean(0), 1e-14); // roundings of 22 rad
  }

  @Test
  void refusesTwoComponents() {
    assertRefusal(
        () -> new Heading(States.FIRST_TWO, 1),
        "a heading must have 1 component",
        "[0, 1]",
        "Heading");
  }
}
