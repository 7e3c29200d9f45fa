package dev.estimation.core.matching;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertThrows;
import static org.junit.jupiter.api.Assertions.assertTrue;

import dev.estimation.core.function.Structure;
import dev.estimation.core.function.VectorFunction;
import dev.estimation.core.gaussian.Gaussian;
import dev.estimation.core.gaussian.Moments;
import dev.estimation.core.space.Space;
import dev.estimation.testing.Agreement;
import java.util.Arrays;
import org.ejml.data.DMatrixRMaj;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.EnumSource;
import org.junit.jupiter.params.provider.ValueSource;

/** A matching to a tolerance where numbers are huge, tiny or missing, and after calls that failed. */
class ToleranceUglyTest {
  private static final double[] NOTHING = {};

  private static Moments unit(int inputs) {
    double[] ones = new double[inputs];
    Arrays.fill(ones, 1);
    Moments moments = new Moments(Space.reals(inputs));
    moments.set(Gaussian.independent(new double[inputs], ones));
    return moments;
  }

  private static MatchingWorkspace work(int inputs, Space output, VectorFunction function) {
    return ToleranceMatching.within(0.01).workspace(Space.reals(inputs), output, function);
  }

  /** Units do not matter: the same evaluations, and moments of a log-normal. */
  @ParameterizedTest
  @ValueSource(doubles = {1e150, 1e-150})
  void unitsDoNotMatter(double size) {
    MatchingWorkspace work = work(1, Space.reals(1), (u, given, z) -> z[0] = size * Math.exp(u[0]));
    for (Use use : Use.values()) {
      assertEquals(MatchingStatus.MATCHED, work.carry(unit(1), NOTHING, null, use));
      assertEquals(9, work.evaluations());
      double variance = Math.E * (Math.E - 1);
      double got = work.output().covariance().get(0, 0) / size / size;
      assertEquals(variance, got, 0.01 * variance); // the tolerance
    }
  }

  /** Squares that overflow are no sign of accuracy. */
  @ParameterizedTest
  @ValueSource(doubles = {1e160, 1e300})
  void whatOverflowsIsNotWithinTheTolerance(double slope) {
    Structure wrong = Structure.UNKNOWN.withJacobian((u, given, j) -> j[0] = slope);
    MatchingWorkspace work = work(
        1, Space.reals(1), new Restructured((u, given, z) -> z[0] = Math.sin(3 * u[0]), wrong));
    assertEquals(MatchingStatus.BELOW_TOLERANCE, work.carry(unit(1), NOTHING, null));
    assertEquals(Double.POSITIVE_INFINITY, work.estimatedError());
    MatchingWorkspace huge =
        work(1, Space.reals(1), (u, given, z) -> z[0] = 1e155 * Math.exp(u[0]));
    assertEquals(MatchingStatus.BELOW_TOLERANCE, huge.carry(unit(1), NOTHING, null, Use.UPDATE));
  }

  /** Without a value at the first probe, another is taken, and not mistaken for a node: 3 nodes give E x^4 for a variance. */
  @Test
  void aProbeElsewhereIsNoNode() {
    VectorFunction holed =
        (u, given, z) -> z[0] = Math.abs(u[0] - 2.86) < 0.1 ? Double.NaN : u[0] * u[0] * u[0];
    MatchingWorkspace work = work(1, Space.reals(1), holed);
    assertEquals(MatchingStatus.BELOW_TOLERANCE, work.carry(unit(1), NOTHING, null));
    assertEquals(9, work.output().covariance().get(0, 0), 1e-13); // rounding
    assertTrue(work.failure().contains("finite values"), work.failure());
  }

  /** Nothing to measure by but rounding, at inputs whose mean is zero: the slopes are those of a rotation's length. */
  @ParameterizedTest
  @EnumSource
  void roundingOfSlopesIsNotRefined(Use use) {
    Structure slopes = Structure.UNKNOWN.withLinearInputs(1).withJacobian((u, given, j) -> {
      j[0] = 0;
      j[1] = Math.hypot(Math.sin(u[0]), Math.cos(u[0])) * Math.PI;
    });
    MatchingWorkspace work =
        work(2, Space.reals(1), new Restructured((u, given, z) -> z[0] = Math.PI * u[1], slopes));
    assertEquals(MatchingStatus.MATCHED, work.carry(unit(2), NOTHING, null, use));
    assertEquals(5, work.evaluations());
  }

