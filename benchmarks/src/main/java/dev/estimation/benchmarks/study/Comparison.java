package dev.estimation.benchmarks.study;

import dev.estimation.benchmarks.log.BadInputException;
import dev.estimation.benchmarks.replay.LoadedVariant;
import dev.estimation.benchmarks.replay.Replayer;
import dev.estimation.benchmarks.replay.RunResult;
import dev.estimation.core.matching.MomentMatching;
import java.util.List;
import java.util.Optional;
import java.util.function.Consumer;

/**
 * Every variant run with every method. That each method can serve each variant is tried before the
 * first run; what the trial made is let go, since a rule of many points takes much memory.
 */
final class Comparison {
  private final List<LoadedVariant> variants;
  private final List<Method> methods;
  private final boolean wholeState;

  /**
   * A comparison, not yet run.
   *
   * @throws BadInputException if a method cannot serve a variant
   */
  Comparison(List<LoadedVariant> variants, List<Method> methods, boolean wholeState) {
    this.variants = variants;
    this.methods = methods;
    this.wholeState = wholeState;
    for (LoadedVariant variant : variants) {
      for (Method method : methods) {
        tryOut(variant, method);
      }
    }
  }

  private void tryOut(LoadedVariant variant, Method method) {
    try {
      replayer(variant, method);
    } catch (IllegalArgumentException refused) {
      throw new BadInputException(
          "method " + method.typed() + " cannot serve variant " + variant.name() + ": "
              + refused.getMessage(),
          refused);
    }
  }

  private Optional<Replayer> replayer(LoadedVariant variant, Method method) {
    MomentMatching matching = wholeState ? method.matching().overWholeInput() : method.matching();
    return variant.scenario().map(scenario -> new Replayer(scenario, matching));
  }

  /** Runs all, one after another, and hands each on as soon as it is done. */
  void run(Consumer<LabelledRun> consumer) {
    for (LoadedVariant variant : variants) {
      for (Method method : methods) {
        Optional<RunResult> result = replayer(variant, method).map(Replayer::run);
        consumer.accept(new LabelledRun(variant, method.typed(), wholeState, result));
      }
    }
  }
}
