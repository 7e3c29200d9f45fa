package dev.estimation.core.matching;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertThrows;
import static org.junit.jupiter.api.Assertions.assertTrue;

import dev.estimation.core.function.Structure;
import dev.estimation.core.function.VectorFunction;
import dev.estimation.core.gaussian.Covariance;
import dev.estimation.core.gaussian.Form;
import dev.estimation.core.gaussian.Gaussian;
import dev.estimation.core.gaussian.Moments;
import dev.estimation.core.space.Space;
import dev.estimation.testing.AllocationMeter;
import java.util.Arrays;
import java.util.HashSet;
import java.util.Set;
import org.ejml.data.DMatrixRMaj;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.ValueSource;

/** How a matching to a tolerance behaves where it cannot, or need not, do its best. */
class ToleranceConductTest {
  private static Moments moments(double[] mean, double... deviations) {
    Moments moments = new Moments(Space.reals(mean.length));
    moments.set(Gaussian.independent(mean, deviations));
    return moments;
  }

  private static MatchingWorkspace work(double tolerance, int inputs, VectorFunction function) {
    return ToleranceMatching.within(tolerance)
        .workspace(Space.reals(inputs), Space.reals(1), function);
  }

  /** Nothing on the axes varies: the first estimate of the covariance is zero, and the probes find the product. */
  @Test
  void aProductAtZeroIsFound() {
    MatchingWorkspace work = work(0.01, 2, (u, given, z) -> z[0] = u[0] * u[1]);
    assertEquals(
        MatchingStatus.MATCHED, work.carry(moments(new double[2], 2, 3), new double[0], null));
    assertEquals(36, work.output().covariance().get(0, 0), 1e-12); // rounding of sums of 13 points
    assertEquals(0, work.mean()[0], 1e-12);
    assertEquals(11, work.evaluations());
  }

  /** Three nodes take x^3 for 3 x; the far pair of nodes sees it, and nine nodes are exact. */
  @Test
  void aCubicAtZeroIsFound() {
    MatchingWorkspace work = work(0.01, 1, (u, given, z) -> z[0] = u[0] * u[0] * u[0]);
    assertEquals(
        MatchingStatus.MATCHED, work.carry(moments(new double[1], 1), new double[0], null));
    assertEquals(15, work.output().covariance().get(0, 0), 1e-12); // E x^6; rounding
    assertEquals(3, work.unitCrossCovariance().get(0, 0), 1e-13); // E x^4
    assertEquals(9, work.evaluations());
  }

  /** A second that the probes would not show alone: a slope at the mean that is not that of the points. */
  @Test
  void aJacobianGivesACubicAway() {
    VectorFunction cubic = (u, given, z) -> z[0] = u[0] + 0.2 * u[1] * (u[1] * u[1] - 3);
    Structure slopes = Structure.UNKNOWN.withJacobian((u, given, j) -> {
      j[0] = 1;
      j[1] = 0.6 * (u[1] * u[1] - 1);
    });
    VectorFunction known = new Restructured(cubic, slopes);
    MatchingWorkspace work = work(0.2, 2, known);
    work.carry(moments(new double[2], 1, 1), new double[0], null);
    assertEquals(1, work.jacobians());
    assertTrue(work.evaluations() > 7, work.evaluations() + " evaluations");
    assertEquals(1.24, work.output().covariance().get(0, 0), 1e-12); // 1 + 0.04 * 3!
  }

  /** No point is evaluated twice. */
  @ParameterizedTest
  @ValueSource(ints = {1, 2, 3})
  void nothingIsEvaluatedTwice(int inputs) {
    Set<String> seen = new HashSet<>();
    VectorFunction wave = (u, given, z) -> {
      double sum = 0;
      StringBuilder place = new StringBuilder();
      for (double value : u) {
        sum += value;
        place.append(value + 0.0).append(' ');
      }
      assertTrue(seen.add(place.toString()), "again at " + place);
      z[0] = Math.sin(sum);
    };
    MatchingWorkspace work = work(1e-3, inputs, wave);
    double[] ones = new double[inputs];
    Arrays.fill(ones, 0.5);
    work.carry(moments(ones, ones), new double[0], null);
    assertEquals(seen.size(), work.evaluations());
    assertTrue(work.evaluations() >= 9, work.evaluations() + " evaluations");
  }

