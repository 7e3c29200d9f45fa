package dev.estimation.core.space;

/** Angles in radians, kept in [-pi, pi). */
public final class Angle {
  private static final double FULL_TURN = 2 * Math.PI;

  private Angle() {}

  /**
   * The equivalent angle in [-pi, pi): a - 2 pi floor((a + pi) / (2 pi)). An angle already there is
   * returned as it is, bit for bit. NaN and infinity give NaN. The result carries the rounding of
   * 2 pi times the number of turns, about 1e-16 rad a turn.
   *
   * @param angle rad
   * @return rad, in [-pi, pi)
   */
  public static double wrap(double angle) {
    if (angle >= -Math.PI && angle < Math.PI) {
      return angle;
    }
    double wrapped = angle - FULL_TURN * Math.floor((angle + Math.PI) / FULL_TURN);
    if (wrapped >= Math.PI) {
      return wrapped - FULL_TURN; // the quotient was rounded down across an integer
    }
    return wrapped < -Math.PI ? -Math.PI : wrapped; // below by one rounding at most
  }
}
