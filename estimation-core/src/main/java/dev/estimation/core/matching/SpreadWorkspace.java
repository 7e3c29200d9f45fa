package dev.estimation.core.matching;

import dev.estimation.core.function.VectorFunction;
import dev.estimation.core.gaussian.Form;
import dev.estimation.core.space.Space;

/** Carries moments by differences over the spread; see {@link SpreadLinearisation}. */
final class SpreadWorkspace extends TaylorWorkspace {
  private static final double SQUARE = 3;
  private static final double REACH = Math.sqrt(SQUARE);

  private final SpreadLinearisation.Bends taken;
  private final double[] displacement;
  private final double[] point;
  private final double[] image;
  private final double[] ahead;
  private final double[] behind;

  SpreadWorkspace(
      Space input,
      Space output,
      VectorFunction function,
      SpreadLinearisation.Bends taken,
      Form form) {
    super(input, output, function, taken != SpreadLinearisation.Bends.NONE, form);
    this.taken = taken;
    this.displacement = new double[input.dimension()];
    this.point = new double[input.storage()];
    this.image = new double[output.storage()];
    this.ahead = new double[output.dimension()];
    this.behind = new double[output.dimension()];
  }

  @Override
  MatchingStatus expand(double[] mean, double[] given) {
    for (int a = 0; a < active.count(); a++) {
      if (!deviateBothWays(mean, given, a, a)) {
        return MatchingStatus.FUNCTION_NOT_FINITE;
      }
      fillSlope(a);
      if (taken != SpreadLinearisation.Bends.NONE) {
        fillBend(a);
      }
      for (int b = 0; b < a && taken == SpreadLinearisation.Bends.ALL; b++) {
        if (!deviateBothWays(mean, given, a, b)) {
          return MatchingStatus.FUNCTION_NOT_FINITE;
        }
        fillBend(a, b);
      }
    }
    return MatchingStatus.MATCHED;
  }

  private boolean deviateBothWays(double[] mean, double[] given, int a, int b) {
    return deviate(mean, given, a, b, REACH, ahead) && deviate(mean, given, a, b, -REACH, behind);
  }

  /** The deviation at a step along column a of the factor, or along the sum of two columns. */
  private boolean deviate(
      double[] mean, double[] given, int a, int b, double step, double[] result) {
    double[] factor = active.factor().data;
    int n = displacement.length;
    for (int r = 0; r < active.count(); r++) {
      int row = active.input(r);
      double length = factor[row * n + a];
      displacement[row] = step * (a == b ? length : length + factor[row * n + b]);
    }
    inputSpace.displace(mean, displacement, point);
    if (!function.evaluate(point, given, image)) {
      return false;
    }
    outputSpace.difference(image, centre, result);
    return true;
  }

  private void fillSlope(int a) {
    for (int i = 0; i < ahead.length; i++) {
      slopesAndBends()[i * width() + a] = (ahead[i] - behind[i]) / (2 * REACH);
    }
  }

  private void fillBend(int a) {
    for (int i = 0; i < ahead.length; i++) {
      slopesAndBends()[i * width() + bend(a, a)] = (ahead[i] + behind[i]) / SQUARE;
    }
  }

  private void fillBend(int a, int b) {
    double[] data = slopesAndBends();
    for (int i = 0; i < ahead.length; i++) {
      int row = i * width();
      double both = (ahead[i] + behind[i]) / SQUARE;
      double single = data[row + bend(a, a)] + data[row + bend(b, b)];
      data[row + bend(a, b)] = (both - single) / 2;
    }
  }
}
