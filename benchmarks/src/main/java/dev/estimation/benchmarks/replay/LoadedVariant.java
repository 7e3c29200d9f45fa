package dev.estimation.benchmarks.replay;

import java.util.Optional;

/**
 * A variant of a case on one log: a scenario, or the reason why the log has none.
 *
 * @param name of the variant
 * @param label of the log and variant, for results
 * @param scenario empty if the log does not have what the variant is about
 * @param absence why there is no scenario; empty if there is one
 */
public record LoadedVariant(
    String name, String label, Optional<Scenario> scenario, String absence) {
  /** {@return a variant that can be run} */
  public static LoadedVariant of(String name, String label, Scenario scenario) {
    return new LoadedVariant(name, label, Optional.of(scenario), "");
  }

  /** {@return a variant that the log does not have} */
  public static LoadedVariant absent(String name, String label, String reason) {
    return new LoadedVariant(name, label, Optional.empty(), reason);
  }
}
