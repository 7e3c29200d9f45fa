package dev.estimation.benchmarks.weigh;

/**
 * What is wanted of a method.
 *
 * @param tolerance of the error at 99 % of the operating points
 * @param mostAccurate whether, of the methods within the budget, the most accurate is wanted instead of the cheapest within
 *     the tolerance
 * @param budget of the calls of a step (us); infinite if there is none
 */
public record Wish(double tolerance, boolean mostAccurate, double budget) {
  boolean hasBudget() {
    return budget < Double.POSITIVE_INFINITY;
  }

  boolean affords(StepWeight weight) {
    return !hasBudget() || weight.micros() <= budget;
  }
}
