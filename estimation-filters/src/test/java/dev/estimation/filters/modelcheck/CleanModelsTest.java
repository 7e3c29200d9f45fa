package dev.estimation.filters.modelcheck;

import static org.junit.jupiter.api.Assertions.assertEquals;

import dev.estimation.core.space.Space;
import dev.estimation.filters.motion.GyroscopeAttitude;
import dev.estimation.filters.testing.Attitude;
import java.util.List;
import org.junit.jupiter.api.Test;

/** Nothing, neither fault nor hint nor note, is said of right models, however hard, with any of several seeds. */
class CleanModelsTest {
  static final Space POSE = Space.reals(2).and(Space.angles(1));

  private static Region lift() {
    return Region.around(Space.reals(2), new double[] {300, 0}, 300, 5).withSteps(0.1, 4);
  }

  /** The heading takes the full circle; the buoy stays 50 m off in east at least. */
  static Region sight() {
    return Region.around(POSE, new double[] {0, 0, 3}, 200, 200, Math.PI)
        .withGiven(new double[] {250, -500}, new double[] {500, 500});
  }

  static Region cart() {
    return Region.around(POSE, new double[] {10, 20, Math.PI}, 50, 50, 1)
        .withControl(new double[] {0, -1}, new double[] {3, 1})
        .withSteps(0.05, 1);
  }

  private static Region attitude() {
    return Region.around(
            Attitude.SPACE,
            new double[] {0.5, 0.5, -0.5, 0.5, 0, 0, 0},
            0.5,
            0.5,
            0.5,
            0.01,
            0.01,
            0.01)
        .withControl(new double[] {-1, -1, -1}, new double[] {1, 1, 1})
        .withSteps(0.005, 0.5);
  }

  private static Region satellite(double halfWidth) {
    return Region.around(
            Space.reals(4),
            new double[] {3.9e6, 5e5, 5e6, 1e5},
            halfWidth,
            halfWidth,
            halfWidth,
            halfWidth)
        .withGiven(new double[] {1e7, -1.5e7, 1e7}, new double[] {2e7, 1.5e7, 2e7});
  }

  private static Region turning(double east, double widthOfPlace) {
    return Region.around(
            Space.reals(5),
            new double[] {east, 0, 0, 0, 0},
            widthOfPlace,
            widthOfPlace,
            20,
            20,
            0.3)
        .withSteps(0.1, 2);
  }

  private static List<ModelReport> reports(ModelCheckMaker with) {
    return List.of(
        with.over(lift()).examine(new CleanModels.Lift()),
        with.over(turning(0, 1000)).examine(new CleanModels.Turning()),
        with.over(turning(1e7, 1)).examine(new CleanModels.Turning()),
        with.over(sight()).examine(new CleanModels.BuoySight()),
        with.over(satellite(1e5)).examine(new CleanModels.Pseudorange()),
        with.over(satellite(1)).examine(new CleanModels.Pseudorange()),
        with.over(cart()).examine(new CleanModels.Cart()),
        with.over(attitude()).examine(new GyroscopeAttitude(1e-6, 1e-10)),
        with.over(mooring()).examine(new CleanModels.Mooring()),
        with.over(masts()).examine(new CleanModels.DistanceDifference()),
        with.over(attitudeAlone().withGiven(new double[] {0.2, 0.2, 0.2}, new double[] {1, 1, 1}))
            .examine(Attitude.knownVector(0.01)),
        with.over(attitudeAlone()).examine(new Attitude.Camera(0.01)));
  }

  private static Region mooring() {
    return Region.between(Space.reals(1), new double[] {-5}, new double[] {5}).withSteps(0.1, 60);
  }

  private static Region masts() {
    return Region.between(Space.reals(2), new double[] {-3, -3}, new double[] {3, 3})
        .withGiven(new double[] {2e7, 0, 2e7, 10}, new double[] {2.1e7, 5e6, 2.1e7, 5e6});
  }

  private static Region attitudeAlone() {
    return Region.around(Space.unitQuaternion(), new double[] {0.5, -0.5, 0.5, 0.5}, 2, 2, 2);
  }

  /** A check with a seed of its own. */
  private interface ModelCheckMaker {
    ModelCheck over(Region region);
  }

  @Test
  void nothingIsSaidOfRightModels() {
    for (long seed = 1; seed <= 5; seed++) {
      long its = seed;
      for (ModelReport report : reports(region -> ModelCheck.over(region).withSeed(its))) {
        assertEquals(
            report.model() + ": 0 faults, 0 hints at 200 places", report.toString(), "seed " + its);
        report.assertClean();
      }
    }
  }
}
