package dev.estimation.testing;

import dev.estimation.core.function.Structure;
import dev.estimation.core.function.VectorFunction;

/** x = r cos(theta), y = r sin(theta) of a range (m) and an angle (rad), with its derivatives. */
public final class PolarToCartesian implements VectorFunction {
  @Override
  public void evaluate(double[] input, double[] given, double[] output) {
    output[0] = input[0] * Math.cos(input[1]);
    output[1] = input[0] * Math.sin(input[1]);
  }

  @Override
  public Structure structure() {
    return Structure.UNKNOWN
        .withJacobian(PolarToCartesian::derive)
        .withHessian(PolarToCartesian::deriveTwice);
  }

  private static void derive(double[] input, double[] given, double[] jacobian) {
    double cosine = Math.cos(input[1]);
    double sine = Math.sin(input[1]);
    jacobian[0] = cosine;
    jacobian[1] = -input[0] * sine;
    jacobian[2] = sine;
    jacobian[3] = input[0] * cosine;
  }

  private static void deriveTwice(double[] input, double[] given, double[] hessians) {
    double cosine = Math.cos(input[1]);
    double sine = Math.sin(input[1]);
    hessians[2] = -sine;
    hessians[3] = -input[0] * cosine;
    hessians[6] = cosine;
    hessians[7] = -input[0] * sine;
  }
}
