package dev.estimation.testing;

import dev.estimation.core.function.Structure;
import dev.estimation.core.function.VectorFunction;
import org.ejml.data.DMatrixRMaj;

/** z = A u + c, with its Jacobian. */
public final class AffineFunction implements VectorFunction {
  private final DMatrixRMaj matrix;
  private final double[] offset;

  /** The function of a matrix, m x n, and m offsets; both kept. */
  public AffineFunction(DMatrixRMaj matrix, double... offset) {
    this.matrix = matrix;
    this.offset = offset;
  }

  @Override
  public void evaluate(double[] input, double[] given, double[] output) {
    for (int i = 0; i < matrix.numRows; i++) {
      double sum = offset[i];
      for (int j = 0; j < matrix.numCols; j++) {
        sum += matrix.get(i, j) * input[j];
      }
      output[i] = sum;
    }
  }

  @Override
  public Structure structure() {
    return Structure.UNKNOWN
        .withJacobian((input, given, jacobian) ->
            System.arraycopy(matrix.data, 0, jacobian, 0, matrix.getNumElements()))
        .withHessian((input, given, hessians) -> {});
  }
}
