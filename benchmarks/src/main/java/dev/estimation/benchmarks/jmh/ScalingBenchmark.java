package dev.estimation.benchmarks.jmh;

import java.util.concurrent.TimeUnit;
import org.ejml.data.DMatrixRMaj;
import org.openjdk.jmh.annotations.Benchmark;
import org.openjdk.jmh.annotations.BenchmarkMode;
import org.openjdk.jmh.annotations.Fork;
import org.openjdk.jmh.annotations.Measurement;
import org.openjdk.jmh.annotations.Mode;
import org.openjdk.jmh.annotations.OutputTimeUnit;
import org.openjdk.jmh.annotations.Param;
import org.openjdk.jmh.annotations.Scope;
import org.openjdk.jmh.annotations.Setup;
import org.openjdk.jmh.annotations.State;
import org.openjdk.jmh.annotations.Warmup;

/** One call of each matching with a smooth function of all n inputs, n outputs; see {@link CoupledWaves}. */
@State(Scope.Thread)
@BenchmarkMode(Mode.AverageTime)
@OutputTimeUnit(TimeUnit.NANOSECONDS)
@Fork(1)
@Warmup(iterations = 4, time = 250, timeUnit = TimeUnit.MILLISECONDS)
@Measurement(iterations = 5, time = 250, timeUnit = TimeUnit.MILLISECONDS)
public class ScalingBenchmark {
  /** Inputs and outputs. */
  @Param({"2", "4", "8", "15", "30", "60"})
  int n;

  /** The matching; products of nodes are out of reach. */
  @Param({
    "linear",
    "second-order",
    "linear-spread",
    "unscented",
    "simplex",
    "cubature3",
    "cubature5",
    "sparse2",
    "tolerance0.01",
    "random1000"
  })
  String matching;

  private Carrier carrier;

  /** Makes the problem and carries once. */
  @Setup
  public void make() {
    carrier = new Carrier("waves:" + n, matching);
  }

  /** The matching. */
  @Benchmark
  public DMatrixRMaj carry() {
    return carrier.carry();
  }

  /** The function alone: the matching's evaluations and Jacobians. */
  @Benchmark
  public double modelOnly() {
    return carrier.model();
  }
}
