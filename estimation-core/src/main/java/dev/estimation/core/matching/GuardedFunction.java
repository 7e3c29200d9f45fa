package dev.estimation.core.matching;

import dev.estimation.core.function.VectorFunction;
import dev.estimation.core.internal.Checks;
import java.util.Arrays;

/** Evaluates a function, counts the calls, and notices outputs that are not finite or not filled. */
final class GuardedFunction {
  /** A NaN that no arithmetic makes: an output that still holds it was left out. */
  private static final double UNFILLED = Double.longBitsToDouble(0x7ff8_0f1e_1d0f_f111L);

  private final VectorFunction function;
  private int evaluations;
  private int failedComponent;
  private double failedValue;
  private int size;

  GuardedFunction(VectorFunction function) {
    this.function = function;
  }

  void reset() {
    evaluations = 0;
  }

  int evaluations() {
    return evaluations;
  }

  /** Counts evaluations made by others. */
  void count(int more) {
    evaluations += more;
  }

  /** Fills {@code output}; false if a component is not finite. */
  boolean evaluate(double[] input, double[] given, double[] output) {
    Arrays.fill(output, UNFILLED);
    function.evaluate(input, given, output);
    evaluations++;
    if (Checks.allFinite(output)) {
      return true;
    }
    failedComponent = Checks.firstNotFinite(output);
    failedValue = output[failedComponent];
    size = output.length;
    return false;
  }

  String failure() {
    boolean unfilled =
        Double.doubleToRawLongBits(failedValue) == Double.doubleToRawLongBits(UNFILLED);
    return "output[" + failedComponent + "] of " + size + " "
        + (unfilled ? "was not filled" : "must be finite, got " + failedValue)
        + " (evaluation " + evaluations + ")";
  }
}
