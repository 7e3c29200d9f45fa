package dev.estimation.core.space;

import java.util.SplittableRandom;

/** A real number, an angle and a real number; the angle of a point need not be wrapped. */
class MixedSpaceTest extends SpaceContract {
  @Override
  Space space() {
    return Space.reals(1).and(Space.angles(1)).and(Space.reals(1));
  }

  @Override
  double[] point(SplittableRandom random) {
    return random.doubles(3, -20, 20).toArray();
  }

  @Override
  double[] tangent(SplittableRandom random) {
    return random.doubles(3, -3.1, 3.1).toArray();
  }
}
