package dev.estimation.benchmarks.jmh;

import dev.estimation.core.accuracy.OperatingPoint;
import dev.estimation.core.function.VectorFunction;
import dev.estimation.core.gaussian.Gaussian;
import dev.estimation.core.matching.Use;
import dev.estimation.core.space.Space;
import java.util.Arrays;
import org.ejml.data.DMatrixRMaj;
import org.ejml.dense.row.CommonOps_DDRM;

/**
 * One carry of moments through a function, made up to bend noticeably within the spread: a function in a state of some
 * size, mean and covariance of the state, the noise of the output and what the result is for. Neighbours in the state
 * are correlated by 0.3, so that factors are full. Components that the function does not read have mean 0 and deviation 1.
 *
 * @param name function and dimension of the state, as in {@code turn:9}
 * @param input where the state lives
 * @param output where the result lives
 * @param function what the matchings are given
 * @param exact the same with all that is true of it said, for the reference
 * @param point mean, covariance and noise
 * @param use of the result
 */
record CarryProblem(
    String name,
    Space input,
    Space output,
    VectorFunction function,
    VectorFunction exact,
    OperatingPoint point,
    Use use) {
  private static final double CORRELATION = 0.3;

  /**
   * A problem by its name.
   *
   * @param name {@code polar}, {@code spherical}, {@code turn}, {@code turn-linear} (which says in what it is linear),
   *     {@code pseudorange}, {@code attitude} or {@code waves}, a colon, and the dimension of the state
   */
  static CarryProblem of(String name) {
    int colon = name.indexOf(':');
    int n = Integer.parseInt(name.substring(colon + 1));
    return switch (name.substring(0, colon)) {
      case "polar" ->
        prediction(name, new PolarPoint(), n, numbers(1000, 0.5), numbers(30, 0.2), 400);
      case "spherical" ->
        prediction(
            name, new SphericalPoint(), n, numbers(1000, 0.5, 0.4), numbers(30, 0.15, 0.1), 400);
      case "turn", "turn-linear" ->
        prediction(
            name,
            new TurnMove(),
            n,
            numbers(1000, 1000, 14, 4, 0.1),
            numbers(20, 20, 5, 5, 0.3),
            1e-3);
      case "pseudorange" ->
        update(
            name, new RangeWithClock(), n, numbers(0, 0, 0, 1e5), numbers(3e4, 3e4, 3e4, 3e4), 100);
      case "attitude" ->
        update(name, new SeenVector(), n, numbers(0.8, 0.6, 0, 0), numbers(0.3, 0.3, 0.3), 0.0025);
      case "waves" -> prediction(name, new CoupledWaves(n), n, waves(n), spread(n), 1e-3);
      default -> throw new IllegalArgumentException("no problem is named " + name);
    };
  }

  private static double[] numbers(double... values) {
    return values;
  }

  private static double[] waves(int n) {
    double[] mean = new double[n];
    Arrays.setAll(mean, i -> 0.1 * (i % 7));
    return mean;
  }

  private static double[] spread(int n) {
    double[] deviations = new double[n];
    Arrays.fill(deviations, 0.01);
    return deviations;
  }

  private static CarryProblem prediction(
      String name, SmallFunction inner, int n, double[] mean, double[] deviations, double noise) {
    return make(name, inner, n, mean, deviations, noise, Use.PREDICTION);
  }

  private static CarryProblem update(
      String name, SmallFunction inner, int n, double[] mean, double[] deviations, double noise) {
    return make(name, inner, n, mean, deviations, noise, Use.UPDATE);
  }

  private static CarryProblem make(
      String name,
      SmallFunction inner,
      int n,
      double[] mean,
      double[] deviations,
      double noise,
      Use use) {
    Space space = space(mean.length, deviations.length, n);
    double[] all = Arrays.copyOf(mean, space.storage());
    DMatrixRMaj ofOutput = CommonOps_DDRM.identity(inner.outputs());
    CommonOps_DDRM.scale(noise, ofOutput);
    return new CarryProblem(
        name,
        space,
        Space.reals(inner.outputs()),
        new EmbeddedFunction(inner, n, name.contains("-linear:")),
        new EmbeddedFunction(inner, n, true),
        OperatingPoint.of(Gaussian.of(space, all, covariance(deviations, n)), ofOutput),
        use);
  }

  /** A mean with one number more than it has deviations is a quaternion. */
  private static Space space(int storage, int dimension, int n) {
    if (n < dimension) {
      throw new IllegalArgumentException(
          "a state must have " + dimension + " components for this function, got " + n);
    }
    if (storage == dimension) {
      return Space.reals(n);
    }
    Space attitude = Space.unitQuaternion();
    return n == dimension ? attitude : attitude.and(Space.reals(n - dimension));
  }

  private static DMatrixRMaj covariance(double[] deviations, int n) {
    double[] all = Arrays.copyOf(deviations, n);
    Arrays.fill(all, deviations.length, n, 1);
    DMatrixRMaj covariance = new DMatrixRMaj(n, n);
    for (int i = 0; i < n; i++) {
      for (int j = 0; j < n; j++) {
        covariance.set(i, j, all[i] * all[j] * Math.pow(CORRELATION, Math.abs(i - j)));
      }
    }
    return covariance;
  }

  /** {@return the standard deviations of the state} */
  double[] deviations() {
    double[] deviations = new double[input.dimension()];
    Arrays.setAll(deviations, point.input()::standardDeviation);
    return deviations;
  }
}
