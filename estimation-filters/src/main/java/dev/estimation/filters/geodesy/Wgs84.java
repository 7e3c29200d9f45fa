package dev.estimation.filters.geodesy;

import dev.estimation.core.internal.Checks;

/**
 * Geodetic coordinates (latitude, longitude in rad, height in m) and Earth-fixed ones (x, y, z in m) on the ellipsoid of WGS 84:
 *
 * <pre>
 * x = (nu + h) cos(latitude) cos(longitude)     nu = a / sqrt(1 - e^2 sin^2(latitude))
 * y = (nu + h) cos(latitude) sin(longitude)
 * z = ((1 - e^2) nu + h) sin(latitude)
 * </pre>
 *
 * <p>Back by Bowring's formula, repeated {@value #ROUNDS} times:
 *
 * <pre>
 * tan(latitude) = (z + e'^2 b sin^3(beta)) / (p - e^2 a cos^3(beta))     p = sqrt(x^2 + y^2)
 * tan(beta) = (1 - f) tan(latitude), at first z / ((1 - f) p)
 * h = p cos(latitude) + z sin(latitude) - a sqrt(1 - e^2 sin^2(latitude))
 * </pre>
 *
 * <p>There and back errs by up to 5 roundings of the distance from the centre in each direction, from heights of -6000 km on: 5e-9 m near
 * the ground, 2e-8 m at 40 000 km (measured on a grid of latitudes). Latitudes beyond +-pi/2 are taken as they are, longitudes of any number
 * of turns too. On the axis the longitude is 0. Less than 300 km from the Earth's centre, towards which latitude loses its meaning, all three are
 * NaN. NaN and infinity give NaN.
 *
 * <p>Cost: a sine and cosine of each angle one way; two arc tangents and about ten roots back. Static and without state:
 * <i>safe</i> for all threads. Sources: NIMA TR8350.2 for the ellipsoid; Bowring 1976, <i>Transformation from spatial to
 * geographical coordinates</i>, Survey Review 23(181), and 1985, <i>The accuracy of geodetic latitude and height equations</i>, Survey Review
 * 28(218) (both from memory); EPSG Guidance Note 7-2, method 9602.
 */
public final class Wgs84 {
  /** Half of the major axis a (m). */
  public static final double SEMI_MAJOR_AXIS = 6378137.0;

  /** The flattening f = (a - b) / a. */
  public static final double FLATTENING = 1 / 298.257223563;

  /** Half of the minor axis b (m). */
  public static final double SEMI_MINOR_AXIS = SEMI_MAJOR_AXIS * (1 - FLATTENING);

  static final double ECCENTRICITY_SQUARED = FLATTENING * (2 - FLATTENING);

  private static final double NO_ANSWER_WITHIN = 3e5;
  private static final int ROUNDS = 3;

  private Wgs84() {}

  /**
   * From geodetic to Earth-fixed coordinates.
   *
   * @param geodetic latitude (rad), longitude (rad), height (m); read
   * @param earthFixed filled; may be the same array
   * @throws IllegalArgumentException if an array has not 3 elements
   */
  public static void toEarthFixed(double[] geodetic, double[] earthFixed) {
    Checks.length("geodetic coordinates", geodetic, 3);
    Checks.length("Earth-fixed coordinates", earthFixed, 3);
    double sin = Math.sin(geodetic[0]);
    double cos = Math.cos(geodetic[0]);
    double longitude = geodetic[1];
    double height = geodetic[2];
    double normal = SEMI_MAJOR_AXIS / Math.sqrt(1 - ECCENTRICITY_SQUARED * sin * sin);
    double fromAxis = (normal + height) * cos;
    earthFixed[0] = fromAxis * Math.cos(longitude);
    earthFixed[1] = fromAxis * Math.sin(longitude);
    earthFixed[2] = ((1 - ECCENTRICITY_SQUARED) * normal + height) * sin;
  }

  /**
   * From Earth-fixed to geodetic coordinates.
   *
   * @param earthFixed x, y, z (m); read
   * @param geodetic filled with latitude in [-pi/2, pi/2] (rad), longitude in [-pi, pi) (rad), height (m); may be the same array
   * @throws IllegalArgumentException if an array has not 3 elements
   */
  public static void toGeodetic(double[] earthFixed, double[] geodetic) {
    Checks.length("Earth-fixed coordinates", earthFixed, 3);
    Checks.length("geodetic coordinates", geodetic, 3);
    double x = earthFixed[0];
    double y = earthFixed[1];
    double z = earthFixed[2];
    double p = Math.sqrt(x * x + y * y);
    double fromCentre = Math.sqrt(p * p + z * z);
    if (!(fromCentre >= NO_ANSWER_WITHIN && fromCentre < Double.POSITIVE_INFINITY)) {
      geodetic[0] = Double.NaN;
      geodetic[1] = Double.NaN;
      geodetic[2] = Double.NaN;
      return;
    }
    geodetic[1] = longitude(x, y);
    fillLatitudeAndHeight(p, z, geodetic);
  }

  private static double longitude(double x, double y) {
    if (x == 0 && y == 0) {
      return 0;
    }
    double longitude = Math.atan2(y, x);
    return longitude == Math.PI ? -Math.PI : longitude;
  }

  /** With (up, out) along the sine and cosine of beta. */
  private static void fillLatitudeAndHeight(double p, double z, double[] geodetic) {
    double focus = SEMI_MAJOR_AXIS * ECCENTRICITY_SQUARED;
    double up = z;
    double out = (1 - FLATTENING) * p;
    for (int round = 0; round < ROUNDS; round++) {
      double length = Math.sqrt(up * up + out * out);
      double sin = up / length;
      double cos = out / length;
      up = (1 - FLATTENING) * z + focus * sin * sin * sin;
      out = p - focus * cos * cos * cos;
    }
    double across = (1 - FLATTENING) * out;
    double length = Math.sqrt(up * up + across * across);
    double sin = up / length;
    geodetic[0] = Math.atan2(up, across);
    geodetic[2] = p * (across / length)
        + z * sin
        - SEMI_MAJOR_AXIS * Math.sqrt(1 - ECCENTRICITY_SQUARED * sin * sin);
  }
}
