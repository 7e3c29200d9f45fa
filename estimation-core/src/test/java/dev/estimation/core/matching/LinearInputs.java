package dev.estimation.core.matching;

import static dev.estimation.testing.Agreement.assertMatrix;
import static dev.estimation.testing.Agreement.assertVector;
import static org.junit.jupiter.api.Assertions.assertEquals;

import dev.estimation.core.function.VectorFunction;
import dev.estimation.core.gaussian.Covariance;
import dev.estimation.core.gaussian.Form;
import dev.estimation.core.gaussian.Moments;
import dev.estimation.core.space.Space;
import dev.estimation.testing.RandomGaussians;
import org.ejml.data.DMatrixRMaj;

/** Results with linear inputs declared beside those without. */
final class LinearInputs {
  private LinearInputs() {}

  /** The same function, said to be linear in nothing; its active inputs stay. */
  static VectorFunction undeclared(VectorFunction function) {
    return new Restructured(function, function.structure().withLinearInputs());
  }

  /** A workspace after a successful call, with a noise that is small beside what the tests carry. */
  static MatchingWorkspace carry(
      MomentMatching matching, VectorFunction function, Moments input, Space output, Form form) {
    MatchingWorkspace work = matching.workspace(input.space(), output, function, form);
    DMatrixRMaj noise = new DMatrixRMaj(output.dimension(), output.dimension());
    for (int i = 0; i < output.dimension(); i++) {
      noise.set(i, i, 0.01);
    }
    Covariance added = RandomGaussians.noise(noise);
    assertEquals(MatchingStatus.MATCHED, work.carry(input, new double[1], added), work::failure);
    return work;
  }

  /** Mean, covariance, cross-covariance and what regression leaves, on one scale for all. */
  static void assertSame(
      String what, MatchingWorkspace wanted, MatchingWorkspace got, double tolerance) {
    assertMeanAndCross(what, wanted, got, tolerance);
    DMatrixRMaj covariance = wanted.output().covariance();
    double scale = 0;
    for (int i = 0; i < covariance.numRows; i++) {
      scale = Math.max(scale, covariance.get(i, i));
    }
    assertMatrix(what + ", covariance", covariance, got.output().covariance(), tolerance, scale);
    assertMatrix(
        what + ", unexplained",
        wanted.unexplained().matrix(),
        got.unexplained().matrix(),
        tolerance,
        scale);
  }

  /** Mean and cross-covariance. */
  static void assertMeanAndCross(
      String what, MatchingWorkspace wanted, MatchingWorkspace got, double tolerance) {
    assertVector(what + ", mean", wanted.mean(), got.mean(), tolerance, 1);
    assertMatrix(what + ", cross-covariance", cross(wanted), cross(got), tolerance, 1);
  }

  /** B W. */
  static DMatrixRMaj cross(MatchingWorkspace work) {
    DMatrixRMaj factor = work.inputFactor();
    DMatrixRMaj w = work.unitCrossCovariance();
    DMatrixRMaj product = new DMatrixRMaj(factor.numRows, w.numCols);
    for (int i = 0; i < factor.numRows; i++) {
      for (int j = 0; j < w.numCols; j++) {
        for (int a = 0; a < w.numRows; a++) {
          product.add(i, j, factor.get(i, a) * w.get(a, j));
        }
      }
    }
    return product;
  }
}
