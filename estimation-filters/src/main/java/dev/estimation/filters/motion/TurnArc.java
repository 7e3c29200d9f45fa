package dev.estimation.filters.motion;

/** The two functions that make up an arc of angle u, and their derivatives. */
final class TurnArc {
  private static final double STRAIGHT = 1e-4;
  private static final double NEARLY_STRAIGHT = 1e-2;

  private TurnArc() {}

  /** {@return sin(u) / u} */
  static double along(double u) {
    return Math.abs(u) < STRAIGHT ? 1 - u * u / 6 : Math.sin(u) / u;
  }

  /** {@return (1 - cos(u)) / u, in a form that does not cancel} */
  static double across(double u) {
    double half = along(u / 2);
    return u / 2 * half * half;
  }

  /** {@return the derivative of {@link #along}; a series where cos(u) - sin(u)/u would cancel} */
  static double alongDerivative(double u) {
    double square = u * u;
    return Math.abs(u) < NEARLY_STRAIGHT
        ? -u / 3 * (1 - square / 10 * (1 - square / 28))
        : (Math.cos(u) - along(u)) / u;
  }

  /** {@return the derivative of {@link #across}} */
  static double acrossDerivative(double u) {
    double half = along(u / 2);
    return along(u) - half * half / 2;
  }
}
