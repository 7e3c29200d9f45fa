package dev.estimation.testing;

import dev.estimation.core.function.Structure;
import dev.estimation.core.function.VectorFunction;
import java.util.Arrays;
import org.ejml.data.DMatrixRMaj;

/**
 * g(u) = A(u_a) u_b + c(u_a): A_rb = p_rb + q_rb w(s_rb' u_a) and c_r = 2 w(t_r' u_a), where w is the sine
 * or, for a bilinear function, the number itself. It allocates nothing.
 */
public final class ConditionallyLinearFunction implements VectorFunction {
  private final int inputs;
  private final int outputs;
  private final boolean bilinear;
  private final int[] bent;
  private final int[] linear;
  private final DMatrixRMaj steady;
  private final DMatrixRMaj moving;
  private final DMatrixRMaj directions;
  private final Structure structure;

  private ConditionallyLinearFunction(
      int inputs, int outputs, int[] active, int[] linear, boolean bilinear, boolean derivatives) {
    this.inputs = inputs;
    this.outputs = outputs;
    this.bilinear = bilinear;
    this.linear = linear;
    Structure known = Structure.UNKNOWN.withActiveInputs(active).withLinearInputs(linear);
    this.bent = known.nonlinearInputs(inputs);
    this.structure = derivatives ? known.withJacobian(this::derive) : known;
    RandomGaussians random = new RandomGaussians(17);
    this.steady = random.matrix(outputs, linear.length);
    this.moving = random.matrix(outputs, linear.length);
    this.directions = random.matrix(outputs * (linear.length + 1), Math.max(1, bent.length));
    for (int i = 0; i < directions.getNumElements(); i++) {
      directions.data[i] = Math.tanh(directions.data[i]) / 2;
    }
  }

  /** With sines. */
  public static ConditionallyLinearFunction waves(
      int inputs, int outputs, int[] active, int[] linear, boolean derivatives) {
    return new ConditionallyLinearFunction(inputs, outputs, active, linear, false, derivatives);
  }

  /** A product of linear functions of u_a and of u_b, at most. */
  public static ConditionallyLinearFunction bilinear(
      int inputs, int outputs, int[] active, int[] linear, boolean derivatives) {
    return new ConditionallyLinearFunction(inputs, outputs, active, linear, true, derivatives);
  }

  private double argument(int direction, double[] u) {
    double sum = 0;
    for (int a = 0; a < bent.length; a++) {
      sum += directions.get(direction, a) * u[bent[a]];
    }
    return sum;
  }

  private double wave(double x) {
    return bilinear ? x : Math.sin(x);
  }

  private double slope(double x) {
    return bilinear ? 1 : Math.cos(x);
  }

  private int direction(int r, int b) {
    return r * (linear.length + 1) + b;
  }

  @Override
  public void evaluate(double[] u, double[] given, double[] z) {
    for (int r = 0; r < outputs; r++) {
      z[r] = 2 * wave(argument(direction(r, linear.length), u));
      for (int b = 0; b < linear.length; b++) {
        double turned = wave(argument(direction(r, b), u));
        z[r] += (steady.get(r, b) + moving.get(r, b) * turned) * u[linear[b]];
      }
    }
  }

  private void derive(double[] u, double[] given, double[] jacobian) {
    Arrays.fill(jacobian, 0);
    for (int r = 0; r < outputs; r++) {
      addSlope(jacobian, r, direction(r, linear.length), u, 2);
      for (int b = 0; b < linear.length; b++) {
        double turned = wave(argument(direction(r, b), u));
        jacobian[r * inputs + linear[b]] = steady.get(r, b) + moving.get(r, b) * turned;
        addSlope(jacobian, r, direction(r, b), u, moving.get(r, b) * u[linear[b]]);
      }
    }
  }

  private void addSlope(double[] jacobian, int r, int direction, double[] u, double factor) {
    double slope = factor * slope(argument(direction, u));
    for (int a = 0; a < bent.length; a++) {
      jacobian[r * inputs + bent[a]] += slope * directions.get(direction, a);
    }
  }

  @Override
  public Structure structure() {
    return structure;
  }
}
