package dev.estimation.core.matching;

import static dev.estimation.testing.Agreement.assertCovariance;
import static dev.estimation.testing.Agreement.assertMatrix;
import static dev.estimation.testing.Agreement.assertVector;
import static org.junit.jupiter.api.Assertions.assertEquals;

import dev.estimation.core.gaussian.Moments;
import dev.estimation.core.space.Space;
import dev.estimation.testing.AffineFunction;
import dev.estimation.testing.EmbeddedFunction;
import dev.estimation.testing.RandomGaussians;
import org.junit.jupiter.api.Test;

/** A matching over the whole input, of functions that read a part of it. */
interface WholeInputChecks extends MatchingUnderTest {
  /** The same matching over the inputs that are read. */
  MomentMatching overActiveInputs();

  /** Both are exact for affine functions; rounding of numbers of size 1 to 10. */
  @Test
  default void affineMapsAgreeWithThoseOverActiveInputs() {
    RandomGaussians random = new RandomGaussians(12);
    Moments input = random.moments(5);
    AffineFunction affine = new AffineFunction(random.matrix(2, 2), random.vector(2));
    EmbeddedFunction function = new EmbeddedFunction(offered(affine), 2, 5, 3, 1);
    Outcome part = carry(overActiveInputs(), input, function, 2);
    Outcome whole = carry(formed(MatchingUnderTest.unitScales(5)), input, function, 5);
    assertVector("mean", part.mean, whole.mean, meanRounding(5, 10), 1);
    double rounding = covarianceRounding(5, 10, part.smallestDeviation());
    assertCovariance("covariance", part.covariance, whole.covariance, rounding);
    assertMatrix("cross-covariance", part.cross(), whole.cross(), 10 * rounding, 10);
  }

  private Outcome carry(
      MomentMatching matching, Moments input, EmbeddedFunction function, int carried) {
    MatchingWorkspace work = matching.workspace(Space.reals(5), Space.reals(2), function);
    Outcome outcome = Outcome.of(work, input);
    assertEquals(evaluations(carried), work.evaluations());
    assertEquals(carried, outcome.factor.numCols);
    return outcome;
  }
}
