package dev.estimation.filters.motion;

import java.util.Arrays;

/**
 * An acceleration that fades with a time constant and is stirred by white jerk: a' = -a / tau + w. State: all
 * positions (m), then all velocities (m/s), then all accelerations (m/s^2). With e = exp(-dt / tau), exactly,
 *
 * <pre>
 * F = [1 dt tau^2 (dt/tau - 1 + e)]     Q = q integral over s from 0 to dt of g g',
 *     [0  1 tau (1 - e)           ]     g = the last column of F(s)
 *     [0  0  e                    ]
 * </pre>
 *
 * <p>Left alone, the acceleration has the standard deviation sigma = sqrt(q tau / 2) and the correlation
 * exp(-|s| / tau) over a time s. For dt far below tau this is {@link ConstantAcceleration}, far above it {@link
 * ConstantVelocity} with density q tau^2.
 *
 * <p>Linear in all; Q composes over time. Accuracy: entries of F and Q are right to about 1e-14 of themselves
 * for every dt / tau; below 1 they come from series, since the closed forms cancel there. <i>Immutable.</i> Allocates
 * nothing. Source: Singer 1970, <i>Estimating optimal tracking filter performance for manned maneuvering
 * targets</i>, IEEE Transactions on Aerospace and Electronic Systems (from memory).
 */
public final class CorrelatedAcceleration extends AxisMotion {
  private final double timeConstant;

  /**
   * The model by the noise that stirs it.
   *
   * @param timeConstant tau (s), finite and above 0
   * @param spectralDensities q of the jerk (m^2/s^5), one for each axis, finite and 0 or more; copied
   */
  public CorrelatedAcceleration(double timeConstant, double... spectralDensities) {
    super(Parameters.densities("CorrelatedAcceleration spectralDensities", spectralDensities), 3);
    this.timeConstant = Parameters.positive("CorrelatedAcceleration timeConstant", timeConstant);
  }

  /**
   * The model by how strongly the target accelerates: q = 2 sigma^2 / tau.
   *
   * @param timeConstant tau (s), finite and above 0: how long a manoeuvre lasts
   * @param deviations sigma, the standard deviation of the acceleration at all times (m/s^2), one for each axis, finite
   *     and 0 or more; read
   * @return the model
   */
  public static CorrelatedAcceleration ofDeviations(double timeConstant, double... deviations) {
    Parameters.positive("CorrelatedAcceleration timeConstant", timeConstant);
    Parameters.densities("CorrelatedAcceleration deviations", deviations);
    return new CorrelatedAcceleration(
        timeConstant,
        Arrays.stream(deviations).map(s -> 2 * s * s / timeConstant).toArray());
  }

  @Override
  double transition(int row, int column, double dt) {
    if (column < 2) {
      return WhiteNoise.integral(column - row, dt);
    }
    double u = dt / timeConstant;
    return switch (row) {
      case 0 -> dt * dt * Fading.position(u);
      case 1 -> dt * Fading.velocity(u);
      default -> Math.exp(-u);
    };
  }

  @Override
  double noise(int row, int column, double dt) {
    double u = dt / timeConstant;
    if (row == column) {
      return WhiteNoise.power(dt, 5 - 2 * row) * variance(row, u);
    }
    if (column - row == 2) {
      return dt * dt * dt * Fading.positionAcceleration(u);
    }
    // A quantity and its rate: the integral of g dg is half the square of g.
    double response = transition(row, 2, dt);
    return response * response / 2;
  }

  private static double variance(int row, double u) {
    return switch (row) {
      case 0 -> Fading.positionVariance(u);
      case 1 -> Fading.velocityVariance(u);
      default -> Fading.velocity(2 * u);
    };
  }
}
