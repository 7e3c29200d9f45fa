package dev.estimation.filters.sensor;

import dev.estimation.core.function.Structure;
import java.util.Arrays;
import java.util.stream.IntStream;

/** What the constructors of sensors have in common. */
final class SensorSetUp {
  private SensorSetUp() {}

  /** {@return a variance from a standard deviation} */
  static double variance(double deviation, String what, String sensor) {
    double variance = deviation * deviation;
    if (!(deviation > 0 && variance > 0 && Double.isFinite(variance))) {
      throw new IllegalArgumentException(
          what + " must be finite and > 0, with a square that is so too, got " + deviation
              + " (sensor model " + sensor + ")");
    }
    return variance;
  }

  /**
   * Columns in the order of the state, so that points do not depend on the order of the axes.
   *
   * @param nonlinear columns
   * @param linear columns
   */
  static Structure structure(int[] nonlinear, int[] linear, String sensor) {
    int[] active =
        IntStream.concat(IntStream.of(nonlinear), IntStream.of(linear)).sorted().toArray();
    if (IntStream.of(active).distinct().count() != active.length) {
      throw new IllegalArgumentException(
          "what is read of the state must be distinct components, got columns "
              + Arrays.toString(active) + " (sensor model " + sensor + ")");
    }
    return Structure.UNKNOWN.withActiveInputs(active).withLinearInputs(linear);
  }

  static int[] join(int[] first, int[] second) {
    return IntStream.concat(IntStream.of(first), IntStream.of(second)).toArray();
  }

  /** {@return the columns of the Hessians of m components} */
  static int hessianColumns(double[] hessians, int m) {
    return (int) Math.round(Math.sqrt(hessians.length / (double) m));
  }
}
