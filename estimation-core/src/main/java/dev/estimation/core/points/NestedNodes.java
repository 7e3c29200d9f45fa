package dev.estimation.core.points;

/**
 * Nested nodes and weights for the standard normal distribution on one axis: levels 0 to 4 of 1, 3, 9,
 * 19 and 35 nodes, each with all nodes of the level before.
 *
 * <p>Q_l f = sum_k w_lk f(x_k) is E f(x), x ~ N(0, 1), for every polynomial to degree 1, 5, 15, 29 and
 * 51, and wrong for the next even power. Each level adds m = 2, 6, 10 or 16 nodes to the one before: the
 * roots of the polynomial r of degree m for which E[p(x) r(x) x^k] = 0 for all k below m, where p vanishes
 * at the nodes already there. Weights follow by interpolation.
 *
 * <p>Nodes are numbered from the centre 0 in the order in which levels add them, and from the centre
 * outwards within a level, +x before -x: those of level l are 0 to {@code count(l)} - 1. The outermost
 * of the levels are at 0, 1.73, 4.18, 6.36 and 9.02 standard deviations. All weights are positive but
 * one pair: -0.0063 at +-2.861 in level 3.
 *
 * <p>The difference weights of level l are those of Q_l - Q_(l-1) on the nodes of level l (of Q_0 for
 * l = 0): what one level more changes. They sum to 0 and refine an axis without losing what is known.
 *
 * <p>Accuracy: nodes and weights are nearest doubles; a test computes them anew with 150 digits from
 * the conditions above. <i>Immutable.</i> Source: Genz and Keister 1996, <i>Fully symmetric
 * interpolatory rules for multiple integrals over infinite regions with Gaussian weight</i>, Journal of
 * Computational and Applied Mathematics 71; Patterson 1968, <i>The optimum addition of points to
 * quadrature formulae</i>, Mathematics of Computation 22.
 */
public final class NestedNodes {
  private final int[] counts = {1, 3, 9, 19, 35};
  private final int[] degrees = {1, 5, 15, 29, 51};
  private final double[] nodes = nodes();
  private final double[][] weights = weights();
  private final double[][] differences = new double[counts.length][];

  private NestedNodes() {
    for (int level = 0; level < counts.length; level++) {
      differences[level] = differences(level);
    }
  }

  /** {@return the nodes for N(0, 1)} */
  public static NestedNodes standardNormal() {
    return new NestedNodes();
  }

  /** {@return the number of levels, 5} */
  public int levels() {
    return counts.length;
  }

  /**
   * {@return the number of nodes of a level}
   *
   * @param level from 0 to {@link #levels()} - 1
   */
  public int count(int level) {
    return counts[known(level)];
  }

  /**
   * {@return the degree to which a level is exact}
   *
   * @param level from 0 to {@link #levels()} - 1
   */
  public int degree(int level) {
    return degrees[known(level)];
  }

  /**
   * {@return the level that adds a node}
   *
   * @param index of the node, from 0 to 34
   */
  public int firstLevel(int index) {
    known(index, counts.length - 1);
    int level = 0;
    while (index >= counts[level]) {
      level++;
    }
    return level;
  }

  /**
   * {@return a node, in standard deviations}
   *
   * @param index from 0 to 34
   */
  public double node(int index) {
    double size = nodes[known(index, counts.length - 1)];
    return index % 2 == 0 ? 0 - size : size;
  }

  /**
   * {@return the weight of a node in a level}
   *
   * @param level from 0 to {@link #levels()} - 1
   * @param index from 0 to {@code count(level)} - 1
   */
  public double weight(int level, int index) {
    return weights[known(level)][known(index, level)];
  }

  /**
   * {@return the weight of a node in a level less that in the level before}
   *
   * @param level from 0 to {@link #levels()} - 1
   * @param index from 0 to {@code count(level)} - 1
   */
  public double difference(int level, int index) {
    return differences[known(level)][known(index, level)];
  }

  private int known(int level) {
    if (level < 0 || level >= counts.length) {
      throw new IllegalArgumentException(
          "level must be from 0 to " + (counts.length - 1) + ", got " + level + " (nested nodes)");
    }
    return level;
  }

  /** The number of the pair +-x of a node that the level has, the centre being pair 0. */
  private int known(int index, int level) {
    if (index < 0 || index >= counts[level]) {
      throw new IllegalArgumentException("node must be from 0 to " + (counts[level] - 1) + ", got "
          + index + " (nested nodes of level " + level + ")");
    }
    return (index + 1) / 2;
  }

  /** The centre's is made from the others, so that the sum is 0 and that of level 1 is -1/3. */
  private double[] differences(int level) {
    double[] result = weights[level].clone();
    if (level > 0) {
      double[] before = weights[level - 1];
      double sum = 0;
      for (int pair = result.length - 1; pair > 0; pair--) {
        result[pair] -= pair < before.length ? before[pair] : 0;
        sum += result[pair];
      }
      result[0] = -2 * sum;
    }
    return result;
  }

  /** Nodes of 0 or more, in nested order; the shortest decimals that give the nearest doubles. */
  private static double[] nodes() {
    return new double[] {
      0,
      1.7320508075688772,
      0.7410953499945409,
      2.861279576057058,
      4.184956017672732,
      1.230423634027306,
      2.5960831150492023,
      3.2053337944991944,
      5.187016039913656,
      6.36339449433637,
      0.2489922975799606,
      2.2336260616769414,
      3.6353185190372783,
      4.736433085952297,
      5.69817776848811,
      7.122106700804617,
      7.980771798590561,
      9.016939789890303,
    };
  }

  /** For each level the weights of its nodes of 0 or more, likewise. */
  private static double[][] weights() {
    return new double[][] {
      {
        1,
      },
      {
        0.6666666666666666, 0.16666666666666666,
      },
      {
        0.25396825396825395,
        0.0948509485094851,
        0.27007432957793787,
        0.007996325470893533,
        9.426945755651748e-5,
      },
      {
        0.3034671998542059,
        0.06409605468680758,
        0.20832499164960888,
        -0.0063372247933737354,
        6.012336945984782e-5,
        0.061151730125247675,
        0.018085234254798452,
        0.002884880436506751,
        6.094808731468983e-7,
        8.629684602229886e-10,
      },
      {
        0.0005148945080687843, 0.045273685465150516, 0.148070831155216, 0.00231134524035221,
        3.57293481989751e-5, 0.09236472671698631, 0.003155446269187564, 0.0008189539275022649,
        2.4676421345798077e-7, 4.6011760348656186e-10, 0.19176011588804442, 0.01567347375185115,
        0.0002752421411678516, 2.734220680118783e-6, 2.1394194479561105e-8, 3.097222357606316e-12,
        5.45004126506369e-15, 1.0541326582333341e-18,
      },
    };
  }
}
