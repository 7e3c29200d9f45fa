package dev.estimation.core.space;

import java.util.SplittableRandom;

/** A space that knows nothing of parts of arrays, alone and in products. */
class UserSpaceTest extends SpaceContract {
  @Override
  Space space() {
    return new UserSpace();
  }

  @Override
  double[] point(SplittableRandom random) {
    return new double[] {random.nextDouble(0.1, 10)};
  }

  @Override
  double[] tangent(SplittableRandom random) {
    return new double[] {random.nextDouble(-3, 3)};
  }
}
