package dev.estimation.core.points;

import dev.estimation.core.internal.Checks;
import java.util.Arrays;

/**
 * Weighted points xi_i that stand for N(0, I), with the centre 0 apart from the others.
 *
 * <p>The centre has two weights: one for means, one for covariances, which differ in the scaled
 * unscented rule. A rule without a centre gives it weight 0. Of every other point only the
 * coordinates that are not zero are kept: rules on axes and products have many zeros.
 *
 * <p><i>Immutable.</i> Memory: 12 bytes a coordinate that is not zero, 12 a point.
 */
public final class UnitPoints {
  /** The most points that a rule may have; more are refused, as one call would take seconds. */
  public static final int LARGEST_SIZE = 100_000;

  private final int dimension;
  private final double centreMeanWeight;
  private final double centreCovarianceWeight;
  private final double[] weights;
  private final int[] starts;
  private final int[] axes;
  private final double[] coordinates;
  private final boolean sample;
  private final int replicates;
  private final int degree;

  private UnitPoints(
      int dimension,
      double centreMeanWeight,
      double centreCovarianceWeight,
      double[] weights,
      int entries,
      boolean sample) {
    this.sample = sample;
    this.replicates = 0;
    this.dimension = dimension;
    this.centreMeanWeight = centreMeanWeight;
    this.centreCovarianceWeight = centreCovarianceWeight;
    this.weights = weights;
    this.starts = new int[weights.length + 1];
    this.axes = new int[entries];
    this.coordinates = new double[entries];
    this.degree = 0;
  }

  private UnitPoints(UnitPoints other, int degree, int replicates) {
    this.sample = other.sample;
    this.replicates = replicates;
    this.dimension = other.dimension;
    this.centreMeanWeight = other.centreMeanWeight;
    this.centreCovarianceWeight = other.centreCovarianceWeight;
    this.weights = other.weights;
    this.starts = other.starts;
    this.axes = other.axes;
    this.coordinates = other.coordinates;
    this.degree = degree;
  }

  /**
   * {@return these points, said to be exact}
   *
   * @param total the degree up to which the mean of every polynomial is exact; 0 or more
   */
  public UnitPoints exactTo(int total) {
    return new UnitPoints(this, total, replicates);
  }

  /** {@return the total degree up to which means of polynomials are exact; 0 unless it was said} */
  public int degree() {
    return degree;
  }

  /**
   * Points and their weights.
   *
   * @param dimension the number of coordinates of a point
   * @param centreMeanWeight weight of the centre in means
   * @param centreCovarianceWeight weight of the centre in covariances
   * @param points the points other than the centre, copied
   * @param weights one for each of them, for means and covariances alike, copied
   * @return the points
   */
  public static UnitPoints of(
      int dimension,
      double centreMeanWeight,
      double centreCovarianceWeight,
      double[][] points,
      double[] weights) {
    return make(dimension, centreMeanWeight, centreCovarianceWeight, points, weights, false);
  }

  /**
   * Draws of equal weight, whose mean and covariance are 0 and I but roughly. Where they are two or
   * more independent replicates of the same kind, moments by them have standard errors.
   *
   * @param dimension the number of coordinates of a draw
   * @param draws one replicate after the other, copied
   * @param replicates R, of the same size each: the number of draws if all are independent, 1 if
   *     nothing is known of how they depend on each other
   * @return the points
   */
  public static UnitPoints sample(int dimension, double[][] draws, int replicates) {
    if (replicates < 1 || draws.length == 0 || draws.length % replicates != 0) {
      throw new IllegalArgumentException(
          "draws must fall into 1 or more replicates of the same size, got " + draws.length
              + " draws and " + replicates + " replicates");
    }
    double[] weights = new double[draws.length];
    Arrays.fill(weights, 1.0 / draws.length);
    return new UnitPoints(make(dimension, 0, 0, draws, weights, true), 0, replicates);
  }

  private static UnitPoints make(
      int dimension,
      double centreMeanWeight,
      double centreCovarianceWeight,
      double[][] points,
      double[] weights,
      boolean sample) {
    refuseAbove("a rule", points.length);
    Checks.length("weights", weights, points.length);
    Checks.finite("weights", weights);
    Checks.finite("centre weights", centreMeanWeight, centreCovarianceWeight);
    int entries = 0;
    for (double[] point : points) {
      Checks.length("a point", point, dimension);
      Checks.finite("a point", point);
      for (double coordinate : point) {
        entries += coordinate == 0 ? 0 : 1;
      }
    }
    UnitPoints result = new UnitPoints(
        dimension, centreMeanWeight, centreCovarianceWeight, weights.clone(), entries, sample);
    result.fill(points);
    return result;
  }

