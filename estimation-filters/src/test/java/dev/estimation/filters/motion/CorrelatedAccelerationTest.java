package dev.estimation.filters.motion;

import static org.junit.jupiter.api.Assertions.assertArrayEquals;
import static org.junit.jupiter.api.Assertions.assertEquals;

import dev.estimation.filters.model.DifferentiableMotion;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.ValueSource;

class CorrelatedAccelerationTest extends MotionContract {
  private static final double[] ANY = {0, 0, 0};

  @Override
  DifferentiableMotion model() {
    return new CorrelatedAcceleration(20, 0.5, 0.1);
  }

  @Override
  double[][] states() {
    return new double[][] {{10, -20, 3, 4, -0.5, 0.2}, new double[6]};
  }

  @Override
  double[] scales() {
    return new double[] {1, 1, 1, 1, 1, 1};
  }

  /**
   * F and Q, upper triangles row by row, for tau = 20 s and q = 0.5 m^2/s^5. Source: the exponential of the matrix [-A D;
   * 0 A'] dt (Van Loan 1978), from 600 s on the integral of g g', with 60 digits in mpmath 1.3.0; rounded to 17. Held to
   * 5e-14 of each entry: above u = 1 the closed forms lose up to two digits.
   */
  @Test
  void equalsTheMatrixExponential() {
    check(
        1e-3,
        new double[] {
          1, 0.001, 4.9999166677083229e-7, 1, 0.00099997500041666146, 0.99995000124997917
        },
        new double[] {
          2.4999305567956176e-17,
          6.249791671006875e-14,
          8.3329166781247743e-11,
          1.666604168124974e-10,
          2.4998750036457552e-7,
          0.0004999750008333125
        });
    check(
        2,
        new double[] {1, 2, 1.9349672143838293, 1, 1.9032516392808085, 0.90483741803595957},
        new double[] {
          0.75709944078298483,
          0.93602453018507897,
          0.60352662965245339,
          1.237838131712868,
          0.90559170060627123,
          0.90634623461009071
        });
    check(
        19,
        new double[] {1, 19, 134.69640938180048, 1, 12.265179530909976, 0.38674102345450121},
        new double[] {
          37919.059986874956,
          4535.7806750873973,
          231.24687242762531,
          594.79094919073955,
          37.608657231363264,
          4.2521569038868247
        });
    check(
        21,
        new double[] {1, 21, 159.97509964446214, 1, 13.001245017776893, 0.34993774911115535},
        new double[] {
          59644.02038413248,
          6398.0081265638978,
          285.34859722718369,
          754.58913638327902,
          42.25809300306712,
          4.3877178587350904
        });
    check(
        600,
        new double[] {1, 600, 11600.000000000037, 1, 19.999999999998128, 9.3576229688401746e-14},
        new double[] {
          13008799999.999991,
          33640000.000000217,
          1999.9999999887709,
          114000.00000000075,
          99.999999999981285,
          5
        });
  }

  private static void check(double dt, double[] transition, double[] noise) {
    DifferentiableMotion line = new CorrelatedAcceleration(20, 0.5);
    double[] none = {};
    double[] f = MotionFunctions.jacobian(line, ANY, none, dt);
    double[] q = MotionFunctions.noise(line, ANY, none, dt);
    int at = 0;
    for (int i = 0; i < 3; i++) {
      for (int j = i; j < 3; j++, at++) {
        assertEquals(transition[at], f[3 * i + j], 5e-14 * transition[at], "F at dt " + dt);
        assertEquals(noise[at], q[3 * i + j], 5e-14 * noise[at], "Q at dt " + dt);
      }
    }
  }

  /** u = dt / tau down to 1e-12: what differs is of order u. */
  @ParameterizedTest
  @ValueSource(doubles = {1e-4, 1e-8, 1e-12, 1e-200})
  void aShortStepIsThatOfConstantAcceleration(double u) {
    DifferentiableMotion slow = new CorrelatedAcceleration(2 / u, 0.5);
    DifferentiableMotion constant = new ConstantAcceleration(0.5);
    double[] none = {};
    double[] expected = MotionFunctions.noise(constant, ANY, none, 2);
    double[] noise = MotionFunctions.noise(slow, ANY, none, 2);
    double[] wanted = MotionFunctions.jacobian(constant, ANY, none, 2);
    double[] transition = MotionFunctions.jacobian(slow, ANY, none, 2);
    for (int i = 0; i < 9; i++) {
      assertEquals(expected[i], noise[i], (u + 1e-15) * expected[i]);
      assertEquals(wanted[i], transition[i], (u + 1e-15) * wanted[i]);
    }
  }

  /** Series and closed forms meet at u = 1 to the two digits that the latter lose. */
  @Test
  void hasNoStepWhereTheSeriesEnd() {
    double above = Math.nextUp(1.0);
    assertEquals(Fading.position(1), Fading.position(above), 2e-15);
    assertEquals(Fading.velocityVariance(1), Fading.velocityVariance(above), 2e-15);
    assertEquals(Fading.positionVariance(1), Fading.positionVariance(above), 2e-15);
    assertEquals(Fading.positionAcceleration(1), Fading.positionAcceleration(above), 2e-15);
  }

  @Test
  void longAfterTheAccelerationHasItsDeviation() {
    DifferentiableMotion given = CorrelatedAcceleration.ofDeviations(20, 3);
    double[] noise = MotionFunctions.noise(given, ANY, new double[0], 1e4);
    assertEquals(9, noise[8], 2e-15); // a rounding of 9
    double[] same =
        MotionFunctions.noise(new CorrelatedAcceleration(20, 0.9), ANY, new double[0], 1e4);
    assertArrayEquals(same, noise, 1e-15 * same[0]); // a rounding of 0.9
  }
}
