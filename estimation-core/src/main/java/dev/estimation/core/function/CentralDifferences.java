package dev.estimation.core.function;

import dev.estimation.core.space.Space;
import java.util.Arrays;

/**
 * A Jacobian by central differences: column j is (g(u + h_j e_j) - g(u - h_j e_j)) / (2 h_j), taken
 * with the differences and displacements of the spaces, so that angles may cross their seam.
 *
 * <p>The step is h_j = eps^(1/3) s_j, eps = 2^-52, with s_j the <i>scale</i> of input j: a length over
 * which g bends noticeably. It is given, since at zero none can be guessed. With a right scale the
 * relative error is about 1e-10: truncation h^2 g''' / 6 and rounding eps g / h are balanced there.
 *
 * <p>Only the active inputs are differenced; the other columns are zero. Cost: 2 evaluations an
 * active input. Source: Dennis and Schnabel 1983, <i>Numerical Methods for Unconstrained Optimization
 * and Nonlinear Equations</i>, section 5.4 (from memory). NaN from g becomes NaN in the column.
 * <i>Confined to one thread</i>; allocates only when built.
 */
public final class CentralDifferences implements Jacobian {
  private static final double STEP = Math.cbrt(0x1p-52);

  private final Space output;
  private final VectorFunction function;
  private final int columns;
  private final int[] active;
  private final InputSteps steps;
  private final double[] ahead;
  private final double[] behind;
  private final double[] difference;

  /**
   * Differences of a function.
   *
   * @param input where u lives
   * @param output where g(u) lives
   * @param function the function
   * @param scales one for each dimension of the input, finite and above 0, in its unit; copied
   */
  public CentralDifferences(Space input, Space output, VectorFunction function, double[] scales) {
    this.steps = new InputSteps(input, scales, STEP);
    this.output = output;
    this.function = function;
    this.columns = input.dimension();
    this.active = function.structure().activeInputs(columns);
    this.ahead = new double[output.storage()];
    this.behind = new double[output.storage()];
    this.difference = new double[output.dimension()];
  }

  @Override
  public void evaluate(double[] point, double[] given, double[] jacobian) {
    Arrays.fill(jacobian, 0);
    for (int j : active) {
      double width = image(point, given, j, 1, ahead) - image(point, given, j, -1, behind);
      output.difference(ahead, behind, difference);
      for (int i = 0; i < difference.length; i++) {
        jacobian[i * columns + j] = difference[i] / width;
      }
    }
  }

  /** Evaluates g away from the point and returns the displacement, as rounded. */
  private double image(double[] point, double[] given, int j, int count, double[] result) {
    double[] moved = steps.move(point, j, count);
    Arrays.fill(result, Double.NaN);
    function.evaluate(moved, given, result);
    return steps.displacement(j);
  }

  /** {@return the function evaluations that one Jacobian costs} */
  public int evaluations() {
    return 2 * active.length;
  }
}
