package dev.estimation.filters.filter;

import static dev.estimation.testing.Agreement.assertNames;
import static dev.estimation.testing.Agreement.assertWithin;
import static org.junit.jupiter.api.Assertions.assertArrayEquals;
import static org.junit.jupiter.api.Assertions.assertEquals;

import dev.estimation.core.function.Structure;
import dev.estimation.core.gaussian.Gaussian;
import dev.estimation.core.matching.Linearisation;
import dev.estimation.core.matching.MomentMatching;
import dev.estimation.core.space.Space;
import dev.estimation.filters.model.DifferentiableNoiseDrivenMotion;
import dev.estimation.filters.testing.Bits;
import dev.estimation.filters.testing.BothForms;
import dev.estimation.filters.testing.Matchings;
import dev.estimation.filters.testing.Models;
import dev.estimation.testing.RandomGaussians;
import java.util.List;
import org.ejml.data.DMatrixRMaj;
import org.ejml.dense.row.CommonOps_DDRM;
import org.junit.jupiter.api.Named;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.Arguments;
import org.junit.jupiter.params.provider.MethodSource;

/** Noise inside the motion. */
class NoiseDrivenTest extends BothForms {
  static List<Named<MomentMatching>> matchings() {
    return Matchings.all();
  }

  static List<Arguments> namedMatchings() {
    return Matchings.all().stream()
        .map(named -> Arguments.of(Named.of(named.getName(), named)))
        .toList();
  }

  /** If the motion is linear, noise inside is the same as G Q G' added afterwards. */
  @ParameterizedTest
  @MethodSource("matchings")
  void linearNoiseInsideIsNoiseAdded(MomentMatching matching) {
    RandomGaussians random = new RandomGaussians(3);
    DMatrixRMaj f = random.matrix(3, 3);
    DMatrixRMaj g = random.matrix(3, 2);
    DMatrixRMaj q = random.covariance(2);
    Gaussian prior = random.gaussian(3);
    Estimate inside = predicted(new Models.LinearNoiseDriven(f, g, q), matching, prior);
    Estimate added = predicted(new Models.LinearMotion(f, product(g, q)), matching, prior);
    for (int i = 0; i < 3; i++) {
      // 1e-13: roundings on entries of order 10, points times weights.
      assertWithin("mean", added.mean(i), inside.mean(i), 1e-13, 10);
      for (int j = 0; j < 3; j++) {
        assertWithin("covariance", added.covariance(i, j), inside.covariance(i, j), 1e-13, 100);
      }
    }
  }

  private Estimate predicted(
      dev.estimation.filters.model.Motion motion, MomentMatching matching, Gaussian prior) {
    FilterPlan plan = formed(FilterPlan.of(motion, matching));
    Estimate estimate = plan.start(0, prior);
    assertEquals(StepStatus.APPLIED, plan.workspace().predict(estimate, 1));
    return estimate;
  }

  private static DMatrixRMaj product(DMatrixRMaj g, DMatrixRMaj q) {
    DMatrixRMaj half = new DMatrixRMaj(g.numRows, q.numCols);
    CommonOps_DDRM.mult(g, q, half);
    DMatrixRMaj result = new DMatrixRMaj(g.numRows, g.numRows);
    CommonOps_DDRM.multTransB(half, g, result);
    return result;
  }

  @Test
  void indefiniteNoiseIsRefused() {
    DMatrixRMaj q = new DMatrixRMaj(new double[][] {{1, 2}, {2, 1}});
    RandomGaussians random = new RandomGaussians(4);
    FilterPlan plan = formed(FilterPlan.cubature(
        new Models.LinearNoiseDriven(random.matrix(3, 3), random.matrix(3, 2), q)));
    Estimate estimate = plan.start(0, random.gaussian(3));
    long[] before = Bits.of(estimate, 3);
    FilterWorkspace work = plan.workspace();
    assertEquals(StepStatus.NOISE_NOT_VALID, work.predict(estimate, 1));
    assertArrayEquals(before, Bits.of(estimate, 3));
    assertNames(
        work.failure(),
        "noiseCovariance is not positive semi-definite: pivot 2 of 2 is -3.0",
        "LinearNoiseDriven");
  }

  /**
   * A motion that reads the second of three state components and the first of two noises: points in
   * two dimensions give what points in all five give, where the spread does not depend on that.
   */
  @ParameterizedTest
  @MethodSource("namedMatchings")
  void pointsAreDrawnOverActiveStatesAndNoises(Named<MomentMatching> named) {
    RandomGaussians random = new RandomGaussians(6);
    Gaussian prior = random.gaussian(3);
    Bent bent = new Bent(random.covariance(2));
    FilterPlan plan = formed(FilterPlan.of(bent, named.getPayload()));
    FilterWorkspace work = plan.workspace();
    Estimate estimate = plan.start(0, prior);
    assertEquals(StepStatus.APPLIED, work.predict(estimate, 1));
    FilterPlan exact = formed(FilterPlan.of(bent, Linearisation.firstOrder().overWholeInput()));
    boolean linear = Matchings.isLinear(named);
    assertEquals(Matchings.jacobians(named, 2, 5), work.jacobians());
    if (linear) {
      Estimate whole = exact.start(0, prior);
      assertEquals(StepStatus.APPLIED, exact.workspace().predict(whole, 1));
      for (int i = 0; i < 3; i++) {
        // 1e-14: the same sums in another order.
        assertWithin("variance", whole.covariance(i, i), estimate.covariance(i, i), 1e-14, 10);
      }
    }
    // The product of two independent normal numbers x and n: mean 0 of n times x.
    assertWithin("mean", 0, estimate.mean(0), 1e-12, 1);
    // Two of five inputs are read: 1, 4, 5 or 9 evaluations; over all 1, 7, 11, 51 or 243.
    assertEquals(Matchings.evaluations(named, 2, 5), work.evaluations());
  }

  @Test
  void evaluationsCountStateAndNoise() {
    RandomGaussians random = new RandomGaussians(5);
    FilterPlan plan = formed(FilterPlan.cubature(new Models.LinearNoiseDriven(
        random.matrix(3, 3), random.matrix(3, 2), random.covariance(2))));
    FilterWorkspace work = plan.workspace();
    assertEquals(StepStatus.APPLIED, work.predict(plan.start(0, random.gaussian(3)), 1));
    assertEquals(2 * 5 + 1, work.evaluations());
  }

  /** Reads state 1 and noise 0. */
  private record Bent(DMatrixRMaj q) implements DifferentiableNoiseDrivenMotion {
    @Override
    public Space stateSpace() {
      return Space.reals(3);
    }

    @Override
    public int noiseDimension() {
      return 2;
    }

    @Override
    public Structure structure() {
      return Structure.UNKNOWN.withActiveInputs(1, 3);
    }

    @Override
    public void move(
        double[] state, double[] noise, double[] control, double time, double dt, double[] next) {
      next[0] = state[1] * noise[0];
      next[1] = state[1];
      next[2] = state[1] + noise[0];
    }

    @Override
    public void moveJacobians(
        double[] state,
        double[] noise,
        double[] control,
        double time,
        double dt,
        double[] byState,
        double[] byNoise) {
      byState[1] = noise[0];
      byState[4] = 1;
      byState[7] = 1;
      byNoise[0] = state[1];
      byNoise[4] = 1;
    }

    @Override
    public void noiseCovariance(double[] control, double time, double dt, double[] covariance) {
      System.arraycopy(q.data, 0, covariance, 0, 4);
    }
  }
}
