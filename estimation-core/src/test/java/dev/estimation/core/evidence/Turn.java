package dev.estimation.core.evidence;

import dev.estimation.core.function.Structure;
import dev.estimation.core.function.VectorFunction;

/** A coordinated turn over given[0] seconds: x, y, vx, vy, turn rate; linear in all but the rate. */
final class Turn implements VectorFunction {
  @Override
  public void evaluate(double[] u, double[] given, double[] z) {
    double t = given[0];
    double angle = u[4] * t;
    double along = Math.abs(angle) < 1e-4 ? 1 - angle * angle / 6 : Math.sin(angle) / angle;
    double across = Math.abs(angle) < 1e-4 ? angle / 2 : (1 - Math.cos(angle)) / angle;
    z[0] = u[0] + t * (along * u[2] - across * u[3]);
    z[1] = u[1] + t * (across * u[2] + along * u[3]);
    z[2] = Math.cos(angle) * u[2] - Math.sin(angle) * u[3];
    z[3] = Math.sin(angle) * u[2] + Math.cos(angle) * u[3];
    z[4] = u[4];
  }

  @Override
  public Structure structure() {
    return Structure.UNKNOWN.withLinearInputs(0, 1, 2, 3);
  }
}
