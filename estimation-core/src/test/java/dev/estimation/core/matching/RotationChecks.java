package dev.estimation.core.matching;

import static dev.estimation.testing.Agreement.assertCovariance;
import static dev.estimation.testing.Agreement.assertMatrix;
import static dev.estimation.testing.Agreement.assertVector;
import static org.junit.jupiter.api.Assertions.assertTrue;

import dev.estimation.core.function.Structure;
import dev.estimation.core.function.VectorFunction;
import dev.estimation.core.gaussian.Gaussian;
import dev.estimation.core.gaussian.Moments;
import dev.estimation.core.space.Space;
import dev.estimation.testing.RandomGaussians;
import dev.estimation.testing.Rotations;
import java.util.SplittableRandom;
import org.ejml.data.DMatrixRMaj;
import org.ejml.dense.row.CommonOps_DDRM;
import org.junit.jupiter.api.Test;

/** Rotations that are turned on both sides: as exact as affine functions of vectors. */
interface RotationChecks extends MatchingUnderTest {
  /** Quaternions, and rotation vectors of up to 5 standard deviations of 0.4 rad. */
  double LARGEST = 2;

  /** A rotation with a full covariance, standard deviations from 0.2 to 0.4 rad or so, and a real. */
  private static Moments input(Space space, double[] mean, long seed) {
    DMatrixRMaj covariance = new RandomGaussians(seed).covariance(space.dimension());
    CommonOps_DDRM.scale(0.1 / CommonOps_DDRM.elementMax(covariance), covariance);
    Moments moments = new Moments(space);
    moments.set(Gaussian.of(space, mean, covariance));
    return moments;
  }

  /** With z = c q d, z exp(R(d)' v) = c q exp(v) d: mean c q d, covariance R(d)' P R(d). */
  @Test
  default void rotationsTurnedOnBothSides() {
    SplittableRandom random = new SplittableRandom(31);
    Space space = Space.unitQuaternion();
    for (int run = 0; run < 20; run++) {
      double[] q = Rotations.random(random);
      double[] before = Rotations.random(random);
      double[] after = Rotations.random(random);
      Moments input = input(space, q, run);
      VectorFunction turned = offered(new Turned(before, after));
      Outcome got = Outcome.of(formed(unitLengths(3)).workspace(space, space, turned), input);
      double[] apart = new double[3];
      double[] wanted = Rotations.product(Rotations.product(before, q), after);
      space.difference(got.mean, wanted, apart);
      assertVector("mean", new double[3], apart, meanRounding(3, LARGEST), 1);
      assertTrue(space.contains(got.mean));
      DMatrixRMaj turn = Rotations.matrix(after);
      DMatrixRMaj cross = new DMatrixRMaj(3, 3);
      DMatrixRMaj covariance = new DMatrixRMaj(3, 3);
      CommonOps_DDRM.mult(input.covariance(), turn, cross);
      CommonOps_DDRM.multTransA(turn, cross, covariance);
      double rounding = covarianceRounding(3, LARGEST, got.smallestDeviation());
      assertCovariance("covariance", covariance, got.covariance, rounding);
      assertMatrix("cross-covariance", cross, got.cross(), rounding, 0.1);
    }
  }

  /** A rotation beside a real that it is not told of: the covariance of both is regressed. */
  @Test
  default void aRotationAmongOthers() {
    Space space = Space.reals(1).and(Space.unitQuaternion());
    Space rotation = Space.unitQuaternion();
    double[] none = {1, 0, 0, 0};
    double[] mean = {7, 0.5, 0.5, -0.5, 0.5};
    Moments input = input(space, mean, 32);
    Turned still = new Turned(none, none);
    VectorFunction second = offered(new VectorFunction() {
      @Override
      public void evaluate(double[] u, double[] given, double[] output) {
        still.evaluate(new double[] {u[1], u[2], u[3], u[4]}, given, output);
      }

      @Override
      public Structure structure() {
        return Structure.UNKNOWN
            .withActiveInputs(1, 2, 3)
            .withJacobian((u, given, j) -> j[1] = j[4 + 2] = j[8 + 3] = 1)
            .withHessian((u, given, h) -> {});
      }
    });
    Outcome got = Outcome.of(formed(unitLengths(4)).workspace(space, rotation, second), input);
    DMatrixRMaj cross = CommonOps_DDRM.extract(input.covariance(), 0, 4, 1, 4);
    DMatrixRMaj wanted = CommonOps_DDRM.extract(input.covariance(), 1, 4, 1, 4);
    double rounding = covarianceRounding(carried(3, 4), LARGEST, got.smallestDeviation());
    assertCovariance("covariance", wanted, got.covariance, rounding);
    assertMatrix("cross-covariance", cross, got.cross(), rounding, 0.1);
  }

  private static double[] unitLengths(int count) {
    return MatchingUnderTest.unitScales(count);
  }

  /** z = c q d, of a sign that jumps about and a length that is not 1. */
  final class Turned implements VectorFunction {
    private final double[] before;
    private final double[] after;

    Turned(double[] before, double[] after) {
      this.before = before;
      this.after = after;
    }

    @Override
    public void evaluate(double[] input, double[] given, double[] output) {
      double[] z = Rotations.product(Rotations.product(before, input), after);
      double scale = z[1] > z[2] ? -1.5 : 0.5;
      for (int i = 0; i < 4; i++) {
        output[i] = scale * z[i];
      }
    }

    @Override
    public Structure structure() {
      return Structure.UNKNOWN
          .withJacobian((input, given, jacobian) -> {
            DMatrixRMaj turn = Rotations.matrix(after);
            CommonOps_DDRM.transpose(turn);
            System.arraycopy(turn.data, 0, jacobian, 0, 9);
          })
          .withHessian((input, given, hessian) -> {}); // linear in rotation vectors: zeros
    }
  }
}
