package dev.estimation.filters.sensor;

import static org.junit.jupiter.api.Assertions.assertArrayEquals;

import dev.estimation.filters.model.DifferentiableSensor;
import java.util.List;
import org.junit.jupiter.api.Test;

class SpeedAndCourseTest extends SensorContract {
  private static final Components VELOCITY = Components.of(2, 3);

  @Override
  List<SensorCase> cases() {
    return List.of(
        new SensorCase(
            "plane",
            new SpeedAndCourse(VELOCITY, 2, 3),
            PLANE,
            1,
            NONE,
            States.plane(4, 7),
            new double[] {0, 0, -5, 1e-7, 0}),
        new SensorCase(
            "compass",
            new SpeedAndCourse(Components.of(3, 2), 2, 3),
            PLANE,
            1,
            NONE,
            States.plane(4, 7)),
        new SensorCase(
            "block",
            new SpeedAndCourse(Components.of(7, 8).behindQuaternions(1), 2, 3),
            BEHIND_ATTITUDE,
            10,
            NONE,
            States.behindAttitude(5, -6, 4)));
  }

  @Override
  DifferentiableSensor withDeviation(double deviation) {
    return new SpeedAndCourse(VELOCITY, deviation, deviation);
  }

  /** East 3, south 4: in compass terms 180 degrees less atan(3 / 4). */
  @Test
  void measuresLengthAndDirection() {
    assertArrayEquals(
        new double[] {5, Math.atan2(-4, 3)}, cases().get(0).measured(States.plane(0, 0)), 0);
    assertArrayEquals(
        new double[] {5, Math.PI - Math.atan2(3, 4)},
        cases().get(1).measured(States.plane(0, 0)),
        5e-16); // one rounding
  }

  @Test
  void crossesItsSeam() {
    assertCrossesSeam(cases().get(0), 1, small -> new double[] {0, 0, -3, small, 0});
  }

  @Test
  void atRestThereIsNoCourse() {
    assertRefused(new SpeedAndCourse(VELOCITY, 1, 1), new double[4], NONE, 3, 0);
  }

  @Test
  void refusesVelocitiesInSpace() {
    assertRefusal(
        () -> new SpeedAndCourse(Components.of(2, 3, 4), 1, 1),
        "a velocity must have 2 components",
        "[2, 3, 4]",
        "SpeedAndCourse");
  }
}
