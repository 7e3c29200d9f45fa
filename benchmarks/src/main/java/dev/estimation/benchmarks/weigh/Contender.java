package dev.estimation.benchmarks.weigh;

import dev.estimation.core.matching.MatchingWorkspace;
import dev.estimation.core.matching.MomentMatching;

/**
 * A method that is weighed.
 *
 * @param name for reading
 * @param matching the method
 */
public record Contender(String name, MomentMatching matching) {
  /** Scratch, or the reason why the method cannot serve the function. */
  record Scratch(MatchingWorkspace work, String refusal) {}

  Scratch scratch(Carry.Target target) {
    try {
      return new Scratch(
          matching.workspace(target.input(), target.output(), target.function()), "");
    } catch (IllegalArgumentException refused) {
      return new Scratch(null, refused.getMessage());
    }
  }
}
