package dev.estimation.filters.consistency;

import static dev.estimation.testing.Agreement.assertNames;
import static dev.estimation.testing.Agreement.assertWithin;
import static org.junit.jupiter.api.Assertions.assertThrows;
import static org.junit.jupiter.api.Assertions.assertTrue;

import dev.estimation.filters.filter.FilterPlan;
import dev.estimation.filters.testing.PlainWalk;
import org.apache.commons.math3.distribution.ChiSquaredDistribution;
import org.junit.jupiter.api.function.Executable;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.CsvSource;
import org.junit.jupiter.params.provider.ValueSource;

/** Quantiles far out in both tails, where an inverse that is right to an absolute error is lost. */
class ExtremeQuantilesTest {
  private static final double[] PROBABILITIES = {1e-12, 1e-6, 0.5, 1 - 1e-6, 1 - 1e-12};

  /**
   * Relative to the smaller of p and 1 - p. Low tail: the series of the distribution is right to
   * some 1e-14, 1e-11 leaves room. High tail: p is rounded to 1e-16 and the distribution right to
   * some 1e-15, which is 1e-9 of 1e-6 and 1e-3 of 1e-12; ten times that.
   */
  @ParameterizedTest
  @CsvSource({"1e-12, 1e-11", "1e-6, 1e-11", "0.5, 1e-11", "0.999999, 1e-8", "0.999999999999, 1e-2"
  })
  void theDistributionGivesTheProbabilityBack(double probability, double tolerance) {
    for (int degrees = 1; degrees <= 6; degrees++) {
      double limit = ChiSquareBounds.upperLimit(probability, degrees);
      double back = new ChiSquaredDistribution(null, degrees).cumulativeProbability(limit);
      double tail = Math.min(probability, 1 - probability);
      assertWithin(degrees + " degrees", probability, back, tolerance, tail);
    }
  }

  /** Two degrees of freedom have the closed form -2 ln(1 - p); 1e-5 at the far end, as stated. */
  @ParameterizedTest
  @CsvSource({"1e-12, 1e-12", "1e-6, 1e-12", "0.999999, 1e-9", "0.999999999999, 1e-5"})
  void twoDegreesHaveAClosedForm(double probability, double tolerance) {
    double wanted = -2 * Math.log1p(-probability);
    double limit = ChiSquareBounds.upperLimit(probability, 2);
    assertWithin("at " + probability, wanted, limit, tolerance, wanted);
  }

  @ParameterizedTest
  @ValueSource(ints = {1, 2, 3, 4, 5, 6})
  void limitsGrowWithTheProbability(int degrees) {
    double before = 0;
    for (double probability : PROBABILITIES) {
      double limit = ChiSquareBounds.upperLimit(probability, degrees);
      assertTrue(limit > before && limit < 1e3, probability + ": " + limit + " after " + before);
      before = limit;
    }
  }

  @ParameterizedTest
  @ValueSource(doubles = {0, 1, Double.NaN, 1e-13, 1 - 1e-13, -0.5, 1.5})
  void probabilitiesBeyondTheEndsAreRefused(double bad) {
    String words = "probability must be in [1.0E-12, 1 - 1.0E-12], got " + bad;
    assertRefused(() -> ChiSquareBounds.upperLimit(bad, 3), words);
    assertRefused(() -> ChiSquareBounds.twoSided(bad, 3), words);
    assertRefused(() -> ChiSquareBounds.ofAverage(bad, 3, 10), words);
    FilterPlan plan = FilterPlan.extended(new PlainWalk(1, 1));
    assertRefused(() -> plan.withGate(bad), words);
  }

  @ParameterizedTest
  @ValueSource(ints = {0, -1})
  void degreesBelowOneAreRefused(int bad) {
    String words = "1 or more, got " + bad;
    assertRefused(() -> ChiSquareBounds.upperLimit(0.5, bad), "degrees of freedom", words);
    assertRefused(() -> ChiSquareBounds.twoSided(0.5, bad), "degrees of freedom", words);
    assertRefused(() -> ChiSquareBounds.ofAverage(0.5, bad, 2), "degrees of freedom", words);
  }

  private static void assertRefused(Executable call, String... words) {
    String message = assertThrows(IllegalArgumentException.class, call).getMessage();
    assertNames(message, words);
  }
}
