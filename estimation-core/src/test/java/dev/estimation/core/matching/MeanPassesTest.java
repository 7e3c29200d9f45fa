package dev.estimation.core.matching;

import static dev.estimation.testing.Agreement.assertNames;
import static dev.estimation.testing.Agreement.assertVector;
import static dev.estimation.testing.Agreement.assertWithin;
import static org.junit.jupiter.api.Assertions.assertThrows;
import static org.junit.jupiter.api.Assertions.assertTrue;

import dev.estimation.core.gaussian.Moments;
import dev.estimation.core.points.CubatureRule;
import dev.estimation.core.points.RandomRule;
import dev.estimation.core.space.Space;
import dev.estimation.testing.BentFunction;
import dev.estimation.testing.RandomGaussians;
import dev.estimation.testing.Rotations;
import org.junit.jupiter.api.Test;

/** Means of rotations by more than one pass. */
class MeanPassesTest {
  private static final double THIRD = 1.0 / 3;
  private static final double[] THIRDS = {THIRD, THIRD, THIRD};
  private static final double[][] QUARTER_TURNS = {
    Rotations.about(90, 1, 0, 0), Rotations.about(90, 0, 1, 0), Rotations.about(90, 0, 0, 1)
  };
  private static final double[] SIXTY =
      Rotations.about(60, 1 / Math.sqrt(3), 1 / Math.sqrt(3), 1 / Math.sqrt(3));

  private static Moments meanOf(double[][] rotations, double[] weights, int passes) {
    return RotationMomentsTest.meanOf(
        rotations, weights, rule -> PointMatching.of(rule).withMeanPasses(passes));
  }

  private static double distance(double[] a, double[] b) {
    double[] apart = new double[3];
    Space.unitQuaternion().difference(a, b, apart);
    return Math.hypot(Math.hypot(apart[0], apart[1]), apart[2]);
  }

  /**
   * 90 degrees about x, y and z: by symmetry 60 degrees about (1, 1, 1), whichever mean is meant (w =
   * sqrt(3) / 2; derived). Each pass comes nearer; thirty leave rounding.
   */
  @Test
  void quarterTurnsAboutThreeAxes() {
    double last = distance(SIXTY, meanOf(QUARTER_TURNS, THIRDS, 1).mean());
    assertTrue(last > 0.01, "one pass is not enough here");
    for (int passes = 2; passes < 6; passes++) {
      double error = distance(SIXTY, meanOf(QUARTER_TURNS, THIRDS, passes).mean());
      double before = last;
      assertTrue(error < 0.5 * before, () -> error + " after " + before);
      last = error;
    }
    RotationMomentsTest.assertIs(SIXTY, meanOf(QUARTER_TURNS, THIRDS, 30).mean());
  }

  /**
   * From there the three are a apart with cos(a / 2) = sqrt(2 / 3), in directions 120 degrees apart across
   * n = (1, 1, 1) / sqrt(3): covariance a^2 / 2 (I - n n'). The centre's weight counts as the others' do.
   */
  @Test
  void theCovarianceIsAboutTheMean() {
    double a = 2 * Math.acos(Math.sqrt(2.0 / 3));
    Moments got = meanOf(QUARTER_TURNS, THIRDS, 30);
    for (int r = 0; r < 3; r++) {
      for (int c = 0; c < 3; c++) {
        double wanted = a * a / 2 * ((r == c ? 1 : 0) - THIRD);
        assertWithin("covariance", wanted, got.covariance().get(r, c), 1e-14, 1);
      }
    }
  }

  /** The order of points, and with it the centre, no longer matters. */
  @Test
  void theCentreIsOneAmongOthers() {
    double[][] turned = {QUARTER_TURNS[1], QUARTER_TURNS[2], Rotations.about(10, 1, 0, 0)};
    double[][] again = {turned[2], turned[0], turned[1]};
    Moments one = meanOf(turned, new double[] {0.5, 0.3, 0.2}, 60);
    Moments other = meanOf(again, new double[] {0.2, 0.5, 0.3}, 60);
    assertWithin("mean", 0, distance(one.mean(), other.mean()), 4e-15, 1);
    assertVector("covariance", one.covariance().data, other.covariance().data, 1e-14, 1);
  }

  /** Independent draws have a mean of their own; in a flat space passes change roundings only. */
  @Test
  void flatSpacesAndDraws() {
    Moments input = new RandomGaussians(5).moments(3);
    BentFunction bent = new BentFunction(3, 2, 6);
    PointMatching draws = PointMatching.of(RandomRule.independent(200, 7));
    Outcome one = Outcome.of(draws.workspace(Space.reals(3), Space.reals(2), bent), input);
    Outcome more =
        Outcome.of(draws.withMeanPasses(4).workspace(Space.reals(3), Space.reals(2), bent), input);
    // 1e-13: sums of 200 numbers of size up to 100.
    assertVector("mean", one.mean, more.mean, 1e-13, 10);
    assertVector("covariance", one.covariance.data, more.covariance.data, 1e-13, 100);
    assertVector("cross", one.unitCross.data, more.unitCross.data, 1e-13, 10);
  }

  @Test
  void aPassAtLeast() {
    PointMatching matching = PointMatching.of(CubatureRule.degreeThree());
    assertNames(
        assertThrows(IllegalArgumentException.class, () -> matching.withMeanPasses(0))
            .getMessage(),
        "mean passes",
        "1 or more",
        "0");
  }
}