  @Test
  void theBudgetIsKeptAndTheBestIsThere() {
    VectorFunction sharp = (u, given, z) -> z[0] = Math.hypot(u[0], u[1]);
    for (int budget : new int[] {7, 20, 100, 500}) {
      MatchingWorkspace work = ToleranceMatching.within(1e-3)
          .withBudget(budget)
          .workspace(Space.reals(2), Space.reals(1), sharp);
      MatchingStatus status = work.carry(moments(new double[] {0.3, 0}, 1, 1), new double[0], null);
      assertEquals(MatchingStatus.BELOW_TOLERANCE, status);
      assertTrue(work.evaluations() <= budget, work.evaluations() + " of " + budget);
      assertTrue(work.estimatedError() > 1e-3);
      assertTrue(work.failure().contains("of at most " + budget), work.failure());
      assertTrue(work.output().factor());
    }
  }

  @Test
  void aBudgetThatIsTooSmallIsRefused() {
    IllegalArgumentException refused = assertThrows(
        IllegalArgumentException.class,
        () -> ToleranceMatching.within(0.01)
            .withBudget(6)
            .workspace(Space.reals(2), Space.reals(1), (u, given, z) -> z[0] = u[0]));
    assertTrue(refused.getMessage().contains("at least 7"), refused.getMessage());
    assertThrows(IllegalArgumentException.class, () -> ToleranceMatching.within(0));
    assertThrows(IllegalArgumentException.class, () -> ToleranceMatching.within(Double.NaN));
    assertThrows(
        IllegalArgumentException.class, () -> ToleranceMatching.within(0.01).withBudget(0));
  }

  /** Square roots end at 5 deviations, which only the third level meets: it is closed, the rest goes on. */
  @Test
  void valuesFurtherOutThatAreNotFiniteCloseTheirLevel() {
    VectorFunction root = (u, given, z) -> z[0] = Math.sqrt(u[0] + 5) * Math.cos(3 * u[0]);
    MatchingWorkspace work = work(1e-6, 1, root);
    assertEquals(
        MatchingStatus.BELOW_TOLERANCE, work.carry(moments(new double[1], 1), new double[0], null));
    assertTrue(Double.isFinite(work.output().covariance().get(0, 0)));
    assertTrue(work.evaluations() <= 19, work.evaluations() + " evaluations");
    VectorFunction near = (u, given, z) -> z[0] = Math.log(u[0] + 1);
    MatchingWorkspace none = work(0.01, 1, near);
    assertEquals(
        MatchingStatus.FUNCTION_NOT_FINITE,
        none.carry(moments(new double[1], 1), new double[0], null));
  }

  /** A probe that is not finite shows nothing; another is tried. */
  @Test
  void aProbeThatIsNotFiniteIsReplaced() {
    VectorFunction cornered =
        (u, given, z) -> z[0] = u[0] > 1.2 && u[1] > 1.2 ? Double.NaN : u[0] + u[1];
    MatchingWorkspace work = work(0.01, 2, cornered);
    assertEquals(
        MatchingStatus.MATCHED, work.carry(moments(new double[2], 1, 1), new double[0], null));
    assertEquals(2, work.output().covariance().get(0, 0), 1e-14);
  }

  @Test
  void anAngleThatWouldPassHalfATurnStopsTheRefinement() {
    Space input = Space.reals(1);
    VectorFunction angle = (u, given, z) -> z[0] = u[0] + 0.3 * u[0] * u[0];
    MatchingWorkspace narrow =
        ToleranceMatching.within(0.01).workspace(input, Space.angles(1), angle);
    assertEquals(
        MatchingStatus.MATCHED, narrow.carry(moments(new double[1], 0.1), new double[0], null));
    MatchingStatus status = narrow.carry(moments(new double[1], 1), new double[0], null);
    assertEquals(MatchingStatus.BELOW_TOLERANCE, status);
    assertTrue(narrow.failure().contains("half a turn"), narrow.failure());
  }

