package dev.estimation.benchmarks.page;

import static org.junit.jupiter.api.Assertions.assertEquals;

import dev.estimation.filters.filter.StepStatus;
import org.junit.jupiter.api.Test;

class VerdictTest {
  private final Bounds bounds = new Bounds();

  /** Chi-square, 3 degrees of freedom: 2.5 % below 0.2158, 2.5 % above 9.348 (any table). */
  @Test
  void squaresAreHeldAgainstTheirBounds() {
    assertEquals(Verdict.BELOW, bounds.judge(0.215, 3));
    assertEquals(Verdict.INSIDE, bounds.judge(0.217, 3));
    assertEquals(Verdict.INSIDE, bounds.judge(9.34, 3));
    assertEquals(Verdict.ABOVE, bounds.judge(9.36, 3));
    assertEquals(Verdict.UNKNOWN, bounds.judge(Double.NaN, 3));
  }

  @Test
  void rowsThatWereNotUsedAreToldApart() {
    assertEquals(Verdict.ABOVE, Verdict.of(StepStatus.APPLIED, Verdict.ABOVE));
    assertEquals(Verdict.BELOW, Verdict.of(StepStatus.APPLIED_BELOW_TOLERANCE, Verdict.BELOW));
    assertEquals(Verdict.GATED, Verdict.of(StepStatus.GATED, Verdict.ABOVE));
    assertEquals(Verdict.SKIPPED, Verdict.of(StepStatus.NOT_CONVERGED, Verdict.INSIDE));
    assertEquals(Verdict.UNKNOWN, Verdict.of(StepStatus.NOT_DEFINITE, Verdict.INSIDE));
  }
}
