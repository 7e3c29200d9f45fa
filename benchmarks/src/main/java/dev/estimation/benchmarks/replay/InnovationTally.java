package dev.estimation.benchmarks.replay;

import dev.estimation.filters.filter.SensorPort;
import java.util.ArrayList;
import java.util.List;

/** Counts measurement rows and sums what their innovations say. */
final class InnovationTally {
  private final List<Integer> rejectedRows = new ArrayList<>();
  private int rows;
  private int accepted;
  private long degrees;
  private double squared;
  private double logLikelihood;

  void accept(SensorPort port) {
    rows++;
    accepted++;
    degrees += port.innovation().length;
    squared += port.normalisedInnovationSquared();
    logLikelihood += port.logLikelihood();
  }

  void reject() {
    rejectedRows.add(rows++);
  }

  /** A row that was neither used nor rejected. */
  void skip() {
    rows++;
  }

  Innovations summary() {
    boolean none = accepted == 0;
    return new Innovations(
        accepted,
        List.copyOf(rejectedRows),
        none ? Double.NaN : logLikelihood,
        none ? Double.NaN : squared / degrees);
  }
}
