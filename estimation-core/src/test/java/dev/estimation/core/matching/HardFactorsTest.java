package dev.estimation.core.matching;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertTrue;

import dev.estimation.core.function.VectorFunction;
import dev.estimation.core.gaussian.Form;
import dev.estimation.core.gaussian.Gaussian;
import dev.estimation.core.gaussian.Moments;
import dev.estimation.core.internal.Householder;
import dev.estimation.core.space.Space;
import dev.estimation.testing.AffineFunction;
import dev.estimation.testing.EmbeddedFunction;
import dev.estimation.testing.ExactMatrix;
import java.util.List;
import java.util.Random;
import org.ejml.data.DMatrixRMaj;
import org.ejml.dense.row.CommonOps_DDRM;
import org.ejml.dense.row.RandomMatrices_DDRM;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.MethodSource;

/** Variances from 1e-12 to 1e12 in one state, turned so that they mix: no covariance matrix of doubles holds them. */
class HardFactorsTest {
  private static final int N = 5;
  private static final double[] DEVIATIONS = {1e6, 1e3, 1, 1e-3, 1e-6};

  static List<String> matchings() {
    return List.of(
        "linearisation",
        "spread 1",
        "spread axes",
        "unscented 1 2 0",
        "unscented 0.5 2 1",
        "cubature 3",
        "McNamee-Stenger",
        "simplex",
        "Gauss-Hermite 3");
  }

  /** The lower factor of Q D D Q', Q a random rotation: what it holds is taken for the truth. */
  private static DMatrixRMaj factor(long seed) {
    DMatrixRMaj turned = RandomMatrices_DDRM.orthogonal(N, N, new Random(seed));
    for (int i = 0; i < N; i++) {
      for (int j = 0; j < N; j++) {
        turned.set(i, j, turned.get(i, j) * DEVIATIONS[j]);
      }
    }
    DMatrixRMaj lower = new DMatrixRMaj(N, N);
    Householder.reduceLower(lower.data, N, turned.data, N, N);
    return lower;
  }

  /** What a filter holds can be read: its square is rounded, and must not be refused for that. */
  @Test
  void momentsWithAHardFactorCanBeReadAsAValue() {
    for (int seed = 0; seed < 200; seed++) {
      Moments moments = new Moments(Space.reals(N));
      moments.changeFactor().setTo(factor(seed));
      assertTrue(moments.factor());
      Gaussian value = moments.toGaussian();
      for (int i = 0; i < N; i++) {
        double variance = moments.covariance().get(i, i);
        assertEquals(variance, value.covariance(i, i), 2e-11 * variance, "seed " + seed);
      }
    }
  }

  /** Small whole numbers, of determinant 1. */
  private static DMatrixRMaj unimodular() {
    return new DMatrixRMaj(new double[][] {
      {1, 2, 0, -1, 1}, {0, 1, 1, 0, 2}, {0, 0, 1, 3, 0}, {0, 0, 0, 1, -1}, {1, 2, 0, -1, 2}
    });
  }

  /**
   * The factor M of A u must whiten the exact covariance: M^-1 A P A' M^-T = I. Rounding of 1e6 by 2e-16 is
   * 2e-4 of the smallest deviation, 1e-6; 1e-2 leaves room for the sums.
   */
  @ParameterizedTest
  @MethodSource("matchings")
  void aFactorCarriesThem(String name) {
    for (int seed = 0; seed < 20; seed++) {
      DMatrixRMaj lower = factor(seed);
      Moments input = new Moments(Space.reals(N));
      input.changeFactor().setTo(lower);
      MatchingWorkspace work = workspace(name, seed, Form.SQUARE_ROOT);
      assertEquals(MatchingStatus.MATCHED, work.carry(input, new double[0], null), work::failure);
      double error = whitening(work.output(), lower, order(seed));
      assertTrue(error <= 1e-2, name + ", seed " + seed + ": " + error);
    }
  }

  /** The covariance form has lost at least one direction altogether, or says that nothing is left. */
  @ParameterizedTest
  @MethodSource("matchings")
  void aCovarianceDoesNot(String name) {
    for (int seed = 0; seed < 20; seed++) {
      DMatrixRMaj lower = factor(seed);
      Moments input = new Moments(Space.reals(N));
      input.changeFactor().setTo(lower);
      input.changeCovariance().setTo(input.covariance().copy());
      MatchingWorkspace work = workspace(name, seed, Form.COVARIANCE);
      MatchingStatus status = work.carry(input, new double[0], null);
      if (status == MatchingStatus.MATCHED && work.output().factoredCovariance().isDefinite()) {
        double error = whitening(work.output(), lower, order(seed));
        assertTrue(!(error < 1), name + ", seed " + seed + ": " + error);
      }
    }
  }

  /** The order in which the function reads the inputs. */
  private static int[] order(int seed) {
    return seed % 2 == 0 ? new int[] {0, 1, 2, 3, 4} : new int[] {2, 0, 4, 1, 3};
  }

  private static MatchingWorkspace workspace(String name, int seed, Form form) {
    VectorFunction affine = new AffineFunction(unimodular(), new double[N]);
    VectorFunction function = new EmbeddedFunction(affine, N, N, order(seed));
    return NamedMatchings.of(name).workspace(Space.reals(N), Space.reals(N), function, form);
  }

  /** The largest entry of M^-1 A P A' M^-T - I. */
  private static double whitening(Moments output, DMatrixRMaj lower, int... order) {
    assertTrue(output.factor(), output::factorFailure);
    DMatrixRMaj read = new DMatrixRMaj(N, N);
    for (int i = 0; i < N; i++) {
      CommonOps_DDRM.extract(lower, order[i], order[i] + 1, 0, N, read, i, 0);
    }
    ExactMatrix carried = ExactMatrix.of(unimodular()).times(ExactMatrix.of(read));
    ExactMatrix white = ExactMatrix.of(output.lowerFactor()).inverse().times(carried);
    ExactMatrix off =
        white.times(white.transposed()).minus(ExactMatrix.of(CommonOps_DDRM.identity(N)));
    double largest = 0;
    for (int i = 0; i < N; i++) {
      for (int j = 0; j < N; j++) {
        largest = Math.max(largest, Math.abs(off.get(i, j)));
      }
    }
    return largest;
  }

  @Test
  void aSmallDeviationBesideALargeOneIsKept() {
    Moments input = new Moments(Space.reals(2));
    DMatrixRMaj lower = input.changeFactor();
    lower.setTo(new DMatrixRMaj(new double[][] {{1e6, 0}, {1e6, 1e-6}}));
    AffineFunction difference =
        new AffineFunction(new DMatrixRMaj(new double[][] {{-1, 1}}), new double[1]);
    for (String name : matchings()) {
      MatchingWorkspace work = NamedMatchings.of(name)
          .workspace(Space.reals(2), Space.reals(1), difference, Form.SQUARE_ROOT);
      assertEquals(MatchingStatus.MATCHED, work.carry(input, new double[0], null), work::failure);
      // The difference has a deviation of 1e-6; points of 1e6 are rounded by 1e-10.
      assertEquals(1e-6, work.output().lowerFactor().get(0, 0), 1e-9, name);
    }
  }
}
