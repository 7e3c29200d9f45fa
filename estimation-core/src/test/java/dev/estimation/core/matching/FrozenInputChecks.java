package dev.estimation.core.matching;

import static dev.estimation.testing.Agreement.assertCovariance;
import static dev.estimation.testing.Agreement.assertVector;

import dev.estimation.core.function.Structure;
import dev.estimation.core.function.VectorFunction;
import dev.estimation.core.gaussian.Gaussian;
import dev.estimation.core.space.Space;
import dev.estimation.testing.BentFunction;
import dev.estimation.testing.PlainFunction;
import dev.estimation.testing.RandomGaussians;
import org.junit.jupiter.api.Test;

/**
 * Components of zero variance equal a problem in which they are constants. True of bent functions
 * only where the spread does not grow with the dimension: derivatives, kappa = 3 - n, products.
 */
interface FrozenInputChecks extends MatchingUnderTest {
  @Test
  default void componentsOfZeroVarianceAreConstants() {
    RandomGaussians random = new RandomGaussians(8);
    Gaussian whole = ZeroVarianceChecks.frozen(random.gaussian(4), 0b0101);
    Gaussian part = Gaussian.of(new double[] {whole.mean(1), whole.mean(3)}, new double[][] {
      {whole.covariance(1, 1), whole.covariance(1, 3)},
      {whole.covariance(3, 1), whole.covariance(3, 3)},
    });
    BentFunction bent = new BentFunction(4, 3, 9);
    VectorFunction fixed = offered(withConstants(bent, whole.mean()));
    Outcome wanted = carry(part, fixed);
    Outcome got = carry(whole, offered(bent));
    // Means and outputs of size 1 to 3; more terms, some of them zero.
    assertVector("mean", wanted.mean, got.mean, meanRounding(4, 3), 1);
    double rounding = bentCovarianceRounding(4, 3, wanted.smallestDeviation());
    assertCovariance("covariance", wanted.covariance, got.covariance, rounding);
  }

  private Outcome carry(Gaussian input, VectorFunction function) {
    int n = input.dimension();
    MatchingWorkspace work =
        formed(MatchingUnderTest.unitScales(n)).workspace(Space.reals(n), Space.reals(3), function);
    return Outcome.of(work, RandomGaussians.momentsOf(input));
  }

  /** The function of components 1 and 3, with the others at the given values. */
  private static VectorFunction withConstants(BentFunction bent, double[] values) {
    PlainFunction plain =
        new PlainFunction((u, given, z) -> bent.evaluate(filled(values, u), given, z));
    Structure structure = Structure.UNKNOWN.withJacobian((u, given, jacobian) -> {
      double[] all = new double[12];
      bent.structure().jacobian().orElseThrow().evaluate(filled(values, u), given, all);
      for (int r = 0; r < 3; r++) {
        jacobian[2 * r] = all[4 * r + 1];
        jacobian[2 * r + 1] = all[4 * r + 3];
      }
    });
    Structure twice = structure.withHessian((u, given, hessians) -> {
      double[] all = new double[48];
      bent.structure().hessian().orElseThrow().evaluate(filled(values, u), given, all);
      for (int r = 0; r < 3; r++) {
        hessians[4 * r] = all[16 * r + 5];
        hessians[4 * r + 2] = all[16 * r + 13];
        hessians[4 * r + 3] = all[16 * r + 15];
      }
    });
    return new VectorFunction() {
      @Override
      public void evaluate(double[] input, double[] given, double[] output) {
        plain.evaluate(input, given, output);
      }

      @Override
      public Structure structure() {
        return twice;
      }
    };
  }

  private static double[] filled(double[] values, double[] u) {
    return new double[] {values[0], u[0], values[2], u[1]};
  }
}
