package dev.estimation.benchmarks.cases.motion;

/** The process noise of a position and its velocity under white acceleration. */
public final class WhiteAcceleration {
  private WhiteAcceleration() {}

  /**
   * Fills in the four entries of one axis: q [[dt^3/3, dt^2/2], [dt^2/2, dt]].
   *
   * @param spectralDensity q (m^2/s^3)
   * @param dt s
   * @param position index of the position in the state
   * @param velocity index of the velocity in the state
   * @param covariance updated, row by row
   * @param dimension of the state
   */
  public static void fill(
      double spectralDensity,
      double dt,
      int position,
      int velocity,
      double[] covariance,
      int dimension) {
    double mixed = spectralDensity * dt * dt / 2;
    covariance[position * dimension + position] = spectralDensity * dt * dt * dt / 3;
    covariance[position * dimension + velocity] = mixed;
    covariance[velocity * dimension + position] = mixed;
    covariance[velocity * dimension + velocity] = spectralDensity * dt;
  }
}
