package dev.estimation.core.matching;

import static dev.estimation.testing.Agreement.assertCovariance;
import static dev.estimation.testing.Agreement.assertMatrix;
import static dev.estimation.testing.Agreement.assertVector;

import dev.estimation.core.function.VectorFunction;
import dev.estimation.core.gaussian.Moments;
import dev.estimation.core.space.Space;
import dev.estimation.testing.BentFunction;
import dev.estimation.testing.RandomGaussians;
import org.junit.jupiter.api.Test;

/** Rules that algebra says are the same. */
class RuleIdentitiesTest {
  private static Outcome carry(String name, Moments input, VectorFunction function) {
    int n = input.mean().length;
    return Outcome.of(
        NamedMatchings.of(name).workspace(Space.reals(n), Space.reals(2), function), input);
  }

  /**
   * alpha = 1, beta = 0, kappa = 0 has the points and weights of third-degree cubature: same bits.
   */
  @Test
  void unscentedWithoutParametersIsCubature() {
    for (int n = 1; n <= 10; n++) {
      Moments input = new RandomGaussians(n).moments(n);
      BentFunction bent = new BentFunction(n, 2, n);
      Outcome.assertSame(carry("cubature 3", input, bent), carry("unscented 1 0 0", input, bent));
    }
  }

  /**
   * If z bends in the first input alone and is affine in the others, kappa = 3 - n equals three
   * nodes an axis: both integrate the first input alike and carry the rest exactly
   * (lower-triangular factor). Tolerance: rounding of sums of numbers to 10, and a centre weight to
   * -2/3.
   */
  @Test
  void kappaThreeMinusDimensionIsThreeNodesWhereOneInputBends() {
    for (int n = 1; n <= 5; n++) {
      Moments input = new RandomGaussians(50 + n).moments(n);
      VectorFunction function = (u, given, z) -> {
        double rest = 0;
        for (int j = 1; j < u.length; j++) {
          rest += j * u[j];
        }
        z[0] = Math.sin(u[0]) + rest / 4;
        z[1] = Math.exp(u[0] / 4) - rest / 2;
      };
      Outcome unscented = carry("unscented 1 0 3-n", input, function);
      Outcome product = carry("Gauss-Hermite 3", input, function);
      assertVector("mean", product.mean, unscented.mean, 1e-13, 1);
      assertCovariance("covariance", product.covariance, unscented.covariance, 1e-12);
      assertMatrix("cross-covariance", product.cross(), unscented.cross(), 1e-12, 1);
    }
  }
}
