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
  private static final double MOST_TERMS = 1e6;

  private DegreeCheck() {}

  static void check(PointRule rule, ReferenceTable.Row row) {
    int n = row.count("n");
    UnitPoints points = rule.points(n);
    int degree = row.count("degree");
    assertEquals(degree, points.degree(), row.toString());
    checkExactTo(points, degree);
    int[] failing = firstFailing(points, degree);
    assertEquals(row.text("first_failing_monomial"), name(failing), row.toString());
    assertEquals(row.number("exact"), UnitMoments.exact(failing));
    double value = UnitMoments.of(points, failing);
    assertWithin(row.toString(), row.number("rule_value"), value, tolerance(points, failing), 1);
    assertWithin(row.toString(), row.number("min_weight"), smallest(points, row), 1e-15, 1);
  }

  /** Every monomial to a total degree must be exact; those that take too long are left out. */
  static void checkExactTo(UnitPoints points, int degree) {
    for (int d = 1; d <= degree; d++) {
      if (d > 3 && terms(points, d) > MOST_TERMS) {
        return;
      }
      for (int[] powers : monomials(points.dimension(), d)) {
        assertTrue(isExact(points, powers), () -> name(powers) + " must be exact");
      }
    }
  }

  /** The terms to sum for all monomials of total degree d: points times (n + d - 1 over d). */
  private static double terms(UnitPoints points, int d) {
    double count = points.size();
    for (int i = 1; i <= d; i++) {
      count *= (points.dimension() + i - 1.0) / i;
    }
    return count;
  }

  /** The first monomial of the next degree that is not exact; there must be one. */
  static int[] firstFailing(UnitPoints points, int degree) {
    for (int[] powers : monomials(points.dimension(), degree + 1)) {
      if (!isExact(points, powers)) {
        return powers;
      }
    }
    throw new AssertionError("no failing monomial of degree " + (degree + 1));
  }

  private static boolean isExact(UnitPoints points, int[] powers) {
    double error = UnitMoments.of(points, powers) - UnitMoments.exact(powers);
    return Math.abs(error) <= tolerance(points, powers);
  }

  /**
   * Rounding of the sum: each term has at most some tens of roundings, of random sign over N terms;
   * 16 (4 + sqrt N) eps times the sum of the absolute terms is some ten times what is expected.
   */
  private static double tolerance(UnitPoints points, int[] powers) {
    double size = 0;
    for (int i = 0; i < points.size(); i++) {
      double term = Math.abs(points.weight(i));
      for (int axis = 0; axis < powers.length && term != 0; axis++) {
        if (powers[axis] > 0) {
          term *= Math.pow(Math.abs(points.coordinate(i, axis)), powers[axis]);
        }
      }
      size += term;
    }
    return 16 * (4 + Math.sqrt(points.size())) * 0x1p-52 * Math.max(size, 1);
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
