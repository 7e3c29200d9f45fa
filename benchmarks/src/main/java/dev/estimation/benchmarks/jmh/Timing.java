package dev.estimation.benchmarks.jmh;

import java.util.Collection;
import java.util.OptionalDouble;
import org.openjdk.jmh.results.RunResult;
import org.openjdk.jmh.util.Statistics;

/**
 * What was measured of one benchmark.
 *
 * @param subject the problem, or n
 * @param matching its label
 * @param part the method of the benchmark, {@code carry} or {@code modelOnly}
 * @param nanos a call, the median of the iterations, which one disturbed iteration does not move
 * @param least of the iterations (ns)
 * @param most of the iterations (ns)
 * @param bytes allocated, a call
 */
record Timing(
    String subject,
    String matching,
    String part,
    double nanos,
    double least,
    double most,
    double bytes) {
  static Timing of(RunResult run) {
    String benchmark = run.getParams().getBenchmark();
    Statistics iterations = run.getPrimaryResult().getStatistics();
    String problem = run.getParams().getParam("problem");
    return new Timing(
        problem == null ? run.getParams().getParam("n") : problem,
        run.getParams().getParam("matching"),
        benchmark.substring(benchmark.lastIndexOf('.') + 1),
        iterations.getPercentile(50),
        iterations.getMin(),
        iterations.getMax(),
        run.getSecondaryResults().get("gc.alloc.rate.norm").getScore());
  }

  /** {@return the time of a function's calls alone, if it was measured (ns)} */
  static OptionalDouble ofModel(Collection<Timing> timings, String subject, String matching) {
    return timings.stream()
        .filter(one -> one.part.equals("modelOnly"))
        .filter(one -> one.subject.equals(subject) && one.matching.equals(matching))
        .mapToDouble(Timing::nanos)
        .findFirst();
  }
}
