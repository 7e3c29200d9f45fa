package dev.estimation.benchmarks.study;

import dev.estimation.benchmarks.log.BadInputException;
import dev.estimation.benchmarks.replay.LoadedVariant;
import dev.estimation.benchmarks.replay.Replayer;
import java.util.ArrayList;
import java.util.List;
import java.util.Optional;
import java.util.function.Consumer;

/** Every variant run with every method. All runs are prepared before the first begins. */
final class Comparison {
  private final List<PreparedRun> runs = new ArrayList<>();
  private final boolean wholeState;

  private record PreparedRun(LoadedVariant variant, String method, Optional<Replayer> replayer) {}

  /**
   * Prepares the runs.
   *
   * @throws BadInputException if a method cannot serve a variant
   */
  Comparison(List<LoadedVariant> variants, List<Method> methods, boolean wholeState) {
    this.wholeState = wholeState;
    for (LoadedVariant variant : variants) {
      for (Method method : methods) {
        runs.add(new PreparedRun(variant, method.typed(), replayer(variant, method)));
      }
    }
  }

  private Optional<Replayer> replayer(LoadedVariant variant, Method method) {
    Method used = wholeState ? method.overWholeInput() : method;
    try {
      return variant.scenario().map(scenario -> new Replayer(scenario, used.matching()));
    } catch (IllegalArgumentException refused) {
      throw new BadInputException(
          "method " + method.typed() + " cannot serve variant " + variant.name() + ": "
              + refused.getMessage(),
          refused);
    }
  }

  /** Runs all, one after another, and hands each on as soon as it is done. */
  void run(Consumer<LabelledRun> consumer) {
    for (PreparedRun run : runs) {
      consumer.accept(new LabelledRun(
          run.variant(), run.method(), wholeState, run.replayer().map(Replayer::run)));
    }
  }
}
