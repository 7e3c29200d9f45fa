package dev.estimation.benchmarks.weigh;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertFalse;
import static org.junit.jupiter.api.Assertions.assertTrue;

import java.util.Arrays;
import java.util.List;
import java.util.Optional;
import org.junit.jupiter.api.Test;

class RecommendationTest {
  private static final Wish ONE_PER_CENT = new Wish(0.01, false, Double.POSITIVE_INFINITY);

  private static Quantiles all(double number) {
    return new Quantiles(number, number, number, number);
  }

  private static MethodWeight method(
      String name, double error, double shareAbove, double evaluations, double micros) {
    return new MethodWeight(
        name, "", all(error), shareAbove, all(evaluations), all(1), micros, 0, "");
  }

  private static MethodWeight refused(String name) {
    return new MethodWeight(
        name,
        "no Jacobian",
        all(Double.POSITIVE_INFINITY),
        1,
        all(0),
        all(0),
        Double.NaN,
        200,
        "no Jacobian");
  }

  private static WeighedRun run(double calls, MethodWeight... methods) {
    return new WeighedRun("ok", List.of(function("Range", calls, methods)));
  }

  private static FunctionWeight function(String name, double calls, MethodWeight... methods) {
    return new FunctionWeight(name, false, calls, 200, 0, "", 2, all(0), 3, Arrays.asList(methods));
  }

  @Test
  void theCheapestThatSufficesIsTakenAndTheReasonNamesWhatDoesNot() {
    WeighedRun run = run(
        2,
        method("linear", 0.3, 0.31, 1, 0.1),
        method("many", 0.001, 0, 9, 0.2),
        method("few", 0.009, 0.01, 5, 0.4));
    Recommendation recommendation = Recommendation.of(run, ONE_PER_CENT);
    assertEquals(Optional.of("few"), recommendation.method());
    assertTrue(recommendation.suffices());
    assertEquals(
        "few: error within 1 % at 99 % of the operating points, 12 evaluations and Jacobians a step, 0.8 us;"
            + " at the others its error is up to 0.9 %;"
            + " linear exceeds 1 % at 31 % of the points of Range;"
            + " many suffices too and took less time, 0.4 us",
        recommendation.reason());
  }

  @Test
  void itMustSufficeForEveryFunction() {
    WeighedRun run = new WeighedRun(
        "ok",
        List.of(
            function("Turn", 1, method("linear", 0, 0, 1, 1), method("points", 0, 0, 5, 1)),
            function("Range", 1, method("linear", 1, 0.02, 1, 1), method("points", 0, 0, 5, 1))));
    assertEquals(Optional.of("points"), Recommendation.of(run, ONE_PER_CENT).method());
  }

  @Test
  void ofEqualsTheMoreAccurateIsTakenThenTheFirst() {
    WeighedRun differ = run(1, method("a", 0.002, 0, 3, 1), method("b", 0.001, 0, 3, 1));
    assertEquals(Optional.of("b"), Recommendation.of(differ, ONE_PER_CENT).method());
    WeighedRun equal = run(1, method("a", 0.001, 0, 3, 2), method("b", 0.001, 0, 3, 1));
    assertEquals(Optional.of("a"), Recommendation.of(equal, ONE_PER_CENT).method());
  }

  @Test
  void aBudgetLeavesOutWhatTakesLonger() {
    WeighedRun run = run(
        2,
        method("linear", 0.3, 0.31, 1, 0.1),
        method("few", 0.009, 0.01, 5, 4),
        method("many", 0.001, 0, 9, 0.2));
    assertEquals(
        Optional.of("many"), Recommendation.of(run, new Wish(0.01, false, 1)).method());
    Recommendation tight = Recommendation.of(run, new Wish(0.01, false, 0.3));
    assertEquals(Optional.of("linear"), tight.method());
    assertFalse(tight.suffices());
    assertTrue(tight.reason().contains("not within 1 %"), tight.reason());
    assertEquals(
        Optional.empty(), Recommendation.of(run, new Wish(0.01, false, 0.1)).method());
    assertEquals(
        Optional.of("many"), Recommendation.of(run, new Wish(0.01, true, 100)).method());
  }

  @Test
  void whereNothingSufficesNothingIsRecommended() {
    Recommendation none = Recommendation.of(
        run(1, refused("linear"), method("a", 0.2, 0.5, 3, 1), method("b", 0.3, 0.04, 5, 1)),
        ONE_PER_CENT);
    assertEquals(Optional.empty(), none.method());
    assertEquals(
        "no method is within 1 % at 99 % of the operating points; the nearest, b exceeds 1 % at 4 % of the points of"
            + " Range; the smallest error at 99 % of them has a, 20 %; Range is not smooth at the scale of the spread at"
            + " 3 of its 200 points",
        none.reason());
  }

  @Test
  void whatIsNotKnownIsNotRecommended() {
    FunctionWeight known = function("Turn", 1, method("linear", 0, 0, 1, 1));
    FunctionWeight blind = new FunctionWeight(
        "Range", false, 1, 0, 7, "output is NaN", 0, all(Double.NaN), 0, known.methods());
    Recommendation none =
        Recommendation.of(new WeighedRun("ok", List.of(known, blind)), ONE_PER_CENT);
    assertEquals(Optional.empty(), none.method());
    assertTrue(none.reason().contains("Range"), none.reason());
    FunctionWeight partly =
        new FunctionWeight("Range", false, 1, 9, 7, "output is NaN", 2, all(0), 0, known.methods());
    Recommendation some =
        Recommendation.of(new WeighedRun("ok", List.of(known, partly)), ONE_PER_CENT);
    assertEquals(Optional.of("linear"), some.method());
    assertTrue(some.reason().endsWith("7 points of Range have no truth and do not count"));
  }

  @Test
  void aMethodThatFailsHereAndThereIsToldOf() {
    Quantiles failing = new Quantiles(0, 0, 0, Double.POSITIVE_INFINITY);
    MethodWeight often = new MethodWeight(
        "often", "", failing, 0.005, all(1), all(1), Double.NaN, 1, "not definite");
    Recommendation recommendation = Recommendation.of(run(1, often), ONE_PER_CENT);
    assertEquals(Optional.of("often"), recommendation.method());
    assertTrue(recommendation.reason().contains("gives no result"), recommendation.reason());
    MethodWeight always = new MethodWeight(
        "always", "", all(Double.POSITIVE_INFINITY), 1, all(1), all(1), 1, 200, "not definite");
    assertEquals(
        Optional.empty(), Recommendation.of(run(1, always), ONE_PER_CENT).method());
    assertEquals(
        Optional.empty(),
        Recommendation.of(run(1, always), new Wish(0.01, false, 9)).method());
  }

  @Test
  void fronts() {
    FunctionWeight function = function(
        "Range",
        1,
        method("cheap", 0.1, 1, 1, 3),
        method("good", 0.01, 0, 5, 2),
        method("beaten", 0.02, 0, 6, 2.5),
        method("slow", 0.01, 0, 5, 9),
        refused("none"));
    assertEquals(List.of("cheap", "good", "slow"), function.frontByEvaluations());
    assertEquals(List.of("good"), function.frontByTime());
    assertEquals("good", function.cheapest().orElseThrow().method());
  }
}
