package dev.estimation.core.accuracy;

/**
 * How hard to look for reference moments. <i>Immutable.</i>
 *
 * @param accuracy the error up to which levels must have converged, in the scale that {@link ReferenceSearch}
 *     states; greater than 0
 * @param points of one random shift, for functions that are not smooth; 2^k - 1 is best
 * @param shifts how many independent shifts; 16 or more
 * @param seed of the shifts
 */
public record ReferenceSettings(double accuracy, int points, int shifts, long seed) {
  /**
   * Settings.
   *
   * @param accuracy greater than 0
   * @param points 2 or more
   * @param shifts 16 or more
   * @param seed any
   */
  public ReferenceSettings {
    if (!(accuracy > 0)) {
      throw new IllegalArgumentException(
          "accuracy must be greater than 0, got " + accuracy + " (reference moments)");
    }
    if (points < 2) {
      throw new IllegalArgumentException(
          "points must be 2 or more, got " + points + " (reference moments)");
    }
    if (shifts < 16) {
      throw new IllegalArgumentException(
          "shifts must be 16 or more, got " + shifts + " (reference moments)");
    }
  }

  /** {@return an accuracy of 1e-6, and 32 shifts of 4095 points: 131 072 evaluations where it is not reached} */
  public static ReferenceSettings standard() {
    return new ReferenceSettings(1e-6, 4095, 32, 1);
  }

  /**
   * {@return these settings with another accuracy}
   *
   * @param error greater than 0
   */
  public ReferenceSettings withAccuracy(double error) {
    return new ReferenceSettings(error, points, shifts, seed);
  }

  /**
   * {@return these settings with other points}
   *
   * @param count of one shift, 2 or more and more than active inputs
   * @param replicates how many independent shifts, 16 or more
   * @param shiftSeed of the shifts
   */
  public ReferenceSettings withPoints(int count, int replicates, long shiftSeed) {
    return new ReferenceSettings(accuracy, count, replicates, shiftSeed);
  }
}
