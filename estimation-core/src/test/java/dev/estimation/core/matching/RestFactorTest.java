package dev.estimation.core.matching;

import static dev.estimation.testing.Agreement.assertCovariance;
import static dev.estimation.testing.Agreement.assertSameBits;
import static dev.estimation.testing.Agreement.assertWithin;
import static org.junit.jupiter.api.Assertions.assertArrayEquals;
import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertTrue;

import dev.estimation.core.function.VectorFunction;
import dev.estimation.core.gaussian.Gaussian;
import dev.estimation.core.gaussian.Moments;
import dev.estimation.core.space.Space;
import dev.estimation.testing.AffineFunction;
import dev.estimation.testing.BentFunction;
import dev.estimation.testing.EmbeddedFunction;
import dev.estimation.testing.RandomGaussians;
import java.util.Arrays;
import java.util.List;
import org.ejml.data.DMatrixRMaj;
import org.ejml.dense.row.CommonOps_DDRM;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.MethodSource;
import org.junit.jupiter.params.provider.ValueSource;

/** What a sum of squares needs of a matching: the rest of the input, and what stays unexplained. */
class RestFactorTest {
  private static final int WHOLE = 6;
  private static final int OUTPUTS = 3;

  static List<String> matchings() {
    return List.of(
        "linearisation",
        "spread 1",
        "linearisation 2",
        "spread 2",
        "spread axes",
        "unscented 1 2 0",
        "unscented 0.5 2 1",
        "unscented 1 0 3-n",
        "cubature",
        "Gauss-Hermite 3");
  }

  static List<String> bentMatchings() {
    return matchings().subList(2, 10);
  }

  private static MatchingWorkspace bent(String name, Moments input, DMatrixRMaj noise, int... at) {
    VectorFunction function =
        new EmbeddedFunction(new BentFunction(at.length, OUTPUTS, 7), OUTPUTS, WHOLE, at);
    MatchingWorkspace work =
        NamedMatchings.of(name).workspace(Space.reals(WHOLE), Space.reals(OUTPUTS), function);
    assertEquals(
        MatchingStatus.MATCHED, work.carry(input, new double[1], RandomGaussians.noise(noise)));
    return work;
  }

  /** 1e-13: six pivots, condition numbers of a few hundred. */
  @ParameterizedTest
  @MethodSource("matchings")
  void theInputIsTheTwoSquares(String name) {
    for (int seed = 0; seed < 20; seed++) {
      RandomGaussians random = new RandomGaussians(seed);
      Moments input = random.moments(WHOLE);
      int[] at = Arrays.copyOf(random.permutation(WHOLE), 1 + seed % 5);
      MatchingWorkspace work = bent(name, input, null, at);
      DMatrixRMaj sum = square(work.inputFactor());
      assertCovariance("L L'", input.covariance(), sum, 1e-13);
      assertActiveRowsAreZero(work, at);
    }
  }

  private static void assertActiveRowsAreZero(MatchingWorkspace work, int... at) {
    assertEquals(at.length, work.activeInputs());
    for (int row : at) {
      for (int column = at.length; column < WHOLE; column++) {
        assertEquals(0.0, work.inputFactor().get(row, column), "active input " + row);
      }
    }
  }

  /** With its rows in the order of the inputs the factor is lower triangular. */
  @ParameterizedTest
  @MethodSource("matchings")
  void lowerInTheOrderOfTheInputs(String name) {
    Moments input = new RandomGaussians(1).moments(WHOLE);
    int[] places = {4, 0, 2};
    MatchingWorkspace work = bent(name, input, null, places);
    assertArrayEquals(new int[] {4, 0, 2, 1, 3, 5}, work.inputOrder());
    for (int q = 0; q < WHOLE; q++) {
      for (int column = q + 1; column < WHOLE; column++) {
        assertEquals(0.0, work.inputFactor().get(work.inputOrder()[q], column));
      }
    }
  }

  /** 1e-12: entries of order 10, the sums of up to 729 points, W'W formed and subtracted. */
  @ParameterizedTest
  @MethodSource("matchings")
  void unexplainedIsTheTotalWithoutTheExplained(String name) {
    for (int seed = 0; seed < 20; seed++) {
      RandomGaussians random = new RandomGaussians(50 + seed);
      Moments input = random.moments(WHOLE);
      DMatrixRMaj noise = random.covariance(OUTPUTS);
      int[] at = Arrays.copyOf(random.permutation(WHOLE), 1 + seed % WHOLE);
      MatchingWorkspace work = bent(name, input, noise, at);
      DMatrixRMaj wanted = work.output().covariance().copy();
      DMatrixRMaj w = work.unitCrossCovariance();
      CommonOps_DDRM.multAddTransA(-1, w, w, wanted);
      DMatrixRMaj got = work.unexplained().matrix();
      for (int i = 0; i < OUTPUTS * OUTPUTS; i++) {
        assertWithin(name + ", seed " + seed, wanted.data[i], got.data[i], 1e-12, 10);
      }
    }
  }

  @ParameterizedTest
  @MethodSource("bentMatchings")
  void bendsAreUnexplained(String name) {
    MatchingWorkspace work = bent(name, new RandomGaussians(2).moments(WHOLE), null, 1, 4);
    DMatrixRMaj got = work.unexplained().matrix();
    assertTrue(Math.abs(CommonOps_DDRM.trace(got)) > 1e-3, "no noise, yet not nothing");
  }

  @ParameterizedTest
  @ValueSource(strings = {"linearisation", "spread 1"})
  void linearisationLeavesTheNoiseItself(String name) {
    RandomGaussians random = new RandomGaussians(3);
    DMatrixRMaj noise = random.covariance(OUTPUTS);
    MatchingWorkspace work = bent(name, random.moments(WHOLE), noise, 3, 1);
    DMatrixRMaj got = work.unexplained().matrix();
    assertSameBits("noise", noise, got);
  }

  /**
   * Of 1e10 and 1e-8 a subtraction would leave nothing. Residuals of 1e5 are rounded to 1e-10,
   * their squares to 1e-20, and noise of 1e-8 is right to far below the 1e-6 that are asked.
   */
  @ParameterizedTest
  @MethodSource("matchings")
  void smallNoiseSurvivesALargePrior(String name) {
    for (int seed = 0; seed < 20; seed++) {
      RandomGaussians random = new RandomGaussians(80 + seed);
      DMatrixRMaj prior = random.covariance(3);
      CommonOps_DDRM.scale(1e10, prior);
      DMatrixRMaj noise = random.covariance(2);
      CommonOps_DDRM.scale(1e-8, noise);
      AffineFunction affine = new AffineFunction(random.matrix(2, 3), random.vector(2));
      MatchingWorkspace work =
          NamedMatchings.of(name).workspace(Space.reals(3), Space.reals(2), affine);
      Moments input = RandomGaussians.momentsOf(Gaussian.of(random.vector(3), prior));
      assertEquals(
          MatchingStatus.MATCHED, work.carry(input, new double[0], RandomGaussians.noise(noise)));
      DMatrixRMaj got = work.unexplained().matrix();
      assertCovariance(name + ", seed " + seed, noise, got, 1e-6);
    }
  }

  private static DMatrixRMaj square(DMatrixRMaj root) {
    DMatrixRMaj result = new DMatrixRMaj(root.numRows, root.numRows);
    if (root.numCols > 0) {
      CommonOps_DDRM.multTransB(root, root, result);
    }
    return result;
  }
}
