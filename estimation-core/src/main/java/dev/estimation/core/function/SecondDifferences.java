package dev.estimation.core.function;

import dev.estimation.core.space.Space;
import java.util.Arrays;

/**
 * Hessians by second central differences of the values: on the diagonal (g(u + h e_j) - 2 g(u) + g(u -
 * h e_j)) / h^2, elsewhere the four corners (g_++ - g_+- - g_-+ + g_--) / (4 h_j h_l). Deviations are
 * those of the output space from g(u), so that angles may cross their seam.
 *
 * <p>The step is h_j = eps^(1/4) s_j, eps = 2^-52, with s_j the scale of input j, as for {@link
 * CentralDifferences}. With a right scale the error is about 1e-7 of the output over the two scales:
 * truncation h^2 g'''' / 12 and rounding 4 eps g / h^2 are near their balance there. Where g has a
 * Jacobian, {@link JacobianDifferences} has three digits more.
 *
 * <p>Only active inputs are differenced; all other entries are zero. Cost: 2 k^2 + 1 evaluations for k
 * active inputs. Source: Dennis and Schnabel 1983, <i>Numerical Methods for Unconstrained Optimization
 * and Nonlinear Equations</i>, section 5.6 (from memory). NaN from g becomes NaN in the entries.
 * <i>Confined to one thread</i>; allocates only when built.
 */
public final class SecondDifferences implements Hessian {
  private static final double STEP = Math.sqrt(Math.sqrt(0x1p-52));

  private final Space output;
  private final VectorFunction function;
  private final int columns;
  private final int[] active;
  private final InputSteps steps;
  private final double[] centre;
  private final double[] copy;
  private final double[] image;
  private final double[] deviation;
  private final double[] sum;

  /**
   * Differences of a function.
   *
   * @param input where u lives
   * @param output where g(u) lives
   * @param function the function
   * @param scales one for each dimension of the input, finite and above 0, in its unit; copied
   */
  public SecondDifferences(Space input, Space output, VectorFunction function, double[] scales) {
    this.steps = new InputSteps(input, scales, STEP);
    this.output = output;
    this.function = function;
    this.columns = input.dimension();
    this.active = function.structure().activeInputs(columns);
    this.centre = new double[output.storage()];
    this.copy = new double[input.storage()];
    this.image = new double[output.storage()];
    this.deviation = new double[output.dimension()];
    this.sum = new double[output.dimension()];
  }

  @Override
  public void evaluate(double[] point, double[] given, double[] hessians) {
    Arrays.fill(hessians, 0);
    System.arraycopy(point, 0, copy, 0, copy.length);
    Arrays.fill(centre, Double.NaN);
    function.evaluate(copy, given, centre);
    for (int a = 0; a < active.length; a++) {
      store(active[a], active[a], bend(point, given, active[a]), hessians);
      for (int b = 0; b < a; b++) {
        store(active[a], active[b], twist(point, given, active[a], active[b]), hessians);
      }
    }
  }

  /** Sums d_+ / a_+ - d_- / a_-, and returns what to divide by; the displacements may differ. */
  private double bend(double[] point, double[] given, int j) {
    Arrays.fill(sum, 0);
    evaluate(steps.move(point, j, 1), given);
    double forward = steps.displacement(j);
    add(1 / forward);
    evaluate(steps.move(point, j, -1), given);
    double backward = steps.displacement(j);
    add(-1 / backward);
    return (forward - backward) / 2;
  }

  /** Sums the four corners, and returns what to divide by. */
  private double twist(double[] point, double[] given, int j, int l) {
    Arrays.fill(sum, 0);
    addCorner(point, given, j, -1, l, 1);
    addCorner(point, given, j, 1, l, -1);
    addCorner(point, given, j, 1, l, 1);
    double forward = steps.displacement(j);
    double aside = steps.displacement(l);
    addCorner(point, given, j, -1, l, -1);
    return (forward - steps.displacement(j)) * (aside - steps.displacement(l));
  }

  private void addCorner(double[] point, double[] given, int j, int first, int l, int second) {
    evaluate(steps.move(point, j, first, l, second), given);
    add(first * second);
  }

  private void evaluate(double[] moved, double[] given) {
    Arrays.fill(image, Double.NaN);
    function.evaluate(moved, given, image);
    output.difference(image, centre, deviation);
  }

  private void add(double factor) {
    for (int i = 0; i < sum.length; i++) {
      sum[i] += factor * deviation[i];
    }
  }

  private void store(int j, int l, double divisor, double[] hessians) {
    for (int i = 0; i < sum.length; i++) {
      double entry = sum[i] / divisor;
      hessians[(i * columns + j) * columns + l] = entry;
      hessians[(i * columns + l) * columns + j] = entry;
    }
  }

  /** {@return the function evaluations that one call costs} */
  public int evaluations() {
    return 2 * active.length * active.length + 1;
  }
}
