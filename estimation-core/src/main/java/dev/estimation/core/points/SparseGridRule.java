package dev.estimation.core.points;

import java.util.Arrays;

/**
 * Sparse grids: sums of small products of nested one-dimensional levels, instead of one large product.
 *
 * <p>With the difference D_l = Q_l - Q_(l-1) of two levels of {@link NestedNodes}, the rule is A = sum
 * over (l_1, ..., l_n) of D_l1 x ... x D_ln, over all l whose costs c(l_1) + ... + c(l_n) are at most q.
 * Nodes are nested, so products share points; each point has one weight, the sum of its shares. Two
 * families differ in the cost of a level:
 *
 * <ul>
 *   <li>{@link #ofLevel}: c(l) = l, the isotropic grid of Smolyak. An axis alone goes to level q: to
 *       degree 5, 15, 29 or 51.
 *   <li>{@link #ofDegree}: c = 0, 1, 3, 8, 15, half of the smallest even power for which level l - 1 is
 *       wrong, and q = degree / 2. No sum of such differences reaches the total degree with fewer
 *       products: a level is not taken before it is needed.
 * </ul>
 *
 * <p>Total degree of exactness, in {@link UnitPoints#degree()}: 2 h - 1, with 2 h the smallest sum of
 * such even powers whose levels together cost more than q. By degree it is at least the one asked for;
 * by level:
 *
 * <table>
 *   <caption>Total degree by level q and number of axes n</caption>
 *   <tr><th>q</th><th>n = 1</th><th>2</th><th>3</th><th>4</th><th>5 or more</th></tr>
 *   <tr><td>1</td><td>5</td><td>3</td><td>3</td><td>3</td><td>3</td></tr>
 *   <tr><td>2</td><td>15</td><td>7</td><td>5</td><td>5</td><td>5</td></tr>
 *   <tr><td>3</td><td>29</td><td>11</td><td>9</td><td>7</td><td>7</td></tr>
 *   <tr><td>4</td><td>51</td><td>21</td><td>13</td><td>11</td><td>9</td></tr>
 * </table>
 *
 * <p>Cost: the number of points grows as n^q / q! times 2^q, no longer exponentially in n.
 *
 * <table>
 *   <caption>Points, the centre included, where none has weight 0</caption>
 *   <tr><th>rule</th><th>points</th></tr>
 *   <tr><td>level 1, degree 3</td><td>1 + 2 n</td></tr>
 *   <tr><td>level 2</td><td>1 + 6 n + 2 n^2</td></tr>
 *   <tr><td>degree 5</td><td>1 + 2 n^2</td></tr>
 *   <tr><td>degree 7</td><td>1 + 8 n + 2 n (n - 1) + 4 n (n - 1) (n - 2) / 3</td></tr>
 * </table>
 *
 * <p>A point whose weight is exactly 0 is left out, as the 8 points on the axes of degree 5 for n = 4
 * are. More than {@link UnitPoints#LARGEST_SIZE} points are refused.
 *
 * <p>Some weights are negative, more so with n. Means are as exact as said, but a covariance is a sum of
 * squares with these weights: if the degree does not cover the square of a function, it may be
 * indefinite, and a filter then refuses the step. The rounding of the function is multiplied by {@link
 * UnitPoints#weightAmplification()}; for n = 2, 4, 6 and 12 it is 1.8, 4.8, 9 and 27 at level 2, 2.3, 10,
 * 31 and 240 at level 4, and 1, 1, 3.7 and 22 at degree 5.
 *
 * <p>Leaving out an axis leaves the grid of the other axes: components of zero variance change nothing.
 * <i>Immutable.</i> Source: Smolyak 1963, <i>Quadrature and interpolation formulas for tensor products of
 * certain classes of functions</i>; Novak and Ritter 1999, <i>Simple cubature formulas with high
 * polynomial exactness</i>, Constructive Approximation 15; for growth by need, Petras 2003, <i>Smolyak
 * cubature of given polynomial degree with few nodes for increasing dimension</i>, Numerische Mathematik
 * 93.
 */
public final class SparseGridRule implements PointRule {
  private final String name;
  private final NestedNodes nodes;
  private final int[] costs;
  private final int[] powers;
  private final int budget;

  private SparseGridRule(String name, NestedNodes nodes, int[] costs, int budget) {
    this.name = name;
    this.nodes = nodes;
    this.costs = costs;
    this.powers = halfPowers(nodes);
    this.budget = budget;
  }

  /**
   * The isotropic grid.
   *
   * @param level q, from 1 to 4, as {@link NestedNodes} has no more
   * @return the rule
   */
  public static SparseGridRule ofLevel(int level) {
    NestedNodes nodes = NestedNodes.standardNormal();
    if (level < 1 || level >= nodes.levels()) {
      throw new IllegalArgumentException(
          "level must be from 1 to " + (nodes.levels() - 1) + ", got " + level + " (sparse grid)");
    }
    int[] costs = new int[nodes.levels() + 1];
    for (int i = 0; i < costs.length; i++) {
      costs[i] = i;
    }
    return new SparseGridRule("level " + level, nodes, costs, level);
  }

  /**
   * The grid of fewest products for a total degree.
   *
   * @param degree from 2 to 51; an even one is as the next
   * @return the rule
   */
  public static SparseGridRule ofDegree(int degree) {
    NestedNodes nodes = NestedNodes.standardNormal();
    int largest = nodes.degree(nodes.levels() - 1);
    if (degree < 2 || degree > largest) {
      throw new IllegalArgumentException(
          "degree must be from 2 to " + largest + ", got " + degree + " (sparse grid)");
    }
    return new SparseGridRule("degree " + degree, nodes, halfPowers(nodes), degree / 2);
  }

  /** For each level, and the one after the last, half of the smallest even power that needs it. */
  private static int[] halfPowers(NestedNodes nodes) {
    int[] result = new int[nodes.levels() + 1];
    for (int level = 1; level < result.length; level++) {
      result[level] = (nodes.degree(level - 1) + 1) / 2;
    }
    return result;
  }

  @Override
  public UnitPoints points(int dimension) {
    SparseGrid grid = new SparseGrid(nodes, costs, budget, dimension);
    UnitPoints.refuseAbove(
        "the sparse grid of " + name + " on " + dimension + " axes", grid.count());
    return grid.points().exactTo(degree(dimension));
  }

  /**
   * One less than the smallest even degree of a monomial that needs levels of too high a cost. Sums of
   * half powers are built axis by axis; axes beyond q + 1 cannot be needed, as each costs 1 or more.
   */
  private int degree(int dimension) {
    int unknown = Integer.MAX_VALUE / 4;
    int[] least = new int[budget + 1];
    Arrays.fill(least, 1, least.length, unknown);
    int failing = unknown;
    for (int axis = 0; axis < Math.min(Math.max(dimension, 1), budget + 1); axis++) {
      for (int spent = budget; spent >= 0; spent--) {
        for (int level = 1; level < costs.length; level++) {
          int sum = least[spent] + powers[level];
          if (spent + costs[level] > budget) {
            failing = Math.min(failing, sum);
          } else {
            least[spent + costs[level]] = Math.min(least[spent + costs[level]], sum);
          }
        }
      }
    }
    return 2 * failing - 1;
  }
}
