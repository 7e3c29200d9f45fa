package dev.estimation.core.points;

import org.apache.commons.math3.analysis.integration.gauss.GaussIntegrator;
import org.apache.commons.math3.analysis.integration.gauss.GaussIntegratorFactory;

/**
 * The product of one-dimensional Gauss-Hermite rules of p nodes an axis: p^n points.
 *
 * <p>Exact for every monomial whose power along each axis is at most 2 p - 1. All weights are
 * positive. Cost: p^n evaluations, and one more at the centre if p is even; rules of more than {@link
 * UnitPoints#LARGEST_SIZE} points are refused. Nodes come from commons-math3 (weight e^{-x^2}) and
 * are turned to the normal density: x sqrt 2, w / sqrt pi.
 *
 * <p><i>Immutable.</i> Source: Abramowitz and Stegun, table 25.10; Ito and Xiong 2000, <i>Gaussian
 * filters for nonlinear filtering problems</i>.
 */
public final class GaussHermiteRule implements PointRule {
  private final int nodesPerAxis;

  private GaussHermiteRule(int nodesPerAxis) {
    this.nodesPerAxis = nodesPerAxis;
  }

  /**
   * The product rule.
   *
   * @param nodesPerAxis p, from 2 to 100; one node alone would see no spread at all
   * @return the rule
   */
  public static GaussHermiteRule product(int nodesPerAxis) {
    if (nodesPerAxis < 2 || nodesPerAxis > 100) {
      throw new IllegalArgumentException(
          "nodes per axis must be from 2 to 100, got " + nodesPerAxis);
    }
    return new GaussHermiteRule(nodesPerAxis);
  }

  @Override
  public UnitPoints points(int dimension) {
    UnitPoints.refuseAbove(
        "the Gauss-Hermite product of " + nodesPerAxis + " nodes on " + dimension + " axes",
        Math.pow(nodesPerAxis, dimension));
    GaussIntegrator axis = new GaussIntegratorFactory().hermite(nodesPerAxis);
    int count = (int) Math.round(Math.pow(nodesPerAxis, dimension));
    boolean hasCentre = nodesPerAxis % 2 == 1;
    int size = hasCentre ? count - 1 : count;
    double[][] points = new double[size][dimension];
    double[] weights = new double[size];
    double centreWeight = 0;
    int filled = 0;
    double[] point = new double[dimension];
    for (int code = 0; code < count; code++) {
      double weight = decode(code, axis, point);
      if (hasCentre && code == count / 2) {
        centreWeight = weight;
      } else {
        points[filled] = point.clone();
        weights[filled++] = weight;
      }
    }
    return UnitPoints.of(dimension, centreWeight, centreWeight, points, weights);
  }

  /** Reads the digits of {@code code} in base p as node numbers, fills the point, returns its weight. */
  private double decode(int code, GaussIntegrator axis, double[] point) {
    double weight = 1;
    int rest = code;
    for (int i = 0; i < point.length; i++) {
      int node = rest % nodesPerAxis;
      boolean middle = 2 * node == nodesPerAxis - 1;
      point[i] = middle ? 0 : Math.sqrt(2) * axis.getPoint(node);
      weight *= axis.getWeight(node) / Math.sqrt(Math.PI);
      rest /= nodesPerAxis;
    }
    return weight;
  }
}
