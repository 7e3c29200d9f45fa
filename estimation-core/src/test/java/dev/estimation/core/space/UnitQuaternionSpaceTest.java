package dev.estimation.core.space;

import dev.estimation.testing.Rotations;
import java.util.SplittableRandom;

/** One rotation. */
class UnitQuaternionSpaceTest extends SpaceContract {
  @Override
  Space space() {
    return Space.unitQuaternion();
  }

  @Override
  double[] point(SplittableRandom random) {
    return Rotations.random(random);
  }

  @Override
  double[] tangent(SplittableRandom random) {
    return Rotations.vector(random, 3.1);
  }

  /** Components up to 1, angles up to pi: eight roundings of those. */
  @Override
  double rounding() {
    return 8 * 0x1p-52 * Math.PI;
  }
}
