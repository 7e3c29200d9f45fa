package dev.estimation.core.gaussian;

import dev.estimation.core.internal.Checks;
import dev.estimation.core.space.Space;
import java.util.ArrayList;
import java.util.Arrays;
import java.util.List;
import org.ejml.data.DMatrixRMaj;

/**
 * Independent estimates of one state, or of parts of it, fused to one: the least squares of all of them.
 *
 * <p>Estimate i says y_i = H_i e + v_i, v_i ~ N(0, P_i), of the displacement e of the state from a reference; H_i is
 * the identity, some of its rows, or a given map. In information form the result is
 *
 * <pre>
 * P = (sum H_i' P_i^-1 H_i)^-1,   e = P sum H_i' P_i^-1 y_i.
 * </pre>
 *
 * It is found by orthogonal reduction of the equations divided by their deviations, those of large weight first,
 * without inverse or normal equations. The order of the estimates does not matter.
 *
 * <p>The reference is the mean of the first estimate of the whole state, unless {@link #about} gives one; without
 * either, what the first estimate of each component says of it, or zero. For reals and angles the choice changes
 * nothing but rounding, as long as angles lie within pi of it; unit quaternions are fused to first order in their
 * distances from it.
 *
 * <p>A zero variance is exact knowledge: the result fulfils it, and the others fill in what it leaves open. Exact
 * estimates that contradict each other, by more than 1e-10 of the numbers they come from, are an error,
 * not a status; so are estimates that leave a part of the state undetermined.
 *
 * <p>Accuracy: with deviations 1 to 1e12 times apart in random directions, covariances agreed with 80 digits to
 * 1e-12, and means to some roundings of their numbers. What lies beyond a factor of 1e15 in one direction is
 * undetermined. A covariance that rounding would make indefinite has its variances raised by as few roundings
 * as it takes.
 *
 * <p>Estimates must be independent. Two trackers that share process noise or earlier data are not: see {@link
 * CovarianceIntersection}. Cost: of the order of N d^2 for N equations of d components, off the step path; allocates.
 * <i>Immutable.</i> Source: Aitken 1935, <i>On least squares and linear combination of observations</i>; Bierman 1977,
 * <i>Factorization Methods for Discrete Sequential Estimation</i>, on data equations; Golub and Van Loan,
 * <i>Matrix Computations</i>, on equality constraints (all from memory).
 */
public final class Fusion {
  private final Space space;
  private final double[] reference;
  private final List<PartialEstimate> parts;

  private Fusion(Space space, double[] reference, List<PartialEstimate> parts) {
    this.space = space;
    this.reference = reference;
    this.parts = parts;
  }

  /**
   * No estimate yet.
   *
   * @param space where the state lives
   * @return the fusion, to be continued by {@code with...}
   */
  public static Fusion of(Space space) {
    return new Fusion(space, null, List.of());
  }

  /**
   * Sets the reference from which all means are differenced.
   *
   * @param point of the space, copied; best near the result
   * @return a fusion with this reference
   * @throws IllegalArgumentException if the space does not contain it
   */
  public Fusion about(double[] point) {
    requirePoint("reference", point);
    return new Fusion(space, point.clone(), parts);
  }

  /**
   * Adds an estimate of the whole state.
   *
   * @param estimate in the space
   * @return a fusion with this estimate too
   * @throws IllegalArgumentException if its dimension is not that of the space, or its mean no point there
   */
  public Fusion with(Gaussian estimate) {
    return with(PartialEstimate.ofAll(space, estimate));
  }

  /**
   * Adds an estimate of some components, in a space where a point has a number for each component of a difference.
   *
   * @param estimate of the components, in their order
   * @param components distinct indices
   * @return a fusion with this estimate too
   * @throws IllegalArgumentException if sizes differ, an index is out of range or comes twice, or the space has
   *     quaternions
   */
  public Fusion with(Gaussian estimate, int... components) {
    requireNumbersAsComponents("an estimate of single components", "withPart");
    requireComponents(components);
    requireDimension(estimate, components.length, "components");
    double[] point = new double[space.storage()];
    for (int i = 0; i < components.length; i++) {
      point[components[i]] = estimate.mean(i);
    }
    return withPart(point, estimate.covariance(), components);
  }

