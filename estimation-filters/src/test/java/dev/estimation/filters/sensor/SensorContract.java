package dev.estimation.filters.sensor;

import static dev.estimation.testing.Agreement.assertNames;
import static org.junit.jupiter.api.Assertions.assertArrayEquals;
import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertNotEquals;
import static org.junit.jupiter.api.Assertions.assertThrows;
import static org.junit.jupiter.api.Assertions.assertTrue;

import dev.estimation.core.function.JacobianCheck;
import dev.estimation.core.gaussian.Gaussian;
import dev.estimation.core.space.FlatSpace;
import dev.estimation.core.space.Space;
import dev.estimation.filters.filter.Estimate;
import dev.estimation.filters.filter.FilterPlan;
import dev.estimation.filters.filter.SensorPort;
import dev.estimation.filters.filter.StepStatus;
import dev.estimation.filters.model.DifferentiableSensor;
import dev.estimation.filters.model.TwiceDifferentiableSensor;
import dev.estimation.filters.testing.PlainWalk;
import dev.estimation.testing.AllocationMeter;
import java.util.Arrays;
import java.util.List;
import java.util.Random;
import java.util.function.DoubleFunction;
import java.util.stream.IntStream;
import org.junit.jupiter.api.TestInstance;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.MethodSource;
import org.junit.jupiter.params.provider.ValueSource;

/** What every ready sensor keeps, in every layout of a state. */
@TestInstance(TestInstance.Lifecycle.PER_CLASS)
abstract class SensorContract {
  static final double[] NONE = {};

  /** A state of position, velocity and one more, as most cases have it: x, y, vx, vy, angle. */
  static final Space PLANE = Space.reals(4).and(Space.angles(1));

  /** An attitude first, then 7 numbers. */
  static final Space BEHIND_ATTITUDE = Space.unitQuaternion().and(Space.reals(7));

  /** Layouts of the sensor with states to look at. */
  abstract List<SensorCase> cases();

  /** The sensor with all its deviations replaced by one. */
  abstract DifferentiableSensor withDeviation(double deviation);

  private Random random() {
    return new Random(20240501);
  }

  @ParameterizedTest
  @MethodSource("cases")
  void derivativesAndActiveInputsAreThoseOfTheMeasurement(SensorCase c) {
    JacobianCheck check = JacobianCheck.of(
        c.space(), c.sensor().measurementSpace(), c.function(), c.scales(), c.given(), c.points());
    assertTrue(check.passed(), check::toString);
  }

  /** None is declared that is never read. */
  @ParameterizedTest
  @MethodSource("cases")
  void everyActiveInputMatters(SensorCase c) {
    int d = c.space().dimension();
    for (int column : c.sensor().structure().activeInputs(d)) {
      boolean matters = Arrays.stream(c.points())
          .map(c::jacobian)
          .anyMatch(jacobian ->
              IntStream.range(0, c.size()).anyMatch(row -> jacobian[row * d + column] != 0));
      assertTrue(matters, "active input " + column);
    }
  }

  /** Points are drawn in the order of active inputs, which is that of the state. */
  @ParameterizedTest
  @MethodSource("cases")
  void activeInputsAreInTheOrderOfTheState(SensorCase c) {
    int[] active = c.sensor().structure().activeInputs(c.space().dimension());
    assertArrayEquals(IntStream.of(active).sorted().toArray(), active);
    c.sensor()
        .structure()
        .nonlinearInputs(c.space().dimension()); // fails if a linear input is not active
  }

  /**
   * h(x + a + b) - h(x + a) - h(x + b) + h(x) = 0 for displacements of linear inputs. Tolerance: 64 roundings of
   * the largest number that enters.
   */
  @ParameterizedTest
  @MethodSource("cases")
  void linearInputsAreLinear(SensorCase c) {
    Random random = random();
    FlatSpace space = (FlatSpace) c.sensor().measurementSpace();
    for (double[] point : c.points()) {
      double[] a = new double[c.space().dimension()];
      double[] b = new double[c.space().dimension()];
      double[] both = new double[c.space().dimension()];
      for (int column : c.sensor().structure().linearInputs()) {
        a[column] = random.nextGaussian();
        b[column] = random.nextGaussian();
        both[column] = a[column] + b[column];
      }
      double[] first = new double[c.size()];
      double[] second = new double[c.size()];
      space.difference(c.measured(point, both), c.measured(point, a), first);
      space.difference(c.measured(point, b), c.measured(point), second);
      space.difference(first, second, first);
      for (int i = 0; i < c.size(); i++) {
        double largest = Math.max(10, Math.abs(c.measured(point)[i]));
        assertEquals(0, first[i], 64 * Math.ulp(largest), "component " + i);
      }
    }
  }

  @ParameterizedTest
  @MethodSource("cases")
  void noiseIsSymmetricAndPositiveDefinite(SensorCase c) {
    for (double[] point : c.points()) {
      double[] noise = c.noise(point);
      int m = c.size();
      double[][] rows = new double[m][];
      for (int i = 0; i < m; i++) {
        rows[i] = Arrays.copyOfRange(noise, i * m, (i + 1) * m);
        for (int j = 0; j < i; j++) {
          assertEquals(rows[j][i], rows[i][j], 0);
        }
        assertTrue(rows[i][i] > 0);
      }
      Gaussian.of(new double[m], rows); // fails if it is no covariance
    }
  }

