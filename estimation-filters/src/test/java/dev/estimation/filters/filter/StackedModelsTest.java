package dev.estimation.filters.filter;

import static org.junit.jupiter.api.Assertions.assertEquals;

import dev.estimation.core.space.Space;
import dev.estimation.filters.model.SensorModel;
import dev.estimation.filters.modelcheck.ModelCheck;
import dev.estimation.filters.modelcheck.Region;
import dev.estimation.filters.sensor.Components;
import dev.estimation.filters.sensor.KnownVector;
import dev.estimation.filters.sensor.Pseudorange;
import dev.estimation.filters.sensor.RangeAndBearing;
import dev.estimation.filters.sensor.Sight;
import java.util.List;
import org.junit.jupiter.api.Test;

/** Rows of ready sensors, as a port stacks them, are as right as one row: neither fault nor hint. */
class StackedModelsTest {
  private static void check(SensorModel row, int rows, Space state, Region region) {
    SensorModel stacked = StackedSensor.of(row, rows, state);
    assertEquals(List.of(), ModelCheck.over(region).examine(stacked).findings());
  }

  @Test
  void landmarksAtBothSidesOfTheSeam() {
    Space pose = Space.reals(2).and(Space.angles(1));
    Sight sight = Sight.toGiven(Components.of(0, 1)).relativeTo(Components.of(2));
    Region region = Region.around(pose, new double[] {0, 0, Math.PI}, 50, 50, 1)
        .withGiven(new double[] {-200, -60, 100, -60}, new double[] {-100, 60, 200, 60});
    check(new RangeAndBearing(sight, 0.3, 0.01), 2, pose, region);
  }

  @Test
  void satellitesWithNoiseOfTheirOwn() {
    Space state = Space.reals(4);
    Pseudorange sensor =
        Pseudorange.ofGivenDeviation(Sight.fromGiven(Components.of(0, 1, 2)), Components.of(3));
    Region region = Region.around(state, new double[] {6.4e6, 0, 0, 0}, 100, 100, 100, 1e5)
        .withGiven(
            new double[] {2e7, -1e7, -1e7, 1, 1e7, 1e7, -1e7, 2, 1e7, -1e7, 1e7, 3},
            new double[] {2.5e7, 1e7, 1e7, 9, 2e7, 2e7, 1e7, 9, 2e7, 1e7, 2e7, 9});
    check(sensor, 3, state, region);
  }

  @Test
  void vectorsSeenFromAnAttitude() {
    Space state = Space.unitQuaternion().and(Space.reals(2));
    double[] centre = {0.5, -0.5, 0.5, 0.5, 0, 0};
    Region region = Region.around(state, centre, 1, 1, 1, 5, 5)
        .withGiven(new double[] {-1, -1, -1, 9, -1, -1}, new double[] {1, 1, 1, 10, 1, 1});
    check(new KnownVector(Components.of(0, 1, 2, 3), 0.1), 2, state, region);
  }
}
