package dev.estimation.benchmarks.study;

import dev.estimation.benchmarks.log.BadInputException;
import dev.estimation.benchmarks.replay.FilterKind;
import dev.estimation.benchmarks.replay.FilteredAndSmoothed;
import dev.estimation.benchmarks.replay.LoadedVariant;
import dev.estimation.benchmarks.replay.Replayer;
import dev.estimation.benchmarks.replay.RunResult;
import dev.estimation.benchmarks.replay.RunTrace;
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
    return variant.scenario().map(scenario -> new Replayer(scenario, kind(method)));
  }

  private FilterKind kind(Method method) {
    FilterKind points = wholeState ? method.kind().overWholeState() : method.kind();
    return squareRoot ? points.inSquareRootForm() : points;
  }

  /** {@return how many runs there will be} */
  int size() {
    return variants.size() * methods.size() * (smooth ? 2 : 1);
  }

  /**
   * Runs all, one after another, and hands each on as soon as it is done. Of the two passes of a run the first one is
   * traced and compiles what the second one, which is timed, runs.
   */
  void run(Progress progress, Consumer<LabelledRun> consumer) {
    for (LoadedVariant variant : variants) {
      for (Method method : methods) {
        Optional<Replayer> replayer = replayer(variant, method);
        if (replayer.isEmpty()) {
          consumeAbsent(variant, method, consumer);
        } else if (smooth) {
          runAndSmooth(variant, method, replayer.get(), progress, consumer);
        } else {
          run(variant, method, replayer.get(), progress, consumer);
        }
      }
    }
  }

  private void consumeAbsent(LoadedVariant variant, Method method, Consumer<LabelledRun> consumer) {
    consumer.accept(labelled(variant, method, false, Optional.empty(), Optional.empty()));
    if (smooth) {
      consumer.accept(labelled(variant, method, true, Optional.empty(), Optional.empty()));
    }
  }

  private void run(
      LoadedVariant variant,
      Method method,
      Replayer replayer,
      Progress progress,
      Consumer<LabelledRun> consumer) {
    RunTrace trace = new RunTrace();
    RunResult result;
    try (Progress.Bar bar = begin(progress, variant, method)) {
      replayer.run(new Followers(trace, bar));
      result = replayer.run(bar);
    }
    consumer.accept(labelled(variant, method, false, Optional.of(result), Optional.of(trace)));
  }

  private void runAndSmooth(
      LoadedVariant variant,
      Method method,
      Replayer replayer,
      Progress progress,
      Consumer<LabelledRun> consumer) {
    RunTrace trace = new RunTrace();
    FilteredAndSmoothed both;
    try (Progress.Bar bar = begin(progress, variant, method)) {
      replayer.runAndSmooth(new Followers(trace, bar));
      both = replayer.runAndSmooth(bar);
    }
    consumer.accept(
        labelled(variant, method, false, Optional.of(both.filtered()), Optional.of(trace)));
    consumer.accept(
        labelled(variant, method, true, Optional.of(both.smoothed()), Optional.empty()));
  }

  private static Progress.Bar begin(Progress progress, LoadedVariant variant, Method method) {
    int steps = variant.scenario().orElseThrow().steps().size();
    return progress.begin(variant.name() + " " + method.typed(), 2 * steps);
  }

  private LabelledRun labelled(
      LoadedVariant variant,
      Method method,
      boolean smoothed,
      Optional<RunResult> result,
      Optional<RunTrace> trace) {
    return new LabelledRun(
        variant, method.typed(), wholeState, squareRoot, smoothed, kind(method), result, trace);
  }
}
