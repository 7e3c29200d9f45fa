package dev.estimation.core.space;

import java.util.SplittableRandom;

/** Three real numbers. */
class RealsSpaceTest extends SpaceContract {
  @Override
  Space space() {
    return Space.reals(3);
  }

  @Override
  double[] point(SplittableRandom random) {
    return random.doubles(3, -500, 500).toArray();
  }

  @Override
  double[] tangent(SplittableRandom random) {
    return random.doubles(3, -400, 400).toArray();
  }
}
