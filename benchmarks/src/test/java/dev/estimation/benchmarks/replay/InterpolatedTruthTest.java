package dev.estimation.benchmarks.replay;

import static org.junit.jupiter.api.Assertions.assertArrayEquals;
import static org.junit.jupiter.api.Assertions.assertFalse;
import static org.junit.jupiter.api.Assertions.assertTrue;

import dev.estimation.core.space.Space;
import org.junit.jupiter.api.Test;

class InterpolatedTruthTest {
  private final double[] values = new double[2];

  @Test
  void isLinearBetweenNeighboursHoweverTheyWereGiven() {
    InterpolatedTruth.Builder builder = new InterpolatedTruth.Builder(1, 0, 1);
    builder.add(2, true, 20, -2);
    builder.add(1, true, 10, -1);
    Truth truth = builder.build().orElseThrow();
    assertArrayEquals(new int[] {0, 1}, truth.components());
    assertTrue(truth.at(1.25, values));
    assertArrayEquals(new double[] {12.5, -1.25}, values, 0);
    assertTrue(truth.at(1, values));
    assertArrayEquals(new double[] {10, -1}, values, 0);
    assertTrue(truth.at(2, values));
    assertArrayEquals(new double[] {20, -2}, values, 0);
  }

  @Test
  void endsWhereFixesEnd() {
    InterpolatedTruth.Builder builder = new InterpolatedTruth.Builder(1, 0, 1);
    builder.add(1, true, 0, 0);
    assertFalse(builder.build().orElseThrow().at(1, values), "one fix is no pair");
    builder.add(2, true, 0, 0);
    Truth truth = builder.build().orElseThrow();
    assertFalse(truth.at(Math.nextDown(1.0), values));
    assertFalse(truth.at(Math.nextUp(2.0), values));
    assertFalse(truth.at(Double.NaN, values));
  }

  @Test
  void hasHolesWhereNeighboursAreFarApartOrPoor() {
    InterpolatedTruth.Builder builder = new InterpolatedTruth.Builder(1, 0, 1);
    builder.add(0, true, 0, 0);
    builder.add(1, true, 0, 0);
    builder.add(2.25, true, 0, 0);
    builder.add(3, false, 0, 0);
    builder.add(4, true, 0, 0);
    builder.add(5, true, 0, 0);
    Truth truth = builder.build().orElseThrow();
    assertTrue(truth.at(0.5, values));
    assertTrue(truth.at(1, values), "the pair before ends here");
    assertFalse(truth.at(1.5, values), "1.25 s apart");
    assertFalse(truth.at(2.5, values), "the fix at 3 is poor");
    assertFalse(truth.at(3.5, values), "the fix at 3 is poor");
    assertTrue(truth.at(4, values), "the pair after begins here");
    assertTrue(truth.at(4.5, values));
  }

  @Test
  void takesFixesOfEqualTime() {
    InterpolatedTruth.Builder builder = new InterpolatedTruth.Builder(1, 0, 1);
    builder.add(1, true, 3, 4);
    builder.add(1, true, 3, 4);
    assertTrue(builder.build().orElseThrow().at(1, values));
    assertArrayEquals(new double[] {3, 4}, values, 0);
  }

  /** From 3.0 to -3.0 the shorter way leads over pi: 0.283 rad, not 6. */
  @Test
  void headingsTakeTheShorterArc() {
    InterpolatedTruth.Builder builder =
        new InterpolatedTruth.Builder(1, Space.reals(1).and(Space.angles(1)), 0, 2);
    builder.add(0, true, -3, 3);
    builder.add(1, true, 3, -3);
    Truth truth = builder.build().orElseThrow();
    double arc = 2 * Math.PI - 6;
    assertTrue(truth.at(0.25, values));
    assertArrayEquals(new double[] {-1.5, 3 + arc / 4}, values, 1e-15); // roundings of 3, as below
    assertTrue(truth.at(0.75, values));
    assertArrayEquals(new double[] {1.5, -3 - arc / 4}, values, 1e-15);
    assertTrue(truth.at(1, values));
    assertArrayEquals(new double[] {3, -3}, values, 1e-15);
  }

  @Test
  void doesNotExistWithoutFixes() {
    assertTrue(new InterpolatedTruth.Builder(1, 0, 1).build().isEmpty());
  }
}
