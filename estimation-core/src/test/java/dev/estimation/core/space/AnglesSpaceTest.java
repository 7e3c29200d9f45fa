package dev.estimation.core.space;

import java.util.SplittableRandom;

/** Two angles. */
class AnglesSpaceTest extends SpaceContract {
  @Override
  Space space() {
    return Space.angles(2);
  }

  @Override
  double[] point(SplittableRandom random) {
    return random.doubles(2, -Math.PI, Math.PI).toArray();
  }

  @Override
  double[] tangent(SplittableRandom random) {
    return random.doubles(2, -Math.PI, Math.PI).toArray();
  }
}
