package dev.estimation.benchmarks.weigh;

import java.util.ArrayList;
import java.util.List;

/**
 * A method over all functions of a step, since a filter has one matching for them all.
 *
 * @param method its name
 * @param suffices whether it serves every function and is within the tolerance at 99 % of the points of each
 * @param serves whether it serves every function
 * @param cost evaluations and Jacobians of a step: medians of a call, times the calls
 * @param micros of a step (us): the calls of its functions, nothing else; NaN if it was not measured
 * @param error the largest of the 99 % errors of the functions
 * @param largest the largest error at any point
 * @param worst the function that has the largest share of points above the tolerance
 * @param worstShare that share
 */
record StepWeight(
    String method,
    boolean suffices,
    boolean serves,
    double cost,
    double micros,
    double error,
    double largest,
    String worst,
    double worstShare) {

  /** {@return all methods, in the order given} */
  static List<StepWeight> of(List<FunctionWeight> functions) {
    List<StepWeight> result = new ArrayList<>();
    for (int i = 0; i < functions.get(0).methods().size(); i++) {
      result.add(of(functions, i));
    }
    return result;
  }

  private static StepWeight of(List<FunctionWeight> functions, int index) {
    boolean suffices = true;
    boolean serves = true;
    double cost = 0;
    double micros = 0;
    double error = 0;
    double largest = 0;
    FunctionWeight worst = functions.get(0);
    for (FunctionWeight function : functions) {
      MethodWeight weight = function.methods().get(index);
      suffices &= weight.suffices();
      serves &= weight.serves();
      cost += function.callsPerStep() * weight.cost();
      micros += function.callsPerStep() * weight.micros();
      error = Math.max(error, weight.error().nearlyAll());
      largest = Math.max(largest, weight.error().largest());
      worst = weight.shareAbove() > worst.methods().get(index).shareAbove() ? function : worst;
    }
    MethodWeight worstWeight = worst.methods().get(index);
    return new StepWeight(
        worstWeight.method(),
        suffices,
        serves,
        cost,
        micros,
        error,
        largest,
        worst.name(),
        worstWeight.shareAbove());
  }
}
