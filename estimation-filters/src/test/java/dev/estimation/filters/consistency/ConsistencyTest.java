package dev.estimation.filters.consistency;

import static dev.estimation.testing.Agreement.assertRelative;
import static dev.estimation.testing.Agreement.assertWithin;
import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertFalse;
import static org.junit.jupiter.api.Assertions.assertThrows;
import static org.junit.jupiter.api.Assertions.assertTrue;

import dev.estimation.core.gaussian.Gaussian;
import dev.estimation.core.space.Space;
import dev.estimation.testing.ReferenceTable;
import java.util.List;
import java.util.SplittableRandom;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.MethodSource;

/** Bounds against tables, normalised errors against closed forms. */
class ConsistencyTest {
  static List<ReferenceTable.Row> quantiles() {
    return ReferenceTable.read("chi2_quantiles.csv").rows();
  }

  static List<ReferenceTable.Row> averages() {
    return ReferenceTable.read("average_nees_bounds.csv").rows();
  }

  /** 1e-12: the stated accuracy of the quantiles. */
  @ParameterizedTest
  @MethodSource("quantiles")
  void quantilesAreThoseOfTheTables(ReferenceTable.Row row) {
    int degrees = row.count("dof");
    for (String p : List.of("0.005", "0.025", "0.5", "0.95", "0.975", "0.99", "0.999")) {
      assertRelative(
          degrees + " at " + p,
          row.number("p" + p),
          ChiSquareBounds.upperLimit(Double.parseDouble(p), degrees),
          1e-12);
    }
    ChiSquareBounds bounds = ChiSquareBounds.twoSided(0.95, degrees);
    assertRelative("lower", row.number("p0.025"), bounds.lower(), 1e-12);
    assertRelative("upper", row.number("p0.975"), bounds.upper(), 1e-12);
  }

  @ParameterizedTest
  @MethodSource("averages")
  void boundsOfAverages(ReferenceTable.Row row) {
    ChiSquareBounds bounds =
        ChiSquareBounds.ofAverage(row.number("prob"), row.count("dim"), row.count("runs"));
    assertRelative("lower", row.number("lower"), bounds.lower(), 1e-12);
    assertRelative("upper", row.number("upper"), bounds.upper(), 1e-12);
  }

  @Test
  void boundsAreInclusiveAndRefuseNaN() {
    ChiSquareBounds bounds = ChiSquareBounds.twoSided(0.95, 2);
    assertTrue(bounds.contains(bounds.lower()) && bounds.contains(bounds.upper()));
    assertFalse(bounds.contains(Math.nextUp(bounds.upper())));
    assertFalse(bounds.contains(Double.NaN));
    assertThrows(IllegalArgumentException.class, () -> ChiSquareBounds.twoSided(1, 2));
    assertThrows(IllegalArgumentException.class, () -> ChiSquareBounds.twoSided(0.95, 0));
  }

  /** For [[a, b], [b, c]] the closed form is (c x^2 - 2 b x y + a y^2) / (a c - b^2). */
  @Test
  void normalisedErrorIsTheQuadraticForm() {
    Gaussian estimate =
        Gaussian.of(new double[] {1, 3, 2}, new double[][] {{4, 0, 1}, {0, 9, 0}, {1, 0, 2}});
    NormalisedError error = NormalisedError.of(Space.reals(3), 0, 2);
    double x = 1 - 0.5;
    double y = 2 - 2.25;
    double expected = (2 * x * x - 2 * x * y + 4 * y * y) / (4 * 2 - 1);
    assertEquals(2, error.degreesOfFreedom());
    assertRelative("NEES", expected, error.squared(estimate, new double[] {0.5, 2.25}), 1e-15);
  }

  @Test
  void normalisedErrorOfAnAngleGoesTheShortWayRound() {
    Gaussian estimate = Gaussian.independent(new double[] {5, 3.1}, new double[] {1, 0.1});
    NormalisedError error = NormalisedError.of(Space.reals(1).and(Space.angles(1)), 1);
    double expected = Math.pow((3.1 - (-3.1 + 2 * Math.PI)) / 0.1, 2);
    // 1e-13: the difference of 0.083 loses two digits of 2 pi.
    assertRelative("NEES", expected, error.squared(estimate, new double[] {-3.1}), 1e-13);
  }

  @Test
  void normalisedErrorChecksItsArguments() {
    NormalisedError error = NormalisedError.of(Space.reals(2), 1);
    Gaussian flat = Gaussian.independent(new double[2], new double[2]);
    assertTrue(Double.isNaN(error.squared(flat, new double[1])), "a variance of 0 has no NEES");
    assertThrows(IllegalArgumentException.class, () -> error.squared(flat, new double[2]));
    assertThrows(IllegalArgumentException.class, () -> NormalisedError.of(Space.reals(2), 2));
    assertThrows(IllegalArgumentException.class, () -> NormalisedError.of(Space.reals(2)));
  }

  /**
   * 20000 squared standard normal pairs: the mean is 2 +- 0.0141 (standard error), the share inside
   * 0.95 +- 0.0015; four standard errors, so a false alarm in about 1 of 8000 seeds; one fixed seed.
   */
  @Test
  void tallyOfHonestErrors() {
    SplittableRandom random = new SplittableRandom(20261201);
    ConsistencyTally tally = new ConsistencyTally(2);
    for (int i = 0; i < 20000; i++) {
      double a = random.nextGaussian();
      double b = random.nextGaussian();
      tally.add(a * a + b * b);
    }
    assertEquals(20000, tally.count());
    assertWithin("mean", 2, tally.mean(), 4 * 0.0142, 1);
    assertWithin("inside", 0.95, tally.insideFraction(), 4 * 0.00155, 1);
  }

  @Test
  void emptyTallyHasNoMean() {
    ConsistencyTally tally = new ConsistencyTally(1);
    assertTrue(Double.isNaN(tally.mean()) && Double.isNaN(tally.insideFraction()));
  }
}
