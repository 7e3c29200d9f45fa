package dev.estimation.benchmarks.weigh;

import dev.estimation.core.function.VectorFunction;
import dev.estimation.core.gaussian.Form;
import dev.estimation.core.matching.MatchingWorkspace;
import dev.estimation.core.matching.MomentMatching;
import dev.estimation.core.space.Space;
import java.util.function.Consumer;

/** A matching whose calls are shown to someone before they are made. */
record TappedMatching(MomentMatching matching, Consumer<Carry> watcher) implements MomentMatching {
  @Override
  public MatchingWorkspace workspace(
      Space input, Space output, VectorFunction function, Form form) {
    return new TappedWorkspace(
        matching.workspace(input, output, function, form),
        new Carry.Target(function, input, output),
        watcher);
  }
}