  /** A distance whose roundings are more than 1e-9 m beside an angle: that is no turn. */
  @ParameterizedTest
  @ValueSource(doubles = {2.5e7, 1e12})
  void roundingFarAwayIsNoTurn(double distance) {
    Space output = Space.reals(1).and(Space.angles(1));
    MatchingWorkspace work = work(2, output, (u, given, z) -> {
      z[0] = distance + 0.01 * u[0];
      z[1] = 0.1 * u[0] * u[1];
    });
    assertEquals(MatchingStatus.MATCHED, work.carry(unit(2), NOTHING, null));
    assertEquals(0.01, work.output().covariance().get(1, 1), 1e-15); // (0.1)^2; rounding
    VectorFunction turning = (u, given, z) -> {
      z[0] = distance + u[0];
      z[1] = 1.9 * u[0] + u[1];
    };
    MatchingWorkspace turns = work(2, output, turning);
    assertEquals(MatchingStatus.BELOW_TOLERANCE, turns.carry(unit(2), NOTHING, null));
    assertTrue(turns.failure().contains("half a turn"), turns.failure());
  }

  /** Of 21 evaluations, 19 find the product and none are left to confirm it; the words do not say that it is above. */
  @Test
  void anEstimateThatIsNotConfirmedSaysSo() {
    VectorFunction product = (u, given, z) -> z[0] = u[0] + u[1] * u[2];
    MatchingWorkspace work = ToleranceMatching.within(0.01)
        .withBudget(21)
        .workspace(Space.reals(3), Space.reals(1), product);
    assertEquals(MatchingStatus.BELOW_TOLERANCE, work.carry(unit(3), NOTHING, null));
    assertTrue(work.estimatedError() < 0.01);
    assertTrue(work.failure().contains("not confirmed"), work.failure());
    assertEquals(
        MatchingStatus.MATCHED, work(3, Space.reals(1), product).carry(unit(3), NOTHING, null));
  }

  /** The first fresh pair meets a NaN after one evaluation: the next one confirms, with two more than the 21. */
  @Test
  void aFreshProbeThatIsNotFiniteConfirmsNothing() {
    MatchingWorkspace work = work(3, Space.reals(1), (u, given, z) -> {
      boolean hole = u[0] > 1 && u[1] < -1 && u[2] > 1;
      z[0] = hole ? Double.NaN : u[0] + u[1] * u[2];
    });
    assertEquals(MatchingStatus.MATCHED, work.carry(unit(3), NOTHING, null));
    assertEquals(24, work.evaluations());
  }

  /** A call that failed has no error of the call before. */
  @Test
  void anErrorIsNotLeftOver() {
    MatchingWorkspace work = work(1, Space.reals(1), (u, given, z) -> z[0] = Math.sqrt(u[0] + 2));
    work.carry(unit(1), NOTHING, null);
    Moments beyond = unit(1);
    for (double mean : new double[] {-1, -3, Double.NaN}) { // at a point, at the centre, before it
      beyond.changeMean()[0] = mean;
      assertTrue(!work.carry(beyond, NOTHING, null).hasResult());
      assertEquals(Double.POSITIVE_INFINITY, work.estimatedError());
    }
  }

  /** Whichever evaluation throws, the next call gives what a new workspace does, bit for bit. */
  @Test
  void aWorkspaceOutlivesWhatAFunctionThrows() {
    int[] left = {Integer.MAX_VALUE};
    VectorFunction wave = (u, given, z) -> {
      if (left[0]-- == 0) {
        throw new IllegalStateException("as asked");
      }
      z[0] = Math.sin(u[0] + u[1]);
    };
    MatchingWorkspace fresh = work(2, Space.reals(1), wave);
    fresh.carry(unit(2), NOTHING, null);
    MatchingWorkspace work = work(2, Space.reals(1), wave);
    for (int good = 0; good < fresh.evaluations(); good += 3) {
      left[0] = good;
      assertThrows(IllegalStateException.class, () -> work.carry(unit(2), NOTHING, null));
      left[0] = Integer.MAX_VALUE;
      assertEquals(MatchingStatus.MATCHED, work.carry(unit(2), NOTHING, null));
      Agreement.assertSameBits(
          "covariance", fresh.output().covariance(), work.output().covariance());
    }
  }

  /** Of one thing moved three ways, one axis moves: E x^6 = 15, from nine nodes. */
  @Test
  void aCovarianceOfRankOneTakesOneAxis() {
    Moments line = new Moments(Space.reals(3));
    line.set(Gaussian.of(new double[3], new DMatrixRMaj(3, 3, true, 1, 1, 1, 1, 1, 1, 1, 1, 1)));
    MatchingWorkspace work = work(3, Space.reals(1), (u, given, z) -> z[0] = u[0] * u[1] * u[2]);
    assertEquals(MatchingStatus.MATCHED, work.carry(line, NOTHING, null));
    assertEquals(9, work.evaluations());
    assertEquals(15, work.output().covariance().get(0, 0), 1e-12); // rounding
  }
}
