package dev.estimation.benchmarks.study;

import dev.estimation.benchmarks.replay.LoadedVariant;
import dev.estimation.benchmarks.replay.ReplayCase;
import java.util.List;

/** A case that has one variant, which no log has. */
class CaseBase implements ReplayCase {
  @Override
  public List<String> variants() {
    return List.of("only");
  }

  @Override
  public LoadedVariant load(String variant) {
    return LoadedVariant.absent(variant, "none", "there is no log");
  }
}
