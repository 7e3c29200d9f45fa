package dev.estimation.benchmarks.jmh;

import static org.junit.jupiter.api.Assertions.assertArrayEquals;
import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertTrue;

import dev.estimation.core.function.JacobianCheck;
import dev.estimation.core.space.Space;
import java.util.Arrays;
import java.util.stream.Stream;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.MethodSource;
import org.junit.jupiter.params.provider.ValueSource;
import org.openjdk.jmh.annotations.Param;

/** What the benchmarks of matchings measure is right before it is fast. */
class MatchingBenchmarkTest {
  /**
   * Of mean and covariance. Tolerance has promised its own. Higher degrees were at 0.035 at most, 1000 draws at 0.052 and all
   * others at 1.2 (unscented, variance of the pseudorange) when this was written: no moments of a wrong function.
   */
  private static double limit(ComparedMatching matching) {
    return switch (matching) {
      case CUBATURE_FIVE, HERMITE, SPARSE -> 0.05;
      case TOLERANCE -> 0.01;
      case RANDOM -> 0.1;
      default -> 1.5;
    };
  }

  static Stream<String> problems() throws NoSuchFieldException {
    return parameters(MatchingBenchmark.class, "problem");
  }

  private static Stream<String> parameters(Class<?> benchmark, String field)
      throws NoSuchFieldException {
    return Arrays.stream(
        benchmark.getDeclaredField(field).getAnnotation(Param.class).value());
  }

  @Test
  void allMatchingsAreMeasured() throws NoSuchFieldException {
    assertArrayEquals(
        Arrays.stream(ComparedMatching.values()).map(ComparedMatching::label).toArray(),
        parameters(MatchingBenchmark.class, "matching").toArray());
    assertArrayEquals(
        Arrays.stream(ComparedMatching.values())
            .filter(one -> one != ComparedMatching.HERMITE)
            .map(ComparedMatching::label)
            .toArray(),
        parameters(ScalingBenchmark.class, "matching").toArray());
  }

  /** The truth has converged to 1e-6, the accuracy that was asked for; each matching is within its limit of it. */
  @ParameterizedTest
  @MethodSource("problems")
  void everyMatchingIsNearTheTruth(String problem) {
    CarryAccuracy.Truth truth = new CarryAccuracy.Truth(CarryProblem.of(problem));
    for (ComparedMatching matching : ComparedMatching.values()) {
      CarryAccuracy accuracy = truth.of(matching);
      assertTrue(accuracy.uncertainty() < 1e-6, accuracy::toString);
      assertTrue(accuracy.error() < limit(matching), () -> matching + ": " + accuracy);
    }
  }

  /** What a function does not read changes nothing but cost: errors agree to 1e-9, some roundings of the condition. */
  @ParameterizedTest
  @ValueSource(strings = {"polar", "spherical", "turn", "turn-linear", "pseudorange", "attitude"})
  void theSizeOfTheStateDoesNotMatter(String function) {
    CarryAccuracy.Truth small = new CarryAccuracy.Truth(CarryProblem.of(function + ":5"));
    CarryAccuracy.Truth large = new CarryAccuracy.Truth(CarryProblem.of(function + ":30"));
    for (ComparedMatching matching : ComparedMatching.values()) {
      assertEquals(small.of(matching).mean(), large.of(matching).mean(), 1e-9);
      assertEquals(small.of(matching).covariance(), large.of(matching).covariance(), 1e-9);
      assertEquals(small.of(matching).evaluations(), large.of(matching).evaluations());
    }
  }

  @ParameterizedTest
  @MethodSource("problems")
  void jacobiansAreThoseOfTheFunctions(String name) {
    requireJacobian(CarryProblem.of(name));
  }

  @ParameterizedTest
  @ValueSource(ints = {2, 4, 8, 15, 30, 60})
  void jacobiansOfWavesAre(int n) {
    requireJacobian(CarryProblem.of("waves:" + n));
  }

  private static void requireJacobian(CarryProblem problem) {
    double[] mean = problem.point().input().mean();
    double[] aside = new double[mean.length];
    problem.input().displace(mean, problem.deviations(), aside);
    Space output = problem.output();
    JacobianCheck check = JacobianCheck.of(
        problem.input(),
        output,
        problem.function(),
        problem.deviations(),
        new double[0],
        mean,
        aside);
    assertTrue(check.passed(), check::toString);
  }

  /** Rules of higher degree are near the truth in all that is scaled up to 15 inputs: 1e-6, the squares of the bends. */
  @ParameterizedTest
  @ValueSource(ints = {2, 4, 8, 15})
  void scaledMatchingsAreNearTheTruth(int n) {
    CarryAccuracy.Truth truth = new CarryAccuracy.Truth(CarryProblem.of("waves:" + n));
    assertTrue(truth.of(ComparedMatching.CUBATURE_FIVE).error() < 1e-6);
    assertTrue(truth.of(ComparedMatching.SPARSE).error() < 1e-6);
    assertTrue(truth.of(ComparedMatching.LINEAR).error() < 0.01);
    assertTrue(truth.of(ComparedMatching.SIMPLEX).error() < 0.01);
    assertTrue(truth.of(ComparedMatching.RANDOM).error() < 0.01);
  }

  /** So that its slope is that of its first points: 2 n + 3. */
  @ParameterizedTest
  @ValueSource(ints = {2, 15, 60})
  void toleranceTakesItsFirstPointsOfWaves(int n) {
    Carrier carrier = new Carrier("waves:" + n, "tolerance0.01");
    assertEquals(2 * n + 3, carrier.work().evaluations());
  }

  /** The function alone is called as often as by the matching, and left as it was: twice the same sum. */
  @Test
  void theModelAloneIsRepeatable() {
    Carrier carrier = new Carrier("turn:9", "second-order");
    double sum = carrier.model();
    assertTrue(Double.isFinite(sum));
    assertEquals(sum, carrier.model(), 0);
  }
}
