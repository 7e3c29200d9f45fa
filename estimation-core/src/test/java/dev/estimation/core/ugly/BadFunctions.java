package dev.estimation.core.ugly;

import dev.estimation.core.function.Structure;
import dev.estimation.core.function.VectorFunction;

/** A function of two inputs and two outputs that misbehaves when told to by {@code given[0]}. */
final class BadFunctions implements VectorFunction {
  static final double GOOD = 0;
  static final double LEAVES_OUT = 1;
  static final double GIVES_NAN = 2;
  static final double GIVES_INFINITY = 3;
  static final double THROWS = 4;
  static final double WRITES_INPUT = 5;
  static final double BAD_AWAY_FROM_MEAN = 6;
  static final double OVERFLOWS = 7;
  static final double BAD_JACOBIAN = 8;

  static final double BAD_HESSIAN = 9;

  private final boolean derivatives;

  BadFunctions(boolean derivatives) {
    this.derivatives = derivatives;
  }

  @Override
  public void evaluate(double[] input, double[] given, double[] output) {
    double conduct = given[0];
    output[0] = input[0] + 0.1 * input[1] * input[1];
    if (conduct == LEAVES_OUT) {
      return;
    }
    output[1] = Math.sin(input[1]);
    if (conduct == GIVES_NAN || (conduct == BAD_AWAY_FROM_MEAN && input[0] > 1)) {
      output[1] = Double.NaN;
    } else if (conduct == GIVES_INFINITY) {
      output[0] = Double.NEGATIVE_INFINITY;
    } else if (conduct == THROWS) {
      throw new IllegalStateException("no such anchor: 42");
    } else if (conduct == OVERFLOWS) {
      output[0] = 1e200 * input[0];
    } else if (conduct == WRITES_INPUT) {
      input[0] = 1e9;
      input[1] = -1e9;
    }
  }

  @Override
  public Structure structure() {
    return derivatives
        ? Structure.UNKNOWN
            .withJacobian(BadFunctions::derive)
            .withHessian(BadFunctions::deriveTwice)
        : Structure.UNKNOWN;
  }

  private static void derive(double[] input, double[] given, double[] jacobian) {
    jacobian[0] = given[0] == OVERFLOWS ? 1e200 : 1;
    jacobian[1] = 0.2 * input[1];
    jacobian[3] = given[0] == BAD_JACOBIAN ? Double.NaN : Math.cos(input[1]);
    if (given[0] == WRITES_INPUT) {
      input[0] = 1e9;
    }
  }

  private static void deriveTwice(double[] input, double[] given, double[] hessians) {
    hessians[3] = 0.2;
    hessians[7] = given[0] == BAD_HESSIAN ? Double.NaN : -Math.sin(input[1]);
    if (given[0] == WRITES_INPUT) {
      input[0] = 1e9;
    }
  }
}
