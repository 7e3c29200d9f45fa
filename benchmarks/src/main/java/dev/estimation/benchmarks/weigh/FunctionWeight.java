package dev.estimation.benchmarks.weigh;

import java.util.ArrayList;
import java.util.Comparator;
import java.util.List;
import java.util.Optional;
import java.util.function.ToDoubleFunction;

/**
 * All methods at the operating points of one function.
 *
 * @param name of the function
 * @param motion whether it is the motion; else it is a sensor
 * @param callsPerStep how many calls a step takes, the mean over the selected steps
 * @param points looked at whose truth was found
 * @param unknown points without truth, which do not count
 * @param firstUnknown why, in words; empty if there are none
 * @param nonlinearInputs how many inputs points are drawn over
 * @param uncertainty of the truth
 * @param notConverged at how many points rules of growing order do not agree, so that the function is not smooth there
 * @param methods in the order given
 */
public record FunctionWeight(
    String name,
    boolean motion,
    double callsPerStep,
    int points,
    int unknown,
    String firstUnknown,
    int nonlinearInputs,
    Quantiles uncertainty,
    int notConverged,
    List<MethodWeight> methods) {
  private static final double EXACT = 1e-6;

  /** Keeps a copy of the methods. */
  public FunctionWeight {
    methods = List.copyOf(methods);
  }

  /** {@return the method within the tolerance with the least evaluations and Jacobians, the first of equals} */
  public Optional<MethodWeight> cheapest() {
    return methods.stream()
        .filter(MethodWeight::suffices)
        .min(Comparator.comparingDouble(MethodWeight::cost)
            .thenComparingDouble(weight -> weight.error().nearlyAll()));
  }

  /** {@return whether every method that serves carries the function without an error to speak of} */
  public boolean isExact() {
    return nonlinearInputs == 0
        && methods.stream()
            .filter(MethodWeight::serves)
            .allMatch(one -> one.error().largest() < EXACT);
  }

  /** {@return the methods to which none is better in both the 99 % error and the time of a call} */
  public List<String> frontByTime() {
    return front(MethodWeight::micros);
  }

  /** {@return the methods to which none is better in both the 99 % error and evaluations with Jacobians} */
  public List<String> frontByEvaluations() {
    return front(MethodWeight::cost);
  }

  private List<String> front(ToDoubleFunction<MethodWeight> cost) {
    List<String> front = new ArrayList<>();
    for (MethodWeight one : methods) {
      boolean competes = one.serves()
          && Double.isFinite(cost.applyAsDouble(one))
          && Double.isFinite(one.error().nearlyAll());
      if (competes
          && methods.stream().noneMatch(other -> other.serves() && beats(other, one, cost))) {
        front.add(one.method());
      }
    }
    return front;
  }

  private static boolean beats(
      MethodWeight a, MethodWeight b, ToDoubleFunction<MethodWeight> cost) {
    double errorA = a.error().nearlyAll();
    double errorB = b.error().nearlyAll();
    double costA = cost.applyAsDouble(a);
    double costB = cost.applyAsDouble(b);
    return errorA <= errorB && costA <= costB && (errorA < errorB || costA < costB);
  }
}
