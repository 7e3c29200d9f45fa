package dev.estimation.core.function;

import dev.estimation.core.space.Space;
import java.util.Arrays;

/**
 * Hessians by central differences of a Jacobian G: with X the differences (G(u + h_l e_l) - G(u - h_l
 * e_l)) / (2 h_l), entry (i, j, l) is the mean of X_ij by l and X_il by j, symmetric by construction.
 *
 * <p>The step is h_l = eps^(1/3) s_l, eps = 2^-52, with s_l the scale of input l, as for {@link
 * CentralDifferences}, and so is the accuracy: about 1e-10 of the entries of G over the scale.
 *
 * <p>Only active inputs are differenced; all other entries are zero. Cost: 2 Jacobians an active input.
 * NaN in the Jacobian becomes NaN in the entries. <i>Confined to one thread</i>; allocates only when
 * built.
 */
public final class JacobianDifferences implements Hessian {
  private static final double STEP = Math.cbrt(0x1p-52);

  private final Jacobian jacobian;
  private final int columns;
  private final int rows;
  private final int[] active;
  private final InputSteps steps;
  private final double[] ahead;
  private final double[] behind;

  /**
   * Differences of the Jacobian that a function offers.
   *
   * @param input where u lives
   * @param output where g(u) lives
   * @param function one that has a Jacobian
   * @param scales one for each dimension of the input, finite and above 0, in its unit; copied
   */
  public JacobianDifferences(Space input, Space output, VectorFunction function, double[] scales) {
    this.steps = new InputSteps(input, scales, STEP);
    this.columns = input.dimension();
    this.rows = output.dimension();
    Structure structure = function.structure();
    this.active = structure.activeInputs(columns);
    this.jacobian = structure
        .jacobian()
        .orElseThrow(() -> new IllegalArgumentException(
            "differences of a Jacobian want one, and the function offers none"));
    this.ahead = new double[rows * columns];
    this.behind = new double[rows * columns];
  }

  @Override
  public void evaluate(double[] point, double[] given, double[] hessians) {
    Arrays.fill(hessians, 0);
    for (int l : active) {
      double width = derive(point, given, l, 1, ahead) - derive(point, given, l, -1, behind);
      for (int i = 0; i < rows; i++) {
        for (int j : active) {
          int at = i * columns + j;
          hessians[at * columns + l] = (ahead[at] - behind[at]) / width;
        }
      }
    }
    for (int i = 0; i < rows; i++) {
      symmetrise(i * columns * columns, hessians);
    }
  }

  private double derive(double[] point, double[] given, int l, int count, double[] result) {
    double[] moved = steps.move(point, l, count);
    Arrays.fill(result, 0);
    jacobian.evaluate(moved, given, result);
    return steps.displacement(l);
  }

  private void symmetrise(int start, double[] hessians) {
    for (int j = 1; j < columns; j++) {
      for (int l = 0; l < j; l++) {
        int lower = start + j * columns + l;
        int upper = start + l * columns + j;
        double mean = (hessians[lower] + hessians[upper]) / 2;
        hessians[lower] = mean;
        hessians[upper] = mean;
      }
    }
  }

  /** {@return the Jacobians that one call costs} */
  public int jacobians() {
    return 2 * active.length;
  }
}
