package dev.estimation.core.space;

/** Angles in radians, kept in [-pi, pi). */
public final class Angle {
  private static final double FULL_TURN = 2 * Math.PI;

  private Angle() {}

  /**
   * The equivalent angle in [-pi, pi): a - 2 pi floor((a + pi) / (2 pi)). An angle already there is
   * returned as it is, bit for bit. NaN and infinity give NaN. 2 pi is the double next to it, which is
   * 2.5e-16 rad too small; that is the error for each turn taken off.
   *
   * @param angle rad
   * @return rad, in [-pi, pi)
   */
  public static double wrap(double angle) {
    if (angle >= -Math.PI && angle < Math.PI) {
      return angle;
    }
    double remainder = Math.IEEEremainder(angle, FULL_TURN); // exact, however many turns
    return remainder >= Math.PI ? -Math.PI : remainder;
  }
}
