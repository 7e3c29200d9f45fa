package dev.estimation.benchmarks.jmh;

import java.io.IOException;
import java.nio.file.Path;
import java.util.ArrayList;
import java.util.Collection;
import java.util.List;
import java.util.Locale;
import org.openjdk.jmh.profile.GCProfiler;
import org.openjdk.jmh.results.Result;
import org.openjdk.jmh.results.RunResult;
import org.openjdk.jmh.runner.Runner;
import org.openjdk.jmh.runner.RunnerException;
import org.openjdk.jmh.runner.options.ChainedOptionsBuilder;
import org.openjdk.jmh.runner.options.OptionsBuilder;
import org.openjdk.jmh.runner.options.TimeValue;

/**
 * The five-state step in one run on one machine: a native program, if its source and a compiler are
 * there, and {@link StepBenchmark} on this JVM and on others. Prints times, bytes and ratios.
 *
 * <pre>{@code
 * java -cp benchmarks/target/study.jar dev.estimation.benchmarks.jmh.SideBySide \
 *     [--native SOURCE.cpp MEASUREMENTS.csv] [--jvm PATH_OF_JAVA]...
 * }</pre>
 *
 * <p>The {@link NativeProgram} is run before and after the JVMs, and the smaller figure counts, which
 * favours it.
 */
public final class SideBySide {
  private final List<String> jvms = new ArrayList<>();
  private Path source;
  private Path measurements;

  private SideBySide() {}

  /**
   * Runs the comparison.
   *
   * @param arguments as above
   */
  public static void main(String[] arguments)
      throws IOException, InterruptedException, RunnerException {
    SideBySide run = new SideBySide();
    run.read(arguments);
    run.compare();
  }

  private void read(String[] arguments) {
    for (int i = 0; i < arguments.length; i++) {
      switch (arguments[i]) {
        case "--native" -> {
          source = Path.of(arguments[++i]);
          measurements = Path.of(arguments[++i]);
        }
        case "--jvm" -> jvms.add(arguments[++i]);
        default -> throw new IllegalArgumentException("unknown argument " + arguments[i]);
      }
    }
  }

  private void compare() throws IOException, InterruptedException, RunnerException {
    NativeProgram program = compile();
    double before = nativeTime(program);
    List<Row> rows = new ArrayList<>(measure(null));
    for (String jvm : jvms) {
      rows.addAll(measure(jvm));
    }
    double after = nativeTime(program);
    print(rows, Math.min(before, after));
  }

  private NativeProgram compile() throws IOException, InterruptedException {
    if (source != null && NativeProgram.canCompile()) {
      return NativeProgram.compile(source);
    }
    System.out.println("native program skipped: it needs --native, g++ and Eigen");
    return null;
  }

  private double nativeTime(NativeProgram program) throws IOException, InterruptedException {
    if (program == null) {
      return Double.NaN;
    }
    program.run(measurements, 2000);
    return program.nanosPerStep();
  }

  private static Collection<Row> measure(String jvm) throws RunnerException {
    ChainedOptionsBuilder options = new OptionsBuilder()
        .include(StepBenchmark.class.getName())
        .addProfiler(GCProfiler.class)
        .forks(2)
        .warmupIterations(5)
        .warmupTime(TimeValue.seconds(1))
        .measurementIterations(5)
        .measurementTime(TimeValue.seconds(1));
    if (jvm != null) {
      options.jvm(jvm);
    }
    return new Runner(options.build()).run().stream().map(Row::of).toList();
  }

  private static void print(List<Row> rows, double nativeTime) {
    System.out.printf(
        Locale.ROOT,
        "%n%-12s %-32s %9s %7s %9s %12s %10s%n",
        "JVM",
        "step",
        "ns",
        "+-",
        "B/step",
        "of native",
        "of plain");
    System.out.printf(Locale.ROOT, "%-12s %-32s %9.1f%n", "-", "native", nativeTime);
    for (Row row : rows) {
      System.out.printf(
          Locale.ROOT,
          "%-12s %-32s %9.1f %7.1f %9.3f %12.3f %10.3f%n",
          row.jvm,
          row.name,
          row.time,
          row.error,
          row.bytes,
          row.time / nativeTime,
          row.time / plainOf(rows, row.jvm));
    }
  }

  private static double plainOf(List<Row> rows, String jvm) {
    return rows.stream()
        .filter(row -> row.jvm.equals(jvm) && row.name.equals("plainEjml"))
        .mapToDouble(row -> row.time)
        .findFirst()
        .orElse(Double.NaN);
  }

  /** One line of the table. */
  private record Row(String jvm, String name, double time, double error, double bytes) {
    static Row of(RunResult run) {
      Result<?> primary = run.getPrimaryResult();
      String benchmark = run.getParams().getBenchmark();
      String method = run.getParams().getParam("method");
      String form = run.getParams().getParam("form");
      String name = benchmark.substring(benchmark.lastIndexOf('.') + 1);
      return new Row(
          run.getParams().getJdkVersion(),
          method == null
              ? name
              : name + " " + method + (form.equals("square-root") ? " " + form : ""),
          primary.getScore(),
          primary.getScoreError(),
          run.getSecondaryResults().get("gc.alloc.rate.norm").getScore());
    }
  }
}
