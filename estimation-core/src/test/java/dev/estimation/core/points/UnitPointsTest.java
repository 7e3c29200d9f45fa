package dev.estimation.core.points;

import static dev.estimation.testing.Agreement.assertNames;
import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertThrows;

import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.function.Executable;

/** Points of a rule of one's own: what is kept, what is refused. */
class UnitPointsTest {
  private static final double ROOT = Math.sqrt(1.5);

  /** Three corners of a triangle at distance sqrt 2, each of weight 1/3. */
  private static double[][] triangle() {
    return new double[][] {
      {Math.sqrt(2), 0}, {-Math.sqrt(0.5), ROOT}, {-Math.sqrt(0.5), -ROOT},
    };
  }

  private static void assertRefused(Executable call, String... fragments) {
    assertNames(assertThrows(IllegalArgumentException.class, call).getMessage(), fragments);
  }

  @Test
  void onlyCoordinatesOtherThanZeroAreKept() {
    double[] weights = {1 / 3.0, 1 / 3.0, 1 / 3.0};
    UnitPoints points = UnitPoints.of(2, 0, 0, triangle(), weights);
    assertEquals(3, points.size());
    assertEquals(1, points.start(1) - points.start(0));
    assertEquals(2, points.start(2) - points.start(1));
    assertEquals(0, points.coordinate(0, 1));
    assertEquals(-ROOT, points.coordinate(2, 1));
    assertEquals(1, points.axis(points.start(1) + 1));
  }

  @Test
  void givenArraysAreCopied() {
    double[][] places = triangle();
    double[] weights = {0.25, 0.5, 0.25};
    UnitPoints points = UnitPoints.of(2, 0, 0, places, weights);
    places[0][0] = 99;
    weights[1] = 99;
    assertEquals(Math.sqrt(2), points.coordinate(0, 0));
    assertEquals(0.5, points.weight(1));
  }

  @Test
  void negativeWeightsCountInTheAmplification() {
    UnitPoints points = UnitPoints.of(1, -3, 5, new double[][] {{1}, {-1}}, new double[] {2, 2});
    assertEquals(7, points.weightAmplification());
    assertEquals(5, points.centreCovarianceWeight());
  }

  @Test
  void replicatesMustBeOfEqualSize() {
    double[][] draws = {{1}, {2}, {3}, {4}};
    assertEquals(2, UnitPoints.sample(1, draws, 2).replicates());
    assertEquals(2, UnitPoints.sample(1, draws, 2).exactTo(1).replicates());
    assertEquals(0, UnitPoints.of(1, 0, 0, draws, new double[4]).replicates());
    assertRefused(() -> UnitPoints.sample(1, draws, 3), "4 draws", "3 replicates");
    assertRefused(() -> UnitPoints.sample(1, draws, 0), "4 draws", "0 replicates");
    assertRefused(() -> UnitPoints.sample(1, draws, 8), "4 draws", "8 replicates");
    assertRefused(() -> UnitPoints.sample(1, new double[0][], 1), "0 draws");
  }

  @Test
  void wrongShapesAndNumbersAreRefused() {
    double[][] places = triangle();
    assertRefused(() -> UnitPoints.of(2, 0, 0, places, new double[2]), "weights", "3", "2");
    assertRefused(() -> UnitPoints.of(3, 0, 0, places, new double[3]), "point", "3", "2");
    double[] bad = {0, Double.NaN, 1};
    assertRefused(() -> UnitPoints.of(2, 0, 0, places, bad), "weights[1]", "NaN");
    double infinite = Double.POSITIVE_INFINITY;
    assertRefused(() -> UnitPoints.of(2, infinite, 0, places, new double[3]), "Infinity");
    assertRefused(() -> UnitPoints.of(2, 0, infinite, places, new double[3]), "Infinity");
    places[1][1] = Double.NaN;
    assertRefused(() -> UnitPoints.of(2, 0, 0, places, new double[3]), "point", "NaN");
  }
}