  /**
   * Adds an estimate of some components in any space.
   *
   * @param point of the space, copied; what of it does not belong to the components does not matter
   * @param covariance k x k, copied
   * @param components distinct indices of k components of a difference
   * @return a fusion with this estimate too
   * @throws IllegalArgumentException if shapes differ, a number is not finite, the covariance is not symmetric and
   *     positive semi-definite, or an index is out of range or comes twice
   */
  public Fusion withPart(double[] point, DMatrixRMaj covariance, int... components) {
    requirePoint("point", point);
    requireComponents(components);
    DMatrixRMaj checked = CovarianceInput.of(components.length, covariance, "the components");
    return with(PartialEstimate.ofComponents(space, point.clone(), checked, components.clone()));
  }

  /**
   * Adds an estimate of a linear map of the state: value = H x + v, with x the numbers of a point.
   *
   * @param map H, k x d, copied
   * @param output where values live, of dimension k: reals, angles or both
   * @param value its estimate in that space
   * @return a fusion with this estimate too
   * @throws IllegalArgumentException if shapes differ, a number is not finite, or a space has quaternions
   */
  public Fusion withMap(DMatrixRMaj map, Space output, Gaussian value) {
    requireNumbersAsComponents("an estimate of a linear map", "withPart");
    int k = output.dimension();
    int d = space.dimension();
    if (output.storage() != k) {
      throw new IllegalArgumentException(
          "values of a linear map must be reals and angles, got the space " + output);
    }
    if (map.numRows != k || map.numCols != d) {
      throw new IllegalArgumentException("map must be " + k + " x " + d
          + " to give the value from the state, got " + map.numRows + " x " + map.numCols);
    }
    requireDimension(value, k, "the map");
    Checks.finite("map", Arrays.copyOf(map.data, k * d));
    return with(PartialEstimate.ofMap(map.copy(), output, value));
  }

  private Fusion with(PartialEstimate part) {
    List<PartialEstimate> more = new ArrayList<>(parts);
    more.add(part);
    return new Fusion(space, reference, List.copyOf(more));
  }

  /**
   * The state, given all estimates.
   *
   * @return its mean and covariance
   * @throws IllegalArgumentException if the estimates leave a part of the state undetermined, if exact ones contradict
   *     each other, or if a result is not finite
   */
  public Gaussian fuse() {
    double[] from = startingPoint();
    List<LinearEquation> equations = new ArrayList<>();
    for (int i = 0; i < parts.size(); i++) {
      parts.get(i).split(from, i, equations);
    }
    ConstrainedLeastSquares squares = new ConstrainedLeastSquares(equations, space.dimension());
    double[] mean = new double[space.storage()];
    space.displace(from, squares.solution(), mean);
    return RoundedGaussian.of(space, mean, squares.covariance());
  }

  private double[] startingPoint() {
    if (reference != null) {
      return reference;
    }
    for (PartialEstimate part : parts) {
      if (part.whole() != null) {
        return part.whole();
      }
    }
    requireNumbersAsComponents("a fusion without an estimate of the whole state", "about");
    double[] point = new double[space.storage()];
    boolean[] known = new boolean[point.length];
    parts.forEach(part -> part.addTo(point, known));
    return point;
  }

  private void requirePoint(String what, double[] point) {
    Checks.length(what, point, space.storage());
    if (!space.contains(point)) {
      throw new IllegalArgumentException(
          what + " must be a point of " + space + ", got " + Arrays.toString(point));
    }
  }

  private void requireComponents(int... components) {
    Checks.distinctIndices("components", components, space.dimension());
    if (components.length == 0) {
      throw new IllegalArgumentException("components must not be empty");
    }
  }

  private static void requireDimension(Gaussian estimate, int wanted, String match) {
    if (estimate.dimension() != wanted || estimate.mean().length != wanted) {
      throw new IllegalArgumentException("estimate must have " + wanted + " numbers to match "
          + match + ", got " + estimate.mean().length + " and dimension " + estimate.dimension());
    }
  }

  private void requireNumbersAsComponents(String what, String instead) {
    if (space.storage() != space.dimension()) {
      throw new IllegalArgumentException(
          what + " wants a space of reals and angles, got " + space + "; see " + instead);
    }
  }
}
