package dev.estimation.core.matching;

import static dev.estimation.testing.Agreement.assertCovariance;
import static dev.estimation.testing.Agreement.assertVector;
import static dev.estimation.testing.Agreement.assertWithin;

import dev.estimation.core.function.VectorFunction;
import dev.estimation.core.gaussian.Gaussian;
import dev.estimation.core.space.Space;
import dev.estimation.testing.BentFunction;
import dev.estimation.testing.OnceDifferentiable;
import dev.estimation.testing.PlainFunction;
import dev.estimation.testing.PolarToCartesian;
import dev.estimation.testing.RandomGaussians;
import org.ejml.data.DMatrixRMaj;
import org.junit.jupiter.api.Test;

/** Second order: the formulas written out, and derivatives from everywhere they may come from. */
class SecondOrderTest {
  private static Outcome carry(MomentMatching matching, VectorFunction function, Gaussian input) {
    int n = input.dimension();
    MatchingWorkspace work = matching.workspace(Space.reals(n), Space.reals(3), function);
    return Outcome.of(work, RandomGaussians.momentsOf(input));
  }

  /** tr(H_i P) / 2 and tr(H_i P H_j P) / 2 by plain loops. 1e-13: sums of 4^4 terms of size 1. */
  @Test
  void theFormulasOfTheBook() {
    for (int seed = 0; seed < 10; seed++) {
      Gaussian input = new RandomGaussians(seed).gaussian(4);
      BentFunction bent = new BentFunction(4, 3, seed);
      Outcome first = carry(Linearisation.firstOrder(), bent, input);
      Outcome second = carry(Linearisation.secondOrder(), bent, input);
      double[] hessians = new double[3 * 4 * 4];
      bent.structure().hessian().orElseThrow().evaluate(input.mean(), new double[1], hessians);
      double[][][] product = new double[3][4][4];
      for (int i = 0; i < 3; i++) {
        for (int r = 0; r < 4; r++) {
          for (int c = 0; c < 4; c++) {
            for (int s = 0; s < 4; s++) {
              double entry = hessians[(i * 4 + Math.max(r, s)) * 4 + Math.min(r, s)];
              product[i][r][c] += entry * input.covariance(s, c);
            }
          }
        }
      }
      for (int i = 0; i < 3; i++) {
        double shift = trace(product[i]) / 2;
        assertWithin("mean", first.mean[i] + shift, second.mean[i], 1e-13, 1);
        for (int j = 0; j < 3; j++) {
          double more = traceOfProduct(product[i], product[j]) / 2;
          double wanted = first.covariance.get(i, j) + more;
          assertWithin("covariance", wanted, second.covariance.get(i, j), 1e-13, 10);
        }
      }
      assertVector("W", first.unitCross.data, second.unitCross.data, 0, 1);
    }
  }

  private static double trace(double[][] a) {
    double sum = 0;
    for (int i = 0; i < a.length; i++) {
      sum += a[i][i];
    }
    return sum;
  }

  private static double traceOfProduct(double[][] a, double[][] b) {
    double sum = 0;
    for (int i = 0; i < a.length; i++) {
      for (int j = 0; j < a.length; j++) {
        sum += a[i][j] * b[j][i];
      }
    }
    return sum;
  }

  /**
   * Range 20 (5) m and angle 45 (30) degrees: covariance of x and y -38.242, from the same outside source
   * as polar2d_rule_outputs.csv, printed to three decimals.
   */
  @Test
  void aWidePolarCaseWithCorrelation() {
    Gaussian polar = Gaussian.independent(
        new double[] {20, Math.toRadians(45)}, new double[] {5, Math.toRadians(30)});
    MatchingWorkspace work = Linearisation.secondOrder()
        .workspace(Space.reals(2), Space.reals(2), new PolarToCartesian());
    Outcome got = Outcome.of(work, RandomGaussians.momentsOf(polar));
    assertWithin("covariance of x and y", -38.242, got.covariance.get(0, 1), 5e-4, 1);
  }

  /** Differences of Jacobians are good to 1e-10 or so of curvatures of size 1, those of values to 1e-7. */
  @Test
  void derivativesFromEverywhereAgree() {
    for (int seed = 0; seed < 10; seed++) {
      Gaussian input = new RandomGaussians(100 + seed).gaussian(5);
      BentFunction bent = new BentFunction(5, 3, seed);
      Outcome wanted = carry(Linearisation.secondOrder(), bent, input);
      Linearisation scaled = Linearisation.secondOrder().withInputScales(1, 1, 1, 1, 1);
      VectorFunction jacobianOnly = new OnceDifferentiable(bent);
      assertAgree(wanted, carry(scaled, jacobianOnly, input), 1e-8);
      assertAgree(wanted, carry(scaled, new PlainFunction(bent), input), 1e-5);
    }
  }

  /** As the spread shrinks, so does the difference: fourth derivatives times its square. */
  @Test
  void overASmallSpreadDifferencesAreDerivatives() {
    for (int seed = 0; seed < 10; seed++) {
      Gaussian wide = new RandomGaussians(200 + seed).gaussian(3);
      DMatrixRMaj covariance = wide.covariance();
      for (int i = 0; i < 9; i++) {
        covariance.data[i] *= 1e-6;
      }
      Gaussian input = Gaussian.of(wide.mean(), covariance);
      BentFunction bent = new BentFunction(3, 3, seed);
      Outcome first = carry(Linearisation.firstOrder(), bent, input);
      Outcome wanted = carry(Linearisation.secondOrder(), bent, input);
      Outcome got = carry(SpreadLinearisation.secondOrder(), bent, input);
      for (int i = 0; i < 3; i++) {
        // Shifts are of size 1e-6; 1e-10 is 1e-6 of that, with the rounding of values near 1.
        double shift = wanted.mean[i] - first.mean[i];
        assertWithin("shift", shift, got.mean[i] - first.mean[i], 1e-10, 1);
      }
      assertCovariance("covariance", wanted.covariance, got.covariance, 1e-4);
    }
  }

  private static void assertAgree(Outcome wanted, Outcome got, double tolerance) {
    assertVector("mean", wanted.mean, got.mean, tolerance, 1);
    assertCovariance("covariance", wanted.covariance, got.covariance, tolerance);
  }
}
