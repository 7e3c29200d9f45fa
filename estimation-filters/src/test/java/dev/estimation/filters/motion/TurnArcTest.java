package dev.estimation.filters.motion;

import static org.junit.jupiter.api.Assertions.assertEquals;

import org.junit.jupiter.api.Test;

class TurnArcTest {
  /** The power series of (sin(u)/u)' summed in exact fractions to u^21, at u = 9/1000. */
  @Test
  void arcDerivativeIsExactOnANearlyStraightCourse() {
    assertEquals(
        -0.002999975700070296, TurnArc.alongDerivative(0.009), 2e-18); // a few roundings of 3e-3
  }

  /** Series and closed form meet, within their first neglected term and cancellation. */
  @Test
  void arcDerivativeHasNoStepWhereTheSeriesEnds() {
    double below = Math.nextDown(1e-2);
    assertEquals(TurnArc.alongDerivative(below), TurnArc.alongDerivative(1e-2), 3e-14);
  }
}
