package dev.estimation.core.matching;

import dev.estimation.core.points.GaussHermiteRule;
import dev.estimation.core.points.PointRule;
import java.util.Arrays;

/** Gauss-Hermite products of 3, 5, 3, 3, 5, 3 nodes, as many as there are axes. */
class GaussHermiteMixedMatchingTest extends PointMatchingContract {
  private static final int[] NODES = {3, 5, 3, 3, 5, 3};

  @Override
  PointRule rule() {
    return n -> GaussHermiteRule.product(Arrays.copyOf(NODES, n)).points(n);
  }

  @Override
  public int evaluations(int carried) {
    return Arrays.stream(NODES).limit(carried).reduce(1, (a, b) -> a * b);
  }

  @Override
  public int largestDimension() {
    return NODES.length;
  }
}
