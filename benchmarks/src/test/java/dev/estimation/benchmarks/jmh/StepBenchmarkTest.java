package dev.estimation.benchmarks.jmh;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertTrue;
import static org.junit.jupiter.api.Assumptions.assumeTrue;

import dev.estimation.core.matching.MomentMatching;
import dev.estimation.core.matching.PointMatching;
import dev.estimation.core.points.UnscentedRule;
import dev.estimation.filters.filter.Estimate;
import dev.estimation.filters.filter.FilterPlan;
import dev.estimation.filters.filter.FilterWorkspace;
import dev.estimation.filters.filter.SensorPort;
import dev.estimation.filters.filter.StepStatus;
import java.io.IOException;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.List;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.CsvSource;

/** What the benchmarks measure is right before it is fast. */
class StepBenchmarkTest {
  private static final MomentMatching UNSCENTED = PointMatching.of(UnscentedRule.scaled(1, 2, 0));

  private final StepBenchmark.Track track = new StepBenchmark.Track();

  /** 1e-9 standard deviations after 20 000 steps: two ways of writing the same sums. */
  @Test
  void plainStepIsTheUnscentedStepOverTheWholeState() {
    Estimate estimate = filter("unscented-whole", "covariance").follow(track, StepBenchmark.STEPS);
    PlainUnscentedStep plain = new StepBenchmark.Plain().follow(track);
    for (int i = 0; i < 5; i++) {
      double deviation = estimate.standardDeviation(i);
      assertEquals(plain.mean.get(i, 0), estimate.mean(i), 1e-9 * deviation);
      for (int j = 0; j < 5; j++) {
        double scale = deviation * estimate.standardDeviation(j);
        assertEquals(plain.covariance.get(i, j), estimate.covariance(i, j), 1e-9 * scale);
      }
    }
  }

  /**
   * Points for the turn rate alone and two inputs of the sensor, eight evaluations in place of 22: within 1e-3
   * standard deviations of the textbook step once the first 50 measurements have brought the spread down
   * (5.5e-4 measured; before that 4.7e-3, of which 4.4e-3 are the textbook step's own distance from products of
   * nine nodes).
   */
  @Test
  void structureSavesEvaluationsAndKeepsTheResult() {
    FilterPlan whole = FilterPlan.of(TurnProblem.motion(), UNSCENTED.overWholeInput());
    FilterPlan structured = FilterPlan.of(TurnProblem.motion(), UNSCENTED);
    FilterWorkspace wholeWork = whole.workspace();
    FilterWorkspace work = structured.workspace();
    SensorPort wholePort = wholeWork.port(TurnProblem.sensor());
    SensorPort port = work.port(TurnProblem.sensor());
    Estimate wanted = whole.start(0, TurnProblem.start());
    Estimate got = structured.start(0, TurnProblem.start());
    for (int k = 0; k < 1000; k++) {
      wholeWork.predict(wanted, k + 1);
      work.predict(got, k + 1);
      wholePort.update(wanted, track.measurements[k]);
      port.update(got, track.measurements[k]);
      for (int i = 0; i < 5 && k >= 50; i++) {
        assertEquals(wanted.mean(i), got.mean(i), 1e-3 * wanted.standardDeviation(i), "step " + k);
      }
    }
    assertEquals(22, wholeWork.evaluations() + wholePort.evaluations());
    assertEquals(8, work.evaluations() + port.evaluations());
  }

  /** Every method, in both forms, follows the target: within a standard deviation of the textbook filter. */
  @ParameterizedTest
  @CsvSource({
    "linear, covariance, 20000",
    "linear, square-root, 20000",
    "unscented, covariance, 20000",
    "unscented, square-root, 20000",
    "unscented-whole, covariance, 20000",
    "unscented-whole, square-root, 20000",
    "cubature, covariance, 20000",
    "cubature, square-root, 20000",
    "hermite3, covariance, 20000",
    "hermite3, square-root, 20000",
    "hermite3-whole, covariance, 20000",
    "hermite3-whole, square-root, 20000",
    "random10000-whole, covariance, 100"
  })
  void everyMethodFollowsTheTarget(String method, String form, int steps) {
    Estimate estimate = filter(method, form).follow(track, steps);
    Estimate reference = filter("unscented-whole", "covariance").follow(track, steps);
    for (int i = 0; i < 5; i++) {
      double distance =
          Math.abs(estimate.mean(i) - reference.mean(i)) / reference.standardDeviation(i);
      assertTrue(distance < 1, method + ", " + form + ", component " + i + ": " + distance);
    }
  }

  private static StepBenchmark.Filter filter(String method, String form) {
    StepBenchmark.Filter filter = new StepBenchmark.Filter();
    filter.method = method;
    filter.form = form;
    filter.make();
    return filter;
  }

  /**
   * The textbook filter, written by hand in another language, on its own measurements: the mean and
   * variances that it prints, to 1e-9 standard deviations (it prints 12 digits).
   */
  @Test
  void agreesWithTheNativeProgram() throws IOException, InterruptedException {
    Path folder = Path.of(System.getProperty("reference.dir", "../../shared"), "native");
    Path source = folder.resolve("textbook_ukf.cpp");
    Path measurements = folder.resolve("measurements.csv");
    assumeTrue(Files.exists(source), "no native program at " + source + ": not compared");
    assumeTrue(NativeProgram.canCompile(), "no g++ or Eigen: not compared with the native program");
    NativeProgram program = NativeProgram.compile(source);
    List<double[]> printed = program.run(measurements, 1);
    Estimate estimate = follow(measurements);
    for (int i = 0; i < 5; i++) {
      double deviation = estimate.standardDeviation(i);
      double rounding = 1e-11 * Math.abs(printed.get(0)[i]);
      assertEquals(printed.get(0)[i], estimate.mean(i), 1e-9 * deviation + rounding);
      assertEquals(printed.get(1)[i], estimate.covariance(i, i), 1e-9 * deviation * deviation);
    }
  }

  private static Estimate follow(Path measurements) throws IOException {
    FilterPlan plan = FilterPlan.of(TurnProblem.motion(), UNSCENTED.overWholeInput());
    FilterWorkspace work = plan.workspace();
    SensorPort port = work.port(TurnProblem.sensor());
    Estimate estimate = plan.start(0, TurnProblem.start());
    List<String> lines = Files.readAllLines(measurements);
    for (String line : lines.subList(1, lines.size())) {
      String[] cells = line.split(",", -1);
      double[] measurement = {Double.parseDouble(cells[1]), Double.parseDouble(cells[2])};
      assertEquals(StepStatus.APPLIED, work.predict(estimate, estimate.time() + 1));
      assertEquals(StepStatus.APPLIED, port.update(estimate, measurement));
    }
    return estimate;
  }
}