  @Test
  void noiseMakesItCheaper() {
    VectorFunction bent = (u, given, z) -> z[0] = u[0] + Math.sin(2 * u[1]) * u[0];
    MatchingWorkspace work = work(0.01, 2, bent);
    Moments input = moments(new double[] {1, 0}, 0.3, 0.4);
    work.carry(input, new double[0], null);
    int without = work.evaluations();
    Covariance noise = new Covariance(1);
    noise.changeMatrix().set(0, 0, 100);
    work.carry(input, new double[0], noise, Use.UPDATE);
    assertTrue(work.evaluations() < without, work.evaluations() + " of " + without);
  }

  /** Where nothing varies, or all of it is linear, there is nothing to look for. */
  @Test
  void stillInputsTakeNoPoints() {
    MatchingWorkspace work = work(0.01, 3, (u, given, z) -> z[0] = u[0] * u[1] * u[2]);
    assertEquals(
        MatchingStatus.MATCHED,
        work.carry(moments(new double[] {2, 3, 5}, 0, 0, 0), new double[0], null));
    assertEquals(1, work.evaluations());
    assertEquals(0, work.output().covariance().get(0, 0), 0);
    work.carry(moments(new double[] {2, 3, 5}, 0, 0.1, 0), new double[0], null);
    assertEquals(5, work.evaluations());
    assertEquals(1, work.output().covariance().get(0, 0), 1e-14); // (0.1 * 2 * 5)^2
  }

  @Test
  void aNoiseThatIsNotFiniteIsTold() {
    MatchingWorkspace work = work(0.01, 1, (u, given, z) -> z[0] = u[0]);
    Covariance noise = new Covariance(1);
    noise.changeMatrix().set(0, 0, Double.NaN);
    assertEquals(
        MatchingStatus.NOISE_NOT_FINITE,
        work.carry(moments(new double[1], 1), new double[0], noise, Use.UPDATE));
  }

  @ParameterizedTest
  @ValueSource(ints = {2, 6, 7, 8, 12, 20})
  void aCallAllocatesNothing(int inputs) {
    VectorFunction wave = (u, given, z) -> {
      double sum = 0;
      for (int i = 0; i < u.length; i++) {
        sum += u[i] / (i + 1);
      }
      z[0] = Math.sin(sum);
      z[1] = u[0] * u[u.length - 1];
    };
    Moments input = moments(new double[inputs], deviations(inputs));
    double[] given = new double[0];
    Covariance noise = new Covariance(2);
    noise.changeMatrix().setTo(new DMatrixRMaj(2, 2, true, 0.1, 0, 0, 0.1));
    for (Form form : Form.values()) {
      for (int linear = 0; linear < 2; linear++) {
        VectorFunction offered = linear == 0
            ? wave
            : new Restructured(
                (u, nothing, z) -> {
                  z[0] = Math.sin(u[0]) + Math.cos(u[0]) * u[1];
                  z[1] = u[1];
                },
                Structure.UNKNOWN.withActiveInputs(0, 1).withLinearInputs(1));
        MatchingWorkspace work = ToleranceMatching.within(0.01)
            .workspace(Space.reals(inputs), Space.reals(1).and(Space.angles(1)), offered, form);
        assertEquals(0, AllocationMeter.bytesPerCall(50, 20, () -> {
          work.carry(input, given, noise, Use.UPDATE);
          work.output();
          work.unitCrossCovariance();
          work.unexplained();
        }));
      }
    }
  }

  private static double[] deviations(int count) {
    double[] result = new double[count];
    Arrays.fill(result, 0.5);
    return result;
  }
}
