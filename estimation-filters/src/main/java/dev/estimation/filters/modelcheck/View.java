package dev.estimation.filters.modelcheck;

import dev.estimation.core.space.Space;

/** A method as a function of state and noise, the rest of the arguments held: values, changes and their rounding. */
final class View {
  private static final int FIRST_HALVING = 26;
  private static final int LAST_HALVING = 29;

  private final Operation operation;
  private final Space input;
  private final Space output;

  View(Operation operation, Space input, Space output) {
    this.operation = operation;
    this.input = input;
    this.output = output;
  }

  int outputs() {
    return output.dimension();
  }

  /** The value at a place; null unless it is finite. */
  double[] value(Arguments at) {
    Attempt attempt = Attempt.of(operation, at);
    return attempt.isFinite() ? attempt.out() : null;
  }

  /** The place moved by a part of a displacement of state and noise. */
  Arguments moved(Arguments at, double[] displacement, double part) {
    double[] tangent = displacement.clone();
    for (int j = 0; j < tangent.length; j++) {
      tangent[j] *= part;
    }
    double[] joint = at.joint();
    input.displace(joint, tangent, joint);
    return at.at(joint);
  }

  /** How to come from one place to another. */
  double[] displacement(Arguments from, Arguments to) {
    double[] tangent = new double[input.dimension()];
    input.difference(to.joint(), from.joint(), tangent);
    return tangent;
  }

  /** a - b in the space of outputs. */
  double[] change(double[] a, double[] b) {
    double[] change = new double[output.dimension()];
    output.difference(a, b, change);
    return change;
  }

  /** The magnitude of an output; the largest one where numbers are not those of differences. */
  double size(double[] value, int i) {
    if (output.storage() == output.dimension()) {
      return Math.abs(value[i]);
    }
    double largest = 0;
    for (double each : value) {
      largest = Math.max(largest, Math.abs(each));
    }
    return largest;
  }

  /**
   * How far the value ahead is from that behind, reflected at the value, for a part of a displacement both ways: 0 for what is
   * linear, also where angles go half a turn. Null unless all are finite. The second row is the sum of both changes' magnitudes.
   */
  double[][] bend(Arguments at, double[] displacement, double part) {
    double[] middle = value(at);
    double[] ahead = value(moved(at, displacement, part));
    double[] behind = value(moved(at, displacement, -part));
    if (middle == null || ahead == null || behind == null) {
      return null;
    }
    double[] forth = change(ahead, middle);
    double[] back = change(middle, behind);
    double[] reflected = new double[middle.length];
    output.displace(middle, back, reflected);
    double[][] bend = {change(ahead, reflected), new double[forth.length]};
    for (int i = 0; i < forth.length; i++) {
      bend[1][i] = Math.abs(forth[i]) + Math.abs(back[i]);
    }
    return bend;
  }

  /**
   * How rounding shows in each output: the bend over displacements so short that nothing else is left of it, or what
   * rounding of the inputs does, if that is more.
   */
  double[] rounding(Arguments at, double[] displacement) {
    double[] rounding = new double[output.dimension()];
    double reach = 1 + inputSize(at, displacement);
    for (int halving = FIRST_HALVING; halving <= LAST_HALVING; halving++) {
      double[][] bend = bend(at, displacement, Math.scalb(1.0, -halving));
      for (int i = 0; i < rounding.length && bend != null; i++) {
        double ofInputs = 0x1p-52 * reach * Math.scalb(bend[1][i], halving);
        rounding[i] = Math.max(rounding[i], Math.max(Math.abs(bend[0][i]), ofInputs));
      }
    }
    return rounding;
  }

  /** The largest input over its part of a displacement; inputs that are not those of differences count as 1. */
  private static double inputSize(Arguments at, double[] displacement) {
    double[] joint = at.joint();
    double largest = 0;
    for (int j = 0; j < displacement.length; j++) {
      double size = joint.length == displacement.length ? Math.abs(joint[j]) : 1;
      largest =
          displacement[j] == 0 ? largest : Math.max(largest, size / Math.abs(displacement[j]));
    }
    return largest;
  }
}
