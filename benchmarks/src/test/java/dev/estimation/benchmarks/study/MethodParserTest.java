package dev.estimation.benchmarks.study;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertThrows;
import static org.junit.jupiter.api.Assertions.assertTrue;

import dev.estimation.benchmarks.log.BadInputException;
import dev.estimation.core.function.VectorFunction;
import dev.estimation.core.gaussian.Gaussian;
import dev.estimation.core.gaussian.Moments;
import dev.estimation.core.matching.MatchingWorkspace;
import dev.estimation.core.space.Space;
import java.util.HashSet;
import java.util.Set;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.CsvSource;
import org.junit.jupiter.params.provider.ValueSource;

class MethodParserTest {
  private static final VectorFunction SUM_OF_SQUARES = (input, given, output) -> {
    output[0] = input[0] * input[0] + input[1] * input[1];
  };

  /**
   * The variance of a sum of two squares tells parameters apart. By hand: with c^2 = alpha^2 (2 +
   * kappa), all points have the value c^2 and the weights 1 / (2 c^2), so the mean is 2 and the
   * variance 2 c^2 + 4 (beta - alpha^2). Cubature: as alpha 1, beta and kappa 0. At S deviations: 2
   * S^2 + 4 max(2 - S^2, -S^2 / 2). Simplex: 4 w / (1 - w), w = 1/2 by itself. Sparse grids of degree 3
   * have 4 points at sqrt 3 of weight 1/6: 4 * 9 / 6 - 2^2. Exact: 4.
   */
  @ParameterizedTest
  @CsvSource({
    "'unscented:1,2,0', 8",
    "'unscented:1,0,1', 2",
    "'unscented:1,0,3-n', 2",
    "'unscented:1,1,2', 8",
    "'unscented:1,1,4-n', 8",
    "'unscented:+1.0,-0.5,3e0', 4",
    "'unscented:1', 2",
    "'unscented:2.5-n', 1",
    "'deviations:1', 6",
    "'deviations:1.5', 3.5",
    "simplex, 4",
    "simplex:0, 0",
    "simplex:0.75, 12",
    "cubature, 0",
    "cubature5, 4",
    "mcnamee-stenger, 4",
    "hermite:3, 4",
    "sparse:1, 2",
    "sparse:2, 4",
    "sparse-degree:3, 2",
    "sparse-degree:5, 4",
    "linear2-spread, 4",
    "linear2-axes, 4"
  })
  void readsItsNumbers(String typed, double variance) {
    assertEquals(typed, MethodParser.parse(typed).typed());
    MatchingWorkspace work = carry(typed, SUM_OF_SQUARES);
    assertEquals(2, work.output().mean()[0], 1e-13); // rounding of sums of a few numbers
    assertEquals(variance, work.output().covariance().get(0, 0), 1e-12);
  }

  /** The product of two independent standard normal numbers has variance 1, all of second order. */
  @ParameterizedTest
  @CsvSource({"linear-spread, 0", "linear2-axes, 0", "linear2-spread, 1"})
  void readsLinearisationsOverTheSpread(String typed, double variance) {
    MatchingWorkspace work =
        carry(typed, (input, given, output) -> output[0] = input[0] * input[1]);
    assertEquals(variance, work.output().covariance().get(0, 0), 1e-15); // a few roundings of 1
  }

  /** Sixth moment along an axis (exact 15) by the two rules of degree 5 in two dimensions. */
  @ParameterizedTest
  @CsvSource({"cubature5, 10", "mcnamee-stenger, 9"})
  void tellsTheRulesOfDegreeFiveApart(String typed, double sixthMoment) {
    MatchingWorkspace work =
        carry(typed, (input, given, output) -> output[0] = Math.pow(input[0], 6));
    assertEquals(sixthMoment, work.output().mean()[0], 1e-12);
    assertEquals(9, work.evaluations());
  }

  private static MatchingWorkspace carry(String typed, VectorFunction function) {
    MatchingWorkspace work = MethodParser.parse(typed)
        .kind()
        .matching()
        .workspace(Space.reals(2), Space.reals(1), function);
    Moments input = new Moments(Space.reals(2));
    input.set(Gaussian.independent(new double[2], new double[] {1, 1}));
    work.carry(input, new double[0], null);
    return work;
  }

