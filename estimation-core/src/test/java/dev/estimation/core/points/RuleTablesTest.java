package dev.estimation.core.points;

import static dev.estimation.testing.Agreement.assertRelative;
import static dev.estimation.testing.Agreement.assertVector;
import static dev.estimation.testing.Agreement.assertWithin;
import static org.junit.jupiter.api.Assertions.assertEquals;

import dev.estimation.testing.ReferenceTable;
import java.util.stream.Stream;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.MethodSource;

/** Weights and coordinates against outside tables, row by row. */
class RuleTablesTest {
  static Stream<ReferenceTable.Row> scaledUnscented() {
    return ReferenceTable.read("scaled_ut_weights.csv").stream();
  }

  /**
   * Relative 1e-14: each number is a quotient of few operations, and the centre's weight, a
   * difference of two such, is of their size or larger unless it is zero; hence the scale of 1 at
   * least.
   */
  @ParameterizedTest
  @MethodSource
  void scaledUnscented(ReferenceTable.Row row) {
    int n = row.count("n");
    UnitPoints points = UnscentedRule.scaled(
            row.number("alpha"), row.number("beta"), row.number("kappa"))
        .points(n);
    assertEquals(2 * n, points.size());
    double mean = row.number("wm0");
    assertWithin("wm0", mean, points.centreMeanWeight(), 1e-14, Math.max(1, Math.abs(mean)));
    double covariance = row.number("wc0");
    assertWithin(
        "wc0",
        covariance,
        points.centreCovarianceWeight(),
        1e-14,
        Math.max(1, Math.abs(covariance)));
    for (int i = 0; i < 2 * n; i++) {
      assertRelative("weight", row.number("wi"), points.weight(i), 1e-14);
      assertEquals(points.start(i) + 1, points.start(i + 1), "one coordinate a point");
      double coordinate = Math.abs(points.coordinate(points.start(i)));
      assertRelative("spread", row.number("spread"), coordinate, 1e-14);
    }
  }

  static Stream<ReferenceTable.Row> gaussHermite() {
    return ReferenceTable.read("gauss_hermite.csv").stream();
  }

  /**
   * Relative 1e-14 for nodes and 2e-14 for weights: a weight is made from the squares of Hermite
   * polynomials at rounded nodes, whose slope there doubles the error.
   */
  @ParameterizedTest
  @MethodSource
  void gaussHermite(ReferenceTable.Row row) {
    UnitPoints points = GaussHermiteRule.product(row.count("p")).points(1);
    double node = row.number("node");
    if (node == 0) {
      assertRelative("centre", row.number("weight"), points.centreMeanWeight(), 2e-14);
      return;
    }
    int nearest = nearest(points, node);
    assertRelative("node", node, points.coordinate(nearest, 0), 1e-14);
    assertRelative("weight", row.number("weight"), points.weight(nearest), 2e-14);
  }

  static Stream<ReferenceTable.Row> fifthDegree() {
    return ReferenceTable.read("cubature5_weights.csv").stream();
  }

  /** 4e-15 of 1, the size of what is added: a few roundings each; weights are up to 3. */
  @ParameterizedTest
  @MethodSource
  void fifthDegree(ReferenceTable.Row row) {
    int n = row.count("n");
    boolean radial = row.text("rule").equals("cubature 5");
    CubatureRule rule = radial ? CubatureRule.degreeFive() : CubatureRule.mcNameeStenger();
    UnitPoints points = rule.points(n);
    assertEquals(row.count("points"), points.size() + 1);
    assertWithin("centre", row.number("centre"), points.centreMeanWeight(), 4e-15, 1);
    assertEquals(points.centreMeanWeight(), points.centreCovarianceWeight());
    for (int i = 0; i < points.size(); i++) {
      boolean onAxis = i < 2 * n;
      assertEquals(onAxis ? 1 : 2, points.start(i + 1) - points.start(i), "coordinates");
      assertWithin("weight", row.number(onAxis ? "axis" : "pair"), points.weight(i), 1e-16, 1);
      double radius = row.number("radius") / (radial && !onAxis ? Math.sqrt(2) : 1);
      for (int entry = points.start(i); entry < points.start(i + 1); entry++) {
        assertRelative("place", radius, Math.abs(points.coordinate(entry)), 1e-15);
      }
    }
  }

  static Stream<ReferenceTable.Row> simplex() {
    return ReferenceTable.read("spherical_simplex_points.csv").stream();
  }

  /** 2e-15 of coordinates to 3: a division and two roots. */
  @ParameterizedTest
  @MethodSource
  void simplex(ReferenceTable.Row row) {
    int n = row.count("n");
    UnitPoints points = SimplexRule.spherical(row.number("centre_weight")).points(n);
    assertEquals(n + 1, points.size());
    int corner = row.count("i") - 1;
    if (corner < 0) {
      assertEquals(row.number("weight"), points.centreMeanWeight());
      assertEquals(row.number("weight"), points.centreCovarianceWeight());
      return;
    }
    assertWithin("weight", row.number("weight"), points.weight(corner), 1e-16, 1);
    double[] place = UnitMoments.place(points, corner);
    assertVector("corner " + corner, row.numbers("coordinates"), place, 2e-15, 1);
  }

  private static int nearest(UnitPoints points, double node) {
    int best = 0;
    for (int i = 1; i < points.size(); i++) {
      if (distance(points, i, node) < distance(points, best, node)) {
        best = i;
      }
    }
    return best;
  }

  private static double distance(UnitPoints points, int index, double node) {
    return Math.abs(points.coordinate(index, 0) - node);
  }
}
