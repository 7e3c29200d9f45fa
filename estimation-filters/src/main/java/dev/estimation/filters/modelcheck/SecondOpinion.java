package dev.estimation.filters.modelcheck;

import java.util.SplittableRandom;

/**
 * Differences that also see the rounding inside a model, for a derivative that is under suspicion. A model may lose digits
 * where its value does not show it (1 - cos of a small angle) and be level over the shortest steps. So the steps are
 * longer here, 1/4, 1/16, ... 2^-20 of the scale, and the scatter of the slope when all inputs are shaken by the same part of
 * their scales counts as uncertainty, besides its change from the last step. The most certain step decides. Of a smooth
 * function that scatter falls by 16 from step to step; where it falls by less than 4 and the slope has settled, it is
 * rounding, and no shorter step is more certain.
 */
final class SecondOpinion {
  private static final int RUNGS = 10;
  private static final int SHAKES = 4;
  private static final double RATIO = 0.25;
  private static final double SETTLED = 0.02;
  private static final double RELATIVE = 1e-6;
  private static final double UNCERTAINTIES = 10;

  private final View view;
  private final double[] scales;
  private final double[][] shakes;

  SecondOpinion(View view, double[] scales) {
    this.view = view;
    this.scales = scales;
    this.shakes = new double[SHAKES][scales.length];
    SplittableRandom random = new SplittableRandom(1);
    for (double[] shake : shakes) {
      for (int l = 0; l < scales.length; l++) {
        shake[l] = scales[l] * (2 * random.nextDouble() - 1);
      }
    }
  }

  /** Whether a derivative of an output by input j, as given, is wrong. */
  boolean disagrees(Arguments at, int output, int j, double given) {
    double best = Double.POSITIVE_INFINITY;
    double seen = Double.NaN;
    double floor = 0;
    double scatter = Double.POSITIVE_INFINITY;
    double part = RATIO;
    double slope = slope(at, output, j, part);
    for (int rung = 0; rung < RUNGS; rung++) {
      part *= RATIO;
      double before = slope;
      double scatterBefore = scatter;
      slope = slope(at, output, j, part);
      scatter = scatter(at, output, j, part, slope);
      if (scatter > RATIO * scatterBefore && scatter < SETTLED * Math.abs(slope)) {
        floor = Math.max(floor, scatter);
      }
      double uncertainty = Math.max(floor, Math.abs(slope - before) + scatter);
      if (uncertainty < best) {
        best = uncertainty;
        seen = slope;
      }
    }
    double allowed = RELATIVE * Math.max(Math.abs(given), Math.abs(seen)) + UNCERTAINTIES * best;
    return Math.abs(given - seen) > allowed;
  }

  /** How much the slope is off the middle of those on both sides; what is smooth leaves the square of the part. */
  private double scatter(Arguments at, int output, int j, double part, double slope) {
    double scatter = 0;
    for (double[] shake : shakes) {
      double ahead = slope(view.moved(at, shake, part), output, j, part);
      double behind = slope(view.moved(at, shake, -part), output, j, part);
      scatter = Math.max(scatter, Math.abs(ahead + behind - 2 * slope));
    }
    return scatter;
  }

  /** NaN where the function is not finite. */
  private double slope(Arguments at, int output, int j, double part) {
    double[] step = new double[scales.length];
    step[j] = scales[j];
    double[] ahead = view.value(view.moved(at, step, part));
    double[] behind = view.value(view.moved(at, step, -part));
    return ahead == null || behind == null
        ? Double.NaN
        : view.change(ahead, behind)[output] / (2 * part * scales[j]);
  }
}
