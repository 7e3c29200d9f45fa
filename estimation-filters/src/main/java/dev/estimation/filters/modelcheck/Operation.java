package dev.estimation.filters.modelcheck;

import java.util.Arrays;

/** A method of a model that fills one array. */
final class Operation {
  /** The call itself. */
  @FunctionalInterface
  interface Call {
    void run(Arguments in, double[] out);
  }

  private final String method;
  private final String output;
  private final int[] shape;
  private final double blank;
  private final Call call;

  private Operation(String method, String output, double blank, Call call, int... shape) {
    this.method = method;
    this.output = output;
    this.shape = shape;
    this.blank = blank;
    this.call = call;
  }

  /** A method that fills a vector, which arrives as NaN. */
  static Operation vector(String method, String output, int size, Call call) {
    return new Operation(method, output, Double.NaN, call, size);
  }

  /** A method that fills a matrix, or a matrix for each row, which arrives as zeros. */
  static Operation matrix(String method, String output, Call call, int... shape) {
    return new Operation(method, output, 0, call, shape);
  }

  String method() {
    return method;
  }

  boolean isVector() {
    return shape.length == 1;
  }

  double[] blankOutput() {
    return filledOutput(blank);
  }

  double[] filledOutput(double value) {
    double[] out = new double[Arrays.stream(shape).reduce(1, (a, b) -> a * b)];
    Arrays.fill(out, value);
    return out;
  }

  void clear(double[] out) {
    Arrays.fill(out, blank);
  }

  void run(Arguments in, double[] out) {
    call.run(in, out);
  }

  /** The name of an entry, as {@code jacobian[0][3]}. */
  String entry(int index) {
    StringBuilder text = new StringBuilder();
    int rest = index;
    for (int axis = shape.length - 1; axis >= 0; axis--) {
      text.insert(0, "[" + rest % shape[axis] + "]");
      rest /= shape[axis];
    }
    return output + text;
  }
}
