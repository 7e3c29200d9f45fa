package dev.estimation.core.accuracy;

import static dev.estimation.testing.Agreement.assertNames;
import static dev.estimation.testing.Agreement.assertWithin;
import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertThrows;
import static org.junit.jupiter.api.Assertions.assertTrue;

import dev.estimation.core.function.VectorFunction;
import dev.estimation.core.gaussian.Gaussian;
import dev.estimation.core.matching.Linearisation;
import dev.estimation.core.matching.PointMatching;
import dev.estimation.core.matching.Use;
import dev.estimation.core.points.CubatureRule;
import dev.estimation.core.points.GaussHermiteRule;
import dev.estimation.core.points.SparseGridRule;
import dev.estimation.core.space.Space;
import dev.estimation.testing.PolarToCartesian;
import java.util.List;
import java.util.stream.IntStream;
import org.junit.jupiter.api.Test;

/** One call that compares matchings over many points. */
class AuditTest {
  private static final double[][] NOISE = {{1e-4, 0}, {0, 1e-4}};

  /** A range of 1 m known to 2 cm, bearings known to 0.2 to 20 degrees. */
  private static List<OperatingPoint> points() {
    return IntStream.rangeClosed(1, 100)
        .mapToObj(i -> OperatingPoint.of(
            Gaussian.independent(
                new double[] {1, 0.1 * i}, new double[] {0.02, Math.toRadians(0.2 * i)}),
            NOISE))
        .toList();
  }

  private static Audit audit(Use use) {
    return Audit.of(Space.reals(2), Space.reals(2), new PolarToCartesian(), use)
        .method("linear", Linearisation.firstOrder())
        .method("cubature", PointMatching.of(CubatureRule.degreeThree()))
        .method("Gauss-Hermite 5", PointMatching.of(GaussHermiteRule.product(5)))
        .method("Gauss-Hermite 10", PointMatching.of(GaussHermiteRule.product(10)));
  }

  @Test
  void dearerMethodsAreBetterAndTheCheapestWithinIsFound() {
    for (Use use : Use.values()) {
      AuditTable table = audit(use).run(points());
      List<AuditRow> rows = table.rows();
      assertEquals(100, table.reference().points());
      assertEquals(100, table.reference().converged());
      for (int i = 1; i < rows.size(); i++) {
        assertTrue(rows.get(i).evaluations() > rows.get(i - 1).evaluations(), table.toString());
        assertTrue(
            rows.get(i).largest().worst() < rows.get(i - 1).largest().worst(), table.toString());
      }
      assertEquals(1, rows.get(0).evaluations());
      assertEquals(1, rows.get(0).jacobians());
      assertEquals(5, rows.get(1).evaluations());
      assertEquals("linear", table.cheapest(0.5, 0.1).orElseThrow().method());
      AuditRow chosen = table.cheapest(1e-6, 1).orElseThrow();
      assertEquals("Gauss-Hermite 10", chosen.method(), table.toString());
      assertEquals(1, chosen.shareWithin(1e-6));
      assertTrue(table.cheapest(1e-15, 1).isEmpty(), "not below what the reference knows");
      assertTrue(table.toString().lines().count() == 6, table.toString());
      assertNames(table.toString(), "cubature", "converged at 100 of 100 points", "cross-cov");
    }
  }

  /** What a Jacobian costs decides between the two. */
  @Test
  void theCostOfJacobiansCounts() {
    AuditTable table = audit(Use.PREDICTION).run(points());
    assertEquals("linear", table.cheapest(1e9, 1, 3.9).orElseThrow().method());
    assertEquals("cubature", table.cheapest(1e9, 1, 4.1).orElseThrow().method());
    assertNames(
        assertThrows(IllegalArgumentException.class, () -> table.cheapest(1, 0)).getMessage(),
        "share",
        "0.0");
  }

