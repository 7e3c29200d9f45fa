package dev.estimation.core.space;

import static dev.estimation.testing.Agreement.assertNames;
import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertNotEquals;

import dev.estimation.testing.Rotations;
import java.util.SplittableRandom;
import org.junit.jupiter.api.Test;

/** Two rotations, with an angle and reals between and after. */
class ProductSpaceTest extends SpaceContract {
  private static final Space Q = Space.unitQuaternion();

  @Override
  Space space() {
    return Q.and(Space.angles(1)).and(Space.reals(1)).and(Q).and(Space.reals(2));
  }

  @Override
  double[] point(SplittableRandom random) {
    double[] point = random.doubles(12, -3, 3).toArray();
    System.arraycopy(Rotations.random(random), 0, point, 0, 4);
    System.arraycopy(Rotations.random(random), 0, point, 6, 4);
    return point;
  }

  @Override
  double[] tangent(SplittableRandom random) {
    double[] tangent = random.doubles(10, -3, 3).toArray();
    System.arraycopy(Rotations.vector(random, 3.1), 0, tangent, 0, 3);
    System.arraycopy(Rotations.vector(random, 3.1), 0, tangent, 5, 3);
    return tangent;
  }

  @Override
  double rounding() {
    return 8 * 0x1p-52 * Math.PI;
  }

  @Test
  void sizesAddUp() {
    assertEquals(12, space().storage());
    assertEquals(10, space().dimension());
  }

  @Test
  void bracketsDoNotMatter() {
    Space angle = Space.angles(1);
    Space real = Space.reals(1);
    assertEquals(Q.and(angle).and(real).and(Q), Q.and(angle.and(real).and(Q)));
    assertEquals(
        Q.and(angle.and(real)).hashCode(), Q.and(angle).and(real).hashCode(), "as equals says");
    assertEquals(Space.reals(1).and(Space.angles(1)), real.and(angle), "flat is flat");
    assertNotEquals(Q.and(real), real.and(Q));
    assertNotEquals(Q.and(real), Q.and(angle));
  }

  @Test
  void itsTextNamesTheFactorsInOrder() {
    assertEquals(
        "(unit quaternion) x (angle, real) x (unit quaternion) x (real, real)",
        space().toString());
    assertNames(Q.and(new UserSpace()).toString(), "unit quaternion", "lengths");
  }
}
