package dev.estimation.core.matching;

import static dev.estimation.testing.Agreement.assertCovariance;
import static dev.estimation.testing.Agreement.assertMatrix;
import static dev.estimation.testing.Agreement.assertVector;
import static dev.estimation.testing.Agreement.assertWithin;
import static org.junit.jupiter.api.Assertions.assertTrue;

import dev.estimation.core.function.Structure;
import dev.estimation.core.function.VectorFunction;
import dev.estimation.core.gaussian.Gaussian;
import dev.estimation.core.gaussian.Moments;
import dev.estimation.core.space.Angle;
import dev.estimation.core.space.FlatSpace;
import dev.estimation.core.space.Space;
import dev.estimation.testing.BentFunction;
import dev.estimation.testing.PlainFunction;
import dev.estimation.testing.PolarToCartesian;
import dev.estimation.testing.RandomGaussians;
import org.junit.jupiter.api.Test;

/** Angles at the seam give what they give away from it, turned. */
interface AngleChecks extends MatchingUnderTest {
  /** Numbers of size 1 to 4. */
  double MAGNITUDE = 4;

  /** A Gaussian of three inputs whose image stays well within half a turn. */
  private static Moments narrow(long seed) {
    RandomGaussians random = new RandomGaussians(seed);
    Gaussian wide = random.gaussian(3);
    double[] mean = wide.mean();
    double[][] covariance = new double[3][3];
    for (int i = 0; i < 3; i++) {
      mean[i] *= 0.3;
      for (int j = 0; j < 3; j++) {
        covariance[i][j] = 0.04 * wide.covariance(i, j);
      }
    }
    return RandomGaussians.momentsOf(Gaussian.of(mean, covariance));
  }

  @Test
  default void anglesOfTheOutputMayCrossTheSeam() {
    for (double turn : new double[] {3.1, -3.1, Math.PI, -Math.PI, 2.8, 0.3}) {
      Moments input = narrow(21);
      BentFunction bent = new BentFunction(3, 2, 22);
      double[] scales = MatchingUnderTest.unitScales(3);
      MatchingWorkspace straight =
          formed(scales).workspace(Space.reals(3), Space.reals(2), offered(bent));
      MatchingWorkspace turned = formed(scales)
          .workspace(Space.reals(3), Space.angles(2), offered(new TurnedFunction(bent, turn)));
      compare(Outcome.of(straight, input), Outcome.of(turned, input), turn);
    }
  }

  private void compare(Outcome wanted, Outcome got, double turn) {
    for (int i = 0; i < wanted.mean.length; i++) {
      double apart = Angle.wrap(got.mean[i] - wanted.mean[i] - turn);
      assertWithin("mean[" + i + "]", 0, apart, meanRounding(3, MAGNITUDE), 1);
      assertInRange(got.mean[i]);
    }
    double rounding = bentCovarianceRounding(3, MAGNITUDE, wanted.smallestDeviation());
    assertCovariance("covariance", wanted.covariance, got.covariance, rounding);
    assertMatrix("cross-covariance", wanted.cross(), got.cross(), rounding, 1);
  }

  private static void assertInRange(double angle) {
    assertTrue(angle >= -Math.PI && angle < Math.PI, () -> angle + " must be in [-pi, pi)");
  }

  /** Points handed to the function are in range, and the result is that of a plain number. */
  @Test
  default void anglesOfTheInputMayCrossTheSeam() {
    for (double angle : new double[] {Math.PI - 0.05, -Math.PI, -Math.PI + 0.1}) {
      Gaussian polar = Gaussian.independent(new double[] {2, angle}, new double[] {0.1, 0.2});
      PolarToCartesian function = new PolarToCartesian();
      FlatSpace seam = Space.reals(1).and(Space.angles(1));
      double[] scales = {1, 1};
      Outcome wanted = Outcome.of(
          formed(scales).workspace(Space.reals(2), Space.reals(2), offered(function)),
          RandomGaussians.momentsOf(polar));
      Moments input = new Moments(seam);
      input.set(polar);
      Outcome got =
          Outcome.of(formed(scales).workspace(seam, Space.reals(2), offered(function)), input);
      assertVector("mean", wanted.mean, got.mean, meanRounding(2, MAGNITUDE), 1);
      double rounding = bentCovarianceRounding(2, MAGNITUDE, wanted.smallestDeviation());
      assertCovariance("covariance", wanted.covariance, got.covariance, rounding);
    }
  }

  @Test
  default void theFunctionSeesAnglesInRange() {
    FlatSpace seam = Space.reals(1).and(Space.angles(1));
    PolarToCartesian polar = new PolarToCartesian();
    MomentMatching matching = formed(1, 1);
    Moments input = new Moments(seam);
    input.set(Gaussian.independent(new double[] {2, Math.PI - 0.01}, new double[] {0.1, 0.5}));
    PlainFunction watched = new PlainFunction((u, given, z) -> {
      assertInRange(u[1]);
      polar.evaluate(u, given, z);
    });
    Outcome.of(matching.workspace(seam, Space.reals(2), watchedWithJacobian(watched)), input);
  }

  private static VectorFunction watchedWithJacobian(PlainFunction watched) {
    return new VectorFunction() {
      @Override
      public void evaluate(double[] input, double[] given, double[] output) {
        watched.evaluate(input, given, output);
      }

      @Override
      public Structure structure() {
        return new PolarToCartesian().structure();
      }
    };
  }

  /** A function may return unwrapped angles; nothing moves, so only the wrapping is seen. */
  @Test
  default void theMeanOfAnAngleIsInRange() {
    for (double raw : new double[] {Math.PI, -Math.PI, 7, -7, 100, Math.nextDown(Math.PI)}) {
      MatchingWorkspace work =
          formed(1).workspace(Space.reals(1), Space.angles(1), offered(new TurnedBy(raw)));
      Outcome outcome = Outcome.of(work, new Moments(Space.reals(1)));
      assertInRange(outcome.mean[0]);
      // 100 rad is 16 turns, each rounded by 2.4e-16.
      assertWithin("angle", 0, Angle.wrap(outcome.mean[0] - Angle.wrap(raw)), 1e-14, 1);
    }
  }

  /** An angle that is the input plus a constant, not wrapped. */
  final class TurnedBy implements VectorFunction {
    private final double turn;

    TurnedBy(double turn) {
      this.turn = turn;
    }

    @Override
    public void evaluate(double[] input, double[] given, double[] output) {
      output[0] = input[0] + turn;
    }

    @Override
    public Structure structure() {
      return Structure.UNKNOWN
          .withJacobian((u, given, j) -> j[0] = 1)
          .withHessian((u, given, h) -> {});
    }
  }
}
