package dev.estimation.benchmarks.replay;

import java.util.List;

/**
 * A time and the measurements of that time, which are updates one after another.
 *
 * @param time s
 * @param measurements in the order of processing; may be empty
 */
public record Step(double time, List<Measurement> measurements) {
  /** Keeps a copy of the list. */
  public Step {
    measurements = List.copyOf(measurements);
  }
}