  /** The same bits at every call, on arguments that stay as they were. */
  @ParameterizedTest
  @MethodSource("cases")
  void callsAreRepeatableAndLeaveArgumentsAlone(SensorCase c) {
    for (double[] point : c.points()) {
      double[] state = point.clone();
      double[] given = c.given().clone();
      assertArrayEquals(c.measured(state), c.measured(state), 0);
      assertArrayEquals(c.jacobian(state), c.jacobian(state), 0);
      assertArrayEquals(c.hessian(state), c.hessian(state), 0);
      assertArrayEquals(c.noise(state), c.noise(state), 0);
      assertArrayEquals(point, state, 0);
      assertArrayEquals(given, c.given(), 0);
    }
  }

  @ParameterizedTest
  @MethodSource("cases")
  void sizesAreThoseDeclared(SensorCase c) {
    assertEquals(c.given().length, c.sensor().givenDimension());
    for (double[] point : c.points()) {
      assertTrue(c.space().contains(point), "not a state: " + Arrays.toString(point));
      assertTrue(Arrays.stream(c.measured(point)).allMatch(Double::isFinite));
    }
  }

  @ParameterizedTest
  @MethodSource("cases")
  void callsAllocateNothing(SensorCase c) {
    int m = c.size();
    int d = c.space().dimension();
    double[] state = c.points()[0];
    double[] measurement = new double[m];
    double[] jacobian = new double[m * d];
    double[] hessians = new double[m * d * d];
    double[] noise = new double[m * m];
    TwiceDifferentiableSensor twice = c.sensor() instanceof TwiceDifferentiableSensor t ? t : null;
    assertEquals(0, AllocationMeter.bytesPerCall(100, 100, () -> {
      c.sensor().measure(state, c.given(), measurement);
      c.sensor().measureJacobian(state, c.given(), jacobian);
      c.sensor().measurementNoise(state, c.given(), noise);
      if (twice != null) {
        twice.measureHessian(state, c.given(), hessians);
      }
    }));
  }

  /** The last three have squares that are zero or infinite. */
  @ParameterizedTest
  @ValueSource(doubles = {0, -1, Double.NaN, Double.POSITIVE_INFINITY, 1e-200, 1e200})
  void badDeviationsAreRefused(double deviation) {
    IllegalArgumentException error =
        assertThrows(IllegalArgumentException.class, () -> withDeviation(deviation));
    assertNames(error.getMessage(), "deviation", "> 0", "got " + deviation);
  }

  /** A component of the noise is the square of its deviation. */
  @ParameterizedTest
  @ValueSource(doubles = {0.5, 1e-9})
  void deviationsAreSquared(double deviation) {
    DifferentiableSensor sensor = withDeviation(deviation);
    int m = sensor.measurementSpace().dimension();
    double[] noise = new double[m * m];
    double[] ones = new double[20];
    Arrays.fill(ones, 1);
    sensor.measurementNoise(ones, ones, noise);
    for (int i = 0; i < m; i++) {
      assertEquals(deviation * deviation, noise[i * (m + 1)], 0);
    }
  }

  /**
   * Two states near each other whose angles are a turn apart: the difference in the measurement space is small.
   *
   * @param c the case
   * @param component the angle
   * @param state of a small number on either side of the seam
   */
  static void assertCrossesSeam(SensorCase c, int component, DoubleFunction<double[]> state) {
    double[] one = c.measured(state.apply(1e-6));
    double[] other = c.measured(state.apply(-1e-6));
    assertTrue(Math.abs(one[component] - other[component]) > 6, "no seam there");
    double[] difference = new double[c.size()];
    c.sensor().measurementSpace().difference(one, other, difference);
    // 2e-6 m across the line of sight of 1 m and more, with the roundings of pi.
    assertTrue(Math.abs(difference[component]) < 3e-6, "difference " + difference[component]);
  }

  /**
   * Where a sensor has no derivative an extended filter refuses the update, says so, and keeps the estimate.
   *
   * @param sensor reads a state of reals
   * @param state the singular place
   * @param given with the measurement
   * @param measurement any
   */
  static void assertRefused(
      DifferentiableSensor sensor, double[] state, double[] given, double... measurement) {
    double[] deviations = new double[state.length];
    Arrays.fill(deviations, 1);
    FilterPlan plan = FilterPlan.extended(new PlainWalk(state.length, 1));
    SensorPort port = plan.workspace().port(sensor);
    Estimate estimate = plan.start(0, Gaussian.independent(state, deviations));
    StepStatus status = port.update(estimate, measurement, given);
    assertNotEquals(StepStatus.APPLIED, status);
    assertNames(port.failure(), sensor.getClass().getSimpleName());
    for (int i = 0; i < state.length; i++) {
      assertEquals(state[i], estimate.mean(i), 0);
      assertEquals(1, estimate.covariance(i, i), 0);
    }
  }

  /** Fails unless the message holds all words. */
  static void assertRefusal(Runnable construction, String... words) {
    IllegalArgumentException error =
        assertThrows(IllegalArgumentException.class, construction::run);
    assertNames(error.getMessage(), words);
  }
}
