package dev.estimation.benchmarks.weigh;

import java.util.List;

/**
 * What a weighing found over one run.
 *
 * @param status of the run that gave the points: how it ended
 * @param functions those that had points: the motion, if it had, and then sensors
 */
public record WeighedRun(String status, List<FunctionWeight> functions) {
  /** Keeps a copy of the functions. */
  public WeighedRun {
    functions = List.copyOf(functions);
  }

  /** {@return whether there was a point with a truth to hold methods against} */
  public boolean hasPoints() {
    return functions.stream().anyMatch(function -> function.points() > 0);
  }
}
