package dev.estimation.filters.soak;

import java.util.Map;
import java.util.TreeMap;

/** What was counted. */
final class SoakTally {
  static final double LIMIT = 1e-6;
  private static final int FIRST = 40;

  long steps;
  long rootFailures;
  long plainFailures;
  long unsound;
  double worst;
  private String where = "";
  private final StringBuilder told = new StringBuilder();
  private int tellings;
  private final Map<Integer, Long> decades = new TreeMap<>();

  void count(
      String step, String rootFailure, String plainFailure, SoakTrack root, SoakTrack plain) {
    steps++;
    if (!rootFailure.isEmpty()) {
      rootFailures++;
      tell(step, "square root: " + rootFailure);
    }
    if (!plainFailure.isEmpty()) {
      plainFailures++;
      tell(step, "covariance: " + plainFailure);
    }
    if (rootFailure.isEmpty() && !root.isSound()) {
      unsound++;
      tell(step, "square root: unsound");
    }
    if (plainFailure.isEmpty() && !plain.isSound()) {
      unsound++;
      tell(step, "covariance: unsound");
    }
    if (rootFailure.isEmpty() && plainFailure.isEmpty()) {
      compare(step, root.distance(plain));
    }
  }

  private void compare(String step, double distance) {
    int decade = distance == 0 ? -20 : (int) Math.floor(Math.log10(distance));
    decades.merge(decade, 1L, Long::sum);
    if (!(distance <= LIMIT)) {
      tell(step, "apart by " + distance);
    }
    if (!(distance <= worst)) {
      worst = distance;
      where = step;
    }
  }

  private void tell(String step, String what) {
    if (tellings++ < FIRST) {
      told.append(step).append(": ").append(what).append('\n');
    }
  }

  String report() {
    return "steps " + steps + "\nfailures in square-root form " + rootFailures
        + "\nfailures in covariance form " + plainFailures + "\nunsound results " + unsound
        + "\nlargest difference (standard deviations) " + worst + " at " + where
        + "\nsteps by power of ten of the difference " + decades + "\n" + told;
  }
}
