package dev.estimation.core.accuracy;

import dev.estimation.core.function.VectorFunction;
import dev.estimation.core.internal.SymmetricMatrix;
import dev.estimation.core.space.Space;
import java.util.Arrays;
import java.util.function.Supplier;
import org.apache.commons.math3.distribution.RealDistribution;
import org.ejml.data.DMatrixRMaj;

/**
 * Independent samples of an input of any distribution, seen through a function: what the output is like, Gaussian
 * or not, with standard errors.
 *
 * <p>N samples z_i = g(u_i); d_i is the difference from the mean, in the output's space, and y the same in
 * standard deviations of its component. Standard errors hold for any distribution whose moments exist; they
 * are the scatter of each sample's share (the influence function) over sqrt N:
 *
 * <table>
 *   <caption>Estimates and the shares whose mean square over N is the squared standard error</caption>
 *   <tr><th>estimate</th><th>share</th></tr>
 *   <tr><td>mean</td><td>d</td></tr>
 *   <tr><td>covariance c = sum d_i d_j / (N - 1)</td><td>d_i d_j - c</td></tr>
 *   <tr><td>skewness g = mean y^3</td><td>y^3 - g - 3 y - 3/2 g (y^2 - 1)</td></tr>
 *   <tr><td>kurtosis k = mean y^4, 3 if Gaussian</td><td>y^4 - k - 4 g y - 2 k (y^2 - 1)</td></tr>
 * </table>
 *
 * <p>In curved spaces the mean is the intrinsic one, found by passes from the first sample's image; angles and
 * rotations must lie within half a turn of it. Components are those of differences (d of them).
 *
 * <p>Special input: a component that does not vary has NaN for skewness and kurtosis. Cost: N evaluations, N d
 * log N, 16 N d bytes; each standard error goes over all samples. <i>Immutable.</i> Source of the shares:
 * Hampel 1974, <i>The influence curve and its role in robust estimation</i>, Journal of the American Statistical
 * Association 69, for the idea; worked out here.
 */
public final class SampledOutput {
  private static final int PASSES = 10;

  private final Space space;
  private final double[] mean;
  private final DMatrixRMaj covariance;
  private final double[][] deviations;
  private final DeviationQuantiles[] quantiles;

  private SampledOutput(Space space, double[] mean, double[][] deviations) {
    this.space = space;
    this.mean = mean;
    this.deviations = deviations;
    this.quantiles =
        Arrays.stream(deviations).map(DeviationQuantiles::new).toArray(DeviationQuantiles[]::new);
    this.covariance = covariance(deviations);
  }

  /**
   * Draws, and looks at the output.
   *
   * @param output where g(u) lives
   * @param function g
   * @param inputs gives a point of the input at each call, such as {@code distribution::sample} of commons-math3's
   *     {@code MultivariateRealDistribution}, {@link #independent}, or {@link GaussianDraws}
   * @param count N, 2 or more
   * @param given handed to the function
   * @return the output
   * @throws IllegalArgumentException if the output is not a point of its space, NaN for one, at some sample
   */
  public static SampledOutput of(
      Space output,
      VectorFunction function,
      Supplier<double[]> inputs,
      int count,
      double... given) {
    if (count < 2) {
      throw new IllegalArgumentException("samples must be 2 or more, got " + count);
    }
    double[][] images = new double[count][output.storage()];
    for (int i = 0; i < count; i++) {
      double[] input = inputs.get();
      Arrays.fill(images[i], Double.NaN);
      function.evaluate(input, given, images[i]);
      if (!output.contains(images[i])) {
        throw new IllegalArgumentException("the function must give a point of " + output
            + ", got " + Arrays.toString(images[i]) + " at sample " + i + ", input "
            + Arrays.toString(input));
      }
    }
    double[] mean = mean(output, images);
    return new SampledOutput(output, mean, deviations(output, images, mean));
  }

  /**
   * {@return draws of a vector of independent components}
   *
   * @param components their distributions, each with its own generator
   */
  public static Supplier<double[]> independent(RealDistribution... components) {
    RealDistribution[] own = components.clone();
    return () -> Arrays.stream(own).mapToDouble(RealDistribution::sample).toArray();
  }

  private static double[][] deviations(Space space, double[][] images, double[] mean) {
    double[][] deviations = new double[space.dimension()][images.length];
    double[] one = new double[space.dimension()];
    for (int i = 0; i < images.length; i++) {
      space.difference(images[i], mean, one);
      for (int c = 0; c < one.length; c++) {
        deviations[c][i] = one[c];
      }
    }
    return deviations;
  }

  private static double[] mean(Space space, double[][] images) {
    double[] centre = images[0].clone();
    double[] shift = new double[space.dimension()];
    double[] one = new double[space.dimension()];
    for (int pass = 0; pass < PASSES; pass++) {
      Arrays.fill(shift, 0);
      for (double[] image : images) {
        space.difference(image, centre, one);
        for (int c = 0; c < one.length; c++) {
          shift[c] += one[c] / images.length;
        }
      }
      space.displace(centre, shift, centre);
    }
    return centre;
  }

  private static DMatrixRMaj covariance(double[][] deviations) {
    int m = deviations.length;
    DMatrixRMaj result = new DMatrixRMaj(m, m);
    for (int i = 0; i < m; i++) {
      for (int j = 0; j <= i; j++) {
        double sum = 0;
        for (int k = 0; k < deviations[i].length; k++) {
          sum += deviations[i][k] * deviations[j][k];
        }
        result.set(i, j, sum / (deviations[i].length - 1));
      }
    }
    SymmetricMatrix.mirrorLower(result);
    return result;
  }

  /** {@return N} */
  public int count() {
    return deviations[0].length;
  }

  /** {@return where the output lives} */
  public Space space() {
    return space;
  }

  /** {@return the mean, a point of the output's space, a copy} */
  public double[] mean() {
    return mean.clone();
  }

  /**
   * {@return the standard error of a component of the mean}
   *
   * @param component from 0
   */
  public double meanStandardError(int component) {
    return Math.sqrt(covariance.get(component, component) / count());
  }

  /** {@return the covariance, m x m, a copy} */
  public DMatrixRMaj covariance() {
    return covariance.copy();
  }

  /**
   * {@return the standard error of an entry of the covariance}
   *
   * @param row from 0
   * @param column from 0
   */
  public double covarianceStandardError(int row, int column) {
    double entry = covariance.get(row, column);
    double squares = 0;
    for (int i = 0; i < count(); i++) {
      double share = deviations[row][i] * deviations[column][i] - entry;
      squares += share * share;
    }
    return Math.sqrt(squares) / count();
  }

  /**
   * Skewness and kurtosis of a component.
   *
   * @param component from 0
   * @return both, with standard errors
   */
  public ComponentShape shape(int component) {
    return ComponentShape.of(deviations[component]);
  }

  /**
   * {@return the quantiles of a component's difference from the mean}
   *
   * @param component from 0
   */
  public DeviationQuantiles quantiles(int component) {
    return quantiles[component];
  }

  /** The difference of a sample from the mean, to be filled. */
  void fillDeviation(int sample, double[] difference) {
    for (int c = 0; c < difference.length; c++) {
      difference[c] = deviations[c][sample];
    }
  }
}
