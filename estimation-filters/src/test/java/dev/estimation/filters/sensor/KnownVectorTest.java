package dev.estimation.filters.sensor;

import static org.junit.jupiter.api.Assertions.assertArrayEquals;

import dev.estimation.core.space.Space;
import dev.estimation.filters.model.DifferentiableSensor;
import java.util.List;
import org.junit.jupiter.api.Test;

class KnownVectorTest extends SensorContract {
  private static final Components FIRST = Components.of(0, 1, 2, 3);

  @Override
  List<SensorCase> cases() {
    double[] field = {0.2, -0.1, 0.4};
    Space second =
        Space.reals(2).and(Space.unitQuaternion()).and(Space.unitQuaternion()).and(Space.reals(1));
    double root = Math.sqrt(0.5);
    return List.of(
        new SensorCase(
            "first",
            new KnownVector(FIRST, 2),
            BEHIND_ATTITUDE,
            1,
            field,
            States.behindAttitude(5, -6, 4)),
        new SensorCase(
            "alone",
            new KnownVector(FIRST, 2),
            Space.unitQuaternion(),
            1,
            field,
            new double[] {1, 0, 0, 0},
            new double[] {0, 0, -1, 0}),
        new SensorCase(
            "second attitude",
            new KnownVector(Components.of(6, 7, 8, 9).behindQuaternions(1), 2),
            second,
            1,
            field,
            new double[] {1, 2, 1, 0, 0, 0, root, 0, 0.5, 0.5, 3}));
  }

  @Override
  DifferentiableSensor withDeviation(double deviation) {
    return new KnownVector(FIRST, deviation);
  }

  /** The body is turned by 90 degrees to the left about up: what is ahead in the world (x) is on its right (-y). */
  @Test
  void seesTheVectorInTheBody() {
    double[] seen = new double[3];
    double root = Math.sqrt(0.5);
    new KnownVector(FIRST, 1)
        .measure(new double[] {root, 0, 0, root}, new double[] {2, 0, 9.8}, seen);
    assertArrayEquals(new double[] {0, -2, 9.8}, seen, 4e-15); // two roundings of 9.8
  }

  @Test
  void refusesScatteredComponents() {
    assertRefusal(
        () -> new KnownVector(Components.of(0, 1, 2, 4), 1),
        "one after the other",
        "[0, 1, 2, 4]",
        "KnownVector");
    assertRefusal(
        () -> new KnownVector(Components.of(0, 1, 2), 1),
        "an attitude must have 4 components",
        "[0, 1, 2]",
        "KnownVector");
  }
}
