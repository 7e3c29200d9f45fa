package dev.estimation.benchmarks.jmh;

import dev.estimation.filters.filter.Estimate;
import dev.estimation.filters.filter.FilterPlan;
import dev.estimation.filters.filter.FilterWorkspace;
import dev.estimation.filters.filter.SensorPort;
import dev.estimation.filters.filter.StepStatus;
import dev.estimation.filters.model.MotionModel;
import dev.estimation.filters.model.SensorModel;
import java.util.concurrent.TimeUnit;
import org.openjdk.jmh.annotations.Benchmark;
import org.openjdk.jmh.annotations.BenchmarkMode;
import org.openjdk.jmh.annotations.Mode;
import org.openjdk.jmh.annotations.OperationsPerInvocation;
import org.openjdk.jmh.annotations.OutputTimeUnit;
import org.openjdk.jmh.annotations.Param;
import org.openjdk.jmh.annotations.Scope;
import org.openjdk.jmh.annotations.Setup;
import org.openjdk.jmh.annotations.State;

/**
 * One prediction and one update of the {@link TurnProblem}: 20 000 steps from the same start, a step
 * at a time. {@code modelOnly} is what the models alone cost in the textbook step: 11 moves, 11 looks.
 */
@BenchmarkMode(Mode.AverageTime)
@OutputTimeUnit(TimeUnit.NANOSECONDS)
@OperationsPerInvocation(StepBenchmark.STEPS)
public class StepBenchmark {
  static final int STEPS = 20_000;

  static final int SAMPLED_STEPS = 100;

  /** The measurements that every benchmark follows. */
  @State(Scope.Thread)
  public static class Track {
    final double[][] measurements = TurnProblem.measurements(STEPS, 7);
    final double[] nothing = new double[0];
  }

  /** The library's filter with one method. */
  @State(Scope.Thread)
  public static class Filter {
    /** The method; {@code whole} marks points over the whole state, as in the textbook. */
    @Param({"linear", "unscented", "unscented-whole", "cubature", "hermite3", "hermite3-whole"})
    String method = "linear";

    /** What is carried from step to step. */
    @Param({"covariance", "square-root"})
    String form = "covariance";

    private FilterPlan plan;
    private FilterWorkspace workspace;
    private SensorPort port;

    /** Makes plan and workspaces. */
    @Setup
    public void make() {
      plan = StepMethod.plan(method, form);
      workspace = plan.workspace();
      port = workspace.port(TurnProblem.sensor());
    }

    Estimate follow(Track track, int steps) {
      Estimate estimate = plan.start(0, TurnProblem.start());
      for (int k = 0; k < steps; k++) {
        StepStatus predicted = workspace.predict(estimate, k + 1.0);
        StepStatus updated = port.update(estimate, track.measurements[k]);
        if (predicted != StepStatus.APPLIED || updated != StepStatus.APPLIED) {
          throw new IllegalStateException(workspace.failure() + port.failure());
        }
      }
      return estimate;
    }
  }

  /** The library. */
  @Benchmark
  public double step(Filter filter, Track track) {
    return filter.follow(track, STEPS).mean(0);
  }

  /** The library with 10 000 draws over the whole state, fewer steps. */
  @Benchmark
  @OperationsPerInvocation(SAMPLED_STEPS)
  public double monteCarlo(Draws draws, Track track) {
    return draws.filter.follow(track, SAMPLED_STEPS).mean(0);
  }

  /** The same step written plainly with a matrix library. */
  @Benchmark
  public double plainEjml(Plain plain, Track track) {
    return plain.follow(track).mean.data[0];
  }

  /** The models alone. */
  @Benchmark
  public double modelOnly(Models models, Track track) {
    double sum = 0;
    for (int k = 0; k < STEPS; k++) {
      for (int i = 0; i < 11; i++) {
        models.state[0] = 1000 + i;
        models.motion.move(models.state, models.nothing, k, 1, models.next);
        models.sensor.measure(models.next, track.nothing, models.image);
        sum += models.image[0] + models.image[1];
      }
    }
    return sum;
  }

  /** The filter by random draws. */
  @State(Scope.Thread)
  public static class Draws {
    final Filter filter = new Filter();

    /** Draws, and makes plan and workspaces. */
    @Setup
    public void make() {
      filter.method = "random10000-whole";
      filter.make();
    }
  }

  /** The step in matrix operations. */
  @State(Scope.Thread)
  public static class Plain {
    private final PlainUnscentedStep step =
        new PlainUnscentedStep(TurnProblem.motion(), TurnProblem.sensor());

    PlainUnscentedStep follow(Track track) {
      var start = TurnProblem.start();
      for (int i = 0; i < 5; i++) {
        step.mean.data[i] = start.mean(i);
        for (int j = 0; j < 5; j++) {
          step.covariance.set(i, j, start.covariance(i, j));
        }
      }
      for (int k = 0; k < STEPS; k++) {
        step.predict();
        step.update(track.measurements[k]);
      }
      return step;
    }
  }

  /** Models and their arrays. */
  @State(Scope.Thread)
  public static class Models {
    final MotionModel motion = TurnProblem.motion();
    final SensorModel sensor = TurnProblem.sensor();
    final double[] nothing = new double[0];
    final double[] state = {1000, 1000, 14, 4, 0.02};
    final double[] next = new double[5];
    final double[] image = new double[2];
  }
}
