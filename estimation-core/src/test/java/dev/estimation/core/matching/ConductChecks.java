package dev.estimation.core.matching;

import static dev.estimation.testing.Agreement.assertSameBits;
import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertNotEquals;

import dev.estimation.core.gaussian.Moments;
import dev.estimation.core.space.Space;
import dev.estimation.testing.BentFunction;
import dev.estimation.testing.EmbeddedFunction;
import dev.estimation.testing.RandomGaussians;
import org.ejml.data.DMatrixRMaj;
import org.junit.jupiter.api.Test;

/** What a call costs, what it leaves alone, and that nothing of one call is felt in the next. */
interface ConductChecks extends MatchingUnderTest {
  private MatchingWorkspace work(int n) {
    return formed(MatchingUnderTest.unitScales(n))
        .workspace(Space.reals(n), Space.reals(2), offered(new BentFunction(n, 2, 41)));
  }

  @Test
  default void evaluationsAndJacobiansAreCounted() {
    for (int n = 1; n <= largestDimension(); n++) {
      MatchingWorkspace work = work(n);
      for (int call = 0; call < 2; call++) {
        Outcome.of(work, new RandomGaussians(n).moments(n));
        assertEquals(evaluations(n), work.evaluations(), "evaluations for n = " + n);
        assertEquals(jacobians(n), work.jacobians(), "Jacobians for n = " + n);
      }
    }
  }

  @Test
  default void evaluationsFollowTheInputsCarried() {
    EmbeddedFunction function =
        new EmbeddedFunction(offered(new BentFunction(2, 2, 1)), 2, 4, 3, 0);
    MatchingWorkspace work =
        formed(MatchingUnderTest.unitScales(4)).workspace(Space.reals(4), Space.reals(2), function);
    Outcome outcome = Outcome.of(work, new RandomGaussians(4).moments(4));
    assertEquals(evaluations(carried(2, 4)), work.evaluations());
    assertEquals(carried(2, 4), outcome.unitCross.numRows);
    assertEquals(carried(2, 4), outcome.factor.numCols);
    assertEquals(4, outcome.factor.numRows);
  }

  @Test
  default void whatIsReadIsNotChanged() {
    RandomGaussians random = new RandomGaussians(2);
    Moments input = random.moments(3);
    double[] given = {0.5, -0.0};
    DMatrixRMaj noise = random.covariance(2);
    double[] meanBefore = input.mean().clone();
    DMatrixRMaj covarianceBefore = input.covariance().copy();
    double[] givenBefore = given.clone();
    DMatrixRMaj noiseBefore = noise.copy();
    Outcome.of(work(3), input, given, noise);
    assertSameBits("mean", meanBefore, input.mean());
    assertSameBits("covariance", covarianceBefore, input.covariance());
    assertSameBits("given", givenBefore, given);
    assertSameBits("noise", noiseBefore, noise);
  }

  @Test
  default void repetitionGivesTheSameBits() {
    Moments input = new RandomGaussians(3).moments(3);
    MatchingWorkspace work = work(3);
    Outcome first = Outcome.of(work, input);
    Outcome.of(work, new RandomGaussians(99).moments(3));
    Outcome.assertSame(first, Outcome.of(work, input));
    Outcome.assertSame(first, Outcome.of(work(3), new RandomGaussians(3).moments(3)));
  }

  @Test
  default void failedCallsLeaveNothingBehind() {
    Moments good = new RandomGaussians(3).moments(3);
    MatchingWorkspace work = work(3);
    Outcome first = Outcome.of(work, good);
    Moments notFinite = new RandomGaussians(4).moments(3);
    notFinite.changeMean()[1] = Double.NaN;
    Moments indefinite = new RandomGaussians(5).moments(3);
    indefinite.changeCovariance().set(2, 2, -1);
    assertFailure(MatchingStatus.INPUT_NOT_FINITE, work, notFinite, 0);
    Outcome.assertSame(first, Outcome.of(work, good));
    assertFailure(MatchingStatus.INPUT_NOT_DEFINITE, work, indefinite, 0);
    Outcome.assertSame(first, Outcome.of(work, good));
    assertFailure(MatchingStatus.FUNCTION_NOT_FINITE, work, good, Double.NaN);
    Outcome.assertSame(first, Outcome.of(work, good));
  }

  private static void assertFailure(
      MatchingStatus wanted, MatchingWorkspace work, Moments input, double given) {
    assertEquals(wanted, work.carry(input, new double[] {given}, null));
    assertNotEquals("", work.failure());
  }

  @Test
  default void theCovarianceOfTheOutputIsSymmetric() {
    RandomGaussians random = new RandomGaussians(7);
    Outcome outcome = Outcome.of(work(3), random.moments(3), new double[1], random.covariance(2));
    assertEquals(outcome.covariance.get(0, 1), outcome.covariance.get(1, 0));
  }
}
