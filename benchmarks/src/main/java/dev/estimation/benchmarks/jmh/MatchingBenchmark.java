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

/**
 * One call of each matching with each function, in states of several sizes of which the function reads the first components;
 * see {@link CarryProblem} and {@link ComparedMatching}. Iterations are short, since there are many.
 */
@State(Scope.Thread)
@BenchmarkMode(Mode.AverageTime)
@OutputTimeUnit(TimeUnit.NANOSECONDS)
@Fork(1)
@Warmup(iterations = 4, time = 250, timeUnit = TimeUnit.MILLISECONDS)
@Measurement(iterations = 5, time = 250, timeUnit = TimeUnit.MILLISECONDS)
public class MatchingBenchmark {
  /** Function and dimension of the state. */
  @Param({
    "polar:2",
    "polar:5",
    "polar:6",
    "polar:9",
    "polar:15",
    "polar:30",
    "spherical:5",
    "spherical:6",
    "spherical:9",
    "spherical:15",
    "spherical:30",
    "turn:5",
    "turn:6",
    "turn:9",
    "turn:15",
    "turn:30",
    "turn-linear:5",
    "turn-linear:6",
    "turn-linear:9",
    "turn-linear:15",
    "turn-linear:30",
    "pseudorange:5",
    "pseudorange:6",
    "pseudorange:9",
    "pseudorange:15",
    "pseudorange:30",
    "attitude:5",
    "attitude:6",
    "attitude:9",
    "attitude:15",
    "attitude:30"
  })
  String problem;

  /** The matching. */
  @Param({
    "linear",
    "second-order",
    "linear-spread",
    "unscented",
    "simplex",
    "cubature3",
    "cubature5",
    "hermite3",
    "sparse2",
    "tolerance0.01",
    "random1000"
  })
  String matching;

  private Carrier carrier;

  /** Makes the problem and carries once. */
  @Setup
  public void make() {
    carrier = new Carrier(problem, matching);
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
