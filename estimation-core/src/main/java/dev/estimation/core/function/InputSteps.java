package dev.estimation.core.function;

import dev.estimation.core.internal.Checks;
import dev.estimation.core.space.Space;
import java.util.Arrays;

/** Points moved by steps along inputs, and how far they came after rounding. One thread's own. */
final class InputSteps {
  private final Space input;
  private final double[] steps;
  private final double[] tangent;
  private final double[] moved;

  /** Steps of a fraction of the scale of each input; refuses scales that are none. */
  InputSteps(Space input, double[] scales, double fraction) {
    Checks.length("input scales", scales, input.dimension());
    for (int j = 0; j < scales.length; j++) {
      if (!(scales[j] > 0 && scales[j] <= Double.MAX_VALUE)) {
        throw new IllegalArgumentException(
            "input scales[" + j + "] must be finite and > 0, got " + scales[j]);
      }
    }
    this.input = input;
    this.steps = Arrays.stream(scales).map(scale -> fraction * scale).toArray();
    this.tangent = new double[input.dimension()];
    this.moved = new double[input.storage()];
  }

  /** The point moved by a number of steps along input j; the array is overwritten by the next move. */
  double[] move(double[] point, int j, double count) {
    return move(point, j, count, j, 0);
  }

  /** The point moved along two inputs. */
  double[] move(double[] point, int j, double count, int l, double second) {
    Arrays.fill(tangent, 0);
    tangent[j] = count * steps[j];
    tangent[l] += second * steps[l];
    input.displace(point, tangent, moved);
    input.difference(moved, point, tangent);
    return moved;
  }

  /** How far the last move came along an input, as rounded. */
  double displacement(int j) {
    return tangent[j];
  }
}
