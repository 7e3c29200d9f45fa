package dev.estimation.core.points;

import java.util.Arrays;
import java.util.stream.Collectors;
import org.apache.commons.math3.analysis.integration.gauss.GaussIntegrator;
import org.apache.commons.math3.analysis.integration.gauss.GaussIntegratorFactory;

/**
 * The product of one-dimensional Gauss-Hermite rules: p^n points for p nodes on each of n axes, or p_1
 * p_2 ... p_n for numbers that differ.
 *
 * <p>Exact for every monomial whose power along each axis is at most 2 p - 1, p the nodes of that axis;
 * the total degree is that of the axis with the fewest nodes. All weights are positive, so covariances are
 * never indefinite. The choice for one to three active inputs, and the yardstick for other rules. Nodes
 * come from commons-math3 (weight e^{-x^2}) and are turned to the normal density: x sqrt 2, w / sqrt pi.
 *
 * <p>Cost: as many evaluations as points, and one more at the centre if the nodes of an axis are even in
 * number; rules of more than {@link UnitPoints#LARGEST_SIZE} points are refused.
 *
 * <p><i>Immutable.</i> Source: Abramowitz and Stegun, table 25.10; Ito and Xiong 2000, <i>Gaussian
 * filters for nonlinear filtering problems</i>.
 */
public final class GaussHermiteRule implements PointRule {
  private final int[] nodes;
  private final boolean alike;

  private GaussHermiteRule(int[] nodes, boolean alike) {
    for (int count : nodes) {
      if (count < 2 || count > 100) {
        throw new IllegalArgumentException("nodes per axis must be from 2 to 100, got " + count);
      }
    }
    this.nodes = nodes;
    this.alike = alike;
  }

  /**
   * The product rule with as many nodes on every axis, for all dimensions.
   *
   * @param nodesPerAxis p, from 2 to 100; one node alone would see no spread at all
   * @return the rule
   */
  public static GaussHermiteRule product(int nodesPerAxis) {
    return new GaussHermiteRule(new int[] {nodesPerAxis}, true);
  }

  /**
   * The product rule with a number of nodes for each axis, for that dimension alone. The axes are the
   * columns of the lower Cholesky factor: the first moves all inputs, the last one the last alone.
   *
   * @param nodesOfAxes one number for each axis, from 2 to 100, copied
   * @return the rule
   */
  public static GaussHermiteRule product(int... nodesOfAxes) {
    return new GaussHermiteRule(nodesOfAxes.clone(), false);
  }

  @Override
  public UnitPoints points(int dimension) {
    int[] nodesOfAxes = nodesOfAxes(dimension);
    refuseTooMany(nodesOfAxes);
    GaussIntegratorFactory factory = new GaussIntegratorFactory();
    GaussIntegrator[] axes =
        Arrays.stream(nodesOfAxes).mapToObj(factory::hermite).toArray(GaussIntegrator[]::new);
    int count = Arrays.stream(nodesOfAxes).reduce(1, (a, b) -> a * b);
    boolean hasCentre = count % 2 == 1;
    int size = hasCentre ? count - 1 : count;
    double[][] points = new double[size][dimension];
    double[] weights = new double[size];
    double centreWeight = 0;
    int filled = 0;
    double[] point = new double[dimension];
    for (int code = 0; code < count; code++) {
      double weight = decode(code, axes, point);
      if (hasCentre && code == count / 2) {
        centreWeight = weight;
      } else {
        points[filled] = point.clone();
        weights[filled++] = weight;
      }
    }
    int fewest = Arrays.stream(nodesOfAxes).min().orElse(1);
    return UnitPoints.of(dimension, centreWeight, centreWeight, points, weights)
        .exactTo(2 * fewest - 1);
  }

  private int[] nodesOfAxes(int dimension) {
    if (alike) {
      int[] all = new int[dimension];
      Arrays.fill(all, nodes[0]);
      return all;
    }
    if (nodes.length != dimension) {
      throw new IllegalArgumentException("nodes must be given for each of " + dimension
          + " axes, got " + nodes.length + ": " + Arrays.toString(nodes)
          + " (Gauss-Hermite product)");
    }
    return nodes;
  }

  private void refuseTooMany(int[] nodesOfAxes) {
    double count = Arrays.stream(nodesOfAxes).asDoubleStream().reduce(1, (a, b) -> a * b);
    String named =
        Arrays.stream(nodes).mapToObj(Integer::toString).collect(Collectors.joining(", "));
    UnitPoints.refuseAbove(
        "the Gauss-Hermite product of " + named + " nodes on " + nodesOfAxes.length + " axes",
        count);
  }

  /**
   * Reads the digits of {@code code}, in the bases of the axes, as node numbers, fills the point,
   * returns its weight.
   */
  private static double decode(int code, GaussIntegrator[] axes, double[] point) {
    double weight = 1;
    int rest = code;
    for (int i = 0; i < point.length; i++) {
      int count = axes[i].getNumberOfPoints();
      int node = rest % count;
      boolean middle = 2 * node == count - 1;
      point[i] = middle ? 0 : Math.sqrt(2) * axes[i].getPoint(node);
      weight *= axes[i].getWeight(node) / Math.sqrt(Math.PI);
      rest /= count;
    }
    return weight;
  }
}
