package dev.estimation.filters.sensor;

/** States to look at, and the components of them. */
final class States {
  /** x, y, vx, vy, angle. */
  static double[] plane(double x, double y) {
    return new double[] {x, y, 3, -4, 2.9};
  }

  /** Attitude, position, velocity, one more. */
  static double[] behindAttitude(double x, double y, double z) {
    return new double[] {0.5, -0.5, 0.1, Math.sqrt(0.49), x, y, z, 30, -20, 7, 0.3};
  }

  static final Components FIRST_TWO = Components.of(0, 1);
  static final Components COMPASS = Components.of(1, 0);
  static final Components ANGLE = Components.of(4);
  static final Components PLACE = Components.of(4, 5, 6).behindQuaternions(1);
  static final Components PLACE_IN_PLANE = Components.of(5, 4).behindQuaternions(1);
  static final Components VELOCITY = Components.of(7, 8, 9).behindQuaternions(1);
  static final Components LAST = Components.of(10).behindQuaternions(1);

  private States() {}
}
