package dev.estimation.filters.motion;

import static org.junit.jupiter.api.Assertions.assertEquals;

import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.ValueSource;

class TurnSeriesTest {
  /**
   * Against the closed form at t = 3, where nothing cancels, and against 1/k! at 0; to a few roundings.
   */
  @ParameterizedTest
  @ValueSource(ints = {1, 2, 3, 4, 5})
  void isTheClosedForm(int k) {
    double t = 3;
    double[] closed = {
      Math.sin(t) / t,
      (1 - Math.cos(t)) / 9,
      (t - Math.sin(t)) / 27,
      (Math.cos(t) - 1 + 4.5) / 81,
      (Math.sin(t) - t + 4.5) / 243
    };
    assertEquals(closed[k - 1], TurnSeries.sum(k, t * t), 8 * Math.ulp(closed[k - 1]));
    assertEquals(1 / WhiteNoise.factorial(k), TurnSeries.sum(k, 0), 0);
  }

  /** Where the series ends both agree to a few roundings of the numbers below 1 that the recurrence subtracts. */
  @ParameterizedTest
  @ValueSource(ints = {1, 2, 3, 4, 5})
  void hasNoStepWhereTheSeriesEnds(int k) {
    double series = TurnSeries.sum(k, 1);
    assertEquals(series, TurnSeries.sum(k, Math.nextUp(1.0)), 4e-16);
  }
}
