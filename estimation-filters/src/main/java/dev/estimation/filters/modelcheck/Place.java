package dev.estimation.filters.modelcheck;

import java.util.List;

/**
 * Where a model was called. <i>Immutable.</i>
 *
 * @param state the state
 * @param noise the noise inside a noise-driven motion; empty for other models
 * @param given the control of a motion, the given of a sensor; empty if there is none
 * @param time at the start (s); NaN for a sensor
 * @param step duration (s); NaN for a sensor
 */
public record Place(
    List<Double> state, List<Double> noise, List<Double> given, double time, double step) {
  /**
   * Copies the lists.
   *
   * @param state the state
   * @param noise the noise
   * @param given control or given
   * @param time at the start (s)
   * @param step duration (s)
   */
  public Place {
    state = List.copyOf(state);
    noise = List.copyOf(noise);
    given = List.copyOf(given);
  }

  /** {@return the place in words, with what there is} */
  @Override
  public String toString() {
    boolean moves = !Double.isNaN(step);
    StringBuilder text = new StringBuilder("state ").append(state);
    if (!noise.isEmpty()) {
      text.append(", noise ").append(noise);
    }
    if (!given.isEmpty()) {
      text.append(moves ? ", control " : ", given ").append(given);
    }
    if (moves) {
      text.append(", t = ").append(time).append(" s, dt = ").append(step).append(" s");
    }
    return text.toString();
  }
}
