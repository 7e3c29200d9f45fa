package dev.estimation.filters.filter;

import static dev.estimation.testing.Agreement.assertWithin;
import static org.junit.jupiter.api.Assertions.assertEquals;

import dev.estimation.core.gaussian.Gaussian;
import dev.estimation.core.space.Space;
import dev.estimation.filters.model.DifferentiableSensor;
import dev.estimation.filters.testing.PlainWalk;
import dev.estimation.testing.RandomGaussians;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.ValueSource;

/**
 * Distances of 2e7 m, measured to a metre: the measurement itself is rounded to 4e-9, so that
 * neither steps nor costs settle to the last digit, and yet the update is an easy one.
 */
class IteratedFarPlacesTest {
  private static final int PLACES = 6;
  private static final double FAR = 2e7;

  /**
   * The mean is of the given size: near the origin, or as far from it as the ground from the
   * centre.
   */
  @ParameterizedTest
  @ValueSource(doubles = {1, 6.4e6})
  void bothSearchesSettleAndAgree(double size) {
    for (int seed = 0; seed < 100; seed++) {
      RandomGaussians random = new RandomGaussians(seed);
      double[] truth = along(random.vector(3), size);
      Distances sensor = new Distances(places(random, truth));
      double[] mean = added(truth, random.vector(3));
      double[] measurement = new double[PLACES];
      sensor.measure(truth, new double[0], measurement);
      measurement = added(measurement, random.vector(PLACES));
      Gaussian prior = Gaussian.independent(mean, new double[] {1, 1, 1});
      Estimate full = updated(IteratedUpdate.undamped(), sensor, prior, measurement, seed);
      Estimate searched = updated(IteratedUpdate.lineSearch(), sensor, prior, measurement, seed);
      assertAgree("draw " + seed, full, searched);
    }
  }

  private static Estimate updated(
      IteratedUpdate iteration, Distances sensor, Gaussian prior, double[] measurement, int seed) {
    FilterPlan plan = FilterPlan.iteratedExtended(new PlainWalk(3, 1), iteration);
    Estimate estimate = plan.start(0, prior);
    SensorPort port = plan.workspace().port(sensor);
    StepStatus status = port.update(estimate, measurement);
    assertEquals(StepStatus.APPLIED, status, () -> "draw " + seed + ": " + port.failure());
    return estimate;
  }

  /** 1e-6 standard deviations: rounding of 4e-9 m in each distance, and as much in the state. */
  private static void assertAgree(String draw, Estimate wanted, Estimate got) {
    for (int i = 0; i < 3; i++) {
      double deviation = wanted.standardDeviation(i);
      assertWithin(draw + ", mean", wanted.mean(i), got.mean(i), 1e-6, deviation);
      for (int j = 0; j < 3; j++) {
        double scale = deviation * wanted.standardDeviation(j);
        double covariance = wanted.covariance(i, j);
        assertWithin(draw + ", covariance", covariance, got.covariance(i, j), 1e-6, scale);
      }
    }
  }

  private static double[][] places(RandomGaussians random, double[] from) {
    double[][] places = new double[PLACES][];
    for (int i = 0; i < PLACES; i++) {
      places[i] = added(from, along(random.vector(3), FAR));
    }
    return places;
  }

  private static double[] along(double[] direction, double length) {
    double norm = Math.sqrt(square(direction));
    double[] result = new double[direction.length];
    for (int i = 0; i < result.length; i++) {
      result[i] = direction[i] / norm * length;
    }
    return result;
  }

  private static double square(double[] v) {
    double sum = 0;
    for (double component : v) {
      sum += component * component;
    }
    return sum;
  }

  private static double[] added(double[] a, double[] b) {
    double[] sum = a.clone();
    for (int i = 0; i < sum.length; i++) {
      sum[i] += b[i];
    }
    return sum;
  }

  /** The distances to places in space, variance 1 m^2 each. */
  private static final class Distances implements DifferentiableSensor {
    private final double[][] places;

    Distances(double[][] places) {
      this.places = places;
    }

    @Override
    public Space measurementSpace() {
      return Space.reals(PLACES);
    }

    private double[] from(int place, double[] state) {
      double[] difference = new double[3];
      for (int i = 0; i < 3; i++) {
        difference[i] = state[i] - places[place][i];
      }
      return difference;
    }

    @Override
    public void measure(double[] state, double[] given, double[] measurement) {
      for (int place = 0; place < PLACES; place++) {
        measurement[place] = Math.sqrt(square(from(place, state)));
      }
    }

    @Override
    public void measureJacobian(double[] state, double[] given, double[] jacobian) {
      for (int place = 0; place < PLACES; place++) {
        System.arraycopy(along(from(place, state), 1), 0, jacobian, 3 * place, 3);
      }
    }

    @Override
    public void measurementNoise(double[] state, double[] given, double[] covariance) {
      for (int i = 0; i < PLACES; i++) {
        covariance[i * (PLACES + 1)] = 1;
      }
    }
  }
}
