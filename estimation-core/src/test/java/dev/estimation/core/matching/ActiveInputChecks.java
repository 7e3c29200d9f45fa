package dev.estimation.core.matching;

import static dev.estimation.testing.Agreement.assertMatrix;
import static dev.estimation.testing.Agreement.assertVector;
import static org.junit.jupiter.api.Assertions.assertTrue;

import dev.estimation.core.function.VectorFunction;
import dev.estimation.core.gaussian.Gaussian;
import dev.estimation.core.gaussian.Moments;
import dev.estimation.core.space.Space;
import dev.estimation.testing.BentFunction;
import dev.estimation.testing.EmbeddedFunction;
import dev.estimation.testing.RandomGaussians;
import java.util.Arrays;
import org.ejml.data.DMatrixRMaj;
import org.ejml.dense.row.CommonOps_DDRM;
import org.junit.jupiter.api.Test;

/**
 * A function that reads k of n inputs is a problem of k inputs, and a regression for the others.
 */
interface ActiveInputChecks extends MatchingUnderTest {
  int WHOLE = 7;

  private Outcome whole(Gaussian value, BentFunction bent, int... places) {
    VectorFunction function = offeredEmbedded(bent, places);
    MatchingWorkspace work = formed(MatchingUnderTest.unitScales(WHOLE))
        .workspace(Space.reals(WHOLE), Space.reals(3), function);
    return Outcome.of(work, RandomGaussians.momentsOf(value), new double[1], noise());
  }

  private VectorFunction offeredEmbedded(BentFunction bent, int... places) {
    return new EmbeddedFunction(offered(bent), 3, WHOLE, places);
  }

  private Outcome part(Gaussian value, BentFunction bent, int... places) {
    MatchingWorkspace work = formed(MatchingUnderTest.unitScales(places.length))
        .workspace(Space.reals(places.length), Space.reals(3), offered(bent));
    return Outcome.of(
        work, RandomGaussians.momentsOf(marginal(value, places)), new double[1], noise());
  }

  /** So that negative weights do not win, which square-root form would refuse. */
  private static DMatrixRMaj noise() {
    return CommonOps_DDRM.identity(3);
  }

  /** The factor is found another way, so equal up to rounding of numbers of size 1 to 10. */
  private void assertEqual(int carried, Outcome wanted, Outcome got) {
    double rounding = bentCovarianceRounding(carried, 10, wanted.smallestDeviation());
    assertVector("mean", wanted.mean, got.mean, rounding, 10);
    assertMatrix("covariance", wanted.covariance, got.covariance, rounding, 10);
    assertMatrix("unit cross-covariance", wanted.unitCross, got.unitCross, rounding, 10);
  }

  private static Gaussian marginal(Gaussian value, int... places) {
    double[] mean = Arrays.stream(places).mapToDouble(value::mean).toArray();
    double[][] covariance = new double[places.length][places.length];
    for (int i = 0; i < places.length; i++) {
      for (int j = 0; j < places.length; j++) {
        covariance[i][j] = value.covariance(places[i], places[j]);
      }
    }
    return Gaussian.of(mean, covariance);
  }

  @Test
  default void inputsReadInAnyOrderGiveTheSmallerProblem() {
    for (int k = 1; k <= 4; k++) {
      for (int seed = 0; seed < 5; seed++) {
        RandomGaussians random = new RandomGaussians(100L * k + seed);
        Gaussian value = random.gaussian(WHOLE);
        int[] places = Arrays.copyOf(random.permutation(WHOLE), k);
        BentFunction bent = new BentFunction(k, 3, seed);
        Outcome wanted = part(value, bent, places);
        Outcome got = whole(value, bent, places);
        assertEqual(k, wanted, got);
      }
    }
  }

  /**
   * P_uz = P_ua P_aa^-1 P_az, here by solving. Tolerance: condition numbers to a few hundred times
   * the rounding of a solution, 1e3 x 64 eps, on entries of size 1 to 10.
   */
  @Test
  default void crossCovarianceOfUnreadInputsIsTheRegression() {
    for (int seed = 0; seed < 10; seed++) {
      RandomGaussians random = new RandomGaussians(900 + seed);
      Gaussian value = random.gaussian(WHOLE);
      int[] places = Arrays.copyOf(random.permutation(WHOLE), 3);
      BentFunction bent = new BentFunction(3, 3, seed);
      DMatrixRMaj read = part(value, bent, places).cross();
      DMatrixRMaj solved = new DMatrixRMaj(3, 3);
      assertTrue(CommonOps_DDRM.solve(marginal(value, places).covariance(), read, solved));
      DMatrixRMaj wanted = new DMatrixRMaj(WHOLE, 3);
      CommonOps_DDRM.mult(columns(value, places), solved, wanted);
      DMatrixRMaj got = whole(value, bent, places).cross();
      assertMatrix("cross-covariance", wanted, got, 1e3 * ROUNDINGS, 10);
    }
  }

  private static DMatrixRMaj columns(Gaussian value, int... places) {
    DMatrixRMaj columns = new DMatrixRMaj(value.dimension(), places.length);
    for (int i = 0; i < value.dimension(); i++) {
      for (int j = 0; j < places.length; j++) {
        columns.set(i, j, value.covariance(i, places[j]));
      }
    }
    return columns;
  }

  /** Common practice: what a sensor does not read cannot change its prediction. */
  @Test
  default void unreadComponentsMayBeAnything() {
    Gaussian value = new RandomGaussians(4).gaussian(WHOLE);
    BentFunction bent = new BentFunction(2, 3, 4);
    Outcome wanted = whole(value, bent, 5, 2);
    double[] mean = value.mean();
    DMatrixRMaj covariance = value.covariance();
    for (int i : new int[] {0, 1, 3, 4, 6}) {
      mean[i] = i % 2 == 0 ? 1e300 : -1e-300;
      for (int j = 0; j < WHOLE; j++) {
        covariance.set(i, j, 0);
        covariance.set(j, i, 0);
      }
      covariance.set(i, i, Math.pow(10, 40 * (i - 3)));
    }
    Outcome got = whole(Gaussian.of(mean, covariance), bent, 5, 2);
    assertEqual(2, wanted, got);
  }

  /** A read component of zero variance beside unread ones: no regression on it. */
  @Test
  default void readComponentsOfZeroVarianceCarryNothing() {
    Gaussian value = ZeroVarianceChecks.frozen(new RandomGaussians(3).gaussian(WHOLE), 0b100000);
    BentFunction bent = new BentFunction(2, 3, 4);
    Outcome got = whole(value, bent, 5, 2);
    Outcome wanted = part(value, bent, 5, 2);
    assertEqual(2, wanted, got);
    Moments input = RandomGaussians.momentsOf(value);
    DMatrixRMaj factor = got.factor;
    for (int i = 0; i < input.mean().length; i++) {
      assertTrue(factor.get(i, 0) == 0, "column of the component of zero variance");
    }
  }
}
