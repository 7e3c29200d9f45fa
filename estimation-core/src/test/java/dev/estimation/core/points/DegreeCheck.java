package dev.estimation.core.points;

import static dev.estimation.testing.Agreement.assertWithin;
import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertTrue;

import dev.estimation.testing.ReferenceTable;
import java.util.ArrayList;
import java.util.Arrays;
import java.util.List;
import java.util.stream.Collectors;

/** Compares the monomials that a rule gets right with a row of rule_degree.csv. */
final class DegreeCheck {
  private DegreeCheck() {}

  static void check(PointRule rule, ReferenceTable.Row row) {
    int n = row.count("n");
    UnitPoints points = rule.points(n);
    int degree = row.count("degree");
    checkExactTo(points, degree);
    int[] failing = firstFailing(points, degree);
    assertEquals(row.text("first_failing_monomial"), name(failing), row.toString());
    assertEquals(row.number("exact"), UnitMoments.exact(failing));
    double value = UnitMoments.of(points, failing);
    assertWithin(row.toString(), row.number("rule_value"), value, tolerance(points, failing), 1);
    assertWithin(row.toString(), row.number("min_weight"), smallest(points, row), 1e-15, 1);
  }

  /** Every monomial to a total degree must be exact. */
  static void checkExactTo(UnitPoints points, int degree) {
    for (int d = 1; d <= degree; d++) {
      for (int[] powers : monomials(points.dimension(), d)) {
        assertTrue(isExact(points, powers), () -> name(powers) + " must be exact");
      }
    }
  }

  private static int[] firstFailing(UnitPoints points, int degree) {
    for (int d = degree + 1; d <= degree + 2; d++) {
      for (int[] powers : monomials(points.dimension(), d)) {
        if (!isExact(points, powers)) {
          return powers;
        }
      }
    }
    throw new AssertionError("no failing monomial above degree " + degree);
  }

  private static boolean isExact(UnitPoints points, int[] powers) {
    double error = UnitMoments.of(points, powers) - UnitMoments.exact(powers);
    return Math.abs(error) <= tolerance(points, powers);
  }

  /**
   * Rounding of the sum: 64 eps times the sum of the absolute terms, enough for the ten products in
   * a term and for sums of a thousand terms of random sign.
   */
  private static double tolerance(UnitPoints points, int[] powers) {
    double size = 0;
    for (int i = 0; i < points.size(); i++) {
      double term = Math.abs(points.weight(i));
      for (int axis = 0; axis < powers.length; axis++) {
        term *= Math.pow(Math.abs(points.coordinate(i, axis)), powers[axis]);
      }
      size += term;
    }
    return 64 * 0x1p-52 * Math.max(size, 1);
  }

  /** The smallest weight, that of the centre included where the table's rule has a centre. */
  private static double smallest(UnitPoints points, ReferenceTable.Row row) {
    double smallest = Double.POSITIVE_INFINITY;
    for (int i = 0; i < points.size(); i++) {
      smallest = Math.min(smallest, points.weight(i));
    }
    boolean hasCentre = row.count("points") == points.size() + 1;
    return hasCentre ? Math.min(smallest, points.centreMeanWeight()) : smallest;
  }

  /** All monomials of n variables and total degree d, highest power of the first variable first. */
  static List<int[]> monomials(int n, int d) {
    List<int[]> all = new ArrayList<>();
    extend(new int[n], 0, d, all);
    return all;
  }

  private static void extend(int[] powers, int axis, int rest, List<int[]> all) {
    if (axis == powers.length - 1) {
      powers[axis] = rest;
      all.add(powers.clone());
      return;
    }
    for (int power = rest; power >= 0; power--) {
      powers[axis] = power;
      extend(powers, axis + 1, rest - power, all);
    }
  }

  private static String name(int[] powers) {
    return Arrays.stream(powers).mapToObj(Integer::toString).collect(Collectors.joining("."));
  }
}