  /** x^2 of N(0, 1) and a noise of 2: mean 1 in 2, variance 2 in 4, KL by hand. */
  @Test
  void linearisationOfASquareByHand() {
    VectorFunction square = (u, given, z) -> z[0] = given[0] * u[0] * u[0];
    Gaussian input = Gaussian.independent(new double[] {0}, new double[] {1});
    AuditTable table = Audit.of(Space.reals(1), Space.reals(1), square, Use.PREDICTION)
        .method("linear", Linearisation.firstOrder().withInputScales(1))
        .run(List.of(OperatingPoint.of(input, new double[][] {{2}}, 1)));
    AuditRow row = table.rows().get(0);
    assertWithin("mean", 0.5, row.mean().worst(), 1e-8, 1);
    assertWithin("covariance", 0.5, row.covariance().median(), 1e-8, 1);
    double divergence = (2 - 1 - Math.log(2) + 0.5) / 2;
    assertWithin("divergence", divergence, row.divergence().most(), 1e-8, 1);
    assertEquals(0, row.failures());
  }

  /** A function without a value at a node of one rule: told, counted, and infinitely wrong there. */
  @Test
  void failuresOfAMatchingAreCounted() {
    VectorFunction fussy = (u, given, z) -> z[0] = u[0] == given[0] ? Double.NaN : u[0];
    Gaussian input = Gaussian.independent(new double[] {0}, new double[] {1});
    double node = 1; // of cubature in one dimension alone
    AuditTable table = Audit.of(Space.reals(1), Space.reals(1), fussy, Use.UPDATE)
        .method("cubature", PointMatching.of(CubatureRule.degreeThree()))
        .method("sparse", PointMatching.of(SparseGridRule.ofLevel(1)))
        .run(List.of(
            OperatingPoint.of(input, new double[][] {{1}}, node),
            OperatingPoint.of(input, new double[][] {{1}}, 99)));
    AuditRow row = table.rows().get(0);
    assertEquals(1, row.failures());
    assertNames(row.firstFailure(), "NaN");
    assertEquals(Double.POSITIVE_INFINITY, row.largest().worst());
    assertEquals(0.5, row.shareWithin(1e-9));
    assertEquals(0, table.rows().get(1).failures());
    assertEquals("sparse", table.cheapest(1e-9, 1).orElseThrow().method());
  }

  @Test
  void badInputIsToldWithThePoint() {
    Audit audit = audit(Use.UPDATE);
    assertNames(
        assertThrows(IllegalArgumentException.class, () -> audit.run(List.of())).getMessage(),
        "0 points");
    Gaussian input = Gaussian.independent(new double[] {1, 0}, new double[] {0.1, 0.1});
    OperatingPoint good = OperatingPoint.of(input, NOISE);
    OperatingPoint wrong = OperatingPoint.of(input, new double[][] {{1}});
    assertThrows(IllegalArgumentException.class, () -> audit.run(List.of(good, wrong)));
    VectorFunction nothing = (u, given, z) -> z[0] = given[0] / 0.0;
    Audit broken = Audit.of(Space.reals(2), Space.reals(1), nothing, Use.UPDATE)
        .method("cubature", PointMatching.of(CubatureRule.degreeThree()));
    OperatingPoint point = OperatingPoint.of(input, new double[][] {{1}}, 1);
    assertNames(
        assertThrows(IllegalArgumentException.class, () -> broken.run(List.of(point)))
            .getMessage(),
        "Infinity",
        "operating point 0");
    assertNames(
        assertThrows(
                IllegalArgumentException.class,
                () -> audit.method("linear", Linearisation.firstOrder()))
            .getMessage(),
        "linear");
  }

  /** Order statistics: of 1 to 200, the median is 100 and the 99 % quantile 198. */
  @Test
  void quantilesAreOrderStatistics() {
    double[] errors = IntStream.rangeClosed(1, 200).mapToDouble(i -> 201 - i).toArray();
    assertEquals(new ErrorQuantiles(100, 198, 200), ErrorQuantiles.of(errors));
    assertEquals(new ErrorQuantiles(7, 7, 7), ErrorQuantiles.of(new double[] {7}));
    double[] hundred = IntStream.rangeClosed(1, 100).asDoubleStream().toArray();
    assertEquals(7, ErrorQuantiles.quantile(hundred, 0.07));
  }
}
