package dev.estimation.core.matching;

import static dev.estimation.testing.Agreement.assertWithin;

import dev.estimation.core.gaussian.Gaussian;
import dev.estimation.core.gaussian.Moments;
import dev.estimation.core.space.Space;
import dev.estimation.testing.BentFunction;
import dev.estimation.testing.PlainFunction;
import dev.estimation.testing.RandomGaussians;
import org.junit.jupiter.api.Test;

/**
 * Norgaard, Poulsen and Ravn 2000, written out as they have it (from memory): mean = (h^2 - n) / h^2 g(m)
 * + sum (g_+ + g_-) / (2 h^2), covariance = sum (g_+ - g_-)(g_+ - g_-)' / (4 h^2) + (h^2 - 1) / (4 h^4)
 * sum (g_+ + g_- - 2 g(m))(...)', h^2 = 3. 1e-13: sums of some ten numbers of size 1 to 10.
 */
class SpreadFormulaTest {
  private static final int N = 4;
  private static final double H2 = 3;

  private final BentFunction bent = new BentFunction(N, 1, 5);
  private final Gaussian input = new RandomGaussians(6).gaussian(N);
  private final Moments moments = RandomGaussians.momentsOf(input);

  private Outcome carry(MomentMatching matching) {
    PlainFunction plain = new PlainFunction(bent);
    return Outcome.of(matching.workspace(Space.reals(N), Space.reals(1), plain), moments);
  }

  private double image(int column, double step) {
    moments.factor();
    double[] point = input.mean();
    for (int i = 0; i < N; i++) {
      point[i] += step * moments.lowerFactor().get(i, column);
    }
    double[] result = new double[1];
    bent.evaluate(point, new double[1], result);
    return result[0];
  }

  @Test
  void alongAxesItIsTheirSecondOrder() {
    double centre = image(0, 0);
    double mean = (H2 - N) / H2 * centre;
    double odd = 0;
    double even = 0;
    for (int a = 0; a < N; a++) {
      double ahead = image(a, Math.sqrt(H2));
      double behind = image(a, -Math.sqrt(H2));
      mean += (ahead + behind) / (2 * H2);
      odd += (ahead - behind) * (ahead - behind) / (4 * H2);
      even += Math.pow(ahead + behind - 2 * centre, 2);
    }
    Outcome second = carry(SpreadLinearisation.secondOrderAlongAxes());
    assertWithin("mean", mean, second.mean[0], 1e-13, 1);
    double variance = odd + (H2 - 1) / (4 * H2 * H2) * even;
    assertWithin("variance", variance, second.covariance.get(0, 0), 1e-13, 1);
    Outcome first = carry(SpreadLinearisation.firstOrder());
    assertWithin("mean", centre, first.mean[0], 0, 1);
    assertWithin("variance", odd, first.covariance.get(0, 0), 1e-13, 1);
  }

  /** Points at sqrt 3 with weights 1/6: the mean of kappa = 3 - n, and the same W. */
  @Test
  void theMeanIsThatOfTheUnscentedRule() {
    Outcome unscented = carry(NamedMatchings.of("unscented 1 0 3-n"));
    Outcome spread = carry(SpreadLinearisation.secondOrderAlongAxes());
    assertWithin("mean", unscented.mean[0], spread.mean[0], 1e-13, 1);
    for (int a = 0; a < N; a++) {
      assertWithin("W", unscented.unitCross.get(a, 0), spread.unitCross.get(a, 0), 1e-13, 1);
    }
  }
}
