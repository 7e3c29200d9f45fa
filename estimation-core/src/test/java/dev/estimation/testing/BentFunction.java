package dev.estimation.testing;

import dev.estimation.core.function.Structure;
import dev.estimation.core.function.VectorFunction;
import org.ejml.data.DMatrixRMaj;

/**
 * z_r = sin(a_r' u) + (b_r' u)^2 / 4 + given[0], smooth and bent in every direction, with its
 * derivatives.
 */
public final class BentFunction implements VectorFunction {
  private final DMatrixRMaj sine;
  private final DMatrixRMaj square;

  /** A random function of n inputs and m outputs; rows of its matrices have length of about 1. */
  public BentFunction(int inputs, int outputs, long seed) {
    RandomGaussians random = new RandomGaussians(seed);
    this.sine = scaled(random.matrix(outputs, inputs));
    this.square = scaled(random.matrix(outputs, inputs));
  }

  private static DMatrixRMaj scaled(DMatrixRMaj matrix) {
    for (int i = 0; i < matrix.getNumElements(); i++) {
      matrix.data[i] /= Math.sqrt(matrix.numCols);
    }
    return matrix;
  }

  @Override
  public void evaluate(double[] input, double[] given, double[] output) {
    for (int r = 0; r < sine.numRows; r++) {
      double b = product(square, r, input);
      output[r] = Math.sin(product(sine, r, input)) + b * b / 4 + given[0];
    }
  }

  private static double product(DMatrixRMaj matrix, int row, double[] input) {
    double sum = 0;
    for (int j = 0; j < matrix.numCols; j++) {
      sum += matrix.get(row, j) * input[j];
    }
    return sum;
  }

  @Override
  public Structure structure() {
    return Structure.UNKNOWN
        .withJacobian((input, given, jacobian) -> derive(input, jacobian))
        .withHessian((input, given, hessians) -> deriveTwice(input, hessians));
  }

  private void derive(double[] input, double[] jacobian) {
    for (int r = 0; r < sine.numRows; r++) {
      double slope = Math.cos(product(sine, r, input));
      double b = product(square, r, input);
      for (int j = 0; j < sine.numCols; j++) {
        jacobian[r * sine.numCols + j] = slope * sine.get(r, j) + b / 2 * square.get(r, j);
      }
    }
  }

  private void deriveTwice(double[] input, double[] hessians) {
    int n = sine.numCols;
    for (int r = 0; r < sine.numRows; r++) {
      double curvature = -Math.sin(product(sine, r, input));
      for (int j = 0; j < n; j++) {
        for (int l = 0; l <= j; l++) {
          hessians[(r * n + j) * n + l] =
              curvature * sine.get(r, j) * sine.get(r, l) + square.get(r, j) * square.get(r, l) / 2;
        }
      }
    }
  }
}
