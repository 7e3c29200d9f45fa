package dev.estimation.core.matching;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertTrue;

import dev.estimation.core.accuracy.CarriedMoments;
import dev.estimation.core.accuracy.MatchingError;
import dev.estimation.core.accuracy.OperatingPoint;
import dev.estimation.core.accuracy.ReferenceSearch;
import dev.estimation.core.accuracy.ReferenceSettings;
import dev.estimation.core.function.VectorFunction;
import dev.estimation.core.gaussian.Gaussian;
import dev.estimation.core.gaussian.Moments;
import dev.estimation.core.space.Space;
import dev.estimation.testing.PolarToCartesian;
import org.ejml.data.DMatrixRMaj;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.CsvSource;

/** Evaluations at a tolerance of 0.01 without noise, and the true error then; limits on counts are goals set beforehand. */
class ToleranceCountsTest {
  @ParameterizedTest
  @CsvSource({"0.01, 7", "0.03, 17", "0.1, 17", "0.3, 17", "0.5, 17"})
  void polarToCartesian(double deviation, int most) {
    for (double bearing : new double[] {0, 0.7, 2}) {
      Gaussian input =
          Gaussian.independent(new double[] {1000, bearing}, new double[] {10, deviation});
      VectorFunction polar = new PolarToCartesian();
      check(input, polar, most);
    }
  }

  @ParameterizedTest
  @CsvSource({"1, 13, 9", "5, 83, 9", "10, 107, 9", "20, 91, 9"})
  void coordinatedTurn(double seconds, int most, int mostWhenLinear) {
    Gaussian input =
        Gaussian.independent(new double[] {0, 0, 150, 0, 0.05}, new double[] {10, 10, 5, 5, 0.02});
    VectorFunction linear = new LinearTurn(true);
    VectorFunction opaque = linear::evaluate;
    check(input, opaque, most, seconds);
    check(input, linear, mostWhenLinear, seconds);
  }

  private static void check(Gaussian input, VectorFunction function, int most, double... given) {
    Space output = Space.reals(input.mean().length);
    MatchingWorkspace work = ToleranceMatching.within(0.01)
        .workspace(Space.reals(input.mean().length), output, function);
    Moments moments = new Moments(Space.reals(input.mean().length));
    moments.set(input);
    assertEquals(MatchingStatus.MATCHED, work.carry(moments, given, null));
    OperatingPoint point =
        OperatingPoint.of(input, new DMatrixRMaj(output.dimension(), output.dimension()), given);
    VectorFunction truth = given.length == 0 ? function : new LinearTurn(false);
    CarriedMoments reference = new ReferenceSearch(
            ReferenceSettings.standard(), Space.reals(input.mean().length), output, truth)
        .find(point, Use.PREDICTION)
        .moments();
    double error = MatchingError.of(reference, CarriedMoments.of(work, moments), Use.PREDICTION)
        .largest();
    assertTrue(work.evaluations() <= most, work.evaluations() + " evaluations, at most " + most);
    assertTrue(error <= 0.01, "true error " + error + ", estimated " + work.estimatedError());
  }
}
