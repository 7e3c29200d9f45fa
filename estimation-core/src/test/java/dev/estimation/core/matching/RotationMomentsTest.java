package dev.estimation.core.matching;

import static dev.estimation.testing.Agreement.assertVector;
import static dev.estimation.testing.Agreement.assertWithin;
import static org.junit.jupiter.api.Assertions.assertEquals;

import dev.estimation.core.function.VectorFunction;
import dev.estimation.core.gaussian.Gaussian;
import dev.estimation.core.gaussian.Moments;
import dev.estimation.core.points.PointRule;
import dev.estimation.core.points.UnitPoints;
import dev.estimation.core.space.Space;
import dev.estimation.testing.Rotations;
import org.ejml.data.DMatrixRMaj;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.CsvSource;

/** Rotations into vectors and vectors into rotations, against closed forms. */
class RotationMomentsTest {
  private static final Space ROTATION = Space.unitQuaternion();
  private static final double[] MEAN = {0.5, -0.5, 0.5, 0.5};

  /** The vector (1, 2, 2) as the turned frame sees it, R(q)' u. */
  private static final VectorFunction SEEN = (q, given, output) -> {
    DMatrixRMaj turn = Rotations.matrix(q);
    for (int i = 0; i < 3; i++) {
      output[i] = turn.get(0, i) + 2 * turn.get(1, i) + 2 * turn.get(2, i);
    }
  };

  private static double[] meanSeen(String matching, double deviation) {
    Moments input = new Moments(ROTATION);
    input.set(Gaussian.independent(ROTATION, MEAN, new double[] {deviation, deviation, deviation}));
    MatchingWorkspace work = NamedMatchings.of(matching).workspace(ROTATION, Space.reals(3), SEEN);
    return Outcome.of(work, input).mean;
  }

  private static void assertShrunk(double factor, double[] got, double tolerance) {
    double[] wanted = new double[3];
    SEEN.evaluate(MEAN, wanted, wanted);
    for (int i = 0; i < 3; i++) {
      wanted[i] *= factor;
    }
    assertVector("R'u shrunk by " + factor, wanted, got, tolerance, 3);
  }

  /**
   * For v ~ N(0, s^2 I) of three components, E exp(v) is (1 + 2 E cos |v|) / 3 times I with E cos |v| =
   * (1 - s^2) exp(-s^2 / 2), from E sin(t |v|) / |v| = t exp(-s^2 t^2 / 2) by d/dt at t = 1 (derived). The
   * errors of the rules: 1.1e-8, 4e-15 and 4e-8 were measured for the first three (tolerances two to five
   * times that), roundings for the others, of up to 8000 points.
   */
  @ParameterizedTest
  @CsvSource({
    "Gauss-Hermite 3, 0.1, 3e-8",
    "Gauss-Hermite 5, 0.1, 2e-14",
    "Gauss-Hermite 5, 0.5, 1e-7",
    "Gauss-Hermite 9, 0.5, 1e-14",
    "Gauss-Hermite 20, 1.2, 1e-14",
  })
  void theMeanOfATurnedVector(String matching, double deviation, double tolerance) {
    double square = deviation * deviation;
    double cosine = (1 - square) * Math.exp(-square / 2);
    assertShrunk((1 + 2 * cosine) / 3, meanSeen(matching, deviation), tolerance);
  }

  /**
   * Points at c s along each axis: one component in three stays, two shrink by cos(c s). Exact for these
   * rules at any spread, 1.2 rad and beyond a quarter turn too. 1e-15: roundings.
   */
  @ParameterizedTest
  @CsvSource({"cubature 3, 0.3", "cubature 3, 1.2", "unscented 1 2 0, 1.2", "unscented 1 2 0, 2"})
  void theMeanByPointsOnAxes(String matching, double deviation) {
    double factor = (1 + 2 * Math.cos(Math.sqrt(3) * deviation)) / 3;
    assertShrunk(factor, meanSeen(matching, deviation), 1e-15);
  }

  /** Wide spreads of a rotation that is only turned: exact while every point is within half a turn. */
  @ParameterizedTest
  @CsvSource({"cubature 3, 1.2", "cubature 3, 1.8", "unscented 1 2 0, 1.8", "Gauss-Hermite 3, 1.04"
  })
  void wideSpreads(String matching, double deviation) {
    Moments input = new Moments(ROTATION);
    input.set(Gaussian.independent(ROTATION, MEAN, new double[] {deviation, 1e-3, deviation}));
    RotationChecks.Turned still =
        new RotationChecks.Turned(new double[] {1, 0, 0, 0}, new double[] {1, 0, 0, 0});
    MatchingWorkspace work = NamedMatchings.of(matching).workspace(ROTATION, ROTATION, still);
    Outcome got = Outcome.of(work, input);
    for (int i = 0; i < 9; i++) {
      assertWithin(
          "covariance", input.covariance().data[i], got.covariance.data[i], 1e-14, deviation);
    }
  }

  /** Weighted rotations as the images of points 1, 2, ... of one input, with the first as the centre. */
  static Moments meanOf(double[][] rotations, double[] weights, PassedMatching matching) {
    double[][] points = new double[weights.length - 1][1];
    double[] rest = new double[points.length];
    for (int i = 0; i < points.length; i++) {
      points[i][0] = i + 1;
      rest[i] = weights[i + 1];
    }
    PointRule rule = n -> UnitPoints.of(n, weights[0], weights[0], points, rest);
    Moments input = new Moments(Space.reals(1));
    input.set(Gaussian.independent(new double[1], new double[] {1}));
    MatchingWorkspace work = matching
        .of(rule)
        .workspace(
            Space.reals(1),
            ROTATION,
            (u, g, q) -> System.arraycopy(rotations[(int) Math.round(u[0])], 0, q, 0, 4));
    assertEquals(MatchingStatus.MATCHED, work.carry(input, new double[0], null), work::failure);
    return work.output();
  }

  /** How a rule becomes a matching. */
  interface PassedMatching {
    MomentMatching of(PointRule rule);
  }

  /** About one axis a single pass is enough: the mean is that of the angles, as measured from the first. */
  @ParameterizedTest
  @CsvSource({
    "355, 5, 15, 5",
    "350, 0, 10, 0",
    "179, -179, 181, 180.333333333333333",
    "10, 20, 30, 20",
    "350, 0, 20, 3.333333333333333",
    "0, 0, 90, 30"
  })
  void anglesAboutOneAxis(double a, double b, double c, double mean) {
    double[][] all = {
      Rotations.about(a, 0, 0, 1), Rotations.about(b, 0, 0, 1), Rotations.about(c, 0, 0, 1)
    };
    double third = 1.0 / 3;
    Moments got = meanOf(all, new double[] {third, third, third}, PointMatching::of);
    assertIs(Rotations.about(mean, 0, 0, 1), got.mean());
  }

  /** 10 degrees and minus the quaternion of 30 degrees: the sign means nothing. */
  @Test
  void theSignMeansNothing() {
    double[] minus = Rotations.about(30 + 360, 0, 0, 1);
    Moments got = meanOf(
        new double[][] {Rotations.about(10, 0, 0, 1), minus},
        new double[] {0.5, 0.5},
        PointMatching::of);
    assertIs(Rotations.about(20, 0, 0, 1), got.mean());
  }

  /** Roundings of angles in degrees and of a rotation. */
  static void assertIs(double[] wanted, double[] got) {
    double[] apart = new double[3];
    ROTATION.difference(got, wanted, apart);
    assertVector("mean", new double[3], apart, 4e-15, 1);
  }
}
