package dev.estimation.filters.motion;

/** White noise on each axis, integrated a number of times. */
abstract class IntegratedNoise extends AxisMotion {
  private final int order;

  IntegratedNoise(int order, double[] densities) {
    super(densities, order + 1);
    this.order = order;
  }

  @Override
  final double transition(int row, int column, double dt) {
    return WhiteNoise.integral(column - row, dt);
  }

  @Override
  final double noise(int row, int column, double dt) {
    return WhiteNoise.covariance(order, row, column, dt);
  }
}
