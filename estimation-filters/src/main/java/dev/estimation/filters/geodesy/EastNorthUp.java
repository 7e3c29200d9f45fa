package dev.estimation.filters.geodesy;

import dev.estimation.core.internal.Checks;

/**
 * Local axes at an origin: east, north and up along the normal of the ellipsoid there.
 *
 * <pre>
 * (east, north, up) = R (p - p_0)     R = [-sin(lon)            cos(lon)            0       ]
 *                                         [-sin(lat) cos(lon)  -sin(lat) sin(lon)   cos(lat)]
 *                                         [ cos(lat) cos(lon)   cos(lat) sin(lon)   sin(lat)]
 * </pre>
 *
 * <p>The axes are straight: 10 km away the ground lies about 8 m below the local plane, 100 km away 800 m. At a pole the longitude of
 * the origin says where north is: local north points along the meridian opposite to it.
 *
 * <p>Accuracy: some roundings of the distance to the origin and of the Earth's radius, that is 1e-9 m. NaN gives NaN. <i>Immutable</i>;
 * allocates only when built. Cost: 9 products. Source: EPSG Guidance Note 7-2, methods 9836 and 9837.
 */
public final class EastNorthUp {
  private final double x;
  private final double y;
  private final double z;
  private final double sinLatitude;
  private final double cosLatitude;
  private final double sinLongitude;
  private final double cosLongitude;

  private EastNorthUp(double[] geodetic, double[] place) {
    this.x = place[0];
    this.y = place[1];
    this.z = place[2];
    this.sinLatitude = Math.sin(geodetic[0]);
    this.cosLatitude = Math.cos(geodetic[0]);
    this.sinLongitude = Math.sin(geodetic[1]);
    this.cosLongitude = Math.cos(geodetic[1]);
  }

  /**
   * {@return the axes at an origin}
   *
   * @param geodetic latitude (rad), longitude (rad), height (m) of the origin, finite; read
   * @throws IllegalArgumentException if it is not 3 finite numbers, or the latitude lies beyond +-pi/2
   */
  public static EastNorthUp at(double[] geodetic) {
    Checks.length("geodetic origin", geodetic, 3);
    Checks.finite("geodetic origin", geodetic);
    if (Math.abs(geodetic[0]) > Math.PI / 2) {
      throw new IllegalArgumentException(
          "latitude of the origin must be in [-pi/2, pi/2] rad, got " + geodetic[0] + "; degrees?");
    }
    double[] place = new double[3];
    Wgs84.toEarthFixed(geodetic, place);
    return new EastNorthUp(geodetic, place);
  }

  /**
   * From Earth-fixed to local coordinates.
   *
   * @param earthFixed x, y, z (m); read
   * @param local filled with east, north, up (m); may be the same array
   * @throws IllegalArgumentException if an array has not 3 elements
   */
  public void toLocal(double[] earthFixed, double[] local) {
    Checks.length("Earth-fixed coordinates", earthFixed, 3);
    fillLocal(earthFixed[0] - x, earthFixed[1] - y, earthFixed[2] - z, local);
  }

  /**
   * From local to Earth-fixed coordinates.
   *
   * @param local east, north, up (m); read
   * @param earthFixed filled with x, y, z (m); may be the same array
   * @throws IllegalArgumentException if an array has not 3 elements
   */
  public void toEarthFixed(double[] local, double[] earthFixed) {
    vectorToEarthFixed(local, earthFixed);
    earthFixed[0] += x;
    earthFixed[1] += y;
    earthFixed[2] += z;
  }

  /**
   * The local components of a vector that is no place: a velocity, a direction, a difference of places.
   *
   * @param earthFixed components along x, y, z; read
   * @param local filled with those along east, north, up; may be the same array
   * @throws IllegalArgumentException if an array has not 3 elements
   */
  public void vectorToLocal(double[] earthFixed, double[] local) {
    Checks.length("Earth-fixed components", earthFixed, 3);
    fillLocal(earthFixed[0], earthFixed[1], earthFixed[2], local);
  }

  /**
   * The Earth-fixed components of a vector that is no place.
   *
   * @param local components along east, north, up; read
   * @param earthFixed filled with those along x, y, z; may be the same array
   * @throws IllegalArgumentException if an array has not 3 elements
   */
  public void vectorToEarthFixed(double[] local, double[] earthFixed) {
    Checks.length("local components", local, 3);
    Checks.length("Earth-fixed components", earthFixed, 3);
    double east = local[0];
    double north = local[1];
    double up = local[2];
    double fromAxis = cosLatitude * up - sinLatitude * north;
    earthFixed[0] = cosLongitude * fromAxis - sinLongitude * east;
    earthFixed[1] = sinLongitude * fromAxis + cosLongitude * east;
    earthFixed[2] = sinLatitude * up + cosLatitude * north;
  }

  private void fillLocal(double dx, double dy, double dz, double[] local) {
    Checks.length("local components", local, 3);
    double fromAxis = cosLongitude * dx + sinLongitude * dy;
    local[0] = cosLongitude * dy - sinLongitude * dx;
    local[1] = cosLatitude * dz - sinLatitude * fromAxis;
    local[2] = cosLatitude * fromAxis + sinLatitude * dz;
  }
}
