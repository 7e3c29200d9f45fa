package dev.estimation.benchmarks.study;

import dev.estimation.benchmarks.log.BadInputException;
import dev.estimation.benchmarks.replay.FilterKind;
import dev.estimation.benchmarks.replay.FilteredAndSmoothed;
import dev.estimation.benchmarks.replay.LoadedVariant;
import dev.estimation.benchmarks.replay.Replayer;
import dev.estimation.benchmarks.replay.RunResult;
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
  private final boolean squareRoot;
  private final boolean smooth;

  /**
   * A comparison, not yet run.
   *
   * @param wholeState whether points are drawn over the whole state
   * @param squareRoot whether filters work in square-root form
   * @param smooth whether each run is followed by one of its smoothed track
   * @throws BadInputException if a method cannot serve a variant
   */
  Comparison(
      List<LoadedVariant> variants,
      List<Method> methods,
      boolean wholeState,
      boolean squareRoot,
      boolean smooth) {
    this.variants = variants;
    this.methods = methods;
    this.wholeState = wholeState;
    this.squareRoot = squareRoot;
    this.smooth = smooth;
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
    FilterKind points = wholeState ? method.kind().overWholeState() : method.kind();
    FilterKind kind = squareRoot ? points.inSquareRootForm() : points;
    return variant.scenario().map(scenario -> new Replayer(scenario, kind));
  }

  /** Runs all, one after another, and hands each on as soon as it is done. */
  void run(Consumer<LabelledRun> consumer) {
    for (LoadedVariant variant : variants) {
      for (Method method : methods) {
        if (smooth) {
          runAndSmooth(variant, method, consumer);
        } else {
          Optional<Replayer> replayer = replayer(variant, method);
          replayer.ifPresent(
              Replayer::run); // untimed: the first pass compiles what the second runs
          Optional<RunResult> result = replayer.map(Replayer::run);
          consumer.accept(labelled(variant, method, false, result));
        }
      }
    }
  }

  private void runAndSmooth(LoadedVariant variant, Method method, Consumer<LabelledRun> consumer) {
    Optional<Replayer> replayer = replayer(variant, method);
    replayer.ifPresent(Replayer::runAndSmooth);
    Optional<FilteredAndSmoothed> both = replayer.map(Replayer::runAndSmooth);
    consumer.accept(labelled(variant, method, false, both.map(FilteredAndSmoothed::filtered)));
    consumer.accept(labelled(variant, method, true, both.map(FilteredAndSmoothed::smoothed)));
  }

  private LabelledRun labelled(
      LoadedVariant variant, Method method, boolean smoothed, Optional<RunResult> result) {
    return new LabelledRun(variant, method.typed(), wholeState, squareRoot, smoothed, result);
  }
}
