package dev.estimation.filters.motion;

/**
 * Constant acceleration on a number of axes, disturbed by white jerk. State: all positions (m), then all
 * velocities (m/s), then all accelerations (m/s^2). On each axis, exactly,
 *
 * <pre>
 * F = [1 dt dt^2/2]     Q = q [dt^5/20  dt^4/8  dt^3/6]
 *     [0  1 dt    ]           [dt^4/8   dt^3/3  dt^2/2]
 *     [0  0  1    ]           [dt^3/6   dt^2/2  dt    ]
 * </pre>
 *
 * <p>Linear in all; Q composes over time. Nothing holds the acceleration back, so over a long time without
 * measurements it wanders without limit; {@link CorrelatedAcceleration} does not. <i>Immutable.</i> Allocates nothing.
 * Source: Bar-Shalom, Li and Kirubarajan 2001, section 6.2 (from memory).
 */
public final class ConstantAcceleration extends IntegratedNoise {
  /**
   * The model.
   *
   * @param spectralDensities of the jerk (m^2/s^5), one for each axis, finite and 0 or more; copied
   */
  public ConstantAcceleration(double... spectralDensities) {
    super(2, Parameters.densities("ConstantAcceleration spectralDensities", spectralDensities));
  }
}
