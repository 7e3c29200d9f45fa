package dev.estimation.core.matching;

import dev.estimation.core.function.Structure;
import dev.estimation.core.function.VectorFunction;

/** A coordinated turn over given[0] seconds: x, y, vx, vy, turn rate; linear in all but the rate. */
final class LinearTurn implements VectorFunction {
  private final Structure structure;

  LinearTurn(boolean derivatives) {
    Structure linear = Structure.UNKNOWN.withLinearInputs(0, 1, 2, 3);
    this.structure = derivatives ? linear.withJacobian(LinearTurn::derive) : linear;
  }

  private static double along(double u) {
    return Math.abs(u) < 1e-4 ? 1 - u * u / 6 : Math.sin(u) / u;
  }

  private static double across(double u) {
    return Math.abs(u) < 1e-4 ? u / 2 : (1 - Math.cos(u)) / u;
  }

  @Override
  public void evaluate(double[] u, double[] given, double[] z) {
    double t = given[0];
    double angle = u[4] * t;
    z[0] = u[0] + t * (along(angle) * u[2] - across(angle) * u[3]);
    z[1] = u[1] + t * (across(angle) * u[2] + along(angle) * u[3]);
    z[2] = Math.cos(angle) * u[2] - Math.sin(angle) * u[3];
    z[3] = Math.sin(angle) * u[2] + Math.cos(angle) * u[3];
    z[4] = u[4];
  }

  private static void derive(double[] u, double[] given, double[] jacobian) {
    double t = given[0];
    double angle = u[4] * t;
    jacobian[0] = 1;
    jacobian[6] = 1;
    jacobian[2] = t * along(angle);
    jacobian[3] = -t * across(angle);
    jacobian[7] = t * across(angle);
    jacobian[8] = t * along(angle);
    jacobian[12] = Math.cos(angle);
    jacobian[13] = -Math.sin(angle);
    jacobian[17] = Math.sin(angle);
    jacobian[18] = Math.cos(angle);
    jacobian[4] = t * t * (alongSlope(angle) * u[2] - acrossSlope(angle) * u[3]);
    jacobian[9] = t * t * (acrossSlope(angle) * u[2] + alongSlope(angle) * u[3]);
    jacobian[14] = -t * (Math.sin(angle) * u[2] + Math.cos(angle) * u[3]);
    jacobian[19] = t * (Math.cos(angle) * u[2] - Math.sin(angle) * u[3]);
    jacobian[24] = 1;
  }

  private static double alongSlope(double u) {
    return Math.abs(u) < 1e-4 ? -u / 3 : (Math.cos(u) - along(u)) / u;
  }

  private static double acrossSlope(double u) {
    return Math.abs(u) < 1e-4 ? 0.5 : (Math.sin(u) - across(u)) / u;
  }

  @Override
  public Structure structure() {
    return structure;
  }
}
