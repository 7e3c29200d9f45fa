package dev.estimation.filters.motion;

/**
 * Constant velocity on a number of axes, disturbed by white acceleration. State: all positions (m), then all
 * velocities (m/s). On each axis, exactly,
 *
 * <pre>
 * F = [1 dt]     Q = q [dt^3/3  dt^2/2]
 *     [0  1]           [dt^2/2  dt    ]
 * </pre>
 *
 * <p>Linear in all; Q composes over time: F(h) Q(h) F(h)' + Q(h) = Q(2 h). Over a time T velocities wander by
 * sqrt(q T): take q from how fast the target manoeuvres, not from the step. <i>Immutable.</i> Allocates nothing. Source:
 * Bar-Shalom, Li and Kirubarajan 2001, section 6.2 (from memory).
 */
public final class ConstantVelocity extends IntegratedNoise {
  /**
   * The model.
   *
   * @param spectralDensities of the acceleration (m^2/s^3), one for each axis, finite and 0 or more; copied
   */
  public ConstantVelocity(double... spectralDensities) {
    super(1, Parameters.densities("ConstantVelocity spectralDensities", spectralDensities));
  }
}
