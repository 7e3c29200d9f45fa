package dev.estimation.core.function;

import dev.estimation.core.internal.Checks;
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

  private final Space input;
  private final Space output;
  private final VectorFunction function;
  private final int[] active;
  private final double[] steps;
  private final double[] tangent;
  private final double[] moved;
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
    Checks.length("input scales", scales, input.dimension());
    for (int j = 0; j < scales.length; j++) {
      if (!(scales[j] > 0 && scales[j] <= Double.MAX_VALUE)) {
        throw new IllegalArgumentException(
            "input scales[" + j + "] must be finite and > 0, got " + scales[j]);
      }
    }
    this.input = input;
    this.output = output;
    this.function = function;
    this.active = function.structure().activeInputs(input.dimension());
    this.steps = Arrays.stream(scales).map(scale -> STEP * scale).toArray();
    this.tangent = new double[input.dimension()];
    this.moved = new double[input.storage()];
    this.ahead = new double[output.storage()];
    this.behind = new double[output.storage()];
    this.difference = new double[output.dimension()];
  }

  @Override
  public void evaluate(double[] point, double[] given, double[] jacobian) {
    int columns = input.dimension();
    Arrays.fill(jacobian, 0);
    for (int j : active) {
      double width =
          image(point, given, j, steps[j], ahead) - image(point, given, j, -steps[j], behind);
      output.difference(ahead, behind, difference);
      for (int i = 0; i < difference.length; i++) {
        jacobian[i * columns + j] = difference[i] / width;
      }
    }
  }

  /** Evaluates g away from the point and returns the displacement, as rounded. */
  private double image(double[] point, double[] given, int j, double step, double[] result) {
    Arrays.fill(tangent, 0);
    tangent[j] = step;
    input.displace(point, tangent, moved);
    input.difference(moved, point, tangent);
    Arrays.fill(result, Double.NaN);
    function.evaluate(moved, given, result);
    return tangent[j];
  }

  /** {@return the function evaluations that one Jacobian costs} */
  public int evaluations() {
    return 2 * active.length;
  }
}
