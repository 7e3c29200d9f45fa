package dev.estimation.core.function;

import dev.estimation.core.space.Space;
import java.util.Arrays;

/**
 * Central differences of a function along one input over a ladder of steps, 1/4, 1/16, ... of the scale,
 * each freed of its h^2 by the one before (Richardson 1911, from memory), and for each output the step at
 * which they are steadiest. That forgives scales that are wrong by several orders of magnitude, and tells
 * how far the differences can be trusted.
 *
 * <p>The uncertainty at a step is the larger of the changes to the two neighbouring steps, of which the
 * longer shows truncation and the shorter rounding, and the rounding that is known beforehand over the
 * width. Steps at which the function is not finite are left out.
 */
final class SteadyDifferences {
  private static final double RATIO = 0.25;
  private static final int RUNGS = 24;

  /** The first rung that has a neighbour of its own kind. */
  private static final int FIRST = 2;

  private final Space output;
  private final VectorFunction function;
  private final InputSteps steps;
  private final double[] image;
  private final double[] ahead;
  private final double[] behind;
  private final double[][] quotients;
  private final double[] widths = new double[RUNGS];

  SteadyDifferences(Space input, Space output, VectorFunction function, double[] scales) {
    this.output = output;
    this.function = function;
    this.steps = new InputSteps(input, scales, 1);
    this.image = new double[output.storage()];
    this.ahead = new double[output.dimension()];
    this.behind = new double[output.dimension()];
    this.quotients = new double[RUNGS][output.dimension()];
  }

  /** Takes the differences along input j; {@code centre} is the image of the point. */
  void take(double[] point, double[] given, double[] centre, int j) {
    double length = 1;
    for (int rung = 0; rung < RUNGS; rung++) {
      length *= RATIO;
      double forward = deviate(point, given, centre, j, length, ahead);
      widths[rung] = forward - deviate(point, given, centre, j, -length, behind);
      for (int i = 0; i < ahead.length; i++) {
        quotients[rung][i] = (ahead[i] - behind[i]) / widths[rung];
      }
    }
    extrapolate();
  }

  /** From the last to the first, since each takes the one before as it was. */
  private void extrapolate() {
    double weight = RATIO * RATIO;
    for (int rung = RUNGS - 1; rung > 0; rung--) {
      double[] here = quotients[rung];
      for (int i = 0; i < here.length; i++) {
        here[i] += weight / (1 - weight) * (here[i] - quotients[rung - 1][i]);
      }
    }
  }

  private double deviate(
      double[] point, double[] given, double[] centre, int j, double count, double[] result) {
    double[] moved = steps.move(point, j, count);
    Arrays.fill(image, Double.NaN);
    function.evaluate(moved, given, image);
    output.difference(image, centre, result);
    return steps.displacement(j);
  }

  /** The rung at which output i is steadiest; 0 if it is at none. */
  int steadiest(int i, double rounding) {
    int best = 0;
    for (int rung = FIRST; rung < RUNGS - 1; rung++) {
      if (uncertainty(i, rung, rounding) < uncertainty(i, best, rounding)) {
        best = rung;
      }
    }
    return best;
  }

  /** The derivative of output i as seen at a rung. */
  double value(int i, int rung) {
    return rung < FIRST ? Double.NaN : quotients[rung][i];
  }

  /** How far that can be wrong, given the rounding of a difference of outputs. */
  double uncertainty(int i, int rung, double rounding) {
    if (rung < FIRST) {
      return Double.POSITIVE_INFINITY;
    }
    double here = quotients[rung][i];
    double change =
        Math.max(Math.abs(here - quotients[rung - 1][i]), Math.abs(here - quotients[rung + 1][i]));
    return change + rounding / widths[rung];
  }
}
