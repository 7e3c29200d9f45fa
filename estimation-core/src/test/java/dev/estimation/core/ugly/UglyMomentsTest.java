package dev.estimation.core.ugly;

import static dev.estimation.testing.Agreement.assertNames;
import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertNotEquals;
import static org.junit.jupiter.api.Assertions.assertThrows;

import dev.estimation.core.gaussian.Covariance;
import dev.estimation.core.gaussian.Moments;
import dev.estimation.core.matching.MatchingStatus;
import dev.estimation.core.space.Space;
import dev.estimation.core.ugly.UglyFixture.Way;
import dev.estimation.testing.RandomGaussians;
import org.ejml.data.DMatrixRMaj;
import org.junit.jupiter.api.function.Executable;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.EnumSource;

/** Moments that are not those of a Gaussian, and arguments of the wrong shape. */
class UglyMomentsTest {
  private static final double[] NOT_FINITE = {
    Double.NaN, Double.POSITIVE_INFINITY, Double.NEGATIVE_INFINITY,
  };

  @ParameterizedTest
  @EnumSource
  void aMeanThatIsNotFinite(Way way) {
    UglyFixture fixture = new UglyFixture(way);
    for (double bad : NOT_FINITE) {
      Moments input = UglyFixture.good();
      input.changeMean()[1] = bad;
      fixture.assertFails(
          MatchingStatus.INPUT_NOT_FINITE,
          input,
          BadFunctions.GOOD,
          "mean[1]",
          Double.toString(bad));
      fixture.assertUsable();
    }
  }

  @ParameterizedTest
  @EnumSource
  void aCovarianceThatIsNotFinite(Way way) {
    UglyFixture fixture = new UglyFixture(way);
    for (double bad : NOT_FINITE) {
      for (int place = 0; place < 3; place++) {
        Moments input = UglyFixture.good();
        int row = (place + 1) / 2;
        int column = place / 2;
        input.changeCovariance().set(row, column, bad);
        input.changeCovariance().set(column, row, bad);
        fixture.assertFails(
            MatchingStatus.INPUT_NOT_DEFINITE,
            input,
            BadFunctions.GOOD,
            "covariance",
            "pivot",
            "of 2");
        fixture.assertUsable();
      }
    }
  }

  @ParameterizedTest
  @EnumSource
  void aCovarianceThatIsIndefinite(Way way) {
    UglyFixture fixture = new UglyFixture(way);
    Moments input = UglyFixture.good();
    input.changeCovariance().set(new double[][] {{1, 2}, {2, 1}});
    fixture.assertFails(
        MatchingStatus.INPUT_NOT_DEFINITE,
        input,
        BadFunctions.GOOD,
        "positive semi-definite",
        "pivot 2 of 2",
        "-3.0");
    assertEquals(0, fixture.work.evaluations(), "nothing was evaluated");
    fixture.assertUsable();
  }

  /** The words belong to the call, whatever the caller does to the moments after it. */
  @ParameterizedTest
  @EnumSource
  void theFailureIsStillKnownWhenTheMeanIsMended(Way way) {
    UglyFixture fixture = new UglyFixture(way);
    Moments input = UglyFixture.good();
    input.changeMean()[1] = Double.NaN;
    assertEquals(MatchingStatus.INPUT_NOT_FINITE, fixture.carry(input, BadFunctions.GOOD));
    input.set(UglyFixture.good());
    assertNames(fixture.work.failure(), "mean[1]", "NaN");
  }

  @ParameterizedTest
  @EnumSource
  void theFailureIsStillKnownWhenTheCovarianceIsMended(Way way) {
    UglyFixture fixture = new UglyFixture(way);
    Moments input = UglyFixture.good();
    input.changeCovariance().set(1, 1, -4);
    assertEquals(MatchingStatus.INPUT_NOT_DEFINITE, fixture.carry(input, BadFunctions.GOOD));
    input.set(UglyFixture.good());
    input.factor();
    assertNames(fixture.work.failure(), "pivot 2 of 2", "-4.04");
  }

  /** NaN in what is given or in the noise must never pass. */
  @ParameterizedTest
  @EnumSource
  void noiseThatIsNotFinite(Way way) {
    UglyFixture fixture = new UglyFixture(way);
    for (double bad : NOT_FINITE) {
      DMatrixRMaj noise = new DMatrixRMaj(2, 2);
      noise.set(1, 0, bad);
      noise.set(0, 1, bad);
      MatchingStatus status = fixture.work.carry(
          UglyFixture.good(), new double[] {BadFunctions.GOOD}, RandomGaussians.noise(noise));
      assertNotEquals(MatchingStatus.MATCHED, status);
      assertNames(fixture.work.failure(), "noise");
      fixture.assertUsable();
    }
  }

  @ParameterizedTest
  @EnumSource
  void wrongShapesAreMistakesOfTheCaller(Way way) {
    UglyFixture fixture = new UglyFixture(way);
    double[] given = new double[1];
    Moments large = new RandomGaussians(1).moments(3);
    assertRefused(() -> fixture.work.carry(large, given, null), "input", "2", "3");
    Covariance wide = new Covariance(3);
    Moments good = UglyFixture.good();
    assertRefused(() -> fixture.work.carry(good, given, wide), "noise", "2 x 2", "3 x 3");
    fixture.assertUsable();
  }

  private static void assertRefused(Executable call, String... fragments) {
    assertNames(assertThrows(IllegalArgumentException.class, call).getMessage(), fragments);
  }

  /** A workspace takes any moments of its size; zero covariance is the plainest of all. */
  @ParameterizedTest
  @EnumSource
  void aCovarianceOfZeros(Way way) {
    UglyFixture fixture = new UglyFixture(way);
    Moments input = new Moments(Space.reals(2));
    assertEquals(MatchingStatus.MATCHED, fixture.carry(input, BadFunctions.GOOD));
    assertEquals(0, Math.abs(fixture.work.output().covariance().get(0, 0)));
    fixture.assertUsable();
  }
}
