package dev.estimation.benchmarks.cases.uwb;

import dev.estimation.benchmarks.log.BadInputException;

/**
 * What belongs to one recording and does not stand in its files.
 *
 * @param lag how late ranges are stamped (s)
 * @param height of the tag (m)
 * @param bias added to every range (m)
 * @param nearX where the tag is known to be near at the start (m)
 * @param nearY where the tag is known to be near at the start (m)
 */
public record UwbSettings(double lag, double height, double bias, double nearX, double nearY) {
  /** Of the recording at hand when the case was made. */
  public static final UwbSettings DEFAULT = new UwbSettings(0.20, 1.3, 0, -2.5, -4.0);

  /** Refuses numbers that are not finite. */
  public UwbSettings {
    finite("lag", lag);
    finite("height", height);
    finite("bias", bias);
    finite("near start x", nearX);
    finite("near start y", nearY);
  }

  private static void finite(String what, double value) {
    if (!Double.isFinite(value)) {
      throw new BadInputException(what + " must be finite, got " + value);
    }
  }
}
