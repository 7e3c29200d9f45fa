package dev.estimation.filters.filter;

import static dev.estimation.testing.Agreement.assertNames;
import static dev.estimation.testing.Agreement.assertWithin;
import static org.junit.jupiter.api.Assertions.assertArrayEquals;
import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertThrows;

import dev.estimation.core.gaussian.Gaussian;
import dev.estimation.core.matching.MomentMatching;
import dev.estimation.filters.testing.Bits;
import dev.estimation.filters.testing.BothForms;
import dev.estimation.filters.testing.Matchings;
import dev.estimation.filters.testing.Models;
import dev.estimation.filters.testing.PlainPosition;
import dev.estimation.filters.testing.PlainWalk;
import java.util.List;
import org.junit.jupiter.api.Named;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.MethodSource;

/** Several rows of one sensor as one update. */
class StackedPortTest extends BothForms {
  private static final double[] PLACES = {0, 0, 0.04, 40, 0, 0.09, 0, 30, 0.01};
  private static final double[] DISTANCES = {22.5, 29.1, 25.2};

  static List<Named<MomentMatching>> matchings() {
    return Matchings.all();
  }

  private static Gaussian prior() {
    return Gaussian.of(new double[] {20, 12}, new double[][] {{9, 2}, {2, 16}});
  }

  /** For a linear sensor, all at once is the same as one after another. */
  @ParameterizedTest
  @MethodSource("matchings")
  void linearRowsMayBeStacked(MomentMatching matching) {
    FilterPlan plan = formed(FilterPlan.of(new PlainWalk(2, 1), matching));
    StackedPort stacked = plan.workspace().port(new PlainPosition(2, 0.5), 3);
    SensorPort single = plan.workspace().port(new PlainPosition(2, 0.5));
    Estimate together = plan.start(0, prior());
    Estimate apart = plan.start(0, prior());
    double sum = 0;
    for (double z : new double[] {21, 19, 20.5}) {
      assertEquals(StepStatus.APPLIED, single.update(apart, new double[] {z}));
      sum += single.logLikelihood();
    }
    double[] all = {21, 19, 20.5};
    assertEquals(StepStatus.APPLIED, stacked.update(together, 3, all, new double[0]));
    // 1e-13: roundings on numbers of order 10 to 20.
    assertWithin("log-likelihood", sum, stacked.last().logLikelihood(), 1e-13, 10);
    for (int i = 0; i < 2; i++) {
      assertWithin("mean", apart.mean(i), together.mean(i), 1e-13, 20);
      assertWithin("variance", apart.covariance(i, i), together.covariance(i, i), 1e-13, 16);
    }
  }

  /** The number of rows varies; spare room behind them is not read. */
  @ParameterizedTest
  @MethodSource("matchings")
  void rowsMayVary(MomentMatching matching) {
    FilterPlan plan = formed(FilterPlan.of(new PlainWalk(2, 1), matching));
    StackedPort port = plan.workspace().port(new Models.Distance(), 3);
    Estimate one = plan.start(0, prior());
    Estimate two = plan.start(0, prior());
    double[] spare = DISTANCES.clone();
    spare[2] = Double.NaN;
    assertEquals(StepStatus.APPLIED, port.update(two, 2, spare, PLACES));
    assertEquals(2, port.last().innovation().length);
    double[] exact = {DISTANCES[0], DISTANCES[1]};
    StackedPort fresh = plan.workspace().port(new Models.Distance(), 2);
    assertEquals(StepStatus.APPLIED, fresh.update(one, 2, exact, PLACES));
    assertArrayEquals(Bits.of(one, 2), Bits.of(two, 2));
    assertEquals(StepStatus.APPLIED, port.update(two, 3, DISTANCES, PLACES));
    assertEquals(StepStatus.APPLIED, port.update(two, 1, DISTANCES, PLACES));
  }

  /** One row stacked is a plain update, bit for bit; the noise is the given one. */
  @ParameterizedTest
  @MethodSource("matchings")
  void oneRowIsAPlainUpdate(MomentMatching matching) {
    FilterPlan plan = formed(FilterPlan.of(new PlainWalk(2, 1), matching));
    Estimate stacked = plan.start(0, prior());
    Estimate plain = plan.start(0, prior());
    double[] place = {40, 0, 0.09};
    double[] distance = {29.1};
    StackedPort many = plan.workspace().port(new Models.Distance(), 5);
    assertEquals(StepStatus.APPLIED, many.update(stacked, 1, distance, place));
    SensorPort one = plan.workspace().port(new Models.Distance());
    assertEquals(StepStatus.APPLIED, one.update(plain, distance, place));
    assertArrayEquals(Bits.of(plain, 2), Bits.of(stacked, 2));
  }

  @Test
  void badRowsAreToldApart() {
    FilterPlan plan = formed(FilterPlan.cubature(new PlainWalk(2, 1)));
    StackedPort port = plan.workspace().port(new Models.Distance(), 3);
    Estimate estimate = plan.start(0, prior());
    long[] before = Bits.of(estimate, 2);
    assertRefused("from 1 to the maximum of 3, got 4", port, estimate, 4, new double[4]);
    assertRefused("from 1 to the maximum of 3, got 0", port, estimate, 0, new double[4]);
    assertRefused("hold 3 numbers or more, got 2", port, estimate, 3, new double[2]);
    double[] places = PLACES.clone();
    places[4] = Double.NaN;
    assertEquals(StepStatus.INPUT_NOT_FINITE, port.update(estimate, 3, DISTANCES, places));
    assertNames(
        port.last().failure(), "given[4] must be finite, got NaN", "Distance, 3 stacked rows");
    places = PLACES.clone();
    places[5] = -1;
    assertEquals(StepStatus.NOISE_NOT_VALID, port.update(estimate, 3, DISTANCES, places));
    assertNames(port.last().failure(), "measurementNoise[1][1] must be finite and > 0, got -1.0");
    assertArrayEquals(before, Bits.of(estimate, 2));
    assertEquals(StepStatus.APPLIED, port.update(estimate, 3, DISTANCES, PLACES));
  }

  private static void assertRefused(
      String words, StackedPort port, Estimate estimate, int rows, double[] measurements) {
    String message = assertThrows(
            IllegalArgumentException.class, () -> port.update(estimate, rows, measurements, PLACES))
        .getMessage();
    assertNames(message, words, "Distance");
  }
}
