package dev.estimation.benchmarks.jmh;

import java.util.Collection;
import org.openjdk.jmh.profile.GCProfiler;
import org.openjdk.jmh.results.RunResult;
import org.openjdk.jmh.runner.Runner;
import org.openjdk.jmh.runner.RunnerException;
import org.openjdk.jmh.runner.options.ChainedOptionsBuilder;
import org.openjdk.jmh.runner.options.OptionsBuilder;
import org.openjdk.jmh.runner.options.TimeValue;
import org.openjdk.jmh.runner.options.VerboseMode;

/**
 * How much is measured, and how long. Quick: four functions in one dimension each, the matchings without the model alone, few
 * n, one fork of short iterations; rough. Full: all that the benchmarks have, as they state it.
 */
enum CostProfile {
  /** A few minutes. */
  QUICK,
  /** About an hour. */
  FULL;

  private static final String[] PROBLEMS = {"polar:2", "turn:5", "pseudorange:9", "attitude:6"};
  private static final String[] SIZES = {"2", "8", "20", "60"};
  private static final String[] SCALED = {
    "linear", "linear-spread", "simplex", "cubature3", "cubature5", "random1000"
  };

  Collection<RunResult> runMatchings() throws RunnerException {
    ChainedOptionsBuilder options = options(MatchingBenchmark.class);
    if (this == QUICK) {
      options.param("problem", PROBLEMS);
    }
    return new Runner(options.build()).run();
  }

  Collection<RunResult> runScaling() throws RunnerException {
    ChainedOptionsBuilder options = options(ScalingBenchmark.class);
    if (this == QUICK) {
      options.param("n", SIZES).param("matching", SCALED);
    }
    return new Runner(options.build()).run();
  }

  private ChainedOptionsBuilder options(Class<?> benchmark) {
    ChainedOptionsBuilder options = new OptionsBuilder()
        .addProfiler(GCProfiler.class)
        .include(benchmark.getName() + (this == QUICK ? ".carry$" : ".*"));
    return this == FULL
        ? options
        : options
            .verbosity(VerboseMode.SILENT)
            .forks(1)
            .warmupIterations(4)
            .warmupTime(TimeValue.milliseconds(200))
            .measurementIterations(5)
            .measurementTime(TimeValue.milliseconds(100));
  }
}
