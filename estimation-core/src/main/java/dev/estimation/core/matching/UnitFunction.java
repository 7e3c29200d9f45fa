package dev.estimation.core.matching;

import dev.estimation.core.function.VectorFunction;
import java.util.Arrays;

/**
 * A function of unit normal inputs: blocks of g(m + L xi) - g(m) and, as further columns, the slopes by unit linear
 * inputs, row by row. Only the axes of nonlinear inputs move. <i>Confined to one thread</i>; allocates only when built.
 */
final class UnitFunction implements NestedExpansion.Source {
  private static final double TURN_ROUNDING = 1e-9;
  private static final double CENTRE_ROUNDING = 4 * 0x1p-52;

  private final BaseWorkspace owner;
  private final LinearSlopes slopes;
  private final int axes;
  private final int columns;
  private final boolean flatInput;
  private final boolean flatOutput;
  private final int[] inputs;
  private final double[] displacement;
  private final double[] point;
  private final double[] image;
  private final double[] deviation;
  private final double[] expected;
  private final double[] linear;
  private final double[] largest;
  private double[] mean;
  private double[] given;
  private ProbePairs known;
  private boolean linearKnown;
  private boolean turned;

  UnitFunction(BaseWorkspace owner, VectorFunction function, int axes) {
    this.owner = owner;
    this.axes = axes;
    this.slopes = new LinearSlopes(owner, function, axes);
    this.columns = 1 + owner.active.count() - axes;
    this.flatInput = owner.inputSpace.isVectorSpace();
    this.flatOutput = owner.outputSpace.isVectorSpace();
    this.inputs = owner.active.inputs();
    this.displacement = new double[owner.inputSpace.dimension()];
    this.point = new double[owner.inputSpace.storage()];
    this.image = new double[owner.outputSpace.storage()];
    this.deviation = new double[owner.outputSpace.dimension()];
    this.expected = new double[deviation.length];
    this.linear = new double[axes * deviation.length];
    this.largest = new double[deviation.length];
  }

  /** Where known values are asked for first. */
  void know(ProbePairs probes) {
    known = probes;
  }

  void begin(double[] meanOfInput, double[] givenToFunction) {
    mean = meanOfInput;
    given = givenToFunction;
    linearKnown = false;
    turned = false;
    Arrays.fill(largest, 0);
  }

  int columns() {
    return columns;
  }

  LinearSlopes slopes() {
    return slopes;
  }

  /** Whether an axis moves no input: the variance along it is zero. */
  boolean isStill(int axis) {
    int n = displacement.length;
    boolean still = true;
    for (int i = 0; still && i < inputs.length; i++) {
      still = owner.active.factor().data[inputs[i] * n + axis] == 0;
    }
    return still;
  }

  /** The coefficients of degree 1 of z, a row for each axis, from which turns of angles are foretold. */
  double[] changeLinear() {
    linearKnown = true;
    return linear;
  }

  /** Whether a deviation was foretold to go beyond half a turn. */
  boolean turned() {
    return turned;
  }

  /** The largest deviation of a component so far, or slope. */
  double largest(int component) {
    return largest[component];
  }

  @Override
  public boolean fill(double[] unit, double[] values, int start) {
    if (known.fillKnown(unit, values, start)) {
      return true;
    }
    if (!flatOutput && linearKnown && turns(unit)) {
      turned = true;
      return false;
    }
    boolean moves = place(unit);
    double[] output = owner.centre;
    if (moves) {
      output = image;
      if (!owner.function.evaluate(owner.copied(point), given, image)) {
        return false;
      }
    }
    owner.outputSpace.difference(output, owner.centre, deviation);
    for (int c = 0; c < deviation.length; c++) {
      values[start + c * columns] = deviation[c];
    }
    if (columns > 1 && !slopes.fill(start + 1, point, given, output, values, columns)) {
      return false;
    }
    for (int at = 0; at < deviation.length * columns; at++) {
      int c = at / columns;
      largest[c] = Math.max(largest[c], Math.abs(values[start + at]));
    }
    return true;
  }

  /** Whether the linear part of a deviation is more than the space of the output can tell from less. */
  private boolean turns(double[] unit) {
    for (int c = 0; c < deviation.length; c++) {
      expected[c] = 0;
      for (int axis = 0; axis < axes; axis++) {
        expected[c] += linear[axis * deviation.length + c] * unit[axis];
      }
    }
    owner.outputSpace.displace(owner.centre, expected, image);
    owner.outputSpace.difference(image, owner.centre, deviation);
    double rounding = TURN_ROUNDING + CENTRE_ROUNDING * centreSize();
    for (int c = 0; c < deviation.length; c++) {
      double allowed = rounding + TURN_ROUNDING * Math.abs(expected[c]);
      if (!(Math.abs(deviation[c] - expected[c]) <= allowed)) {
        return true;
      }
    }
    return false;
  }

  private double centreSize() {
    double size = 0;
    for (double value : owner.centre) {
      size = Math.max(size, Math.abs(value));
    }
    return size;
  }

  /** Places the point; false if it is the mean. */
  private boolean place(double[] unit) {
    boolean moves = false;
    for (int axis = 0; axis < axes; axis++) {
      moves |= unit[axis] != 0;
    }
    if (flatInput) {
      System.arraycopy(mean, 0, point, 0, point.length);
      add(unit, point);
    } else {
      Arrays.fill(displacement, 0);
      add(unit, displacement);
      owner.inputSpace.displace(mean, displacement, point);
    }
    return moves;
  }

  private void add(double[] unit, double[] result) {
    double[] factor = owner.active.factor().data;
    int n = displacement.length;
    for (int input : inputs) {
      double sum = result[input];
      for (int axis = 0; axis < axes; axis++) {
        sum += factor[input * n + axis] * unit[axis];
      }
      result[input] = sum;
    }
  }
}
