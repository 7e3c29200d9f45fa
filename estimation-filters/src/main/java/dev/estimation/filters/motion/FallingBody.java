package dev.estimation.filters.motion;

import dev.estimation.core.space.FlatSpace;
import dev.estimation.core.space.Space;

/**
 * A body that falls straight down through air whose density decreases exponentially with altitude. State: altitude h (m),
 * speed v (m/s, positive downwards), ballistic parameter b (1/m): the deceleration where h is 0
 * is b v^2, so b = (density of the air there) (drag coefficient) (area) / (2 mass).
 *
 * <pre>
 * h' = -v        v' = g - b exp(-c h) v |v| + w_v        b' = w_b
 * </pre>
 *
 * <p>It has no closed form: {@code IntegratedMotion.of(new FallingBody(...), 1e-9, 1e-3, 1e-3, 1e-9)} is the motion
 * model. With g = 0 and no noise v exp((b / c) exp(-c h)) stays what it is (Allen and Eggers 1958, NACA report 1381).
 * Where an estimate can hurt someone, try the filter on your own data first: nothing here replaces that.
 *
 * <p><i>Immutable.</i> Source: Athans, Wishner and Bertolini 1968, <i>Suboptimal state estimation for continuous-time
 * nonlinear systems from discrete noisy measurements</i>, IEEE Transactions on Automatic Control 13 (from memory).
 */
public final class FallingBody implements DifferentiableContinuousMotion {
  private static final int DIMENSION = 3;
  private static final FlatSpace SPACE = Space.reals(DIMENSION);

  private final double decay;
  private final double gravity;
  private final double accelerationDensity;
  private final double ballisticDensity;

  /**
   * The model.
   *
   * @param decay c (1/m), one over the scale height of the air, finite and 0 or more; about 1/7000
   * @param gravity g (m/s^2), finite and 0 or more; 0 where drag dwarfs it
   * @param accelerationDensity spectral density of w_v (m^2/s^3), finite and 0 or more
   * @param ballisticDensity spectral density of w_b (1/(m^2 s)), finite and 0 or more
   */
  public FallingBody(
      double decay, double gravity, double accelerationDensity, double ballisticDensity) {
    this.decay = Parameters.notNegative("FallingBody decay", decay);
    this.gravity = Parameters.notNegative("FallingBody gravity", gravity);
    this.accelerationDensity =
        Parameters.notNegative("FallingBody accelerationDensity", accelerationDensity);
    this.ballisticDensity =
        Parameters.notNegative("FallingBody ballisticDensity", ballisticDensity);
  }

  @Override
  public FlatSpace stateSpace() {
    return SPACE;
  }

  @Override
  public void drift(double[] state, double[] control, double time, double[] rate) {
    double air = Math.exp(-decay * state[0]);
    rate[0] = -state[1];
    rate[1] = gravity - state[2] * air * state[1] * Math.abs(state[1]);
    rate[2] = 0;
  }

  @Override
  public void driftJacobian(double[] state, double[] control, double time, double[] jacobian) {
    double air = Math.exp(-decay * state[0]);
    double speed = Math.abs(state[1]);
    jacobian[1] = -1;
    jacobian[DIMENSION] = decay * state[2] * air * state[1] * speed;
    jacobian[DIMENSION + 1] = -2 * state[2] * air * speed;
    jacobian[DIMENSION + 2] = -air * state[1] * speed;
  }

  @Override
  public void noiseDensity(double[] state, double[] control, double time, double[] density) {
    density[DIMENSION + 1] = accelerationDensity;
    density[2 * DIMENSION + 2] = ballisticDensity;
  }
}
