package dev.estimation.filters.sensor;

import static dev.estimation.filters.sensor.SensorContract.assertRefusal;

import org.junit.jupiter.api.Test;

/** What sights and components refuse. */
class SightTest {
  @Test
  void componentsAreDistinctIndices() {
    assertRefusal(() -> Components.of(), "1 or more", "got []");
    assertRefusal(() -> Components.of(0, -1), "0 or above", "got [0, -1]");
    assertRefusal(() -> Components.of(2, 2), "distinct", "got [2, 2]");
  }

  @Test
  void quaternionsNeedRoom() {
    assertRefusal(() -> Components.of(9, 7).behindQuaternions(2), "[9, 7]", "0 to 1", "got 2");
    assertRefusal(() -> Components.of(7).behindQuaternions(-1), "got -1");
  }

  @Test
  void positionsHaveTwoOrThreeComponents() {
    assertRefusal(() -> Sight.fromGiven(Components.of(0)), "2 or 3", "got [0]");
    assertRefusal(() -> Sight.toGiven(Components.of(0, 1, 2, 3)), "2 or 3", "got [0, 1, 2, 3]");
  }

  @Test
  void heightsAreForPositionsInThePlane() {
    assertRefusal(
        () -> Sight.fromGiven(Components.of(0, 1, 2)).atHeight(1), "2 components", "got [0, 1, 2]");
    assertRefusal(() -> Sight.fromGiven(Components.of(0, 1)).atHeight(Double.NaN), "height", "NaN");
  }

  @Test
  void headingsHaveOneComponent() {
    assertRefusal(
        () -> Sight.fromGiven(Components.of(0, 1)).relativeTo(Components.of(2, 3)),
        "1 component",
        "got [2, 3]");
  }
}
