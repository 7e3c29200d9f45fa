package dev.estimation.core.matching;

import static dev.estimation.testing.Agreement.assertWithin;
import static org.junit.jupiter.api.Assertions.assertEquals;

import dev.estimation.core.function.VectorFunction;
import dev.estimation.core.gaussian.Gaussian;
import dev.estimation.core.gaussian.Moments;
import dev.estimation.core.points.PointRule;
import dev.estimation.core.points.UnitPoints;
import dev.estimation.core.space.Space;
import dev.estimation.testing.RandomGaussians;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.ValueSource;

/** A rule may keep zero among its points, wherever it stands: it has no coordinate of its own. */
class ZeroPointTest {
  private static final double ROOT = Math.sqrt(3);
  private static final VectorFunction SQUARES = (input, given, output) -> {
    output[0] = 0;
    for (double x : input) {
      output[0] += x * x;
    }
    output[1] = input[0];
  };

  private static PointRule threeNodes(int zeroAt) {
    double[][] points = new double[3][1];
    double[] weights = new double[3];
    points[(zeroAt + 1) % 3][0] = ROOT;
    points[(zeroAt + 2) % 3][0] = -ROOT;
    weights[zeroAt] = 2.0 / 3;
    weights[(zeroAt + 1) % 3] = 1.0 / 6;
    weights[(zeroAt + 2) % 3] = 1.0 / 6;
    return dimension -> UnitPoints.of(dimension, 0, 0, points, weights);
  }

  /** The product of the three nodes in two dimensions, turned round so that zero moves. */
  private static PointRule nineNodes(int turn) {
    double[] nodes = {-ROOT, 0, ROOT};
    double[] nodeWeights = {1.0 / 6, 2.0 / 3, 1.0 / 6};
    double[][] points = new double[9][];
    double[] weights = new double[9];
    for (int i = 0; i < 9; i++) {
      int at = (i + turn) % 9;
      points[at] = new double[] {nodes[i / 3], nodes[i % 3]};
      weights[at] = nodeWeights[i / 3] * nodeWeights[i % 3];
    }
    return dimension -> UnitPoints.of(dimension, 0, 0, points, weights);
  }

  private static MatchingWorkspace carried(PointRule rule, int n) {
    double[] ones = MatchingUnderTest.unitScales(n);
    Moments input = RandomGaussians.momentsOf(Gaussian.independent(new double[n], ones));
    MatchingWorkspace work =
        PointMatching.of(rule).workspace(Space.reals(n), Space.reals(2), SQUARES);
    assertEquals(MatchingStatus.MATCHED, work.carry(input, new double[0], null));
    return work;
  }

  /** x^2 of a standard normal number: mean 1, variance 2. 1e-15: a few roundings of sqrt(3). */
  @ParameterizedTest
  @ValueSource(ints = {0, 1, 2})
  void oneDimension(int zeroAt) {
    MatchingWorkspace work = carried(threeNodes(zeroAt), 1);
    assertWithin("mean of x^2", 1, work.output().mean()[0], 1e-15, 2);
    assertWithin("mean of x", 0, work.output().mean()[1], 1e-15, 2);
    assertWithin("variance of x^2", 2, work.output().covariance().get(0, 0), 1e-15, 4);
    assertWithin("variance of x", 1, work.output().covariance().get(1, 1), 1e-15, 2);
    assertWithin("cross-covariance", 1, work.unitCrossCovariance().get(0, 1), 1e-15, 2);
    assertEquals(4, work.evaluations(), "three points and the centre");
  }

  /** x^2 + y^2: mean 2, variance 4. 1e-14: sums over nine points. */
  @ParameterizedTest
  @ValueSource(ints = {0, 4, 5})
  void twoDimensions(int turn) {
    MatchingWorkspace work = carried(nineNodes(turn), 2);
    assertWithin("mean", 2, work.output().mean()[0], 1e-14, 2);
    assertWithin("variance", 4, work.output().covariance().get(0, 0), 1e-14, 4);
    assertWithin("variance of x", 1, work.output().covariance().get(1, 1), 1e-14, 1);
  }
}
