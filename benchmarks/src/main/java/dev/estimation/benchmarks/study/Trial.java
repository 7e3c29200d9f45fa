package dev.estimation.benchmarks.study;

import dev.estimation.benchmarks.log.BadInputException;
import dev.estimation.benchmarks.replay.Replayer;
import dev.estimation.benchmarks.replay.Scenario;

/** Makes a run of a method, or tells in one line that the method cannot serve. */
final class Trial {
  private Trial() {}

  static Replayer of(String variant, Scenario scenario, Method method) {
    try {
      return new Replayer(scenario, method.kind());
    } catch (IllegalArgumentException refused) {
      throw new BadInputException(
          "method " + method.typed() + " cannot serve variant " + variant + ": "
              + refused.getMessage(),
          refused);
    }
  }
}
