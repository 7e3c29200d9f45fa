package dev.estimation.benchmarks.replay;

import java.util.List;

/** A kind of problem, on one log or simulated, in one or more variants. */
public interface ReplayCase {
  /** {@return the names of the variants, in the order in which they are shown} */
  List<String> variants();

  /**
   * Makes one variant.
   *
   * @param variant one of {@link #variants()}
   */
  LoadedVariant load(String variant);

  /**
   * {@return what the components of a variant's state and measurements are, for readers of results}
   *
   * @param variant one of {@link #variants()}
   */
  default VariableNames names(String variant) {
    return VariableNames.NONE;
  }
}
