package dev.estimation.filters.sensor;

import static org.junit.jupiter.api.Assertions.assertArrayEquals;
import static org.junit.jupiter.api.Assertions.assertEquals;

import dev.estimation.core.gaussian.Gaussian;
import dev.estimation.core.space.Space;
import dev.estimation.filters.filter.Estimate;
import dev.estimation.filters.filter.FilterPlan;
import dev.estimation.filters.filter.StepStatus;
import dev.estimation.filters.model.DifferentiableSensor;
import dev.estimation.filters.testing.PlainWalk;
import java.util.List;
import org.junit.jupiter.api.Test;

class PseudorangeTest extends SensorContract {
  private static final Sight SPATIAL = Sight.fromGiven(Components.of(0, 1, 2));
  private static final Components CLOCK = Components.of(3);

  @Override
  List<SensorCase> cases() {
    double[] state = {1.2e6, 2.5e5, 6.2e6, 40, 0.1};
    double[] satellite = {-1.45e7, -2.6e6, 2.19e7};
    double[] withDeviation = {-1.45e7, -2.6e6, 2.19e7, 2.5};
    return List.of(
        new SensorCase(
            "satellite", new Pseudorange(SPATIAL, CLOCK, 2), Space.reals(5), 1e7, satellite, state),
        new SensorCase(
            "deviation given",
            Pseudorange.ofGivenDeviation(SPATIAL, CLOCK),
            Space.reals(5),
            1e7,
            withDeviation,
            state),
        new SensorCase(
            "biased range",
            new Pseudorange(Sight.toGiven(States.COMPASS), Components.of(3), 2),
            PLANE,
            1,
            new double[] {1, 2},
            States.plane(4, 6)),
        new SensorCase(
            "block",
            new Pseudorange(Sight.toGiven(States.PLACE), States.LAST, 2),
            BEHIND_ATTITUDE,
            1,
            new double[] {1, 2, 3},
            States.behindAttitude(5, -6, 4)));
  }

  @Override
  DifferentiableSensor withDeviation(double deviation) {
    return new Pseudorange(SPATIAL, CLOCK, deviation);
  }

  @Test
  void measuresDistancePlusClock() {
    double[] seen = new double[1];
    new Pseudorange(SPATIAL, CLOCK, 1)
        .measure(new double[] {1, 2, 3, 0.25, 9}, new double[] {3, 5, 9}, seen);
    assertEquals(7.25, seen[0], 0);
    assertArrayEquals(
        new int[] {3}, new Pseudorange(SPATIAL, CLOCK, 1).structure().linearInputs());
  }

  @Test
  void aGivenDeviationIsSquared() {
    SensorCase c = cases().get(1);
    assertArrayEquals(new double[] {6.25}, c.noise(c.points()[0]), 0);
  }

  @Test
  void aGivenDeviationThatIsNoneIsRefusedByTheFilter() {
    FilterPlan plan = FilterPlan.cubature(new PlainWalk(4, 1));
    Estimate estimate =
        plan.start(0, Gaussian.independent(new double[4], new double[] {1, 1, 1, 1}));
    var port = plan.workspace().port(Pseudorange.ofGivenDeviation(SPATIAL, CLOCK));
    for (double deviation : new double[] {0, -1}) {
      StepStatus status =
          port.update(estimate, new double[] {7}, new double[] {2, 3, 6, deviation});
      assertEquals(StepStatus.NOISE_NOT_VALID, status);
    }
  }

  @Test
  void atTheSatelliteLinearisationIsRefused() {
    assertRefused(new Pseudorange(SPATIAL, CLOCK, 1), new double[4], new double[3], 3);
  }

  @Test
  void refusesWhatDoesNotFit() {
    assertRefusal(
        () -> new Pseudorange(SPATIAL, Components.of(3, 4), 1),
        "a clock must have 1 component",
        "[3, 4]",
        "Pseudorange");
    assertRefusal(
        () -> new Pseudorange(SPATIAL, Components.of(2), 1),
        "distinct",
        "[0, 1, 2, 2]",
        "Pseudorange");
  }
}