  /** The mean of the sum of squares is 2 for standardised draws, whatever they are. */
  @ParameterizedTest
  @ValueSource(
      strings = {"random:50,-7", "antithetic:25,-7", "latin:50,-7", "sobol:50", "halton:50"})
  void readsDrawnPoints(String typed) {
    MatchingWorkspace work = carry(typed, SUM_OF_SQUARES);
    assertEquals(2, work.output().mean()[0], 1e-13);
    assertEquals(51, work.evaluations(), "the draws and the mean");
  }

  /** Each word has points of its own, and a seed tells: the variances differ. */
  @Test
  void everyWordHasPointsOfItsOwn() {
    String[] words = {
      "random:50,1", "random:50,2", "antithetic:25,1", "antithetic:25,2", "latin:50,1",
      "latin:50,2", "sobol:50", "halton:50", "sobol:51", "halton:51"
    };
    Set<Double> variances = new HashSet<>();
    for (String typed : words) {
      MatchingWorkspace work = MethodParser.parse(typed)
          .kind()
          .matching()
          .workspace(Space.reals(2), Space.reals(1), SUM_OF_SQUARES);
      Moments input = new Moments(Space.reals(2));
      input.set(Gaussian.independent(new double[2], new double[] {1, 1}));
      work.carry(input, new double[0], null);
      variances.add(work.output().covariance().get(0, 0));
    }
    assertEquals(words.length, variances.size());
  }

  @Test
  void readsIteratedUpdates() {
    Method full = MethodParser.parse("linear-iterated");
    Method searched = MethodParser.parse("linear-iterated:line-search");
    assertEquals("linear-iterated", full.typed());
    assertEquals("linear-iterated:line-search", searched.typed());
    assertTrue(full.kind().iteration().isPresent());
    assertTrue(searched.kind().iteration().isPresent());
    assertTrue(MethodParser.parse("linear").kind().iteration().isEmpty());
  }

  @Test
  void readsTheDefaults() {
    assertEquals(
        6, MethodParser.DEFAULT.stream().map(MethodParser::parse).distinct().count());
  }

  @ParameterizedTest
  @ValueSource(
      strings = {
        "",
        "Linear",
        "linear:",
        "linear:1",
        "linear2",
        "linear-spread:",
        "linear2-spread:1",
        "linear2-axes:2,3",
        "linear-iterated:",
        "linear-iterated:line",
        "linear-iterated:line-search,line-search",
        "cubature:3",
        "cubature5:5",
        "mcnamee-stenger:",
        "deviations",
        "deviations:0",
        "deviations:x",
        "simplex:",
        "simplex:1",
        "simplex:0,0",
        "unscented",
        "unscented:",
        "unscented:a",
        "unscented:1,2",
        "unscented:1,2,0,0",
        "unscented:0,2,0",
        "unscented:-1,2,0",
        "unscented:a,2,0",
        "unscented:1,NaN,0",
        "unscented:1,2,n",
        "unscented:1,2,-n",
        "unscented:1,2,3-m",
        "unscented:1, 2,0",
        "unscented:1e999,2,0",
        "hermite",
        "hermite:",
        "hermite:1",
        "hermite:3.5",
        "hermite:101",
        "hermite:3,3",
        "sparse",
        "sparse:",
        "sparse:0",
        "sparse:5",
        "sparse:2.5",
        "sparse:1,2",
        "sparse-degree",
        "sparse-degree:1",
        "sparse-degree:52",
        "sparse-degree:x",
        "random",
        "random:10",
        "random:1,5",
        "random:10,x",
        "random:1e3,5",
        "random:10,0.5",
        "random:10,5,5",
        "antithetic:15,5",
        "antithetic:16",
        "antithetic:16,x",
        "antithetic:1.5,5",
        "latin:1,5",
        "latin:10",
        "latin:10,x",
        "latin:100001,5",
        "sobol",
        "sobol:1",
        "sobol:10,5",
        "sobol:x",
        "halton",
        "halton:1",
        "halton:10,5",
        "halton:x",
        "halton:100001",
        "spline"
      })
  void refusesTheRestInOneLine(String typed) {
    String message =
        assertThrows(BadInputException.class, () -> MethodParser.parse(typed)).getMessage();
    assertTrue(message.contains("method"), message);
    assertTrue(message.contains(typed), message);
    assertTrue(message.lines().count() == 1, message);
  }
}
