package dev.estimation.core.ugly;

import static dev.estimation.testing.Agreement.assertNames;
import static dev.estimation.testing.Agreement.assertSameBits;
import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertThrows;

import dev.estimation.core.gaussian.Moments;
import dev.estimation.core.matching.MatchingStatus;
import dev.estimation.core.ugly.UglyFixture.Way;
import org.ejml.data.DMatrixRMaj;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.EnumSource;
import org.junit.jupiter.params.provider.MethodSource;

/** Functions that misbehave: told apart, and nothing of it is felt in the next call. */
class UglyFunctionTest {
  @ParameterizedTest
  @EnumSource
  void anOutputLeftOut(Way way) {
    UglyFixture fixture = new UglyFixture(way);
    fixture.assertFails(
        MatchingStatus.FUNCTION_NOT_FINITE,
        UglyFixture.good(),
        BadFunctions.LEAVES_OUT,
        "output[1] of 2",
        "not filled",
        "evaluation 1");
    fixture.assertUsable();
  }

  @ParameterizedTest
  @EnumSource
  void anOutputThatIsNaN(Way way) {
    UglyFixture fixture = new UglyFixture(way);
    fixture.assertFails(
        MatchingStatus.FUNCTION_NOT_FINITE,
        UglyFixture.good(),
        BadFunctions.GIVES_NAN,
        "output[1] of 2",
        "finite",
        "NaN");
    fixture.assertUsable();
  }

  @ParameterizedTest
  @EnumSource
  void anOutputThatIsInfinite(Way way) {
    UglyFixture fixture = new UglyFixture(way);
    fixture.assertFails(
        MatchingStatus.FUNCTION_NOT_FINITE,
        UglyFixture.good(),
        BadFunctions.GIVES_INFINITY,
        "output[0] of 2",
        "finite",
        "-Infinity");
    fixture.assertUsable();
  }

  /** The mean is fine and a point is not: the failure comes after sums have begun. */
  @ParameterizedTest
  @MethodSource("dev.estimation.core.ugly.UglyFixture$Way#wide")
  void anOutputThatIsNaNAwayFromTheMean(Way way) {
    UglyFixture fixture = new UglyFixture(way);
    fixture.assertFails(
        MatchingStatus.FUNCTION_NOT_FINITE,
        UglyFixture.good(),
        BadFunctions.BAD_AWAY_FROM_MEAN,
        "output[1] of 2",
        "NaN");
    fixture.assertUsable();
  }

  /** Whoever called for the step sees the exception of the function itself. */
  @ParameterizedTest
  @EnumSource
  void anException(Way way) {
    UglyFixture fixture = new UglyFixture(way);
    Moments input = UglyFixture.good();
    IllegalStateException seen =
        assertThrows(IllegalStateException.class, () -> fixture.carry(input, BadFunctions.THROWS));
    assertNames(seen.getMessage(), "no such anchor: 42");
    assertEquals(UglyFixture.good().toGaussian(), input.toGaussian());
    fixture.assertUsable();
  }

  /** The function breaks its contract; the caller's moments must not be what it writes on. */
  @ParameterizedTest
  @EnumSource
  void aFunctionThatWritesOnItsInput(Way way) {
    UglyFixture fixture = new UglyFixture(way);
    Moments input = UglyFixture.good();
    double[] mean = input.mean().clone();
    DMatrixRMaj covariance = input.covariance().copy();
    assertEquals(
        MatchingStatus.FUNCTION_CHANGED_INPUT, fixture.carry(input, BadFunctions.WRITES_INPUT));
    assertNames(fixture.work.failure(), "input[");
    assertSameBits("mean", mean, input.mean());
    assertSameBits("covariance", covariance, input.covariance());
    fixture.assertUsable();
  }

  /** Outputs of 1e200 are finite, their squares are not. */
  @ParameterizedTest
  @EnumSource(names = "UNSCENTED_NARROW", mode = EnumSource.Mode.EXCLUDE)
  void anOverflow(Way way) {
    UglyFixture fixture = new UglyFixture(way);
    fixture.assertFails(
        MatchingStatus.OUTPUT_NOT_FINITE,
        UglyFixture.good(),
        BadFunctions.OVERFLOWS,
        "not finite",
        "overflow");
    fixture.assertUsable();
  }

  @Test
  void aJacobianThatIsNaN() {
    UglyFixture fixture = new UglyFixture(Way.LINEARISATION);
    fixture.assertFails(
        MatchingStatus.JACOBIAN_NOT_FINITE,
        UglyFixture.good(),
        BadFunctions.BAD_JACOBIAN,
        "Jacobian[1][1]",
        "NaN");
    fixture.assertUsable();
  }

  @Test
  void aHessianThatIsNaN() {
    UglyFixture fixture = new UglyFixture(Way.SECOND_ORDER);
    fixture.assertFails(
        MatchingStatus.JACOBIAN_NOT_FINITE,
        UglyFixture.good(),
        BadFunctions.BAD_HESSIAN,
        "Hessian[1][1][1]",
        "NaN");
    fixture.assertUsable();
  }

  /** A derivative that overflows by differences: the function is finite, the quotient is not. */
  @Test
  void differencesThatAreNotFinite() {
    UglyFixture fixture = new UglyFixture(Way.DIFFERENCES);
    Moments far = UglyFixture.good();
    far.changeMean()[0] = 1e20; // a step of 6e-6 is lost beside it
    fixture.assertFails(
        MatchingStatus.JACOBIAN_NOT_FINITE, far, BadFunctions.GOOD, "Jacobian[0][0]", "NaN");
    fixture.assertUsable();
  }
}
