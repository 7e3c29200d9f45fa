package dev.estimation.core.ugly;

import static dev.estimation.testing.Agreement.assertNames;
import static dev.estimation.testing.Agreement.assertSameBits;
import static org.junit.jupiter.api.Assertions.assertEquals;

import dev.estimation.core.gaussian.Gaussian;
import dev.estimation.core.gaussian.Moments;
import dev.estimation.core.matching.Linearisation;
import dev.estimation.core.matching.MatchingStatus;
import dev.estimation.core.matching.MatchingWorkspace;
import dev.estimation.core.matching.MomentMatching;
import dev.estimation.core.matching.PointMatching;
import dev.estimation.core.matching.SpreadLinearisation;
import dev.estimation.core.points.CubatureRule;
import dev.estimation.core.points.GaussHermiteRule;
import dev.estimation.core.points.UnscentedRule;
import dev.estimation.core.space.Space;
import dev.estimation.testing.RandomGaussians;
import java.util.stream.Stream;
import org.ejml.data.DMatrixRMaj;

/** One workspace with a problem that works, to be asked again after every failure. */
final class UglyFixture {
  final MatchingWorkspace work;
  private final double[] mean;
  private final DMatrixRMaj covariance;
  private final DMatrixRMaj cross;

  /** The matchings that are tried. */
  enum Way {
    LINEARISATION,
    DIFFERENCES,
    SECOND_ORDER,
    SECOND_DIFFERENCES,
    SPREAD,
    SPREAD_SECOND_ORDER,
    UNSCENTED,
    UNSCENTED_NARROW,
    CUBATURE,
    GAUSS_HERMITE;

    MomentMatching matching() {
      return switch (this) {
        case LINEARISATION -> Linearisation.firstOrder();
        case DIFFERENCES -> Linearisation.firstOrder().withInputScales(1, 1);
        case SECOND_ORDER, SECOND_DIFFERENCES -> Linearisation.secondOrder().withInputScales(1, 1);
        case SPREAD -> SpreadLinearisation.firstOrder();
        case SPREAD_SECOND_ORDER -> SpreadLinearisation.secondOrder();
        case UNSCENTED -> PointMatching.of(UnscentedRule.scaled(1, 2, 0));
        case UNSCENTED_NARROW -> PointMatching.of(UnscentedRule.scaled(1e-3, 2, 0));
        case CUBATURE -> PointMatching.of(CubatureRule.degreeThree());
        case GAUSS_HERMITE -> PointMatching.of(GaussHermiteRule.product(3));
      };
    }

    /** Those that evaluate a standard deviation or so away from the mean. */
    static Stream<Way> wide() {
      return Stream.of(SPREAD, SPREAD_SECOND_ORDER, UNSCENTED, CUBATURE, GAUSS_HERMITE);
    }
  }

  UglyFixture(Way way) {
    BadFunctions function = new BadFunctions(way == Way.LINEARISATION || way == Way.SECOND_ORDER);
    work = way.matching().workspace(Space.reals(2), Space.reals(2), function);
    assertEquals(MatchingStatus.MATCHED, carry(good(), BadFunctions.GOOD));
    mean = work.output().mean().clone();
    covariance = work.output().covariance().copy();
    cross = work.unitCrossCovariance().copy();
  }

  /** Moments that every call takes. */
  static Moments good() {
    return RandomGaussians.momentsOf(Gaussian.of(
        new double[] {0.3, -0.2}, new double[][] {{1, 0.2}, {0.2, 0.5}}));
  }

  MatchingStatus carry(Moments input, double conduct) {
    return work.carry(input, new double[] {conduct}, null);
  }

  /** A call must fail in the given way and say so in the given words. */
  void assertFails(MatchingStatus wanted, Moments input, double conduct, String... words) {
    assertEquals(wanted, carry(input, conduct), work::failure);
    assertNames(work.failure(), words);
  }

  /** The good problem must give what it gave at first, bit for bit. */
  void assertUsable() {
    assertEquals(MatchingStatus.MATCHED, carry(good(), BadFunctions.GOOD), work::failure);
    assertEquals("", work.failure());
    assertSameBits("mean", mean, work.output().mean());
    assertSameBits("covariance", covariance, work.output().covariance());
    assertSameBits("unit cross-covariance", cross, work.unitCrossCovariance());
  }
}
