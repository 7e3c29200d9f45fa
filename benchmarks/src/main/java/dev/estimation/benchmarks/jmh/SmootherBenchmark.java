package dev.estimation.benchmarks.jmh;

import dev.estimation.filters.filter.Estimate;
import dev.estimation.filters.filter.FilterPlan;
import dev.estimation.filters.filter.FilterWorkspace;
import dev.estimation.filters.filter.SensorPort;
import dev.estimation.filters.filter.StepStatus;
import dev.estimation.filters.smoother.FixedIntervalSmoother;
import dev.estimation.filters.smoother.SmoothedTrack;
import java.util.concurrent.TimeUnit;
import org.openjdk.jmh.annotations.Benchmark;
import org.openjdk.jmh.annotations.BenchmarkMode;
import org.openjdk.jmh.annotations.Fork;
import org.openjdk.jmh.annotations.Measurement;
import org.openjdk.jmh.annotations.Mode;
import org.openjdk.jmh.annotations.OperationsPerInvocation;
import org.openjdk.jmh.annotations.OutputTimeUnit;
import org.openjdk.jmh.annotations.Param;
import org.openjdk.jmh.annotations.Scope;
import org.openjdk.jmh.annotations.Setup;
import org.openjdk.jmh.annotations.State;
import org.openjdk.jmh.annotations.Warmup;

/**
 * A step of the smoother on 1000 steps of the {@link TurnProblem}: backwards alone, and with the filter's step and its
 * record. No model is called on the way back: the baseline is the textbook's pass in matrix operations, and for the whole
 * the filter without a record.
 */
@State(Scope.Thread)
@BenchmarkMode(Mode.AverageTime)
@OutputTimeUnit(TimeUnit.NANOSECONDS)
@OperationsPerInvocation(SmootherBenchmark.STEPS)
@Fork(1)
@Warmup(iterations = 5, time = 500, timeUnit = TimeUnit.MILLISECONDS)
@Measurement(iterations = 5, time = 500, timeUnit = TimeUnit.MILLISECONDS)
public class SmootherBenchmark {
  static final int STEPS = 1000;

  /** The method of the filter, as in {@link StepBenchmark}. */
  @Param({"linear", "unscented", "cubature", "hermite3"})
  String method;

  /** What the filter carries. */
  @Param({"covariance", "square-root"})
  String form;

  private final double[][] measurements = TurnProblem.measurements(STEPS, 7);
  private final PlainSmoother plain = new PlainSmoother(5, STEPS);
  private FilterPlan plan;
  private FilterWorkspace work;
  private SensorPort port;
  private FixedIntervalSmoother recorded;

  /** Makes the plan and records a track. */
  @Setup
  public void make() {
    plan = StepMethod.plan(method, form);
    work = plan.workspace();
    port = work.port(TurnProblem.sensor());
    Estimate estimate = plan.start(0, TurnProblem.start());
    recorded = FixedIntervalSmoother.startingAt(estimate);
    plain.start(estimate);
    for (int k = 0; k < STEPS; k++) {
      step(estimate, k);
      recorded.record(work, estimate);
      plain.record(work, estimate);
    }
  }

  private void step(Estimate estimate, int k) {
    StepStatus moved = work.predict(estimate, k + 1.0);
    StepStatus updated = port.update(estimate, measurements[k]);
    if (moved != StepStatus.APPLIED || updated != StepStatus.APPLIED) {
      throw new IllegalStateException(work.failure() + port.failure());
    }
  }

  /** Backwards over a record. */
  @Benchmark
  public SmoothedTrack backward() {
    return recorded.smooth();
  }

  /** The same written plainly with a matrix library. */
  @Benchmark
  public PlainSmoother plainEjml() {
    return plain.smooth();
  }

  /** Filter, record, and back. */
  @Benchmark
  public SmoothedTrack whole() {
    Estimate estimate = plan.start(0, TurnProblem.start());
    FixedIntervalSmoother smoother = FixedIntervalSmoother.startingAt(estimate);
    for (int k = 0; k < STEPS; k++) {
      step(estimate, k);
      smoother.record(work, estimate);
    }
    return smoother.smooth();
  }

  /** The filter alone. */
  @Benchmark
  public Estimate filterOnly() {
    Estimate estimate = plan.start(0, TurnProblem.start());
    for (int k = 0; k < STEPS; k++) {
      step(estimate, k);
    }
    return estimate;
  }
}
