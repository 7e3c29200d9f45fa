package dev.estimation.core.points;

import java.util.Arrays;

/** Gauss-Hermite products of 3, 2, 4, 3, 2, 4 nodes, as many as there are axes. */
class GaussHermiteMixedTest extends PointRuleContract {
  private static final int[] NODES = {3, 2, 4, 3, 2, 4};

  @Override
  PointRule rule() {
    return n -> GaussHermiteRule.product(Arrays.copyOf(NODES, n)).points(n);
  }

  @Override
  int degree(int dimension) {
    return dimension == 1 ? 5 : 3;
  }

  @Override
  boolean axesAlike(int dimension) {
    return false;
  }

  @Override
  int largestDimension() {
    return NODES.length;
  }
}