  private void fill(double[][] points) {
    int entry = 0;
    for (int i = 0; i < points.length; i++) {
      for (int axis = 0; axis < dimension; axis++) {
        if (points[i][axis] != 0) {
          axes[entry] = axis;
          coordinates[entry++] = points[i][axis];
        }
      }
      starts[i + 1] = entry;
    }
  }

  /** Refuses a rule of more than {@link #LARGEST_SIZE} points, naming the count. */
  static void refuseAbove(String rule, double count) {
    if (count > LARGEST_SIZE) {
      throw new IllegalArgumentException(
          rule + " has " + (count < 1e15 ? Long.toString((long) count) : Double.toString(count))
              + " points, more than the " + LARGEST_SIZE
              + " allowed; declare active inputs, or take a rule with fewer points");
    }
  }

  /** {@return the number of coordinates of a point} */
  public int dimension() {
    return dimension;
  }

  /** {@return the number of points other than the centre} */
  public int size() {
    return weights.length;
  }

  /** {@return whether mean and covariance are 0 and I but roughly; see {@link #sample}} */
  public boolean isSample() {
    return sample;
  }

  /**
   * {@return the number of independent replicates, of equal size and one after the other; moments have
   * standard errors if it is 2 or more; 0 unless these are a {@link #sample}}
   */
  public int replicates() {
    return replicates;
  }

  /** {@return the weight of the centre in means} */
  public double centreMeanWeight() {
    return centreMeanWeight;
  }

  /** {@return the weight of the centre in covariances} */
  public double centreCovarianceWeight() {
    return centreCovarianceWeight;
  }

  /**
   * {@return the weight of a point, in means and covariances}
   *
   * @param point from 0 to {@link #size()} - 1
   */
  public double weight(int point) {
    return weights[point];
  }

  /**
   * {@return where the entries of a point begin; they end where those of the next begin}
   *
   * @param point from 0 to {@link #size()} - 1
   */
  public int start(int point) {
    return starts[point];
  }

  /**
   * {@return the axis of an entry}
   *
   * @param entry from {@code start(point)} to {@code start(point + 1)} - 1
   */
  public int axis(int entry) {
    return axes[entry];
  }

  /**
   * {@return the coordinate of an entry, not zero}
   *
   * @param entry from {@code start(point)} to {@code start(point + 1)} - 1
   */
  public double coordinate(int entry) {
    return coordinates[entry];
  }

  /**
   * {@return the coordinate of a point along an axis}
   *
   * @param point from 0 to {@link #size()} - 1
   * @param axis from 0
   */
  public double coordinate(int point, int axis) {
    for (int entry = starts[point]; entry < starts[point + 1]; entry++) {
      if (axes[entry] == axis) {
        return coordinates[entry];
      }
    }
    return 0;
  }

  /**
   * The sum of the absolute mean weights, centre included: by how much the rounding of the function
   * itself can be multiplied in the mean. 1 if no weight is negative.
   *
   * @return the sum
   */
  public double weightAmplification() {
    double sum = Math.abs(centreMeanWeight);
    for (double weight : weights) {
      sum += Math.abs(weight);
    }
    return sum;
  }

  /**
   * Whether the covariance of g is positive semi-definite whatever g is. It is true if no weight of a
   * point is negative and that of the centre in covariances is not either, and in the scaled unscented
   * rule if beta + alpha^2 kappa / n is not.
   *
   * <p>With d_i = g(xi_i) - g(0), V = sum w_i and delta = sum w_i d_i, the covariance
   * sum w_i d_i d_i' + (wc_0 - wm_0 - 1) delta delta' equals sum w_i e_i e_i' + (wc_0 - wm_0 - 1 + 1 / V)
   * delta delta' with e_i = d_i - delta / V. That is a sum of squares, and this method says whether all
   * its weights are positive or zero. As V = 1 - wm_0, the last one is wc_0 + wm_0^2 / V. If it is
   * negative, d_i = 1 at all points has a negative variance: delta = V, all e_i = 0.
   *
   * @return false if some function may have an indefinite covariance
   */
  public boolean covarianceWeightsPositive() {
    double sum = 0;
    for (double weight : weights) {
      if (!(weight >= 0)) {
        return false;
      }
      sum += weight;
    }
    double last = centreCovarianceWeight - centreMeanWeight - 1 + 1 / sum;
    // Weights of the centre have rounding of their size, and the sum that of up to 1e5 terms.
    double rounding =
        0x1p-50 * (1 + Math.abs(centreMeanWeight) + Math.abs(centreCovarianceWeight)) + 1e-12 / sum;
    return last >= -rounding;
  }
}
